"""Every gain resistor lies within what the amplifier works with."""

from __future__ import annotations

from selector.candidate import Operating
from selector.limits.measure import Limit, Measure, RangeCheck
from selector.units import RESISTANCE


def _common_least(at: Operating) -> Measure | None:
    """The common resistor is not too small."""
    if at.law.common_name is None:
        return None
    return Measure(at.amplifier.least_common_ohm, at.common.ohm)


def _common_most(at: Operating) -> Measure | None:
    """The common resistor is not too large."""
    if at.law.common_name is None:
        return None
    return Measure(at.common.ohm, at.amplifier.most_ohm)


def _switched_least(at: Operating) -> Measure | None:
    """The resistor of the range is not too small."""
    if at.law.switched_name is None:
        return None
    return Measure(at.amplifier.least_switched_ohm, at.switched.ohm)


def _switched_most(at: Operating) -> Measure | None:
    """The resistor of the range is not too large."""
    if at.law.switched_name is None:
        return None
    return Measure(at.switched.ohm, at.amplifier.most_ohm)


LIMIT = Limit(
    "gain resistance",
    (
        RangeCheck(_common_least),
        RangeCheck(_common_most),
        RangeCheck(_switched_least),
        RangeCheck(_switched_most),
    ),
    RESISTANCE,
)
