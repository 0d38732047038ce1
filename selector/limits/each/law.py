"""The gain law serves the side, the zero and the number of ranges."""

from __future__ import annotations

from selector.candidate import Pairing
from selector.candidate.operating import AmplifierAt
from selector.limits.measure import AmplifierCheck, Limit, Measure, PairCheck, flag


def _own_ground(at: AmplifierAt) -> Measure:
    """A law that reads against its own ground serves the low side with its zero at ground."""
    away = at.conditions.high_side or at.conditions.zero_v > 0.0
    return flag(bad=at.amplifier.law.reads_own_ground and away)


def _switchable(at: Pairing) -> Measure:
    """More than one range needs a law whose gain can be switched."""
    return flag(bad=at.range_count > 1 and not at.amplifier.law.switchable)


LIMIT = Limit(
    "law",
    (
        AmplifierCheck(_own_ground),
        PairCheck(_switchable),
    ),
    None,
)
