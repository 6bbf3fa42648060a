"""Pressure at points of the line."""

from ..references import Cite
from . import Equation

_BALANCE = Cite("", "energy balance from the supply to the point")
_WHERE = "absolute; less every loss up to the point and the velocity head there"

EQUATIONS = (
    Equation("node_pressure", "p_n", "gamma * (E_0 - sum(h) - z_n - h_V)", "Pressure", _BALANCE, _WHERE),
    Equation(
        "node_pressure_with_contingency",
        "p_n",
        "gamma * (E_0 - (1 + c) * sum(h) - z_n - h_V)",
        "Pressure",
        _BALANCE,
        f"{_WHERE}; with the contingency on the losses",
    ),
)
