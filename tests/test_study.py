"""Whole studies of generated input files: the two routes, the way NPSH moves, units, and what must be refused or found."""

from __future__ import annotations

import random
import re
from decimal import Context, Decimal
from fractions import Fraction
from functools import cache
from pathlib import Path
from typing import Any

import pint
import pytest
import yaml
from hypothesis import HealthCheck, given, settings
from hypothesis import strategies as st
from plants import INTAKE, Document, changed, found, plant, studied, verdicts

from calcpack.assessment import Study
from calcpack.faults import InputFault
from calcpack.number import last_unit
from calcpack.roughness import NEW
from calcpack.symbols import NOMENCLATURE
from calcpack.value import drift
from calcpack.verdict import reported_decimals

ROOT = Path(__file__).parents[1]
SAMPLES = sorted((ROOT / "sample_inputs").glob("*.yaml"))
SECTION = "line.sections.0."
#: One run takes 10 ms; the first loads the property library.
FEW = settings(max_examples=40, deadline=None, derandomize=True, suppress_health_check=[HealthCheck.too_slow])


def metres(x: float, digits: int = 3) -> str:
    return f"{x:.{digits}f} m"


def npsh(study: Study, number: int = 0) -> float:
    """NPSH available of the result judged, in metres."""
    return study.judged[number].available.npsh.shadow


def faults(document: Document) -> str:
    with pytest.raises(InputFault) as caught:
        studied(document)
    return str(caught.value)


# --- random systems ---------------------------------------------------------------------------------------------------

SIZES = (("DN 100", "40"), ("DN 150", "40"), ("DN 200", "STD"), ("DN 250", "40"), ("NPS 12", "STD"), ("NPS 6", "XS"))
AREAS = {"DN 100": 0.00821, "DN 150": 0.01865, "DN 200": 0.03226, "DN 250": 0.0509, "NPS 12": 0.0730, "NPS 6": 0.0168}


@st.composite
def systems(draw: st.DrawFn, *, kinds: tuple[str, ...] = ("open", "gas_blanketed"), cold: float = 5) -> Document:
    """A random plant whose surface does not boil; lengths, levels and flows of usual size."""
    size, schedule = draw(st.sampled_from(SIZES))
    flow = draw(st.floats(0.5, 2.5)) * AREAS[size]
    number = draw(st.integers(0, 3))
    elements: list[Any] = [
        {"id": "E", "kind": "entrance", "shape": draw(st.sampled_from(["flush", "inward", "bell"]))},
        {"id": "P", "kind": "pipe", "length": metres(draw(st.floats(1, 40)))},
        {
            "id": "V",
            "kind": "valve",
            "type": draw(st.sampled_from(["gate", "ball", "plug", "butterfly"])),
            "count": number + 1,
        },
        {"id": "F", "kind": "fitting", "name": "reducer", "K": f"{draw(st.floats(0, 2)):.3f}"},
    ]
    elements += [{"id": f"B{n}", "kind": "elbow", "radius": "long", "count": n + 1} for n in range(number)]
    kind = draw(st.sampled_from(kinds))
    changes: dict[str, Any] = {
        "liquid.temperature.highest": f"{draw(st.floats(cold, 70)):.1f} °C",
        "site.barometer.lowest": f"{draw(st.floats(80, 104)):.2f} kPa absolute",
        "supply.kind": kind,
        "supply.level.lowest": metres(draw(st.floats(-3, 8))),
        "pump.datum_elevation.value": metres(draw(st.floats(-1, 1))),
        "pump.flow.highest": f"{flow * 3600:.2f} m³/h",
        "pump.npsh_required.at_flow": f"{flow * 3600:.2f} m³/h",
        SECTION + "bore": None,
        SECTION + "size": size,
        SECTION + "schedule": schedule,
        SECTION + "material": draw(st.sampled_from(sorted(NEW))),
        SECTION + "elements": elements,
    }
    if kind == "gas_blanketed":
        changes["supply.pressure"] = {"lowest": f"{draw(st.floats(-10, 150)):.2f} kPa gauge", "source": "S1"}
    return plant(changes)


def implied_reading(document: Document, study: Study, *, elevation: float, leg: str) -> Document:
    """The file with a reading at its worst case: the gauge shows what the model's own printed values say it must."""
    size, worst = document["line"]["sections"][0], document["supply"]
    level, gamma = found(study, "z_s").shadow, found(study, "gamma").shadow
    lost, head, surface = found(study, "h_L").shadow, found(study, "h_V").shadow, found(study, "H_s").shadow
    barometer = found(study, "p_b").shadow
    pressure = (surface + level - elevation - lost - head) * gamma - barometer
    gauge = {
        "pressure": f"{pressure / 1000:.4f} kPa gauge",
        "elevation": metres(elevation if leg == "filled" else elevation + 1.7),
        "leg": leg,
        "tap": {"size": size["size"], "schedule": size["schedule"]},
    }
    if leg == "dry":
        gauge["tap_elevation"] = metres(elevation)
    reading = {
        "name": "implied",
        "date": "2026-10-02",
        "source": "S1",
        "status": "verified",
        "flow": document["pump"]["flow"]["highest"],
        "barometer": document["site"]["barometer"]["lowest"],
        "temperature": document["liquid"]["temperature"]["highest"],
        "level": worst["level"]["lowest"],
        "gauge": gauge,
    }
    if worst["kind"] == "gas_blanketed":
        reading["surface_pressure"] = worst["pressure"]["lowest"]
    return changed(document, {"readings": [reading]})


