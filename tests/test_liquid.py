"""Liquids: looked up, mixed with water, cited singly or in a table, and read between its rows."""

from __future__ import annotations

import math
from collections.abc import Mapping
from decimal import Decimal
from fractions import Fraction
from typing import Any

import pytest
from hypothesis import given, settings
from hypothesis import strategies as st
from plants import plant, recorded, written
from reader_packages import next_digit

from calcpack import lookup
from calcpack.arithmetic import InFloat, evaluate
from calcpack.catalog import EQUATION, EQUATIONS
from calcpack.faults import InputFault
from calcpack.ledger import Ledger
from calcpack.lookup import LIQUIDS, OutOfRange, liquid
from calcpack.page.pdf import render
from calcpack.quantity import Quantity, parse, unit
from calcpack.reader import verify
from calcpack.source import loads
from calcpack.study.entry import Entry
from calcpack.study.liquid import (
    Liquid,
    at,
    cost_of_temperature,
    vapour_pressure_beside,
    viscosity,
)  # fmt: skip
from calcpack.study.mistakes import properties, search
from calcpack.study.results import Results
from calcpack.study.state import as_found, worst_case
from calcpack.symbols import NOMENCLATURE
from calcpack.value import Value, drift, in_si

PURE = {name: source for name, source in LIQUIDS.items() if not source.mixture}
MIXED = {name: source for name, source in LIQUIDS.items() if source.mixture}
CELSIUS = 273.15


class Plant:
    """A plant with its liquid entered, for one look at a time."""

    def __init__(self, of: Mapping[str, Any], units: str = "SI", **more: Any) -> None:
        changes = {"liquid": {"source": "S1", "status": "verified"} | dict(of), "calculation.units": units, **more}
        readings = 1 if any(key.startswith("readings") for key in changes) else 0
        self.calculation = loads(written(plant(changes, readings=readings)), "liquid.yaml")
        self.entry = Entry(self.calculation, Ledger(units))
        self.entry.ledger.part("liquid", "")
        self.state = worst_case(self.calculation)

    def at(self) -> Liquid:
        return at(self.entry, self.state)

    def viscosity(self) -> Value:
        return viscosity(self.entry, self.state, self.at())

    def kinds(self, symbol: str) -> list[str]:
        return [line.kind for line in self.entry.ledger.lines() if line.value.symbol == symbol]


def hot(temperature: str, **more: Any) -> dict[str, Any]:
    return {"name": "test liquid", "temperature": {"highest": temperature}, **more}


def row(temperature: str, density: str = "", viscosity: str = "", vapour_pressure: str = "") -> dict[str, str]:
    return {"temperature": temperature} | {
        name: text
        for name, text in (("density", density), ("viscosity", viscosity), ("vapour_pressure", vapour_pressure))
        if text
    }


# --- the table of liquids -----------------------------------------------------------------------------------------


@pytest.mark.parametrize("name", PURE)
def test_a_pure_liquid_is_looked_up_from_one_end_of_its_range_to_the_other(name: str) -> None:
    from CoolProp.CoolProp import PropsSI

    source = PURE[name]
    assert PropsSI("Ttriple", source.fluid) <= source.lowest < source.highest < 0.95 * PropsSI("Tcrit", source.fluid)
    for kelvin in (source.lowest, source.highest):
        for property_name in lookup.PROPERTIES:
            if source.offers(property_name):
                assert liquid(name, property_name, kelvin) > 0
    for kelvin in (source.lowest - 0.01, source.highest + 0.01):
        with pytest.raises(OutOfRange, match="between"):
            liquid(name, "density", kelvin)


@pytest.mark.parametrize("name", PURE)
def test_the_formulations_cited_are_those_the_library_names(name: str) -> None:
    from CoolProp.CoolProp import get_BibTeXKey

    source = PURE[name]
    ours = {"iapws95": "Wagner-JPCRD-2002", "iapws08": "Huber-JPCRD-2009"}
    if lookup.library("CoolProp") >= "CoolProp 7":
        ours["Piazza-FPE-2013"] = "deReuck-BOOK-1993"  # the reference names both
    assert get_BibTeXKey(source.fluid, "EOS") == ours.get(source.state, source.state)
    if source.flow:
        assert get_BibTeXKey(source.fluid, "VISCOSITY") == ours.get(source.flow, source.flow)


