"""What stands on a sheet: glyphs and filled rectangles with their places, as PDFium draws them.

Lengths in points, x from the left edge of the sheet, y upwards from its bottom edge.
"""

from __future__ import annotations

import ctypes
from collections.abc import Iterator
from dataclasses import dataclass
from typing import Any, NamedTuple

import pypdfium2 as pdfium
import pypdfium2.raw as c

from .failures import NotAPackage

Colour = tuple[int, int, int]


class Glyph(NamedTuple):
    """One character: pen position, end of its advance, reach of its ink, size across and up, font, colour.

    ``size`` is 0 where the text is turned or mirrored: such a glyph belongs to no line.
    """

    char: str
    x: float
    y: float
    end: float
    left: float
    bottom: float
    right: float
    top: float
    size: float
    height: float
    font: str
    colour: Colour
    drawn: bool

    @property
    def serif(self) -> bool:
        return "Serif" in self.font

    @property
    def italic(self) -> bool:
        return "Italic" in self.font

    @property
    def bold(self) -> bool:
        return "Semi" in self.font

    @property
    def middle(self) -> float:
        return (self.left + self.right) / 2


class Bar(NamedTuple):
    """A filled rectangle."""

    left: float
    bottom: float
    right: float
    top: float
    colour: Colour

    @property
    def width(self) -> float:
        return self.right - self.left

    @property
    def height(self) -> float:
        return self.top - self.bottom

    @property
    def axis(self) -> float:
        return (self.bottom + self.top) / 2


@dataclass(frozen=True)
class Sheet:
    """One page of the file; ``number`` counts from 1."""

    number: int
    width: float
    height: float
    glyphs: tuple[Glyph, ...]
    bars: tuple[Bar, ...]


def sheets(data: bytes) -> list[Sheet]:
    """Every page of a PDF.  Raises :class:`NotAPackage` where PDFium cannot open the file or a page of it."""
    try:
        document = pdfium.PdfDocument(data)
    except pdfium.PdfiumError:
        raise NotAPackage("a file that does not open as a PDF") from None
    try:
        return [_sheet(document, i) for i in range(len(document))]
    except pdfium.PdfiumError:
        raise NotAPackage("a PDF with a page that cannot be read") from None
    finally:
        document.close()


def _sheet(document: Any, index: int) -> Sheet:
    page = document[index]
    width, height = page.get_size()
    text = page.get_textpage()
    glyphs = tuple(_glyphs(text.raw))
    bars = tuple(_bars(page.raw, c.FPDFPage_CountObjects(page.raw), c.FPDFPage_GetObject, (1, 0, 0, 1, 0, 0)))
    text.close()
    page.close()
    return Sheet(index + 1, width, height, glyphs, bars)


#: A font's name, size, colour and whether it is drawn as filled glyphs: the same for all of a run of text.
_Style = tuple[str, float, Colour, bool]


def _glyphs(text: Any) -> Iterator[Glyph]:
    """The glyphs of a text page in the order drawn; blanks are left out, for places are measured."""
    styles: dict[int, _Style] = {}
    x, y = ctypes.c_double(), ctypes.c_double()
    left, right, bottom, top = (ctypes.c_double() for _ in range(4))
    loose, m = c.FS_RECTF(), c.FS_MATRIX()
    for i in range(c.FPDFText_CountChars(text)):
        code = c.FPDFText_GetUnicode(text, i)
        char = "-" if code == 2 else chr(code)  # 2: PDFium's mark for a hyphen at the end of a row
        if c.FPDFText_IsGenerated(text, i) == 1 or char.isspace():
            continue
        run = ctypes.cast(c.FPDFText_GetTextObject(text, i), ctypes.c_void_p).value or 0
        if run not in styles:
            styles[run] = _style(text, i)
        font, size, colour, drawn = styles[run]
        c.FPDFText_GetCharOrigin(text, i, x, y)
        c.FPDFText_GetCharBox(text, i, left, right, bottom, top)
        c.FPDFText_GetLooseCharBox(text, i, loose)
        c.FPDFText_GetMatrix(text, i, m)
        level = m.a > 0 and m.d > 0 and abs(m.b) + abs(m.c) < 1e-6
        across, up = (size * m.a, size * m.d) if level else (0.0, 0.0)
        yield Glyph(
            char,
            x.value,
            y.value,
            loose.right,
            left.value,
            bottom.value,
            right.value,
            top.value,
            across,
            up,
            font,
            colour,
            drawn,
        )


