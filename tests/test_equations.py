"""Over the whole catalogue: dimensions by pint, arrays, both display systems, sources; and the libraries as oracles."""

from __future__ import annotations

import ast
import importlib
import math
import pkgutil
import random
from decimal import Decimal
from fractions import Fraction
from functools import cache
from pathlib import Path
from typing import Any

import fluids
import numpy
import pint
import pytest
from lines import LINES
from mistakes import FOUND
from plants import INTAKE, Document, plant, studied
from pumps import PUMPS
from test_checks import CHECKS
from test_fitting_set import every

import calcpack
from calcpack import equations, lookup
from calcpack.arithmetic import InDecimal, InFloat, OnArrays, evaluate
from calcpack.assessment import run
from calcpack.catalog import EQUATION, EQUATIONS
from calcpack.equations import Equation
from calcpack.formula import Bin, Call, Cmp, FormulaError, Name, Neg, Node, Num, names
from calcpack.ledger import ROOT_RANGES, Ledger
from calcpack.quantity import parse
from calcpack.references import REFERENCES, Cite
from calcpack.root import residual, solve
from calcpack.roughness import AGED, NEW
from calcpack.rules import topics
from calcpack.source import load
from calcpack.symbols import KINDS, NOMENCLATURE
from calcpack.units import COHERENT
from calcpack.value import Line
from calcpack.verdict import Rule

PACKAGE = Path(calcpack.__file__).parent
RULES = [each for topic in topics() for each in vars(topic).values() if isinstance(each, Rule)]
by_name = pytest.mark.parametrize("equation", EQUATIONS, ids=[e.name for e in EQUATIONS])

# --- the list ---------------------------------------------------------------------------------------------------------


def test_the_catalogue_is_what_the_folder_holds() -> None:
    modules = [
        importlib.import_module(f"{equations.__name__}.{m.name}") for m in pkgutil.iter_modules(equations.__path__)
    ]
    in_folder = [e for module in modules for e in module.EQUATIONS]
    assert sorted(e.name for e in in_folder) == sorted(e.name for e in EQUATIONS)
    assert {id(e) for e in in_folder} == {id(e) for e in EQUATIONS}


def test_names_are_unique_and_their_number_is_pinned() -> None:
    assert len(EQUATIONS) == len(EQUATION) == 144
    assert {name: e.name for name, e in EQUATION.items()} == {name: name for name in EQUATION}


@by_name
def test_an_equation_has_title_source_and_known_symbols(equation: Equation) -> None:
    assert equation.title and equation.title[0].isupper() and not equation.title.endswith(".")
    assert equation.source.key in REFERENCES or equation.source.place or equation.source.how
    assert equation.result in NOMENCLATURE and set(equation.operands) <= set(NOMENCLATURE)
    assert equation.result not in equation.operands
    assert (equation.result in names(equation.tree)) is equation.implicit


def cites() -> list[Cite]:
    found = (
        [e.source for e in EQUATIONS]
        + [c.cite for c in lookup.CONSTANTS.values()]
        + [of.cite(name) for of in lookup.LIQUIDS.values() for name in lookup.PROPERTIES if of.offers(name)]
    )
    return (
        found
        + [c.cite for _, _, c in every()]
        + [r.cite for r in (*NEW.values(), *AGED.values())]
        + [r.cite for r in RULES]
    )


def test_every_source_cited_is_listed() -> None:
    assert {c.key for c in cites()} - {""} <= set(REFERENCES)
    assert all(r.text and r.key == key for key, r in REFERENCES.items())


def literals() -> set[str]:
    """Every text that stands in the code outside the two tables: symbols handed to the ledger, sources cited there."""
    found: set[str] = set()
    for path in PACKAGE.rglob("*.py"):
        if path.name not in ("symbols.py", "references.py"):
            found |= {
                n.value
                for n in ast.walk(ast.parse(path.read_text("utf-8")))
                if isinstance(n, ast.Constant) and isinstance(n.value, str)
            }
    return found


def test_every_listed_source_is_cited() -> None:
    used = {c.key for c in cites()} | literals()
    assert {key for key in REFERENCES if key not in used} == set()


