"""The highest temperature expected was used, not an average or a normal one."""

from __future__ import annotations

from ..references import PRACTICE
from ..value import Value
from . import Check, Rule, compare, without_numbers

HIGHEST_TEMPERATURE = Rule("highest_temperature", "Highest temperature expected was used", "T >= T_h", PRACTICE)
_CRITERION = "Vapour pressure is taken at the highest temperature expected, not at an average or a normal one"


def check(used: Value, highest: Value | None, *, given_as: str, cost: str, source: str) -> Check:
    """Judge the temperature ``used`` against the ``highest`` expected; ``given_as`` names the extreme where that is missing.

    ``cost``, empty or beginning with a full stop, says what a warmer liquid would take from NPSH available.
    """
    if highest is None:
        reason = f"the file gives only the {given_as} temperature; state the highest expected{cost}"
        return without_numbers(HIGHEST_TEMPERATURE, "not met", reason, criterion=_CRITERION, source=source, left=used)
    return compare(
        HIGHEST_TEMPERATURE, used, highest, criterion=_CRITERION, source=source, met="the highest temperature was used",
        not_met=f"a result stands at a lower temperature{cost}",
    )  # fmt: skip
