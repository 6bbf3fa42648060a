"""The figure of the system as modelled: elevation to scale and, on the same vertical scale, the heads that build up.

Everything is placed from the record's own numbers; positions on paper are the only arithmetic.
"""

from __future__ import annotations

from collections.abc import Mapping, Sequence
from math import ceil
from typing import Any

from .build_up import build_up
from .drawing import ACCENT, INK, PALE, SECOND, TINT, Drawing, text_width
from .scale import LEFT, WIDTH, Scale, above, axis, ends_at, label, scale_of
from .text import cut

TANK, PIPE, PUMP = 18.0, 42.0, 79.0
COLUMN = 56.0  # of a pump that hangs in its sump
HALF, SHARED = 1.3, 2.0  # half the bore of a pipe of one pump and of several, as drawn (mm)
#: Numbers of elements: the pitch at which they stand side by side, the rows they may take, and the height of a row (mm).
ABREAST, MOST_ROWS, ROW = 4.6, 4, 4.4
NAME_ROOM = 34.0  # for a name in the figure
CLOSED = {"gas_blanketed": "gas", "saturated": "vapour"}  # what stands over the surface of a closed vessel
Sketch = Mapping[str, Any]


def elevation(sketch: Sketch) -> str:
    """The figure as SVG.  Raises :class:`KeyError` where the record's sketch lacks a part."""
    scale = scale_of(sketch, 9.0 + ROW * (_rows(sketch) - 1))
    d = Drawing(WIDTH, scale.bottom + 9.0)
    axis(d, scale)
    if sketch["pump"]["arrangement"] == "wet_pit":
        _vessel(d, scale, sketch, PUMP - 6.0, _start(sketch) - scale.height(5.0))
        _hanging(d, scale, sketch)
    else:
        if sketch["supply"]["levels"]:
            _vessel(d, scale, sketch, PIPE - 6.0, _start(sketch) - scale.height(3.5))
        else:
            _point(d, scale, sketch)
        _line(d, scale, sketch)
    _datum(d, scale, sketch)
    if sketch["heads"]:
        build_up(d, scale, sketch)
    return d.svg()


# --- where the line begins --------------------------------------------------------------------------------------------


def _start(sketch: Sketch) -> float:
    """The elevation at which the line, or the pump's bell, begins."""
    part = sketch["intake"] or sketch["supply"]["point"] or next(iter(sketch["nodes"]), sketch["pump"])
    return float(part["elevation"])


def _run(sketch: Sketch) -> tuple[float, float]:
    """Where the line begins and ends on the paper."""
    return (PIPE - 10 if sketch["supply"]["levels"] else TANK + 10), PUMP - 3.2


def _pitch(sketch: Sketch) -> float:
    first, last = _run(sketch)
    return (last - first - 4) / max(len(sketch["elements"]), 1)


def _rows(sketch: Sketch) -> int:
    """How many rows the numbers of the elements take."""
    return min(MOST_ROWS, ceil(ABREAST / _pitch(sketch)))


def _vessel(d: Drawing, scale: Scale, sketch: Sketch, right: float, floor: float) -> None:
    """A vessel or a basin with its levels, up to the paper's ``right`` and down to ``floor``."""
    supply = sketch["supply"]
    levels = sorted(supply["levels"], key=lambda level: -float(level["value"]))
    lowest = float(levels[-1]["value"])
    bottom, top = scale.y(floor), scale.y(float(levels[0]["value"])) - 5.0
    d.area(TANK, scale.y(lowest), right - TANK, bottom - scale.y(lowest), PALE)
    closed = supply["kind"] in CLOSED
    d.line(f"M{TANK} {top:.2f}V{bottom:.2f}H{right}V{top:.2f}{'Z' if closed else ''}", 0.4)
    if closed:
        d.label(right - 1.0, top + 3.2, CLOSED[supply["kind"]], "end", colour=SECOND)
    crossed = _start(sketch) < lowest < float(sketch["pump"]["elevation"])  # the line rises through the level
    heights = _spread([scale.y(float(level["value"])) for level in levels], 3.4)
    over: list[str] = []
    for level, at in zip(levels, heights, strict=True):
        y, low = scale.y(float(level["value"])), level is levels[-1]
        d.between(TANK, y, right, y, 0.3 if low else 0.15, ACCENT if low else SECOND, "" if low else "1.2 0.8")
        words = f"{level['name']} {label(level['value'], signed=True)}"
        inside = text_width(words, bold=low) < right - TANK - 2.0 and y + 5.0 < scale.y(_start(sketch))
        if low and crossed:
            over.append(words)
        elif low and inside:
            d.label(TANK + 1.0, y + 3.4, words, bold=True)
        else:
            d.label(right + 1.2, at + 0.9, words, bold=low, colour=INK if low else SECOND)
        if low:
            x = TANK + 4
            d.line(f"M{x - 1.2} {y - 2.1:.2f}H{x + 1.2}L{x} {y:.2f}Z", 0.2)
    names = _two_lines(supply["name"], right - TANK + 26)
    y = _clear(top - 1.6, 3.3 * len([*over, *names]), scale)
    for words in over:
        d.label(TANK, y, words)
    for i, words in enumerate(reversed(names), len(over)):
        d.label(TANK, y - 3.3 * i, words, bold=True)


