"""What may be described: supplies, liquids, elements, pumps and criteria that arrive in the records, and their limits."""

from __future__ import annotations

from pathlib import Path
from typing import Any

import pytest
from plants import plant, written
from source_files import SAMPLES

from calcpack.faults import InputFault
from calcpack.fitting_set import LENDER, SETS, variants
from calcpack.lookup import LIQUIDS
from calcpack.source import loads
from calcpack.source.inputs import Calculation

PATHS = sorted(SAMPLES.glob("*.yaml"))
SECTION = "line.sections.0"
ELEMENT = f"{SECTION}.elements.3"
POINT = {
    "supply.level": None,
    "supply.pressure": {"lowest": "50 kPa gauge", "source": "S1", "status": "verified"},
    "supply.elevation": "0.5 m",
    "supply.velocity_head": "counted",
    f"{SECTION}.elements.0": {"id": "1", "kind": "tee", "flow": "run"},
}
LOOP = POINT | {"supply.kind": "loop", "supply.point": "expansion vessel", "supply.high_point": "9 m"}
CURVE = [{"flow": "100 m³/h", "npsh": "3 m"}, {"flow": "200 m³/h", "npsh": "5 m"}]
POINTS = {"pump.npsh_required.value": None, "pump.npsh_required.at_flow": None, "pump.npsh_required.points": CURVE}
INTAKE = {"inlet_diameter": "300 mm", "reference": "bell_lip", "elevation": "-1 m"}
TEE = {f"{SECTION}.elements.0": {"id": "1", "kind": "tee", "flow": "run"}}
HAZEN_WILLIAMS = {
    "line.loss_method": "hazen_williams",
    f"{SECTION}.hazen_williams_C": 120,
    f"{SECTION}.material": None,
}
WET_PIT = {"pump.arrangement": "wet_pit", "line": None}


def fourth(kind: str, **keys: Any) -> dict[str, Any]:
    """The change that puts an element in the fourth place of the line."""
    return {ELEMENT: {"id": "4", "kind": kind, **keys}}


def read(changes: dict[str, Any], **more: Any) -> Calculation:
    return loads(written(plant(changes, **more)), "plant.yaml")


def refused(changes: dict[str, Any], **more: Any) -> list[tuple[str, str]]:
    """``(key, kind)`` of each fault."""
    with pytest.raises(InputFault) as caught:
        read(changes, **more)
    return [(fault.key, fault.kind) for fault in caught.value.faults]


def test_absent_keys_have_their_defaults() -> None:
    c = read({})
    assert c.line is not None and c.line.loss_method == "darcy_weisbach" and c.line.mixed_sets == ""
    section = c.line.sections[0]
    assert (section.pumps, section.condition, section.coefficient_C) == (1, "", None)
    assert (c.pump.running, c.pump.eyes, c.pump.arrangement) == (1, 0, "")
    assert (c.pump.npsh_required.interpolation, c.pump.npsh_required.points) == ("linear", ())
    assert [(e.angle, e.count) for e in section.elements] == [(0, 1), (0, 1), (90, 2), (0, 1)]
    assert (c.liquid.table, c.supply.point, c.criteria.service) == ((), "", None)


def test_a_loop_arrives() -> None:
    supply = read(LOOP).supply
    assert (supply.kind, supply.point, supply.velocity_head) == ("loop", "expansion vessel", "counted")
    assert supply.level is None and supply.elevation is not None and supply.high_point is not None
    assert (supply.key, supply.high_point.key) == ("supply", "supply.high_point")


def test_levels_arrive() -> None:
    level = {"lowest": "1.5 m", "overflow": "4 m", "drawdown": "0.2 m", "source": "S1", "status": "verified"}
    found = read({"supply.level": level}).supply.level
    assert found is not None and found.overflow is not None and found.drawdown is not None
    assert (found.overflow.text, found.drawdown.source) == ("4 m", "S1")


