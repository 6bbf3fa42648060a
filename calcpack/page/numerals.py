"""Printed numbers: sign, digits in threes on both sides of the point, power of ten."""

from __future__ import annotations

from dataclasses import dataclass
from decimal import Decimal, InvalidOperation

from ..number import MINUS

#: Gap between groups of three: a sixth of an em in the serif, the no-break word space (0.2 em) in the sans.
SERIF_GAP = "\u2006"
SANS_GAP = "\u00a0"
#: Numbers whose first digit stands below this power of ten are written with one.
LEAST = -3


@dataclass(frozen=True)
class Numeral:
    """A number ready for print: ``groups`` of digits (the point stays with the group before it)."""

    negative: bool
    groups: tuple[str, ...]
    exponent: str

    def text(self, gap: str) -> str:
        """Sign and digits without the power of ten."""
        return (MINUS if self.negative else "") + gap.join(self.groups)

    @property
    def power(self) -> str:
        """The exponent with a true minus; empty where there is none."""
        return self.exponent.replace("-", MINUS)


def numeral(value: str) -> Numeral:
    """Read ``value`` (digits as Python writes a Decimal: ``-1717.92``, ``4.16667E-4``).

    Below a thousandth it is shown with a power of ten, however it was written.  Raises :class:`ValueError` for text
    that is not a finite number.
    """
    try:
        x = Decimal(value.replace(MINUS, "-"))
    except InvalidOperation:
        raise ValueError(f"{value!r} is not a number") from None
    if not x.is_finite():
        raise ValueError(f"{value!r} is not a number")
    mantissa, _, exponent = (str(x) if x else format(x, "f")).partition("E")
    if x and x.adjusted() < LEAST:
        mantissa, exponent = str(x.scaleb(-x.adjusted())), str(x.adjusted())
    negative = x < 0
    whole, point, part = mantissa.lstrip("+-").partition(".")
    head = len(whole) % 3
    groups = ([whole[:head]] if head else []) + [whole[i : i + 3] for i in range(head, len(whole), 3)]
    tail = [part[i : i + 3] for i in range(0, len(part), 3)]
    if point:
        groups[-1] += "." + tail[0]
        groups += tail[1:]
    return Numeral(negative, tuple(groups), str(int(exponent)) if exponent else "")
