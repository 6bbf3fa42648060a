"""Properties cited that the liquid does not have: of cold water, of another temperature or unit, or a Reid vapour pressure."""

from __future__ import annotations

from collections.abc import Iterator
from itertools import pairwise

from ...lookup import LIQUIDS, OutOfRange, liquid
from ...quantity import parse
from ...source.inputs import Given
from ...value import Value
from .. import property_table
from ..entry import Entry
from ..finding import Finding, finding
from ..npsh import origin
from ..state import warmest
from .search import Search, says

#: How far a cited property may lie from the look-up before it is asked about: impurities explain less.
_FAR = {"density": (0.9, 1.1), "viscosity": (0.5, 2.0), "vapour_pressure": (0.8, 1.25)}
#: The same of a mixture's vapour pressure beside that of pure water: a strong brine has less than half of it.
_FAR_BELOW_WATER = (0.4, 1.02)
#: Density of cold water, kg/m³, and how far the liquid's own may lie from it before it is asked about.
COLD_WATER, LIKE = (995.0, 1001.0), 0.02
#: Liquids that are mostly water.
_WATERY = "water|aqueous|condensate|effluent|sewage|sludge|slurry|brine|caustic|solution|glycol"


def cold_water(at: Search) -> Iterator[Finding]:
    """A density of cold water cited for another liquid, or for hot water."""
    entry, name = at.entry, at.c.liquid.name
    for given, temperature in _cited(entry, "density"):
        if not _of_cold_water(given):
            continue
        known = _looked_up(entry, "density", given, temperature)
        if known is None and (says(name, _WATERY) or not _whole(given)):
            continue
        if known is not None and abs(float(given.quantity.si()) / known - 1) <= LIKE:
            continue
        yield finding(
            "density_of_cold_water", f"The density cited of {name} at {temperature.text}, {given.text}, is that of cold water",
            "heads are those of the pumped liquid at the pumped temperature: pressures and pressure drops come out as too "
            "little head of a lighter one",
            _cost_of_density(at, temperature) if known else None, "the liquid is as heavy as that",
        )  # fmt: skip
        return  # once for a table


def _of_cold_water(given: Given) -> bool:
    return COLD_WATER[0] <= float(given.quantity.si()) <= COLD_WATER[1]


def _whole(given: Given) -> bool:
    """Whether a density is the round figure of water rather than one measured of a liquid as heavy."""
    round_figures = ("1000 kg/m³", "998 kg/m³", "998.2 kg/m³", "62.4 lb/ft³", "62.37 lb/ft³", "62.3 lb/ft³")
    return any(given.quantity.si() == parse(each, "liquid_density").si() for each in round_figures)


def _cost_of_density(at: Search, temperature: Given) -> Value | None:
    """What the density cited does to the pressure on the surface."""
    c = at.c.liquid
    if not _counts(at, temperature):
        return None
    there, dissolved = origin(at.entry, at.worst), c.salinity or c.mass_fraction
    what = "Salinity" if c.salinity else f"Mass fraction dissolved in water, {c.name}"
    fraction = at.entry.typed(dissolved, "w", what) if dissolved else None
    at.ledger.group("Density cited, and as looked up")
    operands = {
        "p_s": there.pressure, "p_v": there.liquid.vapour_pressure, "g": at.ledger.constant("g"), "rho": there.liquid.density,
        "rho_x": at.entry.look_up(c.name, "density", there.liquid.temperature, temperature, fraction),
    }  # fmt: skip
    return at.ledger.apply("cost_of_density", operands)


def _cost_of_vapour_pressure(at: Search, temperature: Given) -> Value | None:
    """What the vapour pressure as looked up takes more than the one cited."""
    if not _counts(at, temperature):
        return None
    there = origin(at.entry, at.worst)
    at.ledger.group("Vapour pressure cited, and as looked up")
    looked_up = at.entry.look_up(at.c.liquid.name, "vapour_pressure", there.liquid.temperature, temperature)
    operands = {"p_x": looked_up, "gamma": there.liquid.specific_weight, "H_v": there.vapour_head}
    return at.ledger.apply("cost_of_vapour_pressure", operands)


def _counts(at: Search, temperature: Given) -> bool:
    """Whether a property at ``temperature`` enters the worst case, and the pressure on the surface does not follow it."""
    warm = warmest(at.c)[1]
    return bool(at.results.runs) and at.c.supply.kind != "saturated" and temperature.quantity.si() == warm.quantity.si()


def unlike_the_look_up(at: Search) -> Iterator[Finding]:
    """A cited property that is not at all that of the liquid; nothing is said of a liquid that is not looked up."""
    for name in _FAR:
        for given, temperature in _cited(at.entry, name):
            if name != "density" or not _of_cold_water(given):
                yield from _unlike(at, name, given, temperature)


def _cited(entry: Entry, name: str) -> Iterator[tuple[Given, Given]]:
    """Each value cited of a property, with the temperature it holds at."""
    for row in property_table.rows(entry, name):
        yield getattr(row, name), row.temperature
    single: Given | None = getattr(entry.calculation.liquid, name)
    if single is not None:
        yield single, warmest(entry.calculation)[1]


def _unlike(at: Search, name: str, cited: Given, temperature: Given) -> Iterator[Finding]:
    c = at.c.liquid
    known = _looked_up(at.entry, name, cited, temperature)
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
    yield finding(
        "property_of_another_liquid",
        f"The {name.replace('_', ' ')} cited, {cited.text}, is not that of {c.name} at {temperature.text}",
        reason,
        _cost_of_vapour_pressure(at, temperature) if name == "vapour_pressure" and not over_mixture else None,
        "the liquid is not pure",
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


def table_runs_back(at: Search) -> Iterator[Finding]:
    """Neighbours in the table whose vapour pressure does not rise, or whose viscosity does not fall, with temperature."""
    for name, rises in (("vapour_pressure", True), ("viscosity", False)):
        for below, above in pairwise(property_table.rows(at.entry, name)):
            first, second = (getattr(row, name).quantity.si() for row in (below, above))
            if (second <= first) if rises else (second >= first):
                words = name.replace("_", " ")
                yield finding(
                    "table_runs_back",
                    f"The {words} of the table does not {'rise' if rises else 'fall'} from {below.temperature.text} to "
                    f"{above.temperature.text}",
                    f"that of a liquid {'rises' if rises else 'falls'} with temperature; a row is in doubt",
                    unless="the rows are as published",
                )


def effective(at: Search) -> Iterator[Finding]:
    """An effective vapour pressure, which is stated and no mistake, but changes what NPSH available means."""
    if at.c.liquid.vapour_pressure_kind == "effective":
        yield finding(
            "",
            "The vapour pressure is an effective one: it counts gas dissolved in the liquid",
            "it lies above the true vapour pressure; NPSH available is counted down to where gas comes out",
        )


MISTAKES = (cold_water, unlike_the_look_up, table_runs_back, effective)
