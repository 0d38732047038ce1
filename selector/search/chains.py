"""The chains of one row up to a figure, the cheapest first and by name among equals."""

from __future__ import annotations

import heapq
from collections.abc import Iterator
from dataclasses import dataclass
from math import inf

import numpy as np
from numpy.typing import NDArray

from selector.candidate.elementwise import stated
from selector.search.bench import Bench
from selector.search.lots import NONE
from selector.search.order import cost_key
from selector.search.reach import before
from selector.search.rows import Line, Ranges, use_between
from selector.search.solve import Lane, Solved
from selector.search.stacks import Indices, mapped

Numbers = NDArray[np.float64]
Truths = NDArray[np.bool_]
UNKNOWN = 1e200  # stands for a cost that is not stated: above all costs, and the sum of several still finite


@dataclass(frozen=True, slots=True)
class Path:
    """A chain by the places of its switched resistors, from the lowest range up, with its figure."""

    figure: float
    switched: tuple[int, ...]


@dataclass(frozen=True, slots=True)
class Graph:
    """What can follow what, under a last range and a figure: one entry for each layer of inner ranges.

    `begins` and `ends` bound the ranges below each inner range that it may follow; `rest` is the least cost of what
    follows each range up to the last, infinite where the last cannot be reached.
    """

    last: int
    begins: Indices
    ends: Indices
    rest: tuple[Numbers, ...]


