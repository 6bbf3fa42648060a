"""Data of the elevation sketch and the head build-up, all taken from lines."""

from __future__ import annotations

from collections.abc import Iterator
from decimal import Decimal

from ..assessment import Study
from ..formula import Bin, Name, Node
from ..ledger import Ledger
from ..number import decimal, rounded, typeset_minus
from ..quantity import Unit
from ..rules.margin import NPSH_MARGIN
from ..source.inputs import Given
from ..study.line import label
from ..study.results import Judged
from ..study.supply import POINTS
from ..value import Line, Value
from .cover import weight
from .lines import Json, number

#: The terms of a result as the build-up names them.
_HEADS = {
    "H_s": "surface pressure", "z": "static head", "H_v": "vapour pressure", "h_L": "losses", "H_b": "barometer",
    "H_g": "gauge reading", "z_g": "gauge height", "h_V": "velocity head", "NPSHA_m": "NPSH by the reading",
    "dH_s": "surface pressure, change", "dz": "level, change", "dH_v": "vapour pressure, change", "dh_h": "losses, change",
    "h_w": "head withheld", "h_a": "acceleration head",
}  # fmt: skip


def sketch(study: Study) -> Json:
    """Levels, datum, inlet and heads of the result that governs, in the display system's unit of length."""
    c, ledger = study.calculation, study.ledger
    unit, each = ledger.coherent("z"), _governing(study)
    result = ledger.line_of(each.available.npsh)
    required = _behind(ledger, result, "z_R") if result.value.symbol == "NPSHA_R" else None
    inlet = gauge = None
    if c.intake is not None:
        inlet = {"reference": c.intake.reference, "elevation": _length(unit, c.intake.elevation),
                 "diameter": _length(unit, c.intake.inlet_diameter)}  # fmt: skip
    if c.readings:
        gauge = {"elevation": _length(unit, c.readings[0].gauge.elevation), "leg": c.readings[0].gauge.leg}
    return {
        "unit": unit.name,
        "state": next(f"{p.title} ({p.scope})" for p in ledger.parts if result in p.blocks),
        "supply": {"name": c.supply.name, "kind": c.supply.kind, "levels": _levels(study, each, unit), "point": _point(study)},
        "datum": c.datum,
        "pump": {"name": c.pump.name, "elevation": _length(unit, c.pump.datum_elevation), "arrangement": c.pump.arrangement},
        "required_datum": None if required is None else number(required.record),
        "intake": inlet,
        "elements": _elements(study),
        "nodes": _nodes(study, each),
        "gauge": gauge,
        "heads": [
            {"name": _name(study, symbol), "symbol": symbol, "value": number(head)} for symbol, head in _terms(ledger, result)
        ],
        "available": number(result.value.record),
        "limit": None if each.needed.limit is None else number(each.needed.limit.record),
    }  # fmt: skip


def _governing(study: Study) -> Judged:
    """The result that decides: by its verdict, then by its margin."""
    checks = [check for check in study.checks if check.rule.name == NPSH_MARGIN.name]
    return min(zip(checks, study.judged, strict=True), key=lambda pair: weight(pair[0].verdict, pair[0].percent))[1]


def _terms(ledger: Ledger, result: Line) -> Iterator[tuple[str, Decimal]]:
    """The heads a result is made of, the first a pressure, those subtracted with a minus; what was taken off last comes last.

    A shift to another datum moves where the result is counted from, not the liquid: it is no head.
    """
    operands = dict(result.operands)
    assert result.tree is not None, "a result is computed"
    for symbol, sign in _signed(result.tree):
        if symbol == "NPSHA":
            yield from _terms(ledger, ledger.line_of(operands[symbol]))
        elif symbol not in ("z_d", "z_R"):
            yield symbol, sign * operands[symbol].record


def _signed(tree: Node, sign: int = 1) -> Iterator[tuple[str, int]]:
    """The names of a sum with their signs."""
    match tree:
        case Bin("+" | "-" as op, a, b):
            yield from _signed(a, sign)
            yield from _signed(b, sign if op == "+" else -sign)
        case Name(name):
            yield name, sign


def _name(study: Study, symbol: str) -> str:
    return "pressure at the point" if symbol == "H_s" and study.calculation.supply.kind in POINTS else _HEADS[symbol]


def _behind(ledger: Ledger, line: Line, symbol: str) -> Value | None:
    """The value of ``symbol`` that ``line`` rests on, the first in the order of its operands."""
    for name, v in line.operands:
        found = v if name == symbol else _behind(ledger, ledger.line_of(v), symbol)
        if found is not None:
            return found
    return None


def _levels(study: Study, each: Judged, unit: Unit) -> list[Json]:
    """The level the result stands at; of a reading that is judged as it was read, the level read with it."""
    c = study.calculation
    if c.supply.level is None:
        return []
    at = _behind(study.ledger, study.ledger.line_of(each.available.npsh), "z_s")
    if at is not None:
        return [{"name": "while pumping" if c.supply.level.drawdown else "lowest", "value": number(at.record)}]
    read = next((r.level for r in c.readings if r.name == each.available.about and r.level), None)
    return [] if read is None else [{"name": "as read", "value": _length(unit, read)}]


def _point(study: Study) -> Json | None:
    """The point of a pipe where the pressure is known."""
    supply = study.calculation.supply
    if supply.elevation is None or supply.pressure is None or supply.pressure.lowest is None:
        return None
    unit = study.ledger.coherent("z")
    return {
        "name": supply.point,
        "elevation": _length(unit, supply.elevation),
        "pressure": typeset_minus(supply.pressure.lowest.text),
    }


def _elements(study: Study) -> list[Json]:
    line = study.calculation.line
    if line is None:
        return []
    return [
        {"row": label(line, s, e), "kind": e.kind, "name": e.name or e.kind, "pumps": s.pumps}
        for s in line.sections for e in s.elements
    ]  # fmt: skip


def _nodes(study: Study, each: Judged) -> list[Json]:
    """Points of the line with the head over vapour pressure there, of the run that governs; for the drawing only."""
    run = next((run for run in study.results.runs if run.available.about == each.available.about), None)
    if run is None:
        return []
    place = {e["row"]: i for i, e in enumerate(_elements(study), 1)}
    weight, vapour = run.origin.liquid.specific_weight.record, run.origin.vapour_head.record
    return [
        {"element": place[n.element], "elevation": number(n.elevation.record),
         "head": str(rounded(n.pressure.record / weight - vapour, 3))}
        for n in run.nodes if n.element in place
    ]  # fmt: skip


def _length(unit: Unit, given: Given) -> str:
    return str(rounded(decimal(given.quantity.si() / unit.factor), 3))
