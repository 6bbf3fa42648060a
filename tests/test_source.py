"""The way from bytes to records, on a small valid file and on what is done to it."""

from __future__ import annotations

import hashlib
import random
from datetime import date
from pathlib import Path
from typing import Any

import jsonschema
import pytest
import yaml

from calcpack.faults import InputFault
from calcpack.kinds import KINDS
from calcpack.source import MAX_FAULTS, document, load, loads
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


def test_utf16_is_named() -> None:
    with pytest.raises(InputFault, match="UTF-16"):
        loads(BASE.encode("utf-16"), "a.yaml")


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
