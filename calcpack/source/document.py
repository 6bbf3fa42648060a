"""From bytes to a tree of text: YAML without its surprises.

Only mappings, lists and text pass.  What YAML would quietly turn into something else (``12:30`` into 750,
``010`` into 8, ``on`` into true) is refused unless quoted.  Anchors, aliases, tags, merge keys and repeated
keys are refused.
"""

from __future__ import annotations

import re
from collections.abc import Iterator
from typing import Any

import yaml

from ..faults import Fault, InputFault, shown
from .characters import normal, objection
from .file import decode
from .nodes import Mapping, Mark, Node, Scalar, Sequence, below, walk

MAX_DEPTH = 20
MAX_NODES = 20_000

_AMBIGUOUS = (
    (r"|~|null|Null|NULL", "an empty value"),
    (r"(?i:yes|no|on|off|true|false)", "a word that YAML reads as true or false"),
    (r"[-+]?0[0-9_]+", "a number with a leading zero, which YAML reads in base 8"),
    (r"[-+]?0[xXbBoO][0-9a-fA-F_]+", "a number in another base"),
    (r"[-+]?[0-9][0-9.]*_[0-9_.]*", "a number with underscores"),
    (r"[-+]?[0-9]+(?::[0-5]?[0-9])+(?:\.[0-9]*)?", "a number with colons, which YAML reads in base 60"),
    (r"(?i:[-+]?\.?(?:inf|infinity)|\.?nan)", "not a finite number"),
)
_AMBIGUOUS_PATTERNS = tuple((re.compile(pattern), why) for pattern, why in _AMBIGUOUS)
_WHOLE, _DECIMALS = re.compile(r"[-+\u2212]?[0-9]+"), re.compile(r"[0-9]+(?: .*)?")
_LOADER: Any = getattr(yaml, "CSafeLoader", yaml.SafeLoader)


def parse(raw: bytes, name: str) -> tuple[Mapping, list[Fault]]:
    """The tree of a file and the faults found in its notation, as far as the tree could be built.

    Raises :class:`InputFault` where there is no tree at all: not UTF-8, broken YAML, too deep, nothing in it.
    """
    text, hidden = decode(raw, name)
    try:
        root = _Builder(name).build(text)
    except InputFault as stop:
        raise InputFault([*hidden, *stop.faults]) from None
    return root, [*hidden, *_notation(root, name)]


class _Builder:
    """Builds the tree from the parser's events; never lets the parser compose or resolve anything itself."""

    def __init__(self, name: str) -> None:
        self._name = name
        self._nodes = 0

    def build(self, text: str) -> Mapping:
        root: Node | None = None
        try:
            events = yaml.parse(text, Loader=_LOADER)
            for event in events:
                if isinstance(event, yaml.DocumentStartEvent) and root is not None:
                    raise self._stop(
                        _mark(event),
                        "one document",
                        "a second one after `---`",
                        "keep one calculation in a file",
                    )
                if isinstance(event, yaml.NodeEvent):
                    root = self._node(event, events, 1)
        except yaml.MarkedYAMLError as error:
            raise self._broken(error) from None
        except yaml.YAMLError as error:
            raise self._stop((1, 1), "a YAML file", str(error).splitlines()[0], "") from None
        except (ValueError, OverflowError):
            # the parser in Python does not guard the number of an escape
            found = "broken notation (an escape that is no character)"
            raise self._stop((1, 1), "a YAML file", found, "write the character itself") from None
        if root is None:
            raise InputFault([Fault(self._name, 1, 1, "", "an input file", "only comments", "", "empty")])
        if not isinstance(root, Mapping):
            found = "a list" if isinstance(root, Sequence) else shown(root.text)
            raise self._stop(root.mark, "keys and values, beginning with `calculation:`", found, "")
        return root

    def _node(self, event: Any, events: Iterator[Any], depth: int) -> Node:
        mark, oddity = _mark(event), _oddity(event)
        self._nodes += 1
        if depth > MAX_DEPTH:
            raise self._stop(mark, f"at most {MAX_DEPTH} levels, one inside another", "more", "")
        if self._nodes > MAX_NODES:
            raise self._stop(mark, f"at most {MAX_NODES} values", "more", "")
        if isinstance(event, yaml.SequenceStartEvent):
            items = []
            while not isinstance(event := next(events), yaml.SequenceEndEvent):
                items.append(self._node(event, events, depth + 1))
            return Sequence(mark, tuple(items), oddity)
        if isinstance(event, yaml.MappingStartEvent):
            entries = []
            while not isinstance(event := next(events), yaml.MappingEndEvent):
                key = self._node(event, events, depth + 1)
                value = self._node(next(events), events, depth + 1)
                if not isinstance(key, Scalar):
                    raise self._stop(key.mark, "a key, which is a word", "a list or a mapping as a key", "")
                if isinstance(value, Scalar) and not value.text and value.plain:
                    # an empty value has no place of its own: parsers differ on where it stands
                    value = Scalar(key.mark, "", True, value.oddity)
                entries.append((key, value))
                _rejoin(entries)
            return Mapping(mark, tuple(entries), oddity)
        typed = getattr(event, "value", "")
        return Scalar(mark, normal(typed), getattr(event, "style", None) in (None, ""), oddity, typed)

    def _stop(self, mark: Mark, wanted: str, found: str, suggestion: str) -> InputFault:
        return InputFault([Fault(self._name, *mark, "", wanted, found, suggestion, "yaml")])

    def _broken(self, error: yaml.MarkedYAMLError) -> InputFault:
        """The parser's complaint in plain words."""
        at = error.problem_mark or error.context_mark
        mark = (at.line + 1, at.column + 1) if at else (1, 1)
        problem = error.problem or "it cannot be read"
        hints = {
            "mapping values are not allowed": "put a value with a colon and a space in quotation marks, "
            "and indent the keys of one mapping alike",
            r"'\t'": "indent with spaces, not with tabs",
            "tab character": "indent with spaces, not with tabs",
            "cannot start any token": "put the value in quotation marks",
            "',' or '}'": "close the braces, with a comma between the entries",
            "',' or ']'": "close the brackets, with a comma between the items",
            "could not find expected ':'": "write `key: value`, with a space after the colon",
            "did not find expected key": "indent the keys of one mapping alike",
            "<block end>": "indent the keys of one mapping alike",
            "Unicode character escape": "leave the character out, or transliterate it; an escape stands for one character",
            "unknown escape": "inside double quotation marks write \\\\ for a backslash, or use single ones",
            "quoted scalar": "close the quotation marks",
            "undefined alias": "write the value out; * has a meaning of its own in YAML",
        }
        hint = next((hint for part, hint in hints.items() if part in problem or part in (error.context or "")), "")
        if "undefined alias" in problem:
            problem = "an alias, * with a name"
        return self._stop(mark, "a YAML file", f"broken notation ({problem.strip()})", hint)


