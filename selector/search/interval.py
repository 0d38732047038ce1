"""Numbers of which only a lower and an upper end are known: every formula that takes arrays takes these too.

An operation encloses every result that numbers between the ends could give, so that a formula evaluated once bounds
all combinations of a block. Source: interval arithmetic, e.g. IEEE 1788-2015, with rounding to nearest: an end may be
off by the rounding of the arrays, which the search allows for.
"""

from __future__ import annotations

from collections.abc import Callable
from typing import TypeAlias, cast

import numpy as np
from numpy.typing import NDArray

from selector.real import Real

Numbers: TypeAlias = NDArray[np.float64]
Held: TypeAlias = "Numbers | float | Interval"

SQUARE = 2.0


class Interval:
    """Arrays of lower and upper ends that broadcast with other arrays; a number for all formulas."""

    __slots__ = ("_positive", "high", "low")

    def __init__(self, low: Numbers | float, high: Numbers | float, *, positive: bool | None = None) -> None:
        """Take both ends; low <= high, element by element. `positive` tells that no element is below 0, if known."""
        self.low = low
        self.high = high
        self._positive = positive

    def __array_ufunc__(self, function: np.ufunc, method: str, *inputs: Held, **rest: object) -> object:
        """Return a function of arrays, of those that formulas use, for intervals."""
        known = _FUNCTIONS.get(function)
        if known is None or method != "__call__" or rest:
            return NotImplemented
        return known(*inputs)

    def __array_function__(
        self, function: object, types: object, inputs: tuple[Held, ...], rest: dict[str, object]
    ) -> object:
        """Return numpy.where for conditions that may hold for a part of an interval."""
        del types
        if function is not np.where or rest:
            return NotImplemented
        return _where(*inputs)

    def __add__(self, other: Held) -> Interval:
        """Return the sum."""
        low = _low(other)
        sure = True if self._positive and _is_positive(other) else None
        return Interval(self.low + low, self.high + _high(other), positive=sure)

    __radd__ = __add__

    def __sub__(self, other: Held) -> Interval:
        """Return the difference."""
        return Interval(self.low - _high(other), self.high - _low(other))

    def __rsub__(self, other: Held) -> Interval:
        """Return the difference, the other way round."""
        return Interval(_low(other) - self.high, _high(other) - self.low)

    def __mul__(self, other: Held) -> Interval:
        """Return the product."""
        low, high = _low(other), _high(other)
        if self.positive and _is_positive(other):
            return Interval(self.low * low, self.high * high, positive=True)
        ends = (self.low * low, self.low * high, self.high * low, self.high * high)
        return Interval(
            np.minimum(np.minimum(ends[0], ends[1]), np.minimum(ends[2], ends[3])),
            np.maximum(np.maximum(ends[0], ends[1]), np.maximum(ends[2], ends[3])),
        )

    __rmul__ = __mul__

    def __truediv__(self, other: Held) -> Interval:
        """Return the quotient; a divisor lies wholly above or below 0."""
        low, high = _low(other), _high(other)
        if self.positive and _is_positive(other):
            return Interval(self.low / high, self.high / low, positive=True)
        return self * Interval(1.0 / high, 1.0 / low)

    def __rtruediv__(self, other: Held) -> Interval:
        """Return the quotient, the other way round."""
        return _interval(other) / self

    def __pow__(self, exponent: float) -> Interval:
        """Return a power; of what lies on both sides of 0 only the square."""
        if self.positive:
            return Interval(self.low**exponent, self.high**exponent, positive=True)
        size = abs(self)
        if exponent == SQUARE:
            return Interval(size.low**exponent, size.high**exponent, positive=True)
        return Interval(np.maximum(self.low, 0.0) ** exponent, np.maximum(self.high, 0.0) ** exponent)

    def __neg__(self) -> Interval:
        """Return the negative."""
        return Interval(-self.high, -self.low)

    def __abs__(self) -> Interval:
        """Return the absolute value."""
        if self.positive:
            return self
        low = np.maximum(0.0, np.maximum(self.low, -self.high))
        return Interval(low, np.maximum(np.abs(self.low), np.abs(self.high)), positive=True)

    def __lt__(self, other: Held) -> Interval:
        """Return whether it is less: surely (low) and perhaps (high), as 1 or 0."""
        return _truth(self.high < _low(other), self.low < _high(other))

    def __gt__(self, other: Held) -> Interval:
        """Return whether it is more: surely and perhaps, as 1 or 0."""
        return _truth(self.low > _high(other), self.high > _low(other))

    @property
    def positive(self) -> bool:
        """Return whether no element is below 0."""
        if self._positive is None:
            self._positive = _all_positive(self.low)
        return self._positive

    def within(self, other: Interval) -> Interval:
        """Return what both have in common; empty elements have low > high."""
        return Interval(np.maximum(self.low, other.low), np.minimum(self.high, other.high))

    def real(self) -> Real:
        """Return the interval as the number that formulas are written for."""
        return cast("Real", self)


def lower(value: object) -> Numbers:
    """Return the lower end of an interval, or a number as it is."""
    return np.asarray(_low(cast("Held", value)))


def upper(value: object) -> Numbers:
    """Return the upper end of an interval, or a number as it is."""
    return np.asarray(_high(cast("Held", value)))


def _low(value: Held) -> Numbers | float:
    return value.low if isinstance(value, Interval) else value


def _high(value: Held) -> Numbers | float:
    return value.high if isinstance(value, Interval) else value


def _interval(value: Held) -> Interval:
    return value if isinstance(value, Interval) else Interval(value, value)


def _is_positive(value: Held) -> bool:
    return value.positive if isinstance(value, Interval) else _all_positive(value)


def _all_positive(low: Numbers | float) -> bool:
    return bool((low >= 0.0).all()) if isinstance(low, np.ndarray) else low >= 0.0


def _truth(surely: object, perhaps: object) -> Interval:
    return Interval(np.asarray(surely, dtype=float), np.asarray(perhaps, dtype=float))


def _where(condition: Held, first: Held, second: Held) -> Interval:
    surely, perhaps = np.asarray(_low(condition)) == 1.0, np.asarray(_high(condition)) == 1.0
    return Interval(
        np.where(surely, _low(first), np.where(perhaps, np.minimum(_low(first), _low(second)), _low(second))),
        np.where(surely, _high(first), np.where(perhaps, np.maximum(_high(first), _high(second)), _high(second))),
    )


def _least(first: Held, second: Held) -> Interval:
    return Interval(np.minimum(_low(first), _low(second)), np.minimum(_high(first), _high(second)))


def _most(first: Held, second: Held) -> Interval:
    return Interval(np.maximum(_low(first), _low(second)), np.maximum(_high(first), _high(second)))


_FUNCTIONS: dict[np.ufunc, Callable[..., Interval]] = {
    np.add: lambda first, second: _interval(first) + second,
    np.subtract: lambda first, second: _interval(first) - second,
    np.multiply: lambda first, second: _interval(first) * second,
    np.true_divide: lambda first, second: _interval(first) / second,
    np.power: lambda first, second: _interval(first) ** second,
    np.less: lambda first, second: _interval(first) < second,
    np.greater: lambda first, second: _interval(first) > second,
    np.absolute: abs,
    np.minimum: _least,
    np.maximum: _most,
}
