"""A line recomputed from what it prints."""

from __future__ import annotations

from collections import defaultdict
from decimal import ROUND_CEILING, ROUND_FLOOR, Decimal
from fractions import Fraction

from .arithmetic import decimal, exact, of_record, rounded, unit_of_record, value
from .book import Book, Class, Finding
from .factors import LISTED, same_factor
from .failures import Unread
from .line import Line
from .lookups import look_up, tabulated
from .picture import Form
from .tree import Number, Op, Symbol, Tree, Values, substituted, symbols
from .units import Quantity, converted


def recompute(line: Line, book: Book) -> Class:
    """Check everything a line prints and note in ``book`` what disagrees; the way it was checked is returned.

    Raises ``Unread`` or ``Undefined`` for a line that cannot be checked at all.
    """
    for operand in line.operands:
        book.cite(line.address, operand.address)
        wrong = book.citation(operand.quantity, operand.address) or book.renamed(operand.symbol, operand.address)
        if wrong:
            book.note(line.sheet, line.address, f"{operand.symbol} {wrong[0]}", *wrong[1:])
    _headline(line, book)
    if line.entry is not None:
        book.result(line.sheet, line.address, line.entry.symbol, line.record.unit)
        return tabulated(line, line.entry, book)
    first = line.forms[0]
    if isinstance(first.left, Symbol):
        book.result(line.sheet, line.address, first.left, line.record.unit)
    book.uses(line.sheet, line.address, (operand.symbol for operand in line.operands))
    if any(form.relation != "=" for form in line.forms):
        raise Unread("a line that is no equation")
    if line.residuals:
        _root(line, book)
        return "bracketed"
    if not isinstance(first.left, Symbol):
        raise Unread("the left side is no symbol")
    if len(line.forms) == 2 and line.forms[1].left is None:
        _equation(line, first, line.forms[1], book)
        return "recomputed"
    if len(line.forms) != 1:
        raise Unread(f"{len(line.forms)} forms")
    if len(line.operands) == 1 and "exact" in line.source:
        _conversion(line, first, book)
        return "recomputed"
    return look_up(line, first, book)


def operand_values(line: Line) -> Values:
    """Symbol -> the values printed for it, in order."""
    found: dict[Symbol, list[Decimal]] = defaultdict(list)
    for operand in line.operands:
        found[operand.symbol].append(operand.quantity.value)
    return found


def _headline(line: Line, book: Book) -> None:
    """The figure shown large is the result rounded to the nearest, or as a rule reports it further down."""
    shown, record = line.headline, line.record
    there = converted(Fraction(record.value), record.unit, shown.unit)
    found = Quantity(rounded(there, shown.value), shown.unit)
    if found.value == shown.value:
        return
    what = Finding(line.sheet, line.address, "the headline is not the result of record", str(shown), str(found))
    if shown.value in (rounded(there, shown.value, mode) for mode in (ROUND_FLOOR, ROUND_CEILING)):
        book.aside[line.address] = shown, what
    else:
        book.findings.append(what)


def _result(line: Line, found: Decimal, book: Book) -> None:
    if of_record(found) != line.record.value:
        book.note(
            line.sheet,
            line.address,
            "the form with numbers gives another result",
            line.record.value,
            of_record(found),
        )


def _substitution(line: Line, symbolic: Tree, numeric: Tree, book: Book) -> None:
    """The numbers stand where the symbols do, and every operand is in the formula."""
    if substituted(symbolic, operand_values(line)) != numeric:
        book.note(line.sheet, line.address, "the form with numbers is not the formula with its operands")
    idle = {operand.symbol for operand in line.operands} - set(symbols(symbolic))
    if idle:
        book.note(line.sheet, line.address, "an operand that the formula has not", ", ".join(map(str, idle)))


def _equation(line: Line, symbolic: Form, numeric: Form, book: Book) -> None:
    _substitution(line, symbolic.right, numeric.right, book)
    _result(line, value(numeric.right), book)


def _conversion(line: Line, form: Form, book: Book) -> None:
    """A conversion holds for its operand exactly, before it is rounded."""
    operand = line.operands[0].quantity
    if line.operands[0].symbol != form.left:
        book.note(line.sheet, line.address, "another symbol is converted", form.left, line.operands[0].symbol)
    right = converted(Fraction(operand.value), operand.unit, line.record.unit)
    printed = exact(form.right)
    if printed != right:
        book.note(
            line.sheet,
            line.address,
            "the conversion is not exact",
            decimal(printed).normalize(),
            decimal(right).normalize(),
        )
    if _first_number(form) != operand.value:
        book.note(line.sheet, line.address, "the form does not begin with its operand", form.right, operand)
    if LISTED.search(line.source) is None:
        book.note(line.sheet, line.address, "the conversion names no row of the list")
    if wrong := same_factor(line.source, operand.unit, line.record.unit):
        book.note(line.sheet, line.address, "the factor is not the exact one", *wrong)
    _result(line, decimal(printed), book)


def _first_number(form: Form) -> Decimal | None:
    tree = form.right
    while isinstance(tree, Op):
        tree = tree.args[0]
    return tree.value if isinstance(tree, Number) else None


def _root(line: Line, book: Book) -> None:
    """A root is proved by its residuals, of opposite sign half a unit of the last digit to either side."""
    if len(line.forms) != 2 or line.forms[0].left is None or line.forms[1].left is None:
        raise Unread("a root without both sides in symbols and in numbers")
    symbolic, numeric = (Op("-", (form.left, form.right)) for form in line.forms if form.left is not None)
    unknown = _unknown(line, symbolic)
    book.result(line.sheet, line.address, unknown, line.record.unit)
    _substitution(line, symbolic, numeric, book)
    root, half = line.record.value, unit_of_record(line.record.value) / 2
    signs = []
    labels = (f"{unknown.base} − ½ unit", f"root {unknown.base}", f"{unknown.base} + ½ unit")
    for row, place, label in zip(line.residuals, (root - half, root, root + half), labels, strict=True):
        printed = row.residual
        if (row.label, row.tried) != (label, place):
            found = f"{row.label} {row.tried}", f"{label} {place}"
            book.note(line.sheet, line.address, "a residual stands at another value", *found)
        residual = value(numeric, {unknown: place})
        signs.append(residual > 0)
        if rounded(residual, printed) != printed:
            book.note(
                line.sheet,
                line.address,
                f"the residual at {place} is another",
                printed,
                rounded(residual, printed),
            )
    if signs[0] == signs[2]:
        book.note(line.sheet, line.address, "the residual does not change sign across the root", root)


def _unknown(line: Line, symbolic: Op) -> Symbol:
    known = {operand.symbol for operand in line.operands}
    found = {s for s in symbols(symbolic) if s not in known}
    if len(found) != 1:
        raise Unread(f"{len(found)} unknowns in an equation solved by its root")
    return found.pop()
