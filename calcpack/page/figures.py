"""The figure of the system as modelled: elevation to scale and, on the same vertical scale, the heads that build up.

Everything is placed from the record's own numbers; positions on paper are the only arithmetic.
"""

from __future__ import annotations

from collections.abc import Mapping, Sequence
from dataclasses import dataclass
from decimal import Decimal
from typing import Any

from ..number import rounded
from .drawing import ACCENT, INK, PALE, SECOND, TINT, Drawing, text_width
from .numerals import SANS_GAP, numeral
from .text import cut

WIDTH = 132.0
TALLEST = 122.0  # room for the heads, mm
SCALES = (5, *(round(m * 10**k) for k in range(1, 10) for m in (1, 1.5, 2, 2.5, 4, 5, 8)))
STEPS = tuple(m * 10.0**k for k in range(-1, 9) for m in (1, 2, 5))  # of the axis
MILLIMETRES = {"ft": 304.8, "m": 1000.0}
LEFT, TANK, PIPE, PUMP, BARS = 13.0, 18.0, 42.0, 79.0, 94.0
HEIGHTS = ("static head", "gauge height")  # drawn first, so that they end at the height they mean
CROWDED, STAGGER = 4.6, 4.4  # below this pitch every second row number stands lower by so much (mm)
LOSSES = ("losses", "vapour pressure")


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

    @property
    def bottom(self) -> float:
        """Paper height of the lowest elevation shown."""
        return self.y(self.low)


def _number(value: str, signed: bool = False) -> str:
    n = numeral(str(rounded(Decimal(value), 3)) if len(value.partition(".")[2]) > 3 else value)
    return ("+" if signed and not n.negative else "") + n.text(SANS_GAP)


def _steps(sketch: Mapping[str, Any]) -> list[tuple[str, str, float, float]]:
    """Name, value, start and end of each head, one standing on the other above the pump's datum."""
    at, out = float(sketch["pump"]["elevation"]), []
    for head in sorted(sketch["heads"], key=lambda h: h["name"] not in HEIGHTS):
        end = at + float(head["value"])
        out.append((head["name"], head["value"], at, end))
        at = end
    return out


def _scale(sketch: Mapping[str, Any]) -> Scale:
    base = float(sketch["pump"]["elevation"])
    points = [0.0, base] + [float(level["value"]) for level in sketch["supply"]["levels"]]
    points += [float(part["elevation"]) for part in (sketch["intake"], sketch["gauge"]) if part]
    points += [z for _, _, start, end in _steps(sketch) for z in (start, end)]
    points += [base + float(sketch[k]) for k in ("available", "limit") if sketch[k]]
    unit = sketch["unit"]
    span = (max(points) - min(points)) * MILLIMETRES[unit]
    ratio = next((s for s in SCALES if span / s <= TALLEST), SCALES[-1])
    depth = 9.0 + (STAGGER if _pitch(sketch) < CROWDED else 0.0)
    millimetre = ratio / MILLIMETRES[unit]
    return Scale(ratio, unit, max(points) + 2.5 * millimetre, min(points) - depth * millimetre)


def _run(sketch: Mapping[str, Any]) -> tuple[float, float]:
    """Where the line begins and ends on the paper."""
    return (PIPE - 10 if sketch["supply"]["levels"] else TANK + 10), PUMP - 3.2


def _pitch(sketch: Mapping[str, Any]) -> float:
    first, last = _run(sketch)
    return (last - first - 4) / max(len(sketch["elements"]), 1)


def elevation(sketch: Mapping[str, Any]) -> str:
    """The figure as SVG.  Raises :class:`KeyError` where the record's sketch lacks a part."""
    scale = _scale(sketch)
    d = Drawing(WIDTH, scale.bottom + 9.0)
    _axis(d, scale)
    _supply(d, scale, sketch)
    _pipe(d, scale, sketch)
    _datum(d, scale, sketch)
    if sketch["heads"]:
        _heads(d, scale, sketch)
    return d.svg()


def _axis(d: Drawing, scale: Scale) -> None:
    per = MILLIMETRES[scale.unit] / scale.ratio
    step = next((s for s in STEPS if s * per >= 8.0), STEPS[-1])
    d.between(LEFT, scale.y(scale.high), LEFT, scale.bottom, 0.2)
    k = int(scale.low / step) - 1
    while (k := k + 1) * step <= scale.high:
        if k * step < scale.low:
            continue
        y = scale.y(k * step)
        d.between(LEFT - 1.4, y, LEFT, y, 0.18)
        d.label(LEFT - 2.0, y + 0.95, _number(f"{k * step:.{1 if step < 1 else 0}f}"), "end")
    d.label(
        3.2,
        (scale.y(scale.high) + scale.bottom) / 2,
        f"elevation and head above the datum, {scale.unit}",
        "middle",
        colour=SECOND,
        upright=True,
    )


