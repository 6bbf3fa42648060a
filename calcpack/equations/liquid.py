"""The liquid at its temperature."""

from ..references import DEFINITION, PRACTICE, Cite
from . import Equation

EQUATIONS = (
    Equation("specific_weight", "gamma", "rho * g", "Specific weight", DEFINITION),
    Equation("dynamic_viscosity", "mu", "nu * rho", "Dynamic viscosity from the kinematic one", DEFINITION),
    Equation("warmer_temperature", "T_x", "T + dT", "Temperature one step warmer", DEFINITION),
    Equation("colder_temperature", "T_x", "T - dT_s", "Temperature one step colder", DEFINITION),
    Equation(
        "cost_of_temperature",
        "dH_c",
        "(p_x - p_v) / gamma",
        "Head lost for that step of temperature",
        DEFINITION,
        "change of density left out: it is the smaller part",
    ),
    Equation(
        "water_mole_fraction",
        "x_w",
        "(1 - w) / (1 - w + w * M_w / M_s)",
        "Mole fraction of water",
        DEFINITION,
        "what is dissolved stays whole: no ions",
    ),
    Equation(
        "raoult",
        "p_v",
        "x_w * p_w",
        "Vapour pressure, absolute, by Raoult's law",
        Cite("raoult"),
        "ideal solution; what is dissolved does not evaporate",
    ),
    Equation(
        "sea_water_vapour_pressure",
        "p_v",
        "p_w / (1 + 0.57357 * w / (1 - w))",
        "Vapour pressure of sea water, absolute",
        Cite("sharqawy"),
        "0 to 200 °C, salinity to 240 g/kg",
    ),
    Equation(
        "density_between",
        "rho",
        "rho_1 + (rho_2 - rho_1) * ((T_t - T_1) / (T_2 - T_1))",
        "Density between two rows of the table",
        PRACTICE,
        "linear in temperature",
    ),
    Equation(
        "place_between",
        "y",
        "(1 / T_1 - 1 / T_t) / (1 / T_1 - 1 / T_2)",
        "Place between two rows of the table",
        DEFINITION,
        "0 at the row below, 1 at the row above; linear in the inverse of the absolute temperature",
    ),
    Equation(
        "vapour_pressure_between",
        "p_v",
        "p_v1 * (p_v2 / p_v1)**y",
        "Vapour pressure, absolute, between two rows of the table",
        PRACTICE,
        "its logarithm is linear in 1/T, which lies a little low where the rows are far apart",
    ),
    Equation(
        "viscosity_between",
        "mu",
        "mu_1 * (mu_2 / mu_1)**y",
        "Dynamic viscosity between two rows of the table",
        PRACTICE,
        "its logarithm is linear in 1/T",
    ),
    Equation(
        "kinematic_viscosity_between",
        "nu",
        "nu_1 * (nu_2 / nu_1)**y",
        "Kinematic viscosity between two rows of the table",
        PRACTICE,
        "its logarithm is linear in 1/T",
    ),
)
