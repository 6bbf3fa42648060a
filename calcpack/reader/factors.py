"""Exact factors of conversions in running text: ``77/34 560``, ``0.304 8²/(0.453 592 37 × 9.806 65)``."""

from __future__ import annotations

import re
from decimal import Decimal
from fractions import Fraction

from .arithmetic import exact
from .failures import Undefined, Unread
from .grammar import Parser, Token
from .text import THIN
from .tree import Number, Symbol, Tree
from .units import factor

_SUPERSCRIPTS = str.maketrans("⁰¹²³⁴⁵⁶⁷⁸⁹⁻", "0123456789-")
_TOKEN = re.compile(rf"\s*(?:(\d[\d{THIN}]*(?:\.[\d{THIN}]+)?)|([⁻⁰¹²³⁴⁵⁶⁷⁸⁹]+)|(x)|([+−×/()]))\s*")


#: After a factor: the row in the list of conversions.
LISTED = re.compile(r"exact, (C[1-9]\d*)")


def printed_tree(text: str) -> Tree:
    """A form written in one row, its only symbol ``x``.  Raises ``Unread``."""
    found, at = [], 0
    while at < len(text):
        match = _TOKEN.match(text, at)
        if match is None:
            raise Unread(f"{text!r} is no factor")
        digits, power, unknown, sign = match.groups()
        if digits:
            found.append(Token("number", Number(Decimal(digits.replace(THIN, "")))))
        elif power:
            found.append(Token("power", Number(Decimal(power.translate(_SUPERSCRIPTS)))))
        else:
            found.append(Token("symbol", Symbol(unknown)) if unknown else Token(sign))
        at = match.end()
    return Parser(found).whole()


def printed_factor(text: str) -> Fraction:
    """The value of a factor written in one row.  Raises ``Unread``."""
    try:
        return exact(printed_tree(text))
    except Undefined as error:
        raise Unread(f"{text!r}: {error}") from None


def same_factor(source: str, before: str, after: str) -> tuple[str, str] | None:
    """The factor printed at the head of ``source`` and the exact one, where they differ."""
    text = source.partition("exact")[0].strip() or "1"  # a unit that differs by its zero alone prints no factor
    right = factor(before, after)
    return None if printed_factor(text) == right else (text, str(right))
