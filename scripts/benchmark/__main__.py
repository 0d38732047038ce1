"""Measures all pairs and prints one line for each."""

from __future__ import annotations

import argparse
import subprocess
import sys
import tempfile
from pathlib import Path

from scripts.benchmark.pairs import pairs
from scripts.benchmark.timing import Measured, measure


def line(measured: Measured) -> str:
    """Return what is printed of one pair."""
    pair = measured.pair
    times = f"{measured.ours_s:8.3f} s{measured.baseline_s:9.3f} s{measured.ratio:8.2f}"
    text = f"{pair.name:<32}{times}  {pair.baseline_name}"
    if pair.rows:
        ours, baseline = pair.rows / measured.ours_s, pair.rows / measured.baseline_s
        text += f"\n{'  rows a second':<32}{ours:8.0f}  {baseline:9.0f}"
    return text


def main() -> int:
    """Measure and print; 1 where a run fails."""
    parser = argparse.ArgumentParser(prog="scripts/bench", description="Times of selector against baselines.")
    parser.add_argument("--turns", type=int, default=5, help="turns of each side; the best counts (5)")
    turns = parser.parse_args().turns
    sys.stdout.write(f"{'':<32}{'ours':>10}{'baseline':>11}{'ratio':>8}\n")
    with tempfile.TemporaryDirectory() as name:
        try:
            for pair in pairs(Path(name)):
                sys.stdout.write(line(measure(pair, turns, Path(name))) + "\n")
                sys.stdout.flush()
        except subprocess.CalledProcessError as error:
            sys.stderr.write(f"{' '.join(error.cmd)} ended with {error.returncode}\n{error.stderr.decode()}\n")
            return 1
    return 0


if __name__ == "__main__":
    sys.exit(main())
