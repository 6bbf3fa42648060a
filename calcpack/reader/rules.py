"""Section 9: rule checks.  Both sides are results cited, the numbers decide, the margin is their room."""

from __future__ import annotations

import operator
from collections.abc import Sequence
from dataclasses import dataclass, replace
from decimal import ROUND_CEILING, ROUND_FLOOR, ROUND_HALF_EVEN, Decimal
from fractions import Fraction

from .arithmetic import WIDE, of_record, rounded
from .bands import INK, SECOND, Band
from .book import Book
from .failures import Unread
from .glyphs import Glyph
from .line import cited, picture
from .picture import forms
from .text import rows, scalar, words
from .tree import Number, Symbol, symbols
from .units import Quantity, converted, factor, named

LEFT, RELATION, RIGHT, MARGIN = (68.0, 95.0), (95.0, 100.0), (100.0, 127.0), (127.0, 150.0)
TEXT = (20.0, 127.0)
VERDICTS = ("met", "not met", "not applicable", "not assessed")
#: Relation -> whether it holds between two numbers.
_HOLDS = {"≥": operator.ge, ">": operator.gt, "≤": operator.le, "<": operator.lt}
_OPPOSITE = {"≥": "<", "<": "≥", "≤": ">", ">": "≤"}


@dataclass(frozen=True)
class Side:
    """One side as reported, and the line it is taken from."""

    shown: Quantity
    address: str


@dataclass(frozen=True)
class Judged:
    """A rule as printed: its verdict, and both sides and the margin as shown large, where it has them."""

    verdict: str
    shown: tuple[Quantity, ...] = ()


def read_rule(band: Band, givens: dict[str, Quantity], book: Book) -> Judged:
    """Check one rule; ``givens`` are inputs as given, by the line that is used.

    Raises :class:`~calcpack.reader.failures.Unread`.
    """
    verdict, upper = _verdict(band)
    relation = words(upper.column(*RELATION))
    if not relation:
        if verdict == "met":
            book.note(band.sheet, band.address, "met without two sides to compare")
        return Judged(verdict)
    left, right = _side(upper.column(*LEFT)), _side(upper.column(*RIGHT))
    asked, sides = _pair(band, relation, left, right, book)
    rising = asked in "≥>"
    down, up = (ROUND_FLOOR, ROUND_CEILING) if sides[0] != sides[1] else (ROUND_HALF_EVEN, ROUND_HALF_EVEN)
    _reported(band, "left side", left, sides[0], down if rising else up, givens, book)
    _reported(band, "right side", right, sides[1], up if rising else down, givens, book)
    a, b = sides[0].value, sides[1].value
    if not _HOLDS[relation](a, b):
        book.note(band.sheet, band.address, "the numbers do not stand in the relation printed", f"{a} {relation} {b}")
    holds = _HOLDS[asked](a, b)
    if verdict == "not applicable" or (verdict != "not assessed" and (verdict == "met") != holds):
        what = "what is asked and the numbers give another verdict"
        book.note(band.sheet, band.address, what, verdict, "met" if holds else "not met")
    margin = _margin(upper, WIDE.subtract(a, b) if rising else WIDE.subtract(b, a), sides[1], book)
    return Judged(verdict, (left.shown, right.shown, margin))


def _verdict(band: Band) -> tuple[str, Band]:
    """The verdict's word, and what stands above its row."""
    for row in rows(g for g in band.column(*TEXT) if g.bold and not g.serif and g.colour == INK):
        word = str(row).partition(":")[0].lower()
        if word in VERDICTS:
            return word, replace(band, glyphs=tuple(g for g in band.glyphs if g.y > row.y + 5))
    raise Unread("no verdict")


def _side(glyphs: Sequence[Glyph]) -> Side:
    number, rest = scalar(words(g for g in glyphs if g.serif))
    if rest:
        raise Unread(f"{rest!r} after a side's number")
    unit = named(words(g for g in glyphs if not g.serif and g.colour == INK))
    return Side(Quantity(number, unit), cited(glyphs))


