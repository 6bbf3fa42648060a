"""Straight pipe of constant bore."""

from ..references import DEFINITION, Cite
from . import Equation

EQUATIONS = (
    Equation(
        "section_flow",
        "Q_n",
        "N * Q",
        "Flow in a section that serves several pumps",
        DEFINITION,
        "the pumps that run and draw through it, each with the flow of one pump",
    ),
    Equation("bore_area", "A", "pi * D**2 / 4", "Area of the bore", DEFINITION),
    Equation("mean_velocity", "V", "Q / A", "Mean velocity", DEFINITION),
    Equation("velocity_head", "h_V", "V**2 / (2 * g)", "Velocity head", DEFINITION),
    Equation("reynolds", "Re", "rho * V * D / mu", "Reynolds number", Cite("hi_edl", "eq. 3.A.4")),
    Equation("relative_roughness", "r", "eps / D", "Relative roughness", DEFINITION),
    Equation(
        "laminar_friction",
        "f",
        "64 / Re",
        "Friction factor (Darcy), laminar",
        Cite("hi_edl", "eq. 3.A.5"),
        "Re below 2000",
    ),
    Equation(
        "colebrook",
        "f",
        "1 / sqrt(f) == -2 * log10(r / 3.7 + 2.51 / (Re * sqrt(f)))",
        "Friction factor (Darcy), solved for its root",
        Cite("colebrook"),
        "turbulent, Re above 4000; the residual changes sign across the root",
    ),
    Equation(
        "colebrook_transition",
        "f",
        "1 / sqrt(f) == -2 * log10(r / 3.7 + 2.51 / (Re * sqrt(f)))",
        "Friction factor (Darcy), solved for its root",
        Cite("colebrook"),
        "uncertain: Re between 2000 and 4000, where flow is neither laminar nor fully turbulent; "
        "the turbulent value is taken, the greater of the two",
    ),
    Equation(
        "pipe_coefficient",
        "K",
        "f * L / D",
        "Loss coefficient, straight pipe",
        Cite("hi_edl", "eq. 3.A.1, its factor f L/D"),
    ),
)
