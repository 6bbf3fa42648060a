"""The reader: what it reads back right, and what it must find."""

from __future__ import annotations

import ast
from collections import Counter
from decimal import Decimal
from fractions import Fraction
from pathlib import Path
from random import Random
from typing import Any

import pytest
from reader_packages import (
    PLANTS,
    falsified,
    lines,
    other,
    package,
    plant_package,
    recomputed_glyphs,
    record,
    sample_sheets,
    with_glyph,
)
from reader_pictures import DISPLAYS, ROW, Trees, expected, pdf, printed

import calcpack.page.pdf
import calcpack.reader
from calcpack import formula
from calcpack.page.layout import MEASURE, Setting, line, with_numbers
from calcpack.page.pdf import fill, render
from calcpack.reader import NotAPackage, Report, verify
from calcpack.reader.arithmetic import of_record
from calcpack.reader.factors import printed_factor
from calcpack.reader.failures import Unread
from calcpack.reader.glyphs import sheets
from calcpack.reader.notation import Marks
from calcpack.reader.picture import Form, forms
from calcpack.reader.reading import read_back
from calcpack.reader.text import scalar
from calcpack.reader.tree import Op, Tree
from calcpack.reader.units import converted, named
from calcpack.units import UNITS

# The engine leaves its colour profile open until the collector comes by.
pytestmark = pytest.mark.filterwarnings("ignore:.*sRGB2014.icc:pytest.PytestUnraisableExceptionWarning")

FOOT, POUND, GRAVITY = Fraction("0.3048"), Fraction("0.45359237"), Fraction("9.80665")


# --- pictures --------------------------------------------------------------------------------------------