class Chains:
    """The chains of a solved row."""

    def __init__(self, bench: Bench, line: Line, solved: Solved, lane: Lane, fixed: float) -> None:
        """Take a row that is solved by itself; `fixed` is the cost of all but its gain resistors, or UNKNOWN."""
        self._bench = bench
        self._solved = solved
        self._last = solved.last
        self._inner = solved.inner
        self._depth = line.lot.range_count - 1
        self._fixed = fixed
        self._lane = lane
        copies = line.lot.family.law.copies
        parts = bench.resistors.parts
        self._costs = np.array([copies * stated(part.unit_cost, UNKNOWN) for part in parts] or [0.0])
        self._names = [part.part for part in parts]

    def up_to(self, most: float, floor: float = -inf, cost_most: float = inf) -> Iterator[Path]:
        """Yield the chains with floor < figure <= most whose gain resistors cost at most `cost_most`.

        In the order of their cost, rounded, then their names; chains that cost the same come by name.
        """
        with np.errstate(all="ignore"):
            yield from self._walk(most, floor, cost_most)

    def least(self, most: float, cost_most: float) -> float:
        """Return a figure below which no chain costs at most `cost_most`, infinite where none up to `most` does."""
        low, high = float(self._solved.least[0]), most
        if self._costs_at_least(high) > cost_most:
            return inf
        for _ in range(60):
            if self._costs_at_least(low) <= cost_most or high <= low * (1.0 + 1e-12):
                break
            middle = low + (high - low) / 2.0 if np.isfinite(high) else max(2.0 * low, 1e-9)
            low, high = (low, middle) if self._costs_at_least(middle) <= cost_most else (middle, high)
        return low

    def _costs_at_least(self, most: float) -> float:
        first = next(self.up_to(most), None)
        return inf if first is None else float(sum(self._costs[list(first.switched)]))

    def _walk(self, most: float, floor: float, cost_most: float) -> Iterator[Path]:
        graphs = [self._graph(int(last), most) for last in np.flatnonzero(_up_to(self._solved.figure[0], most))]
        heap: list[tuple[tuple[bool, float], tuple[str, ...], int, tuple[int, ...]]] = []
        for number, graph in enumerate(graphs):
            self._extend(heap, graph, number, (), cost_most)
        while heap:
            _, _, number, chain = heapq.heappop(heap)
            graph = graphs[number]
            if len(chain) <= self._depth:
                self._extend(heap, graph, number, chain, cost_most)
                continue
            if self._wanted(chain):
                figure = self._figure(chain)
                if floor < figure:
                    yield Path(figure, self._places(chain))

    def _wanted(self, chain: tuple[int, ...]) -> bool:
        """Return whether a chain holds what its lane asks of it."""
        lane, places = self._lane, self._places(chain)
        cost = sum(self._cost(chain, place) for place in range(len(chain)))
        return (lane.needed == NONE or lane.needed in places) and cost > lane.cost_above

    def _places(self, chain: tuple[int, ...]) -> tuple[int, ...]:
        inner = () if self._inner is None else tuple(int(self._inner.switched[0, one]) for one in chain[:-1])
        return (*inner, int(self._last.switched[0, chain[-1]]))

    def _extend(
        self,
        heap: list[tuple[tuple[bool, float], tuple[str, ...], int, tuple[int, ...]]],
        graph: Graph,
        number: int,
        chain: tuple[int, ...],
        cost_most: float,
    ) -> None:
        """Put every longer chain by one range on the heap, with the least cost it can come to."""
        depth = len(chain)
        if depth == self._depth:
            longer = [graph.last]
            rest = np.zeros(1)
        else:
            allowed = np.isfinite(graph.rest[depth])
            if chain:
                allowed &= (graph.begins <= chain[-1]) & (chain[-1] < graph.ends)
            longer = [int(one) for one in np.flatnonzero(allowed)]
            rest = graph.rest[depth][allowed]
        before_ = sum(self._cost(chain, place) for place in range(depth))
        names = tuple(self._name(chain, place) for place in range(depth))
        for following, left in zip(longer, rest, strict=True):
            whole = (*chain, following)
            cost = before_ + self._cost(whole, depth) + float(left)
            if cost <= cost_most:
                cost += self._fixed
                key = cost_key(None if cost >= UNKNOWN else cost)
                heapq.heappush(heap, (key, (*names, self._name(whole, depth)), number, whole))

    def _switched(self, chain: tuple[int, ...], place: int) -> int:
        ranges = self._last if place == self._depth else self._inner
        return NONE if ranges is None else int(ranges.switched[0, chain[place]])

    def _cost(self, chain: tuple[int, ...], place: int) -> float:
        switched = self._switched(chain, place)
        return 0.0 if switched == NONE else float(self._costs[switched])

    def _name(self, chain: tuple[int, ...], place: int) -> str:
        switched = self._switched(chain, place)
        return "" if switched == NONE else self._names[switched]

    def _figure(self, chain: tuple[int, ...]) -> float:
        if self._inner is None:
            return float(self._solved.figure[0, chain[-1]])
        use = float(self._solved.reached[0][0, chain[0]])
        for place, here in enumerate(chain[1:], start=1):
            ranges = self._last if place == self._depth else self._inner
            above = self._above(_some(ranges, np.array([here])), np.array([chain[place - 1]]))
            use = max(use, float(above[0]))
        return float(self._figures(chain[-1], np.array([use]))[0])

    def _figures(self, last: int, use: Numbers) -> Numbers:
        """Return the figures of combinations with a last range by the largest use of their ranges."""
        return np.asarray(self._solved.spent.one(last).figures(self._bench, use[None, :])[0])

    def _above(self, here: Ranges, below: Indices) -> Numbers:
        """Return the use of ranges above inner ones, element by element; one range above several."""
        if self._inner is None:
            return np.zeros(len(below))
        high_a, gain = self._inner.high_a()[:, below], self._inner.gain()[:, below]
        shape = (1, max(here.shape[1], len(below)))
        return np.asarray(use_between(self._bench, here.at.above(high_a, gain), here.error, shape)[0])

    def _graph(self, last: int, most: float) -> Graph:
        if self._inner is None:
            return Graph(last, np.empty(0, dtype=np.int64), np.empty(0, dtype=np.int64), ())
        count = self._inner.shape[1]
        every = np.arange(count)
        allowed = _up_to(self._figures(last, self._above(_some(self._last, np.array([last])), every)), most)
        rest = [np.where(allowed & np.isfinite(self._solved.reached[-1][0]), 0.0, np.inf)]
        ends = before(self._bench, self._inner)[0]
        begins = self._begins(last, most, ends) if self._depth > 1 else ends
        costs = np.array([self._costs[one] if one != NONE else 0.0 for one in self._inner.switched[0]])
        for depth in range(self._depth - 2, -1, -1):
            rest.insert(0, _rest(begins, ends, costs + rest[0], np.isfinite(self._solved.reached[depth][0])))
        lowest = _up_to(self._figures(last, self._solved.reached[0][0]), most)
        rest[0] = np.where(lowest, rest[0], np.inf)
        return Graph(last, begins, ends, tuple(rest))

    def _begins(self, last: int, most: float, ends: Indices) -> Indices:
        """Return for each inner range the first of its row that it may follow."""
        if self._inner is None:
            return ends
        low, high = np.zeros_like(ends), ends.copy()
        while np.any(low < high):
            middle = np.minimum((low + high) // 2, len(ends) - 1)
            stands = _up_to(self._figures(last, self._above(self._inner, middle)), most)
            open_ = low < high
            high = np.where(open_ & stands, middle, high)
            low = np.where(open_ & ~stands, middle + 1, low)
        return np.where(self._inner.stands[0], low, ends)


def _up_to(figure: Numbers, most: float) -> Truths:
    return np.isfinite(figure) & (figure <= most)


def _rest(begins: Indices, ends: Indices, cost: Numbers, reached: Truths) -> Numbers:
    """Return the least cost of what may follow each range: over all i with begins[i] <= place < ends[i]."""
    rest = np.full(len(begins), np.inf)
    for one in np.flatnonzero(np.isfinite(cost) & (begins < ends)):
        part = rest[begins[one] : ends[one]]
        np.minimum(part, cost[one], out=part)
    return np.where(reached, rest, np.inf)


def _some(ranges: Ranges, places: Indices) -> Ranges:
    """Return some ranges of a single row."""
    width = ranges.shape[1]

    def some(array: NDArray[np.float64]) -> NDArray[np.float64]:
        return array[:, places] if array.ndim > 1 and array.shape[1] == width else array

    return Ranges(
        ranges.switched[:, places], mapped(ranges.at, some), ranges.stands[:, places], mapped(ranges.error, some)
    )
