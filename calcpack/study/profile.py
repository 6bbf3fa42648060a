"""Pressure along the line, at every element whose elevation the file gives."""

from __future__ import annotations

from dataclasses import dataclass

from ..value import Value
from .entry import Entry
from .flow import flow_in
from .line import Passage, Passed, contingency
from .liquid import Liquid
from .reducer import other_end


@dataclass(frozen=True)
class Node:
    """A point of the line: the end of an element, or its highest point; ``pressure`` is absolute."""

    element: str
    words: str
    elevation: Value
    pressure: Value


def nodes(entry: Entry, origin_head: Value, liquid: Liquid, passage: Passage) -> tuple[Node, ...]:
    """The pressure after each element with an elevation; ``origin_head`` is the energy head where the line starts.

    Absolute: a result below zero says that no liquid stands there, and is for a rule to judge.
    """
    ledger, line = entry.ledger, entry.calculation.line
    assert line is not None, "a passage leads through a line"
    found: list[Node] = []
    ledger.group("Pressure along the line")
    energy, lost = origin_head, list[Value]()
    for passed in passage.rows:
        lost.append(passed.loss)
        if passed.element.elevation is None:
            continue
        about = f"after element {passed.label}"
        title = f"Elevation of the line, {passed.words}, element {passed.label}"
        elevation = entry.value(passed.element.elevation, "z_n", title)
        if line.friction_contingency is None:
            energy = ledger.apply("energy_after", {"E_m": energy, "h": lost}, about)
        else:
            operands: dict[str, Value | list[Value]] = {"E_m": energy, "c": contingency(entry, line), "h": lost}
            energy = ledger.apply("energy_after_with_contingency", operands, about)
        lost = []
        pressure = ledger.apply("node_pressure", {
            "gamma": liquid.specific_weight, "E_n": energy, "z_n": elevation, "h_V": _velocity_head(entry, passed),
        }, f"absolute, {about}")  # fmt: skip
        found.append(Node(passed.label, passed.words, elevation, pressure))
    return tuple(found)


def _velocity_head(entry: Entry, passed: Passed) -> Value:
    """The velocity head at the end of an element: in its section's bore, or in the bore that a reducer leads to."""
    flow, element = passed.flow, passed.element
    if element.to is None:
        return flow.velocity_head
    return flow_in(entry, flow.flow, other_end(entry, element), f"at the end of element {passed.label}").velocity_head
