"""Data of the elevation sketch and the head build-up, all taken from lines."""

from __future__ import annotations

from ..number import decimal, rounded
from ..quantity import Unit
from ..rules.margin import NPSH_MARGIN
from ..source.inputs import Given
from ..study import Study
from ..study.line import label
from ..value import Line, Value
from .lines import Json, number

#: The terms of a result as the build-up names them; those in ``_TAKEN`` are subtracted.
_HEADS = {
    "H_s": "surface pressure", "z": "static head", "H_v": "vapour pressure", "h_L": "losses", "H_b": "barometer",
    "H_g": "gauge reading", "z_g": "gauge height", "h_V": "velocity head", "NPSHA_m": "NPSH by the reading",
    "dH_s": "surface pressure, change", "dz": "level, change", "dH_v": "vapour pressure, change", "dh_h": "losses, change",
}  # fmt: skip
_TAKEN = frozenset({"H_v", "h_L", "dH_v", "dh_h"})


def sketch(study: Study) -> Json:
    """Levels, datum, inlet and heads of the result that governs, in the display system's unit of length."""
    c, ledger = study.calculation, study.ledger
    lines = ledger.lines()

    def of(symbol: str, title: str = "") -> Value | None:
        return next((x.value for x in lines if x.value.symbol == symbol and x.value.title.startswith(title)
                     and x.value.unit.name == ledger.coherent(symbol).name), None)  # fmt: skip

    def text(v: Value | None) -> str | None:
        return None if v is None else number(v.record)

    judged = [check for check in study.checks if check.rule is NPSH_MARGIN and check.left is not None]
    result = ledger.line_of(min((check.left for check in judged if check.left), key=lambda v: v.record))
    heads = [
        {"name": _HEADS[s], "symbol": s, "value": number(-v.record if s in _TAKEN else v.record)}
        for s, v in result.operands
    ]
    read = result.value.symbol == "NPSHA_m"
    levels = [x.value for x in lines if x.value.symbol == "z_s" and x.value.unit.name == ledger.coherent("z_s").name]
    level = next((v for v in levels if ("lowest" in v.title) is not read), None)
    extreme = "as read" if read else "lowest"
    elements = []
    if c.line is not None:
        elements = [
            {"row": label(c.line, s, e), "kind": e.kind, "name": e.name or e.kind}
            for s in c.line.sections
            for e in s.elements
        ]
    inlet = None
    if c.intake is not None:
        inlet = {"reference": c.intake.reference, "elevation": _length(ledger.coherent("z"), c.intake.elevation),
                 "diameter": _length(ledger.coherent("z"), c.intake.inlet_diameter)}  # fmt: skip
    gauge = None
    if c.readings:
        g = c.readings[0].gauge
        gauge = {"elevation": _length(ledger.coherent("z"), g.elevation), "leg": g.leg}
    limit = study.need.limit
    return {
        "unit": ledger.coherent("z").name,
        "state": _state(study, result),
        "supply": {"name": c.supply.name, "kind": c.supply.kind,
                   "levels": [{"name": f"level, {extreme}", "value": number(level.record)}] if level is not None else []},
        "datum": c.datum,
        "pump": {"name": c.pump.name, "elevation": text(of("z_d"))},
        "intake": inlet,
        "elements": elements,
        "gauge": gauge,
        "heads": heads,
        "available": number(result.value.record),
        "limit": number(limit.record),
    }  # fmt: skip


def _state(study: Study, result: Line) -> str:
    return next(f"{p.title} ({p.scope})" for p in study.ledger.parts if result in p.blocks)


def _length(unit: Unit, given: Given) -> str:
    return str(rounded(decimal(given.quantity.si() / unit.factor), 3))
