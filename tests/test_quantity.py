"""Units against pint and the published factors; the grammar against what people type."""

from __future__ import annotations

from decimal import Decimal
from fractions import Fraction
from typing import Any

import pint
import pytest

from calcpack import symbols
from calcpack.quantity import COHERENT, KINDS, PLANT, QuantityFault, conversion, parse, unit
from calcpack.units import SPELLINGS, UNITS

#: Our name -> the same unit in pint, by its base words.  A revolution is a count here, 2π radians in pint.
IN_PINT = {
    "m": "meter",
    "km": "kilometer",
    "cm": "centimeter",
    "mm": "millimeter",
    "µm": "micrometer",
    "ft": "foot",
    "in": "inch",
    "m²": "meter**2",
    "cm²": "centimeter**2",
    "mm²": "millimeter**2",
    "ft²": "foot**2",
    "in²": "inch**2",
    "m/s": "meter/second",
    "ft/s": "foot/second",
    "m/s²": "meter/second**2",
    "ft/s²": "foot/second**2",
    "m³/s": "meter**3/second",
    "m³/h": "meter**3/hour",
    "m³/d": "meter**3/day",
    "L/s": "liter/second",
    "L/min": "liter/minute",
    "ft³/s": "foot**3/second",
    "ft³/min": "foot**3/minute",
    "gal/min": "gallon/minute",
    "Mgal/d": "megagallon/day",
    "UK gal/min": "imperial_gallon/minute",
    "bbl/h": "oil_barrel/hour",
    "bbl/d": "oil_barrel/day",
    "Pa": "pascal",
    "hPa": "hectopascal",
    "kPa": "kilopascal",
    "MPa": "megapascal",
    "mbar": "millibar",
    "bar": "bar",
    "atm": "standard_atmosphere",
    "kgf/cm²": "kilogram_force/centimeter**2",
    "psi": "force_pound/inch**2",
    "lbf/ft²": "force_pound/foot**2",
    "mmHg": "millimeter_Hg",
    "inHg": "inch_Hg",
    "Torr": "torr",
    "mH2O": "kilogram/liter*standard_gravity*meter",
    "mmH2O": "kilogram/liter*standard_gravity*millimeter",
    "ftH2O": "foot_H2O",
    "inH2O": "kilogram/liter*standard_gravity*inch",
    "kg/m³": "kilogram/meter**3",
    "g/cm³": "gram/centimeter**3",
    "kg/L": "kilogram/liter",
    "lb/ft³": "pound/foot**3",
    "slug/ft³": "slug/foot**3",
    "Pa·s": "pascal*second",
    "mPa·s": "millipascal*second",
    "cP": "centipoise",
    "lbf·s/ft²": "force_pound*second/foot**2",
    "lb/(ft·s)": "pound/foot/second",
    "m²/s": "meter**2/second",
    "mm²/s": "millimeter**2/second",
    "cSt": "centistokes",
    "ft²/s": "foot**2/second",
    "N/m³": "newton/meter**3",
    "kN/m³": "kilonewton/meter**3",
    "lbf/ft³": "force_pound/foot**3",
    "K": "kelvin",
    "°C": "degree_Celsius",
    "°F": "degree_Fahrenheit",
    "°R": "degree_Rankine",
    "K/m": "kelvin/meter",
    "K/km": "kelvin/kilometer",
    "K/ft": "kelvin/foot",
    "1/s": "1/second",
    "r/min": "1/minute",
    "1": "dimensionless",
    "%": "percent",
    "g/kg": "gram/kilogram",
}


@pytest.fixture(scope="module")
def registry() -> Any:
    return pint.UnitRegistry(non_int_type=Fraction)


def test_every_unit_has_an_oracle() -> None:
    assert set(IN_PINT) == set(UNITS)


@pytest.mark.parametrize("name", sorted(UNITS))
def test_factor_is_exactly_that_of_pint(name: str, registry: Any) -> None:
    ours = UNITS[name]
    in_si = IN_PINT[COHERENT["SI"][ours.kind].name]
    for number in (Fraction(1), Fraction(100)):
        theirs = registry.Quantity(number, IN_PINT[name]).to(in_si).magnitude
        assert (number + ours.offset) * ours.factor == theirs


