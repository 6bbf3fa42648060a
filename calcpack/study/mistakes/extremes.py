"""Extremes that are none: the normal value typed again as the lowest or the highest, and a strainer taken clean."""

from __future__ import annotations

from collections.abc import Iterator

from ...source.inputs import Given
from ..finding import Finding, finding
from ..liquid import cost_of_temperature
from .search import Search


def _equal(extreme: Given | None, *others: Given | None) -> bool:
    return extreme is not None and any(other and other.quantity.si() == extreme.quantity.si() for other in others)


def temperature(at: Search) -> Iterator[Finding]:
    """The highest temperature is the normal or the average one."""
    t = at.c.liquid.temperature
    if t.highest is not None and _equal(t.highest, t.normal, t.average):
        yield finding(
            "highest_temperature_is_normal", f"The highest temperature, {t.highest.text}, is the normal one",
            "vapour pressure counts at the highest that can occur, and rises faster the warmer it is; the head shown is that of "
            "5 K more",
            cost_of_temperature(at.entry, at.worst), "the temperature does not vary",
        )  # fmt: skip


def level(at: Search) -> Iterator[Finding]:
    """The lowest level is the normal or the highest one."""
    level = at.c.supply.level
    if (
        level is not None
        and level.lowest is not None
        and _equal(level.lowest, level.normal, level.highest, level.overflow)
    ):
        yield finding(
            "lowest_level_is_normal", f"The lowest level, {level.lowest.text}, is the normal one",
            "static head counts at the lowest level that can occur: each metre that the level falls takes a metre of NPSH available",
            unless="the level is kept",
        )  # fmt: skip


def pressure(at: Search) -> Iterator[Finding]:
    """The lowest pressure of the supply is the normal one."""
    pressure = at.c.supply.pressure
    if pressure is not None and pressure.lowest is not None and _equal(pressure.lowest, pressure.normal):
        yield finding(
            "lowest_pressure_is_normal", f"The lowest pressure of {at.c.supply.name}, {pressure.lowest.text}, is the normal one",
            "a controller swings, and a relief or a make-up valve opens at another pressure: NPSH available falls with it",
            unless="the pressure is kept",
        )  # fmt: skip


def flow(at: Search) -> Iterator[Finding]:
    """The highest flow is the normal one."""
    flow = at.c.pump.flow
    if flow.highest is not None and _equal(flow.highest, flow.normal):
        cost = None
        if at.passage is not None:
            at.ledger.group("What a higher flow would cost")
            cost = at.ledger.apply("cost_of_flow", {"h_L": at.passage.total})
        yield finding(
            "highest_flow_is_normal", f"The highest flow, {flow.highest.text}, is the normal one",
            "a pump runs out along its curve, most of all one alone: losses rise with the square of the flow and NPSH required "
            "rises too; the head shown is lost in the line for a tenth more",
            cost, "the flow is held there",
        )  # fmt: skip


def strainer(at: Search) -> Iterator[Finding]:
    """A strainer whose fouled drop is not given, or is that of a clean one."""
    for passed in at.passage.rows if at.passage else ():
        element = passed.element
        if element.kind != "strainer" or element.clean is None:
            continue
        name = f"{element.name or 'strainer'}, element {passed.label}"
        if element.fouled is None:
            what = f"The file gives no fouled drop of {name}: its clean drop is taken"
        elif element.fouled.quantity.si() == element.clean.quantity.si():
            what = f"The fouled drop of {name}, is its clean drop"
        else:
            continue
        yield finding(
            "clean_strainer", what,
            "a screen fouls before it is cleaned, commonly to twice or three times its clean drop (common practice): once more "
            "what it loses is the least at stake",
            passed.loss, "it does not foul",
        )  # fmt: skip


MISTAKES = (temperature, level, pressure, flow, strainer)
