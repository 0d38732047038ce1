"""The sense lines stay where the amplifier, and a switch at its inputs, works."""

from __future__ import annotations

from selector.candidate import Operating
from selector.candidate.elementwise import smaller
from selector.limits.measure import Limit, Measure, RangeCheck
from selector.real import Real
from selector.units import VOLTAGE


def _highest_v(at: Operating) -> Real:
    conditions = at.conditions
    if not conditions.high_side:
        return at.burden_v
    return conditions.bus_max_v + at.burden_v * conditions.two_way


def _bottom(at: Operating) -> Measure:
    """The lowest sense voltage against common_mode_min."""
    conditions = at.conditions
    lowest_v = (conditions.bus_min_v - at.burden_v) if conditions.high_side else -at.burden_v * conditions.two_way
    return Measure(at.amplifier.common_mode_min_v, at.law.common_mode_v(at.gain, lowest_v, conditions.zero_v))


def _top(at: Operating) -> Measure:
    """The highest sense voltage against common_mode_max, or the supply less its gap."""
    amplifier, conditions = at.amplifier, at.conditions
    top_v = smaller(amplifier.common_mode_max_v, conditions.supply_min_v - amplifier.common_mode_top_gap_v)
    return Measure(at.law.common_mode_v(at.gain, _highest_v(at), conditions.zero_v), top_v)


def _switch(at: Operating) -> Measure | None:
    """A range switch at the inputs sees their voltage, which its supply must cover."""
    if at.range_count == 1 or not at.law.switch_on_inputs:
        return None
    return Measure(_highest_v(at), at.conditions.supply_min_v)


LIMIT = Limit(
    "common mode",
    (
        RangeCheck(_bottom),
        RangeCheck(_top),
        RangeCheck(_switch),
    ),
    VOLTAGE,
)
