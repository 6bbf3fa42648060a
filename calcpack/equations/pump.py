"""NPSH required: between the points of the maker's curve, at another speed, and with its margin."""

from ..references import DEFINITION, IDENTITY, PRACTICE, Cite
from . import Equation

_SMOOTH = Cite("fritsch")

EQUATIONS = (
    Equation(
        "flow_at_curve_speed",
        "Q_c",
        "Q * n_0 / n_p",
        "Flow at which the maker's curve is read, at its speed",
        IDENTITY,
        "flows go as the speeds",
    ),
    Equation(
        "npsh_between_points",
        "NPSHR_c",
        "N_A + (N_B - N_A) * ((Q - Q_A) / (Q_B - Q_A))",
        "NPSH required, on the straight line between two points of the maker's curve",
        PRACTICE,
        "on the safe side where the curve bends upward",
    ),
    Equation("curve_width", "b", "Q_B - Q_A", "Width of the interval between two points of the curve", DEFINITION),
    Equation("curve_widths", "x_b", "b_n / b", "Width of the interval next to it, over its own", DEFINITION),
    Equation("curve_rise", "dN", "N_B - N_A", "Rise of NPSH required between two points of the curve", DEFINITION),
    Equation(
        "curve_slope",
        "dN_P",
        "3 * (1 + x_b) / ((2 + x_b) * x_b / dN_n + (1 + 2 * x_b) / dN)",
        "Rise over the interval at the slope of its end: weighted harmonic mean of the secants beside it",
        _SMOOTH,
        "secants of one sign",
    ),
    Equation(
        "curve_slope_flat",
        "dN_P",
        "0 * dN",
        "Rise over the interval at the slope of its end: none, where the curve turns",
        _SMOOTH,
        "secants of unlike sign",
    ),
    Equation(
        "curve_end_slope",
        "dN_P",
        "((2 + x_b) * dN - dN_n / x_b) / (1 + x_b)",
        "Rise over the interval at the slope of the curve's end, through three points",
        _SMOOTH,
        "the curve's first or last interval",
    ),
    Equation(
        "curve_end_slope_limited",
        "dN_P",
        "3 * dN",
        "Rise over the interval at the slope of the curve's end: three times the secant, the most that keeps the shape",
        _SMOOTH,
        "where the curve turns next to its end",
    ),
    Equation(
        "curve_place", "t", "(Q - Q_A) / (Q_B - Q_A)", "Place of the flow between two points of the curve", DEFINITION
    ),
    Equation(
        "npsh_on_smooth_curve",
        "NPSHR_c",
        "N_A * (1 + 2 * t) * (1 - t)**2 + N_B * t**2 * (3 - 2 * t) + dN_A * t * (1 - t)**2 - dN_B * t**2 * (1 - t)",
        "NPSH required, on the smooth curve between two points of the maker's curve",
        _SMOOTH,
        "cubic between neighbouring points, of the shape that the points have",
    ),
    Equation(
        "npsh_at_speed",
        "NPSHR",
        "NPSHR_c * (n_p / n_0)**e_n",
        "NPSH required at the speed of the pump",
        PRACTICE,
        "both at the flows that go as the speeds",
    ),
    Equation("needed_by_ratio", "N_r", "m_r * NPSHR", "NPSH needed by the margin ratio", DEFINITION),
    Equation("needed_by_difference", "N_d", "NPSHR + m_d", "NPSH needed by the margin difference", DEFINITION),
    Equation("needed_ratio_alone", "N_L", "N_r", "NPSH needed: the ratio is the only margin asked for", DEFINITION),
    Equation(
        "needed_difference_alone", "N_L", "N_d", "NPSH needed: the difference is the only margin asked for", DEFINITION
    ),
    Equation("needed_greater", "N_L", "max(N_r, N_d)", "NPSH needed, the greater governs", DEFINITION),
    Equation("margin_ratio", "M_r", "NPSHA / NPSHR", "Margin ratio", DEFINITION),
    Equation("margin_difference", "M_d", "NPSHA - NPSHR", "Margin difference", DEFINITION),
    Equation("eye_flow", "Q_e", "Q_b / 2", "Flow of one eye of the double-suction impeller, half", DEFINITION),
    Equation(
        "suction_specific_speed",
        "N_ss",
        "n_p / n_u * sqrt(Q_e / Q_u) / (NPSH_b / l_u)**0.75",
        "Suction specific speed, at best efficiency and of one impeller eye",
        DEFINITION,
        "all at one speed; the number depends on the units it is made with",
    ),
    Equation("region_lower", "Q_rl", "r_l * Q_b", "Lower end of the operating region", DEFINITION),
    Equation("region_upper", "Q_rh", "r_h * Q_b", "Upper end of the operating region", DEFINITION),
)
