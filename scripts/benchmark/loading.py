"""What loads quickly, and in little memory: long stock lists beside a bare loop, and beside a shorter list."""

from __future__ import annotations

import csv
from pathlib import Path

from scripts.benchmark.baselines import BARE_LOAD
from scripts.benchmark.startup import PYTHON, SELECTOR
from scripts.benchmark.timing import Pair, Run

GOAL = "10"
SHORT, LONG, LONGEST = 10_000, 100_000, 1_000_000
BESIDE_A_LOOP = 1 / 0.5
BESIDE_A_SHORT_LIST = 1 / 0.8
MOST_MB = 300.0
HEADINGS = ("part", "kind", "resistance [ohm]", "tolerance [%]", "tempco [ppm/K]", "quantity", "unit_cost")


def write_stock(path: Path, rows: int) -> None:
    """Write a stock list of resistors, each with a code and a value of its own."""
    with path.open("w", newline="", encoding="utf-8") as file:
        writer = csv.writer(file)
        writer.writerow(HEADINGS)
        for number in range(rows):
            writer.writerow([f"R-{number}", "resistor", f"{10 + number * 0.5:.10g}", "0.1", "25", number % 500, "0.10"])


def load_pairs(folder: Path, *, full: bool = False) -> list[Pair]:
    """Make what the runs need in a folder, and return the loads of long stock lists; `full`: of the longest as well.

    The longest takes some twenty seconds a turn.
    """
    bare = folder / "bare.py"
    bare.write_text(BARE_LOAD, encoding="utf-8")
    rows = (SHORT, LONG, LONGEST) if full else (SHORT, LONG)
    for each in rows:
        write_stock(_stock(folder, each), each)
    return [
        *(_beside_the_loop(folder, bare, each) for each in rows),
        *(_beside_the_short_list(folder, each) for each in rows[1:]),
    ]


def _beside_the_loop(folder: Path, bare: Path, rows: int) -> Pair:
    """Return the load of a list beside that of a bare loop."""
    plain = folder / "plain.db"
    loop = Run((*PYTHON, str(bare), str(_stock(folder, rows)), str(plain)), lambda: plain.unlink(missing_ok=True))
    name = f"load of {rows} rows"
    return Pair(
        name, "csv, pydantic, executemany", _load(folder, rows), loop, rows, GOAL, BESIDE_A_LOOP, most_mb=MOST_MB
    )


def _beside_the_short_list(folder: Path, rows: int) -> Pair:
    """Return the load of a list beside that of the shortest."""
    return Pair(
        f"load of {rows} rows",
        f"that of {SHORT}, row by row",
        _load(folder, rows),
        _load(folder, SHORT),
        rows,
        GOAL,
        BESIDE_A_SHORT_LIST,
        baseline_rows=SHORT,
    )


def _load(folder: Path, rows: int) -> Run:
    """Return the load of a list into a new catalogue."""
    loaded = folder / "loaded.db"
    command = (*SELECTOR, "load", str(_stock(folder, rows)), "--catalogue", str(loaded))
    return Run(command, lambda: loaded.unlink(missing_ok=True))


def _stock(folder: Path, rows: int) -> Path:
    """Return where a list is."""
    return folder / f"stock{rows}.csv"
