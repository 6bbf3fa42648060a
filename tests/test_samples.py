"""Every sample by a second method: plain floats with the libraries CoolProp and fluids, none of our equations or tables.

The numbers are typed again from the scenario of each sample.  What differs by design is small: bores of the pipe table are
the library's own, f_T of Crane is its fit to the printed table (1 % at most), and the gauge on each head is 0.01 m.
"""

from __future__ import annotations

import subprocess
import sys
from collections.abc import Callable
from math import pi, sqrt
from pathlib import Path

import pytest
from CoolProp.CoolProp import PropsSI
from fluids import ATMOSPHERE_1976
from fluids.fittings import Darby3K, Hooper2K, contraction_conical, ft_Crane
from fluids.friction import friction_factor
from fluids.piping import nearest_pipe

import calcpack

SAMPLES = Path(calcpack.__file__).parent.parent / "sample_inputs"
G = 9.80665
STEEL = 0.00015 * 0.3048
HOOPER_LONG, HOOPER_GATE = "Elbow, 90°, Long-radius (R/D = 1.5), All types", "Valve, Gate, Full line size, Beta = 1"
HOOPER_RUN = "Tee, Through, Flanged or welded"


def bore(nps: float, schedule: str) -> float:
    return float(nearest_pipe(NPS=nps, schedule=schedule)[1])


def speed(flow: float, d: float) -> float:
    return flow / (pi * d**2 / 4)


def head(v: float) -> float:
    return v**2 / (2 * G)


def darcy(flow: float, d: float, rho: float, mu: float, eps: float) -> tuple[float, float]:
    """Reynolds number and friction factor."""
    re = rho * speed(flow, d) * d / mu
    return re, 64 / re if re < 2000 else friction_factor(Re=re, eD=eps / d, Method="Clamond")


def saturated(fluid: str, celsius: float) -> tuple[float, float, float]:
    """Vapour pressure, density and viscosity of the saturated liquid."""
    pressure, density, viscosity = (PropsSI(x, "T", celsius + 273.15, "Q", 0, fluid) for x in "PDV")
    return pressure, density, viscosity


def air(metres: float, allowance: float) -> float:
    return float(ATMOSPHERE_1976(metres).P) - allowance


def deaerator() -> float:
    _, rho, mu = saturated("Water", 152)
    d, q = bore(12, "STD"), 360 / 3600
    f, h = darcy(q, d, rho, mu, 0.001)[1], head(speed(q, d))
    k = 0.5 + 3 * 14 * ft_Crane(d) + 8 * ft_Crane(d) + 0.25 + f * (14 + 15.9 + 2.1) / d
    return 19.5 - k * h - 0.5


def propane() -> float:
    _, rho, mu = saturated("Propane", 38)
    d, small, q = bore(8, "40"), bore(6, "40"), 110 / 3600
    f, h = darcy(q, d, rho, mu, STEEL)[1], head(speed(q, d))
    k = 0.5 + (3 + 4 * 14 + 60) * ft_Crane(d) + f * 44.2 / d
    reducer = contraction_conical(Di1=d, Di2=small, l=0.152, method="Crane") * head(speed(q, small))
    last = darcy(q, small, rho, mu, STEEL)[1] * 0.8 / small * head(speed(q, small))
    valve = 1e5 / (1000 * G) * (110 / 1150) ** 2
    return 3.4 - k * h - reducer - last - valve - 700 / (rho * G)


def glycol(celsius: float) -> float:
    t, w = celsius + 273.15, 0.35
    rho, mu = (PropsSI(x, "T", t, "P", 101325, f"INCOMP::MEG[{w}]") for x in "DV")
    moles = (1 - w) / 18.01528
    water = PropsSI("P", "T", max(t, 273.16), "Q", 0, "Water")
    p_v = water * moles / (moles + w / 62.068)
    d, q = bore(6, "40"), 95 / 3600
    re, f = darcy(q, d, rho, mu, STEEL)
    inches = d / 0.0254
    k = Hooper2K(inches, re, name=HOOPER_RUN) + 4 * Hooper2K(inches, re, name=HOOPER_LONG)
    k += Hooper2K(inches, re, name=HOOPER_GATE) + 0.35 + f * 18 / d
    return (97e3 + 25e3 - p_v) / (rho * G) - k * head(speed(q, d)) - 7.6


def wet_pit() -> float:
    p_v, rho, _ = saturated("Water", 30)
    return (air(12, 3400) - p_v) / (rho * G) + 1.60 - 0.48


