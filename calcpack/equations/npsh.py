"""Net positive suction head: the design route, the measured route, and the way between them."""

from ..references import DEFINITION, IDENTITY, Cite
from . import Equation

EQUATIONS = (
    Equation(
        "static_head",
        "z",
        "z_s - z_d",
        "Static head of the surface over the pump's datum",
        DEFINITION,
        "positive: flooded; negative: lift",
    ),
    Equation("surface_head", "H_s", "p_s / gamma", "Surface pressure as head of this liquid", DEFINITION),
    Equation("vapour_head", "H_v", "p_v / gamma", "Vapour pressure as head of this liquid", DEFINITION),
    Equation(
        "npsh_design",
        "NPSHA_d",
        "H_s + z - H_v - h_L",
        "Net positive suction head available",
        Cite("doe1018", "Centrifugal Pump Operation"),
        "no velocity head: the surface is at rest",
    ),
    Equation("gauge_height", "z_g", "z_G - z_d", "Gauge height over the pump's datum", DEFINITION),
    Equation("barometer_head", "H_b", "p_b / gamma", "Barometer as head of this liquid", DEFINITION),
    Equation("gauge_head", "H_g", "p_g / gamma", "Gauge reading as head of this liquid", DEFINITION),
    Equation(
        "npsh_measured",
        "NPSHA_m",
        "H_b + H_g + z_g + h_V - H_v",
        "Net positive suction head available, measured",
        Cite("handbook"),
        "the gauge has seen every loss before its tap",
    ),
    Equation("difference", "C_d", "NPSHA_d - NPSHA_m", "Model less reading, at the state of the reading", DEFINITION),
    Equation(
        "inferred_loss",
        "h_u",
        "H_sm + z_m - H_vm - NPSHA_m",
        "Losses from the surface to the tap, as the reading shows them",
        IDENTITY,
        "contains every error of level and gauge",
    ),
    Equation(
        "surface_head_change", "dH_s", "H_s - H_sm", "Change of the surface head, worst case less reading", DEFINITION
    ),
    Equation("level_change", "dz", "z - z_m", "Change of the static head, worst case less reading", DEFINITION),
    Equation(
        "vapour_head_change",
        "dH_v",
        "H_v - H_vm",
        "Change of the vapour-pressure head, worst case less reading",
        DEFINITION,
    ),
    Equation(
        "loss_change",
        "dh_h",
        "h_u * ((Q / Q_m)**2 - 1)",
        "Change of the losses with flow",
        IDENTITY,
        "turbulent losses: flow squared",
    ),
    Equation(
        "npsh_carried",
        "NPSHA_w",
        "NPSHA_m + dH_s + dz - dH_v - dh_h",
        "Net positive suction head available, reading carried to the worst case",
        IDENTITY,
    ),
    Equation("margin_ratio", "M_r", "NPSHA / NPSHR", "Margin ratio", DEFINITION),
    Equation("margin_difference", "M_d", "NPSHA - NPSHR", "Margin difference", DEFINITION),
    Equation("needed_by_ratio", "N_r", "m_r * NPSHR", "NPSH needed by the margin ratio", DEFINITION),
    Equation("needed_by_difference", "N_d", "NPSHR + m_d", "NPSH needed by the margin difference", DEFINITION),
    Equation("needed_ratio_alone", "N_L", "N_r", "NPSH needed: the ratio is the only margin asked for", DEFINITION),
    Equation(
        "needed_difference_alone", "N_L", "N_d", "NPSH needed: the difference is the only margin asked for", DEFINITION
    ),
    Equation("needed_greater", "N_L", "max(N_r, N_d)", "NPSH needed, the greater governs", DEFINITION),
)
