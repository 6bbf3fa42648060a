"""The assessment as a table for a terminal."""

from __future__ import annotations

from .record.lines import Json

_GLYPH = {"met": "met", "not met": "NOT MET", "not applicable": "n/a", "not assessed": "not assessed"}


def table(record: Json) -> str:
    """Verdict, rules, findings, key results, unverified inputs and cautions, for reading."""
    c, cover = record["calculation"], record["cover"]
    rows = [f"{c['number']} rev {c['revision']}  {c['title']}", f"{c['system']}; route: {record['route']}", ""]
    rows += [f"Verdict: {cover['verdict']}", f"  {cover['statement']}", "", "Rules"]
    for r in record["checks"]:
        about = f", {r['about']}" if r["about"] else ""
        rows.append(f"  {r['address']}  {_GLYPH[r['verdict']]:12} {r['title']}{about}")
        rows.append(f"       {_sides(r)}")
        rows.append(f"       {r['reason']}. Criterion: {r['criterion']}. Source: {r['source']}")
    rows += ["", "Key results"]
    for x in _lines(record):
        if x["key_result"]:
            rows.append(f"  {x['address']:6} {x['headline']['text']:>10} {x['headline']['unit']:8} {x['title']}")
    if record["findings"]:
        rows += ["", "Findings", *(f"  {f['text']}: {f['reason']}." for f in record["findings"])]
    if cover["unverified"]:
        rows += [
            "",
            "Inputs not verified",
            *(f"  {u['address']:6} {u['what']} ({u['status']})" for u in cover["unverified"]),
        ]
    rows += ["", "Cautions", *(f"  {text}" for text in record["cautions"])]
    return "\n".join(rows)


def _sides(r: Json) -> str:
    if not (r["left"] and r["right"] and r["margin"]):
        return "no two sides to compare"
    left, right, margin = (r[k]["headline"] for k in ("left", "right", "margin"))
    percent = f" ({r['margin']['percent']} %)" if r["margin"]["percent"] else ""
    return f"{left['text']} {left['unit']}, to be {r['relation']} {right['text']} {right['unit']}; margin {margin['text']} {margin['unit']}{percent}"


def _lines(record: Json) -> list[Json]:
    return [b["line"] for part in record["computation"] for b in part["blocks"] if "line" in b]
