"""One-way, the output leaves its lower end at the lowest current of every range."""

from __future__ import annotations

from selector.candidate import Operating
from selector.limits.measure import Limit, LinkCheck, Measure
from selector.units import VOLTAGE


def _reached(at: Operating) -> Measure | None:
    """The lower end of the window against Vz + G Rs (L - Z), Z what a zero calibration removes."""
    if at.conditions.two_way:
        return None
    reached_v = at.conditions.zero_v + at.transfer_ohm * (at.low_a - at.zero_sum_a)
    return Measure(at.window.low_v, reached_v)


LIMIT = Limit("output low", (LinkCheck(_reached),), VOLTAGE)
