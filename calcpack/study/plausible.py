"""What a careful reader would ask about the inputs: each answer a finding, never a silent change."""

from __future__ import annotations

from itertools import pairwise

from ..lookup import LIQUIDS, OutOfRange, liquid
from ..source.inputs import Given
from . import property_table
from .entry import Entry
from .state import warmest


def check(entry: Entry) -> None:
    """Find readings outside the extremes the file states, and cited properties that the liquid does not have."""
    c = entry.calculation
    lowest_level = c.supply.level.lowest if c.supply.level else None
    lowest_barometer = c.site.barometer.lowest if c.site.barometer else None
    for reading in c.readings:
        _beyond(entry, reading.name, "barometer", reading.barometer, lowest_barometer, lower=True)
        _beyond(entry, reading.name, "level", reading.level, lowest_level, lower=True)
        _beyond(entry, reading.name, "flow", reading.flow, c.pump.flow.highest, lower=False)
        _beyond(entry, reading.name, "temperature", reading.temperature, c.liquid.temperature.highest, lower=False)
    for name in _FAR:
        cited: Given | None = getattr(c.liquid, name)
        rows = property_table.rows(entry, name)
        for temperature, given in [(row.temperature, getattr(row, name)) for row in rows] + (
            [(warmest(c)[1], cited)] if cited else []
        ):
            _like_look_up(entry, name, given, temperature)
    _table_runs_on(entry)
    _pump(entry)
    _elevations(entry)
    if c.liquid.vapour_pressure_kind == "effective":
        entry.find(
            "The vapour pressure is an effective one: it counts gas dissolved in the liquid",
            "it lies above the true vapour pressure; NPSH available is counted down to where gas comes out",
        )


def _pump(entry: Entry) -> None:
    """Find what the maker's figure, or the margin over it, was not made for."""
    c = entry.calculation
    npsh = c.pump.npsh_required
    if npsh.basis != "NPSH3":
        entry.find(
            "NPSH required is not stated as NPSH3",
            "the margins in print are counted over NPSH3, a fall of head of 3 % of a rotodynamic pump; a positive displacement "
            "pump's figure rests on a loss of capacity: ask the maker on which basis it stands, and for the margin over it",
        )
    for low, high in pairwise(npsh.points):
        if high.npsh.quantity.si() < low.npsh.quantity.si():
            entry.find(
                f"NPSH required falls from {low.npsh.text} at {low.flow.text} to {high.npsh.text} at {high.flow.text}",
                "it rises with flow, but for some pumps at the lowest flows: a point may be misread",
            )
    if c.pump.reciprocating is not None and c.criteria.service:
        entry.find(
            f"The margin of the service “{c.criteria.service.name}” is published for rotodynamic pumps",
            "a reciprocating pump needs the margin that its maker or the project states",
        )


#: Height, m, by which the ends of a line may lie off the inlet and the pump before it is asked about.
OFF = 2


def _elevations(entry: Entry) -> None:
    """Find pipes that fall more than their length, and lines that begin or end far from inlet and pump."""
    c = entry.calculation
    elements = [e for s in c.line.sections for e in s.elements] if c.line else []
    for before, element in pairwise(elements):
        if element.kind == "pipe" and element.length and element.elevation and before.elevation:
            apart = abs(element.elevation.quantity.si() - before.elevation.quantity.si())
            if apart > element.length.quantity.si():
                entry.find(
                    f"Element {element.id}, {element.length.text} of pipe, leads from {before.elevation.text} to "
                    f"{element.elevation.text}",
                    "a pipe cannot rise or fall by more than its length: an elevation or the length is in doubt",
                )
    if not elements:
        return
    ends = [(elements[-1].elevation, c.pump.datum_elevation, "The line ends", "the pump's datum")]
    if c.intake is not None and elements[0].kind == "entrance":
        ends.append((elements[0].elevation, c.intake.elevation, "The entrance lies", "the inlet of `intake`"))
    for here, there, words, what in ends:
        if here is not None and abs(here.quantity.si() - there.quantity.si()) > OFF:
            entry.find(
                f"{words} at {here.text}, {what} at {there.text}",
                "both describe one place: an elevation, or its datum, is in doubt",
            )


