"""Encodings, hidden characters and letters the pages cannot print."""

from __future__ import annotations

import unicodedata
from datetime import date
from pathlib import Path

import pytest
import yaml
from fontTools.ttLib import TTFont
from source_files import BASE, changed, refused

from calcpack.faults import InputFault
from calcpack.source import MAX_FAULTS, document, loads
from calcpack.source.characters import objection


@pytest.mark.parametrize(
    ("encoding", "found"),
    [
        ("utf-16", "found UTF-16."),
        ("utf-32", "found UTF-32."),
        ("utf-16-le", "UTF-16 or UTF-32"),
        ("utf-16-be", "UTF-16 or UTF-32"),
        ("utf-32-be", "UTF-16 or UTF-32"),
    ],
)
def test_another_encoding_is_named(encoding: str, found: str) -> None:
    with pytest.raises(InputFault, match=found):
        loads(BASE.encode(encoding), "a.yaml")


def test_texts_are_made_alike_where_they_are_read() -> None:
    raw = changed(
        ("owner: Larch Mill (invented)", 'owner: "\\u00a0Larch  Mill\t(invented) "'),
        ("project: Larch Mill wash water (invented)", "project: |\n    Larch Mill\n    wash\u2003water\n"),
        ("name: P-3 A/B", "name: Pompe d'eau re\u0301serve\u0301e"),
        ("date: 2026-11-16", 'date: "2026-11-16\\n"'),
        ("elevation: 0.30 m", "elevation: 0.30\u00a0m"),
        ("normal: 2.10 m, source: S1 2.2", 'normal: 2.10 m, source: "S1\u00a0 2.2 "'),
        ("  S2: {title", '  "S2 ": {title'),
    )
    read = loads(raw, "a.yaml")
    assert (read.owner, read.project) == ("Larch Mill (invented)", "Larch Mill wash water")
    assert read.pump.name == "Pompe d'eau réservée"
    assert (read.date, read.raw) == (date(2026, 11, 16), raw)
    assert (read.readings[0].gauge.elevation.text, read.sources[1].id) == ("0.30 m", "S2")
    assert read.supply.level is not None and read.supply.level.lowest is not None
    assert (read.supply.level.lowest.source, read.supply.level.lowest.place) == ("S1", "2.2")


def test_a_comment_may_hold_any_letters() -> None:
    assert loads(changed(("sources:", "sources:  # 泵房 خزان 👩\u200d🔧 ⚠\ufe0f \U0001fae9")), "a.yaml").sources


@pytest.mark.parametrize(
    ("escape", "name"),
    [
        (r"\0", "U+0000"),
        (r"\a", "U+0007"),
        (r"\e", "U+001B"),
        (r"\x7f", "U+007F"),
        (r"\N", "U+0085"),
        (r"\L", "U+2028"),
        (r"\u00ad", "U+00AD"),
        (r"\u200d", "U+200D"),
        (r"\u202e", "U+202E"),
        (r"\u3164", "U+3164"),
        (r"\uE000", "U+E000"),
        (r"\uFEFF", "U+FEFF"),
        (r"\uFFFF", "U+FFFF"),
        (r"\u0378", "U+0378"),
        (r"\U000E0041", "U+E0041"),
        (r"\u0332", "U+0332"),
        (r"\uFE0F", "U+FE0F"),
    ],
)
def test_an_escape_hides_nothing(escape: str, name: str) -> None:
    """In a value, in a key, and as all of a text; one fault each, at its own place."""
    with pytest.raises(InputFault) as caught:
        loads(
            changed(
                ("owner: Larch Mill (invented)", f'owner: "Larch{escape} Mill"'),
                ("project: Larch Mill wash water (invented)", f'project: "{escape}"'),
                ("status: preliminary", f'"status{escape}": preliminary'),
            ),
            "a.yaml",
        )
    faults = caught.value.faults
    assert [fault.kind for fault in faults] == ["character"] * 3
    assert all(name in fault.found for fault in faults)


@pytest.mark.parametrize("loader", ["CSafeLoader", "SafeLoader"])
@pytest.mark.parametrize("escape", [r"\ud83d\ude00", r"\U00110000", r"\UFFFFFFFF"])
def test_an_escape_that_is_no_character(escape: str, loader: str, monkeypatch: pytest.MonkeyPatch) -> None:
    monkeypatch.setattr(document, "_LOADER", getattr(yaml, loader))
    with pytest.raises(InputFault) as caught:
        loads(changed(("owner: Larch Mill (invented)", f'owner: "{escape}"')), "a.yaml")
    (fault,) = caught.value.faults
    assert fault.kind in ("yaml", "character")
    assert "quotation" not in fault.suggestion


def test_hidden_characters_on_every_line_are_counted_after_a_hundred() -> None:
    faults = refused("# \u202ea\n".encode() * 3 * MAX_FAULTS)
    assert len(faults) == MAX_FAULTS + 1


def test_what_is_hidden_is_told_even_where_the_notation_is_broken() -> None:
    raw = changed(("sources:", "sources:  # a\u202eb"), ("kind: open", "kind: [open"))
    assert refused(raw) == [("", "character"), ("", "yaml")]


def test_the_letters_allowed_are_those_of_the_fonts() -> None:
    """Every letter the fonts share is allowed, and the alphabets allowed are in the fonts as far as they are in use."""
    fonts = (Path(__file__).parent.parent / "templates" / "fonts").glob("*.ttf")
    held = set.intersection(*({chr(c) for c in TTFont(path).getBestCmap()} for path in fonts))
    letters = {c for c in held if unicodedata.category(c) in ("Lu", "Ll", "Lo", "Nd")}
    refused = {c for c in letters if objection(c)}
    assert all(objection(unicodedata.normalize("NFKC", c)) is None for c in refused), "ligatures and the like only"
    in_use = "".join(map(chr, [*range(0x20, 0x7F), *range(0xA1, 0xAD), *range(0xAE, 0x180), *range(0x386, 0x3CF)]))
    in_use += "".join(map(chr, range(0x400, 0x460))) + "–—‘’“”„•…€≈≠≤≥−√∞Δ°³²·µ½ẞỳ"
    assert not [c for c in in_use if objection(c) and unicodedata.category(c) != "Cn"]
    missing = [c for c in in_use if c not in held and unicodedata.category(c) != "Cn"]
    assert len(missing) < 0.02 * len(in_use), missing
    assert all(objection(c) for c in "泵خזּ💧ก\u0905ツ한ﬁ４")