def test_every_symbol_of_the_nomenclature_is_used() -> None:
    used = (
        {s for e in EQUATIONS for s in (e.result, *e.operands)} | {s for r in RULES for s in names(r.tree)} | literals()
    )
    assert {s for s in NOMENCLATURE if s not in used} == set()


def test_no_two_symbols_are_written_alike() -> None:
    written: dict[tuple[str, str], list[str]] = {}
    for s in NOMENCLATURE.values():
        written.setdefault((s.base, s.sub), []).append(s.name)
    # One quantity, counted from the surface or from itself: the same letter on purpose.
    assert [names for names in written.values() if len(names) > 1] == []


@by_name
def test_a_published_figure_exists_or_it_is_a_definition(equation: Equation) -> None:
    """An equation with a source is checked against a figure of a source; a definition or an identity needs none."""
    checked = {s if isinstance(s, str) else s["equation"] for c in CHECKS for s in c.get("steps", ())}
    assert equation.name in checked or equation.source.key == ""


#: Equations that are definitions, identities or common practice; the list is pinned so that none slips in.
WITHOUT_SOURCE = {
    "barometer_station",
    "open_surface",
    "saturated_surface",
    "drawn_down_level",
    "point_from_gauge",
    "absolute_from_gauge",
    "gauge_from_vacuum",
    "specific_weight",
    "dynamic_viscosity",
    "warmer_temperature",
    "colder_temperature",
    "cost_of_temperature",
    "water_mole_fraction",
    "density_between",
    "place_between",
    "vapour_pressure_between",
    "viscosity_between",
    "kinematic_viscosity_between",
    "section_flow",
    "bore_area",
    "mean_velocity",
    "velocity_head",
    "relative_roughness",
    "drop_as_head",
    "flow_coefficient_head",
    "loss_between_points",
    "equal_elements",
    "sum_of_rows",
    "losses_with_contingency",
    "losses",
    "bore_ratio",
    "taper_half_angle",
    "on_larger_bore",
    "energy_after",
    "energy_after_with_contingency",
    "node_pressure",
    "static_head",
    "surface_head",
    "vapour_head",
    "point_head",
    "point_static_head",
    "npsh_point",
    "npsh_point_moving",
    "npsh_wet_pit",
    "npsh_less_withheld",
    "npsh_less_acceleration",
    "npsh_at_required_datum",
    "energy_head",
    "energy_head_moving",
    "gauge_height",
    "barometer_head",
    "gauge_head",
    "difference",
    "inferred_loss",
    "surface_head_change",
    "level_change",
    "vapour_head_change",
    "loss_change",
    "npsh_carried",
    "straight_pipe",
    "straight_run_needed",
    "acceleration_heads",
    "flow_at_curve_speed",
    "npsh_between_points",
    "curve_width",
    "curve_widths",
    "curve_rise",
    "curve_place",
    "npsh_at_speed",
    "needed_by_ratio",
    "needed_by_difference",
    "needed_ratio_alone",
    "needed_difference_alone",
    "needed_greater",
    "margin_ratio",
    "margin_difference",
    "eye_flow",
    "suction_specific_speed",
    "region_lower",
    "region_upper",
    "inlet_area",
    "inlet_velocity",
    "submergence",
    "pressure_less_acceleration",
    "pressure_kept",
    "inlet_gauge_running",
    "inlet_gauge_at_rest",
    "gauge_on_the_line",
    "high_point_gauge",
    "barometer_lowest_likely",
    "barometer_highest_likely",
    "vacuum_as_absolute",
    "gauge_sign",
    "barometer_excess",
    "barometer_rise",
    "weather_head",
    "gas_credit",
    "datum_over_bell",
    "line_end_over_datum",
    "eye_over_bell",
    "cost_of_flow",
    "friction_left_out",
    "cost_of_age",
    "cost_of_density",
    "cost_of_vapour_pressure",
    "loss_of_station_flow",
    "submergence_of_station_flow",
    "npsh_of_specific_speed",
    "usual_margin",
}


def test_the_equations_without_source_are_pinned() -> None:
    assert sorted(e.name for e in EQUATIONS if not e.source.key) == sorted(WITHOUT_SOURCE)


