"""The pump: the flow of the whole station for that of one, a whole flow for that of one eye, and the maker's figure."""

from __future__ import annotations

import re
from collections.abc import Iterator
from itertools import pairwise
from math import isclose

from ...quantity import parse
from ...references import DEFINITION, Cite
from ...source.inputs import Intake
from ...value import Value
from .. import curve, intake
from ..best_efficiency import UNITS, suction_specific_speed
from ..finding import Finding, finding
from ..supply import flow_of
from .search import Search, says

#: Velocity, m/s, above which an inlet is too small: that of any bell of ANSI/HI 9.8 (recalled, not re-read), and of the mouth
#: of a pipe (practice).
FASTEST = {"bell_lip": 2.7, "inlet_centreline": 4.0, "inlet_mouth": 4.0}
#: The highest flow over that of best efficiency, or over the last one of the maker's curve, from which it is not of one pump.
BEYOND = 1.6
#: Part of those flows that the share of one pump may come to.
SHARE = (0.5, 1.3)
#: Suction specific speed, US units, above which a pump of one eye is in doubt.
FASTEST_EYE = 15_000
_TWO_EYES = "double[- ](?:suction|entry)|split[- ]case|axially split"
#: Suction specific speed, US and metric units, of a pump of usual design at its highest (figures to it are in print).
USUAL, USUAL_METRIC = 11_000, "213"
#: How near NPSH required lies to a submergence, in parts of it.
SAME = 0.025
_LETTERS = re.compile(r"(?<![\w/])([A-Z0-9]{1,2}(?:/[A-Z0-9]{1,2})+)(?![\w/])")


def station_flow(at: Search) -> Iterator[Finding]:
    """A flow that is too much for one bell, or for the pump's curve, and fits once it is shared among the pumps."""
    pump = at.c.pump
    assert pump.flow.highest is not None, "the schema asks for the highest flow"
    highest = float(pump.flow.highest.quantity.si())
    best, last = (
        pump.best_efficiency_flow,
        pump.npsh_required.points[-1].flow if pump.npsh_required.points else pump.npsh_required.at_flow,
    )
    for n in _pumps(at):
        if at.c.intake and _too_fast(at, at.c.intake, n):
            speed = at.ledger.shown(intake.inlet_velocity(at.entry, at.results.inlet_flow))
            what = f"The inlet takes {at.ledger.shown(at.results.inlet_flow)} at {speed}"
        elif best and _too_much(highest / float(best.quantity.si()), n):
            what = f"The highest flow of one pump, {pump.flow.highest.text}, is far above its best efficiency at {best.text}"
        elif last and _too_much(highest / float(last.quantity.si()), n):
            what = f"The highest flow of one pump, {pump.flow.highest.text}, is far above NPSH required at {last.text}"
        else:
            continue
        yield finding(
            "station_flow", f"{what}; shared among {n} pumps it fits",
            "every pump has its own flow, inlet and curve: `pump.flow` is that of one pump, and an inlet of one pump does not take "
            "the flow of all",
            _cost_of_station(at, n), "one pump takes it all",
        )  # fmt: skip
        return


def _pumps(at: Search) -> list[int]:
    """How many pumps the station may have, the likeliest first: those running, those named, one less for a spare."""
    named = _LETTERS.search(at.c.pump.name)
    count = len(named[1].split("/")) if named else 1
    return list(dict.fromkeys(n for n in (at.c.pump.running, count, count - 1) if n > 1))


def _too_fast(at: Search, inlet: Intake, n: int) -> bool:
    velocity = intake.inlet_velocity(at.trial, at.results.inlet_flow).shadow
    return velocity > FASTEST[inlet.reference] >= velocity / n


def _too_much(share: float, n: int) -> bool:
    return share >= BEYOND and SHARE[0] <= share / n <= SHARE[1]


def _cost_of_station(at: Search, n: int) -> Value | None:
    """The loss that is too high along a line; without one, the submergence asked for in excess."""
    pump = at.c.pump
    if at.passage is None and at.c.intake is None:
        return None
    at.ledger.group("The flow of all pumps, or of one")
    running = n == pump.running
    pumps = at.ledger.given(
        "N", "Number of pumps running" if running else "Number of pumps by their name", parse(str(n), "ratio"), text=str(n),
        key=f"{pump.key}.{'running' if running else 'name'}", file_line=pump.line,
    )  # fmt: skip
    if at.passage is not None:
        return at.ledger.apply("loss_of_station_flow", {"N": pumps, "h_L": at.passage.total})
    assert at.c.intake is not None, "one of the two is there"
    diameter = at.entry.value(at.c.intake.inlet_diameter, "D_i", "Diameter of the inlet")
    velocity = intake.inlet_velocity(at.entry, at.results.inlet_flow)
    froude = at.ledger.apply("inlet_froude", {"V_i": velocity, "g": at.ledger.constant("g"), "D_i": diameter})
    return at.ledger.apply("submergence_of_station_flow", {"Fr": froude, "D_i": diameter, "N": pumps})


