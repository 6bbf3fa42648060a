"""The record: the same everywhere, complete, and with facts that can be checked by hand."""

from __future__ import annotations

import hashlib
import json
import operator
import os
import re
import subprocess
import sys
from collections import Counter
from collections.abc import Iterator
from decimal import Decimal, localcontext
from fractions import Fraction
from functools import cache
from pathlib import Path
from typing import Any

import pytest
import yaml
from plants import INTAKE, plant, recorded
from test_ledger import lines

import calcpack
from calcpack.record import FORMAT, canonical, fingerprint
from calcpack.record.words import SILENT
from calcpack.symbols import NOMENCLATURE
from calcpack.units import unit

ROOT = Path(__file__).parents[1]
SAMPLES = sorted((ROOT / "sample_inputs").glob("*.yaml"))
Json = dict[str, Any]
each_sample = pytest.mark.parametrize("path", SAMPLES, ids=lambda p: p.stem)


@cache
def record(path: Path) -> Json:
    return calcpack.assess(path)


def sample(letter: str) -> Json:
    return record(next(p for p in SAMPLES if p.name.startswith(f"{letter}_")))


def leaves(of: Any, place: str = "") -> Iterator[tuple[str, Any]]:
    if isinstance(of, dict):
        for key, value in of.items():
            yield from leaves(value, f"{place}.{key}")
    elif isinstance(of, list):
        for number, value in enumerate(of):
            yield from leaves(value, f"{place}[{number}]")
    else:
        yield place, of


# --- plain data, and the same everywhere ------------------------------------------------------------------------------


@each_sample
def test_a_record_is_json_of_texts(path: Path) -> None:
    """No float, so that no machine prints it otherwise; no NaN; numbers are texts with their digits of record."""
    for place, value in leaves(record(path)):
        assert value is None or isinstance(value, (str, bool, int)), place
        assert "NaN" not in str(value) and "Infinity" not in str(value), place
    assert json.loads(canonical(record(path))) == record(path)
    assert record(path)["format"] == FORMAT


@each_sample
def test_the_canonical_form_is_sorted_and_without_spaces(path: Path) -> None:
    raw = canonical(record(path))
    assert raw == json.dumps(json.loads(raw), sort_keys=True, separators=(",", ":"), ensure_ascii=False).encode()
    assert fingerprint(record(path)) == record(path)["fingerprint"]
    without = {k: v for k, v in record(path).items() if k != "fingerprint"}
    assert hashlib.sha256(canonical(without)).hexdigest() == record(path)["fingerprint"]


DUMP = "import sys, calcpack; from calcpack.record import canonical; sys.stdout.buffer.write(canonical(calcpack.assess(sys.argv[1])))"
SURROUNDINGS = (
    {"PYTHONHASHSEED": "1", "TZ": "Pacific/Kiritimati", "LC_ALL": "C"},
    {"PYTHONHASHSEED": "2", "TZ": "America/Adak", "LC_ALL": "C.UTF-8", "PYTHONOPTIMIZE": "0"},
)


@pytest.mark.parametrize("surroundings", SURROUNDINGS, ids=["east", "west"])
def test_a_record_is_the_same_in_any_surroundings(surroundings: dict[str, str], tmp_path: Path) -> None:
    """Hash seed, time zone, locale, working directory and the folder of the file change nothing."""
    path = SAMPLES[2]
    copy = tmp_path / "elsewhere" / path.name
    copy.parent.mkdir()
    copy.write_bytes(path.read_bytes())
    env = {**os.environ, **surroundings, "PYTHONPATH": str(ROOT)}
    done = subprocess.run(
        [sys.executable, "-c", DUMP, str(copy)], capture_output=True, check=True, cwd=tmp_path, env=env
    )
    assert done.stdout == canonical(record(path))


def test_a_record_made_after_others_is_the_same() -> None:
    before = canonical(recorded(plant(readings=1)))
    recorded(plant({"calculation.units": "US"}))
    assert canonical(recorded(plant(readings=1))) == before


