"""Losses along the line, from the surface to the suction nozzle, element by element."""

from __future__ import annotations

from collections.abc import Mapping
from dataclasses import dataclass
from decimal import Decimal

from .. import lookup
from ..fitting_set import SET_NAMES, SETS, coefficient
from ..lookup import OutOfRange
from ..quantity import parse
from ..references import Cite
from ..source.inputs import Element, Line, Pipe, Section
from ..value import Value
from .entry import Entry, Place
from .liquid import Liquid, viscosity
from .state import State

#: Reynolds numbers between which flow is neither laminar nor fully turbulent.
LAMINAR_BELOW, TURBULENT_ABOVE = 2000, 4000
#: Relative roughness where charts of the friction factor end (recalled, not re-read).
ROUGHEST = Decimal("0.05")
#: The inch in m, to choose a size range.
INCH = 0.0254


@dataclass(frozen=True)
class Flow:
    """Flow in one section: its bore, velocity head and flow."""

    flow: Value
    bore: Value
    velocity: Value
    velocity_head: Value


def bore_of(entry: Entry, pipe: Pipe, at: Place, about: str) -> Value:
    """The bore as given, or read from the pipe table by nominal size and schedule."""
    if pipe.bore is not None:
        return entry.value(pipe.bore, "D", f"Bore, {about}")
    try:
        found = lookup.bore(pipe.size, pipe.schedule)
    except OutOfRange as error:
        entry.refuse(
            at,
            "a nominal size and schedule of ASME B36.10M",
            f"{pipe.size} schedule {pipe.schedule}",
            f"{error}; or state the bore",
        )
    quantity = parse(f"{found.millimetres} mm", "bore")
    return entry.ledger.tabulated(
        "D", f"Bore, {about}, from the pipe table", quantity, found.place, Cite("b3610"), lookup.library("fluids")
    )


def flow_in(entry: Entry, flow: Value, bore: Value, about: str) -> Flow:
    """Velocity and velocity head of ``flow`` in ``bore``."""
    ledger = entry.ledger
    area = ledger.apply("bore_area", {"D": bore}, about)
    velocity = ledger.apply("mean_velocity", {"Q": flow, "A": area}, about)
    head = ledger.apply("velocity_head", {"V": velocity, "g": ledger.constant("g")}, about)
    return Flow(flow, bore, velocity, head)


def losses(entry: Entry, state: State, flow: Value, liquid: Liquid) -> Value:
    """The head lost from the surface to the suction nozzle in ``state``."""
    line = entry.calculation.line
    assert line is not None, "the design route needs a line"
    rows: list[tuple[str, str, Mapping[str, Value] | Value]] = []
    for section in line.sections:
        rows += _section(entry, state, flow, liquid, section)
    if not any(e.kind == "entrance" for s in line.sections for e in s.elements):
        entry.find(
            "The line has no entrance: its loss is left out", "a line from a tank or basin begins with an entrance loss"
        )
    entry.ledger.group("Losses from the surface to the suction nozzle")
    title = f"Losses, surface to suction nozzle: {SET_NAMES[line.fitting_set]} coefficients; {state.scope}"
    if line.friction_contingency is None:
        return entry.ledger.losses(title, rows, "losses")
    contingency = entry.value(line.friction_contingency, "c", "Friction contingency on all losses")
    sum_of_rows = entry.ledger.losses(title, rows, "sum_of_rows")
    return entry.ledger.apply("losses_with_contingency", {"h_S": sum_of_rows, "c": contingency})


def label(line: Line, section: Section, element: Element) -> str:
    """How a row of the loss table is named: by the element's id, and its section's where there are several."""
    return element.id if len(line.sections) == 1 else f"{section.id}-{element.id}"


def _section(
    entry: Entry, state: State, flow: Value, liquid: Liquid, section: Section
) -> list[tuple[str, str, Mapping[str, Value] | Value]]:
    about, line = section.name or section.id, entry.calculation.line
    assert line is not None, "a section stands in a line"
    entry.ledger.group(f"Velocity, {about}")
    pipe = flow_in(entry, flow, bore_of(entry, section.pipe, section, about), about)
    rows: dict[int, tuple[str, str, Mapping[str, Value] | Value]] = {}
    # Worked out kind by kind, so that like stands with like on the page; the table keeps the order of flow.
    for place, element in sorted(
        enumerate(section.elements), key=lambda e: {"pipe": 0, "strainer": 2}.get(e[1].kind, 1)
    ):
        if element.kind == "strainer":
            entry.ledger.group(f"Strainer, element {element.id}")
            loss = _strainer(entry, state, flow, liquid, element)
            rows[place] = (label(line, section, element), f"{element.name or 'Strainer'}, {state.strainers}", loss)
            continue
        if element.kind == "pipe":
            entry.ledger.group(f"Friction in the straight pipe, {about}")
            words, k = _pipe(entry, state, liquid, section, pipe, element)
        else:
            entry.ledger.group(f"Fittings, {about}")
            words, k = _fitting(entry, section, pipe, element)
        operands = {"K": k, "h_V": pipe.velocity_head}
        if element.count > 1:
            operands["n"] = entry.count(element)
        rows[place] = (label(line, section, element), words, operands)
    return [rows[place] for place in sorted(rows)]