@FEW
@given(systems(), st.floats(-2, 2), st.sampled_from(["filled", "dry"]), st.sampled_from(["SI", "US"]))
def test_both_routes_agree_on_one_physical_state(document: Document, elevation: float, leg: str, units: str) -> None:
    """Energy balance: the gauge the model implies gives back the model's NPSH available, within line rounding."""
    document = changed(document, {"calculation.units": units})
    study = studied(implied_reading(document, studied(document), elevation=round(elevation, 3), leg=leg))
    design, carried = (each.available for each in study.judged)
    (difference,) = study.differences
    assert abs(difference.value.shadow) < 1e-4, "the gauge is written to 0.1 Pa"
    assert abs(float(difference.value.record * Decimal(float(difference.value.unit.factor)))) < 1e-3
    assert carried.npsh.shadow == pytest.approx(design.npsh.shadow, abs=1e-3), "already at the worst case"
    printed = [float(x.npsh.record) * float(x.npsh.unit.factor) for x in (design, carried)]
    assert printed[0] == pytest.approx(printed[1], abs=2e-3)


@FEW
@given(systems(), st.sampled_from([0.6, 0.85, 1.2]), st.floats(0, 2), st.floats(-8, 8))
def test_a_reading_is_carried_as_the_model_moves(
    document: Document, flow: float, level: float, barometer: float
) -> None:
    """With losses that go by the square of the flow only, a reading carried to the worst case is the model there."""
    loss = [{"id": "F", "kind": "fitting", "name": "all of the line", "K": "3.7"}]
    document = changed(document, {SECTION + "elements": loss})
    worst = studied(document)
    at_reading = {
        "pump.flow.highest": f"{float(document['pump']['flow']['highest'].split()[0]) * flow:.3f} m³/h",
        "supply.level.lowest": metres(found(worst, "z_s").shadow + level),
        "liquid.temperature.highest": "15 °C",
        "site.barometer.lowest": f"{found(worst, 'p_b').shadow / 1000 + barometer:.3f} kPa absolute",
    }
    then = changed(document, at_reading)
    reading = implied_reading(then, studied(then), elevation=0.4, leg="filled")["readings"]
    both = studied(changed(document, {"readings": reading}))
    design, carried = (each.available for each in both.judged)
    # The velocity head on the tap and the gauge's own rounding remain; the liquid's weight differs between the states.
    assert carried.npsh.shadow == pytest.approx(design.npsh.shadow, abs=2e-3)


STATE = {
    "supply.level.lowest": "-3.0 m",
    "liquid.temperature.highest": "20 °C",
    "site.barometer.lowest": "101.325 kPa absolute",
    "pump.flow.highest": "200 m³/h",
}


@pytest.mark.parametrize("velocity", [0.5, 2.0, 3.5])
def test_the_published_consistency_case_holds_at_any_velocity(velocity: float) -> None:
    """A lift of 3 m with 1.2 m of loss at 20 °C and 101.325 kPa leaves 5.9123 m by either route (tests/checks.yaml, N-consistency)."""
    diameter = (4 * 200 / 3600 / velocity / 3.141592653589793) ** 0.5
    coefficient = 1.2 / (velocity**2 / 2 / 9.80665)
    only = [{"id": "F", "kind": "fitting", "name": "all of the line", "K": f"{coefficient:.8g}"}]
    document = plant({**STATE, SECTION + "bore": f"{diameter * 1000:.9g} mm", SECTION + "elements": only})
    study = studied(document)
    gauge = (101325 - 998.1618 * 9.80665 * (3.0 + 1.2 + velocity**2 / 2 / 9.80665) - 101325) / 1000
    both = studied(
        changed(
            plant(readings=1),
            {
                **STATE,
                SECTION + "elements": only,
                SECTION + "bore": f"{diameter * 1000:.9g} mm",
                "readings.0.level": "-3.0 m",
                "readings.0.temperature": "20 °C",
                "readings.0.barometer": "101.325 kPa absolute",
                "readings.0.gauge": {
                    "pressure": f"{gauge:.4f} kPa gauge",
                    "elevation": "0 m",
                    "leg": "filled",
                    "tap": {"bore": f"{diameter * 1000:.9g} mm"},
                },
            },
        )
    )
    if velocity == 2.0:
        assert gauge == pytest.approx(-43.109, abs=5e-4)
    assert npsh(study) == pytest.approx(5.9123, abs=2e-4)
    assert both.judged[1].available.npsh.shadow == pytest.approx(5.9123, abs=2e-4)


