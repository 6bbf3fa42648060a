"""Extremes in their order, lists that rise, and values that can be compared at all."""

from __future__ import annotations

from collections.abc import Iterator, Sequence
from itertools import pairwise

from ...faults import Fault
from ...quantity import Quantity
from ..nodes import Mapping, Node
from ..view import View

#: What a value counts as; the values of one group can only be compared when they count alike.
_MEASURES = {
    "gauge": "a gauge pressure",
    "absolute": "an absolute pressure",
    "pressure": "a pressure difference",
    "length": "a head",
    "dynamic_viscosity": "a dynamic viscosity",
    "kinematic_viscosity": "a kinematic viscosity",
}
#: Address -> the extremes there, each not below the one before it.
_EXTREMES = {
    "supply.level": ("lowest", "normal", "highest", "overflow"),
    "supply.pressure": ("lowest", "normal"),
    "site.barometer": ("lowest", "normal"),
    "liquid.temperature": ("lowest", "average", "normal", "highest"),
    "pump.flow": ("lowest", "normal", "highest"),
}
#: The same where the two ends are those of a window, which has a width.
_WINDOWS = ("criteria.bell_velocity", "criteria.operating_region")


def check(view: View) -> Iterator[Fault]:
    for address, names in _EXTREMES.items():
        yield from _ordered(view, address, view.at(*address.split(".")), names)
    for address in _WINDOWS:
        yield from _ordered(view, address, view.at(*address.split(".")), ("lowest", "highest"), apart=True)
    for address, element in view.elements():
        yield from _ordered(view, f"{address}.drop", element.get("drop"), ("clean", "fouled"))
        yield from _rising(view, f"{address}.curve", list(view.items("curve", node=element)), "flow", ("loss",))
    for address, reading in view.readings():
        span = view.at("gauge", "span", node=reading)
        yield from _ordered(view, f"{address}.gauge.span", span, ("lowest", "highest"), apart=True)
    points = list(view.items("pump", "npsh_required", "points"))
    yield from _rising(view, "pump.npsh_required.points", points, "flow", ())
    yield from _rising(view, "liquid.table", list(view.items("liquid", "table")), "temperature", ("viscosity",))


def _ordered(
    view: View, address: str, node: Node | None, names: tuple[str, ...], *, apart: bool = False
) -> Iterator[Fault]:
    """Extremes are measured alike and stand in their order, ``apart`` where they may not be equal."""
    present = [name for name in names if view.quantity(name, node=node)] if isinstance(node, Mapping) else []
    for low, high in pairwise(present):
        a, b, place = view.quantity(low, node=node), view.quantity(high, node=node), view.at(high, node=node)
        assert a and b and place
        odd = _alike(view, place, f"{address}.{high}", a, b, f"`{low}`")
        yield from odd
        if not odd and (a.si() > b.si() or (apart and a.si() == b.si())):
            wanted = f"a value above `{low}`" if apart else f"a value not below `{low}`"
            found = f"{_shown(b)}, {'not above' if apart else 'below'} {low} ({_shown(a)})"
            yield view.fault(place, f"{address}.{high}", wanted, found, "", "order")


def _rising(
    view: View, address: str, items: Sequence[tuple[str, Mapping]], rising: str, alike: tuple[str, ...]
) -> Iterator[Fault]:
    """The items of a list rise in one of their values; others are measured alike."""
    for (_, before), (name, item) in pairwise(items):
        a, b, place = view.quantity(rising, node=before), view.quantity(rising, node=item), item.get(rising)
        if a and b and place and a.si() >= b.si():
            wanted = f"a {rising} above that of the one before it"
            found = f"{_shown(b)} after {_shown(a)}"
            hint = f"list them in rising {rising}, each {rising} once"
            yield view.fault(place, f"{address}[{name}].{rising}", wanted, found, hint, "order")
        for each in alike:
            a, b, place = view.quantity(each, node=before), view.quantity(each, node=item), item.get(each)
            if a and b and place:
                yield from _alike(view, place, f"{address}[{name}].{each}", a, b, "the one before it")


def _alike(view: View, place: Node, key: str, a: Quantity, b: Quantity, other: str) -> list[Fault]:
    ours, theirs = (_MEASURES.get(v.reference or v.unit.kind, v.unit.kind) for v in (a, b))
    if ours == theirs:
        return []
    hint = f"write both as {ours} or both as {theirs}"
    return [view.fault(place, key, f"{ours}, as for {other}", theirs, hint, "measure")]


def _shown(value: Quantity) -> str:
    return f"{value.text} {value.unit.name}"
