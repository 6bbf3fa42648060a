"""The ledger: addresses, memory, exact conversions, and every printed line re-computed from what is printed."""

from __future__ import annotations

import ast
import math
from collections.abc import Iterator, Sequence
from dataclasses import replace
from decimal import ROUND_HALF_EVEN, Context, Decimal
from fractions import Fraction
from functools import cache
from pathlib import Path
from typing import Any

import pint
import pytest
from plants import value

import calcpack
from calcpack.conversion import conversion_tree
from calcpack.formula import text
from calcpack.ledger import Ledger
from calcpack.lookup import CONSTANTS, OutOfRange
from calcpack.quantity import Quantity, parse
from calcpack.symbols import KINDS, NOMENCLATURE
from calcpack.units import COHERENT, PLANT, UNITS, Unit, unit
from calcpack.value import drift, in_unit

ROOT = Path(__file__).parents[1]
SAMPLES = sorted((ROOT / "sample_inputs").glob("*.yaml"))
Json = dict[str, Any]


@cache
def record(path: Path) -> Json:
    return calcpack.assess(path)


def in_losses(block: Json) -> Iterator[Json]:
    yield from (row["line"] for row in block["rows"])
    yield block["total"]


def lines(of: Json) -> list[Json]:
    """Every printed line once, in the order of the page."""
    found: dict[str, Json] = {line["address"]: line for line in of["inputs"]}
    for part in of["computation"]:
        for block in part["blocks"]:
            each = [block["line"]] if "line" in block else in_losses(block["losses"]) if "losses" in block else ()
            for line in each:
                assert found.setdefault(line["address"], line) == line, f"{line['address']} printed twice, differently"
    return list(found.values())


# --- a second evaluator: the printed text, the printed numbers, nothing of ours ---------------------------------------

FIFTY = Context(prec=50)
PI = Decimal("3.14159265358979323846264338327950288419716939937510")


class Reader(ast.NodeVisitor):
    """A reader with a long calculator: one printed formula on printed numbers."""

    def __init__(self, numbers: dict[str, Any]) -> None:
        self.numbers = numbers

    def visit_Expression(self, node: ast.Expression) -> Decimal:
        return self.visit(node.body)

    def visit_Constant(self, node: ast.Constant) -> Decimal:
        return Decimal(str(node.value))

    def visit_Name(self, node: ast.Name) -> Any:
        return PI if node.id == "pi" else self.numbers[node.id]

    def visit_UnaryOp(self, node: ast.UnaryOp) -> Decimal:
        assert isinstance(node.op, ast.USub)
        return -self.visit(node.operand)

    def visit_BinOp(self, node: ast.BinOp) -> Decimal:
        a, b = self.visit(node.left), self.visit(node.right)
        if isinstance(node.op, ast.Add):
            return FIFTY.add(a, b)
        if isinstance(node.op, ast.Sub):
            return FIFTY.subtract(a, b)
        if isinstance(node.op, ast.Mult):
            return FIFTY.multiply(a, b)
        if isinstance(node.op, ast.Div):
            return FIFTY.divide(a, b)
        assert isinstance(node.op, ast.Pow)
        return FIFTY.power(a, b)

    def visit_Call(self, node: ast.Call) -> Decimal:
        assert isinstance(node.func, ast.Name)
        x = [self.visit(each) for each in node.args]
        match node.func.id:
            case "sqrt":
                return FIFTY.sqrt(x[0])
            case "log10":
                return FIFTY.log10(x[0])
            case "max":
                return max(x)
            case "sum":
                return sum(x[0], Decimal(0))
        raise AssertionError(node.func.id)

    def visit_Compare(self, node: ast.Compare) -> Decimal:
        """An equality's residual: left side less right side."""
        return FIFTY.subtract(self.visit(node.left), self.visit(node.comparators[0]))


def read(formula: str, numbers: dict[str, Any]) -> Decimal:
    found = Reader(numbers).visit(ast.parse(formula, mode="eval"))
    assert isinstance(found, Decimal)
    return found


def printed(x: Decimal) -> Decimal:
    """The published rule: to 12 digits, then half to even to 6."""
    return Context(prec=6, rounding=ROUND_HALF_EVEN).plus(Context(prec=12, rounding=ROUND_HALF_EVEN).plus(x))


