"""The tree against the schema: keys that are missing, values of the wrong form."""

from __future__ import annotations

import re
from collections.abc import Iterator
from contextlib import suppress
from dataclasses import dataclass
from datetime import date
from decimal import Decimal
from functools import cache
from typing import Any

from jsonschema import Draft202012Validator
from jsonschema.exceptions import ValidationError

from ..faults import Fault, listed, shown
from ..quantity import KINDS
from .meant import NOT_THAT, likely
from .nodes import Mapping, Node, Scalar, Sequence, below
from .schema import PROVENANCE, Schema, add, definition, own_kind, parts, schema

_INTEGER = re.compile(r"-?(0|[1-9][0-9]{0,17})")
_DECIMAL = re.compile(r"-?(0|[1-9][0-9]{0,29})\.[0-9]{1,30}")


@cache
def _validator() -> Draft202012Validator:
    return Draft202012Validator(schema())


#: Address, part of the schema and name of the definition of each node, by its ``id``.
_Known = dict[int, tuple[str, Schema, str]]


@dataclass(frozen=True)
class _Place:
    file: str
    node: Node
    key: str
    part: Schema
    kind: str

    @property
    def found(self) -> str:
        if isinstance(self.node, Scalar):
            return shown(self.node.text)
        return "a list" if isinstance(self.node, Sequence) else "a mapping"

    @property
    def text(self) -> str:
        return self.node.text if isinstance(self.node, Scalar) else ""

    def fault(self, wanted: str, found: str, suggestion: str, kind: str) -> Fault:
        return Fault(self.file, *self.node.mark, self.key, wanted, found, suggestion, kind)


def validate(root: Mapping, file: str) -> Iterator[Fault]:
    """The faults of a tree whose unknown keys have been dealt with (:mod:`.spelling`)."""
    known = {id(node): (key, part, kind) for key, node, part, kind in parts(root)}
    for error in _validator().iter_errors(_instance(root, known)):
        node = _at(root, error)
        if id(node) in known:
            place = _Place(file, node, *known[id(node)])
            yield from _missing(place, error) if error.validator == "required" else _value(place, error)


def _instance(node: Node, known: _Known) -> Any:
    """The tree as JSON would hold it: plain numbers as numbers, everything else as text.

    A whole number where a text may stand too, such as a revision, is held to the rules of that text.
    """
    if isinstance(node, Mapping):
        return {name.text: _instance(value, known) for name, value in reversed(node.entries)}
    if isinstance(node, Sequence):
        return [_instance(item, known) for item in node.items]
    kinds = known[id(node)][1].get("type") if id(node) in known else None
    if kinds == ["string", "integer"] and not _DECIMAL.fullmatch(node.text):
        return node.text
    if node.plain and _INTEGER.fullmatch(node.text):
        return int(node.text)
    return Decimal(node.text) if node.plain and _DECIMAL.fullmatch(node.text) else node.text


def _at(root: Mapping, error: ValidationError) -> Node:
    node: Node = root
    for step in error.absolute_path:
        if isinstance(node, Mapping):
            node = node.get(str(step)) or node
        elif isinstance(node, Sequence) and isinstance(step, int):
            node = node.items[step]
    return node


def _words(value: Any) -> list[str]:
    """The texts of a list, or the keys of a mapping."""
    return [str(each) for each in value] if isinstance(value, (list, dict)) else []


def _missing(place: _Place, error: ValidationError) -> Iterator[Fault]:
    """One fault for each key that is missing; the validator reports each of them, and may do so twice."""
    kind = own_kind(place.node, place.part)
    for name in _words(error.validator_value):
        if name in _words(error.instance) or f"'{name}'" not in error.message:
            continue
        part = place.part["properties"][name]
        about = str({**definition(part)[0], **part}.get("description", "")).partition(". ")[0].rstrip(".")
        wanted = f"the key `{name}`{f' for kind {kind}' if kind else ''} ({about})"
        yield Fault(
            place.file, *place.node.mark, below(place.key, name), wanted, "none", add(place.part, name), "missing key"
        )


