"""The rules: each topic one module, which says what it compares, where it stands in the order, and how it is judged.

A topic holds ``ORDER``, its :class:`~calcpack.verdict.Rule` objects and ``judge(results)``; it is found by its place in this
folder, so that a new rule is one file.
"""

from __future__ import annotations

from collections.abc import Callable, Iterator
from importlib import import_module
from pkgutil import iter_modules
from types import ModuleType
from typing import cast

from ..study.results import Results
from ..verdict import Check, Unapplied

Judge = Callable[[Results], Iterator[Check | Unapplied]]


def topics() -> list[ModuleType]:
    """Every topic, in the order in which rules are printed."""
    found = [import_module(f"{__name__}.{module.name}") for module in iter_modules(__path__)]
    return sorted(found, key=lambda topic: cast(int, topic.ORDER))


def judge(results: Results) -> list[Check | Unapplied]:
    """Apply every rule; what a rule needs to compute stands in a part of its own."""
    results.entry.ledger.part("What the rules compare", results.worst.scope)
    return [each for topic in topics() for each in cast(Judge, topic.judge)(results)]
