"""From a tree without faults to the typed records."""

from __future__ import annotations

from hashlib import sha256
from pathlib import PurePath
from typing import Any

from ..quantity import Quantity
from .branch import Branch
from .build_line import build_line, build_pipe
from .inputs import (
    Calculation,
    Case,
    Choice,
    Criteria,
    CurvePoint,
    Extremes,
    Gauge,
    Given,
    Intake,
    Intended,
    Level,
    Liquid,
    NpshRequired,
    PropertyRow,
    Provenance,
    Pump,
    Reading,
    Reciprocating,
    Revision,
    Site,
    Source,
    Supply,
)
from .nodes import Mapping, Mark
from .schema import EXTREMES


def build(root: Mapping, read: dict[Mark, Quantity], raw: bytes, name: str) -> Calculation:
    """The records of a checked tree; ``read`` holds the quantities by the mark of their text."""
    top = Branch(root, "", Provenance(), read)
    head = top.branch("calculation")
    current = Revision(revision=head.text("revision"), date=head.day("date"), reason=head.text("status", "preliminary"))
    system: Any = head.text("units")
    paper: Any = head.text("paper", "Letter" if system == "US" else "A4")
    liquid, supply, pump = _liquid(top.branch("liquid")), _supply(top.branch("supply")), _pump(top.branch("pump"))
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
        liquid=liquid,
        supply=supply,
        line=top.maybe("line", build_line),
        pump=pump,
        intake=top.maybe("intake", _intake),
        criteria=_criteria(top.branch("criteria")),
        cases=tuple(_case(each, liquid, supply, pump) for each in top.each("cases")),
        readings=tuple(map(_reading, top.each("readings"))),
        intended=top.maybe("intended", _intended) or (),
        path=PurePath(name).name,
        named=name,
        raw=raw,
        sha256=sha256(raw).hexdigest(),
    )


def _revision(at: Branch) -> Revision:
    return Revision(revision=at.text("revision"), date=at.day("date"), reason=at.text("reason"))


def _sources(at: Branch) -> tuple[Source, ...]:
    return tuple(_source(name.text, at.branch(name.text)) for name, _ in at.node.entries)


def _source(id: str, at: Branch) -> Source:
    return Source(id=id, title=at.text("title"), document=at.text("document"), edition=at.text("edition"))


def _site(at: Branch) -> Site:
    return Site(
        elevation=at.given("elevation"),
        weather_allowance=at.given("weather_allowance"),
        barometer=at.maybe("barometer", Branch.extremes),
    )


def _liquid(at: Branch) -> Liquid:
    return Liquid(
        name=at.text("name"),
        temperature=at.branch("temperature").extremes(),
        mass_fraction=at.given("mass_fraction"),
        salinity=at.given("salinity"),
        vapour_pressure=at.given("vapour_pressure"),
        vapour_pressure_kind=at.text("vapour_pressure_kind"),
        vapour_pressure_of=at.text("vapour_pressure_of"),
        density=at.given("density"),
        viscosity=at.given("viscosity"),
        table=tuple(map(_row, at.each("table"))),
    )


def _row(at: Branch) -> PropertyRow:
    return PropertyRow(
        temperature=at.must("temperature"),
        density=at.given("density"),
        viscosity=at.given("viscosity"),
        vapour_pressure=at.given("vapour_pressure"),
    )


def _supply(at: Branch) -> Supply:
    kind: Any = at.text("kind")
    return Supply(
        name=at.text("name"),
        kind=kind,
        level=at.maybe("level", _level),
        pressure=at.maybe("pressure", Branch.extremes),
        elevation=at.given("elevation"),
        velocity_head=at.text("velocity_head"),
        point=at.text("point"),
        high_point=at.given("high_point"),
        **at.place,
    )


def _level(at: Branch) -> Level:
    return Level(**vars(at.extremes()), overflow=at.given("overflow"), drawdown=at.given("drawdown"))