#: Published factors: NIST SP 811 (2008), App. B.8 and B.9, from the definitions there.
#: The warm columns (60 °F, 68 °F) are left out, since the tool knows conventional columns only.
PUBLISHED = [
    ("U-gpm", "gal/min", "m³/s", "6.309019640000e-05"),
    ("U-psi", "psi", "Pa", "6894.757293168"),
    ("U-ft", "ft", "m", "0.3048"),
    ("U-atm", "atm", "Pa", "101325"),
    ("U-atm", "atm", "psi", "14.69594878"),
    ("U-mmHg", "mmHg", "Pa", "133.322387415"),
    ("U-torr", "Torr", "Pa", "133.32236842"),
    ("U-inHg", "inHg", "Pa", "3386.388640"),
    ("U-ftH2Oc", "ftH2O", "Pa", "2989.06692"),
    ("U-mH2O", "mH2O", "Pa", "9806.65"),
    ("U-bar", "bar", "Pa", "100000"),
    ("U-bar", "bar", "psi", "14.50377377"),
    ("U-kgfcm2", "kgf/cm²", "Pa", "98066.5"),
    ("U-cSt", "cSt", "m²/s", "1e-6"),
    ("U-lbft3", "lb/ft³", "kg/m³", "16.01846337"),
    ("U-impgal", "UK gal/min", "m³/s", "7.576816667e-5"),
]


@pytest.mark.parametrize(("check", "name", "other", "figure"), PUBLISHED)
def test_published_factor(check: str, name: str, other: str, figure: str) -> None:
    # each figure is printed to about ten digits
    factor = conversion(unit(name), unit(other))
    assert abs(factor / Fraction(figure) - 1) < Fraction(1, 10**9), check


def test_standard_gravity_in_feet() -> None:
    # U-g: 9.80665 m/s² is 32.174 048 56 ft/s² (NIST SP 811 (2008), App. B.8)
    feet = parse("9.80665 m/s²", "acceleration").si() * conversion(unit("m/s²"), unit("ft/s²"))
    assert round(float(feet), 8) == 32.17404856


def test_plant_conversions_are_the_exact_rationals() -> None:
    assert conversion(unit("gal/min"), unit("ft³/s")) == Fraction(77, 34560)
    assert conversion(unit("psi"), unit("lbf/ft²")) == 144
    assert conversion(unit("in"), unit("ft")) == Fraction(1, 12)


def test_no_factor_between_kinds_or_scales_with_a_zero_of_their_own() -> None:
    for a, b in (("m", "kPa"), ("°C", "K"), ("K", "°F")):
        with pytest.raises(ValueError, match="no factor"):
            conversion(unit(a), unit(b))


def test_display_tables_cover_every_kind_of_the_nomenclature() -> None:
    for system in ("SI", "US"):
        assert set(COHERENT[system]) == set(PLANT[system]) == set(symbols.KINDS)
        for kind, (shown, decimals) in PLANT[system].items():
            assert shown.kind == COHERENT[system][kind].kind
            assert decimals >= 0


def test_the_us_system_is_coherent() -> None:
    """Factors multiply as the dimensions do: the foot, the slug, the second and the kelvin are base units.

    Only where temperatures stand in a ratio alone is the degree Rankine taken, to which a °F typed converts exactly.
    """
    us = COHERENT["US"]
    foot, slug = us["length"].factor, us["density"].factor * us["length"].factor ** 3
    for kind, exponents in symbols.KINDS.items():
        length, mass, _, _ = exponents
        degree = Fraction(5, 9) if kind == "absolute_temperature" else 1
        assert us[kind].factor == degree * foot ** int(length) * slug ** int(mass), kind


def test_every_dimension_of_a_kind_has_units() -> None:
    assert {dimension for kind in KINDS.values() for dimension in kind.dimensions} == {u.kind for u in UNITS.values()}


@pytest.mark.parametrize("kind", sorted(KINDS))
def test_examples_of_a_kind_are_read(kind: str) -> None:
    for example in KINDS[kind].examples:
        assert parse(example, kind).unit.kind in KINDS[kind].dimensions


@pytest.mark.parametrize("spelling", sorted(SPELLINGS))
def test_every_spelling_is_read_as_its_unit(spelling: str) -> None:
    wanted = unit(spelling)
    kind = next(name for name, kind in KINDS.items() if wanted.kind in kind.dimensions and not kind.references)
    if wanted.kind == "pressure":
        kind = "pressure_difference"
    if wanted.kind == "ratio":
        kind = {"1": "ratio", "%": "percentage", "g/kg": "mass_fraction"}[wanted.name]
    text = "1.5" if wanted.name == "1" else f"{500 if kind == 'temperature' else 1.5} {spelling}"
    assert parse(text, kind).unit is wanted


