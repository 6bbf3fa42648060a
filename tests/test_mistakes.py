"""Mistakes of the input that look right: each is found, by its name and with the head it costs; files that are right are not."""

from __future__ import annotations

import ast
from functools import cache
from math import pi, sqrt
from pathlib import Path

import pytest
import yaml
from CoolProp.CoolProp import PropsSI
from fluids import ATMOSPHERE_1976
from fluids.friction import friction_factor
from mistakes import EXPECTED, FOLDER, FOUND, ROWS, SAMPLES, Row
from plants import changed, plant, studied, written

import calcpack
from calcpack.assessment import Study, run
from calcpack.faults import InputFault
from calcpack.record import assemble
from calcpack.source import load, loads
from calcpack.source.schema import schema
from calcpack.study import mistakes
from calcpack.table import table

G = 9.80665
CLEAN = sorted({*SAMPLES.glob("*.yaml"), *(row.clean_path for row in ROWS)})
NAMES = set(schema()["$defs"]["intended"]["properties"])


@cache
def study(path: Path) -> Study:
    return run(load(path))


def names(of: Study) -> set[str]:
    return {found.name for found in of.findings.values() if found.name}


def expected(path: Path) -> set[str]:
    return EXPECTED.get(path.stem, set())


# --- found, and nothing else ------------------------------------------------------------------------------------------


@pytest.mark.parametrize("row", FOUND, ids=lambda row: row.file)
def test_a_mistake_is_found_by_its_name_and_nothing_else_is(row: Row) -> None:
    assert names(study(row.path)) == expected(row.clean_path) | {row.name}


@pytest.mark.parametrize("path", CLEAN, ids=lambda path: path.stem)
def test_a_file_that_is_right_has_no_finding(path: Path) -> None:
    assert names(study(path)) == expected(path)


@pytest.mark.parametrize("row", [row for row in ROWS if row.by == "fault"], ids=lambda row: row.file)
def test_a_mistake_that_leaves_nothing_to_compute_is_refused(row: Row) -> None:
    with pytest.raises(InputFault) as caught:
        run(load(row.path))
    assert [fault.kind for fault in caught.value.faults] == [row.name]


@pytest.mark.parametrize("row", [row for row in ROWS if row.by == "rule"], ids=lambda row: row.file)
def test_a_mistake_that_a_rule_judges_is_not_met(row: Row) -> None:
    found = study(row.path)
    assert row.name in {check.rule.name for check in found.checks if check.verdict == "not met"}
    assert row.name not in {check.rule.name for check in study(row.clean_path).checks if check.verdict == "not met"}
    assert names(found) == expected(row.clean_path)


def test_every_file_and_every_name_stands_in_the_table() -> None:
    files = {path.stem for path in FOLDER.glob("*.yaml")}
    assert files == {row.file for row in ROWS} | {row.clean for row in ROWS if row.clean_path.parent == FOLDER}
    assert {row.name for row in FOUND} == NAMES


def test_the_schema_knows_every_name_and_no_other() -> None:
    told: set[str] = set()
    for path in (Path(calcpack.__file__).parent / "study").rglob("*.py"):
        for node in ast.walk(ast.parse(path.read_text("utf-8"))):
            told |= {node.value} if isinstance(node, ast.Constant) and node.value in NAMES else set()
    assert told == NAMES


@pytest.mark.parametrize("row", ROWS, ids=lambda row: row.file)
def test_a_sample_says_what_its_mistake_is_and_that_it_is_invented(row: Row) -> None:
    text = row.path.read_text("utf-8")
    assert text.startswith("# Mistake: ") and "invented for this sample" in text
    assert row.path.read_bytes() != row.clean_path.read_bytes()


# --- the head it costs ------------------------------------------------------------------------------------------------


def moved(row: Row) -> float:
    """By how much NPSH available differs from that of the file that is right, in any result: as judged, or as measured."""
    wrong, right = study(row.path), study(row.clean_path)
    heads = [
        [each.available.npsh.shadow for each in of.judged]
        + [x.value.shadow for x in of.ledger.lines() if x.value.symbol == "NPSHA_m"]
        for of in (wrong, right)
    ]
    return max(abs(a - b) for a, b in zip(*heads, strict=True))


@pytest.mark.parametrize("row", [row for row in FOUND if row.factor], ids=lambda row: row.file)
def test_the_head_at_stake_is_about_what_the_mistake_moves(row: Row) -> None:
    costs = [abs(f.cost.shadow) for f in study(row.path).findings.values() if f.name == row.name and f.cost]
    assert costs
    for cost in costs:
        assert moved(row) / row.factor <= cost <= moved(row) * row.factor


