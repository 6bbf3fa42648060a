"""The cover: its verdict, its tally and its table of rules are those of section 9."""

from __future__ import annotations

import re
from collections import Counter
from collections.abc import Mapping

from .bands import ACCENT, MM, paper_edge
from .book import Book, Finding
from .failures import Unread
from .glyphs import Glyph, Sheet
from .rules import Judged
from .text import ROW, rows, scalar, words
from .units import Quantity, named

#: Size of the verdict in the serif (points).
_VERDICT = 25.0
_COUNT = re.compile(r"(\d+) (met|not met|not applicable|not assessed)(?=,|$)")
_RULE = re.compile(r"9\.[1-9]\d*")
#: Edges of the address, and of what there is, what is asked for and the margin (mm).
NUMBER, COLUMNS = (6.0, 15.0), ((89.0, 113.0), (113.0, 136.0), (136.0, 156.0))


def check_cover(sheet: Sheet, after: Sheet | None, judged: Mapping[str, Judged], book: Book) -> None:
    """Compare the cover with the rules ``judged``, by address; a long table of rules runs on to the sheet ``after`` it."""
    verdicts = [each.verdict for each in judged.values()]
    printed = words(g for g in sheet.glyphs if g.serif and g.bold and abs(g.size - _VERDICT) < 0.1).lower()
    worst = next((word for word in ("not met", "not assessed") if word in verdicts), "met")
    if printed != worst:
        book.note(sheet.number, "", "the cover's verdict is not that of the rules", printed or "none", worst)
    shown = [tally for row in rows(sheet.glyphs) if (tally := {w: int(n) for n, w in _COUNT.findall(str(row))})]
    if Counter(verdicts) not in shown:
        book.note(sheet.number, "", "the cover's tally is not that of the rules", shown, dict(Counter(verdicts)))
    found = _table(sheet, judged, book)
    if after is not None and judged.keys() - found:
        found |= _table(after, judged, book)
    if missing := judged.keys() - found:
        book.note(sheet.number, "", "the cover leaves rules out", "", ", ".join(sorted(missing)))


def _table(sheet: Sheet, judged: Mapping[str, Judged], book: Book) -> set[str]:
    """The rules found on a sheet, each once with the figures of section 9 on the row of its address."""
    edge, found = paper_edge(sheet), set[str]()
    for row in rows(g for g in _between(sheet, edge, NUMBER) if g.colour == ACCENT):
        address = str(row)
        if address in found or not _RULE.fullmatch(address):
            continue
        found.add(address)
        cells = [[g for g in _between(sheet, edge, column) if abs(g.y - row.y) < ROW] for column in COLUMNS]
        if address not in judged:
            book.note(sheet.number, address, "a rule that section 9 lacks")
            continue
        try:
            shown = tuple(_quantity(words(cell)) for cell in cells) if judged[address].shown else ()
        except Unread as error:
            book.unread.append(Finding(sheet.number, address, str(error)))
            continue
        if shown != judged[address].shown:
            told = " · ".join(map(str, judged[address].shown))
            book.note(sheet.number, address, "the cover gives other figures", " · ".join(map(str, shown)), told)
    return found


def _between(sheet: Sheet, edge: float, column: tuple[float, float]) -> list[Glyph]:
    low, high = (edge + (x - 0.3) * MM for x in column)
    return [g for g in sheet.glyphs if low <= g.x < high]


def _quantity(printed: str) -> Quantity:
    value, unit = scalar(printed)
    return Quantity(value, named(unit))
