"""The record: one study as plain data, complete for printing and for re-computation without this code."""

from __future__ import annotations

import dataclasses
import hashlib
import json
from collections import Counter
from collections.abc import Iterator

from .. import __version__, formula
from ..assessment import Study
from ..lookup import library
from ..source.inputs import Given
from ..study.finding import Finding
from ..symbols import NOMENCLATURE
from . import words
from .checks import checks, reported
from .cover import cover
from .limits import limits
from .lines import Json, References, conversions, line, part
from .method import method
from .rounding import effects, greatest, rounding
from .sketch import sketch

FORMAT = "calcpack record 1"


def assemble(study: Study) -> Json:
    """The record of ``study``; the same study gives the same record, fingerprint included, on every machine."""
    c, ledger, references, shown = study.calculation, study.ledger, References(), reported(study)
    computation = [part(ledger, p, references, shown) for p in ledger.parts if p.blocks]
    inputs = [line(ledger, x, references) for x in ledger.inputs]
    judged, moved = checks(study, references), effects(study)
    assumptions = _assumptions(study, inputs)
    record: Json = {
        "format": FORMAT,
        "calculation": {
            "number": c.number, "title": c.title, "revision": c.revision, "date": c.date.isoformat(), "owner": c.owner,
            "project": c.project, "status": c.status, "units": c.units, "paper": c.paper, "datum": c.datum,
            "system": f"{c.pump.name} from {c.supply.name}",
        },
        "revisions": [{"revision": r.revision, "date": r.date.isoformat(), "reason": r.reason} for r in c.revisions],
        "route": study.route,
        "cover": cover(study, judged, inputs, assumptions) | {"rounding": greatest(moved)},
        "purpose": words.purpose(c),
        "scope": words.scope(study),
        "exclusions": words.cautions(c)[-1:],
        "criteria": [
            {"rule": r["address"], "text": ": ".join(t for t in (r["about"], r["criterion"]) if t), "source": r["source"]} for r in judged
        ],
        "method": method(study, references),
        "inputs": inputs,
        "unused": _unused(study),
        "assumptions": assumptions,
        "sketch": sketch(study),
        "computation": computation,
        "checks": judged,
        "unapplied": [{"title": u.title, "missing": u.missing} for u in study.unapplied],
        "findings": [_finding(study, each) for each in study.findings.values()],
        "limits": limits(study),
        "limits_note": words.limits_note(judged),
        "cautions": words.cautions(c),
        "software": _software(study),
        "rounding": rounding(moved),
        "conversions": conversions(ledger.lines()),
        "nomenclature": _nomenclature(study),
        "input_file": {"name": c.path, "sha256": c.sha256, "text": c.raw.decode("utf-8-sig")},
    }  # fmt: skip
    sources = [{"id": s.id, "text": ", ".join(t for t in (s.title, s.document, s.edition) if t)} for s in c.sources]
    record["references"] = sources + references.cited()
    record["fingerprint"] = fingerprint(record)
    return record


def canonical(record: Json) -> bytes:
    """The record as canonical JSON: sorted keys, no spaces, UTF-8."""
    return json.dumps(record, sort_keys=True, separators=(",", ":"), ensure_ascii=False, allow_nan=False).encode()


def fingerprint(record: Json) -> str:
    """SHA-256 of the canonical JSON without the fingerprint itself."""
    return hashlib.sha256(canonical({k: v for k, v in record.items() if k != "fingerprint"})).hexdigest()


def givens(of: object) -> Iterator[Given]:
    """Every value of an input file, in the order of its records."""
    if isinstance(of, Given):
        yield of
    elif isinstance(of, tuple):
        for each in of:
            yield from givens(each)
    elif dataclasses.is_dataclass(of):
        for field in dataclasses.fields(of):
            yield from givens(getattr(of, field.name))


def _unused(study: Study) -> list[Json]:
    """Values of the file that enter no line, such as the normal level: listed, so that nothing of the file is lost."""
    used = {x.key for x in study.ledger.inputs}
    return [
        {"key": g.key, "given": g.text, "source": g.source, "place": g.place, "status": g.status, "file_line": g.line}
        for g in givens(study.calculation) if g.key not in used
    ]  # fmt: skip


def _assumptions(study: Study, inputs: list[Json]) -> list[Json]:
    found: list[Json] = []

    def add(text: str, basis: str, consequence: str, confirm: str) -> None:
        found.append(
            {
                "address": f"5.{len(found) + 1}",
                "text": text,
                "basis": basis,
                "consequence": consequence,
                "confirm": confirm,
            }
        )

    for x in inputs:
        p = x.get("provenance")
        if p and p["status"] == "assumed":
            add(
                f"{x['title']}: {x['given']} (line {x['address']})",
                p["note"],
                "enters the lines that cite it",
                p["confirm"],
            )
    for text, consequence in study.assumptions.values():
        add(text, words.SILENT, consequence, "")
    for each, reason in study.intended:
        at_stake = _at_stake(study, each)
        add(_capital(each.text), f"{words.INTENDED}: {reason}", f"{at_stake} at stake" if at_stake else each.reason, "")
    for text, consequence in words.standing(study):
        add(text, words.INHERENT, consequence, "")
    return found


def _finding(study: Study, found: Finding) -> Json:
    """A finding in words, with the head at stake and its line where it is computed."""
    return {
        "name": found.name, "text": _capital(found.text), "reason": found.reason, "cost": _at_stake(study, found),
        "intended": found.intended,
    }  # fmt: skip


def _at_stake(study: Study, found: Finding) -> str:
    if found.cost is None:
        return ""
    return f"{study.ledger.shown(found.cost).lstrip('-')} (line {found.cost.address})"


def _capital(text: str) -> str:
    return text[:1].upper() + text[1:]


_LIBRARIES = {
    "CoolProp": "properties of liquids ({}); each look-up names its formulation",
    "fluids": "table of pipe bores, ASME B36.10M",
}


def _software(study: Study) -> list[Json]:
    """What computed and printed it; a library with what it was asked for, where its lines say so."""
    asked: dict[str, list[str]] = {}
    for x in study.ledger.lines():
        if x.library:
            name, _, what = x.library.partition(" (")
            asked.setdefault(name, []).append(what.removesuffix(")"))
    found = [{"name": f"calcpack {__version__}", "role": "equations, ledger, rules, record"}]
    found += [
        {"name": name, "role": _LIBRARIES[name.split()[0]].format("; ".join(dict.fromkeys(what)))}
        for name, what in sorted(asked.items())
    ]
    found.append({"name": library("jsonschema"), "role": "form of the input file"})
    found.append({"name": library("weasyprint"), "role": "pages"})
    return found


def _nomenclature(study: Study) -> list[Json]:
    used: Counter[str] = Counter()
    for x in study.ledger.lines():
        used[x.value.symbol] += 1
        used.update(symbol for symbol, _ in x.operands)
    for check in study.checks:
        used.update(formula.names(check.rule.tree))
    entries = [NOMENCLATURE[name] for name in sorted(used, key=str.casefold)]
    return [
        {
            "name": s.name,
            "base": s.base,
            "sub": s.sub,
            "upright": s.upright,
            "meaning": s.meaning,
            "unit": study.ledger.coherent(s.name).name,
        }
        for s in entries
    ]
