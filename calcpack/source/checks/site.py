"""Where the barometer comes from."""

from __future__ import annotations

from collections.abc import Iterator

from ...faults import Fault
from ..nodes import Mapping
from ..view import View


def check(view: View) -> Iterator[Fault]:
    """A barometer is given, or follows from the elevation and an allowance for the weather."""
    site = view.at("site")
    if not isinstance(site, Mapping):
        return
    barometer, elevation = site.get("barometer"), site.get("elevation")
    if isinstance(barometer, Mapping) and not any(barometer.get(name) for name in ("lowest", "normal")):
        yield view.fault(barometer, "site.barometer", "`lowest`, `normal` or both", "neither", "", "barometer")
    elif not barometer and not elevation:
        wanted = "`barometer`, or `elevation` with `weather_allowance`"
        hint = "add `barometer: {lowest: 99.3 kPa absolute}` or the like"
        yield view.fault(site, "site", wanted, "neither", hint, "barometer")
    elif elevation and not barometer and not site.get("weather_allowance"):
        wanted = "`weather_allowance` beside `elevation`: the standard atmosphere knows no weather"
        hint = "add `weather_allowance: 1.7 kPa` or the like"
        yield view.fault(elevation, "site.weather_allowance", wanted, "none", hint, "barometer")
