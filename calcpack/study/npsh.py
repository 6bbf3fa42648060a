"""NPSH available by the two routes, and the reading carried to the worst case."""

from __future__ import annotations

from dataclasses import dataclass, replace

from ..source.inputs import Reading
from ..value import Value
from .barometer import barometer
from .entry import Entry
from .line import Passage, bore_of, flow_in, losses
from .liquid import Liquid, at
from .profile import Node, nodes
from .reciprocating import UNSEEN, acceleration
from .state import State, as_found, warmest
from .supply import POINTS, flow_of, near, point_pressure, surface_level, surface_pressure


@dataclass(frozen=True)
class Origin:
    """Where the line starts in one state: the pressure there and its height, as heads over the pump's datum.

    ``elevation`` and ``pressure`` (absolute) are those of the surface, or of the point of a pipe where pressure is known.
    """

    liquid: Liquid
    flow: Value
    elevation: Value
    pressure: Value
    pressure_head: Value
    vapour_head: Value
    static_head: Value


@dataclass(frozen=True)
class Available:
    """A result to judge: NPSH available, what it describes, and the flow and temperature it holds at.

    ``doubt`` says why it cannot be judged, where it cannot; ``cold`` marks a case of a liquid colder than the warmest.
    """

    about: str
    npsh: Value
    flow: Value
    temperature: Value
    doubt: str = ""
    cold: bool = False


@dataclass(frozen=True)
class Run:
    """The design route in one state; ``passage`` is ``None`` where the pump hangs in its sump."""

    state: State
    origin: Origin
    passage: Passage | None
    nodes: tuple[Node, ...]
    available: Available


def datum(entry: Entry) -> Value:
    """The elevation of the pump's NPSH datum."""
    return entry.value(entry.calculation.pump.datum_elevation, "z_d", "Elevation of the pump's NPSH datum")


def origin(entry: Entry, state: State) -> Origin:
    """What stands at the surface, or at the point where the pressure is known, in ``state``."""
    ledger, supply = entry.ledger, entry.calculation.supply
    liquid = at(entry, state)
    if supply.kind in POINTS:
        ledger.group("Pressure at the point where it is known")
        pressure = point_pressure(entry, state)
        pressure_head = ledger.apply("point_head", {"p_k": pressure, "gamma": liquid.specific_weight})
    else:
        ledger.group("Pressure on the surface")
        pressure = surface_pressure(entry, state, liquid)
        pressure_head = ledger.apply("surface_head", {"p_s": pressure, "gamma": liquid.specific_weight})
    vapour_head = ledger.apply("vapour_head", {"p_v": liquid.vapour_pressure, "gamma": liquid.specific_weight})
    ledger.group("Static head")
    if supply.kind in POINTS:
        assert supply.elevation is not None, "source asks for the elevation of the point"
        elevation, place = (
            entry.value(supply.elevation, "z_k", "Elevation of the point where pressure is known"),
            supply.elevation,
        )
        static = ledger.apply("point_static_head", {"z_k": elevation, "z_d": datum(entry)})
    else:
        assert state.level is not None, "a surface needs a level"
        elevation, place = surface_level(entry, state), state.level
        static = ledger.apply("static_head", {"z_s": elevation, "z_d": datum(entry)})
    near(entry, static, place, "the pump's datum")
    return Origin(liquid, flow_of(entry, state), elevation, pressure, pressure_head, vapour_head, static)


#: Head, m, by which a reading may exceed what the surface offers before it contradicts it: more than a gauge's error.
CREDIBLE = 0.2


def design(entry: Entry, state: State, about: str) -> Run:
    """NPSH available from the supply down the line, in ``state``."""
    ledger, c = entry.ledger, entry.calculation
    start = origin(entry, state)
    heads = {"H_s": start.pressure_head, "z": start.static_head, "H_v": start.vapour_head}
    cold = state.temperature is not warmest(c)[1]
    passage: Passage | None = None
    along: tuple[Node, ...] = ()
    ledger.group(GROUP)
    if c.pump.arrangement == "wet_pit":
        entry.assume(
            "wet pit",
            "No loss lies between the surface and the inlet of the pump",
            "the loss from the bell to the first stage is the pump's own, part of NPSH required; a screen or a channel before the "
            "pump lowers the level itself",
        )
        npsh = ledger.apply("npsh_wet_pit", heads, key_result=True)
    else:
        passage = losses(entry, state, start.flow, start.liquid)
        moving = _velocity_head(entry, passage)
        ledger.group(GROUP)
        equation = "npsh_design" if c.supply.kind not in POINTS else "npsh_point_moving" if moving else "npsh_point"
        operands = heads | {"h_L": passage.total} | ({"h_V": moving} if moving else {})
        npsh = ledger.apply(equation, operands, key_result=True)
        if any(passed.element.elevation for passed in passage.rows):
            along = nodes(entry, _energy(entry, start, moving), start.liquid, passage)
    return Run(state, start, passage, along, Available(about, npsh, start.flow, start.liquid.temperature, cold=cold))


GROUP = "Net positive suction head available, design route"


