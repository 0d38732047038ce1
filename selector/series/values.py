"""Preferred values over decades: all of a span, and those nearest to a value."""

from __future__ import annotations

import math
from dataclasses import dataclass
from decimal import Decimal
from fractions import Fraction

from selector.errors import Fault, UsageRefused
from selector.real import SMALLEST
from selector.series.tables import SERIES

LEAST, MOST = SMALLEST, 1e15  # outside lies no part's value
_ALL_DECADES = 33


@dataclass(frozen=True, slots=True)
class Preferred:
    """A preferred value and how far it lies from the value that was asked for.

    Attributes
    ----------
    value
        In the unit of the value asked for.
    deviation
        Relative, (value - asked) / asked.
    """

    value: float
    deviation: float


def values_between(series: str, low: float, high: float) -> tuple[float, ...]:
    """Return all values of a series from `low` to `high`, both included, rising.

    Every value is the double nearest to its decimal: 4990.0, not 4.99 times 1000.

    Raises
    ------
    UsageRefused
        Where there is no such series, or a bound lies outside 1e-18 ... 1e15.

    Examples
    --------
    >>> values_between("E6", 4.7, 22)
    (4.7, 6.8, 10.0, 15.0, 22.0)
    """
    table = table_of(series)
    bounds = checked(low), checked(high)
    digits = len(str(table[0])) - 1
    decades = range(_decade(bounds[0]), _decade(bounds[1]) + 1)
    values = (float(f"{step}e{decade - digits}") for decade in decades for step in table)
    return tuple(value for value in values if bounds[0] <= value <= bounds[1])


def nearest(value: float, series: str, count: int = 3) -> tuple[Preferred, ...]:
    """Return the `count` values of a series that are nearest to a value, nearest first.

    Distances are those of the decimals as they are written; of two at the same distance the smaller value comes first.

    Raises
    ------
    UsageRefused
        Where there is no such series, the value lies outside 1e-18 ... 1e15, or `count` is below 1.

    Examples
    --------
    >>> nearest(4800.0, "E24", 2)
    (Preferred(value=4700.0, deviation=-0.020833333333333332), Preferred(value=5100.0, deviation=0.0625))
    """
    table = table_of(series)
    counted(count)
    asked = exact(checked(value))
    decades = min(count // len(table) + 2, _ALL_DECADES)  # one side alone then holds more than `count` values
    span = 10.0**decades
    found = values_between(series, max(value / span, LEAST), min(value * span, MOST))
    rated = ((abs(exact(one) - asked), one) for one in found)
    return tuple(Preferred(one, float((exact(one) - asked) / asked)) for _, one in sorted(rated)[:count])


def exact(value: float) -> Fraction:
    """Return the decimal that a double prints as, exactly."""
    return Fraction(Decimal(repr(float(value))))


def table_of(series: str) -> tuple[int, ...]:
    """Return the decade table of a series, refusing what is none."""
    table = SERIES.get(series)
    if table is None:
        raise UsageRefused(Fault("series", f'"{series}" is no E series', f"choose one of {', '.join(SERIES)}"))
    return table


def checked(value: float) -> float:
    """Return a value that a part can have, refusing all others."""
    if not (math.isfinite(value) and LEAST <= value <= MOST):
        raise UsageRefused(Fault("series", f"{value} is no value of a part", f"give one from {LEAST} to {MOST}"))
    return value


def counted(count: int) -> int:
    """Return a count of at least one, refusing all others."""
    if count < 1:
        raise UsageRefused(Fault("series", f"{count} values cannot be shown", "ask for 1 or more"))
    return count


def _decade(value: float) -> int:
    """Return the power of ten of a value's first digit."""
    return Decimal(repr(value)).adjusted()
