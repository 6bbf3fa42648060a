"""A printed line's formula: the symbolic form and the form with its numbers, aligned at the equals signs."""

from __future__ import annotations

from collections.abc import Mapping, Sequence
from dataclasses import dataclass
from functools import reduce

from .. import formula
from ..formula import Bin, Call, Cmp, Name, Neg, Node, Num
from . import boxes
from .boxes import Box
from .typeset import LEVEL, SIZE, Display, Setter

#: Width of the working column, 71 mm, in points.
MEASURE = 71 / 25.4 * 72
INK = "#16191C"
#: Body sizes tried in turn where a formula has a part that is too wide and cannot be broken.
SIZES = (SIZE, 9.0, 8.0, 7.0, 6.0, 5.0)
BESIDE = 16.0  # gap between the two forms when they share a row
INDENT = 10.0  # continuation rows, past the equals sign
LEADING = 2.6  # clear space between rows
ROW_UP, ROW_DOWN = 0.70, 0.22  # least reach of a row, in ems

Values = Mapping[str, str | Sequence[str]]


@dataclass(frozen=True)
class Setting:
    """A picture: SVG text, size and baseline (from the top) in points, and the formula in linear form."""

    svg: str
    width: float
    height: float
    baseline: float
    alt: str


def with_numbers(node: Node, values: Values) -> Node:
    """The tree with every symbol that ``values`` knows replaced by its printed number; a sum is written out."""
    match node:
        case Name(name) if name in values:
            value = values[name]
            return Num(value if isinstance(value, str) else value[0])
        case Neg(x):
            return Neg(with_numbers(x, values))
        case Bin(op, a, b):
            return Bin(op, with_numbers(a, values), with_numbers(b, values))
        case Cmp(op, a, b):
            return Cmp(op, with_numbers(a, values), with_numbers(b, values))
        case Call("sum", (Name(name),)) if name in values:
            value = values[name]
            terms: list[Node] = [Num(t) for t in ([value] if isinstance(value, str) else value)]
            return reduce(lambda a, b: Bin("+", a, b), terms)
        case Call(fn, args):
            return Call(fn, tuple(with_numbers(x, values) for x in args))
    return node


def line(
    symbol: str | None,
    tree: Node,
    values: Values | None,
    names: Mapping[str, Display],
    symbolic: bool = True,
    measure: float = MEASURE,
    found: str = "",
) -> Setting:
    """Set ``symbol = tree`` and below or beside it ``= tree with numbers``.

    ``symbol`` is None where the tree is itself a comparison; its numbers then stand in the relation ``found``.
    ``symbolic=False`` leaves the symbolic form out (a conversion).  Raises :class:`KeyError` for a symbol that ``names`` lacks.
    """
    numbers = None if values is None else with_numbers(tree, values)
    if isinstance(numbers, Cmp) and found:
        numbers = Cmp(found, numbers.a, numbers.b)
    forms = ([(tree, False)] if symbolic else []) + ([(numbers, True)] if numbers is not None else [])
    for size in SIZES:
        box = _rows(symbol, forms, names, size, measure)
        if box.width <= measure + 0.01:
            break
    return _picture(box, _linear(symbol, [form for form, _ in forms]))


def picture(parts: Sequence[Box], alt: str) -> Setting:
    """Loose boxes in one row as a picture."""
    return _picture(boxes.row(parts), alt)


def _picture(box: Box, alt: str) -> Setting:
    return Setting(boxes.svg(box, INK), box.width, box.ascent + box.descent, box.ascent, alt)


def _linear(symbol: str | None, forms: Sequence[Node]) -> str:
    written = [formula.text(form) for form in forms]
    if symbol is None:
        return "; ".join(written)
    return " = ".join([symbol, *written])


