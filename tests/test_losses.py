"""What one element loses: by published sets, in viscous flow, by flow coefficients, by losses known at a flow."""

from __future__ import annotations

import fluids
import pytest
from fluids.control_valve import size_control_valve_l
from lines import (
    BORE,
    CURVE,
    ENTRANCE,
    EXCHANGER,
    FLOW,
    HEAD,
    PIPE,
    SECTION,
    SPEED,
    STRAINER,
    G,
    assumptions,
    faults,
    findings,
    line,
    lost,
    oil,
    passage,
)
from plants import Document, changed, found, plant, studied

from calcpack.faults import InputFault
from calcpack.fitting_set import SETS, variants

# --- sets ------------------------------------------------------------------------------------------------------------

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


# --- viscous liquids -------------------------------------------------------------------------------------------------


@pytest.mark.parametrize("centistokes", [1000.0, 120.0, 2.0])
def test_pipe_and_two_k_fittings_follow_the_reynolds_number(centistokes: float) -> None:
    """Laminar (Re 350), transition (Re 2900) and turbulent (Re 174 000), each against fluids."""
    elbow = {"kind": "elbow", "radius": "long"}
    study = studied(oil(centistokes, PIPE, elbow, **{"line.fitting_set": "hooper_2k"}))
    reynolds = SPEED * BORE / centistokes * 1e6
    assert found(study, "Re").shadow == pytest.approx(reynolds, rel=1e-9)
    turbulent = fluids.friction_factor(reynolds, 0.00015 * 0.3048 / BORE, Method="Colebrook")
    friction = 64 / reynolds if reynolds < 2000 else turbulent
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
    viscous = oil(400, fitting, PIPE, **{"line.fitting_set": set_name})
    assert ("of L1, is that of turbulent flow" in findings(viscous)) is told
    assert "turbulent flow" not in findings(oil(2, fitting, PIPE, **{"line.fitting_set": set_name}))


def test_an_equivalent_length_carries_the_friction_factor_of_its_section() -> None:
    for centistokes in (1000, 120, 2):
        study = studied(oil(centistokes, PIPE, {"kind": "valve", "L_over_D": "13", "count": 2}))
        rows, friction = passage(study).rows, found(study, "f").shadow
        assert rows[1].loss.shadow == pytest.approx(2 * fluids.core.K_from_L_equiv(13, friction) * HEAD, rel=1e-9)


# --- flow coefficients -----------------------------------------------------------------------------------------------


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


# --- losses at a flow ------------------------------------------------------------------------------------------------

DROPS = (
    ({"clean": "0.1 m", "fouled": "0.3 m"}, 0.3 * 4),
    ({"clean": "1 kPa", "fouled": "3 kPa"}, 4 * 3000 / (998.162 * G)),
    ({"clean": "0.1 ft", "fouled": "1 ft"}, 0.3048 * 4),
)


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


@pytest.mark.parametrize(
    ("flow", "expected"), [("100 m³/h", 0.1), ("125 m³/h", 0.15), ("150 m³/h", 0.2), ("200 m³/h", 0.4), ("300 m³/h", 0.8)])  # fmt: skip
def test_a_maker_s_curve_is_read_between_its_points(flow: str, expected: float) -> None:
    assert lost(line(EXCHANGER, **{"pump.flow.highest": flow})) == pytest.approx(expected, rel=1e-6)


def test_the_flow_of_several_pumps_may_end_at_the_last_point() -> None:
    """Three pumps of 99.99999 m³/h are a flow of 299.99997 m³/h, whatever a double makes of it."""
    section = plant()["line"]["sections"][0]
    curve = [CURVE[0], {"flow": "299.99997 m³/h", "loss": "0.80 m"}]
    shared = {**section, "id": "H", "pumps": 3, "elements": [{"id": "1", **EXCHANGER, "curve": curve}]}
    branch = {**section, "elements": [{"id": "1", **PIPE}]}
    flow = {"pump.running": 3, "pump.flow.highest": "99.99999 m³/h"}
    assert lost(plant({"line.sections": [shared, branch], **flow})) == pytest.approx(0.8, rel=1e-6)


@pytest.mark.parametrize("flow", ["99 m³/h", "301 m³/h"])
def test_a_maker_s_curve_is_not_carried_beyond_its_points(flow: str) -> None:
    assert "a curve is not carried beyond its points" in faults(line(EXCHANGER, **{"pump.flow.highest": flow}))


def test_a_maker_s_curve_may_give_pressure_differences() -> None:
    curve = [{"flow": "100 m³/h", "loss": "1 kPa"}, {"flow": "300 m³/h", "loss": "9 kPa"}]
    document = line({**EXCHANGER, "curve": curve}, **{"liquid.temperature.highest": "20 °C"})
    assert lost(document) == pytest.approx(5000 / (998.162 * G), rel=1e-5)
