"""No range saturates before its upper border is read."""

from __future__ import annotations

from selector.budget import combined
from selector.candidate import Operating
from selector.limits.measure import FilterCheck, Limit, Measure
from selector.units import CURRENT


def _room(at: Operating) -> Measure:
    """The error at U without calibration against span / (G Rs) - U."""
    room_a = at.window.span_v / at.transfer_ohm - at.high_a
    return Measure(combined(at.uncalibrated()).error_a(at.high_a), room_a)


LIMIT = Limit("saturation", (FilterCheck(_room),), CURRENT)
