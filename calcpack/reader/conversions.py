"""The list of conversions in section 13, each with its exact factor."""

from __future__ import annotations

import re
from dataclasses import dataclass
from decimal import Decimal
from fractions import Fraction

from .arithmetic import exact
from .bands import INK, MM, Band
from .book import Book, Finding
from .factors import printed_factor, printed_tree
from .failures import Undefined, Unread
from .text import rows, text
from .tree import Symbol, substituted
from .units import converted, factor, named

COLUMNS = (14.0, 23.0, 41.0, 61.0, 105.0)
_LABEL = re.compile(r"C[1-9]\d*")
ROW_PITCH = 13.0  # farthest that a second row of a cell stands below the first (points)
_IN_FULL = "in full: "


@dataclass(frozen=True)
class Conversion:
    """A row of the list."""

    label: str
    before: str
    after: str


def listed(band: Band, book: Book) -> list[Conversion]:
    """The conversions that ``band`` lists; what is wrong with a row, or cannot be read, is noted."""
    found = []
    for label, before, after, printed, in_full in _cells(band):
        try:
            conversion = Conversion(label, named(before), named(after))
            _check(band.sheet, conversion, printed, in_full, book)
            found.append(conversion)
        except (Unread, Undefined) as error:
            book.unread.append(Finding(band.sheet, label, str(error)))
    return found


def _cells(band: Band) -> list[list[str]]:
    """Label, units, factor and the small print below it, row by row; a factor may take two rows."""
    edges = [band.edge + (x - 0.3) * MM for x in COLUMNS]
    found: list[list[str]] = []
    inside, y = False, 0.0
    for row in rows(g for g in band.glyphs if edges[0] <= g.x < edges[-1]):
        label, before, after, times = (
            [g for g in row.glyphs if low <= g.x < high] for low, high in zip(edges, edges[1:], strict=False)
        )
        if label:
            plain = not label[0].serif and not label[0].bold and label[0].colour == INK
            inside = plain and bool(_LABEL.fullmatch(text(label)))
        elif y - row.y > ROW_PITCH:
            inside = False
        y = row.y
        if label and inside:
            found.append([text(label), text(before), text(after), "", ""])
        if inside:
            found[-1][3 if times and times[0].colour == INK else 4] += text(times)
    return found


def _check(sheet: int, conversion: Conversion, printed: str, in_full: str, book: Book) -> None:
    before, after = conversion.before, conversion.after
    if printed_factor(printed) != factor(before, after):
        book.note(sheet, conversion.label, "the factor is not the exact one", printed, factor(before, after))
    zero = converted(Fraction(0), before, after)
    if zero or in_full:
        # A conversion with a zero of its own stands in full below the factor; two points fix it.
        tree = printed_tree(in_full.removeprefix(_IN_FULL))
        ends = [exact(substituted(tree, {Symbol("x"): [Decimal(x)]})) for x in (0, 1)]
        if ends != [zero, converted(Fraction(1), before, after)]:
            book.note(sheet, conversion.label, "the conversion in full is not exact", in_full)
