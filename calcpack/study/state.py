"""A state: the conditions at which a route is computed."""

from __future__ import annotations

from dataclasses import dataclass

from ..number import typeset_minus
from ..source.inputs import Calculation, Case, Given, Reading


@dataclass(frozen=True)
class State:
    """Conditions of one run.

    ``barometer`` is ``None`` where the site's lowest is taken; ``drawdown`` is taken off the level; ``running`` pumps draw
    ``flow`` each; ``strainers`` are clean or fouled.
    """

    name: str
    scope: str
    flow: Given
    running: int
    temperature: Given
    level: Given | None
    drawdown: Given | None
    pressure: Given | None
    barometer: Given | None
    strainers: str


def warmest(calculation: Calculation) -> tuple[str, Given]:
    """The highest temperature the file gives and the name of its extreme."""
    t = calculation.liquid.temperature
    for name, given in (("highest", t.highest), ("normal", t.normal), ("average", t.average), ("lowest", t.lowest)):
        if given is not None:
            return name, given
    raise AssertionError("source asks for one temperature at least")


def worst_case(calculation: Calculation) -> State:
    """All unfavourable extremes together: lowest level and pressure, highest temperature and flow, fouled strainers."""
    name, temperature = warmest(calculation)
    colder = coldest(calculation) is not None
    return _unfavourable(calculation, "warmest case" if colder else "worst case", f"{name} temperature", temperature)


def design_states(calculation: Calculation) -> list[State]:
    """The states the design route is run at: the worst case, and with the coldest liquid where the file gives it."""
    if calculation.line is None and calculation.pump.arrangement != "wet_pit":
        return []
    states = [worst_case(calculation)]
    if (cold := coldest(calculation)) is not None:
        states.append(_unfavourable(calculation, "coldest case", "lowest temperature", cold))
    return states + [_of(calculation, case) for case in calculation.cases]


def coldest(calculation: Calculation) -> Given | None:
    """The lowest temperature, where the file gives it beside a higher one."""
    lowest = calculation.liquid.temperature.lowest
    return None if lowest is warmest(calculation)[1] else lowest


def _of(c: Calculation, case: Case) -> State:
    """The state of a case: the most unfavourable one with what differs."""
    base = worst_case(c)
    flow, temperature = case.flow or base.flow, case.temperature or base.temperature
    level, pressure = case.level or base.level, case.pressure or base.pressure
    running, strainers = case.running or base.running, case.strainers or base.strainers
    words = [f"flow {typeset_minus(flow.text)}", typeset_minus(temperature.text)]
    if c.pump.running > 1:
        words.insert(0, f"{running} {'pump' if running == 1 else 'pumps'} running")
    if level is not None:
        words.insert(0, f"level {typeset_minus(level.text)}")
    if pressure is not None:
        words.append(f"pressure {typeset_minus(pressure.text)}")
    if _strained(c):
        words.append(f"strainer {strainers}")
    scope = ", ".join(words)
    return State(case.name, scope, flow, running, temperature, level, base.drawdown, pressure, None, strainers)


def _strained(c: Calculation) -> bool:
    return c.line is not None and any(e.kind == "strainer" for s in c.line.sections for e in s.elements)


def _unfavourable(c: Calculation, name: str, extreme: str, temperature: Given) -> State:
    level, drawdown = (c.supply.level.lowest, c.supply.level.drawdown) if c.supply.level else (None, None)
    pressure = c.supply.pressure.lowest if c.supply.pressure else None
    highest = c.pump.flow.highest
    assert highest is not None, "the schema asks for the highest flow"
    words = [f"flow {typeset_minus(highest.text)}", f"{extreme} {typeset_minus(temperature.text)}"]
    if c.pump.running > 1:
        words.insert(0, f"{c.pump.running} pumps running")
    if level is not None:
        words.insert(0, f"lowest level {typeset_minus(level.text)}")
    if pressure is not None:
        words.append(f"lowest pressure {typeset_minus(pressure.text)}")
    if _strained(c):
        words.append("strainer fouled")
    scope = ", ".join(words)
    return State(name, scope, highest, c.pump.running, temperature, level, drawdown, pressure, None, "fouled")


def as_found(reading: Reading) -> State:
    """The state of a reading, of one pump alone."""
    words = [
        f"flow {typeset_minus(reading.flow.text)}",
        typeset_minus(reading.temperature.text),
        f"barometer {typeset_minus(reading.barometer.text)}",
    ]
    if reading.level is not None:
        words.insert(0, f"level {typeset_minus(reading.level.text)}")
    return State(
        reading.name, ", ".join(words), reading.flow, 1, reading.temperature, reading.level, None,
        reading.surface_pressure, reading.barometer, reading.strainers or "clean",
    )  # fmt: skip
