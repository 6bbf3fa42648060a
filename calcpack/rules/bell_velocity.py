"""Velocity at the bell or inlet: within the project's limits, or those of ANSI/HI 9.8."""

from __future__ import annotations

from collections.abc import Iterator
from dataclasses import dataclass
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


@dataclass(frozen=True)
class _Limit:
    """A limit of the velocity: its text, its value, and the range of flow it is published for."""

    text: str
    value: Value
    range: str = ""


def judge(results: Results) -> Iterator[Check | Unapplied]:
    """Judge the mean velocity at the inlet against its limits, each that is asked for."""
    entry, c = results.entry, results.calculation
    asked = c.criteria.bell_velocity
    if asked is None:
        yield Unapplied("Velocity at the inlet", "the file asks for no limits")
        return
    method = c.criteria.bell_method
    source = cited(asked.lowest or asked.highest or (method.provenance if method else None))
    if c.intake is None:
        criterion = "The velocity at the inlet keeps its limits"
        yield lacking(BELL_HIGH, "the file describes no inlet", asked=True, criterion=criterion, source=source)
        return
    entry.ledger.group("Velocity at the inlet")
    velocity = inlet_velocity(entry, results.inlet_flow)
    reason = f"the mean velocity of the flow through the inlet (line {velocity.address})"
    for rule, limit, word in zip((BELL_LOW, BELL_HIGH), _limits(results), ("at least", "at most"), strict=True):
        if limit is not None:
            criterion = f"The velocity at the inlet is {word} {limit.text}{limit.range}"
            yield compare(rule, velocity, limit.value, criterion=criterion, source=source, met=reason, not_met=reason)


def _limits(results: Results) -> tuple[_Limit | None, _Limit | None]:
    """The lowest and the highest velocity: the project's own, else those of ANSI/HI 9.8 for the flow through one bell."""
    entry, asked = results.entry, results.calculation.criteria.bell_velocity
    if asked is not None and not results.calculation.criteria.bell_method:
        return _own(entry, asked.lowest, "V_l", "the least"), _own(entry, asked.highest, "V_h", "the most")
    _, words, lowest, highest = next(row for row in WINDOWS if results.inlet_flow.shadow < row[0])
    return _published(entry, lowest, words, "V_l", "the least"), _published(entry, highest, words, "V_h", "the most")


def _own(entry: Entry, given: Given | None, symbol: str, title: str) -> _Limit | None:
    return None if given is None else _Limit(given.text, entry.value(given, symbol, f"Velocity at the inlet, {title}"))


def _published(entry: Entry, text: str, words: str, symbol: str, title: str) -> _Limit:
    place, quantity = f"flow through one bell {words}", parse(text, "velocity_limit")
    value = entry.ledger.tabulated(symbol, f"Velocity at the inlet, {title}", quantity, place, _CITE)
    return _Limit(text, value, f" ({place}, ANSI/HI 9.8)")
