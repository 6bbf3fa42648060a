"""Look-ups derived again: properties of liquids at the state printed, bores of pipes by size and schedule.

CoolProp and fluids are used where they are installed; without them, and for tables of printed constants,
a look-up is read and counted, not derived.
"""

from __future__ import annotations

import re
from contextlib import suppress
from decimal import Decimal
from fractions import Fraction

from .arithmetic import of_record, unit_of_record
from .book import Book, Class
from .failures import Unread
from .line import Entry, Line
from .picture import Form
from .text import THIN
from .tree import Op, Symbol
from .units import Quantity, converted

#: Function as printed -> CoolProp's name of the property and the unit of its value; of saturated liquid, or of a mixture.
_PROPERTIES = {
    Symbol("p", "sat"): ("P", "Pa"),
    Symbol("ρ", "sat"): ("D", "kg/m³"),
    Symbol("μ", "sat"): ("V", "Pa·s"),
    Symbol("ρ"): ("D", "kg/m³"),
    Symbol("μ"): ("V", "Pa·s"),
}
#: Units in which CoolProp takes the state: temperature, and the mass fraction of a mixture.
_STATE = {Symbol("T"): "K", Symbol("w"): ""}
#: The library with the liquid it was asked for, as printed, spaces left out: a row may end anywhere in it.
_ASKED = re.compile(r"CoolProp([\d.]+)\((?:(INCOMP::\w+)at([\d.]+)MPa|([\w-]+))\)")
_PIPE = re.compile(r"(NPS|DN) (\S+) schedule (\S+): ([\d.]+) mm less twice ([\d.]+) mm")
#: Inches of the nominal diameters below DN 100 (ISO 6708 beside ASME B36.10M); above it 25 mm are an inch.
_SMALL = {"15": 0.5, "20": 0.75, "25": 1.0, "32": 1.25, "40": 1.5, "50": 2.0, "65": 2.5, "80": 3.0, "90": 3.5}


def look_up(line: Line, form: Form, book: Book) -> Class:
    """A property of a liquid, derived again from the line alone where the library is installed.  Raises ``Unread``."""
    if not (isinstance(form.right, Op) and form.right.name == "*" and form.right.args[0] in _PROPERTIES):
        raise Unread("neither an equation nor a look-up that is known")
    function, argument = form.right.args
    arguments = argument.args if isinstance(argument, Op) and argument.name == "," else (argument,)
    if tuple(o.symbol for o in line.operands) != arguments or not set(arguments) <= set(_STATE):
        raise Unread("a look-up whose state is not its operands")
    state = [
        float(converted(Fraction(o.quantity.value), o.quantity.unit, _STATE[o.symbol]))  # exact until here
        for o in line.operands
    ]
    output, unit = _PROPERTIES[function]  # type: ignore[index]  # a Symbol: it is in the table
    if line.record.unit != unit:
        raise Unread(f"a look-up in {line.record.unit}, {unit} expected")
    asked = _ASKED.search(re.sub(r"\s", "", line.source))
    if asked is None:
        raise Unread("a look-up that names no library with its liquid")
    derived = _derived(output, state, asked)
    if derived is None:
        return "tabulated"
    version, found = derived
    allowed = Decimal(0) if version == asked[1] else unit_of_record(found)  # versions differ in the last digit
    if abs(found - line.record.value) > allowed:
        book.note(line.sheet, line.address, f"CoolProp {version} gives another value", line.record.value, found)
    return "looked up"


def _derived(output: str, state: list[float], asked: re.Match[str]) -> tuple[str, Decimal] | None:
    """The library's version and the value at ``state``: temperature, and a mixture's mass fraction; None without the library."""
    try:
        from CoolProp import __version__
        from CoolProp.CoolProp import PropsSI
    except ImportError:
        return None
    _, mixture, pressure, pure = asked.groups()
    if len(state) != (2 if mixture else 1):
        raise Unread("a mixture without its share, or a share without a mixture")
    try:
        if mixture:
            found = PropsSI(output, "T", state[0], "P", float(pressure) * 1e6, f"{mixture}[{state[1]!r}]")
        else:
            found = PropsSI(output, "T", state[0], "Q", 0, pure)
    except ValueError:
        raise Unread(f"{mixture or pure} at {state[0]} K is outside the formulation") from None
    return __version__, of_record(Decimal(found))


def tabulated(line: Line, entry: Entry, book: Book) -> Class:
    """A table's entry: the same in formula, headline and result; a pipe's bore is derived again."""
    if entry.quantity not in (line.record, Quantity(line.record.value, "")):
        book.note(line.sheet, line.address, "the entry is not the result", entry.quantity, line.record)
    pipe = _PIPE.search(line.place.replace(THIN, ""))
    if pipe is None:
        return "tabulated"
    system, size, schedule, outside, wall = pipe.groups()
    bore = Decimal(outside) - 2 * Decimal(wall)
    if line.record.unit != "mm" or abs(bore - line.record.value) > Decimal("0.011"):
        book.note(line.sheet, line.address, "the bore is not the diameter less two walls", line.record, f"{bore} mm")
    derived = _pipe(system, size, schedule)
    if derived is None:
        return "tabulated"
    if derived != line.record.value:
        book.note(line.sheet, line.address, "the pipe table gives another bore", line.record, f"{derived} mm")
    return "looked up"


def _pipe(system: str, size: str, schedule: str) -> Decimal | None:
    """The bore in mm; None where the library is missing or has no such pipe."""
    try:
        from fluids.piping import nearest_pipe
    except ImportError:
        return None
    with suppress(ValueError, KeyError, ZeroDivisionError):
        inches = _inches(size) if system == "NPS" else _SMALL.get(size, float(size) / 25)
        nominal, inside, _, _ = nearest_pipe(NPS=inches, schedule=schedule)  # type: ignore[arg-type]  # 1.5 is meant too
        return Decimal(f"{inside * 1000:.2f}") if nominal == inches else None
    return None


def _inches(size: str) -> float:
    whole, _, part = size.rpartition("-")
    top, _, bottom = part.partition("/")
    return float(whole or 0) + float(top) / float(bottom or 1)
