"""A whole package read back: every band in its order, then what only the whole can tell."""

from __future__ import annotations

from collections import Counter
from collections.abc import Sequence

from .bands import Band, bands
from .book import Book, Finding
from .conversions import Conversion, listed
from .cover import check_cover
from .factors import LISTED
from .failures import NotAPackage, Undefined, Unread
from .glyphs import Sheet, sheets
from .inputs import Input, enter, read_input, settle
from .line import RESULT, Line, read_line
from .losses import Table, is_losses, read_row, worked
from .nomenclature import check_symbols, listed_symbols
from .recompute import recompute
from .report import Report
from .rules import Judged, read_rule
from .tree import Symbol
from .visible import check_strip, check_visible, strip


def verify(pdf: bytes) -> Report:
    """Read a package back from its visible pages and recompute every line.

    Raises :class:`~calcpack.reader.failures.NotAPackage` for anything that is none of our packages.
    """
    return read_back(sheets(pdf))


def read_back(found: Sequence[Sheet]) -> Report:
    """Read a package back from its sheets; raises as :func:`verify` does."""
    if not any(strip(sheet) for sheet in found):
        raise NotAPackage("a PDF of which no sheet bears a sheet number as packages do")
    reading = Reading()
    for band in bands(found):
        reading.read(band)
    if not reading.book.classes:
        raise NotAPackage("a PDF without a line of computation")
    return reading.closed(found)


class Reading:
    """Reads bands in order and keeps what the end needs."""

    def __init__(self) -> None:
        self.book = Book()
        self.table = Table()
        self.inputs: list[Input] = []
        self.conversions: dict[str, Conversion] = {}
        self.converting: list[tuple[Line, str]] = []
        self.known: dict[Symbol, str] = {}
        self.rules: dict[str, Judged] = {}
        self.order: list[tuple[int, str]] = []

    def read(self, band: Band) -> None:
        """Read one band; what cannot be read is kept as unread."""
        if band.address:
            self.order.append((band.sheet, band.address))
        try:
            self._read(band)
        except (Unread, Undefined, ArithmeticError, RecursionError) as error:
            reason = str(error) if isinstance(error, Unread | Undefined) else "numbers or nesting beyond all bounds"
            self.book.unread.append(Finding(band.sheet, band.address, reason))
            if band.address:
                self.book.enter(band.address, [])

    def _read(self, band: Band) -> None:
        """A band by the section its address belongs to, or by what it holds where it has none."""
        section = band.address.partition(".")[0]
        if section == "4":
            row = read_input(band)
            enter(row, self.book)
            self.inputs.append(row)
        elif section == "9":
            givens = {row.by or row.address: row.given for row in self.inputs}
            self.rules[band.address] = read_rule(band, givens, self.book)
        elif is_losses(band):
            if read_row(band, self.table, self.book):
                self.book.classes[band.address] = "recomputed"
        elif section == "8":
            self._line(read_line(band))
        elif "formula" in band.head and any(g.serif and g.bold for g in band.column(*RESULT)):
            raise Unread("a result without an address")
        else:
            worked(band, self.table, self.book)
            self.known |= listed_symbols(band)
            self.conversions |= {row.label: row for row in listed(band, self.book)}

    def _line(self, line: Line) -> None:
        self.book.classes[line.address] = recompute(line, self.book)
        self.book.enter(line.address, [line.record])
        if match := LISTED.search(line.source):
            self.converting.append((line, match[1]))

    def closed(self, found: Sequence[Sheet]) -> Report:
        """The report, after the checks that need the whole."""
        book = self.book
        for row in self.inputs:
            settle(row, book)
        for line, label in self.converting:
            listed_as, units = self.conversions.get(label), (line.operands[0].quantity.unit, line.record.unit)
            if listed_as is None or (listed_as.before, listed_as.after) != units:
                book.note(line.sheet, line.address, f"{label} is not its conversion in the list", " to ".join(units))
        book.findings += [finding for _, finding in book.aside.values()]
        self._addresses()
        check_symbols(self.known, book)
        check_cover(found[0], found[1] if len(found) > 1 else None, self.rules, book)
        for sheet in found:
            check_visible(sheet, book)
            check_strip(sheet, len(found), book)
        kinds = Counter(book.classes.values())
        return Report(
            len(found), kinds["recomputed"], kinds["bracketed"], kinds["looked up"] + kinds["tabulated"],
            kinds["looked up"], len(self.inputs), len(self.rules),
            tuple(book.unread), tuple(book.findings),
        )  # fmt: skip

    def _addresses(self) -> None:
        """Addresses of a section run 1, 2, 3 … without a gap or a repetition."""
        next_in: Counter[str] = Counter()
        for sheet, address in self.order:
            section, _, number = address.partition(".")
            next_in[section] += 1
            if int(number) != next_in[section]:
                self.book.note(sheet, address, "addresses do not run on", address, f"{section}.{next_in[section]}")
                next_in[section] = int(number)
