"""Chains of ranges over one common resistor: their least figure, and every chain up to a figure."""

from __future__ import annotations

from dataclasses import dataclass
from functools import cached_property
from itertools import pairwise

import numpy as np

from selector.search.bench import Bench
from selector.search.nodes import Indices, Judged, Numbers, links


@dataclass(frozen=True, slots=True)
class Paths:
    """Chains as rows of gain resistors, from the first range to the last, with the figure of each."""

    switched: Indices  # shape (chains, ranges)
    figure: Numbers  # shape (chains,)


class Layers:
    """The ranges of each number, first to last, that share a common resistor, and the links between them.

    A chain's error use is the largest use of its ranges; a range's use depends on the range below alone. So the
    least use with which a range can be reached follows from the layer below it, and a chain whose remaining part
    cannot stay under a figure is given up at once. Nothing is rounded and nothing that could fit is dropped.
    """

    def __init__(self, bench: Bench, burden: float, first_use: Numbers, layers: tuple[Judged, ...]) -> None:
        """Take the layers; `first_use` is the use of each first range, which begins at the least current."""
        self._bench = bench
        self._burden = burden
        self._first_use = first_use
        self._layers = layers

    @cached_property
    def _links(self) -> list[Numbers]:
        """The use of each range (columns) above each range of the layer below (rows)."""
        tables: list[Numbers] = []
        for below, here in pairwise(self._layers):
            under, at = below.nodes.at, here.nodes.at
            border = at.above(np.reshape(under.high_a, (-1, 1)), np.reshape(under.gain, (-1, 1)))
            shape = (len(below.nodes), len(here.nodes))
            tables.append(links(self._bench, border, here.error, shape))
        return tables

    @cached_property
    def _reached(self) -> list[Numbers]:
        """The least use with which each range of each layer can be reached."""
        reached = [self._first_use]
        for table in self._links:
            if table.size == 0:
                reached.append(np.full(table.shape[1], np.inf))
            else:
                reached.append(np.min(np.maximum(reached[-1][:, None], table), axis=0))
        return reached

    def least(self) -> float:
        """Return the least figure of all chains, infinite where there is none."""
        figures = self._figures(self._reached[-1])
        return float(figures.min()) if figures.size else np.inf

    def _figures(self, use: Numbers) -> Numbers:
        last = self._layers[-1]
        return self._bench.figure(last.power, self._burden, last.headroom, use)

    def up_to(self, most: float) -> Paths:
        """Return every chain whose figure is at most `most`, in no particular order."""
        last = self._layers[-1]
        ends = np.flatnonzero(self._figures(self._reached[-1]) <= most)
        rows = ends[:, None]
        use = np.zeros(len(ends))
        for depth in range(len(self._links) - 1, -1, -1):
            heads, top = rows[:, 0], rows[:, -1]
            so_far = np.maximum(self._links[depth][:, heads], use[None, :])
            bound = np.maximum(so_far, self._reached[depth][:, None])
            figure = self._bench.figure(last.power[top][None, :], self._burden, last.headroom[top][None, :], bound)
            below, chains = np.nonzero(figure <= most)
            rows = np.concatenate([below[:, None], rows[chains]], axis=1)
            use = so_far[below, chains]
        use = np.maximum(use, self._first_use[rows[:, 0]])
        top = rows[:, -1]
        figure = self._bench.figure(last.power[top], self._burden, last.headroom[top], use)
        columns = [layer.nodes.switched[rows[:, depth]] for depth, layer in enumerate(self._layers)]
        return Paths(np.stack(columns, axis=1), figure)
