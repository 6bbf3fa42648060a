"""The way from bytes to records, on a small valid file and on what is done to it."""

from __future__ import annotations

import hashlib
import os
import random
import unicodedata
from datetime import date
from pathlib import Path
from typing import Any

import jsonschema
import pytest
import yaml
from fontTools.ttLib import TTFont

from calcpack.faults import InputFault
from calcpack.kinds import KINDS
from calcpack.source import MAX_FAULTS, document, load, loads
from calcpack.source.characters import objection
from calcpack.source.inputs import Given
from calcpack.source.schema import parts, quantities, schema

SAMPLES = Path(__file__).parent.parent / "sample_inputs"
_BOILING = (SAMPLES / "faults" / "boiling_at_the_surface.yaml").read_text("utf-8")
BASE = _BOILING.replace("normal: 96 °C, highest: 104 °C", "normal: 24 °C, highest: 30 °C")


def changed(*changes: tuple[str, str]) -> bytes:
    text = BASE
    for old, new in changes:
        assert text.count(old) >= 1, old
        text = text.replace(old, new)
    return text.encode()


def refused(raw: bytes) -> list[tuple[str, str]]:
    """``(key, kind)`` of each fault."""
    with pytest.raises(InputFault) as caught:
        loads(raw, "a.yaml")
    return [(fault.key, fault.kind) for fault in caught.value.faults]


@pytest.mark.parametrize("path", sorted(SAMPLES.glob("*.yaml")), ids=lambda path: path.stem)
def test_samples_are_read(path: Path) -> None:
    read = load(path)
    assert read.path == path.name
    assert read.raw == path.read_bytes()
    assert read.sha256 == hashlib.sha256(read.raw).hexdigest()


def test_records() -> None:
    read = loads(BASE.encode(), "folder/a.yaml")
    assert (read.number, read.date, read.units, read.paper) == ("LM-04-C-011", date(2026, 11, 16), "SI", "A4")
    assert read.path == "a.yaml"
    assert [source.id for source in read.sources] == ["S1", "S2"]
    assert read.line is not None and read.supply.level is not None and read.supply.level.lowest is not None
    level = read.supply.level.lowest
    assert (level.key, level.text, level.quantity.unit.name) == ("supply.level.lowest", "0.80 m", "m")
    assert (level.source, level.place, level.status) == ("S1", "2.2", "verified")
    line = BASE.splitlines()[level.line - 1]
    assert line[level.column - 1 :].startswith("0.80 m")
    section = read.line.sections[0]
    assert (section.pipe.size, section.pipe.schedule, section.pipe.bore) == ("DN 150", "40", None)
    assert [element.kind for element in section.elements] == [
        "entrance",
        "pipe",
        "elbow",
        "valve",
        "strainer",
    ]
    assert [element.count for element in section.elements] == [1, 1, 2, 1, 1]
    strainer = section.elements[-1]
    assert strainer.clean is not None and strainer.fouled is not None
    assert strainer.fouled.key == "line.sections[P1].elements[5].drop.fouled"
    assert read.criteria.ratio is not None and read.criteria.ratio.quantity.text == "1.10"
    assert read.readings[0].gauge.pressure.quantity.reference == "gauge"


def test_defaults() -> None:
    read = loads(changed(("units: SI", "units: US")), "a.yaml")
    assert (read.paper, read.status) == ("Letter", "preliminary")
    assert [(r.revision, r.date, r.reason) for r in read.revisions] == [("A", date(2026, 11, 16), "preliminary")]


def test_numbers_that_look_like_numbers_stay_text() -> None:
    read = loads(changed(("revision: A", "revision: 0"), ("number: LM-04-C-011", "number: 1100")), "a.yaml")
    assert (read.revision, read.number) == ("0", "1100")


def test_an_origin_applies_to_the_values_inside() -> None:
    read = loads(BASE.encode(), "a.yaml")
    assert read.line is not None
    length = read.line.sections[0].elements[1].length
    assert length is not None
    assert (length.source, length.place, length.status) == ("S1", "3.1", "preliminary")


