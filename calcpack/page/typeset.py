"""Formulas: a tree set as boxes.

What is printed is the tree, nothing simplified: fractions built up, roots drawn, parentheses where the tree needs
them.  In a formula of numbers every product shows ``×``; among symbols a thin gap stands for it, as the trade writes.
"""

from __future__ import annotations

from collections.abc import Mapping
from dataclasses import dataclass

from ..formula import Bin, Call, Cmp, Name, Neg, Node, Num
from ..number import MINUS
from . import boxes
from .boxes import Bar, Box
from .metrics import ITALIC, REGULAR, Face, glyph
from .numerals import SERIF_GAP, numeral

#: Size of the body of a formula, and of raised and lowered parts by depth, in parts of it.
SIZE = 10.0
SCALES = (1.0, 0.7, 0.55)
AXIS = 0.328  # height of the minus sign of the serif, where bars of fractions lie
RULE = 0.06  # thickness of bars
STRUT_UP, STRUT_DOWN = 0.67, 0.02  # height of a digit: keeps neighbouring fractions level
RELATIONS = {">=": "≥", "<=": "≤", ">": ">", "<": "<", "==": "="}
#: How closely each operator binds.
LEVEL = {"+": 1, "-": 1, "*": 2, "/": 3, "**": 4}


@dataclass(frozen=True)
class Display:
    """How a symbol is written."""

    base: str
    sub: str
    upright: bool


