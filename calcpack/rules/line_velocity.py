"""Velocity in the suction line against the most the project allows."""

from __future__ import annotations

from collections.abc import Iterator

from ..references import PRACTICE
from ..study.entry import cited
from ..study.flow import named
from ..study.results import Results
from ..verdict import Check, Rule, Unapplied, compare, lacking

ORDER = 110
LINE_VELOCITY = Rule("line_velocity", "Velocity in the suction line", "V <= V_m", PRACTICE)


def judge(results: Results) -> Iterator[Check | Unapplied]:
    """Judge the fastest section of the line at the worst case."""
    entry, asked = results.entry, results.calculation.criteria.velocity
    passage = results.line.passage if results.line else None
    if asked is None:
        missing = "the file asks for no limit; ANSI/HI 9.6.6 gives 2.4 m/s (recalled, not re-read)"
        yield Unapplied(LINE_VELOCITY.title, missing)
        return
    criterion = f"The velocity in every section of the line is at most {asked.text}"
    if passage is None:
        yield lacking(
            LINE_VELOCITY, "the file describes no suction line", asked=True, criterion=criterion, source=cited(asked)
        )
        return
    entry.ledger.group("Velocity in the suction line")
    flows = [(flow, run.state) for run in results.runs if run.passage for flow in run.passage.flows]
    fastest, state = max(flows, key=lambda pair: pair[0].velocity.record)
    limit = entry.value(asked, "V_m", "Velocity in the line, the most")
    governs = f", {state.name}" if results.calculation.cases else ""
    reason = f"highest in {named(fastest.section)}{governs} (line {fastest.velocity.address})"
    yield compare(
        LINE_VELOCITY, fastest.velocity, limit, criterion=criterion, source=cited(asked), met=reason, not_met=reason
    )
