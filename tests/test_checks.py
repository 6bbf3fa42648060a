"""Every check value of ``checks.yaml`` through our own equations and look-ups, in both display systems."""

from __future__ import annotations

import re
from collections.abc import Mapping
from decimal import Decimal
from fractions import Fraction
from functools import cache
from importlib import import_module
from pathlib import Path
from typing import Any

import pint
import pytest
import yaml

from calcpack import lookup
from calcpack.catalog import EQUATION
from calcpack.fitting_set import coefficient
from calcpack.ledger import Ledger
from calcpack.number import last_unit
from calcpack.quantity import Quantity, parse, unit
from calcpack.value import Value

Check = dict[str, Any]
FILE: dict[str, Any] = yaml.safe_load((Path(__file__).parent / "checks.yaml").read_text("utf-8"))
CHECKS: list[Check] = FILE["checks"]
PROVENANCE = {"retrieved", "library", "derived", "memory"}
#: Columns at their conventional density, written out for pint.
_CONVENTIONAL = {"inHg": "13595.1*kg/m**3*g_0*inch"}


@cache
def _pint() -> pint.UnitRegistry[Any]:
    return pint.UnitRegistry(non_int_type=Fraction)


def amount(text: str) -> Fraction:
    """A text of the file in SI, by pint: independent of our own units."""
    head, _, name = text.partition(" ")
    number, name = Fraction(head), _CONVENTIONAL.get(name, name)
    return number * Fraction((1 * _pint().parse_expression(name)).to_base_units().magnitude) if name else number


def allowed(tolerance: str, expected: str) -> Fraction:
    """What a figure may differ by, in SI."""
    if tolerance == "exact":
        return Fraction(0)
    if tolerance.endswith("%"):
        return abs(amount(expected)) * Fraction(tolerance.rstrip(" %")) / 100
    return amount(tolerance)


def entered(ledger: Ledger, symbol: str, text: str, number: int = 0) -> Value:
    """An input as typed; a figure of a book may have more digits, or another size, than a plant's file takes."""
    head, _, name = re.sub(" (absolute|gauge)$", "", text).partition(" ")
    return ledger.given(symbol, f"{symbol} {number}", Quantity(Decimal(head), head, unit(name or "1")))


def computed(check: Check, system: str) -> dict[str, Value]:
    """Every value of a check's chain, by its symbol."""
    ledger = Ledger(system)
    ledger.part("check", "")
    values: dict[str, Any] = {}
    for symbol, text in check.get("inputs", {}).items():
        many = isinstance(text, list)
        read = [entered(ledger, symbol, each, n) for n, each in enumerate(text if many else [text])]
        # A look-up takes its temperature as typed, a formula the coherent unit.
        coherent = read if symbol == "T" else [ledger.convert(each) for each in read]
        values[symbol] = coherent if many else coherent[0]
    for symbol in check.get("constants", []):
        values[symbol] = ledger.constant(symbol)
    if "bore" in check:
        found = lookup.bore(*check["bore"])
        values["D"] = ledger.tabulated(
            "D", "bore", parse(f"{found.millimetres} mm", "bore"), found.place, EQUATION["bore_area"].source
        )
    for liquid, names in check.get("look_up", {}).items():
        share = values["w"] if lookup.LIQUIDS[liquid].mixture else None
        for name in names:
            values[lookup.PROPERTIES[name].symbol] = ledger.look_up(liquid, name, values["T"], share)
    for step in check.get("steps", []):
        name, handed = (step, {}) if isinstance(step, str) else (step["equation"], step["with"])
        values[EQUATION[name].result] = ledger.apply(name, values | {a: values[b] for a, b in handed.items()})
    return values


CHAINS = [c for c in CHECKS if not {"quantity", "fitting", "table"} & set(c)]


@pytest.mark.parametrize("system", ["SI", "US"])
@pytest.mark.parametrize("check", CHAINS, ids=[c["id"] for c in CHAINS])
def test_the_published_figure_is_found(check: Check, system: str) -> None:
    values = computed(check, system)
    for symbol, expected in check["expected"].items():
        value, room = values[symbol], allowed(check["tolerance"][symbol], expected)
        full = abs(Fraction(value.shadow) - amount(expected))
        printed = abs((Fraction(value.record) + value.unit.offset) * value.unit.factor - amount(expected))
        unit_of_last_digit = Fraction(last_unit(value.record or Decimal(1))) * value.unit.factor
        assert full <= room + Fraction(1, 10**12), f"{symbol}: {float(value.shadow)} for {expected}"
        assert printed <= room + 2 * unit_of_last_digit, f"{symbol}: {value.record} {value.unit.name} for {expected}"


UNITS = [c for c in CHECKS if "quantity" in c]


@pytest.mark.parametrize("check", UNITS, ids=[c["id"] for c in UNITS])
def test_the_published_unit_is_read(check: Check) -> None:
    kind, text = check["quantity"]
    for expected in check["expected"]["all"]:
        room = allowed(check["tolerance"]["all"], expected)
        assert abs(parse(text, kind).si() - amount(expected)) <= room


FITTINGS = [c for c in CHECKS if "fitting" in c]


@pytest.mark.parametrize("check", FITTINGS, ids=[c["id"] for c in FITTINGS])
def test_the_published_coefficient_is_tabulated(check: Check) -> None:
    found = coefficient("crane", *check["fitting"], 8)
    assert found is not None and found.constants == check["expected"]


def reached(held: Any, path: str) -> Any:
    """What stands in a table under dotted names: places of a tuple, keys, or attributes."""
    for name in path.split("."):
        if isinstance(held, tuple):
            held = held[int(name)]
            continue
        held = held[name] if isinstance(held, Mapping) else getattr(held, name)
    return held


TABLES = [c for c in CHECKS if "table" in c]


@pytest.mark.parametrize("check", TABLES, ids=[c["id"] for c in TABLES])
def test_the_published_figure_is_tabulated(check: Check) -> None:
    module, name, *keys = check["table"]
    held = getattr(import_module(f"calcpack.{module}"), name)
    for key in keys:
        held = held[key]
    assert {str(path): reached(held, str(path)) for path in check["expected"]} == {
        str(path): expected for path, expected in check["expected"].items()
    }


def test_the_file_says_where_each_figure_comes_from() -> None:
    ids = [c["id"] for c in CHECKS]
    assert len(ids) == len(set(ids)), "ids are unique"
    assert not set(ids) & set(FILE["left_out"])
    for check in CHECKS:
        assert check["source"] and check["check"] and check["because"], check["id"]
        assert check["provenance"] in PROVENANCE, check["id"]
        expected = set(check["expected"])
        assert expected == set(check["tolerance"]), f"{check['id']}: a tolerance for each figure"
    assert all(FILE["left_out"].values()), "a reason for each check left out"


def test_how_many_figures_were_seen_is_pinned() -> None:
    """A check added or dropped is noticed, and a figure recalled stays marked as such."""
    count = {p: sum(c["provenance"] == p for c in CHECKS) for p in sorted(PROVENANCE)}
    assert count == {"derived": 29, "library": 68, "memory": 36, "retrieved": 45}
