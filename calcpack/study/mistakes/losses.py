"""Losses that are none, that are missing, or that are too low: velocity head, entrance, Fanning's factor, a new wall."""

from __future__ import annotations

import re
from collections.abc import Iterator

from ... import roughness
from ...fitting_set import LENDER, SETS, coefficient
from ...quantity import Quantity, QuantityFault, parse
from ...value import Value
from ..finding import Finding, finding
from ..flow import Flow, named
from ..friction import TURBULENT_ABOVE, friction_factor
from ..line import Passed
from ..straight import length
from ..supply import POINTS
from .search import Search, digits, says

_VELOCITY_HEAD = r"velocity[- ]heads?|kinetic (?:head|energy)|dynamic head|[Vv](?:²|\^?2) ?/ ?2 ?g"
#: Names of a whole velocity head lost at the end of the line, and the coefficients that are one.
_EXIT, WHOLE = "exit|outlet|into (?:the )?pump|pump inlet", (0.95, 1.05)
#: How near a head withheld lies to the velocity head, in parts of it.
SAME = 0.03
_MOUTH = "entrance|inlet|intake|mouth|bell(?:mouth)?|outlet|nozzle"
_FRICTION = "pipe friction|friction|straight pipe|pipe|spool"
_LENGTH = re.compile(r"([0-9]+(?:\.[0-9]+)?) ?(m|ft)(?![\w/])")
#: Part of the friction found, below which a coefficient stated for it may hold Fanning's factor, a quarter of Darcy's.
FANNING = 0.35
_EXISTING = "existing|revamp|retrofit|refurbish\\w*|as[- ](?:found|built)|survey|de-?bottleneck\\w*|re-?rat(?:e|ing)"
#: Head, m, from which the age of a wall is worth a finding.
WORTH = 0.02


def velocity_head_counted(at: Search) -> Iterator[Finding]:
    """A velocity head taken off in the design route: as an element of the line, or as the head withheld."""
    if at.passage is None:
        return
    for passed in at.passage.rows:
        element = passed.element
        stated = element.K is not None and WHOLE[0] <= float(element.K.quantity.si()) <= WHOLE[1]
        last = passed is at.passage.rows[-1]
        if says(element.name, _VELOCITY_HEAD) or (
            element.kind == "fitting" and stated and last and says(element.name, _EXIT)
        ):
            yield _counted(f"Element {passed.label}, “{element.name}”, takes off a velocity head", passed.loss)
    withheld, last_head = at.c.line.withheld_head if at.c.line else None, at.passage.flows[-1].velocity_head
    if withheld is None or digits(withheld.quantity.number) < 2:
        return
    if abs(float(withheld.quantity.si()) / last_head.shadow - 1) <= SAME:
        at.ledger.group("Head withheld")
        cost = at.entry.value(withheld, "h_w", "Head withheld")
        what = f"The head withheld, {withheld.text}, is the velocity head before the pump (line {last_head.address})"
        yield _counted(what, cost)


def _counted(what: str, cost: Value) -> Finding:
    return finding(
        "velocity_head_counted", what,
        "NPSH is a total head: what becomes velocity at the pump is not lost; NPSH available comes out too small",
        cost, "it is lost before the pump",
    )  # fmt: skip


def no_entrance(at: Search) -> Iterator[Finding]:
    """A line from a surface without an entrance."""
    if at.passage is None or at.c.supply.kind in POINTS:
        return
    first, elements = at.passage.rows[0], [passed.element for passed in at.passage.rows]
    if any(element.kind == "entrance" for element in elements) or first.element.type.startswith("foot"):
        return  # the coefficient of a foot valve holds its entrance
    if first.element.kind == "fitting" and says(first.element.name, _MOUTH):
        return
    flush = coefficient(LENDER, "entrance", "flush", 0.0)
    assert flush is not None, "the lender has it"
    at.ledger.group("The entrance left out")
    k = at.ledger.tabulated(
        "K", flush.title, parse(flush.constants["K"], "coefficient"), f"{SETS[LENDER].name}: {flush.title}", flush.cite
    )
    yield finding(
        "no_entrance", "The line has no entrance: its loss is left out",
        "a line from a tank or basin begins with an entrance loss; the head shown is that of a sharp-edged one",
        at.ledger.apply("row_loss_single", {"K": k, "h_V": first.flow.velocity_head}, "a sharp-edged entrance"),
        "another element holds it",
    )  # fmt: skip