def quoted(entry: Entry, run: Run) -> Available:
    """NPSH available as it is held against NPSH required: less the head withheld and the acceleration head."""
    ledger, c, found = entry.ledger, entry.calculation, run.available
    if c.line is not None and c.line.withheld_head is not None:
        withheld = entry.value(c.line.withheld_head, "h_w", "Head withheld")
        less = ledger.apply("npsh_less_withheld", {"NPSHA": found.npsh, "h_w": withheld}, found.about, key_result=True)
        found = replace(found, npsh=less)
    if run.passage is not None:
        found = less_acceleration(entry, found, run.passage)
    surface, intake = run.origin.elevation, c.intake
    if c.supply.kind not in POINTS and intake is not None and float(intake.elevation.quantity.si()) >= surface.shadow:
        level = f"{ledger.shown(surface)} (line {surface.address})"
        doubt = f"the inlet, at {intake.elevation.text}, is not below the surface, {level}: the pump draws gas"
        found = replace(found, doubt=doubt)
    elif c.pump.arrangement == "wet_pit" and run.origin.static_head.record < 0:
        where = f"line {run.origin.static_head.address}"
        found = replace(
            found, doubt=f"the pump's datum lies above the surface ({where}): a pump in its sump does not lift"
        )
    return at_required_datum(entry, found)


def less_acceleration(entry: Entry, found: Available, passage: Passage | None) -> Available:
    """Less the acceleration head of a reciprocating pump; without a line to find it from, its result cannot be judged."""
    if entry.calculation.pump.reciprocating is None:
        return found
    taken, doubt = acceleration(entry, passage) if passage else (None, UNSEEN)
    found = replace(found, doubt=found.doubt or doubt)
    if taken is None:
        return found
    operands = {"NPSHA": found.npsh, "h_a": taken}
    return replace(found, npsh=entry.ledger.apply("npsh_less_acceleration", operands, found.about, key_result=True))


def _velocity_head(entry: Entry, passage: Passage) -> Value | None:
    """The velocity head at the point where the pressure is known, where the file says that it counts."""
    supply = entry.calculation.supply
    if supply.kind not in POINTS:
        return None
    if supply.velocity_head == "counted":
        return passage.flows[0].velocity_head
    entry.assume(
        "velocity head",
        f"The velocity head at {supply.point or supply.name} is left out",
        "on the safe side: it adds to the energy there",
    )
    return None


def _energy(entry: Entry, start: Origin, moving: Value | None) -> Value:
    """The energy head, absolute and over the datum of the file, with which the liquid enters the line."""
    operands = {"H_s": start.pressure_head, "z_s": start.elevation}
    if moving is None:
        return entry.ledger.apply("energy_head", operands)
    return entry.ledger.apply("energy_head_moving", operands | {"h_V": moving})


def at_required_datum(entry: Entry, found: Available) -> Available:
    """NPSH available at the elevation NPSH required counts from, where that is not the pump's datum."""
    given = entry.calculation.pump.npsh_required.datum_elevation
    if given is None:
        return found
    entry.ledger.group("NPSH available at the datum of NPSH required")
    there = entry.value(given, "z_R", "Elevation NPSH required counts from")
    shifted = entry.ledger.apply(
        "npsh_at_required_datum", {"NPSHA": found.npsh, "z_d": datum(entry), "z_R": there}, found.about, key_result=True
    )
    return replace(found, npsh=shifted)


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


def inferred(entry: Entry, found: Available, reading: Origin) -> Value:
    """The losses from the surface to the tap, as a reading shows them: every error of level and gauge is in them."""
    return entry.ledger.apply("inferred_loss", {
        "H_sm": reading.pressure_head, "z_m": reading.static_head, "H_vm": reading.vapour_head, "NPSHA_m": found.npsh,
    })  # fmt: skip


def carried(entry: Entry, found: Available, reading: Origin, worst: Origin, about: str) -> Available:
    """A reading carried to the worst case: surface pressure, level, vapour pressure, and its own losses by flow squared."""
    ledger = entry.ledger
    ledger.group("From the reading to the worst case")
    lost = inferred(entry, found, reading)
    changes = {
        "dH_s": ledger.apply("surface_head_change", {"H_s": worst.pressure_head, "H_sm": reading.pressure_head}),
        "dz": ledger.apply("level_change", {"z": worst.static_head, "z_m": reading.static_head}),
        "dH_v": ledger.apply("vapour_head_change", {"H_v": worst.vapour_head, "H_vm": reading.vapour_head}),
        "dh_h": ledger.apply("loss_change", {"h_u": lost, "Q": worst.flow, "Q_m": reading.flow}),
    }
    npsh = ledger.apply("npsh_carried", {"NPSHA_m": found.npsh, **changes}, key_result=True)
    doubt = ""
    if lost.shadow < -CREDIBLE:
        doubt = f"the reading shows {ledger.shown(lost).lstrip('-')} more head than the surface offers (line {lost.address})"
    return Available(about, npsh, worst.flow, worst.liquid.temperature, doubt=doubt)
