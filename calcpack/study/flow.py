"""Flow in a bore: the bore, what flows there, its velocity and its Reynolds number."""

from __future__ import annotations

from dataclasses import dataclass

from .. import lookup
from ..lookup import OutOfRange
from ..quantity import parse
from ..references import Cite
from ..source.inputs import Pipe, Section
from ..value import Value
from .entry import Entry, Place
from .liquid import Liquid, viscosity
from .state import State


@dataclass(frozen=True)
class Stream:
    """A flow in a bore, with its velocity and velocity head."""

    flow: Value
    bore: Value
    velocity: Value
    velocity_head: Value


@dataclass(frozen=True)
class Flow(Stream):
    """The flow in one section of the line, with its Reynolds number."""

    section: Section
    reynolds: Value


def named(section: Section) -> str:
    """What a section is called in titles."""
    return section.name or section.id


def bore_of(entry: Entry, pipe: Pipe, at: Place, about: str) -> Value:
    """The bore as given, or read from the pipe table by nominal size and schedule."""
    if pipe.bore is not None:
        return entry.value(pipe.bore, "D", f"Bore, {about}")
    try:
        found = lookup.bore(pipe.size, pipe.schedule)
    except OutOfRange as error:
        entry.refuse(
            at,
            "a nominal size and schedule of ASME B36.10M",
            f"{pipe.size} schedule {pipe.schedule}",
            f"{error}; or state the bore",
        )
    quantity = parse(f"{found.millimetres} mm", "bore")
    return entry.ledger.tabulated(
        "D", f"Bore, {about}, from the pipe table", quantity, found.place, Cite("b3610"), lookup.library("fluids")
    )


def flow_in(entry: Entry, flow: Value, bore: Value, about: str) -> Stream:
    """Velocity and velocity head of ``flow`` in ``bore``."""
    ledger = entry.ledger
    area = ledger.apply("bore_area", {"D": bore}, about)
    velocity = ledger.apply("mean_velocity", {"Q": flow, "A": area}, about)
    head = ledger.apply("velocity_head", {"V": velocity, "g": ledger.constant("g")}, about)
    return Stream(flow, bore, velocity, head)


def flow_through(entry: Entry, state: State, flow: Value, liquid: Liquid, section: Section) -> Flow:
    """What flows in ``section``: that of one pump, or of every pump that runs and draws through it."""
    ledger, about = entry.ledger, named(section)
    bore = bore_of(entry, section.pipe, section, about)
    pumps = _pumps(entry, state, section)
    carried = ledger.apply("section_flow", {"N": pumps, "Q": flow}, about) if pumps else flow
    stream = flow_in(entry, carried, bore, about)
    operands = {"rho": liquid.density, "V": stream.velocity, "D": bore, "mu": viscosity(entry, state, liquid)}
    return Flow(**vars(stream), section=section, reynolds=ledger.apply("reynolds", operands, about))


def _pumps(entry: Entry, state: State, section: Section) -> Value | None:
    """The number of pumps whose flow a section carries, where that is more than one."""
    number, pump = min(section.pumps, state.running), entry.calculation.pump
    if number == 1:
        return None
    if state.running < section.pumps:
        place = next((case for case in entry.calculation.cases if case.name == state.name), pump)
        title, key, line = f"Number of pumps running, {state.name}", f"{place.key}.running", place.line
        provenance = place.provenance
    else:
        title, key = f"Number of pumps that draw through {named(section)}", f"{section.key}.pumps"
        line, provenance = section.line, section.provenance
    return entry.ledger.given(
        "N", title, parse(str(number), "ratio"), text=str(number), key=key, file_line=line, provenance=provenance
    )