_POINT = {
    "supply": {"name": "main M-1", "kind": "main", "pressure": {"lowest": "150 kPa gauge"}, "elevation": "0.4 m",
               "velocity_head": "counted", "source": "S1", "status": "verified"},
    "line.sections.0.elements.0": {"id": "1", "kind": "tee", "flow": "run", "elevation": "0.4 m"},
}  # fmt: skip
_CITED = {"source": "S1", "status": "verified"}
_TABLE = [
    {"temperature": "10 °C", "density": "960 kg/m³", "viscosity": "2 mPa·s", "vapour_pressure": "10 Pa absolute"},
    {"temperature": "60 °C", "density": "925 kg/m³", "viscosity": "1 mPa·s", "vapour_pressure": "90 Pa absolute"},
]
_IN_STOKES = [{**row, "viscosity": f"{n} cSt"} for row, n in zip(_TABLE, (9, 6), strict=True)]
#: Each kind of supply and each way to the properties of a liquid.
SUPPLIES: tuple[Document, ...] = (
    plant(_POINT),
    plant(_POINT | {"supply.velocity_head": "left_out", "line.withheld_head": "0.3 m"}),
    plant({"supply.kind": "saturated", "intake": INTAKE}),
    plant({"supply.kind": "gas_blanketed", "supply.pressure": {"lowest": "3 kPa absolute"}}),
    plant({"supply.level.drawdown": "0.2 m", "pump.arrangement": "wet_pit"}, line=False),
    plant({"pump.npsh_required.datum_elevation": "-0.2 m"}),
    plant({"pump.speed": "200 r/min", "pump.npsh_required.speed": "200 r/min",
           "pump.reciprocating": {"type": "triplex", "liquid": "water"},
           "line.sections.0.elements.1": {"id": "2", "kind": "pipe", "length": "8 m", "elevation": "0 m"}}),
    plant({"liquid": {"name": "oil", "temperature": {"highest": "25 °C"}, "table": _TABLE, **_CITED}}),
    plant({"liquid": {"name": "oil", "temperature": {"highest": "25 °C"}, "table": _IN_STOKES, **_CITED}}),
    plant({"liquid": {"name": "sea water", "salinity": "35 g/kg", "vapour_pressure_of": "raoult",
                      "temperature": {"highest": "25 °C"}, **_CITED}}),
    plant({"liquid": {"name": "ethylene glycol", "mass_fraction": "35 %", "vapour_pressure_of": "raoult",
                      "temperature": {"highest": "25 °C"}, **_CITED}}),
)  # fmt: skip

#: Plants that between them call for every equation.
PLANTS: tuple[Document, ...] = (
    plant({"intake": INTAKE, "criteria.npsh_margin": {"ratio": "1.1", "difference": "0.6 m"}}, readings=1),
    plant({"line.friction_contingency": "10 %", "criteria.npsh_margin": {"difference": "0.6 m"}}),
    plant({"site": {"elevation": "500 m", "weather_allowance": "1.7 kPa"}}),
    plant({"site": {"barometer": {"normal": "100 kPa absolute"}, "weather_allowance": "1.7 kPa"}}),
    plant({"readings.0.gauge.pressure": "4 inHg vacuum"}, line=False, readings=1),
    plant({"supply.kind": "gas_blanketed", "supply.pressure": {"lowest": "20 kPa gauge"}}),
    plant({"liquid.temperature": {"average": "20 °C"}}),
    plant({"liquid.viscosity": {"value": "1 cSt"}, "pump.flow.highest": "1 m³/h"}),
    plant({"liquid.viscosity": {"value": "120 cSt"}}),
    plant(
        {
            "line.sections.0.elements.3": {
                "id": "4", "kind": "strainer", "name": "STR-1", "drop": {"clean": "1 kPa", "fouled": "2 kPa"}, "at_flow": "200 m³/h"
            }
        }
    ),
    *LINES,
    *PUMPS,
    *SUPPLIES,
)  # fmt: skip


def test_every_equation_is_used(monkeypatch: pytest.MonkeyPatch) -> None:
    """No equation stands in the catalogue that no study applies."""
    applied: set[str] = set()
    write = Ledger._line

    def noted(self: Ledger, equation: Equation, *rest: Any, **more: Any) -> Line:
        applied.add(equation.name)
        return write(self, equation, *rest, **more)

    monkeypatch.setattr(Ledger, "_line", noted)
    for document in PLANTS:
        studied(document)
    for row in FOUND:
        run(load(row.path))
    assert {e.name for e in EQUATIONS} - applied == set()


