"""Unit conversions as printed lines: exact, and short enough to type into a calculator."""

from __future__ import annotations

from collections.abc import Mapping
from fractions import Fraction
from functools import cache
from itertools import product
from math import prod

from . import formula
from .formula import Node
from .number import decimal
from .units import Unit


def conversion_tree(symbol: str, frm: Unit, to: Unit) -> Node:
    """The conversion as a formula with exact numbers: ``Q * (77 / 34560)``, ``(T + 459.67) * (5 / 9)``."""
    text = f"{symbol} + {decimal(frm.offset)}" if frm.offset else symbol
    factor = factor_text(frm.factor / to.factor)
    if factor != "1":
        inner = f"({text})" if frm.offset else text
        text = f"{inner} * {factor}" if factor.isdigit() else f"{inner} * ({factor})"
    return formula.parse(text)


#: A numerator or denominator from here on is written as the definitions it is made of.
_SHORT = 10**6


@cache
def factor_text(factor: Fraction) -> str:
    """An exact factor as a checker can type it: a short fraction, else the definitions it is made of."""
    if all(
        part < _SHORT or set(str(part)) <= set("10") and str(part).count("1") == 1
        for part in (factor.numerator, factor.denominator)
    ):
        return str(factor.numerator) if factor.denominator == 1 else f"{factor.numerator} / {factor.denominator}"
    ways = []
    for foot, pound, gravity in product(range(-4, 5), (-1, 0, 1), (-1, 0, 1)):
        powers = {"0.3048": foot, "0.45359237": pound, "9.80665": gravity}
        rest = factor / prod(Fraction(name) ** power for name, power in powers.items())
        ways.append((max(rest.numerator, rest.denominator), abs(foot), rest, powers))
    _, _, rest, powers = min(ways, key=lambda way: way[:2])
    above = [str(rest.numerator)] * (rest.numerator != 1) + _powers(powers, 1)
    below = [str(rest.denominator)] * (rest.denominator != 1) + _powers(powers, -1)
    top = " * ".join(above) or "1"
    return top if not below else f"{top} / {below[0]}" if len(below) == 1 else f"{top} / ({' * '.join(below)})"


def _powers(powers: Mapping[str, int], sign: int) -> list[str]:
    return [name if abs(p) == 1 else f"{name}**{abs(p)}" for name, p in powers.items() if p * sign > 0]
