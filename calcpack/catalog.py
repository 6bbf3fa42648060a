"""Every equation of the tool, in one explicit list."""

from __future__ import annotations

from .equations import Equation, atmosphere, fittings, intake, liquid, npsh, pipe

EQUATIONS: tuple[Equation, ...] = (
    *atmosphere.EQUATIONS,
    *liquid.EQUATIONS,
    *pipe.EQUATIONS,
    *fittings.EQUATIONS,
    *npsh.EQUATIONS,
    *intake.EQUATIONS,
)
EQUATION: dict[str, Equation] = {e.name: e for e in EQUATIONS}
