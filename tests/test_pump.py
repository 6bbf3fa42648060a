"""What the pump needs: its curve, its speed, its suction specific speed, margins by service, acceleration head."""

from __future__ import annotations

import random
from collections.abc import Iterable, Mapping
from typing import Any

import pytest
from plants import Document, changed, found, plant, studied, written
from pumps import POINTS, TRIPLEX, on_curve, triplex_of_two_sections
from scipy.interpolate import PchipInterpolator  # type: ignore[import-untyped]  # it has no stubs

from calcpack.assessment import Study
from calcpack.faults import InputFault
from calcpack.ledger import Ledger
from calcpack.quantity import parse
from calcpack.source import loads
from calcpack.study import best_efficiency, curve, reciprocating, service
from calcpack.study.entry import Entry
from calcpack.value import Value


def entry(document: Document) -> Entry:
    made = Entry(loads(written(document), "plant.yaml"), Ledger("SI"))
    made.ledger.part("test", "")
    return made


def flow(made: Entry, hourly: float) -> Value:
    return made.ledger.convert(made.ledger.given("Q", f"flow {hourly}", parse(f"{hourly!r} m³/h", "flow")))


# --- the curve --------------------------------------------------------------------------------------------------------


@pytest.mark.parametrize(
    ("hourly", "npsh"),
    [(100.0, 3.0), (135.0, 3.5), (170.0, 4.0), (185.0, 4.5), (200.0, 5.0), (230.0, 6.5), (260.0, 8.0)],
)
def test_the_curve_is_read_on_the_straight_line_between_two_points(hourly: float, npsh: float) -> None:
    made = entry(on_curve(POINTS))
    read = curve.at(made, flow(made, hourly))
    assert read.npsh is not None and not read.doubt
    assert read.npsh.shadow == pytest.approx(npsh, rel=1e-9)
    assert float(read.npsh.record) == pytest.approx(npsh, rel=1e-5)
    at_a_point = any(hourly == point for point, _ in POINTS)
    assert (read.npsh.symbol == "N_p") is at_a_point, "a point's own value needs no line"


@pytest.mark.parametrize("interpolation", ["linear", "smooth"])
@pytest.mark.parametrize("hourly", [99.99, 260.01, 1000.0])
def test_the_curve_is_never_drawn_on_beyond_its_points(interpolation: str, hourly: float) -> None:
    made = entry(on_curve(POINTS, **{"pump.npsh_required.interpolation": interpolation}))
    read = curve.at(made, flow(made, hourly))
    assert read.npsh is None and "beyond the tested range" in read.doubt


def curves(number: int, rising: bool) -> Iterable[list[tuple[float, float]]]:
    """Random curves of 2 to 8 points."""
    dice = random.Random(61)
    for _ in range(number):
        count = dice.randint(2, 8)
        flows = sorted(dice.sample(range(50, 900, 10), count))
        heads = [round(dice.uniform(1, 20), 2) for _ in range(count)]
        if rising:
            heads.sort()
        yield [(float(q), h) for q, h in zip(flows, heads, strict=True)]


def test_a_straight_line_lies_between_its_neighbours() -> None:
    for points in curves(60, rising=False):
        made = entry(on_curve(points))
        for (q_1, n_1), (q_2, n_2) in zip(points, points[1:], strict=False):
            hourly = round(q_1 + (q_2 - q_1) * 0.37, 3)
            read = curve.at(made, flow(made, hourly))
            assert read.npsh is not None
            assert min(n_1, n_2) - 1e-9 <= read.npsh.shadow <= max(n_1, n_2) + 1e-9


@pytest.mark.parametrize("rising", [True, False])
def test_the_smooth_curve_is_scipy_s(rising: bool) -> None:
    """Oracle: PchipInterpolator of scipy, on curves that rise and on curves that turn."""
    compared = 0
    for points in curves(80, rising):
        made = entry(on_curve(points, **{"pump.npsh_required.interpolation": "smooth"}))
        oracle = PchipInterpolator([q for q, _ in points], [n for _, n in points])
        for (q_1, _), (q_2, _) in zip(points, points[1:], strict=False):
            for share in (0.11, 0.5, 0.83):
                hourly = round(q_1 + (q_2 - q_1) * share, 3)
                read = curve.at(made, flow(made, hourly))
                assert read.npsh is not None
                assert read.npsh.shadow == pytest.approx(float(oracle(hourly)), rel=1e-9), points
                assert float(read.npsh.record) == pytest.approx(float(oracle(hourly)), abs=5e-3), points
                compared += 1
    assert compared > 500


