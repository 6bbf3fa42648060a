"""Trees evaluated: in decimal arithmetic by the published rule of rounding, or exactly.

The rule: compute to at least 12 digits, round to 12, then half to even to 6.
"""

from __future__ import annotations

from collections.abc import Mapping
from decimal import (
    ROUND_HALF_EVEN,
    Context,
    Decimal,
    DecimalException,
    DivisionByZero,
    InvalidOperation,
    Overflow,
)
from fractions import Fraction

from .failures import Undefined
from .tree import PI, Number, Op, Symbol, Tree

WIDE = Context(prec=40, traps=[DivisionByZero, InvalidOperation, Overflow])
_TWELVE = Context(prec=12, rounding=ROUND_HALF_EVEN)
_SIX = Context(prec=6, rounding=ROUND_HALF_EVEN)
#: The circle constant to 40 digits (OEIS A000796).
_PI = Decimal("3.141592653589793238462643383279502884197")


def of_record(x: Decimal) -> Decimal:
    """``x`` at six significant digits by the published rule."""
    y = _SIX.plus(_TWELVE.plus(x))
    return y.quantize(Decimal(1).scaleb(y.adjusted() - 5)) if y else Decimal(0)


def unit_of_record(x: Decimal) -> Decimal:
    """One unit of the sixth significant digit of ``x``."""
    return Decimal(1).scaleb(x.adjusted() - 5)


def rounded(x: Decimal | Fraction, like: Decimal, mode: str = ROUND_HALF_EVEN) -> Decimal:
    """``x`` to the last printed digit of ``like``."""
    exponent = like.as_tuple().exponent
    assert isinstance(exponent, int), "printed numbers are finite"
    return decimal(x).quantize(Decimal(1).scaleb(exponent), rounding=mode, context=WIDE)


def decimal(x: Decimal | Fraction) -> Decimal:
    """``x`` in decimal, to 40 digits."""
    return x if isinstance(x, Decimal) else WIDE.divide(Decimal(x.numerator), Decimal(x.denominator))


def value(tree: Tree, symbols: Mapping[Symbol, Decimal] | None = None) -> Decimal:
    """The value of ``tree``, its symbols taken from ``symbols``.  Raises :class:`Undefined`."""
    try:
        found = _value(tree, symbols or {})
    except DecimalException:
        raise Undefined("the form has no finite value") from None
    except KeyError as error:
        raise Undefined(f"no number is printed for {error.args[0]}") from None
    if not found.is_finite():
        raise Undefined("the form has no finite value")
    return found


def _value(tree: Tree, symbols: Mapping[Symbol, Decimal]) -> Decimal:
    match tree:
        case Number(x):
            return x
        case Symbol():
            return _PI if tree == PI else symbols[tree]
        case Op(name, args):
            return _apply(name, [_value(x, symbols) for x in args])


def _apply(name: str, args: list[Decimal]) -> Decimal:
    match name, args:
        case "+", [a, b]:
            return WIDE.add(a, b)
        case "-", [a, b]:
            return WIDE.subtract(a, b)
        case "*", [a, b]:
            return WIDE.multiply(a, b)
        case "/", [a, b]:
            return WIDE.divide(a, b)
        case "**", [a, b]:
            return WIDE.power(a, b)
        case "neg", [a]:
            return a.copy_negate()
        case "sqrt", [a]:
            return WIDE.sqrt(a)
        case "log10", [a]:
            return WIDE.log10(a)
        case "ln", [a]:
            return WIDE.ln(a)
        case "exp", [a]:
            return WIDE.exp(a)
        case "max", _:
            return max(args)
        case "min", _:
            return min(args)
    raise Undefined(f"{name} of {len(args)} numbers")


def exact(tree: Tree) -> Fraction:
    """The value of a tree of numbers, sums, products, quotients and small whole powers, as a ratio.

    Raises :class:`~calcpack.reader.failures.Undefined` for any other.
    """
    match tree:
        case Number(x) if abs(x.adjusted()) < 50:
            return Fraction(x)
        case Op("neg", (x,)):
            return -exact(x)
        case Op("+", (a, b)):
            return exact(a) + exact(b)
        case Op("-", (a, b)):
            return exact(a) - exact(b)
        case Op("*", (a, b)):
            return exact(a) * exact(b)
        case Op("/", (a, b)) if exact(b):
            return exact(a) / exact(b)
        case Op("**", (a, Number(x))) if x == int(x) and abs(x) <= 12:
            base = exact(a)
            if base and base.numerator.bit_length() + base.denominator.bit_length() < 2000:
                return base ** int(x)
    raise Undefined("the form is not a ratio of whole numbers")
