"""A quantity as typed: a number, a unit from the white list and, for a pressure, what it counts from.

The grammar is narrow on purpose: what it does not read exactly, it refuses with the line to write instead.
"""

from __future__ import annotations

import re
from dataclasses import dataclass
from decimal import Decimal
from fractions import Fraction
from functools import cache

from .faults import listed, shown
from .kinds import BARE, KINDS, Kind, Reference
from .misread import MOST_DIGITS, REID, QuantityFault, too_long, unknown_unit, unreadable, with_units
from .units import CARRIED, COHERENT, PLANT, SPELLINGS, Unit, conversion, unit

__all__ = ["COHERENT", "KINDS", "PLANT", "Quantity", "QuantityFault", "Unit", "conversion", "parse", "unit"]

#: What each dimension is called when a unit of the wrong one is typed.
_MEASURES = {
    "length": "a length",
    "area": "an area",
    "velocity": "a velocity",
    "acceleration": "an acceleration",
    "flow": "a flow",
    "pressure": "a pressure",
    "density": "a density",
    "dynamic_viscosity": "a dynamic viscosity",
    "kinematic_viscosity": "a kinematic viscosity",
    "specific_weight": "a specific weight",
    "temperature": "a temperature",
    "lapse_rate": "a lapse rate",
    "speed": "a speed of rotation",
    "ratio": "a ratio",
}
#: The same of the units of a ratio.
_SHARES = {"%": "a percentage", "g/kg": "a mass fraction"}

_REFERENCES: dict[str, Reference] = {
    "gauge": "gauge",
    "gage": "gauge",
    "absolute": "absolute",
    "abs": "absolute",
    "vacuum": "vacuum",
}
_MINUS = ("-", "\u2212")
#: A number as it must be typed.  Its exponent is capped so that no text can ask for a number of unreasonable size.
_NUMBER = re.compile(r"([+\-\u2212]?)([0-9]+(?:\.[0-9]+)?(?:[eE][+\-]?[0-9]{1,2})?)(?![0-9.,eE/])")
#: No gauge on Earth reads lower than this below its barometer: no barometer recorded is above 1 090 hPa.
_FULL_VACUUM = Fraction(110_000)


@dataclass(frozen=True)
class Quantity:
    """A value as the engineer typed it.

    ``text`` keeps the digits typed, with ``.`` and ``-``; ``reference`` is what a pressure counts from.
    """

    number: Decimal
    text: str
    unit: Unit
    reference: Reference | None = None

    def si(self) -> Fraction:
        """The exact value in SI; a gauge or vacuum pressure stays a number above or below its barometer."""
        return (Fraction(self.number) + self.unit.offset) * self.unit.factor


def parse(text: str, kind: str) -> Quantity:
    """Read ``text`` as a quantity of ``kind`` (a key of :data:`KINDS`), exactly.

    Raises :class:`QuantityFault` for anything else: what was wanted, what was found, what to write instead.
    """
    asked = KINDS[kind]
    wanted = f"{asked.words}, such as {listed(asked.examples)}"
    if kind == "vapour_pressure" and re.search("rvp|reid", text, re.IGNORECASE):
        raise QuantityFault("reid", wanted, f"{shown(text)}: {REID}")
    text = text.strip(" \t\r\n")
    match = _NUMBER.match(text)
    if match is None:
        raise unreadable(text, wanted, kind)
    sign, digits = match.groups()
    typed = ("-" if sign in _MINUS else "") + digits if sign and Decimal(digits) else digits
    rest = text[match.end() :].strip(" \t")
    if rest[:1].isdigit() and rest not in SPELLINGS:
        raise unreadable(text, wanted, kind)
    if len(re.sub("[eE].*|[.]", "", digits.removeprefix("0."))) > MOST_DIGITS:
        raise too_long(typed, text[match.end() :], wanted, text)
    name, reference = _split_reference(rest, text, wanted)
    if kind in BARE and not rest:
        name = "1"
    elif not rest:
        raise QuantityFault("bare number", wanted, f"{shown(text)}: a value needs its unit", with_units(typed, kind))
    if name not in SPELLINGS or (name == "1" and rest):
        raise unknown_unit(typed, name, reference, kind, wanted, text)
    found = unit(name)
    if kind == "temperature_difference" and found.offset:
        raise QuantityFault("unit", wanted, f"{shown(text)}: {found.name} has a zero of its own")
    if found.kind not in asked.dimensions or (found.kind == "ratio" and found.name not in (asked.units or ("1",))):
        measures = _SHARES.get(found.name) or _MEASURES[found.kind]
        raise QuantityFault("dimension", wanted, f"{shown(text)}: {found.name} measures {measures}")
    value = Quantity(Decimal(typed), typed, found, reference)
    _check_reference(value, asked, wanted, text)
    _check_existence(value, asked, wanted, text)
    _check_size(value, asked, text)
    return value


