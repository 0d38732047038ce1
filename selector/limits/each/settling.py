"""Every range settles in time."""

from __future__ import annotations

from math import isinf

from selector.candidate import Operating
from selector.limits.measure import FilterCheck, Limit, Measure
from selector.limits.settle import settle_s
from selector.units import TIME


def _settling(at: Operating) -> Measure | None:
    """The time to half a count, with the time to slew, against signal.settle."""
    if isinf(at.conditions.settle_s):
        return None
    return Measure(settle_s(at), at.conditions.settle_s)


LIMIT = Limit("settling", (FilterCheck(_settling),), TIME, thins=True)
