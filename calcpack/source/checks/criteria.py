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
    yield from _specific_speed(view)
    region = view.at("criteria", "operating_region")
    if isinstance(region, Mapping) and not region.get("lowest") and not region.get("highest"):
        wanted, hint = "`lowest`, `highest` or both", "add `lowest: 70 %` or the like"
        yield view.fault(region, "criteria.operating_region", wanted, "neither", hint, "criteria")


#: Suction specific speeds in print run from 100 to 350 metric, 5 000 to 18 000 US: between the two scales lies nothing.
_METRIC_BELOW, _US_ABOVE = 1000, 1000


def _specific_speed(view: View) -> Iterator[Fault]:
    """A limit of suction specific speed is of the size of its scale."""
    node, limit = (
        view.at("criteria", "suction_specific_speed", "highest"),
        view.quantity("criteria", "suction_specific_speed", "highest"),
    )
    scale = view.text("criteria", "suction_specific_speed", "in")
    if (
        node
        and limit
        and (scale == "metric" and limit.number > _METRIC_BELOW or scale == "US" and limit.number < _US_ABOVE)
    ):
        wanted = "a figure of its scale: some 200 in metric units (r/min, m³/s, m) is 11 000 in US units (r/min, gal/min, ft)"
        hint = f"write `in: {'US' if scale == 'metric' else 'metric'}`"
        yield view.fault(
            node, "criteria.suction_specific_speed.highest", wanted, f"{limit.text} in {scale} units", hint, "criteria"
        )


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
