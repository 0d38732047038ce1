"""The output filter is made of parts that serve."""

from __future__ import annotations

from selector.candidate import Operating
from selector.limits.capacitor import unfit
from selector.limits.measure import DesignAt, DesignCheck, FilterCheck, Limit, Measure, flag
from selector.units import RESISTANCE


def _capacitor(at: DesignAt) -> Measure | None:
    """The capacitor stands the supply and its spread is known and below 100 %."""
    capacitor = at.design.filter_capacitor
    if capacitor is None:
        return None
    return flag(bad=unfit(capacitor, at.conditions) is not None)


def _least(at: Operating) -> Measure:
    """The resistor is not below filter.resistance_min."""
    return Measure(at.conditions.filter_least_ohm, at.filter.ohm)


def _most(at: Operating) -> Measure:
    """The resistor is not above filter.resistance_max."""
    return Measure(at.filter.ohm, at.conditions.filter_most_ohm)


LIMIT = Limit(
    "filter",
    (
        DesignCheck(_capacitor),
        FilterCheck(_least),
        FilterCheck(_most),
    ),
    RESISTANCE,
    thins=True,
)
