"""Friction in straight pipe: Hazen and Williams, and the condition of the wall."""

from __future__ import annotations

import pytest
from lines import BORE, ENTRANCE, HEAD, HW, PIPE, SECTION, assumptions, faults, findings, line, lost, oil
from plants import Document, changed, found, studied

from calcpack.roughness import AGED, NEW

# --- Hazen and Williams ----------------------------------------------------------------------------------------------


@pytest.mark.parametrize("units", ["SI", "US"])
@pytest.mark.parametrize(("C", "flow"), [(120, 200), (140, 150), (100, 80)])
def test_hazen_and_williams_agree_with_the_form_of_another_book(C: int, flow: int, units: str) -> None:
    """Davis, Water and Wastewater Engineering, eq. 3-2: Q = 0.278 C D^2.63 S^0.54 (m, s); its exponents are rounded."""
    changes = {
        **HW,
        SECTION + "hazen_williams_C": str(C),
        "pump.flow.highest": f"{flow} m³/h",
        "calculation.units": units,
    }
    slope = (flow / 3600 / (0.278 * C * BORE**2.63)) ** (1 / 0.54)
    assert lost(line(PIPE, **changes)) == pytest.approx(20 * slope, rel=0.01)


def test_hazen_and_williams_need_no_roughness_unless_a_fitting_does() -> None:
    assert lost(line(ENTRANCE, PIPE, **HW)) == pytest.approx(0.5 * HEAD)
    by_length = {SECTION + "material": "commercial steel"}
    assert lost(line({"kind": "valve", "L_over_D": "13"}, **{**HW, **by_length})) > 0


def test_hazen_and_williams_are_refused_where_they_do_not_hold() -> None:
    assert "holds for water only" in faults(oil(2, PIPE, **HW))
    assert "a Reynolds number above 4000" in faults(line(PIPE, **HW, **{"pump.flow.highest": "1 m³/h"}))


OUTSIDE = (
    ({"liquid.temperature.highest": "60 °C"}, "temperature 60.00 °C"),
    ({SECTION + "hazen_williams_C": "45"}, "C 45"),
    ({"pump.flow.highest": "400 m³/h"}, "velocity 3.443 m/s"),
    ({"pump.flow.highest": "30 m³/h"}, "velocity 0.258 m/s"),
)


@pytest.mark.parametrize(("changes", "told"), OUTSIDE)
def test_hazen_and_williams_outside_their_usual_range_are_found(changes: Document, told: str) -> None:
    assert "outside its usual range" not in findings(line(PIPE, **HW))
    study = studied(line(PIPE, **{**HW, **changes}))
    (reason,) = [found.reason for text, found in study.findings.items() if "outside its usual range in L1" in text]
    assert told in reason


# --- condition of the wall -------------------------------------------------------------------------------------------


@pytest.mark.parametrize("units", ["SI", "US"])
def test_a_roughness_taken_from_the_table_is_an_assumption_in_the_package_s_own_unit(units: str) -> None:
    told = assumptions(line(PIPE, **{"calculation.units": units}))
    assert "commercial steel is as rough as new: " + {"SI": "0.04572 mm", "US": "0.001800 in"}[units] in told
    own = studied(line(PIPE, **{SECTION + "roughness": {"value": "0.2 mm", "source": "S1"}}))
    assert not own.assumptions and found(own, "eps").shadow == pytest.approx(0.0002)


@pytest.mark.parametrize("material", NEW)
def test_an_aged_wall_loses_more_or_is_refused(material: str) -> None:
    new, aged = (line(PIPE, **{SECTION + "material": material, SECTION + "condition": c}) for c in ("new", "aged"))
    assert lost(new) == lost(changed(new, {SECTION + "condition": None})), "new where the file says nothing"
    if material in AGED:
        assert lost(aged) > lost(new) and f"{material} has aged to" in assumptions(aged)
    else:
        assert "an aged wall is tabulated" in faults(aged)