def _rejoin(entries: list[tuple[Scalar, Node]]) -> None:
    """Undo what YAML makes of ``{length: 9,5 m}``, so that one fault shows the value as it was typed."""
    if len(entries) < 2:
        return
    (name, before), (key, value) = entries[-2:]
    empty = isinstance(value, Scalar) and value.plain and not value.text
    whole = isinstance(before, Scalar) and before.plain and _WHOLE.fullmatch(before.text)
    if empty and whole and _DECIMALS.fullmatch(key.text):
        assert isinstance(before, Scalar)
        typed = f"{before.typed},{key.typed}"
        entries[-2:] = [(name, Scalar(before.mark, normal(typed), typed=typed))]


def _mark(event: Any) -> Mark:
    return event.start_mark.line + 1, event.start_mark.column + 1


def _oddity(event: Any) -> str:
    if isinstance(event, yaml.AliasEvent):
        return f"the alias *{event.anchor}"
    if event.anchor:
        return f"the anchor &{event.anchor}"
    tag = getattr(event, "tag", None)
    return f"the tag {tag.replace('tag:yaml.org,2002:', '!!')}" if tag else ""


def _notation(root: Mapping, name: str) -> Iterator[Fault]:
    """Notation that is YAML and that we refuse."""
    told: set[str] = set()
    for key, node in walk(root):
        if node.oddity in told:
            continue
        if node.oddity:
            told.add(node.oddity)
            hint = "write the value out where it stands"
            yield Fault(name, *node.mark, key, "plain text", shown(node.oddity), hint, "notation")
        elif isinstance(node, Scalar):
            yield from _characters(node, key, name)
            yield from _ambiguous(node, key, name)
        elif isinstance(node, Mapping):
            yield from _keys(node, key, name)


def _characters(node: Scalar, key: str, name: str) -> Iterator[Fault]:
    bad = objection(node.typed)
    if bad:
        yield Fault(name, *node.mark, key, *bad, "character")


def _ambiguous(node: Scalar, key: str, name: str) -> Iterator[Fault]:
    why = next((why for pattern, why in _AMBIGUOUS_PATTERNS if pattern.fullmatch(node.text)), "") if node.plain else ""
    if not why:
        return
    if not node.text:
        yield Fault(name, *node.mark, key, "a value", "none", "write a value, or leave the key out", "empty value")
    else:
        found = f"{shown(node.text)}, {why}"
        number = f", if a number is meant, `{node.text.lstrip('-+0_') or 0}`" if node.text.isdigit() else ""
        yield Fault(
            name,
            *node.mark,
            key,
            "a value read one way only",
            found,
            f'if text is meant, write `"{node.text}"`{number}',
            "ambiguous",
        )


def _keys(node: Mapping, key: str, name: str) -> Iterator[Fault]:
    first: dict[str, Mark] = {}
    for each, _ in node.entries:
        address = below(key, each.text)
        yield from _characters(each, address, name)
        if each.oddity:
            yield Fault(name, *each.mark, address, "a plain key", shown(each.oddity), "", "notation")
        elif each.text == "<<":
            hint = "write the keys out where they are needed"
            yield Fault(name, *each.mark, address, "a plain key", "the merge key <<", hint, "notation")
        elif each.text in first:
            line = first[each.text][0]
            yield Fault(
                name,
                *each.mark,
                address,
                "each key once",
                f"{shown(each.text)} again, after line {line}",
                "keep one of the two",
                "duplicate key",
            )
        first.setdefault(each.text, each.mark)
