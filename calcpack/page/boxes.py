"""Boxes of glyphs and filled bars, joined on a baseline.  All lengths in points, y upwards from the baseline."""

from __future__ import annotations

from collections.abc import Sequence
from dataclasses import dataclass, replace
from html import escape

from . import metrics
from .metrics import Face


@dataclass(frozen=True)
class Run:
    """Characters of one face and size, each at its own ``x``; ``stretch`` is the vertical scale."""

    xs: tuple[float, ...]
    y: float
    text: str
    face: Face
    size: float
    stretch: float = 1.0


@dataclass(frozen=True)
class Bar:
    """A filled rectangle whose lower left corner is (``x``, ``y``)."""

    x: float
    y: float
    width: float
    height: float


@dataclass(frozen=True)
class Box:
    """A piece of a formula: its advance, its reach above and below the baseline, and what is drawn in it."""

    width: float
    ascent: float
    descent: float
    runs: tuple[Run, ...] = ()
    bars: tuple[Bar, ...] = ()

    def moved(self, dx: float, dy: float) -> Box:
        """The same ink, shifted; the advance stays."""
        runs = tuple(replace(r, xs=tuple(x + dx for x in r.xs), y=r.y + dy) for r in self.runs)
        bars = tuple(replace(b, x=b.x + dx, y=b.y + dy) for b in self.bars)
        return Box(self.width, self.ascent + dy, self.descent - dy, runs, bars)


def gap(width: float) -> Box:
    """Blank space."""
    return Box(width, 0.0, 0.0)


def text(characters: str, face: Face, size: float) -> Box:
    """Characters set side by side; the fixed spaces inside them move the pen and draw nothing."""
    xs, drawn, pen, top, bottom = [], "", 0.0, 0.0, 0.0
    for c in characters:
        g = metrics.glyph(face, c)
        if not c.isspace():
            xs.append(pen)
            drawn += c
            top, bottom = max(top, g.top * size), min(bottom, g.bottom * size)
        pen += g.advance * size
    return Box(pen, top, -bottom, (Run(tuple(xs), 0.0, drawn, face, size),) if drawn else ())


def tall(character: str, face: Face, size: float, stretch: float, y: float) -> Box:
    """One character scaled by ``stretch`` upwards only, its baseline at ``y``."""
    g = metrics.glyph(face, character)
    run = Run((0.0,), y, character, face, size, stretch)
    return Box(g.advance * size, y + g.top * size * stretch, -y - g.bottom * size * stretch, (run,))


def row(parts: Sequence[Box]) -> Box:
    """Boxes side by side on one baseline."""
    pen = 0.0
    runs: list[Run] = []
    bars: list[Bar] = []
    for part in parts:
        placed = part.moved(pen, 0.0)
        runs += placed.runs
        bars += placed.bars
        pen += part.width
    ascent = max((p.ascent for p in parts), default=0.0)
    descent = max((p.descent for p in parts), default=0.0)
    return Box(pen, ascent, descent, tuple(runs), tuple(bars))


def overlaid(parts: Sequence[Box], width: float) -> Box:
    """Boxes already moved to their places, taken together."""
    return Box(
        width,
        max(p.ascent for p in parts),
        max(p.descent for p in parts),
        tuple(r for p in parts for r in p.runs),
        tuple(b for p in parts for b in p.bars),
    )


def svg(box: Box, ink: str) -> str:
    """The box as an SVG picture in points, its origin at the left end of the baseline's top edge."""

    def number(x: float) -> str:
        return f"{x + 0.0:.3f}".rstrip("0").rstrip(".") if abs(x) >= 0.0005 else "0"

    out = [
        f'<svg xmlns="http://www.w3.org/2000/svg" width="{number(box.width)}pt" '
        f'height="{number(box.ascent + box.descent)}pt" '
        f'viewBox="0 0 {number(box.width)} {number(box.ascent + box.descent)}" fill="{ink}">'
    ]
    for r in box.runs:
        y = box.ascent - r.y
        style = (
            f'font-family="{r.face.family}" font-style="{r.face.style}" font-weight="{r.face.weight}" '
            f'font-size="{number(r.size)}"'
        )
        place = f'x="{" ".join(map(number, r.xs))}" y="{number(y)}"'
        if r.stretch != 1.0:
            place = f'x="0" y="0" transform="translate({number(r.xs[0])} {number(y)}) scale(1 {number(r.stretch)})"'
        out.append(f"<text {place} {style}>{escape(r.text)}</text>")
    out += [
        f'<rect x="{number(b.x)}" y="{number(box.ascent - b.y - b.height)}" width="{number(b.width)}" '
        f'height="{number(b.height)}"/>'
        for b in box.bars
    ]
    return "".join(out) + "</svg>"
