"""The suction line: every way an element states its loss, viscous flow, headers, reducers, and the pressure along it."""

from __future__ import annotations

import math
import random
from typing import Any

import fluids
import pytest
from fluids.control_valve import size_control_valve_l
from hypothesis import HealthCheck, given, settings
from hypothesis import strategies as st
from plants import Document, changed, found, plant, studied

from calcpack.assessment import Study
from calcpack.faults import InputFault
from calcpack.fitting_set import SETS, variants
from calcpack.roughness import AGED, NEW
from calcpack.study.line import Passage

SECTION = "line.sections.0."
G = 9.80665
BORE, FLOW = 0.2027, 200 / 3600
SPEED = FLOW / (math.pi * BORE**2 / 4)
HEAD = SPEED**2 / 2 / G
FEW = settings(max_examples=30, deadline=None, derandomize=True, suppress_health_check=[HealthCheck.too_slow])
#: An oil: kinematic viscosity in mm²/s to its Reynolds number at the plant's flow and bore, 8.7e5 / viscosity.
OIL: Document = {
    "liquid": {
        "name": "gas oil", "temperature": {"highest": "25 °C", "source": "S1"},
        "density": {"value": "850 kg/m³", "source": "S1"}, "vapour_pressure": {"value": "1 kPa absolute", "source": "S1"},
    }
}  # fmt: skip


def line(*elements: Document, **changes: Any) -> Document:
    """The plant's line with these elements."""
    numbered = [{"id": f"E{n}", **element} for n, element in enumerate(elements, 1)]
    return plant({SECTION + "elements": numbered, **changes})


def oil(centistokes: float, *elements: Document, **changes: Any) -> Document:
    viscosity = {"liquid.viscosity": {"value": f"{centistokes} cSt", "source": "S1"}}
    return line(*elements, **OIL, **viscosity, **changes)


def passage(study: Study) -> Passage:
    run = study.results.line
    assert run is not None and run.passage is not None
    return run.passage


def lost(document: Document, number: int = 0) -> float:
    """Head lost in an element, m."""
    return passage(studied(document)).rows[number].loss.shadow


def faults(document: Document) -> str:
    with pytest.raises(InputFault) as caught:
        studied(document)
    return str(caught.value)


def findings(document: Document) -> str:
    return " ".join(studied(document).findings)


def assumptions(document: Document) -> str:
    return " ".join(text for text, _ in studied(document).assumptions.values())


PIPE = {"kind": "pipe", "length": "20 m"}
ENTRANCE = {"kind": "entrance", "shape": "flush"}


# --- sets -------------------------------------------------------------------------------------------------------------

#: How an element names a variant of its kind.
KEY = {"entrance": "shape", "tee": "flow", "valve": "type"}


def element(kind: str, variant: str) -> Document:
    if kind == "elbow":
        angle, _, radius = variant.partition(" ")
        return {"kind": kind, "angle": int(angle), "radius": radius}
    return {"kind": kind, KEY[kind]: variant}


@pytest.mark.parametrize("set_name", SETS)
@pytest.mark.parametrize("kind", ["entrance", "elbow", "tee", "valve"])
def test_every_fitting_of_every_set_computes(set_name: str, kind: str) -> None:
    for variant in variants(set_name, kind):
        document = line(element(kind, variant), **{"line.fitting_set": set_name})
        assert lost(document) > 0 or variant == "run stub_in", variant


#: A 6 in elbow of 90° and R/D 1.5 in turbulent flow: K as published notes of the three sets give it.
SIX_INCH = (("crane", 0.209), ("hooper_2k", 0.235), ("darby_3k", 0.247))


@pytest.mark.parametrize(("set_name", "K"), SIX_INCH)
def test_one_elbow_in_three_sets(set_name: str, K: float) -> None:
    changes = {
        "line.fitting_set": set_name,
        SECTION + "bore": None,
        SECTION + "size": "NPS 6",
        SECTION + "schedule": "40",
    }
    assert found(studied(line({"kind": "elbow", "radius": "long"}, **changes)), "K").shadow == pytest.approx(
        K, abs=1.5e-3
    )