# --- dimensions, by pint ----------------------------------------------------------------------------------------------

#: Kind of quantity -> pint's name of its SI unit, written down here and not derived from our own table.
SI = {
    "ratio": "dimensionless", "length": "m", "bore": "m", "area": "m**2", "velocity": "m/s", "acceleration": "m/s**2", "flow": "m**3/s",
    "pressure": "Pa", "pressure_difference": "Pa", "density": "kg/m**3", "dynamic_viscosity": "Pa*s", "kinematic_viscosity": "m**2/s",
    "specific_weight": "N/m**3", "temperature": "K", "absolute_temperature": "K", "temperature_difference": "K", "lapse_rate": "K/m", "speed": "1/s",
    "specific_speed": "dimensionless",
}  # fmt: skip
#: Values of usual size, in SI, at which every formula is inside its domain.
USUAL = {
    "length": 3.2, "bore": 0.25, "area": 0.03, "velocity": 1.7, "acceleration": 9.80665, "flow": 0.05, "pressure": 1.0e5,
    "pressure_difference": 2.0e3, "density": 998.2, "dynamic_viscosity": 1.0e-3, "kinematic_viscosity": 1.0e-6, "specific_weight": 9789.0,
    "temperature": 293.0, "absolute_temperature": 293.0, "temperature_difference": 5.0, "lapse_rate": 0.0065, "ratio": 1.3,
    "speed": 24.0, "specific_speed": 145.0,
}  # fmt: skip
OWN = {"Re": 3.0e5, "r": 2.0e-4, "f": 0.016, "f_T": 0.014, "eps": 4.6e-5, "eps_c": 4.6e-5, "r_0": 6.356766e6, "Z": 900.0, "H": 900.0,
       "n_a": 5.2559, "K_h": 0.034163195, "n": 3.0, "Fr": 0.6, "c": 0.1, "Q_A": 0.03, "Q_B": 0.08,
       "T_1": 283.0, "T_t": 300.0, "T_2": 313.0}  # fmt: skip


@cache
def registry() -> pint.UnitRegistry[Any]:
    return pint.UnitRegistry()


def usual(symbol: str) -> float:
    return OWN.get(symbol, USUAL[NOMENCLATURE[symbol].kind])


def by_pint(node: Node, values: dict[str, Any]) -> Any:
    """A tree in pint's own arithmetic: it refuses what does not balance."""
    match node:
        case Num(t):
            return registry().Quantity(float(t), "dimensionless")
        case Name("pi"):
            return registry().Quantity(math.pi, "dimensionless")
        case Name(name):
            return values[name]
        case Neg(x):
            return -by_pint(x, values)
        case Bin("+", a, b):
            return by_pint(a, values) + by_pint(b, values)
        case Bin("-", a, b):
            return by_pint(a, values) - by_pint(b, values)
        case Bin("*", a, b):
            return by_pint(a, values) * by_pint(b, values)
        case Bin("/", a, b):
            return by_pint(a, values) / by_pint(b, values)
        case Bin("**", a, b):
            return by_pint(a, values).to_base_units() ** by_pint(b, values).to("dimensionless").magnitude
        case Call("sqrt", (x,)):
            return by_pint(x, values).to_base_units() ** 0.5
        case Call("log10", (x,)):
            return numpy.log10(by_pint(x, values).to("dimensionless"))
        case Call("max", args):
            return max(by_pint(x, values) for x in args)
        case Call("sum", (x,)):
            return 2 * by_pint(x, values)
    raise AssertionError(node)


@by_name
def test_the_dimensions_balance_by_pint(equation: Equation) -> None:
    units = {s: registry().Quantity(usual(s), SI[NOMENCLATURE[s].kind]) for s in (*equation.operands, equation.result)}
    if isinstance(equation.tree, Cmp):
        left, right = by_pint(equation.tree.a, units), by_pint(equation.tree.b, units)
        assert left.dimensionality == right.dimensionality
        return
    found = by_pint(equation.tree, units)
    assert found.dimensionality == units[equation.result].dimensionality, (
        f"{found.dimensionality} for {equation.result}"
    )
    ours = evaluate(
        equation.tree,
        {s: [usual(s)] * 2 if f"sum({s})" in equation.text else usual(s) for s in equation.operands},
        InFloat(),
    )
    assert found.to_base_units().magnitude == pytest.approx(ours, rel=1e-12)


