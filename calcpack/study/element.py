"""What one element of the line loses, in the way the file gives it."""

from __future__ import annotations

from collections.abc import Callable, Mapping

from .. import lookup
from ..catalog import EQUATION
from ..fitting_set import LENDER, SETS, Coefficient, coefficient, variants
from ..quantity import parse
from ..references import Cite
from ..source.inputs import Element
from ..value import Value
from . import drop, reducer
from .entry import Entry
from .flow import named
from .friction import friction_factor, hazen_williams
from .passing import Passing

#: A row of the loss table: its factors K, h_V and n, or the loss found on lines above.
Content = Mapping[str, Value] | Value
#: The inch in m, to choose a size range.
INCH = 0.0254
#: What the constants of the sets are, after the fitting's title.
CONSTANTS = {
    "K": "",
    "m": ": multiple of the fully rough factor",
    "K_1": ": constant of laminar flow",
    "K_oo": ": constant of turbulent flow",
    "K_i": ": constant of turbulent flow",
    "K_d": ": constant of size",
}


def from_set(element: Element) -> bool:
    """Whether an element's loss is taken from a published set; else the file states it."""
    stated = element.K or element.L_over_D or element.Cv or element.Kv
    return element.kind in ("entrance", "elbow", "tee", "valve", "reducer") and not stated


def set_of(entry: Entry, element: Element) -> str:
    """The published set of an element."""
    line = entry.calculation.line
    assert line is not None, "elements stand in a line"
    return element.set or line.fitting_set


def loss(at: Passing, element: Element) -> tuple[str, Content]:
    """What an element is called in the loss table, and its row there."""
    entry = at.entry
    words = element.name or element.kind.capitalize()
    if element.kind == "pipe":
        return _pipe(at, element)
    if element.kind == "strainer":
        return drop.strainer(at, element)
    if element.loss is not None:
        return words, drop.equal(entry, element, drop.at_flow(at, element.loss, element, words))
    if element.curve:
        return words, drop.on_curve(at, element, words)
    if element.Cv is not None or element.Kv is not None:
        at.turbulent(element)
        return words, drop.equal(entry, element, drop.flow_coefficient(at, element, words))
    if element.K is not None:
        at.turbulent(element)
        k = entry.value(element.K, "K", f"Loss coefficient, {words}, element {element.id}")
    elif element.L_over_D is not None:
        ratio = entry.value(element.L_over_D, "q", f"Equivalent length over bore, {words}, element {element.id}")
        k = entry.ledger.apply("equivalent_length", {"f": friction_factor(entry, at.flow), "q": ratio}, words)
    elif element.kind == "reducer":
        at.turbulent(element)
        _lent(entry, element)
        words, k = element.name or f"Reducer, {element.type}", reducer.coefficient(entry, at.flow, element)
    else:
        words, k = _tabulated(at, element)
    factors = {"K": k, "h_V": at.flow.velocity_head}
    return words, factors if element.count == 1 else factors | {"n": entry.count(element)}


def _pipe(at: Passing, element: Element) -> tuple[str, Content]:
    entry, line = at.entry, at.entry.calculation.line
    assert element.length is not None and line is not None, "the schema asks for a pipe's length"
    about = f"element {element.id}"
    length = entry.value(element.length, "L", f"Length of straight pipe, {about}")
    words = f"{element.name or 'Straight pipe'}, {element.length.text}"
    if line.loss_method == "hazen_williams":
        return words, hazen_williams(entry, at.liquid, at.flow, length, about)
    friction = friction_factor(entry, at.flow)
    k = entry.ledger.apply("pipe_coefficient", {"f": friction, "L": length, "D": at.flow.bore}, about)
    return words, {"K": k, "h_V": at.flow.velocity_head}


def _tabulated(at: Passing, element: Element) -> tuple[str, Value]:
    """A fitting's title and its coefficient from the published set."""
    entry, ledger, set_name = at.entry, at.entry.ledger, set_of(at.entry, element)
    variant = element.shape or element.type or element.flow
    if element.kind == "elbow":
        variant = f"{element.angle} {element.radius}"
    inches = _inches(at)
    found = coefficient(set_name, element.kind, variant, inches)
    if found is None and element.kind == "entrance":
        found, set_name = coefficient(LENDER, element.kind, variant, inches), LENDER
        _lent(entry, element)
    if found is None:
        entry.refuse(
            element,
            f"a fitting of the set {SETS[set_name].name}: {element.kind} {', '.join(variants(set_name, element.kind))}",
            f"{element.kind} {variant}",
            "state its K with its source",
        )
    if element.kind == "valve" and ("check" in variant or "foot" in variant):
        entry.assume(
            f"open {element.id}",
            f"The {found.title[0].lower()}{found.title[1:]} is fully open (element {element.id})",
            "below 15 ft/s a check or foot valve may be only partly open and loses more "
            "(Hydraulic Institute, Engineering Data Library); ask its maker",
        )
    place = f"{SETS[set_name].name}: {found.title}"
    constants = {
        symbol: ledger.tabulated(symbol, found.title + CONSTANTS[symbol], parse(text, "coefficient"), place, found.cite)
        for symbol, text in found.constants.items()
    }
    words = element.name or found.title
    if "K_1" not in constants:
        at.turbulent(element)
    if not found.equation:
        return words, constants["K"]
    return words, ledger.apply(found.equation, constants | _conditions(at, found), found.title)


def _conditions(at: Passing, found: Coefficient) -> dict[str, Value]:
    """What the equation of a coefficient needs besides the fitting's own constants."""
    ledger, bore = at.entry.ledger, at.flow.bore
    known: dict[str, Callable[[], Value]] = {
        "Re": lambda: at.flow.reynolds,
        "D": lambda: bore,
        "d_1": lambda: ledger.constant("d_1"),
        "D_n": lambda: _nominal(at),
        "f_T": lambda: ledger.apply("fully_rough_friction", {"eps_c": ledger.constant("eps_c"), "D": bore}),
    }
    return {symbol: known[symbol]() for symbol in EQUATION[found.equation].operands if symbol not in found.constants}


def _nominal(at: Passing) -> Value:
    """The nominal diameter of the section; its bore where it has no nominal size."""
    section = at.flow.section
    if not section.pipe.size:
        at.entry.assume(
            f"nominal {section.id}",
            f"The nominal diameter of {named(section)} is its bore",
            "the file gives no nominal size; Darby's coefficients move with its power of 0.3",
        )
        return at.flow.bore
    inches = parse(f"{lookup.nominal_inches(section.pipe.size):g} in", "bore")
    title = f"Nominal diameter, {named(section)}"
    return at.entry.ledger.tabulated("D_n", title, inches, section.pipe.size, Cite("b3610"), lookup.library("fluids"))


def _inches(at: Passing) -> float:
    """The nominal size of a section, or its bore where no size is given."""
    size = at.flow.section.pipe.size
    return lookup.nominal_inches(size) if size else at.flow.bore.shadow / INCH


def _lent(entry: Entry, element: Element) -> None:
    """Say that an entrance or a reducer is Crane's, where the set has none."""
    set_name = set_of(entry, element)
    if set_name != LENDER:
        entry.assume(
            f"lent {set_name} {element.kind}",
            f"The loss of the {element.kind} is that of {SETS[LENDER].name}",
            f"{SETS[set_name].name}, as it was seen, has no {element.kind}; at Reynolds numbers below 4000 it loses more",
        )
