"""The maker's curve of NPSH required: read at a flow, between its points and at its speed."""

from __future__ import annotations

from bisect import bisect_left
from dataclasses import dataclass, replace
from math import isclose
from typing import Literal

from ..quantity import parse
from ..references import PRACTICE
from ..source.inputs import Given, NpshRequired
from ..value import Value
from .entry import Entry

#: Exponent of the speed ratio where the file states none: speeding up, and slowing down.
EXPONENTS = {True: "2", False: "1.5"}


@dataclass(frozen=True)
class Read:
    """NPSH required at one flow; absent where the curve does not reach there, with the reason in ``doubt``.

    ``beside`` says in words where it is not the value of that very flow.
    """

    npsh: Value | None
    doubt: str = ""
    beside: str = ""


def required(entry: Entry, flow: Value) -> Read:
    """NPSH required at ``flow`` and at the speed of the pump."""
    read = at(entry, own_flow(entry, flow))
    apart = speeds(entry)
    if apart is None or read.npsh is None:
        return read
    pump, curve = apart
    operands = {"NPSHR_c": read.npsh, "n_p": pump, "n_0": curve, "e_n": _exponent(entry, pump, curve)}
    return replace(read, npsh=entry.ledger.apply("npsh_at_speed", operands))


def own_flow(entry: Entry, flow: Value) -> Value:
    """The flow at which the curve is read: ``flow`` itself, or scaled to the curve's speed."""
    apart = speeds(entry)
    if apart is None:
        return flow
    return entry.ledger.apply("flow_at_curve_speed", {"Q": flow, "n_0": apart[1], "n_p": apart[0]})


def speeds(entry: Entry) -> tuple[Value, Value] | None:
    """Speed of the pump and of the curve, where the file gives both and they differ."""
    pump, curve = entry.calculation.pump.speed, entry.calculation.pump.npsh_required.speed
    if pump is None or curve is None or pump.quantity.si() == curve.quantity.si():
        return None
    return pump_speed(entry, pump), curve_speed(entry, curve)


def pump_speed(entry: Entry, given: Given) -> Value:
    """The speed at which the pump runs."""
    return entry.value(given, "n_p", "Speed of the pump")


def curve_speed(entry: Entry, given: Given) -> Value:
    """The speed of the maker's curve."""
    return entry.value(given, "n_0", "Speed of the NPSH curve")


def ends(entry: Entry) -> tuple[Value | None, Value]:
    """Lowest and highest flow at which NPSH required is known; a single value holds at its flow and, safely, below it."""
    npsh = entry.calculation.pump.npsh_required
    if npsh.points:
        return _flow(entry, 0), _flow(entry, len(npsh.points) - 1)
    return None, _at_flow(entry, npsh)


def at(entry: Entry, flow: Value, *, only_there: bool = False) -> Read:
    """NPSH required at ``flow`` and at the speed of the curve; ``only_there``: a single value holds at its own flow alone."""
    npsh = entry.calculation.pump.npsh_required
    entry.ledger.group("NPSH required")
    lowest, highest = ends(entry)
    if beyond(flow, highest) or (lowest is not None and beyond(lowest, flow)):
        return Read(None, _outside(entry, flow, lowest, highest))
    if npsh.points:
        return Read(_between(entry, flow))
    there = _one(flow.shadow, highest.shadow)
    if only_there and not there:
        return Read(None, f"NPSH required is stated at {_given(npsh.at_flow).text} only")
    beside = "" if there else "NPSH required is the one of a higher flow, on the safe side"
    value = _given(npsh.value)
    return Read(entry.value(value, "NPSHR", f"NPSH required, {_basis(npsh)}", note=_curve(npsh)), beside=beside)


#: Relative difference below which two flows are one: the noise of double precision, where one was scaled.
_NOISE = 1e-9


def beyond(a: Value, b: Value) -> bool:
    """Whether ``a`` exceeds ``b``, by more than the noise of double precision."""
    return a.shadow > b.shadow and not _one(a.shadow, b.shadow)


def _one(a: float, b: float) -> bool:
    return isclose(a, b, rel_tol=_NOISE)


def _outside(entry: Entry, flow: Value, lowest: Value | None, highest: Value) -> str:
    if lowest is None:
        return "NPSH required is stated at a lower flow than this one, and it rises with flow: ask the maker"
    shown = entry.ledger.shown
    return f"beyond the tested range: the curve is read at {shown(flow)} and reaches from {shown(lowest)} to {shown(highest)}"


