"""The barometer at the site."""

from ..references import DEFINITION, PRACTICE, Cite
from . import Equation

EQUATIONS = (
    Equation(
        "geopotential_height",
        "H",
        "r_0 * Z / (r_0 + Z)",
        "Geopotential height of the site",
        Cite("ussa76"),
        "up to 11 km",
    ),
    Equation(
        "atmosphere_exponent",
        "n_a",
        "K_h / beta",
        "Exponent of the pressure law",
        Cite("ussa76"),
    ),
    Equation(
        "standard_atmosphere",
        "p_a",
        "p_0 * (1 - beta * H / T_0)**n_a",
        "Standard atmosphere at the site, absolute",
        Cite("ussa76"),
        "-5 to 11 km",
    ),
    Equation(
        "barometer_standard",
        "p_b",
        "p_a - dp_w",
        "Barometer, absolute: standard atmosphere less weather allowance",
        Cite("armstrong", "deducts an allowance for weather, there half an inch of mercury"),
    ),
    Equation(
        "barometer_station",
        "p_b",
        "p_r - dp_w",
        "Barometer, absolute: station less weather allowance",
        PRACTICE,
    ),
    Equation("open_surface", "p_s", "p_b", "Surface pressure of an open surface, absolute", DEFINITION),
    Equation(
        "saturated_surface",
        "p_s",
        "p_v",
        "Surface pressure of a saturated vessel: the vapour pressure of its liquid, absolute",
        DEFINITION,
        "liquid and vapour in equilibrium at one temperature",
    ),
    Equation("drawn_down_level", "z_s", "z_l - z_w", "Level of the surface while pumping", DEFINITION),
    Equation("point_from_gauge", "p_k", "p_b + p_g", "Pressure at the point where it is known, absolute", DEFINITION),
    Equation("absolute_from_gauge", "p_s", "p_b + p_g", "Surface pressure, absolute", DEFINITION),
    Equation("gauge_from_vacuum", "p_g", "-p_vac", "Gauge pressure from the vacuum as read", DEFINITION),
)
