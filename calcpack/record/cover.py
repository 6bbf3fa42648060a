"""Rule checks as plain data, and what the cover says of them."""

from __future__ import annotations

from collections import Counter
from decimal import Decimal

from .. import formula
from ..ledger import Ledger
from ..number import rounded
from ..quantity import PLANT
from ..rules import ALLOWED, Check, reported_decimals
from ..study import Study
from ..symbols import NOMENCLATURE
from ..value import Value, drift, in_unit
from .lines import Json, References, number, value
from .words import SILENT

_RELATION = {">=": "≥", "<=": "≤", ">": ">", "<": "<", "==": "="}
_RANK = {"not met": 0, "not assessed": 1, "met": 2, "not applicable": 3}


def checks(study: Study, references: References) -> list[Json]:
    """The rules judged, with both sides reported against the verdict: what there is rounded down, what is needed up."""
    return [_check(study.ledger, c, f"9.{n}", references) for n, c in enumerate(study.checks, 1)]


def _check(ledger: Ledger, c: Check, address: str, references: References) -> Json:
    rising = c.rule.tree.op in (">=", ">")
    names = formula.names(c.rule.tree)
    margin = None
    if c.margin is not None and c.left is not None and c.right is not None:
        kind = NOMENCLATURE[names[0]].kind
        own_unit = c.left.unit
        plant = own_unit if kind == "temperature" else PLANT[ledger.system][kind][0]
        shown = (
            c.margin if kind == "temperature" else in_unit(Value(address, names[0], c.margin, 0.0, own_unit, ""), plant)
        )
        x = rounded(shown, min(_decimals(c.left), _decimals(c.right)), "down")
        margin = {
            "value": number(c.margin), "unit": own_unit.name, "headline": {"text": str(x), "unit": plant.name},
            "percent": None if c.percent is None else str(rounded(c.percent, 1, "down")),
        }  # fmt: skip
    own = references.text(c.rule.cite)
    return {
        "address": address,
        "id": c.rule.name,
        "title": c.rule.title,
        "about": c.about,
        "formula": c.rule.text,
        "relation": _RELATION[c.rule.tree.op],
        "left": _side(ledger, c.left, names[0], "down" if rising else "up"),
        "right": _side(ledger, c.right, names[1], "up" if rising else "down"),
        "verdict": c.verdict,
        "reason": c.reason,
        "criterion": c.criterion,
        "source": f"{c.source or 'criterion: no source stated'}; form of the rule: {own}",
        "margin": margin,
    }


def _decimals(v: Value) -> int:
    """Decimals of a reported side; a side that cannot be judged is shown without any."""
    return reported_decimals(v) or 0


def _side(ledger: Ledger, v: Value | None, symbol: str, toward: str) -> Json | None:
    if v is None:
        return None
    typed = next((x.given for x in ledger.inputs if ledger.used[x.value.address] is v), None)
    if typed is not None:
        text, _, unit = typed.partition(" ")
        headline = {"text": text, "unit": unit}
    else:
        plant = PLANT[ledger.system][NOMENCLATURE[v.symbol].kind][0]
        shown = in_unit(v, plant)
        headline = {"text": str(rounded(shown, _decimals(v), toward)), "unit": plant.name}
    return {"symbol": symbol, "name": v.title, **value(v), "headline": headline}


def governing(judged: list[Json]) -> Json:
    """The rule that decides: not met before not assessed before met, then the least margin in per cent."""
    return min(
        judged,
        key=lambda r: (_RANK[r["verdict"]], Decimal(r["margin"]["percent"] or 1000) if r["margin"] else Decimal(1000)),
    )


def cover(study: Study, judged: list[Json], inputs: list[Json], assumptions: list[Json]) -> Json:
    """What the cover says: verdict, statement, tally, counts of unverified inputs."""
    tally = Counter(r["verdict"] for r in judged)
    verdict = "not met" if tally["not met"] else "not assessed" if tally["not assessed"] else "met"
    statuses = [(x, x["provenance"]) for x in inputs if x.get("provenance")]
    counts = Counter(p["status"] or "no status" for _, p in statuses)
    unsourced = [x for x, p in statuses if not p["source"]]
    silent = [a for a in assumptions if a["basis"] == SILENT]
    counts["assumed"] += len(silent)
    unverified = [
        {"address": x["address"], "what": x["title"], "status": p["status"] or "no status"}
        for x, p in statuses
        if p["status"] != "verified"
    ]
    unverified += [{"address": a["address"], "what": a["text"], "status": "assumed"} for a in silent]
    return {
        "verdict": verdict,
        "statement": _statement(study, judged),
        "tally": {word: tally[word] for word in _RANK},
        "governing": governing(judged)["address"],
        "counts": {word: counts[word] for word in ("verified", "maker", "preliminary", "assumed")}
        | {"without source": len(unsourced)},
        "unverified": unverified,
        "rounding": _rounding(study),
    }


def _sentence(r: Json) -> str:
    about = f" ({r['about']})" if r["about"] else ""
    if r["margin"] is None:
        return f"{r['title']}{about}: {r['verdict']}, {r['reason']}."
    left, right, margin = r["left"]["headline"], r["right"]["headline"], r["margin"]["headline"]
    if r["id"] == "highest_temperature":
        return (
            f"The highest temperature was used, {left['text']} {left['unit']}."
            if r["verdict"] == "met"
            else f"{r['title']}: {r['reason']}."
        )
    words = "short by" if margin["text"].startswith("-") else "met by"
    subject = "NPSH available" if r["id"] == "npsh_margin" else "Submergence"
    amount = margin["text"].lstrip("-")
    if r["verdict"] == "not assessed":
        return f"{subject}{about} is {left['text']} {left['unit']}; {right['text']} {right['unit']} is needed: not assessed, {r['reason']}."
    return f"{subject}{about} is {left['text']} {left['unit']}; {right['text']} {right['unit']} is needed: {words} {amount} {margin['unit']}."


def _statement(study: Study, judged: list[Json]) -> str:
    """A few sentences in plant units: what decides, everything that fails, and where model and reading differ."""
    first = governing(judged)
    told = [first] + [r for r in judged if r["verdict"] in ("not met", "not assessed") and r is not first]
    if first["id"] != "npsh_margin":
        told += [r for r in judged if r["id"] == "npsh_margin" and r not in told]
    words = [_sentence(r) for r in told]
    if study.differences:
        apart = ", ".join(f"{study.ledger.shown(d.value)} ({d.name})" for d in study.differences)
        words.append(f"Model less reading, at the state of the reading: {apart}.")
    if study.findings:
        words.append(f"Open findings: {len(study.findings)} (section 9).")
    return " ".join(words)


def _rounding(study: Study) -> str:
    sides = [
        v for c in study.checks for v in (c.left, c.right) if v is not None and NOMENCLATURE[v.symbol].kind == "length"
    ]
    if not sides:
        return ""
    worst = max(sides, key=drift)
    unit = worst.unit.name
    limit = ALLOWED[_decimals(worst)]
    return f"largest effect of line rounding on a result: {drift(worst):.6f} {unit} (line {worst.address}); limit {limit:f} {unit}"
