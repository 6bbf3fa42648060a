"""The schema: complete, described, and at one with the tables and the records."""

from __future__ import annotations

from typing import Any

import jsonschema
from source_files import SAMPLES

from calcpack.kinds import KINDS
from calcpack.source import document, load
from calcpack.source.inputs import Given
from calcpack.source.schema import definition, example, parts, quantities, schema


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


def test_every_value_of_the_schema_has_an_example_or_choices() -> None:
    for where, part in subschemas(schema()):
        for name, value in part.get("properties", {}).items() if isinstance(part.get("properties"), dict) else ():
            known = definition(value)[0] | value
            assert name == "value" or example(value) or known["type"] in ("object", "array"), f"{where}: {name}"


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
        for typed in schema()["$defs"][name]["examples"]:
            assert isinstance(typed, str) == ("string" in schema()["$defs"][name]["type"])


def test_examples_of_the_schema_fit_it() -> None:
    for where, part in subschemas(schema()):
        for typed in part.get("examples", []) if isinstance(part.get("examples"), list) else ():
            whole = {**part, "$defs": schema()["$defs"]}
            assert jsonschema.Draft202012Validator(whole).is_valid(typed), where


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
    from calcpack import fitting_set, roughness

    sections = schema()["$defs"]["section"]["properties"]
    assert set(sections["material"]["enum"]) == set(roughness.NEW)
    assert set(schema()["$defs"]["line"]["properties"]["fitting_set"]["enum"]) == set(fitting_set.SETS)
