"""Formulas set by the page's typesetter, printed in one document, for the reader to read back."""

from __future__ import annotations

import base64
import warnings
from collections.abc import Mapping, Sequence
from decimal import Decimal
from functools import cache
from random import Random

from calcpack import formula
from calcpack.formula import Bin, Call, Name, Neg, Node, Num
from calcpack.page import metrics
from calcpack.page.layout import Setting
from calcpack.page.typeset import Display
from calcpack.reader import tree as read
from calcpack.symbols import NOMENCLATURE

#: Symbols that are told apart in print.
DISPLAYS: dict[str, Display] = {name: Display(s.base, s.sub, s.upright) for name, s in NOMENCLATURE.items()}
ROW = 120  # points a row


@cache
def faces() -> str:
    """The bundled fonts as style rules."""
    return "".join(
        f"@font-face{{font-family:'{f.family}';font-style:{f.style};font-weight:{f.weight};src:url({metrics.path(f).as_uri()})}}"
        for f in metrics.FACES
    )


def printed(settings: Sequence[Setting], rows: int = 12) -> bytes:
    """The pictures one under another, ``rows`` a sheet, each at the top of a row of :data:`ROW` points."""
    body = [
        f'<div><img style="display:block;width:{s.width:.3f}pt;height:{s.height:.3f}pt" '
        f'src="data:image/svg+xml;base64,{base64.b64encode(s.svg.encode()).decode()}"></div>'
        for s in settings
    ]
    style = f"@page{{size:250pt {ROW * rows}pt;margin:0}}body{{margin:0}}div{{height:{ROW}pt}}"
    return pdf(f"<meta charset=utf-8><style>{faces()}{style}</style>{''.join(body)}")


def pdf(html: str) -> bytes:
    """A page of HTML as a PDF file."""
    with warnings.catch_warnings():
        warnings.filterwarnings(
            "ignore", "HarfBuzz-Subset", DeprecationWarning
        )  # which library cuts fonts is no matter
        from weasyprint import HTML
    made = HTML(string=html).write_pdf()
    assert made is not None
    return bytes(made)


def expected(node: Node, displays: Mapping[str, Display] = DISPLAYS) -> read.Tree:
    """The tree as the reader should understand it: a minus before a product binds to its first factor."""
    match node:
        case Num(t):
            return read.Number(Decimal(t))
        case Name("pi"):
            return read.PI
        case Name(name):
            return read.Symbol(displays[name].base, displays[name].sub)
        case Neg(Bin("*", a, b)):
            return read.Op("*", (expected(Neg(a), displays), expected(b, displays)))
        case Neg(x):
            return read.negative(expected(x, displays))
        case Bin(op, a, b):
            return read.Op(op, (expected(a, displays), expected(b, displays)))
        case Call(fn, args):
            return read.Op(fn, tuple(expected(x, displays) for x in args))
    raise AssertionError(node)


class Trees:
    """Random formulas of the language, the same for the same seed."""

    def __init__(self, seed: int) -> None:
        self.random = Random(seed)
        self.names = [n for n in DISPLAYS if n != "NPSHA"]

    def number(self, signed: bool = True) -> str:
        """A number as the record writes one."""
        r = self.random
        digits = r.choice((1, 1, 2, 3, 4, 6, 6, 6, 6, 8))
        whole = str(r.randrange(10 ** (digits - 1), 10**digits))
        cut = r.randrange(0, digits)
        text = whole if cut == 0 else f"{whole[:cut]}.{whole[cut:]}"
        if r.random() < 0.15:
            text = f"0.{'0' * r.randrange(0, 4)}{whole}"
        if r.random() < 0.2:
            mantissa = f"{whole[0]}.{whole[1:]}".rstrip(".")
            text = f"{mantissa}E{r.choice(('-', ''))}{r.randrange(1, 13)}"
        return ("-" if signed and r.random() < 0.15 else "") + text

    def tree(self, depth: int, power: int = 0) -> Node:
        """A tree of at most ``depth`` levels; exponents at most two deep."""
        r = self.random
        if depth <= 0 or r.random() < 0.12:
            return Num(self.number(False)) if r.random() < 0.3 else Name(r.choice([*self.names, "pi"]))
        kind = r.choices(
            ("+", "-", "*", "/", "**", "neg", "sqrt", "log10", "ln", "exp", "max", "min"),
            (5, 5, 8, 6, 3, 1, 2, 1, 1, 1, 1, 1),
        )[0]
        if kind == "neg":
            return Neg(self.tree(depth - 1, power))
        if kind == "**":
            if power == 2:
                return self.tree(0)
            exponent = Num(str(r.randrange(2, 12))) if r.random() < 0.5 else self.tree(min(depth - 1, 2), power + 1)
            return Bin("**", self.tree(depth - 1, power), exponent)
        if kind in "+-*/":
            return Bin(kind, self.tree(depth - 1, power), self.tree(depth - 1, power))
        arguments = r.choice((1, 2, 2, 3)) if kind in ("max", "min") else 1
        return Call(kind, tuple(self.tree(depth - 1, power) for _ in range(arguments)))

    def values(self, node: Node) -> dict[str, str]:
        """A printed number for each symbol."""
        return {name: self.number() for name in formula.names(node)}