# --- the way NPSH available moves -------------------------------------------------------------------------------------


@FEW
@given(systems(), st.floats(0.1, 5))
def test_npsh_falls_as_the_pump_is_raised_and_the_level_falls(document: Document, step: float) -> None:
    base = studied(document)
    level, datum = found(base, "z_s").shadow, found(base, "z_d").shadow
    raised = studied(changed(document, {"pump.datum_elevation.value": metres(datum + step)}))
    lower = studied(changed(document, {"supply.level.lowest": metres(level - step)}))
    assert npsh(base) - npsh(raised) == pytest.approx(step, abs=2e-3)
    assert npsh(base) - npsh(lower) == pytest.approx(step, abs=2e-3)


@FEW
@given(systems(), st.floats(1, 40))
def test_npsh_falls_with_the_length_of_the_line(document: Document, more: float) -> None:
    length = float(document["line"]["sections"][0]["elements"][1]["length"].split()[0])
    longer = changed(document, {SECTION + "elements.1.length": metres(length + more)})
    assert npsh(studied(longer)) < npsh(studied(document))


@FEW
@given(systems(kinds=("open",)), st.floats(1.05, 1.6))
def test_npsh_falls_with_the_flow(document: Document, factor: float) -> None:
    flow = float(document["pump"]["flow"]["highest"].split()[0])
    assert npsh(studied(changed(document, {"pump.flow.highest": f"{flow * factor:.2f} m³/h"}))) < npsh(
        studied(document)
    )


@FEW
@given(systems(kinds=("open",), cold=20), st.floats(3, 20))
def test_npsh_of_water_under_an_open_surface_falls_with_temperature(document: Document, more: float) -> None:
    """From 20 °C on and with a modest line, vapour pressure outweighs density and viscosity."""
    document = changed(document, {SECTION + "elements": [{"id": "P", "kind": "pipe", "length": "3 m"}]})
    degrees = float(document["liquid"]["temperature"]["highest"].split()[0])
    warmer = changed(document, {"liquid.temperature.highest": f"{degrees + more:.1f} °C"})
    assert npsh(studied(warmer)) < npsh(studied(document))


@FEW
@given(systems(), st.integers(1, 100))
def test_the_order_of_elements_changes_nothing_beyond_rounding(document: Document, seed: int) -> None:
    elements = list(document["line"]["sections"][0]["elements"])
    entrance, *rest = elements
    random.Random(seed).shuffle(rest)
    elements = [entrance, *rest]
    other = studied(changed(document, {SECTION + "elements": elements}))
    base = studied(document)
    assert npsh(other) == pytest.approx(npsh(base), abs=1e-9)
    a, b = other.judged[0].available.npsh.record, base.judged[0].available.npsh.record
    assert abs(a - b) <= 2 * last_unit(b)
    assert verdicts(other) == verdicts(base)


@FEW
@given(systems(), st.sampled_from(["SI", "US"]))
def test_line_rounding_stays_far_below_a_reported_digit(document: Document, units: str) -> None:
    study = studied(changed(document, {"calculation.units": units}))
    for value in (study.judged[0].available.npsh, study.judged[0].needed.limit):
        assert reported_decimals(value) == 2 and drift(value) < Decimal("0.001")
    assert verdicts(study)["npsh_margin"] != "not assessed"


# --- one plant in two systems of units --------------------------------------------------------------------------------

_AMOUNT = re.compile(r"(-?[0-9.]+) (m³/h|mm|m|kPa|°C|ft|in|gal/min|psi|°F)( absolute| gauge)?$")
_US = {"m³/h": "gal/min", "mm": "in", "m": "ft", "kPa": "psi", "°C": "°F"}
_OTHER = _US | {us: si for si, us in _US.items()}
_PINT = {"m³/h": "m**3/hour", "gal/min": "gallon/minute", "°C": "degC", "°F": "degF", "in": "inch"}


@cache
def registry() -> pint.UnitRegistry[Any]:
    return pint.UnitRegistry(non_int_type=Fraction)


def restated(of: Any) -> Any:
    """Every quantity of a document in the other system, to the ten digits a file takes, by pint."""
    if isinstance(of, dict):
        return {key: restated(value) for key, value in of.items()}
    if isinstance(of, list):
        return [restated(value) for value in of]
    match = _AMOUNT.match(of) if isinstance(of, str) else None
    if match is None:
        return of
    number, unit, reference = match.groups()
    frm, to = (_PINT.get(u, u) for u in (unit, _OTHER[unit]))
    exact = Fraction(registry().Quantity(Fraction(number), frm).to(to).magnitude)
    digits = Context(prec=9).divide(Decimal(exact.numerator), Decimal(exact.denominator)).normalize()
    return f"{digits:f} {_OTHER[unit]}{reference or ''}"


