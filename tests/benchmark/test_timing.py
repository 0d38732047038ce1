"""Times and memory of processes, and what is said of them beside their goals."""

from __future__ import annotations

import subprocess
import sys
from pathlib import Path

import pytest

from scripts.benchmark.table import Row, line
from scripts.benchmark.timing import LONG_S, Measured, Pair, Run, measure, rows

NOTHING = Run((sys.executable, "-c", ""))


def test_memory_of_a_process_is_its_own(tmp_path: Path) -> None:
    """What a process holds is measured, and not what the one that starts it does: here at least 400 MB."""
    held = b"x" * 400_000_000
    large = Run((sys.executable, "-c", "bytearray(200_000_000)")).turn(tmp_path)
    small = NOTHING.turn(tmp_path)
    assert len(held) > 0
    assert small.peak_mb < 100
    assert 200 < large.peak_mb < 300
    assert 0.0 < small.seconds < 10.0


def test_what_is_printed_may_say_what_not_to_count(tmp_path: Path) -> None:
    """Time that a process itself tells is taken off; one that fails is an error."""
    told = Run((sys.executable, "-c", "print(1000)"), less=float)
    assert told.seconds(tmp_path) < 0.0
    failing = "import sys; print('out'); sys.exit('err')"
    with pytest.raises(subprocess.CalledProcessError) as caught:
        Run((sys.executable, "-c", failing)).turn(tmp_path)
    error = caught.value
    assert (error.returncode, error.cmd[-1], error.stdout, error.stderr) == (1, failing, b"out\n", b"err\n")


def test_command_that_is_not_there_is_an_error(tmp_path: Path) -> None:
    """A command that cannot be started is told from one that took no time."""
    with pytest.raises(subprocess.CalledProcessError):
        Run((str(tmp_path / "nothing"),)).turn(tmp_path)


def test_ratio_is_row_by_row_where_rows_differ() -> None:
    """Ten times the rows in five times the time is half the time a row, and goals are judged by that."""
    pair = Pair("a", "b", NOTHING, NOTHING, rows=100, goal="7", most=0.5, baseline_rows=10, most_mb=50.0)
    assert list(rows(Measured(pair, 5.0, 1.0, 40.0))) == [
        Row("7", "a", "0.50 x b (20 rows/s, 10 rows/s)", "<= 0.5 x", met=True),
        Row("7", "a: most memory", "40 MB", "<= 50 MB", met=True),
    ]
    assert [row.met for row in rows(Measured(pair, 5.1, 1.0, 51.0))] == [False, False]


def test_nothing_is_answered_where_nothing_is_wanted() -> None:
    """A pair without a goal says the times, and neither yes nor no."""
    (row,) = rows(Measured(Pair("a", "b", NOTHING, NOTHING), 5.0, 2.0))
    assert row == Row("", "a", "2.50 x b (5.000 s, 2.000 s)")


def test_rows_stand_in_columns() -> None:
    """What was wanted, and whether it is reached, stand in the same columns whatever stands before them."""
    first, second = (
        line(Row("2", "x", "1 x", "<= 2 x", met=True)),
        line(Row("10", "a name", "3 x", "<= 2 x", met=False)),
    )
    assert first.endswith("  yes")
    assert second.endswith("  NO")
    assert first.index("<= 2 x") == second.index("<= 2 x")


def test_both_sides_are_measured(tmp_path: Path) -> None:
    """The best of all turns is kept of either side."""
    measured = measure(Pair("a", "b", NOTHING, NOTHING), 2, tmp_path)
    assert measured.ours_s > 0.0
    assert measured.baseline_s > 0.0


def test_what_takes_long_is_run_once(tmp_path: Path) -> None:
    """A process that takes longer than a few seconds has one turn only; the others have as many as is said."""
    turns = []
    for told_s, expected in ((-2 * LONG_S, 1), (0.0, 3)):
        turns.clear()
        run = Run(NOTHING.command, lambda: turns.append(1), lambda _, s=told_s: s)
        measure(Pair("a", "b", run, NOTHING), 3, tmp_path)
        assert len(turns) == expected
