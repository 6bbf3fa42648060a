"""The one place that knows where ``templates/`` and ``schemas/`` are."""

from __future__ import annotations

from pathlib import Path

_PACKAGE = Path(__file__).resolve().parent


def find_resource(folder: str, name: str) -> Path:
    """The path of a shipped file, such as ``find_resource("schemas", "input.schema.json")``.

    An installed package carries the two folders under ``calcpack/_data``; in a checkout they stand beside it.
    Raises ``FileNotFoundError`` when neither has it: the installation is then damaged.
    """
    for root in (_PACKAGE / "_data", _PACKAGE.parent):
        path = root / folder / name
        if path.exists():
            return path
    raise FileNotFoundError(f"calcpack is damaged: {folder}/{name} is missing; install it again")
