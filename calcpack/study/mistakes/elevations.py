"""Elevations along the line that contradict its lengths, or the inlet of the same file."""

from __future__ import annotations

from collections.abc import Iterator
from fractions import Fraction
from itertools import pairwise

from ..finding import Finding, finding
from .search import Search

#: Height, m, by which the entrance of the line may lie off the inlet before it is asked about.
OFF = 2
#: Rise of a pipe over its length, beyond which rounded elevations do not explain it.
STEEPEST = Fraction("1.05")


def pipe_too_short(at: Search) -> Iterator[Finding]:
    """A pipe that rises or falls by more than its length."""
    elements = [passed.element for passed in at.passage.rows] if at.passage else []
    for before, element in pairwise(elements):
        if element.kind != "pipe" or not element.length or not element.elevation or not before.elevation:
            continue
        rise = abs(element.elevation.quantity.si() - before.elevation.quantity.si())
        if rise > STEEPEST * element.length.quantity.si():
            yield finding(
                "pipe_too_short",
                f"Element {element.id}, {element.length.text} of pipe, leads from {before.elevation.text} to "
                f"{element.elevation.text}",
                "a pipe cannot rise or fall by more than its length: an elevation or the length is in doubt",
                unless="the elevation is that of a high point on the way",
            )


def entrance_off_inlet(at: Search) -> Iterator[Finding]:
    """An entrance far from the inlet, which is the same place."""
    first, intake = at.passage.rows[0].element if at.passage else None, at.c.intake
    if first is None or intake is None or first.kind != "entrance" or first.elevation is None:
        return
    if abs(first.elevation.quantity.si() - intake.elevation.quantity.si()) > OFF:
        yield finding(
            "entrance_off_inlet",
            f"The entrance lies at {first.elevation.text}, the inlet of `intake` at {intake.elevation.text}",
            "both describe one place: an elevation, or its datum, is in doubt; submergence moves with it, metre for metre",
            unless="a shaft leads down to the inlet",
        )


MISTAKES = (pipe_too_short, entrance_off_inlet)
