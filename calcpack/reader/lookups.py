"""Look-ups derived again: properties of water at the state printed, bores of pipes by size and schedule.

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

#: Function as printed -> CoolProp's name of the property and the unit of its value (saturated liquid water).
_WATER = {
    Symbol("p", "sat"): ("P", "Pa"),
    Symbol("ρ", "sat"): ("D", "kg/m³"),
    Symbol("μ", "sat"): ("V", "Pa·s"),
}
_PIPE = re.compile(r"(NPS|DN) (\S+) schedule (\S+): ([\d.]+) mm less twice ([\d.]+) mm")
#: Inches of the nominal diameters below DN 100 (ISO 6708 beside ASME B36.10M); above it 25 mm are an inch.
_SMALL = {"15": 0.5, "20": 0.75, "25": 1.0, "32": 1.25, "40": 1.5, "50": 2.0, "65": 2.5, "80": 3.0, "90": 3.5}


def look_up(line: Line, form: Form, book: Book) -> Class:
    """A property of water, derived again where the library is installed.  Raises ``Unread``."""
    if not (isinstance(form.right, Op) and form.right.name == "*" and form.right.args[0] in _WATER):
        raise Unread("neither an equation nor a look-up that is known")
    function, argument = form.right.args
    if [o.symbol for o in line.operands] != [argument]:
        raise Unread("a look-up whose state is not its operand")
    state = line.operands[0].quantity
    output, unit = _WATER[function]  # type: ignore[index]  # a Symbol: it is in the table
    if line.record.unit != unit:
        raise Unread(f"a look-up in {line.record.unit}, {unit} expected")
    derived = _water(output, float(converted(Fraction(state.value), state.unit, "K")))
    if derived is None:
        return "tabulated"
    library, found = derived
    allowed = Decimal(0) if library in line.source else unit_of_record(found)  # versions differ in the last digit
    if abs(found - line.record.value) > allowed:
        book.note(line.sheet, line.address, f"{library} gives another value", line.record.value, found)
    return "looked up"


def _water(output: str, kelvin: float) -> tuple[str, Decimal] | None:
    try:
        from CoolProp import __version__
        from CoolProp.CoolProp import PropsSI
    except ImportError:
        return None
    try:
        return f"CoolProp {__version__}", of_record(Decimal(PropsSI(output, "T", kelvin, "Q", 0, "Water")))
    except ValueError:
        raise Unread(f"water at {kelvin} K is outside the formulation") from None


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
