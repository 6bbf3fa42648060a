"""What every sheet must show: its number, and nothing hidden, white or off the paper."""

from __future__ import annotations

import re

from .bands import INK, MM, paper_edge
from .book import Book
from .glyphs import Glyph, Sheet
from .text import rows, text

_STRIP = re.compile(r"sheet (\d+) of (\d+)")
_CHECK_COLUMN = 150.0
#: Sum of the three channels from which a colour is too light to be read on white.
_LIGHT = 3 * 0xC8


def strip(sheet: Sheet) -> tuple[int, int] | None:
    """The sheet number and the count that a sheet bears at its foot, in the check column."""
    low = paper_edge(sheet) + (_CHECK_COLUMN - 0.3) * MM
    foot = [g for g in sheet.glyphs if g.x >= low and g.y < 25 * MM and g.bold and g.colour == INK]
    match = next((m for row in rows(foot) if (m := _STRIP.fullmatch(str(row)))), None)
    return (int(match[1]), int(match[2])) if match else None


def check_strip(sheet: Sheet, count: int, book: Book) -> None:
    """Every sheet but the cover bears its number and the count of sheets."""
    printed = strip(sheet)
    if printed is None and sheet.number > 1:
        book.note(sheet.number, "", "no sheet number")
    elif printed not in (None, (sheet.number, count)):
        shown = "sheet {} of {}".format(*printed or ())
        book.note(sheet.number, "", "another sheet number", shown, f"sheet {sheet.number} of {count}")


def check_visible(sheet: Sheet, book: Book) -> None:
    """Text that a reader of the file finds and a reader of the paper does not."""
    faults: dict[str, list[Glyph]] = {}
    for g in sheet.glyphs:
        if g.left < -0.5 or g.right > sheet.width + 0.5 or g.bottom < -0.5 or g.top > sheet.height + 0.5:
            faults.setdefault("text off the paper", []).append(g)
        elif not g.drawn:
            faults.setdefault("text that is not filled with ink", []).append(g)
        elif sum(g.colour) >= _LIGHT:
            faults.setdefault("text too light to read", []).append(g)
    for what, glyphs in faults.items():
        book.note(sheet.number, "", what, text(tuple(rows(glyphs)[0].glyphs)), "nothing visible")
