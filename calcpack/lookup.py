"""What is looked up rather than computed: properties of liquids, pipe bores, and tables of constants.

The only room that knows CoolProp and the pipe tables; both are imported when first asked for.
"""

from __future__ import annotations

from collections.abc import Mapping
from dataclasses import dataclass
from functools import cache
from importlib.metadata import version
from typing import Literal

from .references import DEFINITION, PRACTICE, Cite


class OutOfRange(ValueError):
    """A look-up outside the validity of its source; the message names the range."""


@dataclass(frozen=True)
class Property:
    """A property of a liquid as a function of its temperature, and of the mass fraction ``w`` in a mixture with water.

    ``output`` is CoolProp's name of it, ``place`` what a pure liquid's formulation is asked for.
    """

    name: str
    symbol: str
    output: str
    title: str
    place: str

    def function(self, mixture: str) -> str:
        """How the look-up is written: of the saturated liquid, or of a mixture at any pressure."""
        return f"{self.symbol}(T, w)" if mixture else f"{self.symbol.partition('_')[0]}_sat(T)"


PROPERTIES: Mapping[str, Property] = {
    p.name: p
    for p in (
        Property("vapour_pressure", "p_v", "P", "Vapour pressure, absolute, looked up", "saturation line"),
        Property("density", "rho", "D", "Density, looked up", "saturated liquid"),
        Property("viscosity", "mu", "V", "Dynamic viscosity, looked up", "saturated liquid"),
    )
}
#: Pressure, Pa, at which CoolProp is asked for a mixture: it takes no part, and keeps hot sea water liquid.
MIXTURE_PRESSURE = 1e6


@dataclass(frozen=True)
class LiquidSource:
    """A liquid that CoolProp knows as ``fluid``, pure or dissolved in water, between two temperatures, K.

    ``state`` is the source of density and vapour pressure, ``flow`` that of viscosity, both keys of the references;
    ``flow`` is empty where CoolProp has no viscosity, or one that other sources contradict.  ``mixture`` is the key of the
    input file that says how much is dissolved, at most ``most``; ``solute`` its relative molecular mass, empty for a salt:
    its ions do not follow Raoult's law.  A mixture ends at its freezing point where CoolProp knows it (``freezes``).
    """

    name: str
    fluid: str
    lowest: float
    highest: float
    state: str
    flow: str
    mixture: Literal["", "mass_fraction", "salinity"] = ""
    most: float = 0.0
    solute: str = ""
    freezes: bool = False

    def offers(self, name: str) -> bool:
        """Whether the property ``name`` is looked up; the vapour pressure of a mixture is that of its water."""
        return not self.mixture if name == "vapour_pressure" else name == "density" or bool(self.flow)

    @property
    def raoult(self) -> bool:
        """Whether Raoult's law on its water is offered for its vapour pressure, as for sea water a published form of it."""
        return bool(self.solute) or self.mixture == "salinity"

    def cite(self, name: str) -> Cite:
        """The source of the property ``name``."""
        return Cite(self.flow if name == "viscosity" else self.state, "" if self.mixture else PROPERTIES[name].place)

    @property
    def validity(self) -> str:
        """The range of the formulation as used here."""
        if not self.mixture:
            return f"{self.lowest:g} K to {self.highest:g} K"
        lowest = "freezing" if self.freezes else f"{self.lowest:g} K"
        return f"{lowest} to {self.highest:g} K, at most {100 * self.most:g} % dissolved"

    @property
    def called(self) -> str:
        """How CoolProp is asked for it."""
        return f"INCOMP::{self.fluid} at {MIXTURE_PRESSURE / 1e6:g} MPa" if self.mixture else self.fluid


def _brine(name: str, fluid: str, most: float) -> LiquidSource:
    return LiquidSource(
        f"{name} brine", fluid, 173.15, 313.15, "Melinder2010", "Melinder2010", "mass_fraction", most, freezes=True
    )


def _glycol(name: str, fluid: str, highest: float, solute: str) -> LiquidSource:
    return LiquidSource(
        name, fluid, 173.15, highest, "Melinder2010", "Melinder2010", "mass_fraction", 0.6, solute, freezes=True
    )


