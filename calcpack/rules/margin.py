"""NPSH available against NPSH required with its margin."""

from __future__ import annotations

from ..references import Cite
from ..value import Value
from . import Check, Rule, compare, without_numbers

NPSH_MARGIN = Rule(
    "npsh_margin", "NPSH available with its margin", "NPSHA >= N_L", Cite("hi961", "ratio or difference, the greater")
)


def check(
    npsh: Value, limit: Value, *, about: str, flow: Value, at_flow: Value, criterion: str, governs: str, source: str
) -> Check:
    """Judge NPSH available at ``flow``; not assessed where NPSH required is stated for a lower flow only."""
    if flow.shadow > at_flow.shadow:
        reason = "NPSH required is stated at a lower flow than this one, and it rises with flow: ask the maker"
        return without_numbers(
            NPSH_MARGIN, "not assessed", reason, about=about, criterion=criterion, source=source, left=npsh
        )
    same = governs
    lower = "" if flow.shadow >= at_flow.shadow else "; NPSH required is the one of a higher flow, on the safe side"
    return compare(
        NPSH_MARGIN,
        npsh,
        limit,
        about=about,
        criterion=criterion,
        source=source,
        met=same + lower,
        not_met=same + lower,
    )
