"""The commands as a user runs them: exit codes, messages, and that nothing is half-written."""

from __future__ import annotations

import json
import os
import signal
import subprocess
import sys
import time
from pathlib import Path

import pytest

import calcpack
from calcpack import cli, output
from calcpack.faults import InputFault

ROOT = Path(__file__).resolve().parent.parent
SAMPLES = ROOT / "sample_inputs"
MET, NOT_MET = SAMPLES / "d_blanketed_hot_water_vessel.yaml", SAMPLES / "a_cooling_tower_basin.yaml"
BAD = SAMPLES / "faults" / "bare_number.yaml"


def run(*arguments: str | Path, cwd: Path = ROOT, **more: str) -> subprocess.CompletedProcess[str]:
    environment = {**os.environ, "PYTHONPATH": str(ROOT), **more}
    command = [sys.executable, "-m", "calcpack", *map(str, arguments)]
    return subprocess.run(command, cwd=cwd, env=environment, capture_output=True, text=True)


@pytest.mark.parametrize(("sample", "code", "verdict"), [(MET, 0, "Verdict: met"), (NOT_MET, 1, "Verdict: not met")])
def test_draft_prints_verdict_margin_and_path(sample: Path, code: int, verdict: str, tmp_path: Path) -> None:
    done = run("draft", sample, "-o", tmp_path / "p.pdf")
    assert (done.returncode, done.stderr) == (code, "")
    first, second = done.stdout.splitlines()
    assert first.startswith(verdict) and "margin" in first
    assert second == str(tmp_path / "p.pdf")
    assert (tmp_path / "p.pdf").read_bytes().startswith(b"%PDF")
    assert [p.name for p in tmp_path.iterdir()] == ["p.pdf"]


def test_assess_prints_a_table_or_the_record(capfd: pytest.CaptureFixture[str]) -> None:
    assert cli.run(["assess", str(NOT_MET)]) == 1
    table = capfd.readouterr().out
    assert "Verdict: not met" in table and "NOT MET" in table and "Cautions" in table
    assert cli.run(["assess", "--json", str(NOT_MET)]) == 1
    record = json.loads(capfd.readouterr().out)
    assert record == calcpack.assess(NOT_MET)


def test_input_fault_is_exit_2_and_touches_no_file(tmp_path: Path) -> None:
    target = tmp_path / "p.pdf"
    target.write_bytes(b"the old package")
    done = run("draft", BAD, "-o", target)
    assert done.returncode == 2
    assert "nothing was written" in done.stderr and "Traceback" not in done.stderr
    assert done.stdout == ""
    assert target.read_bytes() == b"the old package"
    assert [p.name for p in tmp_path.iterdir()] == ["p.pdf"]


def _target(tmp_path: Path, case: str) -> Path:
    match case:
        case "a folder":
            return tmp_path
        case "no folder":
            return tmp_path / "missing" / "p.pdf"
        case "the input file itself":
            own = tmp_path / "own.yaml"
            own.write_bytes(MET.read_bytes())
            return own
    raise AssertionError(case)


@pytest.mark.parametrize("case", ["a folder", "no folder", "the input file itself"])
def test_output_that_cannot_be_written(case: str, tmp_path: Path) -> None:
    target = _target(tmp_path, case)
    source = target if case.startswith("the input") else MET
    before = sorted(p.name for p in tmp_path.iterdir())
    done = run("draft", source, "-o", target)
    assert done.returncode == 2, done.stderr
    assert case in done.stderr and "-o" in done.stderr
    assert sorted(p.name for p in tmp_path.iterdir()) == before


def test_write_fails_late_and_leaves_the_old_file(tmp_path: Path, monkeypatch: pytest.MonkeyPatch) -> None:
    target = tmp_path / "p.pdf"
    target.write_bytes(b"the old package")

    def full(_: int) -> None:
        raise OSError(28, "No space left on device")

    monkeypatch.setattr(os, "fsync", full)
    with pytest.raises(InputFault, match="No space left"):
        output.write(target, b"x" * 1000)
    assert target.read_bytes() == b"the old package"
    assert [p.name for p in tmp_path.iterdir()] == ["p.pdf"]


