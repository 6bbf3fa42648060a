"""The record as the templates print it: text made printable, numbers formatted, pictures drawn."""

from __future__ import annotations

from collections.abc import Mapping
from decimal import Decimal
from typing import Any

from . import figures, glyphs, metrics, tables, text
from .lines import POINT, Context, view
from .scale import steps
from .text import all_printable

PAPERS = {"A4": ("210mm 297mm", "20mm", "14mm"), "Letter": ("215.9mm 279.4mm", "22mm", "17.9mm")}
#: The input file as read: size, and width of a line before it is wrapped (points).
LISTING_SIZE, LISTING_WIDTH = 7.8, 128 * POINT
#: A longer statement leaves its place beside the verdict and runs over the whole width under it.
LONG_STATEMENT = 230
#: More rules than these leave the rest of the cover less room.
MANY_RULES = 8
SCOPE_WIDTH = 77 * POINT  # room for the scope above a sheet
FIGURE_SPACE = "\u2007"
#: Rules on the cover stand in this order.
RANK = ("not met", "not assessed", "met", "not applicable")
#: How far inputs are confirmed, in the order and the short words of the cover's counts.
COUNTED = {
    "verified": "verified", "maker": "unconfirmed", "preliminary": "preliminary", "assumed": "assumed",
    "without source or status": "without source or status",
}  # fmt: skip
SECTIONS = (
    "Purpose and scope",
    "Criteria",
    "Method",
    "Inputs",
    "Assumptions",
    "References",
    "System as modelled",
    "Computation",
    "Checks against criteria",
    "Limits of use",
    "Cautions",
    "Software and rounding",
    "Nomenclature and conversions",
    "Input file as read",
)


def context(record: Mapping[str, Any]) -> dict[str, Any]:
    """The variables of the template.  Raises :class:`KeyError` where the record lacks a part."""
    r = all_printable(record)
    shared = Context(text.display(r["nomenclature"]), _addresses(r), _factors(r))
    paper = PAPERS[r["calculation"]["paper"]]
    return {
        "r": r,
        "c": r["calculation"],
        "sections": SECTIONS,
        "link": shared.link,
        "check": glyphs.check(),
        "page": {"size": paper[0], "left": paper[1], "right": paper[2], "paper": r["calculation"]["paper"]},
        "cover": _cover(r, shared),
        "inputs": [tables.input_row(line, shared) for line in r["inputs"]],
        "unused": [{**u, "given": text.given(u["given"])} for u in r["unused"]],
        "parts": [_part(p, shared) for p in r["computation"]],
        "rules": [tables.rule(rule, shared) for rule in r["checks"]],
        "verdicts": [(glyphs.verdict(word), word) for word in tables.VERDICTS],
        "statuses": [(glyphs.status(key), words) for key, words in tables.STATUS_WORDS.items()],
        "margin_key": glyphs.margin_bar("6"),
        "elevation": glyphs.data_uri(figures.elevation(r["sketch"])) if r["sketch"] else "",
        "figure": _caption(r["sketch"]) if r["sketch"] else {},
        "rounding": [_rounding(row, shared) for row in r["rounding"]],
        "conversions": [
            {
                **row,
                "id": f"C{i}",
                "factor": text.linear(row["factor"]),
                "formula": text.linear(row["formula"]) if "+" in row["formula"] else "",
            }
            for i, row in enumerate(r["conversions"], 1)
        ],
        "nomenclature": [
            {**n, "symbol": text.symbol(shared.names[n["name"]]), "unit": text.unit(n["unit"]) or "–"}
            for n in r["nomenclature"]
        ],
        "system_short": cut(r["calculation"]["system"], SCOPE_WIDTH, 8),
        "strip_title": cut(r["calculation"]["title"], 57 * POINT, 8.5),
        "listing": listing(r["input_file"]["text"]),
        "fingerprint": fours(r["fingerprint"]),
        "input_fingerprint": fours(r["input_file"]["sha256"]),
    }


def _caption(sketch: Mapping[str, Any]) -> dict[str, str]:
    """What the figure shows, in words."""
    shown = {step.name for step in steps(sketch)}
    below = "datum and suction line as modelled, the numbers in circles follow the flow and are listed below"
    left = f"levels, {below}"
    if sketch["pump"]["arrangement"] == "wet_pit":
        left = "sump, level and pump as modelled; the triangle is the pump’s datum"
    elif not sketch["elements"]:
        left = "levels, datum and gauge"
    elif sketch["supply"]["point"]:
        left = f"the point where the pressure is known, {below}"
    cancel = " and ".join(head["name"] for head in sketch["heads"] if head["name"] not in shown)
    return {"left": left, "cancel": tables.capital(cancel)}


def _addresses(r: Mapping[str, Any]) -> frozenset[str]:
    found = (
        {line["address"] for line in r["inputs"]}
        | {a["address"] for a in r["assumptions"]}
        | {c["address"] for c in r["checks"]}
    )
    for part in r["computation"]:
        for block in part["blocks"]:
            if "line" in block:
                found.add(block["line"]["address"])
            elif "losses" in block:
                found |= {row["line"]["address"] for row in block["losses"]["rows"]} | {
                    block["losses"]["total"]["address"]
                }
    return frozenset(found)


def _factors(r: Mapping[str, Any]) -> dict[tuple[str, str], str]:
    return {(row["from"], row["to"]): f"C{i}" for i, row in enumerate(r["conversions"], 1)}


