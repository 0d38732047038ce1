"""What starts quickly: commands beside an empty one, and the main job beside what it has to import."""

from __future__ import annotations

import compileall
import json
import subprocess
import sys
from pathlib import Path

from scripts.benchmark.baselines import EMPTY_COMMAND, IMPORTS, IN_USE
from scripts.benchmark.runner import CHECKOUT
from scripts.benchmark.timing import Pair, Run

DATA = CHECKOUT / "data"
PYTHON = (sys.executable, "-P")
SELECTOR = (*PYTHON, "-m", "selector")
GOAL = "9"
AT_ONCE, LOOKED_UP, SEARCHED = 1.3, 1.5, 1.5


def start_pairs(folder: Path) -> list[Pair]:
    """Make what the runs need in a folder, and return the commands that are to start quickly."""
    empty, imports, in_use, demo = (folder / name for name in ("empty.py", "imports.py", "in_use.py", "demo.db"))
    compileall.compile_dir(CHECKOUT / "selector", quiet=1)  # as an installed program is
    for path, text in ((empty, EMPTY_COMMAND), (imports, IMPORTS), (in_use, IN_USE)):
        path.write_text(text, encoding="utf-8")
    files = [str(path) for path in sorted((DATA / "parts").glob("*.csv"))]
    subprocess.run([*SELECTOR, "load", *files, "--catalogue", str(demo)], check=True, capture_output=True)
    command = (*SELECTOR, "query", str(DATA / "frost_alarm.toml"), "--catalogue", str(demo), "--format", "json")
    query = Run(command, less=searched_s)
    return [
        _beside_empty("--version", empty, AT_ONCE),
        _beside_empty("--help", empty, AT_ONCE),
        _beside_empty("series 4.9k", empty, LOOKED_UP),
        _beside_empty("parts list", empty, LOOKED_UP, "--catalogue", str(demo)),
        Pair(
            "query without its search",
            "importing typer, pydantic, numpy",
            query,
            Run((*PYTHON, str(imports))),
            goal=GOAL,
            most=SEARCHED,
        ),
        Pair("query without its search", "each of these used once", query, Run((*PYTHON, str(in_use), "0.1"))),
    ]


def searched_s(printed: bytes) -> float:
    """Return the time that an answer of `query` says its search took, s."""
    return float(json.loads(printed)["searched"]["seconds"])


def _beside_empty(words: str, empty: Path, most: float, *more: str) -> Pair:
    """Return a command beside an empty one that is asked the same way: for its help, or for nothing."""
    asked = "--help" if words == "--help" else "--version"
    ours = Run((*SELECTOR, *words.split(), *more))
    return Pair(words, "an empty typer command", ours, Run((*PYTHON, str(empty), asked)), goal=GOAL, most=most)
