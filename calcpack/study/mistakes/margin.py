"""The margin over NPSH required: none at all, or one published for another kind of pump."""

from __future__ import annotations

from collections.abc import Iterator

from ...quantity import parse
from ..finding import Finding, finding
from ..service import SERVICES
from .search import Search

#: NPSH needed over NPSH required, up to which there is no margin.
NONE = 1.02


def no_margin(at: Search) -> Iterator[Finding]:
    """The project's own margin adds nothing to NPSH required."""
    each = at.results.judged[0]
    required, limit = each.needed.required, each.needed.limit
    if at.c.criteria.service is not None or required is None or limit is None or limit.shadow > NONE * required.shadow:
        return
    of, service = "water", SERVICES["water"]
    at.ledger.group("Margin in print")
    operands = {"NPSHR": required}
    for symbol, title, text, kind in (
        ("m_r", "Margin ratio", service.usual.ratio, "factor"), ("m_d", "Margin difference", service.usual.difference, "head")
    ):  # fmt: skip
        operands[symbol] = at.ledger.tabulated(
            symbol, f"{title} published for {of}", parse(text, kind), of, service.cite
        )
    yield finding(
        "no_margin", f"The margin asked for adds nothing to NPSH required: {each.needed.criterion}",
        "NPSH3 is the value at which the head has already fallen by 3 %, and cavitation begins well above it; the head shown is the "
        f"margin {service.named} gives for water",
        at.ledger.apply("usual_margin", operands), "NPSH required holds a margin already",
    )  # fmt: skip


def service_of_another_pump(at: Search) -> Iterator[Finding]:
    """A margin of rotodynamic pumps for a reciprocating one."""
    if at.c.pump.reciprocating is not None and at.c.criteria.service:
        yield finding(
            "service_of_another_pump",
            f"The margin of the service “{at.c.criteria.service.name}” is published for rotodynamic pumps",
            "a reciprocating pump needs the margin that its maker or the project states",
            unless="the project wants it so",
        )


MISTAKES = (no_margin, service_of_another_pump)
