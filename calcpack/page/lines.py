"""A line of the record made ready for its row: formula picture, operands, headline and digits of record.

Formats and measures; computes nothing.
"""

from __future__ import annotations

import re
from collections.abc import Mapping
from dataclasses import dataclass
from typing import Any

from markupsafe import Markup

from .. import formula
from . import boxes, layout, metrics, text
from .glyphs import data_uri
from .layout import Setting
from .metrics import REGULAR, SANS_REGULAR, SEMIBOLD
from .numerals import SANS_GAP, numeral
from .typeset import SIZE, Display, Setter

POINT = 72 / 25.4  # points in a millimetre
RESULT_WIDTH, RESULT_EDGE = 27.0, 9.4  # result column, and where its decimal points stand (mm)
VALUE_ROOM = 19.4  # operand's value and unit beside its address (mm)
SYMBOL_ROOM, SYMBOL_GAP = 6.6, 0.9
HEADLINE, RECORD, OPERAND, SYMBOL = 10.5, 7.8, 7.8, 8.5
_FUNCTION = re.compile(r"(\w+)\((\w+(?:, ?\w+)*)\)")
_ROOT_LABELS = ("f − ½ unit", "root f", "f + ½ unit")


@dataclass(frozen=True)
class Context:
    """What the lines of one record share: symbols, addresses that exist, and the list of conversions."""

    names: Mapping[str, Display]
    addresses: frozenset[str]
    factors: Mapping[tuple[str, str], str]

    def link(self, address: str) -> Markup:
        """An address, linked to the line that bears it."""
        if address not in self.addresses:
            return Markup.escape(address)
        return Markup('<a href="#L{}">{}</a>').format(address, address)


def picture(setting: Setting) -> Markup:
    """A typeset formula as an image with its linear form."""
    return Markup('<img class="f" src="{}" alt="{}">').format(data_uri(setting.svg), setting.alt)


def values(line: Mapping[str, Any]) -> layout.Values:
    """Symbol -> printed number, or the list of numbers where one symbol stands for several operands."""
    found: dict[str, Any] = {}
    for operand in line["operands"]:
        name, value = operand["symbol"], operand["value"]
        found[name] = value if name not in found else [*_listed(found[name]), value]
    return found


def _listed(x: Any) -> list[str]:
    return x if isinstance(x, list) else [x]


def formula_picture(line: Mapping[str, Any], names: Mapping[str, Display]) -> Setting | None:
    """The formula of a line, or None where it has none."""
    if line["kind"] == "lookup":
        return _function(line, names)
    if not line["formula"]:
        return None
    tree = formula.parse(line["formula"])
    symbol = None if isinstance(tree, formula.Cmp) else line["symbol"]
    return layout.line(symbol, tree, values(line), names, symbolic=line["kind"] != "conversion")


def _function(line: Mapping[str, Any], names: Mapping[str, Display]) -> Setting | None:
    matched, setter = _FUNCTION.fullmatch(line["function"]), Setter(names)
    if not matched:
        return _entry(line, setter)
    name, _, sub = matched[1].partition("_")
    base = names[name].base if name in names else name
    head = Setter({"": Display(base, sub or (names[name].sub if name in names else ""), len(base) > 2)}).symbol("")
    parts = [setter.symbol(line["symbol"]), setter.relation("=="), head, boxes.text("(", REGULAR, SIZE)]
    for i, argument in enumerate(re.split(", ?", matched[2])):
        parts += [boxes.text(",", REGULAR, SIZE), boxes.gap(0.25 * SIZE)] if i else []
        parts.append(setter.symbol(argument))
    return layout.picture([*parts, boxes.text(")", REGULAR, SIZE)], f"{line['symbol']} = {line['function']}")


def _entry(line: Mapping[str, Any], setter: Setter) -> Setting:
    """A number that stands in a table: symbol = value; its unit stands in the result column."""
    parts = [setter.symbol(line["symbol"]), setter.relation("=="), setter.tree(formula.Num(line["value"]))]
    return layout.picture(parts, f"{line['symbol']} = {line['value']}")


