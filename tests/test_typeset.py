"""Formulas set as boxes: measures come from the font files themselves, expected layouts from the printed rules of the page."""

from __future__ import annotations

import re
import xml.etree.ElementTree as ElementTree
from io import BytesIO
from pathlib import Path

import pytest
from fontTools.ttLib import TTFont

from calcpack import formula
from calcpack.catalog import EQUATIONS
from calcpack.equations import Equation
from calcpack.formula import parse
from calcpack.page import layout, metrics
from calcpack.page.boxes import Box, Run
from calcpack.page.layout import MEASURE, line, with_numbers
from calcpack.page.numerals import numeral
from calcpack.page.typeset import AXIS, Display, Setter
from calcpack.symbols import NOMENCLATURE

FONTS = Path(__file__).parent.parent / "templates" / "fonts"
NAMES = {name: Display(s.base, s.sub, s.upright) for name, s in NOMENCLATURE.items()}
SVG = "{http://www.w3.org/2000/svg}"


def set_tree(text: str, numeric: bool = False) -> Box:
    return Setter(NAMES, numeric).tree(parse(text))


def printed(box: Box) -> str:
    """The characters of a box from left to right."""
    glyphs = [(x, r.y, c) for r in box.runs for x, c in zip(r.xs, r.text, strict=True)]
    return "".join(c for _, _, c in sorted(glyphs, key=lambda g: g[0]))


def run_of(box: Box, text: str) -> Run:
    return next(r for r in box.runs if r.text == text)


def test_advance_widths_are_the_font_files_own() -> None:
    font = TTFont(BytesIO((FONTS / "SourceSerif4-Regular.ttf").read_bytes()))
    cmap, widths = font.getBestCmap(), font["hmtx"]
    for character in "0123456789.()×−=√Σ":
        assert (
            metrics.glyph(metrics.REGULAR, character).advance
            == widths[cmap[ord(character)]][0] / font["head"].unitsPerEm
        )
    assert metrics.width(metrics.REGULAR, 10, "3600") == pytest.approx(
        10 * sum(widths[cmap[ord(c)]][0] for c in "3600") / 1000
    )


def test_every_face_is_bundled_with_its_licence() -> None:
    for face in metrics.FACES:
        assert metrics.path(face).parent == FONTS
    assert (FONTS / "SourceSerif4-OFL.txt").read_text(encoding="utf-8").count("SIL Open Font License") > 0
    assert (FONTS / "SourceSans3-OFL.txt").read_text(encoding="utf-8").count("SIL Open Font License") > 0


@pytest.mark.parametrize(
    ("value", "groups", "power"),
    [
        ("34560", ("34", "560"), ""),
        ("1717.92", ("1", "717.92"), ""),
        ("8.02083", ("8.020", "83"), ""),
        ("0.0159590", ("0.015", "959", "0"), ""),
        ("4.16667E-4", ("4.166", "67"), "−4"),
        ("0.000416667", ("4.166", "67"), "−4"),
        ("1.23457E+6", ("1.234", "57"), "6"),
        ("0.005", ("0.005",), ""),
        ("0", ("0",), ""),
        ("0.00", ("0.00",), ""),
    ],
)
def test_digits_in_threes_on_both_sides_of_the_point(value: str, groups: tuple[str, ...], power: str) -> None:
    n = numeral(value)
    assert (n.groups, n.power, n.negative) == (groups, power, False)
    assert numeral("-" + value).negative is (float(value) != 0)


@pytest.mark.parametrize("text", ["", "NaN", "Infinity", "3 600", "1e", "text"])
def test_what_is_not_a_number_is_refused(text: str) -> None:
    with pytest.raises(ValueError, match="not a number"):
        numeral(text)


def test_gap_between_groups_is_a_sixth_of_an_em_and_draws_nothing() -> None:
    run = set_tree("34560", numeric=True).runs[0]
    digit = metrics.glyph(metrics.REGULAR, "4").advance * 10
    assert run.text == "34560"
    assert run.xs[2] - run.xs[1] - digit == pytest.approx(10 / 6, abs=0.01)
    assert run.xs[1] - run.xs[0] == pytest.approx(digit)