def as_typed(path: Path) -> Document:
    """The file with every value as text, save the keys that hold whole numbers."""
    loaded: Document = yaml.load(path.read_text("utf-8"), yaml.BaseLoader)
    for part in (loaded["pump"], *loaded.get("line", {}).get("sections", ()), *loaded.get("cases", ())):
        part.update({key: int(part[key]) for key in ("running", "eyes", "pumps") if key in part})
    for element in (e for s in loaded.get("line", {}).get("sections", ()) for e in s["elements"]):
        element.update({key: int(element[key]) for key in ("count", "angle") if key in element})
    return loaded


@pytest.mark.parametrize("path", SAMPLES, ids=lambda p: p.stem)
def test_a_sample_restated_in_the_other_units_says_the_same(path: Path) -> None:
    typed = as_typed(path)
    other = {"US": "SI", "SI": "US"}[typed["calculation"]["units"]]
    here, there = studied(typed), studied(changed(restated(typed), {"calculation.units": other}))
    assert [(c.rule.name, c.verdict) for c in here.checks] == [(c.rule.name, c.verdict) for c in there.checks]
    for a, b in zip(here.checks, there.checks, strict=True):
        assert (a.left is None) == (b.left is None)
        if a.left is not None and b.left is not None and a.right is not None and b.right is not None:
            for x, y in ((a.left, b.left), (a.right, b.right)):
                assert x.shadow == pytest.approx(y.shadow, rel=1e-7), "full precision, on nine digits typed"
                of_record = [float((Fraction(v.record) + v.unit.offset) * v.unit.factor) for v in (x, y)]
                # A gauge pressure is a difference of two absolute ones: 2 Pa is 2e-5 of the barometer.
                room = 1e-3 if NOMENCLATURE[x.symbol].kind == "length" else max(2e-5 * abs(x.shadow), 2)
                assert of_record[0] == pytest.approx(of_record[1], abs=room), "within drift"


@pytest.mark.parametrize("path", SAMPLES, ids=lambda p: p.stem)
def test_a_sample_shown_in_the_other_system_says_the_same(path: Path) -> None:
    """The same typed file, only the display system changed."""
    typed = as_typed(path)
    other = {"US": "SI", "SI": "US"}[typed["calculation"]["units"]]
    here, there = studied(typed), studied(changed(typed, {"calculation.units": other}))
    assert [c.verdict for c in here.checks] == [c.verdict for c in there.checks]
    assert npsh(here) == pytest.approx(npsh(there), rel=1e-9)


GAUGES = (
    ("-30 kPa gauge", -30_000.0),
    ("30 kPa vacuum", -30_000.0),
    ("-300 mbar gauge", -30_000.0),
    ("-4.35113 psi gauge", -4.35113 * 6894.757293168),
    ("4.35113 psi vacuum", -4.35113 * 6894.757293168),
    ("-10.0365 ftH2O gauge", -10.0365 * 2989.06692),
    ("8.85900 inHg vacuum", -8.85900 * 3386.388640),
    ("-8.85900 inHg gauge", -8.85900 * 3386.388640),
    ("225.019 mmHg vacuum", -225.019 * 133.322387415),
    ("12.5 psi gauge", 12.5 * 6894.757293168),
    ("28.8 ftH2O gauge", 28.8 * 2989.06692),
)


@pytest.mark.parametrize("units", ["SI", "US"])
@pytest.mark.parametrize(("pressure", "pascal"), GAUGES)
def test_a_gauge_in_any_unit_reads_the_same(pressure: str, pascal: float, units: str) -> None:
    """Sizes of the units as NIST SP 811 has them (tests/checks.yaml), not as we do."""
    at_20 = plant({"readings.0.temperature": "20 °C", "calculation.units": units}, line=False, readings=1)
    study = studied(changed(at_20, {"readings.0.gauge.pressure": pressure}))
    zero = studied(changed(at_20, {"readings.0.gauge.pressure": "0 kPa gauge"}))
    assert found(study, "p_g").shadow == pytest.approx(pascal, rel=1e-8)
    moved = found(study, "NPSHA_m").shadow - found(zero, "NPSHA_m").shadow
    assert moved == pytest.approx(pascal / (998.162 * 9.80665), abs=2e-5), "density of water at 20 °C by IAPWS-95"
    printed = found(study, "NPSHA_m")
    assert float(printed.record) * float(printed.unit.factor) == pytest.approx(printed.shadow, abs=1e-3)


def test_a_dry_leg_counts_from_the_tap_and_a_filled_one_from_the_gauge() -> None:
    filled = studied(plant(line=False, readings=1))
    dry = plant({"readings.0.gauge.leg": "dry", "readings.0.gauge.tap_elevation": "-0.2 m"}, line=False, readings=1)
    assert found(filled, "NPSHA_m").shadow - found(studied(dry), "NPSHA_m").shadow == pytest.approx(
        0.3 - -0.2, abs=1e-9
    )


