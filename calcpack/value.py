"""What the ledger holds: values with their addresses, and the lines, tables and parts they are printed in."""

from __future__ import annotations

import hashlib
from dataclasses import dataclass, field
from decimal import Decimal
from fractions import Fraction
from typing import TYPE_CHECKING, Literal

from . import formula
from .formula import Node
from .number import decimal
from .references import DEFINITION, Cite
from .units import Unit

if TYPE_CHECKING:
    from .source.inputs import Provenance

Kind = Literal["given", "constant", "conversion", "equation", "lookup", "root"]


@dataclass(frozen=True)
class Value:
    """A number with its address: ``record`` in ``unit``, ``shadow`` in SI."""

    address: str
    symbol: str
    record: Decimal
    shadow: float
    unit: Unit
    title: str


@dataclass(frozen=True)
class Line:
    """One printed line; see ``record`` for how it is written down."""

    kind: Kind
    value: Value
    tree: Node | None = None
    operands: tuple[tuple[str, Value], ...] = ()
    cite: Cite = DEFINITION
    validity: str = ""
    given: str = ""
    key: str = ""
    file_line: int = 0
    provenance: Provenance | None = None
    function: str = ""
    library: str = ""
    residuals: tuple[tuple[Decimal, Decimal], ...] = ()
    key_result: bool = False

    @property
    def fingerprint(self) -> str:
        """Changes when the formula, an operand or the result changes; not when the line moves."""
        parts = [
            self.kind,
            formula.text(self.tree) if self.tree else self.given or self.function,
            str(self.value.record),
            self.value.unit.name,
        ]
        parts += [f"{name}={v.record} {v.unit.name}" for name, v in self.operands]
        return hashlib.sha256("\n".join(parts).encode()).hexdigest()[:12]


@dataclass(frozen=True)
class Row:
    """A row of a loss table: its label, the element's words, and the line that holds its loss."""

    label: str
    element: str
    line: Line


@dataclass(frozen=True)
class Losses:
    """A loss table with its total and the row worked in full."""

    title: str
    rows: tuple[Row, ...]
    total: Line
    worked: str


Block = str | Line | Losses


@dataclass
class Part:
    """A run of the computation for one state; a block is a group's title, a line or a loss table."""

    title: str
    scope: str
    blocks: list[Block] = field(default_factory=list)


def in_si(value: Value) -> Fraction:
    """The record of ``value`` in SI, exact."""
    return (Fraction(value.record) + value.unit.offset) * value.unit.factor


def in_unit(value: Value, to: Unit) -> Decimal:
    """The record of ``value`` in another unit of the same dimension, unrounded."""
    return decimal(in_si(value) / to.factor - to.offset)


def drift(value: Value) -> Decimal:
    """How far the record is from the shadow, in the plant-size coherent unit of the record (m or ft for a head)."""
    return abs(value.record - decimal(Fraction(value.shadow) / value.unit.factor - value.unit.offset))
