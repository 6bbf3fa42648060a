"""Elements of the line: each states its loss in one way, and a fitting is one of its published set."""

from __future__ import annotations

from collections.abc import Iterator

from ...faults import Fault, listed, shown
from ...fitting_set import LENDER, SETS, variants
from ..meant import likely
from ..nodes import Mapping, Scalar, below
from ..schema import add, allowed, schema
from ..view import View

#: Keys that name a fitting of a published set; an elbow's angle stands beside its radius.
_FITTINGS = ("shape", "radius", "type", "flow")
#: Every other way of stating a loss; ``loss`` stands with ``at_flow``.
_STATED = ("K", "L_over_D", "Cv", "Kv", "loss", "curve")


def check(view: View) -> Iterator[Fault]:
    part = schema()["$defs"]["element"]
    for address, element in view.elements():
        kind = view.text("kind", node=element)
        if kind not in part["properties"]["kind"]["enum"]:
            continue
        if kind == "reducer":
            yield from _reducer(view, address, element)
        ways = [way for way in (*_FITTINGS, *_STATED) if way in allowed(element, part)]
        if kind == "reducer":
            ways.remove("type")  # its form; its loss follows from its bores unless it is stated
        given = [way for way in ways if element.get(way)]
        if ways and len(given) != 1 and (given or kind != "reducer"):
            wanted = f"{'one of ' if len(ways) > 2 else ''}{listed(f'`{way}`' for way in ways)} of the {kind}"
            found = " and ".join(f"`{way}`" for way in given) or "none"
            yield view.fault(element, address, wanted, found, "keep one" if given else add(part, ways[0]), "K")
            continue
        way = given[0] if given else ""
        yield from _beside(view, address, element, way)
        yield from _published(view, address, element, way)


def _beside(view: View, address: str, element: Mapping, way: str) -> Iterator[Fault]:
    """What stands beside the way a loss is stated, and is used with it only."""
    if way == "loss" and not element.get("at_flow"):
        hint = add(schema()["$defs"]["element"], "at_flow")
        yield view.fault(element, below(address, "at_flow"), "`at_flow` beside `loss`", "none", hint, "K")
    for name, needed in (("at_flow", "loss"), ("angle", "radius")):
        node = element.get(name)
        if node and way not in ("", needed):
            wanted, hint = f"no `{name}` beside `{way}`: it belongs to `{needed}`", "leave it out, or say it in `name`"
            yield view.fault(node, below(address, name), wanted, "one", hint, "K")


def _published(view: View, address: str, element: Mapping, way: str) -> Iterator[Fault]:
    """A fitting is one of the line's set, or of another where that is meant."""
    of_line, own = view.text("line", "fitting_set"), element.get("set")
    if own and way in _STATED:
        wanted, hint = f"no `set` beside `{way}`, which goes before it", "leave one of the two out"
        yield view.fault(own, below(address, "set"), wanted, "one", hint, "fitting")
        return
    named = view.text("set", node=element) or of_line
    if own and of_line and named != of_line and view.text("line", "mixed_sets") != "intended":
        wanted = f"the set of the line, {of_line}: sets rest on different tests and are not mixed unawares"
        hint = "leave `set` out, or add `mixed_sets: intended` to the line"
        yield view.fault(own, below(address, "set"), wanted, shown(named), hint, "fitting")
    elif named in SETS and way in _FITTINGS:
        yield from _offered(view, address, element, way, named)


def _offered(view: View, address: str, element: Mapping, way: str, named: str) -> Iterator[Fault]:
    """The set holds the fitting, or lacks the kind altogether and borrows it; an elbow is named by angle and radius."""
    kind, node, typed = view.text("kind", node=element), element.get(way), view.text(way, node=element)
    if not isinstance(node, Scalar) or not typed:
        return
    lender = named if variants(named, kind) else LENDER
    offered: dict[str, list[str]] = {}
    for variant in variants(lender, kind):
        angle, _, radius = variant.partition(" ") if kind == "elbow" else ("", "", variant)
        offered.setdefault(radius, []).append(angle)
    angle, of_set = view.text("angle", node=element) or "90", f"of the set {SETS[lender].name}"
    if typed not in offered:
        hint = likely(typed, offered) or "state its K with its source"
        yield view.fault(node, below(address, way), f"{listed(offered)}, {of_set}", shown(typed), hint, "choice")
    elif kind == "elbow" and angle not in offered[typed]:
        wanted = f"{listed(offered[typed])} degrees with radius {typed}, {of_set}"
        place = element.get("angle") or node
        yield view.fault(place, below(address, "angle"), wanted, angle, "state its K with its source", "choice")


def _reducer(view: View, address: str, element: Mapping) -> Iterator[Fault]:
    """A reducer says to which bore it leads or from which, and an eccentric one how it lies."""
    ends = [end for end in ("to", "from") if element.get(end)]
    if len(ends) != 1:
        wanted = "`to`, the pipe it leads to, or `from`, the pipe it comes from"
        hint = "keep the one that is not of this section" if ends else "add `to: {bore: 202.7 mm}` or the like"
        yield view.fault(element, address, wanted, "both" if ends else "neither", hint, "reducer")
    form, flat = view.text("type", node=element), element.get("flat_side")
    if form == "eccentric" and not flat:
        wanted = "`flat_side` of an eccentric reducer, on which it depends where gas gathers"
        yield view.fault(element, below(address, "flat_side"), wanted, "none", "add `flat_side: top`", "reducer")
    elif form == "concentric" and flat:
        wanted, hint = "no `flat_side` of a concentric reducer", "leave it out, or write `type: eccentric`"
        yield view.fault(flat, below(address, "flat_side"), wanted, "one", hint, "reducer")