def test_the_measured_route_counts_from_the_pump_s_datum() -> None:
    base = studied(plant(line=False, readings=1))
    raised = studied(plant({"pump.datum_elevation.value": "0.8 m"}, line=False, readings=1))
    assert found(base, "NPSHA_m").shadow - found(raised, "NPSHA_m").shadow == pytest.approx(0.8, abs=1e-9)


# --- the barometer ----------------------------------------------------------------------------------------------------

#: Geometric altitude against pressure, U.S. Standard Atmosphere 1976 (tests/checks.yaml).
ALTITUDES = (
    ("0 m", 101325.0),
    ("500 m", 95461.3),
    ("2000 m", 79501.4),
    ("3000 m", 70121.2),
    ("5000 ft", 12.228 * 6894.757293168),
)


@pytest.mark.parametrize("units", ["SI", "US"])
@pytest.mark.parametrize(("elevation", "pascal"), ALTITUDES)
def test_the_barometer_follows_the_elevation_less_the_weather(elevation: str, pascal: float, units: str) -> None:
    site = {"elevation": elevation, "weather_allowance": "1.7 kPa", "source": "S1", "status": "verified"}
    study = studied(plant({"site": site, "calculation.units": units}))
    assert found(study, "p_b").shadow == pytest.approx(pascal - 1700, abs=4.0 if elevation == "5000 ft" else 1.0)


def test_a_station_barometer_goes_before_the_elevation() -> None:
    site = {
        "elevation": "1500 m",
        "weather_allowance": None,
        "barometer": {"lowest": "97 kPa absolute", "source": "S1"},
    }
    assert found(studied(plant({"site": {k: v for k, v in site.items() if v}})), "p_b").shadow == pytest.approx(97_000)


def test_an_allowance_comes_off_a_station_barometer_too() -> None:
    site = {"weather_allowance": "1.5 kPa", "barometer": {"normal": "99 kPa absolute"}, "source": "S1"}
    assert found(studied(plant({"site": site})), "p_b").shadow == pytest.approx(97_500)


def test_a_normal_barometer_alone_is_not_the_worst_case() -> None:
    """As with temperature: what is not the extreme must not pass for it in silence."""
    message = faults(plant({"site": {"barometer": {"normal": "101 kPa absolute"}, "source": "S1"}}))
    assert "site.barometer.normal" in message and "weather_allowance" in message


@pytest.mark.parametrize("elevation", ["20 km", "45 km", "-6 km", "60000 ft"])
def test_an_elevation_outside_the_standard_atmosphere_is_refused(elevation: str) -> None:
    site = {"elevation": elevation, "weather_allowance": "1 kPa", "source": "S1"}
    assert "site.elevation" in faults(plant({"site": site}))


# --- temperature and properties ---------------------------------------------------------------------------------------


@pytest.mark.parametrize("extreme", ["average", "normal"])
def test_a_temperature_that_is_not_the_highest_is_not_met_and_its_cost_is_told(extreme: str) -> None:
    study = studied(plant({"liquid.temperature": {extreme: "20 °C", "source": "S1"}}))
    (check,) = [c for c in study.checks if c.rule.name == "highest_temperature"]
    assert check.verdict == "not met"
    assert f"only the {extreme} temperature" in check.reason and "highest" in check.reason
    cost = found(study, "dH_c")
    # IAPWS-95: 2.3393 kPa at 20 °C and 3.1698 kPa at 25 °C on 998.162 kg/m³ (saturation tables).
    assert cost.shadow == pytest.approx((3169.8 - 2339.3) / (998.162 * 9.80665), rel=1e-3)
    assert cost.address in check.reason and "5 K" in check.reason


def test_the_cost_is_left_out_where_the_warmer_liquid_cannot_be_looked_up() -> None:
    hot = {"normal": "325 °C", "source": "S1", "status": "verified"}
    supply = {"lowest": "20 MPa absolute", "source": "S1"}
    study = studied(plant({"liquid.temperature": hot, "supply.kind": "gas_blanketed", "supply.pressure": supply}))
    assert verdicts(study)["highest_temperature"] == "not met"


def test_a_reading_at_its_own_state_is_not_the_highest_temperature() -> None:
    study = studied(
        plant(
            {"supply.level": None, "readings.0.level": None, "readings.0.temperature": "12 °C"}, line=False, readings=1
        )
    )
    (check,) = [c for c in study.checks if c.rule.name == "highest_temperature"]
    assert check.verdict == "not met" and "lower temperature" in check.reason
    assert any("own state only" in text for text in study.findings)


def test_the_coldest_result_judged_decides_whether_the_highest_temperature_was_used() -> None:
    """The design route stands at the highest temperature; a reading judged at its own state does not."""
    study = studied(plant({"readings.0.level": None, "readings.0.temperature": "12 °C"}, readings=1))
    assert len(study.judged) == 2
    assert verdicts(study)["highest_temperature"] == "not met"


