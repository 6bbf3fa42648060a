"""NPSH required is taken within the flows it was tested at."""

from __future__ import annotations

from collections.abc import Iterator

from ..references import PRACTICE
from ..study import curve
from ..study.entry import cited
from ..study.results import Results
from ..verdict import Check, Rule, between, compare

ORDER = 70
_TITLE = "NPSH required within its tested range"
TESTED_LOW = Rule("tested_range_low", _TITLE, "Q_c >= Q_cl", PRACTICE, decides=False)
TESTED_HIGH = Rule("tested_range_high", _TITLE, "Q_c <= Q_ch", PRACTICE, decides=False)


def judge(results: Results) -> Iterator[Check]:
    """One check for each flow: between the ends of the curve, or not above the flow of a single value."""
    entry, npsh = results.entry, results.calculation.pump.npsh_required
    entry.ledger.group("Range of the maker's curve")
    # Results at one flow, such as the worst and the coldest case, have one check.
    flows = {each.available.flow.address: each.available for each in reversed(results.judged)}
    for available in reversed(flows.values()):
        flow = curve.own_flow(entry, available.flow)
        lowest, highest = curve.ends(entry)
        about, source = available.about, cited(npsh.provenance)
        if lowest is None:
            yield compare(
                TESTED_HIGH, flow, highest, about=about, source=source,
                criterion="The flow is not above the one at which NPSH required is stated", met="NPSH required rises with flow",
                not_met="NPSH required rises with flow: ask the maker for its value at this one",
            )  # fmt: skip
        else:
            yield between(
                TESTED_LOW, TESTED_HIGH, flow, lowest, highest, about=about, source=source,
                criterion="The flow lies between the first and the last point of the maker's curve",
                met="the curve is read between its points", not_met="a curve is not drawn on beyond its points: ask the maker",
            )  # fmt: skip