def _pair(band: Band, relation: str, left: Side, right: Side, book: Book) -> tuple[str, tuple[Quantity, Quantity]]:
    """The relation asked for, and the two numbers compared, each the result of the line its side cites.

    The numbers stand in the ``relation`` they have: the one asked for, or its opposite.
    """
    found = forms(picture(band, *TEXT))
    if len(found) != 2:
        raise Unread("no pair of what is asked and what is so")
    asked = found[0].relation
    if asked not in _HOLDS or relation not in (asked, _OPPOSITE[asked]):
        raise Unread(f"the relation {relation!r} beside {asked!r}")
    if found[1].relation != relation:
        book.note(band.sheet, band.address, "two relations are printed", relation, found[1].relation)
    book.uses(
        band.sheet,
        band.address,
        (s for form in found for t in (form.left, form.right) if t for s in symbols(t)),
    )
    sides = []
    for of, printed, side in ((found[0].left, found[1].left, left), (found[0].right, found[1].right, right)):
        if not isinstance(printed, Number) or not isinstance(of, Symbol):
            raise Unread("a comparison of something else than two values")
        known = book.values.get(side.address, ())
        unit = known[0].unit if known else ""
        wrong = book.citation(Quantity(printed.value, unit), side.address) or book.renamed(of, side.address)
        if wrong:
            book.note(band.sheet, band.address, f"the comparison {wrong[0]}", *wrong[1:])
        sides.append(Quantity(printed.value, unit))
    if sides[0].unit != sides[1].unit:
        raise Unread("two sides in different units")
    return asked, (sides[0], sides[1])


def _reported(
    band: Band, what: str, side: Side, record: Quantity, mode: str, givens: dict[str, Quantity], book: Book
) -> None:
    """A side is reported as its input was given, else rounded against the verdict."""
    book.reports(side.address, side.shown)
    if givens.get(side.address) == side.shown:
        return
    there = converted(Fraction(record.value), record.unit, side.shown.unit)
    found = rounded(there, side.shown.value, mode)
    if found != side.shown.value:
        shown = Quantity(found, side.shown.unit)
        book.note(band.sheet, band.address, f"the {what} is not the result of record", side.shown, shown)


def _margin(band: Band, room: Decimal, limit: Quantity, book: Book) -> Quantity:
    """The margin as shown, its per cent of the limit and its digits of record, each with its sign."""
    cell, margin = band.column(*MARGIN), of_record(room)
    shown = words(g for g in cell if g.bold)
    number, rest = scalar(shown)
    unit = named(rest)
    # The sixth digit of the record is no part of a margin: at three decimals more than shown it is rounded away first.
    room_shown = rounded(Fraction(margin) * factor(limit.unit, unit), number.scaleb(-3), ROUND_HALF_EVEN)
    found = rounded(Fraction(room_shown), number, ROUND_FLOOR)
    if found != number or not _signed(shown, margin):
        book.note(band.sheet, band.address, "the margin is another", shown, found)
    for row in map(str, rows(g for g in cell if g.colour == SECOND and not g.bold)):
        printed, name = scalar(row)
        if name == "%":
            per_cent = WIDE.divide(WIDE.multiply(margin, Decimal(100)), abs(limit.value))
            if rounded(per_cent, printed, ROUND_FLOOR) != printed or not _signed(row, margin):
                book.note(band.sheet, band.address, "the margin in per cent is another", row, per_cent)
        elif Quantity(printed, named(name)) != Quantity(margin, limit.unit) or not _signed(row, margin):
            book.note(band.sheet, band.address, "the margin of record is another", row, f"{margin} {limit.unit}")
    return Quantity(number, unit)


def _signed(printed: str, margin: Decimal) -> bool:
    """Whether a margin bears its sign: a minus where something is missing, else a plus."""
    return printed.startswith("−" if margin < 0 else "+")
