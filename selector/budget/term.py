"""What a line of the error budget is: data that can be asked for its size."""

from __future__ import annotations

from collections.abc import Callable
from dataclasses import dataclass

from selector.candidate import Calibration, Operating
from selector.real import Real


@dataclass(frozen=True, slots=True)
class Size:
    """An error current of constant_a + proportional * I + cubic_per_a2 * I**3, in A; all parts >= 0."""

    constant_a: Real = 0.0
    proportional: Real = 0.0
    cubic_per_a2: Real = 0.0

    def at(self, current_a: Real) -> Real:
        """Return the error current in A at a load current in A."""
        return self.constant_a + current_a * (self.proportional + self.cubic_per_a2 * current_a**2)

    def scaled(self, factor: Real) -> Size:
        """Return the size times a factor."""
        return Size(self.constant_a * factor, self.proportional * factor, self.cubic_per_a2 * factor)


def _always(at: Operating) -> Real:
    del at
    return 1.0


@dataclass(frozen=True, slots=True)
class Term:
    """One line of the error budget.

    `sizes` gives one Size per independent cause: two resistors give two, which add up in the worst case and
    add in squares in a root sum of squares. `removed_by` is the least calibration that takes the term out, and
    `removable` is 1 where it does so for this design, 0 where it cannot. A term is rectangular within its limit;
    a `normal` one states its standard deviation. A `leakage` is a current that doubles every few kelvin.
    """

    name: str
    sizes: Callable[[Operating], tuple[Size, ...]]
    removed_by: Calibration | None = None
    removable: Callable[[Operating], Real] = _always
    normal: bool = False
    leakage: bool = False

    def removed(self, at: Operating) -> Real:
        """Return 1 where the calibration in use takes the term out, else 0."""
        if self.removed_by is None:
            return 0.0
        chosen = at.calibration.span if self.removed_by is Calibration.ZERO_AND_SPAN else at.calibration.zero
        return self.removable(at) if chosen else 0.0

    def remaining(self, at: Operating) -> tuple[Size, ...]:
        """Return the sizes that count, after calibration; empty where nothing is left."""
        removed = self.removed(at)
        if isinstance(removed, float):
            return () if removed == 1.0 else self.sizes(at)
        return tuple(size.scaled(1.0 - removed) for size in self.sizes(at))