def test_a_set_without_entrances_and_reducers_borrows_them_and_says_so() -> None:
    reducer = {"kind": "reducer", "type": "concentric", "to": {"bore": "154 mm"}}
    for set_name in ("hooper_2k", "darby_3k"):
        document = line(ENTRANCE, reducer, **{"line.fitting_set": set_name})
        told = assumptions(document)
        assert "loss of the entrance is that of Crane" in told and "loss of the reducer is that of Crane" in told
        assert [lost(document, n) for n in (0, 1)] == [lost(line(ENTRANCE, reducer), n) for n in (0, 1)]
    assert "is that of Crane" not in assumptions(line(ENTRANCE, reducer))


def test_mixed_sets_are_named_and_found() -> None:
    elbow = {"kind": "elbow", "radius": "long"}
    mixed = line(elbow, {**elbow, "set": "darby_3k"}, **{"line.mixed_sets": "intended"})
    assert "several sets are mixed in the line: Crane TP-410, Darby 3-K" in findings(mixed)
    assert lost(mixed, 0) == lost(line(elbow)) != lost(mixed, 1)
    assert "mixed" not in findings(line(elbow, elbow))
    with pytest.raises(InputFault):
        studied(changed(mixed, {"line.mixed_sets": None}))


def test_a_fitting_the_set_lacks_is_refused_where_it_stands() -> None:
    document = line({"kind": "valve", "type": "butterfly"}, **{SECTION + "bore": "900 mm"})
    assert "elements[E1]" in faults(document) and "gate" in faults(document)


def test_darby_counts_on_the_nominal_diameter_or_says_that_it_is_the_bore() -> None:
    gate = {"kind": "valve", "type": "gate"}
    by_bore = line(gate, **{"line.fitting_set": "darby_3k"})
    by_size = changed(by_bore, {SECTION + "bore": None, SECTION + "size": "DN 200", SECTION + "schedule": "40"})
    reynolds = found(studied(by_bore), "Re").shadow
    assert found(studied(by_size), "K").shadow == pytest.approx(
        fluids.Darby3K(NPS=8, Re=found(studied(by_size), "Re").shadow, name="Valve, Gate valve, standard, β = 1"),
        rel=1e-9,
    )
    assert found(studied(by_bore), "K").shadow == pytest.approx(
        fluids.Darby3K(NPS=BORE / 0.0254, Re=reynolds, name="Valve, Gate valve, standard, β = 1"), rel=1e-9
    )
    assert "nominal diameter of L1 is its bore" in assumptions(by_bore)
    assert "nominal diameter" not in assumptions(by_size)


# --- viscous liquids --------------------------------------------------------------------------------------------------


@pytest.mark.parametrize("centistokes", [1000.0, 120.0, 2.0])
def test_pipe_and_two_k_fittings_follow_the_reynolds_number(centistokes: float) -> None:
    """Laminar (Re 350), transition (Re 2900) and turbulent (Re 174 000), each against fluids."""
    elbow = {"kind": "elbow", "radius": "long"}
    study = studied(oil(centistokes, PIPE, elbow, **{"line.fitting_set": "hooper_2k"}))
    reynolds = SPEED * BORE / centistokes * 1e6
    assert found(study, "Re").shadow == pytest.approx(reynolds, rel=1e-9)
    roughness = 0.00015 * 0.3048 / BORE
    if reynolds < 2000:
        friction = 64 / reynolds
    else:
        friction = fluids.friction_factor(reynolds, roughness, Method="Colebrook")
    assert passage(study).rows[0].loss.shadow == pytest.approx(friction * 20 / BORE * HEAD, rel=1e-8)
    K = fluids.Hooper2K(Di=BORE / 0.0254, Re=reynolds, name="Elbow, 90°, Long-radius (R/D = 1.5), All types")
    assert passage(study).rows[1].loss.shadow == pytest.approx(K * HEAD, rel=1e-9)


UNDERSTATED = (
    ({"kind": "elbow", "radius": "long"}, "crane", True),
    ({"kind": "fitting", "name": "F", "K": "0.5"}, "hooper_2k", True),
    ({"kind": "valve", "Cv": "900"}, "hooper_2k", True),
    ({"kind": "entrance", "K": "0.5"}, "darby_3k", True),
    ({"kind": "elbow", "radius": "long"}, "hooper_2k", False),
    ({"kind": "elbow", "radius": "long"}, "darby_3k", False),
    ({"kind": "elbow", "L_over_D": "16"}, "crane", False),
)


