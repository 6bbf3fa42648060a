"""Pumps and supplies made in memory for tests: changes to the invented plant, and plants that between them need all of them."""

from __future__ import annotations

from collections.abc import Iterable, Mapping
from typing import Any

from plants import INTAKE, Document, plant

Changes = Mapping[str, Any]
OUTDOORS: Changes = {"site": {"elevation": "300 m", "barometer": {"lowest": "96 kPa absolute"}}}
CURVE: Changes = {
    "pump.npsh_required.value": None,
    "pump.npsh_required.at_flow": None,
    "pump.npsh_required.points": [
        {"flow": "100 m³/h", "npsh": "3 m"},
        {"flow": "200 m³/h", "npsh": "5 m"},
        {"flow": "260 m³/h", "npsh": "8 m"},
    ],
}
BEST: Changes = {"pump.best_efficiency_flow": "200 m³/h", "pump.speed": "1480 r/min"}
STRAINER: Changes = {
    "line.sections.0.elements.0": {
        "id": "1",
        "kind": "strainer",
        "name": "STR-1",
        "drop": {"clean": "0.4 m", "fouled": "1.1 m"},
        "at_flow": "200 m³/h",
        "source": "S1",
    }
}
HIGH: Changes = {"line.sections.0.elements.1.elevation": "0.5 m", "line.sections.0.elements.2.elevation": "1 m"}
LOOP: Changes = {
    "supply": {
        "name": "chilled loop",
        "kind": "loop",
        "pressure": {"lowest": "120 kPa gauge"},
        "elevation": "2 m",
        "point": "expansion vessel",
        "velocity_head": "left_out",
        "high_point": "8 m",
    },
    "line.sections.0.elements.0": {"id": "1", "kind": "connector", "K": "0.1"},
}
BLANKET: Changes = {
    "supply.kind": "gas_blanketed",
    "supply.pressure": {"lowest": "30 kPa gauge", "source": "S1"},
    "liquid.temperature.highest": "60 °C",
}
SATURATED: Changes = {"supply.kind": "saturated", "supply.level.lowest": "9 m", "liquid.temperature.highest": "105 °C"}
WET_PIT: Changes = {"pump.arrangement": "wet_pit", "intake": INTAKE}
SPAN: Changes = {"readings.0.gauge.span": {"lowest": "-100 kPa gauge", "highest": "150 kPa gauge"}}
TRIPLEX: Changes = {
    "pump.reciprocating": {"type": "triplex", "liquid": "water", "stabiliser": "none"},
    "pump.speed": "360 r/min",
    "pump.npsh_required.speed": "360 r/min",
    "line.sections.0.elements.1.length": "8 m",
}
Points = Iterable[tuple[float, float]]
POINTS = ((100.0, 3.0), (170.0, 4.0), (200.0, 5.0), (260.0, 8.0))


def on_curve(points: Points, **changes: Any) -> Document:
    """The invented plant with a curve of ``points``, m³/h and m."""
    held = [{"flow": f"{flow!r} m³/h", "npsh": f"{npsh!r} m"} for flow, npsh in points]
    npsh: dict[str, Any] = {f"pump.npsh_required.{name}": None for name in ("value", "at_flow")}
    return plant(npsh | {"pump.npsh_required.points": held} | changes)


def triplex_of_two_sections() -> Document:
    """A triplex pump behind a section of 8 m and a narrower one of 4 m."""
    document = plant(TRIPLEX)
    pipes = [{"id": "5", "kind": "pipe", "length": "1.5 m"}, {"id": "6", "kind": "pipe", "length": "2.5 m"}]
    narrow = {"id": "L2", "bore": "154.1 mm", "material": "commercial steel", "source": "S1", "elements": pipes}
    document["line"]["sections"].append(narrow)
    return document


SMOOTH: Changes = {"pump.npsh_required.interpolation": "smooth"}
#: Plants that between them call for every equation of the pump, of its rules and of the supplies they are judged on.
PUMPS: tuple[Document, ...] = (
    on_curve(POINTS, **{"pump.flow.highest": "185 m³/h", "pump.speed": "1500 r/min"}),
    on_curve(POINTS, **SMOOTH, **{"pump.flow.highest": "185 m³/h"}),
    on_curve(POINTS, **SMOOTH, **{"pump.flow.highest": "250 m³/h"}),
    on_curve([(100, 3.0), (200, 2.5), (260, 8.0)], **SMOOTH, **{"pump.flow.highest": "150 m³/h"}),
    on_curve([(100, 3.0), (170, 3.5), (260, 0.5)], **SMOOTH, **{"pump.flow.highest": "150 m³/h"}),
    plant({
        **BEST, "pump.eyes": 2, "pump.flow.lowest": "150 m³/h", "criteria.operating_region": {"lowest": "70 %", "highest": "120 %"},
        "criteria.suction_specific_speed": {"highest": "11000", "in": "US"}, "criteria.straight_run": "5",
        "line.sections.0.elements.3": {"id": "4", "kind": "pipe", "length": "1.2 m"},
    }),
    plant({**HIGH, "criteria.vapour_clearance": "0.5 m", "line.withheld_head": "0.3 m"}),
    plant({**OUTDOORS, "readings.0.barometer": "98 kPa absolute"}, readings=1),
    plant({**LOOP, **HIGH}),
    plant({**LOOP, **HIGH, "supply.velocity_head": "counted", "pump.npsh_required.datum_elevation": "-0.5 m"}),
    plant({**BLANKET, "supply.level.drawdown": "0.1 m"}),
    plant({**SATURATED, "supply.pressure.lowest": "21 kPa gauge"}),
    plant(SATURATED),
    plant(WET_PIT, line=False),
    plant(TRIPLEX),
    triplex_of_two_sections(),
)  # fmt: skip
