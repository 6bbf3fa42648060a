"""Roots: the printed one is proven by a sign change, and only the printed one."""

from __future__ import annotations

import math
import random
from decimal import Decimal

import pytest
from fluids.friction import Colebrook

from calcpack.arithmetic import InDecimal, evaluate
from calcpack.catalog import EQUATION
from calcpack.formula import Cmp, FormulaError, parse
from calcpack.ledger import ROOT_RANGES, Ledger
from calcpack.number import last_unit, of_record
from calcpack.root import bracketed, of_record_with_residuals, residual, solve

TREE = EQUATION["colebrook"].tree
assert isinstance(TREE, Cmp)
LOW, HIGH = ROOT_RANGES["f"]


def flows(count: int, seed: int) -> list[tuple[Decimal, Decimal]]:
    """Random Reynolds numbers and relative roughnesses, turbulent, as they are printed."""
    rng = random.Random(seed)
    return [
        (
            of_record(Decimal(4000 * 10 ** rng.uniform(0, 4.4))),
            of_record(Decimal(0 if rng.random() < 0.05 else 10 ** rng.uniform(-7, -1.31))),
        )
        for _ in range(count)
    ]


def proof(reynolds: Decimal, roughness: Decimal, root: Decimal) -> bool:
    """Whether the residual changes sign between half a unit below ``root`` and half a unit above it."""
    half = last_unit(root) / 2
    tree = residual(TREE)
    below, above = (
        evaluate(tree, {"Re": reynolds, "r": roughness, "f": x}, InDecimal()) for x in (root - half, root + half)
    )
    return bool(below * above < 0)


def check(count: int, seed: int) -> None:
    for reynolds, roughness in flows(count, seed):
        root, found = of_record_with_residuals(TREE, "f", {"Re": reynolds, "r": roughness}, LOW, HIGH)
        assert of_record(root) == root and len(found) == 3
        assert proof(reynolds, roughness, root)
        unit = last_unit(root)
        assert not proof(reynolds, roughness, root + unit) and not proof(reynolds, roughness, root - unit)


def test_the_sign_change_proves_the_printed_root_and_no_neighbour() -> None:
    check(1500, seed=1)


@pytest.mark.campaign
def test_the_sign_change_proves_many_roots() -> None:
    check(20_000, seed=2)


def differ_at_six_digits(count: int, seed: int) -> list[str]:
    wrong = []
    for reynolds, roughness in flows(count, seed):
        root, _ = of_record_with_residuals(TREE, "f", {"Re": reynolds, "r": roughness}, LOW, HIGH)
        oracle = of_record(Decimal(Colebrook(float(reynolds), float(roughness), tol=-1)))
        if root != oracle:
            wrong.append(f"Re {reynolds} r {roughness}: {root} {oracle}")
    return wrong


def test_the_friction_factor_is_that_of_fluids_at_six_digits() -> None:
    assert differ_at_six_digits(800, seed=3) == []


@pytest.mark.campaign
def test_many_friction_factors_are_those_of_fluids_at_six_digits() -> None:
    assert differ_at_six_digits(5000, seed=4) == []


def test_the_record_and_the_shadow_solve_the_same_equation() -> None:
    for reynolds, roughness in flows(200, seed=5):
        values = {"Re": reynolds, "r": roughness}
        printed, _ = of_record_with_residuals(TREE, "f", values, LOW, HIGH)
        full = solve(TREE, "f", {k: float(v) for k, v in values.items()}, LOW, HIGH)
        assert of_record(Decimal(full)) == printed


def test_the_root_reaches_the_ledger_with_its_residuals() -> None:
    book = Ledger("SI")
    book.part("a test", "")
    from plants import value

    book.apply("colebrook", {"Re": value("Re", "532302", address="8.8"), "r": value("r", "1.79675E-4", address="8.9")})
    (line,) = book.lines()
    assert line.kind == "root" and len(line.residuals) == 3 and line.operands[0][0] == "r"
    assert line.residuals[0][1] * line.residuals[2][1] < 0


def test_halving_ends_at_the_last_bit() -> None:
    assert bracketed(lambda x: x * x - 2, 1, 2) == pytest.approx(math.sqrt(2), abs=3e-16)
    assert bracketed(lambda x: 2 - x * x, 1, 2) == pytest.approx(math.sqrt(2), abs=3e-16)


def test_no_root_is_refused() -> None:
    with pytest.raises(FormulaError, match="no root"):
        bracketed(lambda x: x + 1, 1, 2)


def test_a_root_on_a_step_of_its_digits() -> None:
    """A root whose first digit changes within half a unit: the proof still holds."""
    tree = parse("f == 0.0999999999")
    assert isinstance(tree, Cmp)
    root, found = of_record_with_residuals(tree, "f", {}, 1e-3, 10)
    assert root == Decimal("0.100000") and found[0][1] * found[2][1] < 0
