"""Hooper's two-K method: K = K_1/Re + K_∞ (1 + d_1/D).

The library files ball and plug valves under reduced trim only; the row of full line size, that of its gate valve, is
headed gate, ball and plug in the printed table (recalled, not re-read).  Its entry of a screwed 45° elbow with the
figures of a 180° one is left out.
"""

from __future__ import annotations

from ..references import Cite
from .coefficient import Coefficient, Entries

_TABLE = Cite("hooper")
_ROW = Cite("hooper", "row of gate, ball and plug valves, full line size (heading recalled)")


def _two(title: str, K_1: str, K_oo: str, cite: Cite = _TABLE) -> Coefficient:
    return Coefficient(title, {"K_1": K_1, "K_oo": K_oo}, "hooper_2k", cite)


HOOPER: Entries = {
    ("elbow", "90 standard"): _two("Elbow 90°, standard, screwed (R/D 1)", "800", "0.4"),
    ("elbow", "90 short"): _two("Elbow 90°, flanged or welded (R/D 1)", "800", "0.25"),
    ("elbow", "90 long"): _two("Elbow 90°, long radius (R/D 1.5)", "800", "0.2"),
    ("elbow", "90 mitre"): _two("Mitre bend 90°, 1 weld (R/D 1.5)", "1000", "1.15"),
    ("elbow", "90 mitre 2 welds"): _two("Mitre bend 90°, 2 welds (R/D 1.5)", "800", "0.35"),
    ("elbow", "90 mitre 3 welds"): _two("Mitre bend 90°, 3 welds (R/D 1.5)", "800", "0.3"),
    ("elbow", "90 mitre 4 welds"): _two("Mitre bend 90°, 4 welds (R/D 1.5)", "800", "0.27"),
    ("elbow", "90 mitre 5 welds"): _two("Mitre bend 90°, 5 welds (R/D 1.5)", "800", "0.25"),
    ("elbow", "45 standard"): _two("Elbow 45°, standard (R/D 1)", "500", "0.2"),
    ("elbow", "45 long"): _two("Elbow 45°, long radius (R/D 1.5)", "500", "0.15"),
    ("elbow", "45 mitre"): _two("Mitre bend 45°, 1 weld (R/D 1.5)", "500", "0.25"),
    ("elbow", "45 mitre 2 welds"): _two("Mitre bend 45°, 2 welds (R/D 1.5)", "500", "0.15"),
    ("elbow", "180 short"): _two("Bend 180°, flanged or welded (R/D 1)", "1000", "0.35"),
    ("elbow", "180 long"): _two("Bend 180°, long radius (R/D 1.5)", "1000", "0.3"),
    ("tee", "run"): _two("Tee, straight run, flanged or welded", "150", "0.05"),
    ("tee", "run threaded"): _two("Tee, straight run, screwed", "200", "0.1"),
    ("tee", "run stub_in"): _two("Tee, straight run, stub-in branch", "100", "0"),
    ("tee", "branch"): _two("Tee, through the branch, flanged or welded", "800", "0.8"),
    ("tee", "branch threaded"): _two("Tee, through the branch, screwed", "500", "0.7"),
    ("tee", "branch long"): _two("Tee, through the branch, long radius, screwed", "800", "0.4"),
    ("tee", "branch stub_in"): _two("Tee, through the branch, stub-in", "1000", "1"),
    ("valve", "gate"): _two("Gate valve, full line size, open", "300", "0.1"),
    ("valve", "ball"): _two("Ball valve, full line size, open", "300", "0.1", _ROW),
    ("valve", "ball_reduced"): _two("Ball valve, reduced trim (β 0.9), open", "500", "0.15"),
    ("valve", "plug"): _two("Plug valve, full line size, open", "300", "0.1", _ROW),
    ("valve", "plug_reduced"): _two("Plug valve, reduced trim (β 0.8), open", "1000", "0.25"),
    ("valve", "globe"): _two("Globe valve, standard, open", "1500", "4"),
    ("valve", "angle"): _two("Angle or Y-type valve, open", "1000", "2"),
    ("valve", "diaphragm_weir"): _two("Diaphragm valve, dam type, open", "1000", "2"),
    ("valve", "butterfly"): _two("Butterfly valve, open", "800", "0.25"),
    ("valve", "lift_check"): _two("Lift check valve", "2000", "10"),
    ("valve", "swing_check"): _two("Swing check valve", "1500", "1.5"),
    ("valve", "tilting_check"): _two("Tilting-disc check valve", "1000", "0.5"),
}
