"""Margins of NPSH published for a service, where the project states none of its own."""

from __future__ import annotations

from collections.abc import Mapping
from dataclasses import dataclass
from typing import Literal

from ..quantity import parse
from ..references import Cite
from ..source.inputs import Given
from ..value import Value
from . import best_efficiency
from .curve import beyond
from .entry import Entry, cited


@dataclass(frozen=True)
class Margin:
    """A margin ratio and a margin difference, the greater of which holds; the difference may be empty.

    ``above``: the ratio must be exceeded, not only reached.
    """

    ratio: str
    difference: str = ""
    above: bool = False


@dataclass(frozen=True)
class Service:
    """What is published for a service.

    ``strict`` goes before ``usual`` from the suction specific speed ``threshold`` on (metric: r/min, m³/s, m), and, where
    ``outside`` is set, outside the preferred operating region only.  ``beside`` is what else is in print.
    """

    usual: Margin
    cite: Cite
    named: str = "ANSI/HI 9.6.1"
    strict: Margin | None = None
    threshold: str = ""
    outside: bool = False
    beside: str = ""


_HI = Cite("hi961s")
_USUAL, _STRICT = Margin("1.1", "0.6 m"), Margin("1.2", "1.0 m")
_WATER = "MIL-HDBK-1005/7A (1999), Water Supply Systems, 5.4.5, asks for at least 2 or 3 ft"
#: Service -> what is published for it.
SERVICES: Mapping[str, Service] = {
    "hydrocarbon": Service(Margin("1.1", "1.0 m"), _HI),
    "chemical": Service(_USUAL, _HI, strict=_STRICT, threshold="210", outside=True),
    "water": Service(_USUAL, _HI, strict=_STRICT, threshold="145", beside=_WATER),
    "wastewater": Service(_USUAL, _HI, strict=_STRICT, threshold="145", beside=_WATER),
    "power": Service(_USUAL, _HI, strict=_STRICT, threshold="145"),
    "pulp": Service(_USUAL, _HI, strict=_STRICT, threshold="145"),
    "building services": Service(Margin("1.0", above=True), _HI, strict=_USUAL, threshold="145"),
    "boiler feed": Service(
        Margin("1.8"), Cite("power_da"), "POWER magazine, on deaerators", beside="1.8 to 2.5 are in print"
    ),
}
#: Preferred operating region, over the flow at best efficiency: the narrower of the two in print (that of pumps of higher
#: specific speed), for the file does not hold the head a pump's specific speed is found from.
PREFERRED: Mapping[Literal["lowest", "highest"], str] = {"lowest": "80 %", "highest": "115 %"}


@dataclass(frozen=True)
class Published:
    """The margin a service asks for at one flow, and how it was chosen."""

    chosen: Margin
    ratio: Value
    difference: Value | None
    words: str
    source: str


def margin(entry: Entry, flow: Value) -> Published:
    """The margin published for the service of the file, at ``flow``; the stricter one where it cannot be told."""
    asked = entry.calculation.criteria.service
    assert asked is not None, "source asks for a margin or a service"
    name, service = asked.name, SERVICES[asked.name]
    entry.ledger.group("Margin published for the service")
    strict, when = _strict(entry, service, flow)
    chosen = service.strict if strict and service.strict else service.usual
    place = f"{name}, {when}" if when else name

    def entered(symbol: str, title: str, text: str, kind: str) -> Value:
        return entry.ledger.tabulated(symbol, f"{title} published for {place}", parse(text, kind), place, service.cite)

    ratio = entered("m_r", "Margin ratio", chosen.ratio, "factor")
    difference = entered("m_d", "Margin difference", chosen.difference, "head") if chosen.difference else None
    entry.assume(
        "service",
        f"The margin is the one published for the service “{name}” ({service.named})",
        "editions differ, and the criterion belongs to the project: state a ratio or a difference to replace it"
        + (f"; {service.beside}" if service.beside else ""),
    )
    own = cited(asked.provenance)
    named = f"{own}, which names the service; " if own else ""
    return Published(chosen, ratio, difference, f"service {place}", f"{named}{service.named} (line {ratio.address})")


def _strict(entry: Entry, service: Service, flow: Value) -> tuple[bool, str]:
    """Whether the stricter margin holds at ``flow``, and when it does, in words."""
    if service.strict is None:
        return False, ""
    speed, doubt = best_efficiency.suction_specific_speed(entry, "metric")
    when = f"suction specific speed {{}} {service.threshold} (metric)"
    if speed is None:
        entry.assume("strict margin", "The stricter margin of the service is taken", doubt)
        return True, when.format("not known to be below")
    entry.ledger.group("Margin published for the service")
    threshold = entry.ledger.tabulated(
        "N_s0", "Suction specific speed from which the stricter margin holds", parse(service.threshold, "specific_speed"),
        "metric: r/min, m³/s, m", service.cite,
    )  # fmt: skip
    if beyond(threshold, speed):
        return False, when.format("below")
    high = when.format("not below")
    if not service.outside:
        return True, high
    inside = _preferred(entry, flow)
    return not inside, f"{high}, {'within' if inside else 'outside'} the preferred region"


def _preferred(entry: Entry, flow: Value) -> bool:
    """Whether ``flow`` lies in the preferred operating region: the project's, else the one in print."""
    lowest, highest = (_end(entry, end) for end in PREFERRED)
    return not beyond(lowest, flow) and not beyond(flow, highest)


def _end(entry: Entry, end: Literal["lowest", "highest"]) -> Value:
    asked = entry.calculation.criteria.operating_region
    share: Given | Value | None = getattr(asked, end, None)
    if share is None:
        entry.assume(
            "preferred region",
            f"The preferred operating region is {' to '.join(PREFERRED.values())} of the flow at best efficiency",
            "the narrower of the two in print, that of pumps of higher specific speed; state operating_region to replace it",
        )
        share = entry.ledger.tabulated(
            "r_l" if end == "lowest" else "r_h",
            f"{end.capitalize()} flow of the preferred operating region, over that at best efficiency",
            parse(PREFERRED[end], "percentage"),
            "pumps of higher specific speed",
            Cite("hi963"),
        )
    found = best_efficiency.region(entry, end, share)
    assert found is not None, "a suction specific speed was found from the flow at best efficiency"
    return found
