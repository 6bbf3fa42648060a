"""The units that may be typed or printed: exact factors, spellings, and the two display systems.

Every factor is an exact fraction built from the definitions: international foot 0.3048 m, pound
0.453 592 37 kg, US gallon 231 in³, UK gallon 4.546 09 L, standard gravity 9.806 65 m/s² (NIST SP 811 (2008),
App. B).
"""

from __future__ import annotations

from collections.abc import Iterator
from dataclasses import dataclass
from fractions import Fraction
from typing import Literal

_SP811 = "NIST SP 811 (2008), App. B.8"
_SI = "SI"

_FOOT = Fraction("0.3048")
_INCH = _FOOT / 12
_POUND = Fraction("0.45359237")
_GRAVITY = Fraction("9.80665")
_FORCE = _POUND * _GRAVITY
_SLUG = _FORCE / _FOOT
_GALLON = 231 * _INCH**3
_UK_GALLON = Fraction("0.00454609")
#: Conventional densities of the liquid columns: mercury 13 595.1 kg/m³ (0 °C), water 1 000 kg/m³.
_MERCURY = Fraction("13595.1") * _GRAVITY
_WATER = 1000 * _GRAVITY


@dataclass(frozen=True)
class Unit:
    """A unit of a kind of quantity: value in SI = (number + ``offset``) * ``factor``, both exact.

    ``kind`` is the dimension measured (``length``, ``flow`` …); ``source`` is where the factor comes from.
    """

    name: str
    kind: str
    factor: Fraction
    offset: Fraction
    source: str


