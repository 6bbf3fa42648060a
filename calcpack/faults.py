"""A fault in the input: where it stands, what was wanted, what was found, and what to write instead."""

from __future__ import annotations

from collections.abc import Iterable
from dataclasses import dataclass
from difflib import get_close_matches

#: Letters of Hangul that show nothing, though they count as letters.
FILLERS = "\u115f\u1160\u3164\uffa0"


@dataclass(frozen=True)
class Fault:
    """One thing wrong in one place.

    ``line`` and ``column`` count from 1, as editors do; 0 means the fault belongs to the file as a whole.
    ``kind`` is a short fixed word for programs (``missing key``, ``unit``); the other texts are for people.
    """

    file: str
    line: int
    column: int
    key: str
    wanted: str
    found: str
    suggestion: str = ""
    kind: str = "value"


class InputFault(Exception):
    """The input cannot be used; carries every fault found in the run, in the order of the file."""

    def __init__(self, faults: Iterable[Fault]) -> None:
        self.faults = tuple(sorted(faults, key=lambda fault: (fault.line, fault.column)))
        super().__init__("\n".join(map(format_fault, self.faults)))


def format_fault(fault: Fault) -> str:
    """The fault in one line: ``file:line:column: key: wanted …; found …. Suggestion: …``."""
    place = fault.file if fault.line == 0 else f"{fault.file}:{fault.line}:{fault.column}"
    key = visible(fault.key[:120])
    parts = [place, key, f"wanted {fault.wanted}; found {fault.found}."]
    text = ": ".join(part for part in parts if part)
    end = "" if fault.suggestion.endswith("?") else "."
    return f"{text} Suggestion: {fault.suggestion}{end}" if fault.suggestion else text


def nearest(word: str, choices: Iterable[str]) -> str:
    """The choice most like ``word``, or an empty text; the same letters in another case come first."""
    if len(word) > 40:
        return ""
    known = list(choices)
    folded = {choice.casefold(): choice for choice in reversed(known)}
    if word.casefold() in folded:
        return folded[word.casefold()]
    near = get_close_matches(word, known, n=1, cutoff=0.6) or get_close_matches(
        word.casefold(), folded, n=1, cutoff=0.6
    )
    return folded.get(near[0], near[0]) if near else ""


def did_you_mean(word: str, choices: Iterable[str]) -> str:
    """``did you mean `flow`?`` without the full stop, or an empty text."""
    near = nearest(word, choices)
    return f"did you mean `{near}`?" if near else ""


def shown(text: str, length: int = 60) -> str:
    """``text`` in quotation marks, for a message: cut when long, invisible characters written out."""
    return f"“{visible(text if len(text) <= length else text[: length - 1] + '…')}”"


def visible(text: str) -> str:
    """``text`` with its invisible characters, and halves of characters, written out: ``a<U+200B>b``."""
    return "".join(c if c.isprintable() and c not in FILLERS else f"<U+{ord(c):04X}>" for c in text)


def listed(words: Iterable[str]) -> str:
    """``a, b or c``."""
    items = list(words)
    return " or ".join([", ".join(items[:-1]), items[-1]] if len(items) > 1 else items)
