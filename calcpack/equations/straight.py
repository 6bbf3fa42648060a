"""Straight pipe before the pump: its length together, the run it must give, and the head its liquid takes to be moved."""

from ..references import DEFINITION, Cite
from . import Equation

EQUATIONS = (
    Equation("straight_pipe", "L_s", "sum(L)", "Straight pipe, together", DEFINITION),
    Equation("straight_run_needed", "L_m", "x_D * D", "Straight run needed before the pump", DEFINITION),
    Equation(
        "acceleration_head",
        "h_as",
        "60 * L * V * n_p * C / (k * g)",
        "Acceleration head",
        Cite("hi61"),
        "short, rigid line; the published form takes r/min, hence 60",
    ),
    Equation("acceleration_heads", "h_a", "sum(h_as)", "Acceleration head of all sections", DEFINITION),
)
