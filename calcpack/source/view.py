"""The tree as the checks look at it."""

from __future__ import annotations

from collections.abc import Iterator
from dataclasses import dataclass

from ..faults import Fault
from ..quantity import Quantity
from .nodes import Mapping, Mark, Node, Scalar, Sequence, label


@dataclass(frozen=True)
class View:
    """The tree with what was read from it; ``at`` may find nothing, since faults may stand anywhere."""

    root: Mapping
    read: dict[Mark, Quantity]
    file: str

    def at(self, *names: str, node: Node | None = None) -> Node | None:
        found: Node | None = node or self.root
        for name in names:
            found = found.get(name) if isinstance(found, Mapping) else None
        return found

    def text(self, *names: str, node: Node | None = None) -> str:
        found = self.at(*names, node=node)
        return found.text if isinstance(found, Scalar) else ""

    def items(self, *names: str, node: Node | None = None) -> Iterator[tuple[str, Mapping]]:
        """``(label, item)`` of a list of mappings."""
        found = self.at(*names, node=node)
        for index, item in enumerate(found.items if isinstance(found, Sequence) else ()):
            if isinstance(item, Mapping):
                yield label(item, index), item

    def quantity(self, *names: str, node: Node | None = None) -> Quantity | None:
        found = self.at(*names, node=node)
        value = found.get("value") if isinstance(found, Mapping) else found
        return self.read.get(value.mark) if isinstance(value, Scalar) else None

    def sections(self) -> Iterator[tuple[str, Mapping]]:
        for name, section in self.items("line", "sections"):
            yield f"line.sections[{name}]", section

    def elements(self) -> Iterator[tuple[str, Mapping]]:
        for address, section in self.sections():
            for name, element in self.items("elements", node=section):
                yield f"{address}.elements[{name}]", element

    def readings(self) -> Iterator[tuple[str, Mapping]]:
        for name, reading in self.items("readings"):
            yield f"readings[{name}]", reading

    def fault(self, node: Node, key: str, wanted: str, found: str, suggestion: str = "", kind: str = "check") -> Fault:
        return Fault(self.file, *node.mark, key, wanted, found, suggestion, kind)