#: Every liquid that is looked up.  A pure one begins where it melts, where its viscosity begins, or where its vapour pressure
#: is some pascals (below, versions of the library differ), and ends at about 0.93 of its critical temperature: beyond that
#: no pump is laid out by saturated liquid.  Solutes that evaporate with the
#: water (ammonia, alcohols) are not offered: neither Raoult's law on the water nor pure water is safe for them.
LIQUIDS: Mapping[str, LiquidSource] = {
    liquid.name: liquid
    for liquid in (
        LiquidSource("water", "Water", 273.16, 600, "iapws95", "iapws08"),
        LiquidSource("ammonia", "Ammonia", 196, 375, "Gao-JPCRD-2020", "Fenghour-JPCRD-1995"),
        LiquidSource("propane", "n-Propane", 150, 340, "Lemmon-JCED-2009", "Vogel-JPCRD-1998"),
        LiquidSource("propylene", "Propylene", 150, 335, "Lemmon-PROPYLENE-2013", ""),
        LiquidSource("n-butane", "n-Butane", 180, 395, "Buecker-JPCRD-2006B", "Vogel-HTHP-1999"),
        LiquidSource("isobutane", "IsoButane", 170, 375, "Buecker-JPCRD-2006B", "Vogel-IJT-2000"),
        LiquidSource("n-pentane", "n-Pentane", 200, 435, "Thol-FPE-2019-alkanes-pentane", ""),
        LiquidSource("isopentane", "Isopentane", 200, 425, "Lemmon-JCED-2006", ""),
        LiquidSource("cyclopentane", "Cyclopentane", 210, 475, "Gedanitz-JCED-2015", ""),
        LiquidSource("n-hexane", "n-Hexane", 220, 470, "Thol-FPE-2019-alkanes-hexane", "Michailidou-JPCRD-2013-Hexane"),
        LiquidSource("cyclohexane", "CycloHexane", 280, 510, "Zhou-JPCRD-2014", "Tariq-JPCRD-2014-Cyclohexane"),
        LiquidSource("n-heptane", "n-Heptane", 230, 500, "Span-IJT-2003B", "Michailidou-JPCRD-2014-Heptane"),
        LiquidSource("n-octane", "n-Octane", 250, 525, "Beckmueller-IJT-2019-octane", "Huber-FPE-2004"),
        LiquidSource("n-decane", "n-Decane", 270, 570, "Lemmon-JCED-2006", "Huber-FPE-2004"),
        LiquidSource("n-dodecane", "n-Dodecane", 290, 610, "Lemmon-EF-2004", "Huber-EF-2004"),
        LiquidSource("benzene", "Benzene", 280, 520, "Thol-HTHP-2012", "Avgeri-JPCRD-2014-Benzene"),
        LiquidSource("toluene", "Toluene", 230, 550, "Lemmon-JCED-2006", "Avgeri-JPCRD-2015-Toluene"),
        LiquidSource("o-xylene", "o-Xylene", 274, 585, "Zhou-JPCRD-2012", "Cao-JPCRD-2016-oxylene"),
        LiquidSource("m-xylene", "m-Xylene", 274, 570, "Zhou-JPCRD-2012", "Cao-JPCRD-2016-mxylene"),
        LiquidSource("p-xylene", "p-Xylene", 287, 570, "Zhou-JPCRD-2012", "Balogun-JPCRD-2015-pxylene"),
        LiquidSource("methanol", "Methanol", 210, 475, "Piazza-FPE-2013", "Xiang-JPCRD-2006"),
        LiquidSource("ethanol", "Ethanol", 220, 475, "Schroeder-JPCRD-2014", "Kiselev-IECR-2005"),
        LiquidSource("acetone", "Acetone", 200, 470, "Lemmon-JCED-2006", ""),
        LiquidSource("R134a", "R134a", 171, 345, "TillnerRoth-JPCRD-1994", "Huber-IECR-2003"),
        LiquidSource("sea water", "MITSW", 273.15, 393.15, "Sharqawy2010", "Sharqawy2010", "salinity", 0.12),
        _glycol("ethylene glycol", "MEG", 373.15, "62.068"),
        _glycol("propylene glycol", "MPG", 373.15, "76.095"),
        _glycol("glycerol", "MGL", 313.15, "92.094"),
        _brine("calcium chloride", "MCA", 0.3),
        _brine("sodium chloride", "MNA", 0.23),
        _brine("magnesium chloride", "MMG", 0.21),  # its eutectic; the correlation runs on, to freezing at -100 °C
        _brine("potassium carbonate", "MKC", 0.4),
        _brine("potassium acetate", "MKA", 0.45),
        _brine("potassium formate", "MKF", 0.48),
    )
}


@cache
def liquid(of: str, name: str, kelvin: float, fraction: float = 0.0) -> float:
    """Property ``name`` of the liquid ``of`` at ``kelvin``, in SI (Pa, kg/m³, Pa·s): saturated, or with ``fraction`` dissolved.

    Raises :class:`OutOfRange` outside the range of the formulation.  Source: CoolProp, which implements the formulations
    that :data:`LIQUIDS` names.
    """
    source = LIQUIDS[of]
    from CoolProp.CoolProp import PropsSI

    lowest = source.lowest
    if source.mixture:
        if fraction > source.most * (1 + 1e-12):  # the limit itself, typed, is a fraction and not quite this float
            raise OutOfRange(f"{of} is looked up to {100 * source.most:g} % dissolved")
        fraction = min(fraction, source.most)
        dissolved = f"INCOMP::{source.fluid}[{fraction!r}]"
        if source.freezes:
            lowest = PropsSI("T_freeze", "T", source.highest, "P", MIXTURE_PRESSURE, dissolved)
    if not lowest <= kelvin <= source.highest:
        begins = f"its freezing point, {_both(lowest)}," if source.freezes else _both(lowest)
        raise OutOfRange(f"a temperature at which {of} is looked up, between {begins} and {_both(source.highest)}")
    output = PROPERTIES[name].output
    if source.mixture:
        return float(PropsSI(output, "T", kelvin, "P", MIXTURE_PRESSURE, dissolved))
    return float(PropsSI(output, "T", kelvin, "Q", 0, source.fluid))