def test_a_caller_s_decimal_context_changes_nothing() -> None:
    with localcontext() as context:
        context.prec = 5
        context.rounding = "ROUND_UP"
        assert canonical(calcpack.assess(SAMPLES[2])) == canonical(record(SAMPLES[2]))


CHANGES: tuple[dict[str, Any], ...] = (
    {"calculation.title": "Another title"},
    {"calculation.units": "US"},
    {"pump.flow.highest": "200.0 m³/h"},
    {"pump.npsh_required.curve": "C-2"},
    {"supply.level.lowest": "1.51 m"},
    {"supply.level.note": "read at the staff gauge"},
    {"sources.S1.edition": "rev 1"},
    {"criteria.npsh_margin.status": "preliminary"},
)


@pytest.mark.parametrize("change", CHANGES, ids=lambda c: next(iter(c)))
def test_the_fingerprint_changes_with_the_content(change: dict[str, Any]) -> None:
    assert recorded(plant(change))["fingerprint"] != recorded(plant())["fingerprint"]


def test_a_line_s_fingerprint_is_not_moved_by_another_line() -> None:
    """What a comparison of two revisions rests on: only changed lines change."""
    before = {(x["title"], x["symbol"]): x["fingerprint"] for x in lines(recorded(plant()))}
    after = {(x["title"], x["symbol"]): x["fingerprint"] for x in lines(recorded(plant({"intake": INTAKE})))}
    assert before.items() <= after.items()
    moved = {
        (x["title"], x["symbol"]): x["fingerprint"]
        for x in lines(recorded(plant({"pump.npsh_required.value": "5.1 m"})))
    }
    changed = {symbol for (title, symbol), value in moved.items() if before.get((title, symbol)) != value}
    assert changed == {"NPSHR", "N_r", "N_L", "M_r", "M_d"}


# --- complete ---------------------------------------------------------------------------------------------------------

KEYS = {
    "format", "calculation", "revisions", "route", "cover", "purpose", "scope", "exclusions", "criteria",
    "method", "inputs", "unused", "assumptions", "references", "sketch", "computation", "checks", "unapplied", "findings",
    "limits", "limits_note", "cautions", "software", "rounding", "conversions", "nomenclature", "input_file", "fingerprint",
}  # fmt: skip


@each_sample
def test_a_record_has_every_part(path: Path) -> None:
    assert set(record(path)) == KEYS
    for part in (
        "purpose",
        "scope",
        "exclusions",
        "criteria",
        "method",
        "inputs",
        "assumptions",
        "computation",
        "checks",
        "limits",
    ):
        assert record(path)[part], part


@each_sample
def test_every_caution_is_there(path: Path) -> None:
    told = " ".join(record(path)["cautions"]).lower()
    for word in (
        "reviewed",
        "licensed engineer",
        "not an independent verification",
        "local codes",
        "npsh3",
        "3 %",
        "transients",
        "gas",
        "vortices",
    ):
        assert word in told, word
    assert record(path)["exclusions"] == record(path)["cautions"][-1:]


@each_sample
def test_the_input_file_is_in_the_record_as_read(path: Path) -> None:
    file = record(path)["input_file"]
    assert file["name"] == path.name and file["text"] == path.read_text("utf-8")
    assert file["sha256"] == hashlib.sha256(path.read_bytes()).hexdigest()


_AMOUNT = re.compile(r"-?[0-9]+(\.[0-9]+)?( (ft|in|m³/h|mm|m|gal/min|psi|kPa|°C|°F|r/min|%)( absolute| gauge)?)?")


def typed(node: yaml.Node, key: str = "") -> Iterator[tuple[int, str]]:
    """Line and text of every quantity of a file; a plain number only under the keys that take one."""
    if isinstance(node, yaml.MappingNode):
        for name, value in node.value:
            yield from typed(value, name.value)
    elif isinstance(node, yaml.SequenceNode):
        for value in node.value:
            yield from typed(value)
    elif _AMOUNT.fullmatch(node.value) and (" " in node.value or key in ("K", "ratio", "value")):
        yield node.start_mark.line + 1, node.value


