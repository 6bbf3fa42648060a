"""Every rule: met, not met, exactly on the limit, not applicable or applied, not assessable; and within rounding."""

from __future__ import annotations

import importlib
import pkgutil
from collections import defaultdict
from decimal import Decimal
from typing import Any

import pytest
from plants import INTAKE, changed, plant, studied, value
from pumps import BEST, BLANKET, CURVE, HIGH, LOOP, OUTDOORS, SATURATED, SPAN, STRAINER, WET_PIT, Changes

from calcpack import formula, rules
from calcpack.formula import FormulaError
from calcpack.references import REFERENCES, Cite
from calcpack.rules import margin, operating_region, submergence, temperature
from calcpack.symbols import NOMENCLATURE
from calcpack.value import Value
from calcpack.verdict import PASSING, Check, Rule, Unapplied, between, compare, lacking, reported_decimals

TOPICS = {m.name: importlib.import_module(f"{rules.__name__}.{m.name}") for m in pkgutil.iter_modules(rules.__path__)}
#: Every rule once; the margin rule stands twice, at least and more than.
RULES = [x for topic in TOPICS.values() for x in vars(topic).values() if isinstance(x, Rule)]


def one(topic: str, changes: Changes, *, line: bool = True, readings: int = 0) -> list[Check | Unapplied]:
    """What a topic says of the invented plant, with ``changes``."""
    study = studied(changed(plant(line=line, readings=readings), changes))
    held = {x.name for x in vars(TOPICS[topic]).values() if isinstance(x, Rule)}
    titles = {x.title for x in vars(TOPICS[topic]).values() if isinstance(x, Rule)} | set(TITLES.get(topic, ()))
    found: list[Check | Unapplied] = [c for c in study.checks if c.rule.name in held]
    return found + [u for u in study.unapplied if u.title in titles]


#: Titles of rules that are not applied as a pair.
TITLES = {"operating_region": ["Operating region"], "bell_velocity": ["Velocity at the inlet"]}