def _both(kelvin: float) -> str:
    return f"{kelvin:.2f} K ({kelvin - 273.15:.2f} °C)"


@cache
def library(name: str) -> str:
    """A library's name and the version that is installed."""
    return f"{name} {version(name)}"


@dataclass(frozen=True)
class Bore:
    """A bore from the pipe table, in millimetres as the table gives it, with its place there."""

    millimetres: str
    place: str


def bore(size: str, schedule: str) -> Bore:
    """Inside diameter of a steel pipe by nominal size (``NPS 16`` or ``DN 250``) and schedule.

    Source: ASME B36.10M through ``fluids``.  Raises :class:`OutOfRange` where the table has no such pipe.
    """
    nps = nominal_inches(size)
    from fluids.piping import nearest_pipe

    try:
        found, inside, outside, wall = nearest_pipe(NPS=nps, schedule=schedule)  # type: ignore[arg-type]  # its annotation says int; NPS 1.5 is meant
    except (ValueError, KeyError):
        raise OutOfRange(f"the table has no pipe {size}, schedule {schedule}") from None
    if found != nps:
        raise OutOfRange(f"the table has no pipe {size}, schedule {schedule}")
    return Bore(
        f"{inside * 1000:.2f}", f"{size} schedule {schedule}: {outside * 1000:.1f} mm less twice {wall * 1000:.2f} mm"
    )


def nominal_inches(size: str) -> float:
    """The NPS of a nominal size, ``NPS 16`` or ``DN 250``.  Raises :class:`OutOfRange` where there is no such size."""
    system, _, number = size.partition(" ")
    try:
        return DN_TO_NPS[number] if system == "DN" else _inches(number)
    except (KeyError, ValueError, ZeroDivisionError):
        raise OutOfRange(f"{size} is not a nominal size of the table") from None


def _inches(text: str) -> float:
    whole, _, fraction = text.partition("-")
    if "/" in whole:
        whole, fraction = "0", whole
    top, _, bottom = fraction.partition("/")
    return float(whole) + (float(top) / float(bottom) if fraction else 0.0)


#: Nominal diameters of ISO 6708 beside the NPS of ASME B36.10M; from DN 100 on it is 25 mm an inch.
DN_TO_NPS: Mapping[str, float] = {
    "15": 0.5,
    "20": 0.75,
    "25": 1,
    "32": 1.25,
    "40": 1.5,
    "50": 2,
    "65": 2.5,
    "80": 3,
    "90": 3.5,
    **{str(25 * n): float(n) for n in (4, 5, 6, 8, 10, 12, 14, 16, 18, 20, 22, 24, 26, 28, 30, 32, 34, 36)},
}


@dataclass(frozen=True)
class Constant:
    """A fixed number of the tool: exact where its definition is, else as its source prints it."""

    symbol: str
    text: str
    title: str
    cite: Cite


CONSTANTS: Mapping[str, Constant] = {
    c.symbol: c
    for c in (
        Constant("g", "9.80665 m/s²", "Standard acceleration of gravity, exact", Cite("sp811", "B.8")),
        Constant("p_0", "101325 Pa absolute", "Pressure at sea level", Cite("ussa76")),
        Constant("T_0", "288.15 K", "Temperature at sea level", Cite("ussa76")),
        Constant("beta", "0.0065 K/m", "Fall of temperature with height, up to 11 km", Cite("ussa76")),
        Constant("r_0", "6356766 m", "Radius of the Earth at latitude 45.5°", Cite("ussa76")),
        Constant(
            "K_h", "0.034163195 K/m", "Hydrostatic constant g₀M₀/R*", Cite("ussa76", "derived from its constants")
        ),
        Constant(
            "eps_c", "0.00015 ft", "Roughness the fitting set takes for clean steel", Cite("crane09", "0.0018 in")
        ),
        Constant("T_w", "273.16 K", "Triple point of water", Cite("iapws95")),
        Constant("M_w", "18.015", "Relative molecular mass of water", Cite("ciaaw")),
        Constant("dT", "5 K", "Step of temperature for the cost line", PRACTICE),
        Constant("d_1", "1 in", "Diameter the constants of the fitting set refer to, exact", DEFINITION),
        Constant("l_1", "1 ft", "Length the formula's number refers to, exact", DEFINITION),
        Constant("Q_1", "1 ft³/s", "Flow the formula's number refers to, exact", DEFINITION),
        Constant("dp_C", "1 psi", "Pressure drop at which Cv is the flow in gal/min, exact", Cite("flomatic")),
        Constant("dp_K", "1 bar", "Pressure drop at which Kv is the flow in m³/h, exact", Cite("adca")),
        Constant(
            "rho_w", "999.1 kg/m³", "Density of the water of Cv (60 °F) and Kv (15 °C)", Cite("iapws95", "at 15 °C")
        ),
        Constant("dT_s", "2 K", "Step of temperature for the vessel's nearness to boiling", PRACTICE),
    )
}
