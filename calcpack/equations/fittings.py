"""Fittings, valves, strainers and equipment, and the sum of the losses."""

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
    Equation("fitting_coefficient", "K", "m * f_T", "Loss coefficient", Cite("crane76"), "turbulent flow"),
    Equation("hooper_2k", "K", "K_1 / Re + K_oo * (1 + d_1 / D)", "Loss coefficient", Cite("hooper"), "any flow"),
    Equation(
        "darby_3k",
        "K",
        "K_1 / Re + K_i * (1 + K_d * (d_1 / D_n)**0.3)",
        "Loss coefficient",
        Cite("darby"),
        "any flow; by the nominal diameter",
    ),
    Equation(
        "equivalent_length",
        "K",
        "f * q",
        "Loss coefficient of an equivalent length",
        Cite("hi_edl", "eq. 3.A.1, its factor f L/D"),
    ),
    Equation("row_loss", "h", "n * K * h_V", "Head lost", Cite("hi_edl", "eq. 3.A.1 with K")),
    Equation("row_loss_single", "h", "K * h_V", "Head lost", Cite("hi_edl", "eq. 3.A.1 with K")),
    Equation("drop_as_head", "h_0", "dp_0 / gamma", "Pressure drop as head", DEFINITION),
    Equation(
        "flow_coefficient_head",
        "h_0",
        "dp_0 / (rho_w * g)",
        "Head lost at the flow that the flow coefficient is",
        DEFINITION,
        "of any liquid: its pressure drop grows with its density, and as head of itself the density cancels",
    ),
    Equation(
        "loss_at_flow",
        "h",
        "h_0 * (Q / Q_0)**2",
        "Loss at this flow",
        Cite("eaton", "printed for strainers"),
        "square law: turbulent flow",
    ),
    Equation(
        "loss_between_points",
        "h",
        "h_A + (h_B - h_A) * ((Q - Q_A) / (Q_B - Q_A))",
        "Loss at this flow, on the straight line between two points of the maker's curve",
        DEFINITION,
    ),
    Equation("equal_elements", "h", "n * h_e", "Loss of equal elements", DEFINITION),
    Equation("sum_of_rows", "h_S", "sum(h)", "Sum of the rows", DEFINITION),
    Equation(
        "losses_with_contingency",
        "h_L",
        "(1 + c) * h_S",
        "Losses, supply to suction nozzle, with the contingency",
        PRACTICE,
    ),
    Equation("losses", "h_L", "sum(h)", "Losses, supply to suction nozzle", DEFINITION),
)