#: Room for a name in the figure, mm.
NAME_ROOM = 34.0


def _spread(wanted: Sequence[float], pitch: float) -> list[float]:
    """Label heights as near to ``wanted`` (ascending) as a pitch between them allows."""
    out: list[float] = []
    for y in wanted:
        out.append(max(y, out[-1] + pitch) if out else y)
    return out


def _supply(d: Drawing, scale: Scale, sketch: Mapping[str, Any]) -> None:
    levels = sorted(sketch["supply"]["levels"], key=lambda level: -float(level["value"]))
    name = sketch["supply"]["name"]
    if not levels:
        y = scale.y(float(sketch["pump"]["elevation"]))
        d.circle(TANK + 8, y, 2.2)
        d.label(TANK, y - 4.0, _cut(name, NAME_ROOM), bold=True)
        return
    lowest, floor = float(levels[-1]["value"]), _pipe_start(sketch) - 3.5 * scale.ratio / MILLIMETRES[scale.unit]
    right, bottom, top = PIPE - 6, scale.y(floor), scale.y(float(levels[0]["value"])) - 5.0
    d.area(TANK, scale.y(lowest), right - TANK, bottom - scale.y(lowest), PALE)
    d.line(
        f"M{TANK} {top:.2f}V{bottom:.2f}H{right}V{top:.2f}"
        + ("Z" if sketch["supply"]["kind"] == "gas_blanketed" else ""),
        0.4,
    )
    heights = _spread([scale.y(float(level["value"])) for level in levels], 3.4)
    lines = _two_lines(name, right - TANK + 26)
    crossed = _pipe_start(sketch) < lowest < float(sketch["pump"]["elevation"])  # the line rises through the level
    for level, at in zip(levels, heights, strict=True):
        y, low = scale.y(float(level["value"])), level is levels[-1]
        d.between(TANK, y, right, y, 0.3 if low else 0.15, ACCENT if low else SECOND, "" if low else "1.2 0.8")
        words = f"{level['name'].rpartition(', ')[2]} {_number(level['value'], signed=True)}"
        if low and crossed:
            d.label(TANK, top - 1.6, words)
        else:
            d.label(right + 1.2, at + 0.9, words, bold=low, colour=INK if low else SECOND)
        if low:
            x = TANK + 4
            d.line(f"M{x - 1.2} {y - 2.1:.2f}H{x + 1.2}L{x} {y:.2f}Z", 0.2)
    for i, words in enumerate(reversed(lines), crossed):
        d.label(TANK, top - 1.6 - 3.3 * i, words, bold=True)


def _two_lines(words: str, room: float) -> list[str]:
    if text_width(words, bold=True) <= room:
        return [words]
    parts, first = words.split(" "), ""
    while parts and text_width(f"{first} {parts[0]}", bold=True) <= room:
        first = f"{first} {parts.pop(0)}".strip()
    lines = [first, " ".join(parts)] if first else [words]
    return [_cut(line, room) for line in lines]


def _cut(words: str, room: float) -> str:
    return cut(words, lambda shorter: text_width(shorter, bold=True) <= room)


def _pipe_start(sketch: Mapping[str, Any]) -> float:
    intake = sketch["intake"]
    return float(intake["elevation"]) if intake else float(sketch["pump"]["elevation"])


def _pipe(d: Drawing, scale: Scale, sketch: Mapping[str, Any]) -> None:
    start, end, half = scale.y(_pipe_start(sketch)), scale.y(float(sketch["pump"]["elevation"])), 1.3
    first, last = _run(sketch)
    for side in (-half, half):
        d.between(first, start + side, last, end + side, 0.35)
    d.between(first, start, last, end, 0.15, SECOND, "3 0.8 0.6 0.8")
    if sketch["intake"] and sketch["intake"]["reference"] == "bell_lip":
        d.line(
            f"M{first} {start - half:.2f}L{first - 1.6} {start - 2.4:.2f}V{start + 2.4:.2f}L{first} {start + half:.2f}",
            0.35,
        )
    elements = sketch["elements"]
    pitch = _pitch(sketch)
    for i, element in enumerate(elements):
        x = first + 2 + pitch * (i + 0.5)
        y = start + (end - start) * (x - first) / (last - first)
        _element(d, element["kind"], x, y, half)
        below = max(start, end) + 6.2 + (STAGGER if i % 2 and pitch < CROWDED else 0.0)
        d.between(x, y + half + 0.4, x, below - 1.9, 0.12, SECOND)
        d.circle(x, below, 1.9, 0.2)
        d.label(x, below + 0.9, str(i + 1), "middle", size=2.5)
    d.circle(PUMP, end, 3.2, 0.4)
    d.line(f"M{PUMP - 1.2} {end + 1.4:.2f}L{PUMP + 1.6} {end:.2f}L{PUMP - 1.2} {end - 1.4:.2f}Z", 0.25)
    d.label(PUMP, end + 6.2, _cut(sketch["pump"]["name"], NAME_ROOM), "middle", bold=True)
    if gauge := sketch["gauge"]:
        x, y = PUMP - 7.0, scale.y(float(gauge["elevation"]))
        d.between(x, end - half if y < end else end + half, x, y, 0.2)
        d.circle(x, y, 1.9, 0.3, "#FFFFFF")
        d.label(x, y + 0.9, "G", "middle", size=2.5)
        d.label(PUMP - 4.0, end + 9.6, f"gauge {_number(gauge['elevation'], signed=True)}", colour=SECOND)


