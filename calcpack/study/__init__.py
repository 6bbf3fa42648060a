"""A study: an input file computed by the routes it calls for, and judged by the rules."""

from __future__ import annotations

from dataclasses import dataclass

from ..ledger import Ledger
from ..lookup import CONSTANTS
from ..rules import Check, margin, submergence, temperature, without_numbers
from ..source.inputs import Calculation, Provenance
from ..value import Value
from . import need, npsh, plausible
from .entry import Entry
from .npsh import Available
from .state import State, as_found, warmest, worst_case


@dataclass(frozen=True)
class Difference:
    """Model less reading at the state of one reading."""

    name: str
    value: Value


@dataclass(frozen=True)
class Study:
    """Everything computed from one calculation; ``judged`` are the results the margin rule was applied to."""

    calculation: Calculation
    ledger: Ledger
    route: str
    judged: tuple[Available, ...]
    need: need.Needed
    differences: tuple[Difference, ...]
    checks: tuple[Check, ...]
    findings: dict[str, str]
    assumptions: dict[str, tuple[str, str]]


def run(calculation: Calculation) -> Study:
    """Compute and judge ``calculation``.  Raises :class:`~calcpack.faults.InputFault` where its numbers cannot stand."""
    ledger = Ledger(calculation.units)
    entry = Entry(calculation, ledger)
    worst = worst_case(calculation)
    by_design = calculation.line is not None
    judged: list[Available] = []
    differences: list[Difference] = []
    if by_design:
        ledger.part("Design route, worst case", worst.scope)
        judged.append(npsh.design(entry, worst, "design route, worst case"))
    for reading in calculation.readings:
        state = as_found(reading)
        if by_design and state.level is not None:
            ledger.part(f"Model at the state of the reading: {reading.name}", state.scope)
            model = npsh.design(entry, state, f"model, {reading.name}")
        else:
            model = None
        ledger.part(f"Measured route: {reading.name}", state.scope)
        found = npsh.measured(entry, reading, reading.name)
        if model is not None:
            ledger.group("Model and reading at the same state")
            value = ledger.apply(
                "difference", {"NPSHA_d": model.npsh, "NPSHA_m": found.npsh}, reading.name, key_result=True
            )
            differences.append(Difference(reading.name, value))
            word = "less" if value.record > 0 else "more"
            entry.find(
                f"{reading.name}: the reading shows {ledger.shown(value).lstrip('-')} {word} NPSH than the model "
                f"at its state (line {value.address})",
                "a loss the model does not hold, or an error of level, gauge, elevation, flow, bore or datum; the lower result "
                "governs while the cause is open",
            )
        if state.level is None or worst.level is None:
            entry.find(
                f"The reading {reading.name} is judged at its own state only",
                "a reading is carried to the worst case by the levels, of the reading and the lowest; the file lacks one",
            )
            judged.append(found)
            continue
        ledger.part(f"Carried to the worst case: {reading.name}", worst.scope)
        at_reading, at_worst = npsh.surface(entry, state), npsh.surface(entry, worst)
        judged.append(npsh.carried(entry, found, at_reading, at_worst, f"{reading.name}, carried to the worst case"))
    plausible.check(entry)
    ledger.part("What the pump needs", worst.scope)
    needed = need.needed(entry)
    for available in judged:
        need.margins(entry, available, needed)
    checks = [_margin(available, needed, calculation) for available in judged]
    checks.append(_temperature(entry, judged, worst))
    checks.append(_submergence(entry, worst))
    route = "both" if by_design and calculation.readings else "design" if by_design else "measured"
    return Study(
        calculation,
        ledger,
        route,
        tuple(judged),
        needed,
        tuple(differences),
        tuple(checks),
        entry.findings,
        entry.assumptions,
    )


def _margin(available: Available, needed: need.Needed, calculation: Calculation) -> Check:
    asked = calculation.criteria.ratio or calculation.criteria.difference
    assert asked is not None, "source asks for a margin"
    if available.doubt:
        return without_numbers(
            margin.NPSH_MARGIN, "not assessed", available.doubt, about=available.about, criterion=needed.criterion,
            source=_cited(asked), left=available.npsh,
        )  # fmt: skip
    return margin.check(
        available.npsh, needed.limit, about=available.about, flow=available.flow, at_flow=needed.at_flow,
        criterion=needed.criterion, governs=needed.governs, source=_cited(asked),
    )  # fmt: skip


def _temperature(entry: Entry, judged: list[Available], worst: State) -> Check:
    entry.ledger.group("The temperature used")
    used = min((a.temperature for a in judged), key=lambda v: v.shadow)
    extreme, given = warmest(entry.calculation)
    highest = need.highest_temperature(entry)
    if highest is not None and highest.unit.name != used.unit.name:
        used, highest = entry.ledger.convert(used), entry.ledger.convert(highest)
    cost = ""
    if highest is None or used.shadow < highest.shadow:
        lost = need.cost_of_temperature(entry, worst)
        if lost is not None:
            cost = f". Each {CONSTANTS['dT'].text} warmer would take {entry.ledger.shown(lost)} from NPSH available (line {lost.address})"
    return temperature.check(used, highest, given_as=extreme, cost=cost, source=_cited(given))


def _submergence(entry: Entry, worst: State) -> Check:
    c = entry.calculation
    free_surface = c.supply.kind != "main"
    missing = (
        "the file describes no inlet"
        if c.intake is None
        else "the file gives no lowest level"
        if worst.level is None
        else ""
    )
    there_is = needed = None
    if free_surface and not missing:
        found = need.submergence(entry, worst, npsh.flow_of(entry, worst))
        there_is, needed = found.there_is, found.needed
        if c.criteria.submergence is None:
            entry.assume(
                "submergence",
                "The least submergence is that of ANSI/HI 9.8, D (1 + 2.3 F)",
                "the file names no criterion; the project may ask for another",
            )
    source = _cited(c.criteria.submergence.provenance) if c.criteria.submergence else ""
    return submergence.check(
        there_is,
        needed,
        free_surface=free_surface,
        supply=c.supply.name,
        reference=need.reference(c.intake) if c.intake else "",
        missing=missing,
        source=source,
    )


def _cited(of: Provenance) -> str:
    return " ".join(part for part in (f"[{of.source}]" if of.source else "", of.place) if part)


__all__ = ["Difference", "Study", "run", "warmest"]
