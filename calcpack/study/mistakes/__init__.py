"""Mistakes of the input that look right: wrong by what they count from, by where they stand, or by what they leave out.

Each is one small function that takes a :class:`~.search.Search` and yields a finding for each time it sees the mistake.  A
topic is a module with ``MISTAKES``, its functions in the order in which findings are printed.  The names are the keys under
``intended`` in the schema; the tests hold the two lists against each other.
"""

from __future__ import annotations

from collections.abc import Callable, Iterator
from contextlib import suppress

from ...faults import InputFault
from ..finding import Finding
from ..results import Results
from . import (
    barometer,
    datum,
    elevations,
    extremes,
    gauge,
    losses,
    margin,
    pressure,
    properties,
    pump,
    readings,
    search,
    vessel,
)

Mistake = Callable[[search.Search], Iterator[Finding]]
TOPICS = (pressure, vessel, barometer, gauge, readings, elevations, datum, extremes, properties, losses, pump, margin)
MISTAKES: tuple[Mistake, ...] = tuple(mistake for topic in TOPICS for mistake in topic.MISTAKES)


def find(results: Results) -> None:
    """Search ``results`` for every mistake, and record what is found; the heads at stake stand in a part of their own."""
    results.entry.ledger.part(PART, results.worst.scope)
    at = search.of(results)
    for mistake in MISTAKES:
        with suppress(InputFault):  # what the input does not allow to be tried is not found
            for found in mistake(at):
                results.entry.record(found)


PART = "What the findings put at stake"
