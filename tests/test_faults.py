"""Each file of ``sample_inputs/faults`` is refused for its own fault, at its own line, with help."""

from __future__ import annotations

from collections.abc import Iterator
from dataclasses import replace
from pathlib import Path

import pytest
from expected_document import DOCUMENT
from expected_line import LINE
from expected_pump import PUMP
from expected_supply import SUPPLY

from calcpack.faults import Fault, InputFault, did_you_mean, format_fault, listed, nearest, shown, visible
from calcpack.kinds import KINDS
from calcpack.source import load
from calcpack.source.schema import PROVENANCE, Schema, definition, schema

FOLDER = Path(__file__).parent.parent / "sample_inputs" / "faults"
EXPECTED = DOCUMENT | SUPPLY | LINE | PUMP
#: Well formed, and refused further on for what it would mean.
WELL_FORMED = {"boiling_at_the_surface"}


def line_of(path: Path, needle: str) -> int:
    """The line, from 1, on which ``needle`` stands below the head comment."""
    lines = path.read_bytes().decode("utf-8", "replace").splitlines()
    return next((n for n, line in enumerate(lines, 1) if needle in line and (line[:1] != "#" or n == 1)), 1)


def test_every_sample_is_tested() -> None:
    assert {path.stem for path in FOLDER.glob("*.yaml")} == set(EXPECTED) | WELL_FORMED


@pytest.mark.parametrize("name", sorted(EXPECTED))
def test_sample_is_refused(name: str) -> None:
    path = FOLDER / f"{name}.yaml"
    with pytest.raises(InputFault) as caught:
        load(path)
    faults, expected = caught.value.faults, EXPECTED[name]
    assert [fault.key for fault in faults] == [key for _, key, _, _ in expected]
    for fault, (needle, _, word, hint) in zip(faults, expected, strict=True):
        assert fault.file == str(path)
        assert fault.line == line_of(path, needle)
        assert fault.column >= 1
        assert word in f"{fault.wanted} {fault.found}"
        assert hint in fault.suggestion
        assert fault.wanted and fault.found and fault.kind


@pytest.mark.parametrize("name", sorted(EXPECTED.keys() - {"empty"}))
def test_sample_says_what_is_wrong(name: str) -> None:
    head = (FOLDER / f"{name}.yaml").read_bytes().decode("utf-8", "replace").splitlines()[:3]
    assert "invented" in head[0]
    assert head[1].startswith("# Wrong: ")


@pytest.mark.parametrize("name", sorted(WELL_FORMED))
def test_well_formed_sample_is_read(name: str) -> None:
    assert load(FOLDER / f"{name}.yaml").number == "LM-04-C-011"


def test_a_message_is_one_line_with_all_its_parts() -> None:
    fault = Fault("a.yaml", 3, 7, "pump.flow", "a flow", "“3 m”", "write `3 m³/h`", "unit")
    assert format_fault(fault) == "a.yaml:3:7: pump.flow: wanted a flow; found “3 m”. Suggestion: write `3 m³/h`."
    assert format_fault(replace(fault, suggestion="")) == "a.yaml:3:7: pump.flow: wanted a flow; found “3 m”."
    assert format_fault(replace(fault, suggestion="did you mean `x`?")).endswith("Suggestion: did you mean `x`?")
    assert format_fault(Fault("a.yaml", 0, 0, "", "a file", "none")) == "a.yaml: wanted a file; found none."


def test_faults_come_in_the_order_of_the_file() -> None:
    a, b = Fault("f", 9, 1, "x", "w", "f"), Fault("f", 2, 5, "y", "w", "f")
    raised = InputFault([a, b])
    assert raised.faults == (b, a)
    assert str(raised).splitlines() == [format_fault(b), format_fault(a)]


def test_nearest() -> None:
    assert nearest("flwo", ["flow", "name"]) == "flow"
    assert nearest("KPA", ["Pa", "kPa", "MPa"]) == "kPa"
    assert nearest("zzz", ["flow", "name"]) == ""
    assert did_you_mean("flwo", ["flow"]) == "did you mean `flow`?"
    assert did_you_mean("zzz", ["flow"]) == ""


def test_texts_in_messages() -> None:
    assert shown("5\u200bm") == "“5<U+200B>m”"
    assert visible("a\udce9 \u115f\n.yaml") == "a<U+DCE9> <U+115F><U+000A>.yaml"
    assert len(shown("x" * 1000)) == 62
    assert listed(["a"]) == "a"
    assert listed(["a", "b", "c"]) == "a, b or c"


def test_every_value_of_the_schema_is_refused_somewhere() -> None:
    """Each key of a quantity or a choice is wrong in one of the files, so that its message has been looked at."""
    refused = {fault[1].rpartition(".")[2] for faults in EXPECTED.values() for fault in faults}
    keys = {
        name
        for part in [schema(), *schema()["$defs"].values()]
        for name, value in keys_of(part)
        if definition(value)[1] in KINDS or "enum" in definition(value)[0]
    }
    assert len(keys) > 60
    assert keys - refused - set(PROVENANCE) == set()


def keys_of(part: Schema) -> Iterator[tuple[str, Schema]]:
    """Every key of a part of the schema and of the mappings and lists inside it."""
    for name, value in part.get("properties", {}).items():
        yield name, value
        yield from keys_of(value)
    yield from keys_of(part["items"]) if "items" in part else ()
