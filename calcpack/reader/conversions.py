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

COLUMNS = (14.0, 23.0, 41.0, 61.0, 105.0)
_LABEL = re.compile(r"C[1-9]\d*")
_IN_FULL = "in full: "


@dataclass(frozen=True)
class Conversion:
    """A row of the list."""

    label: str
    before: str
    after: str


def listed(band: Band, book: Book) -> list[Conversion]:
    """The conversions that ``band`` lists; what is wrong with a factor is noted.  Raises ``Unread``."""
    edges = [band.edge + (x - 0.3) * MM for x in COLUMNS]
    found: list[list[str]] = []
    for row in rows(g for g in band.glyphs if edges[0] <= g.x < edges[-1]):
        label, before, after, factor = (
            [g for g in row.glyphs if low <= g.x < high] for low, high in zip(edges, edges[1:], strict=False)
        )
        if label and label[0].colour == INK and not label[0].serif and _LABEL.fullmatch(text(label)):
            found.append([text(label), text(before), text(after), "", ""])
        elif label:
            found = [*found, []] if found and found[-1] else found  # the list is over
        if found and found[-1]:
            found[-1][3 if factor and factor[0].colour == INK else 4] += text(factor)
    return [_checked(band, cells, book) for cells in found if cells]


def _checked(band: Band, cells: list[str], book: Book) -> Conversion:
    """A row of the list; where the scales have other zeros, the conversion in full below the factor."""
    label, before, after, printed = cells[0], named(cells[1]), named(cells[2]), cells[3]
    right = factor(before, after)
    if printed_factor(printed) != right:
        book.note(band.sheet, label, "the factor is not the exact one", printed, right)
    if cells[4].startswith(_IN_FULL):
        _in_full(band, Conversion(label, before, after), cells[4].removeprefix(_IN_FULL), book)
    return Conversion(label, before, after)


def _in_full(band: Band, conversion: Conversion, printed: str, book: Book) -> None:
    """Two points fix a conversion with a zero of its own."""
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
