"""The pump runs within its operating region around best efficiency."""

from __future__ import annotations

from collections.abc import Iterator
from typing import Literal

from ..references import PRACTICE
from ..source.inputs import Given
from ..study.best_efficiency import region
from ..study.entry import Entry, cited
from ..study.results import Results
from ..study.supply import flow_of
from ..value import Value
from ..verdict import Check, Rule, Unapplied, compare, lacking

ORDER = 90
REGION_UPPER = Rule("operating_region_upper", "Operating region, upper end", "Q <= Q_rh", PRACTICE)
REGION_LOWER = Rule("operating_region_lower", "Operating region, lower end", "Q >= Q_rl", PRACTICE)


def judge(results: Results) -> Iterator[Check | Unapplied]:
    """Judge the highest flow against the upper end, the lowest (or else the normal) flow against the lower end."""
    entry, pump = results.entry, results.calculation.pump
    asked = results.calculation.criteria.operating_region
    if asked is None:
        yield Unapplied("Operating region", "the file asks for no limits of the flow")
        return
    entry.ledger.group("Operating region")
    if asked.highest is not None:
        flow = flow_of(entry, results.worst)
        yield _check(entry, REGION_UPPER, "highest", asked.highest, flow, "highest")
    if asked.lowest is not None:
        given = pump.flow.lowest or pump.flow.normal
        word = "normal" if given is pump.flow.normal and given else "lowest"
        low = None if given is None else entry.value(given, "Q", f"Flow of one pump, {word}")
        yield _check(entry, REGION_LOWER, "lowest", asked.lowest, low, word)


def _check(
    entry: Entry, rule: Rule, end: Literal["lowest", "highest"], share: Given, flow: Value | None, word: str
) -> Check | Unapplied:
    """A flow against one end of the region."""
    most = "at most" if end == "highest" else "at least"
    criterion = f"The {word} flow is {most} {share.text} of that at best efficiency"
    at_end = region(entry, end, share)
    if at_end is None or flow is None:
        missing = "no best_efficiency_flow" if at_end is None else "neither the lowest nor the normal flow"
        reason = f"the file gives {missing} of the pump"
        return lacking(rule, reason, asked=True, criterion=criterion, source=cited(share))
    reason = (
        f"the {word} flow is held against the {'upper' if end == 'highest' else 'lower'} end (line {at_end.address})"
    )
    return compare(rule, flow, at_end, criterion=criterion, source=cited(share), met=reason, not_met=reason)
