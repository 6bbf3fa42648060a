"""What the cover says of the rules judged and of the inputs behind them."""

from __future__ import annotations

from collections import Counter
from decimal import Decimal

from ..assessment import Study
from ..number import MINUS, typeset_minus
from ..symbols import NOMENCLATURE
from ..value import drift
from ..verdict import ALLOWED, reported_decimals
from .lines import Json
from .words import SILENT

_RANK = {"not met": 0, "not assessed": 1, "met": 2, "not applicable": 3}
#: How far an input is confirmed; each input counts once, the last two before the others.
STATES = ("verified", "maker", "preliminary", "assumed", UNSTATED := "without source or status")


def weight(verdict: str, percent: Decimal | None) -> tuple[int, Decimal]:
    """What decides stands first: not met before not assessed before met, then the least margin in per cent."""
    return _RANK[verdict], Decimal("Infinity") if percent is None else percent


def governing(judged: list[Json]) -> Json:
    """The rule that decides."""
    return min(judged, key=lambda r: weight(r["verdict"], _percent(r)))


def _percent(r: Json) -> Decimal | None:
    return Decimal(r["margin"]["percent"]) if r["margin"] and r["margin"]["percent"] else None


def cover(study: Study, judged: list[Json], inputs: list[Json], assumptions: list[Json]) -> Json:
    """What the cover says: verdict, statement, tally, counts of unverified inputs."""
    tally = Counter(r["verdict"] for r in judged)
    verdict = "not met" if tally["not met"] else "not assessed" if tally["not assessed"] else "met"
    states = [(x, _state(p)) for x in inputs if (p := x.get("provenance"))]
    silent = [a for a in assumptions if a["basis"] == SILENT]
    counts = Counter(state for _, state in states)
    counts["assumed"] += len(silent)
    unverified = [
        {"address": x["address"], "what": x["title"], "status": state} for x, state in states if state != "verified"
    ]
    unverified += [{"address": a["address"], "what": a["text"], "status": "assumed"} for a in silent]
    return {
        "verdict": verdict,
        "statement": _statement(study, judged),
        "tally": {word: tally[word] for word in _RANK},
        "governing": governing(judged)["address"],
        "counts": {state: counts[state] for state in STATES},
        "unverified": unverified,
        "rounding": _rounding(study),
    }


def _state(provenance: Json) -> str:
    """How far an input is confirmed: assumed, else by its status, where it has a source as well."""
    status: str = provenance["status"]
    if status == "assumed" or (status and provenance["source"]):
        return status
    return UNSTATED


def _sentence(r: Json) -> str:
    about = f" ({r['about']})" if r["about"] else ""
    if r["margin"] is None:
        return f"{r['title']}{about}: {r['verdict']}, {r['reason']}."
    left, right, margin = (_quantity(r[k]["headline"]) for k in ("left", "right", "margin"))
    if r["id"] == "highest_temperature":
        met = r["verdict"] == "met"
        return f"The highest temperature was used, {left}." if met else f"{r['title']}: {r['reason']}."
    at_least = r["relation"] in "≥>"
    subject = _SUBJECTS.get(r["id"], r["left"]["name"])
    sides = f"{subject}{about} is {left}; {right} {'is needed' if at_least else 'at most is allowed'}"
    if r["verdict"] == "not assessed":
        return f"{sides}: not assessed, {r['reason']}."
    word = "met" if not margin.startswith(MINUS) else "short" if at_least else "over"
    return f"{sides}: {word} by {margin.lstrip(MINUS)}."


#: Rule -> its left side in a sentence, where the title of its line would not do.
_SUBJECTS = {"npsh_margin": "NPSH available", "submergence": "Submergence"}


def _quantity(headline: Json) -> str:
    """A short form in a sentence; a pure number has no unit."""
    unit = "" if headline["unit"] == "1" else f" {headline['unit']}"
    return f"{typeset_minus(headline['text'])}{unit}"


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
    return " ".join(words)


def _rounding(study: Study) -> str:
    sides = [
        v for c in study.checks for v in (c.left, c.right) if v is not None and NOMENCLATURE[v.symbol].kind == "length"
    ]
    if not sides:
        return ""
    worst = max(sides, key=drift)
    unit = worst.unit.name
    limit = ALLOWED[reported_decimals(worst) or 0]
    return f"largest effect of line rounding on a result: {drift(worst):.6f} {unit} (line {worst.address}); limit {limit:f} {unit}"
