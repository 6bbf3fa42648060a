"""The method of a package in words: what was done for this file, why, and within which limits.  It computes nothing."""

from __future__ import annotations

from collections.abc import Iterator

from ..assessment import Study
from ..fitting_set import SETS
from ..lookup import LIQUIDS
from ..references import Cite
from ..source.inputs import Calculation, Line
from ..study.element import from_set
from ..study.state import coldest
from ..study.supply import POINTS
from .lines import References
from .words import shared


def method(study: Study, references: References) -> list[str]:
    """The method, why this route, and how numbers are treated."""
    c, words = study.calculation, [_why(study)]
    if study.route != "measured":
        words += _design(c)
    if c.line is not None:
        words += [_losses(c.line), *_line(c)]
    if study.route != "design":
        words.append(_MEASURED)
    if any("carried" in part.title.lower() for part in study.ledger.parts):
        words.append(_CARRIED)
    words += [_needed(c), " ".join(_liquid(c))]
    words.append(_ROUNDING.format(units=_UNITS[c.units], glp9=references.text(Cite("glp9"))))
    return words


def _why(study: Study) -> str:
    c = study.calculation
    if study.route == "measured":
        return "The input gives readings at the pump inlet and no line: the measured route applies."
    start = "a pressure at a point of the pipe" if c.supply.kind in POINTS else "a level"
    line = "a pump that hangs in its sump" if c.pump.arrangement == "wet_pit" else "a line"
    if study.route == "both":
        return (
            f"The input gives {start}, {line} and readings: both routes apply. The model is run at the state of each reading, where "
            "the two are compared; the difference is a finding, not an error of rounding."
        )
    return f"The input gives {start} and {line} and no reading: the design route applies."


def _design(c: Calculation) -> Iterator[str]:
    """The design route by where the line begins, and what is taken off its result."""
    losses = "" if c.pump.arrangement == "wet_pit" else ", less every loss between {} and the suction nozzle"
    if c.supply.kind in POINTS:
        counted = c.supply.velocity_head == "counted"
        moving = ", plus the velocity head there" if counted else ""
        yield (
            "Design route: NPSH available is the absolute pressure at the point where it is known, as head, plus the height of that "
            f"point over the pump's datum{moving}, less the vapour pressure as head{losses.format('that point')}. "
            + (
                "The velocity head at the point is part of the energy there; none is added at the pump."
                if counted
                else "The velocity head at the point adds to the energy there; it is left out, which is on the safe side."
            )
        )
    else:
        yield (
            "Design route: NPSH available is the pressure on the liquid surface, as head, plus the static head, less the vapour "
            f"pressure as head{losses.format('the surface')}. No velocity head is added: the energy at a still surface already contains what "
            "becomes velocity head at the pump."
        )
    if c.supply.level is not None and c.supply.level.drawdown is not None:
        yield "While the pumps run the surface falls by the drawdown that the file states; it is taken off the level."
    if c.supply.kind == "saturated":
        yield (
            "The vessel is saturated: its liquid and its vapour are at one temperature, and the pressure on the surface is the vapour "
            "pressure itself. The two terms cancel; what is left is the static head less the losses. Both are printed, so that a "
            "reader sees them cancel."
        )
    if c.pump.arrangement == "wet_pit":
        yield (
            "The pump hangs in its sump: the losses from its bell on are its own, part of NPSH required. No line is modelled."
        )
    if coldest(c) is not None:
        yield (
            "The design route is run twice: with the warmest liquid, whose vapour pressure is highest, and with the coldest, which is the most "
            "viscous and loses most in the line. The worse of the two governs."
        )
    if c.pump.reciprocating is not None:
        yield (
            "The flow of a reciprocating pump pulsates. The head that accelerates the liquid in the line is taken off NPSH available; its form holds "
            "for a short, rigid line without a stabiliser."
        )
    if c.line is not None and c.line.withheld_head is not None:
        yield "The head that the file withholds is taken off NPSH available before it is held against NPSH required."


_STATED = {
    "L_over_D": "those stated by L/D, with the friction factor of the pipe",
    "Cv": "valves stated by their flow coefficient Cv or Kv",
    "Kv": "valves stated by their flow coefficient Cv or Kv",
    "K": "those stated by K, with that coefficient",
}