@pytest.mark.parametrize("rule", RULES, ids=[r.name for r in RULES])
def test_a_rule_compares_like_with_like_by_pint(rule: Rule) -> None:
    left, right = (registry().Quantity(1, SI[NOMENCLATURE[s].kind]) for s in names(rule.tree))
    assert left.dimensionality == right.dimensionality


@pytest.mark.parametrize("kind", KINDS)
def test_a_kind_has_the_dimension_of_its_unit_by_pint(kind: str) -> None:
    dimension = registry().Unit(SI[kind]).dimensionality
    base = ("[length]", "[mass]", "[time]", "[temperature]")
    assert tuple(Fraction(dimension.get(b, 0)) for b in base) == KINDS[kind]


BROKEN = (
    ("H_s", "p_s * gamma"),
    ("h_V", "V**2 / 2"),
    ("Re", "rho * V * D * mu"),
    ("f", "64 / V"),
    ("NPSHA_d", "p_s + z"),
    ("Re", "nobody"),
)


@pytest.mark.parametrize(("result", "text"), BROKEN)
def test_an_equation_that_does_not_balance_is_refused(result: str, text: str) -> None:
    with pytest.raises(FormulaError):
        Equation("broken", result, text, "Broken", Cite(""))


# --- arrays and systems -----------------------------------------------------------------------------------------------


def around(symbol: str, rng: random.Random) -> float:
    return usual(symbol) * rng.uniform(0.8, 1.2)


@by_name
def test_arrays_equal_scalars(equation: Equation) -> None:
    rng = random.Random(equation.name)
    tree = residual(equation.tree) if isinstance(equation.tree, Cmp) else equation.tree
    wanted = (*equation.operands, *((equation.result,) if equation.implicit else ()))
    summed = {s for s in wanted if f"sum({s})" in equation.text}
    samples = [
        {s: [around(s, rng) for _ in range(3)] if s in summed else around(s, rng) for s in wanted} for _ in range(30)
    ]
    arrays = {
        s: [numpy.array([x[s][n] for x in samples]) for n in range(3)]
        if s in summed
        else numpy.array([x[s] for x in samples])
        for s in wanted
    }
    together = evaluate(tree, arrays, OnArrays())
    one_by_one = [evaluate(tree, x, InFloat()) for x in samples]
    assert numpy.allclose(together, one_by_one, rtol=1e-13, atol=1e-13 * max(map(abs, one_by_one)))
    precise = [
        float(
            evaluate(
                tree,
                {s: [Decimal(y) for y in v] if isinstance(v, list) else Decimal(v) for s, v in x.items()},
                InDecimal(),
            )
        )
        for x in samples
    ]
    assert numpy.allclose(precise, one_by_one, rtol=1e-10, atol=1e-12 * max(map(abs, one_by_one)))


@by_name
def test_both_display_systems_give_the_same_result(equation: Equation) -> None:
    """The same tree on coherent US numbers, converted exactly there and back: no coefficient hides a unit."""
    rng = random.Random(equation.name)
    for _ in range(5):
        metric = {s: Fraction(around(s, rng)) for s in equation.operands}
        if isinstance(equation.tree, Cmp):
            found = [solve(equation.tree, equation.result, {s: float(x / COHERENT[system][NOMENCLATURE[s].kind].factor) for s, x in metric.items()},
                           *ROOT_RANGES[equation.result]) for system in ("SI", "US")]  # fmt: skip
        else:
            found = [float(_in(system, equation, metric)) for system in ("SI", "US")]
        assert found[0] == pytest.approx(found[1], rel=1e-12)


