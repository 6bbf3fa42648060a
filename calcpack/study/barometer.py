"""The barometer at the site: as read, the lowest on record, or the standard atmosphere less an allowance."""

from __future__ import annotations

from ..value import Value
from .entry import Entry
from .state import State

#: Elevations, m, between which the formula of the lowest layer of the U.S. Standard Atmosphere 1976 holds.
LOWEST_SITE, HIGHEST_SITE = -5000, 11_000


def barometer(entry: Entry, state: State) -> Value:
    """The absolute barometer of ``state``: as read there, else the site's lowest."""
    if state.barometer is not None:
        return entry.value(state.barometer, "p_b", f"Barometer, absolute, {state.name}")
    site, ledger = entry.calculation.site, entry.ledger
    station = site.barometer and (site.barometer.lowest or site.barometer.normal)
    if station:
        lowest = site.barometer is not None and site.barometer.lowest is not None
        word = "Lowest" if lowest else "Normal"
        if site.weather_allowance is None and not lowest:
            entry.refuse(
                station,
                "the lowest station barometer, or a weather_allowance beside the normal one",
                f"the normal one, {station.text}, alone",
                "an allowance of half an inch of mercury, 1.7 kPa, is in print; the site's own record is better",
            )
        if site.weather_allowance is None:
            return entry.value(station, "p_b", f"{word} station barometer, absolute")
        read = entry.value(station, "p_r", f"{word} station barometer, absolute")
        return ledger.apply("barometer_station", {"p_r": read, "dp_w": _allowance(entry)})
    standard = standard_atmosphere(entry)
    assert standard is not None, "source asks for an elevation where no barometer is given"
    return ledger.apply("barometer_standard", {"p_a": standard, "dp_w": _allowance(entry)})


def standard_atmosphere(entry: Entry) -> Value | None:
    """The pressure of the standard atmosphere at the site, where its elevation is given."""
    site, ledger = entry.calculation.site, entry.ledger
    if site.elevation is None:
        return None
    if not LOWEST_SITE <= site.elevation.quantity.si() <= HIGHEST_SITE:
        entry.refuse(
            site.elevation,
            "a site between 5 km below and 11 km above sea level, where the standard atmosphere's formula holds",
            site.elevation.text,
            "check the unit, or state the station barometer",
        )
    height = ledger.apply("geopotential_height", {
        "Z": entry.value(site.elevation, "Z", "Site elevation above sea level"), "r_0": ledger.constant("r_0"),
    })  # fmt: skip
    exponent = ledger.apply("atmosphere_exponent", {"K_h": ledger.constant("K_h"), "beta": ledger.constant("beta")})
    return ledger.apply("standard_atmosphere", {
        "p_0": ledger.constant("p_0"), "beta": ledger.constant("beta"), "H": height, "T_0": ledger.constant("T_0"),
        "n_a": exponent,
    })  # fmt: skip


def _allowance(entry: Entry) -> Value:
    given = entry.calculation.site.weather_allowance
    assert given is not None, "source asks for the allowance where the barometer is not the lowest reading"
    return entry.value(given, "dp_w", "Weather allowance on the barometer")
