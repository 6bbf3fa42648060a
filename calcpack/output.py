"""Writing a package: all of it or nothing."""

from __future__ import annotations

import os
from pathlib import Path

from .faults import Fault, InputFault


def resolve(target: Path, source: Path) -> Path:
    """The file that ``target`` names, links followed; refused before the pages are set where it cannot be written.

    Raises :class:`InputFault` for a folder, a device, the input file itself, a missing folder, a forbidden place.
    """
    try:
        real = target.resolve()
        if real.is_dir():
            raise _unwritable(target, "a folder")
        if not real.parent.is_dir():
            raise _unwritable(target, f"no folder {target.parent}")
        if real.exists() and not real.is_file():
            raise _unwritable(target, "a device or a pipe")
        if real.exists() and source.exists() and real.samefile(source):
            raise _unwritable(target, "the input file itself")
        if not os.access(real if real.exists() else real.parent, os.W_OK):
            raise _unwritable(target, "no permission to write there")
    except (OSError, RuntimeError, ValueError) as error:
        raise _unwritable(target, getattr(error, "strerror", None) or str(error)) from None
    return real


def write(target: Path, content: bytes) -> None:
    """Write ``content``; a crash in the middle leaves the old file.  Raises :class:`InputFault` where it cannot."""
    import tempfile

    temporary = None
    try:
        handle, name = tempfile.mkstemp(dir=target.parent, prefix=".calcpack-")
        temporary = Path(name)
        with os.fdopen(handle, "wb") as stream:
            stream.write(content)
            stream.flush()
            os.fsync(stream.fileno())
        mask = os.umask(0)
        os.umask(mask)
        temporary.chmod(0o666 & ~mask)
        temporary.replace(target)
        temporary = None
    except OSError as error:
        raise _unwritable(target, error.strerror or str(error)) from None
    finally:
        if temporary is not None:
            temporary.unlink(missing_ok=True)


def _unwritable(target: Path, found: str) -> InputFault:
    return InputFault(
        [Fault(str(target), 0, 0, "-o", "a file that can be written", found, "name another path with -o")]
    )
