"""What the reader says of a package."""

from __future__ import annotations

from dataclasses import dataclass

from .book import Finding


@dataclass(frozen=True)
class Report:
    """What was read back: how many lines were checked in which way, what was not read, and what disagrees.

    ``recomputed`` counts equations, sums, conversions and rows of losses; ``bracketed`` roots proved by their
    residuals; ``looked_up`` look-ups, of which ``derived`` were derived again with the library; ``inputs``
    and ``rules`` the rows of sections 4 and 9.
    """

    sheets: int
    recomputed: int
    bracketed: int
    looked_up: int
    derived: int
    inputs: int
    rules: int
    unread: tuple[Finding, ...]
    disagreements: tuple[Finding, ...]

    @property
    def ok(self) -> bool:
        """Whether everything was read and nothing disagrees."""
        return not self.unread and not self.disagreements

    def __str__(self) -> str:
        rows = [
            f"{self.sheets} sheets: {self.recomputed} lines recomputed, {self.bracketed} roots bracketed, "
            f"{self.looked_up} look-ups ({self.derived} derived again), "
            f"{self.inputs} inputs, {self.rules} rules",
            f"{len(self.unread)} not read, {len(self.disagreements)} disagreements",
        ]
        rows += [f"not read: {x}" for x in self.unread]
        rows += [f"disagrees: {x}" for x in self.disagreements]
        return "\n".join(rows)
