"""The nomenclature: every symbol of every equation, once, with what it measures.

A symbol's *kind* names a physical quantity; the kind fixes its dimension here and its units in ``quantity``.
"""

from __future__ import annotations

from dataclasses import dataclass
from fractions import Fraction

from .formula import Dimension


def _dimension(length: int = 0, mass: int = 0, time: int = 0, temperature: int = 0) -> Dimension:
    return (Fraction(length), Fraction(mass), Fraction(time), Fraction(temperature))


#: Kind of quantity -> exponents of length, mass, time, temperature.
KINDS: dict[str, Dimension] = {
    "ratio": _dimension(),
    "length": _dimension(1),
    "bore": _dimension(1),
    "area": _dimension(2),
    "velocity": _dimension(1, time=-1),
    "acceleration": _dimension(1, time=-2),
    "flow": _dimension(3, time=-1),
    "pressure": _dimension(-1, 1, -2),
    "pressure_difference": _dimension(-1, 1, -2),
    "density": _dimension(-3, 1),
    "dynamic_viscosity": _dimension(-1, 1, -1),
    "kinematic_viscosity": _dimension(2, time=-1),
    "specific_weight": _dimension(-2, 1, -2),
    "temperature": _dimension(temperature=1),
    "temperature_difference": _dimension(temperature=1),
    "lapse_rate": _dimension(-1, temperature=1),
    "speed": _dimension(time=-1),
}


@dataclass(frozen=True)
class Symbol:
    """One entry of the nomenclature; ``base`` and ``sub`` are how it is written, upright for names of several letters."""

    name: str
    base: str
    sub: str
    kind: str
    meaning: str

    @property
    def upright(self) -> bool:
        return len(self.base) > 2


