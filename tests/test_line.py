"""The suction line as a whole: its sections, headers, the pressure along it, and what it costs."""

from __future__ import annotations

import json
import math
import random

import pytest
from hypothesis import HealthCheck, given, settings
from hypothesis import strategies as st
from lines import ENTRANCE, FLOW, HEAD, HW, MANY, PIPE, G, assumptions, findings, header, line, passage
from plants import Document, changed, found, plant, recorded, studied

from calcpack.fitting_set import SETS
from calcpack.page.pdf import render
from calcpack.reader import verify
from calcpack.record import canonical

FEW = settings(max_examples=30, deadline=None, derandomize=True, suppress_health_check=[HealthCheck.too_slow])


def test_a_line_in_two_sections_is_the_sum_of_both() -> None:
    """Each section's loss counts on its own bore."""
    first = plant()["line"]["sections"][0]
    second = {
        **first,
        "id": "L2",
        "bore": "154.1 mm",
        "elements": [{"id": "1", "kind": "fitting", "name": "F", "K": "0.4"}],
    }
    one, both = studied(plant()), studied(plant({"line.sections": [first, second]}))
    speed = FLOW / (math.pi * 0.1541**2 / 4)
    assert passage(both).total.shadow - passage(one).total.shadow == pytest.approx(0.4 * speed**2 / 2 / G, abs=1e-9)
    assert [flow.section.id for flow in passage(both).flows] == ["L1", "L2"]
    assert [row.label for row in passage(both).rows] == ["L1-1", "L1-2", "L1-3", "L1-4", "L2-1"]


def test_a_contingency_multiplies_every_loss() -> None:
    without, with_ten = studied(plant()), studied(plant({"line.friction_contingency": "10 %"}))
    assert passage(with_ten).total.shadow == pytest.approx(1.10 * passage(without).total.shadow, rel=1e-12)


def test_a_line_without_entrance_is_a_finding_from_a_surface_only() -> None:
    assert "no entrance" in findings(line(PIPE))
    assert "no entrance" not in findings(line(ENTRANCE, PIPE))
    main = {
        "supply": {
            "name": "main", "kind": "main", "pressure": {"lowest": "150 kPa gauge", "source": "S1"},
            "elevation": {"value": "0 m", "source": "S1"}, "velocity_head": "left_out",
        }
    }  # fmt: skip
    assert "no entrance" not in findings(line(PIPE, **main))


def test_a_check_or_foot_valve_is_taken_open() -> None:
    for valve in ("swing_check", "foot_hinged"):
        assert "is fully open (element E1)" in assumptions(line({"kind": "valve", "type": valve}))
    assert "fully open" not in assumptions(line({"kind": "valve", "type": "gate"}))


# --- headers ---------------------------------------------------------------------------------------------------------


@pytest.mark.parametrize(("pumps", "running", "carried"), [(1, 1, 1), (3, 1, 1), (3, 3, 3), (3, 2, 2)])
def test_a_header_carries_the_pumps_that_run_and_draw_through_it(pumps: int, running: int, carried: int) -> None:
    study = studied(header(pumps, running))
    shared, branch = passage(study).flows
    assert shared.flow.shadow == pytest.approx(carried * FLOW) and branch.flow.shadow == pytest.approx(FLOW)
    speed = carried * FLOW / (math.pi * 0.16 / 4)
    assert passage(study).rows[0].loss.shadow == pytest.approx(0.5 * speed**2 / 2 / G, rel=1e-9)
    entered = [x for x in study.ledger.inputs if x.value.symbol == "N"]
    assert [x.key for x in entered] == (
        [] if carried == 1 else ["line.sections[H].pumps" if pumps <= running else "pump.running"]
    )


def test_a_header_of_one_pump_is_a_plain_line() -> None:
    plain = header(1, 1)
    del plain["line"]["sections"][0]["pumps"], plain["pump"]["running"]
    assert [str(x.value) for x in studied(plain).ledger.lines()] == [
        str(x.value) for x in studied(header(1, 1)).ledger.lines()
    ]


# --- pressure along the line -----------------------------------------------------------------------------------------


