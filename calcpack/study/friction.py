"""Friction in straight pipe: by Darcy and Weisbach, or by Hazen and Williams where the file says so."""

from __future__ import annotations

from decimal import Decimal

from .. import roughness
from ..quantity import parse
from ..source.inputs import Section
from ..value import Value
from .entry import Entry
from .flow import Flow, named
from .liquid import Liquid

#: Reynolds numbers between which flow is neither laminar nor fully turbulent.
LAMINAR_BELOW, TURBULENT_ABOVE = 2000, 4000
#: Relative roughness where charts of the friction factor end (recalled, not re-read).
ROUGHEST = Decimal("0.05")


def friction_factor(entry: Entry, flow: Flow) -> Value:
    """The Darcy friction factor of a section."""
    ledger, section, reynolds = entry.ledger, flow.section, flow.reynolds
    about = named(section)
    if reynolds.record < LAMINAR_BELOW:
        return ledger.apply("laminar_friction", {"Re": reynolds}, about)
    relative = ledger.apply("relative_roughness", {"eps": _roughness(entry, section), "D": flow.bore}, about)
    if relative.record > ROUGHEST:
        entry.refuse(
            section.roughness or section,
            "a roughness below a twentieth of the bore, where the friction factor is known",
            f"a roughness of {ledger.shown(_roughness(entry, section))} in a bore of {ledger.shown(flow.bore)}",
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
    return friction


def _roughness(entry: Entry, section: Section) -> Value:
    about, material = named(section), section.material
    if section.roughness is not None:
        return entry.value(section.roughness, "eps", f"Roughness of the wall, {about}")
    assert material, "source asks for a wall where a friction factor is found from it"
    aged = section.condition == "aged"
    found = (roughness.AGED if aged else roughness.NEW).get(material)
    if found is None:
        entry.refuse(
            section,
            f"a material of which an aged wall is tabulated: {', '.join(roughness.AGED)}",
            material,
            "state its `roughness` with its source",
        )
    title = f"Roughness of {material}, {found.words}, from the table"
    value = entry.ledger.tabulated("eps", title, parse(found.text, "roughness"), material, found.cite)
    if aged:
        entry.assume(
            f"aged {material}",
            f"The pipe wall of {material} has aged to {entry.ledger.shown(value)}: {found.words}",
            "walls age by the water as much as by the years; a roughness measured, or agreed with the owner, replaces it. The "
            "coefficients of fittings rest on clean walls all the same",
        )
    else:
        entry.assume(
            f"roughness {material}",
            f"The pipe wall of {material} is as rough as new: {entry.ledger.shown(value)}",
            "an aged pipe is rougher and loses more; state a roughness, or `condition: aged`, to replace it",
        )
    return value


#: Where the formula of Hazen and Williams is in common use: temperature in K, coefficient, velocity in m/s (practice).
TEMPERATURES, COEFFICIENTS, VELOCITIES = (275.15, 313.15), (60, 160), (0.3, 3.0)


def hazen_williams(entry: Entry, liquid: Liquid, flow: Flow, length: Value, about: str) -> Value:
    """Head lost in straight pipe by Hazen and Williams; refused where the formula does not hold."""
    ledger, given = entry.ledger, flow.section.coefficient_C
    assert given is not None, "source asks for the coefficient"
    if flow.reynolds.record <= TURBULENT_ABOVE:
        entry.refuse(
            given,
            f"turbulent flow, a Reynolds number above {TURBULENT_ABOVE}, for the formula of Hazen and Williams",
            f"{flow.reynolds.record}",
            "leave `loss_method` out: Darcy and Weisbach hold for every flow",
        )
    c = entry.value(given, "C_h", f"Coefficient of Hazen and Williams, {named(flow.section)}")
    lost = ledger.apply(
        "hazen_williams",
        {
            "L": length, "Q": flow.flow, "Q_1": ledger.constant("Q_1"), "C_h": c, "D": flow.bore,
            "l_1": ledger.constant("l_1"),
        },
        about,
    )  # fmt: skip
    outside = [
        f"{what} {shown} (usual: {usual})"
        for value, (low, high), what, shown, usual in (
            (liquid.temperature, TEMPERATURES, "temperature", ledger.shown(liquid.temperature), "2 to 40 °C"),
            (c, COEFFICIENTS, "C", given.text, "60 to 160"),
            (flow.velocity, VELOCITIES, "velocity", ledger.shown(flow.velocity), "0.3 to 3 m/s"),
        )
        if not low <= value.shadow <= high
    ]
    if outside:
        entry.find(
            f"The formula of Hazen and Williams is used outside its usual range in {named(flow.section)}",
            f"{', '.join(outside)}: it knows neither viscosity nor Reynolds number; compare with Darcy and Weisbach",
        )
    return lost
