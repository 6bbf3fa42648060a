"""The reader's own table of units, from their definitions, all exact.

International foot 0.3048 m, pound 0.453 592 37 kg, US gallon 231 in³, imperial gallon 4.546 09 L, standard
gravity 9.806 65 m/s² (NIST SP 811 (2008), App. B; recalled, not re-read); conventional millimetre of mercury
13.5951 times that of water.
"""

from __future__ import annotations

import re
from dataclasses import dataclass
from decimal import Decimal
from fractions import Fraction as F

from .failures import Unread

_FT, _LB, _G = F("0.3048"), F("0.45359237"), F("9.80665")
_IN, _LBF = _FT / 12, _LB * _G
_GAL, _UKGAL = 231 * _IN**3, F("4.54609") / 1000
_MIN, _H, _D = 60, 3600, 86400
_HG, _AQ = F("13.5951") * 1000 * _G, 1000 * _G

#: Dimension -> unit -> its size in SI.
_SIZES: dict[str, dict[str, F]] = {
    "length": {
        "m": F(1), "km": F(1000), "cm": F(1, 100), "mm": F(1, 1000), "µm": F(1, 10**6), "ft": _FT, "in": _IN,
    },
    "area": {"m²": F(1), "cm²": F(1, 10**4), "mm²": F(1, 10**6), "ft²": _FT**2, "in²": _IN**2},
    "velocity": {"m/s": F(1), "ft/s": _FT},
    "acceleration": {"m/s²": F(1), "ft/s²": _FT},
    "flow": {
        "m³/s": F(1), "m³/h": F(1, _H), "m³/d": F(1, _D), "L/s": F(1, 1000), "L/min": F(1, 1000 * _MIN),
        "ft³/s": _FT**3, "ft³/min": _FT**3 / _MIN, "gal/min": _GAL / _MIN, "Mgal/d": _GAL * 10**6 / _D,
        "UK gal/min": _UKGAL / _MIN, "bbl/h": 42 * _GAL / _H, "bbl/d": 42 * _GAL / _D,
    },
    "pressure": {
        "Pa": F(1), "hPa": F(100), "kPa": F(1000), "MPa": F(10**6), "mbar": F(100), "bar": F(10**5),
        "atm": F(101325), "Torr": F(101325, 760), "kgf/cm²": _G * 10**4, "psi": _LBF / _IN**2,
        "lbf/ft²": _LBF / _FT**2, "mmHg": _HG / 1000, "inHg": _HG * _IN, "mH2O": _AQ, "mmH2O": _AQ / 1000,
        "ftH2O": _AQ * _FT, "inH2O": _AQ * _IN,
    },
    "density": {
        "kg/m³": F(1), "g/cm³": F(1000), "kg/L": F(1000), "lb/ft³": _LB / _FT**3, "slug/ft³": _LBF / _FT**4,
    },
    "dynamic viscosity": {
        "Pa·s": F(1), "mPa·s": F(1, 1000), "cP": F(1, 1000), "lbf·s/ft²": _LBF / _FT**2,
        "lb/(ft·s)": _LB / _FT,
    },
    "kinematic viscosity": {"m²/s": F(1), "mm²/s": F(1, 10**6), "cSt": F(1, 10**6), "ft²/s": _FT**2},
    "specific weight": {"N/m³": F(1), "kN/m³": F(1000), "lbf/ft³": _LBF / _FT**3},
    "temperature": {"K": F(1), "°C": F(1), "°F": F(5, 9), "°R": F(5, 9)},
    "lapse rate": {"K/m": F(1), "K/km": F(1, 1000), "K/ft": 1 / _FT},
    "speed": {"s⁻¹": F(1), "r/min": F(1, _MIN)},
    "ratio": {"": F(1), "%": F(1, 100), "g/kg": F(1, 1000)},
}  # fmt: skip
#: Added to a reading before its size counts.
_ZEROS = {"°C": F("273.15"), "°F": F("459.67")}
_DIMENSION = {name: dimension for dimension, names in _SIZES.items() for name in names}
#: Further spellings that may be typed, and so stand in the column 'as given'.
_SPELLINGS = {
    "gpm": "gal/min", "USgpm": "gal/min", "US gal/min": "gal/min", "USgal/min": "gal/min",
    "UKgpm": "UK gal/min", "UKgal/min": "UK gal/min", "imp gal/min": "UK gal/min", "igpm": "UK gal/min",
    "mgd": "Mgal/d", "MGD": "Mgal/d", "cfs": "ft³/s", "cfm": "ft³/min", "l/s": "L/s", "l/min": "L/min",
    "fps": "ft/s", "lbf/in²": "psi", "psf": "lbf/ft²", "torr": "Torr", "mH₂O": "mH2O", "mmH₂O": "mmH2O",
    "ftH₂O": "ftH2O", "inH₂O": "inH2O", "kg/l": "kg/L", "lbm/ft³": "lb/ft³", "lbm/(ft·s)": "lb/(ft·s)",
    "degC": "°C", "deg C": "°C", "degF": "°F", "deg F": "°F", "degR": "°R", "deg R": "°R",
    "rpm": "r/min", "rev/min": "r/min", "1/min": "r/min", "1/s": "s⁻¹", "1": "", "um": "µm", "μm": "µm",
}  # fmt: skip
_REFERENCE = re.compile(r" (gauge|gage|absolute|abs|vacuum)$|(?<=psi|bar|kPa|MPa)(g|a|\(g\)|\(a\))$")


@dataclass(frozen=True)
class Quantity:
    """A printed number with its unit by the table's name; the empty name is a pure number."""

    value: Decimal
    unit: str

    def __str__(self) -> str:
        return f"{self.value} {self.unit}".rstrip()


def named(printed: str) -> str:
    """The table's name of a unit as printed or typed, without what a pressure counts from.  Raises
    ``Unread``."""
    name = _REFERENCE.sub("", printed.strip())
    plain = re.sub(r"(?<=[a-z])\^?3", "³", re.sub(r"(?<=[a-z])\^?2(?!O)", "²", name))
    for each in (name, plain, re.sub("[⋅.*]", "·", plain)):
        each = _SPELLINGS.get(each, each)
        if each in _DIMENSION:
            return each
    raise Unread(f"the unit {printed!r} is not known")


def same_dimension(a: str, b: str) -> bool:
    """Whether two units measure the same."""
    return _DIMENSION[a] == _DIMENSION[b]


def converted(value: F, a: str, b: str) -> F:
    """``value`` of unit ``a`` in unit ``b``, exact.  Raises ``Unread`` where the two differ in dimension."""
    if not same_dimension(a, b):
        raise Unread(f"{a or 'a pure number'} and {b or 'a pure number'} measure different things")
    return (value + _ZEROS.get(a, F(0))) * factor(a, b) - _ZEROS.get(b, F(0))


def factor(a: str, b: str) -> F:
    """The exact multiplier from ``a`` to ``b``, zeros left out."""
    return _SIZES[_DIMENSION[a]][a] / _SIZES[_DIMENSION[b]][b]
