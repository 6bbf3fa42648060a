"""Every equation of the tool, in one explicit list."""

from __future__ import annotations

from .equations import (
    Equation,
    atmosphere,
    fittings,
    hazen_williams,
    intake,
    liquid,
    npsh,
    pipe,
    pressure,
    profile,
    pump,
    reducer,
    stake,
    straight,
)

EQUATIONS: tuple[Equation, ...] = (
    *atmosphere.EQUATIONS,
    *liquid.EQUATIONS,
    *pipe.EQUATIONS,
    *hazen_williams.EQUATIONS,
    *fittings.EQUATIONS,
    *reducer.EQUATIONS,
    *profile.EQUATIONS,
    *npsh.EQUATIONS,
    *straight.EQUATIONS,
    *pump.EQUATIONS,
    *intake.EQUATIONS,
    *pressure.EQUATIONS,
    *stake.EQUATIONS,
)
EQUATION: dict[str, Equation] = {e.name: e for e in EQUATIONS}
