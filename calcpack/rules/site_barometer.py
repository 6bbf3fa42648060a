"""The barometer is that of the station at its elevation, not one reduced to sea level."""

from __future__ import annotations

from collections.abc import Iterator

from ..references import Cite
from ..study.barometer import standard_atmosphere
from ..study.entry import cited
from ..study.results import Results
from ..verdict import Check, Rule, Unapplied, between, compare

ORDER = 150
_TITLE, _CITE = "Barometer suits the site", Cite("ussa76")
LOWEST_BAROMETER = Rule("site_barometer", _TITLE, "p_b <= p_a", _CITE, decides=False)
READ_LOW = Rule("site_barometer_low", _TITLE, "p_b >= p_al", _CITE, decides=False)
READ_HIGH = Rule("site_barometer_high", _TITLE, "p_b <= p_ah", _CITE, decides=False)
_SEA_LEVEL = "it may have been reduced to sea level, or belong to another site"


def judge(results: Results) -> Iterator[Check | Unapplied]:
    """Judge the lowest station barometer and each barometer read against the standard atmosphere at the site."""
    entry, site = results.entry, results.calculation.site
    lowest = site.barometer.lowest if site.barometer else None
    entry.ledger.group("Barometer and elevation of the site")
    if site.elevation is None or (lowest is None and not results.calculation.readings):
        missing = "elevation of the site" if site.elevation is None else "station barometer"
        yield Unapplied(_TITLE, f"the file gives no {missing}")
        return
    standard = standard_atmosphere(entry)
    assert standard is not None, "the site has an elevation"
    if lowest is not None:
        symbol = "p_b" if site.weather_allowance is None else "p_r"
        yield compare(
            LOWEST_BAROMETER, entry.value(lowest, symbol, "Lowest station barometer, absolute"), standard, about="lowest",
            criterion="The lowest barometer at the site is at most the standard atmosphere at its elevation",
            source=cited(lowest), met="it suits the elevation", not_met=f"it is too high for the elevation: {_SEA_LEVEL}",
        )  # fmt: skip
    for reading in results.calculation.readings:
        yield between(
            READ_LOW, READ_HIGH, entry.value(reading.barometer, "p_b", f"Barometer, absolute, {reading.name}"),
            entry.ledger.apply("barometer_lowest_likely", {"p_a": standard}),
            entry.ledger.apply("barometer_highest_likely", {"p_a": standard}),
            about=reading.name, criterion="A barometer read is within 5 % of the standard atmosphere at the site",
            source=cited(reading.barometer), met="it suits the elevation",
            not_met=f"no weather is so far from the standard atmosphere: {_SEA_LEVEL}",
        )  # fmt: skip
