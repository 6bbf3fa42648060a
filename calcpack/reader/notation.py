"""Two-dimensional notation: glyphs and bars of one form become a tree.

The widest bar is taken first: what stands within it from left to right belongs to its fraction or root.  What
is left is read from left to right by baseline and size: level, raised (an exponent) or lowered (a subscript).
"""

from __future__ import annotations

from collections.abc import Sequence
from dataclasses import dataclass
from decimal import Decimal

from .failures import Unread
from .glyphs import Bar, Glyph
from .grammar import Parser, Token
from .tree import PI, Number, Op, Symbol, Tree

#: Size of a form's parts by depth of raising, in parts of the body size.
SCALES = (1.0, 0.7, 0.55)
AXIS = 0.328  # height of a fraction's bar over its baseline (em)
LEVEL = 0.06  # how far two baselines may lie apart and still be one (em)
DIGIT_GAP = 0.25  # widest gap inside a number (em)
TIGHT = 0.07  # widest gap before the × of a power of ten (em)
NAME_GAP = 0.01  # widest gap inside a name (em): an italic f leans over all of a thin gap but 0.02
NAMES = {"ln", "exp", "max", "min", "log"}


@dataclass(frozen=True)
class Fraction:
    """A bar with what stands over and under it."""

    bar: Bar
    over: Marks
    under: Marks


@dataclass(frozen=True)
class Root:
    """A root sign with what stands under its bar."""

    sign: Glyph
    bar: Bar
    inside: Marks


@dataclass(frozen=True)
class Marks:
    """Glyphs and bars that belong together, not yet read."""

    glyphs: tuple[Glyph, ...]
    bars: tuple[Bar, ...] = ()


Item = Glyph | Fraction | Root


def read(marks: Marks, body: float, depth: int = 0) -> Tree:
    """The tree that ``marks`` print, at ``depth`` raisings under ``body`` size.  Raises :class:`Unread`."""
    return _read(items(marks), body, depth)


def items(marks: Marks) -> list[Item]:
    """The outermost parts from left to right: glyphs under no bar, fractions and roots."""
    found: list[Item] = []
    glyphs, bars = list(marks.glyphs), sorted(marks.bars, key=lambda b: -b.width)
    while bars:
        bar = bars.pop(0)
        inner = [b for b in bars if bar.left <= (b.left + b.right) / 2 <= bar.right]
        content = [g for g in glyphs if bar.left <= g.middle <= bar.right]
        bars = [b for b in bars if b not in inner]
        glyphs = [g for g in glyphs if g not in content]
        sign = next((g for g in glyphs if g.char == "√" and meets(g, bar)), None)
        if sign is not None:
            glyphs.remove(sign)
            found.append(Root(sign, bar, Marks(tuple(content), tuple(inner))))
        else:
            found.append(_fraction(bar, content, inner))
    return sorted([*found, *glyphs], key=_left)


def meets(sign: Glyph, bar: Bar) -> bool:
    """Whether ``bar`` goes on from the top of a root sign."""
    near = 0.12 * sign.size
    return abs(sign.top - bar.top) < near and abs(sign.right - bar.left) < near


def _fraction(bar: Bar, glyphs: Sequence[Glyph], bars: Sequence[Bar]) -> Fraction:
    above = [g for g in glyphs if (g.bottom + g.top) / 2 > bar.axis]
    below = [g for g in glyphs if g not in above]
    if not above or not below:
        raise Unread("a bar without something over it and under it")
    over = Marks(tuple(above), tuple(b for b in bars if b.axis > bar.axis))
    return Fraction(bar, over, Marks(tuple(below), tuple(b for b in bars if b.axis <= bar.axis)))


def _left(item: Item) -> float:
    if isinstance(item, Glyph):
        return item.x
    return item.bar.left if isinstance(item, Fraction) else item.sign.x


def baseline(parts: Sequence[Item], size: float) -> float:
    """The baseline of a row of ``size``: that of its first plain glyph, or its first fraction's.

    Brackets and root signs are stretched, so they do not tell.
    """
    for item in parts:
        if isinstance(item, Fraction):
            return item.bar.axis - AXIS * size
        if isinstance(item, Root):
            return baseline(items(item.inside), size)
        if item.char not in "()":
            return item.y
    raise Unread("nothing but brackets")


def _read(parts: Sequence[Item], body: float, depth: int) -> Tree:
    if not parts:
        raise Unread("nothing printed where a term belongs")
    return Parser(_Row(parts, body, depth).tokens()).whole()


