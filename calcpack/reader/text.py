"""Running text read by geometry: rows of glyphs, words, and the numbers in them."""

from __future__ import annotations

import re
from collections.abc import Iterable, Sequence
from dataclasses import dataclass
from decimal import Decimal

from .failures import Unread
from .glyphs import Glyph
from .notation import DIGIT_GAP
from .tree import Symbol

#: Baselines nearer than this are one row (points): raised digits reach 3.8 up, rows are 9.4 apart at least.
ROW = 4.2
WORD = 0.13  # narrowest gap between words (em)
ASKEW = "\ufffd"
THIN = "\u202f"  # stands for the gap inside a number
_RAISED = dict(zip("0123456789−", "⁰¹²³⁴⁵⁶⁷⁸⁹⁻", strict=True))
_LEVEL = str.maketrans({raised: level.replace("−", "-") for level, raised in _RAISED.items()})
_DIGITS = rf"\d(?:{THIN}?\d)*"
_NUMBER = re.compile(rf"([+−-]?)({_DIGITS}(?:\.{_DIGITS})?)(?:×10(⁻?[⁰¹²³⁴⁵⁶⁷⁸⁹]{{1,4}}))?(?![\d.⁰¹²³⁴⁵⁶⁷⁸⁹])")


@dataclass(frozen=True)
class Row:
    """Glyphs of one baseline from left to right, raised and lowered ones with them."""

    y: float
    glyphs: tuple[Glyph, ...]

    def __str__(self) -> str:
        return text(self.glyphs)


def rows(glyphs: Iterable[Glyph]) -> list[Row]:
    """``glyphs`` sorted into rows from the top."""
    near: dict[int, list[tuple[float, list[Glyph]]]] = {}
    for g in sorted(glyphs, key=lambda g: -g.size):
        at = int(g.y // ROW)
        close = [row for i in (at - 1, at, at + 1) for row in near.get(i, ()) if abs(row[0] - g.y) < ROW]
        if close:
            min(close, key=lambda row: abs(row[0] - g.y))[1].append(g)
        else:
            near.setdefault(at, []).append((g.y, [g]))
    found = sorted((row for each in near.values() for row in each), key=lambda row: -row[0])
    return [Row(y, tuple(sorted(row, key=lambda g: g.x))) for y, row in found]


def text(glyphs: Sequence[Glyph]) -> str:
    """The characters of one row: words parted by spaces, gaps in numbers by ``THIN``."""
    if not glyphs:
        return ""
    size, out = max(g.size for g in glyphs), ""
    y = next(g.y for g in glyphs if g.size == size)
    for before, g in zip((None, *glyphs), glyphs, strict=False):
        if before is not None and g.x - before.end > WORD * before.size:
            gap = g.x - before.end
            inside = (before.char + g.char).isdigit() and gap <= DIGIT_GAP * max(before.size, g.size)
            out += THIN if inside else " "
        out += _shown(g, (g.y - y) / (size or 1.0), small=g.size < 0.85 * size)
    return out


def _shown(g: Glyph, rise: float, small: bool) -> str:
    """A character of a row: itself, raised, or a mark that nothing reads where it stands askew."""
    if abs(rise) < 0.08 and not small:
        return g.char
    if rise > 0.15 and small:
        return _RAISED.get(g.char, g.char)
    return g.char if rise < -0.08 and small else ASKEW


def words(glyphs: Iterable[Glyph]) -> str:
    """Several rows as one text."""
    return " ".join(map(str, rows(glyphs)))


def scalar(printed: str) -> tuple[Decimal, str]:
    """The number at the beginning of ``printed``, its digits kept, and what follows.  Raises ``Unread``."""
    match = _NUMBER.match(printed)
    if match is None:
        raise Unread(f"no number in {printed!r}" if printed else "no number printed")
    sign, digits, power = match.groups()
    value = Decimal(digits.replace(THIN, ""))
    if power:
        value = value.scaleb(int(power.translate(_LEVEL)))
    return value.copy_negate() if sign in ("−", "-") else value, printed[match.end() :].strip()


def is_number(printed: str) -> bool:
    """Whether ``printed`` is one number and nothing else."""
    return _NUMBER.fullmatch(printed) is not None


def symbol(glyphs: Sequence[Glyph]) -> Symbol:
    """The symbol that serif ``glyphs`` print: its base of the full size, its subscript smaller."""
    if not glyphs:
        raise Unread("no symbol printed")
    size = max(g.size for g in glyphs)
    base = "".join(g.char for g in glyphs if g.size > 0.85 * size)
    return Symbol(base, "".join(g.char for g in glyphs if g.size <= 0.85 * size))
