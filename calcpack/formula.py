"""The formula language: one text, parsed once into a tree that everything else reads.

A formula is a small expression: numbers, symbols, ``+ - * / **``, unary minus, the constant ``pi``, the functions
of :data:`FUNCTIONS` and at most one comparison, at the top.  The same tree is evaluated in decimal arithmetic (the
record), in floats (the shadow) and on numpy arrays, checked for dimensions and typeset.  Text outside the language
is refused with the reason.
"""

from __future__ import annotations

import ast
import hashlib
import re
from collections.abc import Iterator, Mapping
from dataclasses import dataclass
from fractions import Fraction


class FormulaError(ValueError):
    """A formula outside the language, a dimension that does not balance, or a value outside a function's domain."""


@dataclass(frozen=True)
class Num:
    """A number as written, exact."""

    text: str


@dataclass(frozen=True)
class Name:
    """A symbol of the nomenclature, or ``pi``."""

    name: str


@dataclass(frozen=True)
class Neg:
    """Unary minus."""

    x: Node


@dataclass(frozen=True)
class Bin:
    """A binary operation; ``op`` is one of ``+ - * / **``."""

    op: str
    a: Node
    b: Node


@dataclass(frozen=True)
class Call:
    """A function of :data:`FUNCTIONS` applied to its arguments."""

    fn: str
    args: tuple[Node, ...]


@dataclass(frozen=True)
class Cmp:
    """A comparison; only at the top of a formula (a rule, or an equation solved for its root)."""

    op: str
    a: Node
    b: Node


Node = Num | Name | Neg | Bin | Call | Cmp

#: Longest formula read, in characters.
LONGEST = 500
_DECIMAL = re.compile(r"[0-9]+(\.[0-9]+)?")
#: Function name -> number of arguments (0: two or more; ``sum`` takes one symbol that stands for a list).
FUNCTIONS = {"sqrt": 1, "log10": 1, "ln": 1, "exp": 1, "max": 0, "min": 0, "sum": 1}
_BINARY: dict[type[ast.AST], str] = {ast.Add: "+", ast.Sub: "-", ast.Mult: "*", ast.Div: "/", ast.Pow: "**"}
_COMPARE: dict[type[ast.AST], str] = {ast.GtE: ">=", ast.LtE: "<=", ast.Gt: ">", ast.Lt: "<", ast.Eq: "=="}


def parse(text: str) -> Node:
    """Parse ``text`` into a tree.  Raises :class:`FormulaError` for anything outside the language."""
    if len(text) > LONGEST or not text.isascii() or "#" in text:
        raise FormulaError(f"{text[:40]!r} is not a formula: at most {LONGEST} plain characters, without comments")
    try:
        body = ast.parse(text, mode="eval").body
    except (SyntaxError, ValueError) as error:  # a null byte is the one or the other, by version of Python
        raise FormulaError(f"{text!r} is not a formula: {error}") from None
    return _convert(body, text, top=True)


def _convert(node: ast.AST, text: str, top: bool = False) -> Node:
    match node:
        case ast.Constant(value=int() | float()) if not isinstance(node.value, bool):
            written = ast.get_source_segment(text, node) or ""
            if not _DECIMAL.fullmatch(written):
                raise FormulaError(f"{text!r}: {written!r} is not a plain decimal number")
            return Num(written)
        case ast.Name(id=name):
            return Name(name)
        case ast.UnaryOp(op=ast.USub(), operand=x):
            return Neg(_convert(x, text))
        case ast.BinOp(left=a, op=op, right=b) if type(op) in _BINARY:
            return Bin(_BINARY[type(op)], _convert(a, text), _convert(b, text))
        case ast.Call(func=ast.Name(id=fn), args=args, keywords=[]) if fn in FUNCTIONS:
            wanted = FUNCTIONS[fn]
            if len(args) != wanted if wanted else len(args) < 2:
                raise FormulaError(f"{text!r}: {fn} takes {wanted or 'two or more'} argument(s), {len(args)} given")
            if fn == "sum" and not isinstance(args[0], ast.Name):
                raise FormulaError(f"{text!r}: sum takes one symbol")
            return Call(fn, tuple(_convert(x, text) for x in args))
        case ast.Compare(left=a, ops=[op], comparators=[b]) if top and type(op) in _COMPARE:
            return Cmp(_COMPARE[type(op)], _convert(a, text), _convert(b, text))
    raise FormulaError(f"{text!r}: {ast.unparse(node)!r} is outside the formula language")


def walk(node: Node) -> Iterator[Node]:
    """Yield ``node`` and every node below it, in the order of the text."""
    yield node
    match node:
        case Neg(x):
            yield from walk(x)
        case Bin(_, a, b) | Cmp(_, a, b):
            yield from walk(a)
            yield from walk(b)
        case Call(_, args):
            for x in args:
                yield from walk(x)


