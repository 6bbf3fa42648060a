"""The prose of a package: purpose, method, limits of use, cautions.  It states what was done; it computes nothing."""

from __future__ import annotations

from ..references import Cite
from ..rules import PASSING
from ..source.inputs import Calculation
from ..study import Study
from .lines import Json, References

CAUTIONS = (
    "This package is prepared by a computer program from one input file. It must be reviewed, line by line, by a qualified "
    "engineer who is not its originator; where the law asks for it, a licensed engineer takes responsibility by seal and signature. "
    "The program seals, signs and certifies nothing.",
    "The program's own recomputation, printed or not, is not an independent verification. An alternate calculation, a test or a "
    "line-by-line check by another engineer is.",
    "Local codes, the owner's standards and the conditions of the permit take precedence over the criteria printed here; editions differ, and "
    "the criterion belongs to the project.",
    "NPSH required and the losses of strainers and special fittings are the makers' data; what their figures rest "
    "on is theirs to confirm. NPSH3 is the value at which the head of the first stage has dropped by 3 %: it is not freedom from cavitation.",
    "Not analysed: transients and start-up, valve closure, gas coming out of solution, vortices below the surface, pre-swirl and the "
    "shape of the intake, vortex breakers, recirculation in the pump, vibration, wear, several pumps on one line, fire-pump rules.",
)


def purpose(c: Calculation) -> list[str]:
    """What the calculation is for."""
    default = (
        f"To find whether the net positive suction head available to {c.pump.name} from {c.supply.name} exceeds what the pump requires "
        "by the margin asked for, at the worst case of level, temperature, flow and surface pressure, and whether the inlet lies deep "
        "enough below the surface."
    )
    return [c.purpose or default]


def scope(study: Study) -> list[str]:
    """What is covered: from where to where, in which states."""
    c = study.calculation
    states = [f"{part.title}: {part.scope}." for part in study.ledger.parts if part.title != "What the pump needs"]
    return [
        f"The suction side from the surface of {c.supply.name} to the suction nozzle of {c.pump.name}. Loss from the nozzle to the "
        "impeller belongs to NPSH required.",
        *states,
    ]


_DESIGN = (
    "Design route: NPSH available is the pressure on the liquid surface, as head, plus the static head, less the vapour pressure as head, "
    "less every loss between the surface and the suction nozzle. No velocity head is added: the energy at a still surface already "
    "contains what becomes velocity head at the pump."
)
_MEASURED = (
    "Measured route: NPSH available is the barometer plus the inlet gauge reading, as heads, plus the height of the gauge over the "
    "pump's datum, plus the velocity head at the tap, less the vapour pressure as head. No line loss is subtracted: the gauge has "
    "already seen it. The velocity head is added, because a static tap misses it."
)
_CARRIED = (
    "A reading on one day does not show the worst case. It is carried there by the change of the surface pressure, of the level and of the "
    "vapour pressure, and by its own losses in proportion to the flow squared."
)
_WHY = {
    "design": "The input gives a level and a line and no reading: the design route applies.",
    "measured": "The input gives readings at the pump inlet and no line: the measured route applies.",
    "both": "The input gives a line and readings: both routes apply. The model is run at the state of each reading, where the two are "
    "compared; the difference is a finding, not an error of rounding.",
}
_ROUNDING = (
    "Each line is computed from the printed values above it, in one coherent system of units ({units}), to 50 digits, and rounded for the record: "
    "to 12 and then half to even to 6 significant digits. The small figures are these values of record. A reader who computes to at least 12 "
    "digits, rounds to 12 and then half to even to 6 finds the same. A second run at full precision stands beside it (section 12): it shows what the "
    "rounding of lines does to each result. NIST GLP 9 {glp9} advises against rounding intermediate values; it is done here so that every "
    "printed line re-computes from the printed numbers, and the effect on each result is printed beside its limit."
)
_UNITS = {"SI": "m, s, kg, N, Pa", "US": "ft, s, slug, lbf"}


def method(study: Study, references: References) -> list[str]:
    """The method, why this route, and how numbers are treated."""
    words = [_WHY[study.route]]
    if study.route != "measured":
        words.append(_DESIGN)
        words.append(
            "Losses are found element by element: straight pipe by Darcy and Weisbach with the friction factor of Colebrook (laminar below "
            "Re 2 000; between 2 000 and 4 000 the factor is uncertain and the turbulent one, the greater, is taken); fittings by "
            "loss coefficients of one named set on the velocity head of their own bore; strainers by the square of the flow."
        )
    if study.route != "design":
        words.append(_MEASURED)
    if any("carried" in part.title.lower() for part in study.ledger.parts):
        words.append(_CARRIED)
    words.append(
        "Properties of water are those of the saturated liquid at the temperature of the state; a cited value replaces a look-up."
    )
    words.append(_ROUNDING.format(units=_UNITS[study.calculation.units], glp9=references.text(Cite("glp9"))))
    return words


#: Bases of the assumptions that the tool makes itself.
SILENT, INHERENT = "the file states no other value", "inherent in the method"
STANDING_ASSUMPTIONS = (
    ("The liquid is one phase and free of gas", "dissolved or entrained gas lowers NPSH available"),
    ("One inlet carries the flow of one pump", "a shared inlet or line carries more and loses more"),
)
DESIGN_ASSUMPTIONS = (
    (
        "Every loss coefficient counts on the bore of its own section",
        "a coefficient on another bore differs by the fourth power of the bores",
    ),
)
MEASURED_ASSUMPTIONS = (
    (
        "A filled gauge leg holds the pumped liquid at its temperature",
        "a colder leg is heavier: below 1 % of the leg's height for water",
    ),
    (
        "The loss between the tap and the pump's datum is negligible",
        "a loss there lowers NPSH available by its own amount",
    ),
)


def limits_note(judged: list[Json]) -> str:
    """What the limits of use mean under the verdict."""
    if all(r["verdict"] in PASSING for r in judged):
        return "The verdict holds at these values and on the safe side of each; outside them the package no longer applies."
    return (
        "These are the values computed, not permitted limits: at them not every rule is met. No limit of operation follows "
        "from this package."
    )
