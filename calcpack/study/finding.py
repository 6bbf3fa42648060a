"""A finding: something odd that a careful reader would ask about, with the head at stake."""

from __future__ import annotations

from dataclasses import dataclass

from ..value import Value


@dataclass(frozen=True)
class Finding:
    """What was found and why it is odd.

    A mistake of the input has a ``name``, by which the file may state it as intended, and ``intended`` says when and how;
    what is a result has neither.  ``cost`` is the head at stake, where it can be computed.
    """

    name: str
    text: str
    reason: str
    cost: Value | None = None
    intended: str = ""


def finding(name: str, text: str, reason: str, cost: Value | None = None, unless: str = "") -> Finding:
    """A finding; ``unless`` says in words when a mistake ``name`` is none."""
    condition = unless or "it is meant"
    stated = f"If {condition}, state `intended: {{{name}: …}}` with the reason" if name else ""
    return Finding(name, text, reason, cost, stated)