@each_sample
def test_every_value_of_the_file_is_used_or_listed_as_unused(path: Path) -> None:
    """Nothing of the file is lost: each quantity typed stands among the inputs or the unused, at its line of the file."""
    entered = [x for x in record(path)["inputs"] if x["kind"] == "given"]
    unused = record(path)["unused"]
    assert entered and not {x["key"] for x in unused} & {x["key"] for x in entered}
    told = {(x["file_line"], x["given"]) for x in (*entered, *unused)}
    amounts = set(typed(yaml.compose(path.read_text("utf-8"))))
    assert len(amounts) > 15 and amounts <= told


@each_sample
def test_inputs_stand_at_their_line_of_the_file(path: Path) -> None:
    text = path.read_text("utf-8").splitlines()
    for x in record(path)["inputs"]:
        number, _, of = x["given"].partition(" ")
        if x["kind"] == "given":
            stands = text[x["file_line"] - 1 :][: 9 if x["key"].endswith((".pumps", ".running")) else 1]
            assert any(number in line and (of in line or "Kv" in line) for line in stands), x["key"]


@each_sample
def test_the_counts_on_the_cover_are_those_of_the_inputs(path: Path) -> None:
    """What the tool assumes because the file is silent counts as assumed too, and is named."""
    inputs = [x["provenance"] for x in record(path)["inputs"] if x["kind"] == "given" and x.get("provenance")]
    silent = [a for a in record(path)["assumptions"] if a["basis"] == SILENT]
    cover, stated = record(path)["cover"], ("verified", "maker", "preliminary")
    sourced = Counter(p["status"] for p in inputs if p["source"])
    assert {k: cover["counts"][k] for k in stated} == {k: sourced[k] for k in stated}
    assumed = [p for p in inputs if p["status"] == "assumed"]
    assert cover["counts"]["assumed"] == len(assumed) + len(silent)
    assert sum(cover["counts"].values()) == len(inputs) + len(silent), "each once"
    assert len(cover["unverified"]) == len(inputs) - sourced["verified"] + len(silent)


def test_inputs_without_source_or_status_are_counted_and_named() -> None:
    document = plant({"supply.level": {"lowest": "1.5 m"}, "site.barometer.status": "preliminary"})
    cover = recorded(document)["cover"]
    assert cover["counts"]["without source or status"] == 1 and cover["counts"]["preliminary"] == 1
    named = {u["what"]: u["status"] for u in cover["unverified"] if u["status"] != "assumed"}
    assert named == {
        "Level of the surface, lowest": "without source or status",
        "Lowest station barometer, absolute": "preliminary",
    }


def test_an_assumed_value_without_a_source_counts_once() -> None:
    level = {"lowest": {"value": "1.5 m", "status": "assumed", "note": "from a photograph"}}
    before, after = (recorded(plant(change))["cover"]["counts"] for change in ({}, {"supply.level": level}))
    assert after["assumed"] == before["assumed"] + 1
    assert after["without source or status"] == 0 == before["without source or status"]


@each_sample
def test_every_assumed_input_is_an_assumption_with_its_basis(path: Path) -> None:
    assumed = [x for x in record(path)["inputs"] if x["kind"] == "given" and x["provenance"]["status"] == "assumed"]
    listed = record(path)["assumptions"]
    for x in assumed:
        (found,) = [a for a in listed if f"line {x['address']}" in a["text"]]
        assert found["basis"] == x["provenance"]["note"] != ""
    assert [a["address"] for a in listed] == [f"5.{n}" for n in range(1, len(listed) + 1)]
    assert all(a["text"] and a["basis"] and a["consequence"] for a in listed)


def test_an_assumption_of_the_tool_is_listed() -> None:
    assert any("commercial steel" in a["text"] for a in recorded(plant())["assumptions"])


def test_submergence_by_default_is_an_assumption() -> None:
    """Nothing that changes a result is defaulted in silence."""
    silent = recorded(plant({"intake": INTAKE}))
    (check,) = [c for c in silent["checks"] if c["id"] == "submergence"]
    assert check["verdict"] == "met"
    assert any("ubmergence" in a["text"] for a in silent["assumptions"])
    named = recorded(plant({"intake": INTAKE, "criteria.submergence": {"method": "hi_9_8", "source": "S1"}}))
    assert not any("ubmergence" in a["text"] for a in named["assumptions"])


