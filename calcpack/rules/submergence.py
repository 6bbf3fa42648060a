"""Submergence against vortices drawn from a free surface."""

from __future__ import annotations

from ..references import Cite
from ..value import Value
from . import Check, Rule, compare, without_numbers

SUBMERGENCE = Rule("submergence", "Submergence against surface vortices", "S >= S_m", Cite("hi98"))


def check(
    there_is: Value | None,
    needed: Value | None,
    *,
    free_surface: bool,
    supply: str,
    reference: str,
    missing: str,
    source: str,
) -> Check:
    """Judge submergence over the inlet's ``reference`` line; without a free surface the rule does not apply."""
    criterion = f"Submergence at the lowest level, over the {reference or 'inlet'}, at least D (1 + 2.3 F)"
    if not free_surface:
        reason = f"{supply} has no free surface, so no vortex can draw gas into the inlet"
        return without_numbers(SUBMERGENCE, "not applicable", reason, criterion=criterion, source=source)
    if there_is is None or needed is None:
        return without_numbers(SUBMERGENCE, "not assessed", missing, criterion=criterion, source=source)
    counted = f"counted from the {reference}"
    return compare(SUBMERGENCE, there_is, needed, criterion=criterion, source=source, met=counted, not_met=counted)
