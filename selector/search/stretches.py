"""Stretches of an array, asked for their least, and places found by halving."""

from __future__ import annotations

from collections.abc import Callable

import numpy as np
from numpy.typing import NDArray

from selector.search.stacks import Indices

Numbers = NDArray[np.float64]
Truths = NDArray[np.bool_]


def doubled(values: Numbers) -> Numbers:
    """Return the least of 1, 2, 4 … neighbours from each place of the last axis on, of shape (levels, *shape)."""
    table = [values]
    width = 1
    while 2 * width <= values.shape[-1]:
        wider = np.full(values.shape, np.inf)
        wider[..., :-width] = np.minimum(table[-1][..., :-width], table[-1][..., width:])
        table.append(wider)
        width *= 2
    return np.stack(table)


def least_between(table: Numbers, begin: Indices, end: Indices, *rows: Indices) -> Numbers:
    """Return the least of values[*rows, begin:end], element by element, from what `doubled` gives; none is empty."""
    level = np.frexp((end - begin).astype(float))[1] - 1
    return np.asarray(np.minimum(table[(level, *rows, begin)], table[(level, *rows, end - (1 << level))]))


def first_place(end: Indices, stands: Callable[[Indices], Truths], last: int) -> Indices:
    """Return for each element the first place that stands, `end` where none before it does.

    Of places that come after one that stands, all stand. `stands` is asked for one place of each element, none beyond
    `last`.
    """
    low, high = np.zeros_like(end), end.copy()
    open_ = low < high
    while open_.any():
        middle = np.minimum((low + high) // 2, last)
        serves = stands(middle)
        high = np.where(open_ & serves, middle, high)
        low = np.where(open_ & ~serves, middle + 1, low)
        open_ = low < high
    return low
