"""Two preferred values in series or in parallel that come nearest to a value."""

from __future__ import annotations

import heapq
from bisect import bisect_left
from collections.abc import Callable
from dataclasses import dataclass
from fractions import Fraction
from typing import Literal

from selector.errors import Fault, UsageRefused
from selector.series.values import LEAST, MOST, checked, counted, exact, table_of, values_between

How = Literal["series", "parallel"]
Together = Callable[[Fraction, Fraction], Fraction]

# A part more than this times off the value asked for changes it by less than a thousandth.
SPAN = 1000.0


@dataclass(frozen=True, slots=True)
class Pair:
    """Two preferred values, `first` not above `second`, what they make together, and how far that is off.

    Attributes
    ----------
    value
        Of both together, in the unit of the value asked for.
    deviation
        Relative, (value - asked) / asked.
    """

    first: float
    second: float
    value: float
    deviation: float


def pairs(value: float, series: str, how: How, count: int = 3) -> tuple[Pair, ...]:
    """Return the `count` best pairs of values of a series, best first.

    In series `first + second`, in parallel `first * second / (first + second)`, as for resistors. All pairs are looked
    at whose values lie within 1000 times of the value asked for, either way. The arithmetic is exact on the decimals;
    pairs equally far off stand by rising `first`, then `second`.

    Raises
    ------
    UsageRefused
        Where there is no such series or way, the value lies outside 1e-18 ... 1e15, or `count` is below 1.

    Examples
    --------
    >>> pairs(5000.0, "E24", "series", 1)
    (Pair(first=300.0, second=4700.0, value=5000.0, deviation=0.0),)
    """
    table_of(series)
    counted(count)
    if how not in _WAYS:
        raise UsageRefused(Fault("series", f'"{how}" is no way to connect a pair', "choose series or parallel"))
    asked = exact(checked(value))
    found = values_between(series, max(value / SPAN, LEAST), min(value * SPAN, MOST))
    steps = [exact(one) for one in found]
    candidates = (
        (abs(_WAYS[how](steps[i], steps[j]) - asked), i, j)
        for i in range(len(steps))
        for j in _around(_WAYS[how], asked, steps, i, count)
    )
    return tuple(_pair(found[i], found[j], asked, _WAYS[how]) for _, i, j in heapq.nsmallest(count, candidates))


def _around(together: Together, asked: Fraction, steps: list[Fraction], first: int, count: int) -> range:
    """Return the second parts, not below the first, among which are the `count` best for this first part.

    What two parts make together rises with the second, so the best lie on both sides of the place where it passes the
    value asked for.
    """
    place = bisect_left(steps, asked, lo=first, key=lambda second: together(steps[first], second))
    return range(max(first, place - count), min(len(steps), place + count))


def _pair(first: float, second: float, asked: Fraction, together: Together) -> Pair:
    """Return a pair with its figures."""
    value = together(exact(first), exact(second))
    return Pair(first, second, float(value), float((value - asked) / asked))


def _in_series(first: Fraction, second: Fraction) -> Fraction:
    """Return first + second."""
    return first + second


def _in_parallel(first: Fraction, second: Fraction) -> Fraction:
    """Return first * second / (first + second)."""
    return first * second / (first + second)


_WAYS: dict[How, Together] = {"series": _in_series, "parallel": _in_parallel}
