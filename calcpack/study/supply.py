"""The supply: where the line starts, what pressure stands there, and the barometer behind it."""

from __future__ import annotations

from collections.abc import Callable, Mapping

from ..source.inputs import Given
from ..value import Value
from .barometer import barometer
from .entry import Entry
from .liquid import Liquid, vapour_pressure_beside
from .state import State

#: Distance, m, within which levels, inlets and pumps of one suction side lie; farther is two datums mixed up.
FARTHEST, FAR = 500, 100


def near(entry: Entry, distance: Value, at: Given, what: str) -> None:
    """Refuse a level too far from ``what`` to belong to one suction side; find one that is unusually far."""
    if abs(distance.shadow) > FARTHEST:
        entry.refuse(at, f"a level within {FARTHEST} m of {what}", f"{entry.ledger.shown(distance)} between them",
                     "every elevation of a file counts from its one datum")  # fmt: skip
    if abs(distance.shadow) > FAR:
        entry.find(
            f"{entry.ledger.shown(distance).lstrip('-')} lie between {at.key} and {what} (line {distance.address})",
            "suction sides are rarely that tall: two datums, or two units, may have been mixed up",
            "far_apart",
            cost=distance,
            unless="the suction side is that tall",
        )


def flow_of(entry: Entry, state: State) -> Value:
    """The flow of one pump in ``state``."""
    highest = state.flow is entry.calculation.pump.flow.highest
    return entry.value(state.flow, "Q", "Flow of one pump, highest" if highest else f"Flow of the pump, {state.name}")


def surface_level(entry: Entry, state: State) -> Value:
    """The elevation of the surface in ``state``, drawn down where the file says by how much."""
    assert state.level is not None, "a surface needs a level"
    level = entry.calculation.supply.level
    word = "lowest" if level is not None and state.level is level.lowest else state.name
    if state.drawdown is None:
        return entry.value(state.level, "z_s", f"Level of the surface, {word}")
    still = entry.value(state.level, "z_l", f"Level of the surface before drawdown, {word}")
    drawdown = entry.value(state.drawdown, "z_w", "Drawdown of the surface while pumping")
    return entry.ledger.apply("drawn_down_level", {"z_l": still, "z_w": drawdown})


def _open(entry: Entry, state: State, liquid: Liquid) -> Value:
    return entry.ledger.apply("open_surface", {"p_b": barometer(entry, state)})


def _gas_blanketed(entry: Entry, state: State, liquid: Liquid) -> Value:
    assert state.pressure is not None, "source asks for a blanketed vessel's pressure"
    p_s = entry.absolute(
        state.pressure, f"Pressure in {entry.calculation.supply.name}", lambda: barometer(entry, state)
    )
    colder = vapour_pressure_beside(entry, state, "dT_s", warmer=False)
    if p_s.record < (colder or liquid.vapour_pressure).record:
        entry.refuse(
            state.pressure,
            "a pressure on the surface not below the vapour pressure: 2 K at most may lie between them",
            f"{entry.ledger.shown(p_s)} absolute on the surface and {entry.ledger.shown(liquid.vapour_pressure)} vapour "
            f"pressure at {state.temperature.text}: the liquid boils at the surface",
            "check the temperature, and whether the pressure is gauge or absolute; a vessel that boils is `kind: saturated`",
        )
    return p_s


def _saturated(entry: Entry, state: State, liquid: Liquid) -> Value:
    return entry.ledger.apply("saturated_surface", {"p_v": liquid.vapour_pressure})


#: Kind of supply with a surface -> the absolute pressure on it.
SURFACES: Mapping[str, Callable[[Entry, State, Liquid], Value]] = {
    "open": _open, "gas_blanketed": _gas_blanketed, "saturated": _saturated,
}  # fmt: skip
#: Kinds of supply without a surface: a pressure known at a point of a pipe.
POINTS = ("loop", "main")


def surface_pressure(entry: Entry, state: State, liquid: Liquid) -> Value:
    """The absolute pressure on the surface; a liquid that boils there is refused, for no level makes sense of it."""
    p_s = SURFACES[entry.calculation.supply.kind](entry, state, liquid)
    if entry.calculation.supply.kind == "open" and p_s.record <= liquid.vapour_pressure.record:
        entry.refuse(
            state.temperature,
            "a surface pressure above the vapour pressure",
            f"{entry.ledger.shown(p_s)} absolute on the surface and {entry.ledger.shown(liquid.vapour_pressure)} vapour "
            f"pressure at {state.temperature.text}: the liquid boils at the surface",
            "check the temperature and the liquid",
        )
    return p_s


def point_pressure(entry: Entry, state: State) -> Value:
    """The absolute pressure at the point of a pipe where it is known: as given, or a gauge pressure with the barometer."""
    supply = entry.calculation.supply
    assert state.pressure is not None, "source asks for the pressure of a loop or a main with a line"
    return entry.absolute(
        state.pressure, f"Pressure at {supply.point or supply.name}", lambda: barometer(entry, state), "p_k"
    )