@pytest.mark.parametrize(
    ("text", "kind", "number", "name", "reference"),
    [
        ("38 ft", "length", "38", "ft", None),
        ("\u22123.60 m", "elevation", "-3.60", "m", None),
        ("+0.30 m", "elevation", "0.30", "m", None),
        ("-0 m", "elevation", "0", "m", None),
        ("1.2e3 m", "length", "1.2e3", "m", None),
        ("12.5m", "length", "12.5", "m", None),
        ("10%", "percentage", "10", "%", None),
        ("1.10", "ratio", "1.10", "1", None),
        ("320 m3/h", "flow", "320", "m³/h", None),
        ("320 m^3/h", "flow", "320", "m³/h", None),
        ("3600 gpm", "flow", "3600", "gal/min", None),
        ("0.8 mPa.s", "viscosity", "0.8", "mPa·s", None),
        ("0.8 cSt", "viscosity", "0.8", "cSt", None),
        ("3 psig", "pressure", "3", "psi", "gauge"),
        ("11.93 psi absolute", "barometer", "11.93", "psi", "absolute"),
        ("11.93 psia", "barometer", "11.93", "psi", "absolute"),
        ("1.013 bar abs", "barometer", "1.013", "bar", "absolute"),
        ("-13.5 kPa gauge", "gauge_pressure", "-13.5", "kPa", "gauge"),
        ("5 inHg vacuum", "gauge_pressure", "5", "inHg", "vacuum"),
        ("0.4 m", "drop", "0.4", "m", None),
        ("4 kPa", "drop", "4", "kPa", None),
    ],
)
def test_accepted(text: str, kind: str, number: str, name: str, reference: str | None) -> None:
    value = parse(text, kind)
    assert (value.text, value.unit.name, value.reference) == (number, name, reference)
    assert value.number == Decimal(number)


def test_temperatures_are_exact() -> None:
    assert parse("85 °F", "temperature").si() == (Fraction(85) + Fraction("459.67")) * 5 / 9
    assert parse("24 °C", "temperature").si() == Fraction("297.15")


@pytest.mark.parametrize(
    ("text", "kind", "fault", "word"),
    [
        ("12,5 m", "length", "number", "`12.5 m`"),
        ("1,200 gal/min", "flow", "number", "`1200 gal/min`"),
        ("12,5", "length", "number", "`12.5 m`"),
        ("3 600 gal/min", "flow", "number", "`3600 gal/min`"),
        ("1/2 in", "bore", "number", "`0.5 in`"),
        ("1 1/2 in", "bore", "number", "`1.5 in`"),
        (".5 m", "length", "number", "`0.5 m`"),
        ("5. m", "length", "number", ""),
        ("5 ft 3 in", "length", "unit", ""),
        ("nan m", "length", "number", ""),
        ("inf m", "length", "number", ""),
        ("1e999 m", "length", "number", ""),
        ("9" * 40 + " m", "length", "number", ""),
        ("", "length", "number", ""),
        ("unknown", "length", "number", ""),
        ("38", "length", "bare number", "`38 m` or `38 ft`"),
        ("10", "percentage", "bare number", "`10 %`"),
        ("0.1", "percentage", "bare number", "`10 %`"),
        ("20 C", "temperature", "unit", "`20 °C`"),
        ("20 ºC", "temperature", "unit", "`20 °C`"),
        ("20 ℃", "temperature", "unit", "`20 °C`"),
        ("118 m3/hr", "flow", "unit", "`118 m³/h`"),
        ("3 KPA gauge", "pressure", "unit", "`3 kPa gauge`"),
        ("10 lb/in2", "barometer", "unit", "`10 psi absolute`"),
        ('14.5"', "bore", "unit", "`14.5 in`"),
        ("3 \u043cm", "length", "unit", "`3 mm`"),
        ("3 m", "coefficient", "dimension", ""),
        ("3 gal/min", "length", "dimension", ""),
        ("110 %", "ratio", "dimension", ""),
        ("22 kPa", "pressure", "reference", "`22 kPa gauge` or `22 kPa absolute`"),
        ("22 kPa gauge", "barometer", "reference", ""),
        ("22 kPa gauge", "pressure_difference", "reference", "`22 kPa`"),
        ("5 m gauge", "length", "reference", "`5 m`"),
        ("3 psia gauge", "pressure", "reference", ""),
        ("5 inHg vacuum", "pressure", "reference", ""),
        ("-2 kPa absolute", "barometer", "range", ""),
        ("-2 kPa absolute", "pressure", "range", "`-2 kPa gauge`"),
        ("-5 inHg vacuum", "gauge_pressure", "range", "`5 inHg vacuum`"),
        ("40 inHg vacuum", "gauge_pressure", "range", ""),
        ("-200 kPa gauge", "gauge_pressure", "range", ""),
        ("-300 °C", "temperature", "range", ""),
        ("-459.68 °F", "temperature", "range", ""),
        ("0 mm", "bore", "range", ""),
        ("-0.1", "coefficient", "range", ""),
        ("5 °C", "temperature_difference", "unit", ""),
        ("5\u00a0m", "length", "unit", "`5 m`"),
        ("5\u200bm", "length", "unit", "`5 m`"),
        ("12345678901 m", "length", "number", "`1.23456789e+10 m`"),
        ("0.12345678901 mm", "bore", "number", "`0.123456789 mm`"),
        ("-1.0000000000000 m", "elevation", "number", "`-1 m`"),
        ("0.0000000000012 m", "length", "number", "`1.2e-12 m`"),
        ("1e13 m", "length", "range", "check the unit"),
        ("1e-13 m", "roughness", "range", "check the unit"),
        ("1.99 mm", "diameter", "range", "check the unit"),
        ("20.1 m", "diameter", "range", "check the unit"),
        ("110.1 kPa absolute", "barometer", "range", "check the unit"),
        ("19.9 kPa absolute", "barometer", "range", "check the unit"),
        ("0.09 Pa absolute", "vapour_pressure", "range", "check the unit"),
        ("101 MPa absolute", "pressure", "range", "check the unit"),
        ("1.01e5 kPa gauge", "gauge_pressure", "range", "check the unit"),
        ("299 kg/m³", "liquid_density", "range", "check the unit"),
        ("1001 Pa·s", "viscosity", "range", "check the unit"),
        ("1.1 m²/s", "viscosity", "range", "check the unit"),
        ("501 m", "drop", "range", "check the unit"),
        ("101 MPa", "drop", "range", "check the unit"),
        ("201 %", "percentage", "range", "check the unit"),
        ("101", "factor", "range", "check the decimal point"),
        ("-15.1 km", "elevation", "range", "check the unit"),
        ("0.5", "mass_fraction", "bare number", "`50 %`"),
        ("35", "salinity", "bare number", "`35 g/kg`"),
        ("35 psu", "salinity", "unit", "`35 g/kg`"),
        ("35 wt%", "mass_fraction", "unit", "`35 %`"),
        ("35 %", "salinity", "dimension", ""),
        ("999 g/kg", "mass_fraction", "range", "check the unit"),
        ("-1 m", "depth", "range", ""),
        ("0 m/s", "velocity_limit", "range", ""),
        ("10 kPa", "gauge", "reference", "`10 kPa gauge`"),
        ("4 inHg vacuum", "gauge", "reference", ""),
        ("0.9", "exponent", "range", "check the decimal point"),
        ("2 m", "exponent", "dimension", ""),
        ("\uff15 m", "length", "character", "`5 m`"),
    ],
)
def test_refused(text: str, kind: str, fault: str, word: str) -> None:
    with pytest.raises(QuantityFault) as caught:
        parse(text, kind)
    assert caught.value.kind == fault
    assert word in caught.value.suggestion
    assert KINDS[kind].words in caught.value.wanted


