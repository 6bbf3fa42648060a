"""The characters of a text: spaces made alike, hidden ones found, and those the pages can print."""

from __future__ import annotations

import re
import unicodedata

from ..faults import FILLERS, shown

#: Characters that join letters, and emoji in comments, without hiding any.
_JOINERS = "\u200c\u200d"
_LAYOUT = "\t\n\r"
#: What the pages' fonts are made for: Latin, Greek and Cyrillic with their signs.  The range is wider than any one
#: font; a character inside it that a font lacks is printed by its number.
_PRINTED = re.compile("[\u0020-\u02ff\u0370-\u052f\u1e00-\u22ff]*")
_WANTED = "visible Latin, Greek or Cyrillic letters, figures and the usual signs"


def normal(text: str) -> str:
    """``text`` as it is compared and printed: composed letters, single spaces between words, none around them."""
    composed = unicodedata.normalize("NFC", "".join(c for c in text if not _hidden(c)))
    return " ".join(composed.split())


def _hidden(c: str) -> bool:
    """A character that shows nothing, turns the direction of its neighbours, or has no shape agreed on."""
    return c in FILLERS or (c not in _LAYOUT and unicodedata.category(c) in ("Cc", "Cf", "Cs", "Co", "Cn", "Zl", "Zp"))


def hidden_in_file(text: str) -> re.Pattern[str] | None:
    """What finds the characters of a whole file, comments included, that conceal something; ``None`` without any.

    New emoji, joined ones and private signs conceal nothing and may stand in a comment.
    """
    found = [c for c in set(text) if _hidden(c) and c not in _JOINERS and unicodedata.category(c) not in ("Co", "Cn")]
    return re.compile(f"[{''.join(map(re.escape, found))}]") if found else None


def named(c: str) -> str:
    """``U+200B (zero width space)``."""
    name = unicodedata.name(c, "").lower()
    return f"U+{ord(c):04X}" + (f" ({name})" if name else "")


def objection(typed: str) -> tuple[str, str, str] | None:
    """What is wanted, found and suggested where a value or a key holds characters that cannot be printed."""
    composed = unicodedata.normalize("NFC", typed)
    if composed.isascii() and composed.isprintable():
        return None
    hidden = list(dict.fromkeys(c for c in composed if _hidden(c)))
    text = normal(typed)
    foreign = [] if _PRINTED.fullmatch(text) else list(dict.fromkeys(c for c in text if not _PRINTED.fullmatch(c)))
    if not hidden and not foreign:
        return None
    odd = [f"{named(c)}, which is hidden" for c in hidden[:3]] + [f"“{c}” (U+{ord(c):04X})" for c in foreign[:3]]
    plain = normal(unicodedata.normalize("NFKC", text))
    hint = "delete what is hidden"
    if foreign:
        hint = f"write `{plain}`" if _PRINTED.fullmatch(plain) else "transliterate it; a comment may hold any letters"
    return _WANTED, f"{shown(typed)}, with {' and '.join(odd)}", hint
