"""The liquid at one temperature: cited values first, then its cited table, then the look-up."""

from __future__ import annotations

from dataclasses import dataclass
from fractions import Fraction

from ..lookup import LIQUIDS
from ..quantity import parse
from ..references import Cite
from ..source.inputs import Given
from ..value import Value, in_si
from . import property_table
from .entry import Entry
from .state import State, warmest


@dataclass(frozen=True)
class Liquid:
    """Properties of the pumped liquid in one state."""

    temperature: Value
    density: Value
    specific_weight: Value
    vapour_pressure: Value


def at(entry: Entry, state: State) -> Liquid:
    """The liquid at the temperature of ``state``.  Raises :class:`InputFault` where a property is neither cited nor looked up."""
    entry.ledger.group("The liquid at its temperature")
    temperature = temperature_of(entry, state)
    vapour = _property(entry, "vapour_pressure", temperature, state.temperature)
    density = _property(entry, "density", temperature, state.temperature)
    weight = entry.ledger.apply("specific_weight", {"rho": density, "g": entry.ledger.constant("g")})
    return Liquid(temperature, density, weight, vapour)


def temperature_of(entry: Entry, state: State) -> Value:
    """The temperature of ``state``, as typed."""
    extreme, given = warmest(entry.calculation)
    if given is not state.temperature:
        extreme = "lowest" if state.temperature is entry.calculation.liquid.temperature.lowest else state.name
    return entry.typed(state.temperature, "T", f"Temperature of the liquid, {extreme}")


def viscosity(entry: Entry, state: State, liquid: Liquid) -> Value:
    """The dynamic viscosity of ``state``; a cited kinematic one is multiplied by the density."""
    found = _property(entry, "viscosity", liquid.temperature, state.temperature)
    if found.symbol == "nu":
        return entry.ledger.apply("dynamic_viscosity", {"nu": found, "rho": liquid.density})
    return found


def vapour_pressure_beside(entry: Entry, state: State, step: str, *, warmer: bool = True) -> Value | None:
    """The vapour pressure a step of temperature (the constant ``step``) away from that of ``state``; ``None`` where unknown.

    It is known where it is looked up or tabulated, and unknown beside a single value, which holds at one temperature.
    """
    liquid, ledger = entry.calculation.liquid, entry.ledger
    temperature, size = ledger.convert(temperature_of(entry, state)), ledger.constant(step)
    if _cited_at(entry, "vapour_pressure", temperature) is not None:
        return None
    if rows := property_table.rows(entry, "vapour_pressure"):
        lowest, highest = (float(row.temperature.quantity.si()) for row in (rows[0], rows[-1]))
    elif source := LIQUIDS.get(liquid.name):
        of = LIQUIDS["water"] if source.mixture else source
        lowest, highest = of.lowest, of.highest
    else:
        return None
    reach = temperature.shadow + size.shadow if warmer else temperature.shadow - size.shadow
    if not lowest <= reach <= highest:
        return None
    name, symbol = ("warmer_temperature", "dT") if warmer else ("colder_temperature", "dT_s")
    return _property(entry, "vapour_pressure", ledger.apply(name, {"T": temperature, symbol: size}), state.temperature)


def cost_of_temperature(entry: Entry, state: State) -> Value | None:
    """Head that one step of temperature above the one used would take, where the liquid's vapour pressure is known there."""
    ledger = entry.ledger
    ledger.group("What a warmer liquid would cost")
    p_x = vapour_pressure_beside(entry, state, "dT")
    if p_x is None:
        return None
    here = at(entry, state)
    return ledger.apply("cost_of_temperature", {"p_x": p_x, "p_v": here.vapour_pressure, "gamma": here.specific_weight})


def highest_temperature(entry: Entry) -> Value | None:
    """The highest temperature expected, where the file gives it; a warmer reading goes before what was expected."""
    extreme, given = warmest(entry.calculation)
    if extreme != "highest":
        return None
    warmer = [r for r in entry.calculation.readings if r.temperature.quantity.si() > given.quantity.si()]
    if warmer:
        hottest = max(warmer, key=lambda r: r.temperature.quantity.si())
        return entry.typed(hottest.temperature, "T", f"Temperature of the liquid, {hottest.name}")
    return entry.typed(given, "T", "Temperature of the liquid, highest")