def _pump(at: Branch) -> Pump:
    return Pump(
        name=at.text("name"),
        flow=at.branch("flow").extremes(),
        datum_elevation=at.must("datum_elevation"),
        datum=at.text("datum"),
        arrangement=at.text("arrangement"),
        running=at.number("running", 1),
        eyes=at.number("eyes", 0),
        speed=at.given("speed"),
        best_efficiency_flow=at.given("best_efficiency_flow"),
        npsh_required=_npsh_required(at.branch("npsh_required")),
        reciprocating=at.maybe("reciprocating", _reciprocating),
        **at.origin,
    )


def _npsh_required(at: Branch) -> NpshRequired:
    return NpshRequired(
        value=at.given("value"),
        at_flow=at.given("at_flow"),
        points=tuple(CurvePoint(flow=point.must("flow"), npsh=point.must("npsh")) for point in at.each("points")),
        interpolation=at.text("interpolation", "linear"),
        speed=at.given("speed"),
        speed_exponent=at.given("speed_exponent"),
        impeller=at.given("impeller"),
        curve=at.text("curve"),
        basis=at.text("basis"),
        certified=at.text("certified"),
        datum=at.text("datum"),
        datum_elevation=at.given("datum_elevation"),
        **at.origin,
    )


def _reciprocating(at: Branch) -> Reciprocating:
    return Reciprocating(
        type=at.text("type"),
        C=at.given("C"),
        liquid=at.text("liquid"),
        k=at.given("k"),
        stabiliser=at.text("stabiliser"),
        **at.origin,
    )


def _intake(at: Branch) -> Intake:
    reference: Any = at.text("reference")
    return Intake(inlet_diameter=at.must("inlet_diameter"), reference=reference, elevation=at.must("elevation"))


def _criteria(at: Branch) -> Criteria:
    margin = at.branch("npsh_margin")
    specific = at.maybe("suction_specific_speed", lambda speed: (speed.given("highest"), speed.text("in")))
    return Criteria(
        ratio=margin.given("ratio"),
        difference=margin.given("difference"),
        service=_choice(margin, "service"),
        submergence=at.maybe("submergence", lambda branch: _choice(branch, "method")),
        velocity=at.given("velocity"),
        bell_velocity=at.maybe("bell_velocity", Branch.extremes),
        bell_method=at.maybe("bell_velocity", lambda branch: _choice(branch, "method")),
        straight_run=at.given("straight_run"),
        operating_region=at.maybe("operating_region", Branch.extremes),
        suction_specific_speed=specific[0] if specific else None,
        suction_specific_speed_in=specific[1] if specific else "",
        vapour_clearance=at.given("vapour_clearance"),
        loop_pressure=at.given("loop_pressure"),
    )


def _choice(at: Branch, name: str) -> Choice | None:
    chosen = at.text(name)
    return Choice(name=chosen, provenance=at.provenance) if chosen else None


def _intended(at: Branch) -> tuple[Intended, ...]:
    return tuple(Intended(name=name.text, reason=at.text(name.text)) for name, _ in at.node.entries)


def _case(at: Branch, liquid: Liquid, supply: Supply, pump: Pump) -> Case:
    def chosen(name: str, extremes: Extremes | None) -> Given | None:
        word = at.word(name)
        if word in EXTREMES:
            found: Given | None = getattr(extremes, word)
            return found
        return at.given(name)

    return Case(
        name=at.text("name"),
        flow=chosen("flow", pump.flow),
        running=at.number("running", 0) or None,
        level=chosen("level", supply.level),
        temperature=chosen("temperature", liquid.temperature),
        pressure=chosen("pressure", supply.pressure),
        strainers=at.text("strainers"),
        **at.origin,
    )


def _reading(at: Branch) -> Reading:
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
        **at.origin,
    )


def _gauge(at: Branch) -> Gauge:
    leg: Any = at.text("leg")
    return Gauge(
        pressure=at.must("pressure"),
        elevation=at.must("elevation"),
        leg=leg,
        tap=build_pipe(at.branch("tap")),
        tap_elevation=at.given("tap_elevation"),
        span=at.maybe("span", Branch.extremes),
    )
