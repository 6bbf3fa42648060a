"""A formula picture: its rows, its relation signs, and the forms they begin."""

from __future__ import annotations

from collections.abc import Sequence
from dataclasses import dataclass

from .failures import Unread
from .glyphs import Bar, Glyph
from .notation import Marks, baseline, items, meets, read
from .tree import Tree

RELATIONS = "=≥≤><"
#: Clear space that separates two rows, less what the ink of a curved glyph takes of it (points).
CLEAR = 1.8
#: Height of a fraction's bar, and how far at least the ink of its terms reaches away from it (em).
RULE, ABOVE, BELOW = 0.06, 0.3, 0.4


@dataclass(frozen=True)
class Form:
    """Left side, relation sign and right side; ``left`` is None where the sign begins the form."""

    left: Tree | None
    relation: str
    right: Tree


@dataclass(frozen=True)
class _Part:
    """What belongs to one relation sign: marks to its left, and to its right row by row."""

    sign: Glyph
    left: Marks
    rows: list[Marks]


def forms(marks: Marks) -> list[Form]:
    """The forms of a picture in the order of print.  Raises :class:`~calcpack.reader.failures.Unread`."""
    signs = [g for g in marks.glyphs if g.char in RELATIONS]
    if not signs:
        raise Unread("no relation sign")
    body = signs[0].size
    if any(abs(g.size - body) > 0.02 * body for g in signs):
        raise Unread("relation signs of different sizes")
    parts: list[_Part] = []
    for row in rows(marks):
        parts += _parts(row, parts)
    return [_form(part, body) for part in parts]


def rows(marks: Marks) -> list[Marks]:
    """The rows of a picture from the top, parted by clear space.

    A fraction's bar counts with the space to its terms, which is no space between rows.
    """
    signs = [g for g in marks.glyphs if g.char == "√"]
    reach = [(g.top, g.bottom) for g in marks.glyphs]
    for bar in marks.bars:
        em = 0.0 if any(meets(sign, bar) for sign in signs) else bar.height / RULE
        reach.append((bar.top + ABOVE * em, bar.bottom - BELOW * em))
    reach.sort(reverse=True)
    cuts, low = [], reach[0][1]
    for top, bottom in reach:
        if low - top > CLEAR:
            cuts.append((low + top) / 2)
        low = min(low, bottom)
    found = []
    for high, deep in zip([float("inf"), *cuts], [*cuts, float("-inf")], strict=True):
        glyphs = tuple(g for g in marks.glyphs if deep < g.top <= high)
        found.append(Marks(glyphs, tuple(b for b in marks.bars if deep < b.top <= high)))
    return found


def _parts(row: Marks, before: Sequence[_Part]) -> list[_Part]:
    """The forms that begin in ``row``; a row without a relation sign continues the last form ``before``."""
    signs = sorted((g for g in row.glyphs if g.char in RELATIONS), key=lambda g: g.x)
    if not signs:
        if not before:
            raise Unread("a row before the first relation sign")
        before[-1].rows.append(row)
        return []
    if any(abs(g.y - signs[0].y) > 0.5 for g in signs):
        raise Unread("two rows that cannot be parted")
    found, start = [], float("-inf")
    for sign, after in zip(signs, [*signs[1:], None], strict=True):
        end = after.x if after else float("inf")
        left = _between(row, start, sign.x) if start < 0 else Marks(())
        found.append(_Part(sign, left, [_between(row, sign.end - 0.01, end)]))
        start = sign.end
    return found


def _between(row: Marks, left: float, right: float) -> Marks:
    glyphs = tuple(g for g in row.glyphs if left <= g.x < right)
    return Marks(glyphs, tuple(b for b in row.bars if left <= b.left < right))


def _form(part: _Part, body: float) -> Form:
    right = Marks((), ())
    for row in part.rows:
        right = _joined(right, row, part.sign.y, body)
    left = read(part.left, body) if part.left.glyphs else None
    return Form(left, part.sign.char, read(right, body))


def _joined(before: Marks, row: Marks, y: float, body: float) -> Marks:
    """``row`` set behind ``before`` on the baseline ``y``."""
    if not row.glyphs:
        raise Unread("an empty row")
    if not before.glyphs:
        return row
    dy = y - baseline(items(row), body)
    parts: list[Glyph | Bar] = [*before.glyphs, *before.bars]
    edge = max(p.right for p in parts)
    dx = edge + 0.3 * body - min([*(g.x for g in row.glyphs), *(b.left for b in row.bars)])
    glyphs = tuple(
        g._replace(
            x=g.x + dx,
            end=g.end + dx,
            left=g.left + dx,
            right=g.right + dx,
            y=g.y + dy,
            bottom=g.bottom + dy,
            top=g.top + dy,
        )
        for g in row.glyphs
    )
    bars = tuple(
        b._replace(left=b.left + dx, right=b.right + dx, bottom=b.bottom + dy, top=b.top + dy) for b in row.bars
    )
    return Marks(before.glyphs + glyphs, before.bars + bars)
