"""The liquid at its temperature."""

from ..references import DEFINITION
from . import Equation

EQUATIONS = (
    Equation("specific_weight", "gamma", "rho * g", "Specific weight", DEFINITION),
    Equation("dynamic_viscosity", "mu", "nu * rho", "Dynamic viscosity from the kinematic one", DEFINITION),
    Equation("warmer_temperature", "T_x", "T + dT", "Temperature one step warmer", DEFINITION),
    Equation(
        "cost_of_temperature",
        "dH_c",
        "(p_x - p_v) / gamma",
        "Head lost for that step of temperature",
        DEFINITION,
        "change of density left out: it is the smaller part",
    ),
)
