"""The prose of a package: purpose, scope, standing assumptions, limits of use, cautions.  It computes nothing."""

from __future__ import annotations

from ..assessment import Study
from ..source.inputs import Calculation
from ..study import mistakes
from ..study.supply import POINTS
from ..verdict import PASSING
from .lines import Json

_REVIEW = (
    "This package is prepared by a computer program from one input file. It must be reviewed, line by line, by a qualified "
    "engineer who is not its originator; where the law asks for it, a licensed engineer takes responsibility by seal and signature. "
    "The program seals, signs and certifies nothing.",
    "The program's own recomputation, printed or not, is not an independent verification. An alternate calculation, a test or a "
    "line-by-line check by another engineer is.",
    "Local codes, the owner's standards and the conditions of the permit take precedence over the criteria printed here; editions differ, and "
    "the criterion belongs to the project.",
    "NPSH required and the losses of strainers and special fittings are the makers' data; what their figures rest "
    "on is theirs to confirm. NPSH3 is the value at which the head of the first stage has dropped by 3 %: it is not freedom from cavitation.",
)


def cautions(c: Calculation) -> list[str]:
    """What a user of the package must know; last, what was not analysed."""
    left_out = [
        "transients and start-up", "valve closure", "gas coming out of solution", "vortices below the surface",
        "pre-swirl and the shape of the intake", "vortex breakers", "recirculation in the pump", "vibration", "wear",
    ]  # fmt: skip
    if not shared(c):
        left_out.append("several pumps on one line")
    if c.pump.reciprocating is not None:
        left_out.append("pulsation beyond the acceleration head")
    if c.supply.kind == "saturated":
        left_out.append("a fall of pressure in the vessel")
    left_out.append("fire-pump rules")
    return [*_REVIEW, f"Not analysed: {', '.join(left_out)}."]


def shared(c: Calculation) -> bool:
    """Whether a section of the line serves several pumps."""
    return c.line is not None and any(section.pumps > 1 for section in c.line.sections)


def _start(c: Calculation) -> str:
    """Where the modelled suction side begins, in words."""
    if c.supply.kind in POINTS:
        return c.supply.point or c.supply.name
    return f"the surface of {c.supply.name}"


def purpose(c: Calculation) -> list[str]:
    """What the calculation is for."""
    varies = ["temperature", "flow"]
    if c.supply.level is not None:
        varies.insert(0, "level")
    varies.append(f"pressure at {_start(c)}" if c.supply.kind in POINTS else "surface pressure")
    inlet = ", and whether the inlet lies deep enough below the surface" if c.intake is not None else ""
    default = (
        f"To find whether the net positive suction head available to {c.pump.name} from {c.supply.name} exceeds what the pump requires "
        f"by the margin asked for, at the worst case of {', '.join(varies[:-1])} and {varies[-1]}{inlet}."
    )
    return [c.purpose or default]


#: Parts of the computation that are no state of their own.
_BESIDE = ("What the pump needs", "What the rules compare", mistakes.PART)


def scope(study: Study) -> list[str]:
    """What is covered: from where to where, in which states."""
    c = study.calculation
    if c.pump.arrangement == "wet_pit":
        covered = f"The suction side from {_start(c)} to the bell of {c.pump.name}. Loss inside the pump belongs to NPSH required."
    elif study.route == "measured":
        covered = f"The inlet of {c.pump.name} as measured by its gauge. Loss from there to the impeller belongs to NPSH required."
    else:
        covered = (
            f"The suction side from {_start(c)} to the suction nozzle of {c.pump.name}. Loss from the nozzle to the "
            "impeller belongs to NPSH required."
        )
    return [covered, *(f"{p.title}: {p.scope}." for p in study.ledger.parts if p.blocks and p.title not in _BESIDE)]


#: Bases of the assumptions that the tool makes itself.
SILENT, INHERENT, INTENDED = "the file states no other value", "inherent in the method", "intended, as the file states"


def standing(study: Study) -> list[tuple[str, str]]:
    """Assumptions inherent in the method, with what they may cost."""
    c = study.calculation
    found = [("The liquid is one phase and free of gas", "dissolved or entrained gas lowers NPSH available")]
    if not shared(c):
        found.append(
            ("One inlet carries the flow of one pump", "a shared inlet or line carries more and loses more"),
        )
    elif c.pump.running > 1:
        found.append(
            ("The pumps that run share the flow alike", "the one that takes more loses more, and needs more"),
        )
    if c.line is not None:
        found.append(
            ("Every loss coefficient counts on the bore of its own section",
             "a coefficient on another bore differs by the fourth power of the bores"),
        )  # fmt: skip
    if c.supply.kind == "saturated":
        found.append(
            ("Liquid and vapour in the vessel are in equilibrium at one temperature",
             "while the vessel's pressure falls, warmer liquid in the line boils sooner"),
        )  # fmt: skip
    if c.readings:
        found += [
            ("A filled gauge leg holds the pumped liquid at its temperature",
             "a colder leg is heavier: below 1 % of the leg's height for water"),
            ("The loss between the tap and the pump's datum is negligible",
             "a loss there lowers NPSH available by its own amount"),
        ]  # fmt: skip
    return found


def limits_note(judged: list[Json]) -> str:
    """What the limits of use mean under the verdict."""
    if all(r["verdict"] in PASSING for r in judged):
        return "The verdict holds at these values, and on the safe side of each that has one; outside them the package no longer applies."
    short = [
        word
        for verdict, word in (("not met", "met"), ("not assessed", "assessed"))
        if any(r["verdict"] == verdict for r in judged)
    ]
    return (
        f"These are the values computed, not permitted limits: at them not every rule is {' or '.join(short)}. "
        "No limit of operation follows from this package."
    )