#: topic, changes, how the plant is made -> what each rule of the topic says, in order: verdict (or unapplied), words
DESIGN: dict[str, Any] = {}
MEASURED: dict[str, Any] = {"line": False, "readings": 1}
BOTH: dict[str, Any] = {"readings": 1}
CASES: tuple[tuple[str, Changes, dict[str, Any], list[tuple[str, str]]], ...] = (
    # NPSH margin
    ("margin", {}, DESIGN, [("met", "the ratio is the only margin")]),
    ("margin", {"criteria.npsh_margin.difference": "0.6 m"}, DESIGN, [("met", "the difference governs")]),
    ("margin", {"criteria.npsh_margin.ratio": "3"}, DESIGN, [("not met", "the ratio is the only")]),
    ("margin", {"pump.npsh_required.at_flow": "210 m³/h"}, DESIGN, [("met", "on the safe side")]),
    ("margin", {"pump.npsh_required.at_flow": "190 m³/h"}, DESIGN, [("not assessed", "at a lower flow than this one")]),
    ("margin", CURVE, DESIGN, [("met", "the ratio is the only margin")]),
    ("margin", {**CURVE, "pump.flow.highest": "261 m³/h"}, DESIGN, [("not assessed", "beyond the tested range")]),
    ("margin", {}, BOTH, [("met", "only margin"), ("met", "only margin")]),
    # highest temperature
    ("temperature", {}, DESIGN, [("met", "the highest temperature was used")]),
    ("temperature", {"liquid.temperature": {"average": "20 °C"}}, DESIGN, [("not met", "only the average")]),
    ("temperature", {"readings.0.temperature": "26 °C"}, BOTH, [("not met", "at a lower temperature. Each 5 K")]),
    # submergence
    ("submergence", {"intake": INTAKE}, DESIGN, [("met", "counted from the centreline")]),
    ("submergence", {"intake": {**INTAKE, "elevation": "1.3 m"}}, DESIGN, [("not met", "counted from the centreline")]),
    ("submergence", {}, DESIGN, [("not assessed", "describes no inlet")]),
    ("submergence", LOOP, DESIGN, [("not applicable", "no free surface")]),
    ("submergence", WET_PIT, {"line": False}, [("met", "counted from the centreline")]),
    # closed vessel
    ("closed_vessel", {}, DESIGN, []),
    ("closed_vessel", LOOP, DESIGN, []),
    ("closed_vessel", BLANKET, DESIGN, [("met", "does not boil")]),
    (
        "closed_vessel",
        {**BLANKET, "supply.pressure.lowest": "19 kPa absolute"},
        DESIGN,
        [("not met", "state `kind: saturated`")],
    ),
    ("closed_vessel", SATURATED, DESIGN, [("met", "by definition")]),
    (
        "closed_vessel",
        {**SATURATED, "supply.pressure.lowest": "121 kPa absolute"},
        DESIGN,
        [("met", "one state of saturation")],
    ),
    (
        "closed_vessel",
        {**SATURATED, "supply.pressure.lowest": "21 kPa gauge"},
        DESIGN,
        [("met", "one state of saturation")],
    ),
    ("closed_vessel", {**SATURATED, "supply.pressure.lowest": "111 kPa absolute"}, DESIGN, [("not met", "in doubt")]),
    ("closed_vessel", {**SATURATED, "supply.pressure.lowest": "131 kPa absolute"}, DESIGN, [("not met", "in doubt")]),
    (
        "closed_vessel",
        {**SATURATED, "supply.pressure.lowest": "121 kPa absolute", "liquid.vapour_pressure": "120.9 kPa absolute"},
        DESIGN,
        [("not assessed", "is not known")],
    ),
    # loop pressure
    ("loop_pressure", {}, DESIGN, []),
    ("loop_pressure", {"criteria.loop_pressure": "10 kPa gauge"}, DESIGN, [("not applicable", "no closed loop")]),
    ("loop_pressure", LOOP, DESIGN, [("met", "at the pump inlet"), ("met", "at the high point")]),
    ("loop_pressure", {**LOOP, **HIGH}, DESIGN, [("met", "at element 3"), ("met", "at the high point")]),
    (
        "loop_pressure",
        {**LOOP, "criteria.loop_pressure": "80 kPa gauge"},
        DESIGN,
        [("met", "at the pump inlet"), ("not met", "at the high point")],
    ),
    (
        "loop_pressure",
        {**LOOP, "supply.high_point": None},
        DESIGN,
        [("met", "at the pump inlet"), ("met", "at the pump inlet"), ("unapplied", "no high_point")],
    ),
    (
        "loop_pressure",
        {**LOOP, "supply.high_point": None, "criteria.loop_pressure": "10 kPa gauge"},
        DESIGN,
        [("met", "inlet"), ("met", "inlet"), ("not assessed", "no high_point")],
    ),
    # pressure along the line
    ("line_pressure", {}, DESIGN, [("unapplied", "no elevation of any element")]),
    (
        "line_pressure",
        {"criteria.vapour_clearance": "0.5 m"},
        DESIGN,
        [("not assessed", "no elevation of any element")],
    ),
    ("line_pressure", HIGH, DESIGN, [("met", "element 3")]),
    ("line_pressure", {**HIGH, "criteria.vapour_clearance": "0.5 m"}, DESIGN, [("met", "element 3")]),
    ("line_pressure", {**HIGH, "criteria.vapour_clearance": "11 m"}, DESIGN, [("not met", "element 3")]),
    ("line_pressure", {**HIGH, "line.sections.0.elements.1.elevation": "12 m"}, DESIGN, [("not met", "element 2")]),
    (
        "line_pressure",
        {**HIGH, "liquid.temperature.lowest": "5 °C"},
        DESIGN,
        [("met", "element 3"), ("met", "element 3")],
    ),
    # tested range
    ("tested_range", {}, DESIGN, [("met", "rises with flow")]),
    ("tested_range", {"pump.npsh_required.at_flow": "199 m³/h"}, DESIGN, [("not met", "ask the maker")]),
    ("tested_range", CURVE, DESIGN, [("met", "between its points")]),
    ("tested_range", {**CURVE, "pump.flow.highest": "260 m³/h"}, DESIGN, [("met", "between its points")]),
    ("tested_range", {**CURVE, "pump.flow.highest": "261 m³/h"}, DESIGN, [("not met", "beyond its points")]),
    ("tested_range", {**CURVE, "pump.flow.highest": "99 m³/h"}, DESIGN, [("not met", "beyond its points")]),
    ("tested_range", {**CURVE, "pump.speed": "1200 r/min"}, DESIGN, [("met", "between its points")]),
    ("tested_range", {**CURVE, "pump.speed": "1100 r/min"}, DESIGN, [("not met", "beyond its points")]),
    (
        "tested_range",
        {**CURVE, "readings.0.flow": "90 m³/h", "readings.0.level": None},
        BOTH,
        [("met", "between its points"), ("not met", "beyond its points")],
    ),
    ("tested_range", {"liquid.temperature.lowest": "5 °C"}, DESIGN, [("met", "rises with flow")]),
    # one datum
    ("datum", {}, DESIGN, [("met", "both count from the impeller eye")]),
    ("datum", {"pump.npsh_required.datum": "Impeller EYE"}, DESIGN, [("met", "both count from")]),
    ("datum", {"pump.npsh_required.datum": "foundation"}, DESIGN, [("not met", "state datum_elevation")]),
    (
        "datum",
        {"pump.npsh_required.datum": "foundation", "pump.npsh_required.datum_elevation": "-0.6 m"},
        DESIGN,
        [("met", "was shifted")],
    ),
    # operating region
    ("operating_region", BEST, DESIGN, [("unapplied", "asks for no limits")]),
    (
        "operating_region",
        {**BEST, "criteria.operating_region": {"lowest": "70 %", "highest": "120 %"}, "pump.flow.lowest": "150 m³/h"},
        DESIGN,
        [("met", ""), ("met", "")],
    ),
    (
        "operating_region",
        {**BEST, "criteria.operating_region": {"lowest": "70 %", "highest": "120 %"}, "pump.flow.normal": "139 m³/h"},
        DESIGN,
        [("met", ""), ("not met", "")],
    ),
    ("operating_region", {**BEST, "criteria.operating_region": {"highest": "90 %"}}, DESIGN, [("not met", "")]),
    ("operating_region", {**BEST, "criteria.operating_region": {"highest": "100 %"}}, DESIGN, [("met", "")]),
    (
        "operating_region",
        {**BEST, "criteria.operating_region": {"lowest": "70 %"}},
        DESIGN,
        [("not assessed", "neither the lowest nor the normal flow")],
    ),
    (
        "operating_region",
        {"criteria.operating_region": {"lowest": "70 %", "highest": "120 %"}, "pump.flow.lowest": "150 m³/h"},
        DESIGN,
        [("not assessed", "no best_efficiency_flow"), ("not assessed", "no best_efficiency_flow")],
    ),
    # suction specific speed
    ("specific_speed", BEST, DESIGN, [("unapplied", "asks for no limit")]),
    (
        "specific_speed",
        {**BEST, "criteria.suction_specific_speed": {"highest": "11000", "in": "US"}},
        DESIGN,
        [("met", "")],
    ),
    (
        "specific_speed",
        {**BEST, "criteria.suction_specific_speed": {"highest": "100", "in": "metric"}},
        DESIGN,
        [("not met", "")],
    ),
    (
        "specific_speed",
        {"criteria.suction_specific_speed": {"highest": "11000", "in": "US"}},
        DESIGN,
        [("not assessed", "no best_efficiency_flow")],
    ),
    (
        "specific_speed",
        {
            **BEST,
            "pump.best_efficiency_flow": "180 m³/h",
            "criteria.suction_specific_speed": {"highest": "11000", "in": "US"},
        },
        DESIGN,
        [("not assessed", "stated at 200 m³/h only")],
    ),
    # velocity in the line
    ("line_velocity", {}, DESIGN, [("unapplied", "asks for no limit")]),
    ("line_velocity", {"criteria.velocity": "2.4 m/s"}, DESIGN, [("met", "highest in L1")]),
    ("line_velocity", {"criteria.velocity": "1.5 m/s"}, DESIGN, [("not met", "highest in L1")]),
    ("line_velocity", {"criteria.velocity": "1.5 m/s"}, MEASURED, [("not assessed", "no suction line")]),
    # velocity at the inlet
    ("bell_velocity", {"intake": INTAKE}, DESIGN, [("unapplied", "asks for no limits")]),
    (
        "bell_velocity",
        {"criteria.bell_velocity": {"method": "hi_9_8"}},
        DESIGN,
        [("not assessed", "describes no inlet")],
    ),
    (
        "bell_velocity",
        {"intake": INTAKE, "criteria.bell_velocity": {"method": "hi_9_8"}},
        DESIGN,
        [("met", ""), ("met", "")],
    ),
    (
        "bell_velocity",
        {"intake": {**INTAKE, "inlet_diameter": "400 mm"}, "criteria.bell_velocity": {"method": "hi_9_8"}},
        DESIGN,
        [("not met", ""), ("met", "")],
    ),
    ("bell_velocity", {"intake": INTAKE, "criteria.bell_velocity": {"highest": "0.7 m/s"}}, DESIGN, [("not met", "")]),
    # straight run
    ("straight_run", {}, DESIGN, [("unapplied", "asks for no length")]),
    (
        "straight_run",
        {"criteria.straight_run": "5", "line.sections.0.elements.3": {"id": "4", "kind": "pipe", "length": "1.2 m"}},
        DESIGN,
        [("met", "after Elbow")],
    ),
    (
        "straight_run",
        {"criteria.straight_run": "5", "line.sections.0.elements.3": {"id": "4", "kind": "pipe", "length": "1 m"}},
        DESIGN,
        [("not met", "after Elbow")],
    ),
    (
        "straight_run",
        {"criteria.straight_run": "5", "line.sections.0.elements.2": {"id": "3", "kind": "connector", "K": "0.1"}},
        DESIGN,
        [("not met", "no straight pipe stands after reducer, element 4")],
    ),
    (
        "straight_run",
        {
            "criteria.straight_run": "5",
            "line.sections.0.elements.2": {"id": "3", "kind": "connector", "K": "0.1"},
            "line.sections.0.elements.3": {
                "id": "4",
                "kind": "reducer",
                "type": "concentric",
                "K": "0.1",
                "to": {"bore": "150 mm"},
            },
        },
        DESIGN,
        [("met", "after Entrance")],
    ),
    ("straight_run", {"criteria.straight_run": "5"}, MEASURED, [("not assessed", "no suction line")]),
    # strainer
    ("strainer", {}, DESIGN, []),
    ("strainer", STRAINER, DESIGN, [("met", "the fouled drop was taken")]),
    (
        "strainer",
        {**STRAINER, "line.sections.0.elements.0.drop": {"clean": "4 kPa", "fouled": "11 kPa"}},
        DESIGN,
        [("met", "the fouled drop was taken")],
    ),
    (
        "strainer",
        {**STRAINER, "line.sections.0.elements.0.drop": {"clean": "0.4 m", "fouled": "0.4 m"}},
        DESIGN,
        [("not met", "no more than the clean one")],
    ),
    (
        "strainer",
        {**STRAINER, "line.sections.0.elements.0.drop": {"clean": "0.4 m"}},
        DESIGN,
        [("not assessed", "gives no fouled drop")],
    ),
    # barometer
    ("site_barometer", {}, DESIGN, [("unapplied", "no elevation of the site")]),
    (
        "site_barometer",
        {"site": {"elevation": "300 m", "weather_allowance": "1.7 kPa"}},
        DESIGN,
        [("unapplied", "no station barometer")],
    ),
    ("site_barometer", OUTDOORS, DESIGN, [("met", "suits the elevation")]),
    (
        "site_barometer",
        changed({"site": {}}, {"site.elevation": "1500 m", "site.barometer": {"lowest": "100 kPa absolute"}}),
        DESIGN,
        [("not met", "reduced to sea level")],
    ),
    (
        "site_barometer",
        {**OUTDOORS, "readings.0.barometer": "98 kPa absolute"},
        BOTH,
        [("met", "suits the elevation"), ("met", "suits the elevation")],
    ),
    (
        "site_barometer",
        {**OUTDOORS, "readings.0.barometer": "103 kPa absolute"},
        BOTH,
        [("met", "suits the elevation"), ("not met", "no weather")],
    ),
    # span of the gauge
    ("gauge_span", {}, DESIGN, []),
    ("gauge_span", {}, BOTH, [("unapplied", "for test 1")]),
    ("gauge_span", SPAN, BOTH, [("met", "on the scale")]),
    (
        "gauge_span",
        {"readings.0.gauge.span": {"lowest": "-100 kPa gauge", "highest": "5 kPa gauge"}},
        BOTH,
        [("met", "on the scale")],
    ),
    (
        "gauge_span",
        {"readings.0.gauge.span": {"lowest": "-100 kPa gauge", "highest": "4 kPa gauge"}},
        BOTH,
        [("not met", "beyond its scale")],
    ),
    (
        "gauge_span",
        {**SPAN, "readings.0.gauge.span.lowest": "-20 kPa gauge", "readings.0.gauge.pressure": "21 kPa vacuum"},
        BOTH,
        [("not met", "beyond its scale")],
    ),
)