def _value(place: _Place, error: ValidationError) -> Iterator[Fault]:
    """A value of the wrong form.  A text in the place of a quantity is left to :func:`.schema.quantities`."""
    part, rule = place.part, error.validator
    if isinstance(place.node, Scalar) and (place.kind in KINDS or place.key.endswith(".value")):
        return
    if rule == "enum":
        choices = _words(error.validator_value)
        hint = "leave the quotation marks out" if place.text in choices else likely(place.text, choices)
        why = NOT_THAT.get(place.text.casefold(), "")
        yield place.fault(listed(choices), f"{place.found}: {why}" if why else place.found, hint, "choice")
    elif rule == "type":
        yield _type(place)
    elif rule == "minLength":
        yield place.fault("a text", "none", "", "empty value")
    elif rule == "minItems":
        items = len(_words(error.instance))
        yield place.fault(f"a list of at least {error.validator_value}", f"{items or 'none'}", "", "empty value")
    elif rule in ("maxItems", "maxProperties"):
        wanted = f"at most {error.validator_value} {place.key.rpartition('.')[2]}"
        yield place.fault(
            wanted, f"{len(_words(error.instance))}", "leave out what the calculation does not need", "count"
        )
    elif rule == "maxLength":
        yield place.fault(f"at most {error.validator_value} characters", f"{len(place.text)}", "shorten it", "text")
    elif rule in ("minimum", "maximum"):
        bounds = f"{part.get('minimum', '')} to {part.get('maximum', '')}"
        yield place.fault(f"a whole number from {bounds}", place.found, "", "number")
    elif "propertyNames" in error.schema_path:
        yield place.fault(part["propertyNames"]["description"], shown(str(error.instance)), "", "text")
    else:
        yield place.fault(_described(part), place.found, _respelt(place.text, part), "text")


def _described(part: Schema) -> str:
    """What a part of the schema asks for, from its own description and examples."""
    about = str(part.get("description", "another value")).partition(". ")[0].rstrip(".")
    examples = [str(each) for each in part.get("examples", [])]
    return about[:1].lower() + about[1:] + (f", such as {listed(examples)}" if examples else "")


def _respelt(text: str, part: Schema) -> str:
    """What was probably meant where a text has not the form asked for: ``std`` for ``STD``, ``DN150`` for ``DN 150``."""
    tries = (
        text.upper(),
        re.sub(r"(?<=[A-Z])(?=[0-9])", " ", text.upper()),
        re.sub(r"^SCH(EDULE)?[. ]*", "", text.upper()),
        *_year_first(text),
    )
    fit = list(dict.fromkeys(each for each in tries if "pattern" in part and re.search(part["pattern"], each)))
    return f"did you mean {listed(f'`{each}`' for each in fit)}?" if fit else ""


#: Year first; day first, as points between the numbers say; either order of day and month.
_DATES = (
    (r"([0-9]{4})[ ./-]?([0-9]{1,2})[ ./-]?([0-9]{1,2})", "123"),
    (r"([0-9]{1,2})[./-]([0-9]{1,2})[./-]([0-9]{4})", "321"),
    (r"([0-9]{1,2})[/-]([0-9]{1,2})[/-]([0-9]{4})", "312"),
)


def _year_first(text: str) -> Iterator[str]:
    """The days of the calendar that a date in another order may mean."""
    for form, order in _DATES:
        if found := re.fullmatch(form, text):
            year, month, day = (int(found[int(each)]) for each in order)
            with suppress(ValueError):
                yield str(date(year, month, day))


def _type(place: _Place) -> Fault:
    part, kinds = place.part, place.part.get("type", [])
    if place.kind in KINDS:
        asked = KINDS[place.kind]
        return place.fault(f"{asked.words}, such as {listed(asked.examples)}", place.found, "", "type")
    if kinds == "array":
        return place.fault("a list", place.found, "begin each item with `- `", "type")
    if kinds == "object":
        names = [name for name in part.get("properties", {}) if name not in PROVENANCE]
        first = next(iter(part.get("required", names)), "")
        hint = (
            f"write `{{{first}: {place.text}}}`"
            if place.text and (len(part.get("required", [])) == 1 or 0 < len(names) <= 4)
            else ""
        )
        return place.fault(
            f"keys and values ({listed(names)})" if names else "keys and values", place.found, hint, "type"
        )
    if kinds == "integer":
        whole, _, decimals = place.text.partition(".")
        hint = f"write `{whole}`" if _INTEGER.fullmatch(whole) and decimals and not decimals.strip("0") else ""
        if _INTEGER.fullmatch(place.text):
            hint = "leave the quotation marks out"
        return place.fault("a whole number", place.found, hint, "number")
    hint = f'put it in quotation marks: `"{place.text}"`' if place.text else ""
    if "pattern" in part and not re.search(part["pattern"], place.text):
        hint = _respelt(place.text, part)
    return place.fault(_described(part), place.found, hint, "type")
