"""The build-up of heads: one bar standing on the other, from the pump's datum to NPSH available, beside what is needed."""

from __future__ import annotations

from collections.abc import Mapping
from typing import Any

from .drawing import INK, PALE, SECOND, TINT, Drawing, text_width
from .scale import HEIGHTS, WIDTH, Scale, ends_at, label, steps

BARS = 94.0
#: Heads drawn hatched, and whether the hatching rises; vapour pressure is hatched closely, the other way.
HATCHED = {"losses": True, "head withheld": True, "acceleration head": True, "vapour pressure": False}
ENDS = {"available": "NPSH available", "limit": "needed"}


def build_up(d: Drawing, scale: Scale, sketch: Mapping[str, Any]) -> None:
    """Draw the heads of ``sketch``, then NPSH available and NPSH needed from the datum they count from."""
    shown, ends = steps(sketch), [s for s in ENDS if sketch[s]]
    pitch = (WIDTH - BARS) / (len(shown) + len(ends))
    wide = min(6.0, pitch - 0.8)
    for i, step in enumerate(shown):
        x, top, tall = (
            BARS + pitch * i,
            scale.y(max(step.start, step.end)),
            abs(scale.y(step.start) - scale.y(step.end)),
        )
        d.area(x, top, wide, tall, PALE if step.name in HEIGHTS else "#FFFFFF", 0.2)
        if step.name in HATCHED:
            d.hatch(x, top, wide, tall, 1.4 if HATCHED[step.name] else 0.9, HATCHED[step.name])
        if i + 1 < len(shown) or ends:
            d.between(x + wide, scale.y(step.end), x + pitch, scale.y(step.end), 0.12, SECOND)
        words = f"{step.name} {label(step.value, signed=True)}"
        _bar_label(d, x + wide / 2, top, tall, words, scale, hatched=step.name in HATCHED)
    base = ends_at(sketch)
    for i, key in enumerate(ends, len(shown)):
        x, top, foot = BARS + pitch * i, scale.y(base + float(sketch[key])), scale.y(base)
        own = key == "available"
        d.area(x, min(top, foot), wide, abs(foot - top), TINT if own else "#FFFFFF", 0.35 if own else 0.2)
        _bar_label(d, x + wide / 2, top, foot - top, f"{ENDS[key]} {label(sketch[key])}", scale, bold=own)
    if sketch["limit"]:
        y = scale.y(base + float(sketch["limit"]))
        d.between(BARS + pitch * (len(shown) - 0.2), y, WIDTH, y, 0.3, INK, "0.8 0.6")


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