def test_fraction_has_one_bar_on_the_axis_over_both_parts() -> None:
    box = set_tree("Q / A")
    (bar,) = box.bars
    top, bottom = run_of(box, "Q"), run_of(box, "A")
    assert bar.y + bar.height / 2 == pytest.approx(AXIS * 10)
    assert top.y > bar.y + bar.height and bottom.y < bar.y
    assert bar.x <= min(top.xs[0], bottom.xs[0]) and bar.x + bar.width >= max(top.xs[0], bottom.xs[0])


def test_nested_fraction_has_the_shorter_bar() -> None:
    for text in ("Q / (A / D)", "(Q / A) / D", "1 / (z + 1 / D)"):
        bars = sorted(b.width for b in set_tree(text).bars)
        assert len(bars) == 2 and bars[0] < bars[1] - 1


def test_exponent_is_set_at_seventy_per_cent_and_raised() -> None:
    box = set_tree("D**2")
    assert run_of(box, "2").size == 7.0
    assert run_of(box, "2").y == pytest.approx(3.6)
    tall = set_tree("(Q / A)**2")
    assert max(r.y for r in tall.runs if r.text == "2") > run_of(tall, "Q").y


def test_root_has_a_bar_over_its_radicand() -> None:
    box = set_tree("sqrt(g * D)")
    (bar,) = box.bars
    sign, inside = run_of(box, "√"), run_of(box, "g")
    assert bar.x < inside.xs[0] < bar.x + bar.width
    assert sign.xs[0] < bar.x < sign.xs[0] + sign.size
    assert run_of(set_tree("sqrt(Q / A)"), "√").stretch > 1


@pytest.mark.parametrize(
    ("text", "symbolic", "numeric"),
    [
        ("f * L", "fL", "f×L"),
        ("2 * g", "2g", "2×g"),
        ("g * 2", "g×2", "g×2"),
        ("g * (2 / 3)", "g×2/3", "g×2/3"),
        ("D * (1 + 2.3 * Fr)", "D(1+2.3FD)", "D×(1+2.3×FD)"),
        ("z_s - z_d", "zs−zd", "zs−zd"),
        ("-2 * log10(r)", "−2log10(r)", "−2×log10(r)"),
        ("z - (z_s - z_d)", "z−(zs−zd)", "z−(zs−zd)"),
        ("z - -g", "z−(−g)", "z−(−g)"),
        ("(-z)**2", "(−z)2", "(−z)2"),
        ("max(N_r, N_d)", "max(Nr,Nd)", "max(Nr,Nd)"),
        ("sum(h) * 2", "(Σhi)×2", "(Σhi)×2"),
        ("log10(r)**2", "(log10(r))2", "(log10(r))2"),
        ("pi * D**2", "πD2", "π×D2"),
    ],
)
def test_products_signs_and_brackets(text: str, symbolic: str, numeric: str) -> None:
    def flat(box: Box) -> str:
        return printed(box).replace("23", "2/3") if "2 / 3" in text else printed(box)

    assert flat(set_tree(text)) == symbolic
    assert flat(set_tree(text, numeric=True)) == numeric


def test_numbers_in_place_of_symbols() -> None:
    values = {"z_s": "-4.00", "z_d": "0.5", "Q": "4.16667E-4"}
    tree = with_numbers(parse("z_s - z_d + Q**2"), values)
    assert printed(Setter(NAMES, numeric=True).tree(tree)) == "(−4.00)−0.5+(4.16667×10−4)2"


def test_a_sum_is_written_out() -> None:
    tree = with_numbers(parse("sum(h)"), {"h": ["1.5", "0.25", "3"]})
    assert formula.text(tree) == "1.5 + 0.25 + 3"


def test_brackets_grow_around_tall_content() -> None:
    box = set_tree("(Q / A)**2")
    bracket = run_of(box, "(")
    glyph = metrics.glyph(metrics.REGULAR, "(")
    height = (glyph.top - glyph.bottom) * bracket.size * bracket.stretch
    assert bracket.stretch > 1
    assert height > run_of(box, "Q").y - run_of(box, "A").y


def test_short_forms_share_a_row_and_long_ones_stand_under_one_another() -> None:
    short = line("V", parse("Q / A"), {"Q": "8.02083", "A": "1.26843"}, NAMES)
    assert short.alt == "V = Q / A = 8.02083 / 1.26843"
    assert short.height < 30
    values = {"H_s": "27.6343", "z": "-4.00", "H_v": "1.38194", "h_L": "4.07892"}
    long = line("NPSHA_d", parse("H_s + z - H_v - h_L"), values, NAMES)
    signs = _places(long.svg, "=")
    assert long.width <= MEASURE and len(signs) == 2
    assert signs[0][0] == signs[1][0] and signs[0][1] < signs[1][1]


