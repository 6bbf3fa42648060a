"""The tree of a YAML file: every scalar as text, every node with the line and column where it stands."""

from __future__ import annotations

from collections.abc import Iterator
from dataclasses import dataclass

#: Line and column, from 1.
Mark = tuple[int, int]


@dataclass(frozen=True)
class Scalar:
    """A value or a key; ``plain`` when it stands without quotation marks.

    ``text`` has single spaces and no hidden characters (:func:`.characters.normal`); ``typed`` is for faults alone.
    """

    mark: Mark
    text: str
    plain: bool = True
    oddity: str = ""
    typed: str = ""


@dataclass(frozen=True)
class Sequence:
    """A list."""

    mark: Mark
    items: tuple[Node, ...]
    oddity: str = ""


@dataclass(frozen=True)
class Mapping:
    """Keys and values in the order of the file; a key may stand twice, which is a fault found later."""

    mark: Mark
    entries: tuple[tuple[Scalar, Node], ...]
    oddity: str = ""

    def get(self, key: str) -> Node | None:
        """The first value under ``key``."""
        return next((value for name, value in self.entries if name.text == key), None)


Node = Scalar | Sequence | Mapping


def below(key: str, name: str) -> str:
    """The printed address of ``name`` inside ``key``: ``liquid.temperature``."""
    return f"{key}.{name}" if key else name


def label(item: Node, index: int) -> str:
    """How a list's item is named in an address: by its id where it has one, else by its number from 1."""
    own = item.get("id") if isinstance(item, Mapping) else None
    return own.text if isinstance(own, Scalar) and own.text else str(index + 1)


def children(node: Node, key: str) -> Iterator[tuple[str, str, Node]]:
    """``(address, name in the parent or "", node)`` of each child."""
    if isinstance(node, Mapping):
        for name, value in node.entries:
            yield below(key, name.text), name.text, value
    elif isinstance(node, Sequence):
        for index, item in enumerate(node.items):
            yield f"{key}[{label(item, index)}]", "", item


def walk(node: Node, key: str = "") -> Iterator[tuple[str, Node]]:
    """Every node with its address, parents before children."""
    yield key, node
    for address, _, child in children(node, key):
        yield from walk(child, address)
