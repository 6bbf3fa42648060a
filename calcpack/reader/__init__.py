"""The reader: a package read back from its visible page alone, every line recomputed.

Imports nothing else of calcpack, so that an error in what writes the page cannot hide in what reads it.
"""

from .book import Finding
from .failures import NotAPackage
from .reading import verify
from .report import Report

__all__ = ["Finding", "NotAPackage", "Report", "verify"]
