"""Files that cannot be read, and text that is damaged."""

from __future__ import annotations

import os
import random
from pathlib import Path

import pytest
import yaml
from source_files import BASE, SAMPLES, refused

from calcpack.faults import InputFault
from calcpack.source import document, load, loads


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