@pytest.mark.parametrize(("fitting", "set_name", "told"), UNDERSTATED)
def test_coefficients_of_turbulent_flow_are_found_in_viscous_flow(fitting: Document, set_name: str, told: bool) -> None:
    viscous = oil(400, PIPE, fitting, **{"line.fitting_set": set_name})
    assert ("understate the losses in L1" in findings(viscous)) is told
    assert "understate" not in findings(oil(2, PIPE, fitting, **{"line.fitting_set": set_name}))


def test_an_equivalent_length_carries_the_friction_factor_of_its_section() -> None:
    for centistokes in (1000, 120, 2):
        study = studied(oil(centistokes, PIPE, {"kind": "valve", "L_over_D": "13", "count": 2}))
        rows, friction = passage(study).rows, found(study, "f").shadow
        assert rows[1].loss.shadow == pytest.approx(2 * fluids.core.K_from_L_equiv(13, friction) * HEAD, rel=1e-9)


# --- flow coefficients ------------------------------------------------------------------------------------------------


@pytest.mark.parametrize("units", ["SI", "US"])
@pytest.mark.parametrize(("way", "coefficient", "K"), [
    ("Cv", 900.0, fluids.Cv_to_K(900, BORE)), ("Kv", 640.0, fluids.Kv_to_K(640, BORE)),
])  # fmt: skip
def test_a_flow_coefficient_is_the_k_of_fluids(way: str, coefficient: float, K: float, units: str) -> None:
    """fluids rounds the density of water to 1000 kg/m³: 0.1 %."""
    document = line({"kind": "valve", way: f"{coefficient:g}"}, **{"calculation.units": units})
    assert lost(document) == pytest.approx(K * HEAD, rel=2e-3)
    assert lost(changed(document, {SECTION + "elements.0.count": 3})) == pytest.approx(3 * lost(document), rel=1e-9)


@pytest.mark.parametrize("density", [600.0, 850.0, 1200.0])
def test_the_head_lost_by_a_flow_coefficient_is_that_of_the_sizing_equation(density: float) -> None:
    """IEC 60534 as fluids has it: the Kv that passes this flow of this liquid under the pressure drop we find."""
    document = oil(
        2, {"kind": "valve", "Kv": "640"}, **{"liquid.density": {"value": f"{density} kg/m³", "source": "S1"}}
    )
    drop = lost(document) * density * G
    assert drop / density == pytest.approx(100_000 / 999.1 * (200 / 640) ** 2, rel=1e-9), "as head, of any liquid"
    kv = size_control_valve_l(
        rho=density, Psat=1e3, Pc=3e6, mu=density * 2e-6, P1=1e6 + drop, P2=1e6, Q=FLOW, full_output=False
    )
    assert kv == pytest.approx(640, rel=2e-4)


# --- losses at a flow -------------------------------------------------------------------------------------------------

DROPS = (
    ({"clean": "0.1 m", "fouled": "0.3 m"}, 0.3 * 4),
    ({"clean": "1 kPa", "fouled": "3 kPa"}, 4 * 3000 / (998.162 * G)),
    ({"clean": "0.1 ft", "fouled": "1 ft"}, 0.3048 * 4),
)
STRAINER = {"kind": "strainer", "name": "STR-1", "at_flow": "100 m³/h", "source": "S1", "status": "maker"}


@pytest.mark.parametrize(("drop", "expected"), DROPS)
def test_a_fouled_strainer_loses_by_the_square_of_the_flow(drop: dict[str, str], expected: float) -> None:
    """Twice the reference flow: four times the drop of the fouled screen, as head of the liquid pumped (20 °C)."""
    document = line({**STRAINER, "drop": drop}, **{"liquid.temperature.highest": "20 °C"})
    assert lost(document) == pytest.approx(expected, abs=2e-5)
    assert "clean drop is taken" not in findings(document)


def test_a_strainer_without_a_fouled_drop_is_taken_clean_and_found() -> None:
    document = line({**STRAINER, "drop": {"clean": "0.1 m"}})
    assert lost(document) == pytest.approx(0.4)
    assert "no fouled drop of STR-1" in findings(document)
    assert passage(studied(document)).rows[0].words == "STR-1, clean"


