"""What a search for mistakes works with."""

from __future__ import annotations

import re
from dataclasses import dataclass
from decimal import Decimal

from ...ledger import Ledger
from ...source.inputs import Calculation
from ..entry import Entry
from ..line import Passage
from ..results import Results
from ..state import State


@dataclass(frozen=True)
class Search:
    """The results, and an entry with a ledger of its own for trials.

    What is only tried is computed there and never printed; what is found, and the head at stake, is written to the ledger
    of the results.
    """

    results: Results
    trial: Entry

    @property
    def c(self) -> Calculation:
        """The input."""
        return self.results.calculation

    @property
    def entry(self) -> Entry:
        """The entry of the results."""
        return self.results.entry

    @property
    def ledger(self) -> Ledger:
        """The ledger that is printed."""
        return self.entry.ledger

    @property
    def worst(self) -> State:
        """The worst case."""
        return self.results.worst

    @property
    def passage(self) -> Passage | None:
        """The way along the line at the worst case."""
        return self.results.line.passage if self.results.line else None


class _Trial(Ledger):
    """A ledger whose addresses are none of the results': values of both may stand in one line of it."""

    def _address(self, section: int) -> str:
        return f"trial {super()._address(section)}"


def of(results: Results) -> Search:
    """A search in ``results``."""
    trial = Entry(results.calculation, _Trial(results.calculation.units))
    trial.ledger.part("trial", "")
    return Search(results, trial)


def says(text: str, words: str) -> str:
    """The first of ``words`` (alternatives of a regular expression) that stands in ``text`` as a word, else empty."""
    found = re.search(rf"(?<!\w)(?:{words})(?!\w)", text, re.IGNORECASE)
    return found.group() if found else ""


def digits(number: Decimal) -> int:
    """Digits of a number without the zeros at its ends: one of a round number; none of zero."""
    return len(number.normalize().as_tuple().digits) if number else 0
