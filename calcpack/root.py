"""Roots, printed so that a reader can prove them without iterating."""

from __future__ import annotations

import math
from collections.abc import Callable
from decimal import Context, Decimal

from .arithmetic import InDecimal, InFloat, evaluate
from .formula import Bin, Cmp, FormulaError
from .number import last_unit, of_record

_RESIDUAL = Context(prec=3)


def residual(equality: Cmp) -> Bin:
    """The tree whose zero is the root: left side less right side."""
    return Bin("-", equality.a, equality.b)


def bracketed(function: Callable[[float], float], low: float, high: float) -> float:
    """The zero of a continuous ``function`` between ``low`` and ``high``, by halving to the last bit.

    Raises :class:`FormulaError` where the function does not change sign there.
    """
    sign = math.copysign(1.0, function(low))
    if sign == math.copysign(1.0, function(high)):
        raise FormulaError("no root in the range searched")
    while True:
        middle = (low + high) / 2
        if middle in (low, high):
            return middle
        if math.copysign(1.0, function(middle)) == sign:
            low = middle
        else:
            high = middle


def solve(equality: Cmp, unknown: str, values: dict[str, float], low: float, high: float) -> float:
    """The root in double precision, the shadow book's value."""
    tree = residual(equality)
    return bracketed(lambda x: float(evaluate(tree, values | {unknown: x}, InFloat())), low, high)


def of_record_with_residuals(
    equality: Cmp, unknown: str, values: dict[str, Decimal], low: float, high: float
) -> tuple[Decimal, tuple[tuple[Decimal, Decimal], ...]]:
    """The root at the digits of record and the residuals half a unit below it, at it and half a unit above it.

    The outer two differ in sign: that is the proof a reader repeats.  Raises :class:`FormulaError` where they do not.
    """
    tree = residual(equality)
    close = solve(equality, unknown, {k: float(v) for k, v in values.items()}, low, high)
    printed = of_record(Decimal(close))
    half = last_unit(printed) / 2
    places = (printed - half, printed, printed + half)
    found = tuple((x, _RESIDUAL.plus(evaluate(tree, values | {unknown: x}, InDecimal()))) for x in places)
    if found[0][1] * found[2][1] > 0:
        raise FormulaError("the residual does not change sign across the printed root")
    return printed, found