@pytest.mark.parametrize("name", MIXED)
def test_a_mixture_is_looked_up_from_freezing_to_the_end_of_its_range(name: str) -> None:
    from CoolProp.CoolProp import PropsSI

    source = MIXED[name]
    for fraction in (0.05, source.most / 2, source.most):
        lowest = source.lowest
        if source.freezes:
            lowest = PropsSI("T_freeze", "T", 300, "P", 101325, f"INCOMP::{source.fluid}[{fraction}]")
            assert source.lowest < lowest < CELSIUS
        for kelvin in (lowest + 1e-6, source.highest):
            assert 900 < liquid(name, "density", kelvin, fraction) < 1500
            assert liquid(name, "viscosity", kelvin, fraction) > 1e-4
        for kelvin in (lowest - 0.01, source.highest + 0.01):
            with pytest.raises(OutOfRange, match=f"{name} is looked up, between"):
                liquid(name, "density", kelvin, fraction)
    with pytest.raises(OutOfRange, match="dissolved"):
        liquid(name, "density", 300.0, source.most + 0.001)


@pytest.mark.parametrize("name", MIXED)
def test_the_pressure_asked_for_takes_no_part_in_a_mixture(name: str) -> None:
    from CoolProp.CoolProp import PropsSI

    source = MIXED[name]
    for output in ("D", "V"):
        asked = [PropsSI(output, "T", 300, "P", p, f"INCOMP::{source.fluid}[0.1]") for p in (101325, 1e6, 2e6)]
        assert asked[0] == asked[1] == asked[2]


def test_a_mixture_with_nothing_dissolved_is_nearly_water() -> None:
    for name, source in MIXED.items():
        if source.fluid != "MGL":  # its correlation is poor at the dilute end
            assert liquid(name, "density", 298.15, 0.0) == pytest.approx(997.05, rel=2e-3)
            assert liquid(name, "viscosity", 298.15, 0.0) == pytest.approx(890e-6, rel=0.03)


#: Saturated liquids by other correlations than the library's: vapour pressure and density by Perry's Handbook, 8th ed.,
#: tables 2-8 and 2-32, viscosity by the VDI Heat Atlas (PPDS equation), as the library chemicals 1.5.2 evaluates them.
#: Temperature K, Pa, kg/m³, Pa·s; the viscosity is None where ours must be cited.
ELSEWHERE = (
    ("ammonia", 273.15, 4.2861e05, 637.89, 169.3e-6),
    ("propane", 293.15, 8.3749e05, 498.95, 102.9e-6),
    ("n-butane", 293.15, 2.0799e05, 579.14, 166.6e-6),
    ("isobutane", 263.15, 1.0911e05, 592.5, 223.5e-6),
    ("propylene", 273.15, 5.9304e05, 546.17, None),
    ("methanol", 313.15, 35362, 774.97, 442.1e-6),
    ("ethanol", 313.15, 17994, 772.26, 810.2e-6),
    ("acetone", 313.15, 56498, 769.22, None),
    ("benzene", 313.15, 24299, 857.78, 499.1e-6),
    ("toluene", 313.15, 7880.3, 850.06, 462.7e-6),
    ("o-xylene", 313.15, 2047.9, 863.58, 628.1e-6),
    ("m-xylene", 313.15, 2537.3, 847.57, 491.7e-6),
    ("p-xylene", 313.15, 2643.3, 844.02, 508.3e-6),
    ("n-pentane", 313.15, 1.1572e05, 606.36, None),
    ("isopentane", 313.15, 1.5131e05, 600.48, None),
    ("cyclopentane", 313.15, 73940, 727.78, None),
    ("n-hexane", 313.15, 37445, 642.29, 263.7e-6),
    ("cyclohexane", 313.15, 24603, 759.49, 707.3e-6),
    ("n-heptane", 313.15, 12279, 668.67, 333.4e-6),
    ("n-octane", 313.15, 4143.1, 690.31, 434e-6),
    ("n-decane", 313.15, 483.03, 716.63, 720.9e-6),
    ("n-dodecane", 313.15, 58.069, 735.73, 1073e-6),
)


@pytest.mark.parametrize(("name", "kelvin", "pressure", "density", "viscous"), ELSEWHERE)
def test_a_pure_liquid_is_as_other_correlations_have_it(
    name: str, kelvin: float, pressure: float, density: float, viscous: float | None
) -> None:
    assert liquid(name, "vapour_pressure", kelvin) == pytest.approx(pressure, rel=0.016)
    assert liquid(name, "density", kelvin) == pytest.approx(density, rel=0.006)
    assert LIQUIDS[name].offers("viscosity") is (viscous is not None)
    if viscous is not None:
        assert liquid(name, "viscosity", kelvin) == pytest.approx(viscous, rel=0.05)


