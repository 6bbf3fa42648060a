"""Submergence against vortices drawn from a free surface."""

from __future__ import annotations

from collections.abc import Iterator

from ..references import Cite
from ..study import intake
from ..study.entry import cited
from ..study.results import Results
from ..verdict import Check, Rule, compare, without_numbers

ORDER = 30
SUBMERGENCE = Rule("submergence", "Submergence against surface vortices", "S >= S_m", Cite("hi98"))


def judge(results: Results) -> Iterator[Check]:
    """Judge submergence over the inlet's reference line; without a free surface the rule does not apply."""
    entry, c = results.entry, results.calculation
    reference = intake.reference(c.intake) if c.intake else "inlet"
    criterion = f"Submergence over the {reference}, at least D (1 + 2.3 F)"
    source = cited(c.criteria.submergence.provenance) if c.criteria.submergence else ""
    if c.supply.kind in ("loop", "main"):
        reason = f"{c.supply.name} has no free surface, so no vortex can draw gas into the inlet"
        yield without_numbers(SUBMERGENCE, "not applicable", reason, criterion=criterion, source=source)
        return
    if c.intake is None or results.worst.level is None:
        missing = "the file describes no inlet" if c.intake is None else "the file gives no lowest level"
        yield without_numbers(SUBMERGENCE, "not assessed", missing, criterion=criterion, source=source)
        return
    if c.criteria.submergence is None:
        entry.assume(
            "submergence",
            "The least submergence is that of ANSI/HI 9.8, D (1 + 2.3 F)",
            "the file names no criterion; the project may ask for another",
        )
    each = [(state, intake.submergence(entry, state, flow)) for state, flow in results.situations]
    state, found = min(each, key=lambda pair: pair[1].there_is.record - pair[1].needed.record)
    governs = f", in the case that governs, {state.name}" if results.calculation.cases else ""
    counted = f"counted from the {reference}{governs}"
    yield compare(
        SUBMERGENCE, found.there_is, found.needed, criterion=criterion, source=source, met=counted, not_met=counted
    )
