"""What the schema cannot see: values that must agree with one another.

Every check takes the tree as it is, with faults elsewhere in it, so that one run finds all of them.
"""

from __future__ import annotations

from collections.abc import Iterator
from dataclasses import dataclass
from datetime import date
from itertools import pairwise

from ..faults import Fault, did_you_mean, listed, nearest, shown
from ..quantity import Quantity
from .build import inherit
from .inputs import Provenance
from .nodes import Mapping, Mark, Node, Scalar, Sequence, below, children, label


@dataclass(frozen=True)
class View:
    """The tree with what was read from it; ``at`` may find nothing, since faults may stand anywhere."""

    root: Mapping
    read: dict[Mark, Quantity]
    file: str

    def at(self, *names: str, node: Node | None = None) -> Node | None:
        found: Node | None = node or self.root
        for name in names:
            found = found.get(name) if isinstance(found, Mapping) else None
        return found

    def text(self, *names: str, node: Node | None = None) -> str:
        found = self.at(*names, node=node)
        return found.text if isinstance(found, Scalar) else ""

    def items(self, *names: str, node: Node | None = None) -> Iterator[tuple[str, Mapping]]:
        """``(label, item)`` of a list of mappings."""
        found = self.at(*names, node=node)
        for index, item in enumerate(found.items if isinstance(found, Sequence) else ()):
            if isinstance(item, Mapping):
                yield label(item, index), item

    def quantity(self, *names: str, node: Node | None = None) -> Quantity | None:
        found = self.at(*names, node=node)
        value = found.get("value") if isinstance(found, Mapping) else found
        return self.read.get(value.mark) if isinstance(value, Scalar) else None

    def sections(self) -> Iterator[tuple[str, Mapping]]:
        for name, section in self.items("line", "sections"):
            yield f"line.sections[{name}]", section

    def elements(self) -> Iterator[tuple[str, Mapping]]:
        for address, section in self.sections():
            for name, element in self.items("elements", node=section):
                yield f"{address}.elements[{name}]", element

    def readings(self) -> Iterator[tuple[str, Mapping]]:
        for name, reading in self.items("readings"):
            yield f"readings[{name}]", reading

    def fault(
        self, node: Node, key: str, wanted: str, found: str, suggestion: str = "", kind: str = "check"
    ) -> Fault:
        return Fault(self.file, *node.mark, key, wanted, found, suggestion, kind)


def check(view: View) -> Iterator[Fault]:
    """Every fault between values."""
    for each in (
        _origins,
        _unique,
        _dates,
        _revisions,
        _order,
        _bores,
        _entrances,
        _routes,
        _barometer,
        _liquid,
        _margin,
        _readings,
    ):
        yield from each(view)


def _origins(view: View) -> Iterator[Fault]:
    """Every cited source is listed, and every assumption says on what it rests."""
    listing = view.at("sources")
    known = [name.text for name, _ in listing.entries] if isinstance(listing, Mapping) else []

    def visit(node: Node, key: str, above: Provenance) -> Iterator[Fault]:
        origin = inherit(node, above)
        if isinstance(node, Mapping):
            cited, status = node.get("source"), node.get("status")
            if isinstance(cited, Scalar) and cited.text.strip() and origin.source not in known:
                near = nearest(origin.source, known)
                hint = (
                    f"did you mean `{near}`?"
                    if near
                    else "add the document to `sources`, and cite its id and the place in it"
                )
                wanted = (
                    f"the id of a source ({listed(known)})"
                    if known
                    else "the id of a source listed under `sources`"
                )
                yield view.fault(cited, below(key, "source"), wanted, shown(cited.text), hint, "source")
            if isinstance(status, Scalar) and status.text == "assumed" and not origin.note:
                wanted = "a note that gives the basis of the assumption"
                yield view.fault(status, below(key, "status"), wanted, "none", "add `note:`", "assumption")
        for address, _, child in children(node, key):
            yield from visit(child, address, origin)

    for address, name, child in children(view.root, ""):
        if name not in ("calculation", "revisions", "sources"):
            yield from visit(child, address, Provenance())


def _unique(view: View) -> Iterator[Fault]:
    groups = [("id", list(view.sections()))]
    groups += [
        ("id", [(f"{address}.elements[{name}]", item) for name, item in view.items("elements", node=section)])
        for address, section in view.sections()
    ]
    groups += [
        ("name", list(view.readings())),
        ("revision", [(f"revisions[{n}]", r) for n, r in view.items("revisions")]),
    ]
    for name, items in groups:
        first: dict[str, int] = {}
        for address, item in items:
            own = item.get(name)
            if isinstance(own, Scalar) and own.text in first:
                found = f"{shown(own.text)} again, after line {first[own.text]}"
                yield view.fault(own, below(address, name), f"each {name} once", found, "", "duplicate id")
            elif isinstance(own, Scalar):
                first[own.text] = own.mark[0]


def _day(node: Node | None) -> date | None:
    try:
        return date.fromisoformat(node.text) if isinstance(node, Scalar) and len(node.text) == 10 else None
    except ValueError:
        return None