def test_every_pure_liquid_is_compared_with_something_else() -> None:
    """Water and R134a have published checks of their own."""
    assert {name for name, *_ in ELSEWHERE} | {"water", "R134a"} == set(PURE)


@pytest.mark.parametrize("kelvin", [283.15, 293.15, 303.15])
@pytest.mark.parametrize(
    ("name", "fluid"),
    [("ethylene glycol", "MEG2"), ("calcium chloride brine", "MCA2"), ("sodium chloride brine", "VNA")],
)
def test_mixtures_are_as_other_correlations_have_them(name: str, fluid: str, kelvin: float) -> None:
    """Correlations by other authors (Skovrup 2013 after Melinder, VDI) beside those taken, through the same library."""
    from CoolProp.CoolProp import PropsSI

    if kelvin < 303 or fluid == "MEG2":
        density, viscous = (PropsSI(k, "T", kelvin, "P", 1e6, f"INCOMP::{fluid}[0.15]") for k in "DV")
        assert liquid(name, "density", kelvin, 0.15) == pytest.approx(density, rel=0.005)
        assert liquid(name, "viscosity", kelvin, 0.15) == pytest.approx(viscous, rel=0.06)


# --- the look-up in the ledger ------------------------------------------------------------------------------------


@pytest.mark.parametrize("system", ["SI", "US"])
def test_a_mixture_is_looked_up_at_temperature_and_fraction_as_typed(system: str) -> None:
    from CoolProp.CoolProp import PropsSI

    ledger = Ledger(system)
    ledger.part("liquid", "")
    temperature = ledger.given("T", "temperature", parse("68 °F", "temperature"))
    share = ledger.given("w", "share", parse("33.3 %", "mass_fraction"))
    value = ledger.look_up("ethylene glycol", "density", temperature, share)
    assert ledger.look_up("ethylene glycol", "density", temperature, share) is value
    line = next(line for line in ledger.lines() if line.kind == "lookup")
    kelvin = float((Fraction("68") + Fraction("459.67")) * Fraction(5, 9))
    assert value.shadow == pytest.approx(PropsSI("D", "T", kelvin, "P", 101325, "INCOMP::MEG[0.333]"), rel=1e-12)
    assert [(symbol, v.address) for symbol, v in line.operands] == [("T", "4.1"), ("w", "4.2")]
    assert line.function == "rho(T, w)" and line.library.endswith("(INCOMP::MEG at 1 MPa)")
    assert line.validity == "freezing to 373.15 K, at most 60 % dissolved" and line.cite.key == "Melinder2010"
    assert float(in_si(value)) == pytest.approx(value.shadow, rel=6e-6)


def test_look_ups_of_two_liquids_or_shares_are_two_lines() -> None:
    ledger = Ledger("SI")
    ledger.part("liquid", "")
    temperature = ledger.given("T", "temperature", parse("20 °C", "temperature"))
    shares = [ledger.given("w", f"share {text}", parse(text, "mass_fraction")) for text in ("20 %", "30 %")]
    found = [ledger.look_up(name, "density", temperature) for name in ("water", "toluene")]
    found += [ledger.look_up("propylene glycol", "density", temperature, share) for share in shares]
    assert len({value.address for value in found}) == 4 and len({value.record for value in found}) == 4


# --- mixtures with water ------------------------------------------------------------------------------------------

GLYCOL = {"name": "ethylene glycol", "mass_fraction": "50 %"}


@pytest.mark.parametrize(("units", "of"), [("SI", ""), ("US", ""), ("SI", "water"), ("US", "raoult")])
def test_the_vapour_pressure_of_a_glycol_is_pure_water_s_unless_raoult_is_asked_for(units: str, of: str) -> None:
    """IAPWS-95 at 80 °C: 47.414 kPa; the mole fraction of water at 50 % by mass is 0.7750."""
    changes = GLYCOL | {"temperature": {"highest": "80 °C"}} | ({"vapour_pressure_of": of} if of else {})
    made = Plant(changes, units)
    expected = 47414 * (0.7750 if of == "raoult" else 1)
    assert made.at().vapour_pressure.shadow == pytest.approx(expected, rel=2e-4)
    assert ("vapour_pressure_of" in made.entry.assumptions) is (not of)
    assert ("raoult" in made.entry.assumptions) is (of == "raoult")
    assert drift(made.at().vapour_pressure) < Decimal("1e-5") * made.at().vapour_pressure.record