def _split_reference(rest: str, text: str, wanted: str) -> tuple[str, Reference | None]:
    """The unit's name and what the pressure counts from, as a word after the unit or as its ending."""
    name, reference = rest, None
    head, _, last = rest.rpartition(" ")
    if head and last in _REFERENCES:
        name, reference = head.rstrip(" "), _REFERENCES[last]
    if name in CARRIED:
        name, carried = CARRIED[name]
        if reference not in (None, carried):
            raise QuantityFault("reference", wanted, f"{shown(text)}, which says both {carried} and {reference}")
        reference = carried
    return name, reference


def _check_reference(value: Quantity, asked: Kind, wanted: str, text: str) -> None:
    plain = f"{value.text} {value.unit.name}"
    if value.reference and not asked.references:
        why = "a pressure difference counts from nothing" if value.unit.kind == "pressure" else "that is no pressure"
        raise QuantityFault("reference", wanted, f"{shown(text)}: {why}", f"write `{plain}`")
    if asked.references and value.reference not in asked.references:
        found = (
            f"which counts from {_COUNTS[value.reference]}"
            if value.reference
            else (f"which does not say {listed(asked.references)}")
        )
        hint = listed(f"`{plain} {word}`" for word in asked.references)
        raise QuantityFault("reference", wanted, f"{shown(text)}, {found}", "" if value.reference else f"write {hint}")


_COUNTS = {"gauge": "the barometer", "absolute": "zero pressure", "vacuum": "the barometer downwards"}


#: Powers of ten beyond which a number is a slip of the hand, whatever its kind.
_LARGEST_POWER = 12


@cache
def _size(text: str) -> Fraction:
    """A limit of a range in SI."""
    number, _, name = text.partition(" ")
    return Fraction(number) * unit(name or "1").factor


def _limit(text: str, typed: Unit) -> str:
    """A limit of a range, in the unit typed too: ``20 kPa (2.901 psi)``."""
    if not text or text.rpartition(" ")[2] == typed.name or typed.name == "1":
        return text
    return f"{text} ({Decimal(f'{float(_size(text) / typed.factor - typed.offset):.4g}'):f} {typed.name})"


def _check_size(value: Quantity, asked: Kind, text: str) -> None:
    """Refuse what is not met in practice: the unit is most often the slip."""
    hint = "check the unit and the decimal point" if value.unit.name != "1" else "check the decimal point"
    lowest, highest = asked.ranges[asked.dimensions.index(value.unit.kind)] if asked.ranges else ("", "")
    if (lowest and value.si() < _size(lowest)) or (highest and value.si() > _size(highest)):
        low, high = (_limit(each, value.unit) for each in (lowest, highest))
        limits = f"from {low} to {high}" if lowest else f"of at most {high}"
        raise QuantityFault("range", f"{asked.words}, {limits}", shown(text), hint)
    if value.number and abs(value.number.adjusted()) > _LARGEST_POWER:
        raise QuantityFault("range", asked.words, f"{shown(text)}, which is no size met in practice", hint)


def _check_existence(value: Quantity, asked: Kind, wanted: str, text: str) -> None:
    """Refuse what cannot exist."""
    si = value.si()
    if value.unit.kind == "temperature" and si < 0:
        raise QuantityFault("range", wanted, f"{shown(text)}, which is below absolute zero (-273.15 °C, -459.67 °F)")
    if value.reference == "absolute" and si < 0:
        raise QuantityFault(
            "range",
            wanted,
            f"{shown(text)}: an absolute pressure cannot be below zero",
            f"if the gauge read this, write `{value.text} {value.unit.name} gauge`"
            if "gauge" in asked.references
            else "",
        )
    if value.reference == "vacuum" and si < 0:
        positive = f"{value.text.lstrip('-')} {value.unit.name} vacuum"
        raise QuantityFault("range", wanted, f"{shown(text)}: a vacuum is a positive number", f"write `{positive}`")
    below = {"gauge": -si, "vacuum": si}.get(value.reference or "", Fraction(0))
    if below > _FULL_VACUUM:
        raise QuantityFault(
            "range", wanted, f"{shown(text)}, which is below a full vacuum (110 kPa under any barometer)"
        )
    if (asked.sign == "positive" and si <= 0) or (asked.sign == "not negative" and si < 0):
        rule = "above zero" if asked.sign == "positive" else "zero or more"
        raise QuantityFault("range", wanted, f"{shown(text)}: it must be {rule}")