@pytest.mark.parametrize("arguments", [[], ["make"], ["draft"], ["assess", "a", "b"], ["draft", "--fast", "x"]])
def test_wrong_command_line_is_exit_2(arguments: list[str], capsys: pytest.CaptureFixture[str]) -> None:
    assert cli.run(arguments) == 2
    assert "calcpack" in capsys.readouterr().err


def test_help_and_version_are_exit_0(capsys: pytest.CaptureFixture[str]) -> None:
    assert cli.run(["--version"]) == 0
    assert capsys.readouterr().out.strip() == f"calcpack {calcpack.__version__}"
    assert cli.run(["draft", "--help"]) == 0
    assert "exit codes" in capsys.readouterr().out


def test_not_a_package_is_exit_2(tmp_path: Path) -> None:
    other = tmp_path / "other.pdf"
    other.write_bytes(b"%PDF-1.7 nothing more")
    for path in (other, tmp_path / "missing.pdf", tmp_path, MET):
        done = run("verify", path)
        assert done.returncode == 2, (path, done.stderr)
        assert "Traceback" not in done.stderr and path.name in done.stderr


def test_crash_at_import_is_exit_70(tmp_path: Path) -> None:
    """A module that crashes when imported must never look like a rule not met."""
    (tmp_path / "yaml.py").write_text("raise RuntimeError('broken installation')\n")
    done = run("assess", MET, PYTHONPATH=f"{tmp_path}{os.pathsep}{ROOT}")
    assert done.returncode == 70
    assert "defect of calcpack" in done.stderr and "broken installation" in done.stderr
    assert "Traceback" not in done.stderr


def test_missing_pango_names_the_package_of_each_platform(tmp_path: Path) -> None:
    fake = tmp_path / "weasyprint"
    fake.mkdir()
    (fake / "__init__.py").write_text("raise OSError(\"cannot load library 'libpango-1.0-0': not found\")\n")
    done = run("draft", MET, "-o", tmp_path / "p.pdf", PYTHONPATH=f"{tmp_path}{os.pathsep}{ROOT}")
    assert done.returncode == 2, done.stderr
    for words in ("Pango", "apt install", "brew install", "Windows"):
        assert words in done.stderr
    assert not (tmp_path / "p.pdf").exists()


def test_assess_works_without_the_page_libraries(tmp_path: Path) -> None:
    for name in ("weasyprint", "jinja2", "matplotlib", "pypdfium2", "pint"):
        (tmp_path / f"{name}.py").write_text("raise ImportError('not wanted here')\n")
    done = run("assess", MET, PYTHONPATH=f"{tmp_path}{os.pathsep}{ROOT}")
    assert done.returncode == 0, done.stderr


def test_closed_output_is_quiet() -> None:
    command = f"{sys.executable} -m calcpack assess {MET} | true"
    done = subprocess.run(["sh", "-c", command], cwd=ROOT, capture_output=True, text=True)
    assert "Traceback" not in done.stderr and "defect" not in done.stderr


def test_new_writes_an_input_file_that_works(tmp_path: Path, capsys: pytest.CaptureFixture[str]) -> None:
    target = tmp_path / "mine.yaml"
    assert cli.run(["new", str(target)]) == 0
    assert capsys.readouterr().out.strip() == str(target)
    record = calcpack.assess(target)
    assert record["cover"]["verdict"] == "met" and record["route"] == "design"
    assert target.read_text("utf-8").count("#") > 15


@pytest.mark.parametrize("case", ["a file", "a folder", "a dangling link", "no folder"])
def test_new_overwrites_nothing(case: str, tmp_path: Path, capsys: pytest.CaptureFixture[str]) -> None:
    target = tmp_path / "mine.yaml"
    match case:
        case "a file":
            target.write_text("mine")
        case "a folder":
            target.mkdir()
        case "a dangling link":
            target.symlink_to(tmp_path / "elsewhere.yaml")
        case "no folder":
            target = tmp_path / "missing" / "mine.yaml"
    before = sorted(p.name for p in tmp_path.rglob("*"))
    assert cli.run(["new", str(target)]) == 2
    assert "wanted a file that can be written" in capsys.readouterr().err
    assert sorted(p.name for p in tmp_path.rglob("*")) == before
    assert case != "a file" or target.read_text() == "mine"


