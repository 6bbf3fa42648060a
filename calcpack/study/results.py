"""The results of a calculation before it is judged: every run of every route, and what the pump needs beside it."""

from __future__ import annotations

from dataclasses import dataclass, replace

from ..source.inputs import Calculation
from ..value import Value
from . import npsh, pump
from .entry import Entry
from .npsh import Available, Run
from .pump import Needed
from .state import State, as_found, design_states, worst_case
from .supply import flow_of

#: Why no reading is carried to a state with several pumps running.
NOT_OF_SEVERAL = "a reading on one pump does not show what a shared line or sump loses with several pumps running"


@dataclass(frozen=True)
class Judged:
    """NPSH available beside what the pump needs at its flow."""

    available: Available
    needed: Needed


@dataclass(frozen=True)
class Difference:
    """Model less reading at the state of one reading."""

    name: str
    value: Value


@dataclass(frozen=True)
class Results:
    """Everything computed from one calculation; ``runs`` are those of the design route, the worst case first."""

    entry: Entry
    worst: State
    judged: tuple[Judged, ...]
    runs: tuple[Run, ...]
    differences: tuple[Difference, ...]

    @property
    def calculation(self) -> Calculation:
        """The input it was computed from."""
        return self.entry.calculation

    @property
    def line(self) -> Run | None:
        """The design route at the worst case."""
        return self.runs[0] if self.runs else None

    @property
    def situations(self) -> list[tuple[State, Value]]:
        """Every state the design route is run at, the worst case alone without one, and the flow through the inlet there."""
        if not self.runs:
            return [(self.worst, flow_of(self.entry, self.worst))]
        return [
            (run.state, run.passage.flows[0].flow if run.passage else flow_of(self.entry, run.state))
            for run in self.runs
        ]

    @property
    def inlet_flow(self) -> Value:
        """The flow through the inlet at the worst case: of every pump that its line serves and that runs."""
        return self.situations[0][1]

    @property
    def route(self) -> str:
        """``design``, ``measured`` or ``both``, as the input calls for."""
        if not self.runs:
            return "measured"
        return "both" if self.calculation.readings else "design"


def compute(entry: Entry) -> Results:
    """Run every route the input calls for.  Raises :class:`~calcpack.faults.InputFault` where its numbers cannot stand."""
    calculation, ledger = entry.calculation, entry.ledger
    worst = worst_case(calculation)
    runs: list[Run] = []
    available: list[Available] = []
    for state in design_states(calculation):
        ledger.part(f"Design route, {state.name}", state.scope)
        runs.append(npsh.design(entry, state, f"design route, {state.name}"))
        available.append(npsh.quoted(entry, runs[-1]))
    differences: list[Difference] = []
    for reading in calculation.readings:
        state = as_found(reading)
        model = None
        if runs and state.level is not None:
            ledger.part(f"Model at the state of the reading: {reading.name}", state.scope)
            model = npsh.design(entry, state, f"model, {reading.name}").available
        ledger.part(f"Measured route: {reading.name}", state.scope)
        found = npsh.measured(entry, reading, reading.name)
        if model is not None:
            differences.append(_difference(entry, reading.name, model, found))
        if state.level is None or worst.level is None:
            entry.find(
                f"The reading {reading.name} is judged at its own state only",
                "a reading is carried to the worst case by the levels, of the reading and the lowest; the file lacks one",
            )
            available.append(npsh.at_required_datum(entry, npsh.less_acceleration(entry, found, None)))
            continue
        ledger.part(f"Carried to the worst case: {reading.name}", worst.scope)
        origins = npsh.origin(entry, state), npsh.origin(entry, worst)
        carried = npsh.carried(entry, found, *origins, f"{reading.name}, carried to the worst case")
        carried = npsh.less_acceleration(entry, carried, runs[0].passage if runs else None)
        if calculation.pump.running > 1:
            carried = replace(carried, doubt=NOT_OF_SEVERAL)
        available.append(npsh.at_required_datum(entry, carried))
    ledger.part("What the pump needs", worst.scope)
    judged = [Judged(each, pump.needed(entry, each.flow)) for each in available]
    for each in judged:
        pump.margins(entry, each.available, each.needed)
    return Results(entry, worst, tuple(judged), tuple(runs), tuple(differences))


def _difference(entry: Entry, name: str, model: Available, found: Available) -> Difference:
    """Model less reading, and the finding it is."""
    ledger = entry.ledger
    ledger.group("Model and reading at the same state")
    value = ledger.apply("difference", {"NPSHA_d": model.npsh, "NPSHA_m": found.npsh}, name, key_result=True)
    word = "less" if value.record > 0 else "more"
    entry.find(
        f"{name}: the reading shows {ledger.shown(value).lstrip('-')} {word} NPSH than the model "
        f"at its state (line {value.address})",
        "a loss the model does not hold, or an error of level, gauge, elevation, flow, bore or datum; the lower result "
        "governs while the cause is open",
    )
    return Difference(name, value)