def _dates(view: View) -> Iterator[Fault]:
    """Every date is a day of the calendar; no test is later than the calculation that uses it."""
    places = [("calculation", view.at("calculation"))]
    places += [(f"revisions[{name}]", item) for name, item in view.items("revisions")]
    places += list(view.readings())
    issued = _day(view.at("calculation", "date"))
    for address, item in places:
        node = item.get("date") if isinstance(item, Mapping) else None
        day = _day(node)
        if (
            isinstance(node, Scalar)
            and day is None
            and len(node.text) == 10
            and node.text.replace("-", "").isdigit()
        ):
            yield view.fault(
                node, below(address, "date"), "a day of the calendar", shown(node.text), "", "date"
            )
        elif node and day and issued and day > issued and address.startswith("readings"):
            wanted = f"a day not later than the calculation's date, {issued}"
            yield view.fault(node, below(address, "date"), wanted, shown(str(day)), "", "date")


def _revisions(view: View) -> Iterator[Fault]:
    current, listing = view.at("calculation", "revision"), view.at("revisions")
    entries = {view.text("revision", node=item): (name, item) for name, item in view.items("revisions")}
    if not isinstance(current, Scalar) or not isinstance(listing, Sequence):
        return
    if current.text not in entries:
        wanted = f"an entry for the current revision, {shown(current.text)}"
        yield view.fault(
            listing, "revisions", wanted, listed(map(shown, entries)) or "none", "add it", "revision"
        )
        return
    name, item = entries[current.text]
    entry, issued = _day(item.get("date")), _day(view.at("calculation", "date"))
    if entry and issued and entry != issued:
        wanted = f"the date of the calculation, {issued}, for its current revision"
        yield view.fault(
            item.get("date") or item, f"revisions[{name}].date", wanted, shown(str(entry)), "", "date"
        )


def _order(view: View) -> Iterator[Fault]:
    """Extremes stand in their order."""
    groups: list[tuple[str, Node | None, tuple[str, ...]]] = [
        ("supply.level", view.at("supply", "level"), ("lowest", "normal", "highest")),
        ("supply.pressure", view.at("supply", "pressure"), ("lowest", "normal")),
        ("site.barometer", view.at("site", "barometer"), ("lowest", "normal")),
        ("liquid.temperature", view.at("liquid", "temperature"), ("average", "normal", "highest")),
        ("pump.flow", view.at("pump", "flow"), ("normal", "highest")),
    ]
    groups += [
        (f"{address}.drop", element.get("drop"), ("clean", "fouled")) for address, element in view.elements()
    ]
    for address, node, names in groups:
        held = [(name, view.quantity(name, node=node)) for name in names if isinstance(node, Mapping)]
        present = [(name, value) for name, value in held if value]
        for (low, a), (high, b) in pairwise(present):
            if a.reference == b.reference and a.unit.kind == b.unit.kind and a.si() > b.si():
                place = view.at(high, node=node)
                assert place is not None
                found = f"{b.text} {b.unit.name}, below {low} ({a.text} {a.unit.name})"
                yield view.fault(place, f"{address}.{high}", f"a value not below `{low}`", found, "", "order")


def _bores(view: View) -> Iterator[Fault]:
    """A bore is a size with its schedule, or is given; a section has a roughness."""
    taps = [
        (f"{address}.gauge.tap", view.at("gauge", "tap", node=reading))
        for address, reading in view.readings()
    ]
    for address, node in [*view.sections(), *taps]:
        if not isinstance(node, Mapping):
            continue
        size, schedule, bore = (node.get(name) for name in ("size", "schedule", "bore"))
        if bore and (size or schedule):
            wanted = "either `size` with `schedule`, or `bore`"
            yield view.fault(bore, below(address, "bore"), wanted, "both", "leave one of the two out", "bore")
        elif not bore and not size:
            found = "`schedule` alone" if schedule else "neither"
            yield view.fault(
                node,
                address,
                "`size` with `schedule`, or `bore`",
                found,
                "add `bore: 202.7 mm` or the like",
                "bore",
            )
        elif size and not schedule:
            wanted = "`schedule` beside `size`: a nominal size alone has no bore"
            yield view.fault(
                size, below(address, "schedule"), wanted, "none", "add `schedule: STD` or the like", "bore"
            )
        if address.startswith("line") and not node.get("material") and not node.get("roughness"):
            yield view.fault(
                node,
                address,
                "`material` or `roughness`",
                "neither",
                "add `material: commercial steel` or the like",
                "roughness",
            )


def _entrances(view: View) -> Iterator[Fault]:
    for address, element in view.elements():
        given = [name for name in ("shape", "K") if element.get(name)]
        if view.text("kind", node=element) == "entrance" and len(given) != 1:
            found = "both" if given else "neither"
            yield view.fault(
                element,
                address,
                "`shape` or `K` of the entrance",
                found,
                "" if given else "add `shape: flush`",
                "K",
            )


