"""The nomenclature in section 13, and the symbols of the package against it."""

from __future__ import annotations

from .bands import MM, Band
from .book import Book
from .text import rows, symbol
from .tree import Symbol

#: Left edges of symbol and meaning, and the right edge (mm).
EDGES = (14.0, 34.0, 147.0)


def listed_symbols(band: Band) -> set[Symbol]:
    """Symbols that ``band`` explains: a symbol in the serif at the left, words in the sans beside it."""
    low, middle, high = (band.edge + (x - 0.3) * MM for x in EDGES)
    found = set()
    for row in rows(g for g in band.glyphs if low <= g.x < high):
        left = [g for g in row.glyphs if g.x < middle]
        right = row.glyphs[len(left) :]
        explained = right and not any(g.serif for g in right)
        if left and explained and all(g.serif and not g.bold for g in left):
            found.add(symbol(left))
    return found


def check_symbols(known: set[Symbol], book: Book) -> None:
    """Every symbol in use is explained."""
    for used, (sheet, address) in book.symbols.items():
        if used not in known:
            book.note(sheet, address, "a symbol that the nomenclature lacks", used)