def _told(found: Check | Unapplied) -> tuple[str, str]:
    return ("unapplied", found.missing) if isinstance(found, Unapplied) else (found.verdict, found.reason)


@pytest.mark.parametrize(("topic", "changes", "made", "said"), CASES)
def test_a_rule_is_judged(topic: str, changes: Changes, made: dict[str, Any], said: list[tuple[str, str]]) -> None:
    judged = one(topic, changes, **made)
    found = [_told(each) for each in judged]
    assert all(each.criterion and not each.criterion.endswith(".") for each in judged if isinstance(each, Check))
    assert [verdict for verdict, _ in found] == [verdict for verdict, _ in said]
    for (_, reason), (_, word) in zip(found, said, strict=True):
        assert word in reason and not reason.endswith((".", " "))


def test_every_topic_has_every_kind_of_case() -> None:
    """The table misses no verdict a rule can give."""
    told: dict[str, set[str]] = defaultdict(set)
    for topic, _, _, said in CASES:
        told[topic] |= {verdict for verdict, _ in said} or {"nothing"}
    assert set(told) == set(TOPICS)
    unsettled = {"not assessed", "unapplied", "not applicable", "nothing"}
    always = {"datum", "temperature", "tested_range"}  # every file holds what they need
    for topic, verdicts in told.items():
        assert verdicts >= {"met", "not met"} and (verdicts & unsettled or topic in always), topic


