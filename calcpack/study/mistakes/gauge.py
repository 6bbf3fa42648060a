"""The gauge at the pump inlet: the sign of a vacuum, what it counts from, its height, and the bore at its tap."""

from __future__ import annotations

from collections.abc import Iterator

from ...source.inputs import Reading
from ...value import Value
from .. import npsh
from ..barometer import barometer
from ..entry import Entry
from ..finding import Finding, finding
from ..flow import bore_of, flow_in
from ..liquid import at as liquid_at
from ..state import as_found
from ..supply import flow_of
from .search import Search

#: Head, m, beyond which no suction line loses: a reading is not explained by such a loss.
MOST_LOST = 3.0
#: Head, m, by which a gauge stands below the pump's datum, or above it, at most.
LOWEST_GAUGE, HIGHEST_GAUGE = -2.0, 15.0
#: Part of the line's velocity head below which that at the tap has vanished, and the head, m, that this must come to.
VANISHED, WORTH = 0.2, 0.05
#: Bore of a tap over the diameter of the inlet before the pump, beyond which it is not that of its pipe.
WIDEST = 1.3


def _inferred(entry: Entry, reading: Reading) -> Value:
    """The loss from the surface to the tap, as the reading shows it."""
    found = npsh.measured(entry, reading, reading.name)
    return npsh.inferred(entry, found, npsh.origin(entry, as_found(reading)))


def above_the_surface(at: Search) -> Iterator[Finding]:
    """A reading that shows more head than the surface offers: a vacuum typed without its sign, an absolute reading, or neither."""
    for reading in at.c.readings:
        given, state = reading.gauge.pressure, as_found(reading)
        if reading.level is None:
            continue
        tried = _inferred(at.trial, reading)
        if tried.record >= 0:
            continue
        p_g, p_b = float(given.quantity.si()), barometer(at.trial, state).shadow
        weight = liquid_at(at.trial, state).specific_weight.shadow
        meant = {
            "vacuum_without_sign": tried.shadow + 2 * p_g / weight,
            "absolute_as_gauge": tried.shadow + p_b / weight,
        }
        fits = {name: lost for name, lost in meant.items() if 0 <= lost <= MOST_LOST}
        typed_above = given.quantity.reference == "gauge" and p_g > 0 and tried.shadow < -npsh.CREDIBLE
        if typed_above and fits:
            yield _other_reading(at, reading, min(fits, key=lambda name: fits[name]))
            continue
        inferred = _inferred(at.entry, reading)
        yield finding(
            "reading_above_surface",
            f"The reading {reading.name} shows more head than the surface offers (line {inferred.address})",
            "losses cannot be negative: level, gauge, its elevation, barometer or datum is in doubt",
            inferred, "it lies within what the instruments are good for",
        )  # fmt: skip


def _other_reading(at: Search, reading: Reading, name: str) -> Finding:
    state, given = as_found(reading), reading.gauge.pressure
    weight = liquid_at(at.entry, state).specific_weight
    what = f"{reading.name}: the gauge reads {given.text}, above the barometer, and the surface cannot offer that"
    at.ledger.group("Another meaning of the gauge reading")
    if name == "vacuum_without_sign":
        p_g = at.entry.gauge(given, f"Inlet gauge reading, {state.name}")
        head = at.ledger.apply("gauge_head", {"p_g": p_g, "gamma": weight})
        return finding(
            name, what,
            f"as a vacuum, {given.quantity.text} {given.quantity.unit.name} vacuum, it leaves a likely loss of the line; typed "
            "without its sign it counts twice, and NPSH available comes out too great",
            at.ledger.apply("gauge_sign", {"H_g": head}, state.name), "the gauge shows more than the barometer",
        )  # fmt: skip
    return finding(
        name, what,
        "as an absolute pressure it leaves a likely loss of the line; the barometer is then counted twice, and NPSH available "
        "comes out too great by it",
        at.ledger.apply("barometer_head", {"p_b": barometer(at.entry, state), "gamma": weight}),
        "the gauge shows more than the barometer",
    )  # fmt: skip


