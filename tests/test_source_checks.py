"""What is refused, on a small valid file and on what is done to it."""

from __future__ import annotations

import pytest
from source_files import BASE, changed, refused

from calcpack.faults import InputFault
from calcpack.source import MAX_FAULTS, loads


@pytest.mark.parametrize(
    ("old", "new", "wanted"),
    [
        ("readings:\n", "readings:\n", "at most 20 readings"),
        ("sources:\n", "sources:\n", "at most 100 sources"),
    ],
)
def test_lists_have_an_end(old: str, new: str, wanted: str) -> None:
    more = "".join(f"  X{n}: {{title: sheet}}\n" for n in range(99)) if "sources" in old else ""
    text = BASE.replace(old, new + more)
    if "readings" in old:
        head, _, entry = text.partition("readings:\n")
        entry = entry.rstrip() + "\n"
        text = head + "readings:\n" + "".join(entry.replace("commissioning", f"test {n}") for n in range(21))
    with pytest.raises(InputFault) as caught:
        loads(text.encode(), "a.yaml")
    (fault,) = caught.value.faults
    assert fault.wanted == wanted
    assert fault.found in ("21", "101")


def _elements(section: str, count: int) -> str:
    return "".join(f"        - {{id: {section}{n}, kind: pipe, length: 1 m}}\n" for n in range(count))


def test_a_line_has_an_end() -> None:
    head, _, rest = BASE.partition("    - id: P1\n")
    section, _, tail = rest.partition("        - {id: 1, kind: entrance")
    pump = tail[tail.index("pump:\n") :]
    one = f"    - id: P1\n{section}"
    lines = {n: "".join(one.replace("P1", f"P{s}") + _elements("e", n) for s in range(4)) for n in (50, 51, 61)}
    many = "".join(one.replace("P1", f"P{s}") + _elements("e", 1) for s in range(21))
    pump = pump.replace("    strainers: clean\n", "")
    assert loads((head + lines[50] + pump).encode(), "a.yaml").line is not None
    assert refused((head + lines[51] + pump).encode()) == [("line.sections[P3].elements[e47]", "count")]
    assert [key for key, _ in refused((head + lines[61] + pump).encode())][0] == "line.sections[P0].elements"
    assert refused((head + many + pump).encode()) == [("line.sections", "count")]


def test_a_whole_number_as_a_revision_is_a_text() -> None:
    assert refused(changed(("revision: A", "revision: 12345678901"))) == [("calculation.revision", "text")]
    assert refused(changed(("schedule: 40", "schedule: 4000"))) == [
        ("line.sections[P1].schedule", "text"),
        ("readings[1].gauge.tap.schedule", "text"),
    ]


@pytest.mark.parametrize(
    ("old", "new", "hint"),
    [
        ("size: DN 150\n", "size: dn150\n", "`DN 150`"),
        ("schedule: 40\n", "schedule: xs\n", "`XS`"),
        ("schedule: 40\n", "schedule: SCH40\n", "`40`"),
        ("date: 2026-11-16", "date: 2026.11.16", "`2026-11-16`"),
        ("date: 2026-11-16", "date: 16.11.2026", "`2026-11-16`"),
        ("date: 2026-11-16", "date: 11/12/2026", "`2026-12-11` or `2026-11-12`"),
        ("date: 2026-11-16", "date: 11/16/2026", "mean `2026-11-16`"),
        ("date: 2026-11-16", "date: 31.02.2026", ""),
        ("units: SI", "units: imperial", "`US`"),
        ("kind: open", "kind: closed tank", "`gas_blanketed`"),
        ("material: commercial steel", "material: HDPE pipe", "`plastic`"),
        ("name: water", "name: river water", "`water`"),
        ("type: gate", "type: sluice", "state its K"),
        ("count: 2", 'count: "2"', "quotation marks"),
        ("size: DN 150\n", "size: 150\n", ""),
        ("owner: Larch Mill (invented)", "owner: 77", '`"77"`'),
    ],
)
def test_the_form_meant_is_suggested(old: str, new: str, hint: str) -> None:
    with pytest.raises(InputFault) as caught:
        loads(changed((old, new)), "a.yaml")
    (fault,) = caught.value.faults
    assert hint in fault.suggestion
    assert bool(hint) == bool(fault.suggestion)


