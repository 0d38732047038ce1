"""The drop in the current's path is within what the load can spare."""

from __future__ import annotations

from selector.candidate import ShuntAt
from selector.limits.measure import Limit, Measure, ShuntCheck
from selector.units import VOLTAGE


def _burden(at: ShuntAt) -> Measure:
    """I_max (Rs (1 + tolerance) + lead) against limits.burden."""
    return Measure(at.burden_v, at.conditions.burden_limit_v)


LIMIT = Limit("burden", (ShuntCheck(_burden),), VOLTAGE, ranked=True)
