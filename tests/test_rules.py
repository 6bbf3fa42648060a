"""Every rule: met, not met, exactly on the limit, not applicable, not assessable; and within rounding."""

from __future__ import annotations

import importlib
import pkgutil
from decimal import Decimal
from typing import Any

import pytest
from plants import value

from calcpack import rules
from calcpack.formula import FormulaError
from calcpack.references import REFERENCES, Cite
from calcpack.rules import (
    PASSING,
    Check,
    Rule,
    compare,
    margin,
    reported_decimals,
    submergence,
    temperature,
)
from calcpack.value import Value

RULES = {r.name: r for r in (margin.NPSH_MARGIN, submergence.SUBMERGENCE, temperature.HIGHEST_TEMPERATURE)}


def npsh(
    available: str,
    needed: str,
    flow: str = "0.05",
    at_flow: str = "0.05",
    system: str = "SI",
    shadow: float | None = None,
) -> Check:
    return margin.check(
        value("NPSHA_d", available, system, shadow=shadow, address="8.1"),
        value("N_r", needed, system, address="8.2"),
        about="worst case",
        flow=value("Q", flow, system),
        at_flow=value("Q_r", at_flow, system),
        criterion="at least 1.1 × NPSHR",
        governs="the ratio governs",
        source="[S1] 4.3",
    )


def depth(
    there_is: str | None, needed: str | None, free_surface: bool = True, missing: str = "", shadow: float | None = None
) -> Check:
    return submergence.check(
        None if there_is is None else value("S", there_is, shadow=shadow, address="8.1"),
        None if needed is None else value("S_m", needed, address="8.2"),
        free_surface=free_surface,
        supply="basin CT-1",
        reference="bell lip",
        missing=missing,
        source="[S1] 4.4",
    )


def warmest(
    used: str, highest: str | None, given_as: str = "highest", cost: str = "", shadow: float | None = None
) -> Check:
    return temperature.check(
        value("T", used, shadow=shadow, address="8.1"),
        None if highest is None else value("T_h", highest, address="8.2"),
        given_as=given_as,
        cost=cost,
        source="[S1] 4.2",
    )


#: rule, the call, verdict, a word of its reason
CASES: tuple[tuple[str, Check, str, str], ...] = (
    # NPSH margin
    ("npsh_margin", npsh("26.2410", "25.8500"), "met", "the ratio governs"),
    ("npsh_margin", npsh("25.8400", "25.8500"), "not met", "the ratio governs"),
    ("npsh_margin", npsh("25.8500", "25.8500"), "met", "the ratio governs"),
    ("npsh_margin", npsh("25.8499", "25.8500"), "not met", "the ratio governs"),
    ("npsh_margin", npsh("-1.20000", "5.50000"), "not met", "the ratio governs"),
    ("npsh_margin", npsh("0", "5.50000"), "not met", "the ratio governs"),
    ("npsh_margin", npsh("26.2410", "25.8500", flow="0.04"), "met", "on the safe side"),
    ("npsh_margin", npsh("25.0000", "25.8500", flow="0.04"), "not met", "on the safe side"),
    ("npsh_margin", npsh("26.2410", "25.8500", flow="0.0500001"), "not assessed", "stated at a lower flow"),
    ("npsh_margin", npsh("20.0000", "25.8500", flow="0.06"), "not assessed", "stated at a lower flow"),
    ("npsh_margin", npsh("86.0000", "84.8000", system="US"), "met", "the ratio governs"),
    ("npsh_margin", npsh("25.8500", "25.8500", shadow=25.84999), "not assessed", "within rounding"),
    ("npsh_margin", npsh("25.8499", "25.8500", shadow=25.85001), "not assessed", "within rounding"),
    ("npsh_margin", npsh("27.0000", "25.8500", shadow=27.0012), "met", "the ratio governs"),
    ("npsh_margin", npsh("27.0000", "25.8500", shadow=27.101), "not assessed", "within rounding"),
    ("npsh_margin", npsh("27.0000", "25.8500", shadow=27.0009), "met", "the ratio governs"),
    ("npsh_margin", npsh("1033.77", "5.50000", shadow=1033.774), "met", "the ratio governs"),
    ("npsh_margin", npsh("-142471", "5.50000", shadow=-142470.95), "not met", "the ratio governs"),
    # submergence
    ("submergence", depth("3.50000", "2.90000"), "met", "counted from the bell lip"),
    ("submergence", depth("3.50000", "3.59122"), "not met", "counted from the bell lip"),
    ("submergence", depth("3.50000", "3.50000"), "met", "counted from the bell lip"),
    ("submergence", depth("-0.200000", "0.618595"), "not met", "counted from the bell lip"),
    ("submergence", depth(None, None, free_surface=False), "not applicable", "basin CT-1 has no free surface"),
    ("submergence", depth("3.50000", "2.90000", free_surface=False), "not applicable", "no free surface"),
    ("submergence", depth(None, None, missing="the file describes no inlet"), "not assessed", "describes no inlet"),
    ("submergence", depth("3.50000", None, missing="no lowest level"), "not assessed", "no lowest level"),
    ("submergence", depth("3.50000", "3.50000", shadow=3.499999), "not assessed", "within rounding"),
    # temperature
    ("highest_temperature", warmest("302.594", "302.594"), "met", "the highest temperature was used"),
    ("highest_temperature", warmest("302.595", "302.594"), "met", "the highest temperature was used"),
    (
        "highest_temperature",
        warmest("297.150", "302.594", cost=". Each 5 K costs 0.1 m"),
        "not met",
        "Each 5 K costs 0.1 m",
    ),
    (
        "highest_temperature",
        warmest("297.150", None, "average", ". Each 5 K costs 0.1 m"),
        "not met",
        "only the average temperature",
    ),
    ("highest_temperature", warmest("297.150", None, "normal"), "not met", "only the normal temperature"),
    ("highest_temperature", warmest("302.594", "302.594", shadow=302.5935), "not assessed", "within rounding"),
)


