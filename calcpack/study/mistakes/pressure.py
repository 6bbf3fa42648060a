"""What the pressure of the supply counts from: gauge taken for absolute, the barometer counted twice, a vacuum's sign."""

from __future__ import annotations

from collections.abc import Iterator
from decimal import Decimal

from ...number import decimal
from ...source.inputs import Given
from ...value import Value
from ..barometer import barometer
from ..finding import Finding, finding
from ..liquid import at as liquid_at
from ..liquid import vapour_pressure_beside
from ..state import State, as_found
from .search import Search, digits

#: An absolute pressure below this part of the barometer is asked about.
BELOW = 0.98
#: A gauge pressure within these parts of the barometer is asked about, of a vessel.
NEAR = (0.95, 1.10)
#: Digits by which a gauge pressure has more than what is left without a barometer, and the fewest it has near one.
MORE, FEWEST = 2, 3
#: Units in which a gauge shows a vacuum.
_OF_VACUUM = ("inHg", "mmHg")
_STANDARD = 101_325


def _stated(at: Search) -> Iterator[tuple[Given, State]]:
    """Every pressure of the supply that a result rests on; that of a saturated vessel is for comparison only."""
    if at.c.supply.kind == "saturated":
        return
    if at.worst.pressure is not None:
        yield at.worst.pressure, at.worst
    for reading in at.c.readings:
        if reading.surface_pressure is not None:
            yield reading.surface_pressure, as_found(reading)


def _head(at: Search, state: State) -> Value:
    """The barometer as head of the liquid."""
    weight = liquid_at(at.entry, state).specific_weight
    at.ledger.group("The barometer as head")
    return at.ledger.apply("barometer_head", {"p_b": barometer(at.entry, state), "gamma": weight})


def below_the_barometer(at: Search) -> Iterator[Finding]:
    """An absolute pressure below the barometer: a gauge pressure, or a vacuum, typed as absolute."""
    for given, state in _stated(at):
        if given.quantity.reference != "absolute":
            continue
        if float(given.quantity.si()) >= BELOW * barometer(at.trial, state).shadow:
            continue
        what = f"{at.c.supply.name}: the absolute pressure, {given.text}, lies below the barometer"
        if given.quantity.unit.name in _OF_VACUUM:
            weight = liquid_at(at.entry, state).specific_weight
            at.ledger.group("A vacuum typed as absolute")
            p_s = at.entry.value(given, "p_s", f"Pressure in {at.c.supply.name}, absolute")
            operands = {"p_s": p_s, "p_b": barometer(at.entry, state), "gamma": weight}
            cost = at.ledger.apply("vacuum_as_absolute", operands)
            yield finding(
                "vacuum_as_absolute", f"{what}, in a unit in which gauges show a vacuum",
                "a vacuum counts from the barometer downwards: the absolute pressure is then the barometer less the vacuum; NPSH "
                f"available comes out too {'great' if cost.record > 0 else 'small'}",
                cost, "it is absolute",
            )  # fmt: skip
            continue
        yield finding(
            "gauge_as_absolute", what,
            "a supply under gas or in a pipe rarely stands below it, and draws air in where it leaks: it may be a gauge pressure; "
            "NPSH available then comes out too small by the barometer",
            _head(at, state), "it stands below the barometer",
        )  # fmt: skip


def barometer_twice(at: Search) -> Iterator[Finding]:
    """A gauge pressure that holds the barometer already: near it, or round once a barometer is taken off."""
    for given, state in _stated(at):
        if given.quantity.reference != "gauge":
            continue
        near = float(given.quantity.si()) / barometer(at.trial, state).shadow
        less = _without(at, given)
        if less is not None and digits(less):
            why = f"less a barometer it is the round {less:f} {given.quantity.unit.name}"
        elif less is not None or (
            at.c.supply.kind == "gas_blanketed"
            and NEAR[0] <= near <= NEAR[1]
            and digits(given.quantity.number) >= FEWEST
        ):
            why = "it is about the barometer itself"
        else:
            continue
        yield finding(
            "barometer_twice", f"{at.c.supply.name}: the gauge pressure, {given.text}, seems to hold the barometer already",
            f"{why}: if it is absolute, the barometer is counted twice, and NPSH available comes out too great by it",
            _head(at, state), "it is a gauge pressure",
        )  # fmt: skip


def _without(at: Search, given: Given) -> Decimal | None:
    """A gauge pressure less a barometer, where that has far fewer digits; in the unit typed."""
    typed, unit = given.quantity.number, given.quantity.unit
    extremes = at.c.site.barometer
    stated = [extremes.lowest, extremes.normal] if extremes else []
    stated += [reading.barometer for reading in at.c.readings]
    exact = [decimal(each.quantity.si() / unit.factor) for each in stated if each] + [decimal(_STANDARD / unit.factor)]
    for barometer_ in (Decimal(f"{each:.{places}g}") for each in exact for places in (3, 4, 5, 6)):
        left = typed - barometer_
        if left >= 0 and digits(typed) - digits(left) >= MORE:
            return left.normalize()
    return None


def stated_of_saturation(at: Search) -> Iterator[Finding]:
    """A pressure stated of a saturated vessel that is that of saturation once it counts from elsewhere."""
    given = at.c.supply.pressure.lowest if at.c.supply.pressure else None
    if at.c.supply.kind != "saturated" or given is None:
        return
    ends = [vapour_pressure_beside(at.trial, at.worst, "dT_s", warmer=warmer) for warmer in (False, True)]
    if ends[0] is None or ends[1] is None:
        return
    low, high, p_b = ends[0].shadow, ends[1].shadow, barometer(at.trial, at.worst).shadow
    p = float(given.quantity.si())
    gauge = given.quantity.reference == "gauge"
    if low <= (p + p_b if gauge else p) <= high:
        return
    meant = {"barometer_twice": (gauge, p, "an absolute pressure")}
    meant["gauge_as_absolute"] = (not gauge, p + p_b, "a gauge pressure")
    meant["vacuum_as_absolute"] = (not gauge, p_b - p, "a vacuum")
    for name, (typed, pressure, words) in meant.items():
        if typed and low <= pressure <= high:
            yield finding(
                name, f"{at.c.supply.name}: the pressure stated, {given.text}, is that of saturation if it is {words}",
                "a saturated vessel stands at the vapour pressure; the result does not rest on the pressure stated",
            )  # fmt: skip


MISTAKES = (below_the_barometer, barometer_twice, stated_of_saturation)
