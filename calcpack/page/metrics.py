"""The bundled fonts: which files, how wide a glyph is, how far it reaches, and which characters there are.

Widths come from the files that are embedded, so that a formula is laid out in the very glyphs that are printed.
"""

from __future__ import annotations

from dataclasses import dataclass
from functools import cache
from io import BytesIO
from pathlib import Path
from typing import Any

from ..resources import find_resource

SERIF = "Source Serif 4"
SANS = "Source Sans 3"


@dataclass(frozen=True)
class Face:
    """One bundled face, as CSS and SVG name it."""

    family: str
    style: str
    weight: int
    file: str


REGULAR = Face(SERIF, "normal", 400, "SourceSerif4-Regular.ttf")
ITALIC = Face(SERIF, "italic", 400, "SourceSerif4-Italic.ttf")
SEMIBOLD = Face(SERIF, "normal", 600, "SourceSerif4-SemiBold.ttf")
SANS_REGULAR = Face(SANS, "normal", 400, "SourceSans3-Regular.ttf")
SANS_ITALIC = Face(SANS, "italic", 400, "SourceSans3-Italic.ttf")
SANS_SEMIBOLD = Face(SANS, "normal", 600, "SourceSans3-SemiBold.ttf")
FACES = (REGULAR, ITALIC, SEMIBOLD, SANS_REGULAR, SANS_ITALIC, SANS_SEMIBOLD)


@dataclass(frozen=True)
class Glyph:
    """Advance width, lowest and highest point and right edge of the ink, all as parts of the font size."""

    advance: float
    bottom: float
    top: float
    right: float


def path(face: Face) -> Path:
    """The font file of ``face``."""
    return find_resource("templates", f"fonts/{face.file}")


@cache
def _font(face: Face) -> tuple[dict[int, str], Any, Any, float]:
    from fontTools.ttLib import TTFont  # only a page needs it

    font = TTFont(BytesIO(path(face).read_bytes()), lazy=True)
    return font.getBestCmap(), font["hmtx"], font["glyf"], font["head"].unitsPerEm


def covered(face: Face) -> frozenset[int]:
    """The code points of ``face``."""
    return frozenset(_font(face)[0])


@cache
def glyph(face: Face, character: str) -> Glyph:
    """The measures of one character.  Raises :class:`KeyError` where the face has none."""
    cmap, widths, outlines, em = _font(face)
    name = cmap[ord(character)]
    outline = outlines[name]
    empty = outline.numberOfContours == 0
    bottom, top, right = (0, 0, 0) if empty else (outline.yMin, outline.yMax, outline.xMax)
    return Glyph(widths[name][0] / em, bottom / em, top / em, right / em)


def width(face: Face, size: float, text: str) -> float:
    """The width of ``text`` without kerning, in the unit of ``size``; unknown characters count half an em."""
    cmap = _font(face)[0]
    return size * sum(glyph(face, c).advance if ord(c) in cmap else 0.5 for c in text)
