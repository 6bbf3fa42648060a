"""Three arithmetics on one tree: decimal, float, arrays; and what none of them may return."""

from __future__ import annotations

import math
import random
from decimal import Decimal
from typing import Any

import numpy
import pytest

from calcpack.arithmetic import InDecimal, InFloat, OnArrays, evaluate
from calcpack.formula import FormulaError, Name, names, parse, walk

NAN, INFINITY = float("nan"), float("inf")


def in_decimal(written: str, **values: Any) -> Any:
    as_decimal = {
        k: [Decimal(repr(x)) for x in v] if isinstance(v, list) else Decimal(repr(v)) for k, v in values.items()
    }
    return evaluate(parse(written), as_decimal, InDecimal())


def in_float(written: str, **values: Any) -> Any:
    return evaluate(parse(written), values, InFloat())


#: Values by hand or from a table of logarithms, not by our own arithmetic.
KNOWN = (
    ("a + b * c", {"a": 1.5, "b": 2.0, "c": 0.25}, "2"),
    ("a - b - c", {"a": 10.0, "b": 3.0, "c": 2.0}, "5"),
    ("-a**2", {"a": 3.0}, "-9"),
    ("2**3**2", {}, "512"),
    ("sqrt(a)", {"a": 2.0}, "1.4142135623730950488016887242096980785696718753769"),
    ("log10(a)", {"a": 2.0}, "0.30102999566398119521373889472449302676818988146211"),
    ("ln(a)", {"a": 10.0}, "2.3025850929940456840179914546843642076011014886288"),
    ("exp(a)", {"a": 1.0}, "2.7182818284590452353602874713526624977572470937000"),
    ("pi * D**2 / 4", {"D": 2.0}, "3.1415926535897932384626433832795028841971693993751"),
    ("max(a, b, c)", {"a": 1.0, "b": 3.0, "c": 2.0}, "3"),
    ("min(a, b)", {"a": 1.0, "b": 3.0}, "1"),
    ("sum(h)", {"h": [0.1, 0.2, 0.3]}, "0.6"),
    ("sum(h)", {"h": [5.0]}, "5"),
    ("a**0.5", {"a": 4.0}, "2"),
    ("(a / b)**-1", {"a": 2.0, "b": 4.0}, "2"),
)


@pytest.mark.parametrize(("written", "values", "expected"), KNOWN)
def test_a_value_known_from_elsewhere(written: str, values: dict[str, Any], expected: str) -> None:
    exact = Decimal(expected)
    assert abs(in_decimal(written, **values) - exact) <= abs(exact) * Decimal("1e-48")
    assert in_float(written, **values) == pytest.approx(float(exact), rel=1e-15)
    arrays = {k: [numpy.full(3, x) for x in v] if isinstance(v, list) else numpy.full(3, v) for k, v in values.items()}
    assert numpy.allclose(evaluate(parse(written), arrays, OnArrays()), float(exact), rtol=1e-15)


@pytest.mark.parametrize(("op", "verdicts"), [(">=", "FTT"), ("<=", "TTF"), (">", "FFT"), ("<", "TFF"), ("==", "FTF")])
def test_a_comparison_is_a_verdict_in_every_book(op: str, verdicts: str) -> None:
    for a, verdict in zip((1.0, 2.0, 3.0), verdicts, strict=True):
        assert in_decimal(f"a {op} b", a=a, b=2.0) is (verdict == "T")
        assert in_float(f"a {op} b", a=a, b=2.0) is (verdict == "T")
    found = evaluate(parse(f"a {op} b"), {"a": numpy.array([1.0, 2.0, 3.0]), "b": 2.0}, OnArrays())
    assert "".join("T" if x else "F" for x in found) == verdicts


