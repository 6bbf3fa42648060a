"""Where the properties of the liquid come from."""

from __future__ import annotations

from collections.abc import Iterator

from ...faults import Fault, listed, shown
from ...lookup import LIQUIDS
from ..branch import inherit
from ..inputs import Provenance
from ..meant import likely
from ..nodes import Mapping, Node, Scalar, Sequence
from ..schema import add, schema
from ..view import View

_PROPERTIES = ("density", "viscosity", "vapour_pressure")
_WATERS = ("vapour_pressure", True)
#: What a mixture states -> what mixture it is.
_SHARES = {"mass_fraction": "a glycol or a brine", "salinity": "sea water"}


def check(view: View) -> Iterator[Fault]:
    liquid = view.at("liquid")
    if isinstance(liquid, Mapping):
        for each in (_temperature, _table, _known, _mixture, _vapour_pressure):
            yield from each(view, liquid)


def _temperature(view: View, liquid: Mapping) -> Iterator[Fault]:
    node = liquid.get("temperature")
    if isinstance(node, Mapping) and not any(node.get(each) for each in ("average", "normal", "highest")):
        wanted = "`average`, `normal` or `highest`"
        yield view.fault(node, "liquid.temperature", wanted, "none of them", "add `highest`", "liquid")


def _table(view: View, liquid: Mapping) -> Iterator[Fault]:
    """The rows hold the same properties, one at least, and have an origin."""
    rows = list(view.items("liquid", "table"))
    first = [name for name in _PROPERTIES if rows and rows[0][1].get(name)]
    if rows and not first:
        wanted = f"{listed(f'`{name}`' for name in _PROPERTIES)} beside `temperature`"
        yield view.fault(rows[0][1], f"liquid.table[{rows[0][0]}]", wanted, "none of them", "", "table")
    for name, row in rows:
        held = [each for each in _PROPERTIES if row.get(each)]
        if held != first:
            wanted = f"the properties of the first row ({', '.join(first) or 'none'})"
            yield view.fault(row, f"liquid.table[{name}]", wanted, ", ".join(held) or "none", "", "table")
        elif held and not _cited(row, inherit(liquid, Provenance())):
            hint = "add `source:` to the row or to `liquid`, or `status: assumed` with a `note:`"
            yield view.fault(row, f"liquid.table[{name}]", "a table row with a source", "none", hint, "source")


def _cited(node: Node | None, above: Provenance) -> bool:
    origin = inherit(node, above) if node else None
    return origin is not None and bool(origin.source or origin.status == "assumed")


def _given(liquid: Mapping, name: str) -> bool:
    """Whether a property is given with an origin; that of a table is looked at row by row."""
    table = liquid.get("table")
    rows = table.items if isinstance(table, Sequence) else ()
    listed_there = any(isinstance(row, Mapping) and row.get(name) for row in rows)
    return listed_there or _cited(liquid.get(name), inherit(liquid, Provenance()))


def _known(view: View, liquid: Mapping) -> Iterator[Fault]:
    """The tool looks the liquid up, or is told what it does not know about it."""
    name = liquid.get("name")
    if not isinstance(name, Scalar) or not name.text:
        return
    known = LIQUIDS.get(name.text)
    # The vapour pressure of a mixture that is looked up follows from that of its water.
    looked_up = [
        each for each in _PROPERTIES if known and (known.offers(each) or (each, bool(known.mixture)) == _WATERS)
    ]
    *most, last = [each for each in _PROPERTIES if each not in looked_up and not _given(liquid, each)] or [""]
    if not last:
        return
    missing = f"{', '.join(most)} and {last}, each with a source" if most else f"{last} with a source"
    if known:
        wanted, hint = f"{missing}: it is not looked up for {name.text}", "add it, singly or in a `table`"
        yield view.fault(name, f"liquid.{last}", wanted, "none", hint, "liquid")
        return
    wanted = f"a liquid that is looked up, such as {listed(list(LIQUIDS)[:3])}, or {missing}"
    hint = likely(name.text, LIQUIDS) or "add them, singly or in a `table`"
    yield view.fault(name, "liquid.name", wanted, shown(name.text), hint, "liquid")


def _mixture(view: View, liquid: Mapping) -> Iterator[Fault]:
    """A mixture states its share, and nothing else does."""
    name = view.text("name", node=liquid)
    if not name:
        return
    known = LIQUIDS.get(name)
    mixture = known.mixture if known else ""
    for share, what in _SHARES.items():
        node = liquid.get(share)
        if share == mixture and not node:
            wanted = f"`{share}`, on which the properties of {name} depend"
            hint = add(schema()["$defs"]["liquid"], share)
            yield view.fault(liquid, f"liquid.{share}", wanted, "none", hint, "liquid")
        elif node and share != mixture:
            wanted = f"no `{share}`: it is for {what} that is looked up, not for {name}"
            yield view.fault(node, f"liquid.{share}", wanted, "one", "leave it out, or say it in the name", "liquid")
    key, of = "liquid.vapour_pressure_of", liquid.get("vapour_pressure_of")
    if of and not mixture:
        wanted = f"no `vapour_pressure_of`: it is for mixtures with water that are looked up, not for {name}"
        yield view.fault(of, key, wanted, "one", "leave it out", "liquid")
    elif of and _given(liquid, "vapour_pressure"):
        wanted = "either `vapour_pressure` or `vapour_pressure_of`"
        yield view.fault(of, key, wanted, "both", "leave one of the two out", "liquid")
    elif of and known and not known.raoult and view.text("vapour_pressure_of", node=liquid) == "raoult":
        wanted = f"water for {name}: Raoult's law holds for glycols, not for a salt that falls into ions"
        yield view.fault(of, key, wanted, "raoult", "write `water`", "liquid")


def _vapour_pressure(view: View, liquid: Mapping) -> Iterator[Fault]:
    kind = liquid.get("vapour_pressure_kind")
    if kind and view.text("vapour_pressure_kind", node=liquid) == "effective" and not _given(liquid, "vapour_pressure"):
        wanted = "`vapour_pressure` with a source beside `effective`: dissolved gas is not looked up"
        hint = add(schema()["$defs"]["liquid"], "vapour_pressure")
        yield view.fault(kind, "liquid.vapour_pressure", wanted, "none", hint, "liquid")
