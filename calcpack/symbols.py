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
    "absolute_temperature": _dimension(temperature=1),
    "temperature_difference": _dimension(temperature=1),
    "lapse_rate": _dimension(-1, temperature=1),
    "speed": _dimension(time=-1),
    "specific_speed": _dimension(),
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
b       b        .      flow                 width of the interval of the NPSH curve that is read
b_n     b        n      flow                 width of the interval next to it
beta    β        .      lapse_rate           fall of temperature with height, U.S. Standard Atmosphere 1976
b_D     β        D      ratio                smaller over larger bore of a reducer
c       c        .      ratio                friction contingency
C       C        .      ratio                coefficient of the pump's type in the acceleration head
C_d     d        N      length               model less reading: the difference in NPSH available
C_h     C        HW     ratio                coefficient C of Hazen and Williams
D       D        .      bore                 bore of the pipe
d_1     d        1      bore                 diameter of 1 in, to which a fitting set's constants refer
D_1     D        1      bore                 larger bore of a reducer
D_2     D        2      bore                 smaller bore of a reducer
D_i     D        i      bore                 diameter of the inlet or bell
D_n     D        n      bore                 nominal diameter of the pipe
dH_c    ΔH       T      length               head that a warmer liquid would cost
dh_h    Δh       L      length               change of the losses with flow
dH_s    ΔH       s      length               change of the surface head
dH_v    ΔH       v      length               change of the vapour-pressure head
dH_x    ΔH       x      length               head that a finding puts at stake
dN      ΔN       .      length               rise of the NPSH curve over the interval that is read
dN_A    ΔN       A      length               rise over the interval at the slope of the point below
dN_B    ΔN       B      length               rise over the interval at the slope of the point above
dN_n    ΔN       n      length               rise of the NPSH curve over the interval next to it
dN_P    ΔN       P      length               rise over the interval at the slope of one of its ends
dp_cl   Δp       cl     pressure_difference  pressure drop of a clean strainer at the reference flow
dp_w    Δp       w      pressure_difference  weather allowance on the barometer
dp_0    Δp       0      pressure_difference  pressure drop at the reference flow of a loss
dp_C    Δp       C      pressure_difference  pressure drop at which Cv is the flow in gal/min
dp_K    Δp       K      pressure_difference  pressure drop at which Kv is the flow in m³/h
dT      ΔT       .      temperature_difference step of temperature for the cost line
dT_s    ΔT       s      temperature_difference step of temperature for the vessel's nearness to boiling
dz      Δz       .      length               change of the surface level
E_0     E        0      length               energy head where the line starts, absolute, over the file's datum
E_m     E        m      length               energy head at the point before, absolute, over the file's datum
E_n     E        n      length               energy head at a point of the line, absolute, over the file's datum
e_n     e        n      ratio                exponent of the speed ratio
eps     ε        .      bore                 roughness of the pipe wall
eps_c   ε        c      bore                 roughness of clean commercial steel, as the fitting set takes it
f       f        .      ratio                Darcy friction factor
f_x     f        x      ratio                Darcy friction factor with the wall as aged
f_T     f        T      ratio                Darcy friction factor of fully rough flow in clean commercial steel
Fr      F        D      ratio                Froude number of the inlet
g       g        .      acceleration         standard acceleration of gravity
gamma   γ        .      specific_weight      specific weight of the liquid
h       h        i      length               head lost in one row of the loss table
h_0     h        0      length               head lost at the reference flow of a loss
h_a     h        a      length               acceleration head of a reciprocating pump
h_A     h        A      length               head lost at the point of a maker's curve below this flow
h_as    h        a,s    length               acceleration head of one section
h_B     h        B      length               head lost at the point of a maker's curve above this flow
h_c     h        c      length               head kept over vapour pressure along the line
h_cl    h        cl     length               head lost in a clean strainer at the reference flow
h_e     h        e      length               head lost in one of several equal elements
h_L     h        L      length               head lost from the supply to the suction nozzle
h_S     h        Σ      length               sum of the rows of the loss table
h_u     h        L,m    length               losses from the surface to the tap, as the reading shows them
h_w     h        w      length               head withheld before NPSH available is quoted
H       H        .      length               geopotential height of the site
H_b     H        b      length               barometer as head of the liquid
H_g     H        g      length               gauge reading as head of the liquid
H_k     H        k      length               pressure at the point where it is known, as head
H_s     H        s      length               surface pressure as head of the liquid
H_sm    H        s,m    length               surface pressure as head, at the reading
H_v     H        v      length               vapour pressure as head of the liquid
H_vm    H        v,m    length               vapour pressure as head, at the reading
h_V     h        V      length               velocity head
K       K        .      ratio                loss coefficient on the velocity head of the section's bore
k       k        .      ratio                coefficient of the liquid in the acceleration head
K_1     K        1      ratio                constant of laminar flow of a fitting
K_d     K        d      ratio                constant of size of a fitting, Darby
K_i     K        i      ratio                constant of turbulent flow of a fitting, Darby
K_oo    K        ∞      ratio                constant of turbulent flow of a fitting, Hooper
K_s     K        s      ratio                loss coefficient on the velocity head of the smaller bore
K_h     k        h      lapse_rate           hydrostatic constant g₀M₀/R*, U.S. Standard Atmosphere 1976
L       L        .      length               length of straight pipe
L_m     L        min    length               straight run needed before the pump
L_s     L        s      length               straight pipe, together
L_t     L        t      length               length of a taper
l_1     l        1      length               length of 1 ft, to which a formula's number refers
l_u     l        u      length               unit of length in the suction specific speed
m       m        .      ratio                multiple of the fully rough friction factor
m_r     m        r      ratio                margin ratio asked for
m_d     m        d      length               margin difference asked for
M       M        .      length               margin of a check, left side less right side
M_d     M        d      length               margin difference, available less required
M_r     M        r      ratio                margin ratio, available over required
M_s     M        s      ratio                relative molecular mass of the substance dissolved
M_w     M        w      ratio                relative molecular mass of water
mu      μ        .      dynamic_viscosity    dynamic viscosity of the liquid
mu_1    μ        1      dynamic_viscosity    dynamic viscosity in the row of the table below the temperature
mu_2    μ        2      dynamic_viscosity    dynamic viscosity in the row of the table above the temperature
n       n        .      ratio                number of equal elements
n_0     n        0      speed                speed of the maker's curve
n_a     n        a      ratio                exponent of the pressure law of the atmosphere
N       N        .      ratio                number of pumps whose flow a section carries
N_A     NPSHR    A      length               NPSH required at the point of the maker's curve below this flow
N_B     NPSHR    B      length               NPSH required at the point of the maker's curve above this flow
n_p     n        p      speed                speed of the pump
N_p     NPSHR    p      length               NPSH required at a point of the maker's curve
N_s0    N        ss,0   specific_speed       suction specific speed from which the stricter margin holds
N_sm    N        ss,max specific_speed       suction specific speed, the most
N_ss    N        ss     specific_speed       suction specific speed
n_u     n        u      speed                unit of speed in the suction specific speed
NPSH_b  NPSHR    b      length               NPSH required at best efficiency
NPSHR_c NPSHR    c      length               NPSH required at the speed of the maker's curve
nu      ν        .      kinematic_viscosity  kinematic viscosity of the liquid
nu_1    ν        1      kinematic_viscosity  kinematic viscosity in the row of the table below the temperature
nu_2    ν        2      kinematic_viscosity  kinematic viscosity in the row of the table above the temperature
NPSHA   NPSHA    .      length               net positive suction head available at the pump datum
NPSHA_d NPSHA    d      length               NPSH available, design route
NPSHA_m NPSHA    m      length               NPSH available, measured route
NPSHA_q NPSHA    q      length               NPSH available, less the head withheld
NPSHA_R NPSHA    R      length               NPSH available at the datum of NPSH required
NPSHA_t NPSHA    t      length               NPSH available, less the acceleration head
NPSHA_w NPSHA    w      length               NPSH available, reading carried to the worst case
NPSHR   NPSHR    .      length               net positive suction head required
N_d     N        d      length               NPSH needed by the margin difference
N_r     N        r      length               NPSH needed by the margin ratio
N_L     N        lim    length               NPSH needed, the greater criterion
p_0     p        0      pressure             pressure at sea level, U.S. Standard Atmosphere 1976
p_a     p        a      pressure             pressure of the standard atmosphere at the site
p_ah    p        a,max  pressure             highest barometer that suits the site
p_al    p        a,min  pressure             lowest barometer that suits the site
p_b     p        b      pressure             barometer at the site, absolute
p_g     p        g      pressure             gauge pressure, relative to the barometer
p_gh    p        g,max  pressure             upper end of the gauge's scale
p_gl    p        g,min  pressure             lower end of the gauge's scale
p_h     p        h      pressure             gauge pressure at the high point of the loop, at rest
p_i     p        i      pressure             gauge pressure at a point of the loop
p_k     p        k      pressure             absolute pressure at the point where it is known
p_l     p        l      pressure             lowest gauge pressure to be kept in the loop
p_m     p        min    pressure             absolute pressure to be kept along the line
p_n     p        n      pressure             absolute pressure at a point of the line
p_sn    p        n,s    pressure             lowest absolute pressure at a point of the line within a stroke
p_r     p        r      pressure             station barometer as read, absolute
p_s     p        s      pressure             absolute pressure on the liquid surface
p_v     p        v      pressure             vapour pressure, absolute
p_v1    p        v,1    pressure             vapour pressure in the row of the table below the temperature
p_v2    p        v,2    pressure             vapour pressure in the row of the table above the temperature
p_vac   p        vac    pressure             vacuum as read, below the barometer
p_w     p        w      pressure             vapour pressure of pure water, absolute
p_x     p        v,x    pressure             vapour pressure at the warmer temperature, absolute
p_y     p        v,y    pressure             vapour pressure at the colder temperature, absolute
q       q        .      ratio                equivalent length of straight pipe over the bore
Q       Q        .      flow                 flow of one pump
Q_0     Q        0      flow                 reference flow of a loss
Q_1     Q        1      flow                 flow of 1 ft³/s, to which a formula's number refers
Q_A     Q        A      flow                 flow of the point of a maker's curve below this flow
Q_B     Q        B      flow                 flow of the point of a maker's curve above this flow
Q_b     Q        b      flow                 flow of one pump at its best efficiency
Q_c     Q        c      flow                 flow at which the maker's curve is read, at its speed
Q_ch    Q        c,max  flow                 highest flow of the maker's curve
Q_cl    Q        c,min  flow                 lowest flow of the maker's curve
Q_e     Q        e      flow                 flow of one eye of the impeller at best efficiency
Q_m     Q        m      flow                 flow at the reading
Q_n     Q        N      flow                 flow in a section that serves several pumps
Q_p     Q        p      flow                 flow of a point of the maker's curve
Q_r     Q        R      flow                 flow at which NPSH required is stated
Q_rh    Q        r,max  flow                 upper end of the operating region
Q_rl    Q        r,min  flow                 lower end of the operating region
Q_u     Q        u      flow                 unit of flow in the suction specific speed
r       r        .      ratio                relative roughness
r_0     r        0      length               radius of the Earth, U.S. Standard Atmosphere 1976
r_h     r        max    ratio                upper end of the operating region over the flow at best efficiency
r_l     r        min    ratio                lower end of the operating region over the flow at best efficiency
Re      Re       .      ratio                Reynolds number
rho     ρ        .      density              density of the liquid
rho_1   ρ        1      density              density in the row of the table below the temperature
rho_2   ρ        2      density              density in the row of the table above the temperature
rho_x   ρ        x      density              density of the liquid as looked up, beside the one cited
rho_w   ρ        w      density              density of the water to which Cv and Kv refer
s       s        .      ratio                sine of half the angle of a taper
S       S        .      length               available submergence over the reference line
S_m     S        min    length               submergence needed against vortices
T       T        .      temperature          temperature of the liquid
t       t        .      ratio                place of a flow between two points of the NPSH curve
T_0     T        0      temperature          temperature at sea level, U.S. Standard Atmosphere 1976
T_1     T        1      absolute_temperature temperature of the row of the table below
T_2     T        2      absolute_temperature temperature of the row of the table above
T_h     T        max    temperature          highest temperature expected
T_t     T        t      absolute_temperature temperature at which the table is read
T_w     T        w      temperature          triple point of water
T_x     T        x      temperature          warmer temperature for the cost line
V       V        .      velocity             mean velocity in the bore
V_h     V        i,max  velocity             velocity at the inlet or bell, the most
V_i     V        i      velocity             mean velocity at the inlet or bell
V_l     V        i,min  velocity             velocity at the inlet or bell, the least
V_m     V        max    velocity             velocity in the line, the most
w       w        .      ratio                mass fraction dissolved in water; of sea water its salinity
x_b     x        b      ratio                width of the interval next to it, over its own
x_D     x        D      ratio                straight run asked for, in diameters
x_w     x        w      ratio                mole fraction of water
y       y        .      ratio                place between two rows of the table, by the inverse of temperature
z       z        .      length               static head: surface above the pump's datum
z_d     z        d      length               elevation of the pump's NPSH datum
z_g     z        g      length               gauge height above the pump's datum
z_G     z        G      length               elevation at which the gauge reads the liquid's pressure
z_h     z        h      length               elevation of the high point of the loop
z_k     z        k      length               elevation of the point where pressure is known
z_l     z        l      length               level of the surface before drawdown
z_m     z        m      length               static head at the reading
z_n     z        n      length               elevation of a point of the line
z_r     z        r      length               elevation of the submergence's reference line
z_R     z        R      length               elevation NPSH required counts from
z_s     z        s      length               elevation of the liquid surface
z_w     z        w      length               drawdown of the surface while pumping
Z       Z        .      length               site elevation, geometric
"""


def _read(table: str) -> dict[str, Symbol]:
    rows = (line.split(maxsplit=4) for line in table.strip().splitlines())
    return {r[0]: Symbol(r[0], r[1], "" if r[2] == "." else r[2], r[3], r[4]) for r in rows}


#: Symbol name, as formulas write it -> its entry.
NOMENCLATURE: dict[str, Symbol] = _read(_TABLE)
DIMENSIONS: dict[str, Dimension] = {name: KINDS[s.kind] for name, s in NOMENCLATURE.items()}