REFUSED: tuple[tuple[str, dict[str, Any]], ...] = (
    ("log10(a)", {"a": 0.0}),
    ("ln(a)", {"a": 0.0}),
    ("log10(a)", {"a": -1.0}),
    ("ln(a)", {"a": -1.0}),
    ("sqrt(a)", {"a": -1.0}),
    ("a / b", {"a": 1.0, "b": 0.0}),
    ("a / b", {"a": 0.0, "b": 0.0}),
    ("a**b", {"a": 0.0, "b": -1.0}),
    ("a**b", {"a": 0.0, "b": 0.0}),
    ("a**b", {"a": -8.0, "b": 0.5}),
    ("(a**b)**2", {"a": -8.0, "b": 0.5}),
    ("a + b", {"a": NAN, "b": 1.0}),
    ("a + b", {"a": INFINITY, "b": 1.0}),
    ("a * b", {"a": -INFINITY, "b": 0.0}),
    ("b / a", {"a": INFINITY, "b": 1.0}),
    ("max(a, b)", {"a": NAN, "b": 1.0}),
    ("max(b, a)", {"a": NAN, "b": 1.0}),
    ("min(b, a)", {"a": -INFINITY, "b": 1.0}),
    ("sum(h)", {"h": [1.0, NAN]}),
    ("sum(h)", {"h": [1.0, INFINITY]}),
    ("a >= b", {"a": NAN, "b": 1.0}),
    ("a == b", {"a": NAN, "b": NAN}),
    ("a >= b", {"a": INFINITY, "b": 1.0}),
    ("a**b >= 1", {"a": -8.0, "b": 0.5}),
    ("1 / a >= b", {"a": 0.0, "b": 1.0}),
)


@pytest.mark.parametrize(("written", "values"), REFUSED)
def test_a_value_that_is_none_is_refused_in_both_books(written: str, values: dict[str, Any]) -> None:
    """Decimal's own log of 0 is silently -Infinity, and NaN compares as false: neither may reach a verdict."""
    with pytest.raises(FormulaError):
        in_decimal(written, **values)
    with pytest.raises(FormulaError):
        in_float(written, **values)


@pytest.mark.parametrize("written", ["exp(a)", "a * a * a", "a**9"])
def test_overflow_is_refused_in_floats(written: str) -> None:
    with pytest.raises(FormulaError):
        in_float(written, a=1e200)


def test_the_decimal_book_carries_fifty_digits() -> None:
    assert in_decimal("1 / 3") == Decimal("0." + "3" * 50)
    assert in_decimal("a - b", a=1e16, b=1.0) == Decimal("9999999999999999")


EXPRESSIONS = (
    "a * b / c + d", "a**2 / (2 * c)", "sqrt(a * b) - d", "log10(a / (3.7 * b))**-2", "1 / sqrt(a) + 2 * log10(b / 3.7 + 2.51 / (c * sqrt(a)))",
    "max(a, b, c) - min(c, d)", "exp(-a / b) * ln(1 + c)", "(1 - a * b / (a * b + c))**d", "pi * a**2 / 4", "a + b - c - d",
)  # fmt: skip


@pytest.mark.parametrize("written", EXPRESSIONS)
def test_decimal_float_and_arrays_agree(written: str) -> None:
    rng = random.Random(written)
    tree = parse(written)
    samples = [{n: round(rng.uniform(0.1, 5), 6) for n in names(tree)} for _ in range(200)]
    arrays = {n: numpy.array([s[n] for s in samples]) for n in names(tree)}
    together = evaluate(tree, arrays, OnArrays())
    for number, values in enumerate(samples):
        precise = evaluate(tree, {n: Decimal(repr(x)) for n, x in values.items()}, InDecimal())
        double = evaluate(tree, values, InFloat())
        # Cancelling terms lose digits against what they are made of, not against each other.
        size = max(1.0, *(abs(x) for x in values.values()), abs(double))
        assert double == pytest.approx(float(precise), rel=1e-12, abs=1e-14 * size)
        assert together[number] == pytest.approx(double, rel=1e-13, abs=1e-14 * size)


def test_arrays_broadcast_and_are_not_checked() -> None:
    grid = evaluate(parse("a * b"), {"a": numpy.arange(3.0)[:, None], "b": numpy.arange(4.0)}, OnArrays())
    assert grid.shape == (3, 4) and grid[2, 3] == 6
    with numpy.errstate(all="ignore"):
        assert math.isnan(evaluate(parse("log10(a)"), {"a": numpy.array([-1.0])}, OnArrays())[0])


def test_a_missing_operand_is_a_defect() -> None:
    assert any(isinstance(n, Name) for n in walk(parse("a + b")))
    with pytest.raises(KeyError):
        in_float("a + b", a=1.0)
