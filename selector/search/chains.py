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
from selector.search.links import Graph, Links, up_to
from selector.search.lots import NONE
from selector.search.order import cost_key
from selector.search.rows import Line
from selector.search.solve import Lane, Solved

Numbers = NDArray[np.float64]
Truths = NDArray[np.bool_]
SMALLEST_FIGURE = 1e-9  # where a figure of 0 begins to be doubled
UNKNOWN = 1e200  # stands for a cost that is not stated: above all costs, and the sum of several still finite


@dataclass(frozen=True, slots=True)
class Path:
    """A chain by the places of its switched resistors, from the lowest range up, with its figure."""

    figure: float
    switched: tuple[int, ...]


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
        self._costs = _costs(bench, line)
        self._links = Links(bench, solved, self._costs)
        parts = bench.resistors.parts
        self._names = [part.part for part in parts]

    def up_to(
        self, most: float, floor: float = -inf, cost_most: float = inf, *, ordered: bool = True
    ) -> Iterator[Path]:
        """Yield the chains with floor < figure <= most whose gain resistors cost at most `cost_most`.

        In the order of their cost, rounded, then their names; unless `ordered`, one last range after the other.
        """
        lasts = [int(last) for last in np.flatnonzero(up_to(self._solved.figure[0], most))]
        with np.errstate(all="ignore"):
            for some in (lasts,) if ordered else ([last] for last in lasts):
                yield from self._walk([self._links.graph(last, most) for last in some], floor, cost_most)

    def least(self, most: float, cost_most: float) -> float:
        """Return a figure below which no chain costs at most `cost_most`, infinite where none up to `most` does.

        For each last range by halving: the cheapest chain up to a figure gets no dearer when the figure rises.
        """
        figures, best, end = self._solved.figure[0], inf, most
        for last in np.argsort(figures, kind="stable"):
            low, high = float(figures[last]), end
            if not (low <= high and low < inf):
                break
            if not self._within(int(last), high, cost_most):
                continue
            while high > low * (1.0 + 1e-13) and not self._within(int(last), low, cost_most):
                middle = low + (high - low) / 2.0 if high < inf else max(2.0 * low, SMALLEST_FIGURE)
                if middle in (low, high):
                    break
                low, high = (low, middle) if self._within(int(last), middle, cost_most) else (middle, high)
            best, end = min(best, low), min(end, high)
        return best

    def _within(self, last: int, most: float, cost_most: float) -> bool:
        """Return whether a chain to a last range up to a figure costs at most `cost_most`."""
        alone = self._links.last_costs[last]
        if self._inner is None:
            return bool(alone <= cost_most)
        with np.errstate(all="ignore"):
            costs = self._links.inner_costs + self._links.graph(last, most).rest[0]
        return bool(costs.min(initial=inf) + alone <= cost_most)

    def _walk(self, graphs: list[Graph], floor: float, cost_most: float) -> Iterator[Path]:
        heap: list[tuple[tuple[bool, float], tuple[str, ...], int, tuple[int, ...]]] = []
        for number, graph in enumerate(graphs):
            self._extend(heap, graph, number, (), cost_most)
        while heap:
            _, _, number, chain = heapq.heappop(heap)
            graph = graphs[number]
            if len(chain) <= self._depth:
                self._extend(heap, graph, number, chain, cost_most)
                continue
            figure = self._figure(chain)
            if floor < figure:
                yield Path(figure, self._places(chain))

    def _may_hold(self, chain: tuple[int, ...], graph: Graph) -> bool:
        """Return whether a chain, or a longer one, may hold the resistor that its lane needs."""
        needed = self._lane.needed
        if needed == NONE or len(chain) < self._depth:
            return True
        places = [self._switched(chain, place) for place in range(len(chain))]
        return needed in places or needed == int(self._last.switched[0, graph.last])

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
            rest = dear = np.zeros(1)
        else:
            allowed = np.isfinite(graph.rest[depth])
            if chain:
                allowed &= (graph.begins <= chain[-1]) & (chain[-1] < graph.ends)
            longer = [int(one) for one in np.flatnonzero(allowed)]
            rest, dear = graph.rest[depth][allowed], graph.dear[depth][allowed]
        before_ = sum(self._cost(chain, place) for place in range(depth))
        names = tuple(self._name(chain, place) for place in range(depth))
        ending = 0.0 if depth == self._depth else float(self._links.last_costs[graph.last])
        for following, left, most in zip(longer, rest, dear, strict=True):
            whole = (*chain, following)
            so_far = before_ + self._cost(whole, depth) + ending
            cost = so_far + float(left)
            if cost <= cost_most and so_far + float(most) > self._lane.cost_above and self._may_hold(whole, graph):
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
            below = chain[place - 1]
            above = self._links.last_use(here)[below] if place == self._depth else self._links.inner_use(below, here)
            use = max(use, float(above))
        return float(self._links.figures(chain[-1], np.array([use]))[0])


def _costs(bench: Bench, line: Line) -> Numbers:
    """Return the cost of each resistor in a place of the gain network."""
    copies = line.lot.family.law.copies
    return np.array([copies * stated(part.unit_cost, UNKNOWN) for part in bench.resistors.parts] or [0.0])
