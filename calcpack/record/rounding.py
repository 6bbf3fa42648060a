"""What the rounding of lines does to the results: each compared value and key result in both books, beside its limit."""

from __future__ import annotations

from collections.abc import Iterator
from dataclasses import dataclass
from decimal import Decimal

from ..assessment import Study
from ..number import decimal
from ..quantity import PLANT, Unit
from ..symbols import NOMENCLATURE
from ..value import Value, drift
from ..verdict import reported_decimals
from .lines import Json, number, short

#: A drift below this is the noise of double precision, not of rounding.
NOISE = Decimal("1e-9")


@dataclass(frozen=True)
class Effect:
    """The drift of a value and the most it may have, a tenth of the last digit reported, in the unit of record.

    ``plant`` is the unit it is reported in.
    """

    value: Value
    plant: Unit
    drift: Decimal
    limit: Decimal


def effects(study: Study) -> list[Effect]:
    """The effect on each key result and each computed side of a rule, once."""
    return [_effect(study, v) for v in {v.address: v for v in _results(study)}.values()]


def _results(study: Study) -> Iterator[Value]:
    yield from (x.value for x in study.ledger.lines() if x.key_result)
    for check in study.checks:
        for v in (check.left, check.right):
            if v is not None and study.ledger.line_of(v).kind in ("equation", "root"):
                yield v


def _effect(study: Study, v: Value) -> Effect:
    plant = PLANT[study.ledger.system][NOMENCLATURE[v.symbol].kind][0]
    last = Decimal(1).scaleb(-(reported_decimals(v) or 0) - 1)
    return Effect(v, plant, drift(v), last * decimal(plant.factor / v.unit.factor))


def rounding(found: list[Effect]) -> list[Json]:
    """Each effect as a row of its table."""
    return [
        {
            "address": e.value.address, "what": e.value.title, "record": number(e.value.record),
            "shadow": short(float(e.value.shadow / e.value.unit.factor)), "unit": e.value.unit.name,
            "drift": _brief(e.drift) if e.drift > NOISE else "0", "limit": _brief(e.limit),
        }
        for e in found
    ]  # fmt: skip


def greatest(found: list[Effect]) -> str:
    """The effect nearest to its limit, in a few words; empty where nothing is computed."""
    if not found:
        return ""
    e = max(found, key=lambda e: e.drift / e.limit)
    unit, scale = "" if e.plant.name == "1" else f" {e.plant.name}", decimal(e.value.unit.factor / e.plant.factor)
    moved, most = (f"{(x * scale).quantize(Decimal('1e-6')):f}" for x in (e.drift, e.limit))
    return f"largest effect of line rounding on a result: {moved}{unit} (line {e.value.address}); limit {Decimal(most).normalize():f}{unit}"


def _brief(x: Decimal) -> str:
    """A small number at two digits."""
    return f"{x:.1E}" if x < Decimal("0.001") else f"{Decimal(f'{x:.2G}').normalize():f}"