def _beyond(entry: Entry, name: str, what: str, read: Given | None, extreme: Given | None, *, lower: bool) -> None:
    if read is None or extreme is None:
        return
    outside = read.quantity.si() < extreme.quantity.si() if lower else read.quantity.si() > extreme.quantity.si()
    if outside:
        word = "below the lowest" if lower else "above the highest"
        entry.find(
            f"{name}: the {what} read, {read.text}, is {word} the file states, {extreme.text}",
            "the worst case is then not the worst; the extreme or the reading is in doubt",
        )


#: How far a cited property may lie from the look-up before it is asked about: impurities explain less.
_FAR = {"density": (0.9, 1.1), "viscosity": (0.5, 2.0), "vapour_pressure": (0.8, 1.25)}
#: The same of a mixture's vapour pressure beside that of pure water: a strong brine has less than half of it.
_FAR_BELOW_WATER = (0.4, 1.02)


def _like_look_up(entry: Entry, name: str, cited: Given, temperature: Given) -> None:
    """Find a cited property that is not at all that of the liquid; nothing is said of a liquid that is not looked up."""
    c = entry.calculation.liquid
    known = _looked_up(entry, name, cited, temperature)
    if known is None:
        return
    over_mixture = name == "vapour_pressure" and LIQUIDS[c.name].mixture
    lowest, highest = _FAR_BELOW_WATER if over_mixture else _FAR[name]
    effective = name == "vapour_pressure" and c.vapour_pressure_kind == "effective"
    if effective:
        lowest, highest = (lowest if over_mixture else 1.0), float("inf")
    share = float(cited.quantity.si()) / known
    if lowest <= share <= highest:
        return
    reason = "the look-up differs by more than impurities would explain; the unit or the temperature is in doubt"
    if effective:
        reason = "an effective vapour pressure lies above the true one, which the look-up gives as higher than this"
    elif name == "vapour_pressure" and share < lowest:
        reason = (
            "the look-up is far higher, so that NPSH available comes out too great; the unit, the temperature, or a Reid "
            "vapour pressure taken for the true one is in doubt"
        )
    entry.find(
        f"The {name.replace('_', ' ')} cited, {cited.text}, is not that of {c.name} at {temperature.text}", reason
    )


def _looked_up(entry: Entry, name: str, cited: Given, temperature: Given) -> float | None:
    """The property in SI as the look-up has it, where it has it; that of its water for a mixture's vapour pressure."""
    c = entry.calculation.liquid
    source = LIQUIDS.get(c.name)
    if source is None:
        return None
    dissolved = c.salinity or c.mass_fraction
    of, fraction = (c.name, float(dissolved.quantity.si())) if source.mixture and dissolved else (c.name, 0.0)
    if name == "vapour_pressure" and source.mixture:
        of, fraction = "water", 0.0
    elif not source.offers(name):
        return None
    kelvin = float(temperature.quantity.si())
    try:
        known = liquid(of, name, kelvin, fraction)
        kinematic = cited.quantity.unit.kind == "kinematic_viscosity"
        return known / liquid(of, "density", kelvin, fraction) if kinematic else known
    except OutOfRange:
        return None


def _table_runs_on(entry: Entry) -> None:
    """Find neighbours in the table whose vapour pressure does not rise, or whose viscosity does not fall, with temperature."""
    for name, rises in (("vapour_pressure", True), ("viscosity", False)):
        for below, above in pairwise(property_table.rows(entry, name)):
            first, second = (getattr(row, name).quantity.si() for row in (below, above))
            if (second <= first) if rises else (second >= first):
                words = name.replace("_", " ")
                entry.find(
                    f"The {words} of the table does not {'rise' if rises else 'fall'} from {below.temperature.text} to "
                    f"{above.temperature.text}",
                    f"that of a liquid {'rises' if rises else 'falls'} with temperature; a row is in doubt",
                )
