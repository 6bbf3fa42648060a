"""Each file of ``sample_inputs/faults`` is refused for its own fault, at its own line, with help."""

from __future__ import annotations

from dataclasses import replace
from pathlib import Path

import pytest

from calcpack.faults import Fault, InputFault, did_you_mean, format_fault, listed, nearest, shown, visible
from calcpack.source import load

FOLDER = Path(__file__).parent.parent / "sample_inputs" / "faults"
NOWHERE = ""

#: file -> its faults: a text on the line, the key, a word of what is wanted or found, a word of the
#: suggestion.
EXPECTED: dict[str, list[tuple[str, str, str, str]]] = {
    "unknown_key": [("flwo:", "pump.flwo", "`flow`", "`flow`")],
    "missing_key": [("name: P-3 A/B", "pump.datum_elevation", "`datum_elevation`", "datum_elevation: ")],
    "bare_number": [("length: 9.5}", "line.sections[P1].elements[2].length", "a value needs its unit", "`9.5 m`")],
    "wrong_dimension": [("temperature: 21 m", "readings[1].temperature", "m³/h measures a flow", "")],
    "unit_not_known": [("30 C", "liquid.temperature.highest", "a temperature", "`30 °C`")],
    "unit_near_miss": [("118 m3/hr", "readings[1].flow", "a flow", "`118 m³/h`")],
    "decimal_comma": [("4,2 m", "pump.npsh_required.value", "a comma", "`4.2 m`")],
    "decimal_comma_in_braces": [("9,5 m", "line.sections[P1].elements[2].length", "a comma", "`9.5 m`")],
    "thousands_grouped": [("1 480 r/min", "pump.npsh_required.speed", "thousands", "`1480 r/min`")],
    "gauge_or_absolute_missing": [("100.2 kPa", "readings[1].barometer", "absolute", "`100.2 kPa absolute`")],
    "barometer_as_gauge": [("100.2 kPa gauge", "readings[1].barometer", "an absolute pressure", "")],
    "difference_as_gauge": [("1.7 kPa gauge", "site.weather_allowance", "pressure difference", "`1.7 kPa`")],
    "below_absolute_zero": [("-300 °C", "readings[1].temperature", "below absolute zero", "")],
    "absolute_pressure_below_zero": [("-2.5 kPa absolute", "readings[1].barometer", "cannot be below zero", "")],
    "vacuum_negative": [("kPa vacuum", "readings[1].gauge.pressure", "positive number", "`2.5 kPa vacuum`")],
    "below_full_vacuum": [("-250 kPa gauge", "readings[1].gauge.pressure", "full vacuum", "")],
    "not_a_number": [("length: nan m", "line.sections[P1].elements[2].length", "not a finite number", "")],
    "coefficient_nan": [("K: .nan", "line.sections[P1].elements[1].K", "plain number", "")],
    "negative_flow": [("-118 m³/h", "readings[1].flow", "above zero", "")],
    "hidden_character": [('elevation: "0.30', "readings[1].gauge.elevation", "zero width space", "delete")],
    "hidden_escapes": [
        ("owner:", "calculation.owner", "U+0000, which is hidden and U+001B", "delete"),
        ('"S2\\u202e"', "sources.S2", "right-to-left override", "delete"),
        ('name: "Wash', "supply.name", "U+E0041 (tag", "delete"),
        ('name: "suction', "line.sections[P1].name", "U+115F (hangul", "delete"),
    ],
    "hidden_in_comment": [
        ("# criteria", NOWHERE, "U+061C (arabic letter mark)", "delete"),
        ("name: suction", NOWHERE, "U+115F (hangul", "delete"),
    ],
    "other_letters": [
        ("owner:", "calculation.owner", "“落” (U+843D)", "transliterate"),
        ("T-3", "supply.name", "Latin, Greek or Cyrillic", "transliterate"),
        ("name: P-3", "pump.name", "(U+1F4A7)", "transliterate"),
        ("\uff14.2 m", "pump.npsh_required.value", "(U+FF14)", "`4.2 m`"),
    ],
    "ids_that_differ_by_spaces": [
        ("kind: elbow", "line.sections[P1].elements[V1].id", "after line 38", ""),
    ],
    "blank_texts": [
        ("owner:", "calculation.owner", "a text", ""),
        ("project:", "calculation.project", "a text", ""),
        ("name: |", "supply.name", "a text", ""),
    ],
    "long_past_dates": [
        ("1926-11-16", "calculation.date", "not before 1950-01-01", "check the year"),
        ("0206-10-02", "readings[1].date", "not before 1950-01-01", "check the year"),
    ],
    "date_without_dashes": [
        ("20261116", "calculation.date", "year first, such as", "`2026-11-16`"),
        ("2026/10/2", "readings[1].date", "year first, such as", "`2026-10-02`"),
    ],
    "whole_numbers": [
        ("angle: 90.0", "line.sections[P1].elements[3].angle", "a whole number", "`90`"),
        ("angle: 90.0", "line.sections[P1].elements[3].count", "a whole number", "`2`"),
    ],
    "too_many_digits": [
        ("4.20000000001 m", "pump.npsh_required.value", "at most ten digits", "`4.2 m`"),
        ("0.000000000006 km", "criteria.npsh_margin.difference", "at most ten digits", "`6e-12 km`"),
    ],
    "sizes_not_met": [
        ("120 km", "site.elevation", "from -15 km to 15 km", "check the unit"),
        ("1.7 bar", "site.weather_allowance", "of at most 20 kPa", "check the unit"),
        ("30000 °C", "liquid.temperature.highest", "from 1 K to 900 K", "check the unit"),
        ("bore: 154 m", "line.sections[P1].bore", "from 2 mm to 20 m", "check the unit"),
        ("roughness: 0.5 m", "line.sections[P1].roughness", "of at most 100 mm", "check the unit"),
        ("K: 5e6", "line.sections[P1].elements[1].K", "of at most 100000", "check the decimal"),
        ("9500 km", "line.sections[P1].elements[2].length", "of at most 100 km", "check the unit"),
        ("15000000 m³/h", "pump.flow.highest", "from 1e-9 m³/s to 1000 m³/s", "check the unit"),
        ("4200 m", "pump.npsh_required.value", "of at most 500 m", "check the unit"),
        ("1480000 r/min", "pump.npsh_required.speed", "of at most 100000 r/min", "check the unit"),
        ("ratio: 110", "criteria.npsh_margin.ratio", "of at most 100", "check the decimal"),
        ("1002 kPa", "readings[1].barometer", "from 20 kPa to 110 kPa", "check the unit"),
        ("2500 MPa", "readings[1].gauge.pressure", "of at most 100 MPa", "check the unit"),
    ],
    "mixed_measures": [
        ("22 kPa gauge", "supply.pressure.normal", "a gauge pressure, as for `lowest`", "both as an absolute"),
        ("15 kPa", "line.sections[P1].elements[5].drop.fouled", "as for `clean`", "both as a head"),
    ],
    "long_texts": [
        ("title: Wash", "calculation.title", "at most 120 characters", "shorten"),
        ("12345678901", "calculation.revision", "at most 10 characters", "shorten"),
        ("P-3 A/B and", "pump.name", "at most 80 characters", "shorten"),
    ],
    "schedule_near_miss": [
        ("schedule: std", "line.sections[P1].schedule", "such as STD", "`STD`"),
        ("schedule: Sch 40", "readings[1].gauge.tap.schedule", "such as STD", "`40`"),
    ],
    "two_entrances": [
        ("shape: bell", "line.sections[P1].elements[4]", "one entrance, at the supply", "the supply of the second")
    ],
    "reversed_text": [("\u202e", NOWHERE, "U+202E", "delete")],
    "ambiguous_scalar": [
        ("0123", "sources.S1.edition", "base 8", '`"0123"`'),
        ("12:30}", "sources.S2.edition", "base 60", '`"12:30"`'),
    ],
    "yes_or_no": [("units: on", "calculation.units", "SI or US", "")],
    "empty_value": [("  datum:", "calculation.datum", "a value", "leave the key out")],
    "duplicate_key": [("  kind: main", "supply.kind", "each key once", "keep one")],
    "alias_bomb": [
        ("a: &a", "liquid.a", "keys", ""),
        ("a: &a", "liquid.a", "anchor &a", "write the value out"),
        ("b: &b", "liquid.b", "keys", ""),
        ("b: &b", "liquid.b", "anchor &b", "write the value out"),
        ("b: &b", "liquid.b[1]", "alias *a", "write the value out"),
        ("c: &c", "liquid.c", "keys", ""),
        ("c: &c", "liquid.c", "anchor &c", "write the value out"),
        ("c: &c", "liquid.c[1]", "alias *b", "write the value out"),
        ("d: [", "liquid.d", "keys", ""),
        ("d: [", "liquid.d[1]", "alias *c", "write the value out"),
    ],
    "merge_key": [("<<:", "pump.<<", "merge key", "write the keys out")],
    "tag": [("!!str", "pump.name", "!!str", "write the value out")],
    "deep_nesting": [("[[[[", NOWHERE, "20 levels", "")],
    "two_documents": [("---", NOWHERE, "one document", "one calculation")],
    "broken_notation": [("title: Pumps:", NOWHERE, "broken notation", "quotation marks")],
    "tab_indent": [("\tkind", NOWHERE, "broken notation", "spaces, not with tabs")],
    "not_utf8": [("highest: 30", NOWHERE, "UTF-8", "save the file again")],
    "only_comments": [("An invented plant", NOWHERE, "only comments", "")],
    "empty": [(NOWHERE, NOWHERE, "an empty file", "")],
    "a_list": [("- calculation", NOWHERE, "keys and values", "")],
    "unknown_source": [("S4 2.1", "liquid.temperature.source", "S1 or S2", "`sources`")],
    "assumed_without_note": [("status: assumed", "liquid.temperature.status", "a note", "`note:`")],
    "status_not_known": [("status: check", "liquid.temperature.status", "verified, maker", "")],
    "duplicate_element": [("{id: 2, kind: elbow", "line.sections[P1].elements[2].id", "each id once", "")],
    "level_order": [("lowest: 3.10 m", "supply.level.normal", "not below `lowest`", "")],
    "temperature_order": [("normal: 34 °C", "liquid.temperature.highest", "not below `normal`", "")],
    "size_without_schedule": [("      size: DN 150", "line.sections[P1].schedule", "`schedule`", "schedule: STD")],
    "no_bore": [("- id: P1", "line.sections[P1]", "`size` with `schedule`, or `bore`", "bore: ")],
    "dry_leg": [("leg: dry", "readings[1].gauge.tap_elevation", "`tap_elevation`", "`tap_elevation`")],
    "blanket_without_pressure": [("name: Wash water tank", "supply.pressure", "`pressure`", "22 kPa gauge")],
    "main_with_level": [
        ("  level:", "supply.level", "for kind main", "leave it out"),
        ("  fitting_set:", "line", "no line from a main", "readings"),
    ],
    "other_liquid": [("35 % glycol", "liquid.name", "density, viscosity and vapour_pressure", "water only")],
    "no_barometer": [("weather_allowance", "site", "`barometer`", "barometer: ")],
    "no_weather_allowance": [("elevation: 120 m", "site.weather_allowance", "`weather_allowance`", "1.7 kPa")],
    "nothing_to_calculate": [("calculation:", NOWHERE, "`readings`", "")],
    "line_without_level": [("name: Wash water tank", "supply.level", "a level", "level: ")],
    "fitting_without_k": [("kind: fitting", "line.sections[P1].elements[4].K", "`K`", "K: ")],
    "key_of_another_kind": [
        ("radius: long}", "line.sections[P1].elements[2].radius", "name or length", "leave it out")
    ],
    "choice_near_miss": [("gatee", "line.sections[P1].elements[4].type", "swing_check", "`gate`")],
    "strainer_state": [("- name: commissioning", "readings[1].strainers", "STR-3", "")],
    "margin_missing": [("npsh_margin:", "criteria.npsh_margin", "`ratio`, `difference`", "ratio: ")],
    "revision_not_listed": [("revision: P1", "revisions", "“A”", "")],
    "no_such_day": [("2026-11-31", "calculation.date", "calendar", "")],
    "date_form": [("2 October 2026", "readings[1].date", "year first, such as 2026-11-16", "")],
    "extremes_wanted": [("level: 0.80 m", "supply.level", "lowest, normal or highest", "`{lowest: 0.80 m}`")],
    "several_faults": [
        ("S9 2.1", "liquid.temperature.source", "S1 or S2", "`sources`"),
        ("schedul:", "line.sections[P1].schedul", "`schedule`", "`schedule`"),
        ("length: 9.5}", "line.sections[P1].elements[2].length", "a value needs its unit", "`9.5 m`"),
        ("mm water", "pump.npsh_required.value", "a head of the liquid", ""),
        ("100.2 kPa", "readings[1].barometer", "absolute", "`100.2 kPa absolute`"),
        ("gauge: {pressure", "readings[1].gauge.elevation", "`elevation`", "elevation: "),
    ],
}
#: Well formed, and refused further on for what it would mean.
WELL_FORMED = {"boiling_at_the_surface"}