def _routes(view: View) -> Iterator[Fault]:
    """There is something to compute, and what is given is used."""
    line, level, supply = view.at("line"), view.at("supply", "level"), view.at("supply")
    kind = view.text("supply", "kind")
    if line and kind == "main":
        hint = "give `readings` and leave `line` out: a main has no surface to start from"
        yield view.fault(line, "line", "no line from a main", "a line", hint, "route")
    elif line and isinstance(supply, Mapping) and not level:
        yield view.fault(
            supply,
            "supply.level",
            "a level, from which the line starts",
            "none",
            "add `level: {lowest: …}`",
            "route",
        )
    elif not line and not view.at("readings"):
        wanted = "`line` with `supply.level`, or `readings`, or both"
        yield view.fault(view.root, "", wanted, "neither, so there is nothing to calculate", "", "route")


def _barometer(view: View) -> Iterator[Fault]:
    site = view.at("site")
    if not isinstance(site, Mapping):
        return
    barometer, elevation = site.get("barometer"), site.get("elevation")
    if isinstance(barometer, Mapping) and not any(barometer.get(name) for name in ("lowest", "normal")):
        yield view.fault(
            barometer, "site.barometer", "`lowest`, `normal` or both", "neither", "", "barometer"
        )
    elif not barometer and not elevation:
        wanted = "`barometer`, or `elevation` with `weather_allowance`"
        yield view.fault(
            site,
            "site",
            wanted,
            "neither",
            "add `barometer: {lowest: 99.3 kPa absolute}` or the like",
            "barometer",
        )
    elif elevation and not barometer and not site.get("weather_allowance"):
        wanted = "`weather_allowance` beside `elevation`: the standard atmosphere knows no weather"
        yield view.fault(
            elevation,
            "site.weather_allowance",
            wanted,
            "none",
            "add `weather_allowance: 1.7 kPa` or the like",
            "barometer",
        )


def _liquid(view: View) -> Iterator[Fault]:
    liquid = view.at("liquid")
    if not isinstance(liquid, Mapping):
        return
    temperature, name = liquid.get("temperature"), liquid.get("name")
    if isinstance(temperature, Mapping) and not any(
        temperature.get(each) for each in ("average", "normal", "highest")
    ):
        wanted = "`average`, `normal` or `highest`"
        yield view.fault(temperature, "liquid.temperature", wanted, "none of them", "add `highest`", "liquid")
    if not isinstance(name, Scalar) or name.text in ("", "water"):
        return
    above = inherit(liquid, Provenance())
    missing = []
    for each in ("density", "viscosity", "vapour_pressure"):
        node = liquid.get(each)
        origin = inherit(node, above) if node else None
        if origin is None or not (origin.source or origin.status == "assumed"):
            missing.append(each)
    if missing:
        wanted = (
            f"`water`, or {listed(missing)} with a source"
            if len(missing) == 1
            else (f"`water`, or {', '.join(missing[:-1])} and {missing[-1]}, each with a source")
        )
        hint = did_you_mean(name.text, ["water"]) or "add them: properties are looked up for water only"
        yield view.fault(name, "liquid.name", wanted, shown(name.text), hint, "liquid")


def _margin(view: View) -> Iterator[Fault]:
    margin = view.at("criteria", "npsh_margin")
    if isinstance(margin, Mapping) and not margin.get("ratio") and not margin.get("difference"):
        wanted = "`ratio`, `difference` or both"
        yield view.fault(
            margin, "criteria.npsh_margin", wanted, "neither", "add `ratio: 1.10` or the like", "criteria"
        )


def _readings(view: View) -> Iterator[Fault]:
    """What a reading needs for the plant it was taken on."""
    strained = [
        view.text("name", node=e) for _, e in view.elements() if view.text("kind", node=e) == "strainer"
    ]
    kind = view.text("supply", "kind")
    for address, reading in view.readings():
        gauge, level, surface = (reading.get(name) for name in ("gauge", "level", "surface_pressure"))
        if (
            isinstance(gauge, Mapping)
            and view.text("leg", node=gauge) == "dry"
            and not gauge.get("tap_elevation")
        ):
            wanted = "`tap_elevation` beside a dry leg: the pressure acts at the tap, not at the gauge"
            yield view.fault(
                gauge, f"{address}.gauge.tap_elevation", wanted, "none", "add `tap_elevation`", "reading"
            )
        if strained and not reading.get("strainers"):
            wanted = f"`strainers: clean` or `strainers: fouled`, since the line has {listed(strained)}"
            yield view.fault(reading, f"{address}.strainers", wanted, "none", "add it", "reading")
        if level and kind == "gas_blanketed" and not surface:
            wanted = "`surface_pressure` beside `level` for a gas-blanketed vessel"
            yield view.fault(reading, f"{address}.surface_pressure", wanted, "none", "add it", "reading")
        if surface and kind in ("open", "main"):
            wanted = "no `surface_pressure`: only a gas-blanketed vessel has one"
            yield view.fault(surface, f"{address}.surface_pressure", wanted, "one", "leave it out", "reading")
        if level and kind == "main":
            yield view.fault(
                level,
                f"{address}.level",
                "no `level`: a main has no surface",
                "one",
                "leave it out",
                "reading",
            )