def _clear(y: float, tall: float, scale: Scale) -> float:
    """A baseline at or above ``y`` for ``tall`` rows of words that the datum line does not cross."""
    datum = scale.y(0.0)
    return datum - 1.0 if y - tall < datum < y + 1.0 else y


def _spread(wanted: Sequence[float], pitch: float) -> list[float]:
    """Label heights as near to ``wanted`` (ascending) as a pitch between them allows."""
    out: list[float] = []
    for y in wanted:
        out.append(max(y, out[-1] + pitch) if out else y)
    return out


def _point(d: Drawing, scale: Scale, sketch: Sketch) -> None:
    """No surface: the pipe comes from the left, cut off by a break, and the point is marked where its pressure is known."""
    supply, point = sketch["supply"], sketch["supply"]["point"]
    x, y = _run(sketch)[0], scale.y(_start(sketch))
    for side in (-HALF, HALF):
        d.between(TANK + 2, y + side, x, y + side, 0.35)
    d.line(
        f"M{TANK + 2} {y - 2.6:.2f}L{TANK + 1} {y - 0.5:.2f}L{TANK + 3} {y + 0.5:.2f}L{TANK + 2} {y + 2.6:.2f}", 0.25
    )
    words = [(line, True) for line in _two_lines(supply["name"], PUMP - TANK - 8)]
    if point:
        d.circle(TANK + 8, y, 0.7, fill=INK)
        words += [(point["name"], False)] if point["name"] else []
        words.append((f"{label(point['elevation'], signed=True)}, {point['pressure']}", False))
    foot = _clear(min(y for _, y in _path(scale, sketch)) - 4.0, 3.3 * len(words), scale)
    for i, (line, bold) in enumerate(reversed(words)):
        d.label(TANK, foot - 3.3 * i, cut(line, lambda s: text_width(s, bold=True) <= PUMP - TANK), bold=bold)


# --- the line and the pump --------------------------------------------------------------------------------------------


