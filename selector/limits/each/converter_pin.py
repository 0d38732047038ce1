"""The converter's pin stands an output at the supply, by itself or behind the filter's resistor."""

from __future__ import annotations

from math import isinf

from selector.candidate import Operating
from selector.limits.measure import FilterCheck, Limit, Measure, fits
from selector.units import CURRENT


def _pin(at: Operating) -> Measure | None:
    """The current into the clamp at the highest supply against what it takes; 0 A where the pin stands the supply."""
    conditions = at.conditions
    if isinf(conditions.converter_input_max_v):
        return None
    over_v = conditions.supply_max_v - conditions.converter_input_max_v
    if fits(conditions.supply_max_v, conditions.converter_input_max_v):
        over_v = 0.0
    return Measure(over_v / at.filter.least_ohm, conditions.clamp_current_a)


LIMIT = Limit("converter pin", (FilterCheck(_pin),), CURRENT, thins=True)
