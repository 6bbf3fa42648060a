"""The assessment as a table for a terminal."""

from __future__ import annotations

from .number import typeset_minus
from .record.lines import Json, quantity

_GLYPH = {"met": "met", "not met": "NOT MET", "not applicable": "n/a", "not assessed": "not assessed"}


def table(record: Json) -> str:
    """Verdict, rules, findings, key results, unverified inputs and cautions, for reading."""
    c, cover = record["calculation"], record["cover"]
    rows = [f"{c['number']} rev {c['revision']}  {c['title']}", f"{c['system']}; route: {record['route']}", ""]
    rows += [f"Verdict: {cover['verdict']}", f"  {cover['statement']}"]
    if record["findings"]:
        rows.append(f"  Open findings, below: {len(record['findings'])}.")
    rows += ["", "Rules"]
    for r in record["checks"]:
        about = f", {r['about']}" if r["about"] else ""
        rows.append(f"  {r['address']:5} {_GLYPH[r['verdict']]:12} {r['title']}{about}")
        rows += [
            f"        {words}"
            for words in (_sides(r), f"{r['reason']}. {r['criterion']}. Source: {r['source']}")
            if words
        ]
    if record["unapplied"]:
        rows += ["", "Rules not applied", *(f"  {u['title']}: {u['missing']}" for u in record["unapplied"])]
    rows += ["", "Key results"]
    for part in record["computation"]:
        for x in (b["line"] for b in part["blocks"] if "line" in b):
            if x["key_result"]:
                rows.append(f"  {x['address']:6} {quantity(x['headline']):>14}  {x['title']} ({part['title']})")
    if record["findings"]:
        rows += ["", "Findings", *map(_finding, record["findings"])]
    if cover["unverified"]:
        rows += [
            "",
            "Inputs not verified",
            *(f"  {u['address']:6} {u['what']} ({u['status']})" for u in cover["unverified"]),
        ]
    rows += ["", "Cautions", *(f"  {text}" for text in record["cautions"])]
    return "\n".join(rows)


def _finding(f: Json) -> str:
    cost = f"Head at stake: {f['cost']}" if f["cost"] else ""
    return "  " + " ".join(f"{part}." for part in (f"{f['text']}: {f['reason']}", cost, f["intended"]) if part)


def _sides(r: Json) -> str:
    """Both sides and the margin; empty where there are none to compare."""
    if not (r["left"] and r["right"] and r["margin"]):
        return ""
    left, right, margin = (quantity(r[k]["headline"]) for k in ("left", "right", "margin"))
    percent = f" ({typeset_minus(r['margin']['percent'])} %)" if r["margin"]["percent"] else ""
    return f"{left}, to be {r['relation']} {right}; margin {margin}{percent}"
