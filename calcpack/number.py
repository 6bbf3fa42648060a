"""Printed numbers: rounding to the digits of record, and writing them down.

The rule published to readers: compute to at least 12 digits, round to 12, then half to even to 6.  The middle step
makes a double-precision calculator and our 50-digit arithmetic agree on ties.
"""

from __future__ import annotations

from decimal import ROUND_CEILING, ROUND_FLOOR, ROUND_HALF_EVEN, Context, Decimal
from fractions import Fraction

#: Significant digits of a value of record.
DIGITS = 6
_TWELVE = Context(prec=12, rounding=ROUND_HALF_EVEN)
_SIX = Context(prec=DIGITS, rounding=ROUND_HALF_EVEN)
_WIDE = Context(prec=50)
MINUS = "\u2212"


def typeset_minus(text: str) -> str:
    """A quantity as typed, with a true minus sign for a sentence."""
    return MINUS + text[1:] if text.startswith("-") else text


def _unit(exponent: int) -> Decimal:
    """A power of ten, whatever decimal context the caller has set."""
    return Decimal((0, (1,), exponent))


def of_record(x: Decimal) -> Decimal:
    """Round to the digits of record, trailing zeros kept (``4`` becomes ``4.00000``)."""
    y = _SIX.plus(_TWELVE.plus(x))
    if y.is_zero():
        return Decimal(0)
    return y.quantize(_unit(y.adjusted() - DIGITS + 1), context=_WIDE)


def decimal(x: Fraction) -> Decimal:
    """An exact fraction in decimal, to 50 digits."""
    return _WIDE.divide(Decimal(x.numerator), Decimal(x.denominator))


def last_unit(x: Decimal) -> Decimal:
    """One unit of the last digit of record of ``x``."""
    return _unit(x.adjusted() - DIGITS + 1)


def rounded(x: Decimal, decimals: int, toward: str = "even") -> Decimal:
    """``x`` at ``decimals`` places: half to ``even``, ``down`` (towards minus infinity) or ``up``."""
    mode = {"even": ROUND_HALF_EVEN, "down": ROUND_FLOOR, "up": ROUND_CEILING}[toward]
    return x.quantize(_unit(-decimals), rounding=mode, context=_WIDE)


def headline(x: Decimal, decimals: int) -> Decimal:
    """The short form shown large: ``decimals`` places, or four significant digits where that would show too little.

    No more digits than a value of record has.
    """
    if x.is_zero():
        return Decimal(0)
    if Decimal("0.1") <= abs(x) < Decimal(10_000):
        return rounded(x, min(decimals, DIGITS - 1 - x.adjusted()))
    four = Context(prec=4, rounding=ROUND_HALF_EVEN).plus(x)
    return four.quantize(_unit(four.adjusted() - 3), context=_WIDE)


def plain(x: Decimal) -> bool:
    """Whether a value of record is written out in full rather than with a power of ten."""
    return x.is_zero() or -4 < x.adjusted() < DIGITS
