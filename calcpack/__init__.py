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
    from .faults import InputFault
    from .reader import NotAPackage, Report
    from .source.inputs import Calculation

__version__ = "0.1.0"
__all__ = ["InputFault", "NotAPackage", "Package", "__version__", "assess", "draft", "verify"]


def __getattr__(name: str) -> type[Exception]:
    """The two exceptions a caller may want to catch, loaded when first asked for."""
    if name == "InputFault":
        from .faults import InputFault

        return InputFault
    if name == "NotAPackage":
        from .reader import NotAPackage

        return NotAPackage
    raise AttributeError(f"module {__name__!r} has no attribute {name!r}")


@dataclass(frozen=True)
class Package:
    """A package: its record (plain data, see ``calcpack.record``) and its pages as PDF bytes."""

    record: dict[str, Any]
    pdf: bytes


def assess(path: str | Path) -> dict[str, Any]:
    """Compute and judge an input file; returns its record.

    Raises :class:`calcpack.InputFault`, which carries every fault found, where the file cannot be used.
    """
    from .source import load

    return _record(load(path))


def draft(path: str | Path) -> Package:
    """Compute an input file and set its pages.  Raises :class:`calcpack.InputFault` as :func:`assess` does."""
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

    Raises :class:`calcpack.NotAPackage` for anything that is not a package of calcpack.
    """
    from .reader import verify as read_back

    return read_back(pdf)


def _record(calculation: Calculation) -> dict[str, Any]:
    from decimal import localcontext

    from .arithmetic import DECIMAL
    from .assessment import run
    from .record import assemble

    # Whatever decimal context the caller works in, ours is our own.
    with localcontext(DECIMAL):
        return assemble(run(calculation))
