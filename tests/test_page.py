"""The package as a file: what a reader, an archive and a checker find in it."""

from __future__ import annotations

import copy
import ctypes
import hashlib
import json
import logging
import os
import re
import subprocess
import sys
from collections.abc import Iterator
from pathlib import Path
from typing import Any

import pypdfium2
import pypdfium2.raw as raw
import pytest
from plants import INTAKE, plant, recorded

from calcpack.assessment import run
from calcpack.page import pdf, view
from calcpack.page.figures import elevation
from calcpack.page.glyphs import margin_bar, status, verdict
from calcpack.page.lines import Context, noted
from calcpack.page.pdf import PageError, render
from calcpack.page.scale import ends_at, steps
from calcpack.page.text import linear, printable
from calcpack.page.typeset import Display
from calcpack.record import assemble, canonical
from calcpack.source import load

# The engine leaves its colour profile open until the collector comes by.
pytestmark = pytest.mark.filterwarnings("ignore:.*sRGB2014.icc:pytest.PytestUnraisableExceptionWarning")
SAMPLES = Path(__file__).parent.parent / "sample_inputs"
POINT = 72 / 25.4
Record = dict[str, Any]


def record(name: str, **calculation: str) -> Record:
    made: Record = json.loads(canonical(assemble(run(load(SAMPLES / name)))))
    made["calculation"].update(calculation)
    return made


def attachments(of: Record) -> list[tuple[str, bytes, str, str]]:
    return [
        (of["input_file"]["name"], of["input_file"]["text"].encode(), "input file as read", "Source"),
        ("record.json", canonical(of), "record of the calculation", "Data"),
    ]


@pytest.fixture(scope="module")
def american() -> Record:
    return record("a_cooling_tower_basin.yaml")


@pytest.fixture(scope="module")
def letter(american: Record) -> bytes:
    return render(american, attachments(american))


@pytest.fixture(scope="module")
def other() -> Record:
    """Verdicts, characters and words that the samples do not have."""
    made = record("b_river_intake_measured.yaml", paper="A4", title="Intake <b>& 日本\u200b pump")
    first, second = made["checks"][0], made["checks"][1]
    first |= {"verdict": "not assessed", "reason": "no level is given", "left": None, "right": None, "margin": None}
    second |= {
        "verdict": "not applicable",
        "reason": "there is no free surface",
        "left": None,
        "right": None,
        "margin": None,
    }
    made["cover"] |= {"verdict": "not assessed", "statement": "A long statement of the result. " * 20}
    made["findings"] = [
        {
            "name": "",
            "text": "The loss between surface and tap is larger than expected",
            "reason": "it may be a closed valve",
            "cost": "1.2 m (line 8.3)",
            "intended": "",
        }  # fmt: skip
    ]
    return made


@pytest.fixture(scope="module")
def a4(other: Record) -> bytes:
    return render(other, attachments(other))


@pytest.fixture(params=["letter", "a4"])
def document(request: pytest.FixtureRequest) -> Iterator[pypdfium2.PdfDocument]:
    found = pypdfium2.PdfDocument(request.getfixturevalue(request.param))
    yield found
    found.close()


def words(document: pypdfium2.PdfDocument) -> list[str]:
    texts = []
    for page in document:
        text = page.get_textpage()
        texts.append(text.get_text_range())
        text.close()
        page.close()
    return texts


def test_papers(letter: bytes, a4: bytes) -> None:
    sizes = []
    for file in (letter, a4):
        with pypdfium2.PdfDocument(file) as document:
            sizes.append({(round(w / POINT, 1), round(h / POINT, 1)) for w, h in (p.get_size() for p in document)})
    assert sizes == [{(215.9, 279.4)}, {(210.0, 297.0)}]


def test_sheet_number_and_revision_on_every_page(document: pypdfium2.PdfDocument) -> None:
    texts = words(document)
    assert re.search(rf"\b1 of {len(texts)}\b", texts[0])
    for n, text in enumerate(texts[1:], 2):
        assert f"sheet {n} of {len(texts)}" in text
        assert re.search(r"calculation\s", text) and re.search(r"rev\.", text)