def test_a_table_of_properties_arrives() -> None:
    row = {"temperature": "20 °C", "density": "870 kg/m³", "viscosity": "60 cSt", "vapour_pressure": "9 Pa absolute"}
    rows = [row, row | {"temperature": "40 °C", "viscosity": "25 cSt"}]
    liquid = read({"liquid.name": "heat transfer oil", "liquid.source": "S1", "liquid.table": rows}).liquid
    assert [each.temperature.text for each in liquid.table] == ["20 °C", "40 °C"]
    assert liquid.table[1].viscosity is not None
    assert (liquid.table[1].viscosity.key, liquid.table[1].viscosity.source) == ("liquid.table[2].viscosity", "S1")


def test_a_curve_of_equipment_and_a_reducer_arrive() -> None:
    points = [{"flow": "100 m³/h", "loss": "4 kPa"}, {"flow": "200 m³/h", "loss": "15 kPa"}]
    c = read(
        {
            ELEMENT: {"id": "4", "kind": "equipment", "name": "cooler", "curve": points, "elevation": "1 m"},
            f"{SECTION}.elements.1": {
                "id": "2",
                "kind": "reducer",
                "type": "eccentric",
                "from": {"size": "DN 250", "schedule": "40"},
                "length": "178 mm",
                "flat_side": "top",
                "drawing": "D-1",
            },
        }
    )
    assert c.line is not None
    _, reducer, _, cooler = c.line.sections[0].elements
    assert reducer.from_pipe is not None and reducer.to is None
    assert (reducer.from_pipe.size, reducer.flat_side, reducer.drawing) == ("DN 250", "top", "D-1")
    assert [(p.flow.text, p.loss.text) for p in cooler.curve] == [("100 m³/h", "4 kPa"), ("200 m³/h", "15 kPa")]
    assert cooler.curve[0].loss.key == "line.sections[L1].elements[4].curve[1].loss"


def test_the_pump_and_its_criteria_arrive() -> None:
    c = read(
        POINTS
        | {
            "pump.running": 1,
            "pump.eyes": 2,
            "pump.speed": "1450 r/min",
            "pump.npsh_required.interpolation": "smooth",
            "pump.npsh_required.speed_exponent": 1.5,
            "pump.npsh_required.datum_elevation": "0.4 m",
            "pump.reciprocating": {"type": "triplex", "k": 1.5, "stabiliser": "none"},
            "criteria.npsh_margin": {"service": "boiler feed"},
            "criteria.bell_velocity": {"method": "hi_9_8"},
            "criteria.suction_specific_speed": {"highest": 11000, "in": "US"},
            "criteria.operating_region": {"lowest": "70 %", "source": "S1"},
            "criteria.straight_run": 5,
        }
    )
    pump, required, criteria = c.pump, c.pump.npsh_required, c.criteria
    assert (pump.running, pump.eyes, required.interpolation, required.value) == (1, 2, "smooth", None)
    assert [point.npsh.key for point in required.points] == [f"pump.npsh_required.points[{n}].npsh" for n in (1, 2)]
    assert pump.reciprocating is not None and pump.reciprocating.k is not None and pump.reciprocating.C is None
    assert criteria.service is not None and criteria.service.name == "boiler feed"
    assert criteria.bell_method is not None and criteria.bell_method.name == "hi_9_8"
    assert criteria.suction_specific_speed_in == "US"
    assert criteria.bell_velocity is not None and criteria.bell_velocity.lowest is None
    assert criteria.operating_region is not None and criteria.operating_region.lowest is not None
    assert criteria.operating_region.lowest.source == "S1"