OIL: Document = {
    "name": "oil",
    "temperature": {"highest": "40 °C"},
    "density": "880 kg/m³",
    "vapour_pressure": "0.01 kPa absolute",
    "viscosity": "150 cSt",
    "source": "S1",
    "status": "maker",
}


def test_a_viscous_liquid_flows_laminar_with_its_cited_properties() -> None:
    """Hagen and Poiseuille: 32 ν L V / (g D²) is lost in the pipe alone, here 10 m of 200 mm bore at 50 m³/h."""
    only = [{"id": "P", "kind": "pipe", "length": "10 m"}]
    changes = {"liquid": OIL, "pump.flow.highest": "50 m³/h", SECTION + "bore": "200 mm", SECTION + "elements": only}
    study = studied(plant(changes))
    speed = 50 / 3600 / (3.141592653589793 * 0.2**2 / 4)
    assert found(study, "Re").shadow == pytest.approx(speed * 0.2 / 150e-6, rel=1e-9)
    assert found(study, "Re").record < 2000
    assert found(study, "h_L").shadow == pytest.approx(32 * 150e-6 * 10 * speed / (9.80665 * 0.2**2), rel=1e-9)
    assert npsh(study) == pytest.approx((100_000 - 10) / (880 * 9.80665) + 1.5 - found(study, "h_L").shadow, rel=1e-9)


CITED = (
    ({"viscosity": "132 mPa·s"}, "mu", 0.132),
    ({"viscosity": "150 mm²/s"}, "mu", 150e-6 * 880),
    ({"viscosity": "0.1 lb/(ft·s)"}, "mu", 0.1 * 0.45359237 / 0.3048),
    ({"density": "55 lb/ft³"}, "rho", 55 * 16.01846337),
    ({"vapour_pressure": "0.02 psi absolute"}, "p_v", 0.02 * 6894.757293168),
)


@pytest.mark.parametrize(("change", "symbol", "expected"), CITED)
def test_a_cited_property_is_used_as_it_stands(change: dict[str, str], symbol: str, expected: float) -> None:
    assert found(studied(plant({"liquid": OIL | change})), symbol).shadow == pytest.approx(expected, rel=1e-8)


def test_a_cited_property_of_water_replaces_the_look_up_at_its_temperature_only() -> None:
    document = plant(
        {"liquid.vapour_pressure": {"value": "4 kPa absolute", "source": "S1"}, "readings.0.temperature": "15 °C"},
        readings=1,
    )
    study = studied(document)
    cited = [x for x in study.ledger.lines() if x.value.symbol == "p_v"]
    assert {x.kind for x in cited} == {"given", "conversion", "lookup"}
    assert found(study, "p_v", "Vapour pressure, absolute, cited").shadow == pytest.approx(4000)
    # IAPWS-95 at 15 °C: 1.7058 kPa.
    assert next(x.value.shadow for x in cited if x.kind == "lookup") == pytest.approx(1705.8, rel=1e-4)


def test_a_liquid_without_look_up_is_refused_at_another_temperature() -> None:
    message = faults(plant({"liquid": OIL, "readings.0.temperature": "15 °C"}, readings=1))
    assert "readings[1].temperature" in message and "holds at one temperature" in message


REYNOLDS = (
    (0.5, "laminar", False),
    (0.95, "laminar", False),
    (1.05, "transition", True),
    (1.9, "transition", True),
    (2.2, "turbulent", False),
)


@pytest.mark.parametrize(("times", "zone", "finding"), REYNOLDS)
def test_the_transition_zone_is_a_finding(times: float, zone: str, finding: bool) -> None:
    """Between Re 2000 and 4000 the turbulent factor is taken, which is the greater, and the doubt is said."""
    flow = times * 2000 * 150e-6 * 3.141592653589793 * 0.2 / 4 * 3600
    study = studied(plant({"liquid": OIL, "pump.flow.highest": f"{flow:.4f} m³/h", SECTION + "bore": "200 mm"}))
    assert any("uncertain" in text for text in study.findings) is finding
    friction = found(study, "f")
    reynolds = found(study, "Re").shadow
    assert reynolds == pytest.approx(times * 2000, rel=1e-4)
    if zone == "laminar":
        assert friction.shadow == pytest.approx(64 / reynolds, rel=1e-12)
    else:
        assert friction.shadow > 64 / reynolds
    (line,) = [x for x in study.ledger.lines() if x.value.symbol == "f"]
    assert ("uncertain" in line.validity) is finding


# --- rules in their plants --------------------------------------------------------------------------------------------


def test_a_main_has_no_surface_and_so_no_submergence() -> None:
    main = {"supply": {"name": "main M-4", "kind": "main"}, "readings.0.level": None}
    study = studied(plant(main, line=False, readings=1))
    (check,) = [c for c in study.checks if c.rule.name == "submergence"]
    assert check.verdict == "not applicable" and "main M-4" in check.reason and "no free surface" in check.reason
    assert (check.left, check.right) == (None, None)