def test_a_reading_names_the_state_of_its_strainers() -> None:
    document = plant(
        {SECTION + "elements": [{"id": "S", **STRAINER, "drop": {"clean": "0.1 m", "fouled": "0.3 m"}}]}, readings=1
    )
    clean = studied(changed(document, {"readings.0.strainers": "clean"}))
    fouled = studied(changed(document, {"readings.0.strainers": "fouled"}))
    assert clean.differences[0].value.shadow - fouled.differences[0].value.shadow == pytest.approx(0.2 * 4, abs=1e-9)


def test_connector_and_equipment_state_k_or_a_loss_at_a_flow() -> None:
    hose = {"kind": "connector", "name": "hose", "loss": "0.1 m", "at_flow": "100 m³/h"}
    assert lost(line(hose)) == pytest.approx(0.4)
    assert lost(line({**hose, "count": 2})) == pytest.approx(0.8)
    assert lost(line({"kind": "connector", "name": "hose", "K": "0.7"})) == pytest.approx(0.7 * HEAD)
    meter = {"kind": "equipment", "name": "FE-1", "loss": "5 kPa", "at_flow": "250 m³/h"}
    assert lost(line(meter, **{"liquid.temperature.highest": "20 °C"})) == pytest.approx(
        5000 / (998.162 * G) * 0.64, rel=1e-5
    )


CURVE = [
    {"flow": "100 m³/h", "loss": "0.10 m"},
    {"flow": "150 m³/h", "loss": "0.20 m"},
    {"flow": "300 m³/h", "loss": "0.80 m"},
]
EXCHANGER = {"kind": "equipment", "name": "E-1", "curve": CURVE}


@pytest.mark.parametrize(
    ("flow", "expected"), [("100 m³/h", 0.1), ("125 m³/h", 0.15), ("150 m³/h", 0.2), ("200 m³/h", 0.4), ("300 m³/h", 0.8),
                           ("0.0833333333333 m³/s", 0.8)])  # fmt: skip
def test_a_maker_s_curve_is_read_between_its_points(flow: str, expected: float) -> None:
    assert lost(line(EXCHANGER, **{"pump.flow.highest": flow})) == pytest.approx(expected, rel=1e-6)


@pytest.mark.parametrize("flow", ["99 m³/h", "301 m³/h"])
def test_a_maker_s_curve_is_not_carried_beyond_its_points(flow: str) -> None:
    assert "a curve is not carried beyond its points" in faults(line(EXCHANGER, **{"pump.flow.highest": flow}))


def test_a_maker_s_curve_may_give_pressure_differences() -> None:
    curve = [{"flow": "100 m³/h", "loss": "1 kPa"}, {"flow": "300 m³/h", "loss": "9 kPa"}]
    document = line({**EXCHANGER, "curve": curve}, **{"liquid.temperature.highest": "20 °C"})
    assert lost(document) == pytest.approx(5000 / (998.162 * G), rel=1e-5)


# --- reducers ---------------------------------------------------------------------------------------------------------


@pytest.mark.parametrize("units", ["SI", "US"])
@pytest.mark.parametrize("length", ["", "30 mm", "60 mm", "152 mm", "600 mm"])
@pytest.mark.parametrize("other", [0.154, 0.300])
@pytest.mark.parametrize("end", ["to", "from"])
def test_a_reducer_is_that_of_crane_in_fluids(end: str, other: float, length: str, units: str) -> None:
    """Contraction and enlargement, gradual, steep and sudden, each referred to the section's own bore."""
    reducer: Document = {"kind": "reducer", "type": "concentric", end: {"bore": f"{other * 1000:g} mm"}}
    taper = float(length.split()[0]) / 1000 if length else 0.0
    if length:
        reducer["length"] = length
    before, after = (BORE, other) if end == "to" else (other, BORE)
    if before > after:
        on_smaller = fluids.contraction_conical(Di1=before, Di2=after, l=taper, method="Crane")
    else:
        angle = math.degrees(2 * math.atan((after - before) / 2 / taper)) if taper else 180.0
        on_smaller = fluids.diffuser_conical(Di1=before, Di2=after, angle=angle, method="Crane")
    K = on_smaller if other > BORE else fluids.fittings.change_K_basis(on_smaller, D1=other, D2=BORE)
    assert lost(line(reducer, **{"calculation.units": units})) == pytest.approx(K * HEAD, rel=1e-6)


