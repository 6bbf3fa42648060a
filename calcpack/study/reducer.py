"""Reducers: contraction or enlargement of the bore, gradual or sudden."""

from __future__ import annotations

from decimal import Decimal

from ..source.inputs import Element
from ..value import Value
from .entry import Entry
from .flow import Flow, bore_of

#: Sine of 22.5°: half the angle at which the source changes from its gradual to its steep formulas.
GRADUAL_TO = Decimal("0.382683")


def other_end(entry: Entry, element: Element) -> Value:
    """The bore at the end of a reducer that is not its section's."""
    pipe = element.to or element.from_pipe
    assert pipe is not None, "source asks for the other end of a reducer"
    word = "leads to" if element.to else "comes from"
    return bore_of(entry, pipe, element, f"the pipe that the {_called(element)}, {word}")


def coefficient(entry: Entry, flow: Flow, element: Element) -> Value:
    """The loss coefficient of a reducer on the velocity head of its own section."""
    ledger, about = entry.ledger, _called(element)
    own, other = flow.bore, other_end(entry, element)
    if own.record == other.record:
        entry.refuse(
            element,
            "a bore at the other end that differs from the section's",
            f"{ledger.shown(other)} at both ends",
            "leave the reducer out, or correct one of the two",
        )
    larger, smaller = (own, other) if own.record > other.record else (other, own)
    narrows = (larger is own) == (element.to is not None)
    ratio = ledger.apply("bore_ratio", {"D_2": smaller, "D_1": larger}, about)
    operands = {"b_D": ratio}
    if element.length is None:
        equation = "contraction_sudden" if narrows else "enlargement_sudden"
    else:
        taper = {
            "D_1": larger,
            "D_2": smaller,
            "L_t": entry.value(element.length, "L_t", f"Length of the taper, {about}"),
        }
        operands["s"] = ledger.apply("taper_half_angle", taper, about)
        gradual = operands["s"].record <= GRADUAL_TO
        equation = (
            ("contraction_gradual" if gradual else "contraction_steep")
            if narrows
            else ("enlargement_gradual" if gradual else "enlargement_sudden")
        )
    on_smaller = ledger.apply(equation, operands, about)
    if element.type == "eccentric":
        entry.assume(
            "eccentric reducers",
            "An eccentric reducer loses as much as a concentric one of its length",
            "the source prints no figure of its own; the published spread of reducers is 50 % either way "
            "(Hydraulic Institute, Engineering Data Library)",
        )
    if smaller is own:
        return on_smaller
    return ledger.apply("on_larger_bore", {"K_s": on_smaller, "b_D": ratio}, about)


def lie(entry: Entry, before: Element, element: Element) -> None:
    """Find a reducer in which gas collects, where its elevation and that of the element before it tell.

    Source: Bloch, H. P.: Eccentric reducers and straight runs of pipe at pump suction. Hydrocarbon Processing, 1 September
    2010, quoting Karassik and the Hydraulic Institute.
    """
    if element.kind != "reducer" or before.elevation is None or element.elevation is None:
        return
    comes_from, here = before.elevation.quantity.si(), element.elevation.quantity.si()
    if element.flat_side == "bottom" and comes_from <= here:
        entry.find(
            f"The flat side of the {_called(element)}, lies at the bottom, and the line does not fall to it from above",
            "gas collects at the top of its slope; the flat side belongs to the top there",
        )
    elif element.flat_side == "top" and comes_from > here:
        entry.find(
            f"The flat side of the {_called(element)}, lies at the top, and the line falls to it from above",
            "with the slope at the top gas can rise back to the supply; the flat side belongs to the bottom there",
        )
    elif element.type == "concentric" and comes_from == here:
        entry.find(
            f"The {_called(element)}, is concentric in a level run",
            "gas collects at the top of a straight taper; an eccentric reducer with its flat side up avoids that",
        )


def _called(element: Element) -> str:
    return f"reducer {element.name}, element {element.id}".replace(" ,", ",")


#: Part of a bore by which two ends may differ and still be one: tables round bores, and flanges join odd ones.
SAME_BORE = 0.02
#: Elements at the joint of two sections that change the bore themselves, or may: their stated loss is of the change too.
_CHANGING = ("tee", "fitting", "equipment")


def join(entry: Entry, up: Flow, down: Flow) -> None:
    """Refuse a reducer that leads to another bore than the next section's; find a change of bore without one."""
    last, first = up.section.elements[-1], down.section.elements[0]
    for element, own, named_bore in ((last, up.bore, down.bore), (first, down.bore, up.bore)):
        if element.kind == "reducer" and (element.to is not None) == (element is last):
            other = other_end(entry, element)
            if _apart(other, named_bore):
                entry.refuse(
                    element,
                    f"the bore of the section next to it, {entry.ledger.shown(named_bore)}",
                    f"a reducer between {entry.ledger.shown(own)} and {entry.ledger.shown(other)}",
                    "give both the same size",
                )
            return
    if _apart(up.bore, down.bore) and last.kind not in _CHANGING and first.kind not in _CHANGING:
        entry.find(
            f"The bore changes from {entry.ledger.shown(up.bore)} to {entry.ledger.shown(down.bore)} between sections "
            f"{up.section.id} and {down.section.id} without a reducer",
            "the loss of the change is left out: add the reducer",
        )


def _apart(a: Value, b: Value) -> bool:
    return abs(a.shadow - b.shadow) > SAME_BORE * max(a.shadow, b.shadow)
