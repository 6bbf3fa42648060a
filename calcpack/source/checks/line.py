"""The sections of the line: bores, walls, what flows through them, and where the line begins."""

from __future__ import annotations

from collections.abc import Iterator
from itertools import pairwise

from ...faults import Fault, shown
from ..nodes import Mapping, Node, below
from ..schema import add, schema
from ..view import View
from .supply import has_surface

#: Liquids the method of Hazen and Williams holds for.
_WATERS = ("water", "sea water")
#: Elements of a line, in all its sections: more do not make one suction line.
MAX_ELEMENTS = 200


def check(view: View) -> Iterator[Fault]:
    for each in (_count, _bores, _walls, _hazen_williams, _pumps, _entrances, _reducers):
        yield from each(view)


def _count(view: View) -> Iterator[Fault]:
    elements = list(view.elements())
    if len(elements) > MAX_ELEMENTS:
        address, element = elements[MAX_ELEMENTS]
        wanted, hint = f"at most {MAX_ELEMENTS} elements in all sections", "put equal ones into one, with `count`"
        yield view.fault(element, address, wanted, f"{len(elements)}", hint, "count")


def _bores(view: View) -> Iterator[Fault]:
    """A bore is a size with its schedule, or is given."""
    pipes: list[tuple[str, Node | None]] = [*view.sections()]
    pipes += [(f"{address}.gauge.tap", view.at("gauge", "tap", node=item)) for address, item in view.readings()]
    pipes += [(f"{address}.{end}", item.get(end)) for address, item in view.elements() for end in ("to", "from")]
    for address, node in pipes:
        if not isinstance(node, Mapping):
            continue
        size, schedule, bore = (node.get(name) for name in ("size", "schedule", "bore"))
        if bore and (size or schedule):
            wanted = "either `size` with `schedule`, or `bore`"
            yield view.fault(bore, below(address, "bore"), wanted, "both", "leave one of the two out", "bore")
        elif not bore and not size:
            found = "`schedule` alone" if schedule else "neither"
            wanted, hint = "`size` with `schedule`, or `bore`", "add `bore: 202.7 mm` or the like"
            yield view.fault(node, address, wanted, found, hint, "bore")
        elif size and not schedule:
            wanted, hint = (
                "`schedule` beside `size`: a nominal size alone has no bore",
                "add `schedule: STD` or the like",
            )
            yield view.fault(size, below(address, "schedule"), wanted, "none", hint, "bore")


def _walls(view: View) -> Iterator[Fault]:
    """A section has a roughness wherever a friction factor is found from it."""
    smooth = view.text("line", "loss_method") == "hazen_williams"
    for address, section in view.sections():
        condition, rough = section.get("condition"), section.get("material") or section.get("roughness")
        equivalent = any(item.get("L_over_D") for _, item in view.items("elements", node=section))
        if not rough and (equivalent or not smooth):
            hint = "add `material: commercial steel` or the like"
            yield view.fault(section, address, "`material` or `roughness`", "neither", hint, "roughness")
        if condition and not section.get("material"):
            wanted = "`material` beside `condition`, whose state it is"
            yield view.fault(condition, below(address, "condition"), wanted, "none", "add `material`", "roughness")


def _hazen_williams(view: View) -> Iterator[Fault]:
    """The method is for water, and has its coefficient in every section with pipe; no other method has one."""
    node, name = view.at("line", "loss_method"), view.text("liquid", "name")
    used = view.text("line", "loss_method") == "hazen_williams"
    if used and node and name and name not in _WATERS:
        wanted = "darcy_weisbach: the method of Hazen and Williams holds for water only"
        found = f"hazen_williams for {shown(name)}"
        yield view.fault(node, "line.loss_method", wanted, found, "write `darcy_weisbach`", "method")
    for address, section in view.sections():
        key, given = below(address, "hazen_williams_C"), section.get("hazen_williams_C")
        piped = any(view.text("kind", node=item) == "pipe" for _, item in view.items("elements", node=section))
        if used and piped and not given:
            wanted = "the key `hazen_williams_C` for loss_method hazen_williams"
            yield view.fault(
                section, key, wanted, "none", add(schema()["$defs"]["section"], "hazen_williams_C"), "method"
            )
        elif given and not used:
            wanted = "no `hazen_williams_C`: it is for loss_method hazen_williams"
            yield view.fault(given, key, wanted, "one", "leave it out, or add `loss_method` to the line", "method")


