"""Words on the page: what the bundled fonts can print, numbers and units as HTML, symbols as HTML.

A character that the fonts lack is printed as its code point, ``[U+4E2D]``: nothing is dropped and no other font
steps in.
"""

from __future__ import annotations

import re
import unicodedata
from collections.abc import Callable, Mapping
from functools import cache
from typing import Any

from markupsafe import Markup, escape

from ..number import MINUS
from . import metrics
from .numerals import SANS_GAP, SERIF_GAP, numeral
from .typeset import Display, runs

#: Characters with an exact equal among the bundled ones.
EQUALS = str.maketrans(
    {"\u2011": "-", "\u2010": "-", "\u00b5": "μ", "\u2126": "Ω", "\u212a": "K", "\t": "    ", "\r": None}
)


@cache
def printable_characters() -> frozenset[str]:
    """What every face of both families has, and what neither hides nor reorders text."""
    common = frozenset.intersection(*(metrics.covered(face) for face in metrics.FACES))
    hidden = {"Cc", "Cf", "Cn", "Co", "Cs", "Zl", "Zp"}
    return frozenset(c for c in map(chr, common) if unicodedata.category(c) not in hidden) | {"\n"}


def printable(text: str) -> str:
    """``text`` in composed form with every character that cannot be printed replaced by its code point."""
    known = printable_characters()
    composed = unicodedata.normalize("NFC", text).translate(EQUALS)
    return "".join(c if c in known else f"[U+{ord(c):04X}]" for c in composed)


def all_printable(value: Any) -> Any:
    """The same record with every text made printable."""
    if isinstance(value, str):
        return printable(value)
    if isinstance(value, Mapping):
        return {k: all_printable(v) for k, v in value.items()}
    if isinstance(value, list | tuple):
        return [all_printable(v) for v in value]
    return value


def number(value: str, serif: bool = False) -> Markup:
    """A number with its groups and a raised power of ten."""
    n = numeral(value)
    power = Markup("×10<sup>{}</sup>").format(n.power) if n.exponent else ""
    return Markup("{}{}").format(n.text(SERIF_GAP if serif else SANS_GAP), power)


def number_width(value: str, face: metrics.Face, size: float) -> float:
    """The printed width of :func:`number` in points."""
    n = numeral(value)
    gap = SERIF_GAP if face.family == metrics.SERIF else SANS_GAP
    power = metrics.width(face, size, "×10") + metrics.width(face, size * 0.7, n.power) if n.exponent else 0.0
    return metrics.width(face, size, n.text(gap)) + power


def unit(name: str) -> str:
    """A unit as printed: nothing for a pure number, and never a digit first, which would run on from the number."""
    if name.startswith("1/"):
        return Markup("{}<sup>{}1</sup>").format(name[2:], MINUS)
    return "" if name == "1" else name


def quantity(value: str, name: str) -> Markup:
    """Number and unit, never parted."""
    shown = unit(name)
    return Markup("{}{}{}").format(number(value), SANS_GAP if shown else "", shown)


_TOKEN = re.compile(r"\*\* ?(\d+)|\*|/|[-+()]|[\d.]+(?:E[-+]?\d+)?|[a-z]\w*")


def linear(formula: str) -> Markup:
    """A formula of numbers in one row: ``0.3048**2 / (2 * 3)`` as 0.304 8², a slash, brackets and ``×``."""
    out = Markup("")
    for match in _TOKEN.finditer(formula):
        token = match[0]
        if match[1]:
            out += Markup("<sup>{}</sup>").format(match[1])
        elif token in "+*-":
            out += Markup(" {} ").format({"*": "×", "-": MINUS}.get(token, token))
        elif token in "/()":
            out += token
        else:
            out += number(token) if token[0].isdigit() else Markup("<i>{}</i>").format(token)
    return out


def given(text: str) -> Markup:
    """A value as typed, with its number grouped where it begins with one; the word after the unit may wrap."""
    first, _, rest = text.partition(" ")
    try:
        shown: str | Markup = number(first)
    except ValueError:
        return escape(text)
    name, _, reference = rest.partition(" ")
    return Markup("{}{}{} {}").format(shown, SANS_GAP if name else "", name, reference)


def symbol(shown: Display) -> Markup:
    """A symbol in running text."""
    base = Markup("").join(
        Markup("<i>{}</i>").format(part) if face is metrics.ITALIC else escape(part) for part, face in runs(shown)
    )
    return base + (Markup("<sub>{}</sub>").format(shown.sub) if shown.sub else Markup(""))


def symbol_width(shown: Display, size: float) -> float:
    """The printed width of :func:`symbol` in points."""
    base = sum(metrics.width(face, size, part) for part, face in runs(shown))
    return base + metrics.width(metrics.REGULAR, size * 0.7, shown.sub)


def display(nomenclature: list[dict[str, Any]]) -> dict[str, Display]:
    """How each symbol of the record's nomenclature is written."""
    return {n["name"]: Display(n["base"], n["sub"], n["upright"]) for n in nomenclature}


def cut(words: str, fits: Callable[[str], bool]) -> str:
    """``words``, or as much of them as fits with an ellipsis."""
    if fits(words):
        return words
    while words and not fits(words + "…"):
        words = words[:-1]
    return words.rstrip() + "…"


_BEFORE_UNIT = re.compile(r"(?<=[0-9]) (?=(?:ft|in|mm|m|kPa|Pa|psi|gal/min|m³/h|L/s|°C|°F|K|%)(?![a-z]))")


def together(words: str) -> str:
    """A sentence whose numbers never part from their units."""
    return _BEFORE_UNIT.sub("\u00a0", words)
