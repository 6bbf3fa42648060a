"""Sheets cut into bands by the rules across them, and bands into columns.

The working block is 176 mm wide; its left edge, from which every column counts, is 20 mm in on
A4 and 22 mm in on Letter.
"""

from __future__ import annotations

import re
from collections.abc import Iterable, Iterator
from dataclasses import dataclass

from .failures import NotAPackage
from .glyphs import Bar, Colour, Glyph, Sheet
from .text import rows, words

MM = 72 / 25.4
INK: Colour = (0x16, 0x19, 0x1C)
SECOND: Colour = (0x4A, 0x50, 0x55)
ACCENT: Colour = (0x14, 0x50, 0x5C)
#: Width and height of a paper and the left edge of its working block (mm).
PAPERS = ((210.0, 297.0, 20.0), (215.9, 279.4, 22.0))
NUMBER = (4.0, 14.0)  # the column of addresses
ADDRESS = re.compile(r"[1-9]\d?\.[1-9]\d{0,3}")
_SLACK = 0.3  # a column begins this much before its edge (mm)


@dataclass(frozen=True)
class Band:
    """What stands between two rules of a sheet; ``head`` is the text of the last column heads above it."""

    sheet: int
    edge: float
    head: str
    glyphs: tuple[Glyph, ...]
    bars: tuple[Bar, ...]

    def column(self, left: float, right: float) -> list[Glyph]:
        """The glyphs whose pen stands between two distances from the working block's edge (mm)."""
        low, high = self.edge + (left - _SLACK) * MM, self.edge + (right - _SLACK) * MM
        return [g for g in self.glyphs if low <= g.x < high]

    def inner_bars(self, left: float, right: float) -> list[Bar]:
        """The filled bars that begin between two distances from the working block's edge (mm)."""
        low, high = self.edge + (left - _SLACK) * MM, self.edge + (right - _SLACK) * MM
        return [b for b in self.bars if low <= b.left < high and b.height < 1.0]

    @property
    def address(self) -> str:
        """The address the band bears, or an empty text."""
        own = [g for g in self.column(*NUMBER) if not g.serif and g.bold and g.colour == INK]
        found = words(own)
        return found if ADDRESS.fullmatch(found) else ""


def paper_edge(sheet: Sheet) -> float:
    """The left edge of the working block (points).  Raises :class:`NotAPackage` for any other paper."""
    for width, height, edge in PAPERS:
        if abs(sheet.width - width * MM) < 1 and abs(sheet.height - height * MM) < 1:
            return edge * MM
    raise NotAPackage(f"a PDF whose sheet {sheet.number} is neither A4 nor Letter")


def bands(sheets: Iterable[Sheet]) -> Iterator[Band]:
    """Every band of every sheet in order of reading."""
    for sheet in sheets:
        edge, head = paper_edge(sheet), ""
        rules = sorted((b for b in sheet.bars if b.width > 120 * MM and b.height < 1.0), key=lambda b: -b.axis)
        for above, below in zip((None, *rules), (*rules, None), strict=True):
            high = above.axis if above else float("inf")
            low = below.axis if below else float("-inf")
            glyphs = tuple(g for g in sheet.glyphs if low < g.y < high)
            bars = tuple(b for b in sheet.bars if low < b.axis < high)
            band = Band(sheet.number, edge, head, glyphs, bars)
            if glyphs:
                yield band
            head = _head(band) or head


def _head(band: Band) -> str:
    """The column heads at the foot of a band, if it holds any: they begin with ``line`` or ``rule``."""
    found = ""
    for row in rows(g for g in band.glyphs if not g.serif and g.colour == SECOND):
        if row.glyphs[0].x < band.edge + NUMBER[1] * MM and str(row).split()[0] in ("line", "rule"):
            found = str(row)
    return found
