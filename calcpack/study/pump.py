"""What the pump needs: NPSH required at the flow and speed of a result, and with its margin."""

from __future__ import annotations

from dataclasses import dataclass
from typing import TYPE_CHECKING

from ..value import Value
from . import curve, service
from .entry import Entry, cited

if TYPE_CHECKING:
    from .npsh import Available


@dataclass(frozen=True)
class Needed:
    """NPSH needed at one flow: the maker's value, the greater of the margins asked for, and the words of the criterion.

    ``doubt`` says why a result cannot be judged, and ``required`` and ``limit`` are absent then.  ``above``: the limit must be
    exceeded, not only reached.
    """

    required: Value | None
    limit: Value | None
    governs: str
    criterion: str
    source: str
    doubt: str
    above: bool = False


@dataclass(frozen=True)
class _Margin:
    """A margin asked for: ratio, difference or both, in words, and where it comes from."""

    ratio: Value | None
    difference: Value | None
    above: bool
    words: str
    source: str


def needed(entry: Entry, flow: Value) -> Needed:
    """NPSH required at ``flow`` with its margin, ratio and difference, the greater governing."""
    read = curve.required(entry, flow)
    asked = _asked(entry, flow)
    if read.npsh is None:
        return Needed(None, None, "", asked.words, asked.source, read.doubt)
    limit, governs = _limit(entry, asked, read.npsh)
    if read.beside:
        governs = f"{governs}; {read.beside}"
    return Needed(read.npsh, limit, governs, asked.words, asked.source, "", asked.above)


def _asked(entry: Entry, flow: Value) -> _Margin:
    """The margin of the project, else the one published for its service."""
    criteria = entry.calculation.criteria
    ratio, difference = criteria.ratio, criteria.difference
    if ratio is None and difference is None:
        found = service.margin(entry, flow)
        words = _words(found.chosen.ratio, found.chosen.difference, found.chosen.above)
        return _Margin(found.ratio, found.difference, found.chosen.above, f"{words}: {found.words}", found.source)
    entry.ledger.group("NPSH needed")
    return _Margin(
        None if ratio is None else entry.value(ratio, "m_r", "Margin ratio asked for"),
        None if difference is None else entry.value(difference, "m_d", "Margin difference asked for"),
        False,
        _words("" if ratio is None else ratio.text, "" if difference is None else difference.text),
        cited(ratio or difference),
    )


def _words(ratio: str, difference: str, above: bool = False) -> str:
    parts = [f"{ratio} × NPSHR"] if ratio else []
    parts += [f"NPSHR + {difference}"] if difference else []
    most = parts[0] if len(parts) == 1 else f"the greater of {parts[0]} and {parts[1]}"
    return f"NPSH available {'more than' if above else 'at least'} {most}"


def _limit(entry: Entry, asked: _Margin, required: Value) -> tuple[Value, str]:
    """NPSH needed, and which margin governs."""
    ledger = entry.ledger
    ledger.group("NPSH needed")
    by_ratio = asked.ratio and ledger.apply("needed_by_ratio", {"m_r": asked.ratio, "NPSHR": required})
    by_difference = asked.difference and ledger.apply(
        "needed_by_difference", {"m_d": asked.difference, "NPSHR": required}
    )
    if by_ratio and by_difference:
        limit = ledger.apply("needed_greater", {"N_r": by_ratio, "N_d": by_difference})
        return limit, "the ratio governs" if by_ratio.record == limit.record else "the difference governs"
    if by_ratio:
        limit = ledger.apply("needed_ratio_alone", {"N_r": by_ratio})
        return limit, "the ratio is the only margin asked for"
    assert by_difference is not None, "source asks for a margin or a service"
    return ledger.apply(
        "needed_difference_alone", {"N_d": by_difference}
    ), "the difference is the only margin asked for"


def margins(entry: Entry, available: Available, need: Needed) -> None:
    """Margin ratio and margin difference, printed whichever of them is asked for."""
    if need.required is None:
        return
    entry.ledger.group(f"Margin, {available.about}")
    for name in ("margin_ratio", "margin_difference"):
        entry.ledger.apply(name, {"NPSHA": available.npsh, "NPSHR": need.required}, available.about)
