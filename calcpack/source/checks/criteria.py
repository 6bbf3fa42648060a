"""What must be met: a margin, and limits that hold something."""

from __future__ import annotations

from collections.abc import Iterator

from ...faults import Fault
from ..nodes import Mapping
from ..view import View


def check(view: View) -> Iterator[Fault]:
    yield from _margin(view)
    bell = view.at("criteria", "bell_velocity")
    if isinstance(bell, Mapping):
        limits, method = bell.get("lowest") or bell.get("highest"), bell.get("method")
        if bool(limits) == bool(method):
            wanted = "either `lowest`, `highest` or both, or `method`"
            found, hint = ("both", "leave one out") if method else ("neither", "add `method: hi_9_8` or a limit")
            yield view.fault(bell, "criteria.bell_velocity", wanted, found, hint, "criteria")
    region = view.at("criteria", "operating_region")
    if isinstance(region, Mapping) and not region.get("lowest") and not region.get("highest"):
        wanted, hint = "`lowest`, `highest` or both", "add `lowest: 70 %` or the like"
        yield view.fault(region, "criteria.operating_region", wanted, "neither", hint, "criteria")


def _margin(view: View) -> Iterator[Fault]:
    margin = view.at("criteria", "npsh_margin")
    if isinstance(margin, Mapping) and not any(margin.get(name) for name in ("ratio", "difference", "service")):
        wanted, hint = "`ratio`, `difference` or both, or `service`", "add `ratio: 1.10` or the like"
        yield view.fault(margin, "criteria.npsh_margin", wanted, "none of them", hint, "criteria")
    ratio, node = view.quantity("criteria", "npsh_margin", "ratio"), view.at("criteria", "npsh_margin", "ratio")
    if ratio and node and ratio.number < 1:
        wanted = "a ratio of 1 or more: NPSH available over NPSH required"
        hint = "ten per cent over NPSH required is `ratio: 1.10`"
        yield view.fault(node, "criteria.npsh_margin.ratio", wanted, ratio.text, hint, "criteria")