@pytest.mark.parametrize(
    ("command", "wanted", "undone"),
    [
        ("assess", "wanted an input file (YAML); found a PDF", "nothing was computed"),
        ("draft", "wanted an input file (YAML); found a PDF", "nothing was written"),
        ("verify", "found a file that does not open as a PDF", "nothing was verified"),
    ],
)
def test_a_file_of_the_wrong_kind_is_named_as_what_it_is(
    command: str, wanted: str, undone: str, tmp_path: Path, capsys: pytest.CaptureFixture[str]
) -> None:
    package = tmp_path / "p.pdf"
    package.write_bytes(b"%PDF-1.7\n\xe2\xe3\xcf\xd3 nothing more")
    assert cli.run([command, str(package)]) == 2
    told = capsys.readouterr().err
    assert wanted in told and undone in told and ".." not in told


def test_a_package_that_is_not_there(tmp_path: Path, capsys: pytest.CaptureFixture[str]) -> None:
    assert cli.run(["verify", str(tmp_path / "missing.pdf")]) == 2
    assert "found no file of that name" in capsys.readouterr().err


def test_an_odd_file_name_is_written_out(tmp_path: Path, capsys: pytest.CaptureFixture[str]) -> None:
    for arguments in (["verify", str(tmp_path / "a\x1b[2Jb.pdf")], ["new", str(tmp_path / "a\x1b[2Jb" / "c.yaml")]):
        assert cli.run(arguments) == 2
        told = capsys.readouterr().err
        assert "\x1b" not in told and "<U+001B>" in told


def test_the_exceptions_of_the_interface_are_at_hand_and_cost_no_import() -> None:
    probe = (
        "import sys, calcpack; before = set(sys.modules); names = calcpack.InputFault, calcpack.NotAPackage\n"
        "assert 'calcpack.reader' not in before and 'calcpack.faults' not in before\n"
        "try: calcpack.verify(b'nothing')\n"
        "except calcpack.NotAPackage as error: print(error)"
    )
    done = subprocess.run([sys.executable, "-c", probe], capture_output=True, text=True, cwd=ROOT)
    assert done.stdout.strip() == "a file that does not open as a PDF", done.stderr
    with pytest.raises(AttributeError, match="no attribute"):
        calcpack.nothing_of_the_kind  # noqa: B018
    with pytest.raises(calcpack.InputFault) as caught:
        calcpack.assess(BAD)
    assert caught.value.faults  # type: ignore[attr-defined]  # reached by a lazy attribute, typed as Any exception


def test_findings_stand_below_the_verdict_in_a_terminal(capsys: pytest.CaptureFixture[str]) -> None:
    assert cli.run(["assess", str(SAMPLES / "c_transfer_pump_both_routes.yaml")]) == 0
    told = capsys.readouterr().out
    assert "Open findings, below: 3." in told and "section" not in told
    assert told.index("Open findings") < told.index("\nFindings\n")


@pytest.mark.campaign
def test_killed_at_any_moment_leaves_old_or_new(tmp_path: Path) -> None:
    """Kill the command at 40 moments of its run: the target holds the old bytes or a whole new package, never less."""
    target = tmp_path / "p.pdf"
    target.write_bytes(b"old")
    environment = {**os.environ, "PYTHONPATH": str(ROOT)}
    command = [sys.executable, "-m", "calcpack", "draft", str(MET), "-o", str(target)]
    start = time.monotonic()
    subprocess.run(command, cwd=ROOT, env=environment, capture_output=True)
    whole, length = target.read_bytes(), time.monotonic() - start
    seen = set()
    for step in range(40):
        target.write_bytes(b"old")
        process = subprocess.Popen(
            command, cwd=ROOT, env=environment, stdout=subprocess.DEVNULL, stderr=subprocess.DEVNULL
        )
        time.sleep(length * (0.5 + 0.6 * step / 40))
        process.send_signal(signal.SIGKILL)
        process.wait()
        found = target.read_bytes()
        assert found in (b"old", whole)
        seen.add(found == whole)
    assert False in seen
