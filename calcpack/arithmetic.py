"""Arithmetic on a formula's tree: in decimal (the record), in floats (the shadow) and on arrays."""

from __future__ import annotations

import math
from abc import ABC, abstractmethod
from collections.abc import Callable, Mapping, Sequence
from decimal import Context, Decimal, DecimalException, DivisionByZero, InvalidOperation, Overflow
from functools import reduce
from types import CodeType
from typing import Any, Protocol

from .formula import Bin, Call, Cmp, FormulaError, Name, Neg, Node, Num, text


class Arithmetic(Protocol):
    """A book: how the trees of formulas are worked out on its kind of number."""

    def run(self, node: Node, values: Mapping[str, Any]) -> Any: ...


class _Walking(ABC):
    """Works a tree out node by node."""

    @abstractmethod
    def number(self, text: str) -> Any: ...

    @abstractmethod
    def binary(self, op: str, a: Any, b: Any) -> Any: ...

    @abstractmethod
    def call(self, fn: str, args: Sequence[Any]) -> Any: ...

    def run(self, node: Node, values: Mapping[str, Any]) -> Any:
        match node:
            case Num(t):
                return self.number(t)
            case Name(name):
                return self.number("pi") if name == "pi" else values[name]
            case Neg(x):
                return self.binary("-", 0, self.run(x, values))
            case Bin(op, a, b) | Cmp(op, a, b):
                return self.binary(op, self.run(a, values), self.run(b, values))
            case Call(fn, args):
                return self.call(fn, [self.run(x, values) for x in args])
        raise AssertionError(node)


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


class InDecimal(_Walking):
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


class InFloat(_Walking):
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
    """Arrays: numpy, element by element; no ledger, no rounding.

    A tree's text is compiled once: in compiled code numpy works in place on its own intermediate results, which makes
    long arrays up to four times faster than a walk that holds on to each of them.
    """

    def __init__(self) -> None:
        import numpy as np  # only where arrays are asked for: the import costs more than a whole assessment's arithmetic

        self._scope: dict[str, Any] = {
            "__builtins__": {}, "pi": math.pi, "sqrt": np.sqrt, "log10": np.log10, "ln": np.log, "exp": np.exp,
            "max": lambda *xs: reduce(np.maximum, xs), "min": lambda *xs: reduce(np.minimum, xs),
            "sum": lambda xs: reduce(np.add, xs),
        }  # fmt: skip
        self._codes: dict[int, tuple[Node, CodeType]] = {}

    def run(self, node: Node, values: Mapping[str, Any]) -> Any:
        if id(node) not in self._codes:
            # The node is kept beside its code, so that its id stays its own.
            self._codes[id(node)] = (node, compile(text(node), "<formula>", "eval"))
        return eval(self._codes[id(node)][1], self._scope, dict(values))


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
            for side in (node.a, node.b):
                _check(arithmetic.run(side, values), side)
        result = arithmetic.run(node, values)
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