@pytest.mark.parametrize("kind", sorted(kind for kind in KINDS if KINDS[kind].ranges))
def test_a_range_for_each_dimension_holds_its_own_ends(kind: str) -> None:
    asked = KINDS[kind]
    assert len(asked.ranges) == len(asked.dimensions)
    reference = f" {asked.references[-1]}" if asked.references and asked.references[-1] != "vacuum" else ""
    reference = reference or (" gauge" if asked.references else "")
    for dimension, limits in zip(asked.dimensions, asked.ranges, strict=True):
        for limit in filter(None, limits):
            value = parse(limit + reference, kind)
            assert value.unit.kind == dimension
            beyond = value.number * (Decimal("0.999") if limit == limits[0] and value.number > 0 else Decimal("1.001"))
            with pytest.raises(QuantityFault, match="check the") as caught:
                parse(f"{beyond} {value.unit.name}{reference}".removesuffix(" 1"), kind)
            assert caught.value.kind == "range"


@pytest.mark.parametrize(
    ("text", "kind", "limits"),
    [
        ("300 psi absolute", "barometer", "from 20 kPa (2.901 psi) to 110 kPa (15.95 psi)"),
        ("400000 ft", "pipe_length", "of at most 100 km (328100 ft)"),
        ("3000 °F", "temperature", "from 1 K (-457.9 °F) to 900 K (1160 °F)"),
        ("120 m/s", "velocity_limit", "of at most 100 m/s"),
        ("4", "exponent", "from 1 to 3"),
    ],
)
def test_a_limit_is_said_in_the_unit_typed_too(text: str, kind: str, limits: str) -> None:
    with pytest.raises(QuantityFault) as caught:
        parse(text, kind)
    assert caught.value.wanted.endswith(f", {limits}")


def test_ten_digits_are_enough() -> None:
    for text in ("1234567890 Pa", "0.1234567890 Pa", "0.0000000001 Pa", "123456.7890e2 Pa"):
        assert parse(text, "pressure_difference").text == text.removesuffix(" Pa")


def test_a_fault_says_what_the_unit_measures() -> None:
    with pytest.raises(QuantityFault, match="gal/min measures a flow"):
        parse("3 gal/min", "length")
