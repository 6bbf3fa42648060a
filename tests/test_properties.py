"""What must hold for every plant: NPSH available moves the right way, and the two routes agree on one physical state.

Where a property does not hold, that is said beside it, with a plant that shows it.
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
@given(SYSTEMS, number(0.1, 5))
def test_it_falls_when_the_line_grows_the_pump_rises_or_the_level_falls(system: System, step: float) -> None:
    base = changes(system)
    here = available(plant(base))
    longer = base | {"line.sections.0.elements.1.length": f"{system['length'] + step:.2f} m"}
    higher = base | {"pump.datum_elevation.value": f"{step} m"}
    lower = base | {"supply.level.lowest": f"{system['level'] - step:.2f} m"}
    assert available(plant(longer)) < here
    assert available(plant(higher)) == pytest.approx(here - step, abs=1e-9)
    assert available(plant(lower)) == pytest.approx(here - step, abs=1e-9)


@EXAMPLES
@given(SYSTEMS, number(1, 20, 0))
def test_it_falls_when_the_flow_rises_from_an_open_surface(system: System, step: float) -> None:
    base = changes(system)
    more = base | {"pump.flow.highest": f"{system['flow'] + step} m³/h"}
    assert available(plant(more)) < available(plant(base))


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


@EXAMPLES
@given(SYSTEMS, number(-1, 2), number(150, 300, 1))
def test_both_routes_agree_on_one_physical_state(system: System, gauge: float, tap: float) -> None:
    """A gauge reading made by the energy balance of the design route gives the same NPSH, whatever the bore at the tap."""
    reading = {
        "readings.0.flow": f"{system['flow']} m³/h", "readings.0.temperature": f"{system['temperature']} °C",
        "readings.0.barometer": f"{system['barometer']} kPa absolute", "readings.0.level": f"{system['level']} m",
        "readings.0.gauge.elevation": f"{gauge} m", "readings.0.gauge.tap.bore": f"{tap} mm",
    }  # fmt: skip
    design = studied(plant(changes(system)))
    weight, lost = found(design, "gamma").shadow, found(design, "h_L").shadow
    velocity = system["flow"] / 3600 / (3.141592653589793 * (tap / 1000) ** 2 / 4)
    head = system["level"] - lost - gauge - velocity**2 / (2 * G)
    reading["readings.0.gauge.pressure"] = f"{head * weight / 1000:.7f} kPa gauge"
    both = studied(plant(changes(system) | reading, readings=1))
    assert both.route == "both"
    assert both.differences[0].value.shadow == pytest.approx(0, abs=1e-6)
    printed = found(both, "NPSHA_d").record - found(both, "NPSHA_m").record
    assert abs(float(printed)) < 2e-3


def test_the_measured_route_rises_with_flow_at_one_reading() -> None:
    """More flow at the same gauge reading means more velocity head there: the gauge had already seen the losses."""
    slow = studied(plant(line=False, readings=1))
    fast = studied(plant({"readings.0.flow": "240 m³/h"}, line=False, readings=1))
    assert found(fast, "NPSHA_m").shadow > found(slow, "NPSHA_m").shadow
