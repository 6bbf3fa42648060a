"""Suction lines made in memory for tests, and what is read off them."""

from __future__ import annotations

import math
from typing import Any

import pytest
from plants import Document, plant, studied

from calcpack.assessment import Study
from calcpack.faults import InputFault
from calcpack.study.line import Passage

SECTION = "line.sections.0."
G = 9.80665
BORE, FLOW = 0.2027, 200 / 3600
SPEED = FLOW / (math.pi * BORE**2 / 4)
HEAD = SPEED**2 / 2 / G
#: An oil: kinematic viscosity in mm²/s to its Reynolds number at the plant's flow and bore, 8.7e5 / viscosity.
OIL: Document = {
    "liquid": {
        "name": "gas oil", "temperature": {"highest": "25 °C", "source": "S1"},
        "density": {"value": "850 kg/m³", "source": "S1"}, "vapour_pressure": {"value": "1 kPa absolute", "source": "S1"},
    }
}  # fmt: skip


def line(*elements: Document, **changes: Any) -> Document:
    """The plant's line with these elements."""
    numbered = [{"id": f"E{n}", **element} for n, element in enumerate(elements, 1)]
    return plant({SECTION + "elements": numbered, **changes})


def oil(centistokes: float, *elements: Document, **changes: Any) -> Document:
    viscosity = {"liquid.viscosity": {"value": f"{centistokes} cSt", "source": "S1"}}
    return line(*elements, **OIL, **viscosity, **changes)


def passage(study: Study) -> Passage:
    run = study.results.line
    assert run is not None and run.passage is not None
    return run.passage


def lost(document: Document, number: int = 0) -> float:
    """Head lost in an element, m."""
    return passage(studied(document)).rows[number].loss.shadow


def faults(document: Document) -> str:
    with pytest.raises(InputFault) as caught:
        studied(document)
    return str(caught.value)


def findings(document: Document) -> str:
    return " ".join(studied(document).findings)


def assumptions(document: Document) -> str:
    return " ".join(text for text, _ in studied(document).assumptions.values())


PIPE = {"kind": "pipe", "length": "20 m"}
ENTRANCE = {"kind": "entrance", "shape": "flush"}
STRAINER = {"kind": "strainer", "name": "STR-1", "at_flow": "100 m³/h", "source": "S1", "status": "maker"}
CURVE = [
    {"flow": "100 m³/h", "loss": "0.10 m"},
    {"flow": "150 m³/h", "loss": "0.20 m"},
    {"flow": "300 m³/h", "loss": "0.80 m"},
]
EXCHANGER = {"kind": "equipment", "name": "E-1", "curve": CURVE}
#: Hazen and Williams as the method of the line.
HW = {"line.loss_method": "hazen_williams", SECTION + "material": None, SECTION + "hazen_williams_C": "120"}
#: Every way an element states its loss.
MANY = (
    PIPE, {"kind": "elbow", "radius": "long", "count": 2}, {"kind": "valve", "type": "gate"}, {"kind": "valve", "Cv": "900"},
    {"kind": "valve", "L_over_D": "13"}, {"kind": "connector", "name": "hose", "count": 2, "loss": "1 kPa", "at_flow": "150 m³/h"}, EXCHANGER,
    {**STRAINER, "drop": {"clean": "0.1 m", "fouled": "0.3 m"}}, {"kind": "fitting", "name": "F", "K": "0.4"},
    {"kind": "tee", "flow": "run"},
)  # fmt: skip


def reducer(end: str, bore: str, length: str = "") -> Document:
    """A concentric reducer to or from another bore."""
    return {"kind": "reducer", "type": "concentric", end: {"bore": bore}} | ({"length": length} if length else {})


def header(pumps: int, running: int) -> Document:
    """A line whose header serves several pumps."""
    branch = plant()["line"]["sections"][0]
    shared = {
        **branch,
        "id": "H",
        "bore": "400 mm",
        "pumps": pumps,
        "elements": [{"id": "1", **ENTRANCE}, {"id": "2", **PIPE}],
    }
    return plant({"line.sections": [shared, {**branch, "elements": branch["elements"][1:]}], "pump.running": running})


#: Lines that between them call for every equation of a line.
LINES: tuple[Document, ...] = (
    line(*MANY, **{"line.friction_contingency": "10 %"}),
    line(*MANY, **{"line.fitting_set": "hooper_2k"}),
    line({"kind": "valve", "type": "gate"}, **{"line.fitting_set": "darby_3k"}),
    line(PIPE, **HW),
    *(
        line(ENTRANCE, PIPE, {**reducer("to", bore, length), "elevation": "0 m"})
        for bore in ("154 mm", "300 mm")
        for length in ("", "30 mm", "600 mm")
    ),
    header(3, 3),
    line({**PIPE, "elevation": "0 m"}, **{"line.friction_contingency": "10 %"}),
)
