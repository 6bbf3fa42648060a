"""A closed loop keeps a pressure above the barometer, at the pump's inlet and at its high point, running and at rest."""

from __future__ import annotations

from collections.abc import Iterator

from ..quantity import parse
from ..references import PRACTICE
from ..study.barometer import barometer
from ..study.entry import Entry, cited
from ..study.npsh import Origin, Run, origin
from ..study.results import Results
from ..value import Value
from ..verdict import Check, Rule, Unapplied, compare, lacking

ORDER = 50
LOOP_PRESSURE = Rule("loop_pressure", "Pressure in the closed loop", "p_i >= p_l", PRACTICE)
_CRITERION = "The gauge pressure in the loop does not fall below the lowest to be kept: air is not drawn in"


def judge(results: Results) -> Iterator[Check | Unapplied]:
    """Judge a loop where its pressure is lowest, running and at rest; other supplies have no such pressure."""
    entry, c = results.entry, results.calculation
    asked = c.criteria.loop_pressure
    if c.supply.kind != "loop":
        if asked is not None:
            reason = f"{c.supply.name} is no closed loop"
            yield Check(LOOP_PRESSURE, "", "not applicable", reason, _CRITERION, cited(asked))
        return
    entry.ledger.group("Pressure in the closed loop")
    limit = _limit(entry)
    if not results.runs:
        yield lacking(
            LOOP_PRESSURE, "the file describes no suction line, so the pressure at the running pump's inlet is not computed",
            asked=asked is not None, about="running", criterion=_CRITERION, source=cited(asked),
        )  # fmt: skip
    for run in results.runs:
        yield _least(results, _running(entry, run), limit, f"running, {run.state.name}")
    at_rest = [(run.origin, run.state.name) for run in results.runs] or [
        (origin(entry, results.worst), results.worst.name)
    ]
    for where, name in at_rest:
        yield _least(results, _at_rest(results, where), limit, f"at rest, {name}")
    if c.supply.high_point is None:
        yield lacking(
            LOOP_PRESSURE, "the file gives no high_point of the loop", asked=asked is not None, about="high point, at rest",
            criterion=_CRITERION, source=cited(asked),
        )  # fmt: skip


def _limit(entry: Entry) -> Value:
    given = entry.calculation.criteria.loop_pressure
    if given is not None:
        return entry.value(given, "p_l", "Lowest gauge pressure to be kept in the loop")
    entry.assume(
        "loop pressure",
        "A closed loop is kept at no less than the barometer",
        "below it air is drawn in through seals and vents; most projects ask for more: state loop_pressure",
    )
    title = "Lowest gauge pressure to be kept in the loop: that of the barometer"
    return entry.ledger.tabulated("p_l", title, parse("0 kPa gauge", "gauge"), "assumed", PRACTICE)


def _running(entry: Entry, run: Run) -> dict[str, Value]:
    """Places of the loop -> gauge pressure there, the pump running."""
    ledger, p_b = entry.ledger, barometer(entry, run.state)
    assert run.passage is not None, "the line of a loop leads to its pump"
    found = {
        "the pump inlet": ledger.apply("inlet_gauge_running", {
            "gamma": run.origin.liquid.specific_weight, "NPSHA_d": run.available.npsh, "H_v": run.origin.vapour_head,
            "h_V": run.passage.flows[-1].velocity_head, "p_b": p_b,
        }, run.state.name),
    }  # fmt: skip
    if run.nodes:
        lowest = min(run.nodes, key=lambda node: node.pressure.record)
        place = f"element {lowest.element}"
        found[place] = ledger.apply("gauge_on_the_line", {"p_n": lowest.pressure, "p_b": p_b}, place)
    return found


def _at_rest(results: Results, where: Origin) -> dict[str, Value]:
    """Places of the loop -> gauge pressure there, the pump at rest."""
    entry, supply = results.entry, results.calculation.supply
    ledger, p_b, weight = entry.ledger, barometer(entry, results.worst), where.liquid.specific_weight
    found = {
        "the pump inlet": ledger.apply("inlet_gauge_at_rest", {
            "gamma": weight, "H_k": where.pressure_head, "z": where.static_head, "p_b": p_b,
        }),
    }  # fmt: skip
    if supply.high_point is not None:
        high = entry.value(supply.high_point, "z_h", "Elevation of the high point of the loop")
        found["the high point"] = ledger.apply("high_point_gauge", {
            "p_k": where.pressure, "gamma": weight, "z_h": high, "z_k": where.elevation, "p_b": p_b,
        })  # fmt: skip
    return found


def _least(results: Results, places: dict[str, Value], limit: Value, about: str) -> Check:
    place = min(places, key=lambda name: places[name].record)
    reason = f"lowest at {place} (line {places[place].address})"
    return compare(
        LOOP_PRESSURE, places[place], limit, about=about, criterion=_CRITERION,
        source=cited(results.calculation.criteria.loop_pressure), met=reason, not_met=reason,
    )  # fmt: skip
