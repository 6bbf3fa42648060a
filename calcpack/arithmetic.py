"""Arithmetic on a formula's tree: in decimal (the record), in floats (the shadow) and on arrays."""

from __future__ import annotations

import math
from collections.abc import Callable, Mapping, Sequence
from decimal import Context, Decimal, DecimalException, DivisionByZero, InvalidOperation, Overflow
from functools import reduce
from typing import Any, Protocol

from .formula import Bin, Call, Cmp, FormulaError, Name, Neg, Node, Num, text


class Arithmetic(Protocol):
    """What an evaluation needs to know of its numbers."""

    def number(self, text: str) -> Any: ...
    def binary(self, op: str, a: Any, b: Any) -> Any: ...
    def call(self, fn: str, args: Sequence[Any]) -> Any: ...


def _operate(op: str, a: Any, b: Any) -> Any:
    match op:
        case "+":
            return a + b
        case "-":
            return a - b
        case "*":
            return a * b
        case "/":
            return a / b
        case "**":
            return a**b
        case ">=":
            return a >= b
        case "<=":
            return a <= b
        case ">":
            return a > b
        case "<":
            return a < b
        case "==":
            return a == b
    raise AssertionError(op)


#: 50 digits, and every special value trapped: Decimal's own log of 0 is silently -Infinity.
DECIMAL = Context(prec=50, traps=[DivisionByZero, InvalidOperation, Overflow])
#: pi to 50 digits (OEIS A000796).
PI = Decimal("3.1415926535897932384626433832795028841971693993751")


class InDecimal:
    """The record book: :class:`decimal.Decimal` at 50 digits."""

    def number(self, text: str) -> Decimal:
        return PI if text == "pi" else Decimal(text)

    def binary(self, op: str, a: Decimal, b: Decimal) -> Any:
        match op:
            case "+":
                return DECIMAL.add(a, b)
            case "-":
                return DECIMAL.subtract(a, b)
            case "*":
                return DECIMAL.multiply(a, b)
            case "/":
                return DECIMAL.divide(a, b)
            case "**":
                return DECIMAL.power(a, b)
        return _operate(op, a, b)

    def call(self, fn: str, args: Sequence[Any]) -> Decimal:
        match fn:
            case "sqrt":
                return DECIMAL.sqrt(args[0])
            case "log10":
                return _finite(DECIMAL.log10(args[0]), fn)
            case "ln":
                return _finite(DECIMAL.ln(args[0]), fn)
            case "exp":
                return DECIMAL.exp(args[0])
            case "max":
                return Decimal(max(args))
            case "min":
                return Decimal(min(args))
            case "sum":
                return reduce(DECIMAL.add, args[0], Decimal(0))
        raise AssertionError(fn)


def _finite(x: Decimal, fn: str) -> Decimal:
    if not x.is_finite():
        raise FormulaError(f"{fn} of a number outside its domain")
    return x


class InFloat:
    """The shadow book: double precision."""

    _functions: Mapping[str, Callable[..., float]] = {
        "sqrt": math.sqrt,
        "log10": math.log10,
        "ln": math.log,
        "exp": math.exp,
        "max": max,
        "min": min,
    }

    def number(self, text: str) -> float | int:
        return math.pi if text == "pi" else _literal(text)

    def binary(self, op: str, a: float, b: float) -> Any:
        if op == "**" and a == 0 and b == 0:
            raise FormulaError("0 to the power 0 has no value")
        return _operate(op, a, b)

    def call(self, fn: str, args: Sequence[Any]) -> float:
        return math.fsum(args[0]) if fn == "sum" else self._functions[fn](*args)


class OnArrays:
    """Arrays: numpy, element by element; no ledger, no rounding."""

    def __init__(self) -> None:
        import numpy  # only where arrays are asked for: the import costs more than a whole assessment's arithmetic

        self._np = numpy

    def number(self, text: str) -> float | int:
        return math.pi if text == "pi" else _literal(text)

    def binary(self, op: str, a: Any, b: Any) -> Any:
        return _operate(op, a, b)

    def call(self, fn: str, args: Sequence[Any]) -> Any:
        np = self._np
        match fn:
            case "ln":
                return np.log(args[0])
            case "max":
                return reduce(np.maximum, args)
            case "min":
                return reduce(np.minimum, args)
            case "sum":
                return reduce(np.add, args[0])
        return getattr(np, fn)(args[0])


def _literal(text: str) -> float | int:
    return int(text) if text.lstrip("-").isdigit() else float(text)


def evaluate(node: Node, values: Mapping[str, Any], arithmetic: Arithmetic) -> Any:
    """Evaluate a tree on ``values`` (symbol -> number, or a sequence where ``sum`` takes it).

    Raises :class:`FormulaError` where a value is not finite or a function leaves its domain; never returns a
    non-finite scalar, and never a verdict on one.  Arrays pass unchecked.
    """
    try:
        for value in values.values():
            _check(value, node)
        if isinstance(node, Cmp):
            a, b = evaluate(node.a, values, arithmetic), evaluate(node.b, values, arithmetic)
            return arithmetic.binary(node.op, a, b)
        result = _evaluate(node, values, arithmetic)
    except FormulaError:
        raise
    except (DecimalException, ArithmeticError, ValueError):
        raise FormulaError(f"{text(node)} has no finite value here") from None
    _check(result, node)
    return result


def _check(x: Any, node: Node) -> None:
    finite = x.is_finite() if isinstance(x, Decimal) else not isinstance(x, float) or math.isfinite(x)
    if not finite or isinstance(x, complex):
        raise FormulaError(f"{text(node)} has no finite value here")


def _evaluate(node: Node, values: Mapping[str, Any], on: Arithmetic) -> Any:
    match node:
        case Num(t):
            return on.number(t)
        case Name(name):
            return on.number("pi") if name == "pi" else values[name]
        case Neg(x):
            return on.binary("-", 0, _evaluate(x, values, on))
        case Bin(op, a, b):
            return on.binary(op, _evaluate(a, values, on), _evaluate(b, values, on))
        case Call(fn, args):
            return on.call(fn, [_evaluate(x, values, on) for x in args])
    raise AssertionError(node)
