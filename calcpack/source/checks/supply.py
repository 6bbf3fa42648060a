"""Where the line starts, and by which route NPSH available is found."""

from __future__ import annotations

from collections.abc import Iterator

from ...faults import Fault
from ..nodes import Mapping
from ..schema import add, allowed, schema
from ..view import View

#: What a main states where a line starts in it, and nowhere else.
_START = ("pressure", "elevation", "velocity_head")


def check(view: View) -> Iterator[Fault]:
    yield from _routes(view)
    yield from _main(view)
    yield from _high_point(view)
    intake, kind = view.at("intake"), view.text("supply", "kind")
    if intake and not has_surface(view):
        wanted = f"no `intake` for kind {kind}: it has no free surface, so nothing can be submerged"
        yield view.fault(intake, "intake", wanted, "one", "leave it out", "intake")


def _high_point(view: View) -> Iterator[Fault]:
    """No element of the suction line lies above the high point of the loop."""
    node, highest = view.at("supply", "high_point"), view.quantity("supply", "high_point")
    for address, element in view.elements():
        elevation = view.quantity("elevation", node=element)
        if node and highest and elevation and elevation.si() > highest.si():
            wanted = "the highest point of the loop, not below any element of the line"
            found = f"{highest.text} {highest.unit.name}, below {address} ({elevation.text} {elevation.unit.name})"
            yield view.fault(node, "supply.high_point", wanted, found, "", "order")
            return


def has_surface(view: View) -> bool:
    """Whether the supply is of a kind with a free surface; so is one whose kind cannot be told."""
    supply = view.at("supply")
    return not isinstance(supply, Mapping) or "level" in allowed(supply, schema()["$defs"]["supply"])


def wet_pit(view: View) -> bool:
    return view.text("pump", "arrangement") == "wet_pit"


def _routes(view: View) -> Iterator[Fault]:
    """There is something to compute, and what is given is used."""
    line, level, supply = view.at("line"), view.at("supply", "level"), view.at("supply")
    if wet_pit(view):
        if line:
            wanted = (
                "no line for a wet-pit pump: NPSH counts from its bell, and what is lost above it is the pump's own"
            )
            yield view.fault(line, "line", wanted, "a line", "leave out `line`, or `pump.arrangement`", "route")
        if not has_surface(view):
            wanted = "a supply with a free surface for a wet-pit pump, which hangs in it"
            place = view.at("supply", "kind") or view.root
            yield view.fault(place, "supply.kind", wanted, f"kind {view.text('supply', 'kind')}", "", "route")
    elif not line and not view.at("readings"):
        wanted = "`line` with the `supply` it starts from, or `readings`, or both"
        yield view.fault(view.root, "", wanted, "neither, so there is nothing to calculate", "", "route")
    if (line or wet_pit(view)) and has_surface(view) and isinstance(supply, Mapping) and not level:
        wanted = "a level, from which the line starts" if line else "a level, from which the pump draws"
        yield view.fault(supply, "supply.level", wanted, "none", "add `level: {lowest: …}`", "route")


def _main(view: View) -> Iterator[Fault]:
    """A main states a pressure and where it holds if a line starts there, and only then."""
    supply = view.at("supply")
    if view.text("supply", "kind") != "main" or not isinstance(supply, Mapping):
        return
    for name in _START:
        found, key = supply.get(name), f"supply.{name}"
        if view.at("line") and not found:
            wanted = f"the key `{name}` of a main in which a line starts"
            yield view.fault(supply, key, wanted, "none", add(schema()["$defs"]["supply"], name), "missing key")
        elif found and not view.at("line"):
            wanted = f"no `{name}` of a main without a `line`: the gauge of a reading has seen it"
            yield view.fault(found, key, wanted, "one", "leave it out", "route")
