"""A state: the conditions at which a route is computed."""

from __future__ import annotations

from dataclasses import dataclass

from ..number import typeset_minus
from ..source.inputs import Calculation, Given, Reading


@dataclass(frozen=True)
class State:
    """Conditions of one run.  ``barometer`` is ``None`` where the site's lowest is taken; ``strainers`` clean or fouled."""

    name: str
    scope: str
    flow: Given
    temperature: Given
    level: Given | None
    pressure: Given | None
    barometer: Given | None
    strainers: str


def warmest(calculation: Calculation) -> tuple[str, Given]:
    """The highest temperature the file gives and the name of its extreme."""
    t = calculation.liquid.temperature
    for name, given in (("highest", t.highest), ("normal", t.normal), ("average", t.average)):
        if given is not None:
            return name, given
    raise AssertionError("the schema asks for one temperature at least")


def worst_case(calculation: Calculation) -> State:
    """All unfavourable extremes together: lowest level and pressure, highest temperature and flow, fouled strainers."""
    c = calculation
    name, temperature = warmest(c)
    level = c.supply.level.lowest if c.supply.level else None
    pressure = c.supply.pressure.lowest if c.supply.pressure else None
    highest = c.pump.flow.highest
    assert highest is not None, "the schema asks for the highest flow"
    words = [f"flow {typeset_minus(highest.text)}", f"{name} temperature {typeset_minus(temperature.text)}"]
    if level is not None:
        words.insert(0, f"lowest level {typeset_minus(level.text)}")
    if pressure is not None:
        words.append(f"lowest pressure {typeset_minus(pressure.text)}")
    if c.line and any(e.kind == "strainer" for s in c.line.sections for e in s.elements):
        words.append("strainer fouled")
    return State("worst case", ", ".join(words), highest, temperature, level, pressure, None, "fouled")


def as_found(reading: Reading) -> State:
    """The state of a reading."""
    words = [
        f"flow {typeset_minus(reading.flow.text)}",
        reading.temperature.text,
        f"barometer {typeset_minus(reading.barometer.text)}",
    ]
    if reading.level is not None:
        words.insert(0, f"level {typeset_minus(reading.level.text)}")
    return State(
        reading.name,
        ", ".join(words),
        reading.flow,
        reading.temperature,
        reading.level,
        reading.surface_pressure,
        reading.barometer,
        reading.strainers or "clean",
    )
