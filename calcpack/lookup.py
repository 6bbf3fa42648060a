"""What is looked up rather than computed: properties of water, pipe bores, and tables of constants.

The only room that knows CoolProp and the pipe tables; both are imported when first asked for.
"""

from __future__ import annotations

from collections.abc import Mapping
from dataclasses import dataclass
from functools import cache
from importlib.metadata import version

from .references import PRACTICE, Cite


class OutOfRange(ValueError):
    """A look-up outside the validity of its source; the message names the range."""


@dataclass(frozen=True)
class Property:
    """A property of saturated liquid water as a function of temperature.

    Source: CoolProp (reference equation named in ``cite``); validity of the formulation in ``lowest``..``highest``, K.
    """

    name: str
    symbol: str
    output: str
    function: str
    title: str
    cite: Cite


#: Water between its triple point and its critical point, K (IAPWS R6-95); the tool stops at 600 K, short of it.
WATER_RANGE = (273.16, 600.0)
PROPERTIES: Mapping[str, Property] = {
    p.name: p
    for p in (
        Property(
            "vapour_pressure",
            "p_v",
            "P",
            "p_sat(T)",
            "Vapour pressure, absolute, looked up",
            Cite("iapws95", "saturation line"),
        ),
        Property("density", "rho", "D", "rho_sat(T)", "Density, looked up", Cite("iapws95", "saturated liquid")),
        Property(
            "viscosity", "mu", "V", "mu_sat(T)", "Dynamic viscosity, looked up", Cite("iapws08", "saturated liquid")
        ),
    )
}


@cache
def water(name: str, kelvin: float) -> float:
    """Property ``name`` of saturated liquid water at ``kelvin``, in SI (Pa, kg/m³, Pa·s).

    Raises :class:`OutOfRange` outside :data:`WATER_RANGE`.  Source: IAPWS-95 and IAPWS R12-08 through CoolProp.
    """
    low, high = WATER_RANGE
    if not low <= kelvin <= high:
        raise OutOfRange(f"water is looked up between {low} K (0.01 °C) and {high:.0f} K")
    from CoolProp.CoolProp import PropsSI

    return float(PropsSI(PROPERTIES[name].output, "T", kelvin, "Q", 0, "Water"))


@cache
def library(name: str) -> str:
    """A library's name and the version that is installed."""
    return f"{name} {version(name)}"


@dataclass(frozen=True)
class Bore:
    """A bore from the pipe table, in millimetres as the table gives it, with its place there."""

    millimetres: str
    place: str


def bore(size: str, schedule: str) -> Bore:
    """Inside diameter of a steel pipe by nominal size (``NPS 16`` or ``DN 250``) and schedule.

    Source: ASME B36.10M through ``fluids``.  Raises :class:`OutOfRange` where the table has no such pipe.
    """
    nps = nominal_inches(size)
    from fluids.piping import nearest_pipe

    try:
        found, inside, outside, wall = nearest_pipe(NPS=nps, schedule=schedule)  # type: ignore[arg-type]  # its annotation says int; NPS 1.5 is meant
    except (ValueError, KeyError):
        raise OutOfRange(f"the table has no pipe {size}, schedule {schedule}") from None
    if found != nps:
        raise OutOfRange(f"the table has no pipe {size}, schedule {schedule}")
    return Bore(
        f"{inside * 1000:.2f}", f"{size} schedule {schedule}: {outside * 1000:.1f} mm less twice {wall * 1000:.2f} mm"
    )


def nominal_inches(size: str) -> float:
    """The NPS of a nominal size, ``NPS 16`` or ``DN 250``.  Raises :class:`OutOfRange` where there is no such size."""
    system, _, number = size.partition(" ")
    try:
        return DN_TO_NPS[number] if system == "DN" else _inches(number)
    except (KeyError, ValueError, ZeroDivisionError):
        raise OutOfRange(f"{size} is not a nominal size of the table") from None


def _inches(text: str) -> float:
    whole, _, fraction = text.partition("-")
    if "/" in whole:
        whole, fraction = "0", whole
    top, _, bottom = fraction.partition("/")
    return float(whole) + (float(top) / float(bottom) if fraction else 0.0)


#: Nominal diameters of ISO 6708 beside the NPS of ASME B36.10M; from DN 100 on it is 25 mm an inch.
DN_TO_NPS: Mapping[str, float] = {
    "15": 0.5,
    "20": 0.75,
    "25": 1,
    "32": 1.25,
    "40": 1.5,
    "50": 2,
    "65": 2.5,
    "80": 3,
    "90": 3.5,
    **{str(25 * n): float(n) for n in (4, 5, 6, 8, 10, 12, 14, 16, 18, 20, 22, 24, 26, 28, 30, 32, 34, 36)},
}


@dataclass(frozen=True)
class Constant:
    """A fixed number of the tool: exact where its definition is, else as its source prints it."""

    symbol: str
    text: str
    title: str
    cite: Cite


CONSTANTS: Mapping[str, Constant] = {
    c.symbol: c
    for c in (
        Constant("g", "9.80665 m/s²", "Standard acceleration of gravity, exact", Cite("sp811", "B.8")),
        Constant("p_0", "101325 Pa absolute", "Pressure at sea level", Cite("ussa76")),
        Constant("T_0", "288.15 K", "Temperature at sea level", Cite("ussa76")),
        Constant("beta", "0.0065 K/m", "Fall of temperature with height, up to 11 km", Cite("ussa76")),
        Constant("r_0", "6356766 m", "Radius of the Earth at latitude 45.5°", Cite("ussa76")),
        Constant(
            "K_h", "0.034163195 K/m", "Hydrostatic constant g₀M₀/R*", Cite("ussa76", "derived from its constants")
        ),
        Constant(
            "eps_c", "0.00015 ft", "Roughness the fitting set takes for clean steel", Cite("crane09", "0.0018 in")
        ),
        Constant("dT", "5 K", "Step of temperature for the cost line", PRACTICE),
    )
}

#: Absolute roughness by material.
ROUGHNESS: Mapping[str, tuple[str, Cite]] = {
    "commercial steel": ("0.00015 ft", Cite("hi_edl", "table 3.A.1")),
    "stainless steel": ("0.00005 ft", Cite("hi_edl", "table 3.A.1")),
    "galvanised steel": ("0.0005 ft", Cite("hi_edl", "table 3.A.1")),
    "cast iron": ("0.00085 ft", Cite("hi_edl", "table 3.A.1, uncoated")),
    "cement-lined steel": ("0.005 ft", Cite("hi_edl", "table 3.A.1")),
    "concrete": ("0.01 ft", Cite("hi_edl", "table 3.A.1, upper value")),
    "plastic": ("0.000005 ft", Cite("hi_edl", "table 3.A.1, drawn tubing")),
    "copper": ("0.000005 ft", Cite("hi_edl", "table 3.A.1, drawn tubing")),
}
