"""The command's entry point: guarded, so that a crash, even one at import, never looks like a rule not met."""

from __future__ import annotations

import contextlib
import errno
import gc
import os
import sys

#: Exit code of an input, or an output, at fault.
AT_FAULT = 2
#: Exit code of a defect of ours (EX_SOFTWARE of sysexits.h).
DEFECT = 70


def main() -> int:
    """Run the command and return its exit code; a defect prints a short report to send and returns 70."""
    _open_streams()
    # A command lives for seconds; collecting its cycles costs more than it frees.
    gc.disable()
    try:
        from .cli import run

        code = run(sys.argv[1:])
        sys.stdout.flush()
        return code
    except KeyboardInterrupt:
        return 130
    except BrokenPipeError:
        # The reader of our output has gone; nothing is left to say, and Python must not say it at exit either.
        sys.stderr.close()
        return 141
    except Exception as error:
        if isinstance(error, OSError) and error.errno == errno.ENOSPC:
            return _no_room()
        return _report(error)


def _open_streams() -> None:
    """Make standard output and error usable: closed ones lead nowhere, and no character ends in a crash."""
    for name in ("stdout", "stderr"):
        if getattr(sys, name) is None:
            setattr(sys, name, open(os.devnull, "w", encoding="utf-8"))  # noqa: SIM115
        getattr(sys, name).reconfigure(errors="backslashreplace")


def _no_room() -> int:
    """The output could not be written: not a defect, and not a verdict."""
    sys.stdout = open(os.devnull, "w", encoding="utf-8")  # noqa: SIM115
    with contextlib.suppress(OSError):
        print("calcpack: wanted room to write the output; found no space left on the device.", file=sys.stderr)
        sys.stderr.flush()
    return AT_FAULT


def _report(error: Exception) -> int:
    import platform
    import traceback

    from . import __version__

    last = traceback.extract_tb(error.__traceback__)[-1]
    place = last.filename.replace("\\", "/").rpartition("/calcpack/")[2]
    print(
        "calcpack: this is a defect of calcpack, not of your file. Nothing was written. Please send these lines to its developers:\n"
        f"  calcpack {__version__}, Python {platform.python_version()}, {platform.system()}\n"
        f"  {type(error).__name__}: {error}\n"
        f"  at {place}, line {last.lineno}, in {last.name}",
        file=sys.stderr,
    )
    return DEFECT


if __name__ == "__main__":
    sys.exit(main())
