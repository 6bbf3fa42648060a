"""Inputs, loss tables and rule checks made ready for their tables.  Formats; computes nothing."""

from __future__ import annotations

from collections.abc import Mapping
from typing import Any

from markupsafe import Markup

from .. import formula
from . import glyphs, layout, metrics, text
from .lines import POINT, Context, picture, result, values
from .numerals import numeral
from .typeset import RELATIONS

STATUS_WORDS = {
    "verified": "verified",
    "maker": "maker’s, unconfirmed",
    "preliminary": "preliminary",
    "assumed": "assumed",
}
TOTAL_WIDTH, WORKED_WIDTH = 91.0, 118.0  # room for the formula of the total, and of the row worked in full (mm)
#: A row of this form stands in the table alone; any other is a line printed in full above it.
ROW_FORMULAS = ("n * K * h_V", "K * h_V")
_OPERATORS = {sign: operator for operator, sign in RELATIONS.items()}
VERDICTS = ("met", "not met", "not applicable", "not assessed")
POINT_EDGE = 8.0  # decimal points in the columns 'as given' and 'as used' of the inputs (mm)
GIVEN_WIDTH, USED_WIDTH = 24.5, 29.5  # room in these columns (mm)


def _width(words: str) -> float:
    return metrics.width(metrics.SANS_REGULAR, 8.8, words)


def _indent(value: str) -> float:
    whole = numeral(value.partition(".")[0].upper().partition("E")[0]).text("\u00a0")
    return max(0.0, POINT_EDGE * POINT - _width(whole))


def _aligned(value: str) -> str:
    return f"{_indent(value):.1f}pt"


def _joint(value: str, unit: str, room: float) -> Markup:
    """What stands between a number and its unit: a space, or a new row where the column is too narrow for both."""
    together = _indent(value) + text.number_width(value, metrics.SANS_REGULAR, 8.8) + _width(f" {unit}")
    return Markup("&nbsp;") if together <= room * POINT else Markup("<br>")


def _split(given: str) -> tuple[str, str]:
    first, _, rest = given.partition(" ")
    try:
        numeral(first)
    except ValueError:
        return "", given
    return first, rest


def input_row(line: Mapping[str, Any], context: Context) -> dict[str, Any]:
    """A given value or a constant: as given, as used and by which line, its source and status."""
    p, used = line.get("provenance") or {}, line["used"]
    number, words = _split(line["given"])
    unit, _, reference = words.partition(" ")
    shown = text.unit(used["unit"])
    status = p.get("status", "") if line["kind"] == "given" else "constant"
    return {
        "address": line["address"],
        "symbol": text.symbol(context.names[line["symbol"]]),
        "title": line["title"],
        "source": _origin(line),
        "number": text.number(number) if number else "",
        "unit": _joint(number, unit, GIVEN_WIDTH) + unit if number and unit else "",
        "words": reference if number else words,
        "indent": _aligned(number) if number else "0",
        "used": text.number(used["value"]),
        "used_unit": _joint(used["value"], shown, USED_WIDTH) + shown if shown else "",
        "used_indent": _aligned(used["value"]),
        "link": context.link(used["address"]) if used["address"] != line["address"] else "",
        "mark": glyphs.status(status) if status != "constant" else "",
        "status": STATUS_WORDS.get(status, status or "not stated"),
    }


def _origin(line: Mapping[str, Any]) -> str:
    """Source with its place, note, and who confirms, in one run of words."""
    p = line.get("provenance") or {}
    cited = f"[{p['source']}] {p['place']}".strip() if p.get("source") else ""
    first = line["source"] if line["kind"] == "constant" else cited or "no source"
    confirm = f"to be confirmed: {p['confirm']}" if p.get("confirm") else ""
    return "; ".join(x for x in (first, p.get("note", ""), line["note"], confirm) if x)


def losses(table: Mapping[str, Any], context: Context) -> dict[str, Any]:
    """A loss table: rows ``n K h_V`` from cited values, or the value of a line printed above; one row in full."""
    rows = [_loss_row(row, context) for row in table["rows"]]
    worked = next((row for row in table["rows"] if row["row"] == table["worked"]), None)
    return {
        "title": table["title"],
        "rows": rows,
        "total": _total(table["total"], context),
        "shares": _shares(table),
        "worked": _worked(worked, context) if worked else None,
    }


