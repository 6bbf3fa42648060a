"""Cases: each differs from the most unfavourable state in something that the plant has."""

from __future__ import annotations

from collections.abc import Iterator

from ...faults import Fault, listed
from ..nodes import Mapping, below
from ..schema import EXTREMES
from ..view import View
from .supply import wet_pit

#: Key of a case -> where the file holds the extremes of that quantity.
_OF = {
    "flow": ("pump", "flow"), "level": ("supply", "level"), "temperature": ("liquid", "temperature"),
    "pressure": ("supply", "pressure"),
}  # fmt: skip


def check(view: View) -> Iterator[Fault]:
    served = [int(n) for _, s in view.sections() if (n := view.text("pumps", node=s)).isdecimal() and len(n) < 3]
    cases = [(f"cases[{name}]", case) for name, case in view.items("cases")]
    for address, case in cases:
        if not view.at("line") and not wet_pit(view):
            wanted = "no cases without a line: a reading is judged at its own state"
            yield view.fault(case, address, wanted, "one", "leave `cases` out, or describe the `line`", "case")
            return
        if not any(case.get(name) for name in (*_OF, "running", "strainers")):
            wanted = (
                f"something that differs from the most unfavourable state ({listed([*_OF, 'running', 'strainers'])})"
            )
            yield view.fault(case, address, wanted, "nothing", "add it, or leave the case out", "case")
        yield from _extremes(view, address, case)
        running, most = view.text("running", node=case), max(served, default=1)
        node = case.get("running")
        if node and running.isdecimal() and int(running) > most and view.at("line"):
            yield view.fault(
                node, below(address, "running"), f"at most {most}, the pumps that the line serves", running, "", "case"
            )
        strainers = case.get("strainers")
        if strainers and not any(view.text("kind", node=e) == "strainer" for _, e in view.elements()):
            wanted = "no `strainers`: the line has none"
            yield view.fault(strainers, below(address, "strainers"), wanted, "one", "leave it out", "case")


def _extremes(view: View, address: str, case: Mapping) -> Iterator[Fault]:
    """What a case takes by its extreme stands in the file, and what it changes is there."""
    for name, place in _OF.items():
        node = case.get(name)
        word = view.text(name, "value", node=case) if isinstance(node, Mapping) else view.text(name, node=case)
        held = view.at(*place)
        if not node:
            continue
        if not isinstance(held, Mapping):
            wanted = f"no `{name}`: `{'.'.join(place)}` is not in the file, so nothing can differ from it"
            yield view.fault(node, below(address, name), wanted, "one", "leave it out", "case")
        elif word in EXTREMES and not held.get(word):
            there = [each for each in EXTREMES if held.get(each)]
            wanted = f"an extreme of `{'.'.join(place)}` that the file gives ({listed(there)}), or a value"
            yield view.fault(node, below(address, name), wanted, word, f"add `{word}` there", "case")
