"""Suction specific speed against the most the project allows."""

from __future__ import annotations

from collections.abc import Iterator
from typing import Literal, cast

from ..references import PRACTICE
from ..study.best_efficiency import suction_specific_speed
from ..study.entry import cited
from ..study.results import Results
from ..verdict import Check, Rule, Unapplied, compare, lacking

ORDER = 100
SPECIFIC_SPEED = Rule("suction_specific_speed", "Suction specific speed", "N_ss <= N_sm", PRACTICE)


def judge(results: Results) -> Iterator[Check | Unapplied]:
    """Judge suction specific speed in the units of the limit."""
    entry, criteria = results.entry, results.calculation.criteria
    asked, units = criteria.suction_specific_speed, criteria.suction_specific_speed_in
    if asked is None:
        yield Unapplied(
            SPECIFIC_SPEED.title,
            "the file asks for no limit; figures from 7 500 to 11 000 (US units) are in print, and a single limit is disputed",
        )
        return
    criterion = f"Suction specific speed at best efficiency, of one eye, at most {asked.text} ({units} units)"
    found, missing = suction_specific_speed(entry, cast(Literal["US", "metric"], units))
    if found is None:
        yield lacking(SPECIFIC_SPEED, missing, asked=True, criterion=criterion, source=cited(asked))
        return
    limit = entry.value(asked, "N_sm", f"Suction specific speed, the most, {units} units")
    reason = f"found at best efficiency, where NPSH required is read from the maker's curve (line {found.address})"
    yield compare(SPECIFIC_SPEED, found, limit, criterion=criterion, source=cited(asked), met=reason, not_met=reason)
