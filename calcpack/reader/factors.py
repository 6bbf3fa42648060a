"""Exact factors of conversions as printed in running text: ``77/34 560``, ``0.304 8²/(0.453 592 37 × 9.806 65)``."""

from __future__ import annotations

import re
from fractions import Fraction

from .notation import Parser, Token, Unread
from .text import THIN
from .tree import Number, Op, Tree
from .arithmetic import Undefined, exact
from .units import factor
from decimal import Decimal

_SUPERSCRIPTS = str.maketrans("⁰¹²³⁴⁵⁶⁷⁸⁹⁻", "0123456789-")
_TOKEN = re.compile(rf"\s*(?:(\d[\d{THIN}]*(?:\.[\d{THIN}]+)?)|([⁻⁰¹²³⁴⁵⁶⁷⁸⁹]+)|([×/()]))")


def printed_factor(text: str) -> Fraction:
    """The value of a factor written in one row.  Raises ``Unread``."""
    try:
        return exact(_product(_tokens(text.strip())))
    except Undefined as error:
        raise Unread(f"{text!r}: {error}") from None


def same_factor(source: str, before: str, after: str) -> tuple[str, str] | None:
    """The factor printed at the head of ``source`` and the exact one, where they differ."""
    text = source.partition(" exact")[0]
    right = factor(before, after)
    return None if printed_factor(text) == right else (text, str(right))


def _tokens(text: str) -> list[Token]:
    found, at = [], 0
    while at < len(text):
        match = _TOKEN.match(text, at)
        if match is None:
            raise Unread(f"{text!r} is no factor")
        digits, power, sign = match.groups()
        if digits:
            found.append(Token("number", Number(Decimal(digits.replace(THIN, "")))))
        elif power:
            found.append(Token("power", Number(Decimal(power.translate(_SUPERSCRIPTS)))))
        else:
            found.append(Token(sign))
        at = match.end()
    return found


def _product(tokens: list[Token]) -> Tree:
    """A product over a product: one ``/`` at the most outside brackets."""
    depth, cut = 0, None
    for i, token in enumerate(tokens):
        depth += {"(": 1, ")": -1}.get(token.kind, 0)
        if token.kind == "/" and depth == 0:
            if cut is not None:
                raise Unread("two slashes in one factor")
            cut = i
    if cut is None:
        return Parser(tokens).whole()
    return Op("/", (Parser(tokens[:cut]).whole(), Parser(tokens[cut + 1 :]).whole()))
