"""Wall times of whole processes, ours and a baseline's by turns."""

from __future__ import annotations

import subprocess
import time
from collections.abc import Callable, Sequence
from dataclasses import dataclass
from pathlib import Path


@dataclass(frozen=True, slots=True)
class Run:
    """A process to time: its command, and what has to be cleared away before each turn."""

    command: Sequence[str]
    prepare: Callable[[], None] = lambda: None

    def seconds(self, folder: Path) -> float:
        """Return the wall time of one turn, s; raises CalledProcessError where the process fails."""
        self.prepare()
        begin = time.perf_counter()
        subprocess.run(self.command, cwd=folder, check=True, capture_output=True)
        return time.perf_counter() - begin


@dataclass(frozen=True, slots=True)
class Pair:
    """What is measured: ours, the baseline, and the rows that either of them works on (0: not counted in rows)."""

    name: str
    baseline_name: str
    ours: Run
    baseline: Run
    rows: int = 0


@dataclass(frozen=True, slots=True)
class Measured:
    """The best of all turns of both sides, s."""

    pair: Pair
    ours_s: float
    baseline_s: float

    @property
    def ratio(self) -> float:
        """Return how many times as long as the baseline ours takes."""
        return self.ours_s / self.baseline_s


def measure(pair: Pair, turns: int, folder: Path) -> Measured:
    """Run both sides by turns, so that a busy machine slows both, and keep the best of each."""
    ours, baseline = [], []
    for _ in range(turns):
        ours.append(pair.ours.seconds(folder))
        baseline.append(pair.baseline.seconds(folder))
    return Measured(pair, min(ours), min(baseline))
