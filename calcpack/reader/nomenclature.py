"""The nomenclature in section 13, and the symbols of the package against it."""

from __future__ import annotations

from collections.abc import Mapping

from .bands import MM, Band
from .book import Book
from .text import rows, symbol, text
from .tree import Symbol
from .units import named, same_dimension

#: Left edges of symbol, meaning and unit, and the right edge (mm).
EDGES = (14.0, 34.0, 122.0, 147.0)


def listed_symbols(band: Band) -> dict[Symbol, str]:
    """Symbols that ``band`` explains, with their units: a symbol in the serif at the left, words in the sans beside it.

    Raises :class:`~calcpack.reader.failures.Unread` for a unit that is not known.
    """
    low, middle, last, high = (band.edge + (x - 0.3) * MM for x in EDGES)
    found: dict[Symbol, str] = {}
    for row in rows(g for g in band.glyphs if low <= g.x < high):
        left = [g for g in row.glyphs if g.x < middle]
        right = row.glyphs[len(left) :]
        explained = right and not any(g.serif for g in right)
        if left and explained and all(g.serif and not g.bold for g in left):
            unit = text([g for g in right if g.x >= last])
            found[symbol(left)] = "" if unit == "–" else named(unit)
    return found


def check_symbols(known: Mapping[Symbol, str], book: Book) -> None:
    """Every symbol in use is explained, and every value is of what its symbol measures."""
    for used, (sheet, address) in book.symbols.items():
        if used not in known:
            book.note(sheet, address, "a symbol that the nomenclature lacks", used)
    for sheet, address, of, unit in book.measured:
        if of in known and not same_dimension(known[of], unit):
            book.note(
                sheet, address, f"{of} measures something else", unit or "a plain number", known[of] or "a plain number"
            )
