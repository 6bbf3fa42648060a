"""A text that is not a quantity: why it could not be read, and what was probably meant."""

from __future__ import annotations

import re
import unicodedata
from decimal import Context, Decimal
from fractions import Fraction

from .faults import listed, nearest, shown
from .kinds import BARE, KINDS
from .units import CARRIED, SPELLINGS, UNITS

#: What people write that is not on the list of units, by what they mean.
_MEANT = {
    typed: name
    for name, words in {
        "°C": "C|c|ºC|deg C|celsius|Celsius", "°F": "F|f|ºF|deg F|fahrenheit|Fahrenheit", "°R": "R",
        "K": "kelvin|°K",
        "ft": "feet|foot|'", "in": 'inch|inches|"', "m": "metre|metres|meter|meters|mtr",
        "m³/h": "cbm/h|cmh|m³", "L/s": "lps", "L/min": "lpm", "gal/min": "gal",
        "cSt": "cst", "cP": "cp|cps", "lb/ft³": "lbs/ft³|pcf", "psi": "lb/in²|lbs", "kgf/cm²": "at",
        "mH2O": "mwc|mWC|m of water", "ftH2O": "ft of water", "inHg": '"Hg|in Hg|in. Hg', "mmHg": "mm Hg",
        "r/min": "rev|r.p.m.", "%": "percent|wt%|wt %|% w/w", "g/kg": "psu|PSU|ppt|‰",
    }.items()
    for typed in words.split("|")
}  # fmt: skip
#: Letters of another alphabet that look like ours.
_LOOK_ALIKE = str.maketrans("аВСсеКкМмНоОРрТтх", "aBCceKkMmHoOPpTtx")
#: Digits of a typed number.
MOST_DIGITS = 10
_FRACTION = re.compile(r"(?:([0-9]{1,4})[ -])?([0-9]{1,3})/([0-9]{1,3})(?![0-9.,/])")
_GROUPED = re.compile(r"[+\-\u2212]?[0-9]{1,3}(?:[ '’][0-9]{3})+(?:\.[0-9]+)?(?![0-9.,])")
_COMMA = re.compile(r"([+\-\u2212]?[0-9]+),([0-9]+)(?![0-9.,])")


#: Why a Reid vapour pressure cannot stand for the true one.
REID = (
    "a Reid vapour pressure is measured at 37.8 °C with four volumes of vapour to one of liquid and air: it is not the "
    "true vapour pressure, and lies below it for volatile mixtures"
)


class QuantityFault(ValueError):
    """A text that is not the quantity wanted; says what was wanted, what was found and what to write."""

    def __init__(self, kind: str, wanted: str, found: str, suggestion: str = "") -> None:
        self.kind, self.wanted, self.found, self.suggestion = kind, wanted, found, suggestion
        super().__init__(f"wanted {wanted}; found {found}" + (f"; {suggestion}" if suggestion else ""))


def with_units(number: str, kind: str) -> str:
    """``write `38 m` or `38 ft```: the number with the usual units of its kind."""
    tails = [example.split(" ", 1)[1] for example in KINDS[kind].examples if " " in example]
    if "%" in KINDS[kind].units and abs(Decimal(number)) < 1:
        number, tails = f"{(Decimal(number) * 100).normalize():f}", ["%"]
    return "write " + listed(f"`{number} {tail}`" for tail in tails)


def unknown_unit(number: str, name: str, reference: str | None, kind: str, wanted: str, text: str) -> QuantityFault:
    """A unit that is not on the list, or not in that spelling."""
    asked = KINDS[kind]
    if kind in BARE:
        return QuantityFault("unit", wanted, shown(text), f"write `{number}`")
    choices = [spelling for spelling, of in SPELLINGS.items() if UNITS[of].kind in asked.dimensions and spelling != "1"]
    plain = unicodedata.normalize("NFKC", name).replace("^", "").translate(_LOOK_ALIKE)
    flat = re.sub(r"(?<=[a-zA-Z])3", "³", re.sub(r"(?<=[a-zA-Z])2(?!O)", "²", plain))
    candidates = (*(_MEANT.get(each) for each in (name, flat, plain)), SPELLINGS.get(plain))
    meant = next((candidate for candidate in candidates if candidate), "")
    if not meant or UNITS[meant].kind not in asked.dimensions:
        near = nearest(name, [*choices, *CARRIED] if asked.references else choices)
        meant = near if near in CARRIED else SPELLINGS.get(near, "")
    if meant:
        endings = [""] if meant in CARRIED or not asked.references else [f" {r}" for r in asked.references]
        if reference and meant not in CARRIED:
            endings = [f" {reference}"]
        hint = "write " + listed(f"`{number} {meant}{ending}`" for ending in endings)
    else:
        hint = with_units(number, kind)
    return QuantityFault("unit", wanted, f"{shown(text)}: the unit {shown(name)} is not known", hint)


def too_long(number: str, rest: str, wanted: str, text: str) -> QuantityFault:
    """A number of more digits than a column of the pages holds, or than anything is measured to."""
    short = Context(prec=MOST_DIGITS).create_decimal(number).normalize()
    found = f"{shown(text)}, which has more"
    hint = f"write `{short:g}{rest}`" if abs(short.adjusted()) < 100 else ""
    return QuantityFault("number", f"{wanted}, in at most ten digits", found, hint)


def unreadable(text: str, wanted: str, kind: str) -> QuantityFault:
    """Why a text does not begin with one plain number, as far as that can be told."""
    if not text:
        return QuantityFault("number", wanted, "nothing")
    comma, grouped = _COMMA.match(text), _GROUPED.match(text)
    if comma:
        rest = text[comma.end() :]
        whole, decimals = comma.groups()
        hint = f"write `{whole}.{decimals}{rest}`" if rest or kind in BARE else with_units(f"{whole}.{decimals}", kind)
        if len(decimals) == 3 and rest:
            hint += f" or `{whole}{decimals}{rest}`, whichever is meant"
        return QuantityFault("number", wanted, f"{shown(text)}: a comma does not mark decimals or thousands", hint)
    fraction = _FRACTION.match(text)
    if fraction and int(fraction[3]):
        value = int(fraction[1] or 0) + Fraction(int(fraction[2]), int(fraction[3]))
        hint = f"write `{float(value):g}{text[fraction.end() :]}`"
        return QuantityFault("number", wanted, f"{shown(text)}: fractions are not read", hint)
    if grouped:
        joined = re.sub("[ '’]", "", grouped.group()) + text[grouped.end() :]
        return QuantityFault("number", wanted, f"{shown(text)}: thousands are not grouped", f"write `{joined}`")
    if re.match(r"[+\-\u2212]?(nan|inf|\.nan|\.inf)", text, re.IGNORECASE):
        return QuantityFault("number", wanted, f"{shown(text)}, which is not a finite number")
    if re.match(r"[+\-\u2212]?\.[0-9]", text):
        return QuantityFault("number", wanted, shown(text), f"write `{text.replace('.', '0.', 1)}`")
    plain = unicodedata.normalize("NFKC", text)
    if plain != text and re.match(r"[+\-]?[0-9]", plain):
        return QuantityFault("character", wanted, f"{shown(text)}, with look-alike characters", f"write `{plain}`")
    return QuantityFault("number", wanted, f"{shown(text)}, which does not begin with one plain number")
