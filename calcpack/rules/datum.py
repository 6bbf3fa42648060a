"""NPSH available and NPSH required count from one elevation."""

from __future__ import annotations

from collections.abc import Iterator

from ..references import DEFINITION
from ..study.entry import cited
from ..study.npsh import datum
from ..study.results import Results
from ..verdict import Check, Rule, compare, without_numbers

ORDER = 80
ONE_DATUM = Rule(
    "one_datum", "NPSH available and required count from one elevation", "z_d >= z_R", DEFINITION, decides=False
)
_CRITERION = "NPSH available is held against NPSH required at the elevation NPSH required counts from, or above it"


def judge(results: Results) -> Iterator[Check]:
    """Judge the datums by their words, or by the elevation to which NPSH available was shifted."""
    entry, pump = results.entry, results.calculation.pump
    given, source = pump.npsh_required.datum_elevation, cited(pump.npsh_required.provenance)
    if given is not None:
        elevation = entry.value(given, "z_R", "Elevation NPSH required counts from")
        reason = "NPSH available was shifted to the elevation NPSH required counts from"
    elif pump.datum.casefold() == pump.npsh_required.datum.casefold():
        elevation, reason = datum(entry), f"both count from the {pump.datum}"
    else:
        reason = (
            f"NPSH available counts from “{pump.datum}”, NPSH required from “{pump.npsh_required.datum}”: "
            "state datum_elevation of NPSH required, or one datum for both"
        )
        yield without_numbers(ONE_DATUM, "not met", reason, criterion=_CRITERION, source=source)
        return
    yield compare(ONE_DATUM, elevation, elevation, criterion=_CRITERION, source=source, met=reason)
