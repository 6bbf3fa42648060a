"""Roughness of the pipe wall by material, as new and as aged."""

from __future__ import annotations

from collections.abc import Mapping
from dataclasses import dataclass

from .references import Cite


@dataclass(frozen=True)
class Roughness:
    """An absolute roughness as its source prints it, what it holds for, and where it stands."""

    text: str
    words: str
    cite: Cite


def _new(text: str, more: str = "") -> Roughness:
    return Roughness(text, "new", Cite("hi_edl", f"table 3.A.1{more}"))


#: Clean, as new; of a range the upper value.
NEW: Mapping[str, Roughness] = {
    "commercial steel": _new("0.00015 ft"),
    "stainless steel": _new("0.00005 ft"),
    "galvanised steel": _new("0.0005 ft"),
    "cast iron": _new("0.00085 ft", ", uncoated"),
    "cement-lined steel": _new("0.005 ft"),
    "concrete": _new("0.01 ft", ", upper value"),
    "plastic": _new("0.000005 ft", ", drawn tubing"),
    "copper": _new("0.000005 ft", ", drawn tubing"),
}
#: After years in water; of a range the upper value.  Materials that do not age, or of which no value was found, are not here.
AGED: Mapping[str, Roughness] = {
    "commercial steel": Roughness(
        "1 mm", "after years of operation, corroded or with small deposits", Cite("idelchik", "seamless steel, 0.15 to 1 mm")
    ),
    "galvanised steel": Roughness("0.18 mm", "used for water", Cite("idelchik", "galvanised sheet steel")),
    "cast iron": Roughness("1.5 mm", "used and corroded", Cite("idelchik", "cast iron, 1 to 1.5 mm")),
    "concrete": Roughness(
        "4 mm", "used and corroded, with a wavy surface", Cite("idelchik", "concrete water conduits, 1 to 4 mm")
    ),
}  # fmt: skip
