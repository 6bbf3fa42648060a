"""The input file as bytes and as text: what may be opened, how large it may be, how it is encoded."""

from __future__ import annotations

import os
import re
import stat
from pathlib import Path

from ..faults import Fault, InputFault, visible
from .characters import hidden_in_file, named
from .nodes import Mark

MAX_BYTES = 1_000_000
#: Pipes the shell hands over; a pipe by any other name may wait for ever for its writer.
_HANDED = re.compile(r"/dev/stdin|(?:/dev/fd|/proc/self/fd)/([0-9]+)")
_OTHER_KINDS = {
    stat.S_IFIFO: "a named pipe",
    stat.S_IFCHR: "a terminal or another device",
    stat.S_IFBLK: "a device",
    stat.S_IFSOCK: "a socket",
}
#: Other encodings by the bytes they begin with; the longer marks first, since they begin like the shorter ones.
_ENCODINGS = {
    b"\xff\xfe\0\0": "UTF-32",
    b"\0\0\xfe\xff": "UTF-32",
    b"\xff\xfe": "UTF-16",
    b"\xfe\xff": "UTF-16",
}


def read_bytes(path: Path) -> bytes:
    """The file's content.

    Opens regular files, and pipes handed over as ``/dev/stdin`` or ``/dev/fd/N``.  Raises :class:`InputFault`
    where the file is of another kind, cannot be read or is too large.
    """
    try:
        with open(_openable(path), "rb") as file:
            raw = file.read(MAX_BYTES + 1)
    except FileNotFoundError:
        raise _whole(path, "an input file", "no file of that name") from None
    except (OSError, ValueError) as error:
        reason = getattr(error, "strerror", None) or str(error)
        raise _whole(path, "a file that can be read", reason[:1].lower() + reason[1:]) from None
    if len(raw) > MAX_BYTES:
        hint = "an input file is a few pages of text"
        raise _whole(path, f"a file of at most {MAX_BYTES // 1000} kB", "a larger one", hint)
    return raw


def _openable(path: Path) -> Path | int:
    """What to open: the path, or a copy of the descriptor of a pipe, which another opening could wait for."""
    if path == Path():
        raise _whole(path, "an input file", "no file named, only the current folder", "name the YAML file")
    kind = stat.S_IFMT(os.stat(path).st_mode)
    handed = _HANDED.fullmatch(str(path))
    if kind == stat.S_IFDIR:
        raise _whole(path, "an input file", "a folder", "name the YAML file inside it")
    if kind == stat.S_IFIFO and handed:
        return os.dup(int(handed[1] or 0))
    if kind != stat.S_IFREG:
        raise _whole(path, "a regular file", _OTHER_KINDS.get(kind, "another kind of file"), "name the YAML file")
    return path


def _whole(path: Path, wanted: str, found: str, suggestion: str = "") -> InputFault:
    return InputFault([Fault(visible(str(path)), 0, 0, "", wanted, found, suggestion, "file")])


def decode(raw: bytes, name: str) -> tuple[str, list[Fault]]:
    """The text of the bytes without its hidden characters, and a fault for each line that has some.

    Raises :class:`InputFault` where it is a PDF, is not UTF-8 or holds nothing.
    """
    if raw.startswith(b"%PDF"):
        hint = "`calcpack verify` reads a package back; its input file is attached to it"
        raise InputFault([Fault(name, 0, 0, "", "an input file (YAML)", "a PDF", hint, "file")])
    other = next((encoding for mark, encoding in _ENCODINGS.items() if raw.startswith(mark)), "")
    if not other and b"\0" in raw[:4]:
        other = "UTF-16 or UTF-32"
    if other:
        hint = "save the file again as UTF-8"
        raise InputFault([Fault(name, 1, 1, "", "text in UTF-8", other, hint, "encoding")])
    try:
        text = raw.decode("utf-8-sig")
    except UnicodeDecodeError as error:
        mark = _end(raw[: error.start].decode("utf-8", "replace"))
        found = f"the byte {raw[error.start]:02X}, which is not UTF-8"
        hint = "save the file again as UTF-8 (° and ³ are the usual cause)"
        raise InputFault([Fault(name, *mark, "", "text in UTF-8", found, hint, "encoding")]) from None
    faults = []
    if hidden := hidden_in_file(text):
        for number, line in enumerate(text.split("\n"), 1):
            if at := hidden.search(line):
                found = f"the hidden character {named(at.group())}"
                faults.append(Fault(name, number, at.start() + 1, "", "visible text", found, "delete it", "character"))
        text = hidden.sub("", text)
    if not text.strip():
        faults.append(Fault(name, 1, 1, "", "an input file", "an empty file", "", "empty"))
        raise InputFault(faults)
    return text, faults


def _end(before: str) -> Mark:
    """Line and column just after ``before``."""
    return before.count("\n") + 1, len(before) - (before.rfind("\n") + 1) + 1
