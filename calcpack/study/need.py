"""What the pump needs: NPSH required with its margin, submergence, and the temperature that should have been used."""

from __future__ import annotations

from dataclasses import dataclass

from ..lookup import WATER_RANGE
from ..source.inputs import Intake, NpshRequired
from ..value import Value
from .entry import Entry
from .liquid import temperature_of
from .npsh import Available, near
from .state import State, warmest


@dataclass(frozen=True)
class Needed:
    """NPSH needed: the maker's value, each margin asked for, the greater, and the words of the criterion."""

    required: Value
    at_flow: Value
    limit: Value
    governs: str
    criterion: str


def needed(entry: Entry) -> Needed:
    """NPSH required with its margin, ratio and difference, the greater governing."""
    ledger, pump, asked = entry.ledger, entry.calculation.pump, entry.calculation.criteria
    npsh = pump.npsh_required
    if npsh.datum.casefold() != pump.datum.casefold():
        entry.find(
            f"NPSH required counts from “{npsh.datum}”, NPSH available from “{pump.datum}”",
            "they are compared as if both were one elevation; where they differ, NPSH required needs a shift",
        )
    ledger.group("NPSH needed")
    required = entry.value(npsh.value, "NPSHR", f"NPSH required, {npsh.basis}", note=_curve(npsh))
    at_flow = entry.typed(npsh.at_flow, "Q_r", "Flow at which NPSH required is stated")
    words: list[str] = []
    by_ratio = by_difference = None
    if asked.ratio is not None:
        ratio = entry.value(asked.ratio, "m_r", "Margin ratio asked for")
        by_ratio = ledger.apply("needed_by_ratio", {"m_r": ratio, "NPSHR": required})
        words.append(f"{asked.ratio.text} × NPSHR")
    if asked.difference is not None:
        difference = entry.value(asked.difference, "m_d", "Margin difference asked for")
        by_difference = ledger.apply("needed_by_difference", {"m_d": difference, "NPSHR": required})
        words.append(f"NPSHR + {asked.difference.text}")
    if by_ratio and by_difference:
        limit = ledger.apply("needed_greater", {"N_r": by_ratio, "N_d": by_difference})
        governs = "the ratio governs" if by_ratio.record == limit.record else "the difference governs"
    elif by_ratio:
        limit = ledger.apply("needed_ratio_alone", {"N_r": by_ratio})
        governs = "the ratio is the only margin asked for"
    else:
        assert by_difference is not None, "source asks for a margin"
        limit = ledger.apply("needed_difference_alone", {"N_d": by_difference})
        governs = "the difference is the only margin asked for"
    criterion = "NPSH available at least " + (
        words[0] if len(words) == 1 else f"the greater of {words[0]} and {words[1]}"
    )
    return Needed(required, at_flow, limit, governs, criterion)


def _curve(npsh: NpshRequired) -> str:
    """What the maker's figure holds for, in words."""
    parts = [f"{npsh.certified} curve {npsh.curve}"]
    parts += [given.text for given in (npsh.speed, npsh.impeller) if given is not None]
    return ", ".join([*parts, f"counted from the {npsh.datum}"])


def margins(entry: Entry, available: Available, need: Needed) -> None:
    """Margin ratio and margin difference, printed whichever of them is asked for."""
    entry.ledger.group(f"Margin, {available.about}")
    for name in ("margin_ratio", "margin_difference"):
        entry.ledger.apply(name, {"NPSHA": available.npsh, "NPSHR": need.required}, available.about)


@dataclass(frozen=True)
class Submergence:
    """Submergence there is and needed."""

    there_is: Value
    needed: Value


def reference(intake: Intake) -> str:
    """The line submergence counts from, in words."""
    return "bell lip" if intake.reference == "bell_lip" else "centreline of the inlet"


def submergence(entry: Entry, state: State, flow: Value) -> Submergence:
    """Submergence over the inlet's reference line at the lowest level, and the least that keeps vortices out."""
    ledger, intake = entry.ledger, entry.calculation.intake
    assert intake is not None and state.level is not None, "submergence needs an inlet and a level"
    ledger.group("Submergence of the inlet")
    diameter = entry.value(intake.inlet_diameter, "D_i", "Diameter of the inlet")
    area = ledger.apply("inlet_area", {"D_i": diameter})
    velocity = ledger.apply("inlet_velocity", {"Q": flow, "A_i": area})
    froude = ledger.apply("inlet_froude", {"V_i": velocity, "g": ledger.constant("g"), "D_i": diameter})
    least = ledger.apply("submergence_needed", {"D_i": diameter, "Fr": froude}, key_result=True)
    level = entry.value(state.level, "z_s", "Level of the surface, lowest")
    line = entry.value(intake.elevation, "z_r", f"Elevation of the {reference(intake)}")
    there_is = ledger.apply("submergence", {"z_s": level, "z_r": line}, f"the {reference(intake)}", key_result=True)
    near(entry, there_is, intake.elevation, f"the {reference(intake)}")
    return Submergence(there_is, least)


#: Above this temperature, K, a step warmer would leave the range of the look-up.
WARMEST_WITH_COST = WATER_RANGE[1] - 10


def cost_of_temperature(entry: Entry, state: State) -> Value | None:
    """Head that one step of temperature above the one used would take, where the liquid can be looked up there."""
    liquid = entry.calculation.liquid
    if liquid.name != "water" or liquid.vapour_pressure is not None:
        return None
    ledger = entry.ledger
    ledger.group("What a warmer liquid would cost")
    temperature = temperature_of(entry, state)
    if temperature.shadow > WARMEST_WITH_COST:
        return None
    warmer = ledger.apply("warmer_temperature", {"T": ledger.convert(temperature), "dT": ledger.constant("dT")})
    p_v = entry.look_up("vapour_pressure", temperature, state.temperature)
    p_x = entry.look_up("vapour_pressure", warmer, state.temperature)
    density = entry.look_up("density", temperature, state.temperature)
    weight = ledger.apply("specific_weight", {"rho": density, "g": ledger.constant("g")})
    return ledger.apply("cost_of_temperature", {"p_x": p_x, "p_v": p_v, "gamma": weight})


def highest_temperature(entry: Entry) -> Value | None:
    """The highest temperature expected, where the file gives it; a warmer reading goes before what was expected."""
    extreme, given = warmest(entry.calculation)
    if extreme != "highest":
        return None
    warmer = [r for r in entry.calculation.readings if r.temperature.quantity.si() > given.quantity.si()]
    if warmer:
        hottest = max(warmer, key=lambda r: r.temperature.quantity.si())
        return entry.typed(hottest.temperature, "T", f"Temperature of the liquid, {hottest.name}")
    return entry.typed(given, "T", "Temperature of the liquid, highest")
