"""A mapping of the file with its address and its origin, as the records are built from it."""

from __future__ import annotations

from collections.abc import Callable, Iterator
from dataclasses import dataclass
from datetime import date
from typing import Any, TypeVar

from ..quantity import Quantity
from .inputs import Extremes, Given, Provenance
from .nodes import Mapping, Mark, Node, Scalar, Sequence, below, label

T = TypeVar("T")


def inherit(node: Node, above: Provenance) -> Provenance:
    """The origin of ``node``: what it states itself, else what the mapping above it states.

    A source of its own is not held to the status of another, and an assumed value does not inherit a source.
    """
    own = {name: _text(node, name) for name in ("source", "status", "note", "confirm")}
    source, _, place = own["source"].partition(" ")
    status = own["status"] or ("" if source else above.status)
    if not source and own["status"] != "assumed":
        source, place = above.source, above.place
    note, confirm = own["note"] or above.note, own["confirm"] or above.confirm
    return Provenance(source=source, place=place, status=status, note=note, confirm=confirm)


def _text(node: Node, name: str) -> str:
    found = node.get(name) if isinstance(node, Mapping) else None
    return found.text if isinstance(found, Scalar) else ""


@dataclass(frozen=True)
class Branch:
    """A mapping of the file with its address and its origin; its methods rely on a tree without faults."""

    node: Mapping
    key: str
    provenance: Provenance
    read: dict[Mark, Quantity]

    def text(self, name: str, absent: str = "") -> str:
        return _text(self.node, name) or absent

    def word(self, name: str) -> str:
        """The text of a value, whether it stands alone or in a mapping with its origin."""
        node = self.node.get(name)
        return _text(node, "value") if isinstance(node, Mapping) else self.text(name)

    def number(self, name: str, absent: int) -> int:
        return int(self.text(name, str(absent)))

    def day(self, name: str) -> date:
        return date.fromisoformat(self.text(name))

    def given(self, name: str) -> Given | None:
        node = self.node.get(name)
        if node is None:
            return None
        scalar = node.get("value") if isinstance(node, Mapping) else node
        assert isinstance(scalar, Scalar)
        origin = inherit(node, self.provenance)
        return Given(
            key=below(self.key, name),
            text=scalar.text,
            quantity=self.read[scalar.mark],
            line=scalar.mark[0],
            column=scalar.mark[1],
            **vars(origin),
        )

    def must(self, name: str) -> Given:
        found = self.given(name)
        assert found is not None
        return found

    def branch(self, name: str) -> Branch:
        node = self.node.get(name)
        assert isinstance(node, Mapping)
        return Branch(node, below(self.key, name), inherit(node, self.provenance), self.read)

    def maybe(self, name: str, make: Callable[[Branch], T]) -> T | None:
        return make(self.branch(name)) if self.node.get(name) else None

    def each(self, name: str) -> Iterator[Branch]:
        node = self.node.get(name)
        if isinstance(node, Sequence):
            for index, item in enumerate(node.items):
                assert isinstance(item, Mapping)
                address = f"{below(self.key, name)}[{label(item, index)}]"
                yield Branch(item, address, inherit(item, self.provenance), self.read)

    def extremes(self) -> Extremes:
        return Extremes(
            lowest=self.given("lowest"),
            normal=self.given("normal"),
            highest=self.given("highest"),
            average=self.given("average"),
        )

    @property
    def place(self) -> dict[str, Any]:
        line, column = self.node.mark
        return {"key": self.key, "line": line, "column": column}

    @property
    def origin(self) -> dict[str, Any]:
        return {"provenance": self.provenance, **self.place}
