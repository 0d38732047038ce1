"""The least use with which ranges are reached from below, against plain loops."""

from __future__ import annotations

from dataclasses import replace
from random import Random
from typing import TYPE_CHECKING

import numpy as np
import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

from selector.budget import combined
from selector.limits import LinkCheck, PointCheck, use_of, worst_point
from selector.search.bench import ALL_LIMITS
from selector.search.blocked import RANKED
from selector.search.reach import before, least_larger
from selector.search.solve import Lane, solve
from selector.search.stacks import mapped
from tests.search.lines import lines, loose

if TYPE_CHECKING:
    from collections.abc import Iterator

    from numpy.typing import NDArray

    from selector.candidate import Operating
    from selector.search.bench import Bench
    from selector.search.rows import Line, Ranges
    from selector.search.solve import Solved

    Numbers = NDArray[np.float64]

USES = st.sampled_from((0.0, 0.5, 1.0, 1.0, 2.0, 3.0, np.inf))
SEEDS = range(40)
LINES = 3  # of each catalogue


@st.composite
def tables(draw: st.DrawFn) -> tuple[Numbers, NDArray[np.int64], Numbers]:
    """Return what reaches places, (rows, places), how many of them count and uses that fall with the place."""
    rows, places, columns = (draw(st.integers(1, most)) for most in (2, 9, 3))
    reached = draw(st.lists(USES, min_size=rows * places, max_size=rows * places))
    end = draw(st.lists(st.integers(0, places), min_size=rows * columns, max_size=rows * columns))
    uses = draw(st.lists(USES, min_size=rows * columns * places, max_size=rows * columns * places))
    falling = -np.sort(-np.array(uses).reshape(rows, columns, places), axis=2)
    return np.array(reached).reshape(rows, places), np.array(end).reshape(rows, columns), falling


@given(tables())
@settings(max_examples=300, deadline=None, derandomize=True)
def test_least_larger_is_the_least_over_all_places(table: tuple[Numbers, NDArray[np.int64], Numbers]) -> None:
    """Halving finds what trying every place finds, with equal values, infinite ones and no place at all."""
    reached, end, uses = table

    def use_from(place: NDArray[np.int64]) -> Numbers:
        return np.take_along_axis(uses, place[:, :, None], axis=2)[:, :, 0]

    plain = np.full(end.shape, np.inf)
    for row, column in np.ndindex(*end.shape):
        for place in range(end[row, column]):
            plain[row, column] = min(plain[row, column], max(reached[row, place], uses[row, column, place]))
    np.testing.assert_array_equal(least_larger(reached, end, use_from), plain)


def _solved(seed: int, *, lifted: bool = False) -> Iterator[tuple[Bench, Line, Solved]]:
    """Yield rows of two and three ranges with one filter; `lifted` holds no limit that a score weighs."""
    bench, random = loose(seed, (8, 14), 3, headroom=0.5 if lifted else 0.05), Random(seed)
    if bench.ladder is None:
        return
    bench = replace(bench, held=ALL_LIMITS - RANKED) if lifted else bench
    every = list(lines(bench, random, range(2, 4)))
    for line in random.sample(every, min(LINES, len(every))):
        step = random.randrange(len(bench.ladder or ()))
        yield bench, line, solve(bench, line, [Lane(step=np.array(step))])


def _each(ranges: Ranges) -> list[Operating]:
    """Return the ranges of a single row in plain numbers."""
    shape = ranges.shape
    return [
        mapped(ranges.at, lambda array, place=place: float(np.broadcast_to(array, shape)[0, place]))
        for place in range(shape[1])
    ]


def _use(bench: Bench, at: Operating) -> float:
    """Return the use of a range that knows what lies below it, infinite where a held limit is not met."""
    point = worst_point(at, combined(at))
    for check in (check for limit in bench.limits for check in limit.checks):
        measure = check.measure(at) if isinstance(check, LinkCheck) else None
        if (measure is not None and not measure.meets) or (isinstance(check, PointCheck) and not point.meets):
            return np.inf
    return float(use_of(point))


def _reached(bench: Bench, below: list[Operating], reached: Numbers, here: Ranges) -> Numbers:
    """Return the least use that reaches each range from any other one, tried one by one."""
    plain = np.full(here.shape[1], np.inf)
    for place, at in enumerate(_each(here)):
        for one, use in zip(below, reached, strict=True):
            if np.isfinite(use) and here.stands[0, place]:
                plain[place] = min(plain[place], max(use, _use(bench, at.above(one.high_a, one.gain))))
    return plain


def _check_reached(bench: Bench, solved: Solved) -> int:
    """Compare what reaches every range of a row with plain loops; return how many are reached."""
    assert solved.inner is not None
    inner = _each(solved.inner)
    first = [_use(bench, at) if stands else np.inf for at, stands in zip(inner, solved.inner.stands[0], strict=True)]
    np.testing.assert_allclose(solved.reached[0][0], first, rtol=1e-9)
    for below, found in zip(solved.reached, solved.reached[1:], strict=False):
        np.testing.assert_allclose(found[0], _reached(bench, inner, below[0], solved.inner), rtol=1e-9)
    use = _reached(bench, inner, solved.reached[-1][0], solved.last)
    np.testing.assert_allclose(solved.use[0], use, rtol=1e-9)
    return int(np.isfinite(use).sum())


@pytest.mark.parametrize("seed", SEEDS)
def test_ranges_are_reached_as_a_plain_loop_finds(seed: int) -> None:
    """The least use that reaches each range of real resistors, equal ones too, is that of trying all below it.

    Tolerance: 1e-9, far above the rounding of arrays against plain numbers.
    """
    for bench, _, solved in _solved(seed):
        _check_reached(bench, solved)


@pytest.mark.parametrize("seed", SEEDS)
def test_ranges_are_reached_as_a_plain_loop_finds_without_headroom(seed: int) -> None:
    """The same where headroom is not held, so that a last range may have a larger gain than one below it.

    Tolerance: 1e-9, far above the rounding of arrays against plain numbers.
    """
    for bench, _, solved in _solved(seed, lifted=True):
        _check_reached(bench, solved)


def test_rows_reach_their_last_ranges() -> None:
    """The catalogues of these tests have many rows that are reached, with either limits."""
    for lifted in (False, True):
        counts = [np.isfinite(solved.use).sum() for seed in SEEDS for _, _, solved in _solved(seed, lifted=lifted)]
        assert sum(count > 0 for count in counts) > 20


@pytest.mark.parametrize("seed", SEEDS)
def test_ranges_before_another_have_a_lower_border(seed: int) -> None:
    """Of each row those before a range are exactly those whose upper border is lower; equal ones are not."""
    for bench, _, solved in _solved(seed):
        assert solved.inner is not None
        high_a = solved.inner.high_a()[0]
        rises = np.diff(high_a) >= 0.0
        assert rises[: np.argmin(rises)].all() if not rises.all() else True
        count = int(solved.inner.stands[0].nonzero()[0].max(initial=-1)) + 1
        found = before(bench, solved.inner)[0]
        assert found[:count].tolist() == [int((high_a[:count] < one).sum()) for one in high_a[:count]]
