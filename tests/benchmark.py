"""Speed as ratios measured in one run, never a timed test: ``python tests/benchmark.py``.

Each ratio pairs the product with a floor measured beside it, alternating, best of several runs.
"""

from __future__ import annotations

import resource
import subprocess
import sys
import tempfile
import time
from collections.abc import Callable
from dataclasses import replace
from pathlib import Path

import numpy as np

from calcpack.arithmetic import InFloat, OnArrays, evaluate
from calcpack.assessment import Study, run
from calcpack.catalog import EQUATIONS
from calcpack.equations import Equation
from calcpack.formula import Call, Cmp, Name, walk
from calcpack.source import load

ROOT = Path(__file__).resolve().parent.parent
SAMPLE = ROOT / "sample_inputs" / "a_cooling_tower_basin.yaml"
ROUNDS = 7

LOOK_UPS = """
from CoolProp.CoolProp import PropsSI
for output in "PDV":
    PropsSI(output, "T", 302.594, "Q", 0, "Water")
from fluids.piping import nearest_pipe
nearest_pipe(NPS=16, schedule="STD")
"""
PLAIN = """
import sys
from weasyprint import HTML
line = "<p>" + "The suction side is checked line by line from the printed numbers alone. " * 2 + "</p>"
sheet = "<style>@page{size:letter;margin:25mm 20mm} p{font:10pt serif;margin:0 0 2pt} div{break-after:page}</style>"
HTML(string=sheet + ("<div>" + line * 22 + "</div>") * int(sys.argv[1])).write_pdf(sys.argv[2])
"""


def seconds(command: list[str]) -> float:
    start = time.perf_counter()
    subprocess.run(command, cwd=ROOT, stdout=subprocess.DEVNULL, stderr=subprocess.DEVNULL)
    return time.perf_counter() - start


def paired(ours: list[str], floor: list[str], rounds: int = ROUNDS) -> tuple[float, float]:
    """Best wall time of each of two commands, run in turn."""
    times = [(seconds(ours), seconds(floor)) for _ in range(rounds)]
    return min(t for t, _ in times), min(t for _, t in times)


def best(function: Callable[[], object], rounds: int = 15) -> float:
    times = []
    for _ in range(rounds):
        start = time.perf_counter()
        function()
        times.append(time.perf_counter() - start)
    return min(times)


def peak(command: list[str]) -> float:
    """Peak resident memory of a command in MB, read by a child that has no other child."""
    script = (
        "import resource, subprocess, sys; subprocess.run(sys.argv[1:], stdout=-3, stderr=-3); "
        "print(resource.getrusage(resource.RUSAGE_CHILDREN).ru_maxrss)"
    )
    out = subprocess.check_output([sys.executable, "-c", script, *command], cwd=ROOT, text=True)
    return int(out) / 1024


#: Equations written by hand in numpy, as an engineer would.
BY_HAND: dict[str, Callable[[dict[str, np.ndarray]], np.ndarray]] = {
    "velocity_head": lambda v: v["V"] ** 2 / (2 * v["g"]),
    "reynolds": lambda v: v["rho"] * v["V"] * v["D"] / v["mu"],
    "standard_atmosphere": lambda v: v["p_0"] * (1 - v["beta"] * v["H"] / v["T_0"]) ** v["n_a"],
    "fully_rough_friction": lambda v: 0.25 / np.log10(v["eps_c"] / (3.7 * v["D"])) ** 2,
    "npsh_design": lambda v: v["H_s"] + v["z"] - v["H_v"] - v["h_L"],
    "submergence_needed": lambda v: v["D_i"] * (1 + 2.3 * v["Fr"]),
}


#: How numpy spells the functions of the formula language.
IN_NUMPY = {
    "sqrt": np.sqrt,
    "log10": np.log10,
    "ln": np.log,
    "exp": np.exp,
    "max": np.maximum,
    "min": np.minimum,
    "pi": np.pi,
}


def plain() -> list[Equation]:
    """Every equation that computes with single values: no root, no sum of a list, no value handed on."""
    return [
        e for e in EQUATIONS
        if not isinstance(e.tree, Cmp | Name) and not any(isinstance(n, Call) and n.fn == "sum" for n in walk(e.tree))
    ]  # fmt: skip


