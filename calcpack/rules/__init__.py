"""Rules as data: each topic one module; a rule is a comparison of two values with its criterion and source."""

from __future__ import annotations

from dataclasses import dataclass, field
from decimal import Decimal
from typing import Literal

from .. import formula
from ..arithmetic import InDecimal, InFloat, evaluate
from ..formula import Bin, Cmp, FormulaError
from ..number import of_record
from ..references import Cite
from ..symbols import DIMENSIONS, NOMENCLATURE
from ..value import Value, drift

Verdict = Literal["met", "not met", "not applicable", "not assessed"]
#: The verdicts that let a package pass.
PASSING: frozenset[Verdict] = frozenset({"met", "not applicable"})


@dataclass(frozen=True)
class Rule:
    """A criterion; ``text`` is a comparison that holds where the rule is met."""

    name: str
    title: str
    text: str
    cite: Cite
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


#: Decimals at which a side may be reported, and the drift that each allows: a tenth of its last digit.
ALLOWED = {decimals: Decimal(1).scaleb(-decimals - 1) for decimals in (2, 1, 0)}


def reported_decimals(v: Value) -> int | None:
    """Decimals at which line rounding lets a side be reported, two at most; ``None`` where it allows none."""
    return next((decimals for decimals, most in ALLOWED.items() if drift(v) <= most), None)


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
        if not right.record or NOMENCLATURE[b].kind == "temperature"
        else evaluate(_PERCENT, {"M": margin, "N_L": abs(right.record)}, InDecimal())
    )
    drifted = reported_decimals(left) is None or reported_decimals(right) is None
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
            "within rounding: line rounding moves a side by more than a tenth of a whole unit",
        )
    return Check(rule, about, verdict, reason, criterion, source, left, right, margin, percent)


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