def test_an_own_source_is_not_held_to_the_status_of_another() -> None:
    read = loads(changed(("normal: 2.10 m", "normal: {value: 2.10 m, source: S2}")), "a.yaml")
    assert read.supply.level is not None and read.supply.level.normal is not None
    assert (read.supply.level.normal.source, read.supply.level.normal.status) == ("S2", "")


def test_an_assumed_value_does_not_inherit_a_source() -> None:
    read = loads(changed(("normal: 2.10 m", "normal: {value: 2.10 m, status: assumed, note: usual}")), "a.yaml")
    assert read.supply.level is not None and read.supply.level.normal is not None
    normal = read.supply.level.normal
    assert (normal.source, normal.status, normal.note) == ("", "assumed", "usual")


def test_a_byte_order_mark_and_windows_line_ends_are_accepted() -> None:
    raw = b"\xef\xbb\xbf" + BASE.replace("\n", "\r\n").encode()
    read = loads(raw, "a.yaml")
    assert read.raw == raw
    assert read.pump.datum_elevation.line == loads(BASE.encode(), "a.yaml").pump.datum_elevation.line


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


@pytest.mark.parametrize(
    ("old", "new", "wanted"),
    [
        ("readings:\n", "readings:\n", "at most 20 readings"),
        ("sources:\n", "sources:\n", "at most 100 sources"),
    ],
)
def test_lists_have_an_end(old: str, new: str, wanted: str) -> None:
    more = "".join(f"  X{n}: {{title: sheet}}\n" for n in range(99)) if "sources" in old else ""
    text = BASE.replace(old, new + more)
    if "readings" in old:
        head, _, entry = text.partition("readings:\n")
        entry = entry.rstrip() + "\n"
        text = head + "readings:\n" + "".join(entry.replace("commissioning", f"test {n}") for n in range(21))
    with pytest.raises(InputFault) as caught:
        loads(text.encode(), "a.yaml")
    (fault,) = caught.value.faults
    assert fault.wanted == wanted
    assert fault.found in ("21", "101")


def _elements(section: str, count: int) -> str:
    return "".join(f"        - {{id: {section}{n}, kind: pipe, length: 1 m}}\n" for n in range(count))


def test_a_line_has_an_end() -> None:
    head, _, rest = BASE.partition("    - id: P1\n")
    section, _, tail = rest.partition("        - {id: 1, kind: entrance")
    pump = tail[tail.index("pump:\n") :]
    one = f"    - id: P1\n{section}"
    lines = {n: "".join(one.replace("P1", f"P{s}") + _elements("e", n) for s in range(4)) for n in (50, 51, 61)}
    many = "".join(one.replace("P1", f"P{s}") + _elements("e", 1) for s in range(21))
    pump = pump.replace("    strainers: clean\n", "")
    assert loads((head + lines[50] + pump).encode(), "a.yaml").line is not None
    assert refused((head + lines[51] + pump).encode()) == [("line.sections[P3].elements[e47]", "count")]
    assert [key for key, _ in refused((head + lines[61] + pump).encode())][0] == "line.sections[P0].elements"
    assert refused((head + many + pump).encode()) == [("line.sections", "count")]


def test_a_whole_number_as_a_revision_is_a_text() -> None:
    assert refused(changed(("revision: A", "revision: 12345678901"))) == [("calculation.revision", "text")]
    assert refused(changed(("schedule: 40", "schedule: 4000"))) == [
        ("line.sections[P1].schedule", "text"),
        ("readings[1].gauge.tap.schedule", "text"),
    ]


@pytest.mark.parametrize(
    ("old", "new", "hint"),
    [
        ("size: DN 150\n", "size: dn150\n", "`DN 150`"),
        ("schedule: 40\n", "schedule: xs\n", "`XS`"),
        ("schedule: 40\n", "schedule: SCH40\n", "`40`"),
        ("date: 2026-11-16", "date: 2026.11.16", "`2026-11-16`"),
        ("date: 2026-11-16", "date: 16.11.2026", ""),
        ("size: DN 150\n", "size: 150\n", ""),
        ("owner: Larch Mill (invented)", "owner: 77", '`"77"`'),
    ],
)
def test_the_form_meant_is_suggested(old: str, new: str, hint: str) -> None:
    with pytest.raises(InputFault) as caught:
        loads(changed((old, new)), "a.yaml")
    (fault,) = caught.value.faults
    assert hint in fault.suggestion
    assert bool(hint) == bool(fault.suggestion)