@pytest.mark.parametrize(
    ("changes", "faults"),
    [
        ([("source: S1 3.1", "source: S1 3.1\n      bore: 154 mm")], [("line.sections[P1].bore", "bore")]),
        ([("shape: flush", "shape: flush, K: 0.5")], [("line.sections[P1].elements[1]", "K")]),
        ([("      material: commercial steel\n", "")], [("line.sections[P1]", "roughness")]),
        ([("clean: 0.2 m", "clean: 2 m")], [("line.sections[P1].elements[5].drop.fouled", "order")]),
        ([("normal: 120 m³/h", "normal: 160 m³/h")], [("pump.flow.highest", "order")]),
        ([("date: 2026-10-02", "date: 2026-12-02")], [("readings[1].date", "date")]),
        (
            [("    level: 1.95 m\n", "    level: 1.95 m\n    surface_pressure: 4 kPa gauge\n")],
            [("readings[1].surface_pressure", "reading")],
        ),
        ([("  name: water\n", "  name: Water\n")], [("liquid.name", "liquid")]),
        ([("normal: 24 °C, highest: 30 °C, ", "")], [("liquid.temperature", "liquid")]),
        (
            [("  elevation: 120 m\n", "  elevation: 120 m\n  barometer: {source: S1}\n")],
            [("site.barometer", "barometer")],
        ),
        (
            [("sources:\n", "revisions: [{revision: A, date: 2026-11-15, reason: x}]\nsources:\n")],
            [("revisions[1].date", "date")],
        ),
        ([("S1: {title", "1S: {title"), ("S1 ", "S2 ")], [("sources", "text")]),
        ([("S1: {title", "s2: {title"), ("S1 ", "S2 ")], [("sources.S2", "duplicate id")]),
        (
            [("radius: long, count: 2", 'radius: long, angle: "90"')],
            [("line.sections[P1].elements[3].angle", "number")],
        ),
        ([("radius: long, count: 2", "radius: long, angle: 60")], [("line.sections[P1].elements[3].angle", "choice")]),
        ([("date: 2026-10-02", "date: 1949-12-31")], [("readings[1].date", "date")]),
        ([("count: 2", "count: 0")], [("line.sections[P1].elements[3].count", "number")]),
        ([("count: 2", "count: two")], [("line.sections[P1].elements[3].count", "number")]),
        ([("size: DN 150\n", "size: 150 mm\n")], [("line.sections[P1].size", "text")]),
        ([("ratio: 1.10", "ratio: [1.10]")], [("criteria.npsh_margin.ratio", "type")]),
        ([("owner: Larch Mill (invented)", "owner: 77")], [("calculation.owner", "type")]),
        ([("owner: Larch Mill (invented)", "owner: {a: b}")], [("calculation.owner", "type")]),
        ([("criteria:\n", "criterai:\n")], [("criterai", "unknown key")]),
        (
            [("length: 9.5 m", "lenght: 9.5")],
            [
                ("line.sections[P1].elements[2].lenght", "unknown key"),
                ("line.sections[P1].elements[2].length", "bare number"),
            ],
        ),
    ],
)
def test_refused(changes: list[tuple[str, str]], faults: list[tuple[str, str]]) -> None:
    assert refused(changed(*changes)) == faults


def test_every_fault_of_a_kindless_supply_is_its_own() -> None:
    assert refused(changed(("kind: open", "kind: opne"))) == [("supply.kind", "choice")]


def test_many_faults_are_counted_after_a_hundred() -> None:
    many = "".join(f"  key{n}: 1 m\n" for n in range(3 * MAX_FAULTS))
    faults = refused(changed(("pump:\n", "pump:\n" + many)))
    assert len(faults) == MAX_FAULTS + 1
    assert faults[-1][1] == "count"