def test_sea_water_has_its_own_form_of_raoult_s_law() -> None:
    """3.1053 kPa at 25 °C and 35 g/kg by Sharqawy et al. (2010)."""
    sea = {"name": "sea water", "salinity": "35 g/kg", "temperature": {"highest": "25 °C"}}
    assert Plant(sea | {"vapour_pressure_of": "raoult"}).at().vapour_pressure.shadow == pytest.approx(3105.3, rel=1e-3)
    pure = Plant(sea).at()
    assert pure.vapour_pressure.shadow == pytest.approx(3169.9, rel=1e-3)
    assert pure.density.shadow == pytest.approx(1023.34, rel=1e-3)  # IAPWS R13-08 at 25 °C, through iapws 1.5.5


@pytest.mark.parametrize("of", ["", "raoult"])
def test_below_the_triple_point_of_water_its_vapour_pressure_is_taken_there(of: str) -> None:
    """611.655 Pa (IAPWS R6-95), which is more than that of colder water."""
    changes = GLYCOL | {"temperature": {"highest": "-10 °C"}} | ({"vapour_pressure_of": of} if of else {})
    made = Plant(changes)
    assert made.at().vapour_pressure.shadow == pytest.approx(611.655 * (0.7750 if of else 1), rel=2e-4)
    assert "triple_point" in made.entry.assumptions
    assert vapour_pressure_beside(made.entry, made.state, "dT") is None


@pytest.mark.parametrize(
    ("changes", "key", "said"),
    [
        (GLYCOL | {"mass_fraction": "61 %"}, "liquid.mass_fraction", "at most 60 %"),
        (GLYCOL | {"temperature": {"highest": "-40 °C"}}, "liquid.temperature.highest", "freezing point"),
        (GLYCOL | {"temperature": {"highest": "101 °C"}}, "liquid.temperature.highest", "100.00 °C"),
        (
            {"name": "propane", "temperature": {"highest": "70 °C"}},
            "liquid.temperature.highest",
            "propane is looked up",
        ),
        ({"name": "benzene", "temperature": {"highest": "5 °C"}}, "liquid.temperature.highest", "280.00 K"),
    ],
)
def test_outside_the_formulation_the_file_is_refused_where_it_says_so(
    changes: dict[str, Any], key: str, said: str
) -> None:
    made = Plant({"temperature": {"highest": "20 °C"}} | changes)
    with pytest.raises(InputFault) as refused:
        made.viscosity()
    assert key in str(refused.value) and said in str(refused.value)


def test_a_liquid_without_a_viscosity_to_look_up_has_it_cited() -> None:
    pentane = {"name": "n-pentane", "temperature": {"highest": "25 °C"}, "viscosity": "0.224 mPa·s"}
    made = Plant(pentane)
    assert made.viscosity().shadow == pytest.approx(0.224e-3) and made.kinds("mu") == ["given", "conversion"]
    assert made.at().vapour_pressure.shadow == pytest.approx(68.3e3, rel=0.01)  # NIST: 68.3 kPa (recalled)
    with pytest.raises(InputFault, match="viscosity"):
        Plant({key: value for key, value in pentane.items() if key != "viscosity"})


# --- cited values and tables --------------------------------------------------------------------------------------


def test_a_single_value_goes_before_the_table_and_the_table_before_the_look_up() -> None:
    table = [row("20 °C", density="990 kg/m³"), row("40 °C", density="980 kg/m³")]
    water = {"name": "water", "temperature": {"highest": "30 °C"}}
    assert Plant(water).at().density.shadow == pytest.approx(995.6, rel=1e-3)
    assert Plant(water | {"table": table}).at().density.shadow == pytest.approx(985, rel=1e-9)
    assert Plant(water | {"table": table, "density": "999 kg/m³"}).at().density.shadow == 999


def test_beside_a_single_value_another_state_takes_the_table_or_the_look_up() -> None:
    table = [row("10 °C", "990 kg/m³"), row("30 °C", "980 kg/m³")]
    water = {"name": "water", "temperature": {"highest": "30 °C"}, "density": "999 kg/m³"}
    for changes, expected in ((water, 998.16), (water | {"table": table}, 985)):
        made = Plant(changes, **{"readings.0.temperature": "20 °C"})
        state = as_found(made.calculation.readings[0])
        assert at(made.entry, state).density.shadow == pytest.approx(expected, rel=1e-4)