def fanning(at: Search) -> Iterator[Finding]:
    """Friction of a pipe stated as a coefficient that is a quarter of what the tool finds for the length in its name."""
    for passed in at.passage.rows if at.passage else ():
        element, section = passed.element, passed.section
        stretch = _length_in(element.name) if element.kind == "fitting" and says(element.name, _FRICTION) else None
        if stretch is None or element.K is None or not (section.material or section.roughness):
            continue
        factor = friction_factor(at.trial, passed.flow)
        whole = factor.shadow * float(stretch.si()) / passed.flow.bore.shadow
        if float(element.K.quantity.si()) < FANNING * whole:
            yield _fanning(at, passed, stretch)


def _length_in(name: str) -> Quantity | None:
    match = _LENGTH.search(name)
    try:
        return parse(f"{match[1]} {match[2]}", "pipe_length") if match else None
    except QuantityFault:
        return None  # a number in a name that is no length


def _fanning(at: Search, passed: Passed, stretch: Quantity) -> Finding:
    element, flow = passed.element, passed.flow
    at.ledger.group("Friction by the tool, beside the coefficient stated")
    typed = at.ledger.given(
        "L", f"Length of straight pipe, in the name of element {passed.label}", stretch, key=f"{element.key}.name",
        file_line=element.line, provenance=element.provenance,
    )  # fmt: skip
    operands = {
        "f": friction_factor(at.entry, flow), "L": at.ledger.convert(typed), "D": flow.bore, "h_V": flow.velocity_head,
        "h": passed.loss,
    }  # fmt: skip
    return finding(
        "fanning_factor", f"The coefficient of element {passed.label}, “{element.name}”, is about a quarter of f L/D",
        "Fanning's friction factor is a quarter of Darcy's, which belongs in f L/D: give the pipe as `kind: pipe`, with its length",
        at.ledger.apply("friction_left_out", operands, f"element {passed.label}"), "the coefficient was measured",
    )  # fmt: skip


def new_wall(at: Search) -> Iterator[Finding]:
    """A wall taken as new in a plant that exists: it has readings, or its titles say so."""
    line, existing = at.c.line, says(f"{at.c.title} {at.c.purpose} {at.c.project}", _EXISTING)
    if at.passage is None or line is None or line.loss_method != "darcy_weisbach" or not (at.c.readings or existing):
        return
    for flow in at.passage.flows:
        section = flow.section
        pipes = [element for element in section.elements if element.kind == "pipe"]
        new = section.roughness is None and section.condition != "aged" and section.material in roughness.AGED
        if not pipes or not new or flow.reynolds.record <= TURBULENT_ABOVE:
            continue
        if _age(at, flow, trial=True).shadow < WORTH:
            continue
        yield finding(
            "new_wall", f"The wall of {named(section)} is taken as new, and the plant exists",
            f"it has {'readings' if at.c.readings else f'“{existing}” in its titles'}; an aged wall loses more: state a roughness, "
            "or `condition: aged`, as which the head shown counts it",
            _age(at, flow), "the pipe is new, or was found smooth",
        )  # fmt: skip


def _age(at: Search, flow: Flow, *, trial: bool = False) -> Value:
    """Head lost by the wall as aged over that as new."""
    entry, section = at.trial if trial else at.entry, flow.section
    ledger, about = entry.ledger, named(section)
    wall = roughness.AGED[section.material]
    ledger.group(f"The wall as aged, {about}")
    title = f"Roughness of {section.material}, {wall.words}, from the table"
    eps = ledger.tabulated("eps", title, parse(wall.text, "roughness"), section.material, wall.cite)
    relative = ledger.apply("relative_roughness", {"eps": eps, "D": flow.bore}, f"{about}, aged")
    operands = {
        "f_x": ledger.apply("colebrook", {"r": relative, "Re": flow.reynolds}, f"{about}, aged"),
        "f": friction_factor(entry, flow),
        "L": length(entry, [element for element in section.elements if element.kind == "pipe"], about),
        "D": flow.bore,
        "h_V": flow.velocity_head,
    }
    return ledger.apply("cost_of_age", operands, about)


MISTAKES = (velocity_head_counted, no_entrance, fanning, new_wall)
