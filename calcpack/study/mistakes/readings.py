"""Readings outside the extremes that the file states."""

from __future__ import annotations

from collections.abc import Iterator

from ...source.inputs import Given
from ..finding import Finding, finding
from .search import Search


def beyond_extremes(at: Search) -> Iterator[Finding]:
    """A barometer or a level read below the lowest of the file, a flow or a temperature above the highest."""
    c = at.c
    lowest_level = c.supply.level.lowest if c.supply.level else None
    lowest_barometer = c.site.barometer.lowest if c.site.barometer else None
    for reading in c.readings:
        for what, read, extreme, lower in (
            ("barometer", reading.barometer, lowest_barometer, True),
            ("level", reading.level, lowest_level, True),
            ("flow", reading.flow, c.pump.flow.highest, False),
            ("temperature", reading.temperature, c.liquid.temperature.highest, False),
        ):
            if _outside(read, extreme, lower=lower):
                assert read is not None and extreme is not None, "both are there"
                word = "below the lowest" if lower else "above the highest"
                yield finding(
                    "reading_beyond_extremes",
                    f"{reading.name}: the {what} read, {read.text}, is {word} the file states, {extreme.text}",
                    "the worst case is then not the worst; the extreme or the reading is in doubt",
                    unless="such a state does not come back",
                )


def _outside(read: Given | None, extreme: Given | None, *, lower: bool) -> bool:
    if read is None or extreme is None:
        return False
    return read.quantity.si() < extreme.quantity.si() if lower else read.quantity.si() > extreme.quantity.si()


MISTAKES = (beyond_extremes,)
