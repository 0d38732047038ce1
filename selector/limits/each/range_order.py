"""There are as many ranges as the spec allows; each ends above the one below it and has a smaller gain."""

from __future__ import annotations

from selector.candidate import Operating, Pairing
from selector.limits.measure import Limit, LinkCheck, Measure, PairCheck, flag
from selector.units import CURRENT


def _count(at: Pairing) -> Measure:
    """There are no more ranges than the spec allows."""
    return flag(bad=at.range_count > at.conditions.ranges_most)


def _borders(at: Operating) -> Measure:
    """The border below lies below this range's own, strictly."""
    return Measure(at.border.below_a, at.high_a, strict=True)


def _gains(at: Operating) -> Measure:
    """The gain is below that of the range below, strictly."""
    return Measure(at.gain, at.border.below_gain, strict=True, figure=False)


LIMIT = Limit(
    "range order",
    (
        PairCheck(_count),
        LinkCheck(_borders),
        LinkCheck(_gains),
    ),
    CURRENT,
)