@pytest.mark.parametrize(
    ("changes", "faults"),
    [
        ([("source: S1 3.1", "source: S1 3.1\n      bore: 154 mm")], [("line.sections[P1].bore", "bore")]),
        ([("shape: flush", "shape: flush, K: 0.5")], [("line.sections[P1].elements[1]", "K")]),
        ([("      material: commercial steel\n", "")], [("line.sections[P1]", "roughness")]),
        ([("clean: 0.2 m", "clean: 2 m")], [("line.sections[P1].elements[5].drop.fouled", "order")]),
        ([("normal: 120 m³/h", "normal: 160 m³/h")], [("pump.flow.highest", "order")]),
        ([("date: 2026-10-02", "date: 2026-12-02")], [("readings[1].date", "date")]),
        (
            [("    level: 1.95 m\n", "    level: 1.95 m\n    surface_pressure: 4 kPa gauge\n")],
            [("readings[1].surface_pressure", "reading")],
        ),
        ([("  name: water\n", "  name: Water\n")], [("liquid.name", "liquid")]),
        ([("normal: 24 °C, highest: 30 °C, ", "")], [("liquid.temperature", "liquid")]),
        (
            [("  elevation: 120 m\n", "  elevation: 120 m\n  barometer: {source: S1}\n")],
            [("site.barometer", "barometer")],
        ),
        (
            [("sources:\n", "revisions: [{revision: A, date: 2026-11-15, reason: x}]\nsources:\n")],
            [("revisions[1].date", "date")],
        ),
        ([("S1: {title", "1S: {title"), ("S1 ", "S2 ")], [("sources", "text")]),
        ([("S1: {title", "s2: {title"), ("S1 ", "S2 ")], [("sources.S2", "duplicate id")]),
        (
            [("radius: long, count: 2", 'radius: long, angle: "90"')],
            [("line.sections[P1].elements[3].angle", "choice")],
        ),
        ([("radius: long, count: 2", "radius: long, angle: 60")], [("line.sections[P1].elements[3].angle", "choice")]),
        ([("date: 2026-10-02", "date: 1949-12-31")], [("readings[1].date", "date")]),
        ([("count: 2", "count: 0")], [("line.sections[P1].elements[3].count", "number")]),
        ([("count: 2", "count: two")], [("line.sections[P1].elements[3].count", "number")]),
        ([("size: DN 150\n", "size: 150 mm\n")], [("line.sections[P1].size", "text")]),
        ([("ratio: 1.10", "ratio: [1.10]")], [("criteria.npsh_margin.ratio", "type")]),
        ([("owner: Larch Mill (invented)", "owner: 77")], [("calculation.owner", "type")]),
        ([("owner: Larch Mill (invented)", "owner: {a: b}")], [("calculation.owner", "type")]),
        ([("criteria:\n", "criterai:\n")], [("criterai", "unknown key")]),
        (
            [("length: 9.5 m", "lenght: 9.5")],
            [
                ("line.sections[P1].elements[2].lenght", "unknown key"),
                ("line.sections[P1].elements[2].length", "bare number"),
            ],
        ),
    ],
)
def test_refused(changes: list[tuple[str, str]], faults: list[tuple[str, str]]) -> None:
    assert refused(changed(*changes)) == faults


def test_every_fault_of_a_kindless_supply_is_its_own() -> None:
    assert refused(changed(("kind: open", "kind: opne"))) == [("supply.kind", "choice")]


def test_many_faults_are_counted_after_a_hundred() -> None:
    many = "".join(f"  key{n}: 1 m\n" for n in range(3 * MAX_FAULTS))
    faults = refused(changed(("pump:\n", "pump:\n" + many)))
    assert len(faults) == MAX_FAULTS + 1
    assert faults[-1][1] == "count"