def test_a_reducer_between_equal_bores_is_refused() -> None:
    assert "differs from the section's" in faults(
        line({"kind": "reducer", "type": "concentric", "to": {"bore": "202.7 mm"}})
    )


def test_an_eccentric_reducer_counts_as_concentric_and_says_so() -> None:
    to = {"to": {"size": "NPS 6", "schedule": "40"}, "length": "140 mm"}
    eccentric = line({"kind": "reducer", "type": "eccentric", "flat_side": "top", **to})
    concentric = line({"kind": "reducer", "type": "concentric", **to})
    assert lost(eccentric) == lost(concentric)
    assert "eccentric reducer loses as much" in assumptions(eccentric) and "eccentric" not in assumptions(concentric)


LAYOUTS = (
    ("eccentric", "bottom", "-1 m", "0 m", "at the bottom"),
    ("eccentric", "bottom", "0 m", "0 m", "at the bottom"),
    ("eccentric", "bottom", "3 m", "0 m", ""),
    ("eccentric", "top", "3 m", "0 m", "at the top"),
    ("eccentric", "top", "0 m", "0 m", ""),
    ("eccentric", "top", "-1 m", "0 m", ""),
    ("concentric", "", "0 m", "0 m", "concentric in a level run"),
    ("concentric", "", "3 m", "0 m", ""),
    ("eccentric", "bottom", "", "0 m", ""),
    ("eccentric", "bottom", "0 m", "", ""),
)


@pytest.mark.parametrize(("form", "side", "before", "here", "told"), LAYOUTS)
def test_the_flat_side_is_judged_only_where_elevations_tell(
    form: str, side: str, before: str, here: str, told: str
) -> None:
    reducer = {"kind": "reducer", "type": form, "to": {"bore": "154 mm"}} | ({"flat_side": side} if side else {})
    pipe, reducer = PIPE | ({"elevation": before} if before else {}), reducer | ({"elevation": here} if here else {})
    text = findings(line(ENTRANCE, pipe, reducer))
    assert told in text if told else "reducer" not in text


# --- Hazen and Williams -----------------------------------------------------------------------------------------------

HW = {"line.loss_method": "hazen_williams", SECTION + "material": None, SECTION + "hazen_williams_C": "120"}


@pytest.mark.parametrize("units", ["SI", "US"])
@pytest.mark.parametrize(("C", "flow"), [(120, 200), (140, 150), (100, 80)])
def test_hazen_and_williams_agree_with_the_form_of_another_book(C: int, flow: int, units: str) -> None:
    """Davis, Water and Wastewater Engineering, eq. 3-2: Q = 0.278 C D^2.63 S^0.54 (m, s); its exponents are rounded."""
    changes = {
        **HW,
        SECTION + "hazen_williams_C": str(C),
        "pump.flow.highest": f"{flow} m³/h",
        "calculation.units": units,
    }
    slope = (flow / 3600 / (0.278 * C * BORE**2.63)) ** (1 / 0.54)
    assert lost(line(PIPE, **changes)) == pytest.approx(20 * slope, rel=0.01)


def test_hazen_and_williams_need_no_roughness_unless_a_fitting_does() -> None:
    assert lost(line(PIPE, ENTRANCE, **HW), 1) == pytest.approx(0.5 * HEAD)
    by_length = line(PIPE, {"kind": "valve", "L_over_D": "13"}, **HW)
    assert "needs the friction factor" in faults(by_length)
    assert lost(changed(by_length, {SECTION + "material": "commercial steel"}), 1) > 0


def test_hazen_and_williams_are_refused_where_they_do_not_hold() -> None:
    assert "holds for no other liquid" in faults(oil(2, PIPE, **HW))
    assert "a Reynolds number above 4000" in faults(line(PIPE, **HW, **{"pump.flow.highest": "1 m³/h"}))


OUTSIDE = (
    ({"liquid.temperature.highest": "60 °C"}, "temperature 60.00 °C"),
    ({SECTION + "hazen_williams_C": "45"}, "C 45"),
    ({"pump.flow.highest": "400 m³/h"}, "velocity 3.443 m/s"),
    ({"pump.flow.highest": "30 m³/h"}, "velocity 0.258 m/s"),
)


