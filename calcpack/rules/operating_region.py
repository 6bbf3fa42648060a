"""The pump runs within its operating region around best efficiency."""

from __future__ import annotations

from collections.abc import Iterator

from ..references import PRACTICE
from ..study.best_efficiency import region
from ..study.entry import cited
from ..study.results import Results
from ..study.supply import flow_of
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
        criterion, source = (
            f"The highest flow is at most {asked.highest.text} of that at best efficiency",
            cited(asked.highest),
        )
        upper = region(entry, "highest", asked.highest)
        yield (
            compare(REGION_UPPER, flow_of(entry, results.worst), upper, criterion=criterion, source=source)
            if upper
            else lacking(REGION_UPPER, _MISSING, asked=True, criterion=criterion, source=source)
        )
    if asked.lowest is not None:
        word, given = ("lowest", pump.flow.lowest) if pump.flow.lowest else ("normal", pump.flow.normal)
        criterion, source = (
            f"The {word} flow is at least {asked.lowest.text} of that at best efficiency",
            cited(asked.lowest),
        )
        lower = region(entry, "lowest", asked.lowest)
        if lower is None or given is None:
            missing = _MISSING if lower is None else "the file gives neither the lowest nor the normal flow of the pump"
            yield lacking(REGION_LOWER, missing, asked=True, criterion=criterion, source=source)
        else:
            flow = entry.value(given, "Q", f"Flow of one pump, {word}")
            yield compare(REGION_LOWER, flow, lower, criterion=criterion, source=source)


_MISSING = "the file gives no best_efficiency_flow of the pump"
