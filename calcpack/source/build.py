"""From a tree without faults to the typed records."""

from __future__ import annotations

from collections.abc import Callable, Iterator
from dataclasses import dataclass
from datetime import date
from hashlib import sha256
from pathlib import PurePath
from typing import Any, TypeVar

from ..quantity import Quantity
from .inputs import (
    Calculation,
    Criteria,
    Element,
    Extremes,
    Gauge,
    Given,
    Intake,
    Line,
    Liquid,
    NpshRequired,
    Pipe,
    Provenance,
    Pump,
    Reading,
    Revision,
    Section,
    Site,
    Source,
    Submergence,
    Supply,
)
from .nodes import Mapping, Mark, Node, Scalar, Sequence, below, label

T = TypeVar("T")


def inherit(node: Node, above: Provenance) -> Provenance:
    """The origin of ``node``: what it states itself, else what the mapping above it states.

    A source of its own is not held to the status of another, and an assumed value does not inherit a source.
    """
    own = {name: _text(node, name) for name in ("source", "status", "note", "confirm")}
    source, _, place = own["source"].partition(" ")
    status = own["status"] or ("" if source else above.status)
    if not source and own["status"] != "assumed":
        source, place = above.source, above.place
    note, confirm = own["note"] or above.note, own["confirm"] or above.confirm
    return Provenance(source=source, place=place, status=status, note=note, confirm=confirm)


def _text(node: Node, name: str) -> str:
    found = node.get(name) if isinstance(node, Mapping) else None
    return found.text if isinstance(found, Scalar) else ""


@dataclass(frozen=True)
class _Branch:
    """A mapping of the file with its address and its origin; its methods rely on a tree without faults."""

    node: Mapping
    key: str
    provenance: Provenance
    read: dict[Mark, Quantity]

    def text(self, name: str, absent: str = "") -> str:
        return _text(self.node, name) or absent

    def number(self, name: str, absent: int) -> int:
        return int(self.text(name, str(absent)))

    def day(self, name: str) -> date:
        return date.fromisoformat(self.text(name))

    def given(self, name: str) -> Given | None:
        node = self.node.get(name)
        if node is None:
            return None
        scalar = node.get("value") if isinstance(node, Mapping) else node
        assert isinstance(scalar, Scalar)
        origin = inherit(node, self.provenance)
        return Given(
            key=below(self.key, name),
            text=scalar.text,
            quantity=self.read[scalar.mark],
            line=scalar.mark[0],
            column=scalar.mark[1],
            **vars(origin),
        )

    def must(self, name: str) -> Given:
        found = self.given(name)
        assert found is not None
        return found

    def branch(self, name: str) -> _Branch:
        node = self.node.get(name)
        assert isinstance(node, Mapping)
        return _Branch(node, below(self.key, name), inherit(node, self.provenance), self.read)

    def maybe(self, name: str, make: Callable[[_Branch], T]) -> T | None:
        return make(self.branch(name)) if self.node.get(name) else None

    def each(self, name: str) -> Iterator[_Branch]:
        node = self.node.get(name)
        if isinstance(node, Sequence):
            for index, item in enumerate(node.items):
                assert isinstance(item, Mapping)
                address = f"{below(self.key, name)}[{label(item, index)}]"
                yield _Branch(item, address, inherit(item, self.provenance), self.read)

    @property
    def place(self) -> dict[str, Any]:
        line, column = self.node.mark
        return {"key": self.key, "line": line, "column": column, "provenance": self.provenance}


def build(root: Mapping, read: dict[Mark, Quantity], raw: bytes, name: str) -> Calculation:
    """The records of a checked tree; ``read`` holds the quantities by the mark of their text."""
    top = _Branch(root, "", Provenance(), read)
    head = top.branch("calculation")
    current = Revision(revision=head.text("revision"), date=head.day("date"), reason=head.text("status", "preliminary"))
    system: Any = head.text("units")
    paper: Any = head.text("paper", "Letter" if system == "US" else "A4")
    return Calculation(
        number=head.text("number"),
        title=head.text("title"),
        revision=current.revision,
        date=current.date,
        owner=head.text("owner"),
        project=head.text("project"),
        units=system,
        paper=paper,
        status=current.reason,
        purpose=head.text("purpose"),
        datum=head.text("datum"),
        revisions=tuple(map(_revision, top.each("revisions"))) or (current,),
        sources=top.maybe("sources", _sources) or (),
        site=_site(top.branch("site")),
        liquid=_liquid(top.branch("liquid")),
        supply=_supply(top.branch("supply")),
        line=top.maybe("line", _line),
        pump=_pump(top.branch("pump")),
        intake=top.maybe("intake", _intake),
        criteria=_criteria(top.branch("criteria")),
        readings=tuple(map(_reading, top.each("readings"))),
        path=PurePath(name).name,
        named=name,
        raw=raw,
        sha256=sha256(raw).hexdigest(),
    )