def numbers(line: Json) -> dict[str, Any]:
    """The printed operands, those of one symbol together where the formula sums them."""
    found: dict[str, Any] = {}
    for operand in line["operands"]:
        found.setdefault(operand["symbol"], []).append(Decimal(operand["value"]))
    return {symbol: many if f"sum({symbol})" in line["formula"] else many[0] for symbol, many in found.items()}


@pytest.mark.parametrize("path", SAMPLES, ids=lambda p: p.stem)
def test_printed_operands_give_the_printed_result(path: Path) -> None:
    computed = [x for x in lines(record(path)) if x["kind"] in ("equation", "conversion")]
    assert len(computed) > 20
    for line in computed:
        assert printed(read(line["formula"], numbers(line))) == Decimal(line["value"]), line["address"]


@pytest.mark.parametrize("path", SAMPLES, ids=lambda p: p.stem)
def test_the_residual_changes_sign_at_the_printed_root(path: Path) -> None:
    for line in (x for x in lines(record(path)) if x["kind"] == "root"):
        at = [read(line["formula"], numbers(line) | {line["symbol"]: Decimal(x)}) for x, _ in line["residuals"]]
        places = [Decimal(x) for x, _ in line["residuals"]]
        root = Decimal(line["value"])
        unit_of_last = Decimal(1).scaleb(root.adjusted() - 5)
        assert places == [root - unit_of_last / 2, root, root + unit_of_last / 2]
        assert at[0] * at[2] < 0
        assert [f"{Context(prec=3).plus(x):E}" for x in at] == [r for _, r in line["residuals"]]


@pytest.mark.parametrize("path", SAMPLES, ids=lambda p: p.stem)
def test_every_operand_is_the_result_of_the_line_it_cites(path: Path) -> None:
    by_address = {x["address"]: x for x in lines(record(path))}
    operands = [o for x in by_address.values() for o in x["operands"]]
    assert operands
    for operand in operands:
        cited = by_address[operand["address"]]
        assert (operand["value"], operand["unit"]) == (cited["value"], cited["unit"])


@pytest.mark.parametrize("path", SAMPLES, ids=lambda p: p.stem)
def test_a_line_uses_only_lines_above_it(path: Path) -> None:
    for line in lines(record(path)):
        section, _, number = line["address"].partition(".")
        for operand in line["operands"]:
            place, _, above = operand["address"].partition(".")
            assert place == "4" or (place == section == "8" and int(above) < int(number))


@pytest.mark.parametrize("path", SAMPLES, ids=lambda p: p.stem)
def test_looked_up_values_are_the_library_s_at_the_printed_state(path: Path) -> None:
    from CoolProp.CoolProp import PropsSI

    output = {"p_sat": "P", "rho_sat": "D", "mu_sat": "V", "rho": "D", "mu": "V"}
    found = [x for x in lines(record(path)) if x["kind"] == "lookup" and x["operands"]]
    for line in found:
        state = []
        for operand in line["operands"]:
            of = UNITS[operand["unit"]]
            state.append(float((Fraction(operand["value"]) + of.offset) * of.factor))
        fluid = line["library"].partition("(")[2].rstrip(")")
        mixture = fluid.removesuffix(" at 1 MPa")
        asked = ("P", 1e6, f"{mixture}[{state[1]}]") if len(state) == 2 else ("Q", 0, fluid)
        of_property = output[line["function"].partition("(")[0]]
        assert printed(Decimal(PropsSI(of_property, "T", state[0], *asked))) == Decimal(line["value"])


@pytest.mark.parametrize("path", SAMPLES, ids=lambda p: p.stem)
def test_addresses_are_consecutive(path: Path) -> None:
    for section in ("4", "8"):
        found = sorted(
            int(a.partition(".")[2]) for a in (x["address"] for x in lines(record(path))) if a.startswith(f"{section}.")
        )
        assert found == list(range(1, len(found) + 1))


