"""Chains of ranges: the least use with which each range can be reached from below."""

from __future__ import annotations

from collections.abc import Callable
from dataclasses import dataclass

import numpy as np
from numpy.typing import NDArray

from selector.search.bench import Bench
from selector.search.rows import Ranges, use_between
from selector.search.stacks import Indices
from selector.search.stretches import doubled, least_between

Numbers = NDArray[np.float64]


@dataclass(frozen=True, slots=True)
class Below:
    """Ranges that may lie below others, by rising upper border, with the least use that reaches each."""

    high_a: Numbers
    gain: Numbers
    reached: Numbers

    @classmethod
    def of(cls, ranges: Ranges, reached: Numbers) -> Below:
        """Return the ranges with what reaches them."""
        return cls(ranges.high_a(), ranges.gain(), reached)


def before(bench: Bench, ranges: Ranges) -> Indices:
    """Return for each range how many of its own row have a lower upper border; all of them where no order is held."""
    rows, count = ranges.shape
    if not bench.ordered:
        return np.full((rows, count), count)
    high_a = ranges.high_a()
    starts = np.zeros((rows, count), dtype=np.int64)
    starts[:, 1:] = np.where(high_a[:, 1:] > high_a[:, :-1], np.arange(1, count)[None, :], 0)
    return np.maximum.accumulate(starts, axis=1)


def below_last(bench: Bench, inner: Ranges, last: Ranges) -> Indices:
    """Return for each last range how many inner ones of its row may lie below it.

    All of them have a larger gain where the last keeps its headroom; else those that do, which end before it.
    """
    if bench.holds_headroom or not bench.ordered:
        return np.full(last.shape, inner.shape[1])
    each = zip(inner.gain(), last.gain(), strict=True)  # gains fall along a row
    return np.stack([np.searchsorted(-below, -here, side="left") for below, here in each])


def reached_above(bench: Bench, below: Below, here: Ranges, end: Indices) -> Numbers:
    """Return the least use with which each range is reached, over the first `end` ranges of its row below it."""
    rows = np.arange(len(end))[:, None]

    def use_from(place: Indices) -> Numbers:
        border = here.at.above(below.high_a[rows, place], below.gain[rows, place])
        return use_between(bench, border, here.error, end.shape)

    return np.where(here.stands, least_larger(below.reached, end, use_from), np.inf)


def least_larger(reached: Numbers, end: Indices, use_from: Callable[[Indices], Numbers]) -> Numbers:
    """Return for each element the least of max(reached[place], use from that place) over the first `end` places.

    `reached` has the shape (rows, places), `end` and the uses (rows, columns). The least that reaches a place or a
    later one rises with the place; the use falls, since a range that begins higher is judged on a part of the same
    span. The least of their maximum is found by halving.
    """
    rows = np.arange(len(end))[:, None]
    table, last = doubled(reached), reached.shape[1] - 1
    low, high = np.zeros_like(end), end.copy()
    best = np.full(end.shape, np.inf)
    open_ = low < high
    while open_.any():
        middle = np.minimum((low + high) // 2, last)
        reach = least_between(table, middle, np.maximum(end, middle + 1), rows)
        use = use_from(middle)
        best = np.where(open_, np.minimum(best, np.maximum(reach, use)), best)
        rises = reach >= use
        high = np.where(open_ & rises, middle, high)
        low = np.where(open_ & ~rises, middle + 1, low)
        open_ = low < high
    return best