def cost(file: str) -> float:
    """The head at stake in m, of the first finding of a mistake that has one."""
    return next(abs(f.cost.shadow) for f in study(FOLDER / f"{file}.yaml").findings.values() if f.name and f.cost)


def water(celsius: float) -> tuple[float, float]:
    """Vapour pressure and density of saturated water."""
    p, rho = (PropsSI(x, "T", celsius + 273.15, "Q", 0, "Water") for x in "PD")
    return float(p), float(rho)


def head(flow: float, bore: float) -> float:
    return (flow / 3600 / (pi * bore**2 / 4)) ** 2 / (2 * G)


def age(flow: float, bore: float, length: float, celsius: float) -> float:
    """Head lost in commercial steel with a wall of 1 mm over that of 0.00015 ft."""
    _, rho = water(celsius)
    mu = PropsSI("V", "T", celsius + 273.15, "Q", 0, "Water")
    re = rho * flow / 3600 / (pi * bore / 4) / mu
    new, aged = (friction_factor(Re=re, eD=eps / bore) for eps in (0.00015 * 0.3048, 0.001))
    return float((aged - new) * length / bore * head(flow, bore))


INCH_HG = 3386.389
#: File -> the head its mistake costs, in m: by hand and by the libraries, none of our equations.
BY_HAND = {
    "gauge_as_absolute": 99.3e3 / (water(30)[1] * G),
    "barometer_twice": 99.3e3 / (water(95)[1] * G),
    "vacuum_as_absolute": (2 * 18 * INCH_HG - 99.3e3) / (water(30)[1] * G),
    "vacuum_without_sign": 2 * 47e3 / (water(19)[1] * G),
    "absolute_as_gauge": 97.8e3 / (water(19)[1] * G),
    "sea_level_barometer": (14.70 * 6894.757 - float(ATMOSPHERE_1976(5300 * 0.3048).P))
    / (water((85 - 32) / 1.8)[1] * G),
    "sea_level_barometer_no_elevation": 0.5 * INCH_HG / (water(95)[1] * G),
    "airport_pressure": (100.9e3 - float(ATMOSPHERE_1976(1100).P)) / (water(19)[1] * G),
    "gauge_height_over_the_pump": 41.20 - 0.45,
    "wrong_datum_bell": 0.762 / 2,
    "highest_temperature_is_normal": (water(95)[0] - water(90)[0]) / (water(90)[1] * G),
    "velocity_head_counted": head(65, 0.10226),
    "velocity_head_counted_exit": head(520, 0.25446),
    "velocity_head_left_out": head(320, 0.25451),
    "density_of_cold_water": (121.3e3 - water(95)[0]) / G * (1 / water(95)[1] - 1 / 998.2),
    "no_entrance": 0.5 * head(320, 0.25451),
    "new_wall": age(360, 0.3048, 14 + 15.9 + 2.1, 152),
    "new_wall_read": age(320, 0.25451, 22, 28),
    "saturated_as_blanketed": (502e3 - water(148)[0]) / (water(148)[1] * G),
    "station_flow": 2.3 * 1.86 / (pi * 0.762**2 / 4) * sqrt(0.762 / G) * (1 - 1 / 3),
    "submergence_as_npsh": (1480 * sqrt(320 / 3600) / 213) ** (4 / 3) - 0.90,
    "no_margin": 0.1 * 7.8,
    "reid_vapour_pressure_unawares": (PropsSI("P", "T", 328.15, "Q", 0, "n-Hexane") - 34.2e3)
    / (PropsSI("D", "T", 328.15, "Q", 0, "n-Hexane") * G),
}


@pytest.mark.parametrize("file", BY_HAND)
def test_the_head_at_stake_is_that_found_by_hand(file: str) -> None:
    assert cost(file) == pytest.approx(BY_HAND[file], rel=0.005)


def test_a_barometer_costs_ten_metres_and_the_first_kilometre_more_than_one() -> None:
    """The figures in print: 10.3 m of cold water for a barometer, 1.2 m for the first kilometre."""
    assert cost("gauge_as_absolute") == pytest.approx(10.3, abs=0.2)
    high = studied(plant({"site": {"elevation": "1000 m", "barometer": {"lowest": "101.325 kPa absolute"}}}))
    (found,) = [f for f in high.findings.values() if f.name == "sea_level_barometer"]
    assert found.cost is not None and found.cost.shadow == pytest.approx(1.2, abs=0.05)


