"""Straight pipe before the pump against the run the project asks for."""

from __future__ import annotations

from collections.abc import Iterator

from ..references import PRACTICE
from ..study.entry import cited
from ..study.results import Results
from ..study.straight import run
from ..verdict import Check, Rule, Unapplied, compare, lacking, without_numbers

ORDER = 130
STRAIGHT_RUN = Rule("straight_run", "Straight run before the pump", "L_s >= L_m", PRACTICE)


def judge(results: Results) -> Iterator[Check | Unapplied]:
    """Judge the straight pipe between the last element that disturbs the flow and the pump."""
    entry, asked = results.entry, results.calculation.criteria.straight_run
    if asked is None:
        yield Unapplied(
            STRAIGHT_RUN.title, "the file asks for no length; API RP 686 gives 5 diameters (recalled, not re-read)"
        )
        return
    criterion, source = f"Straight pipe before the pump of at least {asked.text} diameters", cited(asked)
    passage = results.line.passage if results.line else None
    if passage is None:
        yield lacking(
            STRAIGHT_RUN, "the file describes no suction line", asked=True, criterion=criterion, source=source
        )
        return
    entry.ledger.group("Straight run before the pump")
    found = run(entry, passage)
    after = (
        f"after {found.after.words}, element {found.after.label}" if found.after else "from the beginning of the line"
    )
    if found.length is None:
        reason = f"no straight pipe stands {after}, before the pump"
        yield without_numbers(STRAIGHT_RUN, "not met", reason, criterion=criterion, source=source)
        return
    diameters = entry.value(asked, "x_D", "Straight run asked for, in diameters")
    needed = entry.ledger.apply("straight_run_needed", {"x_D": diameters, "D": found.bore})
    reason = f"it runs {after}; reducers and connectors in it neither count nor break it"
    yield compare(STRAIGHT_RUN, found.length, needed, criterion=criterion, source=source, met=reason, not_met=reason)
