"""Measures all there is, or a part of it, and prints one line for each: what was reached, and what was wanted."""

from __future__ import annotations

import argparse
import subprocess
import sys
import tempfile
from collections.abc import Callable, Iterator, Sequence
from functools import partial
from pathlib import Path

from scripts.benchmark import goals, timing
from scripts.benchmark.loading import load_pairs
from scripts.benchmark.runner import CHECKOUT, LIMIT_S, Runner
from scripts.benchmark.startup import start_pairs
from scripts.benchmark.table import heading, line
from scripts.benchmark.timing import Pair

PARTS = ("start", "load", "search", "methods")


def _pairs(name: str, of: Callable[[Path], list[Pair]], turns: int) -> Iterator[str]:
    """Yield a table of pairs, measured in a folder that goes away."""
    yield heading(name)
    with tempfile.TemporaryDirectory() as folder:
        for pair in of(Path(folder)):
            yield from map(line, timing.rows(timing.measure(pair, turns, Path(folder))))


def _search(turns: int, limit_s: float, *, full: bool) -> Iterator[str]:
    """Yield the table of the search's goals; 1, that the list is exact, is held by tests."""
    yield heading("search")
    yield from map(line, goals.rows(Runner(turns, limit_s), full=full))


def _methods() -> Iterator[str]:
    """Yield the table of methods on one small problem, worked out in a process of its own."""
    command = [sys.executable, "-P", "-m", "scripts.benchmark.methods"]
    done = subprocess.run(command, cwd=CHECKOUT, check=True, capture_output=True)
    yield done.stdout.decode().rstrip("\n")


def _lines(given: argparse.Namespace) -> Iterator[str]:
    """Yield what is printed, part by part."""
    measured = {
        "start": lambda: _pairs("start", start_pairs, given.turns),
        "load": lambda: _pairs("load", partial(load_pairs, full=given.full), given.turns),
        "search": lambda: _search(given.turns, given.limit, full=given.full),
        "methods": _methods,
    }
    for part, lines in measured.items():
        if part in (given.only or PARTS):
            yield from lines()
            yield ""


def arguments(texts: Sequence[str]) -> argparse.Namespace:
    """Return the options of the command line."""
    parser = argparse.ArgumentParser(prog="scripts/bench", description="Times of selector against baselines.")
    parser.add_argument("--turns", type=int, default=5, help="turns of each side; the best counts (5)")
    parser.add_argument("--only", action="append", choices=PARTS, help="measure this part alone; may be repeated")
    parser.add_argument(
        "--full", action="store_true", help="all three specs for each goal, the largest catalogue and stock list too"
    )
    parser.add_argument("--limit", type=float, default=LIMIT_S, help=f"most seconds of one search ({LIMIT_S:g})")
    return parser.parse_args(texts)


def main() -> int:
    """Measure and print; 1 where a run fails."""
    try:
        for text in _lines(arguments(sys.argv[1:])):
            sys.stdout.write(text + "\n")
            sys.stdout.flush()
    except subprocess.CalledProcessError as error:
        told = (error.stdout + error.stderr).decode(errors="replace")
        sys.stderr.write(f"{' '.join(error.cmd)} ended with {error.returncode}\n{told}\n")
        return 1
    return 0


if __name__ == "__main__":
    sys.exit(main())