def test_topics_stand_in_an_order_of_their_own() -> None:
    orders = [topic.ORDER for topic in rules.topics()]
    assert orders == sorted(set(orders))
    assert {topic.__name__.rpartition(".")[2] for topic in rules.topics()} == set(TOPICS)


def test_every_rule_names_its_source() -> None:
    assert len(RULES) == 26 and len({rule.name for rule in RULES}) == len(RULES) - 1
    for rule in RULES:
        assert rule.title and (rule.cite.key in REFERENCES or rule.cite.how or rule.cite.place)


SAID: tuple[tuple[Changes, str], ...] = (
    ({**LOOP}, "A closed loop is kept at no less than the barometer"),
    (HIGH, "No head is kept over vapour pressure"),
    ({"intake": INTAKE}, "The least submergence is that of ANSI/HI 9.8"),
)


@pytest.mark.parametrize(("changes", "text"), SAID)
def test_a_criterion_of_the_tool_is_an_assumption(changes: Changes, text: str) -> None:
    assert any(text in said for said, _ in studied(plant(changes)).assumptions.values())
    asked = {
        "criteria.loop_pressure": "10 kPa gauge",
        "criteria.vapour_clearance": "0.5 m",
        "criteria.submergence": {"method": "hi_9_8"},
    }
    assert not any(text in said for said, _ in studied(plant({**changes, **asked})).assumptions.values())


