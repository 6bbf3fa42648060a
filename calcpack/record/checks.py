"""Rule checks as plain data: both sides as reported, the relation asked for and the one found, the margin."""

from __future__ import annotations

import operator
from decimal import Decimal
from fractions import Fraction

from .. import formula
from ..assessment import Study
from ..ledger import Ledger
from ..number import rounded
from ..quantity import PLANT, Unit
from ..symbols import NOMENCLATURE
from ..value import Line, Value, in_unit
from ..verdict import Check, reported_decimals
from .lines import Json, References, number, quantity, value

_SIGN = {">=": "≥", "<=": "≤", ">": ">", "<": "<"}
_OPPOSITE = {">=": "<", "<=": ">", ">": "<=", "<": ">="}
_HOLDS = {">=": operator.ge, "<=": operator.le, ">": operator.gt, "<": operator.lt}
#: Decimals beyond those of a margin in which the six digits of record may leave a trace: 39.9996 is 40.
_NOISE = 3
#: Decimals beyond which no value of record has a digit left to show.
_ALL_DIGITS = 8


def checks(study: Study, references: References) -> list[Json]:
    """The rules judged, with both sides reported against the verdict: what there is rounded down, what is needed up."""
    return [_check(study.ledger, c, f"9.{n}", references) for n, c in enumerate(study.checks, 1)]


def reported(study: Study) -> dict[str, Json]:
    """Address -> short form of every result that a rule compares, so that one value is reported in one way everywhere."""
    found: dict[str, Json] = {}
    for c in study.checks:
        if c.left is not None and c.right is not None:
            for side, headline in zip((c.left, c.right), _headlines(study.ledger, c, c.left, c.right), strict=True):
                if _stated(study.ledger, side) is None:
                    found.setdefault(side.address, headline)
    return found


def _check(ledger: Ledger, c: Check, address: str, references: References) -> Json:
    names, op = formula.names(c.rule.tree), c.rule.tree.op
    left = right = margin = None
    found = _SIGN[op]
    if c.left is not None and c.right is not None and c.margin is not None:
        shown = _headlines(ledger, c, c.left, c.right)
        left, right = (_side(v, s, h) for v, s, h in zip((c.left, c.right), names, shown, strict=True))
        found = _SIGN[op if _HOLDS[op](c.left.record, c.right.record) else _OPPOSITE[op]]
        margin = _margin(ledger, c, c.left, c.margin, _places(ledger, (c.left, c.right), shown))
    return {
        "address": address,
        "id": c.rule.name,
        "title": c.rule.title,
        "about": c.about,
        "formula": c.rule.text,
        "relation": _SIGN[op],
        "found": found,
        "left": left,
        "right": right,
        "verdict": c.verdict,
        "reason": _reason(c, margin),
        "criterion": c.criterion,
        "source": f"{c.source or 'no source stated'}; form of the rule: {references.text(c.rule.cite)}",
        "margin": margin,
    }


def _reason(c: Check, margin: Json | None) -> str:
    """Why the verdict stands; where a rule is not met, by how much comes first."""
    if c.verdict != "not met" or margin is None:
        return c.reason
    shown = margin["headline"]
    return f"{'short' if c.rule.tree.op in ('>=', '>') else 'over'} by {quantity({**shown, 'text': shown['text'].lstrip('-')})}; {c.reason}"


def _margin(ledger: Ledger, c: Check, left: Value, margin: Decimal, decimals: int) -> Json:
    """What there is more than needed, rounded downwards; a step of temperature in the unit of its sides."""
    kind = NOMENCLATURE[formula.names(c.rule.tree)[0]].kind
    unit = left.unit if kind == "temperature" else PLANT[ledger.system][kind][0]
    shown = margin if unit is left.unit else in_unit(Value("", left.symbol, margin, 0.0, left.unit, ""), unit)
    return {
        "value": number(margin), "unit": left.unit.name,
        "headline": {"text": str(rounded(rounded(shown, decimals + _NOISE, "even"), decimals, "down")), "unit": unit.name},
        "percent": None if c.percent is None else str(rounded(c.percent, 1, "down")),
    }  # fmt: skip


def _side(v: Value, symbol: str, headline: Json) -> Json:
    return {"symbol": symbol, "name": v.title, **value(v), "headline": headline}


def _headlines(ledger: Ledger, c: Check, left: Value, right: Value) -> list[Json]:
    """Both sides as reported, at as many decimals as keep true the relation that is printed between them.

    What there is is rounded down and what is needed up, so that neither flatters; two equal values are one figure.
    """
    op = c.rule.tree.op
    toward, holds = ("down", "up") if op in (">=", ">") else ("up", "down"), _HOLDS[op](left.record, right.record)
    if left.record == right.record:
        toward = ("even", "even")
    sides = [_reported(ledger, v, t, 0) for v, t in zip((left, right), toward, strict=True)]
    one_unit = len({unit.name for _, unit, _ in sides}) == 1
    for more in range(_ALL_DIGITS):
        sides = [_reported(ledger, v, t, more, as_stated=one_unit) for v, t in zip((left, right), toward, strict=True)]
        a, b = ((Fraction(x) + unit.offset) * unit.factor for x, unit, _ in sides)
        if _HOLDS[op](a, b) == holds:
            break
    return [headline for _, _, headline in sides]


def _reported(ledger: Ledger, v: Value, toward: str, more: int, as_stated: bool = True) -> tuple[Decimal, Unit, Json]:
    """A side as it was stated, or in plant units at the decimals line rounding allows and ``more``."""
    line = _stated(ledger, v) if as_stated else None
    if line is not None and line.kind == "lookup":
        return v.record, v.unit, {"text": number(v.record), "unit": v.unit.name}
    if line is not None:
        text, _, unit = line.given.partition(" ")
        return line.value.record, line.value.unit, {"text": text, "unit": unit}
    plant = PLANT[ledger.system][NOMENCLATURE[v.symbol].kind][0]
    shown = rounded(in_unit(v, plant), (reported_decimals(v) or 0) + more, toward)
    return shown, plant, {"text": str(shown), "unit": plant.name}


def _stated(ledger: Ledger, v: Value) -> Line | None:
    """The input, or the entry of a table, that a side is, where it is one."""
    line = ledger.line_of(v)
    if line.kind == "lookup" and not line.operands:
        return line
    return next((x for x in ledger.inputs if ledger.used[x.value.address] is v), None)


def _places(ledger: Ledger, sides: tuple[Value, Value], shown: list[Json]) -> int:
    """Decimals of a margin: as few as a computed side shows, or as many as were stated."""
    places = [len(h["text"].partition(".")[2]) for h in shown]
    computed = [n for n, v in zip(places, sides, strict=True) if _stated(ledger, v) is None]
    return min(computed) if computed else max(places)