# --- stated as intended -----------------------------------------------------------------------------------------------


def excused(path: Path, *more: str) -> Study:
    """The file with every finding it has, and ``more``, stated as intended."""
    reasons = dict.fromkeys([*sorted(names(study(path))), *more], "agreed with the owner")
    raw = path.read_bytes() + b"\n" + yaml.safe_dump({"intended": reasons}).encode()
    return run(loads(raw, "intended.yaml"))


@pytest.mark.parametrize("row", FOUND, ids=lambda row: row.file)
def test_stated_as_intended_it_is_an_assumption_with_its_reason(row: Row) -> None:
    made = excused(row.path)
    assert names(made) == set()
    record = assemble(made)
    told = [a for a in record["assumptions"] if "agreed with the owner" in a["basis"]]
    assert {a["text"] for a in told} == {
        f.text[0].upper() + f.text[1:] for f in study(row.path).findings.values() if f.name
    }


def test_an_intention_that_excuses_nothing_is_a_finding() -> None:
    made = excused(SAMPLES / "d_blanketed_hot_water_vessel.yaml", "no_margin")
    (text,) = made.findings
    assert text == "The file states `no_margin` as intended, and nothing of the kind is found"


@pytest.mark.parametrize(
    ("stated", "words"),
    [({"no_margn": "agreed"}, "write `no_margin`"), ({"no_margin": ""}, "a text"), ({"no_margin": ["a"]}, "no_margin")],
)
def test_an_intention_is_a_known_name_with_a_reason(stated: dict[str, object], words: str) -> None:
    with pytest.raises(InputFault, match=words):
        loads(written(plant({"intended": stated})), "plant.yaml")


def test_a_finding_says_how_it_is_stated_as_intended_and_what_it_costs() -> None:
    record = assemble(study(FOLDER / "vacuum_without_sign.yaml"))
    (found,) = [f for f in record["findings"] if f["name"]]
    assert found["name"] == "vacuum_without_sign" and found["cost"].startswith("9.601 m (line 8.")
    assert found["intended"].endswith("state `intended: {vacuum_without_sign: …}` with the reason")
    assert "9.601 m" in table(record) and "intended" in table(record)


# --- close to a threshold ---------------------------------------------------------------------------------------------

VESSEL = {"supply.kind": "gas_blanketed", "liquid.temperature": {"highest": "20 °C"}}
#: A pressure of the vessel, and whether it is asked about as one that holds the barometer already.
SETTINGS = (
    ("1 bar gauge", False), ("1.0 bar gauge", False), ("100 kPa gauge", False), ("15 psi gauge", False), ("2 kPa gauge", False),
    ("125 kPa gauge", False), ("1.25 bar gauge", False), ("350 mmH2O gauge", False), ("101.3 kPa gauge", True),
    ("14.7 psi gauge", True), ("19.7 psi gauge", True), ("1.213 bar gauge", True), ("151.3 kPa gauge", True), ("102.6 kPa gauge", True),
)  # fmt: skip


HAZEN_WILLIAMS = {
    "line.loss_method": "hazen_williams", "line.sections.0.material": None, "line.sections.0.hazen_williams_C": "120",
}  # fmt: skip


@pytest.mark.parametrize(("pressure", "found"), SETTINGS)
def test_a_round_setting_of_a_vessel_is_not_asked_about(pressure: str, found: bool) -> None:
    made = studied(plant({**VESSEL, "supply.pressure": {"lowest": pressure}}))
    assert ("barometer_twice" in names(made)) is found