def arrays() -> tuple[float, str, int]:
    """The worst ratio of the array path to numpy on 100 000 points over every equation, and its equation.

    What stands in :data:`BY_HAND` was written by an engineer; the rest is the formula's text compiled as numpy.
    """
    rng, worst, on, chosen = np.random.default_rng(1), (0.0, ""), OnArrays(), plain()
    for equation in chosen:
        values = {s: rng.uniform(0.1, 0.9, 100_000) + (10 if s == "T_0" else 0) for s in equation.operands}
        code = compile(equation.text, equation.name, "eval")
        by_hand = BY_HAND.get(equation.name) or (lambda v, code=code: eval(code, IN_NUMPY, v))
        with np.errstate(all="ignore"):  # random numbers may lie outside a logarithm's domain; the time is the same
            pairs = [
                (best(lambda: evaluate(equation.tree, values, on), 20), best(lambda: by_hand(values), 20))  # noqa: B023
                for _ in range(3)
            ]
        worst = max(worst, (min(a for a, _ in pairs) / min(b for _, b in pairs), equation.name))
    return *worst, len(chosen)


def growth() -> list[tuple[int, float, int]]:
    """Elements, seconds and lines of a run of sample a with its line made longer; the cap of the input file is passed by."""
    calculation = load(SAMPLE)
    assert calculation.line is not None
    section = calculation.line.sections[0]
    bend = next(e for e in section.elements if e.kind == "elbow")
    found = []
    for count in (10, 100, 1000):
        extra = tuple(replace(bend, id=f"E{n}", key=f"{bend.key}{n}") for n in range(count - len(section.elements)))
        longer = replace(section, elements=section.elements + extra)
        of = replace(calculation, line=replace(calculation.line, sections=(longer,)))
        study: Study = run(of)
        found.append((count, best(lambda: run(of), 3), len(study.ledger.lines())))  # noqa: B023
    return found


def tree_cost() -> tuple[float, int]:
    """Microseconds of one evaluation in floats over the whole catalogue."""
    chosen = plain()
    values = {s: 0.5 for e in chosen for s in e.operands} | {"p_0": 1.0}
    on = InFloat()
    timed = [e for e in chosen if _defined(e, values, on)]
    return best(lambda: [evaluate(e.tree, values, on) for e in timed]) / len(timed) * 1e6, len(timed)


def _defined(equation: Equation, values: dict[str, float], on: InFloat) -> bool:
    try:
        evaluate(equation.tree, values, on)
    except (ArithmeticError, ValueError):
        return False
    return True


def main() -> None:
    me = [sys.executable, "-m", "calcpack"]
    ours, floor = paired([*me, "assess", str(SAMPLE)], [sys.executable, "-c", LOOK_UPS])
    start, _ = paired([sys.executable, "-c", "pass"], [sys.executable, "-c", "pass"])
    print(
        f"assess cold             {ours:6.3f} s   look-ups alone {floor:6.3f} s   ratio {ours / floor:5.2f}   bare Python {start:.3f} s"
    )

    with tempfile.TemporaryDirectory() as folder:
        target = str(Path(folder) / "p.pdf")
        draft = [*me, "draft", str(SAMPLE), "-o", target]
        seconds(draft)
        import pypdfium2

        pages = len(pypdfium2.PdfDocument(target))
        text = [sys.executable, "-c", PLAIN, str(pages), str(Path(folder) / "plain.pdf")]
        ours, floor = paired(draft, text, 3)
        same = len(pypdfium2.PdfDocument(str(Path(folder) / "plain.pdf")))
        print(
            f"draft cold, {pages:2} pages    {ours:6.3f} s   plain text, {same} pages {floor:6.3f} s   ratio {ours / floor:5.2f}"
        )
        ours, floor = paired([*me, "verify", target], [sys.executable, "-c", "import pypdfium2"], 3)
        print(f"verify cold             {ours:6.3f} s   ({ours / pages * 1000:.0f} ms a page)")
        print(
            f"peak memory             assess {peak([*me, 'assess', str(SAMPLE)]):.0f} MB   draft {peak(draft):.0f} MB"
        )

    ratio, name, count = arrays()
    print(f"array path              worst ratio to numpy {ratio:.2f} ({name}; {count} equations, 100 000 points)")
    for elements, taken, lines in growth():
        print(
            f"{elements:5} elements          {taken * 1e3:8.1f} ms, {taken / elements * 1e3:.2f} ms an element, {lines} lines"
        )
    calculation = load(SAMPLE)
    run(calculation)
    whole, lines = best(lambda: run(calculation), 20), len(run(calculation).ledger.lines())
    print(
        f"ledger run              {whole * 1e3:.1f} ms, {lines} lines, {whole / lines * 1e6:.0f} µs a line in both books"
    )
    cost, count = tree_cost()
    print(f"one evaluation          {cost:.1f} µs in floats, mean of {count} equations")
    print(f"peak memory of this run {resource.getrusage(resource.RUSAGE_SELF).ru_maxrss / 1024:.0f} MB")


if __name__ == "__main__":
    main()