def names(node: Node) -> tuple[str, ...]:
    """The symbols of a tree, each once, in the order of the text; ``pi`` is a constant and not among them."""
    return tuple(dict.fromkeys(n.name for n in walk(node) if isinstance(n, Name) and n.name != "pi"))


_LEVEL = {">=": 0, "<=": 0, ">": 0, "<": 0, "==": 0, "+": 1, "-": 1, "*": 2, "/": 2, "**": 4}


def text(node: Node) -> str:
    """The linear text of a tree, with the fewest parentheses; ``parse(text(tree)) == tree``."""
    return _text(node, 0)


def _text(node: Node, level: int) -> str:
    match node:
        case Num(t):
            return t if not t.startswith("-") or level == 0 else f"({t})"
        case Name(n):
            return n
        case Neg(x):
            inner = "-" + _text(x, 3)
            return f"({inner})" if level > 3 else inner
        case Call(fn, args):
            return f"{fn}({', '.join(_text(x, 0) for x in args)})"
        case Bin(op, a, b) | Cmp(op, a, b):
            own = _LEVEL[op]
            right_associative = op == "**"
            left = _text(a, own + right_associative)
            right = _text(b, 5 if isinstance(b, Neg) else own + (not right_associative))
            inner = f"{left}**{right}" if op == "**" else f"{left} {op} {right}"
            return f"({inner})" if own < level else inner
    raise AssertionError(node)


def fingerprint(node: Node) -> str:
    """Twelve hexadecimal digits that change when, and only when, the formula changes."""
    return hashlib.sha256(text(node).encode()).hexdigest()[:12]


# --- dimensions -------------------------------------------------------------------------------------------------

#: Exponents of length, mass, time, temperature.
Dimension = tuple[Fraction, Fraction, Fraction, Fraction]
_ZERO = Fraction(0)
NONE: Dimension = (_ZERO, _ZERO, _ZERO, _ZERO)


def dimension(node: Node, of: Mapping[str, Dimension]) -> Dimension:
    """The dimension of a tree, exponents as exact fractions.  Raises :class:`FormulaError` where it does not balance."""
    match node:
        case Num():
            return NONE
        case Name(name):
            if name == "pi":
                return NONE
            if name not in of:
                raise FormulaError(f"symbol {name!r} is not in the nomenclature")
            return of[name]
        case Neg(x):
            return dimension(x, of)
        case Bin("+" | "-", a, b) | Cmp(_, a, b):
            left, right = dimension(a, of), dimension(b, of)
            if left != right:
                raise FormulaError(f"{text(node)}: the two sides differ in dimension")
            return left
        case Bin("*", a, b):
            return _combine(dimension(a, of), dimension(b, of), 1)
        case Bin("/", a, b):
            return _combine(dimension(a, of), dimension(b, of), -1)
        case Bin("**", a, b):
            base = dimension(a, of)
            if dimension(b, of) != NONE:
                raise FormulaError(f"{text(node)}: an exponent must be a pure number")
            if base == NONE:
                return NONE
            if names(b):
                raise FormulaError(f"{text(node)}: a quantity with a dimension takes a constant exponent only")
            power = _constant(b)
            return (base[0] * power, base[1] * power, base[2] * power, base[3] * power)
        case Call("sqrt", (x,)):
            inner = dimension(x, of)
            return (inner[0] / 2, inner[1] / 2, inner[2] / 2, inner[3] / 2)
        case Call("max" | "min" | "sum", args):
            found = {dimension(x, of) for x in args}
            if len(found) != 1:
                raise FormulaError(f"{text(node)}: the arguments differ in dimension")
            return found.pop()
        case Call(fn, (x,)):
            if dimension(x, of) != NONE:
                raise FormulaError(f"{text(node)}: {fn} takes a pure number")
            return NONE
    raise AssertionError(node)


def _combine(a: Dimension, b: Dimension, sign: int) -> Dimension:
    return (a[0] + sign * b[0], a[1] + sign * b[1], a[2] + sign * b[2], a[3] + sign * b[3])


def _constant(node: Node) -> Fraction:
    """An exponent without symbols, exact."""
    match node:
        case Num(t):
            return Fraction(t)
        case Neg(x):
            return -_constant(x)
        case Bin("+", a, b):
            return _constant(a) + _constant(b)
        case Bin("-", a, b):
            return _constant(a) - _constant(b)
        case Bin("*", a, b):
            return _constant(a) * _constant(b)
        case Bin("/", a, b):
            return _constant(a) / _constant(b)
    raise FormulaError(f"{text(node)}: an exponent is a plain number or a fraction")
