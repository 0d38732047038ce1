"""A row, taken apart by the filter that its ranges take."""

from __future__ import annotations

from collections.abc import Iterator

import numpy as np
from numpy.typing import NDArray

from selector.search.bench import Bench
from selector.search.doubts import Doubts
from selector.search.ladder import Ladder
from selector.search.rows import Line
from selector.search.solve import Lane, Solved
from selector.search.stacks import Indices

Numbers = NDArray[np.float64]
Truths = NDArray[np.bool_]


def lanes_of(bench: Bench, line: Line, solved: Solved, most: float) -> Iterator[Lane]:
    """Yield the lanes of a row of one range or more that could hold a figure of `most` or less.

    Each takes one filter, or is doubtful: then its figure stays a bound, and the filter is chosen when a design is
    judged.
    """
    ladder = bench.ladder
    if ladder is None:
        return
    if solved.inner is None:
        yield from _single(bench, line, solved, ladder, most)
        return
    doubts = Doubts.of(bench, line)
    reached = solved.reached[0][0]
    first = np.flatnonzero(_promising(bench, solved, most) & np.isfinite(reached))
    if solved.steps is not None:
        steps = solved.steps[0]
        for step in sorted(set(steps[first].tolist())):
            if step < len(ladder):
                lowest = _marked(bench, solved.inner.switched[0][first[steps[first] == step]])
                yield from doubts.lanes(Lane(lowest, None, np.array(step)))
        return
    last = np.flatnonzero(solved.figure[0] <= most)
    for place in first:
        first_place = np.array([place])
        steps = ladder.choices(solved.inner.some(first_place).at, solved.last.some(last).at)
        lowest = _marked(bench, solved.inner.switched[0][first_place])
        for step in sorted(set(steps.tolist())):
            if step < len(ladder):
                highest = _marked(bench, solved.last.switched[0][last[steps == step]])
                yield from doubts.lanes(Lane(lowest, highest, np.array(step)))


def _single(bench: Bench, line: Line, solved: Solved, ladder: Ladder, most: float) -> Iterator[Lane]:
    """Yield designs with one range: each of its resistors with the filter it takes, and those in doubt apart."""
    last = np.flatnonzero(solved.figure[0] <= most)
    switched = np.maximum(solved.last.switched[0], 0)
    steps = np.full(max(1, len(bench.resistors)), len(ladder))
    certain, doubted = (np.zeros(len(steps), dtype=bool) for _ in range(2))
    doubts = Doubts.of(bench, line)
    for place in last:
        if solved.steps is None:
            one = solved.last.some(np.array([place])).at
            step = int(ladder.choices(one, one)[0])
        else:
            step = int(solved.steps[0, place])
        if step < len(ladder):
            resistor = int(switched[place])
            steps[resistor] = step
            (doubted if doubts.of_single(step, int(solved.last.switched[0, place])) else certain)[resistor] = True
    if certain.any():
        yield Lane(None, certain, steps)
    if doubted.any():
        yield Lane(None, doubted, steps if line.lot.family.alone else None, doubtful=True)


def _promising(bench: Bench, solved: Solved, most: float) -> Truths:
    """Return which lowest ranges could be part of a combination with a figure of `most` or less."""
    lowest = solved.reached[0][0][:, None]
    figure = solved.spent.figures(bench, np.maximum(lowest, solved.use[0][None, :]))
    return np.asarray(figure.min(axis=1) <= most)


def _marked(bench: Bench, places: Indices) -> Truths:
    marks = np.zeros(max(1, len(bench.resistors)), dtype=bool)
    marks[places] = True
    return marks