INTAKES: tuple[tuple[dict[str, Any], str, str], ...] = (
    ({}, "not assessed", "no inlet"),
    ({"intake": INTAKE}, "met", "centreline"),
    ({"intake": INTAKE | {"elevation": "1.4 m"}}, "not met", "centreline"),
    ({"intake": INTAKE | {"reference": "bell_lip"}}, "met", "bell lip"),
)


@pytest.mark.parametrize(("changes", "verdict", "word"), INTAKES)
def test_submergence_is_judged_where_the_file_describes_an_inlet(
    changes: dict[str, Any], verdict: str, word: str
) -> None:
    study = studied(plant(changes))
    (check,) = [c for c in study.checks if c.rule.name == "submergence"]
    assert check.verdict == verdict and word in check.reason


def test_submergence_needs_a_level() -> None:
    study = studied(plant({"intake": INTAKE, "supply.level": None, "readings.0.level": None}, line=False, readings=1))
    (check,) = [c for c in study.checks if c.rule.name == "submergence"]
    assert check.verdict == "not assessed" and "level" in check.reason


FLOWS = (("199.9 m³/h", "not assessed", "lower flow"), ("200 m³/h", "met", "ratio"), ("240 m³/h", "met", "safe side"))


@pytest.mark.parametrize(("at_flow", "verdict", "word"), FLOWS)
def test_npsh_required_stated_at_a_lower_flow_is_not_assessed(at_flow: str, verdict: str, word: str) -> None:
    study = studied(plant({"pump.npsh_required.at_flow": at_flow}))
    (check,) = [c for c in study.checks if c.rule.name == "npsh_margin"]
    assert check.verdict == verdict and word in check.reason


MARGINS: tuple[tuple[dict[str, str], float, str], ...] = (
    ({"ratio": "1.1"}, 5.5, "ratio"),
    ({"difference": "0.7 m"}, 5.7, "difference"),
    ({"ratio": "1.1", "difference": "0.7 m"}, 5.7, "difference"),
    ({"ratio": "1.3", "difference": "0.7 m"}, 6.5, "ratio"),
    ({"ratio": "1.1", "difference": "0.5 m"}, 5.5, "ratio"),
)


@pytest.mark.parametrize(("asked", "needed", "word"), MARGINS)
def test_the_greater_margin_governs(asked: dict[str, str], needed: float, word: str) -> None:
    study = studied(plant({"criteria.npsh_margin": asked}))
    assert study.judged[0].needed.limit.shadow == pytest.approx(needed) and word in study.judged[0].needed.governs
    assert ("governs" in study.judged[0].needed.governs) is (len(asked) == 2), "one margin alone governs nothing"
    for name, symbol in (("ratio", "M_r"), ("difference", "M_d")):
        assert found(study, symbol).shadow > 0, f"the margin {name} is printed whichever is asked for"


BOILING: tuple[dict[str, Any], ...] = (
    {"liquid.temperature.highest": "101 °C"},
    {"liquid.temperature.highest": "100 °C", "site.barometer.lowest": "90 kPa absolute"},
    {
        "liquid.temperature.highest": "125 °C",
        "supply.kind": "gas_blanketed",
        "supply.pressure": {"lowest": "98 kPa gauge", "source": "S1"},
    },
    {
        "liquid.temperature.highest": "65 °C",
        "supply.kind": "gas_blanketed",
        "supply.pressure": {"lowest": "19.9 kPa absolute", "source": "S1"},
    },
)


@pytest.mark.parametrize("changes", BOILING)
def test_a_liquid_that_boils_at_the_surface_is_a_fault(changes: dict[str, Any]) -> None:
    message = faults(plant(changes))
    assert "boils at the surface" in message and "vapour pressure" in message


def test_a_liquid_just_below_boiling_is_not() -> None:
    """Water at 60 °C boils under 19.9464 kPa (tests/checks.yaml)."""
    changes = {
        "liquid.temperature.highest": "60 °C",
        "supply.kind": "gas_blanketed",
        "supply.pressure": {"lowest": "19.95 kPa absolute", "source": "S1"},
    }
    assert npsh(studied(plant(changes))) < 1.5


def test_readings_that_show_more_than_the_surface_offers_are_a_finding() -> None:
    study = studied(plant({"readings.0.gauge.pressure": "40 kPa gauge"}, line=False, readings=1))
    assert any("more head than the surface offers" in text for text in study.findings)


def test_readings_in_doubt_are_not_judged() -> None:
    """A reading that shows a gain where there can only be loss settles nothing."""
    study = studied(plant({"readings.0.gauge.pressure": "40 kPa gauge"}, line=False, readings=1))
    (check,) = [c for c in study.checks if c.rule.name == "npsh_margin"]
    assert check.verdict == "not assessed" and "more head than the surface offers" in check.reason


BEYOND = (
    ("barometer", "99.9 kPa absolute", "below the lowest"),
    ("level", "1.49 m", "below the lowest"),
    ("flow", "201 m³/h", "above the highest"),
    ("temperature", "25.1 °C", "above the highest"),
)


