"""The schema as the one list of keys: what may stand where, and of what kind each value is.

The kind of quantity a key takes is the name of the ``$defs`` entry it refers to.
"""

from __future__ import annotations

import json
from collections.abc import Iterator
from functools import cache
from typing import Any

from ..faults import Fault
from ..quantity import KINDS, Quantity, QuantityFault, parse
from ..resources import find_resource
from .nodes import Mapping, Mark, Node, Scalar, Sequence, below, label

#: The keys of an origin, which stand in nearly every mapping and are left out where messages list keys.
PROVENANCE = ("source", "status", "note", "confirm")
Schema = dict[str, Any]
#: What a case may say in the place of a value: the extreme it takes.
EXTREMES = ("lowest", "normal", "highest")


@cache
def schema() -> Schema:
    """The shipped schema."""
    loaded: Schema = json.loads(find_resource("schemas", "input.schema.json").read_text("utf-8"))
    return loaded


def definition(part: Schema) -> tuple[Schema, str]:
    """What a part of the schema refers to, and the name of that definition, empty where there is none."""
    if "$ref" not in part:
        return part, ""
    name = part["$ref"].rpartition("/")[2]
    return schema()["$defs"][name], name


def below_key(part: Schema, name: str) -> tuple[Schema, str] | None:
    """The definition of a key's value, or ``None`` for a key the mapping does not have."""
    found = part.get("properties", {}).get(name) or part.get("additionalProperties")
    return definition(found) if isinstance(found, dict) else None


def parts(root: Mapping) -> Iterator[tuple[str, Node, Schema, str]]:
    """``(address, node, its part of the schema, name of the definition)`` of every node the schema knows."""
    return _parts(root, schema(), "", "")


def _parts(node: Node, part: Schema, name: str, key: str) -> Iterator[tuple[str, Node, Schema, str]]:
    yield key, node, part, name
    if isinstance(node, Mapping):
        for each, value in node.entries:
            found = below_key(part, each.text)
            if found is not None:
                yield from _parts(value, *found, below(key, each.text))
    elif isinstance(node, Sequence) and "items" in part:
        for index, item in enumerate(node.items):
            yield from _parts(item, *definition(part["items"]), f"{key}[{label(item, index)}]")


def own_kind(node: Node, part: Schema) -> str:
    """The text under ``kind`` of a mapping whose keys depend on it, else an empty text."""
    own = node.get("kind") if isinstance(node, Mapping) and "allOf" in part else None
    return own.text if isinstance(own, Scalar) else ""


def allowed(node: Node, part: Schema) -> list[str]:
    """The keys that may stand in a mapping, narrowed by its own ``kind``."""
    names = list(part.get("properties", {}))
    kind = own_kind(node, part)
    for branch in part.get("allOf", []):
        if branch["if"]["properties"]["kind"]["const"] == kind:
            return [name for name in names if name in branch["then"]["propertyNames"]["enum"]]
    return names


def example(part: Schema) -> str:
    """A value that could stand there, as it would be typed; empty where a whole block is needed."""
    found = {**definition(part)[0], **part}
    choices = found.get("examples", found.get("enum", []))
    if choices:
        return str(choices[0])
    required = found.get("required", [])
    if 0 < len(required) <= 2:
        inner = [f"{name}: {example(found['properties'][name])}" for name in required]
        return f"{{{', '.join(inner)}}}"
    return ""


def add(part: Schema, name: str) -> str:
    """``add `bore: 202.7 mm` with the right value``: how a key of ``part`` that is missing would be typed."""
    sample = example(part["properties"][name])
    return f"add `{name}: {sample}` with the right value" if sample else f"add `{name}:`"


def quantities(root: Mapping, file: str) -> tuple[dict[Mark, Quantity], list[Fault]]:
    """Every quantity of the file by the mark of its text, and the faults of those that cannot be read."""
    read: dict[Mark, Quantity] = {}
    faults: list[Fault] = []
    for key, node, _, kind in parts(root):
        text = node.get("value") if isinstance(node, Mapping) else node
        if kind not in KINDS or not isinstance(text, Scalar) or (text.plain and not text.text):
            continue
        if key.startswith("cases[") and text.text in EXTREMES:
            continue
        try:
            read[text.mark] = parse(text.text, kind)
        except QuantityFault as bad:
            faults.append(Fault(file, *text.mark, key, bad.wanted, bad.found, bad.suggestion, bad.kind))
    return read, faults
