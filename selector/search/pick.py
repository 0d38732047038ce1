"""Some elements of figures that are kept as arrays."""

from __future__ import annotations

from dataclasses import fields, is_dataclass
from typing import TypeVar, cast

import numpy as np
from numpy.typing import NDArray

Held = TypeVar("Held")
Index = NDArray[np.int64] | int


def picked(held: Held, index: Index) -> Held:
    """Return the dataclass with every array of one dimension in it, at any depth, reduced to some elements."""
    if isinstance(held, np.ndarray):
        return cast("Held", held[index] if held.ndim == 1 else held)
    if not is_dataclass(held) or isinstance(held, type):
        return cast("Held", tuple(picked(one, index) for one in held)) if isinstance(held, tuple) else held
    changed = {field.name: picked(getattr(held, field.name), index) for field in fields(held)}
    return cast("Held", type(held)(**changed))