@pytest.mark.parametrize(
    ("changes", "name", "found"),
    [
        ({"supply.level.normal": "1.51 m"}, "lowest_level_is_normal", False),
        ({"supply.level.normal": "1.5 m"}, "lowest_level_is_normal", True),
        ({"criteria.npsh_margin.ratio": "1.05"}, "no_margin", False),
        ({"criteria.npsh_margin": {"difference": "0 m"}}, "no_margin", True),
        ({"site.barometer.lowest": "100.8 kPa absolute"}, "sea_level_barometer", False),
        ({"site.barometer.lowest": "29.92 inHg absolute"}, "sea_level_barometer", True),
        ({"line.withheld_head": "0.2 m"}, "velocity_head_counted", False),
        ({"line.withheld_head": "0.151 m"}, "velocity_head_counted", True),
        ({"line.sections.0.elements.3": {"id": "4", "kind": "fitting", "name": "tank exit", "K": "1.0"}}, "velocity_head_counted", True),
        ({"line.sections.0.elements.3": {"id": "4", "kind": "fitting", "name": "hose", "K": "1.0"}}, "velocity_head_counted", False),
        ({"line.sections.0.elements.0": {"id": "1", "kind": "valve", "type": "foot_hinged"}}, "no_entrance", False),
        ({"line.sections.0.elements.0": {"id": "1", "kind": "fitting", "name": "bellmouth", "K": "0.1"}}, "no_entrance", False),
        ({"line.sections.0.elements.3": {"id": "4", "kind": "fitting", "name": "pipe 9 m", "K": "0.2"}}, "fanning_factor", True),
        ({"line.sections.0.elements.3": {"id": "4", "kind": "fitting", "name": "pipe 9 m", "K": "0.6"}}, "fanning_factor", False),
        ({"line.sections.0.elements.3": {"id": "4", "kind": "fitting", "name": "pipe 0 m", "K": "0.2"}}, "fanning_factor", False),
        (
            {
                **HAZEN_WILLIAMS,
                "line.sections.0.elements.3": {"id": "4", "kind": "fitting", "name": "pipe 9 m", "K": "0.2"},
            },
            "fanning_factor",
            False,
        ),
        ({"calculation.title": "Existing pump, suction check"}, "new_wall", True),
        ({"calculation.title": "New pump"}, "new_wall", False),
        ({"pump.datum": "floor"}, "wrong_datum", True),
        ({"pump.datum": "impeller eye, 0.8 m over the floor"}, "wrong_datum", False),
        ({"pump.datum": "floor", "pump.npsh_required.datum_elevation": "0 m"}, "wrong_datum", False),
        ({"liquid.density": {"value": "998.2 kg/m³", "source": "S1"}}, "density_of_cold_water", False),
        ({"pump.name": "P-1 A/B", "pump.flow.highest": "330 m³/h"}, "station_flow", True),
        ({"pump.name": "P-1 A/B", "pump.flow.highest": "300 m³/h"}, "station_flow", False),
        ({"pump.name": "P-1", "pump.flow.highest": "330 m³/h"}, "station_flow", False),
    ],
)  # fmt: skip
def test_what_is_asked_about_and_what_is_not(changes: dict[str, object], name: str, found: bool) -> None:
    assert (name in names(studied(plant(changes)))) is found


@pytest.mark.parametrize(
    ("changes", "name", "found"),
    [
        ({"gauge.elevation": "0 m", "gauge.tap_elevation": "0 m"}, "gauge_height", False),
        ({"gauge.elevation": "0 m", "gauge.tap_elevation": "0.4 m"}, "gauge_height", True),
        ({"gauge.elevation": "0 m", "gauge.tap_elevation": "0.4 m", "gauge.leg": "dry"}, "gauge_height", False),
        ({"gauge.tap.bore": "300 mm"}, "velocity_head_left_out", False),
        ({"gauge.tap.bore": "310 mm"}, "velocity_head_left_out", True),
        ({"barometer": "110 kPa absolute"}, "airport_pressure", False),
        ({"barometer": "110 kPa absolute", "gauge.pressure": "-5 kPa gauge"}, "airport_pressure", False),
    ],
)
def test_what_is_asked_about_a_reading(changes: dict[str, object], name: str, found: bool) -> None:
    document = changed(plant(readings=1), {f"readings.0.{key}": value for key, value in changes.items()})
    assert (name in names(studied(document))) is found


def test_one_finding_is_stated_for_all_readings() -> None:
    made = studied(plant({"readings.0.gauge.elevation": "0 m", "readings.1.gauge.elevation": "0 m"}, readings=2))
    assert sum(found.name == "gauge_height" for found in made.findings.values()) == 2
    assert len(mistakes.MISTAKES) == len(set(mistakes.MISTAKES))


# --- trials are not printed -------------------------------------------------------------------------------------------


@pytest.mark.parametrize("path", CLEAN, ids=lambda path: path.stem)
def test_what_is_only_tried_stands_on_no_page(path: Path) -> None:
    found = study(path)
    parts = [part for part in found.ledger.parts if part.title == mistakes.PART]
    costly = any(f.name and f.cost for f in found.findings.values())
    assert [bool(part.blocks) for part in parts] == [costly]
    assert not any(line.value.address.startswith("trial") for line in found.ledger.lines())
    assert all("trial" not in value.address for line in found.ledger.lines() for _, value in line.operands)