def _element(d: Drawing, kind: str, x: float, y: float, half: float) -> None:
    match kind:
        case "valve":
            d.line(
                f"M{x - 1.3} {y - half:.2f}V{y + half:.2f}L{x + 1.3} {y - half:.2f}V{y + half:.2f}Z",
                0.3,
                fill="#FFFFFF",
            )
        case "strainer":
            d.area(x - 1.1, y - half, 2.2, 2 * half, TINT, 0.25)
            d.hatch(x - 1.1, y - half, 2.2, 2 * half, 0.7, True)
        case "elbow":
            d.line(f"M{x - 1.2} {y - half:.2f}Q{x + 1.2} {y - half:.2f} {x + 1.2} {y + half:.2f}", 0.3)
        case "tee":
            d.line(f"M{x - 0.8} {y - half:.2f}V{y - half - 1.8:.2f}M{x + 0.8} {y - half:.2f}V{y - half - 1.8:.2f}", 0.3)
        case "entrance" | "pipe":
            pass
        case _:
            d.line(
                f"M{x - 0.5} {y - half - 0.7:.2f}V{y + half + 0.7:.2f}M{x + 0.5} {y - half - 0.7:.2f}V{y + half + 0.7:.2f}",
                0.3,
            )


def _datum(d: Drawing, scale: Scale, sketch: Mapping[str, Any]) -> None:
    y = scale.y(0.0)
    d.between(LEFT, y, WIDTH, y, 0.18, INK, "6 1 0.6 1 0.6 1")
    d.label(LEFT, scale.bottom + 4.0, f"datum 0: {sketch['datum']}", colour=SECOND)
    d.label(LEFT, scale.bottom + 7.6, f"vertical scale 1:{scale.ratio}, horizontal not to scale", colour=SECOND)


def _heads(d: Drawing, scale: Scale, sketch: Mapping[str, Any]) -> None:
    steps, base = _steps(sketch), float(sketch["pump"]["elevation"])
    ends = [s for s in ("available", "limit") if sketch[s]]
    pitch = (WIDTH - BARS) / (len(steps) + len(ends))
    wide = min(6.0, pitch - 0.8)
    for i, (name, value, start, end) in enumerate(steps):
        x, top, tall = BARS + pitch * i, scale.y(max(start, end)), abs(scale.y(start) - scale.y(end))
        d.area(x, top, wide, tall, PALE if name in HEIGHTS else "#FFFFFF", 0.2)
        if name in LOSSES:
            d.hatch(x, top, wide, tall, 0.9 if name == "vapour pressure" else 1.4, name == "losses")
        if i + 1 < len(steps) or ends:
            d.between(x + wide, scale.y(end), x + pitch, scale.y(end), 0.12, SECOND)
        _bar_label(d, x + wide / 2, top, tall, f"{name} {_number(value, signed=True)}", scale, hatched=name in LOSSES)
    for i, key in enumerate(ends, len(steps)):
        x, top = BARS + pitch * i, scale.y(base + float(sketch[key]))
        tall = scale.y(base) - top
        d.area(
            x,
            min(top, top + tall),
            wide,
            abs(tall),
            TINT if key == "available" else "#FFFFFF",
            0.35 if key == "available" else 0.2,
        )
        words = "NPSH available" if key == "available" else "needed"
        _bar_label(d, x + wide / 2, top, tall, f"{words} {_number(sketch[key])}", scale, bold=key == "available")
    if sketch["limit"]:
        y = scale.y(base + float(sketch["limit"]))
        d.between(BARS + pitch * (len(steps) - 0.2), y, WIDTH, y, 0.3, INK, "0.8 0.6")


def _bar_label(
    d: Drawing, x: float, top: float, tall: float, words: str, scale: Scale, bold: bool = False, hatched: bool = False
) -> None:
    """The words inside the bar where they fit, else under it or above it."""
    length = text_width(words, bold)
    if tall > length + 3 and not hatched:
        d.label(x + 0.95, top + tall / 2, words, "middle", bold, upright=True)
    elif top + tall + length + 2 < scale.bottom:
        d.label(x + 0.95, top + tall + 1.2, words, "end", bold, upright=True)
    else:
        d.label(x + 0.95, top - 1.2, words, "start", bold, upright=True)