def operands(line: Mapping[str, Any], context: Context) -> dict[str, Markup]:
    """The column 'rests on' as three blocks side by side: symbols, values with units, addresses; row by row.

    A value stands further right after a wide symbol; a unit that does not fit beside its number takes a row of its own.
    """
    symbols, numbers, links = Markup(""), Markup(""), Markup("")
    for o in line["operands"]:
        shown, value, unit = context.names[o["symbol"]], o["value"], text.unit(o["unit"])
        further = max(0.0, text.symbol_width(shown, SYMBOL) / POINT + SYMBOL_GAP - SYMBOL_ROOM)
        needed = text.number_width(value, SANS_REGULAR, OPERAND) + metrics.width(SANS_REGULAR, OPERAND, " " + unit)
        below = bool(unit) and needed / POINT > VALUE_ROOM - further
        end = Markup("<br><br>") if below else Markup("<br>")
        symbols += text.symbol(shown) + end
        links += context.link(o["address"]) + end
        printed = text.number(value) + ("" if below or not unit else SANS_GAP + unit)
        numbers += (
            Markup('<span style="margin-left:{:.1f}mm">{}</span>').format(further, printed) if further else printed
        )
        numbers += (Markup("<br>") + unit if below else "") + Markup("<br>")
    return {"symbols": symbols, "numbers": numbers, "links": links}


def _indent(value: str, face: metrics.Face, size: float) -> float:
    whole = numeral(value.partition(".")[0].upper().partition("E")[0])
    gap = "\u2006" if face.family == metrics.SERIF else "\u00a0"
    return max(0.0, RESULT_EDGE * POINT - metrics.width(face, size, whole.text(gap)))


def result(line: Mapping[str, Any]) -> dict[str, Any]:
    """Headline and digits of record, their points in line; a unit that does not fit takes a row of its own."""
    head, value, record_unit = line["headline"], line["value"], text.unit(line["unit"])
    name = text.unit(head["unit"])
    head_indent, record_indent = _indent(head["text"], SEMIBOLD, HEADLINE), _indent(value, SANS_REGULAR, RECORD)
    head_end = (
        head_indent + text.number_width(head["text"], SEMIBOLD, HEADLINE) + metrics.width(SANS_REGULAR, 8, " " + name)
    )
    differs = record_unit if record_unit != name else ""
    record_end = (
        record_indent
        + text.number_width(value, SANS_REGULAR, RECORD)
        + metrics.width(SANS_REGULAR, RECORD, " " + differs)
    )
    return {
        "head": text.number(head["text"], serif=True),
        "unit": name,
        "indent": f"{head_indent:.1f}pt",
        "below": head_end > RESULT_WIDTH * POINT,
        "record": text.number(value),
        "record_unit": differs,
        "record_indent": f"{record_indent:.1f}pt",
        "record_below": record_end > RESULT_WIDTH * POINT,
        "key": line["key_result"],
    }


def sources(line: Mapping[str, Any], context: Context) -> list[Markup]:
    """What the line rests on besides its operands, one paragraph each."""
    rows: list[Markup] = []
    if line["kind"] == "conversion":
        row = context.factors.get((line["from"], line["to"]), "")
        factor = text.linear(line["factor"])
        rows.append(
            Markup("{} exact{}").format(factor, Markup(', <a href="#{}">{}</a>').format(row, row) if row else "")
        )
    if line["kind"] == "lookup":
        rows.append(Markup.escape(line["library"]))
    return [r for r in (*rows, Markup.escape(line["source"]), noted(line["note"], context)) if r]


def noted(words: str, context: Context) -> Markup:
    """A note with its symbols, ``h_V``, written as such, in the face of the note: the serif is for operands."""
    written = {f"{s.base}_{s.sub}": s for s in context.names.values()} | dict(context.names)
    out = Markup("")
    for part in re.split(r"(\w+_\w+)", words):
        shown = written.get(part)
        out += Markup("{}<sub>{}</sub>").format(shown.base, shown.sub) if shown and "_" in part else part
    return out


def residuals(line: Mapping[str, Any]) -> list[dict[str, Any]]:
    """The three rows of a root; the middle one is the root as printed."""
    rows = zip(_ROOT_LABELS, line.get("residuals", []), strict=False)
    return [
        {
            "label": label,
            "value": text.number(value),
            "sign": "" if residual.startswith("-") else "+",
            "residual": text.number(residual),
            "root": label == _ROOT_LABELS[1],
        }
        for label, (value, residual) in rows
    ]


def view(line: Mapping[str, Any], context: Context) -> dict[str, Any]:
    """Everything the template prints of a computed line."""
    setting = formula_picture(line, context.names)
    return {
        "address": line["address"],
        "kind": line["kind"],
        "title": line["title"],
        "picture": picture(setting) if setting else "",
        "place": line["function"] if line["kind"] == "lookup" and not line["operands"] else "",
        "rests": operands(line, context) if line["operands"] else None,
        "sources": Markup("<br>").join(sources(line, context)),
        "result": result(line),
        "residuals": residuals(line),
    }
