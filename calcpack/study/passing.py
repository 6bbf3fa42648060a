"""The liquid on its way through one section, in one state."""

from __future__ import annotations

from dataclasses import dataclass

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

    def turbulent(self) -> None:
        """Find that a coefficient or a square law is used where the flow is not turbulent."""
        reynolds = self.flow.reynolds
        if reynolds.record < TURBULENT_ABOVE:
            self.entry.find(
                f"Coefficients of turbulent flow understate the losses in {named(self.flow.section)} (line {reynolds.address})",
                f"its Reynolds number is below {TURBULENT_ABOVE}, where a fitting loses more than its K of turbulent flow; "
                "the sets of Hooper and of Darby correct for the Reynolds number",
            )
