"""Origins, ids, dates and revisions."""

from __future__ import annotations

from collections.abc import Iterator
from datetime import date

from ...faults import Fault, listed, nearest, shown
from ..branch import inherit
from ..inputs import Provenance
from ..nodes import Mapping, Node, Scalar, Sequence, below, children
from ..view import View


def check(view: View) -> Iterator[Fault]:
    """Every fault of the document's own order."""
    for each in (_origins, _unique, _dates, _revisions):
        yield from each(view)


def _origins(view: View) -> Iterator[Fault]:
    """Every cited source is listed, and every assumption says on what it rests."""
    listing = view.at("sources")
    known = [name.text for name, _ in listing.entries] if isinstance(listing, Mapping) else []

    def visit(node: Node, key: str, above: Provenance) -> Iterator[Fault]:
        origin = inherit(node, above)
        if isinstance(node, Mapping):
            cited, status = node.get("source"), node.get("status")
            if isinstance(cited, Scalar) and cited.text and origin.source not in known:
                near = nearest(origin.source, known)
                hint = (
                    f"did you mean `{near}`?"
                    if near
                    else "add the document to `sources`, and cite its id and the place in it"
                )
                wanted = (
                    f"the id of a source ({listed(known)})" if known else "the id of a source listed under `sources`"
                )
                yield view.fault(cited, below(key, "source"), wanted, shown(cited.text), hint, "source")
            if isinstance(status, Scalar) and status.text == "assumed" and not origin.note:
                wanted = "a note that gives the basis of the assumption"
                yield view.fault(status, below(key, "status"), wanted, "none", "add `note:`", "assumption")
        for address, _, child in children(node, key):
            yield from visit(child, address, origin)

    for address, name, child in children(view.root, ""):
        if name not in ("calculation", "revisions", "sources"):
            yield from visit(child, address, Provenance())


def _unique(view: View) -> Iterator[Fault]:
    groups = [("id", list(view.sections()))]
    groups += [
        ("id", [(f"{address}.elements[{name}]", item) for name, item in view.items("elements", node=section)])
        for address, section in view.sections()
    ]
    groups += [
        ("name", list(view.readings())),
        ("name", [(f"cases[{name}]", case) for name, case in view.items("cases")]),
        ("revision", [(f"revisions[{n}]", r) for n, r in view.items("revisions")]),
    ]
    marks = [(name, [(below(address, name), item.get(name)) for address, item in items]) for name, items in groups]
    listing = view.at("sources")
    entries = listing.entries if isinstance(listing, Mapping) else ()
    marks.append(("id", [(below("sources", name.text), name) for name, _ in entries]))
    for name, each in marks:
        first: dict[str, int] = {}
        for address, own in each:
            if not isinstance(own, Scalar):
                continue
            if own.text.casefold() in first:
                wanted = f"each {name} once, whether in capitals or not"
                found = f"{shown(own.text)} again, after line {first[own.text.casefold()]}"
                yield view.fault(own, address, wanted, found, "", "duplicate id")
            first.setdefault(own.text.casefold(), own.mark[0])


def _day(node: Node | None) -> date | None:
    try:
        return date.fromisoformat(node.text) if isinstance(node, Scalar) and len(node.text) == 10 else None
    except ValueError:
        return None


#: Nothing calculated here was issued or measured before; an earlier date is a slip.
_EARLIEST = date(1950, 1, 1)


def _dates(view: View) -> Iterator[Fault]:
    """Every date is a day of the calendar, not long past; no test is later than the calculation that uses it."""
    places = [("calculation", view.at("calculation"))]
    places += [(f"revisions[{name}]", item) for name, item in view.items("revisions")]
    places += list(view.readings())
    issued = _day(view.at("calculation", "date"))
    for address, item in places:
        node = item.get("date") if isinstance(item, Mapping) else None
        day = _day(node)
        if isinstance(node, Scalar) and day is None and len(node.text) == 10 and node.text.replace("-", "").isdigit():
            yield view.fault(node, below(address, "date"), "a day of the calendar", shown(node.text), "", "date")
        elif node and day and day < _EARLIEST:
            wanted = f"a day not before {_EARLIEST}"
            yield view.fault(node, below(address, "date"), wanted, shown(str(day)), "check the year", "date")
        elif node and day and issued and day > issued and address.startswith("readings"):
            wanted = f"a day not later than the calculation's date, {issued}"
            yield view.fault(node, below(address, "date"), wanted, shown(str(day)), "", "date")


def _revisions(view: View) -> Iterator[Fault]:
    current, listing = view.at("calculation", "revision"), view.at("revisions")
    entries = {view.text("revision", node=item): (name, item) for name, item in view.items("revisions")}
    if not isinstance(current, Scalar) or not isinstance(listing, Sequence):
        return
    if current.text not in entries:
        wanted = f"an entry for the current revision, {shown(current.text)}"
        yield view.fault(listing, "revisions", wanted, listed(map(shown, entries)) or "none", "add it", "revision")
        return
    name, item = entries[current.text]
    entry, issued = _day(item.get("date")), _day(view.at("calculation", "date"))
    if entry and issued and entry != issued:
        wanted = f"the date of the calculation, {issued}, for its current revision"
        yield view.fault(item.get("date") or item, f"revisions[{name}].date", wanted, shown(str(entry)), "", "date")
