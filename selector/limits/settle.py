"""How long a range takes to settle."""

from __future__ import annotations

from selector.candidate import Operating
from selector.physics.filters import settling_s
from selector.real import Real


def settle_s(at: Operating) -> Real:
    """Return the time to half a count of the converter, s, with the time to slew the largest swing where stated."""
    linear_s = settling_s(at.amplifier_pole_hz, at.filter.slow_hz, at.conditions.bits)
    return linear_s + at.swing_v / at.amplifier.slew_v_per_s
