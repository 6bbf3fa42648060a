"""Section 4: every input as given and as used, the latter by the line that converts it."""

from __future__ import annotations

from dataclasses import dataclass

from .bands import ACCENT, Band
from .book import Book
from .line import cited
from .text import rows, scalar, symbol, words
from .tree import Symbol
from .units import Quantity, named

SYMBOL, AS_GIVEN, AS_USED = (14.0, 27.0), (72.0, 98.0), (98.0, 129.0)


@dataclass(frozen=True)
class Input:
    """A row of the inputs; ``by`` is the line that converts it, empty where it is used as given."""

    sheet: int
    address: str
    symbol: Symbol
    given: Quantity
    used: Quantity
    by: str


def read_input(band: Band) -> Input:
    """The input that ``band`` holds.  Raises :class:`~calcpack.reader.failures.Unread`."""
    used = band.column(*AS_USED)
    by = cited(used) if any(g.colour == ACCENT for g in used) else ""
    given = _quantity(words(band.column(*AS_GIVEN)))
    own = " ".join(str(row) for row in rows(used) if not any(g.colour == ACCENT for g in row.glyphs))
    shown = symbol([g for g in band.column(*SYMBOL) if g.serif])
    return Input(band.sheet, band.address, shown, given, _quantity(own), by)


def _quantity(printed: str) -> Quantity:
    value, unit = scalar(printed)
    return Quantity(value, named(unit))


def enter(row: Input, book: Book) -> None:
    """Let lines cite the input, and compare what is used with what is given where nothing converts it."""
    book.enter(row.address, [row.given])
    book.result(row.sheet, row.address, row.symbol, row.given.unit)
    if not row.by and row.used != row.given:
        book.note(row.sheet, row.address, "used otherwise than given, and no line converts it", row.used, row.given)


def settle(row: Input, book: Book) -> None:
    """Once every line is read: the value as used is the result of the line that converts the input."""
    if row.by and (wrong := book.citation(row.used, row.by)):
        book.note(row.sheet, row.address, f"as used: {wrong[0]}", *wrong[1:])
    if row.by and row.address not in book.cites.get(row.by, ()):
        book.note(row.sheet, row.address, f"line {row.by} does not convert this input")
