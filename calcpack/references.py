"""The published sources our equations, constants and tables rest on, and how each was seen.

``seen`` is printed beside every citation: a figure recalled is never shown as one that was opened.
"""

from __future__ import annotations

from collections.abc import Iterator
from dataclasses import dataclass
from typing import Literal

#: opened: read in the source or an official copy; secondary: read where another publication quotes it;
#: library: as a named library's documentation or data gives it; recalled: from memory, not re-read;
#: ours: a definition or an identity that needs no source; practice: common practice, no source.
Seen = Literal["opened", "secondary", "library", "recalled", "ours", "practice"]

SEEN_TEXT: dict[Seen, str] = {
    "opened": "",
    "secondary": "as quoted in a second publication",
    "library": "",
    "recalled": "recalled, not re-read",
    "ours": "",
    "practice": "common practice, no source",
}


@dataclass(frozen=True)
class Reference:
    """A published source."""

    key: str
    text: str
    seen: Seen


@dataclass(frozen=True)
class Cite:
    """A place in a published source; ``key`` is empty for a definition, an identity or common practice."""

    key: str
    place: str = ""
    seen: Seen = "ours"

    @property
    def how(self) -> str:
        """How it was seen, in words for the page; empty where the source was opened."""
        return SEEN_TEXT[REFERENCES[self.key].seen if self.key else self.seen]


DEFINITION = Cite("", "definition")
IDENTITY = Cite("", "identity")
PRACTICE = Cite("", "", "practice")