@pytest.mark.parametrize(("changes", "told"), OUTSIDE)
def test_hazen_and_williams_outside_their_usual_range_are_found(changes: Document, told: str) -> None:
    assert "outside its usual range" not in findings(line(PIPE, **HW))
    study = studied(line(PIPE, **{**HW, **changes}))
    (reason,) = [reason for text, reason in study.findings.items() if "outside its usual range in L1" in text]
    assert told in reason


# --- condition of the wall --------------------------------------------------------------------------------------------


@pytest.mark.parametrize("units", ["SI", "US"])
def test_a_roughness_taken_from_the_table_is_an_assumption_in_the_package_s_own_unit(units: str) -> None:
    told = assumptions(line(PIPE, **{"calculation.units": units}))
    assert "commercial steel is as rough as new: " + {"SI": "0.04572 mm", "US": "0.001800 in"}[units] in told
    own = studied(line(PIPE, **{SECTION + "roughness": {"value": "0.2 mm", "source": "S1"}}))
    assert not own.assumptions and found(own, "eps").shadow == pytest.approx(0.0002)


@pytest.mark.parametrize("material", NEW)
def test_an_aged_wall_loses_more_or_is_refused(material: str) -> None:
    new, aged = (line(PIPE, **{SECTION + "material": material, SECTION + "condition": c}) for c in ("new", "aged"))
    assert lost(new) == lost(changed(new, {SECTION + "condition": None})), "new where the file says nothing"
    if material in AGED:
        assert lost(aged) > lost(new) and f"{material} has aged to" in assumptions(aged)
    else:
        assert "an aged wall is tabulated" in faults(aged)


# --- the whole line ---------------------------------------------------------------------------------------------------


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


# --- headers ----------------------------------------------------------------------------------------------------------


def header(pumps: int, running: int) -> Document:
    branch = plant()["line"]["sections"][0]
    shared = {
        **branch,
        "id": "H",
        "bore": "400 mm",
        "pumps": pumps,
        "elements": [{"id": "1", **ENTRANCE}, {"id": "2", **PIPE}],
    }
    return plant({"line.sections": [shared, {**branch, "elements": branch["elements"][1:]}], "pump.running": running})


@pytest.mark.parametrize(
    ("pumps", "running", "carried"), [(1, 1, 1), (3, 1, 1), (1, 3, 1), (3, 3, 3), (3, 2, 2), (2, 3, 2)]
)
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


# --- pressure along the line ------------------------------------------------------------------------------------------


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
    expected = [
        ("E1", gamma * (start - more * 0.5 * HEAD + 2.5 - HEAD)),
        ("E3", gamma * (start - more * 2.7 * HEAD - 0.8 - HEAD)),
        ("E4", gamma * (start - more * 2.8 * HEAD - 0.0 - small)),
    ]
    assert [(node.element, node.pressure.shadow) for node in run.nodes] == [
        (name, pytest.approx(pressure, rel=2e-6)) for name, pressure in expected
    ]
    for node in run.nodes:
        assert float(node.pressure.record * node.pressure.unit.factor) == pytest.approx(node.pressure.shadow, rel=1e-4)


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


# --- order and size ---------------------------------------------------------------------------------------------------

MANY = (
    PIPE, {"kind": "elbow", "radius": "long", "count": 2}, {"kind": "valve", "type": "gate"}, {"kind": "valve", "Cv": "900"},
    {"kind": "valve", "L_over_D": "13"}, {"kind": "connector", "name": "hose", "loss": "1 kPa", "at_flow": "150 m³/h"}, EXCHANGER,
    {**STRAINER, "drop": {"clean": "0.1 m", "fouled": "0.3 m"}}, {"kind": "fitting", "name": "F", "K": "0.4"},
    {"kind": "tee", "flow": "run"},
)  # fmt: skip


@FEW
@given(st.sampled_from(list(SETS)), st.integers(0, 10**6), st.sampled_from(["SI", "US"]))
def test_the_order_of_elements_changes_nothing(set_name: str, seed: int, units: str) -> None:
    shuffled = list(MANY)
    random.Random(seed).shuffle(shuffled)
    changes = {"line.fitting_set": set_name, "calculation.units": units}
    one, other = (passage(studied(line(*elements, **changes))) for elements in (MANY, shuffled))
    assert other.total.shadow == pytest.approx(one.total.shadow, rel=1e-14)
    assert other.total.record == pytest.approx(one.total.record, rel=2e-6)


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