def _in(system: str, equation: Equation, metric: dict[str, Fraction]) -> Fraction:
    units = {s: COHERENT[system][NOMENCLATURE[s].kind] for s in (*equation.operands, equation.result)}
    values: dict[str, Any] = {}
    for s, x in metric.items():
        in_unit = x / units[s].factor
        number = Decimal(in_unit.numerator) / Decimal(in_unit.denominator)
        values[s] = [number, number * 2] if f"sum({s})" in equation.text else number
    return Fraction(evaluate(equation.tree, values, InDecimal())) * units[equation.result].factor


# --- oracles: fluids --------------------------------------------------------------------------------------------------


def test_the_friction_factor_is_that_of_fluids() -> None:
    rng = random.Random(7)
    tree = EQUATION["colebrook"].tree
    assert isinstance(tree, Cmp)
    for _ in range(300):
        reynolds, roughness = 4000 * 10 ** rng.uniform(0, 4), 10 ** rng.uniform(-6, -1.31)
        ours = solve(tree, "f", {"Re": reynolds, "r": roughness}, *ROOT_RANGES["f"])
        assert ours == pytest.approx(fluids.friction_factor(reynolds, roughness, Method="Colebrook"), rel=1e-9)


def test_laminar_friction_is_that_of_fluids() -> None:
    for reynolds in (1.0, 64.0, 1999.0):
        assert evaluate(EQUATION["laminar_friction"].tree, {"Re": reynolds}, InFloat()) == pytest.approx(
            fluids.friction_factor(reynolds)
        )


def test_the_turbulent_factor_is_the_greater_in_the_transition_zone() -> None:
    """What the validity note of the transition says, at every roughness the charts have."""
    tree = EQUATION["colebrook_transition"].tree
    assert isinstance(tree, Cmp)
    for reynolds in numpy.linspace(2000, 4000, 21):
        for roughness in (0.0, 1e-5, 1e-3, 0.05):
            assert solve(tree, "f", {"Re": float(reynolds), "r": roughness}, *ROOT_RANGES["f"]) > 64 / reynolds


BORES = (0.0158, 0.0266, 0.0525, 0.0779, 0.1023, 0.1541, 0.2027, 0.3032, 0.3873, 0.59, 0.9)


@pytest.mark.parametrize("bore", BORES)
def test_the_fully_rough_factor_is_that_of_fluids(bore: float) -> None:
    """The limit the source prints against the library's fit of its table: 1 %, and 1.5 % in the smallest pipe, on the safe side."""
    ours = evaluate(EQUATION["fully_rough_friction"].tree, {"eps_c": 0.00015 * 0.3048, "D": bore}, InFloat())
    assert ours == pytest.approx(fluids.ft_Crane(bore), rel=0.01 if bore > 0.04 else 0.015)


@pytest.mark.parametrize("metres", [-5000, -400, 0, 1, 500, 1609.344, 3000, 5000, 8848, 11000])
def test_the_standard_atmosphere_is_that_of_fluids(metres: float) -> None:
    """On the geometric altitude, to 1 Pa."""
    book = Ledger("SI")
    book.part("a test", "")
    values = {s: book.constant(s) for s in ("r_0", "K_h", "beta", "p_0", "T_0")}
    values["Z"] = book.convert(book.given("Z", "site", parse(f"{metres} m", "elevation")))
    for name in ("geopotential_height", "atmosphere_exponent", "standard_atmosphere"):
        values[EQUATION[name].result] = book.apply(name, values)
    oracle = fluids.ATMOSPHERE_1976(metres).P
    assert values["p_a"].shadow == pytest.approx(oracle, abs=1)
    assert float(values["p_a"].record) == pytest.approx(oracle, abs=2), "six digits, each line rounded"


PIPES = [
    (f"NPS {n}", s)
    for n in ("1/2", "1", "1-1/2", "2", "3", "4", "6", "8", "10", "12", "16", "20", "24")
    for s in ("40", "STD", "80", "XS")
]


@pytest.mark.parametrize(("size", "schedule"), PIPES)
def test_a_bore_is_that_of_the_table(size: str, schedule: str) -> None:
    """Outside diameter less twice the wall; inch sizes as fluids' table has them."""
    whole, _, part = size.removeprefix("NPS ").partition("-")
    nps = float(Fraction(whole)) + float(Fraction(part or 0))
    try:
        _, inside, outside, wall = fluids.nearest_pipe(NPS=nps, schedule=schedule)
    except ValueError:
        with pytest.raises(lookup.OutOfRange):
            lookup.bore(size, schedule)
        return
    found = lookup.bore(size, schedule)
    assert float(found.millimetres) == pytest.approx(inside * 1000, abs=0.005)
    assert float(found.millimetres) == pytest.approx((outside - 2 * wall) * 1000, abs=0.01)
    assert f"{size} schedule {schedule}" in found.place


