"""The table of goals: what is measured in processes of their own, and what counts as reached."""

from __future__ import annotations

import subprocess
from math import inf
from typing import TYPE_CHECKING

import pytest

from scripts.benchmark.__main__ import arguments
from scripts.benchmark.case import Case, Outcome, case_of
from scripts.benchmark.catalogue import Sizes
from scripts.benchmark.goals import YARDSTICK, rows
from scripts.benchmark.runner import Runner
from scripts.benchmark.table import line

if TYPE_CHECKING:
    from collections.abc import Callable

TINY = Sizes(3, 6, 1, 8, 3)


class Told(Runner):
    """A runner that is told what comes of each case."""

    outcome: Callable[[Case], Outcome]

    def of(self, case: Case) -> Outcome:
        """Return what is told, and remember it."""
        self.outcomes[case] = Outcome(2.0, 50.0, 2_000_000, 9) if case.yardstick else self.outcome(case)
        return self.outcomes[case]


def _told(outcome: Callable[[Case], Outcome]) -> Told:
    told = Told(1)
    told.outcome = outcome
    return told


def test_goals_are_reached_by_a_fast_search() -> None:
    """Where every case takes a second and little memory, every goal from 2 to 8 is reached, and none is left out."""
    found = list(rows(_told(lambda _: Outcome(1.0, 90.0, 10**19, 5)), full=True))
    assert {row.goal for row in found} == {"", "2", "3", "4", "5", "6", "7", "8"}
    assert all(row.met for row in found if row.goal)
    assert all(row.met is None and not row.wanted for row in found if not row.goal)


def test_no_goal_is_reached_by_a_search_that_does_not_end() -> None:
    """Where no case ends within its time, no goal is reached but that of memory, and the table says how long it ran."""
    found = list(rows(_told(lambda _: Outcome(inf, 90.0, 0, 0))))
    assert not any(row.met for row in found if row.goal not in ("", "8"))
    assert "not within 600 s" in " ".join(map(line, found))


def test_goal_is_missed_just_above_its_figure() -> None:
    """The time of the larger against that of the smaller decides: 20 x the time is within 20 x, 20.1 x is not."""
    for seconds, met in ((20.0, True), (20.1, False)):
        many = Sizes(500, 200)
        told = _told(lambda case, s=seconds, m=many: Outcome(s if case.sizes == m else 1.0, 90.0, 10**19, 5))
        row = next(row for row in rows(told) if "the pairs" in row.name)
        assert row.met is met


def test_case_is_the_one_that_its_arguments_stand_for() -> None:
    """A case goes through its command line unchanged."""
    for case in (Case(), YARDSTICK, Case("tight", 2, TINY, near=True, top=0)):
        assert case_of(case.arguments()) == case


def test_runner_measures_a_search_and_the_yardstick() -> None:
    """Both run in a fresh interpreter, tell time, memory and count, and find the same pairs with one range."""
    runner = Runner(1)
    ours, theirs = Case("loose", 1, TINY, top=0), Case("loose", 1, TINY, yardstick=True)
    first, second = runner.of(ours), runner.of(theirs)
    assert first.nominal == second.nominal > 1000
    assert first.found == second.found > 0
    assert 10.0 < first.peak_mb < 1000.0
    assert 0.0 < first.seconds < 60.0
    assert runner.of(ours) is first


def test_runner_stops_a_case_that_takes_too_long() -> None:
    """A case beyond its time has an infinite time and the memory it had so far."""
    outcome = Runner(1, limit_s=0.05).of(Case("loose", 1, TINY))
    assert outcome.seconds == inf
    assert outcome.peak_mb > 0.0


def test_runner_tells_a_case_that_fails() -> None:
    """A case that fails of itself is no slow one: its error comes through."""
    with pytest.raises(subprocess.CalledProcessError):
        Runner(1).of(Case("loose", 9, TINY))


def test_parts_of_the_run_can_be_chosen() -> None:
    """`--only` names parts and may be repeated; without it there is none to leave out."""
    assert arguments([]).only is None
    assert arguments(["--only", "search", "--only", "methods", "--turns", "2"]).only == ["search", "methods"]
    assert arguments(["--turns", "2"]).turns == 2
