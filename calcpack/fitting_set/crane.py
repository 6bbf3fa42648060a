"""Crane Technical Paper 410: K as a multiple m of the friction factor of fully rough flow, or K itself.

Each entry says in which edition it was seen; the standard elbows and the globe valve are recalled, not re-read.  The
tests compare all of them with the library fluids.
"""

from __future__ import annotations

from ..references import Cite
from .coefficient import Coefficient, Entries

_76, _09, _RECALLED = Cite("crane76"), Cite("crane09"), Cite("crane")


def _multiple(title: str, m: str, cite: Cite = _76) -> Coefficient:
    return Coefficient(title, {"m": m}, "fitting_coefficient", cite)


def _fixed(title: str, K: str) -> Coefficient:
    return Coefficient(title, {"K": K}, "", _76)


def _by_size(title: str, small: str, middle: str, large: str) -> tuple[tuple[float, Coefficient], ...]:
    """Entries for 2 to 8, 10 to 14 and 16 to 24 in."""
    sizes = ((9.0, "2 to 8 in", small), (15.0, "10 to 14 in", middle), (25.0, "16 to 24 in", large))
    return tuple((below, _multiple(f"{title}, {words}, open", m, _09)) for below, words, m in sizes)


#: Radius over bore of a bend -> its multiple for 90°.
_BENDS = {
    "2": "12",
    "3": "12",
    "4": "14",
    "6": "17",
    "8": "24",
    "10": "30",
    "12": "34",
    "14": "38",
    "16": "42",
    "20": "50",
}
#: Angle of a mitre -> its multiple.
_MITRES = {15: "4", 30: "8", 45: "15", 60: "25", 75: "40", 90: "60"}
#: Radius of the rounding of an entrance over the bore -> its K.
_ROUNDINGS = {"0.02": "0.28", "0.04": "0.24", "0.06": "0.15", "0.10": "0.09"}

CRANE: Entries = {
    ("entrance", "flush"): _fixed("Entrance, flush, sharp-edged", "0.5"),
    ("entrance", "inward"): _fixed("Entrance, pipe projecting inward", "0.78"),
    ("entrance", "bell"): _fixed("Entrance, bell (rounded, r/d 0.15 or more)", "0.04"),
    **{("entrance", f"rounded {r}"): _fixed(f"Entrance, flush, rounded (r/d {r})", K) for r, K in _ROUNDINGS.items()},
    ("elbow", "90 standard"): _multiple("Elbow 90°, standard", "30", _RECALLED),
    ("elbow", "90 short"): _multiple("Elbow 90°, short radius, flanged or welded (r/d 1)", "20"),
    ("elbow", "90 long"): _multiple("Elbow 90°, long radius (r/d 1.5)", "14", _09),
    **{("elbow", f"90 {r}D"): _multiple(f"Bend 90°, r/d {r}", m) for r, m in _BENDS.items()},
    ("elbow", "45 standard"): _multiple("Elbow 45°, standard", "16", _RECALLED),
    **{
        ("elbow", f"{angle} mitre"): _multiple(f"Mitre bend {angle}°", m, _76 if angle > 15 else _09)
        for angle, m in _MITRES.items()
    },
    ("tee", "run"): _multiple("Tee, straight run", "20"),
    ("tee", "branch"): _multiple("Tee, through the branch", "60"),
    ("valve", "gate"): _multiple("Gate valve, open", "8"),
    ("valve", "globe"): _multiple("Globe valve, open", "340", _RECALLED),
    ("valve", "angle"): _multiple("Angle valve, open (the greater of the forms printed)", "150", _09),
    ("valve", "ball"): _multiple("Ball valve, full bore, open", "3", _09),
    ("valve", "plug"): _multiple("Plug valve, straightway, open", "18"),
    ("valve", "plug_three_way_run"): _multiple("Plug valve, three-way, straight through", "30"),
    ("valve", "plug_three_way_branch"): _multiple("Plug valve, three-way, through the branch", "90", _09),
    ("valve", "diaphragm_weir"): _multiple("Diaphragm valve, weir type, open", "149", _09),
    ("valve", "diaphragm_straight"): _multiple("Diaphragm valve, straight-through type, open", "39", _09),
    ("valve", "butterfly"): _by_size("Butterfly valve", "45", "35", "25"),
    ("valve", "butterfly_double_offset"): _by_size("Butterfly valve, double offset", "74", "52", "43"),
    ("valve", "butterfly_triple_offset"): _by_size("Butterfly valve, triple offset", "218", "96", "55"),
    ("valve", "swing_check"): _multiple("Swing check valve", "100"),
    ("valve", "swing_check_straight"): _multiple("Swing check valve, straight body", "50", _09),
    ("valve", "lift_check"): _multiple("Lift check valve", "600", _09),
    ("valve", "lift_check_angle"): _multiple("Lift check valve, angle body", "55", _09),
    ("valve", "tilting_check"): _by_size("Tilting-disc check valve, disc at 15°", "120", "90", "60"),
    ("valve", "tilting_check_5"): _by_size("Tilting-disc check valve, disc at 5°", "40", "30", "20"),
    ("valve", "foot_poppet"): _multiple("Foot valve with strainer, poppet disc", "420", _09),
    ("valve", "foot_hinged"): _multiple("Foot valve with strainer, hinged disc", "75", _09),
}