def _losses(line: Line) -> str:
    """How the losses of the line are found."""
    elements = [e for section in line.sections for e in section.elements]
    kinds = {e.kind for e in elements}
    words = []
    if "pipe" in kinds and line.loss_method == "hazen_williams":
        words.append(
            "straight pipe by the formula of Hazen and Williams, the stated method: empirical, for water in turbulent flow near room "
            "temperature; it knows neither viscosity nor roughness but one coefficient C"
        )
    elif "pipe" in kinds:
        words.append(
            "straight pipe by Darcy and Weisbach with the friction factor of Colebrook (laminar below Re 2 000; between 2 000 and 4 000 "
            "the factor is uncertain and the turbulent one, the greater, is taken)"
        )
    sets = list(dict.fromkeys(SETS[e.set or line.fitting_set].name for e in elements if from_set(e)))
    if sets:
        words.append(
            f"fittings by the loss coefficients of {' and '.join(sets)}, on the velocity head of their own bore"
        )
    words += dict.fromkeys(text for key, text in _STATED.items() for e in elements if getattr(e, key) is not None)
    if "strainer" in kinds or any(e.loss is not None for e in elements):
        words.append("strainers and other makers' losses by the square of the flow")
    if any(e.curve for e in elements):
        words.append("equipment by its maker's curve, in a straight line between two points")
    text = f"Losses are found element by element: {'; '.join(words)}."
    if len(sets) > 1:
        text += " The file mixes sets on purpose: for one and the same fitting they differ; the line of each coefficient names its set."
    if line.friction_contingency is not None:
        text += " The contingency that the file states is added to all losses."
    return text


def _line(c: Calculation) -> Iterator[str]:
    if shared(c):
        yield (
            f"Several pumps share the line. Each section carries the flow of those it serves that run ({c.pump.running} here), each with the "
            "flow of one pump; velocity, friction and losses of a section are those of its own flow."
        )
    if c.line is not None and any(e.elevation is not None for s in c.line.sections for e in s.elements):
        yield (
            "The absolute pressure is found at every point of the line whose elevation the file gives: a high point can boil although NPSH "
            "at the pump is ample."
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


def _needed(c: Calculation) -> str:
    """How NPSH required is read."""
    npsh = c.pump.npsh_required
    words = ["NPSH required is the maker's figure at the flow it is stated for."]
    if npsh.points:
        words = [
            "NPSH required is read from the maker's curve at the flow of each result, "
            + (
                "by a smooth curve through its points, as the file asks."
                if npsh.interpolation == "smooth"
                else "in a straight line between two of its points: on the safe side of a curve that bends upwards, and a checker does it by hand."
            )
        ]
    if c.pump.speed is not None and npsh.speed is not None and c.pump.speed.quantity.si() != npsh.speed.quantity.si():
        words.append(
            "It is carried from the speed of the curve to the speed of operation: the flow with the ratio of speeds, NPSH required "
            "with a power of it."
        )
    if npsh.datum_elevation is not None:
        words.append(
            "It counts from another elevation than the pump's datum; NPSH available is shifted there, on a line of its own, before "
            "the two are compared."
        )
    return " ".join(words)


def _liquid(c: Calculation) -> Iterator[str]:
    """Where the properties of the liquid come from."""
    liquid = c.liquid
    known = LIQUIDS.get(liquid.name)
    if liquid.table:
        yield (
            f"Properties of {liquid.name} are read between two rows of the file's table at the temperature of the state: density in a straight line, "
            "the logarithms of vapour pressure and viscosity in a straight line over the inverse of absolute temperature."
        )
    elif known is None:
        yield f"Properties of {liquid.name} are the file's, cited at the temperature of the state."
        return
    if known is not None and known.mixture:
        yield f"Properties of {liquid.name} are looked up at the temperature of the state and the share dissolved."
        if liquid.vapour_pressure is None and known.mixture == "mass_fraction":
            yield (
                "Its vapour pressure is that of its water by Raoult's law."
                if liquid.vapour_pressure_of == "raoult"
                else "Its vapour pressure is taken as that of pure water, which is higher: the safe side."
            )
    elif known is not None:
        yield f"Properties of {liquid.name} are those of the saturated liquid at the temperature of the state."
    yield "A cited value replaces a look-up."


_ROUNDING = (
    "Each line is computed from the printed values above it, in one coherent system of units ({units}), to 50 digits, and rounded for the record: "
    "to 12 and then half to even to 6 significant digits. The small figures are these values of record. A reader who computes to at least 12 "
    "digits, rounds to 12 and then half to even to 6 finds the same. A second run at full precision stands beside it (section 12): it shows what the "
    "rounding of lines does to each result. NIST GLP 9 {glp9} advises against rounding intermediate values; it is done here so that every "
    "printed line re-computes from the printed numbers, and the effect on each result is printed beside its limit."
)
_UNITS = {"SI": "m, s, kg, N, Pa", "US": "ft, s, slug, lbf"}