def _pumps(view: View) -> Iterator[Fault]:
    """Toward the pump a line branches and never joins; its last section is the pump's own."""
    served: list[tuple[str, Node, int]] = []
    for address, section in view.sections():
        number = view.text("pumps", node=section) or "1"
        served.append(
            (
                below(address, "pumps"),
                section.get("pumps") or section,
                int(number) if number.isdecimal() and len(number) < 3 else 1,
            )
        )
    for (_, _, before), (key, node, after) in pairwise(served):
        if after > before:
            wanted = f"a number not above that of the section before it, {before}: toward the pump a line only branches"
            yield view.fault(node, key, wanted, f"{after}", "list the sections from the supply to the pump", "pumps")
    most, running = max((number for *_, number in served), default=1), view.at("pump", "running")
    count = view.text("pump", "running")
    pump = view.at("pump")
    if most > 1 and not running and isinstance(pump, Mapping):
        wanted = f"`running` beside a section that serves {most} pumps: how many of them run at most"
        yield view.fault(pump, "pump.running", wanted, "none", f"add `running: {most}`", "pumps")
    elif running and count.isdecimal() and int(count) > most and served:
        wanted = f"at most {most}, the pumps that the line serves"
        hint = "give the shared sections `pumps`, or leave `running` out where every pump has a line of its own"
        yield view.fault(running, "pump.running", wanted, count, hint, "pumps")
    if served and served[-1][2] != 1:
        key, node, last = served[-1]
        wanted = "1 for the last section, which leads to one pump"
        yield view.fault(node, key, wanted, f"{last}", "add the section from the header to the pump", "pumps")


def _entrances(view: View) -> Iterator[Fault]:
    """A line has one entrance at most: at its beginning, and out of a free surface."""
    kind, first = view.text("supply", "kind"), ""
    for number, (address, element) in enumerate(view.elements()):
        if view.text("kind", node=element) != "entrance":
            continue
        if not has_surface(view):
            wanted = f"no entrance for kind {kind}: the line starts in a pipe"
            yield view.fault(element, address, wanted, "one", "leave it out, or give a tee", "entrance")
        elif first:
            wanted = "one entrance, at the supply"
            hint = "a tank or a basin between two lines is the supply of the second"
            yield view.fault(element, address, wanted, f"a second one, after {first}", hint, "entrance")
        elif number:
            wanted = "the entrance as the first element: the line is listed from the supply to the pump"
            yield view.fault(element, address, wanted, f"element {number + 1} of the line", "move it up", "entrance")
        first = first or address


def _reducers(view: View) -> Iterator[Fault]:
    """A section has one bore: no pipe of it follows a reducer to another bore, or stands before one from another bore."""
    for address, section in view.sections():
        kinds = [view.text("kind", node=item) for _, item in view.items("elements", node=section)]
        for number, (name, element) in enumerate(view.items("elements", node=section)):
            for end, beyond, word in (("to", kinds[number:], "after"), ("from", kinds[:number], "before")):
                node = element.get(end)
                if node and kinds[number] == "reducer" and "pipe" in beyond:
                    wanted = f"no pipe of this section {word} a reducer with `{end}`: it has another bore"
                    hint = f"give the pipe {word} it a section of its own"
                    place = f"{address}.elements[{name}].{end}"
                    yield view.fault(node, place, wanted, "one", hint, "reducer")
