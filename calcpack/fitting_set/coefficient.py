"""What a published set prints for one fitting."""

from __future__ import annotations

from collections.abc import Mapping
from dataclasses import dataclass

from ..references import Cite


@dataclass(frozen=True)
class Coefficient:
    """A fitting's constants (symbol -> number as printed), and the equation that makes a coefficient K of them.

    ``equation`` is empty where the set prints K itself.
    """

    title: str
    constants: Mapping[str, str]
    equation: str
    cite: Cite


#: (kind, variant) -> its coefficient, or those of its ranges of size, each with the nominal size in inches it ends below.
Entries = Mapping[tuple[str, str], "Coefficient | tuple[tuple[float, Coefficient], ...]"]
