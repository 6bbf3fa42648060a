"""Every entry of every published set, and of the tables of roughness, against the library fluids."""

from __future__ import annotations

from collections.abc import Callable, Iterator, Mapping

import fluids
import pytest
from fluids.fittings import (
    Darby,
    Hooper,
    bend_miter_Crane_angles,
    bend_miter_Crane_fds,
    bend_rounded_Crane_fds,
    bend_rounded_Crane_ratios,
    entrance_rounded_Ks_Crane,
    entrance_rounded_ratios_Crane,
)
from fluids.friction import HHR_roughness

from calcpack import lookup, roughness
from calcpack.arithmetic import InFloat, evaluate
from calcpack.catalog import EQUATION
from calcpack.fitting_set import LENDER, SETS, Coefficient, coefficient, variants
from calcpack.quantity import parse
from calcpack.references import REFERENCES

CRANE, HOOPER, DARBY = (SETS[key].entries for key in ("crane", "hooper_2k", "darby_3k"))
#: Nominal sizes, in, with the bore, m, of a standard wall.
SIZES = {nps: float(lookup.bore(f"NPS {nps}", "STD").millimetres) / 1000 for nps in (2, 6, 8, 10, 14, 16, 24)}


def every() -> Iterator[tuple[str, tuple[str, str], Coefficient]]:
    """Set, kind with variant, and coefficient of every entry, those of each size range included."""
    for set_name, held in SETS.items():
        for key, entry in held.entries.items():
            for of_size in (entry,) if isinstance(entry, Coefficient) else (c for _, c in entry):
                yield set_name, key, of_size


def test_an_entry_has_a_title_a_source_and_the_constants_of_its_equation() -> None:
    for _, key, found in every():
        assert found.title and found.cite.key in REFERENCES, key
        assert all(float(text) >= 0 for text in found.constants.values()), key
        if found.equation:
            assert set(found.constants) < set(EQUATION[found.equation].operands), key
        else:
            assert set(found.constants) == {"K"}, key


def test_titles_of_a_set_are_told_apart() -> None:
    for set_name in SETS:
        titles = [c.title for name, _, c in every() if name == set_name]
        assert len(titles) == len(set(titles))


def test_a_fitting_has_the_same_name_in_every_set_that_has_it() -> None:
    common = [set(held.entries) for held in SETS.values()]
    shared = common[0] & common[1] & common[2]
    for key in (
        ("elbow", "90 standard"), ("elbow", "90 short"), ("elbow", "90 long"), ("elbow", "90 mitre"), ("elbow", "45 standard"),
        ("tee", "run"), ("tee", "branch"), ("valve", "gate"), ("valve", "globe"), ("valve", "ball"), ("valve", "plug"),
        ("valve", "angle"), ("valve", "diaphragm_weir"), ("valve", "swing_check"), ("valve", "lift_check"),
    ):  # fmt: skip
        assert key in shared


def test_what_a_set_lacks_is_none_and_its_variants_are_listed() -> None:
    assert coefficient("crane", "elbow", "45 long", 8) is None
    assert coefficient("crane", "valve", "butterfly", 30) is None
    assert coefficient("darby_3k", "valve", "butterfly", 8) is None
    assert variants("crane", "tee") == ["run", "branch"]
    assert variants("hooper_2k", "entrance") == [] != variants(LENDER, "entrance")


# --- Crane ------------------------------------------------------------------------------------------------------------

