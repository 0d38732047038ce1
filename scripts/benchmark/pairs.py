"""What is measured against what."""

from __future__ import annotations

import csv
import subprocess
import sys
from pathlib import Path

from scripts.benchmark.baselines import BARE_LOAD, EMPTY_COMMAND, IMPORTS
from scripts.benchmark.timing import Pair, Run

DATA = Path(__file__).resolve().parents[2] / "data"
ROWS = 20_000
SELECTOR = (sys.executable, "-P", "-m", "selector")


def write_stock(path: Path, rows: int) -> None:
    """Write a stock list of resistors, each with a code and a value of its own."""
    with path.open("w", newline="", encoding="utf-8") as file:
        writer = csv.writer(file)
        writer.writerow(
            ["part", "kind", "resistance [ohm]", "tolerance [%]", "tempco [ppm/K]", "quantity", "unit_cost"]
        )
        for number in range(rows):
            writer.writerow([f"R-{number}", "resistor", f"{10 + number * 0.5:g}", "0.1", "25", number % 500, "0.10"])


def pairs(folder: Path) -> list[Pair]:
    """Make what the runs need in a folder, and return all that is measured."""
    empty, imports, bare = folder / "empty.py", folder / "imports.py", folder / "bare.py"
    for path, text in ((empty, EMPTY_COMMAND), (imports, IMPORTS), (bare, BARE_LOAD)):
        path.write_text(text, encoding="utf-8")
    stock, loaded, plain, demo = (folder / name for name in ("stock.csv", "loaded.db", "plain.db", "demo.db"))
    write_stock(stock, ROWS)
    files = [str(path) for path in sorted((DATA / "parts").glob("*.csv"))]
    subprocess.run([*SELECTOR, "load", *files, "--catalogue", str(demo)], check=True, capture_output=True)
    python = (sys.executable, "-P")
    nothing = Run((*python, str(empty), "--version"))
    return [
        Pair("--version", "an empty typer command", Run((*SELECTOR, "--version")), nothing),
        Pair("series 4.9k", "an empty typer command", Run((*SELECTOR, "series", "4.9k")), nothing),
        Pair(
            f"load of {ROWS} rows",
            "csv and executemany alone",
            Run(
                (*SELECTOR, "load", str(stock), "--catalogue", str(loaded)),
                lambda: loaded.unlink(missing_ok=True),
            ),
            Run((*python, str(bare), str(stock), str(plain)), lambda: plain.unlink(missing_ok=True)),
            ROWS,
        ),
        Pair(
            "query of the bundled scenario",
            "importing typer, pydantic, numpy",
            Run((*SELECTOR, "query", str(DATA / "frost_alarm.toml"), "--catalogue", str(demo))),
            Run((*python, str(imports))),
        ),
    ]