def test_a_folder_is_not_a_file(tmp_path: Path) -> None:
    with pytest.raises(InputFault, match="found a folder"):
        load(tmp_path)


def test_a_missing_file(tmp_path: Path) -> None:
    with pytest.raises(InputFault, match="no file of that name"):
        load(tmp_path / "none.yaml")


def test_no_file_named() -> None:
    with pytest.raises(InputFault, match="found no file named"):
        load("")


def test_a_pipe_is_read_only_where_it_was_handed_over(tmp_path: Path) -> None:
    named = tmp_path / "a.yaml"
    os.mkfifo(named)
    for path in (named, Path("/dev/null")):
        with pytest.raises(InputFault, match="wanted a regular file"):
            load(path)
    read, write = os.pipe()
    try:
        os.write(write, BASE.encode())
        os.close(write)
        assert load(f"/dev/fd/{read}").number == "LM-04-C-011"
    finally:
        os.close(read)


def test_a_name_that_is_not_utf8(tmp_path: Path) -> None:
    path = tmp_path / os.fsdecode(b"caf\xe9\n.yaml")
    path.write_bytes(BASE.encode())
    read = load(path)
    assert read.path == "caf<U+DCE9><U+000A>.yaml"
    assert read.named.encode("utf-8").endswith(b".yaml")
    path.write_bytes(b"a: 1\n")
    with pytest.raises(InputFault) as caught:
        load(path)
    assert all(fault.file == read.named for fault in caught.value.faults)


def test_a_name_no_file_can_have() -> None:
    for name in ("a\0b.yaml", "x" * 5000):
        with pytest.raises(InputFault) as caught:
            load(name)
        assert caught.value.faults[0].kind == "file"


def test_a_large_file_is_not_read_to_its_end(tmp_path: Path) -> None:
    path = tmp_path / "large.yaml"
    with path.open("wb") as file:
        file.truncate(50_000_000)
    with pytest.raises(InputFault, match="at most 1000 kB"):
        load(path)


def test_many_values_are_refused() -> None:
    assert refused(b"a: [" + b"1," * document.MAX_NODES + b"1]") == [("", "yaml")]


def test_deep_brackets_are_refused_at_once() -> None:
    assert refused(b"a: " + b"[" * 400_000) == [("", "yaml")]


@pytest.mark.parametrize("path", sorted((SAMPLES / "faults").glob("*.yaml")), ids=lambda path: path.stem)
def test_the_parser_in_python_finds_the_same(path: Path, monkeypatch: pytest.MonkeyPatch) -> None:
    def found() -> list[tuple[int, int, str, str]]:
        try:
            load(path)
        except InputFault as fault:
            return [(each.line, each.column, each.key, each.suggestion) for each in fault.faults]
        return []

    fast = found()
    monkeypatch.setattr(document, "_LOADER", yaml.SafeLoader)
    assert found() == fast


WORDS = [
    "nan",
    "~",
    "on",
    "{",
    "}",
    "[",
    "]",
    ":",
    ",",
    "- ",
    "#",
    "&a ",
    "*a",
    "!x ",
    "<<: ",
    "'",
    '"',
    "|",
    ">",
    "%",
    "@",
    "\t",
    "\n",
    "  ",
    "\u202e",
    "\u00a0",
    "\u2212",
    "\x00",
    "\x85",
    "\ufeff",
    "\U0001f4a7",
    "1e9",
    "9" * 50,
    "-",
    "°F",
    "kPa",
    "---",
    "...",
    "? ",
    "0x1",
    "null",
    "12:30",
    "value: ",
    "2026-02-30",
]


