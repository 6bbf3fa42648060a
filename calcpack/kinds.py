"""What a key asks for: the kinds of quantity, in the engineer's words.

Kinds with a range are those of keys in the input file; the others also hold constants and tabulated values.
"""

from __future__ import annotations

from dataclasses import dataclass
from typing import Literal

Reference = Literal["gauge", "absolute", "vacuum"]


@dataclass(frozen=True)
class Kind:
    """What a key asks for.

    ``dimensions`` are those a unit may have, ``references`` what a pressure may count from.  ``ranges`` holds for each
    dimension the lowest and the highest size met in practice, with units, empty where the sign says enough: a number
    beyond them is a slip of the hand or of the unit (common practice, no source).  ``units`` are those a ratio may
    have; empty: a plain number.
    """

    dimensions: tuple[str, ...]
    sign: Literal["any", "not negative", "positive"]
    words: str
    examples: tuple[str, ...]
    references: tuple[Reference, ...] = ()
    ranges: tuple[tuple[str, str], ...] = ()
    units: tuple[str, ...] = ()


_LENGTH = ("length",)
_PRESSURE = ("pressure",)
_RATIO = ("ratio",)
KINDS: dict[str, Kind] = {
    "length": Kind(_LENGTH, "positive", "a length", ("12.5 m", "38 ft")),
    "pipe_length": Kind(_LENGTH, "positive", "a length", ("12.5 m", "38 ft"), ranges=(("", "100 km"),)),
    "elevation": Kind(_LENGTH, "any", "an elevation", ("0.67 m", "4.0 ft"), ranges=(("-15 km", "15 km"),)),
    "head": Kind(_LENGTH, "not negative", "a head of the liquid", ("0.6 m", "2 ft"), ranges=(("", "500 m"),)),
    "npsh": Kind(_LENGTH, "positive", "a head of the liquid", ("7.8 m", "23.5 ft"), ranges=(("", "500 m"),)),
    "bore": Kind(_LENGTH, "positive", "a diameter", ("202.7 mm", "14.5 in")),
    "diameter": Kind(_LENGTH, "positive", "a diameter", ("202.7 mm", "14.5 in"), ranges=(("2 mm", "20 m"),)),
    "roughness": Kind(_LENGTH, "not negative", "a roughness", ("0.05 mm", "0.0018 in"), ranges=(("", "100 mm"),)),
    "depth": Kind(_LENGTH, "not negative", "a fall of the level", ("0.15 m", "6 in"), ranges=(("", "500 m"),)),
    "area": Kind(("area",), "positive", "an area", ("0.032 m²", "0.35 ft²")),
    "velocity": Kind(("velocity",), "any", "a velocity", ("1.7 m/s", "5.5 ft/s")),
    "velocity_limit": Kind(("velocity",), "positive", "a velocity", ("2.4 m/s", "8 ft/s"), ranges=(("", "100 m/s"),)),
    "acceleration": Kind(("acceleration",), "any", "an acceleration", ("9.80665 m/s²",)),
    "flow": Kind(("flow",), "positive", "a flow", ("320 m³/h", "3600 gal/min"), ranges=(("1e-9 m³/s", "1000 m³/s"),)),
    "pressure": Kind(
        _PRESSURE,
        "any",
        "a pressure that says gauge or absolute",
        ("22 kPa gauge", "101.3 kPa absolute"),
        ("gauge", "absolute"),
        (("", "100 MPa"),),
    ),
    "barometer": Kind(
        _PRESSURE,
        "positive",
        "an absolute pressure of the air",
        ("99.3 kPa absolute", "14.4 psi absolute"),
        ("absolute",),
        (("20 kPa", "110 kPa"),),
    ),
    "vapour_pressure": Kind(
        _PRESSURE,
        "positive",
        "an absolute vapour pressure",
        ("4.2 kPa absolute", "0.61 psi absolute"),
        ("absolute",),
        (("0.1 Pa", "30 MPa"),),
    ),
    "gauge_pressure": Kind(
        _PRESSURE,
        "any",
        "a gauge reading that says gauge or vacuum",
        ("-13.5 kPa gauge", "4 inHg vacuum"),
        ("gauge", "vacuum"),
        (("", "100 MPa"),),
    ),
    "gauge": Kind(
        _PRESSURE, "any", "a gauge pressure", ("10 kPa gauge", "1.5 psi gauge"), ("gauge",), (("", "100 MPa"),)
    ),
    "pressure_difference": Kind(
        _PRESSURE, "not negative", "a pressure difference, without gauge or absolute", ("4 kPa", "0.6 psi")
    ),
    "weather_allowance": Kind(
        _PRESSURE,
        "not negative",
        "a pressure difference, without gauge or absolute",
        ("1.7 kPa", "0.25 psi"),
        ranges=(("", "20 kPa"),),
    ),
    "drop": Kind(
        ("length", "pressure"),
        "not negative",
        "a drop, as a head or a pressure difference",
        ("0.4 m", "4 kPa"),
        ranges=(("", "500 m"), ("", "100 MPa")),
    ),
    "density": Kind(("density",), "positive", "a density", ("998.2 kg/m³", "62.3 lb/ft³")),
    "liquid_density": Kind(
        ("density",),
        "positive",
        "a density",
        ("998.2 kg/m³", "62.3 lb/ft³"),
        ranges=(("300 kg/m³", "15000 kg/m³"),),
    ),
    "dynamic_viscosity": Kind(("dynamic_viscosity",), "positive", "a dynamic viscosity", ("0.8 mPa·s", "0.8 cP")),
    "kinematic_viscosity": Kind(("kinematic_viscosity",), "positive", "a kinematic viscosity", ("0.8 cSt",)),
    "viscosity": Kind(
        ("dynamic_viscosity", "kinematic_viscosity"),
        "positive",
        "a viscosity, dynamic or kinematic",
        ("0.8 mPa·s", "0.8 cSt"),
        ranges=(("1e-7 Pa·s", "1000 Pa·s"), ("1e-9 m²/s", "1 m²/s")),
    ),
    "specific_weight": Kind(("specific_weight",), "positive", "a specific weight", ("9.79 kN/m³", "62.3 lbf/ft³")),
    "temperature": Kind(("temperature",), "any", "a temperature", ("24 °C", "85 °F"), ranges=(("1 K", "900 K"),)),
    "temperature_difference": Kind(("temperature",), "positive", "a step of temperature", ("5 K",)),
    "lapse_rate": Kind(("lapse_rate",), "any", "a lapse rate", ("0.0065 K/m",)),
    "speed": Kind(("speed",), "positive", "a speed of rotation", ("1480 r/min",), ranges=(("", "100000 r/min"),)),
    "percentage": Kind(_RATIO, "not negative", "a percentage", ("10 %",), ranges=(("", "200 %"),), units=("%",)),
    "mass_fraction": Kind(
        _RATIO, "not negative", "a mass fraction", ("35 %", "350 g/kg"), ranges=(("", "99 %"),), units=("%", "g/kg")
    ),
    "salinity": Kind(_RATIO, "not negative", "a salinity", ("35 g/kg",), ranges=(("", "300 g/kg"),), units=("g/kg",)),
    "ratio": Kind(_RATIO, "positive", "a plain number above zero, without a unit", ("1.10",)),
    "factor": Kind(_RATIO, "positive", "a plain number above zero, without a unit", ("1.10",), ranges=(("", "100"),)),
    "coefficient": Kind(
        _RATIO, "not negative", "a plain number, zero or more, without a unit", ("0.10",), ranges=(("", "100000"),)
    ),
    "diameters": Kind(
        _RATIO, "not negative", "a plain number of diameters, without a unit", ("5",), ranges=(("", "10000"),)
    ),
    "flow_coefficient": Kind(
        _RATIO, "positive", "a plain number above zero, without a unit", ("640",), ranges=(("", "1000000"),)
    ),
    "hazen_williams_C": Kind(_RATIO, "positive", "a plain number, without a unit", ("120",), ranges=(("20", "200"),)),
    "exponent": Kind(_RATIO, "positive", "a plain number, without a unit", ("2",), ranges=(("1", "3"),)),
    "specific_speed": Kind(
        _RATIO, "positive", "a plain number above zero, without a unit", ("11000",), ranges=(("", "1000000"),)
    ),
}
#: Kinds typed as a plain number.
BARE = frozenset(name for name, kind in KINDS.items() if kind.dimensions == _RATIO and not kind.units)