@pytest.mark.parametrize(("pressure", "found_"), [("20.5 kPa absolute", True), ("23 kPa absolute", False)])
def test_a_blanketed_vessel_near_saturation_is_found(pressure: str, found_: bool) -> None:
    """Water at 60 °C boils at 19.95 kPa, at 62 °C at 21.87 kPa (IAPWS-IF97)."""
    study = studied(plant({**BLANKET, "supply.pressure.lowest": pressure, "supply.level.lowest": "9 m"}))
    assert any("within 2 K of saturation" in text for text in study.findings) is found_


# --- the comparison ---------------------------------------------------------------------------------------------------


def _side(symbol: str, record: str, shadow: float | None = None, address: str = "8.1", system: str = "SI") -> Value:
    return value(symbol, record, system, shadow=shadow, address=address)


@pytest.mark.parametrize("rule", RULES, ids=lambda rule: f"{rule.name} {rule.tree.op}")
def test_on_the_limit_a_rule_is_met_where_its_relation_allows_it(rule: Rule) -> None:
    a, b = formula.names(rule.tree)
    check = compare(rule, _side(a, "300"), _side(b, "300", address="8.2"), criterion="a test", source="")
    assert check.margin == 0
    assert check.verdict == ("met" if "=" in rule.tree.op else "not met")
    above = compare(rule, _side(a, "300"), _side(b, "299", address="8.2"), criterion="a test", source="")
    assert above.verdict == ("met" if ">" in rule.tree.op else "not met")


