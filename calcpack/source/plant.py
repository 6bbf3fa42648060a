"""What the schema cannot see about the plant: keys that need, replace or exclude one another.

Every check takes the tree as it is, with faults elsewhere in it, so that one run finds all of them.
"""

from __future__ import annotations

from collections.abc import Iterator

from ..faults import Fault, did_you_mean, listed, shown
from .build import inherit
from .inputs import Provenance
from .nodes import Mapping, Scalar, below
from .view import View

#: Elements of a line, in all its sections: more do not make one suction line.
MAX_ELEMENTS = 200


def check_plant(view: View) -> Iterator[Fault]:
    """Every fault of the plant's description."""
    for each in (_elements, _bores, _entrances, _routes, _barometer, _liquid, _margin, _readings):
        yield from each(view)


def _elements(view: View) -> Iterator[Fault]:
    elements = list(view.elements())
    if len(elements) > MAX_ELEMENTS:
        address, element = elements[MAX_ELEMENTS]
        wanted, hint = f"at most {MAX_ELEMENTS} elements in all sections", "put equal ones into one, with `count`"
        yield view.fault(element, address, wanted, f"{len(elements)}", hint, "count")


def _bores(view: View) -> Iterator[Fault]:
    """A bore is a size with its schedule, or is given; a section has a roughness."""
    taps = [(f"{address}.gauge.tap", view.at("gauge", "tap", node=reading)) for address, reading in view.readings()]
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
    """A line has one entrance at most, and its loss is found in one way."""
    first = ""
    for address, element in view.elements():
        if view.text("kind", node=element) != "entrance":
            continue
        if first:
            wanted = "one entrance, at the supply"
            hint = "a tank or a basin between two lines is the supply of the second"
            yield view.fault(element, address, wanted, f"a second one, after {first}", hint, "entrance")
        first = first or address
        given = [name for name in ("shape", "K") if element.get(name)]
        if len(given) != 1:
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
        yield view.fault(barometer, "site.barometer", "`lowest`, `normal` or both", "neither", "", "barometer")
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
    if isinstance(temperature, Mapping) and not any(temperature.get(each) for each in ("average", "normal", "highest")):
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
        yield view.fault(margin, "criteria.npsh_margin", wanted, "neither", "add `ratio: 1.10` or the like", "criteria")
    ratio = view.quantity("criteria", "npsh_margin", "ratio")
    node = view.at("criteria", "npsh_margin", "ratio")
    if ratio and node and ratio.number < 1:
        wanted = "a ratio of 1 or more: NPSH available over NPSH required"
        hint = "ten per cent over NPSH required is `ratio: 1.10`"
        yield view.fault(node, "criteria.npsh_margin.ratio", wanted, ratio.text, hint, "criteria")


def _readings(view: View) -> Iterator[Fault]:
    """What a reading needs for the plant it was taken on."""
    strained = [view.text("name", node=e) for _, e in view.elements() if view.text("kind", node=e) == "strainer"]
    kind = view.text("supply", "kind")
    for address, reading in view.readings():
        gauge, level, surface = (reading.get(name) for name in ("gauge", "level", "surface_pressure"))
        if isinstance(gauge, Mapping) and view.text("leg", node=gauge) == "dry" and not gauge.get("tap_elevation"):
            wanted = "`tap_elevation` beside a dry leg: the pressure acts at the tap, not at the gauge"
            yield view.fault(gauge, f"{address}.gauge.tap_elevation", wanted, "none", "add `tap_elevation`", "reading")
        yield from _gauge(view, address, reading)
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


def _gauge(view: View, address: str, reading: Mapping) -> Iterator[Fault]:
    """No gauge reads below zero absolute pressure."""
    node = view.at("gauge", "pressure", node=reading)
    read, barometer = view.quantity("gauge", "pressure", node=reading), view.quantity("barometer", node=reading)
    if node and read and barometer:
        below_barometer = read.si() if read.reference == "vacuum" else -read.si()
        if below_barometer >= barometer.si():
            found = f"{read.text} {read.unit.name} {read.reference} under a barometer of {barometer.text} {barometer.unit.name}"
            wanted = "a gauge reading above zero absolute pressure"
            hint = "check the sign and the units of gauge and barometer"
            yield view.fault(node, f"{address}.gauge.pressure", wanted, found, hint, "reading")
