"""Where NPSH available does not move as it does from an open surface with a thin liquid, and where it does.

``test_study.py`` holds the properties of the ordinary plant: the length, level and flow, and the agreement of both routes.
"""

from __future__ import annotations

from typing import Any

import pytest
from hypothesis import given, settings
from hypothesis import strategies as st
from plants import INTAKE, found, plant, studied

EXAMPLES = settings(max_examples=30, deadline=None)
G = 9.80665


def number(low: float, high: float, decimals: int = 2) -> st.SearchStrategy[float]:
    return st.integers(int(low * 10**decimals), int(high * 10**decimals)).map(lambda n: n / 10**decimals)


SYSTEMS = st.fixed_dictionaries({
    "length": number(2, 60), "level": number(-2, 8), "flow": number(120, 260, 0), "K": number(0, 3),
    "temperature": number(5, 70, 1), "barometer": number(85, 104, 1), "bore": number(180, 300, 1),
})  # fmt: skip
System = dict[str, float]


def changes(system: System) -> dict[str, Any]:
    """The invented plant with the numbers of a random system; the pump is small enough to be judged at every flow."""
    return {
        "site.barometer.lowest": f"{system['barometer']} kPa absolute",
        "liquid.temperature.highest": f"{system['temperature']} °C",
        "supply.level.lowest": f"{system['level']} m",
        "pump.flow.highest": f"{system['flow']} m³/h",
        "pump.npsh_required.at_flow": "300 m³/h",
        "line.sections.0.bore": f"{system['bore']} mm",
        "line.sections.0.elements.1.length": f"{system['length']} m",
        "line.sections.0.elements.3.K": system["K"],
    }


def available(document: dict[str, Any]) -> float:
    """NPSH available of the design route at the worst case, at full precision."""
    return studied(document).judged[0].available.npsh.shadow


@EXAMPLES
@given(SYSTEMS, number(30, 70, 1), number(0.5, 10, 1))
def test_it_falls_when_a_thin_liquid_warms_under_an_open_surface(system: System, warm: float, step: float) -> None:
    """Water from 30 °C in a line of modest loss; the next tests show where it does not hold."""
    base = changes(system | {"length": min(system["length"], 10), "temperature": warm})
    warmer = base | {"liquid.temperature.highest": f"{warm + step:.1f} °C"}
    assert available(plant(warmer)) < available(plant(base))


def test_cold_water_in_a_long_line_gains_by_warming() -> None:
    """Below some 20 °C a kelvin costs millimetres of vapour pressure, while a thinner liquid loses less on a long line."""
    base = {
        "line.sections.0.elements.1.length": "400 m", "line.sections.0.material": "plastic",
        "supply.level.lowest": "8 m", "liquid.temperature.highest": "5 °C",
    }  # fmt: skip
    assert available(plant(base | {"liquid.temperature.highest": "10 °C"})) > available(plant(base))


OIL = {
    "liquid.name": "oil", "liquid.source": "S1", "liquid.status": "verified",
    "liquid.table": [
        {"temperature": "10 °C", "density": "960 kg/m³", "viscosity": "900 cSt", "vapour_pressure": "10 Pa absolute"},
        {"temperature": "60 °C", "density": "925 kg/m³", "viscosity": "60 cSt", "vapour_pressure": "90 Pa absolute"},
    ],
}  # fmt: skip


@EXAMPLES
@given(number(12, 20, 1), number(1, 5, 1))
def test_a_viscous_liquid_gains_by_warming(cold: float, step: float) -> None:
    """As long as the flow stays laminar; where it turns, the friction factor jumps, and warming may cost."""
    base = OIL | {"liquid.temperature.highest": f"{cold} °C", "line.fitting_set": "hooper_2k"}
    warmer = base | {"liquid.temperature.highest": f"{cold + step:.1f} °C"}
    assert available(plant(warmer)) > available(plant(base))


SATURATED = {"supply.kind": "saturated", "intake": INTAKE}


@EXAMPLES
@given(SYSTEMS, number(1, 10, 1))
def test_a_saturated_vessel_knows_no_barometer_and_hardly_a_temperature(system: System, step: float) -> None:
    """Surface pressure and vapour pressure are one: what is left moves only by the losses, through the viscosity."""
    base = changes(system) | SATURATED
    here = studied(plant(base))
    losses = found(here, "h_L").shadow
    assert here.judged[0].available.npsh.shadow == pytest.approx(system["level"] - losses, abs=1e-9)
    higher = base | {"site.barometer.lowest": "105 kPa absolute"}
    assert available(plant(higher)) == here.judged[0].available.npsh.shadow
    warmer = base | {"liquid.temperature.highest": f"{system['temperature'] + step:.1f} °C"}
    assert available(plant(warmer)) >= here.judged[0].available.npsh.shadow


@EXAMPLES
@given(SYSTEMS, number(1, 20, 0))
def test_a_pressurised_vessel_gains_by_its_pressure_not_by_the_barometer_where_it_is_absolute(
    system: System, step: float
) -> None:
    vessel = changes(system) | {"supply.kind": "gas_blanketed", "supply.pressure": {"lowest": "150 kPa absolute"}}
    here = available(plant(vessel))
    assert available(plant(vessel | {"site.barometer.lowest": "80 kPa absolute"})) == here
    assert available(plant(vessel | {"supply.pressure": {"lowest": f"{150 + step} kPa absolute"}})) > here


def test_the_measured_route_rises_with_flow_at_one_reading() -> None:
    """More flow at the same gauge reading means more velocity head there: the gauge had already seen the losses."""
    slow = studied(plant(line=False, readings=1))
    fast = studied(plant({"readings.0.flow": "240 m³/h"}, line=False, readings=1))
    assert found(fast, "NPSHA_m").shadow > found(slow, "NPSHA_m").shadow
