"""The ranges outside which a package stops applying, as the file states them."""

from __future__ import annotations

from ..assessment import Study
from ..number import typeset_minus
from ..source.inputs import Calculation, Given
from ..study.state import coldest
from ..study.supply import POINTS
from ..verdict import PASSING
from .lines import Json


def limits(study: Study) -> list[Json]:
    """Each limit with its value as given and, where it enters the computation, its line."""
    address = {x.key: x.value.address for x in study.ledger.inputs}
    passing = all(check.verdict in PASSING for check in study.checks)
    rows = [
        {
            "what": what,
            "limit": f"{word if passing else 'computed at'} {typeset_minus(of.text)}",
            "address": address.get(of.key, ""),
        }
        for what, word, of in _stated(study.calculation)
        if of is not None
    ]
    running = study.calculation.pump.running
    if running > 1:
        row = {
            "what": "pumps running",
            "limit": f"{'not above' if passing else 'computed at'} {running}",
            "address": "",
        }
        rows.insert(1, row)
    return rows


def _breathes(c: Calculation) -> bool:
    """Whether the barometer enters NPSH available: over an open surface, beside a gauge pressure, and in readings."""
    pressure = c.supply.pressure.lowest if c.supply.pressure else None
    gauge = pressure is not None and pressure.quantity.reference != "absolute" and c.supply.kind != "saturated"
    return c.supply.kind == "open" or gauge or bool(c.readings)


def _stated(c: Calculation) -> list[tuple[str, str, Given | None]]:
    """What is limited, the word for it while the verdict holds, and the value; ``None`` where the file has none."""
    level, pressure = c.supply.level, c.supply.pressure
    place = f"at {c.supply.point or c.supply.name}" if c.supply.kind in POINTS else "on the surface"
    rows = [
        ("flow of one pump", "not above", c.pump.flow.highest),
        ("level of the surface", "not below", level.lowest if level else None),
        ("drawdown of the surface", "not above", level.drawdown if level else None),
        ("temperature of the liquid", "not above", c.liquid.temperature.highest),
        ("lowest temperature of the liquid", "not below", coldest(c)),
        (f"pressure {place}", "not below", pressure.lowest if pressure else None),
        ("barometer at the site", "not below", c.site.barometer.lowest if c.site.barometer and _breathes(c) else None),
    ]
    for section in c.line.sections if c.line else ():
        for e in section.elements:
            if e.kind == "strainer":
                rows.append((f"drop of {e.name or 'the strainer'}", "not above", e.fouled or e.clean))
            elif e.loss is not None:
                rows.append((f"loss of {e.name or e.kind}", "not above", e.loss))
    npsh = c.pump.npsh_required
    rows += [(f"flow of one pump, {case.name}", "not above", case.flow) for case in c.cases]
    if npsh.points:
        rows.insert(1, ("flow of one pump, by the curve", "not below", npsh.points[0].flow))
    return [*rows, ("speed of the pump", "as", c.pump.speed or npsh.speed), ("impeller", "as", npsh.impeller)]
