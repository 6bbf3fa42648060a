"""Reducers: their losses against fluids, and what their lie says."""

from __future__ import annotations

import math

import fluids
import pytest
from lines import BORE, ENTRANCE, HEAD, PIPE, assumptions, faults, findings, line, lost
from plants import Document, plant


@pytest.mark.parametrize("units", ["SI", "US"])
@pytest.mark.parametrize("length", ["", "30 mm", "60 mm", "152 mm", "600 mm"])
@pytest.mark.parametrize("other", [0.154, 0.300])
@pytest.mark.parametrize("end", ["to", "from"])
def test_a_reducer_is_that_of_crane_in_fluids(end: str, other: float, length: str, units: str) -> None:
    """Contraction and enlargement, gradual, steep and sudden, each referred to the section's own bore."""
    reducer: Document = {"kind": "reducer", "type": "concentric", end: {"bore": f"{other * 1000:g} mm"}}
    taper = float(length.split()[0]) / 1000 if length else 0.0
    if length:
        reducer["length"] = length
    before, after = (BORE, other) if end == "to" else (other, BORE)
    if before > after:
        on_smaller = fluids.contraction_conical(Di1=before, Di2=after, l=taper, method="Crane")
    else:
        angle = math.degrees(2 * math.atan((after - before) / 2 / taper)) if taper else 180.0
        on_smaller = fluids.diffuser_conical(Di1=before, Di2=after, angle=angle, method="Crane")
    K = on_smaller if other > BORE else fluids.fittings.change_K_basis(on_smaller, D1=other, D2=BORE)
    assert lost(line(reducer, **{"calculation.units": units})) == pytest.approx(K * HEAD, rel=1e-6)


def test_a_reducer_between_equal_bores_is_refused() -> None:
    assert "differs from the section's" in faults(
        line({"kind": "reducer", "type": "concentric", "to": {"bore": "202.7 mm"}})
    )


def test_an_eccentric_reducer_counts_as_concentric_and_says_so() -> None:
    to = {"to": {"size": "NPS 6", "schedule": "40"}, "length": "140 mm"}
    eccentric = line({"kind": "reducer", "type": "eccentric", "flat_side": "top", **to})
    concentric = line({"kind": "reducer", "type": "concentric", **to})
    assert lost(eccentric) == lost(concentric)
    assert "eccentric reducer loses as much" in assumptions(eccentric) and "eccentric" not in assumptions(concentric)


LAYOUTS = (
    ("eccentric", "bottom", "-1 m", "0 m", "at the bottom"),
    ("eccentric", "bottom", "0 m", "0 m", "at the bottom"),
    ("eccentric", "bottom", "3 m", "0 m", ""),
    ("eccentric", "top", "3 m", "0 m", "at the top"),
    ("eccentric", "top", "0 m", "0 m", ""),
    ("eccentric", "top", "-1 m", "0 m", ""),
    ("concentric", "", "0 m", "0 m", "concentric in a level run"),
    ("concentric", "", "3 m", "0 m", ""),
    ("eccentric", "bottom", "", "0 m", ""),
    ("eccentric", "bottom", "0 m", "", ""),
)


@pytest.mark.parametrize(("form", "side", "before", "here", "told"), LAYOUTS)
def test_the_flat_side_is_judged_only_where_elevations_tell(
    form: str, side: str, before: str, here: str, told: str
) -> None:
    reducer = {"kind": "reducer", "type": form, "to": {"bore": "154 mm"}} | ({"flat_side": side} if side else {})
    pipe, reducer = PIPE | ({"elevation": before} if before else {}), reducer | ({"elevation": here} if here else {})
    text = findings(line(ENTRANCE, pipe, reducer))
    assert told in text if told else "reducer" not in text


def test_a_reducer_is_judged_by_the_section_before_it_too() -> None:
    section = plant()["line"]["sections"][0]
    above = {
        **section,
        "id": "A",
        "bore": "300 mm",
        "elements": [{"id": "1", **ENTRANCE}, {"id": "2", **PIPE, "elevation": "3 m"}],
    }
    eccentric = {
        "id": "1",
        "kind": "reducer",
        "type": "eccentric",
        "flat_side": "top",
        "from": {"bore": "300 mm"},
        "elevation": "0 m",
    }
    below = {**section, "elements": [eccentric]}
    assert "at the top, and the line falls to it" in findings(plant({"line.sections": [above, below]}))