@pytest.mark.parametrize(("rule", "check", "verdict", "word"), CASES)
def test_a_rule_is_judged(rule: str, check: Check, verdict: str, word: str) -> None:
    assert check.rule.name == rule
    assert check.verdict == verdict
    assert word in check.reason and not check.reason.endswith((".", " "))
    assert check.criterion and check.source


def test_every_rule_has_every_kind_of_case() -> None:
    """The table misses no verdict a rule can give, nor the case on the limit."""
    for name in RULES:
        verdicts = {c.verdict for rule, c, _, _ in CASES if rule == name}
        assert verdicts >= {"met", "not met", "not assessed"}
        assert any(c.margin == 0 and c.verdict == "met" for rule, c, _, _ in CASES if rule == name), "on the limit"
    assert any(c.verdict == "not applicable" for _, c, _, _ in CASES)


def test_the_rules_are_what_the_folder_holds() -> None:
    modules = [importlib.import_module(f"{rules.__name__}.{m.name}") for m in pkgutil.iter_modules(rules.__path__)]
    held = {x.name: x for module in modules for x in vars(module).values() if isinstance(x, Rule)}
    assert held == RULES and len(RULES) == 3
    for rule in RULES.values():
        assert rule.title and (rule.cite.key in REFERENCES or rule.cite.how)


MARGINS = (
    (npsh("26.2410", "25.8500"), "0.391000", "1.5"),
    (npsh("25.0000", "25.8500"), "-0.850000", "-3.2"),
    (npsh("25.8500", "25.8500"), "0", "0"),
    (depth("3.50000", "3.59122"), "-0.0912200", "-2.5"),
    (warmest("300.000", "302.594"), "-2.59400", None),
)


@pytest.mark.parametrize(("check", "margin_", "percent"), MARGINS)
def test_the_margin_is_the_left_side_less_the_right(check: Check, margin_: str, percent: str | None) -> None:
    assert check.margin == Decimal(margin_)
    assert (check.percent is None) is (percent is None)
    if check.percent is not None and percent is not None:
        assert abs(check.percent - Decimal(percent)) < Decimal("0.1")


def test_a_rule_without_numbers_claims_no_margin() -> None:
    for check in (npsh("26", "25", flow="0.06"), depth(None, None, free_surface=False), warmest("300", None, "normal")):
        assert (check.right, check.margin, check.percent) == (None, None, None)


BOTH_WAYS = (
    ("S >= S_m", "3", "2", "met"),
    ("S <= S_m", "3", "2", "not met"),
    ("S <= S_m", "2", "3", "met"),
    ("S > S_m", "2", "2", "not met"),
    ("S < S_m", "2", "2", "not met"),
)


@pytest.mark.parametrize(("text", "left", "right", "verdict"), BOTH_WAYS)
def test_a_rule_holds_where_its_comparison_does(text: str, left: str, right: str, verdict: str) -> None:
    rule = Rule("a_test", "A test", text, Cite(""))
    check = compare(rule, value("S", left), value("S_m", right, address="8.2"), criterion="a test", source="")
    assert check.verdict == verdict
    assert check.margin is not None
    if "=" in text:
        assert (check.margin >= 0) is (verdict == "met")


NOT_RULES: tuple[tuple[str, str], ...] = (
    ("S - S_m", "not a comparison"),
    ("S >= Q", "differ in dimension"),
    ("S >= nobody", "nomenclature"),
)


@pytest.mark.parametrize(("text", "reason"), NOT_RULES)
def test_what_is_no_comparison_of_like_with_like_is_refused(text: str, reason: str) -> None:
    with pytest.raises(FormulaError, match=reason):
        Rule("a_test", "A test", text, Cite(""))


#: record, how far the shadow lies from it, decimals reported
DECIMALS: tuple[tuple[str, float, int | None], ...] = (
    ("4.37380", 0.0, 2),
    ("26.2410", 0.00099, 2),
    ("26.2410", -0.0011, 1),
    ("317.810", 0.0099, 1),
    ("317.810", 0.011, 0),
    ("-1033.77", 0.099, 0),
    ("1033.77", 0.11, None),
    ("0", 0.0, 2),
)


@pytest.mark.parametrize(("record", "drift", "decimals"), DECIMALS)
@pytest.mark.parametrize("system", ["SI", "US"])
def test_a_side_is_reported_at_the_decimals_its_drift_allows(
    record: str, drift: float, decimals: int | None, system: str
) -> None:
    """Line rounding may move a side by a tenth of its last digit reported, in the unit it is printed in."""
    metre = 1.0 if system == "SI" else 0.3048
    side = value("NPSHA_d", record, system, shadow=(float(record) + drift) * metre)
    assert reported_decimals(side) == decimals


def test_only_met_and_not_applicable_pass() -> None:
    assert sorted(PASSING) == ["met", "not applicable"]


def test_a_crash_of_a_rule_is_no_pass() -> None:
    """A value that is none must not come out as a verdict."""
    broken: dict[str, Any] = {"record": Decimal("NaN"), "shadow": float("nan")}
    left = value("S", "3")
    nothing = Value(left.address, left.symbol, broken["record"], broken["shadow"], left.unit, left.title)
    for sides in ((nothing, left), (left, nothing)):
        with pytest.raises(FormulaError):
            compare(submergence.SUBMERGENCE, *sides, criterion="a test", source="")
