"""A closed vessel's pressure suits its liquid: a gas stands above the vapour pressure, vapour at it."""

from __future__ import annotations

from collections.abc import Iterator

from ..lookup import CONSTANTS
from ..references import DEFINITION, PRACTICE
from ..study.barometer import barometer
from ..study.entry import cited
from ..study.liquid import Liquid, at, vapour_pressure_beside
from ..study.results import Results
from ..study.supply import surface_pressure
from ..value import Value
from ..verdict import Check, Rule, between, compare, without_numbers

ORDER = 40
_TITLE = "Pressure in the closed vessel suits its liquid"
CLOSED_VESSEL = Rule("closed_vessel", _TITLE, "p_s >= p_v", DEFINITION, decides=False)
STATED_LOW = Rule("closed_vessel_low", _TITLE, "p_s >= p_y", PRACTICE, decides=False)
STATED_HIGH = Rule("closed_vessel_high", _TITLE, "p_s <= p_x", PRACTICE, decides=False)
NEAR = CONSTANTS["dT_s"].text


def judge(results: Results) -> Iterator[Check]:
    """Judge the pressure on the surface of a closed vessel against vapour pressure; other supplies have none."""
    kind = results.calculation.supply.kind
    if kind not in ("gas_blanketed", "saturated"):
        return
    entry, worst = results.entry, results.worst
    entry.ledger.group("Pressure in the closed vessel")
    liquid = at(entry, worst)
    entry.ledger.group("Pressure in the closed vessel")
    if kind == "saturated" and worst.pressure is not None:
        yield _stated(results)
        return
    p_s = surface_pressure(entry, worst, liquid)
    yield _blanketed(results, p_s, liquid) if kind == "gas_blanketed" else compare(
        CLOSED_VESSEL, p_s, liquid.vapour_pressure, criterion="Vapour alone stands over the liquid, in equilibrium with it",
        source="", met="met by definition: one pressure at one temperature",
    )  # fmt: skip


def _blanketed(results: Results, p_s: Value, liquid: Liquid) -> Check:
    return compare(
        CLOSED_VESSEL, p_s, liquid.vapour_pressure, criterion="The gas keeps the liquid above its vapour pressure",
        source=cited(results.worst.pressure), met="the liquid does not boil at its surface",
        not_met=f"the liquid boils at its surface, within {NEAR}: state `kind: saturated` if it is vapour that stands over it, "
        "or check whether the pressure is gauge or absolute",
    )  # fmt: skip


def _stated(results: Results) -> Check:
    """A pressure stated of a saturated vessel, within a step of temperature on either side of saturation."""
    entry, worst, supply = results.entry, results.worst, results.calculation.supply
    assert worst.pressure is not None, "called where a pressure is stated"
    criterion = f"The pressure stated is that of saturation at the temperature stated, within {NEAR}"
    stated = entry.absolute(worst.pressure, f"Pressure stated of {supply.name}", lambda: barometer(entry, worst))
    colder = vapour_pressure_beside(entry, worst, "dT_s", warmer=False)
    warmer = vapour_pressure_beside(entry, worst, "dT_s")
    if colder is None or warmer is None:
        reason = f"the vapour pressure {NEAR} beside the temperature is not known"
        return without_numbers(STATED_LOW, "not assessed", reason, criterion=criterion, source=cited(worst.pressure))
    return between(
        STATED_LOW, STATED_HIGH, stated, colder, warmer, criterion=criterion, source=cited(worst.pressure),
        met="the pressure and the temperature stated belong to one state of saturation",
        not_met="the pressure and the temperature stated do not belong to one state of saturation: one of them is in doubt, "
        "or a gas stands over the liquid",
    )  # fmt: skip