#: Published rows (Bachus and Custodio, 2003) and the value between them: 145 °F, 3.2814 psi by hand,
#: 2.889·(3.718/2.889)^y, y = (1/599.67 − 1/604.67)/(1/599.67 − 1/609.67) = 0.504134.
STEAM = [row("140 °F", vapour_pressure="2.889 psi absolute"), row("150 °F", vapour_pressure="3.718 psi absolute")]


@pytest.mark.parametrize("units", ["SI", "US"])
def test_vapour_pressure_between_two_published_rows_is_what_a_hand_calculation_finds(units: str) -> None:
    made = Plant(hot("145 °F", density="61.3 lb/ft³", viscosity="0.44 cP", table=STEAM), units)
    place = (1 / 599.67 - 1 / 604.67) / (1 / 599.67 - 1 / 609.67)
    assert place == pytest.approx(0.504134, abs=1e-6)
    expected = 2.889 * (3.718 / 2.889) ** place
    assert expected == pytest.approx(3.2809, abs=1e-3)
    assert made.at().vapour_pressure.shadow == pytest.approx(expected * 6894.757293168, rel=1e-9)
    # IAPWS-95 at 145 °F, through the library: the rows lie up to 0.2 % from it themselves.
    assert made.at().vapour_pressure.shadow == pytest.approx(liquid("water", "vapour_pressure", 335.9278), rel=2e-3)


@pytest.mark.parametrize("name", ["water", "propane", "toluene", "ethanol"])
@pytest.mark.parametrize("step", [5, 10, 20])
def test_reading_between_rows_is_near_the_liquid_itself(name: str, step: int) -> None:
    """Rows of the library's own values; halfway the error grows with the square of their distance: 0.3 % at 20 K."""
    low, middle, high = 300.0, 300.0 + step / 2, 300.0 + step
    table = [
        row(
            f"{kelvin} K",
            f"{liquid(name, 'density', kelvin):.4f} kg/m³",
            f"{liquid(name, 'viscosity', kelvin):.6g} Pa·s",
            f"{liquid(name, 'vapour_pressure', kelvin) / 1000:.7g} kPa absolute",
        )
        for kelvin in (low, high)
    ]
    made = Plant(hot(f"{middle} K", table=table))
    found = made.at()
    assert found.vapour_pressure.shadow == pytest.approx(
        liquid(name, "vapour_pressure", middle), rel=3.5e-3 * (step / 20) ** 2
    )
    assert found.density.shadow == pytest.approx(liquid(name, "density", middle), rel=2e-3)
    assert made.viscosity().shadow == pytest.approx(liquid(name, "viscosity", middle), rel=0.01)


def test_at_a_row_s_own_temperature_its_own_value_is_used() -> None:
    table = [
        row("59 °F", "61 lb/ft³", "3 cSt", "1 psi absolute"),
        row("20 °C", "60 lb/ft³", "2 cSt", "2 psi absolute"),
        row("86 °F", "59 lb/ft³", "1 cSt", "3 psi absolute"),
    ]
    made = Plant(hot("68 °F", table=table))
    assert made.at().density.shadow == pytest.approx(60 * 16.01846337, rel=1e-8)
    assert made.viscosity().shadow == pytest.approx(2e-6 * 60 * 16.01846337, rel=1e-8)
    assert not made.kinds("y") and made.kinds("p_v") == ["given", "conversion"]


@pytest.mark.parametrize("temperature", ["9.99 °C", "40.01 °C"])
def test_beyond_the_table_is_refused_with_its_range(temperature: str) -> None:
    table = [row("10 °C", "900 kg/m³", "9 cP", "1 kPa absolute"), row("40 °C", "880 kg/m³", "3 cP", "4 kPa absolute")]
    with pytest.raises(InputFault) as refused:
        Plant(hot(temperature, table=table)).at()
    assert "liquid.temperature.highest" in str(refused.value) and "10 °C to 40 °C" in str(refused.value)


TEMPERATURES = st.integers(-2000, 20000).map(lambda n: n / 100)