def whole_flow_of_two_eyes(at: Search) -> Iterator[Finding]:
    """A double-suction pump, by its words or by its suction specific speed, with the flow of both eyes in one."""
    pump = at.c.pump
    if pump.eyes == 2:
        return
    words = says(f"{at.c.title} {pump.name} {pump.npsh_required.curve} {pump.npsh_required.provenance.note}", _TWO_EYES)
    speed, _ = suction_specific_speed(at.trial, "US")
    fast = speed is not None and speed.shadow > FASTEST_EYE >= speed.shadow / 2**0.5
    if not words and not fast:
        return
    what = f"The pump is taken as of one eye, and is called “{words}”"
    if not words:
        printed, _ = suction_specific_speed(at.entry, "US")
        assert printed is not None, "the trial has found it"
        what = f"The suction specific speed of one eye is {at.ledger.headline(printed)[0]:f} in US units (line {printed.address})"
    yield finding(
        "double_suction", what,
        "an impeller with two eyes takes half the flow in each: state `eyes: 2`; it costs no head, but a suction specific speed "
        "too high by the square root of two asks for a stricter margin",
        unless="the impeller has one eye",
    )  # fmt: skip


def submergence_as_npsh(at: Search) -> Iterator[Finding]:
    """NPSH required that is the submergence of the file, and too low for the speed of the pump."""
    required = at.results.judged[0].needed.required
    if required is None or at.c.intake is None or at.worst.level is None or at.c.pump.reciprocating is not None:
        return
    there = intake.submergence(at.trial, at.worst, at.results.inlet_flow)
    alike = {"needed": there.needed, "there is": there.there_is}
    word = next((w for w, s in alike.items() if isclose(required.shadow, s.shadow, rel_tol=SAME)), "")
    low = _of_usual_speed(at, required, trial=True)
    if not word or (low is not None and low.shadow <= 0):
        return
    yield finding(
        "submergence_as_npsh",
        f"NPSH required, {at.ledger.shown(required)}, is the submergence {word}, {at.ledger.shown(alike[word])}",
        "the two have nothing in common: submergence keeps vortices out, NPSH required keeps the head of the pump; take the maker's "
        f"curve. The head shown is that of a pump of suction specific speed {USUAL} (US units)",
        _of_usual_speed(at, required), "the maker states it",
    )  # fmt: skip


def _of_usual_speed(at: Search, required: Value, *, trial: bool = False) -> Value | None:
    """NPSH required of a pump of usual design at the highest flow, over the one stated."""
    entry, speed = at.trial if trial else at.entry, at.c.pump.speed or at.c.pump.npsh_required.speed
    ledger = entry.ledger
    if speed is None:
        return None
    ledger.group("NPSH required of a usual pump")
    unit = {
        symbol: ledger.tabulated(symbol, f"Unit of the suction specific speed, {text}", parse(text, kind), "metric", DEFINITION)
        for (symbol, kind), text in zip((("n_u", "speed"), ("Q_u", "flow"), ("l_u", "length")), UNITS["metric"], strict=True)
    }  # fmt: skip
    usual = ledger.tabulated(
        "N_sm",
        f"Suction specific speed, {USUAL} in US units",
        parse(USUAL_METRIC, "specific_speed"),
        "metric units",
        Cite("hi961s"),
    )
    flow = flow_of(entry, at.worst)
    eye = ledger.apply("eye_flow", {"Q_b": flow}) if at.c.pump.eyes == 2 else flow
    operands = {"n_p": curve.pump_speed(entry, speed), "Q": eye, "N_sm": usual, "NPSHR": required, **unit}
    return ledger.apply("npsh_of_specific_speed", operands)


def not_npsh3(at: Search) -> Iterator[Finding]:
    """NPSH required that is not NPSH3."""
    if at.c.pump.npsh_required.basis != "NPSH3":
        yield finding(
            "not_npsh3", "NPSH required is not stated as NPSH3",
            "the margins in print are counted over NPSH3, a fall of head of 3 % of a rotodynamic pump; a positive displacement "
            "pump's figure rests on a loss of capacity: ask the maker on which basis it stands, and for the margin over it",
            unless="the maker states another basis",
        )  # fmt: skip


def curve_falls(at: Search) -> Iterator[Finding]:
    """Points of the maker's curve between which NPSH required falls."""
    for low, high in pairwise(at.c.pump.npsh_required.points):
        if high.npsh.quantity.si() < low.npsh.quantity.si():
            yield finding(
                "curve_falls",
                f"NPSH required falls from {low.npsh.text} at {low.flow.text} to {high.npsh.text} at {high.flow.text}",
                "it rises with flow, but for some pumps at the lowest flows: a point may be misread",
                unless="the maker's curve falls there",
            )


MISTAKES = (station_flow, whole_flow_of_two_eyes, submergence_as_npsh, not_npsh3, curve_falls)
