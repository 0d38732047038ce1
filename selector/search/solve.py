"""The least figure of rows: every chain of real ranges over a common resistor, with the filter it takes or a bound."""

from __future__ import annotations

from dataclasses import dataclass
from math import inf

import numpy as np
from numpy.typing import NDArray

from selector.candidate.operating import FilterAt
from selector.search.bench import Bench
from selector.search.ladder import Ladder
from selector.search.lots import NONE
from selector.search.prices import payable
from selector.search.reach import Below, before, below_last, reached_above
from selector.search.rows import Line, Ranges, Spent, first_use, ranges_of, with_filter
from selector.search.screen import usable_of
from selector.search.stacks import Indices

Numbers = NDArray[np.float64]
Truths = NDArray[np.bool_]


@dataclass(frozen=True, slots=True)
class Lane:
    """What is allowed of a row: the resistors of the lowest and of the last range, and the filter that all take.

    `step` is the filter's place on the ladder: one for all ranges, or one for each resistor of a single range; None
    where the filter is still bounded. A `doubtful` lane takes a filter that hangs on stock or cost. The resistor
    `barred` is left out, `needed` is part of every combination; gain resistors cost more than `cost_above` and at
    most `cost_most`.
    """

    first: Truths | None = None
    last: Truths | None = None
    step: Indices | None = None
    doubtful: bool = False
    barred: int = NONE
    needed: int = NONE
    cost_above: float = -inf
    cost_most: float = inf


@dataclass(frozen=True, slots=True)
class Solved:
    """Rows with the least figure of their combinations by last range (rows, columns), and of each row.

    `use` is the least error use of the combinations of a last range, `spent` what it uses besides.
    `reached` holds the least use that reaches each inner range, by number of ranges; `steps` the filter that each
    lowest range takes by itself, where that is known.
    """

    inner: Ranges | None
    last: Ranges
    reached: tuple[Numbers, ...]
    use: Numbers
    spent: Spent
    figure: Numbers
    least: Numbers
    steps: Indices | None


def solve(bench: Bench, line: Line, lanes: list[Lane]) -> Solved:
    """Return the least figures of rows, one lane each; all lanes have a filter, or none has."""
    with np.errstate(all="ignore"):
        usable = _unbarred(usable_of(bench, line), lanes)
        affords = payable(bench, line)
        usable = usable if affords is None else usable & affords
        last = ranges_of(bench, line, _narrowed(usable, [lane.last for lane in lanes]), last=True)
        if line.lot.range_count == 1:
            return _single(bench, line, lanes, last)
        inner = ranges_of(bench, line, usable, last=False)
        lowest = _allowed([lane.first for lane in lanes], inner)
        below, above, steps = _filters(bench, line, lanes, (inner, last), lowest)
        inner, last = with_filter(bench, inner, below), with_filter(bench, last, above)
        reached = [np.where(lowest, first_use(bench, inner), np.inf)]
        end = before(bench, inner)
        for _ in range(line.lot.range_count - 2):
            reached.append(reached_above(bench, Below.of(inner, reached[-1]), inner, end))
        use = reached_above(bench, Below.of(inner, reached[-1]), last, below_last(bench, inner, last))
        spent, figure = _figures(bench, last, use)
    return Solved(inner, last, tuple(reached), use, spent, figure, figure.min(axis=1), steps)


def _figures(bench: Bench, last: Ranges, use: Numbers) -> tuple[Spent, Numbers]:
    """Return what last ranges spend, and the figures of combinations; what cannot be worked out is out."""
    spent = Spent.of(bench, last)
    figure = spent.figures(bench, use)
    return spent, np.where(np.isnan(figure), np.inf, figure)


def _single(bench: Bench, line: Line, lanes: list[Lane], last: Ranges) -> Solved:
    """Return the figures of designs with one range."""
    ladder, steps = bench.ladder, None
    filters: FilterAt | None = None
    if bench.needs_filter and ladder is not None:
        if lanes[0].step is not None:
            steps = _of_each(lanes, last)
        elif line.lot.family.alone:
            steps = ladder.steps(last.at)
        filters = ladder.own(last.at) if steps is None else _single_filters(ladder, lanes, last, steps)
        if steps is not None:
            last = Ranges(last.switched, last.at, last.stands & (steps < len(ladder)))
    last = with_filter(bench, last, filters)
    use = first_use(bench, last)
    spent, figure = _figures(bench, last, use)
    return Solved(None, last, (), use, spent, figure, figure.min(axis=1), steps)


def _single_filters(ladder: Ladder, lanes: list[Lane], last: Ranges, steps: Indices) -> FilterAt:
    steps = np.minimum(steps, len(ladder) - 1)
    if any(lane.step is None or lane.doubtful for lane in lanes):
        return ladder.best_from(steps)
    return last.at.with_filter(ladder.figures(steps)).filter


def _filters(
    bench: Bench, line: Line, lanes: list[Lane], ranges: tuple[Ranges, Ranges], lowest: Truths
) -> tuple[FilterAt | None, FilterAt | None, Indices | None]:
    """Return the filters of inner and last ranges, or bounds of them, and the one each lowest range takes."""
    ladder, (inner, last) = bench.ladder, ranges
    if not bench.needs_filter or ladder is None:
        return None, None, None
    if lanes[0].step is not None:
        step = np.array([int(lane.step) for lane in lanes if lane.step is not None])[:, None]
        figures = ladder.figures(step)
        return inner.at.with_filter(figures).filter, last.at.with_filter(figures).filter, None
    if not line.lot.family.alone:
        return ladder.own(inner.at), ladder.own(last.at), None
    steps = np.where(inner.stands & lowest, ladder.steps(inner.at), len(ladder))
    best = ladder.best_from(np.minimum(steps.min(axis=1), len(ladder) - 1)[:, None])
    return best, best, steps


def _unbarred(usable: Truths, lanes: list[Lane]) -> Truths:
    barred = np.array([lane.barred for lane in lanes])
    if (barred == NONE).all():
        return usable
    rows = np.broadcast_to(usable, (len(lanes), usable.shape[-1])).copy()
    rows[barred != NONE, barred[barred != NONE]] = False
    return rows


def _narrowed(usable: Truths, each: list[Truths | None]) -> Truths:
    if all(one is None for one in each):
        return usable
    every = np.ones(usable.shape[-1], dtype=bool)
    return np.asarray(usable & np.stack([every if one is None else one for one in each]))


def _allowed(each: list[Truths | None], ranges: Ranges) -> Truths:
    if all(one is None for one in each):
        return ranges.stands
    every = np.ones(ranges.shape[1], dtype=bool)
    rows = [every if one is None else one[ranges.switched[row]] for row, one in enumerate(each)]
    return np.asarray(ranges.stands & np.stack(rows))


def _of_each(lanes: list[Lane], last: Ranges) -> Indices:
    each = [lane.step for lane in lanes if lane.step is not None]
    return np.stack(
        [
            np.broadcast_to(step, (1,)) if step.ndim == 0 else step[np.maximum(last.switched[row], 0)]
            for row, step in enumerate(each)
        ]
    )
