"""A value as the file gives it, with where it comes from: its origin, the documents, the issues of the file."""

from __future__ import annotations

from dataclasses import dataclass
from datetime import date

from ..quantity import Quantity


@dataclass(frozen=True, kw_only=True)
class Provenance:
    """Where a value comes from and how far it is trusted; empty texts where the file does not say.

    ``status`` is ``verified``, ``maker``, ``preliminary``, ``assumed`` or empty.
    """

    source: str = ""
    place: str = ""
    status: str = ""
    note: str = ""
    confirm: str = ""


@dataclass(frozen=True, kw_only=True)
class Given(Provenance):
    """A value as the file gives it: its address, its text, what was read from it, its origin, its place."""

    key: str
    text: str
    quantity: Quantity
    line: int
    column: int


@dataclass(frozen=True, kw_only=True)
class Extremes:
    """One quantity that varies, by its named extremes."""

    lowest: Given | None = None
    normal: Given | None = None
    highest: Given | None = None
    average: Given | None = None


@dataclass(frozen=True, kw_only=True)
class Level(Extremes):
    """Levels of a surface; ``drawdown`` is taken off the lowest while the pump runs."""

    overflow: Given | None = None
    drawdown: Given | None = None


@dataclass(frozen=True, kw_only=True)
class Source:
    """A document that values come from."""

    id: str
    title: str
    document: str
    edition: str


@dataclass(frozen=True, kw_only=True)
class Revision:
    """One issue of the calculation."""

    revision: str
    date: date
    reason: str
