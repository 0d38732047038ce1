"""Shunt, amplifier and what its output drives stay within the power that is granted."""

from __future__ import annotations

from selector.candidate import Operating, Pairing
from selector.candidate.uses import idle_power_w, power_w
from selector.limits.measure import Limit, Measure, PairCheck, RangeCheck
from selector.units import POWER


def _idle(at: Pairing) -> Measure:
    """Power without what the output drives: what is too much here is too much anyhow."""
    return Measure(idle_power_w(at), at.conditions.power_limit_w)


def _power(at: Operating) -> Measure:
    """The largest power against limits.power."""
    return Measure(power_w(at), at.conditions.power_limit_w)


LIMIT = Limit(
    "power",
    (
        PairCheck(_idle),
        RangeCheck(_power, last_only=True),
    ),
    POWER,
    ranked=True,
)
