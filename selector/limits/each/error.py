"""The error is allowed at every judged current."""

from __future__ import annotations

from selector.budget import Combined
from selector.candidate import Operating
from selector.limits.measure import Limit, Measure, PointCheck
from selector.limits.worst import worst_point
from selector.units import CURRENT


def _error(at: Operating, error: Combined) -> Measure:
    """The error against what is allowed, where its share is largest."""
    return worst_point(at, error)


LIMIT = Limit("error", (PointCheck(_error),), CURRENT, ranked=True)
