"""Input files made in memory for tests: an invented plant, changed key by key."""

from __future__ import annotations

import copy
from collections.abc import Mapping
from decimal import Decimal
from typing import Any

import yaml

from calcpack.assessment import Study, run
from calcpack.record import assemble
from calcpack.source import loads
from calcpack.symbols import NOMENCLATURE
from calcpack.units import COHERENT, unit
from calcpack.value import Value

Document = dict[str, Any]

_HEAD: Document = {
    "calculation": {
        "number": "T-1",
        "title": "Suction check of an invented pump",
        "revision": "A",
        "date": "2026-11-16",
        "owner": "Test owner (invented)",
        "project": "Test plant (invented)",
        "units": "SI",
        "datum": "pump shaft centreline",
    },
    "sources": {"S1": {"title": "Test data", "document": "T-D-1", "edition": "rev 0"}},
    "site": {"barometer": {"lowest": "100 kPa absolute", "source": "S1", "status": "verified"}},
    "liquid": {"name": "water", "temperature": {"highest": "25 °C", "source": "S1", "status": "verified"}},
    "supply": {
        "name": "tank T-1",
        "kind": "open",
        "level": {"lowest": "1.5 m", "source": "S1", "status": "verified"},
    },
    "pump": {
        "name": "P-1",
        "flow": {"highest": "200 m³/h", "source": "S1", "status": "verified"},
        "datum_elevation": {"value": "0 m", "source": "S1", "status": "verified"},
        "datum": "impeller eye",
        "npsh_required": {
            "value": "5 m",
            "at_flow": "200 m³/h",
            "speed": "1480 r/min",
            "impeller": "300 mm",
            "curve": "C-1",
            "basis": "NPSH3",
            "certified": "typical",
            "datum": "impeller eye",
            "source": "S1",
            "status": "verified",
        },
    },
    "criteria": {"npsh_margin": {"ratio": "1.1", "source": "S1", "status": "verified"}},
}
_LINE: Document = {
    "fitting_set": "crane",
    "sections": [
        {
            "id": "L1",
            "bore": "202.7 mm",
            "material": "commercial steel",
            "source": "S1",
            "status": "verified",
            "elements": [
                {"id": "1", "kind": "entrance", "shape": "flush"},
                {"id": "2", "kind": "pipe", "length": "20 m"},
                {"id": "3", "kind": "elbow", "radius": "long", "count": 2},
                {"id": "4", "kind": "fitting", "name": "reducer", "K": "0.3"},
            ],
        }
    ],
}
_READING: Document = {
    "name": "test 1",
    "date": "2026-10-02",
    "source": "S1",
    "status": "verified",
    "flow": "200 m³/h",
    "barometer": "100 kPa absolute",
    "temperature": "25 °C",
    "level": "1.5 m",
    "gauge": {"pressure": "5 kPa gauge", "elevation": "0.3 m", "leg": "filled", "tap": {"bore": "202.7 mm"}},
}
INTAKE: Document = {
    "inlet_diameter": "300 mm",
    "reference": "inlet_centreline",
    "elevation": "-1 m",
    "source": "S1",
    "status": "verified",
}


def plant(changes: Mapping[str, Any] | None = None, *, line: bool = True, readings: int = 0) -> Document:
    """A whole input file: the invented plant with ``changes``, dotted address -> value (``None``: left out).

    ``line`` gives it the design route; ``readings`` is how many equal readings it has, told apart by name.
    """
    document = copy.deepcopy(_HEAD)
    if line:
        document["line"] = copy.deepcopy(_LINE)
    if readings:
        document["readings"] = [{**copy.deepcopy(_READING), "name": f"test {n + 1}"} for n in range(readings)]
    return changed(document, changes or {})


def changed(document: Document, changes: Mapping[str, Any]) -> Document:
    """A copy of ``document`` with dotted addresses set; a number counts along a list, ``None`` leaves a key out."""
    made = copy.deepcopy(document)
    for address, value in changes.items():
        *above, last = address.split(".")
        at: Any = made
        for name in above:
            at = at[int(name)] if isinstance(at, list) else at.setdefault(name, {})
        if value is None:
            at.pop(last, None)
        elif isinstance(at, list):
            at[int(last)] = copy.deepcopy(value)
        else:
            at[last] = copy.deepcopy(value)
    return made


class _InFull(yaml.SafeDumper):
    """Writes a part that stands twice twice: the tool reads no aliases."""

    def ignore_aliases(self, data: Any) -> bool:
        return True


def written(document: Document) -> bytes:
    """The file's bytes."""
    return yaml.dump(document, Dumper=_InFull, allow_unicode=True, sort_keys=False).encode()


def studied(document: Document) -> Study:
    """The document computed and judged."""
    return run(loads(written(document), "plant.yaml"))


def recorded(document: Document) -> dict[str, Any]:
    """The document's record."""
    return assemble(studied(document))


def found(study: Study, symbol: str, title: str = "") -> Value:
    """The first coherent value of a study by its symbol and the beginning of its title."""
    return next(
        x.value
        for x in study.ledger.lines()
        if x.value.symbol == symbol
        and x.value.title.startswith(title)
        and x.value.unit == study.ledger.coherent(symbol)
    )


def verdicts(study: Study) -> dict[str, str]:
    """Rule -> verdict; where a rule was judged several times, the last."""
    return {c.rule.name: c.verdict for c in study.checks}


def value(symbol: str, record: str, system: str = "SI", *, shadow: float | None = None, address: str = "8.1") -> Value:
    """A value of its own in the coherent unit; its shadow is the record unless told."""
    of = COHERENT[system][NOMENCLATURE[symbol].kind]
    full = float(record) * float(of.factor) if shadow is None else shadow
    return Value(address, symbol, Decimal(record), full, unit(of.name), f"{symbol} of a test")