_ALL = (
    Reference(
        "ussa76",
        "U.S. Standard Atmosphere, 1976. NOAA, NASA, USAF: NOAA-S/T 76-1562, NASA-TM-X-74335, Washington 1976; "
        "as transcribed in the library fluids 1.3.1",
        "library",
    ),
    Reference("hi_edl", "Hydraulic Institute: Engineering Data Library (text and tables, 2023)", "opened"),
    Reference(
        "colebrook",
        "Colebrook, C. F.: Turbulent flow in pipes. J. Inst. Civil Engineers 11 (1939) 133-156; "
        "form as printed by the Hydraulic Institute, Engineering Data Library, eq. 3.A.2",
        "secondary",
    ),
    Reference(
        "crane76",
        "Crane Co.: Flow of Fluids through Valves, Fittings and Pipe, Technical Paper 410 (1976), as reprinted by "
        "permission in Ludwig, Applied Process Design, vol. 1, 3rd ed., table 2-2",
        "opened",
    ),
    Reference(
        "crane09",
        "Crane Co.: Flow of Fluids through Valves, Fittings and Pipe, Technical Paper 410 (2009), "
        "as the library fluids 1.3.1 gives it",
        "library",
    ),
    Reference("crane", "Crane Co.: Flow of Fluids through Valves, Fittings and Pipe, Technical Paper 410", "recalled"),
    Reference(
        "hooper",
        "Hooper, W. B.: The two-K method predicts head losses in pipe fittings. Chemical Engineering, 24 August 1981, "
        "p. 96; constants as the library fluids 1.3.1 gives them",
        "library",
    ),
    Reference(
        "darby",
        "Silverberg, P. and Darby, R.: Correlate pressure drops through fittings. Chemical Engineering, July 1999, p. 101, "
        "and April 2001, p. 127; constants as the library fluids 1.3.1 gives them",
        "library",
    ),
    Reference(
        "epanet", "U.S. Environmental Protection Agency: EPANET 2.2 User Manual, chapter The Network Model", "opened"
    ),
    Reference(
        "idelchik",
        "Idelchik, I. E. and Ginevskii, A. S.: Handbook of Hydraulic Resistance. Begell House 2007; as the library fluids "
        "1.3.1 gives it",
        "library",
    ),
    Reference("flomatic", "Flomatic Valves: What is valve flow coefficient? (maker's page)", "opened"),
    Reference("adca", "Valsteam ADCA: Control valve sizing, IS PV20.00 E 08.18 (maker's data)", "opened"),
    Reference(
        "hi98",
        "ANSI/HI 9.8: Rotodynamic Pumps for Pump Intake Design, as excerpted by the Hydraulic Institute in its "
        "Engineering Data Library, eq. 1.E.1 and 1.E.2 (2023)",
        "opened",
    ),
    Reference(
        "hi961s",
        "ANSI/HI 9.6.1: Rotodynamic Pumps, Guideline for NPSH Margin, in the structure of its 2012 edition, as a public sheet "
        "sums it up (Recommended NPSH margin according to ANSI/HI guideline; it names no edition)",
        "secondary",
    ),
    Reference("power_da", "POWER magazine: Can your boiler feed pump handle a deaerator pressure transient?", "opened"),
    Reference("hi98bell", "ANSI/HI 9.8-1998: Pump Intake Design, table of velocities at the inlet bell", "recalled"),
    Reference("hi963", "ANSI/HI 9.6.3: Rotodynamic Pumps, Guideline for Operating Regions", "recalled"),
    Reference(
        "hi61",
        "ANSI/HI 6.1-6.5: Reciprocating Power Pumps, and GPSA Engineering Data Book, section 12: acceleration head",
        "recalled",
    ),
    Reference(
        "fritsch",
        "Fritsch, F. N. and Butland, J.: A method for constructing local monotone piecewise cubic interpolants. "
        "SIAM J. Sci. Stat. Comput. 5 (1984) 300-304; as the library scipy documents its PchipInterpolator",
        "library",
    ),
    Reference(
        "doe1018",
        "DOE-HDBK-1018/1-93: Mechanical Science, vol. 1, module Pumps. U.S. Department of Energy 1993",
        "opened",
    ),
    Reference("handbook", "Centrifugal Pumps Handbook, eq. 3, p. 185 (author and year not seen)", "opened"),
    Reference("armstrong", "Armstrong Pumps: Hydronic Solutions Catalog, p. 182", "opened"),
    Reference("eaton", "Eaton Filtration: Pipeline strainers, technical data", "opened"),
    Reference(
        "sp811",
        "NIST Special Publication 811 (2008): Guide for the Use of the International System of Units, "
        "appendix B; definitions exact",
        "recalled",
    ),
    Reference(
        "iapws95",
        "IAPWS-95: Wagner, W. and Pruss, A.: J. Phys. Chem. Ref. Data 31 (2002) 387-535; as implemented in CoolProp",
        "library",
    ),
    Reference(
        "iapws08",
        "IAPWS 2008: Huber, M. L. et al.: J. Phys. Chem. Ref. Data 38 (2009) 101-125; as implemented in CoolProp",
        "library",
    ),
    Reference(
        "b3610",
        "ASME B36.10M-2004: Welded and Seamless Wrought Steel Pipe, as tabulated in the library fluids 1.3.1",
        "library",
    ),
    Reference(
        "glp9", "NIST GLP 9 (2019): Good Laboratory Practice for Rounding, doi 10.6028/NIST.IR.6969-2019", "opened"
    ),
    Reference(
        "sharqawy",
        "Sharqawy, M. H., Lienhard V, J. H. and Zubair, S. M.: Thermophysical properties of seawater: a review of existing "
        "correlations and data. Desalination and Water Treatment 16 (2010) 354-380; formula as quoted in OpenPNM",
        "secondary",
    ),
    Reference("raoult", "Raoult's law of ideal solutions, as in textbooks of physical chemistry", "recalled"),
    Reference("ciaaw", "IUPAC standard atomic weights, abridged; relative molecular masses by addition", "recalled"),
)
#: Formulations of liquids, by the keys under which CoolProp cites them: authors, journal, volume (year), pages.
_FORMULATIONS = """
Avgeri-JPCRD-2014-Benzene       Avgeri, S. et al.: J. Phys. Chem. Ref. Data 43 (2014) 033103
Avgeri-JPCRD-2015-Toluene       Avgeri, S. et al.: J. Phys. Chem. Ref. Data 44 (2015) 033101
Balogun-JPCRD-2015-pxylene      Balogun, B. et al.: J. Phys. Chem. Ref. Data 44 (2015) 013103
Beckmueller-IJT-2019-octane     Beckmüller, R. et al.: Fundamental equation of state for n-octane. Int. J. Thermophys. (2019)
Buecker-JPCRD-2006B             Bücker, D. and Wagner, W.: J. Phys. Chem. Ref. Data 35 (2006) 929-1019
Cao-JPCRD-2016-mxylene          Cao, F. L. et al.: J. Phys. Chem. Ref. Data 45 (2016) 013103
Cao-JPCRD-2016-oxylene          Cao, F. L. et al.: J. Phys. Chem. Ref. Data 45 (2016) 023102
Fenghour-JPCRD-1995             Fenghour, A. et al.: J. Phys. Chem. Ref. Data 24 (1995) 1649-1667
Gao-JPCRD-2020                  Gao, K. et al.: Thermodynamic properties of ammonia. J. Phys. Chem. Ref. Data (2020)
Gedanitz-JCED-2015              Gedanitz, H. et al.: J. Chem. Eng. Data 60 (2015) 1331-1337
Huber-EF-2004                   Huber, M. L. et al.: Energy & Fuels 18 (2004) 968-975
Huber-FPE-2004                  Huber, M. L. et al.: Fluid Phase Equilibria 224 (2004) 263-270
Huber-IECR-2003                 Huber, M. L. et al.: Ind. Eng. Chem. Res. 42 (2003) 3163-3178
Kiselev-IECR-2005               Kiselev, S. B. et al.: Ind. Eng. Chem. Res. 44 (2005) 6916-6927
Lemmon-EF-2004                  Lemmon, E. W. and Huber, M. L.: Energy & Fuels 18 (2004) 960-967
Lemmon-JCED-2006                Lemmon, E. W. and Span, R.: J. Chem. Eng. Data 51 (2006) 785-850
Lemmon-JCED-2009                Lemmon, E. W. et al.: J. Chem. Eng. Data 54 (2009) 3141-3180
Lemmon-PROPYLENE-2013           Lemmon, E. W. et al.: Equation of state for propylene, personal communication (2010)
Melinder2010                    Melinder, Å.: Properties of Secondary Working Fluids for Indirect Systems. IIR 2010
Michailidou-JPCRD-2013-Hexane   Michailidou, E. K. et al.: J. Phys. Chem. Ref. Data 42 (2013) 033104
Michailidou-JPCRD-2014-Heptane  Michailidou, E. K. et al.: J. Phys. Chem. Ref. Data 43 (2014) 023103
Piazza-FPE-2013                 Piazza, L. and Span, R.: Fluid Phase Equilibria 349 (2013) 12-24 (CoolProp 7: de Reuck and Craven 1993)
Schroeder-JPCRD-2014            Schroeder, J. A. et al.: J. Phys. Chem. Ref. Data 43 (2014) 043102
Sharqawy2010                    Sharqawy, M. H. et al.: Desalination and Water Treatment 16 (2010) 354-380
Span-IJT-2003B                  Span, R. and Wagner, W.: Int. J. Thermophys. 24 (2003) 41-109
Tariq-JPCRD-2014-Cyclohexane    Tariq, U. et al.: J. Phys. Chem. Ref. Data 43 (2014) 033101
Thol-FPE-2019-alkanes-hexane    Thol, M. et al.: Fundamental equations of state, n-hexane. Fluid Phase Equilibria (2019)
Thol-FPE-2019-alkanes-pentane   Thol, M. et al.: Fundamental equations of state, n-pentane. Fluid Phase Equilibria (2019)
Thol-HTHP-2012                  Thol, M. et al.: High Temperatures - High Pressures 41 (2012) 81-97
TillnerRoth-JPCRD-1994          Tillner-Roth, R. and Baehr, H. D.: J. Phys. Chem. Ref. Data 23 (1994) 657-729
Vogel-HTHP-1999                 Vogel, E. et al.: High Temperatures - High Pressures 31 (1999) 173-186
Vogel-IJT-2000                  Vogel, E. et al.: Int. J. Thermophys. 21 (2000) 343-356
Vogel-JPCRD-1998                Vogel, E. et al.: J. Phys. Chem. Ref. Data 27 (1998) 947-970
Xiang-JPCRD-2006                Xiang, H. W. et al.: J. Phys. Chem. Ref. Data 35 (2006) 1597-1620
Zhou-JPCRD-2012                 Zhou, Y. et al.: J. Phys. Chem. Ref. Data 41 (2012) 023103
Zhou-JPCRD-2014                 Zhou, Y. et al.: J. Phys. Chem. Ref. Data 43 (2014) 043105
"""


def _formulations(table: str) -> Iterator[Reference]:
    for line in table.strip().splitlines():
        key, text = line.split(maxsplit=1)
        yield Reference(key, f"{text}; as implemented in CoolProp", "library")


REFERENCES: dict[str, Reference] = {r.key: r for r in (*_ALL, *_formulations(_FORMULATIONS))}