def height(at: Search) -> Iterator[Finding]:
    """A gauge on the pump's datum to the digit while its tap is elsewhere or not told, or too far from it to be its gauge."""
    datum = at.c.pump.datum_elevation
    for reading in at.c.readings:
        gauge = reading.gauge
        if gauge.leg != "filled":
            continue
        high = float(gauge.elevation.quantity.si() - datum.quantity.si())
        tap = gauge.tap_elevation
        if high == 0 and (tap is None or tap.quantity.si() != datum.quantity.si()):
            cost = None if tap is None else _height(at, reading, tap_of=True)
            yield finding(
                "gauge_height",
                f"{reading.name}: the elevation of the gauge, {gauge.elevation.text}, is that of the pump's datum to the digit",
                "a filled leg adds the height of the gauge's centre over the datum, metre for metre; gauges usually stand 0.3 to "
                "1.5 m off it (common practice): measure it, or state the tap's elevation too",
                cost, "the gauge's centre lies on the datum",
            )  # fmt: skip
        elif not LOWEST_GAUGE <= high <= HIGHEST_GAUGE:
            yield finding(
                "gauge_height",
                f"{reading.name}: the gauge, at {gauge.elevation.text}, lies far from the pump's datum, at {datum.text}",
                "its height is added metre for metre: every elevation counts from the file's one datum, not from the pump or "
                "the floor",
                _height(at, reading), "the gauge stands that far away",
            )  # fmt: skip


def _height(at: Search, reading: Reading, *, tap_of: bool = False) -> Value:
    gauge = reading.gauge
    at.ledger.group("Height of the gauge")
    if tap_of:
        assert gauge.tap_elevation is not None, "called where it is given"
        stands = at.entry.value(gauge.tap_elevation, "z_G", f"Elevation of the tap, {reading.name}")
    else:
        stands = at.entry.value(gauge.elevation, "z_G", f"Elevation of the gauge centre, leg filled, {reading.name}")
    return at.ledger.apply("gauge_height", {"z_G": stands, "z_d": npsh.datum(at.entry)}, reading.name)


def velocity_head(at: Search) -> Iterator[Finding]:
    """A bore at the tap so wide that the velocity head, which a wall tap misses, vanishes."""
    for reading in at.c.readings:
        state = as_found(reading)
        flow = flow_of(at.trial, state)
        tap = flow_in(at.trial, flow, bore_of(at.trial, reading.gauge.tap, reading, "at the gauge tap"), "")
        if at.passage is None:
            inlet = at.c.intake.inlet_diameter if at.c.intake else None
            if inlet is None or tap.bore.shadow <= WIDEST * float(inlet.quantity.si()):
                continue
            cost, than = None, f"the inlet that the water enters by, {inlet.text}"
        else:
            last = at.passage.flows[-1]
            line = flow_in(at.trial, flow, last.bore, "").velocity_head.shadow
            if tap.velocity_head.shadow >= VANISHED * line or line < WORTH:
                continue
            at.ledger.group("Velocity head in the line's bore")
            own = flow_of(at.entry, state)
            cost = flow_in(at.entry, own, last.bore, f"before the pump, {reading.name}").velocity_head
            than = f"the line before the pump, {at.ledger.shown(last.bore)}"
        yield finding(
            "velocity_head_left_out",
            f"{reading.name}: the bore at the tap, {at.ledger.shown(tap.bore)}, is far wider than {than}",
            "a wall tap does not see the velocity head, which is part of NPSH available (0.2 m at 2 m/s): in so wide a bore it "
            "vanishes, and NPSH available comes out too small",
            cost, "the tap stands in such a pipe",
        )  # fmt: skip


MISTAKES = (above_the_surface, height, velocity_head)
