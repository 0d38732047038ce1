"""What can follow what in the chains of one row, under a last range and a figure."""

from __future__ import annotations

from dataclasses import dataclass
from functools import cached_property
from math import inf

import numpy as np
from numpy.typing import NDArray

from selector.search.bench import Bench
from selector.search.lots import NONE
from selector.search.reach import before
from selector.search.rows import Ranges, use_between
from selector.search.solve import Solved
from selector.search.stacks import Indices
from selector.search.stretches import first_place

Numbers = NDArray[np.float64]
Truths = NDArray[np.bool_]
TABLED = 600  # inner ranges of which every one above every other is worked out once; more would fill the memory


@dataclass(frozen=True, slots=True)
class Graph:
    """What can follow what, under a last range and a figure: one entry for each layer of inner ranges.

    `begins` and `ends` bound the ranges below each inner range that it may follow; `rest` is the least cost of what
    follows each range up to the last, infinite where the last cannot be reached; `dear` is the most.
    """

    last: int
    begins: Indices
    ends: Indices
    rest: tuple[Numbers, ...]
    dear: tuple[Numbers, ...]


class Links:
    """The uses of the ranges of a solved row above each other."""

    def __init__(self, bench: Bench, solved: Solved, costs: Numbers) -> None:
        """Take a row that is solved by itself, and the cost of each resistor."""
        self._bench = bench
        self._solved = solved
        self._inner = solved.inner
        self._depth = len(solved.reached)
        self._costs = costs
        self._of_last: dict[int, Numbers] = {}

    @cached_property
    def last_costs(self) -> Numbers:
        """Return the cost of the resistor of each last range."""
        return self._costs_of(self._solved.last)

    @cached_property
    def inner_costs(self) -> Numbers:
        """Return the cost of the resistor of each inner range."""
        return np.zeros(0) if self._inner is None else self._costs_of(self._inner)

    def _costs_of(self, ranges: Ranges) -> Numbers:
        places = ranges.switched[0]
        return np.where(places == NONE, 0.0, self._costs[np.maximum(places, 0)])

    def figures(self, last: int, use: Numbers) -> Numbers:
        """Return the figures of combinations with a last range by the largest use of their ranges."""
        return np.asarray(self._solved.spent.one(last).figures(self._bench, use[None, :])[0])

    def last_use(self, last: int) -> Numbers:
        """Return the use of a last range above each inner one."""
        if self._inner is None:
            return np.zeros(0)
        if last not in self._of_last:
            one = self._solved.last.some(np.array([last]))
            self._of_last[last] = self._above(one, np.arange(self._inner.shape[1]))
        return self._of_last[last]

    def inner_use(self, below: int, here: int) -> float:
        """Return the use of an inner range above another."""
        if self._inner is None:
            return 0.0
        return float(self._above(self._inner.some(np.array([here])), np.array([below]))[0])

    def graph(self, last: int, most: float) -> Graph:
        """Return what can follow what in chains with a figure of at most `most`."""
        if self._inner is None:
            return Graph(last, np.empty(0, dtype=np.int64), np.empty(0, dtype=np.int64), (), ())
        allowed = up_to(self.figures(last, self.last_use(last)), most)
        rest = [np.where(allowed & np.isfinite(self._solved.reached[-1][0]), 0.0, np.inf)]
        begins = self._begins(last, most) if self._depth > 1 else self._ends
        dear = [np.where(np.isfinite(rest[0]), 0.0, -inf)]
        for depth in range(self._depth - 2, -1, -1):
            reached = np.isfinite(self._solved.reached[depth][0])
            least = _over(begins, self._ends, self.inner_costs + rest[0], np.minimum, inf)
            most_ = _over(begins, self._ends, self.inner_costs + dear[0], np.maximum, -inf)
            rest.insert(0, np.where(reached, least, inf))
            dear.insert(0, np.where(reached, most_, -inf))
        lowest = up_to(self.figures(last, self._solved.reached[0][0]), most)
        rest[0] = np.where(lowest, rest[0], np.inf)
        return Graph(last, begins, self._ends, tuple(rest), tuple(dear))

    @cached_property
    def _ends(self) -> Indices:
        return np.zeros(0, dtype=np.int64) if self._inner is None else before(self._bench, self._inner)[0]

    def _begins(self, last: int, most: float) -> Indices:
        """Return for each inner range the first of its row that it may follow."""
        if self._inner is None:
            return self._ends

        def follows(below: Indices) -> Truths:
            return up_to(self.figures(last, self._inner_uses(below)), most)

        begins = first_place(self._ends, follows, len(self._ends) - 1)
        return np.where(self._inner.stands[0], begins, self._ends)

    def _inner_uses(self, below: Indices) -> Numbers:
        """Return the use of each inner range above the one that `below` names for it."""
        if self._inner is None:
            return np.zeros(0)
        if len(below) > TABLED:
            return self._above(self._inner, below)
        return np.asarray(self._table[below, np.arange(len(below))])

    @cached_property
    def _table(self) -> Numbers:
        """The use of each inner range (columns) above each (rows)."""
        if self._inner is None:
            return np.zeros((0, 0))
        border = self._inner.at.above(self._inner.high_a()[0][:, None], self._inner.gain()[0][:, None])
        count = self._inner.shape[1]
        return use_between(self._bench, border, self._inner.error, (count, count))

    def _above(self, here: Ranges, below: Indices) -> Numbers:
        """Return the use of ranges above inner ones, element by element; one range above several."""
        if self._inner is None:
            return np.zeros(len(below))
        high_a, gain = self._inner.high_a()[:, below], self._inner.gain()[:, below]
        shape = (1, max(here.shape[1], len(below)))
        return np.asarray(use_between(self._bench, here.at.above(high_a, gain), here.error, shape)[0])


def up_to(figure: Numbers, most: float) -> Truths:
    """Return which figures there are of at most `most`."""
    return np.isfinite(figure) & (figure <= most)


def _over(begins: Indices, ends: Indices, cost: Numbers, end: np.ufunc, none: float) -> Numbers:
    """Return the least or most cost of what may follow each range: over all i with begins[i] <= place < ends[i]."""
    found = np.full(len(begins), none)
    for one in np.flatnonzero(np.isfinite(cost) & (begins < ends)):
        part = found[begins[one] : ends[one]]
        end(part, cost[one], out=part)
    return found
