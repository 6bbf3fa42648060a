"""NPSH available by the two routes, and the reading carried to the worst case."""

from __future__ import annotations

from dataclasses import dataclass

from ..source.inputs import Given, Reading
from ..value import Value
from .entry import Entry
from .line import bore_of, flow_in, losses
from .liquid import Liquid, at
from .state import State, as_found
from .surface import barometer, pressure


@dataclass(frozen=True)
class Surface:
    """What stands at the surface in one state, as heads over the pump's datum."""

    liquid: Liquid
    flow: Value
    level: Value
    surface_head: Value
    vapour_head: Value
    static_head: Value


@dataclass(frozen=True)
class Available:
    """A result to judge: NPSH available, what it describes, and the flow and temperature it holds at.

    ``doubt`` says why it cannot be judged, where it cannot.
    """

    about: str
    npsh: Value
    flow: Value
    temperature: Value
    doubt: str = ""


def flow_of(entry: Entry, state: State) -> Value:
    """The flow of ``state``."""
    highest = state.flow is entry.calculation.pump.flow.highest
    return entry.value(state.flow, "Q", "Flow of one pump, highest" if highest else f"Flow of the pump, {state.name}")


def datum(entry: Entry) -> Value:
    """The elevation of the pump's NPSH datum."""
    return entry.value(entry.calculation.pump.datum_elevation, "z_d", "Elevation of the pump's NPSH datum")


def surface(entry: Entry, state: State) -> Surface:
    """The surface in ``state``; a liquid that boils there is refused, for no level makes sense of it."""
    ledger = entry.ledger
    assert state.level is not None, "a surface needs a level"
    liquid = at(entry, state)
    ledger.group("Pressure on the surface")
    p_s = pressure(entry, state)
    if p_s.record <= liquid.vapour_pressure.record:
        entry.refuse(
            state.pressure or state.temperature,
            "a surface pressure above the vapour pressure",
            f"{ledger.shown(p_s)} absolute on the surface and {ledger.shown(liquid.vapour_pressure)} vapour pressure "
            f"at {state.temperature.text}: the liquid boils at the surface",
            "check the temperature, and whether the pressure is gauge or absolute",
        )
    surface_head = ledger.apply("surface_head", {"p_s": p_s, "gamma": liquid.specific_weight})
    vapour_head = ledger.apply("vapour_head", {"p_v": liquid.vapour_pressure, "gamma": liquid.specific_weight})
    ledger.group("Static head")
    word = "lowest" if state.barometer is None else state.name
    level = entry.value(state.level, "z_s", f"Level of the surface, {word}")
    static = ledger.apply("static_head", {"z_s": level, "z_d": datum(entry)})
    near(entry, static, state.level, "the pump's datum")
    return Surface(liquid, flow_of(entry, state), level, surface_head, vapour_head, static)


#: Distance, m, within which levels, inlets and pumps of one suction side lie; farther is two datums mixed up.
FARTHEST = 500
#: Head, m, by which a reading may exceed what the surface offers before it contradicts it: more than a gauge's error.
CREDIBLE = 0.2


def near(entry: Entry, distance: Value, at: Given, what: str) -> None:
    """Refuse a level too far from ``what`` to belong to one suction side."""
    if abs(distance.shadow) > FARTHEST:
        entry.refuse(at, f"a level within {FARTHEST} m of {what}", f"{entry.ledger.shown(distance)} between them",
                     "every elevation of a file counts from its one datum")  # fmt: skip


def design(entry: Entry, state: State, about: str) -> Available:
    """NPSH available from the surface down the line, in ``state``."""
    top = surface(entry, state)
    lost = losses(entry, state, top.flow, top.liquid)
    entry.ledger.group("Net positive suction head available, design route")
    npsh = entry.ledger.apply("npsh_design", {
        "H_s": top.surface_head, "z": top.static_head, "H_v": top.vapour_head, "h_L": lost,
    }, key_result=True)  # fmt: skip
    return Available(about, npsh, top.flow, top.liquid.temperature)


def measured(entry: Entry, reading: Reading, about: str) -> Available:
    """NPSH available from the gauge at the pump inlet; no line loss, for the gauge has seen it."""
    ledger, state, gauge = entry.ledger, as_found(reading), reading.gauge
    liquid = at(entry, state)
    ledger.group("Barometer and gauge")
    weight = liquid.specific_weight
    p_b = barometer(entry, state)
    p_g = entry.gauge(gauge.pressure, f"Inlet gauge reading, {state.name}")
    barometer_head = ledger.apply("barometer_head", {"p_b": p_b, "gamma": weight})
    gauge_head = ledger.apply("gauge_head", {"p_g": p_g, "gamma": weight})
    if gauge.leg == "filled":
        height = entry.value(gauge.elevation, "z_G", f"Elevation of the gauge centre, leg filled, {state.name}")
    else:
        assert gauge.tap_elevation is not None, "source asks for the tap's elevation where the leg is dry"
        height = entry.value(gauge.tap_elevation, "z_G", f"Elevation of the tap, gauge leg dry, {state.name}")
    gauge_height = ledger.apply("gauge_height", {"z_G": height, "z_d": datum(entry)})
    vapour_head = ledger.apply("vapour_head", {"p_v": liquid.vapour_pressure, "gamma": weight})
    ledger.group("Velocity head at the tap")
    flow = flow_of(entry, state)
    bore = bore_of(entry, gauge.tap, reading, "at the gauge tap")
    at_tap = flow_in(entry, flow, bore, "at the gauge tap")
    ledger.group("Net positive suction head available, measured route")
    npsh = ledger.apply("npsh_measured", {
        "H_b": barometer_head, "H_g": gauge_head, "z_g": gauge_height, "h_V": at_tap.velocity_head, "H_v": vapour_head,
    }, key_result=True)  # fmt: skip
    return Available(about, npsh, flow, liquid.temperature)


def carried(entry: Entry, found: Available, reading: Surface, worst: Surface, about: str) -> Available:
    """A reading carried to the worst case: surface pressure, level, vapour pressure, and its own losses by flow squared."""
    ledger = entry.ledger
    ledger.group("From the reading to the worst case")
    inferred = ledger.apply("inferred_loss", {
        "H_sm": reading.surface_head, "z_m": reading.static_head, "H_vm": reading.vapour_head, "NPSHA_m": found.npsh,
    })  # fmt: skip
    changes = {
        "dH_s": ledger.apply("surface_head_change", {"H_s": worst.surface_head, "H_sm": reading.surface_head}),
        "dz": ledger.apply("level_change", {"z": worst.static_head, "z_m": reading.static_head}),
        "dH_v": ledger.apply("vapour_head_change", {"H_v": worst.vapour_head, "H_vm": reading.vapour_head}),
        "dh_h": ledger.apply("loss_change", {"h_u": inferred, "Q": worst.flow, "Q_m": reading.flow}),
    }
    npsh = ledger.apply("npsh_carried", {"NPSHA_m": found.npsh, **changes}, key_result=True)
    if inferred.record < 0:
        entry.find(
            f"The reading {found.about} shows more head than the surface offers (line {inferred.address})",
            "losses cannot be negative: level, gauge, its elevation, barometer or datum is in doubt",
        )
    doubt = ""
    if inferred.shadow < -CREDIBLE:
        doubt = f"the reading shows {ledger.shown(inferred).lstrip('-')} more head than the surface offers (line {inferred.address})"
    return Available(about, npsh, worst.flow, worst.liquid.temperature, doubt=doubt)
