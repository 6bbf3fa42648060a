"""The liquid on its way through one section, in one state."""

from __future__ import annotations

from dataclasses import dataclass

from ..source.inputs import Element
from .entry import Entry
from .flow import Flow, named
from .friction import TURBULENT_ABOVE
from .liquid import Liquid
from .state import State


@dataclass(frozen=True)
class Passing:
    """What an element's loss depends on besides the element."""

    entry: Entry
    state: State
    liquid: Liquid
    flow: Flow

    def turbulent(self, element: Element) -> None:
        """Find that an element's coefficient or square law is used where the flow is not turbulent."""
        reynolds = self.flow.reynolds
        if reynolds.record < TURBULENT_ABOVE:
            self.entry.find(
                f"The loss of {element.name or element.kind}, element {element.id} of {named(self.flow.section)}, is that of "
                f"turbulent flow, {self.state.name}",
                f"the Reynolds number there is {self.entry.ledger.shown(reynolds).removesuffix(' 1')} (line {reynolds.address}); below "
                f"{TURBULENT_ABOVE} an element loses more than its coefficient, or the square of the flow, says: ask the maker; for "
                "fittings the sets of Hooper and of Darby correct for it",
            )
