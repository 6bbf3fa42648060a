"""The input file: from YAML to typed records, with every fault at once."""

from __future__ import annotations

from collections.abc import Iterable
from pathlib import Path

from ..faults import Fault, InputFault, visible
from .build import build
from .checks import check
from .document import parse
from .file import read_bytes
from .inputs import Calculation
from .schema import quantities
from .spelling import MAX_FAULTS, correct
from .validate import validate
from .view import View

__all__ = ["MAX_FAULTS", "Calculation", "load", "loads"]


def load(path: str | Path) -> Calculation:
    """Read an input file.

    Raises :class:`InputFault` with every fault found; faults name the file as ``path`` does.
    """
    return loads(read_bytes(Path(path)), str(path))


def loads(raw: bytes, name: str) -> Calculation:
    """Read the bytes of an input file; ``name`` is how faults name it, with what cannot be printed written out."""
    name = visible(name)
    try:
        typed, notation = parse(raw, name)
    except InputFault as stop:
        raise InputFault(_once(stop.faults, name)) from None
    root, spelling = correct(typed, name)
    read, unread = quantities(root, name)
    view = View(root, read, name)
    faults = [*notation, *spelling, *validate(root, name), *unread, *check(view)]
    if faults:
        raise InputFault(_once(faults, name))
    return build(root, read, raw, name)


def _once(faults: Iterable[Fault], name: str) -> list[Fault]:
    """One fault for each place: the first found says most, and whether a text is ambiguous matters least."""
    first: dict[tuple[int, int, str], Fault] = {}
    for fault in sorted(faults, key=lambda fault: fault.kind == "ambiguous"):
        first.setdefault((fault.line, fault.column, fault.key), fault)
    kept = sorted(first.values(), key=lambda fault: (fault.line, fault.column))
    if len(kept) > MAX_FAULTS:
        more = f"{len(kept) - MAX_FAULTS} more after these"
        kept[MAX_FAULTS:] = [Fault(name, kept[MAX_FAULTS].line, 1, "", "a file with fewer faults", more, "", "count")]
    return kept