def _cover(r: Mapping[str, Any], shared: Context) -> dict[str, Any]:
    cover = r["cover"]
    governing = next((c for c in r["checks"] if c["address"] == cover["governing"]), None)
    shown = sorted(
        r["checks"], key=lambda c: (c["address"] != cover["governing"], RANK.index(c["verdict"]), _percent(c))
    )
    return {
        "glyph": glyphs.verdict(cover["verdict"], 14.0),
        "word": tables.capital(cover["verdict"]),
        "statement": text.together(cover["statement"]),
        "long": len(cover["statement"]) > LONG_STATEMENT,
        "many": len(shown) > MANY_RULES,
        "listed": 2 if len(shown) > MANY_RULES else 12,
        "route": _route(r),
        "tally": [(n, word) for word, n in cover["tally"].items() if n],
        "governs": tables.rule(governing, shared) if governing else None,
        "rules": [tables.rule(c, shared) for c in shown],
        "counts": [(cover["counts"][state], words) for state, words in COUNTED.items()],
        "findings": len(r["findings"]),
        "unverified": [
            {**u, "link": shared.link(u["address"]), "status": tables.STATUS_WORDS.get(u["status"], u["status"])}
            for u in cover["unverified"]
        ],
        "confirm": _confirmations(r, shared),
        "rounding": cover["rounding"],
        "owner": cut(r["calculation"]["owner"], 75 * POINT, 8.8),
        "project": cut(r["calculation"]["project"], 75 * POINT, 8.8),
        "title": cut(r["calculation"]["title"], 120 * POINT, 8.8),
    }


def _route(r: Mapping[str, Any]) -> str:
    start = "the point where pressure is known" if r["sketch"]["supply"]["point"] else "the surface"
    words = {"design": f"design, from {start}; not measured", "measured": "measured, from the gauge"}
    return words.get(r["route"], "design and measured, side by side")


def _percent(check: Mapping[str, Any]) -> Decimal:
    """The margin of a rule in per cent of its limit; rules without one come last."""
    margin = check["margin"]
    return Decimal(margin["percent"]) if margin and margin["percent"] else Decimal("Infinity")


def _confirmations(r: Mapping[str, Any], shared: Context) -> list[dict[str, Any]]:
    """Who has to confirm what: assumptions, and inputs that are not among the assumptions already."""
    asked = [(a["address"], a["text"], a["confirm"]) for a in r["assumptions"]]
    for line in r["inputs"]:
        p = line.get("provenance") or {}
        if p.get("status") != "assumed":
            asked.append((line["address"], line["title"], p.get("confirm", "")))
    return [{"link": shared.link(address), "what": what, "who": who} for address, what, who in asked if who]


def _part(part: Mapping[str, Any], shared: Context) -> dict[str, Any]:
    """A part of the computation as runs of lines under their groups, and loss tables between them."""
    runs: list[dict[str, Any]] = []
    for block in part["blocks"]:
        if "losses" in block:
            rows = runs[-1]["rows"] if runs and "rows" in runs[-1] else []
            group = rows.pop()["group"] if rows and "group" in rows[-1] else ""
            runs.append({"losses": {"group": group, **tables.losses(block["losses"], shared)}})
            continue
        if not runs or "rows" not in runs[-1]:
            runs.append({"rows": []})
        runs[-1]["rows"].append(
            {"group": block["group"]} if "group" in block else {"line": view(block["line"], shared)}
        )
    return {
        "title": text.together(part["title"]),
        "scope": text.together(part["scope"]),
        "short": cut(part["scope"], SCOPE_WIDTH, 8),
        "runs": runs,
    }


def _rounding(row: Mapping[str, Any], shared: Context) -> dict[str, Any]:
    return {
        "link": shared.link(row["address"]),
        "what": row["what"],
        "unit": text.unit(row["unit"]),
        **{k: text.number(row[k]) for k in ("record", "shadow", "drift", "limit")},
    }


def fours(digits: str) -> str:
    """A fingerprint in groups of four."""
    return " ".join(digits[i : i + 4] for i in range(0, len(digits), 4))


def listing(source: str) -> str:
    """The input file with line numbers; a line past the measure goes on in a row without a number, after an arrow."""
    lines = source.splitlines()
    digits, out = len(str(len(lines))), []
    for i, line in enumerate(lines, 1):
        body = line.lstrip(" ")
        indent = FIGURE_SPACE * (len(line) - len(body))
        first, *rest = _wrapped(body, LISTING_WIDTH - metrics.width(metrics.SANS_REGULAR, LISTING_SIZE, indent))
        out.append(f"{str(i).rjust(digits).replace(' ', FIGURE_SPACE)}  {FIGURE_SPACE}{indent}{first}")
        out += [f"{FIGURE_SPACE * digits}  → {indent}{piece}" for piece in rest]
    return "\n".join(out)


def _wrapped(body: str, room: float) -> list[str]:
    """Rows no wider than ``room``, broken after a space where there is one in the last third."""
    rows, row, pen = [], "", 0.0
    for character in body:
        advance = metrics.width(metrics.SANS_REGULAR, LISTING_SIZE, character)
        if pen + advance > max(room, 60.0):
            at = row.rfind(" ") + 1
            at = at if at > 2 * len(row) // 3 else len(row)
            rows.append(row[:at])
            row = row[at:]
            pen = metrics.width(metrics.SANS_REGULAR, LISTING_SIZE, row)
        row += character
        pen += advance
    return [*rows, row]


def cut(words: str, room: float, size: float) -> str:
    """``words`` shortened to ``room`` points."""
    return text.cut(words, lambda shorter: metrics.width(metrics.SANS_REGULAR, size, shorter) <= room)