@each_sample
def test_every_reference_cited_is_listed_and_every_listed_one_exists(path: Path) -> None:
    raw = canonical(record(path)).decode()
    listed = [r["id"] for r in record(path)["references"]]
    assert len(listed) == len(set(listed))
    assert set(re.findall(r"\[([RS][0-9]+)\]", raw)) <= set(listed)
    published = [i for i in listed if i.startswith("R")]
    assert published == [f"R{n}" for n in range(1, len(published) + 1)]
    assert all(f"[{i}]" in raw for i in published)


@each_sample
def test_every_symbol_shown_is_in_the_nomenclature(path: Path) -> None:
    listed = {n["name"]: n for n in record(path)["nomenclature"]}
    shown = {s for x in lines(record(path)) for s in (x["symbol"], *(o["symbol"] for o in x["operands"]))}
    shown |= {c[side]["symbol"] for c in record(path)["checks"] for side in ("left", "right") if c[side]}
    assert shown <= set(listed)
    assert all(listed[s]["meaning"] == NOMENCLATURE[s].meaning for s in listed)
    written = [(n["base"], n["sub"]) for n in listed.values()]
    assert len(written) == len(set(written)), "told apart in print"


@each_sample
def test_every_conversion_used_is_listed_with_its_factor(path: Path) -> None:
    used = {(x["from"], x["to"]) for x in lines(record(path)) if x["kind"] == "conversion"}
    listed = {(c["from"], c["to"]): c for c in record(path)["conversions"]}
    assert set(listed) == used
    assert all(c["factor"] and c["source"] and c["formula"].count("x") == 1 for c in listed.values())


@each_sample
def test_every_address_cited_exists(path: Path) -> None:
    of = record(path)
    known = (
        {x["address"] for x in lines(of)}
        | {c["address"] for c in of["checks"]}
        | {a["address"] for a in of["assumptions"]}
    )
    cited = (
        [of["cover"]["governing"]]
        + [r["address"] for r in of["rounding"]]
        + [x["address"] for x in of["limits"] if x["address"]]
    )
    cited += [c[side]["address"] for c in of["checks"] for side in ("left", "right") if c[side]]
    cited += [x["used"]["address"] for x in of["inputs"]]
    cited += [
        m for _, text in leaves(of) if isinstance(text, str) for m in re.findall(r"\(line ([0-9]+\.[0-9]+)\)", text)
    ]
    assert set(cited) <= known


@each_sample
def test_an_input_points_to_the_value_the_formulas_use(path: Path) -> None:
    by_address = {x["address"]: x for x in lines(record(path))}
    for x in record(path)["inputs"]:
        used = by_address[x["used"]["address"]]
        assert (used["value"], used["unit"], used["symbol"]) == (x["used"]["value"], x["used"]["unit"], x["symbol"])
        assert used is x or [o["address"] for o in used["operands"]] == [x["address"]]


HOLDS = {"≥": operator.ge, ">": operator.gt, "≤": operator.le, "<": operator.lt}


def si(side: Json, shown: Json) -> tuple[Fraction, Fraction]:
    """A side of record and as shown, both in SI."""
    name = re.sub(" (absolute|gauge|vacuum)$", "", shown["unit"]) or "1"
    own, plain = unit(side["unit"]), unit(name)
    of_record, as_shown = (
        (Fraction(x) + u.offset) * u.factor for x, u in ((side["value"], own), (shown["text"], plain))
    )
    return of_record, as_shown


