"""Fittings, valves, strainers, and the sum of the losses."""

from ..references import DEFINITION, PRACTICE, Cite
from . import Equation

EQUATIONS = (
    Equation(
        "fully_rough_friction",
        "f_T",
        "0.25 / log10(eps_c / (3.7 * D))**2",
        "Friction factor of fully rough flow in clean steel",
        Cite("crane09", "f_T"),
    ),
    Equation("fitting_coefficient", "K", "m * f_T", "Loss coefficient", Cite("crane76")),
    Equation("row_loss", "h", "n * K * h_V", "Head lost", Cite("hi_edl", "eq. 3.A.1 with K")),
    Equation("row_loss_single", "h", "K * h_V", "Head lost", Cite("hi_edl", "eq. 3.A.1 with K")),
    Equation("strainer_drop", "h_0", "dp_0 / gamma", "Strainer drop as head at its reference flow", DEFINITION),
    Equation(
        "strainer_loss",
        "h",
        "h_0 * (Q / Q_0)**2",
        "Strainer loss at this flow",
        Cite("eaton"),
        "square law: turbulent flow through the screen",
    ),
    Equation("sum_of_rows", "h_S", "sum(h)", "Sum of the rows", DEFINITION),
    Equation(
        "losses_with_contingency",
        "h_L",
        "(1 + c) * h_S",
        "Losses, surface to suction nozzle, with the contingency",
        PRACTICE,
    ),
    Equation("losses", "h_L", "sum(h)", "Losses, surface to suction nozzle", DEFINITION),
)
