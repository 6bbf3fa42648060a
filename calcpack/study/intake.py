"""The inlet below a free surface: the flow through it and its submergence."""

from __future__ import annotations

from dataclasses import dataclass

from ..source.inputs import Intake
from ..value import Value
from .entry import Entry
from .state import State
from .supply import near, surface_level


@dataclass(frozen=True)
class Submergence:
    """Submergence there is and needed, and the velocity at the inlet."""

    there_is: Value
    needed: Value
    velocity: Value


_REFERENCES = {
    "bell_lip": "bell lip", "inlet_centreline": "centreline of the inlet", "inlet_mouth": "mouth of the inlet",
}  # fmt: skip


def reference(intake: Intake) -> str:
    """The line submergence counts from, in words."""
    return _REFERENCES[intake.reference]


def inlet_velocity(entry: Entry, flow: Value) -> Value:
    """Mean velocity at the inlet of the ``flow`` through it."""
    ledger, intake = entry.ledger, entry.calculation.intake
    assert intake is not None, "a velocity at the inlet needs an inlet"
    diameter = entry.value(intake.inlet_diameter, "D_i", "Diameter of the inlet")
    area = ledger.apply("inlet_area", {"D_i": diameter})
    return ledger.apply("inlet_velocity", {"Q": flow, "A_i": area})


def submergence(entry: Entry, state: State, flow: Value) -> Submergence:
    """Submergence over the inlet's reference line at the lowest level, and the least that keeps vortices out."""
    ledger, intake = entry.ledger, entry.calculation.intake
    assert intake is not None, "submergence needs an inlet"
    ledger.group("Submergence of the inlet")
    velocity = inlet_velocity(entry, flow)
    diameter = entry.value(intake.inlet_diameter, "D_i", "Diameter of the inlet")
    froude = ledger.apply("inlet_froude", {"V_i": velocity, "g": ledger.constant("g"), "D_i": diameter})
    least = ledger.apply("submergence_needed", {"D_i": diameter, "Fr": froude}, key_result=True)
    line = entry.value(intake.elevation, "z_r", f"Elevation of the {reference(intake)}")
    there_is = ledger.apply(
        "submergence", {"z_s": surface_level(entry, state), "z_r": line}, f"the {reference(intake)}", key_result=True
    )
    near(entry, there_is, intake.elevation, f"the {reference(intake)}")
    return Submergence(there_is, least, velocity)
