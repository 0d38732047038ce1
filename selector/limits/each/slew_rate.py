"""The output follows the signal's largest swing."""

from __future__ import annotations

from math import pi

from selector.candidate import Operating
from selector.limits.measure import Limit, Measure, RangeCheck
from selector.units import SLEW_RATE


def _slew(at: Operating) -> Measure:
    """Pi f A against the slew rate; nothing where none is stated."""
    return Measure(pi * at.conditions.bandwidth_hz * at.swing_v, at.amplifier.slew_v_per_s)


LIMIT = Limit("slew rate", (RangeCheck(_slew),), SLEW_RATE)