#: kind, name, factor, source, further spellings.  ³ and ² may be typed ^3 and 3, · may be typed . or *.
_TABLE: tuple[tuple[str, str, Fraction | int, str, str], ...] = (
    ("length", "m", 1, _SI, ""),
    ("length", "km", 1000, _SI, ""),
    ("length", "cm", Fraction(1, 100), _SI, ""),
    ("length", "mm", Fraction(1, 1000), _SI, ""),
    ("length", "µm", Fraction(1, 10**6), _SI, "μm um"),
    ("length", "ft", _FOOT, _SP811, ""),
    ("length", "in", _INCH, _SP811, ""),
    ("area", "m²", 1, _SI, ""),
    ("area", "cm²", Fraction(1, 10**4), _SI, ""),
    ("area", "mm²", Fraction(1, 10**6), _SI, ""),
    ("area", "ft²", _FOOT**2, _SP811, ""),
    ("area", "in²", _INCH**2, _SP811, ""),
    ("velocity", "m/s", 1, _SI, ""),
    ("velocity", "ft/s", _FOOT, _SP811, "fps"),
    ("acceleration", "m/s²", 1, _SI, ""),
    ("acceleration", "ft/s²", _FOOT, _SP811, ""),
    ("flow", "m³/s", 1, _SI, ""),
    ("flow", "m³/h", Fraction(1, 3600), _SI, ""),
    ("flow", "m³/d", Fraction(1, 86400), _SI, ""),
    ("flow", "L/s", Fraction(1, 1000), _SI, "l/s"),
    ("flow", "L/min", Fraction(1, 60_000), _SI, "l/min"),
    ("flow", "ft³/s", _FOOT**3, _SP811, "cfs"),
    ("flow", "ft³/min", _FOOT**3 / 60, _SP811, "cfm"),
    ("flow", "gal/min", _GALLON / 60, _SP811 + ", US gallon of 231 in³", "gpm USgpm US_gal/min USgal/min"),
    ("flow", "Mgal/d", _GALLON * 10**6 / 86400, _SP811 + ", US gallon of 231 in³", "mgd MGD"),
    ("flow", "UK gal/min", _UK_GALLON / 60, _SP811 + ", UK gallon of 4.546 09 L", "UKgpm imp_gal/min igpm"),
    ("flow", "bbl/h", 42 * _GALLON / 3600, _SP811 + ", barrel of 42 US gallons", ""),
    ("flow", "bbl/d", 42 * _GALLON / 86400, _SP811 + ", barrel of 42 US gallons", ""),
    ("pressure", "Pa", 1, _SI, ""),
    ("pressure", "hPa", 100, _SI, ""),
    ("pressure", "kPa", 1000, _SI, ""),
    ("pressure", "MPa", 10**6, _SI, ""),
    ("pressure", "mbar", 100, _SP811, ""),
    ("pressure", "bar", 10**5, _SP811, ""),
    ("pressure", "atm", 101325, _SP811, ""),
    ("pressure", "kgf/cm²", _GRAVITY * 10**4, _SP811, ""),
    ("pressure", "psi", _FORCE / _INCH**2, _SP811, "lbf/in²"),
    ("pressure", "lbf/ft²", _FORCE / _FOOT**2, _SP811, "psf"),
    ("pressure", "mmHg", _MERCURY / 1000, _SP811 + ", conventional mercury 13 595.1 kg/m³", ""),
    ("pressure", "inHg", _MERCURY * _INCH, _SP811 + ", conventional mercury 13 595.1 kg/m³", ""),
    ("pressure", "Torr", Fraction(101325, 760), _SP811, "torr"),
    ("pressure", "mH2O", _WATER, _SP811 + ", conventional water 1 000 kg/m³", "mH₂O"),
    ("pressure", "mmH2O", _WATER / 1000, _SP811 + ", conventional water 1 000 kg/m³", "mmH₂O"),
    ("pressure", "ftH2O", _WATER * _FOOT, _SP811 + ", conventional water 1 000 kg/m³", "ftH₂O"),
    ("pressure", "inH2O", _WATER * _INCH, _SP811 + ", conventional water 1 000 kg/m³", "inH₂O"),
    ("density", "kg/m³", 1, _SI, ""),
    ("density", "g/cm³", 1000, _SI, ""),
    ("density", "kg/L", 1000, _SI, "kg/l"),
    ("density", "lb/ft³", _POUND / _FOOT**3, _SP811, "lbm/ft³"),
    ("density", "slug/ft³", _SLUG / _FOOT**3, _SP811, ""),
    ("dynamic_viscosity", "Pa·s", 1, _SI, ""),
    ("dynamic_viscosity", "mPa·s", Fraction(1, 1000), _SI, ""),
    ("dynamic_viscosity", "cP", Fraction(1, 1000), _SP811, ""),
    ("dynamic_viscosity", "lbf·s/ft²", _FORCE / _FOOT**2, _SP811, ""),
    ("dynamic_viscosity", "lb/(ft·s)", _POUND / _FOOT, _SP811, "lbm/(ft·s)"),
    ("kinematic_viscosity", "m²/s", 1, _SI, ""),
    ("kinematic_viscosity", "mm²/s", Fraction(1, 10**6), _SI, ""),
    ("kinematic_viscosity", "cSt", Fraction(1, 10**6), _SP811, ""),
    ("kinematic_viscosity", "ft²/s", _FOOT**2, _SP811, ""),
    ("specific_weight", "N/m³", 1, _SI, ""),
    ("specific_weight", "kN/m³", 1000, _SI, ""),
    ("specific_weight", "lbf/ft³", _FORCE / _FOOT**3, _SP811, ""),
    ("temperature", "K", 1, _SI, ""),
    ("temperature", "°C", 1, _SI, "degC deg_C"),
    ("temperature", "°F", Fraction(5, 9), "NIST SP 811 (2008), App. B.9", "degF deg_F"),
    ("temperature", "°R", Fraction(5, 9), "NIST SP 811 (2008), App. B.9", "degR deg_R"),
    ("lapse_rate", "K/m", 1, _SI, ""),
    ("lapse_rate", "K/km", Fraction(1, 1000), _SI, ""),
    ("lapse_rate", "K/ft", 1 / _FOOT, _SP811, ""),
    ("speed", "1/s", 1, _SI, ""),
    ("speed", "r/min", Fraction(1, 60), _SP811, "rpm rev/min 1/min"),
    ("ratio", "1", 1, _SI, ""),
    ("ratio", "%", Fraction(1, 100), "definition", ""),
    ("ratio", "g/kg", Fraction(1, 1000), "definition", ""),
)
_OFFSETS = {"°C": Fraction("273.15"), "°F": Fraction("459.67")}
UNITS: dict[str, Unit] = {
    name: Unit(name, kind, Fraction(factor), _OFFSETS.get(name, Fraction(0)), source)
    for kind, name, factor, source, _ in _TABLE
}


