"""Straight pipe of the line: its lengths together, and the run before the pump."""

from __future__ import annotations

from collections.abc import Sequence
from dataclasses import dataclass

from ..source.inputs import Element
from ..value import Value
from .entry import Entry
from .line import Passage, Passed

#: Elements at the pump's nozzle that are no run of straight pipe and do not break one.
PASSED_OVER = ("reducer", "connector")


@dataclass(frozen=True)
class Run:
    """Straight pipe before the pump, of one bore; ``after`` is the element that disturbs the flow before it.

    ``length`` is ``None`` where that element stands at the pump itself.
    """

    length: Value | None
    bore: Value
    after: Passed | None


def length(entry: Entry, pipes: Sequence[Element], about: str) -> Value:
    """The length of straight pipes together."""
    lengths = [
        entry.value(given, "L", f"Length of straight pipe, {pipe.id}") for pipe in pipes if (given := pipe.length)
    ]
    return lengths[0] if len(lengths) == 1 else entry.ledger.apply("straight_pipe", {"L": lengths}, about)


def run(entry: Entry, passage: Passage) -> Run:
    """The straight run before the pump: the last pipes of one bore, with what is passed over among them.

    It ends at the last element that disturbs the flow, and where the bore or the number of pumps served changes.
    """
    pipes: list[Passed] = []
    after: Passed | None = None
    for passed in reversed(passage.rows):
        if passed.element.kind in PASSED_OVER:
            continue
        one_pipe = not pipes or (
            passed.flow.bore.record == pipes[0].flow.bore.record and passed.section.pumps == pipes[0].section.pumps
        )
        if passed.element.kind != "pipe" or not one_pipe:
            after = passed
            break
        pipes.insert(0, passed)
    if not pipes:
        return Run(None, passage.flows[-1].bore, after)
    found = length(entry, [each.element for each in pipes], "before the pump")
    return Run(found, pipes[-1].flow.bore, after)
