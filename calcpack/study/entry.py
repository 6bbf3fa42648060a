"""Inputs entering the ledger: the one way from what the file says to an addressed value."""

from __future__ import annotations

from collections.abc import Callable
from typing import NoReturn, Protocol

from ..faults import Fault, InputFault
from ..ledger import Ledger
from ..lookup import OutOfRange
from ..quantity import parse
from ..source.inputs import Calculation, Element, Given, Provenance
from ..value import Value
from .finding import Finding, finding


class Place(Protocol):
    """Anything of the file that knows where it stands."""

    @property
    def line(self) -> int: ...
    @property
    def column(self) -> int: ...
    @property
    def key(self) -> str: ...


#: Symbol of an absolute pressure -> the equation that makes it of a gauge pressure.
_FROM_GAUGE = {"p_s": "absolute_from_gauge", "p_k": "point_from_gauge"}


class Entry:
    """A calculation and the ledger it is written into."""

    def __init__(self, calculation: Calculation, ledger: Ledger) -> None:
        self.calculation = calculation
        self.ledger = ledger
        self.findings: dict[str, Finding] = {}
        self.assumptions: dict[str, tuple[str, str]] = {}

    def value(self, given: Given, symbol: str, title: str, note: str = "") -> Value:
        """Enter ``given`` as ``symbol``, converted to the display system's unit where it needs to be."""
        return self.ledger.convert(self.typed(given, symbol, title, note))

    def typed(self, given: Given, symbol: str, title: str, note: str = "") -> Value:
        """Enter ``given`` as ``symbol`` and keep it as typed, for a look-up; ``note`` says what it holds for."""
        return self.ledger.given(
            symbol, title, given.quantity, text=given.text, key=given.key, file_line=given.line,
            note=note, provenance=given,
        )  # fmt: skip

    def count(self, element: Element) -> Value:
        """The number of equal elements, a plain number of the file."""
        return self.ledger.given(
            "n", f"Number of equal elements, element {element.id}", parse(str(element.count), "ratio"), text=str(element.count),
            key=f"{element.key}.count", file_line=element.line, provenance=element.provenance,
        )  # fmt: skip

    def absolute(self, given: Given, title: str, barometer: Callable[[], Value], symbol: str = "p_s") -> Value:
        """A pressure as the absolute one ``symbol`` stands for: as given, or a gauge pressure with the barometer added."""
        if given.quantity.reference == "absolute":
            return self.value(given, symbol, f"{title}, absolute")
        operands = {"p_g": self.gauge(given, title), "p_b": barometer()}
        return self.ledger.apply(_FROM_GAUGE[symbol], operands)

    def gauge(self, given: Given, title: str) -> Value:
        """A pressure relative to the barometer; a vacuum as read becomes a negative gauge pressure on a line of its own."""
        if given.quantity.reference == "vacuum":
            read = self.value(given, "p_vac", f"{title}, vacuum")
            return self.ledger.apply("gauge_from_vacuum", {"p_vac": read})
        return self.value(given, "p_g", f"{title}, gauge")

    def refuse(self, at: Place, wanted: str, found: str, suggestion: str = "") -> NoReturn:
        """Raise :class:`InputFault` at a place in the file."""
        raise InputFault([Fault(self.calculation.named, at.line, at.column, at.key, wanted, found, suggestion)])

    def look_up(
        self, liquid: str, name: str, temperature: Value, given: Given, fraction: Value | None = None, title: str = ""
    ) -> Value:
        """A property of a liquid; outside its range the fault stands at ``given``, the temperature's place in the file."""
        try:
            return self.ledger.look_up(liquid, name, temperature, fraction, title)
        except OutOfRange as error:
            self.refuse(given, str(error), given.text, "cite the property instead")

    def assume(self, key: str, text: str, consequence: str) -> None:
        """Record an assumption the tool makes, once."""
        self.assumptions.setdefault(key, (text, consequence))

    def find(self, text: str, reason: str, name: str = "", *, cost: Value | None = None, unless: str = "") -> None:
        """Record a finding, once; :func:`~calcpack.study.finding.finding` says what its parts are."""
        self.record(finding(name, text, reason, cost, unless))

    def record(self, found: Finding) -> None:
        """Record a finding, once."""
        self.findings.setdefault(found.text, found)


def cited(of: Provenance | None) -> str:
    """A project's own source as it is printed, ``[S1] 4.3``; empty where none is stated."""
    return "" if of is None else " ".join(part for part in (f"[{of.source}]" if of.source else "", of.place) if part)
