"""Whole packages of the sample inputs for the reader's tests, and ways to falsify them."""

from __future__ import annotations

import copy
import json
from collections.abc import Callable, Iterator, Sequence
from dataclasses import replace
from functools import cache
from pathlib import Path
from random import Random
from typing import Any

from plants import INTAKE, plant, recorded

from calcpack.assessment import run
from calcpack.page.pdf import render
from calcpack.reader.bands import ACCENT, INK, MM, NUMBER, SECOND, Band, bands
from calcpack.reader.glyphs import Glyph, Sheet, sheets
from calcpack.reader.line import RESTS_ON, RESULT, WORKING, picture
from calcpack.reader.losses import FACTORS, LOSS, RECORD, SUM, is_losses
from calcpack.reader.rules import LEFT, MARGIN, RIGHT, TEXT
from calcpack.record import assemble, canonical
from calcpack.source import load

SAMPLES = {path.name[0]: path for path in sorted((Path(__file__).parent.parent / "sample_inputs").glob("*.yaml"))}
Record = dict[str, Any]
Json = dict[str, Any]


@cache
def _record(name: str) -> str:
    return canonical(assemble(run(load(SAMPLES[name])))).decode()


def record(name: str) -> Record:
    """The record of the sample that begins with ``name``, a copy of its own."""
    made: Record = json.loads(_record(name))
    return made


@cache
def package(name: str) -> bytes:
    """The package of the sample that begins with ``name``."""
    return render(record(name), [])


@cache
def sample_sheets(name: str) -> tuple[Sheet, ...]:
    """The sheets of the sample that begins with ``name``."""
    return tuple(sheets(package(name)))


def lines(made: Record) -> Iterator[Json]:
    """Every computed line of a record, rows of loss tables included, each once."""
    seen = set()
    for part in made["computation"]:
        for block in part["blocks"]:
            found = [block["line"]] if "line" in block else []
            if "losses" in block:
                found = [*(row["line"] for row in block["losses"]["rows"]), block["losses"]["total"]]
            for line in found:
                if line["address"] not in seen:
                    seen.add(line["address"])
                    yield line


def next_digit(value: str, place: int = -1) -> str:
    """``value`` with one digit of its mantissa, the one at ``place``, changed to its successor."""
    mantissa, e, power = value.partition("E")
    at = [i for i, c in enumerate(mantissa) if c.isdigit()][place]
    return f"{mantissa[:at]}{(int(mantissa[at]) + 1) % 10}{mantissa[at + 1 :]}{e}{power}"


Change = Callable[[Record], str]


def recomputed_glyphs(found: Sequence[Sheet]) -> list[tuple[int, str, Glyph]]:
    """Sheet, address and glyph of every character that the reader recomputes or compares."""
    pool = []
    for band in bands(found):
        for glyph in dict.fromkeys(_checked(band)):
            pool.append((band.sheet, band.address, glyph))
    return pool


def _checked(band: Band) -> list[Glyph]:
    section = band.address.partition(".")[0]
    if section == "4":
        used = [g for g in band.column(98, 129) if g.colour == ACCENT or not (g.size > 8.7 and _below(band, g))]
        return [*band.column(*NUMBER), *band.column(72, 98), *used]
    if section == "9":
        sides = [g for edges in (LEFT, RIGHT) for g in band.column(*edges) if g.size > 7.9 or g.colour == ACCENT]
        sides = [g for g in sides if g.bold or not _prose(band, g)]
        margin = [g for g in band.column(*MARGIN) if g.x > band.edge + MARGIN[0] * MM]
        return [*band.column(*NUMBER), *sides, *margin, *picture(band, *TEXT).glyphs]
    if is_losses(band):
        cells = [g for edges in (*FACTORS, LOSS) for g in band.column(*edges) if not g.serif and g.colour != SECOND]
        cells = [g for g in cells if not picture(band, *SUM).glyphs or g.x > band.edge + LOSS[0] * MM]
        return [*band.column(*NUMBER), *cells, *band.column(*RECORD), *picture(band, *SUM).glyphs]
    if section == "8":
        under = [g for g in band.column(*WORKING) if not g.serif and g.colour == INK]
        rests = [g for g in band.column(*RESTS_ON) if g.colour != SECOND]
        return [*band.column(*NUMBER), *picture(band, *WORKING).glyphs, *under, *rests, *band.column(*RESULT)]
    return []


def _below(band: Band, glyph: Glyph) -> bool:
    """Whether ``glyph`` stands below the first row of its band, as the word ``line`` does."""
    return glyph.y < max(g.y for g in band.column(*NUMBER)) - 5


def _prose(band: Band, glyph: Glyph) -> bool:
    """Whether ``glyph`` belongs to the sentences of a rule's second row."""
    verdict = max(g.y for g in band.column(*TEXT) if g.bold and not g.serif)
    return glyph.y < verdict + 5


