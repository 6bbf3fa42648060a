"""Verdicts: a rule as data is a comparison of two values with its criterion and source; a check is a rule judged."""

from __future__ import annotations

from dataclasses import dataclass, field
from decimal import Decimal
from typing import Literal

from . import formula
from .arithmetic import InDecimal, InFloat, evaluate
from .formula import Bin, Cmp, FormulaError
from .number import decimal, of_record
from .references import Cite
from .symbols import DIMENSIONS, NOMENCLATURE
from .units import COHERENT, PLANT, Unit
from .value import Value, drift

Verdict = Literal["met", "not met", "not applicable", "not assessed"]
#: The verdicts that let a package pass.
PASSING: frozenset[Verdict] = frozenset({"met", "not applicable"})


@dataclass(frozen=True)
class Rule:
    """A criterion; ``text`` is a comparison that holds where the rule is met.

    ``decides``: what is left over is a margin whose per cent can be weighed against those of others; a consistency of the
    input has none.
    """

    name: str
    title: str
    text: str
    cite: Cite
    decides: bool = True
    tree: Cmp = field(init=False, repr=False, compare=False)

    def __post_init__(self) -> None:
        tree = formula.parse(self.text)
        if not isinstance(tree, Cmp):
            raise FormulaError(f"rule {self.name}: {self.text!r} is not a comparison")
        formula.dimension(tree, DIMENSIONS)
        object.__setattr__(self, "tree", tree)


@dataclass(frozen=True)
class Check:
    """A rule judged: both sides where there are two, the verdict and its reason."""

    rule: Rule
    about: str
    verdict: Verdict
    reason: str
    criterion: str
    source: str
    left: Value | None = None
    right: Value | None = None
    margin: Decimal | None = None
    percent: Decimal | None = None


@dataclass(frozen=True)
class Unapplied:
    """A rule the file neither asks for nor holds data for: ``missing`` says what it would need."""

    title: str
    missing: str


#: Decimals of a reported length, and the drift that each allows: a tenth of its last digit.
ALLOWED = {decimals: Decimal(1).scaleb(-decimals - 1) for decimals in (2, 1, 0)}
#: Most decimals of a reported side, and how many of them it may lose to line rounding.
MOST_DECIMALS, LOST = 2, 2


def reported_decimals(v: Value) -> int | None:
    """Decimals at which line rounding lets a side be reported in its plant unit; ``None`` where it allows none.

    Two at most, and no more than the plant unit usually has; the drift may be a tenth of the last of them.  Units of few
    decimals (a flow in m³/h) are so small that a drift of a whole one is allowed.
    """
    plant, usual = _plant(v)
    moved = drift(v) * decimal(v.unit.factor / plant.factor)
    most = min(usual, MOST_DECIMALS)
    found = next((most - n for n in range(LOST + 1) if moved <= Decimal(1).scaleb(n - most - 1)), None)
    return None if found is None else max(found, 0)


def _plant(v: Value) -> tuple[Unit, int]:
    """The plant unit of a value and its usual decimals; a unit that both display systems share is read as SI."""
    kind = NOMENCLATURE[v.symbol].kind
    us = v.unit.name == COHERENT["US"][kind].name != COHERENT["SI"][kind].name
    return PLANT["US" if us else "SI"][kind]


def compare(
    rule: Rule,
    left: Value,
    right: Value,
    *,
    about: str = "",
    criterion: str,
    source: str,
    met: str = "",
    not_met: str = "",
) -> Check:
    """Judge ``rule`` on two values of record; the shadow book must agree, else the rule is not assessed."""
    a, b = formula.names(rule.tree)
    record: bool = evaluate(rule.tree, {a: left.record, b: right.record}, InDecimal())
    shadow: bool = evaluate(rule.tree, {a: left.shadow, b: right.shadow}, InFloat())
    room = Bin("-", rule.tree.a, rule.tree.b) if rule.tree.op in (">=", ">") else Bin("-", rule.tree.b, rule.tree.a)
    margin = of_record(evaluate(room, {a: left.record, b: right.record}, InDecimal()))
    percent = (
        None
        if not right.record or not rule.decides or NOMENCLATURE[b].kind == "temperature"
        else evaluate(_PERCENT, {"M": margin, "N_L": abs(right.record)}, InDecimal())
    )
    drifted = any(reported_decimals(v) is None for v in (left, right)) and abs(margin) <= _CLEAR * (
        drift(left) + drift(right)
    )
    verdict: Verdict = "met" if record else "not met"
    reason = met if record else not_met
    if record != shadow:
        verdict, reason = (
            "not assessed",
            "within rounding: the verdict turns between the record and the full-precision run",
        )
    elif drifted:
        verdict, reason = (
            "not assessed",
            "within rounding: line rounding moves a side by more than can be reported",
        )
    return Check(rule, about, verdict, reason, criterion, source, left, right, margin, percent)


#: Times the drift of both sides beyond which a margin stands whatever rounding did.
_CLEAR = 100
_PERCENT = formula.parse("100 * M / N_L")


def without_numbers(
    rule: Rule,
    verdict: Verdict,
    reason: str,
    *,
    about: str = "",
    criterion: str = "",
    source: str = "",
    left: Value | None = None,
) -> Check:
    """A rule that no comparison can settle, with the reason."""
    return Check(rule, about, verdict, reason, criterion, source, left)


def between(
    low: Rule, high: Rule, value: Value, lowest: Value, highest: Value, *, about: str = "", criterion: str, source: str,
    met: str = "", not_met: str = "",
) -> Check:  # fmt: skip
    """Judge that ``value`` lies between two ends, at the end that it is nearer to."""
    both = (
        compare(rule, value, end, about=about, criterion=criterion, source=source, met=met, not_met=not_met)
        for rule, end in ((low, lowest), (high, highest))
    )
    return min(both, key=lambda check: check.margin or Decimal(0))


def lacking(
    rule: Rule, missing: str, *, asked: bool, about: str = "", criterion: str = "", source: str = ""
) -> Check | Unapplied:
    """A rule without what it needs: not assessed where the file asks for it, else not applied."""
    if not asked:
        return Unapplied(rule.title, missing)
    return without_numbers(rule, "not assessed", missing, about=about, criterion=criterion, source=source)
