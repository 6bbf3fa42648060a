"""Equations as data: each topic one module, each module one tuple, the whole list in :mod:`calcpack.catalog`."""

from __future__ import annotations

from dataclasses import dataclass, field

from .. import formula
from ..formula import FormulaError, Node
from ..references import Cite
from ..symbols import DIMENSIONS


@dataclass(frozen=True)
class Equation:
    """One formula with its result, source and validity.

    ``text`` is an expression for ``result``, or, for an equation solved by its root, an equality that holds there.
    Raises :class:`~calcpack.formula.FormulaError` when the text is outside the language or does not balance.
    """

    name: str
    result: str
    text: str
    title: str
    source: Cite
    validity: str = ""
    tree: Node = field(init=False, repr=False, compare=False)

    def __post_init__(self) -> None:
        tree = formula.parse(self.text)
        object.__setattr__(self, "tree", tree)
        found = formula.dimension(tree, DIMENSIONS)
        if not self.implicit and found != DIMENSIONS[self.result]:
            raise FormulaError(f"equation {self.name}: {self.text!r} has not the dimension of {self.result}")

    @property
    def implicit(self) -> bool:
        """Whether the result is the root of an equality rather than the value of an expression."""
        return isinstance(self.tree, formula.Cmp)

    @property
    def operands(self) -> tuple[str, ...]:
        """The symbols it needs, in the order of the text; a root is not an operand of itself."""
        return tuple(n for n in formula.names(self.tree) if not (self.implicit and n == self.result))
