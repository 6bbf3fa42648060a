"""Loss coefficients of fittings by one named published set; sets are never mixed within a line."""

from __future__ import annotations

from collections.abc import Mapping
from dataclasses import dataclass

from .references import Cite


@dataclass(frozen=True)
class Coefficient:
    """A fitting's entry: a multiple ``m`` of the fully rough friction factor, or a ``K`` of its own (the other empty)."""

    title: str
    m: str = ""
    K: str = ""
    cite: Cite = Cite("crane")


#: (kind, variant) -> entry.  Crane TP-410; each entry says in which edition it was seen; the rest is recalled, not
#: re-read. The tests compare all of them with the library fluids.
CRANE: Mapping[tuple[str, str], Coefficient] = {
    ("entrance", "flush"): Coefficient("Entrance, flush, sharp-edged", K="0.5", cite=Cite("crane76")),
    ("entrance", "inward"): Coefficient("Entrance, pipe projecting inward", K="0.78", cite=Cite("crane76")),
    ("entrance", "bell"): Coefficient("Entrance, bell (rounded, r/d 0.15 or more)", K="0.04", cite=Cite("crane76")),
    ("elbow", "90 standard"): Coefficient("Elbow 90°, standard", m="30"),
    ("elbow", "90 long"): Coefficient("Elbow 90°, long radius (r/d 1.5)", m="14", cite=Cite("crane09")),
    ("elbow", "45 standard"): Coefficient("Elbow 45°, standard", m="16"),
    ("tee", "run"): Coefficient("Tee, straight run", m="20", cite=Cite("crane76")),
    ("tee", "branch"): Coefficient("Tee, through the branch", m="60", cite=Cite("crane76")),
    ("valve", "gate"): Coefficient("Gate valve, open", m="8", cite=Cite("crane76")),
    ("valve", "ball"): Coefficient("Ball valve, full bore, open", m="3", cite=Cite("crane09")),
    ("valve", "plug"): Coefficient("Plug valve, straightway, open", m="18", cite=Cite("crane76")),
    ("valve", "globe"): Coefficient("Globe valve, open", m="340"),
    ("valve", "swing_check"): Coefficient("Swing check valve", m="100", cite=Cite("crane76")),
    ("valve", "foot_poppet"): Coefficient("Foot valve with strainer, poppet disc", m="420", cite=Cite("crane09")),
    ("valve", "foot_hinged"): Coefficient("Foot valve with strainer, hinged disc", m="75", cite=Cite("crane09")),
    ("valve", "butterfly 2 to 8 in"): Coefficient("Butterfly valve, 2 to 8 in, open", m="45", cite=Cite("crane09")),
    ("valve", "butterfly 10 to 14 in"): Coefficient("Butterfly valve, 10 to 14 in, open", m="35", cite=Cite("crane09")),
    ("valve", "butterfly 16 to 24 in"): Coefficient("Butterfly valve, 16 to 24 in, open", m="25", cite=Cite("crane09")),
}
SETS: Mapping[str, Mapping[tuple[str, str], Coefficient]] = {"crane": CRANE}
SET_NAMES: Mapping[str, str] = {"crane": "Crane TP-410"}

#: Nominal size, in, at which each size range of the butterfly valve has ended.
_BUTTERFLY = ((9, "2 to 8 in"), (15, "10 to 14 in"), (25, "16 to 24 in"))


def coefficient(set_name: str, kind: str, variant: str, inches: float) -> Coefficient | None:
    """The entry for a fitting of a nominal size in inches, or ``None`` where the set has none."""
    if variant == "butterfly":
        variant = next((f"butterfly {sizes}" for limit, sizes in _BUTTERFLY if inches < limit), variant)
    return SETS[set_name].get((kind, variant))
