"""The checks of some sort among limits, and which of many ranges meet all of them."""

from __future__ import annotations

from collections.abc import Callable, Iterable
from typing import TypeVar

import numpy as np
from numpy.typing import NDArray

from selector.candidate import Operating
from selector.limits import FilterCheck, Limit, LinkCheck, Measure, RangeCheck
from selector.limits.measure import Check

Truths = NDArray[np.bool_]
Sort = TypeVar("Sort", bound=Check)


def checks_of(limits: Iterable[Limit], sort: type[Sort]) -> tuple[Sort, ...]:
    """Return the checks of one sort, in the order of the limits."""
    return tuple(check for limit in limits for check in limit.checks if isinstance(check, sort))


def plainly(measure: Measure) -> Truths:
    """Return whether a measure of numbers is met."""
    return np.asarray(measure.meets, dtype=bool)


def met(
    checks: Iterable[RangeCheck | LinkCheck | FilterCheck],
    at: Operating,
    stands: Truths,
    meets: Callable[[Measure], Truths] = plainly,
) -> Truths:
    """Return which ranges, of those that stand, meet all checks; the shapes of both broadcast."""
    for check in checks:
        measure = check.measure(at)
        stands = stands if measure is None else stands & meets(measure)
    return stands