@pytest.mark.parametrize("rule", RULES, ids=lambda rule: f"{rule.name} {rule.tree.op}")
def test_a_rule_whose_verdict_turns_with_rounding_is_not_assessed(rule: Rule) -> None:
    a, b = formula.names(rule.tree)
    for shadow in (300.0001, 299.9999):
        left = _side(a, "300", shadow=shadow)
        check = compare(rule, left, _side(b, "300", address="8.2"), criterion="a test", source="")
        turns = check.verdict == "not assessed"
        assert turns is ((">" in rule.tree.op) is (shadow < 300) if "=" in rule.tree.op else shadow > 300)
        assert not turns or "within rounding" in check.reason


#: record of NPSH available, of NPSH needed, shadow of the first, verdict
ROUNDING: tuple[tuple[str, str, float | None, str], ...] = (
    ("26.2410", "25.8500", None, "met"),
    ("25.8499", "25.8500", None, "not met"),
    ("-1.20000", "5.50000", None, "not met"),
    ("0", "5.50000", None, "not met"),
    ("25.8500", "25.8500", 25.84999, "not assessed"),
    ("25.8499", "25.8500", 25.85001, "not assessed"),
    ("27.0000", "25.8500", 27.0012, "met"),
    ("27.0000", "25.8500", 27.101, "not assessed"),
    ("1033.77", "5.50000", 1033.774, "met"),
    ("-142471", "5.50000", -142470.95, "not met"),
)


