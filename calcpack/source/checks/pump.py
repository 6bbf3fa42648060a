"""The pump: what NPSH required holds for, and what a reciprocating pump needs beside it."""

from __future__ import annotations

from collections.abc import Iterator

from ...faults import Fault
from ..nodes import Mapping
from ..schema import add, schema
from ..view import View


def check(view: View) -> Iterator[Fault]:
    pump, required = view.at("pump"), view.at("pump", "npsh_required")
    if isinstance(required, Mapping):
        yield from _curve(view, required)
        yield from _speed(view, required)
    reciprocating = view.at("pump", "reciprocating")
    if isinstance(pump, Mapping) and isinstance(reciprocating, Mapping):
        yield from _reciprocating(view, pump, reciprocating)


def _curve(view: View, required: Mapping) -> Iterator[Fault]:
    """NPSH required is one value at its flow, or points of a curve."""
    key, part = "pump.npsh_required", schema()["$defs"]["npsh_required"]
    points, held = required.get("points"), [name for name in ("value", "at_flow") if required.get(name)]
    if points and held:
        wanted = "either `points`, or `value` with `at_flow`"
        yield view.fault(points, f"{key}.points", wanted, "both", "leave one of the two out", "npsh")
    elif not points and not held:
        wanted, hint = "`value` with `at_flow`, or `points`", f"{add(part, 'value')}, and `at_flow`"
        yield view.fault(required, key, wanted, "neither", hint, "npsh")
    elif len(held) == 1:
        missing = "at_flow" if held == ["value"] else "value"
        wanted = f"`{missing}` beside `{held[0]}`: NPSH required holds at a flow"
        yield view.fault(required, f"{key}.{missing}", wanted, "none", add(part, missing), "missing key")
    smooth = required.get("interpolation")
    if smooth and not points:
        wanted = "no `interpolation` without `points`"
        yield view.fault(smooth, f"{key}.interpolation", wanted, "one", "leave it out", "npsh")


def _speed(view: View, required: Mapping) -> Iterator[Fault]:
    """NPSH required is carried from the speed of the curve to that of operation."""
    operating, exponent = view.at("pump", "speed"), required.get("speed_exponent")
    if operating and not required.get("speed"):
        wanted = "`speed` of the curve beside the `speed` of the pump"
        hint = add(schema()["$defs"]["npsh_required"], "speed")
        yield view.fault(required, "pump.npsh_required.speed", wanted, "none", hint, "speed")
    if exponent and not operating:
        wanted = "`pump.speed` beside `speed_exponent`: at the speed of the curve nothing is carried"
        hint = "add `speed` to `pump`, or leave the exponent out"
        yield view.fault(exponent, "pump.npsh_required.speed_exponent", wanted, "none", hint, "speed")


def _reciprocating(view: View, pump: Mapping, reciprocating: Mapping) -> Iterator[Fault]:
    """The acceleration head rests on the pump's type, the liquid, the speed and the line."""
    key, part = "pump.reciprocating", schema()["$defs"]["reciprocating"]
    for words, number in (("type", "C"), ("liquid", "k")):
        if not reciprocating.get(words) and not reciprocating.get(number):
            wanted = f"`{words}`, or the coefficient `{number}` itself"
            yield view.fault(reciprocating, f"{key}.{words}", wanted, "neither", add(part, words), "reciprocating")
    if not pump.get("speed"):
        wanted = "`speed` of a reciprocating pump, on which its acceleration head depends"
        yield view.fault(pump, "pump.speed", wanted, "none", add(schema()["$defs"]["pump"], "speed"), "reciprocating")
    if not view.at("line"):
        wanted = "a `line` before a reciprocating pump: the liquid in it is what is accelerated"
        yield view.fault(reciprocating, key, wanted, "none", "add `line:`", "reciprocating")