@pytest.mark.parametrize("path", SAMPLES, ids=lambda p: p.stem)
def test_the_shadow_stands_beside_the_record(path: Path) -> None:
    """Line rounding moves no line by more than a few hundred-thousandths of what it is made of.

    The widest is vapour pressure, 6 % a kelvin on a temperature rounded to 0.001 K.
    """
    for line in lines(record(path)):
        of = UNITS[line["unit"]]
        full, shown = float(line["shadow"]["value"]), float((Fraction(line["value"]) + of.offset) * of.factor)
        parts = [
            abs(float(Fraction(o["value"]) * UNITS[o["unit"]].factor))
            for o in line["operands"]
            if UNITS[o["unit"]].kind == of.kind
        ]
        assert abs(full - shown) <= 4e-5 * max([abs(shown), *parts]), line["address"]


@pytest.mark.parametrize("path", SAMPLES, ids=lambda p: p.stem)
def test_headlines_are_the_record_in_plant_units(path: Path) -> None:
    compared = {c[s]["address"] for c in record(path)["checks"] for s in ("left", "right") if c[s]}
    for line in lines(record(path)):
        shown = line["headline"]
        frm, to = UNITS[line["unit"]], UNITS[shown["unit"]]
        exact = (Fraction(line["value"]) + frm.offset) * frm.factor / to.factor - to.offset
        # What a rule compares is rounded to the safe side, all else to the nearest.
        part = Fraction(1) if line["address"] in compared else Fraction(1, 2)
        last = part * Fraction(10) ** int(Decimal(shown["text"]).as_tuple().exponent)
        assert abs(Fraction(shown["text"]) - exact) <= last, line["address"]


# --- conversions ------------------------------------------------------------------------------------------------------

PINT = {
    "µm": "micrometer", "m³/d": "m**3/day", "L/s": "liter/s", "L/min": "liter/min", "m³/h": "m**3/hour", "ft³/min": "ft**3/min",
    "gal/min": "gallon/min", "Mgal/d": "1000000*gallon/day", "UK gal/min": "imperial_gallon/min", "bbl/h": "oil_barrel/hour",
    "bbl/d": "oil_barrel/day", "kgf/cm²": "kilogram_force/cm**2", "psi": "psi", "lbf/ft²": "lbf/ft**2", "Torr": "torr",
    "mH2O": "meter*water", "mmH2O": "millimeter*water", "ftH2O": "foot*water", "inH2O": "inch*water",
    "mmHg": "13595.1*kg/m**3*g_0*mm", "inHg": "13595.1*kg/m**3*g_0*inch", "kg/L": "kg/liter", "lb/ft³": "lb/ft**3",
    "slug/ft³": "slug/ft**3", "Pa·s": "Pa*s", "mPa·s": "mPa*s", "cP": "centipoise", "lbf·s/ft²": "lbf*s/ft**2", "lb/(ft·s)": "lb/(ft*s)",
    "cSt": "centistokes", "lbf/ft³": "lbf/ft**3", "°C": "delta_degC", "°F": "delta_degF", "°R": "delta_degF", "r/min": "1/min", "1": "dimensionless",
    "%": "percent",
}  # fmt: skip


@cache
def registry() -> pint.UnitRegistry[Any]:
    return pint.UnitRegistry(non_int_type=Fraction)


def by_pint(of: Unit) -> Fraction:
    """A unit's size in SI as pint has it, exact; conventional water of 1000 kg/m³ written out."""
    text = PINT.get(of.name, of.name.replace("²", "**2").replace("³", "**3"))
    if "water" in text:
        text = text.replace("*water", "*1000*kg/m**3*g_0")
    found = registry().Quantity(1, "dimensionless") * registry().parse_expression(text)
    return Fraction(found.to_base_units().magnitude)


@pytest.mark.parametrize("name", UNITS)
def test_a_unit_has_the_exact_size_of_pint(name: str) -> None:
    assert UNITS[name].factor == by_pint(UNITS[name])


PAIRS = [(u.name, system) for u in UNITS.values() for system in ("SI", "US")]


def a_symbol_of(of: Unit) -> str:
    """A symbol measured in units of that kind."""
    return next(s.name for s in NOMENCLATURE.values() if COHERENT["SI"][s.kind].kind == of.kind)


MEASURED = {COHERENT["SI"][s.kind].kind for s in NOMENCLATURE.values()}