def test_a_long_sum_goes_on_in_rows_that_begin_with_an_operator() -> None:
    terms = ["0.062", "0.223704", "0.205062", "0.161564", "0.0621399", "0.167778", "0.296533", "2.90000"]
    setting = line("h_S", parse("sum(h)"), {"h": terms}, NAMES)
    edge = _places(setting.svg, "=")[0][0]
    rows: dict[float, list[tuple[float, str]]] = {}
    for text, x, y in _texts(setting.svg):
        rows.setdefault(y, []).append((x, text))
    firsts = [min(row) for y, row in sorted(rows.items())][-2:]
    assert setting.width <= MEASURE
    assert all(text[0] in "+" and x > edge for x, text in firsts)


def test_a_broken_product_keeps_the_brackets_of_a_leading_minus() -> None:
    wide = " + ".join(["123.456"] * 5)
    setting = line("z", parse(f"z_s - (-(f * L)) * ({wide})"), {"z_s": "1", "f": "2", "L": "3"}, NAMES)
    texts = "".join(text for text, _, _ in _texts(setting.svg))
    assert texts.count("(") == texts.count(")") == 4


def test_a_conversion_shows_its_numbers_only() -> None:
    setting = line("Q", parse("Q * (77 / 34560)"), {"Q": "3600"}, NAMES, symbolic=False)
    assert setting.alt == "Q = 3600 * (77 / 34560)"
    assert len(_places(setting.svg, "=")) == 1


def test_a_root_keeps_its_unknown() -> None:
    tree = parse("1 / sqrt(f) == -2 * log10(r / 3.7 + 2.51 / (Re * sqrt(f)))")
    setting = line(None, tree, {"r": "3.27870E-4", "Re": "921533"}, NAMES)
    assert setting.width <= MEASURE
    assert setting.alt.endswith("log10(3.27870E-4 / 3.7 + 2.51 / (921533 * sqrt(f)))")
    assert sum(text == "f" for text, _, _ in _texts(setting.svg)) == 4


def test_an_unknown_symbol_is_refused() -> None:
    with pytest.raises(KeyError):
        line("V", parse("Q / nobody"), None, NAMES)


@pytest.mark.parametrize("equation", EQUATIONS, ids=lambda e: e.name)
def test_every_equation_fits_the_column_at_a_legible_size(equation: Equation) -> None:
    tree = equation.tree
    symbol = None if isinstance(tree, formula.Cmp) else equation.result
    widest = dict.fromkeys(equation.operands, "-1234.56")  # type: ignore[attr-defined]
    assert line(symbol, tree, widest, NAMES).width <= MEASURE + 0.01
    setting = line(symbol, tree, dict.fromkeys(equation.operands, "0.123456"), NAMES)  # type: ignore[attr-defined]
    assert setting.width <= MEASURE + 0.01
    sizes = {float(s) for s in re.findall(r'font-size="([\d.]+)"', setting.svg)}
    assert max(sizes) >= 7.0


def test_the_picture_holds_text_and_filled_bars_only() -> None:
    setting = line("f_T", parse("0.25 / log10(eps_c / (3.7 * D))**2"), {"eps_c": "1.5E-4", "D": "1.27083"}, NAMES)
    root = ElementTree.fromstring(setting.svg)
    assert {child.tag for child in root} == {SVG + "text", SVG + "rect"}
    assert root.get("fill") == layout.INK
    for child in root.iter(SVG + "text"):
        assert child.text and " " not in child.text and child.get("font-family") == metrics.SERIF


def _texts(svg: str) -> list[tuple[str, float, float]]:
    found = []
    for child in ElementTree.fromstring(svg).iter(SVG + "text"):
        x, y = (child.get("x") or "0").split()[0], child.get("y") or "0"
        if moved := re.match(r"translate\(([-\d.]+) ([-\d.]+)\)", child.get("transform") or ""):
            x, y = moved[1], moved[2]
        found.append((child.text or "", float(x), float(y)))
    return found


def _places(svg: str, text: str) -> list[tuple[float, float]]:
    return [(x, y) for t, x, y in _texts(svg) if t == text]
