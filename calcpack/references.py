"""The published sources our equations, constants and tables rest on, and how each was seen.

``seen`` is printed beside every citation: a figure recalled is never shown as one that was opened.
"""

from __future__ import annotations

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
        "hi98",
        "ANSI/HI 9.8: Rotodynamic Pumps for Pump Intake Design, as excerpted by the Hydraulic Institute in its "
        "Engineering Data Library, eq. 1.E.1 and 1.E.2 (2023)",
        "opened",
    ),
    Reference("hi961", "ANSI/HI 9.6.1-2012: Rotodynamic Pumps, Guideline for NPSH Margin", "recalled"),
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
)
REFERENCES: dict[str, Reference] = {r.key: r for r in _ALL}
