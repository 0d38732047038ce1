"""Some elements of figures that are kept as arrays."""

from __future__ import annotations

from dataclasses import fields, is_dataclass
from typing import TypeVar, cast

import numpy as np
from numpy.typing import NDArray

from selector.candidate import Conditions, ShuntAt, Window
from selector.candidate.figures import AmplifierFigures, ShuntFigures, SwitchFigures
from selector.gain import LawFigures

Held = TypeVar("Held")
Index = NDArray[np.int64] | int

# What all nodes of a frame share is no array: a frame has one shunt, one amplifier and one switch.
_SHARED = (int, float, str, Conditions, ShuntAt, Window, AmplifierFigures, ShuntFigures, SwitchFigures, LawFigures)


def picked(held: Held, index: Index) -> Held:
    """Return the dataclass with every array of one dimension in it, at any depth, reduced to some elements."""
    if isinstance(held, np.ndarray):
        return cast("Held", held[index] if held.ndim == 1 else held)
    if isinstance(held, _SHARED):
        return held
    if isinstance(held, tuple):
        return cast("Held", tuple(picked(one, index) for one in held))
    if not is_dataclass(held) or isinstance(held, type):
        return held
    return cast("Held", type(held)(*(picked(getattr(held, field.name), index) for field in fields(held))))