#: Entry -> its K by fluids' own function of Crane's method for a bore, over fluids' own f_T.
MULTIPLES: Mapping[tuple[str, str], Callable[[float], float]] = {
    ("valve", "gate"): lambda D: fluids.K_gate_valve_Crane(D1=D, D2=D, angle=0),
    ("valve", "ball"): lambda D: fluids.K_ball_valve_Crane(D1=D, D2=D, angle=0),
    ("valve", "plug"): lambda D: fluids.K_plug_valve_Crane(D1=D, D2=D, angle=0, style=0),
    ("valve", "plug_three_way_run"): lambda D: fluids.K_plug_valve_Crane(D1=D, D2=D, angle=0, style=1),
    ("valve", "plug_three_way_branch"): lambda D: fluids.K_plug_valve_Crane(D1=D, D2=D, angle=0, style=2),
    ("valve", "globe"): lambda D: fluids.K_globe_valve_Crane(D1=D, D2=D),
    ("valve", "angle"): lambda D: max(fluids.K_angle_valve_Crane(D1=D, D2=D, style=style) for style in (0, 1, 2)),
    ("valve", "diaphragm_weir"): lambda D: fluids.K_diaphragm_valve_Crane(D=D, style=0),
    ("valve", "diaphragm_straight"): lambda D: fluids.K_diaphragm_valve_Crane(D=D, style=1),
    ("valve", "swing_check"): lambda D: fluids.K_swing_check_valve_Crane(D=D, angled=True),
    ("valve", "swing_check_straight"): lambda D: fluids.K_swing_check_valve_Crane(D=D, angled=False),
    ("valve", "lift_check"): lambda D: fluids.K_lift_check_valve_Crane(D1=D, D2=D, angled=False),
    ("valve", "lift_check_angle"): lambda D: fluids.K_lift_check_valve_Crane(D1=D, D2=D, angled=True),
    ("valve", "tilting_check"): lambda D: fluids.K_tilting_disk_check_valve_Crane(D=D, angle=15),
    ("valve", "tilting_check_5"): lambda D: fluids.K_tilting_disk_check_valve_Crane(D=D, angle=5),
    ("valve", "butterfly"): lambda D: fluids.K_butterfly_valve_Crane(D=D, style=0),
    ("valve", "butterfly_double_offset"): lambda D: fluids.K_butterfly_valve_Crane(D=D, style=1),
    ("valve", "butterfly_triple_offset"): lambda D: fluids.K_butterfly_valve_Crane(D=D, style=2),
    ("valve", "foot_poppet"): lambda D: fluids.K_foot_valve_Crane(D=D, style=0),
    ("valve", "foot_hinged"): lambda D: fluids.K_foot_valve_Crane(D=D, style=1),
}
#: Not in fluids: recalled (30, 16) or read in the reprint of the 1976 edition (20, 60).
ELSEWHERE = {
    ("elbow", "90 standard"): "30",
    ("elbow", "45 standard"): "16",
    ("tee", "run"): "20",
    ("tee", "branch"): "60",
}


@pytest.mark.parametrize("key", MULTIPLES, ids=lambda key: key[1])
@pytest.mark.parametrize("nps", SIZES)
def test_a_valve_is_that_of_fluids(key: tuple[str, str], nps: int) -> None:
    """The range of size by the nominal size; fluids takes it by the bore, here that of a standard wall."""
    found = coefficient("crane", *key, nps)
    assert found is not None
    oracle = MULTIPLES[key](SIZES[nps]) / fluids.ft_Crane(SIZES[nps])
    assert float(found.constants["m"]) == pytest.approx(oracle, rel=1e-9)


def test_bends_and_mitres_are_those_of_fluids() -> None:
    bends = dict(zip(bend_rounded_Crane_ratios, bend_rounded_Crane_fds, strict=True))
    radii = {"short": 1.0, "long": 1.5} | {
        v.split()[1]: float(v[3:-1]) for v in variants("crane", "elbow") if v.endswith("D")
    }
    assert set(bends) == set(radii.values())
    for name, ratio in radii.items():
        found = coefficient("crane", "elbow", f"90 {name}", 8)
        assert found is not None and float(found.constants["m"]) == bends[ratio]
    for angle, m in zip(bend_miter_Crane_angles[1:], bend_miter_Crane_fds[1:], strict=True):
        found = coefficient("crane", "elbow", f"{angle:.0f} mitre", 8)
        assert found is not None and float(found.constants["m"]) == m


def test_entrances_are_those_of_fluids() -> None:
    rounded = dict(zip(entrance_rounded_ratios_Crane, entrance_rounded_Ks_Crane, strict=True))
    names = {"flush": 0.0, "bell": 0.15} | {v: float(v.split()[1]) for v in variants("crane", "entrance") if " " in v}
    assert set(rounded) == set(names.values())
    for name, ratio in names.items():
        found = coefficient("crane", "entrance", name, 8)
        assert found is not None and float(found.constants["K"]) == rounded[ratio]
    inward = coefficient("crane", "entrance", "inward", 8)
    assert inward is not None and float(inward.constants["K"]) == fluids.entrance_distance(Di=0.2, method="Crane")


def test_no_entry_of_crane_is_without_a_check() -> None:
    bends = {key for key in CRANE if key[0] == "elbow" and key[1].split()[1] not in ("standard",)}
    entrances = {key for key in CRANE if key[0] == "entrance"}
    assert set(CRANE) == set(MULTIPLES) | bends | entrances | set(ELSEWHERE)
    for key, m in ELSEWHERE.items():
        entry = CRANE[key]
        assert isinstance(entry, Coefficient) and entry.constants == {"m": m}


# --- Hooper and Darby -------------------------------------------------------------------------------------------------