def _revision(at: _Branch) -> Revision:
    return Revision(revision=at.text("revision"), date=at.day("date"), reason=at.text("reason"))


def _sources(at: _Branch) -> tuple[Source, ...]:
    return tuple(
        Source(
            id=name.text,
            title=_text(node, "title"),
            document=_text(node, "document"),
            edition=_text(node, "edition"),
        )
        for name, node in at.node.entries
    )


def _extremes(at: _Branch) -> Extremes:
    return Extremes(
        lowest=at.given("lowest"),
        normal=at.given("normal"),
        highest=at.given("highest"),
        average=at.given("average"),
    )


def _site(at: _Branch) -> Site:
    return Site(
        elevation=at.given("elevation"),
        weather_allowance=at.given("weather_allowance"),
        barometer=at.maybe("barometer", _extremes),
    )


def _liquid(at: _Branch) -> Liquid:
    return Liquid(
        name=at.text("name"),
        temperature=_extremes(at.branch("temperature")),
        vapour_pressure=at.given("vapour_pressure"),
        density=at.given("density"),
        viscosity=at.given("viscosity"),
    )


def _supply(at: _Branch) -> Supply:
    kind: Any = at.text("kind")
    return Supply(
        name=at.text("name"),
        kind=kind,
        level=at.maybe("level", _extremes),
        pressure=at.maybe("pressure", _extremes),
    )


def _pipe(at: _Branch) -> Pipe:
    return Pipe(size=at.text("size"), schedule=at.text("schedule"), bore=at.given("bore"), provenance=at.provenance)


def _line(at: _Branch) -> Line:
    return Line(
        fitting_set=at.text("fitting_set"),
        friction_contingency=at.given("friction_contingency"),
        sections=tuple(map(_section, at.each("sections"))),
        provenance=at.provenance,
    )


def _section(at: _Branch) -> Section:
    return Section(
        id=at.text("id"),
        name=at.text("name"),
        pipe=_pipe(at),
        material=at.text("material"),
        roughness=at.given("roughness"),
        elements=tuple(map(_element, at.each("elements"))),
        **at.place,
    )


def _element(at: _Branch) -> Element:
    kind: Any = at.text("kind")
    drop = at.branch("drop") if kind == "strainer" else None
    return Element(
        id=at.text("id"),
        kind=kind,
        name=at.text("name"),
        count=at.number("count", 1),
        length=at.given("length"),
        shape=at.text("shape"),
        angle=at.number("angle", 90 if kind == "elbow" else 0),
        radius=at.text("radius"),
        type=at.text("type"),
        flow=at.text("flow"),
        K=at.given("K"),
        clean=drop.given("clean") if drop else None,
        fouled=drop.given("fouled") if drop else None,
        at_flow=at.given("at_flow"),
        **at.place,
    )


def _pump(at: _Branch) -> Pump:
    return Pump(
        name=at.text("name"),
        flow=_extremes(at.branch("flow")),
        datum_elevation=at.must("datum_elevation"),
        datum=at.text("datum"),
        npsh_required=_npsh_required(at.branch("npsh_required")),
    )


def _npsh_required(at: _Branch) -> NpshRequired:
    return NpshRequired(
        value=at.must("value"),
        at_flow=at.must("at_flow"),
        speed=at.given("speed"),
        impeller=at.given("impeller"),
        curve=at.text("curve"),
        basis=at.text("basis"),
        certified=at.text("certified"),
        datum=at.text("datum"),
        provenance=at.provenance,
    )


def _intake(at: _Branch) -> Intake:
    reference: Any = at.text("reference")
    return Intake(inlet_diameter=at.must("inlet_diameter"), reference=reference, elevation=at.must("elevation"))


def _criteria(at: _Branch) -> Criteria:
    margin = at.branch("npsh_margin")
    return Criteria(
        ratio=margin.given("ratio"),
        difference=margin.given("difference"),
        submergence=at.maybe("submergence", _submergence),
    )


def _submergence(at: _Branch) -> Submergence:
    return Submergence(method=at.text("method"), provenance=at.provenance)


def _reading(at: _Branch) -> Reading:
    return Reading(
        name=at.text("name"),
        date=at.day("date"),
        flow=at.must("flow"),
        barometer=at.must("barometer"),
        temperature=at.must("temperature"),
        level=at.given("level"),
        surface_pressure=at.given("surface_pressure"),
        gauge=_gauge(at.branch("gauge")),
        strainers=at.text("strainers"),
        **at.place,
    )


def _gauge(at: _Branch) -> Gauge:
    leg: Any = at.text("leg")
    return Gauge(
        pressure=at.must("pressure"),
        elevation=at.must("elevation"),
        leg=leg,
        tap=_pipe(at.branch("tap")),
        tap_elevation=at.given("tap_elevation"),
    )
