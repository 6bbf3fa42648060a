"""NPSH available against NPSH required with its margin."""

from __future__ import annotations

from collections.abc import Iterator

from ..references import PRACTICE
from ..study.results import Judged, Results
from ..verdict import Check, Rule, compare, without_numbers

ORDER = 10
_TITLE, _CITE = "NPSH available with its margin", PRACTICE
NPSH_MARGIN = Rule("npsh_margin", _TITLE, "NPSHA >= N_L", _CITE)
#: The same where the margin must be exceeded.
NPSH_ABOVE = Rule("npsh_margin", _TITLE, "NPSHA > N_L", _CITE)


def judge(results: Results) -> Iterator[Check]:
    """One check for each result; not assessed where its own doubt, or what the pump needs, stands in the way."""
    for each in results.judged:
        yield _check(each)


def _check(each: Judged) -> Check:
    available, needed = each.available, each.needed
    doubt = available.doubt or needed.doubt
    rule = NPSH_ABOVE if needed.above else NPSH_MARGIN
    if doubt or needed.limit is None:
        return without_numbers(
            rule, "not assessed", doubt, about=available.about, criterion=needed.criterion, source=needed.source,
            left=available.npsh,
        )  # fmt: skip
    return compare(
        rule, available.npsh, needed.limit, about=available.about, criterion=needed.criterion, source=needed.source,
        met=needed.governs, not_met=needed.governs,
    )  # fmt: skip
