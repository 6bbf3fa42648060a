"""The vertical scale that the elevation and the build-up of heads share: heights to paper, numbers as labels."""

from __future__ import annotations

from collections.abc import Mapping
from dataclasses import dataclass
from decimal import Decimal
from typing import Any

from ..number import rounded
from .drawing import SECOND, Drawing
from .numerals import SANS_GAP, numeral

WIDTH = 132.0
LEFT = 13.0  # of the axis (mm)
TALLEST = 122.0  # room for the heads, mm
RATIOS = (5, *(round(m * 10**k) for k in range(1, 10) for m in (1, 1.5, 2, 2.5, 4, 5, 8)))
STEPS = tuple(m * 10.0**k for k in range(-1, 9) for m in (1, 2, 5))  # of the axis
MILLIMETRES = {"ft": 304.8, "m": 1000.0}
HEIGHTS = ("static head", "gauge height")  # drawn first, so that they end at the height they mean


@dataclass(frozen=True)
class Step:
    """A head of the build-up: it stands from ``start`` to ``end`` on the scale."""

    name: str
    value: str
    start: float
    end: float


@dataclass(frozen=True)
class Scale:
    """Elevation to paper: ``1 : ratio``, with ``top`` (mm from the edge) at elevation ``high``."""

    ratio: int
    unit: str
    high: float
    low: float
    top: float = 6.0

    def y(self, elevation: float) -> float:
        """Paper height of an elevation, from the top edge."""
        return self.top + (self.high - elevation) * MILLIMETRES[self.unit] / self.ratio

    def height(self, millimetres: float) -> float:
        """The elevation that so many millimetres of paper stand for."""
        return millimetres * self.ratio / MILLIMETRES[self.unit]

    @property
    def bottom(self) -> float:
        """Paper height of the lowest elevation shown."""
        return self.y(self.low)


def steps(sketch: Mapping[str, Any]) -> list[Step]:
    """The heads of a sketch, one standing on the other above the pump's datum; two that cancel are left out."""
    values = [Decimal(head["value"]) for head in sketch["heads"]]
    at, out = float(sketch["pump"]["elevation"]), []
    for head in sorted(sketch["heads"], key=lambda h: h["name"] not in HEIGHTS):
        if Decimal(head["value"]) and -Decimal(head["value"]) in values:
            continue
        out.append(Step(head["name"], head["value"], at, at + float(head["value"])))
        at = out[-1].end
    return out


def ends_at(sketch: Mapping[str, Any]) -> float:
    """The elevation from which NPSH available and NPSH needed count."""
    return float(sketch["required_datum"] or sketch["pump"]["elevation"])


def scale_of(sketch: Mapping[str, Any], depth: float) -> Scale:
    """The largest usual scale on which all heights of ``sketch`` fit; ``depth`` millimetres are left below the lowest."""
    supply, base = sketch["supply"], ends_at(sketch)
    points = [0.0, base, float(sketch["pump"]["elevation"])]
    points += [float(level["value"]) for level in supply["levels"]]
    points += [float(part["elevation"]) for part in (sketch["intake"], sketch["gauge"], supply["point"]) if part]
    points += [z for step in steps(sketch) for z in (step.start, step.end)]
    points += [z for node in sketch["nodes"] for z in (float(node["elevation"]), above(node))]
    points += [base + float(sketch[k]) for k in ("available", "limit") if sketch[k]]
    unit = sketch["unit"]
    span = (max(points) - min(points)) * MILLIMETRES[unit]
    ratio = next((r for r in RATIOS if span / r <= TALLEST), RATIOS[-1])
    millimetre = ratio / MILLIMETRES[unit]
    return Scale(ratio, unit, max(points) + 2.5 * millimetre, min(points) - depth * millimetre)


def above(node: Mapping[str, Any]) -> float:
    """How high the head over vapour pressure reaches at a point of the line."""
    return float(node["elevation"]) + float(node["head"])


def label(value: str, signed: bool = False) -> str:
    """A number of the figure, at three decimals at most."""
    n = numeral(str(rounded(Decimal(value), 3)) if len(value.partition(".")[2]) > 3 else value)
    return ("+" if signed and not n.negative else "") + n.text(SANS_GAP)


def axis(d: Drawing, scale: Scale) -> None:
    """The axis of elevation and head, with a tick every eight millimetres or more."""
    per = MILLIMETRES[scale.unit] / scale.ratio
    step = next((s for s in STEPS if s * per >= 8.0), STEPS[-1])
    d.between(LEFT, scale.y(scale.high), LEFT, scale.bottom, 0.2)
    for k in range(int(scale.low / step) - 1, int(scale.high / step) + 2):
        if scale.low <= k * step <= scale.high:
            y = scale.y(k * step)
            d.between(LEFT - 1.4, y, LEFT, y, 0.18)
            d.label(LEFT - 2.0, y + 0.95, label(f"{k * step:.{1 if step < 1 else 0}f}"), "end")
    middle = (scale.y(scale.high) + scale.bottom) / 2
    d.label(3.2, middle, f"elevation and head above the datum, {scale.unit}", "middle", colour=SECOND, upright=True)