def _line(d: Drawing, scale: Scale, sketch: Sketch) -> None:
    """The line from the supply to the pump, through the elevations the record has; its elements, the gauge, the pump."""
    path, pitch, elements = _path(scale, sketch), _pitch(sketch), sketch["elements"]
    (first, start), (_, end) = path[0], path[-1]
    shared = sum(1 for element in elements if element["pumps"] > 1)
    ends_shared = first + 2 + pitch * shared if shared else first
    for (x1, y1), (x2, y2) in zip(path, path[1:], strict=False):
        half = SHARED if x1 < ends_shared - 0.01 else HALF
        for side in (-half, half):
            d.between(x1, y1 + side, x2, y2 + side, 0.35)
        d.between(x1, y1, x2, y2, 0.15, SECOND, "3 0.8 0.6 0.8")
    if sketch["intake"] and sketch["intake"]["reference"] != "inlet_centreline":
        d.line(
            f"M{first} {start - HALF:.2f}L{first - 1.6} {start - 2.4:.2f}V{start + 2.4:.2f}L{first} {start + HALF:.2f}",
            0.35,
        )
    lowest, every = max(y for _, y in path), ceil(ABREAST / pitch / MOST_ROWS)
    for i, element in enumerate(elements):
        x = first + 2 + pitch * (i + 0.5)
        y = _height(path, x)
        half = SHARED if element["pumps"] > 1 else HALF
        _element(d, element["kind"], x, y, half)
        if i % every:
            continue
        below = lowest + 6.2 + ROW * (i // every % _rows(sketch))
        d.between(x, y + half + 0.4, x, below - 1.9, 0.12, SECOND)
        d.circle(x, below, 1.9, 0.2)
        d.label(x, below + 0.9, str(i + 1), "middle", size=2.5)
    _grade(d, scale, sketch)
    d.circle(PUMP, end, 3.2, 0.4)
    d.line(f"M{PUMP - 1.2} {end + 1.4:.2f}L{PUMP + 1.6} {end:.2f}L{PUMP - 1.2} {end - 1.4:.2f}Z", 0.25)
    name = _cut(sketch["pump"]["name"], NAME_ROOM)
    numbered = first + 4.8 + pitch * (len(elements) - 0.5) if elements else 0.0  # where the last number ends
    d.label(max(PUMP - text_width(name, bold=True) / 2, numbered), end + 6.2, name, bold=True)
    if gauge := sketch["gauge"]:
        x, y = PUMP - 7.0, scale.y(float(gauge["elevation"]))
        d.between(x, end - HALF if y < end else end + HALF, x, y, 0.2)
        d.circle(x, y, 1.9, 0.3, "#FFFFFF")
        d.label(x, y + 0.9, "G", "middle", size=2.5)
        d.label(PUMP - 4.0, end + 9.6, f"gauge {label(gauge['elevation'], signed=True)}", colour=SECOND)


def _place(sketch: Sketch, node: Mapping[str, Any]) -> float:
    """Where a point of the line stands on the paper."""
    return _run(sketch)[0] + 2 + _pitch(sketch) * (float(node["element"]) - 0.5)


def _path(scale: Scale, sketch: Sketch) -> list[tuple[float, float]]:
    """The centre of the line on the paper: where it begins, each point whose elevation is known, the pump."""
    (first, last), nodes = _run(sketch), sketch["nodes"]
    inner = [(_place(sketch, node), scale.y(float(node["elevation"]))) for node in nodes]
    return [(first, scale.y(_start(sketch))), *inner, (last, scale.y(float(sketch["pump"]["elevation"])))]


def _height(path: Sequence[tuple[float, float]], x: float) -> float:
    """The paper height of the line's centre at ``x``."""
    (x1, y1), (x2, y2) = next((a, b) for a, b in zip(path, path[1:], strict=False) if x <= b[0] + 0.01)
    return y1 + (y2 - y1) * (x - x1) / (x2 - x1)


def _grade(d: Drawing, scale: Scale, sketch: Sketch) -> None:
    """The head over vapour pressure along the line, standing on its centre, at the points where it is known."""
    nodes = sketch["nodes"]
    places = [(_place(sketch, node), scale.y(above(node))) for node in nodes]
    for (x1, y1), (x2, y2) in zip(places, places[1:], strict=False):
        d.between(x1, y1, x2, y2, 0.35, ACCENT, "1.8 0.8")
    least = min((float(node["head"]) for node in nodes), default=0.0)
    for (x, y), node in zip(places, nodes, strict=True):
        d.circle(x, y, 0.5, 0.2, "#FFFFFF")
        if _pitch(sketch) > 3.0 or float(node["head"]) == least:
            d.label(x + 0.95, y - 1.4, label(node["head"]), upright=True, colour=ACCENT)


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
        case "reducer":
            wide, narrow = half + 0.5, half - 0.4
            right = f"L{x + 1.2} {y - narrow:.2f}V{y + narrow:.2f}"
            d.line(f"M{x - 1.2} {y - wide:.2f}{right}L{x - 1.2} {y + wide:.2f}Z", 0.3, fill="#FFFFFF")
        case "equipment":
            d.area(x - 1.6, y - half - 1.2, 3.2, 2 * half + 2.4, "#FFFFFF", 0.3)
        case "entrance" | "pipe":
            pass
        case _:
            d.line(
                f"M{x - 0.5} {y - half - 0.7:.2f}V{y + half + 0.7:.2f}M{x + 0.5} {y - half - 0.7:.2f}V{y + half + 0.7:.2f}",
                0.3,
            )


def _hanging(d: Drawing, scale: Scale, sketch: Sketch) -> None:
    """A pump that hangs in its sump: its column from above the surface down to the bell, its datum where NPSH counts from."""
    datum, lip = scale.y(float(sketch["pump"]["elevation"])), scale.y(_start(sketch))
    top = scale.y(max(float(level["value"]) for level in sketch["supply"]["levels"])) - 8.0
    neck = min(lip - 2.4, datum - 0.1) if datum < lip - 2.4 else lip - 2.4
    for side in (-1, 1):
        d.line(f"M{COLUMN + 1.6 * side} {top:.2f}V{neck:.2f}L{COLUMN + 3.4 * side} {lip:.2f}", 0.35)
    d.between(COLUMN - 3.4, lip, COLUMN + 3.4, lip, 0.2)
    d.area(COLUMN - 3.2, top - 3.4, 6.4, 3.4, "#FFFFFF", 0.4)
    d.line(f"M{COLUMN - 1.3} {datum + 1.0:.2f}L{COLUMN} {datum - 1.4:.2f}L{COLUMN + 1.3} {datum + 1.0:.2f}Z", 0.25)
    d.label(COLUMN, top - 4.6, _cut(sketch["pump"]["name"], NAME_ROOM), "middle", bold=True)
    d.label(
        COLUMN - 4.4,
        _clear(lip + 0.9, 2.6, scale),
        f"bell {label(str(_start(sketch)), signed=True)}",
        "end",
        colour=SECOND,
    )


# --- words ------------------------------------------------------------------------------------------------------------


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


def _datum(d: Drawing, scale: Scale, sketch: Sketch) -> None:
    y = scale.y(0.0)
    d.between(LEFT, y, WIDTH, y, 0.18, INK, "6 1 0.6 1 0.6 1")
    d.label(LEFT, scale.bottom + 4.0, f"datum 0: {sketch['datum']}", colour=SECOND)
    d.label(LEFT, scale.bottom + 7.6, f"vertical scale 1:{scale.ratio}, horizontal not to scale", colour=SECOND)
    if sketch["required_datum"]:
        y, below = scale.y(ends_at(sketch)), ends_at(sketch) < 0
        d.between(PUMP + 6, y, WIDTH, y, 0.18, SECOND, "2 1")
        d.label(PUMP + 6, y + (2.9 if below else -0.8), label(sketch["required_datum"], signed=True), colour=SECOND)