@pytest.mark.parametrize(("available", "needed", "shadow", "verdict"), ROUNDING)
def test_both_books_must_agree(available: str, needed: str, shadow: float | None, verdict: str) -> None:
    sides = _side("NPSHA_d", available, shadow), _side("N_L", needed, address="8.2")
    check = compare(margin.NPSH_MARGIN, *sides, criterion="a test", source="", met="m", not_met="n")
    assert check.verdict == verdict
    assert ("within rounding" in check.reason) is (verdict == "not assessed")


MARGINS = (
    (margin.NPSH_MARGIN, "26.2410", "25.8500", "0.391000", "1.5"),
    (margin.NPSH_MARGIN, "25.0000", "25.8500", "-0.850000", "-3.2"),
    (submergence.SUBMERGENCE, "3.50000", "3.59122", "-0.0912200", "-2.5"),
    (operating_region.REGION_UPPER, "0.0500000", "0.0600000", "0.0100000", "16.6"),
    (temperature.HIGHEST_TEMPERATURE, "300.000", "302.594", "-2.59400", None),
    (TOPICS["datum"].ONE_DATUM, "1.5", "1.5", "0", None),
)


@pytest.mark.parametrize(("rule", "left", "right", "margin_", "percent"), MARGINS)
def test_the_margin_is_what_there_is_more_than_needed(
    rule: Rule, left: str, right: str, margin_: str, percent: str | None
) -> None:
    a, b = formula.names(rule.tree)
    check = compare(rule, _side(a, left), _side(b, right, address="8.2"), criterion="a test", source="")
    assert check.margin == Decimal(margin_)
    assert (check.percent is None) is (percent is None)
    if check.percent is not None and percent is not None:
        assert abs(check.percent - Decimal(percent)) < Decimal("0.1")


def test_a_rule_without_numbers_claims_no_margin() -> None:
    checks = [c for topic, changes, made, _ in CASES[:12] for c in one(topic, changes, **made)]
    bare = [c for c in checks if isinstance(c, Check) and c.right is None]
    assert bare
    for check in bare:
        assert (check.margin, check.percent) == (None, None) and check.verdict != "met"


BOTH_WAYS = (
    ("S >= S_m", "3", "2", "met"),
    ("S <= S_m", "3", "2", "not met"),
    ("S <= S_m", "2", "3", "met"),
    ("S > S_m", "2", "2", "not met"),
    ("S < S_m", "2", "2", "not met"),
)


@pytest.mark.parametrize(("text", "left", "right", "verdict"), BOTH_WAYS)
def test_a_rule_holds_where_its_comparison_does(text: str, left: str, right: str, verdict: str) -> None:
    rule = Rule("a_test", "A test", text, Cite(""))
    check = compare(rule, value("S", left), value("S_m", right, address="8.2"), criterion="a test", source="")
    assert check.verdict == verdict
    assert check.margin is not None
    if "=" in text:
        assert (check.margin >= 0) is (verdict == "met")


LOW, HIGH_END = Rule("low", "A test", "V_i >= V_l", Cite("")), Rule("high", "A test", "V_i <= V_h", Cite(""))


@pytest.mark.parametrize(
    ("number", "verdict", "end"),
    [
        ("1.5", "met", "low"),
        ("2.5", "met", "high"),
        ("0.5", "not met", "low"),
        ("3.5", "not met", "high"),
        ("3", "met", "high"),
    ],
)
def test_a_value_between_two_ends_is_judged_at_the_nearer_one(number: str, verdict: str, end: str) -> None:
    check = between(LOW, HIGH_END, value("V_i", number), value("V_l", "1"), value("V_h", "3"), criterion="a", source="")
    assert (check.verdict, check.rule.name) == (verdict, end)


def test_a_rule_that_lacks_its_data_is_assessed_only_where_it_is_asked_for() -> None:
    asked = lacking(LOW, "no inlet", asked=True, criterion="a", source="")
    assert isinstance(asked, Check) and (asked.verdict, asked.reason) == ("not assessed", "no inlet")
    assert lacking(LOW, "no inlet", asked=False) == Unapplied("A test", "no inlet")