@each_sample
def test_sides_are_reported_against_the_verdict(path: Path) -> None:
    """What there is is never flattered, what is needed never made less; and the relation printed is true of both books."""
    for c in record(path)["checks"]:
        if not c["margin"]:
            continue
        (left, shown_left), (right, shown_right) = (si(c[s], c[s]["headline"]) for s in ("left", "right"))
        better = 1 if c["relation"] in "≥>" else -1
        if left == right:
            assert shown_left == shown_right, "two equal values are one figure"
            continue
        # A value as typed is not rounded, and its conversion of record is: a millionth may lie between them.
        if left != right:  # two equal values are one figure, rounded to the nearest
            assert better * shown_left <= better * left + abs(left) / 10**5, c["address"]
            assert better * shown_right >= better * right - abs(right) / 10**5, c["address"]
        assert HOLDS[c["found"]](left, right) and HOLDS[c["found"]](shown_left, shown_right), c["address"]
        assert HOLDS[c["relation"]](left, right) is (c["verdict"] == "met"), c["address"]
        if c["margin"]["unit"] in ("m", "ft"):
            assert Decimal(c["margin"]["headline"]["text"]) <= Decimal(c["margin"]["value"])


@each_sample
def test_one_value_is_reported_in_one_way(path: Path) -> None:
    """A result that a rule compares is shown by its line as the rule shows it, decimals and all."""
    shown = {x["address"]: x["headline"] for x in lines(record(path)) if x["kind"] in ("equation", "root")}
    first: dict[str, Json] = {}
    for c in record(path)["checks"]:
        for side in (c["left"], c["right"]):
            if side and c["margin"]:
                first.setdefault(side["address"], side["headline"])
    assert {a: h for a, h in first.items() if a in shown} == {a: shown[a] for a in first if a in shown}


def test_a_narrow_margin_is_reported_at_as_many_decimals_as_keep_it_true() -> None:
    """9.999 m met by 9.9985 m: at two decimals rounded to the safe side the first would look the smaller."""
    of = recorded(plant())
    available = next(c for c in of["checks"] if c["id"] == "npsh_margin")["left"]["value"]
    needed = Decimal(available) - Decimal("0.0005")
    made = recorded(
        plant({"criteria.npsh_margin": {"difference": f"{needed - 5} m", "source": "S1", "status": "verified"}})
    )
    check = next(c for c in made["checks"] if c["id"] == "npsh_margin")
    left, right = (Decimal(check[s]["headline"]["text"]) for s in ("left", "right"))
    assert check["verdict"] == "met" and left >= right


def test_a_rule_not_met_prints_the_relation_there_is() -> None:
    check = next(c for c in recorded(plant({"pump.npsh_required.value": "12 m"}))["checks"] if c["id"] == "npsh_margin")
    assert (check["relation"], check["found"], check["verdict"]) == ("≥", "<", "not met")


@each_sample
def test_the_tally_and_the_verdict_are_those_of_the_checks(path: Path) -> None:
    cover, checks = record(path)["cover"], record(path)["checks"]
    tally = Counter(c["verdict"] for c in checks)
    assert cover["tally"] == {k: tally[k] for k in ("met", "not met", "not applicable", "not assessed")}
    assert cover["verdict"] == ("not met" if tally["not met"] else "not assessed" if tally["not assessed"] else "met")
    governing = next(c for c in checks if c["address"] == cover["governing"])
    assert governing["verdict"] == cover["verdict"]
    assert [c["address"] for c in checks] == [f"9.{n}" for n in range(1, len(checks) + 1)]


def test_the_cover_names_what_fails() -> None:
    of = recorded(
        plant({"pump.npsh_required.value": "12 m", "liquid.temperature": {"average": "20 °C", "source": "S1"}})
    )
    assert of["cover"]["verdict"] == "not met"
    assert "short by" in of["cover"]["statement"] and "average" in of["cover"]["statement"]
    assert ". ." not in of["cover"]["statement"] and ".." not in of["cover"]["statement"]


@each_sample
def test_the_proof_of_rounding_covers_every_key_result(path: Path) -> None:
    rows = {r["address"]: r for r in record(path)["rounding"]}
    computed = {x["address"] for x in lines(record(path)) if x["kind"] in ("equation", "root")}
    keys = {x["address"] for x in lines(record(path)) if x["key_result"]}
    sides = {c[s]["address"] for c in record(path)["checks"] for s in ("left", "right") if c[s]}
    assert keys | (sides & computed) == set(rows)
    for r in rows.values():
        assert abs(Decimal(r["record"]) - Decimal(r["shadow"])) <= Decimal(r["limit"])


