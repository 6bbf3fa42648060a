"""A formula as the reader understood it."""

from __future__ import annotations

from collections.abc import Iterator, Mapping, Sequence
from dataclasses import dataclass
from decimal import Decimal
from functools import reduce


@dataclass(frozen=True)
class Number:
    """A printed number; a minus straight before its digits is part of it."""

    value: Decimal


@dataclass(frozen=True)
class Symbol:
    """A symbol as printed: its base and its subscript."""

    base: str
    sub: str = ""

    def __str__(self) -> str:
        return f"{self.base}_{self.sub}" if self.sub else self.base


@dataclass(frozen=True)
class Op:
    """An operation: ``+ - * / ** neg sqrt log10 ln exp max min sum`` and its arguments; ``,`` lists those of a look-up."""

    name: str
    args: tuple[Tree, ...]


Tree = Number | Symbol | Op
#: The circle constant, exact.
PI = Symbol("π")
#: Symbol -> its value, or its values in order where it stands for the rows of a sum.
Values = Mapping[Symbol, Sequence[Decimal]]


def negative(x: Tree) -> Tree:
    """Minus ``x``."""
    return Number(x.value.copy_negate()) if isinstance(x, Number) else Op("neg", (x,))


def symbols(tree: Tree) -> Iterator[Symbol]:
    """Every symbol of a tree but the circle constant, in the order of print."""
    if isinstance(tree, Symbol) and tree != PI:
        yield tree
    elif isinstance(tree, Op):
        for x in tree.args:
            yield from symbols(x)


def substituted(tree: Tree, values: Values) -> Tree:
    """``tree`` with the numbers of ``values`` for its symbols; a sum over a symbol is written out."""
    match tree:
        case Symbol() if len(values.get(tree, ())) == 1:
            return Number(values[tree][0])
        case Op("sum", (Symbol() as x,)) if x in values:
            terms: list[Tree] = [Number(v) for v in values[x]]
            return reduce(lambda a, b: Op("+", (a, b)), terms)
        case Op("neg", (x,)):
            return negative(substituted(x, values))
        case Op(name, args):
            return Op(name, tuple(substituted(x, values) for x in args))
    return tree
