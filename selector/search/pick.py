"""Some elements of figures that are kept as arrays."""

from __future__ import annotations

from collections.abc import Hashable
from dataclasses import fields, is_dataclass
from functools import cache
from typing import TypeVar, cast

import numpy as np
from numpy.typing import NDArray

from selector.candidate import Conditions, ShuntAt, Window
from selector.candidate.figures import AmplifierFigures, ShuntFigures, SwitchFigures
from selector.gain import LawFigures

Held = TypeVar("Held")
Index = NDArray[np.int64] | int

# What all nodes of a frame share is no array: a frame has one shunt, one amplifier and one switch.
_SHARED = (Conditions, ShuntAt, Window, AmplifierFigures, ShuntFigures, SwitchFigures, LawFigures)


def picked(held: Held, index: Index) -> Held:
    """Return the dataclass with every array of one dimension in it, at any depth, reduced to some elements."""
    return cast("Held", _picked(held, index))


def _picked(held: object, index: Index) -> object:
    sort = type(held)
    if sort is np.ndarray:
        array = cast("NDArray[np.float64]", held)
        return array[index] if array.ndim == 1 else array
    if sort is tuple:
        return tuple([_picked(one, index) for one in cast("tuple[object, ...]", held)])
    names = _names(cast("Hashable", sort))
    return sort(*[_picked(getattr(held, name), index) for name in names]) if names else held


@cache
def _names(sort: Hashable) -> tuple[str, ...]:
    """Return the fields of a dataclass that may hold arrays, none for anything else."""
    if not isinstance(sort, type) or issubclass(sort, _SHARED) or not is_dataclass(sort):
        return ()
    return tuple(field.name for field in fields(sort))