@pytest.mark.parametrize(("name", "system"), [(n, s) for n, s in PAIRS if UNITS[n].kind in MEASURED])
def test_a_conversion_line_is_exact(name: str, system: str) -> None:
    """The printed factor is pint's, exact; the printed result is the exact product, rounded once."""
    frm = UNITS[name]
    symbol = a_symbol_of(frm)
    to = COHERENT[system][NOMENCLATURE[symbol].kind]
    tree = conversion_tree(symbol, frm, to)
    for typed in ("1", "3600", "0.0173", "98.7654321"):
        exact = (Fraction(typed) + frm.offset) * by_pint(frm) / by_pint(to)
        digits = FIFTY.divide(Decimal(exact.numerator), Decimal(exact.denominator))
        assert printed(read(text(tree), {symbol: Decimal(typed)})) == printed(digits)
        ledger = Ledger(system)
        ledger.part("a test", "")
        entered = ledger.given(symbol, "as typed", Quantity(Decimal(typed), typed, frm))
        assert (str(entered.record), entered.unit) == (typed, frm)
        made = ledger.convert(entered)
        assert made.record == (Decimal(typed) if frm.name == to.name else printed(digits))
        assert made.shadow == pytest.approx(float(exact * by_pint(to)), rel=1e-15)
        assert made.unit == to


def test_units_of_one_dimension_have_one_coherent_unit() -> None:
    """Printed numbers go straight into a formula: every coherent unit is a product of the system's base units.

    But for absolute temperatures, which formulas take the ratios of only (tests/test_liquid.py): degrees Rankine in US.
    """
    for system, base in (("SI", {"L": 1.0, "M": 1.0}), ("US", {"L": 0.3048, "M": 0.45359237 * 9.80665 / 0.3048})):
        for kind, (length, mass, _, _) in KINDS.items():
            size = base["L"] ** float(length) * base["M"] ** float(mass)
            size *= 5 / 9 if (system, kind) == ("US", "absolute_temperature") else 1.0
            assert float(COHERENT[system][kind].factor) == pytest.approx(size, rel=1e-14), (system, kind)
            assert COHERENT[system][kind].offset == 0
            assert PLANT[system][kind][0].kind == COHERENT[system][kind].kind


# --- one line at a time -----------------------------------------------------------------------------------------------


def ledger(system: str = "SI") -> Ledger:
    made = Ledger(system)
    made.part("a test", "scope")
    return made


def test_the_same_request_gives_the_same_line() -> None:
    book = ledger()
    typed, area = book.given("Q", "flow", parse("200 m³/h", "flow")), value("A", "0.0323", address="4.9")
    flow = book.convert(typed)
    first = book.apply("mean_velocity", {"Q": flow, "A": area})
    count = len(book.parts[0].blocks)
    book.part("another part", "scope")
    assert book.apply("mean_velocity", {"Q": flow, "A": area}) is first
    assert book.given("Q", "flow", parse("200 m³/h", "flow")) is typed and book.convert(typed) is flow
    assert book.constant("g") is book.constant("g")
    assert len(book.parts[0].blocks) == count and book.parts[1].blocks == []


def test_another_operand_gives_another_line() -> None:
    book = ledger()
    area = value("A", "0.0323", address="4.9")
    first = book.apply("mean_velocity", {"Q": value("Q", "0.05", address="4.1"), "A": area})
    second = book.apply("mean_velocity", {"Q": value("Q", "0.05", address="4.2"), "A": area})
    assert first.address != second.address and first.record == second.record


def test_a_looked_up_property_is_looked_up_once() -> None:
    book = ledger()
    temperature = book.given("T", "temperature", parse("20 °C", "temperature"))
    first = book.look_up("water", "density", temperature)
    assert book.look_up("water", "density", temperature) is first
    assert sum(x.kind == "lookup" for x in book.lines()) == 1


@pytest.mark.parametrize("system", ["SI", "US"])
@pytest.mark.parametrize("kelvin", ["273.0", "600.1", "20"])
def test_a_look_up_outside_its_range_is_refused(system: str, kelvin: str) -> None:
    with pytest.raises(OutOfRange, match="between"):
        ledger(system).look_up("water", "density", value("T", kelvin, system))