def _cells(line: Mapping[str, Any], context: Context) -> dict[str, Any]:
    shown = result(line)
    return {
        "loss": shown["head"],
        "record": shown["record"],
        "unit": shown["unit"],
        "link": context.link(line["address"]),
    }


def _loss_row(row: Mapping[str, Any], context: Context) -> dict[str, Any]:
    line = row["line"]
    operands = {o["symbol"]: (text.number(o["value"]), context.link(o["address"])) for o in line["operands"]}
    inside = line["formula"] in ROW_FORMULAS
    operands.setdefault("n", (Markup("1"), Markup("")))
    return {
        "row": row["row"],
        "element": row["element"],
        "inside": inside,
        "address": line["address"],
        "source": line["source"],
        "factors": [operands[s] for s in ("n", "K", "h_V")] if inside else [],
        **_cells(line, context),
    }


def _total(line: Mapping[str, Any], context: Context) -> dict[str, Any]:
    setting = layout.line(
        line["symbol"], formula.parse(line["formula"]), values(line), context.names, measure=TOTAL_WIDTH * POINT
    )
    return {
        "address": line["address"],
        "title": line["title"],
        "key": line["key_result"],
        "picture": picture(setting),
        "source": line["source"],
        **_cells(line, context),
    }


def _worked(row: Mapping[str, Any], context: Context) -> dict[str, Any]:
    line = row["line"]
    setting = layout.line(
        line["symbol"], formula.parse(line["formula"]), values(line), context.names, measure=WORKED_WIDTH * POINT
    )
    return {"row": row["row"], "picture": picture(setting), "value": text.quantity(line["value"], line["unit"])}


def _shares(table: Mapping[str, Any]) -> str:
    """One bar divided by the rows' losses: a drawing to scale, the numbers stand in the table."""
    total = float(table["total"]["value"])
    if total <= 0:
        return ""
    x, body = 0.0, ""
    for i, row in enumerate(table["rows"]):
        w = 112.0 * float(row["line"]["value"]) / total
        fill = glyphs.TINT if i % 2 else "none"
        body += f'<rect x="{x + 0.1:.3f}" y="0.1" width="{max(w, 0.01):.3f}" height="3.6" fill="{fill}" stroke-width="0.2"/>'
        if w > 1.9 * len(row["row"]) + 0.6:
            body += (
                f'<text x="{x + w / 2:.3f}" y="2.85" text-anchor="middle" font-family="{metrics.SANS}" font-size="2.7" '
                f'fill="{glyphs.INK}" stroke="none">{row["row"]}</text>'
            )
        x += w
    return glyphs.data_uri(glyphs.picture(112.3, 3.8, body))


def rule(r: Mapping[str, Any], context: Context) -> dict[str, Any]:
    """A check: both sides as reported and of record, margin, verdict and reason."""
    sides = [_side(r[s], context) for s in ("left", "right")] if r["left"] and r["right"] else []
    margin = r["margin"]
    inequality = ""
    if sides and r["formula"]:
        record = {r[s]["symbol"]: r[s]["value"] for s in ("left", "right")}
        asked = formula.parse(r["formula"])
        inequality = picture(
            layout.line(None, asked, record, context.names, measure=60 * POINT, found=_OPERATORS[r["found"]])
        )
    return {
        "address": r["address"],
        "title": r["title"],
        "verdict": r["verdict"],
        "glyph": glyphs.verdict(r["verdict"]),
        "word": capital(r["verdict"]),
        "about": r["about"],
        "reason": r["reason"],
        "criterion": r["criterion"],
        "source": r["source"],
        "sides": sides,
        "relation": r["found"],
        "inequality": inequality,
        "margin": signed(margin["headline"]["text"], margin["headline"]["unit"]) if margin else "",
        "margin_record": signed(margin["value"], margin["unit"]) if margin else "",
        "percent": signed(margin["percent"], "%") if margin and margin["percent"] else "",
        "bar": glyphs.margin_bar(margin["percent"]) if margin and margin["percent"] else "",
    }


def _side(side: Mapping[str, Any], context: Context) -> dict[str, Any]:
    return {
        "number": text.number(side["headline"]["text"], serif=True),
        "unit": text.unit(side["headline"]["unit"]),
        "name": side["name"],
        "link": context.link(side["address"]),
    }


def signed(value: str, unit: str) -> Any:
    """A number with its sign always shown."""
    return ("" if value.startswith("-") else "+") + text.quantity(value, unit)


def capital(words: str) -> str:
    """The first letter large."""
    return words[:1].upper() + words[1:]