@settings(max_examples=60, deadline=None)
@given(
    st.lists(TEMPERATURES, min_size=2, max_size=4, unique=True).map(sorted),
    st.lists(st.floats(-3, 4).map(lambda x: round(10**x, 4)), min_size=4, max_size=4, unique=True).map(sorted),
    st.floats(0, 1),
    st.floats(0, 1),
    st.sampled_from(["°C", "°F"]),
    st.sampled_from(["SI", "US"]),
)
def test_a_value_read_lies_between_its_neighbours_and_rises_with_temperature(
    temperatures: list[float], pressures: list[float], first: float, second: float, scale: str, units: str
) -> None:
    """Whatever the rows: no over- or undershoot, in order, and the record with its shadow in each system's own degrees."""
    table = [
        row(f"{t:.2f} {scale}", "900 kg/m³", "5 cP", f"{p} kPa absolute")
        for t, p in zip(temperatures, pressures, strict=False)
    ]
    span = temperatures[-1] - temperatures[0]
    found: list[float] = []
    for share in sorted((first, second)):
        temperature = min(max(round(temperatures[0] + share * span, 2), temperatures[0]), temperatures[-1])
        value = Plant(hot(f"{temperature:.2f} {scale}", table=table), units).at().vapour_pressure
        below = max(p for t, p in zip(temperatures, pressures, strict=False) if t <= temperature)
        above = min(p for t, p in zip(temperatures, pressures, strict=False) if t >= temperature)
        assert below * 1000 * (1 - 1e-9) <= value.shadow <= above * 1000 * (1 + 1e-9)
        found.append(value.shadow)
        if (scale, units) != ("°F", "SI") and (
            min(b - a for a, b in zip(temperatures, temperatures[1:], strict=False)) > 1
        ):
            assert float(in_si(value)) == pytest.approx(value.shadow, rel=1e-5)
    assert found == sorted(found)


@pytest.mark.parametrize(
    ("scale", "units", "most"), [("°C", "SI", 6e-6), ("°F", "US", 6e-6), ("°C", "US", 6e-6), ("°F", "SI", 6e-5)]
)
def test_the_two_books_agree_between_rows(scale: str, units: str, most: float) -> None:
    """Kelvin at six digits holds what is typed in °C exactly, degrees Rankine what is typed in °F.

    A table in °F shown in SI loses up to half a millikelvin a temperature; what that costs is bounded here.
    """
    worst = 0.0
    for n in range(40):
        base = 37 + 5 * n
        table = [row(f"{base + k} {scale}", "900 kg/m³", "5 cP", f"{p} kPa absolute") for k, p in ((0, 100), (10, 140))]
        value = Plant(hot(f"{base + 3.7:.1f} {scale}", table=table), units).at().vapour_pressure
        worst = max(worst, abs(float(in_si(value)) / value.shadow - 1))
    assert worst < most


ABSOLUTE = {name for name, symbol in NOMENCLATURE.items() if symbol.kind == "absolute_temperature"}


@pytest.mark.parametrize("name", [e.name for e in EQUATIONS if set(e.operands) & ABSOLUTE])
def test_a_formula_takes_ratios_of_absolute_temperatures_only(name: str) -> None:
    """So that kelvin and degrees Rankine give the same; no temperature of another kind stands beside them."""
    equation = EQUATION[name]
    assert equation.result not in ABSOLUTE
    others = [s for s in equation.operands if NOMENCLATURE[s].kind.endswith("temperature") and s not in ABSOLUTE]
    assert not others
    values = {symbol: 2.0 + n for n, symbol in enumerate(equation.operands)}
    values |= {"T_1": 280.0, "T_t": 283.0, "T_2": 290.0}
    rankine = {s: 1.8 * x if s in ABSOLUTE else x for s, x in values.items()}
    found = [evaluate(equation.tree, each, InFloat()) for each in (values, rankine)]
    assert found[0] == pytest.approx(found[1], rel=1e-12)


# --- dissolved gas ------------------------------------------------------------------------------------------------


def test_an_effective_vapour_pressure_says_so_and_holds_at_its_temperature() -> None:
    water = {"name": "water", "temperature": {"highest": "30 °C"}, "vapour_pressure_kind": "effective"}
    made = Plant(water | {"vapour_pressure": "9 kPa absolute"}, **{"readings.0.temperature": "20 °C"})
    assert made.at().vapour_pressure.title.startswith("Effective vapour pressure (dissolved gas), absolute, cited")
    with pytest.raises(InputFault, match="effective vapour pressure of water is not looked up"):
        at(made.entry, as_found(made.calculation.readings[0]))
    assert any("effective one" in text for text in asked(made))
    table = [row("10 °C", vapour_pressure="5 kPa absolute"), row("30 °C", vapour_pressure="9 kPa absolute")]
    tabulated = Plant(water | {"table": table}, **{"readings.0.temperature": "20 °C"})
    assert 5000 < at(tabulated.entry, as_found(tabulated.calculation.readings[0])).vapour_pressure.shadow < 9000