def test_the_smooth_curve_keeps_the_shape_of_its_points() -> None:
    for points in curves(40, rising=True):
        made = entry(on_curve(points, **{"pump.npsh_required.interpolation": "smooth"}))
        for (q_1, n_1), (q_2, n_2) in zip(points, points[1:], strict=False):
            read = curve.at(made, flow(made, round((q_1 + q_2) / 2, 3)))
            assert read.npsh is not None and n_1 - 1e-9 <= read.npsh.shadow <= n_2 + 1e-9


def test_points_that_print_alike_are_refused() -> None:
    with pytest.raises(InputFault, match="first six digits"):
        studied(on_curve([(100.0, 3.0), (199.99999, 4.0), (200.00001, 5.0)], **{"pump.flow.highest": "200 m³/h"}))


def test_a_single_value_holds_at_its_flow_and_below_it() -> None:
    made = entry(plant())
    exact, lower, higher = (curve.at(made, flow(made, q)) for q in (200.0, 150.0, 200.1))
    assert exact.npsh is not None and not exact.beside
    assert lower.npsh is exact.npsh and "on the safe side" in lower.beside
    assert higher.npsh is None and "at a lower flow" in higher.doubt


def test_the_maker_s_figure_says_what_it_holds_for() -> None:
    study = studied(plant())
    [line] = [x for x in study.ledger.inputs if x.value.symbol == "NPSHR"]
    assert line.value.title == "NPSH required, NPSH3"
    assert line.validity == "typical curve C-1, 1480 r/min, 300 mm, counted from the impeller eye"


# --- speed ------------------------------------------------------------------------------------------------------------


def at_speed(speed: str, **changes: Any) -> Study:
    return studied(on_curve(POINTS, **{"pump.speed": speed, "pump.npsh_required.speed": "1000 r/min", **changes}))


def test_at_half_the_flow_and_twice_the_speed_the_curve_is_read_at_its_own_flow() -> None:
    """Affinity laws (DOE-HDBK-1012/3-92, HT-03, p. 50): flow as the speed, head as its square."""
    study = at_speed("2000 r/min", **{"pump.flow.highest": "400 m³/h"})
    assert found(study, "Q_c").shadow == pytest.approx(200 / 3600)
    assert found(study, "NPSHR").shadow == pytest.approx(4 * 5.0)
    assert any("exponent 2:" in text for text, _ in study.assumptions.values())


def test_a_pump_slowed_down_keeps_more_of_its_npsh_required() -> None:
    study = at_speed("810 r/min", **{"pump.flow.highest": "162 m³/h"})
    assert found(study, "NPSHR").shadow == pytest.approx(0.729 * 5.0), "0.81 to the power 1.5"
    assert any("exponent 1.5:" in text for text, _ in study.assumptions.values())


def test_a_stated_exponent_goes_before_the_usual_one() -> None:
    study = at_speed("2000 r/min", **{"pump.flow.highest": "400 m³/h", "pump.npsh_required.speed_exponent": "1"})
    assert found(study, "NPSHR").shadow == pytest.approx(2 * 5.0)
    assert "speed exponent" not in study.results.entry.assumptions


def test_the_range_is_held_at_the_scaled_flow() -> None:
    study = at_speed("900 r/min", **{"pump.flow.highest": "240 m³/h"})
    assert {c.rule.name: c.verdict for c in study.checks}["npsh_margin"] == "not assessed"
    assert at_speed("1000 r/min", **{"pump.flow.highest": "240 m³/h"}).judged[0].needed.required is not None


def test_at_the_curve_s_own_speed_nothing_is_scaled() -> None:
    study = at_speed("1000 r/min")
    assert "Q_c" not in {x.value.symbol for x in study.ledger.lines()}


# --- suction specific speed -------------------------------------------------------------------------------------------

#: ``M-NSS``: 3550 r/min, 400 US gal/min an eye, NPSH3 10 ft; by definition, other units by pint's factors
NSS: Mapping[str, Any] = {
    "pump.npsh_required.value": "10 ft",
    "pump.npsh_required.at_flow": "400 gal/min",
    "pump.npsh_required.speed": "3550 r/min",
    "pump.best_efficiency_flow": "400 gal/min",
    "pump.flow.highest": "400 gal/min",
}


def specific_speed(units: str, system: str, **changes: Any) -> Value | None:
    asked: dict[str, Any] = {"highest": "11000" if units == "US" else "210", "in": units}
    extra = {"criteria.suction_specific_speed": asked, "calculation.units": system}
    study = studied(plant({**NSS, **extra, **changes}))
    [check] = [c for c in study.checks if c.rule.name == "suction_specific_speed"]
    return check.left


