"""The amplifier states how fast it is and how high its inputs may go."""

from __future__ import annotations

from math import isinf

from selector.candidate.operating import AmplifierAt
from selector.limits.measure import AmplifierCheck, Limit, Measure, flag


def _speed(at: AmplifierAt) -> Measure:
    """An amplifier states gain_bandwidth or bandwidth."""
    slow = at.amplifier.gain_bandwidth_hz, at.amplifier.bandwidth_hz
    return flag(bad=isinf(min(slow)))


def _top(at: AmplifierAt) -> Measure:
    """An amplifier states common_mode_max or common_mode_top_gap."""
    amplifier = at.amplifier
    return flag(bad=isinf(amplifier.common_mode_max_v) and isinf(amplifier.common_mode_top_gap_v))


LIMIT = Limit(
    "missing figure",
    (
        AmplifierCheck(_speed),
        AmplifierCheck(_top),
    ),
    None,
)
