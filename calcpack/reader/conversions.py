"""The list of conversions in section 13, each with its exact factor."""

from __future__ import annotations

import re
from dataclasses import dataclass
from decimal import Decimal
from fractions import Fraction

from .arithmetic import exact
from .bands import INK, MM, Band
from .book import Book
from .factors import printed_factor, printed_tree
from .text import rows, text
from .tree import Symbol, substituted
from .units import converted, factor, named

COLUMNS = (14.0, 23.0, 41.0, 61.0, 109.0)
_LABEL = re.compile(r"C[1-9]\d*")
_IN_FULL = "in full: "


@dataclass(frozen=True)
class Conversion:
    """A row of the list."""

    label: str
    before: str
    after: str


def listed(band: Band, book: Book) -> list[Conversion]:
    """The conversions that ``band`` lists; what is wrong with a factor is noted."""
    edges = [band.edge + (x - 0.3) * MM for x in COLUMNS]
    found: list[Conversion] = []
    for row in rows(g for g in band.glyphs if edges[0] <= g.x < edges[-1]):
        cells = [
            text([g for g in row.glyphs if low <= g.x < high])
            for low, high in zip(edges, edges[1:], strict=False)
        ]
        if _LABEL.fullmatch(cells[0]) and not row.glyphs[0].serif and row.glyphs[0].colour == INK:
            found.append(_checked(band, cells, book))
        elif found and cells[3].startswith(_IN_FULL):
            _in_full(band, found[-1], cells[3].removeprefix(_IN_FULL), book)
    return found


def _checked(band: Band, cells: list[str], book: Book) -> Conversion:
    label, before, after, printed = cells[0], named(cells[1]), named(cells[2]), cells[3]
    right = factor(before, after)
    if printed_factor(printed) != right:
        book.note(band.sheet, label, "the factor is not the exact one", printed, right)
    return Conversion(label, before, after)


def _in_full(band: Band, conversion: Conversion, printed: str, book: Book) -> None:
    """A conversion with a zero of its own: two points fix it."""
    tree = printed_tree(printed)
    for x in (Decimal(0), Decimal(1)):
        right = converted(Fraction(x), conversion.before, conversion.after)
        if exact(substituted(tree, {Symbol("x"): [x]})) != right:
            book.note(
                band.sheet,
                conversion.label,
                "the conversion in full is not exact",
                printed,
                f"{right} at {x}",
            )
            return