@pytest.mark.parametrize("system", ["SI", "US"])
@pytest.mark.parametrize(("units", "number"), [("US", 12626), ("metric", 244.47)])
def test_suction_specific_speed_is_the_trade_s_number_in_either_system(units: str, number: float, system: str) -> None:
    made = specific_speed(units, system)
    assert made is not None
    assert made.shadow == pytest.approx(number, rel=1e-4)
    assert float(made.record) == pytest.approx(number, rel=1e-4)


def test_a_double_suction_impeller_counts_half_its_flow() -> None:
    doubled = {key: "800 gal/min" for key, flow in NSS.items() if flow == "400 gal/min"}
    made = specific_speed("US", "US", **doubled, **{"pump.eyes": 2})
    assert made is not None and made.shadow == pytest.approx(12626, rel=1e-4)


def test_suction_specific_speed_is_that_of_the_curve_s_speed() -> None:
    """It does not change with speed where NPSH required goes as its square."""
    made = specific_speed(
        "US",
        "US",
        **{"pump.speed": "1775 r/min", "pump.best_efficiency_flow": "200 gal/min", "pump.flow.highest": "200 gal/min"},
    )
    assert made is not None and made.shadow == pytest.approx(12626, rel=1e-4)


MISSING: tuple[tuple[Mapping[str, Any], str], ...] = (
    ({"pump.best_efficiency_flow": None}, "no best_efficiency_flow"),
    ({"pump.npsh_required.speed": None}, "no speed of the NPSH curve"),
    ({"pump.best_efficiency_flow": "390 gal/min"}, "stated at 400 gal/min only"),
    ({"pump.best_efficiency_flow": "410 gal/min"}, "at a lower flow"),
    ({"pump.speed": "3550 r/min", "pump.reciprocating": {"type": "triplex", "liquid": "water"}}, "reciprocating"),
)


@pytest.mark.parametrize(("changes", "reason"), MISSING)
def test_suction_specific_speed_says_what_it_lacks(changes: Mapping[str, Any], reason: str) -> None:
    made = entry(plant({**NSS, **changes}))
    number, why = best_efficiency.suction_specific_speed(made, "US")
    assert number is None and reason in why


# --- margins by service -----------------------------------------------------------------------------------------------

#: Curve and best efficiency of a suction specific speed of 107, 213 and 320 metric: by definition, at 1480 r/min.
SLOW, FAST, FASTEST = "1480 r/min", "2950 r/min", "4420 r/min"
BEST: Mapping[str, Any] = {"pump.best_efficiency_flow": "190 m³/h"}
ONE_ONE, ONE_TWO = "1.1 × NPSHR and NPSHR + 0.6 m", "1.2 × NPSHR and NPSHR + 1.0 m"

#: service, speed of the curve, changes -> words of the margin (``M-HI-*``, ``M-BFW``), words of the reason
SERVICES: tuple[tuple[str, str, Mapping[str, Any], str, str], ...] = (
    ("hydrocarbon", SLOW, {}, "1.1 × NPSHR and NPSHR + 1.0 m", ""),
    ("chemical", SLOW, {}, ONE_ONE, "below 210"),
    ("chemical", FAST, {}, ONE_ONE, "within the preferred region"),
    ("chemical", FAST, {"pump.flow.highest": "230 m³/h"}, ONE_TWO, "outside the preferred region"),
    (
        "chemical",
        FAST,
        {"pump.flow.highest": "230 m³/h", "criteria.operating_region": {"highest": "125 %"}},
        ONE_ONE,
        "within the preferred region",
    ),
    ("water", SLOW, {}, ONE_ONE, "below 145"),
    ("water", FAST, {}, ONE_TWO, "not below 145"),
    ("wastewater", FAST, {}, ONE_TWO, "not below 145"),
    ("power", SLOW, {}, ONE_ONE, "below 145"),
    ("pulp", FASTEST, {}, ONE_TWO, "not below 145"),
    ("water", SLOW, {"pump.best_efficiency_flow": None}, ONE_TWO, "not known to be below"),
    ("building services", SLOW, {}, "more than 1.0 × NPSHR", "below 145"),
    ("building services", FAST, {}, ONE_ONE, "not below 145"),
    ("boiler feed", SLOW, {}, "1.8 × NPSHR", ""),
)


@pytest.mark.parametrize(("name", "speed", "changes", "margin", "reason"), SERVICES)
def test_a_service_asks_for_its_published_margin(
    name: str, speed: str, changes: Mapping[str, Any], margin: str, reason: str
) -> None:
    asked = {"criteria.npsh_margin": {"service": name}, "pump.npsh_required.speed": speed}
    study = studied(on_curve(POINTS, **{**BEST, **asked, **changes}))
    needed = study.judged[0].needed
    assert margin in needed.criterion and reason in needed.criterion and f"service {name}" in needed.criterion
    assert "ANSI/HI 9.6.1" in needed.source or "POWER" in needed.source
    assert any("editions differ" in consequence for _, consequence in study.assumptions.values())


