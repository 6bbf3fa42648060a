"""An assessment: an input file computed by the routes it calls for, and judged by the rules."""

from __future__ import annotations

from dataclasses import dataclass

from . import rules
from .ledger import Ledger
from .source.inputs import Calculation
from .study import mistakes
from .study.entry import Entry
from .study.finding import Finding
from .study.results import Difference, Judged, Results, compute
from .verdict import Check, Unapplied


@dataclass(frozen=True)
class Study:
    """Results, the rules applied to them, and those the file neither asks for nor holds data for."""

    results: Results
    checks: tuple[Check, ...]
    unapplied: tuple[Unapplied, ...]

    @property
    def calculation(self) -> Calculation:
        """The input."""
        return self.results.calculation

    @property
    def ledger(self) -> Ledger:
        """The ledger with every line."""
        return self.results.entry.ledger

    @property
    def route(self) -> str:
        """``design``, ``measured`` or ``both``."""
        return self.results.route

    @property
    def judged(self) -> tuple[Judged, ...]:
        """The results the margin rule was applied to."""
        return self.results.judged

    @property
    def differences(self) -> tuple[Difference, ...]:
        """Model less reading, for each reading the model was run for."""
        return self.results.differences

    @property
    def findings(self) -> dict[str, Finding]:
        """Findings by their text, but for those the file states as intended; an intention that meets none is one as well."""
        found, stated = self.results.entry.findings, self._stated
        open_ = {text: each for text, each in found.items() if each.name not in stated}
        idle = [name for name in stated if all(each.name != name for each in found.values())]
        return open_ | {each.text: each for each in map(_idle, idle)}

    @property
    def intended(self) -> list[tuple[Finding, str]]:
        """Findings that the file states as intended, each with its reason there."""
        return [(f, self._stated[f.name]) for f in self.results.entry.findings.values() if f.name in self._stated]

    @property
    def _stated(self) -> dict[str, str]:
        return {each.name: each.reason for each in self.calculation.intended}

    @property
    def assumptions(self) -> dict[str, tuple[str, str]]:
        """Assumptions the tool made, with what they may cost."""
        return self.results.entry.assumptions


def _idle(name: str) -> Finding:
    return Finding(
        "", f"The file states `{name}` as intended, and nothing of the kind is found",
        "what it excused is gone, or never was: take it out of `intended`",
    )  # fmt: skip


def run(calculation: Calculation) -> Study:
    """Compute and judge ``calculation``.  Raises :class:`~calcpack.faults.InputFault` where its numbers cannot stand."""
    results = compute(Entry(calculation, Ledger(calculation.units)))
    judged = rules.judge(results)
    mistakes.find(results)
    return Study(
        results,
        tuple(each for each in judged if isinstance(each, Check)),
        tuple(each for each in judged if isinstance(each, Unapplied)),
    )
