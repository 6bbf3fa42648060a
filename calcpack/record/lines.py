"""Lines of the ledger as plain data, with their sources numbered in the order of first use."""

from __future__ import annotations

from collections.abc import Mapping
from decimal import Decimal
from types import MappingProxyType
from typing import Any

from .. import formula
from ..conversion import conversion_tree, factor_text
from ..ledger import Ledger
from ..number import DIGITS, typeset_minus
from ..quantity import COHERENT, PLANT
from ..references import REFERENCES, Cite
from ..symbols import NOMENCLATURE
from ..value import Line, Losses, Part, Value

Json = dict[str, Any]
#: Address -> short form of the values that rules compare.
Reported = Mapping[str, Json]


class References:
    """Numbers the published sources as they are first cited."""

    def __init__(self) -> None:
        self._number: dict[str, int] = {}

    def text(self, cite: Cite) -> str:
        """``[R3] eq. 5; recalled, not re-read``, or the words of a definition or of common practice."""
        if not cite.key:
            return "; ".join(part for part in (cite.place, cite.how) if part)
        number = self._number.setdefault(cite.key, len(self._number) + 1)
        cited = " ".join(part for part in (f"[R{number}]", cite.place) if part)
        return "; ".join(part for part in (cited, cite.how) if part)

    def cited(self) -> list[Json]:
        """The sources cited so far, in the order of their numbers."""
        return [{"id": f"R{n}", "text": REFERENCES[key].text} for key, n in self._number.items()]


def number(x: Decimal) -> str:
    """A value of record as text: its digits, with a power of ten only where that is how it is printed."""
    return str(x) if x.is_zero() or -4 < x.adjusted() < DIGITS + 4 else f"{x:E}"


def short(x: float) -> str:
    """A full-precision number at nine digits: enough to show a drift, and the same on every machine."""
    return f"{x:.8E}"


def value(v: Value) -> Json:
    """A value where another line uses it."""
    return {"value": number(v.record), "unit": v.unit.name, "address": v.address}


def headline(ledger: Ledger, v: Value) -> Json:
    """The short form in plant units."""
    x, unit = ledger.headline(v)
    return {"text": number(x), "unit": unit.name}


def quantity(headline: Json) -> str:
    """A short form in a sentence; a pure number has no unit."""
    unit = "" if headline["unit"] in ("", "1") else f" {headline['unit']}"
    return f"{typeset_minus(headline['text'])}{unit}"


def _shown(ledger: Ledger, of: Line, reported: Reported) -> Json:
    """The figure shown large: an input as it stands, a result in plant units, a table's entry as it stands where its unit is
    one of the display system.

    A value that a rule compares is shown as the rule reports it.
    """
    kind = NOMENCLATURE[of.value.symbol].kind
    at_home = of.value.unit.name in (COHERENT[ledger.system][kind].name, PLANT[ledger.system][kind][0].name)
    if of.kind in ("given", "constant") or (of.kind == "lookup" and not of.operands and at_home):
        return {"text": number(of.value.record), "unit": of.value.unit.name}
    return reported.get(of.value.address) or headline(ledger, of.value)


def line(ledger: Ledger, of: Line, references: References, reported: Reported = MappingProxyType({})) -> Json:
    """One line with everything the page prints of it; ``reported`` are the short forms of values that rules compare."""
    v = of.value
    found: Json = {
        "address": v.address,
        "kind": of.kind,
        "title": v.title,
        "symbol": v.symbol,
        "formula": formula.text(of.tree) if of.tree else None,
        "operands": [{"symbol": symbol, **value(operand)} for symbol, operand in of.operands],
        "value": number(v.record),
        "unit": v.unit.name,
        "headline": _shown(ledger, of, reported),
        "source": references.text(of.cite),
        "note": of.validity,
        "key_result": of.key_result,
        "shadow": {"value": short(v.shadow), "unit": "SI"},
        "fingerprint": of.fingerprint,
    }
    if of.kind in ("given", "constant"):
        found |= {"given": of.given, "key": of.key, "file_line": of.file_line, "used": value(ledger.used[v.address])}
        if of.provenance is not None:
            p = of.provenance
            found["provenance"] = {
                "source": p.source,
                "place": p.place,
                "status": p.status,
                "note": p.note,
                "confirm": p.confirm,
            }
    if of.kind == "conversion":
        found |= _conversion(of)
    if of.kind == "lookup":
        found |= {"function": of.function, "library": of.library}
    if of.kind == "root":
        found["residuals"] = [[number(x), f"{r:E}"] for x, r in of.residuals]
    return found


def part(ledger: Ledger, of: Part, references: References, reported: Reported) -> Json:
    """A part of the computation with its blocks."""
    blocks: list[Json] = []
    for block in of.blocks:
        if isinstance(block, str):
            blocks.append({"group": block})
        elif isinstance(block, Losses):
            blocks.append({"losses": _losses(ledger, block, references, reported)})
        else:
            blocks.append({"line": line(ledger, block, references, reported)})
    return {"title": of.title, "scope": of.scope, "blocks": blocks}


def _losses(ledger: Ledger, of: Losses, references: References, reported: Reported) -> Json:
    rows = [{"row": r.label, "element": r.element, "line": line(ledger, r.line, references)} for r in of.rows]
    return {"title": of.title, "rows": rows, "total": line(ledger, of.total, references, reported), "worked": of.worked}


def conversions(lines: list[Line]) -> list[Json]:
    """Each conversion used, once, with its exact factor."""
    seen: dict[tuple[str, str], Json] = {}
    for of in lines:
        if of.kind == "conversion":
            before, after = of.operands[0][1].unit, of.value.unit
            tree = formula.text(conversion_tree("x", before, after))
            seen.setdefault((before.name, after.name), {**_conversion(of), "formula": tree})
    return list(seen.values())


def _conversion(of: Line) -> Json:
    """From, to, exact factor and the sources of the definitions behind it; SI's own powers of ten need none."""
    before, after = of.operands[0][1].unit, of.value.unit
    sources = dict.fromkeys(unit.source for unit in (before, after) if unit.source != "SI")
    return {
        "from": before.name, "to": after.name, "factor": factor_text(before.factor / after.factor),
        "source": "; ".join(sources) or "SI",
    }  # fmt: skip
