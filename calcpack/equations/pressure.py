"""Pressures that rules hold against one another: along the line, in a loop, and of the air at the site."""

from ..references import DEFINITION, PRACTICE
from . import Equation

EQUATIONS = (
    Equation(
        "pressure_less_acceleration",
        "p_sn",
        "p_n - gamma * h_a",
        "Lowest pressure within a stroke",
        DEFINITION,
        "absolute",
    ),
    Equation("pressure_kept", "p_m", "p_v + gamma * h_c", "Absolute pressure to be kept along the line", DEFINITION),
    Equation(
        "inlet_gauge_running",
        "p_i",
        "gamma * (NPSHA_d + H_v - h_V) - p_b",
        "Gauge pressure at the pump inlet, on the pump's datum, pump running",
        DEFINITION,
    ),
    Equation(
        "inlet_gauge_at_rest",
        "p_i",
        "gamma * (H_k + z) - p_b",
        "Gauge pressure at the pump inlet, on the pump's datum, at rest",
        DEFINITION,
    ),
    Equation(
        "gauge_on_the_line", "p_i", "p_n - p_b", "Gauge pressure at a point of the line, pump running", DEFINITION
    ),
    Equation(
        "high_point_gauge",
        "p_h",
        "p_k - gamma * (z_h - z_k) - p_b",
        "Gauge pressure at the high point of the loop, at rest",
        DEFINITION,
    ),
    Equation("barometer_lowest_likely", "p_al", "0.95 * p_a", "Lowest barometer that suits the site", PRACTICE),
    Equation("barometer_highest_likely", "p_ah", "1.05 * p_a", "Highest barometer that suits the site", PRACTICE),
)
