"""Who may know whom: imports only go down the layers, and an assessment loads nothing it does not need."""

from __future__ import annotations

import ast
import json
import subprocess
import sys
from collections.abc import Iterator
from pathlib import Path

import pytest

import calcpack

PACKAGE = Path(calcpack.__file__).parent
#: Layer of every room (a module or a folder); a room imports only its own layer and those below.
LAYERS = (
    "faults symbols number quantity units kinds misread formula arithmetic references resources conversion",
    "equations catalog verdict lookup roughness root ledger value source fitting_set",
    "study",
    "rules",
    "assessment",
    "record table",
    "page reader cli output __main__ __init__",
)
LAYER = {room: number for number, rooms in enumerate(LAYERS, 1) for room in rooms.split()}
#: Libraries and the only rooms that may import them.
LIBRARIES = {
    "jinja2": {"page"},
    "weasyprint": {"page"},
    "matplotlib": {"page"},
    "CoolProp": {"lookup", "reader"},  # the reader derives a look-up anew, and may know nothing of ours
    "fluids": {"lookup", "reader"},
    "pypdfium2": {"reader"},
    "yaml": {"source"},
    "jsonschema": {"source"},
    "numpy": {"arithmetic", "page", "reader"},
    "fontTools": {"page", "reader"},
    "pint": set(),
    "requests": set(),
    "urllib": set(),
    "socket": set(),
}
MODULES = sorted(PACKAGE.rglob("*.py"))


def room(path: Path) -> str:
    return path.relative_to(PACKAGE).parts[0].removesuffix(".py")


def imports(path: Path) -> Iterator[tuple[str, bool]]:
    """``(module, ours)`` of every import of a file, also inside functions; of ours the room only."""
    depth = len(path.relative_to(PACKAGE).parts)
    for node in ast.walk(ast.parse(path.read_text("utf-8"))):
        if isinstance(node, ast.Import):
            for alias in node.names:
                top, *below = alias.name.split(".")
                yield (below[0] if below else "__init__", True) if top == "calcpack" else (top, False)
        elif isinstance(node, ast.ImportFrom) and node.level == 0:
            top, *below = (node.module or "").split(".")
            yield (below[0] if below else "__init__", True) if top == "calcpack" else (top, False)
        elif isinstance(node, ast.ImportFrom):
            up = depth - node.level
            inside = path.relative_to(PACKAGE).parts[:up]
            named = [*inside, *(node.module or "").split(".")] if node.module else list(inside)
            for target in [named] if named else [[alias.name] for alias in node.names]:
                yield (target[0] if target[0] in LAYER else "__init__"), True


@pytest.mark.parametrize("path", MODULES, ids=lambda p: str(p.relative_to(PACKAGE)))
def test_imports_go_down(path: Path) -> None:
    own = room(path)
    assert own in LAYER, f"{own} has no layer"
    for other, ours in imports(path):
        if ours and other != own:
            # The version number, which stands in the package's own file, may be read from everywhere.
            assert other == "__init__" or LAYER[other] <= LAYER[own], f"{own} imports {other}"


@pytest.mark.parametrize("path", MODULES, ids=lambda p: str(p.relative_to(PACKAGE)))
def test_a_library_is_known_to_its_room_only(path: Path) -> None:
    for name, ours in imports(path):
        if not ours and name in LIBRARIES:
            assert room(path) in LIBRARIES[name], f"{path.name} imports {name}"


@pytest.mark.parametrize("path", [p for p in MODULES if room(p) == "reader"], ids=lambda p: p.name)
def test_the_reader_knows_nothing_of_ours(path: Path) -> None:
    """What it finds must not rest on the code that printed it."""
    assert {name for name, ours in imports(path) if ours} <= {"reader"}


def test_only_the_package_s_own_file_knows_every_step() -> None:
    known = {name for name, ours in imports(PACKAGE / "__init__.py") if ours}
    assert known == {"arithmetic", "assessment", "faults", "page", "reader", "record", "source"}


def test_every_room_has_a_layer_and_every_layer_its_rooms() -> None:
    assert {room(p) for p in MODULES} == set(LAYER)


ASSESS = """
import sys, json, calcpack
calcpack.assess(sys.argv[1])
print(json.dumps(sorted(sys.modules)))
"""


@pytest.mark.parametrize("sample", ["a_cooling_tower_basin", "c_transfer_pump_both_routes"])
def test_an_assessment_loads_no_page_and_no_reader(sample: str) -> None:
    path = PACKAGE.parent / "sample_inputs" / f"{sample}.yaml"
    done = subprocess.run(
        [sys.executable, "-c", ASSESS, str(path)], capture_output=True, text=True, check=True, cwd=PACKAGE.parent
    )
    loaded = set(json.loads(done.stdout))
    for heavy in (
        "weasyprint",
        "jinja2",
        "matplotlib",
        "pypdfium2",
        "pint",
        "fontTools",
        "calcpack.page",
        "calcpack.reader",
        "calcpack.cli",
    ):
        assert heavy not in loaded


def test_importing_the_package_loads_nothing_heavy() -> None:
    probe = "import sys, json, calcpack; print(json.dumps(sorted(sys.modules)))"
    done = subprocess.run([sys.executable, "-c", probe], capture_output=True, text=True, check=True, cwd=PACKAGE.parent)
    loaded = set(json.loads(done.stdout))
    for heavy in ("numpy", "CoolProp", "fluids", "yaml", "jsonschema", "weasyprint", "matplotlib", "pypdfium2"):
        assert heavy not in loaded


def test_rooms_stay_small() -> None:
    """One noun a module: at most 400 lines."""
    assert {p.name: n for p in MODULES if (n := len(p.read_text("utf-8").splitlines())) > 400} == {}
