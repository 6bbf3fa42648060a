"""A sheet to draw on: millimetres, y downwards, fills first and text last, labels in the bundled sans."""

from __future__ import annotations

from dataclasses import dataclass, field
from html import escape
from typing import Literal

from . import metrics
from .glyphs import HAIR, INK, SECOND, TINT

PALE, ACCENT = "#E4ECED", "#14505C"
TEXT = 2.75  # mm, 7.8 pt
Anchor = Literal["start", "middle", "end"]
__all__ = ["ACCENT", "HAIR", "INK", "PALE", "SECOND", "TEXT", "TINT", "Drawing"]


def _n(x: float) -> str:
    return f"{x:.2f}".rstrip("0").rstrip(".") if abs(x) >= 0.005 else "0"


@dataclass
class Drawing:
    """Collects shapes in three layers and writes them as SVG."""

    width: float
    height: float
    fills: list[str] = field(default_factory=list)
    lines: list[str] = field(default_factory=list)
    texts: list[str] = field(default_factory=list)

    def area(self, x: float, y: float, width: float, height: float, fill: str, outline: float = 0.0) -> None:
        """A filled rectangle, optionally outlined in ink."""
        stroke = f' stroke="{INK}" stroke-width="{outline}"' if outline else ""
        self.fills.append(
            f'<rect x="{_n(x)}" y="{_n(y)}" width="{_n(width)}" height="{_n(height)}" fill="{fill}"{stroke}/>'
        )

    def line(self, d: str, width: float = 0.2, colour: str = INK, dash: str = "", fill: str = "none") -> None:
        """A path; ``dash`` as in SVG."""
        dashed = f' stroke-dasharray="{dash}"' if dash else ""
        self.lines.append(f'<path d="{d}" fill="{fill}" stroke="{colour}" stroke-width="{width}"{dashed}/>')

    def between(
        self, x1: float, y1: float, x2: float, y2: float, width: float = 0.2, colour: str = INK, dash: str = ""
    ) -> None:
        """A straight line."""
        self.line(f"M{_n(x1)} {_n(y1)}L{_n(x2)} {_n(y2)}", width, colour, dash)

    def circle(self, x: float, y: float, radius: float, width: float = 0.25, fill: str = "none") -> None:
        """A circle."""
        self.lines.append(
            f'<circle cx="{_n(x)}" cy="{_n(y)}" r="{_n(radius)}" fill="{fill}" stroke="{INK}" stroke-width="{width}"/>'
        )

    def hatch(self, x: float, y: float, width: float, height: float, step: float, rising: bool) -> None:
        """Oblique lines over a rectangle, clipped to it by construction."""
        offset = step / 2
        while offset < width + height:
            left, right = max(0.0, offset - height), min(offset, width)
            if rising:
                self.between(x + left, y + offset - left, x + right, y + offset - right, 0.12)
            else:
                self.between(x + left, y + height - offset + left, x + right, y + height - offset + right, 0.12)
            offset += step

    def label(
        self,
        x: float,
        y: float,
        words: str,
        anchor: Anchor = "start",
        bold: bool = False,
        colour: str = INK,
        upright: bool = False,
        size: float = TEXT,
    ) -> None:
        """Words on a baseline; ``upright`` turns them to read upwards from the point."""
        face = metrics.SANS_SEMIBOLD if bold else metrics.SANS_REGULAR
        shift = {"start": 0.0, "middle": 0.5, "end": 1.0}[anchor] * metrics.width(face, size, words)
        at = f'x="{_n(x - shift)}" y="{_n(y)}"'
        if upright:
            at = f'x="{_n(-shift)}" y="0" transform="translate({_n(x)} {_n(y)}) rotate(-90)"'
        self.texts.append(
            f'<text {at} font-family="{face.family}" font-weight="{face.weight}" font-size="{size}" fill="{colour}">{escape(words)}</text>'
        )

    def svg(self) -> str:
        """The drawing."""
        return (
            f'<svg xmlns="http://www.w3.org/2000/svg" width="{_n(self.width)}mm" height="{_n(self.height)}mm" '
            f'viewBox="0 0 {_n(self.width)} {_n(self.height)}">{"".join(self.fills + self.lines + self.texts)}</svg>'
        )


def text_width(words: str, bold: bool = False, size: float = TEXT) -> float:
    """The width of a label in millimetres."""
    return metrics.width(metrics.SANS_SEMIBOLD if bold else metrics.SANS_REGULAR, size, words)