def _typed(name: str) -> Iterator[str]:
    """The ways one name may be typed."""
    for power in (name, name.replace("³", "3").replace("²", "2"), name.replace("³", "^3").replace("²", "^2")):
        for dot in "·⋅.*":
            yield power.replace("·", dot)


_Carried = Literal["gauge", "absolute"]
_ENDINGS: dict[_Carried, tuple[str, ...]] = {"gauge": ("g", "(g)"), "absolute": ("a", "(a)")}
#: Every accepted spelling -> the unit's name.
SPELLINGS: dict[str, str] = {
    spelling: name
    for _, name, _, _, more in _TABLE
    for each in (name, *(word.replace("_", " ") for word in more.split()))
    for spelling in _typed(each)
}


#: Spellings of a pressure unit that carry what the pressure counts from -> the unit's name, and what.
CARRIED: dict[str, tuple[str, _Carried]] = {
    f"{name}{spelt}": (name, reference)
    for name in ("psi", "bar", "mbar", "kPa", "MPa")
    for reference, spellings in _ENDINGS.items()
    for spelt in spellings
}


def unit(name: str) -> Unit:
    """The unit of that name or spelling.  Raises ``KeyError`` for a unit that is not on the list."""
    return UNITS[SPELLINGS[name]]


def conversion(a: Unit, b: Unit) -> Fraction:
    """The exact multiplier from ``a`` to ``b``.

    Raises ``ValueError`` for units of different kinds and for a unit with a zero of its own.
    """
    if a.kind != b.kind or a.offset or b.offset:
        raise ValueError(f"no factor leads from {a.name} to {b.name}")
    return a.factor / b.factor


#: kind: coherent SI, coherent US, plant SI with its decimals, plant US with its decimals.
_DISPLAY: dict[str, tuple[str, str, str, int, str, int]] = {
    "length": ("m", "ft", "m", 3, "ft", 3),
    "bore": ("m", "ft", "mm", 1, "in", 3),
    "area": ("m²", "ft²", "m²", 4, "ft²", 3),
    "velocity": ("m/s", "ft/s", "m/s", 3, "ft/s", 2),
    "acceleration": ("m/s²", "ft/s²", "m/s²", 5, "ft/s²", 4),
    "flow": ("m³/s", "ft³/s", "m³/h", 1, "gal/min", 1),
    "pressure": ("Pa", "lbf/ft²", "kPa", 2, "psi", 3),
    "pressure_difference": ("Pa", "lbf/ft²", "kPa", 2, "psi", 3),
    "density": ("kg/m³", "slug/ft³", "kg/m³", 2, "slug/ft³", 4),
    "dynamic_viscosity": ("Pa·s", "lbf·s/ft²", "mPa·s", 4, "cP", 4),
    "kinematic_viscosity": ("m²/s", "ft²/s", "cSt", 4, "cSt", 4),
    "specific_weight": ("N/m³", "lbf/ft³", "kN/m³", 3, "lbf/ft³", 2),
    "temperature": ("K", "K", "°C", 2, "°F", 2),
    "absolute_temperature": ("K", "°R", "°C", 2, "°F", 2),
    "temperature_difference": ("K", "K", "K", 2, "K", 2),
    "lapse_rate": ("K/m", "K/ft", "K/m", 4, "K/ft", 6),
    "ratio": ("1", "1", "1", 3, "1", 3),
    "speed": ("1/s", "1/s", "r/min", 0, "r/min", 0),
    "specific_speed": ("1", "1", "1", 0, "1", 0),
}
#: Display system -> kind -> the unit of record, coherent, so that printed numbers go straight into a formula.
COHERENT: dict[str, dict[str, Unit]] = {
    "SI": {kind: unit(row[0]) for kind, row in _DISPLAY.items()},
    "US": {kind: unit(row[1]) for kind, row in _DISPLAY.items()},
}
#: Display system -> kind -> the unit and the decimals of the headline figure.
PLANT: dict[str, dict[str, tuple[Unit, int]]] = {
    "SI": {kind: (unit(row[2]), row[3]) for kind, row in _DISPLAY.items()},
    "US": {kind: (unit(row[4]), row[5]) for kind, row in _DISPLAY.items()},
}