def _pipe(
    entry: Entry, state: State, liquid: Liquid, section: Section, pipe: Flow, element: Element
) -> tuple[str, Value]:
    ledger, about = entry.ledger, section.name or section.id
    assert element.length is not None, "the schema asks for a pipe's length"
    length = entry.value(element.length, "L", f"Length of straight pipe, element {element.id}")
    reynolds = ledger.apply(
        "reynolds",
        {"rho": liquid.density, "V": pipe.velocity, "D": pipe.bore, "mu": viscosity(entry, state, liquid)},
        about,
    )
    if reynolds.record < LAMINAR_BELOW:
        friction = ledger.apply("laminar_friction", {"Re": reynolds}, about)
    else:
        relative = ledger.apply("relative_roughness", {"eps": _roughness(entry, section), "D": pipe.bore}, about)
        if relative.record > ROUGHEST:
            entry.refuse(
                section.roughness or section,
                "a roughness below a twentieth of the bore, where the friction factor is known",
                f"a roughness of {ledger.shown(_roughness(entry, section))} in a bore of {ledger.shown(pipe.bore)}",
                "check the unit of the roughness and of the bore",
            )
        turbulent = reynolds.record > TURBULENT_ABOVE
        friction = ledger.apply(
            "colebrook" if turbulent else "colebrook_transition", {"r": relative, "Re": reynolds}, about
        )
        if not turbulent:
            entry.find(
                f"The friction factor of {about} is uncertain (line {friction.address})",
                f"its Reynolds number lies between {LAMINAR_BELOW} and {TURBULENT_ABOVE}; the turbulent value, the greater, is taken",
            )
    k = ledger.apply("pipe_coefficient", {"f": friction, "L": length, "D": pipe.bore}, f"element {element.id}")
    return f"{element.name or 'Straight pipe'}, {element.length.text}", k


def _roughness(entry: Entry, section: Section) -> Value:
    if section.roughness is not None:
        return entry.value(section.roughness, "eps", f"Roughness of the wall, {section.name or section.id}")
    text, cite = lookup.ROUGHNESS[section.material]
    entry.assume(
        f"roughness {section.material}",
        f"The pipe wall of {section.material} is as rough as new: {text}",
        "an aged pipe is rougher and loses more; state a roughness to replace it",
    )
    return entry.ledger.tabulated(
        "eps", f"Roughness of {section.material}, new, from the table", parse(text, "roughness"), section.material, cite
    )


def _fitting(entry: Entry, section: Section, pipe: Flow, element: Element) -> tuple[str, Value]:
    ledger, line = entry.ledger, entry.calculation.line
    assert line is not None, "fittings stand in a line"
    if element.K is not None:
        words = element.name or element.kind.capitalize()
        return words, entry.value(element.K, "K", f"Loss coefficient, {words}, element {element.id}")
    variant = (
        f"{element.angle} {element.radius}"
        if element.kind == "elbow"
        else element.shape or element.type or element.flow
    )
    found = coefficient(line.fitting_set, element.kind, variant, _inches(section, pipe))
    if found is None:
        known = ", ".join(v for k, v in SETS[line.fitting_set] if k == element.kind)
        entry.refuse(
            element,
            f"a fitting of the set {SET_NAMES[line.fitting_set]}: {element.kind} {known}",
            f"{element.kind} {variant}",
            "state its K with its source",
        )
    words = element.name or found.title
    if element.kind == "valve" and ("check" in element.type or "foot" in element.type):
        entry.assume(
            f"open {element.id}",
            f"The {found.title[0].lower()}{found.title[1:]} is fully open (element {element.id})",
            "below 15 ft/s a check or foot valve may be only partly open and loses more "
            "(Hydraulic Institute, Engineering Data Library); ask its maker",
        )
    set_name = SET_NAMES[line.fitting_set]
    if found.K:
        return words, ledger.tabulated(
            "K", found.title, parse(found.K, "coefficient"), f"{set_name}: {found.title}", found.cite
        )
    rough = ledger.apply("fully_rough_friction", {"eps_c": ledger.constant("eps_c"), "D": pipe.bore})
    multiple = ledger.tabulated(
        "m",
        f"{found.title}: multiple of the fully rough factor",
        parse(found.m, "ratio"),
        f"{set_name}: {found.title}",
        found.cite,
    )
    return words, ledger.apply("fitting_coefficient", {"m": multiple, "f_T": rough}, found.title)


def _inches(section: Section, pipe: Flow) -> float:
    """The nominal size of a section, or its bore where no size is given."""
    return lookup.nominal_inches(section.pipe.size) if section.pipe.size else pipe.bore.shadow / INCH


def _strainer(entry: Entry, state: State, flow: Value, liquid: Liquid, element: Element) -> Value:
    drop = element.clean if state.strainers == "clean" else element.fouled
    assert drop is not None and element.at_flow is not None, "source asks for both"
    words = f"{element.name or 'strainer'}, {state.strainers}"
    if drop.quantity.unit.kind == "length":
        head = entry.value(drop, "h_0", f"Drop of {words}, at its reference flow")
    else:
        pressure = entry.value(drop, "dp_0", f"Pressure drop of {words}, at its reference flow")
        head = entry.ledger.apply("strainer_drop", {"dp_0": pressure, "gamma": liquid.specific_weight}, words)
    reference = entry.value(element.at_flow, "Q_0", f"Reference flow of the drop, {element.name or 'strainer'}")
    return entry.ledger.apply("strainer_loss", {"h_0": head, "Q": flow, "Q_0": reference}, words)