@each_sample
def test_the_sketch_adds_up(path: Path) -> None:
    """The heads drawn are those of the result: their sum is what is available."""
    sketch = record(path)["sketch"]
    assert abs(sum(Decimal(h["value"]) for h in sketch["heads"]) - Decimal(sketch["available"])) <= Decimal("1.5e-4")


def test_rows_of_a_loss_table_are_told_apart() -> None:
    section = plant()["line"]["sections"][0]
    second = {**section, "id": "L2", "elements": section["elements"][1:]}
    of = recorded(plant({"line.sections": [section, second]}))
    (table,) = [b["losses"] for part in of["computation"] for b in part["blocks"] if "losses" in b]
    labels = [row["row"] for row in table["rows"]]
    assert len(labels) == 7 == len(set(labels)) and labels.count(table["worked"]) == 1


def test_no_record_names_a_place_of_this_machine() -> None:
    for path in SAMPLES:
        assert str(ROOT) not in canonical(record(path)).decode()


# --- facts by hand ----------------------------------------------------------------------------------------------------


def figure(of: Json, symbol: str, title: str = "") -> float:
    return float(next(x["value"] for x in lines(of) if x["symbol"] == symbol and x["title"].startswith(title)))


def test_sample_a_submergence_agrees_with_the_us_form_of_the_standard() -> None:
    """ANSI/HI 9.8-1998: S = D + 0.574 Q / D^1.5 in inches and gal/min: 20 + 0.574 · 3600 / 20^1.5 = 43.10 in = 3.592 ft."""
    assert figure(sample("a"), "S_m") == pytest.approx((20 + 0.574 * 3600 / 20**1.5) / 12, rel=1e-3)
    assert figure(sample("a"), "S") == 3.5


def test_sample_a_velocity_and_velocity_head_by_the_trade_s_constants() -> None:
    """V = 0.4085 Q / d² (gal/min, in; Crane TP-410), bore 15.25 in; V²/2g of 6.32 ft/s is 0.621 ft."""
    assert figure(sample("a"), "V") == pytest.approx(0.4085 * 3600 / 15.25**2, rel=1e-3)
    assert figure(sample("a"), "h_V") == pytest.approx(6.32**2 / 64.35, rel=2e-3)


def test_sample_a_heads_by_the_psi_to_feet_constant() -> None:
    """2.31 ft of cold water a psi over the specific gravity at 85 °F, 0.9957 (62.164 / 62.43)."""
    assert figure(sample("a"), "H_s") == pytest.approx(11.93 * 144 / 62.164, rel=1e-4)
    assert figure(sample("a"), "H_v") == pytest.approx(1.382, abs=0.001)
    assert figure(sample("a"), "h", "Loss at this flow, in-line screen") == 2.9, "at its reference flow"


def test_sample_a_by_a_short_calculation() -> None:
    """27.63 + 4.00 - 1.38 - losses; losses 2.90 + 0.621 (0.477 + ΣK 1.41) = 4.07: scenario's ΣK and friction to 0.1 ft."""
    assert figure(sample("a"), "NPSHA_d") == pytest.approx(
        27.63 + 4.00 - 1.38 - (2.90 + 0.621 * (0.477 + 1.41)), abs=0.1
    )


def test_sample_b_by_a_short_calculation() -> None:
    """19 °C water: 2.198 kPa, 998.4 kg/m³ (steam tables); (97.8 - 47 - 2.198) / 9.791 + 0.45 + 1.808²/2g = 5.58 m."""
    speed = 210 / 3600 / (3.14159265 * 0.2027**2 / 4)
    expected = (97.8 - 47 - 2.198) / (0.9984 * 9.80665) + 0.45 + speed**2 / 2 / 9.80665
    assert figure(sample("b"), "NPSHA_m") == pytest.approx(expected, abs=0.003)
    # Carried: 27 °C water 3.567 kPa, 996.5 kg/m³; the level 0.50 m lower, the barometer 96.3 kPa, the same flow.
    change = (96.3 - 3.567) / (0.9965 * 9.80665) - (97.8 - 2.198) / (0.9984 * 9.80665) - 0.50
    assert figure(sample("b"), "NPSHA_w") == pytest.approx(expected + change, abs=0.005)
    assert sample("b")["cover"]["verdict"] == "not met"


