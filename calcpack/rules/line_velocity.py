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
    fastest = max(passage.flows, key=lambda flow: flow.velocity.record)
    limit = entry.value(asked, "V_m", "Velocity in the line, the most")
    reason = f"highest in {named(fastest.section)} (line {fastest.velocity.address})"
    yield compare(
        LINE_VELOCITY, fastest.velocity, limit, criterion=criterion, source=cited(asked), met=reason, not_met=reason
    )