def test_cover_holds_verdict_counts_and_blank_signatures(letter: bytes, american: Record) -> None:
    with pypdfium2.PdfDocument(letter) as document:
        cover = words(document)[0]
    assert "Not met" in cover and american["calculation"]["number"] in cover
    for word in (
        "originator",
        "checker",
        "approver",
        "Preliminary",
        "Unverified inputs and assumptions",
        "fingerprint",
    ):
        assert word in cover
    assert american["fingerprint"][:4] in cover
    assert american["cover"]["statement"][:30] in cover.replace("\r\n", " ")


def test_cover_lists_every_rule_those_without_numbers_too(other: Record, a4: bytes) -> None:
    with pypdfium2.PdfDocument(a4) as document:
        cover = words(document)[0]
    table = cover[cover.index("the governing one first") :].replace("\r", "")
    for check in other["checks"]:
        assert re.search(rf"\b{re.escape(check['address'])} {re.escape(check['title'])}", table), check["address"]
    for word, n in (("not assessed", 1), ("not applicable", 1)):
        assert len(re.findall(rf"^.*{word}$", table, re.MULTILINE)) >= n


def test_rules_not_applied_are_printed_with_what_the_file_would_need(letter: bytes, american: Record) -> None:
    with pypdfium2.PdfDocument(letter) as document:
        text = re.sub(r"\s+", " ", " ".join(words(document)))
    after = text[text.index("Rules not applied") :]
    assert american["unapplied"]
    for rule in american["unapplied"]:
        assert rule["title"] in after and rule["missing"] in after


def test_a_comparison_that_fails_is_not_printed_as_if_it_held(letter: bytes, american: Record) -> None:
    failed = next(c for c in american["checks"] if c["verdict"] == "not met")
    with pypdfium2.PdfDocument(letter) as document:
        text = " ".join(words(document))
    left, right = (failed[s]["headline"]["text"] for s in ("left", "right"))
    assert failed["relation"] == "≥" and failed["found"] == "<"
    assert not re.search(rf"{re.escape(left)}[^<0-9]*≥[^0-9]*{re.escape(right)}", text)


KINDS = {
    "saturated": ({"supply.kind": "saturated", "supply.level.lowest": "12 m"}, ("vapour", "static head")),
    "loop": (
        {
            "supply": {
                "name": "chilled loop", "kind": "loop", "pressure": {"lowest": "150 kPa gauge"}, "elevation": "0.4 m",
                "point": "expansion tank", "velocity_head": "left_out",
            },
            "line.sections.0.elements.0": {"id": "1", "kind": "tee", "flow": "run"},
        },
        ("chilled loop", "expansion tank", "+0.400, 150 kPa gauge", "pressure at the point"),
    ),
    "wet pit": (
        {"pump.arrangement": "wet_pit", "line": None, "intake": INTAKE | {"reference": "bell_lip"}},
        ("bell −1.0", "P-1", "NPSH available"),
    ),
    "points of the line": (
        {"line.sections.0.elements.1.elevation": "0.5 m", "line.sections.0.elements.3.elevation": "0 m"},
        ("static head", "surface pressure"),
    ),
    "another datum": (
        {"pump.npsh_required.datum_elevation": "-0.25 m", "line.withheld_head": "0.5 m"},
        ("−0.25", "head withheld −0.5"),
    ),
}  # fmt: skip


@pytest.mark.parametrize(("changes", "labels"), KINDS.values(), ids=KINDS.keys())
def test_the_figure_of_each_kind_of_supply(changes: dict[str, Any], labels: tuple[str, ...]) -> None:
    drawn = elevation(recorded(plant(changes))["sketch"])
    shown = [text.replace("\u00a0", "") for text in re.findall(r"<text[^>]*>([^<]*)</text>", drawn)]
    assert all(any(label in text for text in shown) for label in labels), shown


def test_two_heads_that_cancel_are_left_out_of_the_figure() -> None:
    sketch = recorded(plant({"supply.kind": "saturated", "supply.level.lowest": "12 m"}))["sketch"]
    assert {head["name"] for head in sketch["heads"]} >= {"surface pressure", "vapour pressure"}
    assert [step.name for step in steps(sketch)] == ["static head", "losses"]


def test_the_build_up_ends_at_npsh_available_from_the_datum_it_counts_from() -> None:
    """A shift of datum moves where the bar stands, not where it ends; what is withheld is the last head taken."""
    sketch = recorded(plant({"pump.npsh_required.datum_elevation": "-0.25 m", "line.withheld_head": "0.5 m"}))["sketch"]
    last = steps(sketch)[-1]
    assert last.name == "head withheld"
    assert last.end == pytest.approx(ends_at(sketch) + float(sketch["available"]), abs=1e-4)


