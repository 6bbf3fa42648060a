"""Writing a file: all of it or nothing."""

from __future__ import annotations

import os
from pathlib import Path

from .faults import Fault, InputFault, visible
from .resources import find_resource


def resolve(target: Path, source: Path, option: str = "") -> Path:
    """The file that ``target`` names, links followed; refused before the pages are set where it cannot be written.

    ``option`` is the one that names it.  Raises :class:`InputFault` for a folder, a device, the input file itself, a
    missing folder, a forbidden place.
    """
    try:
        real = target.resolve()
        if real.is_dir():
            raise _unwritable(target, "a folder", option)
        if not real.parent.is_dir():
            raise _unwritable(target, f"no folder {visible(str(target.parent))}", option)
        if real.exists() and not real.is_file():
            raise _unwritable(target, "a device or a pipe", option)
        if real.exists() and source.exists() and real.samefile(source):
            raise _unwritable(target, "the input file itself", option)
        if not os.access(real if real.exists() else real.parent, os.W_OK):
            raise _unwritable(target, "no permission to write there", option)
    except (OSError, RuntimeError, ValueError) as error:
        raise _unwritable(target, getattr(error, "strerror", None) or str(error), option) from None
    return real


def write(target: Path, content: bytes, option: str = "") -> None:
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
        raise _unwritable(target, error.strerror or str(error), option) from None
    finally:
        if temporary is not None:
            temporary.unlink(missing_ok=True)


def begin(target: Path) -> None:
    """Write the small input file to begin with.  Raises :class:`InputFault` where one is there, or none can be."""
    if target.exists() or target.is_symlink():
        raise _unwritable(target, "one that is there already; none is overwritten")
    write(resolve(target, target), find_resource("templates", "begin.yaml").read_bytes())


def _unwritable(target: Path, found: str, option: str = "") -> InputFault:
    other = f"name another path{' with ' if option else ''}{option}"
    return InputFault([Fault(visible(str(target)), 0, 0, option, "a file that can be written", found, other)])
