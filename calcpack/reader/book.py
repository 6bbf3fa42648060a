"""What has been read so far: the values each address may be cited with, and what was found wrong."""

from __future__ import annotations

from collections.abc import Iterable
from dataclasses import dataclass, field
from typing import Literal

from .tree import Symbol
from .units import Quantity

Class = Literal["recomputed", "bracketed", "looked up", "tabulated"]


@dataclass(frozen=True)
class Finding:
    """A disagreement, or something that could not be read: where, what, as printed and as found."""

    sheet: int
    address: str
    what: str
    printed: str = ""
    found: str = ""

    def __str__(self) -> str:
        shown = f": printed {self.printed}, found {self.found}" if self.printed or self.found else ""
        return f"sheet {self.sheet}, line {self.address or '-'}: {self.what}{shown}"


@dataclass
class Book:
    """Addresses in order of reading with the values another line may take from them."""

    values: dict[str, tuple[Quantity, ...]] = field(default_factory=dict)
    cites: dict[str, set[str]] = field(default_factory=dict)
    symbols: dict[Symbol, tuple[int, str]] = field(default_factory=dict)
    measured: list[tuple[int, str, Symbol, str]] = field(default_factory=list)
    bases: dict[str, str] = field(default_factory=dict)
    classes: dict[str, Class] = field(default_factory=dict)
    findings: list[Finding] = field(default_factory=list)
    unread: list[Finding] = field(default_factory=list)
    #: Headlines not rounded to the nearest: right only where a rule reports the same line so.
    aside: dict[str, tuple[Quantity, Finding]] = field(default_factory=dict)

    def citation(self, quantity: Quantity, address: str) -> tuple[str, str, str] | None:
        """What is wrong with citing ``address`` for ``quantity``: what, printed, found; or nothing.

        Only lines read before are known, so a line that cites itself or a later one is found out here.
        """
        if address not in self.values:
            return f"no earlier line is {address}", str(quantity), "nothing"
        known = self.values[address]
        if not any(quantity.value == q.value and quantity.unit == q.unit for q in known):
            return (
                f"differs from line {address}",
                str(quantity),
                " or ".join(map(str, known)) or "nothing readable",
            )
        return None

    def renamed(self, of: Symbol, address: str) -> tuple[str, str, str] | None:
        """What is wrong with the value of ``address`` standing for ``of``: its line's symbol may differ in the subscript only."""
        base = self.bases.get(address, of.base)
        return None if base == of.base else (f"stands for another symbol than line {address}", str(of), base)

    def cite(self, by: str, address: str) -> None:
        """Remember that line ``by`` rests on ``address``."""
        self.cites.setdefault(by, set()).add(address)

    def uses(self, sheet: int, address: str, found: Iterable[Symbol]) -> None:
        """Remember symbols in use and where each first stands."""
        for x in found:
            self.symbols.setdefault(x, (sheet, address))

    def result(self, sheet: int, address: str, of: Symbol, unit: str) -> None:
        """Remember which symbol a value is printed for, and in which unit."""
        self.uses(sheet, address, [of])
        self.bases[address] = of.base
        self.measured.append((sheet, address, of, unit))

    def enter(self, address: str, values: Iterable[Quantity]) -> None:
        """Let later lines cite ``address``."""
        self.values[address] = tuple(values)

    def reports(self, address: str, shown: Quantity) -> None:
        """A rule reports the result of ``address`` as ``shown``, rounded against its verdict: its headline may be the same."""
        if address in self.aside and self.aside[address][0] == shown:
            del self.aside[address]

    def note(self, sheet: int, address: str, what: str, printed: object = "", found: object = "") -> None:
        """Keep a disagreement."""
        self.findings.append(Finding(sheet, address, what, str(printed), str(found)))
