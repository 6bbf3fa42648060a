"""Darby's three-K method: K = K_1/Re + K_i (1 + K_d (d_1/D_n)^0.3), D_n the nominal diameter.

As the library has it; a data sheet in circulation prints K_i 0.015 for the ball valve.
"""

from __future__ import annotations

from ..references import Cite
from .coefficient import Coefficient, Entries


def _three(title: str, K_1: str, K_i: str, K_d: str) -> Coefficient:
    return Coefficient(title, {"K_1": K_1, "K_i": K_i, "K_d": K_d}, "darby_3k", Cite("darby"))


DARBY: Entries = {
    ("elbow", "90 standard"): _three("Elbow 90°, standard, threaded (r/D 1)", "800", "0.14", "4"),
    ("elbow", "90 short"): _three("Elbow 90°, flanged or welded (r/D 1)", "800", "0.091", "4"),
    ("elbow", "90 long"): _three("Elbow 90°, long radius (r/D 1.5)", "800", "0.071", "4.2"),
    ("elbow", "90 2D"): _three("Bend 90°, r/D 2", "800", "0.056", "3.9"),
    ("elbow", "90 4D"): _three("Bend 90°, r/D 4", "800", "0.066", "3.9"),
    ("elbow", "90 6D"): _three("Bend 90°, r/D 6", "800", "0.075", "4.2"),
    ("elbow", "90 mitre"): _three("Mitre bend 90°, 1 weld", "1000", "0.27", "4"),
    ("elbow", "90 mitre 2 welds"): _three("Mitre bend 90°, 2 welds", "800", "0.068", "4.1"),
    ("elbow", "90 mitre 3 welds"): _three("Mitre bend 90°, 3 welds", "800", "0.035", "4.2"),
    ("elbow", "45 standard"): _three("Elbow 45°, standard, threaded (r/D 1)", "500", "0.071", "4.2"),
    ("elbow", "45 long"): _three("Elbow 45°, long radius (r/D 1.5)", "500", "0.052", "4"),
    ("elbow", "45 mitre"): _three("Mitre bend 45°, 1 weld", "500", "0.086", "4"),
    ("elbow", "45 mitre 2 welds"): _three("Mitre bend 45°, 2 welds", "500", "0.052", "4"),
    ("elbow", "180 standard"): _three("Return bend 180°, close, threaded (r/D 1)", "1000", "0.23", "4"),
    ("elbow", "180 short"): _three("Bend 180°, flanged (r/D 1)", "1000", "0.12", "4"),
    ("elbow", "180 long"): _three("Bend 180°, long radius (r/D 1.5)", "1000", "0.1", "4"),
    ("tee", "run"): _three("Tee, straight run, flanged", "150", "0.05", "4"),
    ("tee", "run threaded"): _three("Tee, straight run, threaded", "200", "0.091", "4"),
    ("tee", "run stub_in"): _three("Tee, straight run, stub-in branch", "100", "0", "0"),
    ("tee", "branch"): _three("Tee, through the branch, flanged (r/D 1)", "800", "0.28", "4"),
    ("tee", "branch threaded"): _three("Tee, through the branch, threaded (r/D 1)", "500", "0.274", "4"),
    ("tee", "branch long"): _three("Tee, through the branch, long radius (r/D 1.5)", "800", "0.14", "4"),
    ("tee", "branch stub_in"): _three("Tee, through the branch, stub-in", "1000", "0.34", "4"),
    ("valve", "gate"): _three("Gate valve, full line size, open", "300", "0.037", "3.9"),
    ("valve", "ball"): _three("Ball valve, full line size, open", "300", "0.017", "3.5"),
    ("valve", "plug"): _three("Plug valve, straight through, open", "300", "0.084", "3.9"),
    ("valve", "plug_three_way_run"): _three("Plug valve, three-way, straight through", "300", "0.14", "4"),
    ("valve", "plug_three_way_branch"): _three("Plug valve, through the branch", "500", "0.41", "4"),
    ("valve", "globe"): _three("Globe valve, standard, open", "1500", "1.7", "3.6"),
    ("valve", "angle"): _three("Angle valve, 90°, full line size, open", "1000", "0.69", "4"),
    ("valve", "angle_45"): _three("Angle valve, 45°, full line size, open", "950", "0.25", "4"),
    ("valve", "diaphragm_weir"): _three("Diaphragm valve, dam type, open", "1000", "0.69", "4.9"),
    ("valve", "swing_check"): _three("Swing check valve", "1500", "0.46", "4"),
    ("valve", "lift_check"): _three("Lift check valve", "2000", "2.85", "3.8"),
}