def other(glyph: Glyph, random: Random) -> str:
    """Another character of the same class."""
    for family in ("0123456789", "+−×", "⁰¹²³⁴⁵⁶⁷⁸⁹", "()", "=≥≤"):
        if glyph.char in family:
            return random.choice([c for c in family if c != glyph.char])
    letters = "abcdefghikmnpqstuvwxyzABDEFGHKLMNPQRSTVZ"
    return random.choice("0123456789") if glyph.char == "." else random.choice([c for c in letters if c != glyph.char])


def with_glyph(found: Sequence[Sheet], number: int, glyph: Glyph, **changes: Any) -> list[Sheet]:
    """The sheets with one glyph of sheet ``number`` changed."""
    changed = list(found)
    sheet = found[number - 1]
    glyphs = tuple(g._replace(**changes) if g is glyph else g for g in sheet.glyphs)
    changed[number - 1] = replace(sheet, glyphs=glyphs)
    return changed


def falsified(made: Record) -> tuple[Record, dict[str, str]]:
    """A record with one falsehood in each of many lines; address -> words the reader should find there."""
    made = copy.deepcopy(made)
    taken: set[str] = set()
    expected: dict[str, str] = {}

    def pick(wanted: Callable[[Json], bool], words: str) -> Json:
        line = next(x for x in lines(made) if x["address"] not in taken and wanted(x))
        taken.add(line["address"])
        expected[line["address"]] = words
        return line

    def equation(x: Json) -> bool:
        return bool(
            x["kind"] == "equation"
            and len(x["operands"]) > 1
            and "sum" not in x["formula"]
            and "h_V" not in x["formula"]
        )

    line = pick(lambda x: equation(x) and x["formula"].count("/") == 1, "the form with numbers gives another result")
    line["value"] = next_digit(line["value"])
    line = pick(equation, "differs from line")
    line["operands"][0]["value"] = next_digit(line["operands"][0]["value"], 0)
    line = pick(equation, "differs from line")
    line["operands"][0]["address"] = line["operands"][1]["address"]
    line = pick(equation, "differs from line")
    line["operands"][0]["unit"] = "kPa"
    line = pick(equation, "no earlier line is")
    line["operands"][0]["address"] = line["address"]
    line = pick(lambda x: equation(x) and " - " in x["formula"], "gives another result")
    line["formula"] = line["formula"].replace(" - ", " + ", 1)
    line = pick(equation, "the headline is not the result of record")
    line["headline"]["text"] = next_digit(line["headline"]["text"])
    line = pick(lambda x: x["kind"] == "conversion" and "/" in x["factor"], "the factor is not the exact one")
    line["factor"] = next_digit(line["factor"], 0)
    line = pick(lambda x: x["kind"] == "conversion" and "/" in x["factor"], "the conversion is not exact")
    line["formula"] = next_digit(line["formula"][: line["formula"].rindex(")")]) + ")"
    line = pick(lambda x: x["kind"] == "lookup" and x["operands"], "gives another value")
    line["value"] = next_digit(line["value"])
    line = pick(lambda x: x["kind"] == "lookup" and not x["operands"], "the headline is not the result of record")
    line["headline"]["text"] = next_digit(line["headline"]["text"], 0)
    line = pick(lambda x: x["kind"] == "root", "the residual at")
    line["residuals"][0][1] = next_digit(line["residuals"][0][1])
    return made, expected


