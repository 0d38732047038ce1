"""The output keeps its headroom at the largest current."""

from __future__ import annotations

from selector.candidate import Operating
from selector.limits.measure import Limit, Measure, RangeCheck
from selector.units import VOLTAGE


def _headroom(at: Operating) -> Measure:
    """G Rs I_max against (1 - headroom) of the span."""
    usable_v = (1.0 - at.conditions.headroom_limit_frac) * at.window.span_v
    return Measure(at.transfer_ohm * at.conditions.current_max_a, usable_v)


LIMIT = Limit("headroom", (RangeCheck(_headroom, last_only=True),), VOLTAGE, ranked=True)
