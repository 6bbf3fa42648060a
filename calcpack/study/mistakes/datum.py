"""The pump's datum: NPSH counts at the impeller's eye, not at the floor, a flange or the shaft of a vertical pump."""

from __future__ import annotations

from collections.abc import Iterator

from ...value import Value
from .. import npsh
from ..finding import Finding, finding
from .search import Search, says

#: Places that are no datum of NPSH of a pump that lies.
_ELSEWHERE = "floor|paving|grade|ground|slab|flanges?|base ?plates?|sole ?plates?|motor|coupling|discharge"
#: A vertical pump's shaft; and words that say that the datum is in the pump below it.
_SHAFT, _INSIDE = "shafts?|coupling", "eyes?|impellers?|first[- ]stage|vertical|cans?|barrel"
#: Height of a first stage over the bell lip, in diameters of the bell, beyond which it is no first stage.
HIGHEST_STAGE = 2.0
#: Head, m, between the end of the line and the datum, beyond which they are not one nozzle and its pump.
APART = 0.5


def wrong_datum(at: Search) -> Iterator[Finding]:
    """A datum that by its words, or by where the bell or the line's end stands, is not the pump's NPSH datum."""
    if at.c.pump.npsh_required.datum_elevation is not None:
        return  # the elevation NPSH required counts from is told, and NPSH available is shifted to it
    found = _of_a_wet_pit(at) if at.c.pump.arrangement == "wet_pit" else _of_a_line(at)
    what, cost = found or _by_words(at)
    if what:
        yield finding(
            "wrong_datum", what,
            "NPSH counts at the impeller's eye, of a vertical pump at that of its first stage; another datum moves NPSH available "
            "metre for metre, usually by 0.3 to 3 m (common practice)",
            cost, "NPSH required counts from there",
        )  # fmt: skip


def _by_words(at: Search) -> tuple[str, Value | None]:
    vertical = at.c.pump.arrangement == "wet_pit"
    for datum in (at.c.pump.datum, at.c.pump.npsh_required.datum):
        word = says(datum, _ELSEWHERE) or (vertical and says(datum, _SHAFT))
        if word and not says(datum, _INSIDE):
            return f"The pump's NPSH datum is “{datum}”", None
    return "", None


def _of_a_wet_pit(at: Search) -> tuple[str, Value | None] | None:
    """A datum above the water, too high over the bell for a first stage, or on the bell lip itself."""
    datum, intake, level = at.c.pump.datum_elevation, at.c.intake, at.worst.level
    if intake is None or intake.reference != "bell_lip":
        return None
    over = float(datum.quantity.si() - intake.elevation.quantity.si())
    dry = level is not None and datum.quantity.si() >= level.quantity.si()
    diameter = float(intake.inlet_diameter.quantity.si())
    if over and not dry and over <= HIGHEST_STAGE * diameter:
        return None
    at.ledger.group("The pump's datum over the bell lip")
    if over:
        lip = at.entry.value(intake.elevation, "z_r", "Elevation of the bell lip")
        cost = at.ledger.apply("datum_over_bell", {"z_d": npsh.datum(at.entry), "z_r": lip})
        place = "above the lowest level, where no first stage hangs" if dry else "far above the bell lip"
        return f"The pump's NPSH datum, {datum.text}, lies {place} (line {cost.address})", cost
    width = at.entry.value(intake.inlet_diameter, "D_i", "Diameter of the inlet")
    cost = at.ledger.apply("eye_over_bell", {"D_i": width})
    return f"The pump's NPSH datum, {datum.text}, is the bell lip, above which the first stage hangs", cost


def _of_a_line(at: Search) -> tuple[str, Value | None] | None:
    """A datum well off the end of the line, where the pump's nozzle is."""
    nodes = at.results.line.nodes if at.results.line else ()
    last = at.passage.rows[-1].element.elevation if at.passage else None
    datum = at.c.pump.datum_elevation
    if last is None or abs(float(last.quantity.si() - datum.quantity.si())) <= APART:
        return None
    if says(f"{at.c.pump.datum} {at.c.pump.npsh_required.datum}", "first[- ]stage|vertical|cans?|barrel"):
        return None
    at.ledger.group("The line's end over the pump's datum")
    operands = {"z_n": nodes[-1].elevation, "z_d": npsh.datum(at.entry)}
    cost = at.ledger.apply("line_end_over_datum", operands)
    what = f"The line ends at {last.text}, and the pump's NPSH datum lies at {datum.text} (line {cost.address})"
    return what, cost


MISTAKES = (wrong_datum,)
