"""calcpack: a calculation package for a pump's suction side, line by line.

The Python interface does what the commands do::

    record = calcpack.assess("plant.yaml")      # compute and check
    pdf = calcpack.draft("plant.yaml").pdf      # the package
    report = calcpack.verify(pdf)               # read back from its pages
"""

from __future__ import annotations

from dataclasses import dataclass
from pathlib import Path
from typing import TYPE_CHECKING, Any

if TYPE_CHECKING:
    from .reader import Report
    from .source.inputs import Calculation

__version__ = "0.1.0"
__all__ = ["Package", "__version__", "assess", "draft", "verify"]


@dataclass(frozen=True)
class Package:
    """A package: its record (plain data, see ``calcpack.record``) and its pages as PDF bytes."""

    record: dict[str, Any]
    pdf: bytes


def assess(path: str | Path) -> dict[str, Any]:
    """Compute and judge an input file; returns its record.

    Raises :class:`calcpack.faults.InputFault`, which carries every fault found, where the file cannot be used.
    """
    from .source import load

    return _record(load(path))


def draft(path: str | Path) -> Package:
    """Compute an input file and set its pages.  Raises :class:`calcpack.faults.InputFault` as :func:`assess` does."""
    from .page.pdf import render
    from .record import canonical
    from .source import load

    calculation = load(path)
    record = _record(calculation)
    attachments = (
        (calculation.path, calculation.raw, "the input file as read", "Source"),
        ("record.json", canonical(record), "the record: every line as data", "Data"),
    )
    return Package(record, render(record, attachments))


def verify(pdf: bytes) -> Report:
    """Read a package back from its visible pages, recompute every line and compare.

    Raises :class:`calcpack.reader.NotAPackage` for anything that is not a package of calcpack.
    """
    from .reader import verify as read_back

    return read_back(pdf)


def _record(calculation: Calculation) -> dict[str, Any]:
    from decimal import localcontext

    from .arithmetic import DECIMAL
    from .record import assemble
    from .study import run

    # Whatever decimal context the caller works in, ours is our own.
    with localcontext(DECIMAL):
        return assemble(run(calculation))
