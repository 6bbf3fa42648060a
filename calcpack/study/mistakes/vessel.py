"""A closed vessel whose liquid boils, taken for one under gas: the pressure over it is then credited to the pump."""

from __future__ import annotations

from collections.abc import Iterator
from dataclasses import replace

from ...faults import InputFault
from ...lookup import CONSTANTS
from ..finding import Finding, finding
from ..liquid import at as liquid_at
from ..liquid import vapour_pressure_beside
from ..npsh import origin
from .search import Search, says

#: Vessels in which liquid and vapour stand in balance.
_BOILS = "deaerators?|degassers?|hot ?wells?|condensate (?:receiver|tank|drum)|flash (?:tank|vessel|drum)|reflux drum|steam drum|knock-?out drum"
#: Distance of a pressure from a vapour pressure, in parts of it, below which they are one.
SAME = 0.01
#: Step of temperature within which a vessel is near to boiling, as printed.
STEP = CONSTANTS["dT_s"].text


def saturated_as_blanketed(at: Search) -> Iterator[Finding]:
    """A vessel under gas within a step of saturation, at the vapour pressure of another temperature, or boiling by its name."""
    name = at.c.supply.name
    if at.c.supply.kind != "gas_blanketed" or at.worst.pressure is None:
        return
    now = origin(at.trial, at.worst)
    warmer = vapour_pressure_beside(at.trial, at.worst, "dT_s")
    boils = says(name, _BOILS)
    other = _of_another_temperature(at, now.pressure.shadow)
    if warmer is not None and now.pressure.shadow < warmer.shadow:
        what = f"{name} stands within {STEP} of saturation"
    elif other:
        what = f"The pressure in {name} is the vapour pressure at {other}, not at {at.worst.temperature.text}"
    elif boils:
        what = f"{name} is taken as under gas, and by its name, “{boils}”, its liquid boils"
    else:
        return
    there = origin(at.entry, at.worst)
    at.ledger.group("Pressure on the surface over vapour pressure")
    cost = at.ledger.apply("gas_credit", {"H_s": there.pressure_head, "H_v": there.vapour_head})
    yield finding(
        "saturated_as_blanketed", what,
        f"if it is vapour that stands over the liquid, its pressure follows the temperature (lines {there.pressure.address} and "
        f"{there.liquid.vapour_pressure.address}): state `kind: saturated`, and the two cancel",
        cost, "a gas holds the pressure",
    )  # fmt: skip


def _of_another_temperature(at: Search, pressure: float) -> str:
    """The temperature of the file, other than the one used, whose vapour pressure ``pressure`` is; empty where it is none."""
    t = at.c.liquid.temperature
    for given in (t.normal, t.average, t.lowest):
        if given is None or given.quantity.si() == at.worst.temperature.quantity.si():
            continue
        try:
            there = liquid_at(at.trial, replace(at.worst, temperature=given)).vapour_pressure.shadow
        except InputFault:
            continue  # a value cited at one temperature is not known at another
        if abs(pressure / there - 1) <= SAME:
            return given.text
    return ""


MISTAKES = (saturated_as_blanketed,)