def test_sample_c_readings_by_a_short_calculation() -> None:
    """24 °C water: 2.986 kPa, 997.3 kg/m³; bore 254.46 mm; the readings at 320 and 240 m³/h, and the model's losses scaled by the flow squared."""
    for flow, gauge in ((320, -13.5), (240, -6.0)):
        speed = flow / 3600 / (3.14159265 * 0.25446**2 / 4)
        expected = (100.2 + gauge - 2.986) / (0.9973 * 9.80665) + 0.30 + speed**2 / 2 / 9.80665
        found = next(float(x["value"]) for x in lines(sample("c")) if x["symbol"] == "NPSHA_m" and f"{flow}" in x["title"] + str(x["operands"])
                     or x["symbol"] == "NPSHA_m" and abs(float(x["value"]) - expected) < 0.05)  # fmt: skip
        assert found == pytest.approx(expected, abs=0.003)
    apart = [float(x["value"]) for x in lines(sample("c")) if x["symbol"] == "C_d"]
    assert apart[0] / apart[1] == pytest.approx((320 / 240) ** 2, rel=0.02), (
        "the deficit grows about with the flow squared"
    )


def test_sample_d_by_a_short_calculation() -> None:
    """95 °C water: 84.61 kPa, 961.9 kg/m³ (steam tables); (99.3 + 22 - 84.61) / 9.433 + 1.8 - 1.32 = 4.37 m."""
    expected = (99.3 + 22 - 84.61) / (0.9619 * 9.80665) + 1.8 - figure(sample("d"), "h_L")
    assert figure(sample("d"), "NPSHA_d") == pytest.approx(expected, abs=0.004)
    speed = 65 / 3600 / (3.14159265 * 0.10226**2 / 4)
    assert figure(sample("d"), "V") == pytest.approx(speed, rel=1e-4)
    # ΣK of fittings 0.5 + 2 · 14 f_T + 8 f_T + 0.30 at f_T 0.0163; friction 0.0170 · 14 / 0.10226.
    lost = (0.5 + 36 * 0.0163 + 0.30 + 0.0170 * 14 / 0.10226) * speed**2 / 2 / 9.80665 + 0.4
    assert figure(sample("d"), "h_L") == pytest.approx(lost, abs=0.005)


VERDICTS = (("a", "design", {"npsh_margin": "met", "highest_temperature": "met", "submergence": "not met"}),
            ("b", "measured", {"npsh_margin": "not met", "highest_temperature": "met"}),
            ("c", "both", {"npsh_margin": "met", "highest_temperature": "met"}),
            ("d", "design", {"npsh_margin": "met", "highest_temperature": "met", "submergence": "met"}))  # fmt: skip


@pytest.mark.parametrize(("letter", "route", "expected"), VERDICTS)
def test_the_verdicts_of_the_samples(letter: str, route: str, expected: dict[str, str]) -> None:
    of = sample(letter)
    assert of["route"] == route
    assert expected.items() <= {c["id"]: c["verdict"] for c in of["checks"]}.items()


def test_the_samples_cover_both_routes_both_systems_and_both_verdicts() -> None:
    of = [record(p) for p in SAMPLES]
    assert {r["route"] for r in of} == {"design", "measured", "both"}
    assert {r["calculation"]["units"] for r in of} == {"SI", "US"}
    assert {r["cover"]["verdict"] for r in of} >= {"met", "not met"}


def test_the_samples_say_that_they_are_invented() -> None:
    for path in SAMPLES:
        calculation = record(path)["calculation"]
        assert "invented" in calculation["owner"] and "invented" in calculation["project"]
