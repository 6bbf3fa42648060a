"""Small pictures drawn as paths: verdicts, status discs, check marks, margin bars.  Lengths in millimetres.

Every state has a silhouette of its own, so that it survives a grey print; solid black is kept for shortfall.
"""

from __future__ import annotations

import base64
from collections.abc import Mapping
from decimal import Decimal
from functools import cache
from math import cos, pi, sin

INK, SECOND, HAIR, TINT = "#16191C", "#4A5055", "#8E9599", "#C3D2D4"


def data_uri(svg: str) -> str:
    """A picture as the address of an image."""
    return "data:image/svg+xml;base64," + base64.b64encode(svg.encode()).decode()


def picture(width: float, height: float, body: str, scale: float = 1.0) -> str:
    """A drawing in millimetres, stroked in ink unless its parts say otherwise."""
    return (
        f'<svg xmlns="http://www.w3.org/2000/svg" width="{width * scale:.4g}mm" height="{height * scale:.4g}mm" '
        f'viewBox="0 0 {width:.4g} {height:.4g}" fill="none" stroke="{INK}" stroke-linecap="butt">{body}</svg>'
    )


def _dashed_circle(radius: float) -> str:
    arcs = []
    for i in range(8):
        a, b = (2 * i - 0.5) * pi / 8, (2 * i + 0.5) * pi / 8
        arcs.append(
            f"M{5 + radius * cos(a):.3f} {5 + radius * sin(a):.3f}"
            f"A{radius} {radius} 0 0 1 {5 + radius * cos(b):.3f} {5 + radius * sin(b):.3f}"
        )
    return f'<path d="{"".join(arcs)}" stroke-width="1"/>'


_VERDICTS: Mapping[str, str] = {
    "met": '<circle cx="5" cy="5" r="4.4" stroke-width="0.9"/><path d="M2.8 5.2L4.4 6.8L7.4 3.4" stroke-width="1.1"/>',
    # The cross is cut out of the square, not painted white over it.
    "not met": f'<path fill="{INK}" stroke="none" fill-rule="evenodd" d="M0.4 0.4H9.6V9.6H0.4Z'
    'M5 4.1L7.3 1.8L8.2 2.7L5.9 5L8.2 7.3L7.3 8.2L5 5.9L2.7 8.2L1.8 7.3L4.1 5L1.8 2.7L2.7 1.8Z"/>',
    "not applicable": f'<circle cx="5" cy="5" r="4.4" stroke-width="0.5" stroke="{SECOND}"/>'
    f'<path d="M2.8 5H7.2" stroke-width="0.8" stroke="{SECOND}"/>',
    "not assessed": _dashed_circle(4.3)
    + '<path d="M3.6 4C3.6 2.2 6.5 2.2 6.5 4C6.5 5.2 5 5.1 5 6.3" stroke-width="0.9"/>'
    + f'<circle cx="5" cy="7.7" r="0.6" fill="{INK}" stroke="none"/>',
}


@cache
def verdict(word: str, size: float = 3.2) -> str:
    """The glyph of a verdict, ``size`` millimetres square."""
    return data_uri(picture(10, 10, _VERDICTS[word], size / 10))


_FILLS = {"verified": 1.0, "maker": 0.5, "preliminary": 0.25, "assumed": 0.0}


@cache
def status(word: str) -> str:
    """A disc filled as far as the value is confirmed; a triangle where the status is unknown."""
    if word not in _FILLS:
        return data_uri(picture(10, 10, '<path d="M5 1L9.4 9H0.6Z" stroke-width="1"/>', 0.26))
    full, r = _FILLS[word], 4.2
    body = f'<circle cx="5" cy="5" r="{r}" stroke-width="1"/>'
    if full == 1.0:
        body = f'<circle cx="5" cy="5" r="4.7" fill="{INK}" stroke="none"/>'
    elif full:
        end = (5, 5 + r) if full == 0.5 else (5 - r, 5)
        sweep = f"M5 5V{5 - r:.2f}A{r} {r} 0 0 0 {end[0]:.2f} {end[1]:.2f}Z"
        body += f'<path d="{sweep}" fill="{INK}" stroke="none"/>'
    return data_uri(picture(10, 10, body, 0.26))


@cache
def check() -> str:
    """The blank check mark: a box for how, a line for by whom."""
    body = f'<rect x="0.15" y="0.15" width="4.4" height="4.4" stroke-width="0.2" stroke="{SECOND}"/>'
    return data_uri(picture(21.5, 4.8, body + f'<path d="M6.5 4.5H20.5" stroke-width="0.14" stroke="{HAIR}"/>'))


@cache
def margin_bar(percent: str) -> str:
    """Room to the right of the limit or shortfall to the left, on one scale of ten per cent either way for every rule.

    An arrow shows that the bar runs past the end of the scale.
    """
    shown = Decimal(percent)
    ends = max(Decimal(-10), min(Decimal(10), shown))
    x = 11 + float(ends) * 0.95
    body = "".join(
        f'<path d="M{11 + tick * 0.95:.2f} 3.4V4.6" stroke-width="0.15" stroke="{SECOND}"/>'
        for tick in (-10, -5, 5, 10)
    )
    body += f'<path d="M1.5 4H20.5" stroke-width="0.15" stroke="{SECOND}"/>'
    if x >= 11:
        body += f'<rect x="11" y="1.3" width="{x - 11:.3f}" height="2" fill="{TINT}" stroke-width="0.2"/>'
    else:
        body += f'<rect x="{x:.3f}" y="1.3" width="{11 - x:.3f}" height="2" fill="{INK}" stroke="none"/>'
    if abs(shown) > 10:
        tip = 21.6 if shown > 0 else 0.4
        base = 20.3 if shown > 0 else 1.7
        body += f'<path d="M{base} 1.1L{tip} 2.3L{base} 3.5Z" fill="{INK}" stroke="none"/>'
    body += '<path d="M11 0.4V4.8" stroke-width="0.45"/>'
    return data_uri(picture(22, 5, body))
