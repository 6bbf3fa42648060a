"""What a key asks for: the kinds of quantity, in the engineer's words."""

from __future__ import annotations

from dataclasses import dataclass
from typing import Literal

Reference = Literal["gauge", "absolute", "vacuum"]


@dataclass(frozen=True)
class Kind:
    """What a key asks for.

    ``dimensions`` are those a unit may have, ``references`` what a pressure may count from.
    """

    dimensions: tuple[str, ...]
    sign: Literal["any", "not negative", "positive"]
    words: str
    examples: tuple[str, ...]
    references: tuple[Reference, ...] = ()


_HEAD = ("length",)
KINDS: dict[str, Kind] = {
    "length": Kind(_HEAD, "positive", "a length", ("12.5 m", "38 ft")),
    "elevation": Kind(_HEAD, "any", "an elevation", ("0.67 m", "4.0 ft")),
    "head": Kind(_HEAD, "not negative", "a head of the liquid", ("7.8 m", "23.5 ft")),
    "bore": Kind(_HEAD, "positive", "a diameter", ("202.7 mm", "14.5 in")),
    "roughness": Kind(_HEAD, "not negative", "a roughness", ("0.05 mm", "0.0018 in")),
    "area": Kind(("area",), "positive", "an area", ("0.032 m²", "0.35 ft²")),
    "velocity": Kind(("velocity",), "any", "a velocity", ("1.7 m/s", "5.5 ft/s")),
    "acceleration": Kind(("acceleration",), "any", "an acceleration", ("9.80665 m/s²",)),
    "flow": Kind(("flow",), "positive", "a flow", ("320 m³/h", "3600 gal/min")),
    "pressure": Kind(
        ("pressure",),
        "any",
        "a pressure that says gauge or absolute",
        ("22 kPa gauge", "101.3 kPa absolute"),
        ("gauge", "absolute"),
    ),
    "absolute_pressure": Kind(
        ("pressure",),
        "any",
        "an absolute pressure",
        ("99.3 kPa absolute", "14.4 psi absolute"),
        ("absolute",),
    ),
    "gauge_pressure": Kind(
        ("pressure",),
        "any",
        "a gauge reading that says gauge or vacuum",
        ("-13.5 kPa gauge", "4 inHg vacuum"),
        ("gauge", "vacuum"),
    ),
    "pressure_difference": Kind(
        ("pressure",),
        "not negative",
        "a pressure difference, without gauge or absolute",
        ("1.7 kPa", "0.25 psi"),
    ),
    "drop": Kind(
        ("length", "pressure"),
        "not negative",
        "a drop, as a head or a pressure difference",
        ("0.4 m", "4 kPa"),
    ),
    "density": Kind(("density",), "positive", "a density", ("998.2 kg/m³", "62.3 lb/ft³")),
    "dynamic_viscosity": Kind(("dynamic_viscosity",), "positive", "a dynamic viscosity", ("0.8 mPa·s", "0.8 cP")),
    "kinematic_viscosity": Kind(("kinematic_viscosity",), "positive", "a kinematic viscosity", ("0.8 cSt",)),
    "viscosity": Kind(
        ("dynamic_viscosity", "kinematic_viscosity"),
        "positive",
        "a viscosity, dynamic or kinematic",
        ("0.8 mPa·s", "0.8 cSt"),
    ),
    "specific_weight": Kind(("specific_weight",), "positive", "a specific weight", ("9.79 kN/m³", "62.3 lbf/ft³")),
    "temperature": Kind(("temperature",), "any", "a temperature", ("24 °C", "85 °F")),
    "temperature_difference": Kind(("temperature",), "positive", "a step of temperature", ("5 K",)),
    "lapse_rate": Kind(("lapse_rate",), "any", "a lapse rate", ("0.0065 K/m",)),
    "speed": Kind(("speed",), "positive", "a speed of rotation", ("1480 r/min",)),
    "percentage": Kind(("ratio",), "not negative", "a percentage", ("10 %",)),
    "ratio": Kind(("ratio",), "positive", "a plain number above zero, without a unit", ("1.10",)),
    "coefficient": Kind(("ratio",), "not negative", "a plain number, zero or more, without a unit", ("0.10",)),
}
#: Kinds typed as a plain number.
BARE = frozenset({"ratio", "coefficient"})