class _Row:
    """One row of items at one depth, cut into tokens."""

    def __init__(self, parts: Sequence[Item], body: float, depth: int) -> None:
        self.parts, self.body, self.depth = parts, body, depth
        self.size = body * SCALES[min(depth, 2)]
        self.y = baseline(parts, self.size)
        self.at = 0

    def height(self, item: Item) -> int:
        """0 for an item on the row's baseline, 1 raised, -1 lowered."""
        match item:
            case Fraction():
                rise = item.bar.axis - AXIS * self.size - self.y
            case Root() | Glyph(char="(" | ")"):
                low = item.sign.bottom if isinstance(item, Root) else item.bottom
                return 1 if low > self.y + 0.1 * self.size else 0
            case _:
                rise = item.y - self.y
        if abs(rise) > LEVEL * self.size:
            return 1 if rise > 0 else -1
        if isinstance(item, Glyph) and abs(item.size - self.size) > 0.02 * self.size:
            raise Unread(f"{item.char!r} of another size on the baseline")
        return 0

    def peek(self, height: int = 0) -> Item | None:
        """The next item where it stands at ``height``."""
        if self.at < len(self.parts) and self.height(self.parts[self.at]) == height:
            return self.parts[self.at]
        return None

    def glyph(self, chars: str = "") -> Glyph | None:
        """The next item where it is a level glyph, one of ``chars`` if given."""
        item = self.peek()
        return item if isinstance(item, Glyph) and (not chars or item.char in chars) else None

    def tokens(self) -> list[Token]:
        found: list[Token] = []
        while self.at < len(self.parts):
            found.append(self.token())
        return found

    def token(self) -> Token:
        if self.peek(1) is not None:
            return Token("power", _read(self.taken(1), self.body, self.depth + 1))
        item = self.peek()
        if item is None:
            raise Unread("a lowered mark without a symbol before it")
        if isinstance(item, Glyph) and item.char in "0123456789.":
            return Token("number", Number(self.number()))
        if isinstance(item, Glyph) and item.char.isalpha():
            return self.word()
        self.at += 1
        if isinstance(item, Fraction):
            over = read(item.over, self.body, self.depth)
            return Token("tree", Op("/", (over, read(item.under, self.body, self.depth))))
        if isinstance(item, Root):
            return Token("tree", Op("sqrt", (read(item.inside, self.body, self.depth),)))
        if item.char not in "+−×(),":
            raise Unread(f"the sign {item.char!r} is outside the notation")
        return Token(item.char)

    def taken(self, height: int) -> list[Item]:
        """All next items that stand at ``height``."""
        start = self.at
        while self.peek(height) is not None:
            self.at += 1
        return list(self.parts[start : self.at])

    def number(self) -> Decimal:
        """Digits with gaps of threes, and a power of ten set tight against them."""
        digits, last = "", None
        while (g := self.glyph("0123456789.")) and (last is None or g.x - last.end <= DIGIT_GAP * self.size):
            digits, last, self.at = digits + g.char, g, self.at + 1
        assert last is not None, "called on a digit"
        value, exponent = decimal(digits), 0
        times = self.glyph("×")
        if times is not None and times.x - last.end < TIGHT * self.size:
            self.at += 1
            ten = [self.glyph("1"), None]
            self.at += 1
            ten[1] = self.glyph("0")
            self.at += 1
            raised = self.taken(1)
            text = "".join(g.char for g in raised if isinstance(g, Glyph)).replace("−", "-")
            if None in ten or len(text) != len(raised) or not text.lstrip("-").isdigit() or len(text) > 5:
                raise Unread("a power of ten that is none")
            exponent = int(text)
        return value.scaleb(exponent)

    def word(self) -> Token:
        """A symbol with its subscript, or the name of a function before its bracket."""
        letters: list[Glyph] = []
        while (
            (g := self.glyph()) and g.char.isalpha() and (not letters or g.x - letters[-1].end < NAME_GAP * self.size)
        ):
            letters.append(g)
            self.at += 1
        base = "".join(g.char for g in letters)
        if not all(g.serif for g in letters):
            raise Unread(f"{base!r} in a foreign face")
        sub = "".join(g.char if isinstance(g, Glyph) else "?" for g in self.taken(-1))
        upright = not any(g.italic for g in letters)
        if upright and base == "Σ" and not sub:
            return Token("sum")
        if upright and base == PI.base and not sub:
            return Token("tree", PI)
        if upright and base in NAMES and sub == ("10" if base == "log" else "") and self.glyph("("):
            return Token("function", name=base + sub)
        return Token("symbol", Symbol(base, sub))


def decimal(digits: str) -> Decimal:
    """Plain digits with at most one point.  Raises :class:`Unread`."""
    if digits.count(".") > 1 or not digits.strip("."):
        raise Unread(f"{digits!r} is no number")
    return Decimal(digits)