@pytest.mark.parametrize(
    "changes",
    [
        {"liquid.name": "ethylene glycol", "liquid.mass_fraction": "350 g/kg", "liquid.vapour_pressure_of": "raoult"},
        {"liquid.name": "sea water", "liquid.salinity": "35 g/kg", "liquid.vapour_pressure_of": "water"},
        {"liquid.name": "acetone", "liquid.viscosity": {"value": "0.3 mPa·s", "source": "S1"}},
        {
            "liquid.vapour_pressure": {"value": "30 kPa absolute", "source": "S1"},
            "liquid.vapour_pressure_kind": "effective",
        },
        {"liquid.temperature": {"lowest": "5 °C", "average": "15 °C", "highest": "30 °C"}},
        {"supply.kind": "saturated"},
        {"supply.kind": "saturated", "supply.pressure": {"lowest": "20 kPa gauge"}},
        POINT | {"supply.kind": "main"},
        LOOP | {"supply.velocity_head": "left_out", "supply.high_point": None},
        WET_PIT | {"intake": INTAKE},
        HAZEN_WILLIAMS,
        {f"{SECTION}.condition": "aged"},
        {"line.withheld_head": "0.5 m"},
        {f"{SECTION}.elements.0": {"id": "1", "kind": "entrance", "K": 0.4}},
        fourth("elbow", L_over_D=30),
        fourth("tee", K=1.1),
        fourth("valve", Cv=640),
        fourth("fitting", name="mixer", Kv=640),
        fourth("reducer", type="concentric", to={"bore": "150 mm"}),
        fourth("reducer", type="concentric", to={"bore": "150 mm"}, K=0.2),
        fourth("connector", loss="2 kPa", at_flow="200 m³/h", count=2),
        fourth("equipment", name="cooler", K=3),
        fourth("strainer", name="S", drop={"clean": "1 kPa"}, at_flow="200 m³/h"),
        fourth("valve", type="gate", set="crane"),
        fourth("valve", type="gate", set="hooper_2k") | {"line.mixed_sets": "intended"},
        {"pump.npsh_required.basis": "other"},
        {"pump.reciprocating": {"C": 0.066, "liquid": "water"}, "pump.speed": "300 r/min"},
        {"criteria.bell_velocity": {"lowest": "0.6 m/s"}},
        {"criteria.velocity": "8 ft/s", "criteria.vapour_clearance": "0.5 m", "criteria.loop_pressure": "-5 kPa gauge"},
    ],
)
def test_accepted(changes: dict[str, Any]) -> None:
    assert read(changes).number == "T-1"


@pytest.mark.parametrize(
    ("changes", "faults"),
    [
        (LOOP | {"intake": INTAKE}, [("intake", "intake")]),
        (WET_PIT | {"supply.level": None}, [("supply.level", "route")]),
        ({"line": None}, [("", "route")]),
        ({"liquid.name": "propan"}, [("liquid.name", "liquid")]),
        (
            {"liquid.name": "glycerol", "liquid.salinity": "35 g/kg"},
            [("liquid.mass_fraction", "liquid"), ("liquid.salinity", "liquid")],
        ),
        (
            {
                "liquid.name": "ethylene glycol",
                "liquid.mass_fraction": "35 %",
                "liquid.vapour_pressure_of": "water",
                "liquid.vapour_pressure": {"value": "3 kPa absolute", "source": "S1"},
            },
            [("liquid.vapour_pressure_of", "liquid")],
        ),
        ({"liquid.table": [{"temperature": "20 °C"}, {"temperature": "30 °C"}]}, [("liquid.table[1]", "table")]),
        (
            {f"{SECTION}.condition": "new", f"{SECTION}.material": None, f"{SECTION}.roughness": "0.1 mm"},
            [("line.sections[L1].condition", "roughness")],
        ),
        (
            HAZEN_WILLIAMS | fourth("elbow", L_over_D=30),
            [("line.sections[L1]", "roughness")],
        ),
        ({f"{SECTION}.pumps": 2, "pump.running": 2}, [("line.sections[L1].pumps", "pumps")]),
        ({f"{SECTION}.pumps": "9" * 5000}, [("line.sections[L1].pumps", "number")]),
        (TEE | fourth("entrance", shape="bell"), [("line.sections[L1].elements[4]", "entrance")]),
        (fourth("elbow", radius="long", set="darby_3k"), [("line.sections[L1].elements[4].set", "fitting")]),
        (
            {"line.fitting_set": "hooper_2k"} | fourth("elbow", radius="long", angle=30),
            [("line.sections[L1].elements[4].angle", "choice")],
        ),
        (fourth("equipment", name="cooler", curve=[]), [("line.sections[L1].elements[4].curve", "empty value")]),
        (POINTS | {"pump.npsh_required.at_flow": "200 m³/h"}, [("pump.npsh_required.points", "npsh")]),
        ({"pump.npsh_required.value": None}, [("pump.npsh_required.value", "missing key")]),
        ({"pump.npsh_required.speed_exponent": 2}, [("pump.npsh_required.speed_exponent", "speed")]),
        ({"criteria.npsh_margin": {"source": "S1"}}, [("criteria.npsh_margin", "criteria")]),
        ({"criteria.bell_velocity": {"source": "S1"}}, [("criteria.bell_velocity", "criteria")]),
    ],
)
def test_refused(changes: dict[str, Any], faults: list[tuple[str, str]]) -> None:
    assert refused(changes) == faults