@pytest.mark.parametrize("system", ["SI", "US"])
def test_an_operand_in_the_wrong_unit_is_a_defect(system: str) -> None:
    book = ledger(system)
    area = value("A", "0.0323", system)
    flow = replace(value("Q", "200", system), unit=unit("m³/h"))
    with pytest.raises(AssertionError, match="Q arrives in m³/h"):
        book.apply("mean_velocity", {"Q": flow, "A": area})
    with pytest.raises(KeyError):
        book.apply("mean_velocity", {"A": area})


def test_an_operand_of_the_other_system_is_a_defect() -> None:
    with pytest.raises(AssertionError):
        ledger("US").apply("mean_velocity", {"Q": value("Q", "0.05", "SI"), "A": value("A", "0.5", "US")})


@pytest.mark.parametrize("symbol", CONSTANTS)
@pytest.mark.parametrize("system", ["SI", "US"])
def test_a_constant_is_entered_and_converted(symbol: str, system: str) -> None:
    found = ledger(system).constant(symbol)
    assert found.unit == COHERENT[system][NOMENCLATURE[symbol].kind]
    assert float(found.record) * float(found.unit.factor) == pytest.approx(found.shadow, rel=5.1e-6)  # six digits


def test_a_group_without_lines_leaves_no_heading_and_a_heading_is_not_repeated() -> None:
    book = ledger()
    book.group("empty")
    book.group("velocity")
    area = book.apply("bore_area", {"D": value("D", "0.2")})
    book.group("velocity")
    book.apply("mean_velocity", {"Q": value("Q", "0.05", address="8.9"), "A": area})
    assert [b for b in book.parts[0].blocks if isinstance(b, str)] == ["velocity"]


def test_a_loss_table_sums_its_printed_rows() -> None:
    book = ledger()
    head = value("h_V", "0.123457", address="4.1")
    rows = [
        (str(n), f"element {n}", {"K": value("K", k, address=f"4.{n + 2}"), "h_V": head})
        for n, k in enumerate(("0.5", "0.337", "1.2"))
    ]
    block = book.losses("losses", rows, "losses")
    assert block is book.parts[0].blocks[-1]
    shown: Sequence[Decimal] = [row.line.value.record for row in block.rows]
    assert shown == [Decimal("0.0617285"), Decimal("0.0416050"), Decimal("0.148148")]
    assert block.total.value.record == printed(sum(shown, Decimal(0)))
    assert block.worked == "0" and book.line_of(block.total.value) is block.total


def test_a_fingerprint_follows_the_content_and_not_the_place() -> None:
    a, b = ledger(), ledger()
    b.given("Q", "flow", parse("1 m³/s", "flow"))
    b.apply("bore_area", {"D": value("D", "0.3", address="4.8")})
    for book in (a, b):
        book.apply("bore_area", {"D": value("D", "0.2", address="4.9")})
    last = [book.lines()[-1] for book in (a, b)]
    assert last[0].value.address != last[1].value.address
    assert last[0].fingerprint == last[1].fingerprint
    other = ledger()
    other.apply("bore_area", {"D": value("D", "0.200001")})
    assert other.lines()[-1].fingerprint != last[0].fingerprint


DRIFT = (
    ("H_s", "27.6353", "US", 27.6353 * 0.3048, "0"),
    ("H_s", "27.6353", "US", 27.6359 * 0.3048, "0.0006"),
    ("T", "302.594", "SI", 302.5944, "0.0004"),
)


@pytest.mark.parametrize(("symbol", "record", "system", "shadow", "expected"), DRIFT)
def test_drift_is_counted_in_the_unit_of_the_record(
    symbol: str, record: str, system: str, shadow: float, expected: str
) -> None:
    assert float(drift(value(symbol, record, system, shadow=shadow))) == pytest.approx(float(expected), abs=1e-12)


IN_UNIT = (
    ("p_b", "1717.92", "US", "psi", 11.93),
    ("T", "302.594444", "US", "°F", 85.0),
    ("Q", "8.02083", "US", "gal/min", 3600.0),
    ("T", "273.15", "SI", "°C", 0.0),
)


@pytest.mark.parametrize(("symbol", "record", "system", "to", "expected"), IN_UNIT)
def test_a_record_in_another_unit(symbol: str, record: str, system: str, to: str, expected: float) -> None:
    assert math.isclose(float(in_unit(value(symbol, record, system), unit(to))), expected, rel_tol=1e-6, abs_tol=1e-5)
