"""Named cases: states by how they differ from the most unfavourable one, each computed and judged."""

from __future__ import annotations

from typing import Any

import pytest
from plants import INTAKE, plant, studied

from calcpack.assessment import Study

STRAINER = {
    "line.sections.0.elements.3": {
        "id": "4", "kind": "strainer", "name": "STR-1", "drop": {"clean": "0.2 m", "fouled": "1 m"}, "at_flow": "200 m³/h",
    }
}  # fmt: skip
EXTREMES = {
    "supply.level": {"lowest": "1.5 m", "normal": "2.5 m"}, "pump.flow": {"normal": "150 m³/h", "highest": "200 m³/h"},
    "liquid.temperature": {"normal": "15 °C", "highest": "25 °C"},
}  # fmt: skip


def available(study: Study) -> list[float]:
    return [each.available.npsh.shadow for each in study.judged]


def of(*cases: dict[str, Any], **changes: Any) -> Study:
    return studied(plant(STRAINER | EXTREMES | {"cases": list(cases)} | changes))


@pytest.mark.parametrize(
    ("case", "alone"),
    [
        ({"level": "normal"}, {"supply.level.lowest": "2.5 m"}),
        ({"level": "2.2 m"}, {"supply.level.lowest": "2.2 m"}),
        ({"flow": "normal"}, {"pump.flow.highest": "150 m³/h"}),
        ({"temperature": "normal"}, {"liquid.temperature": {"highest": "15 °C"}}),
        ({"strainers": "clean"}, {"line.sections.0.elements.3.drop.fouled": "0.2 m"}),
    ],
)
def test_a_case_is_the_plant_with_that_one_thing_changed(case: dict[str, Any], alone: dict[str, Any]) -> None:
    worst, other = available(of({"name": "other", **case}))
    assert other == available(studied(plant(STRAINER | EXTREMES | alone)))[0]
    assert worst == available(studied(plant(STRAINER | EXTREMES)))[0] and worst < other


def test_each_case_is_judged_under_its_name_and_the_worst_case_goes_first() -> None:
    study = of({"name": "normal operation", "flow": "normal"}, {"name": "high water", "level": "normal"})
    about = [check.about for check in study.checks if check.rule.name == "npsh_margin"]
    assert about == [f"design route, {name}" for name in ("worst case", "normal operation", "high water")]


def test_a_case_is_no_average_temperature() -> None:
    study = of({"name": "normal operation", "temperature": "normal"})
    assert {c.rule.name: c.verdict for c in study.checks}["highest_temperature"] == "met"


def test_submergence_and_velocity_name_the_case_that_governs() -> None:
    more = {"name": "run-out", "flow": "320 m³/h", "level": "2.5 m"}
    study = of(more, intake=INTAKE, **{"criteria.velocity": "2.4 m/s"})
    reasons = {c.rule.name: c.reason for c in study.checks}
    assert "worst case" in reasons["submergence"] and "run-out" in reasons["line_velocity"]
    deep = of(more | {"level": "lowest"}, intake=INTAKE)
    assert "run-out" in {c.rule.name: c.reason for c in deep.checks}["submergence"]


def test_a_header_carries_the_pumps_of_the_case() -> None:
    steel = {"material": "commercial steel"}
    header = {
        "pump.running": 3,
        "line.sections": [
            {
                "id": "H",
                "bore": "400 mm",
                **steel,
                "pumps": 3,
                "elements": [{"id": "1", "kind": "entrance", "shape": "flush"}],
            },
            {"id": "B", "bore": "202.7 mm", **steel, "elements": [{"id": "1", "kind": "tee", "flow": "branch"}]},
        ],
    }
    study = studied(plant(header | {"cases": [{"name": "alone", "running": 1}]}))
    flows = [run.passage.flows[0].flow.shadow for run in study.results.runs if run.passage]
    assert flows[0] == pytest.approx(3 * flows[1])


def test_an_extreme_may_have_a_source() -> None:
    case = {"name": "other", "level": {"value": "normal", "source": "S1"}, "flow": {"value": "normal", "note": "usual"}}
    assert available(of(case)) == available(of({"name": "other", "level": "normal", "flow": "normal"}))
