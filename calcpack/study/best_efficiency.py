"""The pump at its best efficiency: its suction specific speed, and the operating region around it."""

from __future__ import annotations

from collections.abc import Mapping
from typing import Literal

from ..quantity import parse
from ..references import DEFINITION
from ..source.inputs import Given
from ..value import Value
from . import curve
from .entry import Entry

#: Units the suction specific speed is made with -> speed, flow, head.
UNITS: Mapping[str, tuple[str, str, str]] = {
    "US": ("1 r/min", "1 gal/min", "1 ft"),
    "metric": ("1 r/min", "1 m³/s", "1 m"),
}


def flow(entry: Entry) -> Value | None:
    """The flow of one pump at its best efficiency, at the speed of the pump."""
    given = entry.calculation.pump.best_efficiency_flow
    return None if given is None else entry.value(given, "Q_b", "Flow of one pump at its best efficiency")


def suction_specific_speed(entry: Entry, units: Literal["US", "metric"]) -> tuple[Value | None, str]:
    """Suction specific speed of one impeller eye made with ``units``, or why there is none.

    All at the curve's speed: there NPSH required is known, and the number is the same at every speed where NPSH required goes
    as the speed squared.
    """
    pump, ledger = entry.calculation.pump, entry.ledger
    if pump.reciprocating is not None:
        return None, "a reciprocating pump has no suction specific speed"
    ledger.group("Suction specific speed")
    best, speed = flow(entry), pump.npsh_required.speed
    if best is None:
        return None, "the file gives no best_efficiency_flow"
    if speed is None:
        return None, "the file gives no speed of the NPSH curve"
    at_curve = curve.own_flow(entry, best)
    read = curve.at(entry, at_curve, only_there=True)
    if read.npsh is None:
        return None, f"NPSH required at best efficiency is not known: {read.doubt}"
    ledger.group("Suction specific speed")
    if not pump.eyes:
        entry.assume(
            "eyes",
            "The impeller takes its whole flow in one eye",
            "a double-suction impeller takes half in each, and its suction specific speed is lower: state `eyes: 2`",
        )
    eye = ledger.apply("eye_flow", {"Q_b": at_curve}) if pump.eyes == 2 else at_curve
    unit = {
        symbol: ledger.tabulated(symbol, f"Unit of the suction specific speed, {text}", parse(text, kind), units, DEFINITION)
        for (symbol, kind), text in zip((("n_u", "speed"), ("Q_u", "flow"), ("l_u", "length")), UNITS[units], strict=True)
    }  # fmt: skip
    operands = {"n_p": curve.curve_speed(entry, speed), "Q_e": eye, "NPSH_b": read.npsh, **unit}
    return ledger.apply("suction_specific_speed", operands, f"{units} units"), ""


def region(entry: Entry, end: Literal["lowest", "highest"], share: Given | Value) -> Value | None:
    """The flow at one ``end`` of the operating region, ``share`` of the flow at best efficiency."""
    best, symbol = flow(entry), "r_l" if end == "lowest" else "r_h"
    if best is None:
        return None
    if isinstance(share, Given):
        share = entry.value(
            share, symbol, f"{end.capitalize()} flow of the operating region, over that at best efficiency"
        )
    return entry.ledger.apply("region_lower" if end == "lowest" else "region_upper", {symbol: share, "Q_b": best})
