"""The barometer: that of sea level at a site above it, or one reduced to sea level as weather stations report it."""

from __future__ import annotations

from collections.abc import Iterator

from ...quantity import parse
from ...references import Cite
from ...source.inputs import Given
from ..barometer import standard_atmosphere
from ..finding import Finding, finding
from ..liquid import at as liquid_at
from ..state import as_found
from .search import Search

#: Barometers, Pa, that are the standard atmosphere of sea level as it is commonly rounded.
SEA_LEVEL = (100_900, 101_700)
#: Part of the standard atmosphere at the site that a normal barometer, and one read on a day, may reach.
NORMAL, READ = 1.02, 1.03
#: Pa by which a barometer read may lie above the lowest of the station: the weather of most places moves it less.
RISE = 10_000
#: Weather's share of a lowest barometer: half an inch of mercury.
_WEATHER = ("0.5 inHg", Cite("armstrong", "deducts half an inch of mercury for weather"))


def of_the_site(at: Search) -> Iterator[Finding]:
    """A station barometer above the standard atmosphere at the site, or, without its elevation, one of sea level as the lowest."""
    stated = at.c.site.barometer
    given = (stated.lowest or stated.normal) if stated else None
    if stated is None or given is None:
        return
    p, lowest = float(given.quantity.si()), given is stated.lowest
    sea_level = SEA_LEVEL[0] <= p <= SEA_LEVEL[1]
    word = "lowest" if lowest else "normal"
    trial = standard_atmosphere(at.trial)
    if trial is None:
        if lowest and sea_level:
            yield _lowest_of_sea_level(at, given)
        return
    if p <= trial.shadow * (1 if lowest else NORMAL):
        return
    standard = standard_atmosphere(at.entry)
    assert standard is not None and at.c.site.elevation is not None, "the trial has found it"
    weight = liquid_at(at.entry, at.worst).specific_weight
    at.ledger.group("Barometer over the standard atmosphere at the site")
    title = f"{word.capitalize()} station barometer, absolute"
    p_b = at.entry.value(given, "p_r" if at.c.site.weather_allowance else "p_b", title)
    cost = at.ledger.apply("barometer_excess", {"p_b": p_b, "p_a": standard, "gamma": weight})
    place = at.c.site.elevation.text
    yield finding(
        "sea_level_barometer" if sea_level else "airport_pressure",
        f"The {word} barometer, {given.text}, is {'that of sea level' if sea_level else 'too high'} for a site at {place}",
        "the air is thinner there, and weather reports reduce what they read to sea level; NPSH available comes out too great "
        f"by what lies above the standard atmosphere (line {standard.address}), and by the weather's share",
        cost, "the station at the site itself reads it",
    )  # fmt: skip


def _lowest_of_sea_level(at: Search, given: Given) -> Finding:
    weight = liquid_at(at.entry, at.worst).specific_weight
    at.ledger.group("What weather takes from the barometer")
    text, cite = _WEATHER
    weather = at.ledger.tabulated(
        "dp_w", "Weather allowance on the barometer, in print", parse(text, "weather_allowance"), text, cite
    )
    return finding(
        "sea_level_barometer",
        f"The lowest barometer, {given.text}, is the standard atmosphere at sea level, and the file gives no elevation",
        "bad weather lies below it even at sea level, by the head shown here; and each of the first kilometres of height takes "
        "about 1.2 m of water more (U.S. Standard Atmosphere 1976): state the site's elevation",
        at.ledger.apply("weather_head", {"dp_w": weather, "gamma": weight}), "the station's record is as high as that",
    )  # fmt: skip


def read_on_a_day(at: Search) -> Iterator[Finding]:
    """A barometer read that the site cannot have: reduced to sea level, as airports report it."""
    standard, stated = standard_atmosphere(at.trial), at.c.site.barometer
    lowest = stated.lowest if stated else None
    for reading in at.c.readings:
        p, state = float(reading.barometer.quantity.si()), as_found(reading)
        if standard is not None and p > READ * standard.shadow:
            against = "the standard atmosphere at the site"
        elif standard is None and lowest is not None and p > float(lowest.quantity.si()) + RISE:
            against = f"the lowest of the station, {lowest.text}, by more than weather moves it"
        else:
            continue
        weight = liquid_at(at.entry, state).specific_weight
        at.ledger.group("Barometer read, and that of the site")
        p_b = at.entry.value(reading.barometer, "p_b", f"Barometer, absolute, {state.name}")
        printed = standard_atmosphere(at.entry)
        if printed is not None:
            cost = at.ledger.apply("barometer_excess", {"p_b": p_b, "p_a": printed, "gamma": weight}, state.name)
        else:
            assert lowest is not None, "one of the two is there"
            symbol = "p_r" if at.c.site.weather_allowance else "p_b"
            p_r = at.entry.value(lowest, symbol, "Lowest station barometer, absolute")
            cost = at.ledger.apply("barometer_rise", {"p_b": p_b, "p_r": p_r, "gamma": weight}, state.name)
        yield finding(
            "airport_pressure", f"{reading.name}: the barometer read, {reading.barometer.text}, lies above {against}",
            "airports and weather services report it reduced to sea level; NPSH available comes out too great at the state of the "
            "reading, and is right again only where an open surface, under the same air, carries it to the worst case",
            cost, "it was read at the site on that day",
        )  # fmt: skip


MISTAKES = (of_the_site, read_on_a_day)
