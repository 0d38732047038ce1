"""Every range follows the signal."""

from __future__ import annotations

from selector.candidate import Operating
from selector.limits.measure import FilterCheck, Limit, Measure
from selector.physics.filters import bandwidth_hz
from selector.units import FREQUENCY


def _bandwidth(at: Operating) -> Measure:
    """The bandwidth that is asked against the -3 dB frequency of the chain."""
    return Measure(at.conditions.bandwidth_hz, bandwidth_hz(at.amplifier_pole_hz, at.filter.slow_hz))


LIMIT = Limit("bandwidth", (FilterCheck(_bandwidth),), FREQUENCY, thins=True)
