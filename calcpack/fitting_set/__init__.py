"""Loss coefficients of fittings by named published sets; sets are not mixed within a line unless the file says so.

An entry is named by the kind of element and its variant, alike in every set that has the fitting: ``elbow 90 standard``
(threaded, r/D 1), ``90 short`` (flanged or butt-welded, r/D 1), ``90 long`` (r/D 1.5), ``90 3D`` and so on; ``tee run``
and ``branch`` (flanged or welded); ``valve gate``; ``entrance flush``.
"""

from __future__ import annotations

from collections.abc import Mapping
from dataclasses import dataclass

from .coefficient import Coefficient, Entries
from .crane import CRANE
from .darby import DARBY
from .hooper import HOOPER


@dataclass(frozen=True)
class FittingSet:
    """A published set: its name as printed, and its entries by kind and variant."""

    name: str
    entries: Entries


#: Key of the input file -> the set.
SETS: Mapping[str, FittingSet] = {
    "crane": FittingSet("Crane TP-410", CRANE),
    "hooper_2k": FittingSet("Hooper 2-K", HOOPER),
    "darby_3k": FittingSet("Darby 3-K", DARBY),
}
#: The set that lends what another has not: entrances and changes of bore.
LENDER = "crane"


def variants(set_name: str, kind: str) -> list[str]:
    """The variants of a kind of element that a set has."""
    return [variant for k, variant in SETS[set_name].entries if k == kind]


def coefficient(set_name: str, kind: str, variant: str, inches: float) -> Coefficient | None:
    """The entry for a fitting of a nominal size in inches, or ``None`` where the set has none."""
    entry = SETS[set_name].entries.get((kind, variant))
    if entry is None or isinstance(entry, Coefficient):
        return entry
    return next((of_size for below, of_size in entry if inches < below), None)


__all__ = ["LENDER", "SETS", "Coefficient", "FittingSet", "coefficient", "variants"]
