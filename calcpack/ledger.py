"""The ledger: the only place where a printed value comes into being.

Every value has an address, a unit and an origin.  It is kept in two books: the *record*, computed in decimal
arithmetic from the printed values above it and rounded once to the digits of record, and the *shadow*, the same
tree in double precision SI from the exact inputs.  What is printed is what was computed, by construction.
"""

from __future__ import annotations

from collections import Counter
from collections.abc import Mapping, Sequence
from decimal import Decimal
from typing import TYPE_CHECKING, Any, Literal

from . import lookup, root
from .arithmetic import InDecimal, InFloat, evaluate
from .catalog import EQUATION
from .conversion import conversion_tree
from .equations import Equation
from .formula import Cmp
from .number import headline, of_record
from .quantity import COHERENT, PLANT, Quantity, Unit, parse
from .references import DEFINITION, Cite
from .symbols import NOMENCLATURE
from .value import Kind, Line, Losses, Part, Row, Value, in_si, in_unit

if TYPE_CHECKING:
    from .source.inputs import Provenance

Operands = Mapping[str, "Value | Sequence[Value]"]
#: Sections of the package that hold addressed values.
INPUTS, COMPUTATION = 4, 8


class Ledger:
    """Writes lines and hands out their values; the same request twice gives the same line."""

    def __init__(self, system: str) -> None:
        self.system = system
        self.used: dict[str, Value] = {}
        self.parts: list[Part] = []
        self._lines: dict[str, Line] = {}
        self._count: Counter[int] = Counter()
        self._made: dict[tuple[object, ...], Value] = {}
        self._group = self._placed = ""

    # --- order on the page

    def part(self, title: str, scope: str) -> None:
        """Begin a part of the computation."""
        self.parts.append(Part(title, scope))
        self._group = self._placed = ""

    def group(self, title: str) -> None:
        """Name the lines that follow; a group without lines leaves no heading, and none is repeated."""
        self._group = "" if title == self._placed else title

    def _address(self, section: int) -> str:
        self._count[section] += 1
        return f"{section}.{self._count[section]}"

    def _place(self, block: Line | Losses) -> None:
        blocks = self.parts[-1].blocks
        if self._group:
            blocks.append(self._group)
            self._placed, self._group = self._group, ""
        blocks.append(block)

    def _register(self, line: Line) -> Line:
        self._lines[line.value.address] = line
        return line

    def _write(self, line: Line) -> Value:
        self._place(self._register(line))
        return line.value

    @property
    def inputs(self) -> list[Line]:
        """Inputs and constants, in the order of their addresses."""
        return [line for line in self._lines.values() if line.kind in ("given", "constant")]

    def lines(self) -> list[Line]:
        """Every line with an address, inputs first, rows of loss tables included."""
        return self.inputs + [line for line in self._lines.values() if line.kind not in ("given", "constant")]

    def line_of(self, value: Value) -> Line:
        """The line that made ``value``."""
        return self._lines[value.address]

    # --- values

    def coherent(self, symbol: str) -> Unit:
        """The unit in which ``symbol`` enters formulas."""
        return COHERENT[self.system][NOMENCLATURE[symbol].kind]

    def given(
        self,
        symbol: str,
        title: str,
        quantity: Quantity,
        *,
        text: str = "",
        kind: Kind = "given",
        cite: Cite = DEFINITION,
        key: str = "",
        file_line: int = 0,
        provenance: Provenance | None = None,
        note: str = "",
    ) -> Value:
        """Enter an input or a constant as typed; :meth:`convert` brings it to the unit in which it enters formulas."""
        identity = ("given", symbol, key or title, quantity.text, quantity.unit.name)
        if identity not in self._made:
            value = Value(self._address(INPUTS), symbol, quantity.number, float(quantity.si()), quantity.unit, title)
            self._register(
                Line(
                    kind,
                    value,
                    given=text or f"{quantity.text} {quantity.unit.name}".removesuffix(" 1"),
                    cite=cite,
                    key=key,
                    file_line=file_line,
                    provenance=provenance,
                    validity=note,
                )
            )
            self._made[identity] = self.used[value.address] = value
        return self._made[identity]

    def constant(self, symbol: str) -> Value:
        """A constant of the tool, entered among the inputs."""
        c = lookup.CONSTANTS[symbol]
        quantity = parse(c.text, NOMENCLATURE[symbol].kind)
        return self.convert(self.given(symbol, c.title, quantity, kind="constant", cite=c.cite))

    def convert(self, value: Value, symbol: str = "") -> Value:
        """``value`` in the coherent unit of its symbol, or of another ``symbol``: itself, or a conversion line, exact."""
        to = self.coherent(symbol or value.symbol)
        if value.unit.name == to.name:
            return value
        made = self._made.get(("convert", value.address, to.name))
        if made is None:
            tree = conversion_tree(value.symbol, value.unit, to)
            record = of_record(evaluate(tree, {value.symbol: value.record}, InDecimal()))
            title = (
                f"{value.title.removesuffix(', looked up')}, {'as a fraction' if to.name == '1' else f'in {to.name}'}"
            )
            made = Value(self._address(COMPUTATION), value.symbol, record, value.shadow, to, title)
            self._made["convert", value.address, to.name] = made
            if value.address in self.used:
                self.used[value.address] = made
            self._write(Line("conversion", made, tree, ((value.symbol, value),)))
        return made

    def apply(self, name: str, values: Operands, about: str = "", key_result: bool = False) -> Value:
        """Evaluate an equation of the catalogue on earlier values and write its line."""
        used = {s: values[s] for s in EQUATION[name].operands}
        identity = (name, *((s, v.address) for s in used for v in _each(used[s])))
        if identity not in self._made:
            self._made[identity] = self._write(self._line(EQUATION[name], used, about, key_result))
        return self._made[identity]

    def _line(self, equation: Equation, used: Operands, about: str, key_result: bool = False) -> Line:
        operands = tuple((s, v) for s in used for v in _each(used[s]))
        for symbol, v in operands:
            if v.unit.name != self.coherent(symbol).name:
                raise AssertionError(f"{equation.name}: {symbol} arrives in {v.unit.name}")
        title = f"{equation.title}, {about}" if about else equation.title
        residuals: tuple[tuple[Decimal, Decimal], ...] = ()
        if isinstance(equation.tree, Cmp):
            low, high = ROOT_RANGES[equation.result]
            record, residuals = root.of_record_with_residuals(
                equation.tree, equation.result, _book(used, "record"), low, high
            )
            shadow = root.solve(equation.tree, equation.result, _book(used, "shadow"), low, high)
        else:
            record = of_record(evaluate(equation.tree, _book(used, "record"), InDecimal()))
            shadow = evaluate(equation.tree, _book(used, "shadow"), InFloat())
        value = Value(
            self._address(COMPUTATION), equation.result, record, shadow, self.coherent(equation.result), title
        )
        return Line(
            "root" if residuals else "equation",
            value,
            equation.tree,
            operands,
            equation.source,
            equation.validity,
            residuals=residuals,
            key_result=key_result,
        )

    def look_up(
        self, liquid: str, name: str, temperature: Value, fraction: Value | None = None, title: str = ""
    ) -> Value:
        """A property of ``liquid`` at ``temperature``, of a mixture at the mass ``fraction`` dissolved; in SI from the library,
        then converted where the display asks.

        Both are taken as typed, exactly: no rounded kelvin stands between, for vapour pressure moves by 3 % a kelvin.

        Raises :class:`~calcpack.lookup.OutOfRange` outside the formulation's validity.
        """
        source, p = lookup.LIQUIDS[liquid], lookup.PROPERTIES[name]
        operands = (("T", temperature), *((("w", fraction),) if fraction else ()))
        identity = ("look_up", liquid, name, *(v.address for _, v in operands))
        if identity not in self._made:
            record = lookup.liquid(liquid, name, *(float(in_si(v)) for _, v in operands))
            shadow = lookup.liquid(liquid, name, *(v.shadow for _, v in operands))
            value = Value(
                self._address(COMPUTATION),
                p.symbol,
                of_record(Decimal(record)),
                shadow,
                COHERENT["SI"][NOMENCLATURE[p.symbol].kind],
                title or p.title,
            )
            self._made[identity] = value
            self._write(
                Line(
                    "lookup",
                    value,
                    None,
                    operands,
                    source.cite(name),
                    source.validity,
                    function=p.function(source.mixture),
                    library=f"{lookup.library('CoolProp')} ({source.called})",
                )
            )
        return self.convert(self._made[identity])

    def tabulated(
        self, symbol: str, title: str, quantity: Quantity, place: str, cite: Cite, library: str = ""
    ) -> Value:
        """A number read from a table of ours or of a library, printed as a look-up with its place there."""
        identity = ("table", symbol, title, place)
        if identity not in self._made:
            value = Value(
                self._address(COMPUTATION), symbol, quantity.number, float(quantity.si()), quantity.unit, title
            )
            self._made[identity] = value
            self._write(Line("lookup", value, None, (), cite, "", function=place, library=library))
        return self.convert(self._made[identity])

    def losses(self, title: str, rows: Sequence[tuple[str, str, Mapping[str, Value] | Value]], total: str) -> Losses:
        """Write a loss table: each row ``n K h_V`` from its values, or the value of a line above; then its sum.

        The row worked in full is the first with ``n``, else the first with ``K``; where every row is a line above, none is.
        """
        made = [
            Row(
                label,
                element,
                self.line_of(content)
                if isinstance(content, Value)
                else self._register(
                    self._line(EQUATION["row_loss" if "n" in content else "row_loss_single"], content, element)
                ),
            )
            for label, element, content in rows
        ]
        sum_line = self._register(self._line(EQUATION[total], {"h": [row.line.value for row in made]}, ""))
        inside = [row for row, (_, _, content) in zip(made, rows, strict=True) if not isinstance(content, Value)]
        worked = max(inside, key=lambda row: "n" in dict(row.line.operands), default=None)
        table = Losses(title, tuple(made), sum_line, worked.label if worked else "")
        self._place(table)
        return table

    def headline(self, value: Value) -> tuple[Decimal, Unit]:
        """``value`` in plant units at the decimals usual there."""
        plant, decimals = PLANT[self.system][NOMENCLATURE[value.symbol].kind]
        return headline(in_unit(value, plant), decimals), plant

    def shown(self, value: Value) -> str:
        """``value`` in plant units, for a sentence."""
        x, unit = self.headline(value)
        return f"{x} {unit.name}"


#: Range searched for each symbol found as a root: Darcy factors of any pipe lie well inside.
ROOT_RANGES: Mapping[str, tuple[float, float]] = {"f": (1e-3, 10.0)}


def _each(x: Value | Sequence[Value]) -> Sequence[Value]:
    return (x,) if isinstance(x, Value) else x


def _book(used: Operands, book: Literal["record", "shadow"]) -> dict[str, Any]:
    return {s: getattr(v, book) if isinstance(v, Value) else [getattr(x, book) for x in v] for s, v in used.items()}