#: Variant -> the library's name of it.
OF_HOOPER = {
    ("elbow", "90 standard"): "Elbow, 90°, Standard (R/D = 1), Screwed",
    ("elbow", "90 short"): "Elbow, 90°, Standard (R/D = 1), Flanged/welded",
    ("elbow", "90 long"): "Elbow, 90°, Long-radius (R/D = 1.5), All types",
    ("elbow", "90 mitre"): "Elbow, 90°, Mitered (R/D = 1.5), 1 weld (90° angle)",
    ("elbow", "90 mitre 2 welds"): "Elbow, 90°, Mitered (R/D = 1.5), 2 weld (45° angle)",
    ("elbow", "90 mitre 3 welds"): "Elbow, 90°, Mitered (R/D = 1.5), 3 weld (30° angle)",
    ("elbow", "90 mitre 4 welds"): "Elbow, 90°, Mitered (R/D = 1.5), 4 weld (22.5° angle)",
    ("elbow", "90 mitre 5 welds"): "Elbow, 90°, Mitered (R/D = 1.5), 5 weld (18° angle)",
    ("elbow", "45 standard"): "Elbow, 45°, Standard (R/D = 1), All types",
    ("elbow", "45 long"): "Elbow, 45°, Long-radius (R/D 1.5), All types",
    ("elbow", "45 mitre"): "Elbow, 45°, Mitered (R/D=1.5), 1 weld (45° angle)",
    ("elbow", "45 mitre 2 welds"): "Elbow, 45°, Mitered (R/D=1.5), 2 weld (22.5° angle)",
    ("elbow", "180 short"): "Elbow, 180°, Standard (R/D = 1), Flanged/welded",
    ("elbow", "180 long"): "Elbow, 180°, Long-radius (R/D = 1.5), All types",
    ("tee", "run"): "Tee, Through, Flanged or welded",
    ("tee", "run threaded"): "Tee, Run, Screwed",
    ("tee", "run stub_in"): "Tee, Tee, Stub-in type branch",
    ("tee", "branch"): "Elbow, Elbow, Standard, Flanged/welded",
    ("tee", "branch threaded"): "Elbow, Used as, Standard, Screwed",
    ("tee", "branch long"): "Elbow, Elbow, Long-radius, Screwed",
    ("tee", "branch stub_in"): "Elbow, Elbow, Stub-in type branch",
    ("valve", "gate"): "Valve, Gate, Full line size, Beta = 1",
    # One row of the table: gate, ball and plug valves of full line size.
    ("valve", "ball"): "Valve, Gate, Full line size, Beta = 1",
    ("valve", "plug"): "Valve, Gate, Full line size, Beta = 1",
    ("valve", "ball_reduced"): "Valve, Ball, Reduced trim, Beta = 0.9",
    ("valve", "plug_reduced"): "Valve, Plug, Reduced trim, Beta = 0.8",
    ("valve", "globe"): "Valve, Globe, Standard",
    ("valve", "angle"): "Valve, Globe, Angle or Y-type",
    ("valve", "diaphragm_weir"): "Valve, Diaphragm, Dam type",
    ("valve", "butterfly"): "Valve, Butterfly,",
    ("valve", "lift_check"): "Valve, Check, Lift",
    ("valve", "swing_check"): "Valve, Check, Swing",
    ("valve", "tilting_check"): "Valve, Check, Tilting-disc",
}
OF_DARBY = {
    ("elbow", "90 standard"): "Elbow, 90°, threaded, standard, (r/D = 1)",
    ("elbow", "90 long"): "Elbow, 90°, threaded, long radius, (r/D = 1.5)",
    ("elbow", "90 short"): "Elbow, 90°, flanged, welded, bends, (r/D = 1)",
    ("elbow", "90 2D"): "Elbow, 90°, (r/D = 2)",
    ("elbow", "90 4D"): "Elbow, 90°, (r/D = 4)",
    ("elbow", "90 6D"): "Elbow, 90°, (r/D = 6)",
    ("elbow", "90 mitre"): "Elbow, 90°, mitered, 1 weld, (90°)",
    ("elbow", "90 mitre 2 welds"): "Elbow, 90°, 2 welds, (45°)",
    ("elbow", "90 mitre 3 welds"): "Elbow, 90°, 3 welds, (30°)",
    ("elbow", "45 standard"): "Elbow, 45°, threaded standard, (r/D = 1)",
    ("elbow", "45 long"): "Elbow, 45°, long radius, (r/D = 1.5)",
    ("elbow", "45 mitre"): "Elbow, 45°, mitered, 1 weld, (45°)",
    ("elbow", "45 mitre 2 welds"): "Elbow, 45°, mitered, 2 welds, (22.5°)",
    ("elbow", "180 standard"): "Elbow, 180°, threaded, close-return bend, (r/D = 1)",
    ("elbow", "180 short"): "Elbow, 180°, flanged, (r/D = 1)",
    ("elbow", "180 long"): "Elbow, 180°, all, (r/D = 1.5)",
    ("tee", "branch threaded"): "Tee, Through-branch, (as elbow), threaded, (r/D = 1)",
    ("tee", "branch long"): "Tee, Through-branch,(as elbow), (r/D = 1.5)",
    ("tee", "branch"): "Tee, Through-branch, (as elbow), flanged, (r/D = 1)",
    ("tee", "branch stub_in"): "Tee, Through-branch, (as elbow), stub-in branch",
    ("tee", "run threaded"): "Tee, Run-through, threaded, (r/D = 1)",
    ("tee", "run"): "Tee, Run-through, flanged, (r/D = 1)",
    ("tee", "run stub_in"): "Tee, Run-through, stub-in branch",
    ("valve", "angle_45"): "Valve, Angle valve, 45°, full line size, β = 1",
    ("valve", "angle"): "Valve, Angle valve, 90°, full line size, β = 1",
    ("valve", "globe"): "Valve, Globe valve, standard, β = 1",
    ("valve", "plug_three_way_branch"): "Valve, Plug valve, branch flow",
    ("valve", "plug"): "Valve, Plug valve, straight through",
    ("valve", "plug_three_way_run"): "Valve, Plug valve, three-way (flow through)",
    ("valve", "gate"): "Valve, Gate valve, standard, β = 1",
    ("valve", "ball"): "Valve, Ball valve, standard, β = 1",
    ("valve", "diaphragm_weir"): "Valve, Diaphragm, dam type",
    ("valve", "swing_check"): "Valve, Swing check",
    ("valve", "lift_check"): "Valve, Lift check",
}
#: Entries of the library that are left out, with the reason.
LEFT_OUT = {"Elbow, 45°, Standard (R/D = 1), Screwed": "its figures are those of a 180° elbow"}