def header(running: int, flow: float, level: float = 0.6, strainer: float = 1.10) -> float:
    p_v, rho, mu = saturated("Water", 32)
    d, b, q = bore(20, "STD"), bore(10, "STD"), flow / 3600
    re, f = darcy(running * q, d, rho, mu, STEEL)
    long, gate = {"K1": 800, "Ki": 0.071, "Kd": 4.2}, {"name": "Valve, Gate valve, standard, β = 1"}
    k = 0.5 + f * 40 / d + Darby3K(20, re, **long) + Darby3K(20, re, **gate) + 0.40
    lost = k * head(speed(running * q, d))
    re, f = darcy(q, b, rho, mu, STEEL)
    k = Darby3K(10, re, name="Tee, Through-branch, (as elbow), flanged, (r/D = 1)") + f * 6 / b
    k += Darby3K(10, re, **gate) + 2 * Darby3K(10, re, **long)
    lost += k * head(speed(q, b)) + strainer * (flow / 400) ** 2
    return (air(4, 1700) - p_v) / (rho * G) + level - lost


def oil(rho: float, cst: float, p_v: float) -> float:
    d, q = bore(8, "40"), 38 / 3600
    re, f = darcy(q, d, rho, rho * cst * 1e-6, STEEL)
    inches = d / 0.0254
    k = 0.78 + f * 45 / d + 5 * Hooper2K(inches, re, name=HOOPER_LONG) + 2 * Hooper2K(inches, re, name=HOOPER_GATE)
    k += Hooper2K(inches, re, name=HOOPER_RUN)
    return (air(60, 1700) - p_v) / (rho * G) - 1.2 - k * head(speed(q, d)) - 0.35


def triplex() -> float:
    p_v, rho, mu = saturated("Water", 40)
    d, q = bore(4, "40"), 22 / 3600
    v, f = speed(q, d), darcy(q, d, rho, mu, 0.00005 * 0.3048)[1]
    k = 0.5 + (3 * 14 + 8) * ft_Crane(d) + 18 * f + f * 7.5 / d
    return (air(95, 1700) - p_v) / (rho * G) + 2.6 - k * head(v) - 8.5 * v * 210 * 0.066 / (1.5 * G)


#: Sample -> what each result of NPSH available is by the second method.
BY_HAND: dict[str, list[Callable[[], float]]] = {
    "e_deaerator_feed": [deaerator],
    "f_propane_sphere": [propane],
    "g_glycol_loop": [lambda: glycol(35), lambda: glycol(-8)],
    "h_wet_pit": [wet_pit],
    "i_three_pumps_one_header": [
        lambda: header(3, 400),
        lambda: header(2, 440),
        lambda: header(1, 520),
        lambda: header(1, 520, 2.4, 0.25),
    ],
    # At 50 °C the table is read between its rows at 30 and 60 °C: log of viscosity against the inverse temperature.
    "j_viscous_oil": [lambda: oil(945 + (926 - 945) * 2 / 3, 155.0, 119.0), lambda: oil(954, 1900, 25)],
    "k_triplex_plunger": [triplex],
}


@pytest.mark.parametrize("name", BY_HAND)
def test_a_second_method_finds_the_same(name: str) -> None:
    checks = [c for c in calcpack.assess(SAMPLES / f"{name}.yaml")["checks"] if c["id"] == "npsh_margin"]
    assert [float(c["left"]["value"]) for c in checks] == pytest.approx([f() for f in BY_HAND[name]], abs=0.01)


def test_the_submergence_of_the_wet_pit_is_that_of_the_standard() -> None:
    check = next(c for c in calcpack.assess(SAMPLES / "h_wet_pit.yaml")["checks"] if c["id"] == "submergence")
    d = 0.762
    assert float(check["right"]["value"]) == pytest.approx(d + 2.3 * 0.62 / (pi * d**2 / 4) * sqrt(d / G), rel=1e-5)
    assert check["verdict"] == "not met"


#: What each sample is to show.
VERDICTS = {
    "a_cooling_tower_basin": 1, "b_river_intake_measured": 1, "c_transfer_pump_both_routes": 0, "d_blanketed_hot_water_vessel": 0,
    "e_deaerator_feed": 0, "f_propane_sphere": 1, "g_glycol_loop": 1, "h_wet_pit": 1, "i_three_pumps_one_header": 1,
    "j_viscous_oil": 1, "k_triplex_plunger": 0,
}  # fmt: skip


def test_every_sample_has_a_verdict_that_is_known() -> None:
    assert {p.stem for p in SAMPLES.glob("*.yaml")} == set(VERDICTS)


@pytest.mark.parametrize("name", VERDICTS)
def test_a_sample_ends_as_it_should(name: str) -> None:
    done = subprocess.run(
        [sys.executable, "-m", "calcpack", "assess", str(SAMPLES / f"{name}.yaml")], capture_output=True
    )
    assert done.returncode == VERDICTS[name]
