"""Wall times of whole processes, ours and a baseline's by turns, and the memory they take."""

from __future__ import annotations

import subprocess
import sys
import tempfile
from collections.abc import Callable, Iterator, Sequence
from dataclasses import dataclass
from pathlib import Path
from typing import IO

from scripts.benchmark.table import Row

LONG_S = 5.0
_WATCH = (sys.executable, "-I", "-S", str(Path(__file__).with_name("watch.py")))
_KIB_IN_A_MB = 1e6 / 1024


@dataclass(frozen=True, slots=True)
class Turn:
    """One run of a process: its wall time in s, and the most memory that it held, in MB."""

    seconds: float
    peak_mb: float


@dataclass(frozen=True, slots=True)
class Run:
    """A process to time: its command, and what has to be cleared away before each turn.

    `less` says from what the process printed which part of the time is not to be counted, s.
    """

    command: Sequence[str]
    prepare: Callable[[], None] = lambda: None
    less: Callable[[bytes], float] = lambda _printed: 0.0

    def turn(self, folder: Path) -> Turn:
        """Return the figures of one turn; raises CalledProcessError where the process fails."""
        self.prepare()
        with (
            tempfile.TemporaryFile() as printed,
            tempfile.TemporaryFile() as errors,
            tempfile.TemporaryFile() as told,
        ):
            watch = [*_WATCH, str(told.fileno()), *self.command]
            done = subprocess.run(
                watch, cwd=folder, check=False, stdout=printed, stderr=errors, pass_fds=(told.fileno(),)
            )
            output, complaint, figures = (_read(file) for file in (printed, errors, told))
        seconds, status, peak_kib = map(float, figures.split()) if done.returncode == 0 else (0.0, done.returncode, 0.0)
        if status != 0:
            raise subprocess.CalledProcessError(int(status), list(self.command), output, complaint)
        return Turn(seconds - self.less(output), peak_kib / _KIB_IN_A_MB)

    def seconds(self, folder: Path) -> float:
        """Return the wall time of one turn, s; raises CalledProcessError where the process fails."""
        return self.turn(folder).seconds


@dataclass(frozen=True, slots=True)
class Pair:
    """What is measured: ours, the baseline, and the rows that either of them works on (0: not counted in rows).

    `goal` is the number of the goal, `most` how many times as long as the baseline ours may take at most, `most_mb` the
    memory that it may hold; None where nothing is wanted. Where the baseline works on another number of rows,
    `baseline_rows`, times are compared row by row.
    """

    name: str
    baseline_name: str
    ours: Run
    baseline: Run
    rows: int = 0
    goal: str = ""
    most: float | None = None
    baseline_rows: int = 0
    most_mb: float | None = None


@dataclass(frozen=True, slots=True)
class Measured:
    """The best of all turns of both sides, s, and the most memory of all turns of ours, MB."""

    pair: Pair
    ours_s: float
    baseline_s: float
    peak_mb: float = 0.0

    @property
    def ratio(self) -> float:
        """Return how many times as long as the baseline ours takes, for each row where the rows are not as many."""
        ratio = self.ours_s / self.baseline_s
        return ratio * self.pair.baseline_rows / self.pair.rows if self.pair.baseline_rows else ratio


def measure(pair: Pair, turns: int, folder: Path) -> Measured:
    """Run both sides by turns, so that a busy machine slows both, and keep the best of each.

    What takes long is not run again: what disturbs it is small beside it.
    """
    ours, baseline = [], []
    for _ in range(turns):
        ours.append(pair.ours.turn(folder))
        baseline.append(pair.baseline.turn(folder))
        if ours[-1].seconds > LONG_S:
            break
    best = min(turn.seconds for turn in ours), min(turn.seconds for turn in baseline)
    return Measured(pair, *best, max(turn.peak_mb for turn in ours))


def rows(measured: Measured) -> Iterator[Row]:
    """Yield a row for the time of a pair, and one for the memory, where there is a goal for it."""
    pair = measured.pair
    reached = f"{measured.ratio:.2f} x {pair.baseline_name} ({measured.ours_s:.3f} s, {measured.baseline_s:.3f} s"
    if pair.rows:
        ours, baseline = pair.rows / measured.ours_s, (pair.baseline_rows or pair.rows) / measured.baseline_s
        reached = f"{measured.ratio:.2f} x {pair.baseline_name} ({ours:.0f} rows/s, {baseline:.0f} rows/s"
    wanted = "" if pair.most is None else f"<= {pair.most:.3g} x"
    yield Row(pair.goal, pair.name, f"{reached})", wanted, None if pair.most is None else measured.ratio <= pair.most)
    if pair.most_mb is not None:
        reached, wanted = f"{measured.peak_mb:.0f} MB", f"<= {pair.most_mb:g} MB"
        yield Row(pair.goal, f"{pair.name}: most memory", reached, wanted, measured.peak_mb <= pair.most_mb)


def _read(file: IO[bytes]) -> bytes:
    file.seek(0)
    return file.read()
