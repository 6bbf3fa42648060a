"""Results that must not be judged, and inputs that look right and are asked about."""

from __future__ import annotations

from typing import Any

import pytest
from plants import INTAKE, plant, studied, verdicts

from calcpack.record import assemble

SECTION = "line.sections.0."
HEADER = {
    "pump.running": 3,
    "line.sections": [
        {"id": "H", "bore": "300 mm", "material": "commercial steel", "pumps": 3,
         "elements": [{"id": "1", "kind": "entrance", "shape": "flush"}, {"id": "2", "kind": "pipe", "length": "10 m"}]},
        {"id": "B", "bore": "202.7 mm", "material": "commercial steel",
         "elements": [{"id": "1", "kind": "tee", "flow": "branch"}, {"id": "2", "kind": "pipe", "length": "4 m"}]},
    ],
}  # fmt: skip
STROKES = {
    "pump.speed": "200 r/min", "pump.npsh_required.speed": "200 r/min",
    "pump.reciprocating": {"type": "triplex", "liquid": "water"},
}  # fmt: skip


def doubts(changes: dict[str, Any], **more: Any) -> list[str]:
    return [each.available.doubt for each in studied(plant(changes, **more)).judged]


def test_a_reading_on_one_pump_is_not_carried_to_several() -> None:
    design, carried = doubts(HEADER, readings=1)
    assert design == "" and "several pumps running" in carried
    assert "several pumps running" in doubts({"pump.running": 3}, line=False, readings=1)[0]


def test_a_line_without_length_has_no_acceleration_head_to_judge_by() -> None:
    only_K = {SECTION + "elements": [{"id": "1", "kind": "fitting", "name": "all", "K": "2"}]}
    assert "no length" in doubts(STROKES | only_K)[0]


def test_the_axis_goes_before_the_straight_pipe_and_without_it_there_is_a_finding() -> None:
    straight, axis = studied(plant(STROKES)), studied(plant(STROKES | {SECTION + "axis_length": "14 m"}))
    assert any("straight pipe only" in text for text in straight.findings)
    assert not any("straight pipe only" in text for text in axis.findings)


@pytest.mark.parametrize("drawdown", ["2.4 m", "2.5 m"])
def test_an_inlet_not_below_the_surface_drawn_down_is_not_judged(drawdown: str) -> None:
    assert "draws gas" in doubts({"intake": INTAKE, "supply.level.drawdown": drawdown})[0] or drawdown == "2.4 m"
    assert doubts({"intake": INTAKE, "supply.level.drawdown": "0.2 m"}) == [""]


def test_a_pump_in_its_sump_does_not_lift() -> None:
    pit = {"pump.arrangement": "wet_pit", "pump.datum_elevation.value": "1.6 m"}
    assert "does not lift" in doubts(pit, line=False)[0]


def test_a_reducer_leads_to_the_bore_of_the_next_section() -> None:
    def line(to: str, after: str) -> dict[str, Any]:
        first = [{"id": "1", "kind": "entrance", "shape": "flush"}, {"id": "2", "kind": "pipe", "length": "4 m"}]
        if to:
            first.append({"id": "3", "kind": "reducer", "type": "concentric", "to": {"bore": to}, "length": "152 mm"})
        steel = {"material": "commercial steel"}
        pipe = [{"id": "1", "kind": "pipe", "length": "1 m"}]
        return {"line.sections": [{"id": "A", "bore": "202.7 mm", **steel, "elements": first},
                                  {"id": "B", "bore": after, **steel, "elements": pipe}]}  # fmt: skip

    assert not any("bore changes" in text for text in studied(plant(line("154.1 mm", "154.1 mm"))).findings)
    assert any("bore changes" in text for text in studied(plant(line("", "154.1 mm"))).findings)
    with pytest.raises(Exception, match="the bore of the section next to it"):
        studied(plant(line("154.1 mm", "102.3 mm")))


ELEVATED = {SECTION + "elements.0.elevation": "-1 m", SECTION + "elements.1.elevation": "0 m"}


@pytest.mark.parametrize(
    ("changes", "word"),
    [
        ({SECTION + "elements.1.elevation": "30 m"}, "leads from"),
        ({SECTION + "elements.0.elevation": "9 m", "intake": INTAKE}, "entrance lies"),
        ({SECTION + "elements.3.elevation": "5 m"}, "line ends"),
        ({}, ""),
    ],
)
def test_elevations_that_contradict_are_asked_about(changes: dict[str, Any], word: str) -> None:
    found = [
        text
        for text in studied(plant(ELEVATED | changes)).findings
        if "lies" in text or "ends" in text or "leads" in text
    ]
    assert bool(found) is bool(word) and all(word in text for text in found[:1])


def test_a_result_far_below_what_is_needed_is_not_met_whatever_rounding_did() -> None:
    assert (
        verdicts(studied(plant({SECTION + "elements.3": {"id": "4", "kind": "valve", "Kv": 1}})))["npsh_margin"]
        == "not met"
    )


SPECIFIC = {
    "pump.npsh_required.points": [{"flow": "100 m³/h", "npsh": "4 m"}, {"flow": "250 m³/h", "npsh": "6 m"}],
    "pump.npsh_required.value": None, "pump.npsh_required.at_flow": None, "pump.best_efficiency_flow": "200 m³/h",
}  # fmt: skip


@pytest.mark.parametrize("known", [True, False])
@pytest.mark.parametrize(
    "service", ["hydrocarbon", "chemical", "water", "wastewater", "power", "pulp", "building services", "boiler feed"]
)
def test_every_service_makes_a_record(service: str, known: bool) -> None:
    changes = {"criteria.npsh_margin": {"service": service}} | (SPECIFIC if known else {})
    assert assemble(studied(plant(changes)))["cover"]["verdict"] in ("met", "not met", "not assessed")
