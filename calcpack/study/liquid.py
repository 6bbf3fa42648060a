"""The liquid at one temperature: cited values first, else looked up."""

from __future__ import annotations

from dataclasses import dataclass

from ..source.inputs import Given
from ..value import Value
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
    vapour = _property(entry, state, "vapour_pressure", "p_v", "Vapour pressure, absolute")
    density = _property(entry, state, "density", "rho", "Density")
    weight = entry.ledger.apply("specific_weight", {"rho": density, "g": entry.ledger.constant("g")})
    return Liquid(temperature, density, weight, vapour)


def temperature_of(entry: Entry, state: State) -> Value:
    """The temperature of ``state``, as typed."""
    extreme, given = warmest(entry.calculation)
    title = (
        f"Temperature of the liquid, {extreme}"
        if given is state.temperature
        else f"Temperature of the liquid, {state.name}"
    )
    return entry.typed(state.temperature, "T", title)


def viscosity(entry: Entry, state: State, liquid: Liquid) -> Value:
    """The dynamic viscosity of ``state``; a cited kinematic one is multiplied by the density."""
    cited = _cited(entry, state, "viscosity")
    if cited is None:
        return entry.look_up("viscosity", liquid.temperature, state.temperature)
    if cited.quantity.unit.kind == "kinematic_viscosity":
        return entry.ledger.apply("dynamic_viscosity", {
            "nu": entry.value(cited, "nu", "Kinematic viscosity"), "rho": liquid.density,
        })  # fmt: skip
    return entry.value(cited, "mu", "Dynamic viscosity")


def _property(entry: Entry, state: State, name: str, symbol: str, title: str) -> Value:
    cited = _cited(entry, state, name)
    if cited is not None:
        return entry.value(cited, symbol, f"{title}, cited")
    return entry.look_up(name, temperature_of(entry, state), state.temperature)


def _cited(entry: Entry, state: State, name: str) -> Given | None:
    """The file's own value of a property, where it holds: at the temperature of the worst case only."""
    liquid = entry.calculation.liquid
    given: Given | None = getattr(liquid, name)
    if given is None or state.temperature.quantity.si() == warmest(entry.calculation)[1].quantity.si():
        return given
    if liquid.name != "water":
        entry.refuse(
            state.temperature,
            f"the temperature at which {name} is cited",
            state.temperature.text,
            f"a cited property holds at one temperature; {liquid.name} is not looked up at another",
        )
    return None
