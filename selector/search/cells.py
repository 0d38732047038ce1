"""How finely a bound looks: cells of an inner range's upper border, and of a last range's gain."""

from __future__ import annotations

from dataclasses import dataclass
from functools import cached_property

import numpy as np
from numpy.typing import NDArray

from selector.budget import allowed_a, allowed_at, breaks
from selector.candidate import Conditions
from selector.search.interval import Interval

Numbers = NDArray[np.float64]
ROOM = 1e-9  # cells overlap by this much, so that rounding leaves no gap between them
LEAST_SHARE = 1.0 / 30.0  # of the largest gain of a last range; the cell below it reaches down to any gain
MOST_SHARE = 1e3  # where headroom is not held; the cell above it reaches up to any gain


@dataclass(frozen=True)
class Cells:
    """How finely currents and gains are cut: inner ranges by their upper border, last ranges by their gain."""

    conditions: Conditions
    inner: int
    last: int
    holds_headroom: bool

    @cached_property
    def borders_a(self) -> Numbers:
        """Return the edges of the cells of an inner range's upper border, A."""
        least, most = self.conditions.current_min_a, self.conditions.current_max_a
        return least * (most / least) ** np.linspace(0.0, 1.0, self.inner + 1)

    @cached_property
    def allowed_a(self) -> Numbers:
        """Return the most that is allowed anywhere in each of these cells, A."""
        edges = self.borders_a
        most = np.maximum(allowed_at(self.conditions, edges[:-1]), allowed_at(self.conditions, edges[1:]))
        for at_a, below, above in breaks(self.conditions):
            inside = (edges[:-1] <= at_a) & (at_a <= edges[1:])
            for band in (below, above):
                most = np.where(inside, np.maximum(most, allowed_a(band, at_a)), most)
        return np.asarray(most)

    @cached_property
    def shares(self) -> Interval:
        """Return the cells of a last range's gain, as shares of the gain that leaves the least headroom."""
        edges = LEAST_SHARE ** np.linspace(1.0, 0.0, self.last)
        if not self.holds_headroom:
            edges = np.concatenate([edges, MOST_SHARE ** np.linspace(0.1, 1.0, 10)])
        low, high = np.concatenate([[0.0], edges[:-1]]), edges.copy()
        if not self.holds_headroom:
            low, high = np.append(low, edges[-1]), np.append(high, np.inf)
        return Interval(low[None, :] * (1.0 - ROOM), high[None, :] * (1.0 + ROOM))