def line_of(path: Path, needle: str) -> int:
    """The line, from 1, on which ``needle`` stands below the head comment."""
    lines = path.read_bytes().decode("utf-8", "replace").splitlines()
    return next((n for n, line in enumerate(lines, 1) if needle in line and (line[:1] != "#" or n == 1)), 1)


def test_every_sample_is_tested() -> None:
    assert {path.stem for path in FOLDER.glob("*.yaml")} == set(EXPECTED) | WELL_FORMED


@pytest.mark.parametrize("name", sorted(EXPECTED))
def test_sample_is_refused(name: str) -> None:
    path = FOLDER / f"{name}.yaml"
    with pytest.raises(InputFault) as caught:
        load(path)
    faults, expected = caught.value.faults, EXPECTED[name]
    assert [fault.key for fault in faults] == [key for _, key, _, _ in expected]
    for fault, (needle, _, word, hint) in zip(faults, expected, strict=True):
        assert fault.file == str(path)
        assert fault.line == line_of(path, needle)
        assert fault.column >= 1
        assert word in f"{fault.wanted} {fault.found}"
        assert hint in fault.suggestion
        assert fault.wanted and fault.found and fault.kind


@pytest.mark.parametrize("name", sorted(EXPECTED.keys() - {"empty"}))
def test_sample_says_what_is_wrong(name: str) -> None:
    head = (FOLDER / f"{name}.yaml").read_bytes().decode("utf-8", "replace").splitlines()[:3]
    assert "invented" in head[0]
    assert head[1].startswith("# Wrong: ")