# --- a step of temperature ----------------------------------------------------------------------------------------


@pytest.mark.parametrize("units", ["SI", "US"])
@pytest.mark.parametrize(("name", "celsius"), [("water", 80), ("propane", 38), ("toluene", 60)])
def test_five_kelvin_cost_what_the_vapour_pressure_rises_by(name: str, celsius: int, units: str) -> None:
    made = Plant({"name": name, "temperature": {"highest": f"{celsius} °C"}}, units)
    cost = cost_of_temperature(made.entry, made.state)
    assert cost is not None
    kelvin = celsius + CELSIUS
    rise = liquid(name, "vapour_pressure", kelvin + 5) - liquid(name, "vapour_pressure", kelvin)
    assert cost.shadow == pytest.approx(rise / (liquid(name, "density", kelvin) * 9.80665), rel=1e-9)


def test_beside_a_state_the_vapour_pressure_comes_from_where_that_of_the_state_does() -> None:
    glycol = Plant(GLYCOL | {"temperature": {"highest": "80 °C"}, "vapour_pressure_of": "raoult"})
    colder = vapour_pressure_beside(glycol.entry, glycol.state, "dT_s", warmer=False)
    assert colder is not None
    assert colder.shadow == pytest.approx(0.7750 * liquid("water", "vapour_pressure", 351.15), rel=1e-4)
    table = [row("10 °C", "900 kg/m³", "9 cP", "1 kPa absolute"), row("40 °C", "880 kg/m³", "3 cP", "4 kPa absolute")]
    tabulated = Plant(hot("37 °C", table=table))
    colder = vapour_pressure_beside(tabulated.entry, tabulated.state, "dT_s", warmer=False)
    assert colder is not None
    place = (1 / 283.15 - 1 / 308.15) / (1 / 283.15 - 1 / 313.15)
    assert colder.shadow == pytest.approx(1000 * math.exp(place * math.log(4)), rel=1e-9)


@pytest.mark.parametrize(
    "changes",
    [
        {"name": "water", "temperature": {"highest": "326 °C"}},  # beyond the look-up
        hot(
            "38 °C",
            table=[
                row("10 °C", "9e2 kg/m³", "9 cP", "1 kPa absolute"),
                row("40 °C", "880 kg/m³", "3 cP", "4 kPa absolute"),
            ],
        ),
        hot("38 °C", density="900 kg/m³", viscosity="5 cP", vapour_pressure="1 kPa absolute"),
        {"name": "water", "temperature": {"highest": "38 °C"}, "vapour_pressure": "6.6 kPa absolute"},
    ],
    ids=["look-up", "table", "single", "single of water"],
)
def test_where_it_is_unknown_a_warmer_vapour_pressure_is_not_made_up(changes: dict[str, Any]) -> None:
    made = Plant(changes)
    before = len(made.entry.ledger.lines())
    assert vapour_pressure_beside(made.entry, made.state, "dT") is None
    assert all(line.kind != "lookup" for line in made.entry.ledger.lines()[before:])
    assert cost_of_temperature(made.entry, made.state) is None


# --- what a careful reader asks -----------------------------------------------------------------------------------


def findings(changes: Mapping[str, Any]) -> list[str]:
    return asked(Plant(changes))


def asked(made: Plant) -> list[str]:
    """What is asked about the properties cited, without a computation of anything else."""
    at = search.of(Results(made.entry, made.state, (), (), ()))
    return [found.text for mistake in properties.MISTAKES for found in mistake(at)]


PROPANE = {"name": "propane", "temperature": {"highest": "38 °C"}}


@pytest.mark.parametrize(
    ("changes", "found"),
    [
        (PROPANE | {"vapour_pressure": "1300 kPa absolute"}, False),
        (PROPANE | {"vapour_pressure": "130 kPa absolute"}, True),
        (PROPANE | {"density": "471 kg/m³"}, False),
        (PROPANE | {"density": "620 kg/m³"}, True),
        (PROPANE | {"viscosity": "0.085 cP"}, False),
        (PROPANE | {"viscosity": "0.18 cSt"}, False),
        (PROPANE | {"viscosity": "0.85 cSt"}, True),
        (GLYCOL | {"temperature": {"highest": "80 °C"}, "vapour_pressure": "36 kPa absolute"}, False),
        (GLYCOL | {"temperature": {"highest": "80 °C"}, "vapour_pressure": "3.6 kPa absolute"}, True),
        (GLYCOL | {"temperature": {"highest": "80 °C"}, "vapour_pressure": "60 kPa absolute"}, True),
        (
            PROPANE
            | {
                "table": [
                    row("0 °C", vapour_pressure="474 kPa absolute"),
                    row("40 °C", vapour_pressure="137 psi absolute"),
                ]
            },
            True,
        ),
        (hot("30 °C", density="1 kg/L", viscosity="1 cP", vapour_pressure="1 Pa absolute"), False),
    ],
)
def test_a_cited_property_far_from_the_look_up_is_asked_about(changes: dict[str, Any], found: bool) -> None:
    assert any("is not that of" in text for text in findings(changes)) is found