def test_symbols_in_a_note_are_written_as_symbols_in_the_face_of_the_note() -> None:
    shared = Context({"h_V": Display("h", "V", False), "g": Display("g", "", False)}, frozenset(), {})
    assert noted("h_V is there, g too; a_b is not", shared) == "h<sub>V</sub> is there, g too; a_b is not"


def test_every_section_is_there_and_bookmarked(document: pypdfium2.PdfDocument) -> None:
    titles = [item.get_title() for item in document.get_toc()]
    for n, section in enumerate(view.SECTIONS, 1):
        assert any(re.fullmatch(rf"{n}\s+{re.escape(section)}", title) for title in titles), section


def test_every_line_is_printed(letter: bytes, american: Record) -> None:
    with pypdfium2.PdfDocument(letter) as document:
        text = "\n".join(words(document))
    for part in american["computation"]:
        for block in part["blocks"]:
            if "line" in block:
                assert re.search(rf"^{re.escape(block['line']['address'])}\b", text, re.MULTILINE)


def test_other_verdicts_long_words_and_odd_characters(a4: bytes) -> None:
    with pypdfium2.PdfDocument(a4) as document:
        texts = words(document)
    whole = re.sub(r"\s+", " ", " ".join(texts))
    assert "Intake <b>& [U+65E5][U+672C][U+200B] pump" in whole
    assert "Not assessed: no level is given" in whole and "Not applicable: there is no free surface" in whole
    assert "larger than expected" in whole


def test_a_long_cover_keeps_signatures_and_title_block_on_the_first_sheet(other: Record, a4: bytes) -> None:
    with pypdfium2.PdfDocument(a4) as document:
        texts = words(document)
    assert "approver" in texts[0] and other["fingerprint"][-4:] in texts[0] and "Not assessed" in texts[0]


def test_attachments(letter: bytes, american: Record) -> None:
    with pypdfium2.PdfDocument(letter) as document:
        found = {}
        for i in range(document.count_attachments()):
            attachment = document.get_attachment(i)
            found[attachment.get_name()] = bytes(attachment.get_data())
    assert found == {name: content for name, content, _, _ in attachments(american)}


def test_only_bundled_fonts(document: pypdfium2.PdfDocument) -> None:
    fonts = set()
    for page in document:
        for item in page.get_objects(filter=[raw.FPDF_PAGEOBJ_TEXT], max_depth=6):
            font = raw.FPDFTextObj_GetFont(item.raw)
            buffer = ctypes.create_string_buffer(200)
            raw.FPDFFont_GetBaseFontName(font, buffer, 200)
            fonts.add(buffer.value.decode().partition("+")[2] or buffer.value.decode())
        page.close()
    assert fonts and all(re.fullmatch(r"Source-?(Serif-?4|Sans-?3),?(-?Semi-?Bold)?(-?Italic)?", f) for f in fonts), (
        fonts
    )


def test_no_text_is_white_or_off_the_paper(document: pypdfium2.PdfDocument) -> None:
    for page in document:
        width, height = page.get_size()
        for item in page.get_objects(filter=[raw.FPDF_PAGEOBJ_TEXT], max_depth=6):
            r, g, b, a = (ctypes.c_uint() for _ in range(4))
            raw.FPDFPageObj_GetFillColor(item.raw, r, g, b, a)
            assert r.value + g.value + b.value < 600 and a.value == 255
            left, bottom, right, top = item.get_bounds()
            assert left >= -0.5 and bottom >= -0.5 and right <= width + 0.5 and top <= height + 0.5
        page.close()


def test_lines_are_parted_by_hairlines_of_one_rectangle(letter: bytes, american: Record) -> None:
    hairlines = 0
    with pypdfium2.PdfDocument(letter) as document:
        for page in document:
            for item in page.get_objects(filter=[raw.FPDF_PAGEOBJ_PATH], max_depth=6):
                left, bottom, right, top = item.get_bounds()
                if abs(right - left - 172 * POINT) < 0.3 and abs(top - bottom - 0.5) < 0.05:
                    assert abs(left - 26 * POINT) < 0.3
                    hairlines += 1
            page.close()
    lines = sum("line" in block for part in american["computation"] for block in part["blocks"])
    rows = sum(
        len(block["losses"]["rows"]) + 1
        for part in american["computation"]
        for block in part["blocks"]
        if "losses" in block
    )
    wanted = len(american["inputs"]) + len(american["assumptions"]) + lines + rows + len(american["checks"])
    assert hairlines == wanted


