"""Every strainer was taken fouled in the worst case, by a drop above its clean one."""

from __future__ import annotations

from collections.abc import Iterator

from ..references import PRACTICE
from ..source.inputs import Element
from ..study.entry import Entry, cited
from ..study.line import label
from ..study.results import Results
from ..value import Value
from ..verdict import Check, Rule, compare, without_numbers

ORDER = 140
_TITLE = "Strainer taken fouled"
STRAINER_HEAD = Rule("strainer_head", _TITLE, "h_0 > h_cl", PRACTICE, decides=False)
STRAINER_PRESSURE = Rule("strainer_pressure", _TITLE, "dp_0 > dp_cl", PRACTICE, decides=False)
_CRITERION = "The worst case takes a fouled strainer, whose drop is above that of a clean one"


def judge(results: Results) -> Iterator[Check]:
    """One check for each strainer of the line; a line without one has nothing to foul."""
    line = results.calculation.line
    for section in line.sections if line else ():
        for element in section.elements:
            if element.kind == "strainer":
                assert line is not None, "a section stands in a line"
                yield _check(results.entry, element, label(line, section, element))


def _check(entry: Entry, element: Element, place: str) -> Check:
    assert element.clean is not None, "the schema asks for a strainer's clean drop"
    about, source = f"{element.name or 'strainer'}, element {place}", cited(element.provenance)
    rule, symbol = (
        (STRAINER_HEAD, "h_0") if element.clean.quantity.unit.kind == "length" else (STRAINER_PRESSURE, "dp_0")
    )
    if element.fouled is None:
        reason = "the file gives no fouled drop, so the clean one was taken"
        return without_numbers(rule, "not assessed", reason, about=about, criterion=_CRITERION, source=source)
    entry.ledger.group("Strainers")
    drops: list[Value] = [
        entry.value(drop, symbol, f"Drop of {element.name or 'strainer'}, {word}, at its reference flow")
        for drop, word in ((element.fouled, "fouled"), (element.clean, "clean"))
    ]
    return compare(
        rule, *drops, about=about, criterion=_CRITERION, source=source, met="the fouled drop was taken",
        not_met="the fouled drop is no more than the clean one: state what it comes to before it is cleaned",
    )  # fmt: skip
