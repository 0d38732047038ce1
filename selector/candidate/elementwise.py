"""The smaller, the larger and the chosen of numbers or arrays, floats stay floats; and a number that may be absent."""

from __future__ import annotations

import numpy as np

from selector.real import Real, Truth


def smaller(first: Real, second: Real) -> Real:
    """Return the smaller of two, element by element."""
    if isinstance(first, float) and isinstance(second, float):
        return min(first, second)
    return np.minimum(first, second)


def larger(first: Real, second: Real) -> Real:
    """Return the larger of two, element by element."""
    if isinstance(first, float) and isinstance(second, float):
        return max(first, second)
    return np.maximum(first, second)


def chosen(condition: Truth, first: Real, second: Real) -> Real:
    """Return `first` where the condition holds, else `second`, element by element."""
    if isinstance(condition, bool):
        return first if condition else second
    return np.where(condition, first, second)


def stated(value: float | None, absent: float) -> float:
    """Return a figure, or what stands for one that is not stated."""
    return absent if value is None else value
