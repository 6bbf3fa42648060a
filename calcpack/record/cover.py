"""What the cover says of the rules judged and of the inputs behind them."""

from __future__ import annotations

from collections import Counter
from decimal import Decimal

from ..assessment import Study
from ..number import MINUS, typeset_minus
from ..rules.margin import NPSH_MARGIN
from ..verdict import PASSING
from .lines import Json, quantity
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
    left, right, margin = (quantity(r[k]["headline"]) for k in ("left", "right", "margin"))
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
_SUBJECTS = {NPSH_MARGIN.name: "NPSH available", "submergence": "Submergence"}


def _statement(study: Study, judged: list[Json]) -> str:
    """A few sentences in plant units: what decides, every rule that fails, NPSH, and where model and reading differ."""
    decides = governing(judged)["address"]
    told: dict[str, list[Json]] = {}
    for r in sorted(judged, key=lambda r: weight(r["verdict"], _percent(r))):
        told.setdefault(r["id"], []).append(r)
    words = []
    for first, *others in told.values():
        if first["address"] == decides or first["id"] == NPSH_MARGIN.name or first["verdict"] not in PASSING:
            words.append(_sentence(first))
        more = sum(r["verdict"] == first["verdict"] for r in others)
        if more and first["verdict"] not in PASSING:
            words.append(
                f"By the same rule {more} more {'results are' if more > 1 else 'result is'} {first['verdict']}."
            )
    if study.differences:
        apart = ", ".join(f"{typeset_minus(study.ledger.shown(d.value))} ({d.name})" for d in study.differences)
        words.append(f"Model less reading, at the state of the reading: {apart}.")
    if study.calculation.supply.kind == "saturated":
        words.append("Steady state only: a fall of the vessel's pressure is not analysed.")
    pump = study.calculation.pump
    if pump.running > 1 and not any((case.running or pump.running) < pump.running for case in study.calculation.cases):
        words.append(
            f"Computed with {study.calculation.pump.running} pumps running; with fewer, each runs out on its curve."
        )
    return " ".join(words)
