"""The wheel carries templates and schemas, and makes a package outside the tree."""

from __future__ import annotations

import os
import shutil
import subprocess
import sys
import sysconfig
import venv
import zipfile
from pathlib import Path

import pytest

ROOT = Path(__file__).resolve().parent.parent


@pytest.fixture(scope="module")
def wheel(tmp_path_factory: pytest.TempPathFactory) -> Path:
    out = tmp_path_factory.mktemp("wheel")
    command = [sys.executable, "-m", "build", "--wheel", "--no-isolation", "--outdir", str(out), str(ROOT)]
    subprocess.run(command, check=True, capture_output=True)
    (built,) = out.glob("calcpack-*.whl")
    return built


def test_wheel_carries_its_data(wheel: Path) -> None:
    names = set(zipfile.ZipFile(wheel).namelist())
    assert "calcpack/_data/schemas/input.schema.json" in names
    assert "calcpack/py.typed" in names
    shipped = {p.relative_to(ROOT).as_posix() for p in (ROOT / "templates").rglob("*") if p.is_file()}
    assert shipped and {f"calcpack/_data/{p}" for p in shipped} <= names


def test_wheel_makes_a_package_elsewhere(wheel: Path, tmp_path: Path) -> None:
    """A new environment holds the wheel alone; what it depends on is lent by a path file, so that no network is needed."""
    venv.create(tmp_path / "env", with_pip=False)
    bin_folder = "Scripts" if os.name == "nt" else "bin"
    python = tmp_path / "env" / bin_folder / "python"
    purelib = Path(
        subprocess.check_output(
            [python, "-c", "import sysconfig; print(sysconfig.get_path('purelib'))"], text=True
        ).strip()
    )
    zipfile.ZipFile(wheel).extractall(purelib)
    (purelib / "lent.pth").write_text(sysconfig.get_path("purelib") + "\n")
    sample = tmp_path / "input.yaml"
    shutil.copy(ROOT / "sample_inputs" / "d_blanketed_hot_water_vessel.yaml", sample)
    environment = {k: v for k, v in os.environ.items() if k != "PYTHONPATH"}
    where = subprocess.check_output(
        [python, "-c", "import calcpack; print(calcpack.__file__)"], cwd=tmp_path, env=environment, text=True
    )
    assert Path(where.strip()).is_relative_to(tmp_path)
    command = [python, "-m", "calcpack", "draft", sample.name, "-o", "package.pdf"]
    done = subprocess.run(command, cwd=tmp_path, env=environment, capture_output=True, text=True)
    assert done.returncode == 0, done.stderr
    assert (tmp_path / "package.pdf").read_bytes().startswith(b"%PDF")
    assert "Verdict: met" in done.stdout