def test_a_reading_of_a_saturated_vessel_has_no_pressure_of_its_own() -> None:
    changes = {"supply.kind": "saturated", "readings.0.surface_pressure": "20 kPa gauge"}
    assert refused(changes, readings=1) == [("readings[1].surface_pressure", "reading")]


@pytest.mark.parametrize("name", sorted(SETS))
def test_every_fitting_of_a_set_may_be_typed(name: str) -> None:
    """What a set holds is accepted as the table names it; of a kind it lacks, what it borrows."""
    elements: list[dict[str, Any]] = []
    for kind, key in (("elbow", "radius"), ("tee", "flow"), ("valve", "type"), ("entrance", "shape")):
        for variant in variants(name, kind) or variants(LENDER, kind):
            angle, _, radius = variant.partition(" ")
            named = {"angle": int(angle), key: radius} if kind == "elbow" else {key: variant}
            elements.append({"id": f"x{len(elements)}", "kind": kind, **named})
    for element in elements:
        place = f"{SECTION}.elements.0" if element["kind"] == "entrance" else ELEMENT
        assert read({"line.fitting_set": name, place: element}).line is not None


def test_every_liquid_of_the_table_may_be_typed() -> None:
    for name, known in LIQUIDS.items():
        share = {f"liquid.{known.mixture}": "30 g/kg"} if known.mixture else {}
        viscous = {} if known.offers("viscosity") else {"liquid.viscosity": {"value": "0.3 mPa·s", "source": "S1"}}
        assert read({"liquid.name": name} | share | viscous).liquid.name == name


ENDS = ("", " {}", " []", " x", " -1 m", ' ""')


def damaged(path: Path, every: int) -> None:
    """Lines of a sample without their value, or with another: a fault with all its parts, or a file that loads."""
    lines = path.read_text("utf-8").splitlines(keepends=True)
    cases = [(n, end) for n in range(len(lines)) for end in ENDS]
    for n, end in cases[::every]:
        key, colon, _ = lines[n].partition(":")
        changed = f"{key}:{end}\n" if end and colon else ""
        try:
            loads("".join([*lines[:n], changed, *lines[n + 1 :]]).encode(), "a.yaml")
        except InputFault as refusal:
            assert all(fault.wanted and fault.found for fault in refusal.faults)


@pytest.mark.parametrize("path", PATHS, ids=lambda path: path.stem)
def test_a_damaged_line_raises_nothing_but_a_fault(path: Path) -> None:
    damaged(path, 29)


@pytest.mark.campaign
@pytest.mark.parametrize("path", PATHS, ids=lambda path: path.stem)
def test_every_damaged_line_raises_nothing_but_a_fault(path: Path) -> None:
    damaged(path, 1)


HEADER = {f"{SECTION}.pumps": 3}


@pytest.mark.parametrize(
    ("changes", "key"),
    [
        ({"pump.running": 3}, "pump.running"),
        (LOOP | {"supply.high_point": "0.2 m", f"{SECTION}.elements.3.elevation": "1 m"}, "supply.high_point"),
        (
            {"criteria.suction_specific_speed": {"highest": 11000, "in": "metric"}},
            "criteria.suction_specific_speed.highest",
        ),
        (
            {"criteria.suction_specific_speed": {"highest": 213, "in": "US"}},
            "criteria.suction_specific_speed.highest",
        ),
        ({"liquid.vapour_pressure": "9 psi RVP"}, "liquid.vapour_pressure"),
    ],
)
def test_what_looks_right_and_is_not_is_refused(changes: dict[str, Any], key: str) -> None:
    assert [found for found, _ in refused(changes)] == [key]


def test_a_header_says_how_many_pumps_run() -> None:
    assert "pump.running" in [found for found, _ in refused(HEADER)]
