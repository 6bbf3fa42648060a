"""The cover: its verdict and tally are those of the rules in section 9."""

from __future__ import annotations

import re
from collections import Counter
from collections.abc import Sequence

from .book import Book
from .glyphs import Sheet
from .text import rows, words

#: Size of the verdict in the serif (points).
_VERDICT = 25.0
_COUNT = re.compile(r"(\d+) (met|not met|not applicable|not assessed)(?=,|$)")


def check_cover(sheet: Sheet, verdicts: Sequence[str], book: Book) -> None:
    """Compare the cover with the ``verdicts`` of the rules."""
    printed = words(g for g in sheet.glyphs if g.serif and g.bold and abs(g.size - _VERDICT) < 0.1).lower()
    worst = next((word for word in ("not met", "not assessed") if word in verdicts), "met")
    if printed != worst:
        book.note(sheet.number, "", "the cover's verdict is not that of the rules", printed or "none", worst)
    shown = [tally for row in rows(sheet.glyphs) if (tally := {w: int(n) for n, w in _COUNT.findall(str(row))})]
    if Counter(verdicts) not in shown:
        book.note(sheet.number, "", "the cover's tally is not that of the rules", shown, dict(Counter(verdicts)))
