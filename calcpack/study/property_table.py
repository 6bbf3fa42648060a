"""A liquid's cited properties: single values, and the table against temperature, read between its rows but never beyond."""

from __future__ import annotations

from itertools import pairwise

from ..source.inputs import Given, PropertyRow
from ..value import Value, in_si
from .entry import Entry

#: What a property's unit measures -> its symbol and its title.
_NAMES = {
    "pressure": ("p_v", "Vapour pressure, absolute"),
    "density": ("rho", "Density"),
    "dynamic_viscosity": ("mu", "Dynamic viscosity"),
    "kinematic_viscosity": ("nu", "Kinematic viscosity"),
}
#: Symbol -> the equation that reads it between two rows, and its symbols for the row below and above.
_BETWEEN = {
    "p_v": ("vapour_pressure_between", "p_v1", "p_v2"),
    "rho": ("density_between", "rho_1", "rho_2"),
    "mu": ("viscosity_between", "mu_1", "mu_2"),
    "nu": ("kinematic_viscosity_between", "nu_1", "nu_2"),
}


def cited_value(entry: Entry, given: Given, row: str = "") -> Value:
    """A property as the file cites it; ``row`` says in which row of the table."""
    symbol, title = _NAMES[given.quantity.unit.kind]
    if symbol == "p_v" and entry.calculation.liquid.vapour_pressure_kind == "effective":
        title = "Effective vapour pressure (dissolved gas), absolute"
    return entry.value(given, symbol, f"{title}{row}, cited")


def rows(entry: Entry, name: str) -> tuple[PropertyRow, ...]:
    """The rows of the cited table that give the property ``name``: all or none."""
    return tuple(row for row in entry.calculation.liquid.table if getattr(row, name) is not None)


def read(entry: Entry, name: str, temperature: Value, at: Given) -> Value:
    """The property ``name`` at ``temperature``: a row's own value, else between its neighbours.

    Density is linear in temperature; the logarithms of vapour pressure and viscosity are linear in its inverse.  Outside
    the table the fault stands at ``at``, the temperature's place.
    """
    table, sought = rows(entry, name), in_si(temperature)
    for row in table:
        if row.temperature.quantity.si() == sought:
            return _value(entry, row, name)
    for below, above in pairwise(table):
        if below.temperature.quantity.si() < sought < above.temperature.quantity.si():
            return _between(entry, name, temperature, below, above)
    entry.refuse(
        at,
        f"a temperature within the table, {table[0].temperature.text} to {table[-1].temperature.text}",
        at.text,
        f"the {name.replace('_', ' ')} is read between the rows of the table, never beyond; add a row",
    )


def _value(entry: Entry, row: PropertyRow, name: str) -> Value:
    return cited_value(entry, getattr(row, name), f", at {row.temperature.text}")


def _between(entry: Entry, name: str, temperature: Value, below: PropertyRow, above: PropertyRow) -> Value:
    ledger = entry.ledger
    lower, upper = _value(entry, below, name), _value(entry, above, name)
    assert lower.symbol == upper.symbol, "source asks for one kind of viscosity in every row"
    sought = {
        symbol: ledger.convert(value, symbol)
        for symbol, value in (
            ("T_t", temperature),
            ("T_1", entry.typed(below.temperature, "T", "Temperature of a row of the liquid's table")),
            ("T_2", entry.typed(above.temperature, "T", "Temperature of a row of the liquid's table")),
        )
    }
    equation, first, second = _BETWEEN[lower.symbol]
    values = {first: lower, second: upper} | sought
    if lower.symbol != "rho":
        values["y"] = ledger.apply("place_between", sought)
    return ledger.apply(equation, values)