_TABLE = """
A       A        .      area                 flow area of the bore
A_i     A        i      area                 area of the inlet or bell
beta    β        .      lapse_rate           fall of temperature with height, U.S. Standard Atmosphere 1976
c       c        .      ratio                friction contingency
C_d     d        N      length               model less reading: the difference in NPSH available
D       D        .      bore                 bore of the pipe
D_i     D        i      bore                 diameter of the inlet or bell
dH_c    ΔH       T      length               head that a warmer liquid would cost
dh_h    Δh       L      length               change of the losses with flow
dH_s    ΔH       s      length               change of the surface head
dH_v    ΔH       v      length               change of the vapour-pressure head
dp_w    Δp       w      pressure_difference  weather allowance on the barometer
dp_0    Δp       0      pressure_difference  pressure drop of a strainer at its reference flow
dT      ΔT       .      temperature_difference step of temperature for the cost line
dz      Δz       .      length               change of the surface level
eps     ε        .      bore                 roughness of the pipe wall
eps_c   ε        c      bore                 roughness of clean commercial steel, as the fitting set takes it
f       f        .      ratio                Darcy friction factor
f_T     f        T      ratio                Darcy friction factor of fully rough flow in clean commercial steel
Fr      F        D      ratio                Froude number of the inlet
g       g        .      acceleration         standard acceleration of gravity
gamma   γ        .      specific_weight      specific weight of the liquid
h       h        i      length               head lost in one row of the loss table
h_0     h        0      length               head lost in a strainer at its reference flow
h_L     h        L      length               head lost from the surface to the suction nozzle
h_S     h        Σ      length               sum of the rows of the loss table
h_u     h        L,m    length               losses from the surface to the tap, as the reading shows them
H       H        .      length               geopotential height of the site
H_b     H        b      length               barometer as head of the liquid
H_g     H        g      length               gauge reading as head of the liquid
H_s     H        s      length               surface pressure as head of the liquid
H_sm    H        s,m    length               surface pressure as head, at the reading
H_v     H        v      length               vapour pressure as head of the liquid
H_vm    H        v,m    length               vapour pressure as head, at the reading
h_V     h        V      length               velocity head
K       K        .      ratio                loss coefficient on the velocity head of the section's bore
K_h     k        h      lapse_rate           hydrostatic constant g₀M₀/R*, U.S. Standard Atmosphere 1976
L       L        .      length               length of straight pipe
m       m        .      ratio                multiple of the fully rough friction factor
m_r     m        r      ratio                margin ratio asked for
m_d     m        d      length               margin difference asked for
M       M        .      length               margin of a check, left side less right side
M_d     M        d      length               margin difference, available less required
M_r     M        r      ratio                margin ratio, available over required
mu      μ        .      dynamic_viscosity    dynamic viscosity of the liquid
n       n        .      ratio                number of equal elements
n_a     n        a      ratio                exponent of the pressure law of the atmosphere
nu      ν        .      kinematic_viscosity  kinematic viscosity of the liquid
NPSHA   NPSHA    .      length               net positive suction head available at the pump datum
NPSHA_d NPSHA    d      length               NPSH available, design route
NPSHA_m NPSHA    m      length               NPSH available, measured route
NPSHA_w NPSHA    w      length               NPSH available, reading carried to the worst case
NPSHR   NPSHR    .      length               net positive suction head required
N_d     N        d      length               NPSH needed by the margin difference
N_r     N        r      length               NPSH needed by the margin ratio
N_L     N        lim    length               NPSH needed, the greater criterion
p_0     p        0      pressure             pressure at sea level, U.S. Standard Atmosphere 1976
p_a     p        a      pressure             pressure of the standard atmosphere at the site
p_b     p        b      pressure             barometer at the site, absolute
p_g     p        g      pressure             gauge pressure, relative to the barometer
p_r     p        r      pressure             station barometer as read, absolute
p_s     p        s      pressure             absolute pressure on the liquid surface
p_v     p        v      pressure             vapour pressure, absolute
p_vac   p        vac    pressure             vacuum as read, below the barometer
p_x     p        v,x    pressure             vapour pressure at the warmer temperature, absolute
Q       Q        .      flow                 flow of one pump
Q_0     Q        0      flow                 reference flow of a strainer's drop
Q_m     Q        m      flow                 flow at the reading
Q_r     Q        R      flow                 flow at which NPSH required is stated
r       r        .      ratio                relative roughness
r_0     r        0      length               radius of the Earth, U.S. Standard Atmosphere 1976
Re      Re       .      ratio                Reynolds number
rho     ρ        .      density              density of the liquid
S       S        .      length               available submergence over the reference line
S_m     S        min    length               submergence needed against vortices
T       T        .      temperature          temperature of the liquid
T_0     T        0      temperature          temperature at sea level, U.S. Standard Atmosphere 1976
T_h     T        max    temperature          highest temperature expected
T_x     T        x      temperature          warmer temperature for the cost line
V       V        .      velocity             mean velocity in the bore
V_i     V        i      velocity             mean velocity at the inlet or bell
z       z        .      length               static head: surface above the pump's datum
z_d     z        d      length               elevation of the pump's NPSH datum
z_g     z        g      length               gauge height above the pump's datum
z_G     z        G      length               elevation at which the gauge reads the liquid's pressure
z_m     z        m      length               static head at the reading
z_r     z        r      length               elevation of the submergence's reference line
z_s     z        s      length               elevation of the liquid surface
Z       Z        .      length               site elevation, geometric
"""


def _read(table: str) -> dict[str, Symbol]:
    rows = (line.split(maxsplit=4) for line in table.strip().splitlines())
    return {r[0]: Symbol(r[0], r[1], "" if r[2] == "." else r[2], r[3], r[4]) for r in rows}


#: Symbol name, as formulas write it -> its entry.
NOMENCLATURE: dict[str, Symbol] = _read(_TABLE)
DIMENSIONS: dict[str, Dimension] = {name: KINDS[s.kind] for name, s in NOMENCLATURE.items()}
