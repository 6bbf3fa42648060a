"""What the schema cannot see: keys that need, replace or exclude one another, and the order of values.

One topic a module, each with ``check(view)``.  Every check takes the tree as it is, with faults elsewhere in it, so
that one run finds all of them.
"""

from __future__ import annotations

from collections.abc import Iterator

from ...faults import Fault
from ..view import View
from . import cases, criteria, document, element, line, liquid, order, pump, reading, site, supply

TOPICS = (document, order, site, liquid, supply, line, element, pump, criteria, reading, cases)


def check(view: View) -> Iterator[Fault]:
    """Every fault of the document's own order and of the plant's description."""
    for topic in TOPICS:
        yield from topic.check(view)
