"""Every gauge reading lies on the scale of its gauge."""

from __future__ import annotations

from collections.abc import Iterator

from ..references import PRACTICE
from ..study.entry import cited
from ..study.results import Results
from ..verdict import Check, Rule, Unapplied, between

ORDER = 160
_TITLE = "Reading within the gauge's span"
SPAN_LOW = Rule("gauge_span_low", _TITLE, "p_g >= p_gl", PRACTICE, decides=False)
SPAN_HIGH = Rule("gauge_span_high", _TITLE, "p_g <= p_gh", PRACTICE, decides=False)


def judge(results: Results) -> Iterator[Check | Unapplied]:
    """One check for each reading whose gauge has a span; the others are named together."""
    entry, bare = results.entry, []
    for reading in results.calculation.readings:
        gauge = reading.gauge
        if gauge.span is None or gauge.span.lowest is None or gauge.span.highest is None:
            bare.append(reading.name)
            continue
        entry.ledger.group("Span of the gauge")
        yield between(
            SPAN_LOW, SPAN_HIGH, entry.gauge(gauge.pressure, f"Inlet gauge reading, {reading.name}"),
            entry.value(gauge.span.lowest, "p_gl", f"Lower end of the gauge's scale, {reading.name}"),
            entry.value(gauge.span.highest, "p_gh", f"Upper end of the gauge's scale, {reading.name}"),
            about=reading.name, criterion="The gauge reads between the ends of its scale", source=cited(gauge.pressure),
            met="the reading lies on the scale", not_met="no gauge reads beyond its scale: the reading or the span is in doubt",
        )  # fmt: skip
    if bare:
        yield Unapplied(_TITLE, f"the file gives no span of the gauge for {', '.join(bare)}")