def _rows(
    symbol: str | None, forms: Sequence[tuple[Node, bool]], names: Mapping[str, Display], size: float, measure: float
) -> Box:
    """All rows of a line at one body size; may come out wider than ``measure``."""
    sides = []
    for tree, numeric in forms:
        setter = Setter(names, numeric, size)
        if isinstance(tree, Cmp):
            sides.append((setter.tree(tree.a), setter.relation(tree.op), _pieces(tree.b, setter)))
        else:
            head = setter.symbol(symbol) if symbol and not sides else boxes.gap(0)
            sides.append((head, setter.relation("=="), _pieces(tree, setter)))
    beside = _beside(sides)
    if symbol is not None and beside.width <= measure:
        return beside
    edge = max(left.width for left, _, _ in sides)
    rows: list[Box] = []
    for left, sign, pieces in sides:
        begin = edge + sign.width
        for i, part in enumerate(_broken(pieces, measure - begin, measure - begin - INDENT * size / SIZE)):
            if i == 0:
                rows.append(boxes.row([boxes.gap(edge - left.width), left, sign, part]))
            else:
                rows.append(boxes.row([boxes.gap(begin + INDENT * size / SIZE), part]))
    return _stacked(rows, size)


def _beside(sides: Sequence[tuple[Box, Box, list[Box]]]) -> Box:
    parts: list[Box] = []
    for i, (left, sign, pieces) in enumerate(sides):
        parts += [*([boxes.gap(BESIDE)] if i else []), left, sign, *pieces]
    return _stacked([boxes.row(parts)], SIZE)


def _stacked(rows: Sequence[Box], size: float) -> Box:
    """Rows under one another; the baseline is the first row's."""
    first, placed, pen = max(rows[0].ascent, ROW_UP * size), [], 0.0
    for i, row in enumerate(rows):
        up, down = max(row.ascent, ROW_UP * size), max(row.descent, ROW_DOWN * size)
        pen = pen - up - LEADING if i else 0.0
        placed.append(row.moved(0.0, pen))
        pen -= down
    box = boxes.overlaid(placed, max(r.width for r in rows))
    return Box(box.width, first, -pen, box.runs, box.bars)


def _pieces(tree: Node, setter: Setter, first: bool = True) -> list[Box]:
    """The tree in pieces that rows may part: its terms, each with its operator before it, and what a wide one falls into.

    ``first`` says that nothing stands before the tree, so that a leading minus needs no parentheses.
    """
    match tree:
        case Bin("+" | "-" as op, a, b):
            return [*_pieces(a, setter, first), *_joined(op, a, b, setter)]
        case Bin("*", a, b) if _wide(setter.tree(tree)):
            return [*_operand(a, 2, setter, first), *_joined("*", a, b, setter)]
    return [setter.tree(tree, 0 if first else 2, 0, first)]


def _wide(box: Box) -> bool:
    """Whether a box leaves rows too little room to stay whole."""
    return box.width > MEASURE * 0.75


def _joined(op: str, a: Node, b: Node, setter: Setter) -> list[Box]:
    """The operator between ``a`` and ``b`` and what ``b`` falls into, the first piece behind the operator."""
    operator, whole = setter.joined(op, a, b, 0)
    head, *rest = _operand(b, LEVEL[op] + 1, setter, False) if _wide(whole) else [whole]
    return [boxes.row([operator, head]), *rest]


def _operand(tree: Node, level: int, setter: Setter, first: bool) -> list[Box]:
    """The pieces of an operand of strength ``level``, in brackets where it binds weaker."""
    if isinstance(tree, Bin) and tree.op in "+-*" and LEVEL[tree.op] < level:
        first_piece, *more = _pieces(tree, setter)
        left, right = setter.brackets(boxes.row([first_piece, *more]), 0)
        if not more:
            return [boxes.row([left, first_piece, right])]
        return [boxes.row([left, first_piece]), *more[:-1], boxes.row([more[-1], right])]
    if isinstance(tree, Bin) and tree.op == "*":
        return _pieces(tree, setter, first)
    return [setter.tree(tree, level, 0, first)]


def _broken(pieces: list[Box], first: float, later: float) -> list[Box]:
    """Fill rows greedily, then with the same number of rows as evenly as can be."""
    rows = _filled(pieces, first, later)
    if len(rows) > 1:
        for cut in range(19, 9, -1):
            tighter = _filled(pieces, first * cut / 20, later * cut / 20)
            if len(tighter) > len(rows) or max(r.width for r in tighter) > max(first, later) * cut / 20:
                break
            rows = tighter
    return rows


def _filled(pieces: list[Box], first: float, later: float) -> list[Box]:
    rows: list[list[Box]] = [[pieces[0]]]
    room = first - pieces[0].width
    for piece in pieces[1:]:
        if piece.width > room:
            rows.append([])
            room = later
        rows[-1].append(piece)
        room -= piece.width
    return [boxes.row(r) for r in rows]
