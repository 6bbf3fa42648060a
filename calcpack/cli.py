"""The commands: new, assess, draft, verify."""

from __future__ import annotations

import argparse
import sys
from collections.abc import Sequence
from pathlib import Path
from typing import Any, NoReturn

from . import __version__, assess, draft, verify
from .faults import Fault, InputFault, visible
from .output import begin, resolve, write

#: Bytes beyond which no file is a package.
LARGEST_PACKAGE = 200 * 10**6
PASSED, NOT_MET, AT_FAULT, DISAGREES = 0, 1, 2, 3
_EPILOG = (
    "exit codes: 0 every rule met or not applicable; 1 a rule not met or not assessed; 2 input at fault; "
    "3 verification disagrees; 70 a defect of calcpack"
)


class _Parser(argparse.ArgumentParser):
    def error(self, message: str) -> NoReturn:
        print(f"calcpack: {visible(message)}. See `calcpack --help`.", file=sys.stderr)
        raise SystemExit(AT_FAULT)


def _parser() -> argparse.ArgumentParser:
    parser = _Parser(
        "calcpack", description="A calculation package for a pump's suction side, from one input file.", epilog=_EPILOG
    )
    parser.add_argument("--version", action="version", version=f"calcpack {__version__}")
    commands = parser.add_subparsers(dest="command", required=True, metavar="COMMAND", parser_class=_Parser)
    beginning = commands.add_parser("new", help="write a small input file to begin with", epilog=_EPILOG)
    beginning.add_argument("input", type=Path, metavar="FILE.yaml", help="the file to write; none is overwritten")
    drafting = commands.add_parser("draft", help="make the package (PDF) of an input file", epilog=_EPILOG)
    drafting.add_argument("input", type=Path, metavar="INPUT", help="the input file (YAML)")
    drafting.add_argument(
        "-o",
        "--output",
        type=Path,
        metavar="FILE.pdf",
        help="where to write it; default: the input's name with .pdf, here",
    )
    assessing = commands.add_parser("assess", help="compute and check, without making pages", epilog=_EPILOG)
    assessing.add_argument("input", type=Path, metavar="INPUT", help="the input file (YAML)")
    assessing.add_argument("--json", action="store_true", help="print the record instead of the table")
    verifying = commands.add_parser(
        "verify", help="read a package back from its pages and recompute every line", epilog=_EPILOG
    )
    verifying.add_argument("package", type=Path, metavar="FILE.pdf", help="the package")
    return parser


def run(arguments: Sequence[str]) -> int:
    """Run the command line ``arguments`` and return the exit code; messages go to standard error."""
    try:
        asked = _parser().parse_args(arguments)
    except SystemExit as stop:
        return int(stop.code or 0)
    try:
        match asked.command:
            case "new":
                return _new(asked.input)
            case "draft":
                return _draft(asked.input, asked.output)
            case "assess":
                return _assess(asked.input, asked.json)
        return _verify(asked.package)
    except InputFault as fault:
        print(str(fault), file=sys.stderr)
        count = len(fault.faults)
        print(f"calcpack: {count} fault{'s' if count > 1 else ''}; {_LEFT_UNDONE[asked.command]}.", file=sys.stderr)
        return AT_FAULT


_LEFT_UNDONE = {
    "new": "nothing was written",
    "draft": "nothing was written",
    "assess": "nothing was computed",
    "verify": "nothing was verified",
}


def _new(target: Path) -> int:
    begin(target)
    print(visible(str(target)))
    return PASSED


def _passed(record: dict[str, Any]) -> int:
    return PASSED if record["cover"]["verdict"] == "met" else NOT_MET


def _draft(source: Path, output: Path | None) -> int:
    target = output or Path(Path(source.name or "package").stem + ".pdf")
    real = resolve(target, source, "-o")
    _progress("computing and setting the pages")
    try:
        package = draft(source)
    except OSError as error:
        if "cannot load library" not in str(error):
            raise
        raise InputFault([_missing_library(error)]) from None
    finally:
        _progress("")
    write(real, package.pdf, "-o")
    print(_verdict(package.record))
    print(visible(str(target)))
    return _passed(package.record)


def _assess(source: Path, as_json: bool) -> int:
    record = assess(source)
    if as_json:
        from .record import canonical

        sys.stdout.buffer.write(canonical(record) + b"\n")
    else:
        from .table import table

        print(table(record))
    return _passed(record)


def _verify(package: Path) -> int:
    from .reader import NotAPackage

    try:
        if package.exists() and not package.is_file():
            raise NotAPackage("a folder, a device or a pipe")
        if package.exists() and package.stat().st_size > LARGEST_PACKAGE:
            raise NotAPackage(f"a file larger than {LARGEST_PACKAGE // 10**6} MB")
        report = verify(package.read_bytes())
    except FileNotFoundError:
        raise _no_package(package, "no file of that name") from None
    except (OSError, ValueError) as error:
        reason = getattr(error, "strerror", None) or str(error)
        raise _no_package(package, reason[:1].lower() + reason[1:]) from None
    print(report)
    return PASSED if report.ok else DISAGREES


def _no_package(path: Path, found: str) -> InputFault:
    return InputFault([Fault(visible(str(path)), 0, 0, "", "a package, the PDF that `calcpack draft` makes", found)])


def _verdict(record: dict[str, Any]) -> str:
    from .number import typeset_minus
    from .record.lines import quantity

    cover = record["cover"]
    rule = next(r for r in record["checks"] if r["address"] == cover["governing"])
    margin = rule["margin"]
    amount = f", margin {quantity(margin['headline'])}" if margin else f": {rule['reason']}"
    percent = f" ({typeset_minus(margin['percent'])} %)" if margin and margin["percent"] else ""
    about = f" ({rule['about']})" if rule["about"] else ""
    return f"Verdict: {cover['verdict']}. Governing: rule {rule['address']}, {rule['title']}{about}: {rule['verdict']}{amount}{percent}."


def _progress(words: str) -> None:
    """One line on a terminal, overwritten; nothing where the output goes elsewhere."""
    if sys.stderr is not None and sys.stderr.isatty():
        print(f"\r\033[K{words}{' …' if words else ''}", end="", file=sys.stderr, flush=True)


def _missing_library(error: OSError) -> Fault:
    return Fault(
        "this machine", 0, 0, "", "the library Pango, which sets the pages", str(error).splitlines()[0],
        "Debian, Ubuntu: `apt install libpango-1.0-0 libpangoft2-1.0-0`; Fedora: `dnf install pango`; macOS: `brew install pango`; "
        "Windows: install GTK's runtime through MSYS2, `pacman -S mingw-w64-x86_64-pango`",
    )  # fmt: skip
