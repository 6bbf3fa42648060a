"""The way from bytes to records, on a small valid file."""

from __future__ import annotations

import hashlib
from datetime import date
from pathlib import Path

import pytest
from source_files import BASE, SAMPLES, changed

from calcpack.source import load, loads


@pytest.mark.parametrize("path", sorted(SAMPLES.glob("*.yaml")), ids=lambda path: path.stem)
def test_samples_are_read(path: Path) -> None:
    read = load(path)
    assert read.path == path.name
    assert read.raw == path.read_bytes()
    assert read.sha256 == hashlib.sha256(read.raw).hexdigest()


def test_records() -> None:
    read = loads(BASE.encode(), "folder/a.yaml")
    assert (read.number, read.date, read.units, read.paper) == ("LM-04-C-011", date(2026, 11, 16), "SI", "A4")
    assert read.path == "a.yaml"
    assert [source.id for source in read.sources] == ["S1", "S2"]
    assert read.line is not None and read.supply.level is not None and read.supply.level.lowest is not None
    level = read.supply.level.lowest
    assert (level.key, level.text, level.quantity.unit.name) == ("supply.level.lowest", "0.80 m", "m")
    assert (level.source, level.place, level.status) == ("S1", "2.2", "verified")
    line = BASE.splitlines()[level.line - 1]
    assert line[level.column - 1 :].startswith("0.80 m")
    section = read.line.sections[0]
    assert (section.pipe.size, section.pipe.schedule, section.pipe.bore) == ("DN 150", "40", None)
    assert [element.kind for element in section.elements] == [
        "entrance",
        "pipe",
        "elbow",
        "valve",
        "strainer",
    ]
    assert [element.count for element in section.elements] == [1, 1, 2, 1, 1]
    strainer = section.elements[-1]
    assert strainer.clean is not None and strainer.fouled is not None
    assert strainer.fouled.key == "line.sections[P1].elements[5].drop.fouled"
    assert read.criteria.ratio is not None and read.criteria.ratio.quantity.text == "1.10"
    assert read.readings[0].gauge.pressure.quantity.reference == "gauge"


def test_defaults() -> None:
    read = loads(changed(("units: SI", "units: US")), "a.yaml")
    assert (read.paper, read.status) == ("Letter", "preliminary")
    assert [(r.revision, r.date, r.reason) for r in read.revisions] == [("A", date(2026, 11, 16), "preliminary")]


def test_numbers_that_look_like_numbers_stay_text() -> None:
    read = loads(changed(("revision: A", "revision: 0"), ("number: LM-04-C-011", "number: 1100")), "a.yaml")
    assert (read.revision, read.number) == ("0", "1100")


def test_an_origin_applies_to_the_values_inside() -> None:
    read = loads(BASE.encode(), "a.yaml")
    assert read.line is not None
    length = read.line.sections[0].elements[1].length
    assert length is not None
    assert (length.source, length.place, length.status) == ("S1", "3.1", "preliminary")


def test_an_own_source_is_not_held_to_the_status_of_another() -> None:
    read = loads(changed(("normal: 2.10 m", "normal: {value: 2.10 m, source: S2}")), "a.yaml")
    assert read.supply.level is not None and read.supply.level.normal is not None
    assert (read.supply.level.normal.source, read.supply.level.normal.status) == ("S2", "")


def test_an_assumed_value_does_not_inherit_a_source() -> None:
    read = loads(changed(("normal: 2.10 m", "normal: {value: 2.10 m, status: assumed, note: usual}")), "a.yaml")
    assert read.supply.level is not None and read.supply.level.normal is not None
    normal = read.supply.level.normal
    assert (normal.source, normal.status, normal.note) == ("", "assumed", "usual")


def test_a_byte_order_mark_and_windows_line_ends_are_accepted() -> None:
    raw = b"\xef\xbb\xbf" + BASE.replace("\n", "\r\n").encode()
    read = loads(raw, "a.yaml")
    assert read.raw == raw
    assert read.pump.datum_elevation.line == loads(BASE.encode(), "a.yaml").pump.datum_elevation.line
