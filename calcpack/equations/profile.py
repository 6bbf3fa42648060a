"""Energy and pressure at points of the line."""

from ..references import DEFINITION, Cite
from . import Equation

_BALANCE = Cite("", "energy balance from the point before")

EQUATIONS = (
    Equation("energy_after", "E_n", "E_m - sum(h)", "Energy head", _BALANCE),
    Equation(
        "energy_after_with_contingency", "E_n", "E_m - (1 + c) * sum(h)", "Energy head", _BALANCE,
        "with the contingency on the losses",
    ),
    Equation("node_pressure", "p_n", "gamma * (E_n - z_n - h_V)", "Pressure", DEFINITION, "absolute"),
)  # fmt: skip