NOT_RULES: tuple[tuple[str, str], ...] = (
    ("S - S_m", "not a comparison"),
    ("S >= Q", "differ in dimension"),
    ("S >= nobody", "nomenclature"),
)


@pytest.mark.parametrize(("text", "reason"), NOT_RULES)
def test_what_is_no_comparison_of_like_with_like_is_refused(text: str, reason: str) -> None:
    with pytest.raises(FormulaError, match=reason):
        Rule("a_test", "A test", text, Cite(""))


#: record, how far the shadow lies from it, decimals reported
DECIMALS: tuple[tuple[str, float, int | None], ...] = (
    ("4.37380", 0.0, 2),
    ("26.2410", 0.00099, 2),
    ("26.2410", -0.0011, 1),
    ("317.810", 0.0099, 1),
    ("317.810", 0.011, 0),
    ("-1033.77", 0.099, 0),
    ("1033.77", 0.11, None),
    ("0", 0.0, 2),
)


@pytest.mark.parametrize(("record", "drift", "decimals"), DECIMALS)
@pytest.mark.parametrize("system", ["SI", "US"])
def test_a_side_is_reported_at_the_decimals_its_drift_allows(
    record: str, drift: float, decimals: int | None, system: str
) -> None:
    """Line rounding may move a side by a tenth of its last digit reported, in the unit it is printed in."""
    metre = 1.0 if system == "SI" else 0.3048
    side = value("NPSHA_d", record, system, shadow=(float(record) + drift) * metre)
    assert reported_decimals(side) == decimals


#: symbol, record and shadow in the coherent unit, decimals in the plant unit
PLANT_UNITS: tuple[tuple[str, str, float, str, int | None], ...] = (
    ("p_n", "101325", 101325.4, "SI", 2),  # 0.0004 kPa
    ("p_n", "101325", 101332.0, "SI", 1),  # 0.007 kPa
    ("p_n", "101325", 101500.0, "SI", None),  # 0.175 kPa
    ("p_n", "2116.22", 2116.22 * 47.880259, "US", 2),
    ("Q", "0.0888889", 0.08888888, "SI", 1),  # 0.00007 m³/h
    ("Q", "10.0000", 10.00004, "SI", 0),  # 0.14 m³/h
    ("Q", "900.000", 900.003, "SI", None),  # 11 m³/h
    ("N_ss", "12626.4", 12626.9, "SI", 0),
    ("N_ss", "12626.4", 12640.0, "SI", None),
    ("V", "1.72165", 1.72165, "SI", 2),
    ("m_r", "1.10000", 1.1009, "SI", 2),
)


@pytest.mark.parametrize(("symbol", "record", "shadow", "system", "decimals"), PLANT_UNITS)
def test_the_drift_allowed_follows_the_plant_unit(
    symbol: str, record: str, shadow: float, system: str, decimals: int | None
) -> None:
    assert reported_decimals(value(symbol, record, system, shadow=shadow)) == decimals


def test_only_met_and_not_applicable_pass() -> None:
    assert sorted(PASSING) == ["met", "not applicable"]


def test_a_crash_of_a_rule_is_no_pass() -> None:
    """A value that is none must not come out as a verdict."""
    left = value("S", "3")
    nothing = Value(left.address, left.symbol, Decimal("NaN"), float("nan"), left.unit, left.title)
    for sides in ((nothing, left), (left, nothing)):
        with pytest.raises(FormulaError):
            compare(submergence.SUBMERGENCE, *sides, criterion="a test", source="")


def test_every_side_of_a_rule_has_a_kind_that_is_reported() -> None:
    kinds = {NOMENCLATURE[name].kind for rule in RULES for name in formula.names(rule.tree)}
    assert kinds == {"length", "temperature", "pressure", "pressure_difference", "flow", "velocity", "specific_speed"}
