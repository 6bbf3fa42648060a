"""Velocity at the bell or inlet: within the project's limits, or those of ANSI/HI 9.8."""

from __future__ import annotations

from collections.abc import Iterator
from math import inf

from ..quantity import parse
from ..references import Cite
from ..source.inputs import Given
from ..study.entry import Entry, cited
from ..study.intake import inlet_velocity
from ..study.results import Results
from ..value import Value
from ..verdict import Check, Rule, Unapplied, compare, lacking

ORDER = 120
_CITE = Cite("hi98bell")
BELL_LOW = Rule("bell_velocity_low", "Velocity at the inlet, lower limit", "V_i >= V_l", _CITE)
BELL_HIGH = Rule("bell_velocity_high", "Velocity at the inlet, upper limit", "V_i <= V_h", _CITE)
#: ANSI/HI 9.8: flow through one bell below this, m³/s -> lowest and highest velocity; with the words of the range.
WINDOWS = (
    (0.315, "below 315 L/s", "0.6 m/s", "2.7 m/s"),
    (1.260, "315 to 1260 L/s", "0.9 m/s", "2.4 m/s"),
    (inf, "above 1260 L/s", "1.2 m/s", "2.1 m/s"),
)
_TITLES = {"V_l": "the least", "V_h": "the most"}


def judge(results: Results) -> Iterator[Check | Unapplied]:
    """Judge the mean velocity at the inlet against its limits, each that is asked for."""
    entry, c = results.entry, results.calculation
    asked = c.criteria.bell_velocity
    if asked is None:
        yield Unapplied("Velocity at the inlet", "the file asks for no limits")
        return
    source = cited(asked.lowest or asked.highest or c.criteria.provenance)
    if c.intake is None:
        missing = "the file describes no inlet"
        yield lacking(
            BELL_HIGH, missing, asked=True, criterion="The velocity at the inlet keeps its limits", source=source
        )
        return
    entry.ledger.group("Velocity at the inlet")
    flow = results.inlet_flow
    velocity = inlet_velocity(entry, flow)
    if c.criteria.bell_method:
        lowest, highest, words = _window(entry, flow)
    else:
        lowest, highest, words = _own(entry, asked.lowest, "V_l"), _own(entry, asked.highest, "V_h"), ""
    for rule, limit, word in ((BELL_LOW, lowest, "at least"), (BELL_HIGH, highest, "at most")):
        if limit:
            criterion = f"The velocity at the inlet is {word} {entry.ledger.shown(limit)}{words}"
            yield compare(rule, velocity, limit, criterion=criterion, source=source)


def _own(entry: Entry, given: Given | None, symbol: str) -> Value | None:
    """A limit of the project."""
    return None if given is None else entry.value(given, symbol, f"Velocity at the inlet, {_TITLES[symbol]}")


def _window(entry: Entry, flow: Value) -> tuple[Value | None, Value | None, str]:
    """The limits of ANSI/HI 9.8 for the flow through one bell."""
    _, words, lowest, highest = next(row for row in WINDOWS if flow.shadow < row[0])
    place = f"flow through one bell {words}"

    def entered(symbol: str, title: str, text: str) -> Value:
        return entry.ledger.tabulated(
            symbol, f"Velocity at the inlet, {title}", parse(text, "velocity_limit"), place, _CITE
        )

    return entered("V_l", "the least", lowest), entered("V_h", "the most", highest), f" ({place}, ANSI/HI 9.8)"
