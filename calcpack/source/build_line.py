"""The records of the line: its sections, and what the liquid passes in them."""

from __future__ import annotations

from typing import Any

from .branch import Branch
from .inputs import Element, Line, LossPoint, Pipe, Section


def build_line(at: Branch) -> Line:
    """The suction line of a checked tree."""
    return Line(
        loss_method=at.text("loss_method", "darcy_weisbach"),
        fitting_set=at.text("fitting_set"),
        mixed_sets=at.text("mixed_sets"),
        friction_contingency=at.given("friction_contingency"),
        withheld_head=at.given("withheld_head"),
        sections=tuple(map(_section, at.each("sections"))),
        provenance=at.provenance,
    )


def build_pipe(at: Branch) -> Pipe:
    """A bore of a checked tree."""
    return Pipe(size=at.text("size"), schedule=at.text("schedule"), bore=at.given("bore"), provenance=at.provenance)


def _section(at: Branch) -> Section:
    return Section(
        id=at.text("id"),
        name=at.text("name"),
        pipe=build_pipe(at),
        material=at.text("material"),
        condition=at.text("condition"),
        roughness=at.given("roughness"),
        coefficient_C=at.given("hazen_williams_C"),
        axis_length=at.given("axis_length"),
        pumps=at.number("pumps", 1),
        elements=tuple(map(_element, at.each("elements"))),
        **at.origin,
    )


def _element(at: Branch) -> Element:
    kind: Any = at.text("kind")
    drop = at.branch("drop") if kind == "strainer" else None
    return Element(
        id=at.text("id"),
        kind=kind,
        name=at.text("name"),
        count=at.number("count", 1),
        length=at.given("length"),
        shape=at.text("shape"),
        angle=at.number("angle", 90 if at.text("radius") else 0),
        radius=at.text("radius"),
        type=at.text("type"),
        flow=at.text("flow"),
        flat_side=at.text("flat_side"),
        to=at.maybe("to", build_pipe),
        from_pipe=at.maybe("from", build_pipe),
        K=at.given("K"),
        L_over_D=at.given("L_over_D"),
        Cv=at.given("Cv"),
        Kv=at.given("Kv"),
        set=at.text("set"),
        clean=drop.given("clean") if drop else None,
        fouled=drop.given("fouled") if drop else None,
        loss=at.given("loss"),
        at_flow=at.given("at_flow"),
        curve=tuple(LossPoint(flow=point.must("flow"), loss=point.must("loss")) for point in at.each("curve")),
        elevation=at.given("elevation"),
        drawing=at.text("drawing"),
        **at.origin,
    )
