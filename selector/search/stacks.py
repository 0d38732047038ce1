"""The figures of many parts as arrays, and rows of them side by side."""

from __future__ import annotations

from collections.abc import Callable, Sequence
from dataclasses import fields, is_dataclass
from typing import TypeVar, cast

import numpy as np
from numpy.typing import NDArray

from selector.candidate import Conditions
from selector.search.interval import Interval, lower

Held = TypeVar("Held")
Indices = NDArray[np.int64]
Change = Callable[[NDArray[np.float64]], NDArray[np.float64]]


def stacked(each: Sequence[Held]) -> Held:
    """Return the figures of several parts as one object with arrays of shape (len(each),), at any depth.

    What is no number is taken from the first.
    """
    first = each[0]
    if isinstance(first, float):
        return cast("Held", np.array(each))
    names = _names(type(first))
    if not names:
        return first
    return _made(first, [stacked([getattr(one, name) for one in each]) for name in names])


def columns(held: Held, index: Indices) -> Held:
    """Return some rows of stacked figures as arrays of shape (len(index), 1)."""
    return mapped(held, lambda array: array[index][:, None])


def taken(held: Held, index: Indices) -> Held:
    """Return elements of stacked figures, in the shape of their indices."""
    return mapped(held, lambda array: array[index])


def mapped(held: Held, change: Change) -> Held:
    """Return the object with every array in it changed, at any depth."""
    if isinstance(held, np.ndarray):
        return cast("Held", change(held))
    if isinstance(held, Interval):
        return cast("Held", Interval(_changed(held.low, change), _changed(held.high, change)))
    if isinstance(held, tuple):
        return cast("Held", tuple([mapped(one, change) for one in held]))
    names = _names(type(held))
    return _made(held, [mapped(getattr(held, name), change) for name in names]) if names else held


def low_ends(held: Held) -> Held:
    """Return the object with the lower end of every interval in it, at any depth."""
    if isinstance(held, Interval):
        return cast("Held", lower(held))
    if isinstance(held, tuple):
        return cast("Held", tuple([low_ends(one) for one in held]))
    names = _names(type(held))
    return _made(held, [low_ends(getattr(held, name)) for name in names]) if names else held


def _changed(end: NDArray[np.float64] | float, change: Change) -> NDArray[np.float64] | float:
    return change(end) if isinstance(end, np.ndarray) else end


def _made(like: Held, values: list[object]) -> Held:
    sort = cast("Callable[..., Held]", type(like))
    return sort(*values)


def _names(sort: type) -> tuple[str, ...]:
    """Return the fields of a dataclass that may hold arrays, none for anything else."""
    if sort not in _KNOWN:
        divides = is_dataclass(sort) and not issubclass(sort, Conditions)
        _KNOWN[sort] = tuple(field.name for field in fields(sort)) if divides else ()
    return _KNOWN[sort]


_KNOWN: dict[type, tuple[str, ...]] = {}
