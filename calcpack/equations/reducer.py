"""Changes of bore, sudden and by a taper, on the velocity head of the smaller bore."""

from ..references import DEFINITION, IDENTITY, Cite
from . import Equation

_TAPER = "taper of at most 45° in all; turbulent flow"
_STEEP = "taper of more than 45° in all; turbulent flow"

EQUATIONS = (
    Equation("bore_ratio", "b_D", "D_2 / D_1", "Smaller over larger bore", DEFINITION),
    Equation(
        "taper_half_angle",
        "s",
        "(D_1 - D_2) / sqrt(4 * L_t**2 + (D_1 - D_2)**2)",
        "Sine of half the angle of the taper",
        IDENTITY,
        "from its length and its two bores",
    ),
    Equation(
        "contraction_gradual", "K_s", "0.8 * s * (1 - b_D**2)", "Gradual contraction", Cite("crane76", "formula 1"), _TAPER
    ),
    Equation(
        "contraction_steep",
        "K_s",
        "0.5 * sqrt(s) * (1 - b_D**2)",
        "Steep contraction",
        Cite("crane76", "formula 2"),
        _STEEP,
    ),
    Equation(
        "contraction_sudden",
        "K_s",
        "0.5 * (1 - b_D**2)",
        "Sudden contraction",
        Cite("crane76", "formula 2 at 180°"),
        "turbulent flow",
    ),
    Equation(
        "enlargement_gradual",
        "K_s",
        "2.6 * s * (1 - b_D**2)**2",
        "Gradual enlargement",
        Cite("crane76", "formula 3"),
        _TAPER,
    ),
    Equation(
        "enlargement_sudden",
        "K_s",
        "(1 - b_D**2)**2",
        "Sudden enlargement, or a taper of more than 45° in all",
        Cite("crane76", "formula 4"),
        "turbulent flow",
    ),
    Equation(
        "on_larger_bore",
        "K",
        "K_s / b_D**4",
        "Loss coefficient on the velocity head of the larger bore",
        IDENTITY,
        "one loss in head; velocity heads go by the fourth power of the bores",
    ),
)  # fmt: skip