def test_every_entry_of_the_library_is_held() -> None:
    assert set(OF_HOOPER) == set(HOOPER) and set(OF_DARBY) == set(DARBY)
    assert set(Hooper) == set(OF_HOOPER.values()) | set(LEFT_OUT)
    assert set(Darby) == set(OF_DARBY.values())


@pytest.mark.parametrize("reynolds", [50.0, 1999.0, 3000.0, 4e5])
@pytest.mark.parametrize("nps", SIZES)
def test_hooper_s_and_darby_s_coefficients_are_those_of_fluids(nps: int, reynolds: float) -> None:
    """Laminar, transition and turbulent flow; Hooper on the bore, Darby on the nominal diameter."""
    bore, inch = SIZES[nps], 0.0254
    given = {"Re": reynolds, "d_1": inch, "D": bore, "D_n": nps * inch}
    for key, name in OF_HOOPER.items():
        found = coefficient("hooper_2k", *key, nps)
        assert found is not None
        ours = evaluate(EQUATION["hooper_2k"].tree, given | numbers(found), InFloat())
        assert ours == pytest.approx(fluids.Hooper2K(Di=bore / inch, Re=reynolds, name=name), rel=1e-12), key
    for key, name in OF_DARBY.items():
        found = coefficient("darby_3k", *key, nps)
        assert found is not None
        ours = evaluate(EQUATION["darby_3k"].tree, given | numbers(found), InFloat())
        assert ours == pytest.approx(fluids.Darby3K(NPS=nps, Re=reynolds, name=name), rel=1e-12), key


def numbers(found: Coefficient) -> dict[str, float]:
    return {symbol: float(text) for symbol, text in found.constants.items()}


# --- roughness --------------------------------------------------------------------------------------------------------

#: Hydraulic Institute, Engineering Data Library, table 3.A.1, its column in millimetres; ours stands in feet.
NEW_MM = {
    "commercial steel": 0.0457,
    "stainless steel": 0.015,
    "galvanised steel": 0.152,
    "cast iron": 0.26,
    "cement-lined steel": 1.5,
    "concrete": 3.05,
    "plastic": 0.00152,
    "copper": 0.00152,
}
#: Material -> the library's name of its aged wall; the greater of the two ends of a range, else the single value.
AGED = {
    "commercial steel": "Seamless steel tubes, Following multiple years of operation, generally corroded or with small amounts of scale",
    "galvanised steel": "Galvanized sheet steel, Used previously for water",
    "cast iron": "Cast-iron tubes, Used and corroded",
    "concrete": "Concrete water conduits, no finish, Used and corroded; with a wavy surface and wood framework",
}  # fmt: skip


def metres(of: Mapping[str, roughness.Roughness]) -> dict[str, float]:
    return {material: float(parse(found.text, "roughness").si()) for material, found in of.items()}


def test_a_new_roughness_is_that_of_the_table_s_other_column() -> None:
    assert metres(roughness.NEW) == pytest.approx({m: mm / 1000 for m, mm in NEW_MM.items()}, rel=0.02)


def test_an_aged_roughness_is_the_upper_value_of_fluids() -> None:
    assert metres(roughness.AGED) == pytest.approx(
        {material: HHR_roughness[name][1] or HHR_roughness[name][2] for material, name in AGED.items()}
    )
    assert all(metres(roughness.AGED)[m] > metres(roughness.NEW)[m] for m in roughness.AGED)