def _between(entry: Entry, flow: Value) -> Value:
    """The curve at ``flow``, which lies within its ends."""
    npsh = entry.calculation.pump.npsh_required
    flows = [float(point.flow.quantity.si()) for point in npsh.points]
    place = next((n for n, at_point in enumerate(flows) if _one(flow.shadow, at_point)), None)
    if place is not None:
        return _npsh(entry, place)
    above = bisect_left(flows, flow.shadow)
    operands = {"Q": flow, **_neighbours(entry, above - 1)}
    if npsh.interpolation != "smooth" or len(flows) == 2:
        return entry.ledger.apply("npsh_between_points", operands)
    entry.assume(
        "smooth curve",
        "NPSH required follows a smooth curve through the maker's points",
        "where the curve bends upwards it lies below the straight line between two points, which is the safe side",
    )
    slopes = {"dN_A": _slope(entry, above - 1, -1), "dN_B": _slope(entry, above - 1, +1)}
    part = entry.ledger.apply("curve_place", operands)
    return entry.ledger.apply("npsh_on_smooth_curve", operands | slopes | {"t": part})


def _neighbours(entry: Entry, place: int) -> dict[str, Value]:
    """The two points of the interval that begins at the point ``place``."""
    ends_ = {
        "Q_A": _flow(entry, place), "Q_B": _flow(entry, place + 1),
        "N_A": _npsh(entry, place), "N_B": _npsh(entry, place + 1),
    }  # fmt: skip
    if ends_["Q_A"].record == ends_["Q_B"].record:
        at, before = (entry.calculation.pump.npsh_required.points[each].flow for each in (place + 1, place))
        entry.refuse(
            at,
            "a flow that differs from the point before it in its first six digits",
            at.text,
            f"before it: {before.text}",
        )
    return ends_


def _interval(entry: Entry, place: int) -> tuple[Value, Value]:
    """Width and rise of the interval that begins at the point ``place``."""
    ends_, about = _neighbours(entry, place), f"points {place + 1} and {place + 2}"
    return entry.ledger.apply("curve_width", ends_, about), entry.ledger.apply("curve_rise", ends_, about)


def _slope(entry: Entry, place: int, side: Literal[-1, 1]) -> Value:
    """Rise over the interval ``place`` at the slope of its end on one ``side``.

    Source: Fritsch and Butland 1984.  The end of the curve has one interval only: its slope is that of three points.
    """
    ledger = entry.ledger
    inner = 0 <= place + side < len(entry.calculation.pump.npsh_required.points) - 1
    width, rise = _interval(entry, place)
    next_width, next_rise = _interval(entry, place + side if inner else place - side)
    widths = ledger.apply("curve_widths", {"b": width, "b_n": next_width})
    operands = {"dN": rise, "dN_n": next_rise, "x_b": widths}
    alike = _sign(rise) == _sign(next_rise)
    if inner:
        return ledger.apply("curve_slope" if alike and _sign(rise) else "curve_slope_flat", operands)
    free = ledger.apply("curve_end_slope", operands)
    if _sign(free) != _sign(rise):
        return ledger.apply("curve_slope_flat", operands)
    limited = free if alike else ledger.apply("curve_end_slope_limited", operands)
    return limited if abs(limited.record) < abs(free.record) else free


def _sign(value: Value) -> int:
    return (value.record > 0) - (value.record < 0)


def _flow(entry: Entry, place: int) -> Value:
    given = entry.calculation.pump.npsh_required.points[place].flow
    return entry.value(given, "Q_p", f"Flow at point {place + 1} of the NPSH curve")


def _npsh(entry: Entry, place: int) -> Value:
    npsh = entry.calculation.pump.npsh_required
    title = f"NPSH required at point {place + 1} of the curve, {_basis(npsh)}"
    return entry.value(npsh.points[place].npsh, "N_p", title, note=_curve(npsh))


def _at_flow(entry: Entry, npsh: NpshRequired) -> Value:
    return entry.value(_given(npsh.at_flow), "Q_r", "Flow at which NPSH required is stated")


def _given(given: Given | None) -> Given:
    assert given is not None, "source asks for value with at_flow where there are no points"
    return given


def _basis(npsh: NpshRequired) -> str:
    return npsh.basis if npsh.basis == "NPSH3" else "basis other than NPSH3, or not stated"


def _curve(npsh: NpshRequired) -> str:
    """What the maker's figure holds for, in words."""
    parts = [f"{npsh.certified} curve {npsh.curve}"]
    parts += [given.text for given in (npsh.speed, npsh.impeller) if given is not None]
    return ", ".join([*parts, f"counted from the {npsh.datum}"])


def _exponent(entry: Entry, pump: Value, curve: Value) -> Value:
    """The exponent of the speed ratio: as stated, else the usual one on the safe side."""
    given = entry.calculation.pump.npsh_required.speed_exponent
    if given is not None:
        return entry.value(given, "e_n", "Exponent of the speed ratio")
    faster = pump.shadow > curve.shadow
    text, word = EXPONENTS[faster], "faster" if faster else "slower"
    entry.assume(
        "speed exponent",
        f"NPSH required follows the speed with the exponent {text}: the pump runs {word} than the curve",
        "common practice, on the safe side: 2 when speeding up, 1.5 when slowing down; state speed_exponent to replace it",
    )
    place = f"common practice for a pump that runs {word} than its curve"
    return entry.ledger.tabulated("e_n", "Exponent of the speed ratio", parse(text, "exponent"), place, PRACTICE)