@pytest.mark.parametrize("seed", range(20))
def test_damaged_text_raises_nothing_but_a_fault(seed: int) -> None:
    """Deletions, insertions and repeated stretches; the seeds are fixed so that a failure can be repeated."""
    chance = random.Random(seed)
    for _ in range(15):
        text = BASE
        for _ in range(chance.randint(1, 4)):
            a, b = sorted(chance.randrange(len(text)) for _ in range(2))
            b = min(b, a + chance.choice((1, 1, 5, 40)))
            text = text[:a] + chance.choice(("", "", chance.choice(WORDS), text[a:b] * 2, text[b : b + 30])) + text[b:]
        raw = text.encode("utf-8", "surrogatepass")
        if chance.random() < 0.1:
            at = chance.randrange(len(raw))
            raw = raw[:at] + bytes([chance.randrange(256)]) + raw[at:]
        try:
            loads(raw, "a.yaml")
        except InputFault as refusal:
            assert refusal.faults
            assert all(fault.wanted and fault.found for fault in refusal.faults)


def subschemas(part: Any, where: str = "") -> Any:
    if isinstance(part, dict):
        yield where, part
        for key, value in part.items():
            if key not in ("examples", "enum", "const", "required", "if", "then"):
                yield from subschemas(value, f"{where}/{key}")
    elif isinstance(part, list):
        for value in part:
            yield from subschemas(value, where)


def test_the_schema_is_one() -> None:
    jsonschema.Draft202012Validator.check_schema(schema())


def test_every_key_of_the_schema_is_described() -> None:
    for where, part in subschemas(schema()):
        for name, value in part.get("properties", {}).items() if isinstance(part.get("properties"), dict) else ():
            described = {**schema()["$defs"].get(value.get("$ref", "").rpartition("/")[2], {}), **value}
            assert described.get("description"), f"{where}: {name}"


def test_every_mapping_of_the_schema_is_closed() -> None:
    for where, part in subschemas(schema()):
        if part.get("type") == "object" or "object" in part.get("type", ()):
            assert part.get("additionalProperties") is False or where.endswith("/sources"), where


def test_quantities_of_the_schema_are_kinds() -> None:
    named = {
        name
        for name, part in schema()["$defs"].items()
        if "value" in part.get("properties", {}) and "object" in part["type"]
    }
    assert named - {"npsh_required"} <= set(KINDS)
    for name in named - {"npsh_required"}:
        for example in schema()["$defs"][name]["examples"]:
            assert isinstance(example, str) == ("string" in schema()["$defs"][name]["type"])


def test_examples_of_the_schema_fit_it() -> None:
    for where, part in subschemas(schema()):
        for example in part.get("examples", []) if isinstance(part.get("examples"), list) else ():
            whole = {**part, "$defs": schema()["$defs"]}
            assert jsonschema.Draft202012Validator(whole).is_valid(example), where


def test_the_schema_and_the_reader_know_the_same_quantities() -> None:
    """Every quantity the schema finds in the samples arrives in the records, and no other."""

    def givens(value: Any) -> Any:
        if isinstance(value, Given):
            yield value
        elif isinstance(value, tuple):
            for each in value:
                yield from givens(each)
        elif hasattr(value, "__dataclass_fields__"):
            for each in vars(value).values():
                yield from givens(each)

    for path in [*sorted(SAMPLES.glob("*.yaml")), SAMPLES / "faults" / "boiling_at_the_surface.yaml"]:
        root, _ = document.parse(path.read_bytes(), path.name)
        read, _ = quantities(root, path.name)
        found = {(each.line, each.column): each for each in givens(load(path))}
        assert set(found) == set(read)
        assert {each.key for each in found.values()} <= {key for key, *_ in parts(root)}


def test_choices_of_the_schema_are_those_of_the_tables() -> None:
    from calcpack import fitting_set, lookup

    sections = schema()["$defs"]["section"]["properties"]
    assert set(sections["material"]["enum"]) == set(lookup.ROUGHNESS)
    element = schema()["$defs"]["element"]["properties"]
    variants = {
        kind: {v.split(" ")[0] for k, v in fitting_set.CRANE if k == kind} for kind in ("valve", "tee", "entrance")
    }
    assert set(element["type"]["enum"]) == variants["valve"]
    assert set(element["flow"]["enum"]) == variants["tee"]
    assert set(element["shape"]["enum"]) == variants["entrance"]
    assert set(schema()["$defs"]["line"]["properties"]["fitting_set"]["enum"]) == set(fitting_set.SETS)
