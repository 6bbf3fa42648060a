"""The inlet below a free surface."""

from ..references import DEFINITION, Cite
from . import Equation

EQUATIONS = (
    Equation("inlet_area", "A_i", "pi * D_i**2 / 4", "Area of the inlet", DEFINITION),
    Equation("inlet_velocity", "V_i", "Q / A_i", "Mean velocity at the inlet", DEFINITION),
    Equation("inlet_froude", "Fr", "V_i / sqrt(g * D_i)", "Froude number of the inlet", Cite("hi98")),
    Equation("submergence_needed", "S_m", "D_i * (1 + 2.3 * Fr)", "Submergence needed against vortices", Cite("hi98")),
    Equation("submergence", "S", "z_s - z_r", "Available submergence over the reference line", DEFINITION),
)
