"""The head that a mistake of the input would put at stake, where the file holds what it takes to compute it."""

from ..references import DEFINITION, IDENTITY, PRACTICE
from . import Equation

_TWICE = "read below the barometer and typed as if above it"

EQUATIONS = (
    Equation(
        "vacuum_as_absolute",
        "dH_x",
        "(2 * p_s - p_b) / gamma",
        "Head by which the surface pressure is too high if it is a vacuum typed as absolute",
        IDENTITY,
        "negative: too low",
    ),
    Equation("gauge_sign", "dH_x", "2 * H_g", "Head by which the reading is too high if it is a vacuum", IDENTITY, _TWICE),
    Equation(
        "barometer_excess",
        "dH_x",
        "(p_b - p_a) / gamma",
        "Head by which the barometer lies above the standard atmosphere at the site",
        DEFINITION,
    ),
    Equation(
        "barometer_rise",
        "dH_x",
        "(p_b - p_r) / gamma",
        "Head by which the barometer read lies above the lowest of the station",
        DEFINITION,
    ),
    Equation("weather_head", "dH_x", "dp_w / gamma", "Head that low-pressure weather takes", DEFINITION),
    Equation(
        "gas_credit", "dH_x", "H_s - H_v", "Head credited to the pressure on the surface over vapour pressure", DEFINITION
    ),
    Equation("datum_over_bell", "dH_x", "z_d - z_r", "Height of the pump's datum over the bell lip", DEFINITION),
    Equation("line_end_over_datum", "dH_x", "z_n - z_d", "Height of the line's end over the pump's datum", DEFINITION),
    Equation(
        "eye_over_bell", "dH_x", "D_i / 2", "Usual height of the first stage's eye over the bell lip", PRACTICE,
        "half the diameter of the bell, estimated",
    ),
    Equation(
        "cost_of_flow", "dH_x", "(1.1**2 - 1) * h_L", "Head lost for a tenth more of flow", IDENTITY,
        "turbulent losses: flow squared",
    ),
    Equation("friction_left_out", "dH_x", "f * L / D * h_V - h", "Friction that the coefficient stated leaves out", DEFINITION),
    Equation(
        "cost_of_age", "dH_x", "(f_x - f) * L / D * h_V", "Head lost in straight pipe by its wall as aged, over that as new", DEFINITION
    ),
    Equation(
        "cost_of_density",
        "dH_x",
        "(p_s - p_v) / g * (1 / rho - 1 / rho_x)",
        "Head by which the surface pressure over vapour pressure changes with the density cited",
        IDENTITY,
        "negative: the head is too low",
    ),
    Equation(
        "cost_of_vapour_pressure", "dH_x", "p_x / gamma - H_v", "Head that the vapour pressure as looked up takes more", DEFINITION
    ),
    Equation(
        "loss_of_station_flow", "dH_x", "(1 - 1 / N**2) * h_L", "Loss that is too high if the flow is that of all pumps", IDENTITY,
        "turbulent losses: flow squared",
    ),
    Equation(
        "submergence_of_station_flow", "dH_x", "2.3 * Fr * D_i * (1 - 1 / N)",
        "Submergence asked for in excess if the flow is that of all pumps", IDENTITY, "by the formula of the submergence needed",
    ),
    Equation(
        "npsh_of_specific_speed",
        "dH_x",
        "l_u * (n_p / n_u * sqrt(Q / Q_u) / N_sm)**(4 / 3) - NPSHR",
        "NPSH required of a pump of usual suction specific speed, over the one stated",
        IDENTITY,
        "the definition of suction specific speed turned round; an estimate",
    ),
    Equation(
        "usual_margin", "dH_x", "max((m_r - 1) * NPSHR, m_d)", "Margin over NPSH required in print", DEFINITION,
        "ratio or difference, the greater",
    ),
)  # fmt: skip
