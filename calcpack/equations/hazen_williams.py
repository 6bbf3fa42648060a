"""Friction in straight pipe by Hazen and Williams."""

from ..references import Cite
from . import Equation

EQUATIONS = (
    Equation(
        "hazen_williams",
        "h",
        "4.727 * L * (Q / (Q_1 * C_h))**1.852 / (D / l_1)**4.871",
        "Head lost in straight pipe, Hazen-Williams",
        Cite("epanet", "table of headloss formulas"),
        "water near ordinary temperature, turbulent flow; the number belongs to feet and cubic feet a second, hence l_1 and Q_1",
    ),
)
