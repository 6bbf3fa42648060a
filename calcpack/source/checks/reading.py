"""What a reading needs for the plant it was taken on."""

from __future__ import annotations

from collections.abc import Iterator

from ...faults import Fault, listed
from ..nodes import Mapping
from ..view import View
from .supply import has_surface


def check(view: View) -> Iterator[Fault]:
    for address, reading in view.readings():
        yield from _gauge(view, address, reading)
        yield from _strainers(view, address, reading)
        yield from _supply(view, address, reading)


def _gauge(view: View, address: str, reading: Mapping) -> Iterator[Fault]:
    """A dry leg acts at the tap, and no gauge reads below zero absolute pressure."""
    gauge = reading.get("gauge")
    if isinstance(gauge, Mapping) and view.text("leg", node=gauge) == "dry" and not gauge.get("tap_elevation"):
        wanted = "`tap_elevation` beside a dry leg: the pressure acts at the tap, not at the gauge"
        yield view.fault(gauge, f"{address}.gauge.tap_elevation", wanted, "none", "add `tap_elevation`", "reading")
    node = view.at("gauge", "pressure", node=reading)
    read, barometer = view.quantity("gauge", "pressure", node=reading), view.quantity("barometer", node=reading)
    if node and read and barometer:
        below_barometer = read.si() if read.reference == "vacuum" else -read.si()
        if below_barometer >= barometer.si():
            over = f"a barometer of {barometer.text} {barometer.unit.name}"
            found = f"{read.text} {read.unit.name} {read.reference} under {over}"
            wanted = "a gauge reading above zero absolute pressure"
            hint = "check the sign and the units of gauge and barometer"
            yield view.fault(node, f"{address}.gauge.pressure", wanted, found, hint, "reading")


def _strainers(view: View, address: str, reading: Mapping) -> Iterator[Fault]:
    """The state of the line's strainers is told, and is one whose drop the file holds."""
    strainers = [element for _, element in view.elements() if view.text("kind", node=element) == "strainer"]
    state = reading.get("strainers")
    if strainers and not state:
        names = listed(view.text("name", node=element) for element in strainers)
        wanted = f"`strainers: clean` or `strainers: fouled`, since the line has {names}"
        yield view.fault(reading, f"{address}.strainers", wanted, "none", "add it", "reading")
    drops = [(view.text("name", node=element), element.get("drop")) for element in strainers]
    unknown = [name for name, drop in drops if isinstance(drop, Mapping) and not drop.get("fouled")]
    if state and view.text("strainers", node=reading) == "fouled" and unknown:
        wanted = f"`clean`, or a `fouled` drop of {listed(unknown)}"
        yield view.fault(state, f"{address}.strainers", wanted, "fouled", "add `fouled` to its `drop`", "reading")


def _supply(view: View, address: str, reading: Mapping) -> Iterator[Fault]:
    """A surface has a level, and only a gas-blanketed one a pressure of its own."""
    level, surface = reading.get("level"), reading.get("surface_pressure")
    kind = view.text("supply", "kind")
    if level and kind == "gas_blanketed" and not surface:
        wanted = "`surface_pressure` beside `level` for a gas-blanketed vessel"
        yield view.fault(reading, f"{address}.surface_pressure", wanted, "none", "add it", "reading")
    if surface and kind and kind != "gas_blanketed":
        wanted = "no `surface_pressure`: only a gas-blanketed vessel has one"
        yield view.fault(surface, f"{address}.surface_pressure", wanted, "one", "leave it out", "reading")
    if level and not has_surface(view):
        wanted = f"no `level` for kind {kind}: it has no surface"
        yield view.fault(level, f"{address}.level", wanted, "one", "leave it out", "reading")
