"""What a careful reader would ask about the inputs: each answer a finding, never a silent change."""

from __future__ import annotations

from .. import lookup
from ..lookup import OutOfRange
from ..source.inputs import Given
from .entry import Entry
from .state import warmest


def check(entry: Entry) -> None:
    """Find readings outside the extremes the file states, and cited properties of water that water does not have."""
    c = entry.calculation
    lowest_level = c.supply.level.lowest if c.supply.level else None
    lowest_barometer = c.site.barometer.lowest if c.site.barometer else None
    for reading in c.readings:
        _beyond(entry, reading.name, "barometer", reading.barometer, lowest_barometer, lower=True)
        _beyond(entry, reading.name, "level", reading.level, lowest_level, lower=True)
        _beyond(entry, reading.name, "flow", reading.flow, c.pump.flow.highest, lower=False)
        _beyond(entry, reading.name, "temperature", reading.temperature, c.liquid.temperature.highest, lower=False)
    if c.liquid.name == "water":
        for name in ("density", "vapour_pressure"):
            _like_water(entry, name, getattr(c.liquid, name))


def _beyond(entry: Entry, name: str, what: str, read: Given | None, extreme: Given | None, *, lower: bool) -> None:
    if read is None or extreme is None:
        return
    outside = read.quantity.si() < extreme.quantity.si() if lower else read.quantity.si() > extreme.quantity.si()
    if outside:
        word = "below the lowest" if lower else "above the highest"
        entry.find(
            f"{name}: the {what} read, {read.text}, is {word} the file states, {extreme.text}",
            "the worst case is then not the worst; the extreme or the reading is in doubt",
        )


#: How far a cited property of water may lie from the look-up before it is asked about: salt, glycol or gas explain less.
_FAR = {"density": (0.9, 1.1), "vapour_pressure": (0.8, 1.25)}


def _like_water(entry: Entry, name: str, cited: Given | None) -> None:
    if cited is None:
        return
    temperature = warmest(entry.calculation)[1]
    try:
        looked_up = lookup.water(name, float(temperature.quantity.si()))
    except OutOfRange:
        return
    low, high = _FAR[name]
    if not low <= float(cited.quantity.si()) / looked_up <= high:
        entry.find(
            f"The {name.replace('_', ' ')} cited, {cited.text}, is not that of water at {temperature.text}",
            "the look-up differs by more than dissolved salt or gas would explain; the unit or the temperature is in doubt",
        )
