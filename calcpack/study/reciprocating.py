"""Acceleration head: what a reciprocating pump takes from NPSH available by moving the liquid in strokes."""

from __future__ import annotations

from collections.abc import Mapping

from ..quantity import parse
from ..references import Cite
from ..source.inputs import Given, Section
from ..value import Value
from . import curve, straight
from .entry import Entry
from .line import Passage

#: Coefficient C by the type of the pump, and k by the liquid.
PUMPS: Mapping[str, str] = {
    "simplex single-acting": "0.400", "simplex double-acting": "0.200", "duplex single-acting": "0.200",
    "duplex double-acting": "0.115", "triplex": "0.066", "quintuplex": "0.040", "septuplex": "0.028", "nonuplex": "0.022",
}  # fmt: skip
LIQUIDS: Mapping[str, str] = {"deaerated water": "1.4", "water": "1.5", "hydrocarbon": "2.0", "hot oil": "2.5"}
_CITE = Cite("hi61")
#: Length of line, m, up to which the form holds: about 50 ft.
LONGEST = 15
#: Why no reading settles a reciprocating pump.
UNSEEN = "the mean of a gauge reading does not show the acceleration head that the pump takes in each stroke"


def acceleration(entry: Entry, passage: Passage) -> tuple[Value | None, str]:
    """The acceleration head of the line, and why the result cannot be judged, where it cannot.

    Each section counts with its length along the axis, or, where the file gives none, with its straight pipe: a finding.

    Source: ANSI/HI 6.1-6.5 and GPSA, recalled.
    """
    pump, ledger = entry.calculation.pump, entry.ledger
    its = pump.reciprocating
    assert its is not None, "only a reciprocating pump has an acceleration head"
    if its.stabiliser == "fitted":
        return (
            None,
            "a suction stabiliser is fitted, so the form of the acceleration head does not hold: its maker states what is left",
        )
    ledger.group("Acceleration head")
    if not its.stabiliser:
        entry.assume(
            "stabiliser",
            "No suction stabiliser is fitted",
            "with one, less acceleration head is left: its maker states it",
        )
    assert pump.speed is not None, "source asks for the speed of a reciprocating pump"
    operands = {
        "n_p": curve.pump_speed(entry, pump.speed),
        "C": _coefficient(entry, "C", "Coefficient of the pump's type", its.C, its.type, PUMPS),
        "k": _coefficient(entry, "k", "Coefficient of the liquid", its.k, its.liquid, LIQUIDS),
        "g": ledger.constant("g"),
    }
    heads, lengths = [], []
    for flow in passage.flows:
        length = _length(entry, flow.section)
        if length is not None:
            about = flow.section.name or flow.section.id
            heads.append(ledger.apply("acceleration_head", operands | {"L": length, "V": flow.velocity}, about))
            lengths.append(length)
    if not heads:
        return None, "the line has no length, so its acceleration head is not known"
    taken = heads[0] if len(heads) == 1 else ledger.apply("acceleration_heads", {"h_as": heads})
    together = lengths[0] if len(lengths) == 1 else ledger.apply("straight_pipe", {"L": lengths}, "whole line")
    doubt = ""
    if together.shadow > LONGEST:
        doubt = (
            f"the acceleration head is known for a short, rigid line of {LONGEST} m (50 ft) at most; "
            f"this one has {ledger.shown(together)} (line {together.address})"
        )
    return taken, doubt


def _length(entry: Entry, section: Section) -> Value | None:
    """The length of liquid a section accelerates."""
    about = section.name or section.id
    if section.axis_length is not None:
        return entry.value(section.axis_length, "L", f"Length along the axis, fittings included, {about}")
    pipes = [element for element in section.elements if element.kind == "pipe"]
    others = len(pipes) < len(section.elements)
    if others:
        entry.find(
            f"The acceleration head of {about} counts its straight pipe only",
            "the liquid in fittings and valves is accelerated too: state axis_length, measured along the axis with them",
        )
    return straight.length(entry, pipes, about) if pipes else None


def _coefficient(
    entry: Entry, symbol: str, title: str, stated: Given | None, name: str, table: Mapping[str, str]
) -> Value:
    """A coefficient as stated, else that of the table."""
    if stated is not None:
        return entry.value(stated, symbol, f"{title}, acceleration head")
    return entry.ledger.tabulated(symbol, f"{title}: {name}", parse(table[name], "factor"), name, _CITE)
