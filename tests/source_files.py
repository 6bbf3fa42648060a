"""A small valid input file, and what is done to it."""

from __future__ import annotations

from pathlib import Path

import pytest

from calcpack.faults import InputFault
from calcpack.source import loads

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