@pytest.mark.parametrize("units", ["SI", "US"])
@pytest.mark.parametrize("contingency", ["", "15 %"])
def test_the_profile_is_an_energy_balance(contingency: str, units: str) -> None:
    """Written out in plain numbers: what the surface offers, less the losses so far, the height and the velocity head there."""
    elements = (
        {**ENTRANCE, "elevation": "-2.5 m"},
        {"kind": "fitting", "name": "pipe", "K": "1.6"},
        {"kind": "fitting", "name": "bend", "K": "0.3", "count": 2, "elevation": "0.8 m"},
        {"kind": "reducer", "type": "concentric", "K": "0.1", "to": {"bore": "154 mm"}, "elevation": "0 m"},
    )
    changes = {"calculation.units": units, "liquid.temperature.highest": "20 °C", "supply.level.lowest": "-1 m"}
    if contingency:
        changes["line.friction_contingency"] = contingency
    run = studied(line(*elements, **changes)).results.line
    assert run is not None
    gamma, more = 998.1618 * G, 1.15 if contingency else 1.0
    start = 100_000 / gamma - 1.0
    small = (FLOW / (math.pi * 0.154**2 / 4)) ** 2 / 2 / G
    expected = {
        "E1": gamma * (start - more * 0.5 * HEAD + 2.5 - HEAD),
        "E3": gamma * (start - more * 2.7 * HEAD - 0.8 - HEAD),
        "E4": gamma * (start - more * 2.8 * HEAD - 0.0 - small),
    }
    assert {node.element: node.pressure.shadow for node in run.nodes} == pytest.approx(expected, rel=2e-6)
    for node in run.nodes:
        printed = float(node.pressure.record) * float(node.pressure.unit.factor)
        assert printed == pytest.approx(node.pressure.shadow, rel=1e-4)


def test_the_last_point_of_the_profile_agrees_with_npsh_available() -> None:
    """Pressure at the pump, plus its height over the datum and its velocity head, less vapour pressure, is NPSH available."""
    study = studied(line(ENTRANCE, PIPE, {"kind": "elbow", "radius": "long", "elevation": "0.3 m"}))
    run = study.results.line
    assert run is not None
    (node,) = run.nodes
    gamma = found(study, "gamma").shadow
    vapour = found(study, "p_v").shadow
    assert (node.pressure.shadow - vapour) / gamma + 0.3 + HEAD == pytest.approx(run.available.npsh.shadow, abs=1e-9)


def test_a_pressure_below_zero_is_printed_for_a_rule_to_judge() -> None:
    run = studied(line(ENTRANCE, {**PIPE, "elevation": "12 m"})).results.line
    assert run is not None and run.nodes[0].pressure.record < 0


#: Pages with what only a line prints: a profile of one loss and of many, a constant with the sign of infinity, no row with K.
PRINTED = (
    line({**ENTRANCE, "elevation": "-1 m"}, *MANY[:-1], {**MANY[-1], "elevation": "0 m"}, **{
        "line.fitting_set": "hooper_2k", "line.friction_contingency": "10 %", "calculation.units": "US",
    }),
    changed(header(3, 2), {"line.sections.0.elements.1.elevation": "0.5 m", "line.fitting_set": "darby_3k"}),
    line(PIPE, **HW),
)  # fmt: skip


@pytest.mark.filterwarnings("ignore:.*sRGB2014.icc:pytest.PytestUnraisableExceptionWarning")
@pytest.mark.parametrize(
    "document", [PRINTED[0], *(pytest.param(each, marks=pytest.mark.campaign) for each in PRINTED[1:])]
)
def test_the_pages_of_a_line_read_back(document: Document) -> None:
    report = verify(render(json.loads(canonical(recorded(document))), []))
    assert report.ok, str(report)


# --- order and size --------------------------------------------------------------------------------------------------


@FEW
@given(st.sampled_from(list(SETS)), st.integers(0, 10**6), st.sampled_from(["SI", "US"]))
def test_the_order_of_elements_changes_nothing(set_name: str, seed: int, units: str) -> None:
    shuffled = list(MANY)
    random.Random(seed).shuffle(shuffled)
    changes = {"line.fitting_set": set_name, "calculation.units": units}
    one, other = (passage(studied(line(*elements, **changes))) for elements in (MANY, shuffled))
    assert other.total.shadow == pytest.approx(one.total.shadow, rel=1e-14)
    assert float(other.total.record) == pytest.approx(float(one.total.record), rel=2e-6)


def test_lines_of_the_ledger_grow_with_the_elements_and_not_faster() -> None:
    """Ten, a hundred and two hundred elements: what elements share is written once."""
    written = {}
    for count in (10, 100, 200):
        sections = []
        for n in range(0, count, 50):
            each = [
                {"id": str(k), **(PIPE if k % 2 else {"kind": "elbow", "radius": "long"})}
                for k in range(n, min(n + 50, count))
            ]
            sections.append({**plant()["line"]["sections"][0], "id": f"S{n}", "elements": each})
        written[count] = len(studied(plant({"line.sections": sections})).ledger.lines())
    per_element = (written[200] - written[100]) / 100
    assert per_element < 4
    assert written[200] - written[10] <= 1.2 * per_element * 190


def test_where_an_element_is_drawn_stands_in_the_table_of_losses() -> None:
    drawn = plant({"line.sections.0.elements.1.drawing": "D-118 sheet 2"})
    rows = [b["losses"]["rows"] for part in recorded(drawn)["computation"] for b in part["blocks"] if "losses" in b]
    assert [row["element"].endswith(", D-118 sheet 2") for row in rows[0]] == [False, True, False, False]