@dataclass(frozen=True)
class Setter:
    """Sets trees at one body size; ``names`` are the symbols, ``numeric`` says that products show ``×``."""

    names: Mapping[str, Display]
    numeric: bool = False
    size: float = SIZE

    def em(self, depth: int) -> float:
        """The font size at ``depth`` raisings."""
        return self.size * SCALES[min(depth, 2)]

    def tree(self, node: Node, level: int = 0, depth: int = 0, first: bool = True) -> Box:
        """The box of ``node``; parenthesised where it binds weaker than ``level``.

        ``first`` says that nothing stands before it, so that a leading minus needs no parentheses.
        """
        match node:
            case Num(t):
                return self._number(t, level, depth)
            case Name("pi"):
                return boxes.text("π", REGULAR, self.em(depth))
            case Name(name):
                return self.symbol(name, depth)
            case Neg(x):
                inner = boxes.row([self._sign(MINUS, depth), self.tree(x, 2, depth, False)])
                return inner if first and level <= 2 else self.parenthesised(inner, depth)
            case Call("sqrt", (x,)):
                box = self._root(x, depth)
                return self.parenthesised(box, depth) if level > LEVEL["**"] else box
            case Call(fn, args):
                return self._call(fn, args, level, depth)
            case Bin("/", a, b):
                box = self._fraction(a, b, depth)
                return self.parenthesised(box, depth) if level > LEVEL["/"] else box
            case Bin("**", a, b):
                box = self._power(a, b, depth)
                return self.parenthesised(box, depth) if level > LEVEL["**"] else box
            case Bin(op, a, b):
                own = LEVEL[op]
                left = self.tree(a, own, depth, first or level > own)
                box = boxes.row([left, *self.joined(op, a, b, depth)])
                return self.parenthesised(box, depth) if level > own else box
            case Cmp(op, a, b):
                return boxes.row([self.tree(a), self.relation(op), self.tree(b)])

    def joined(self, op: str, a: Node, b: Node, depth: int) -> list[Box]:
        """The operator between ``a`` and ``b``, and ``b``."""
        right = self.tree(b, LEVEL[op] + 1, depth, False)
        if op == "*" and not (self.numeric or _starts_with_number(b)):
            return [boxes.gap(0.17 * self.em(depth)), right]
        return [self._sign({"+": "+", "-": MINUS, "*": "×"}[op], depth, (0.2, 0.17)[op == "*"]), right]

    def relation(self, op: str) -> Box:
        """A relation sign with its spaces."""
        return self._sign(RELATIONS[op], 0, 0.28)

    def _sign(self, sign: str, depth: int, space: float = 0.0) -> Box:
        em = self.em(depth)
        side = boxes.gap(em * (space if depth == 0 else space * 0.6))
        return boxes.row([side, boxes.text(sign, REGULAR, em), side])

    def symbol(self, name: str, depth: int = 0) -> Box:
        """A symbol of the nomenclature with its subscript."""
        shown, em = self.names[name], self.em(depth)
        parts = [boxes.text(run, face, em) for run, face in runs(shown)]
        if shown.sub:
            lean = 0.0 if shown.upright else 0.02
            parts.append(boxes.text(shown.sub, REGULAR, self.em(depth + 1)).moved(lean * em, -0.17 * em))
            parts.append(boxes.gap(0.03 * em))
        return boxes.row(parts)

    def _number(self, value: str, level: int, depth: int) -> Box:
        n, em = numeral(value), self.em(depth)
        parts = [boxes.text(n.text(SERIF_GAP), REGULAR, em)]
        if n.exponent:
            tight = boxes.gap(0.04 * em)
            parts += [
                tight,
                boxes.text("×10", REGULAR, em),
                self._raised(boxes.text(n.power, REGULAR, self.em(depth + 1)), em),
            ]
        box = boxes.row(parts)
        weak = (n.negative and self.numeric) or (bool(n.exponent) and level >= LEVEL["**"])
        return self.parenthesised(box, depth) if weak else box

    def _raised(self, box: Box, em: float, under: float = 0.0) -> Box:
        return box.moved(0.02 * em, max(0.36 * em, under - 0.42 * em))

    def _power(self, base: Node, exponent: Node, depth: int) -> Box:
        em = self.em(depth)
        below = self.tree(base, LEVEL["**"] + 1, depth, False)
        above = self.tree(exponent, 0, depth + 1)
        lift = max(0.36 * em, below.ascent - 0.42 * em, above.descent + 0.28 * em)
        return boxes.row([below, above.moved(0.03 * em, lift), boxes.gap(0.05 * em)])

    def _fraction(self, a: Node, b: Node, depth: int) -> Box:
        em = self.em(depth)
        top, bottom = self.tree(a, 0, depth), self.tree(b, 0, depth)
        nested = any(isinstance(n, Bin) and n.op == "/" for n in (a, b))
        over = (0.16 if nested else 0.06) * em
        bar, side = max(top.width, bottom.width) + 2 * over, 0.06 * em
        half, clear = RULE * em / 2, 0.13 * em
        up = AXIS * em + half + clear + max(top.descent, STRUT_DOWN * em)
        down = AXIS * em - half - clear - max(bottom.ascent, STRUT_UP * em)
        middle = side + bar / 2
        parts = [
            top.moved(middle - top.width / 2, up),
            bottom.moved(middle - bottom.width / 2, down),
            Box(bar, 0.0, 0.0, (), (Bar(side, AXIS * em - half, bar, RULE * em),)),
        ]
        return boxes.overlaid(parts, bar + 2 * side)

    def _root(self, x: Node, depth: int) -> Box:
        em = self.em(depth)
        inside, sign = self.tree(x, 0, depth), glyph(REGULAR, "√")
        top = max(inside.ascent, STRUT_UP * em) + 0.12 * em + RULE * em
        bottom = max(inside.descent, -sign.bottom * em)
        grown = max(1.0, (top + bottom) / ((sign.top - sign.bottom) * em))
        wide = min(grown**0.5, 1.35)
        root = boxes.tall("√", REGULAR, em * wide, grown / wide, top - sign.top * em * grown)
        start = sign.right * em * wide - 0.03 * em
        bar = Bar(start, top - RULE * em, root.width - start + inside.width + 0.1 * em, RULE * em)
        body = boxes.row([root, inside, boxes.gap(0.14 * em)])
        return Box(body.width, max(body.ascent, top), body.descent, body.runs, (*body.bars, bar))

    def parenthesised(self, inner: Box, depth: int) -> Box:
        """``inner`` in round brackets."""
        left, right = self.brackets(inner, depth)
        return boxes.row([left, inner, right])

    def brackets(self, inner: Box, depth: int) -> tuple[Box, Box]:
        """Round brackets around ``inner``, real glyphs stretched to its height."""
        em, sign = self.em(depth), glyph(REGULAR, "(")
        if inner.ascent <= 0.95 * em and inner.descent <= 0.38 * em:
            return boxes.text("(", REGULAR, em), boxes.text(")", REGULAR, em)
        natural = (sign.top - sign.bottom) * em
        grown = max(1.0, (inner.ascent + inner.descent + 0.12 * em) / natural)
        wide = min(grown**0.5, 1.4)
        foot = -inner.descent - 0.06 * em - sign.bottom * em * grown
        left, right = (boxes.tall(c, REGULAR, em * wide, grown / wide, foot) for c in "()")
        return left, right

    def _call(self, fn: str, args: tuple[Node, ...], level: int, depth: int) -> Box:
        em = self.em(depth)
        if fn == "sum":
            box = boxes.row([boxes.text("Σ", REGULAR, em), boxes.gap(0.1 * em), self.tree(args[0], 2, depth, False)])
            return self.parenthesised(box, depth) if level >= 2 else box
        parts = []
        for x in args:
            parts += [self.tree(x, 0, depth), boxes.row([boxes.text(",", REGULAR, em), boxes.gap(0.25 * em)])]
        name = [boxes.text("log" if fn == "log10" else fn, REGULAR, em)]
        if fn == "log10":
            name.append(boxes.text("10", REGULAR, self.em(depth + 1)).moved(0.02 * em, -0.17 * em))
        box = boxes.row([*name, boxes.gap(0.06 * em), self.parenthesised(boxes.row(parts[:-1]), depth)])
        return self.parenthesised(box, depth) if level >= LEVEL["**"] else box


def runs(shown: Display) -> list[tuple[str, Face]]:
    """The base of a symbol as (characters, face): variables italic, difference signs and words upright."""
    if shown.upright:
        return [(shown.base, REGULAR)]
    if len(shown.base) > 1 and shown.base[0] in "ΔΣ":
        return [(shown.base[0], REGULAR), (shown.base[1:], ITALIC)]
    return [(shown.base, ITALIC)]


def _starts_with_number(node: Node) -> bool:
    match node:
        case Num():
            return True
        case Bin("*" | "**", a, _):
            return _starts_with_number(a)
        case Bin("/", a, b):
            # A fraction of plain numbers beside a symbol reads as one number; the sign keeps them apart.
            return isinstance(a, Num) and isinstance(b, Num)
    return False