@pytest.mark.parametrize(("pressure", "found"), [("3 kPa absolute", True), ("9 kPa absolute", False)])
def test_an_effective_vapour_pressure_below_the_true_one_is_asked_about(pressure: str, found: bool) -> None:
    water = {"name": "water", "temperature": {"highest": "30 °C"}, "vapour_pressure_kind": "effective"}
    assert any("is not that of water" in text for text in findings(water | {"vapour_pressure": pressure})) is found


def test_a_table_that_runs_backwards_is_asked_about() -> None:
    upside = [row("10 °C", "900 kg/m³", "3 cP", "4 kPa absolute"), row("40 °C", "880 kg/m³", "9 cP", "1 kPa absolute")]
    found = findings(hot("20 °C", table=upside))
    assert any("vapour pressure of the table does not rise from 10 °C to 40 °C" in text for text in found)
    assert any("viscosity of the table does not fall" in text for text in found)


def test_a_share_is_kept_as_typed_and_converted_for_formulas_only() -> None:
    made = Plant(GLYCOL | {"temperature": {"highest": "80 °C"}, "vapour_pressure_of": "raoult"})
    made.at()
    share = [line for line in made.entry.ledger.lines() if line.value.symbol == "w"]
    assert [(line.kind, str(line.value.record), line.value.unit.name) for line in share] == [
        ("given", "50", "%"), ("conversion", "0.500000", "1")]  # fmt: skip
    assert share[0].value.unit == unit("%") and Quantity(Decimal("50"), "50", unit("%")).si() == Fraction(1, 2)


# --- read back from the page --------------------------------------------------------------------------------------


def looked_up_lines(made: dict[str, Any]) -> list[dict[str, Any]]:
    blocks = [block["line"] for part in made["computation"] for block in part["blocks"] if "line" in block]
    return [line for line in blocks if line["kind"] == "lookup" and line["operands"]]


@pytest.mark.filterwarnings("ignore:.*sRGB2014.icc:pytest.PytestUnraisableExceptionWarning")
@pytest.mark.parametrize(
    ("changes", "units", "derived"),
    [
        ({"name": "propane", "temperature": {"highest": "-60 °C"}}, "US", 3),
        (GLYCOL | {"temperature": {"highest": "176 °F"}, "vapour_pressure_of": "raoult"}, "SI", 3),
        ({"name": "n-butane", "temperature": {"highest": "-10 °C"}}, "SI", 3),
        ({"name": "sea water", "salinity": "35 g/kg", "temperature": {"highest": "25 °C"}}, "US", 3),
        (
            hot(
                "20 °C",
                table=[
                    row("10 °C", "9e2 kg/m³", "9 cP", "1 kPa absolute"),
                    row("40 °C", "880 kg/m³", "3 cP", "4 kPa absolute"),
                ],
            ),
            "SI",
            0,
        ),
        (hot("145 °F", density="61.3 lb/ft³", viscosity="0.44 cP", table=STEAM), "US", 0),
    ],
    ids=["propane", "glycol", "n-butane", "sea water", "table", "US table"],
)
def test_a_look_up_is_derived_again_from_its_printed_line_alone(
    changes: dict[str, Any], units: str, derived: int
) -> None:
    """A pure liquid and a mixture; one digit changed in each look-up is found there."""
    of = {"liquid": {"source": "S1", "status": "verified"} | changes, "calculation.units": units}
    made = recorded(plant(of))
    report = verify(render(made, []))
    assert report.ok, str(report)
    assert report.derived == derived == len(looked_up_lines(made))
    for line in looked_up_lines(made):
        line["value"] = next_digit(line["value"])
    if derived:
        found = verify(render(made, [])).disagreements
        wrong = {finding.address for finding in found if "gives another value" in finding.what}
        assert wrong == {line["address"] for line in looked_up_lines(made)}