def test_dn_and_nps_are_the_same_pipe() -> None:
    """Pairs of ISO 6708 and ASME B36.10M as their tables pair them."""
    for dn, nps in (
        ("15", "1/2"),
        ("25", "1"),
        ("40", "1-1/2"),
        ("50", "2"),
        ("65", "2-1/2"),
        ("80", "3"),
        ("100", "4"),
        ("150", "6"),
        ("600", "24"),
    ):
        assert lookup.bore(f"DN {dn}", "40").millimetres == lookup.bore(f"NPS {nps}", "40").millimetres


NO_PIPE = (
    ("DN 101", "40"),
    ("NPS 7", "40"),
    ("NPS 8", "41"),
    ("NPS 0", "40"),
    ("NPS 1/0", "40"),
    ("NPS x", "40"),
    ("DN 4000", "40"),
)


@pytest.mark.parametrize(("size", "schedule"), NO_PIPE)
def test_a_pipe_of_no_table_is_refused(size: str, schedule: str) -> None:
    with pytest.raises(lookup.OutOfRange):
        lookup.bore(size, schedule)


# --- oracles: properties of water -------------------------------------------------------------------------------------


@pytest.mark.parametrize("kelvin", [273.16, 278.15, 300.0, 333.15, 372.755919, 450.0, 599.9])
def test_looked_up_properties_are_consistent_with_the_library_s_derived_outputs(kelvin: float) -> None:
    """Through other inputs than the look-up's own: from pressure back to temperature, from volume, from density."""
    from CoolProp.CoolProp import PropsSI

    pressure, density, viscosity = (
        lookup.liquid("water", n, kelvin) for n in ("vapour_pressure", "density", "viscosity")
    )
    assert PropsSI("T", "P", pressure, "Q", 0, "Water") == pytest.approx(kelvin, rel=1e-7)
    assert PropsSI("D", "P", pressure, "Q", 0, "Water") == pytest.approx(density, rel=1e-6)
    assert PropsSI("V", "T", kelvin, "D", density, "Water") == pytest.approx(viscosity, rel=1e-6)
    assert PropsSI("G", "T", kelvin, "Q", 0, "Water") == pytest.approx(
        PropsSI("G", "T", kelvin, "Q", 1, "Water"), abs=1e-2
    )


def test_the_library_gives_the_published_viscosity() -> None:
    """IAPWS R12-08 (2008), table 4: 298.15 K and 998 kg/m³, 889.735100 µPa·s (recalled, not re-read)."""
    from CoolProp.CoolProp import PropsSI

    assert PropsSI("V", "T", 298.15, "D", 998, "Water") == pytest.approx(889.735100e-6, rel=1e-8)


@pytest.mark.parametrize("name", lookup.PROPERTIES)
@pytest.mark.parametrize("kelvin", [273.15, 600.001, -5.0, 0.0, 1e9])
def test_water_outside_its_range_is_refused(name: str, kelvin: float) -> None:
    with pytest.raises(lookup.OutOfRange, match="0.01 °C"):
        lookup.liquid("water", name, kelvin)


def test_properties_are_written_under_symbols_of_their_kind() -> None:
    assert {p.symbol: NOMENCLATURE[p.symbol].kind for p in lookup.PROPERTIES.values()} == {
        "p_v": "pressure", "rho": "density", "mu": "dynamic_viscosity"}  # fmt: skip


def test_the_hydrostatic_constant_is_that_of_its_definition() -> None:
    """g₀M₀/R*: 9.80665 · 28.9644e-3 / 8.31432, the constants of the U.S. Standard Atmosphere 1976."""
    assert float(lookup.CONSTANTS["K_h"].text.split()[0]) == pytest.approx(9.80665 * 28.9644e-3 / 8.31432, rel=1e-7)
