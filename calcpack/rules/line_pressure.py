"""Pressure along the line: no point of it comes near the vapour pressure, not only the pump's inlet."""

from __future__ import annotations

from collections.abc import Iterator

from ..references import PRACTICE
from ..study.entry import cited
from ..study.npsh import Run
from ..study.reciprocating import acceleration
from ..study.results import Results
from ..verdict import Check, Rule, Unapplied, compare, lacking

ORDER = 60
#: Per cent of an absolute pressure says little: near boiling every margin is a small part of it.
LINE_PRESSURE = Rule("line_pressure", "Pressure along the suction line", "p_n >= p_m", PRACTICE, decides=False)


def judge(results: Results) -> Iterator[Check | Unapplied]:
    """One check for each run of the design route, at the point of the line where pressure is lowest."""
    asked = results.calculation.criteria.vapour_clearance
    runs = [run for run in results.runs if run.nodes]
    if not runs:
        missing = "the file gives no elevation of any element of a suction line"
        yield lacking(
            LINE_PRESSURE, missing, asked=asked is not None, criterion=_criterion(results), source=cited(asked)
        )
    elif asked is None:
        results.entry.assume(
            "vapour clearance",
            "No head is kept over vapour pressure along the line",
            "the liquid may come to the verge of boiling at a high point; state vapour_clearance to keep some",
        )
    for run in runs:
        yield _check(results, run)


def _criterion(results: Results) -> str:
    asked = results.calculation.criteria.vapour_clearance
    kept = f" with {asked.text} of head over it" if asked else ""
    return f"The absolute pressure at every point of the line is at least the vapour pressure{kept}"


def _check(results: Results, run: Run) -> Check:
    entry, asked, liquid = results.entry, results.calculation.criteria.vapour_clearance, run.origin.liquid
    entry.ledger.group("Pressure to be kept along the line")
    least = liquid.vapour_pressure
    if asked is not None:
        clearance = entry.value(asked, "h_c", "Head kept over vapour pressure along the line")
        operands = {"p_v": least, "gamma": liquid.specific_weight, "h_c": clearance}
        least = entry.ledger.apply("pressure_kept", operands, run.state.name)
    lowest = min(run.nodes, key=lambda node: node.pressure.record)
    pressure, stroke = lowest.pressure, ""
    taken = acceleration(entry, run.passage)[0] if results.calculation.pump.reciprocating and run.passage else None
    if taken is not None:
        operands = {"p_n": pressure, "gamma": liquid.specific_weight, "h_a": taken}
        pressure = entry.ledger.apply("pressure_less_acceleration", operands, run.state.name)
        stroke = "; the whole acceleration head is taken off, on the safe side upstream of the pump"
    reason = f"lowest after {lowest.words}, element {lowest.element} (line {lowest.pressure.address}){stroke}"
    return compare(
        LINE_PRESSURE, pressure, least, about=run.available.about, criterion=_criterion(results),
        source=cited(asked), met=reason, not_met=reason,
    )  # fmt: skip