def test_a_margin_of_the_project_goes_before_that_of_its_service() -> None:
    study = studied(plant({"criteria.npsh_margin": {"service": "water", "ratio": "1.5", "source": "S1 4.3"}}))
    needed = study.judged[0].needed
    assert (needed.criterion, needed.source) == ("NPSH available at least 1.5 × NPSHR", "[S1] 4.3")


def test_what_must_be_exceeded_is_not_met_on_the_limit() -> None:
    rows = [service.SERVICES["building services"].usual]
    rows += [x for s in service.SERVICES.values() for x in (s.usual, s.strict) if x and x is not rows[0]]
    assert [row.above for row in rows] == [True] + [False] * (len(rows) - 1)
    [first, *_] = studied(
        on_curve(POINTS, **BEST, **{"criteria.npsh_margin": {"service": "building services"}, "pump.eyes": 1})
    ).checks
    assert first.rule.tree.op == ">"


# --- reciprocating pumps ----------------------------------------------------------------------------------------------


def test_the_acceleration_head_is_taken_from_npsh_available() -> None:
    study = studied(plant(TRIPLEX))
    head, before, after = (found(study, symbol) for symbol in ("h_as", "NPSHA_d", "NPSHA_t"))
    assert after.shadow == pytest.approx(before.shadow - head.shadow)
    assert study.judged[0].available.npsh is after


def test_the_heads_of_several_sections_add() -> None:
    study = studied(triplex_of_two_sections())
    heads = [x.value.shadow for x in study.ledger.lines() if x.value.symbol == "h_as"]
    assert len(heads) == 2 and found(study, "h_a").shadow == pytest.approx(sum(heads))
    # Twice the length, at a velocity that goes as the bore squared.
    assert heads[1] / heads[0] == pytest.approx(4 / 8 * (202.7 / 154.1) ** 2)


DOUBTS: tuple[tuple[Mapping[str, Any], str, bool], ...] = (
    ({"pump.reciprocating.stabiliser": "fitted"}, "its maker states what is left", False),
    ({"line.sections.0.elements.1.length": "15 m"}, "", True),
    ({"line.sections.0.elements.1.length": "15.1 m"}, "short, rigid line of 15 m (50 ft)", True),
    ({"pump.reciprocating": {"C": "0.066", "k": "1.5"}}, "", True),
)


@pytest.mark.parametrize(("changes", "doubt", "taken"), DOUBTS)
def test_where_the_form_does_not_hold_nothing_is_assessed(changes: Mapping[str, Any], doubt: str, taken: bool) -> None:
    study = studied(changed(plant(TRIPLEX), changes))
    assert doubt in study.judged[0].available.doubt and bool(doubt) is bool(study.judged[0].available.doubt)
    assert study.checks[0].verdict == ("not assessed" if doubt else "not met" if taken else "met")
    assert ("NPSHA_t" in {x.value.symbol for x in study.ledger.lines()}) is taken


def test_no_reading_shows_the_acceleration_head() -> None:
    alone = studied(plant({**TRIPLEX, "readings.0.level": None}, readings=1))
    assert alone.judged[1].available.doubt == reciprocating.UNSEEN
    both = studied(plant(TRIPLEX, readings=1))
    assert [each.available.npsh.symbol for each in both.judged] == ["NPSHA_t", "NPSHA_t"]


def test_an_assumption_says_that_no_stabiliser_is_fitted() -> None:
    study = studied(changed(plant(TRIPLEX), {"pump.reciprocating.stabiliser": None}))
    assert "stabiliser" in study.results.entry.assumptions


# --- what a careful reader would ask ----------------------------------------------------------------------------------

FINDINGS: tuple[tuple[Mapping[str, Any], str], ...] = (
    ({"pump.npsh_required.basis": "other"}, "not stated as NPSH3"),
    ({**TRIPLEX, "criteria.npsh_margin": {"service": "water"}}, "published for rotodynamic pumps"),
)


@pytest.mark.parametrize(("changes", "word"), FINDINGS)
def test_a_doubtful_figure_is_found(changes: Mapping[str, Any], word: str) -> None:
    assert any(word in text for text in studied(plant(changes)).findings)
    assert not any(word in text for text in studied(plant()).findings)


def test_a_curve_that_falls_is_found() -> None:
    study = studied(on_curve([(100.0, 3.0), (150.0, 2.5), (260.0, 8.0)]))
    assert any("falls from 3.0 m at 100.0 m³/h to 2.5 m at 150.0 m³/h" in text for text in study.findings)
