"""A line of section 8 as printed: formula picture, operands, source, result, and the rows of a root."""

from __future__ import annotations

from collections.abc import Sequence
from dataclasses import dataclass
from decimal import Decimal

from .bands import ACCENT, ADDRESS, INK, MM, SECOND, Band
from .failures import Unread
from .glyphs import Glyph
from .notation import Marks
from .picture import Form, forms
from .text import Row, rows, scalar, symbol, text, words
from .tree import Symbol
from .units import Quantity, named

WORKING, RESTS_ON, RESULT = (14.0, 87.0), (87.0, 122.0), (122.0, 150.0)
ROOT_COLUMNS = (14.0, 34.0, 56.0, 87.0)
#: Size of the title in the serif; no part of a formula has it (points).
TITLE = 9.5


@dataclass(frozen=True)
class Operand:
    """A row of the column 'rests on': symbol, number with its unit, and the line it is taken from."""

    symbol: Symbol
    quantity: Quantity
    address: str


@dataclass(frozen=True)
class Entry:
    """What a line without operands prints: a symbol and the number and unit a table has for it."""

    symbol: Symbol
    quantity: Quantity


@dataclass(frozen=True)
class Residual:
    """A row under a root: its label, the value tried, and left side less right side there."""

    label: str
    tried: Decimal
    residual: Decimal


@dataclass(frozen=True)
class Line:
    """One line; ``record`` are the digits of record, ``headline`` the figure shown large.

    ``entry`` is set, and ``forms`` empty, where the line rests on a table rather than on operands.
    """

    sheet: int
    address: str
    forms: tuple[Form, ...]
    entry: Entry | None
    operands: tuple[Operand, ...]
    source: str
    place: str
    headline: Quantity
    record: Quantity
    residuals: tuple[Residual, ...]


def read_line(band: Band) -> Line:
    """The line that ``band`` holds.  Raises :class:`~calcpack.reader.failures.Unread`."""
    working = band.column(*WORKING)
    operands, source = rests_on(band.column(*RESTS_ON))
    marks = picture(band, *WORKING)
    printed = tuple(forms(marks)) if operands else ()
    headline, record = result(band.column(*RESULT))
    place = words(g for g in working if not g.serif and g.colour == SECOND)
    return Line(
        band.sheet, band.address, printed, None if operands else entry(marks), operands, source, place,
        headline, record, residuals(band, [g for g in working if not g.serif and g.colour == INK]),
    )  # fmt: skip


def entry(marks: Marks) -> Entry:
    """``symbol = number unit``, in one row.  Raises ``Unread``."""
    printed = sorted(marks.glyphs, key=lambda g: g.x)
    sign = next((i for i, g in enumerate(printed) if g.char == "="), 0)
    if not sign or marks.bars:
        raise Unread("no operand, and no entry of a table")
    value, unit = scalar(text(printed[sign + 1 :]))
    return Entry(symbol(printed[:sign]), Quantity(value, named(unit)))


def picture(band: Band, left: float, right: float) -> Marks:
    """The formula between two distances from the edge (mm): the serif but for the title, and the bars."""
    glyphs = tuple(g for g in band.column(left, right) if g.serif and g.colour == INK and not g.bold and not _title(g))
    return Marks(glyphs, tuple(band.inner_bars(left, right)))


def _title(g: Glyph) -> bool:
    return abs(g.size - TITLE) < 0.02 and abs(g.height - TITLE) < 0.02 and not g.italic


def rests_on(glyphs: Sequence[Glyph]) -> tuple[tuple[Operand, ...], str]:
    """Operands from the top, and the text below them."""
    found: list[tuple[Row, str]] = []
    source: list[str] = []
    for row in rows(glyphs):
        if any(g.serif for g in row.glyphs):
            found.append((row, ""))
        elif found and all(g.colour == INK for g in row.glyphs) and not source:
            if found[-1][1]:
                raise Unread("a row between two operands that is neither")
            found[-1] = (found[-1][0], str(row))
        else:
            source.append(str(row))
    return tuple(_operand(row, unit) for row, unit in found), " ".join(source)


def _operand(row: Row, unit_below: str) -> Operand:
    printed = text([g for g in row.glyphs if not g.serif and g.colour == INK])
    value, unit = scalar(printed)
    return Operand(
        symbol([g for g in row.glyphs if g.serif]),
        Quantity(value, named(unit or unit_below)),
        cited(row.glyphs),
    )


def cited(glyphs: Sequence[Glyph]) -> str:
    """The one address that ``glyphs`` cite, in the accent colour.  Raises ``Unread``."""
    found = words(g for g in glyphs if g.colour == ACCENT)
    if not ADDRESS.fullmatch(found):
        raise Unread(f"{found!r} is no address" if found else "no address cited")
    return found


def result(glyphs: Sequence[Glyph]) -> tuple[Quantity, Quantity]:
    """Headline and digits of record; the unit is printed once where both have the same."""
    large, head_rest = scalar(words(g for g in glyphs if g.serif))
    if head_rest:
        raise Unread(f"{head_rest!r} after the headline")
    unit = named(words(g for g in glyphs if not g.serif and g.colour == INK))
    digits, own = scalar(words(g for g in glyphs if not g.serif and g.colour == SECOND))
    return Quantity(large, unit), Quantity(digits, named(own) if own else unit)


def residuals(band: Band, glyphs: Sequence[Glyph]) -> tuple[Residual, ...]:
    """The rows under a root, three or none.  Raises ``Unread``."""
    edges = [band.edge + (x - 0.3) * MM for x in ROOT_COLUMNS]
    found = []
    for row in rows(glyphs):
        cells = [
            text([g for g in row.glyphs if low <= g.x < high]) for low, high in zip(edges, edges[1:], strict=False)
        ]
        label, tried, residual = cells
        if not label or not residual.startswith("residual "):
            raise Unread(f"{str(row)!r} is no row of a root")
        found.append(Residual(label, whole(tried), whole(residual.removeprefix("residual "))))
    if len(found) not in (0, 3):
        raise Unread(f"{len(found)} rows of a root, 3 expected")
    return tuple(found)


def whole(printed: str) -> Decimal:
    """A text that is a number and nothing else.  Raises ``Unread``."""
    value, rest = scalar(printed)
    if rest:
        raise Unread(f"{rest!r} after the number")
    return value