def test_internal_links_lead_to_pages(letter: bytes) -> None:
    links = 0
    with pypdfium2.PdfDocument(letter) as document:
        for page in document:
            at, link = ctypes.c_int(0), raw.FPDF_LINK()
            while raw.FPDFLink_Enumerate(page.raw, at, link):
                target = raw.FPDFLink_GetDest(document.raw, link)
                assert target and 0 <= raw.FPDFDest_GetDestPageIndex(document.raw, target) < len(document)
                links += 1
            page.close()
    assert links > 100


def test_same_record_same_bytes(american: Record, letter: bytes, tmp_path: Path) -> None:
    """In another process, with another hash seed, time zone, locale and folder."""
    source = tmp_path / "record.json"
    source.write_bytes(canonical(american))
    code = (
        "import json, sys, hashlib; sys.path.insert(0, sys.argv[2]); sys.path.insert(0, sys.argv[3])\n"
        "from calcpack.page.pdf import render; from test_page import attachments\n"
        "r = json.load(open(sys.argv[1], encoding='utf-8')); print(hashlib.sha256(render(r, attachments(r))).hexdigest())"
    )
    root = Path(__file__).parent.parent
    environment = {**os.environ, "PYTHONHASHSEED": "7", "TZ": "Asia/Tokyo", "LC_ALL": "C", "PYTHONWARNINGS": "ignore"}
    command = [sys.executable, "-c", code, str(source), str(root), str(root / "tests")]
    done = subprocess.run(command, cwd=tmp_path, env=environment, capture_output=True, text=True, check=True)
    assert done.stdout.strip() == hashlib.sha256(letter).hexdigest()


def test_the_record_is_left_as_it_was(other: Record) -> None:
    before = copy.deepcopy(other)
    view.context(other)
    assert other == before


def test_a_warning_of_the_engine_is_a_defect() -> None:
    with pytest.raises(PageError, match="no such property"), pdf._strict():
        logging.getLogger("weasyprint").warning("no such property")


def test_a_character_that_no_face_has_is_a_defect_of_the_page() -> None:
    with pytest.raises(PageError, match=r"U\+65E5"):
        pdf._only_known_characters("<p>Tag \u65e5</p>")


@pytest.mark.parametrize(
    ("typed", "shown"),
    [
        ("pump P-1", "pump P-1"),
        ("日", "[U+65E5]"),
        ("a\u200bb", "a[U+200B]b"),
        ("e\u0301", "é"),
        ("5 \u00b5m", "5 μm"),
        ("\U0001f600", "[U+1F600]"),
        ("\u202eabc", "[U+202E]abc"),
        ("a\tb", "a    b"),
    ],
)
def test_what_cannot_be_printed_is_shown_by_its_code_point(typed: str, shown: str) -> None:
    assert printable(typed) == shown


def test_factors_in_one_row() -> None:
    assert linear("77 / 34560") == "77/34\u00a0560"
    assert (
        linear("0.3048**2 / (0.45359237 * 9.80665)")
        == "0.304\u00a08<sup>2</sup>/(0.453\u00a0592\u00a037 × 9.806\u00a065)"
    )
    assert linear("x + 273.15") == "<i>x</i> + 273.15"


def test_long_lines_of_the_input_file_are_wrapped_after_an_arrow() -> None:
    rows = view.listing("a: 1\n  b: " + "word " * 60).split("\n")
    assert rows[0].startswith("1") and rows[1].startswith("2")
    assert len(rows) > 3 and all("→" in row for row in rows[2:])
    assert "".join(rows).count("word") == 60


def test_silhouettes_differ() -> None:
    assert len({verdict(word) for word in ("met", "not met", "not applicable", "not assessed")}) == 4
    assert len({status(word) for word in ("verified", "maker", "preliminary", "assumed", "")}) == 5
    assert len({margin_bar(p) for p in ("-50", "-5", "0", "5", "50")}) == 5
