"""Loss tables of section 8: rows ``n K h_V`` or results of lines above, their sum, the row worked in full."""

from __future__ import annotations

import re
from collections.abc import Sequence
from dataclasses import dataclass, field
from decimal import Decimal
from functools import reduce

from .arithmetic import WIDE, of_record, rounded, value
from .bands import ACCENT, ADDRESS, INK, NUMBER, SECOND, Band
from .book import Book
from .failures import Unread
from .line import cited, picture, whole
from .picture import Form, forms
from .text import is_number, rows, scalar, words
from .tree import Number, Op, Symbol, Tree, symbols
from .units import Quantity, named

LABEL, FACTORS = (14.0, 21.0), ((64.0, 76.0), (76.0, 96.0), (96.0, 114.0))
#: The loss is semibold and may lean to the left, over the column of h_V.
LOSS, RECORD, SUM = (96.0, 129.0), (129.0, 150.0), (21.0, 150.0)
WORKED = re.compile(r"Row (\S+) worked in full")
_UNIT = re.compile(r"loss, (\S+)")


@dataclass
class Table:
    """The rows of a table since the last total, by label, with their factors and losses."""

    losses: list[Decimal] = field(default_factory=list)
    factors: dict[str, tuple[list[Decimal], Decimal, str]] = field(default_factory=dict)


def is_losses(band: Band) -> bool:
    """Whether ``band`` is a row of a loss table."""
    digits = words(g for g in band.column(*RECORD) if g.colour == SECOND)
    return _UNIT.search(band.head) is not None and is_number(digits)


def read_row(band: Band, table: Table, book: Book) -> bool:
    """Check a row or the total; whether it is a line of its own.  Raises ``Unread``."""
    match = _UNIT.search(band.head)
    assert match is not None, "is_losses has found it"
    unit = named(match[1])
    record = Quantity(whole(words(g for g in band.column(*RECORD) if g.colour == SECOND)), unit)
    _reported(band, record, book)
    if picture(band, *SUM).glyphs:
        _total(band, record, table, book)
        return True
    label = words(band.column(*LABEL))
    if not band.address:
        above = words(g for g in band.column(*NUMBER) if g.colour == ACCENT)
        if not ADDRESS.fullmatch(above):
            raise Unread("a row of losses without an address")
        _agree(band, f"row {label}", record, above, book)
        repeated = cited([g for edges in FACTORS for g in band.column(*edges)])
        if repeated != above:
            book.note(band.sheet, "", f"row {label} names two lines", above, repeated)
        table.losses.append(record.value)
        return False
    _product(band, label, record, table, book)
    return True


def _reported(band: Band, record: Quantity, book: Book) -> None:
    """The loss as shown large against its digits of record."""
    shown = whole(words(g for g in band.column(*LOSS) if g.bold and not g.serif and g.colour == INK))
    if rounded(record.value, shown) != shown:
        found = rounded(record.value, shown)
        book.note(band.sheet, band.address, "the loss shown is not the result of record", shown, found)


def _agree(band: Band, what: str, quantity: Quantity, address: str, book: Book) -> None:
    if wrong := book.citation(quantity, address):
        book.note(band.sheet, band.address, f"{what} {wrong[0]}", *wrong[1:])
    book.cite(band.address, address)


def _product(band: Band, label: str, record: Quantity, table: Table, book: Book) -> None:
    units = ("", "", record.unit)
    numbers = []
    for name, edges, unit in zip(("n", "K", "h_V"), FACTORS, units, strict=True):
        cell = band.column(*edges)
        number = whole(words(g for g in cell if g.colour == INK and not g.bold))
        numbers.append(number)
        if name == "n" and number == 1 and not any(g.colour == ACCENT for g in cell):
            continue
        _agree(band, name, Quantity(number, unit), cited(cell), book)
    found = of_record(reduce(WIDE.multiply, numbers))
    if found != record.value:
        book.note(band.sheet, band.address, "n K h_V gives another loss", record.value, found)
    book.enter(band.address, [record])
    table.losses.append(record.value)
    table.factors[label] = (numbers, record.value, record.unit)


def _total(band: Band, record: Quantity, table: Table, book: Book) -> None:
    """The sum: its numbers are the rows above it, in their order."""
    found = forms(picture(band, *SUM))
    if not _equations(found) or not (isinstance(found[0].right, Op) and found[0].right.name == "sum"):
        raise Unread("a total that is no sum")
    book.uses(band.sheet, band.address, (s for x in (found[0].left, found[0].right) if x for s in symbols(x)))
    if isinstance(found[0].left, Symbol):
        book.result(band.sheet, band.address, found[0].left, record.unit)
    if not table.losses or found[1].right != _sum(table.losses):
        book.note(band.sheet, band.address, "the sum is not that of the rows above it")
    total = of_record(value(found[1].right))
    if total != record.value:
        book.note(band.sheet, band.address, "the rows give another sum", record.value, total)
    book.enter(band.address, [record])
    table.losses.clear()


def _equations(found: Sequence[Form]) -> bool:
    """Whether ``found`` are a symbolic form and a form with numbers of one equation."""
    return len(found) == 2 and isinstance(found[0].left, Symbol) and all(x.relation == "=" for x in found)


def _sum(terms: Sequence[Decimal]) -> Tree:
    numbers: list[Tree] = [Number(x) for x in terms]
    return reduce(lambda a, b: Op("+", (a, b)), numbers)


def worked(band: Band, table: Table, book: Book) -> None:
    """Check the row worked in full that ``band`` holds, if it holds one.  Raises ``Unread``."""
    head = next((row for row in rows(g for g in band.glyphs if g.bold) if WORKED.search(str(row))), None)
    if head is None:
        return
    below = tuple(g for g in band.glyphs if g.y < head.y)
    gives = next((str(row) for row in rows(g for g in below if not g.serif) if str(row).startswith("gives ")), "")
    label = WORKED.search(str(head))
    assert label is not None, "the row was found by it"
    if label[1] not in table.factors:
        raise Unread(f"row {label[1]} is worked in full and is not in the table")
    numbers, loss, unit = table.factors[label[1]]
    part = Band(band.sheet, band.edge, band.head, below, band.bars)
    printed = forms(picture(part, 14.0, 150.0))
    if not _equations(printed):
        raise Unread(f"row {label[1]} worked in full is no equation in symbols and in numbers")
    book.uses(band.sheet, "", symbols(printed[0].right))
    factors = _factors(printed[1].right)
    if factors not in (numbers, numbers[1:]) or len(_factors(printed[0].right)) != len(factors):
        book.note(band.sheet, "", f"row {label[1]} worked in full has other numbers than the table")
    given, rest = scalar(gives.removeprefix("gives "))
    if Quantity(given, named(rest.partition(";")[0])) != Quantity(loss, unit):
        book.note(band.sheet, "", f"row {label[1]} worked in full gives another loss", gives, f"{loss} {unit}")
    table.factors.clear()


def _factors(tree: Tree) -> list[Decimal | Symbol]:
    if isinstance(tree, Op) and tree.name == "*":
        return [x for arg in tree.args for x in _factors(arg)]
    if isinstance(tree, Number):
        return [tree.value]
    if isinstance(tree, Symbol):
        return [tree]
    raise Unread("a loss that is no product")