_BY = {"source": "S1", "status": "verified"}
_OIL = {
    "name": "oil",
    "temperature": {"highest": "104 °F", **_BY},
    "density": {"value": "54.3 lb/ft³", **_BY},
    "viscosity": {"value": "300 cP", **_BY},
    "vapour_pressure": {"value": "0.03 psi absolute", **_BY},
}
_HIGH = {"elevation": {"value": "1600 m", **_BY}, "weather_allowance": {"value": "2 kPa", **_BY}}
_GAS = {"lowest": "22 kPa gauge", **_BY}
_COLUMN = {"lowest": "29.5 inHg absolute", **_BY}
_US = {"calculation.units": "US"}
_CURVE = {
    "pump.npsh_required.value": None,
    "pump.npsh_required.at_flow": None,
    "pump.npsh_required.points": [
        {"flow": f"{flow} m³/h", "npsh": f"{npsh} m"} for flow, npsh in ((120, 2.6), (180, 3.9), (240, 6.1), (300, 9.4))
    ],
}
_SPEED = {"pump.speed": "1450 r/min", "pump.npsh_required.speed_exponent": "2"}
_EYES = {
    "pump.eyes": 2,
    "pump.best_efficiency_flow": "210 m³/h",
    "criteria.suction_specific_speed": {"highest": "220", "in": "metric"},
}
_TABLE = {
    "name": "fuel oil",
    "temperature": {"lowest": "60 °F", "highest": "130 °F"},
    **_BY,
    "table": [
        {"temperature": t, "density": f"{d} lb/ft³", "viscosity": f"{v} cSt", "vapour_pressure": f"{p} psi absolute"}
        for t, d, v, p in (("50 °F", 60.1, 900, 0.001), ("100 °F", 59.2, 150, 0.004), ("150 °F", 58.3, 45, 0.02))
    ],
}
_MAIN = {
    "supply": {
        "name": "city main",
        "kind": "main",
        "pressure": {"lowest": "35 psi gauge", **_BY},
        "elevation": {"value": "-3 ft", **_BY},
        "velocity_head": "counted",
    },
    "line.sections.0.elements.0": {"id": "1", "kind": "tee", "flow": "branch"},
}
_LOSSES = {
    "line.mixed_sets": "intended",
    "line.sections.0.elements": [
        {"id": "1", "kind": "entrance", "shape": "flush"},
        {"id": "2", "kind": "pipe", "length": "12 m", "elevation": "0.5 m"},
        {"id": "3", "kind": "elbow", "radius": "long", "set": "hooper_2k"},
        {"id": "4", "kind": "valve", "Cv": "900"},
        {"id": "5", "kind": "valve", "L_over_D": "13"},
        {
            "id": "6",
            "kind": "equipment",
            "name": "E-1",
            "curve": [{"flow": "150 m³/h", "loss": "8 kPa"}, {"flow": "250 m³/h", "loss": "20 kPa"}],
        },
        {"id": "7", "kind": "connector", "loss": "0.2 m", "at_flow": "200 m³/h", "count": 2},
        {
            "id": "8",
            "kind": "reducer",
            "type": "concentric",
            "to": {"bore": "150 mm"},
            "length": "0.2 m",
            "elevation": "0.1 m",
        },
    ],
}
_WITHHELD = {"line.withheld_head": {"value": "0.5 m", **_BY}, "pump.npsh_required.datum_elevation": "-0.4 m"}
_HAZEN = {
    "line.loss_method": "hazen_williams",
    "line.sections.0.hazen_williams_C": "120",
    "line.fitting_set": "darby_3k",
}
_ASKED = {
    "criteria.velocity": "2.4 m/s",
    "criteria.operating_region": {"lowest": "70 %", "highest": "120 %"},
    "pump.flow.lowest": "120 m³/h",
    "pump.best_efficiency_flow": "190 m³/h",
    "liquid.name": "sea water",
    "liquid.salinity": "35 g/kg",
}
_MIXED = {"pump.flow.highest": "880 gpm", "supply.level.lowest": "5 ft", "site.barometer": _COLUMN}
#: Plants unlike the samples: name -> changes to the invented plant, whether it has a line, how many readings.
PLANTS: dict[str, tuple[dict[str, Any], bool, int]] = {
    "US, mixed units": ({**_US, **_MIXED}, True, 0),
    "standard atmosphere": ({"site": _HIGH}, True, 0),
    "blanketed": ({"supply.kind": "gas_blanketed", "supply.pressure": _GAS, "intake": INTAKE}, True, 0),
    "viscous, laminar": ({**_US, "pump.flow.highest": "400 UK gal/min", "liquid": _OIL}, True, 0),
    "vacuum at the gauge": ({"readings.0.gauge.pressure": "4 inHg vacuum"}, True, 1),
    "contingency": ({"line.friction_contingency": {"value": "10 %", **_BY}}, True, 0),
    "small loss": ({"line.sections.0.elements.3.K": "0.001"}, True, 0),
    "readings only": ({**_US, "calculation.paper": "A4"}, False, 2),
    "saturated, curve, speed": (
        {**_US, **_CURVE, **_SPEED, **_EYES, "supply.kind": "saturated", "supply.level.lowest": "52 ft"}, True, 0
    ),
    "smooth curve": ({**_CURVE, "pump.npsh_required.interpolation": "smooth"}, True, 0),
    "a table's liquid, coldest case": ({**_US, "liquid": _TABLE}, True, 0),
    "a main": ({**_US, **_MAIN}, True, 0),
    "every way to state a loss": (_LOSSES, True, 0),
    "withheld head, another datum": (_WITHHELD, True, 0),
    "Hazen and Williams": ({**_US, **_HAZEN}, True, 0),
    "more criteria": (_ASKED, True, 0),
    "wet pit": (
        {"line": None, "pump.arrangement": "wet_pit", "intake": INTAKE | {"reference": "bell_lip"}, "supply.level.drawdown": "6 in"},
        True, 0,
    ),
}  # fmt: skip


def plant_package(name: str) -> tuple[Record, bytes]:
    """Record and package of one of :data:`PLANTS`."""
    changes, line, readings = PLANTS[name]
    made: Record = json.loads(canonical(recorded(plant(changes, line=line, readings=readings))))
    return made, render(made, [])