@pytest.mark.parametrize("name", sorted(WELL_FORMED))
def test_well_formed_sample_is_read(name: str) -> None:
    assert load(FOLDER / f"{name}.yaml").number == "LM-04-C-011"


def test_a_message_is_one_line_with_all_its_parts() -> None:
    fault = Fault("a.yaml", 3, 7, "pump.flow", "a flow", "“3 m”", "write `3 m³/h`", "unit")
    assert format_fault(fault) == "a.yaml:3:7: pump.flow: wanted a flow; found “3 m”. Suggestion: write `3 m³/h`."
    assert format_fault(replace(fault, suggestion="")) == "a.yaml:3:7: pump.flow: wanted a flow; found “3 m”."
    assert format_fault(replace(fault, suggestion="did you mean `x`?")).endswith("Suggestion: did you mean `x`?")
    assert format_fault(Fault("a.yaml", 0, 0, "", "a file", "none")) == "a.yaml: wanted a file; found none."


def test_faults_come_in_the_order_of_the_file() -> None:
    a, b = Fault("f", 9, 1, "x", "w", "f"), Fault("f", 2, 5, "y", "w", "f")
    raised = InputFault([a, b])
    assert raised.faults == (b, a)
    assert str(raised).splitlines() == [format_fault(b), format_fault(a)]


def test_nearest() -> None:
    assert nearest("flwo", ["flow", "name"]) == "flow"
    assert nearest("KPA", ["Pa", "kPa", "MPa"]) == "kPa"
    assert nearest("zzz", ["flow", "name"]) == ""
    assert did_you_mean("flwo", ["flow"]) == "did you mean `flow`?"
    assert did_you_mean("zzz", ["flow"]) == ""


def test_texts_in_messages() -> None:
    assert shown("5\u200bm") == "“5<U+200B>m”"
    assert visible("a\udce9 \u115f\n.yaml") == "a<U+DCE9> <U+115F><U+000A>.yaml"
    assert len(shown("x" * 1000)) == 62
    assert listed(["a"]) == "a"
    assert listed(["a", "b", "c"]) == "a, b or c"
