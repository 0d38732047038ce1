"""The number that formulas work on: one float, or an array of them."""

from __future__ import annotations

from typing import TYPE_CHECKING, TypeAlias, cast

if TYPE_CHECKING:
    from numpy import bool_, float64
    from numpy.typing import NDArray

    Real: TypeAlias = float | NDArray[float64]
    Truth: TypeAlias = bool | NDArray[bool_]
else:
    Real = float
    Truth = bool

SMALLEST = 1e-18  # in SI units; a figure that must lie above 0 is no smaller


def magnitude(value: Real) -> Real:
    """Return the absolute value of a float or of every element of an array."""
    return cast("Real", abs(value))
