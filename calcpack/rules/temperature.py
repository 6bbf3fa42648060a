"""The highest temperature expected was used, not an average or a normal one."""

from __future__ import annotations

from collections.abc import Iterator

from ..lookup import CONSTANTS
from ..references import PRACTICE
from ..study.entry import cited
from ..study.liquid import cost_of_temperature, highest_temperature
from ..study.results import Results
from ..study.state import warmest
from ..verdict import Check, Rule, compare, without_numbers

ORDER = 20
HIGHEST_TEMPERATURE = Rule("highest_temperature", "Highest temperature expected was used", "T >= T_h", PRACTICE)
_CRITERION = "Vapour pressure is taken at the highest temperature expected, not at an average or a normal one"


def judge(results: Results) -> Iterator[Check]:
    """Judge the highest temperature of the results, against the highest expected; the cost of 5 K where it is missed."""
    entry = results.entry
    ledger = entry.ledger
    ledger.group("The temperature used")
    used = min(
        (each.available.temperature for each in results.judged if not each.available.cold), key=lambda v: v.shadow
    )
    extreme, given = warmest(entry.calculation)
    highest = highest_temperature(entry)
    if highest is not None and highest.unit.name != used.unit.name:
        used, highest = ledger.convert(used), ledger.convert(highest)
    cost = ""
    if highest is None or used.shadow < highest.shadow:
        lost = cost_of_temperature(entry, results.worst)
        if lost is not None:
            cost = f". Each {CONSTANTS['dT'].text} warmer would take {ledger.shown(lost)} from NPSH available (line {lost.address})"
    if highest is None:
        reason = f"the file gives only the {extreme} temperature; state the highest expected{cost}"
        yield without_numbers(
            HIGHEST_TEMPERATURE, "not met", reason, criterion=_CRITERION, source=cited(given), left=used
        )
    else:
        yield compare(
            HIGHEST_TEMPERATURE, used, highest, criterion=_CRITERION, source=cited(given),
            met="the highest temperature was used", not_met=f"a result stands at a lower temperature{cost}",
        )  # fmt: skip
