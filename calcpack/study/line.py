"""Losses along the line, from the supply to the suction nozzle, element by element."""

from __future__ import annotations

from dataclasses import dataclass
from itertools import pairwise

from ..fitting_set import SETS
from ..source.inputs import Element, Line, Section
from ..value import Value
from . import reducer
from .element import Content, from_set, loss, set_of
from .entry import Entry
from .flow import Flow, bore_of, flow_in, flow_through, named
from .liquid import Liquid
from .passing import Passing
from .state import State

__all__ = ["Flow", "Passage", "Passed", "bore_of", "flow_in", "label", "losses"]


@dataclass(frozen=True)
class Passed:
    """One element passed: its row's label and words, and what is lost in it."""

    label: str
    words: str
    element: Element
    flow: Flow
    loss: Value

    @property
    def section(self) -> Section:
        """The section it stands in."""
        return self.flow.section


@dataclass(frozen=True)
class Passage:
    """The way from the supply to the suction nozzle in one state: its loss, the flow in each section, each element."""

    total: Value
    flows: tuple[Flow, ...]
    rows: tuple[Passed, ...]


#: Kinds worked out before and after the others, so that like stands with like on the page.
_ORDER = {"pipe": 0, "strainer": 2}


def losses(entry: Entry, state: State, flow: Value, liquid: Liquid) -> Passage:
    """The head lost from the supply to the suction nozzle in ``state``; ``flow`` is that of one pump."""
    line = entry.calculation.line
    assert line is not None, "the design route needs a line"
    flows: list[Flow] = []
    rows: list[tuple[Element, Flow, str, Content]] = []
    for section in line.sections:
        entry.ledger.group(f"Velocity, {named(section)}")
        flows.append(flow_through(entry, state, flow, liquid, section))
        rows += _section(Passing(entry, state, liquid, flows[-1]))
    for (before, *_), (element, *_) in pairwise(rows):
        reducer.lie(entry, before, element)
    for up, down in pairwise(flows):
        reducer.join(entry, up, down)
    entry.ledger.group("Losses from the supply to the suction nozzle")
    title = f"Losses, supply to suction nozzle: {_sets(entry, line)} coefficients; {state.scope}"
    labelled = [
        (label(line, flow.section, element), ", ".join(filter(None, (words, element.drawing))), content)
        for element, flow, words, content in rows
    ]
    table = entry.ledger.losses(title, labelled, "losses" if line.friction_contingency is None else "sum_of_rows")
    total = table.total.value
    if line.friction_contingency is not None:
        total = entry.ledger.apply("losses_with_contingency", {"h_S": total, "c": contingency(entry, line)})
    passed = (
        Passed(row.label, words, element, flow, row.line.value)
        for row, (element, flow, words, _) in zip(table.rows, rows, strict=True)
    )
    return Passage(total, tuple(flows), tuple(passed))


def contingency(entry: Entry, line: Line) -> Value:
    """The friction contingency of the line."""
    assert line.friction_contingency is not None, "called where the file gives one"
    return entry.value(line.friction_contingency, "c", "Friction contingency on all losses")


def label(line: Line, section: Section, element: Element) -> str:
    """How a row of the loss table is named: by the element's id, and its section's where there are several."""
    return element.id if len(line.sections) == 1 else f"{section.id}-{element.id}"


def _section(at: Passing) -> list[tuple[Element, Flow, str, Content]]:
    """The rows of a section in the order of flow."""
    section, about, ledger = at.flow.section, named(at.flow.section), at.entry.ledger
    rows: dict[int, tuple[Element, Flow, str, Content]] = {}
    for place, element in sorted(enumerate(section.elements), key=lambda e: _ORDER.get(e[1].kind, 1)):
        if element.kind == "pipe":
            ledger.group(f"Friction in the straight pipe, {about}")
        elif element.kind == "strainer":
            ledger.group(f"Strainer, element {element.id}")
        else:
            ledger.group(f"Fittings, {about}")
        rows[place] = (element, at.flow, *loss(at, element))
    return [rows[place] for place in range(len(rows))]


def _sets(entry: Entry, line: Line) -> str:
    """The sets the line's coefficients are taken from; that more than one is meant is a finding."""
    elements = (element for section in line.sections for element in section.elements)
    used = dict.fromkeys(set_of(entry, element) for element in elements if from_set(element))
    names = [SETS[set_name].name for set_name in used or (line.fitting_set,)]
    if len(names) > 1:
        entry.find(
            f"Loss coefficients of several sets are mixed in the line: {', '.join(names)}",
            "sets differ by tens of per cent for one fitting, and each is consistent in itself",
            "mixed_sets",
            unless="each is the better one for its fitting",
        )
    return " and ".join(names)