def _style(text: Any, i: int) -> _Style:
    name, flags = ctypes.create_string_buffer(128), ctypes.c_int()
    c.FPDFText_GetFontInfo(text, i, name, 128, flags)
    red, green, blue, alpha = (ctypes.c_uint() for _ in range(4))
    c.FPDFText_GetFillColor(text, i, red, green, blue, alpha)
    mode = c.FPDFTextObj_GetTextRenderMode(c.FPDFText_GetTextObject(text, i))
    drawn = mode == c.FPDF_TEXTRENDERMODE_FILL and alpha.value == 255
    font = name.value.decode("utf-8", "replace").partition("+")[2]
    return font, c.FPDFText_GetFontSize(text, i), (red.value, green.value, blue.value), drawn


_Matrix = tuple[float, float, float, float, float, float]


def _within(inner: Any, outer: _Matrix) -> _Matrix:
    """``inner`` applied first, then ``outer``."""
    a, b, d, e, f, g = outer
    return (
        inner.a * a + inner.b * d, inner.a * b + inner.b * e,
        inner.c * a + inner.d * d, inner.c * b + inner.d * e,
        inner.e * a + inner.f * d + f, inner.e * b + inner.f * e + g,
    )  # fmt: skip


def _bars(holder: Any, count: int, get: Any, outer: _Matrix) -> Iterator[Bar]:
    """Upright filled rectangles among the objects of a page or a form, forms opened."""
    matrix = c.FS_MATRIX()
    for i in range(count):
        item = get(holder, i)
        kind = c.FPDFPageObj_GetType(item)
        if kind not in (c.FPDF_PAGEOBJ_FORM, c.FPDF_PAGEOBJ_PATH):
            continue
        c.FPDFPageObj_GetMatrix(item, matrix)
        place = _within(matrix, outer)
        if kind == c.FPDF_PAGEOBJ_FORM:
            yield from _bars(item, c.FPDFFormObj_CountObjects(item), c.FPDFFormObj_GetObject, place)
        elif _filled(item) and (corners := _corners(item, place)):
            xs, ys = [p[0] for p in corners], [p[1] for p in corners]
            yield Bar(min(xs), min(ys), max(xs), max(ys), _colour(item))


def _filled(path: Any) -> bool:
    fill, stroke = ctypes.c_int(), ctypes.c_int()
    c.FPDFPath_GetDrawMode(path, fill, stroke)
    return fill.value != 0


def _corners(path: Any, place: _Matrix) -> list[tuple[float, float]]:
    """The corners of a path that is one upright rectangle, on the sheet; else nothing."""
    count = c.FPDFPath_CountSegments(path)
    if not 4 <= count <= 5:
        return []
    a, b, d, e, f, g = place
    x, y, found = ctypes.c_float(), ctypes.c_float(), []
    for i in range(count):
        segment = c.FPDFPath_GetPathSegment(path, i)
        if c.FPDFPathSegment_GetType(segment) not in (c.FPDF_SEGMENT_MOVETO, c.FPDF_SEGMENT_LINETO):
            return []
        c.FPDFPathSegment_GetPoint(segment, x, y)
        found.append((x.value * a + y.value * d + f, x.value * b + y.value * e + g))
    upright = len({round(p[0], 2) for p in found}) == 2 == len({round(p[1], 2) for p in found})
    return found if upright or _thin(found) else []


def _thin(corners: list[tuple[float, float]]) -> bool:
    """Whether rounding has made one side of a hairline vanish."""
    return min(max(p[i] for p in corners) - min(p[i] for p in corners) for i in (0, 1)) < 0.05


def _colour(item: Any) -> Colour:
    red, green, blue, alpha = (ctypes.c_uint() for _ in range(4))
    c.FPDFPageObj_GetFillColor(item, red, green, blue, alpha)
    return red.value, green.value, blue.value