def _property(entry: Entry, name: str, temperature: Value, given: Given) -> Value:
    """A property at ``temperature``; where it cannot be had, the fault stands at ``given``, the temperature's place."""
    liquid = entry.calculation.liquid
    if cited := _cited_at(entry, name, temperature):
        return property_table.cited_value(entry, cited)
    if property_table.rows(entry, name):
        return property_table.read(entry, name, temperature, given)
    source = LIQUIDS.get(liquid.name)
    effective = name == "vapour_pressure" and liquid.vapour_pressure_kind == "effective"
    if source and source.mixture and name == "vapour_pressure" and not effective:
        return _over_mixture(entry, temperature, given)
    if source and source.offers(name) and not effective:
        fraction = _dissolved(entry) if source.mixture else None
        return entry.look_up(liquid.name, name, temperature, given, fraction)
    words = f"the {'effective ' if effective else ''}{name.replace('_', ' ')} of {liquid.name}"
    entry.refuse(
        given,
        f"the temperature at which {name} is cited",
        given.text,
        f"a cited property holds at one temperature; give a `table` of it, for {words} is not looked up",
    )


def _cited_at(entry: Entry, name: str, temperature: Value) -> Given | None:
    """The file's single value of a property, where it holds: at the highest temperature only."""
    cited: Given | None = getattr(entry.calculation.liquid, name)
    return cited if in_si(temperature) == warmest(entry.calculation)[1].quantity.si() else None


def _share(entry: Entry) -> Given:
    """How much is dissolved in water, as the file gives it."""
    liquid = entry.calculation.liquid
    source = LIQUIDS[liquid.name]
    given = liquid.salinity if source.mixture == "salinity" else liquid.mass_fraction
    assert given is not None, "source asks for what is dissolved"
    if given.quantity.si() > Fraction(str(source.most)):  # the limit as printed, not its nearest float
        entry.refuse(
            given,
            f"at most {100 * source.most:g} %",
            given.text,
            f"{liquid.name} is looked up no further; cite its properties",
        )
    return given


def _dissolved(entry: Entry) -> Value:
    """The mass fraction dissolved in water, as typed."""
    name = entry.calculation.liquid.name
    title = "Salinity" if LIQUIDS[name].mixture == "salinity" else f"Mass fraction dissolved in water, {name}"
    return entry.typed(_share(entry), "w", title)


def _over_mixture(entry: Entry, temperature: Value, given: Given) -> Value:
    """The vapour pressure of a mixture with water: by Raoult's law, or that of pure water, which is higher."""
    liquid = entry.calculation.liquid
    title = "Vapour pressure of pure water, absolute, looked up"
    if in_si(temperature) < LIQUIDS["water"].lowest:
        entry.assume(
            "triple_point",
            "Below the triple point of water, 0.01 °C, its vapour pressure is taken there",
            "on the safe side: that of colder water is lower",
        )
        temperature = entry.ledger.constant("T_w")
    pure = entry.look_up("water", "vapour_pressure", temperature, given, title=title)
    if liquid.vapour_pressure_of == "raoult":
        return _raoult(entry, pure)
    if not liquid.vapour_pressure_of:
        entry.assume(
            "vapour_pressure_of",
            f"The vapour pressure of {liquid.name} is taken to be that of pure water",
            "on the safe side: what is dissolved lowers it; `vapour_pressure_of: raoult` or a cited value comes nearer",
        )
    return pure


def _raoult(entry: Entry, pure: Value) -> Value:
    """The vapour pressure over a solution by Raoult's law on its water; of sea water by the published form of it."""
    ledger, name = entry.ledger, entry.calculation.liquid.name
    source, fraction = LIQUIDS[name], _dissolved(entry)
    if source.mixture == "salinity":
        return ledger.apply("sea_water_vapour_pressure", {"p_w": pure, "w": ledger.convert(fraction)})
    assert source.solute, "source refuses Raoult's law for a salt"
    entry.assume(
        "raoult",
        f"The vapour pressure of {name} follows Raoult's law",
        "an ideal solution whose solute does not evaporate; a real one differs by some per cent",
    )
    solute = ledger.tabulated(
        "M_s", f"Relative molecular mass of {name}", parse(source.solute, "ratio"), "the sum of its atomic weights",
        Cite("ciaaw"),
    )  # fmt: skip
    water = {"w": ledger.convert(fraction), "M_w": ledger.constant("M_w"), "M_s": solute}
    return ledger.apply("raoult", {"x_w": ledger.apply("water_mole_fraction", water), "p_w": pure})