def read_pictures(settings: list[Setting], rows: int = 12) -> list[list[Form] | str]:
    """The forms of each picture as read back, or why it could not be read."""
    found: list[list[Form] | str] = []
    pages = sheets(printed(settings, rows))
    for i in range(len(settings)):
        page = pages[i // rows]
        high = page.height - ROW * (i % rows)
        glyphs = tuple(g for g in page.glyphs if high - ROW < (g.bottom + g.top) / 2 < high)
        bars = tuple(b for b in page.bars if high - ROW < b.axis < high)
        try:
            found.append(forms(Marks(glyphs, bars)))
        except Unread as error:
            found.append(str(error))
    return found


def wrong_trees(seed: int, count: int, depth: int) -> list[str]:
    """Random formulas set, printed and read back: those not read as the trees that were set."""
    trees, wanted = Trees(seed), []
    settings: list[Setting] = []
    while len(settings) < count:
        node = trees.tree(depth)
        values = trees.values(node)
        setting = line("z_d", node, values, DISPLAYS)
        if setting.width < MEASURE + 0.01 and setting.height < ROW - 4:
            settings.append(setting)
            wanted.append([expected(node), expected(with_numbers(node, values))])
    read = read_pictures(settings)
    return [
        f"{setting.alt}: {got}"
        for setting, got, want in zip(settings, read, wanted, strict=True)
        if isinstance(got, str) or [form.right for form in got] != want
    ]


@pytest.mark.parametrize(("seed", "count", "depth"), [(1, 60, 2), (2, 120, 3), (3, 100, 4), (4, 40, 5)])
def test_random_formulas_read_back_as_they_were_set(seed: int, count: int, depth: int) -> None:
    assert wrong_trees(seed, count, depth) == []


@pytest.mark.campaign
@pytest.mark.parametrize("seed", range(100, 108))
def test_thousands_of_random_formulas_read_back(seed: int) -> None:
    assert wrong_trees(seed, 600, 3 + seed % 3) == []


def test_an_equation_solved_by_its_root_has_both_sides_in_both_forms() -> None:
    tree = formula.parse("1 / sqrt(f) == -2 * log10(r / 3.7 + 2.51 / (Re * sqrt(f)))")
    assert isinstance(tree, formula.Cmp)
    values = {"r": "3.27878E-4", "Re": "921510"}
    found = read_pictures([line(None, tree, values, DISPLAYS)])[0]
    sides: list[tuple[Tree, Tree]] = [
        (expected(node.a), expected(node.b))
        for node in (tree, with_numbers(tree, values))
        if isinstance(node, formula.Cmp)
    ]
    assert not isinstance(found, str)
    assert [(form.left, form.right) for form in found] == sides


def test_a_sum_is_read_with_its_symbol_and_its_terms() -> None:
    terms = ["0.0248583", "0.296570", "2.90000", "-0.167794", "1.5E-5", "4", "0.0621458"]
    found = read_pictures([line("h_L", formula.parse("sum(h)"), {"h": terms}, DISPLAYS)])[0]
    assert not isinstance(found, str)
    assert found[0].right == Op("sum", (expected(formula.Name("h")),))
    assert found[1].right == expected(with_numbers(formula.parse("sum(h)"), {"h": terms}))


@pytest.mark.parametrize("count", [1, 2, 5, 14])
def test_a_long_sum_inside_brackets_is_broken_and_read_whole(count: int) -> None:
    tree = formula.parse("g * (z_s - (1 + c) * sum(h) - z_d - h_V)")
    values = {
        "g": "9757.47",
        "z_s": "10.8052",
        "c": "0.1",
        "h": ["0.0803475"] * count,
        "z_d": "-1.2",
        "h_V": "0.160695",
    }
    setting = line("p_s", tree, values, DISPLAYS)
    assert setting.width <= MEASURE + 0.01
    found = read_pictures([setting])[0]
    assert not isinstance(found, str), found
    assert [form.right for form in found] == [expected(tree), expected(with_numbers(tree, values))]


# --- numbers, units, factors -----------------------------------------------------------------------------


@pytest.mark.parametrize(
    ("exact", "record"),
    [("2.500005", "2.50000"), ("2.500015", "2.50002"), ("99999.95", "100000"), ("1", "1.00000"), ("0", "0"),
     ("2.500000499999999", "2.50000"), ("0.00012345649999999999", "0.000123456")],
)  # fmt: skip
def test_the_published_rule_of_rounding(exact: str, record: str) -> None:
    assert str(of_record(Decimal(exact))) == record


@pytest.mark.parametrize(
    ("text", "value", "rest"),
    [("3\u202f600 gal/min", "3600", "gal/min"), ("4.166\u202f67×10⁻⁴ ft", "0.000416667", "ft"),
     ("−13.5 kPa", "-13.5", "kPa"),
     ("+0.391\u202f000 ft", "0.391000", "ft"), ("85 °F", "85", "°F"), ("1.10", "1.10", "")],
)  # fmt: skip
def test_numbers_in_running_text(text: str, value: str, rest: str) -> None:
    assert scalar(text) == (Decimal(value), rest)


@pytest.mark.parametrize("text", ["", "ft", "1.2.3", "×10⁴", "−"])
def test_what_is_no_number_is_not_read_as_one(text: str) -> None:
    with pytest.raises(Unread):
        scalar(text)


@pytest.mark.parametrize("name", [name for name in UNITS if name != "1"])
def test_two_tables_of_units_agree(name: str) -> None:
    """The writer's table and the reader's were made apart, from the definitions."""
    mine, theirs = named("s⁻¹" if name == "1/s" else name), UNITS[name]
    si = {unit.kind: other for other, unit in UNITS.items() if unit.factor == 1 and not unit.offset}[theirs.kind]
    base = {"1/s": "s⁻¹", "1": ""}.get(si, si)
    assert converted(Fraction(7), mine, base) == (7 + theirs.offset) * theirs.factor


@pytest.mark.parametrize(
    ("text", "factor"),
    [("77/34\u202f560", Fraction(77, 34560)), ("144", Fraction(144)), ("5/9", Fraction(5, 9)),
     ("0.304\u202f8²/(0.453\u202f592\u202f37 × 9.806\u202f65)", FOOT**2 / (POUND * GRAVITY))],
)  # fmt: skip
def test_exact_factors_in_running_text(text: str, factor: Fraction) -> None:
    assert printed_factor(text) == factor


# --- packages --------------------------------------------------------------------------------------------


def check_good(made: dict[str, Any], pdf: bytes) -> None:
    report = verify(pdf)
    kinds = Counter(x["kind"] for x in lines(made))
    assert report.ok, str(report)
    assert (report.recomputed, report.bracketed, report.looked_up) == (
        kinds["equation"] + kinds["conversion"], kinds["root"], kinds["lookup"]
    )  # fmt: skip
    assert (report.inputs, report.rules) == (len(made["inputs"]), len(made["checks"]))


@pytest.mark.parametrize("name", ["a", "b"])
def test_a_good_package_agrees_and_nothing_is_unread(name: str) -> None:
    check_good(record(name), package(name))


@pytest.mark.campaign
@pytest.mark.parametrize("name", ["c", "d"])
def test_every_sample_agrees(name: str) -> None:
    check_good(record(name), package(name))


@pytest.mark.campaign
@pytest.mark.parametrize("name", PLANTS)
def test_plants_unlike_the_samples_agree(name: str) -> None:
    check_good(*plant_package(name))


def found_at(report: Report) -> dict[str, str]:
    """Address -> everything found there."""
    words: dict[str, str] = {}
    for finding in (*report.disagreements, *report.unread):
        words[finding.address] = f"{words.get(finding.address, '')}; {finding.what}"
    return words


def test_falsehoods_in_print_are_found_where_they_stand() -> None:
    made, wanted = falsified(record("a"))
    found = found_at(verify(render(made, [])))
    assert {address: words for address, words in wanted.items() if words not in found.get(address, "")} == {}


def test_falsehoods_in_tables_rules_and_cover_are_found() -> None:
    made = record("a")
    losses = next(b["losses"] for part in made["computation"] for b in part["blocks"] if "losses" in b)
    rows = [row["line"] for row in losses["rows"] if "h_V" in row["line"]["formula"]]
    rows[0]["value"] = "0.0248584"
    rows[1]["operands"][0]["address"] = rows[0]["operands"][0]["address"]
    losses["total"]["headline"]["text"] = "4.013"
    made["checks"][0]["verdict"] = "not met"
    made["checks"][2]["margin"]["headline"]["text"] = "-0.09"
    made["checks"][2]["left"]["headline"]["text"] = "3.51"
    made["inputs"][3]["used"]["value"] = "4.1"
    made["conversions"][1]["factor"] = "0.3048**2 / (0.45359237 * 9.80666)"
    found = found_at(verify(render(made, [])))
    wanted = {
        rows[0]["address"]: "n K h_V gives another loss", rows[1]["address"]: "K differs from line",
        losses["total"]["address"]: "the loss shown is not the result",
        "9.1": "what is asked and the numbers give another verdict",
        "9.3": "the margin is another", made["inputs"][3]["address"]: "used otherwise than given",
        "C2": "the factor is not the exact one", "": "the cover's tally is not that of the rules",
    }  # fmt: skip
    assert {address: words for address, words in wanted.items() if words not in found.get(address, "")} == {}
    assert "the left side is not the result of record" in found["9.3"]


def test_a_headline_rounded_aside_stands_only_where_a_rule_reports_it_so() -> None:
    """A result that a rule compares is rounded to the safe side on its line too; any other is rounded to the nearest."""
    made = record("a")
    shown = {c[s]["address"] for c in made["checks"] for s in ("left", "right") if c[s]}
    needed = next(x for x in lines(made) if x["symbol"] == "S_m")
    assert needed["address"] in shown and float(needed["headline"]["text"]) > float(needed["value"])
    assert verify(package("a")).ok
    plain = next(x for x in lines(made) if x["symbol"] == "H_s")
    assert plain["address"] not in shown
    text = Decimal(plain["headline"]["text"])
    step = Decimal(1).scaleb(-len(plain["headline"]["text"].partition(".")[2]))
    plain["headline"]["text"] = str(text + step if text < Decimal(plain["value"]) else text - step)
    assert "the headline is not the result" in found_at(verify(render(made, []))).get(plain["address"], "")


def test_a_result_under_another_symbol_is_found() -> None:
    """By what the symbol measures, or by the lines that take the value under its own symbol."""
    made = record("a")
    velocity = next(x for x in lines(made) if x["symbol"] == "V")
    roughness = next(x for x in lines(made) if x["symbol"] == "r")
    velocity["symbol"], roughness["symbol"] = "g", "f"
    found = found_at(verify(render(made, [])))
    assert "g measures something else" in found[velocity["address"]]
    user = next(x for x in lines(made) if x["symbol"] == "f" and x is not roughness)
    assert f"r stands for another symbol than line {roughness['address']}" in found[user["address"]]


def test_a_relation_that_the_numbers_do_not_have_is_found() -> None:
    made = record("a")
    failed = next(c for c in made["checks"] if c["verdict"] == "not met")
    failed["found"] = "≥"
    found = found_at(verify(render(made, [])))
    assert "the numbers do not stand in the relation printed" in found[failed["address"]]


def test_a_cover_with_other_figures_or_fewer_rules_is_found() -> None:
    made = record("a")
    html = fill(made)
    first = made["checks"][0]["left"]["headline"]["text"]
    assert html.count(f"{first} ft</td>") == 1
    changed = _printed(html.replace(f"{first} ft</td>", f"{float(first) + 1:.2f} ft</td>"), made)
    assert "the cover gives other figures" in found_at(verify(changed))[made["checks"][0]["address"]]
    row = html[html.index("<tr>", html.index("the governing one first")) :].partition("</tr>")[0] + "</tr>"
    assert "the cover leaves rules out" in found_at(verify(_printed(html.replace(row, "", 1), made)))[""]


def _printed(html: str, made: dict[str, Any]) -> bytes:
    """Changed HTML of a package as a PDF."""
    with pytest.MonkeyPatch.context() as patch:
        patch.setattr(calcpack.page.pdf, "fill", lambda _: html)
        return render(made, [])


def unseen(name: str, seed: int, count: int) -> list[str]:
    """Characters changed one at a time in what is recomputed: those that the reader did not notice."""
    found, random = sample_sheets(name), Random(seed)
    pool, missed = recomputed_glyphs(found), []
    for sheet, address, glyph in random.choices(pool, k=count):
        char = other(glyph, random)
        if read_back(with_glyph(found, sheet, glyph, char=char)).ok:
            missed.append(f"sheet {sheet}, line {address}: {glyph.char} to {char} at {glyph.x:.0f}, {glyph.y:.0f}")
    return missed


def test_single_characters_changed_are_noticed() -> None:
    assert unseen("b", 11, 40) == []


@pytest.mark.campaign
@pytest.mark.parametrize("name", ["a", "b", "c", "d"])
def test_hundreds_of_characters_changed_are_noticed(name: str) -> None:
    assert unseen(name, 12, 400) == []


@pytest.mark.parametrize(
    ("changes", "words"),
    [({"colour": (255, 255, 255)}, "too light to read"), ({"drawn": False}, "not filled with ink"),
     ({"left": -30.0, "right": -20.0}, "off the paper")],
)  # fmt: skip
def test_text_that_paper_does_not_show_is_a_disagreement(changes: dict[str, object], words: str) -> None:
    found = sample_sheets("b")
    glyph = found[1].glyphs[40]
    report = read_back(with_glyph(found, 2, glyph, **changes))
    assert any(words in finding.what for finding in report.disagreements)


def test_a_sheet_left_out_is_noticed() -> None:
    found = list(sample_sheets("b"))
    del found[8]
    report = read_back(found)
    assert any("addresses do not run on" in finding.what for finding in report.disagreements)
    assert any("another sheet number" in finding.what for finding in report.disagreements)


# --- other files -----------------------------------------------------------------------------------------


@pytest.mark.parametrize("data", [b"", b"%PDF-1.7\n", b"plain text, no package", bytes(range(256)) * 40])
def test_what_is_no_pdf_is_refused(data: bytes) -> None:
    with pytest.raises(NotAPackage):
        verify(data)


@pytest.mark.parametrize("size", ["A4", "100mm 100mm"])
def test_a_foreign_pdf_is_refused(size: str) -> None:
    made = pdf(f"<style>@page{{size:{size}}}</style><p>8.1 A letter about 4.1, sheet 1 of 1")
    with pytest.raises(NotAPackage):
        verify(made)


def test_a_damaged_package_ends_in_a_report_or_a_refusal() -> None:
    whole, random = package("b"), Random(5)
    for _ in range(12):
        damaged = bytearray(whole)
        for _ in range(random.choice((1, 20, 400))):
            damaged[random.randrange(len(damaged))] = random.randrange(256)
        try:
            assert isinstance(verify(bytes(damaged)), Report)
        except NotAPackage as error:
            assert str(error)
    with pytest.raises(NotAPackage):
        verify(whole[: len(whole) // 2])


def test_the_reader_imports_nothing_else_of_ours() -> None:
    folder = Path(calcpack.reader.__file__).parent
    for path in folder.glob("*.py"):
        for node in ast.walk(ast.parse(path.read_text(encoding="utf-8"))):
            if isinstance(node, ast.ImportFrom):
                assert node.level < 2 and (node.level == 1 or not (node.module or "").startswith("calcpack")), path.name
