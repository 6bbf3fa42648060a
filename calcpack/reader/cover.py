"""The cover: its verdict and tally are those of the rules in section 9."""

from __future__ import annotations

import re
from collections import Counter
from collections.abc import Sequence

from .book import Book
from .glyphs import Sheet
from .rules import VERDICTS
from .text import rows, words

#: Size of the verdict in the serif (points).
_VERDICT = 25.0
_TALLY = re.compile(r"\d+ (?:met|not met|not applicable|not assessed)(?:, \d+ (?:met|not met|not applicable|not assessed))*")


def check_cover(sheet: Sheet, verdicts: Sequence[str], book: Book) -> None:
    """Compare the cover with the ``verdicts`` of the rules."""
    printed = words(g for g in sheet.glyphs if g.serif and g.bold and abs(g.size - _VERDICT) < 0.1).lower()
    worst = next((word for word in ("not met", "not assessed") if word in verdicts), "met")
    if printed != worst:
        book.note(sheet.number, "", "the cover's verdict is not that of the rules", printed or "none", worst)
    counted = Counter(verdicts)
    tally = ", ".join(f"{counted[word]} {word}" for word in VERDICTS if counted[word])
    shown = [m[0] for row in rows(sheet.glyphs) if (m := _TALLY.search(str(row)))]
    if tally not in shown:
        book.note(sheet.number, "", "the cover's tally is not that of the rules", "; ".join(shown) or "none", tally)
