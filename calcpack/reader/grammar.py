"""Tokens of one form become a tree: powers bind closest, then products, then sums, all from the left."""

from __future__ import annotations

from collections.abc import Sequence
from dataclasses import dataclass

from .failures import Unread
from .tree import Op, Tree, negative


@dataclass(frozen=True)
class Token:
    """``kind`` is a sign, or one of ``number symbol function tree power sum``."""

    kind: str
    tree: Tree | None = None
    name: str = ""


class Parser:
    """Reads tokens from the left.

    Two factors side by side are a product, unless the second is a number: numbers always show their sign.
    """

    def __init__(self, tokens: Sequence[Token]) -> None:
        self.tokens, self.at = tokens, 0

    @property
    def next(self) -> str:
        return self.tokens[self.at].kind if self.at < len(self.tokens) else ""

    def take(self, kind: str = "") -> Token:
        if not self.next or (kind and self.next != kind):
            raise Unread(f"{kind or 'a term'!r} expected, {self.next or 'the end'!r} found")
        self.at += 1
        return self.tokens[self.at - 1]

    def whole(self) -> Tree:
        tree = self.sum()
        if self.next:
            raise Unread(f"{self.next!r} after the end of the form")
        return tree

    def sum(self) -> Tree:
        tree = self.product(leading=True)
        while self.next in ("+", "−"):
            op = "+" if self.take().kind == "+" else "-"
            tree = Op(op, (tree, self.product()))
        return tree

    def product(self, leading: bool = False) -> Tree:
        minus = leading and self.next == "−"
        if minus:
            self.take()
        tree = self.power()
        tree = negative(tree) if minus else tree
        while self.next in ("×", "/", "symbol", "function", "tree", "sum", "("):
            op = "/" if self.next == "/" else "*"
            if self.next in ("×", "/"):
                self.take()
            tree = Op(op, (tree, self.power()))
        return tree

    def power(self) -> Tree:
        tree = self.primary()
        return Op("**", (tree, self.exponent())) if self.next == "power" else tree

    def exponent(self) -> Tree:
        tree = self.take("power").tree
        assert tree is not None, "a power token carries its exponent"
        return tree

    def primary(self) -> Tree:
        token = self.take()
        if token.tree is not None and token.kind != "power":
            return token.tree
        if token.kind == "(":
            args = self.arguments()
            return args[0] if len(args) == 1 else Op(",", args)
        if token.kind == "sum":
            return Op("sum", (self.primary(),))
        if token.kind == "function":
            self.take("(")
            return Op(token.name, self.arguments())
        raise Unread(f"{token.kind!r} where a term belongs")

    def arguments(self) -> tuple[Tree, ...]:
        """What stands between brackets, the closing one taken; several where a look-up has them."""
        found = [self.sum()]
        while self.next == ",":
            self.take()
            found.append(self.sum())
        self.take(")")
        return tuple(found)
