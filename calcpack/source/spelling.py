"""Keys that are not in the schema: reported once, and read as the key they are nearest to.

Reading on under the corrected key keeps one slip from being two faults (``flwo`` unknown, ``flow`` missing).
"""

from __future__ import annotations

from ..faults import Fault, listed, nearest, shown
from .meant import NOT_THAT
from .nodes import Mapping, Node, Scalar, Sequence, below, label
from .schema import PROVENANCE, Schema, allowed, below_key, definition, own_kind, schema

#: More faults than this are counted, not shown, and no longer guessed at.
MAX_FAULTS = 100


def correct(root: Mapping, file: str) -> tuple[Mapping, list[Fault]]:
    """The tree with every unknown key corrected or left out, and a fault for each of them."""
    faults: list[Fault] = []
    corrected = _correct(root, schema(), "", file, faults)
    assert isinstance(corrected, Mapping)
    return corrected, faults


def _correct(node: Node, part: Schema, key: str, file: str, faults: list[Fault]) -> Node:
    if isinstance(node, Sequence) and "items" in part:
        inner = definition(part["items"])[0]
        items = (_correct(item, inner, f"{key}[{label(item, n)}]", file, faults) for n, item in enumerate(node.items))
        return Sequence(node.mark, tuple(items), node.oddity)
    if not isinstance(node, Mapping) or "properties" not in part and "additionalProperties" not in part:
        return node
    entries = []
    known = frozenset(allowed(node, part))
    for name, value in node.entries:
        if name.text == "<<":
            continue  # reported as notation
        if "properties" in part and name.text not in known:
            meant = _meant(name.text, node, part) if len(faults) < MAX_FAULTS else ""
            faults.append(_fault(name, meant, node, part, key, file))
            if not meant:
                continue
            name = Scalar(name.mark, meant, name.plain, name.oddity)
        found = below_key(part, name.text)
        entries.append((name, _correct(value, found[0], below(key, name.text), file, faults) if found else value))
    return Mapping(node.mark, tuple(entries), node.oddity)


def _meant(name: str, node: Mapping, part: Schema) -> str:
    """The key that was probably meant: one that is missing before one that is merely absent."""
    free = [each for each in allowed(node, part) if node.get(each) is None]
    if name.casefold() in NOT_THAT and "vapour_pressure" in free:
        return "vapour_pressure"
    return nearest(name, [each for each in free if each in part.get("required", [])]) or nearest(name, free)


def _fault(name: Scalar, meant: str, node: Mapping, part: Schema, key: str, file: str) -> Fault:
    kind = own_kind(node, part)
    scope = f" for kind {kind}" if kind else ""
    plain = [each for each in allowed(node, part) if each not in PROVENANCE]
    wanted = f"the key `{meant}`" if meant else f"one of the keys {listed(plain)}{scope}"
    why = NOT_THAT.get(name.text.casefold(), "")
    found = f"{shown(name.text)}{f': {why}' if why else ', which is no key here'}"
    hint = f"write `{meant}`" if meant else f"leave it out{scope}" if name.text in part.get("properties", {}) else ""
    return Fault(file, *name.mark, below(key, name.text), wanted, found, hint, "unknown key")
