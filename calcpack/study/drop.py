"""Losses given at a flow: strainers, connectors, equipment with its curve, and flow coefficients Cv and Kv."""

from __future__ import annotations

from ..quantity import parse
from ..source.inputs import Element, Given
from ..value import Value
from .entry import Entry
from .passing import Passing

#: A flow this much beyond a point, in parts of it, is at that point: the same flow typed in two units.
SAME = 1e-9


def at_flow(at: Passing, loss: Given, element: Element, words: str) -> Value:
    """A loss known at one flow, scaled by the square of the flow."""
    assert element.at_flow is not None, "source asks for the flow beside the loss"
    head = _head(at, loss, words, "its reference flow", "h_0")
    at.turbulent(element)
    at.entry.assume(
        f"viscosity {element.id}",
        f"The loss of {words} is turbulent and goes by the square of the flow, whatever the liquid's viscosity",
        "a liquid thicker than the one the loss was stated for loses more: ask the maker, above all for the coldest case",
    )
    reference = at.entry.value(element.at_flow, "Q_0", f"Reference flow of the loss, {element.name or element.kind}")
    return at.entry.ledger.apply("loss_at_flow", {"h_0": head, "Q": at.flow.flow, "Q_0": reference}, words)


def strainer(at: Passing, element: Element) -> tuple[str, Value]:
    """A strainer's words and its loss, clean or fouled as the state asks; fouled only where the file gives that drop."""
    name = element.name or "strainer"
    fouled = at.state.strainers == "fouled" and element.fouled is not None
    drop = element.fouled if fouled else element.clean
    assert drop is not None, "source asks for the clean drop"
    words = f"{name}, {'fouled' if fouled else 'clean'}"
    return words, at_flow(at, drop, element, words)


def on_curve(at: Passing, element: Element, words: str) -> Value:
    """A loss read linearly between two points of the maker's curve; refused beyond its ends."""
    entry, flow, curve = at.entry, at.flow.flow, element.curve
    if not _reaches(flow, curve[0].flow) or _reaches(flow, curve[-1].flow, -SAME):
        entry.refuse(
            curve[0].flow,
            f"a curve of {words} that covers the flow through it, {entry.ledger.shown(flow)}",
            f"{curve[0].flow.text} to {curve[-1].flow.text}",
            "a curve is not carried beyond its points; ask the maker",
        )
    below = max(n for n, point in enumerate(curve[:-1]) if _reaches(flow, point.flow))
    a, b = curve[below], curve[below + 1]
    title = f"Flow of a point of the curve, {words}"
    operands = {
        "Q": flow,
        "Q_A": entry.value(a.flow, "Q_A", title),
        "Q_B": entry.value(b.flow, "Q_B", title),
        "h_A": _head(at, a.loss, words, a.flow.text, "h_A"),
        "h_B": _head(at, b.loss, words, b.flow.text, "h_B"),
    }
    return entry.ledger.apply("loss_between_points", operands, words)


def _reaches(flow: Value, point: Given, room: float = SAME) -> bool:
    return flow.shadow >= float(point.quantity.si()) * (1 - room)


def flow_coefficient(at: Passing, element: Element, words: str) -> Value:
    """The loss of a valve by its Cv or Kv: the flow of water, in gal/min or m³/h, that loses 1 psi or 1 bar."""
    ledger = at.entry.ledger
    if element.Cv is not None:
        given, unit, constant, of = element.Cv, "gal/min", "dp_C", "Cv, gal/min of water at 60 °F that lose 1 psi"
    else:
        assert element.Kv is not None, "called for a flow coefficient"
        given, unit, constant, of = element.Kv, "m³/h", "dp_K", "Kv, m³/h of water that lose 1 bar"
    text = f"{given.text} {unit}"
    reference = ledger.convert(
        ledger.given(
            "Q_0", f"Flow coefficient of {words}: {of}", parse(text, "flow"), text=text, key=given.key,
            file_line=given.line, provenance=given,
        )
    )  # fmt: skip
    head = ledger.apply(
        "flow_coefficient_head",
        {"dp_0": ledger.constant(constant), "rho_w": ledger.constant("rho_w"), "g": ledger.constant("g")},
        given.key.rpartition(".")[2],
    )
    return ledger.apply("loss_at_flow", {"h_0": head, "Q": at.flow.flow, "Q_0": reference}, words)


def equal(entry: Entry, element: Element, lost: Value) -> Value:
    """``lost`` by each of several equal elements, or by one."""
    if element.count == 1:
        return lost
    return entry.ledger.apply("equal_elements", {"n": entry.count(element), "h_e": lost}, f"element {element.id}")


def _head(at: Passing, loss: Given, words: str, flow: str, symbol: str) -> Value:
    """A loss given as a head at a flow, or as a pressure difference and then converted to head of the liquid."""
    if loss.quantity.unit.kind == "length":
        return at.entry.value(loss, symbol, f"Loss of {words} at {flow}")
    pressure = at.entry.value(loss, "dp_0", f"Pressure drop of {words} at {flow}")
    about = f"{words}, at {flow}"
    return at.entry.ledger.apply("drop_as_head", {"dp_0": pressure, "gamma": at.liquid.specific_weight}, about)