@pytest.mark.parametrize(("key", "read", "word"), BEYOND)
def test_a_reading_beyond_the_extremes_of_the_file_is_a_finding(key: str, read: str, word: str) -> None:
    base = studied(plant(readings=1))
    study = studied(plant({f"readings.0.{key}": read}, readings=1))
    assert not any("the file states" in text for text in base.findings)
    (told,) = [text for text in study.findings if "the file states" in text]
    assert key in told and read in told and word in told


def test_a_reading_warmer_than_expected_goes_before_what_was_expected() -> None:
    study = studied(plant({"readings.0.temperature": "27 °C"}, readings=1))
    assert verdicts(study)["highest_temperature"] == "not met"


UNLIKE_WATER = (("density", "850 kg/m³", True), ("density", "1025 kg/m³", False), ("vapour_pressure", "3.17 psi absolute", True),
                ("vapour_pressure", "3.1 kPa absolute", False))  # fmt: skip


@pytest.mark.parametrize(("name", "cited", "finding"), UNLIKE_WATER)
def test_a_cited_property_that_water_does_not_have_is_a_finding(name: str, cited: str, finding: bool) -> None:
    study = studied(plant({f"liquid.{name}": {"value": cited, "source": "S1"}}))
    assert any("is not that of water" in text for text in study.findings) is finding


def test_a_difference_between_model_and_reading_is_a_finding() -> None:
    study = studied(plant(readings=2))
    told = [text for text in study.findings if "than the model" in text]
    assert len(told) == 2 == len(study.differences)


# --- what must be refused, not crash ----------------------------------------------------------------------------------

REFUSED: dict[str, dict[str, Any]] = {
    "roughness above the bore": {
        SECTION + "material": None,
        SECTION + "roughness": {"value": "600 mm", "source": "S1"},
    },
    "bore below the roughness": {SECTION + "bore": "0.01 mm"},
    "nominal size without a denominator": {
        SECTION + "bore": None,
        SECTION + "size": "NPS 1/0",
        SECTION + "schedule": "40",
    },
    "nominal size of no table": {SECTION + "bore": None, SECTION + "size": "NPS 99", SECTION + "schedule": "40"},
    "schedule of no table": {SECTION + "bore": None, SECTION + "size": "NPS 8", SECTION + "schedule": "999"},
    "flow beyond all measure": {"pump.flow.highest": "1e90 m³/h"},
    "fitting the set does not have": {
        SECTION + "elements.2": {"id": "3", "kind": "elbow", "radius": "long", "angle": 45}
    },
    "butterfly valve larger than the table": {
        SECTION + "bore": "900 mm",
        SECTION + "elements.2": {"id": "3", "kind": "valve", "type": "butterfly"},
    },
    "a pump that needs nothing": {"pump.npsh_required.value": "0 m"},
    "a margin below what the pump needs": {"criteria.npsh_margin": {"ratio": "0.9"}},
    "a level on another datum": {"supply.level.lowest": "1250 m"},
    "an inlet on another datum": {"intake": INTAKE | {"elevation": "1250 m"}},
    "ice": {"liquid.temperature.highest": "-1 °C"},
    "steam": {"liquid.temperature.highest": "340 °C"},
}


@pytest.mark.parametrize("changes", REFUSED.values(), ids=REFUSED)
def test_what_cannot_be_computed_is_a_fault_in_its_place(changes: dict[str, Any]) -> None:
    message = faults(plant(changes))
    assert re.match(r"plant\.yaml:[0-9]+:[0-9]+: ", message), "file, line and column"


def test_a_gauge_below_absolute_zero_is_refused() -> None:
    reading = {"readings.0.gauge.pressure": "-99 kPa gauge", "readings.0.barometer": "97 kPa absolute"}
    assert "readings[1].gauge.pressure" in faults(plant(reading, line=False, readings=1))


@pytest.mark.parametrize("units", ["SI", "US"])
@pytest.mark.parametrize("fahrenheit", range(240, 391, 10))
def test_hot_water_can_be_judged(fahrenheit: int, units: str) -> None:
    """Line rounding must not keep an ordinary plant, a vessel 5 % above boiling, from a verdict that is not in doubt."""
    from CoolProp.CoolProp import PropsSI

    boiling = PropsSI("P", "T", (fahrenheit + 459.67) / 1.8, "Q", 0, "Water") / 6894.757
    vessel = {"lowest": f"{boiling * 1.05 + 4:.1f} psi absolute", "source": "S1", "status": "verified"}
    changes = {
        "calculation.units": units,
        "liquid.temperature.highest": f"{fahrenheit} °F",
        "supply.kind": "gas_blanketed",
        "supply.pressure": vessel,
        "supply.level.lowest": "27.3 ft",
    }
    study = studied(plant(changes))
    (check,) = [c for c in study.checks if c.rule.name == "npsh_margin"]
    assert check.verdict in ("met", "not met"), check.reason
