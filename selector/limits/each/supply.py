"""The supply at both ends of its tolerance lies inside what amplifier and switch stand."""

from __future__ import annotations

from selector.candidate.operating import AmplifierAt, SwitchAt
from selector.limits.measure import AmplifierCheck, Limit, Measure, SwitchCheck
from selector.units import VOLTAGE


def _amplifier_least(at: AmplifierAt) -> Measure:
    """The lowest supply is enough for the amplifier."""
    return Measure(at.amplifier.supply_min_v, at.conditions.supply_min_v)


def _amplifier_most(at: AmplifierAt) -> Measure:
    """The highest supply is not too much for the amplifier."""
    return Measure(at.conditions.supply_max_v, at.amplifier.supply_max_v)


def _switch_least(at: SwitchAt) -> Measure:
    """The lowest supply is enough for the switch."""
    return Measure(at.switch.supply_min_v, at.conditions.supply_min_v)


def _switch_most(at: SwitchAt) -> Measure:
    """The highest supply is not too much for the switch."""
    return Measure(at.conditions.supply_max_v, at.switch.supply_max_v)


LIMIT = Limit(
    "supply",
    (
        AmplifierCheck(_amplifier_least),
        AmplifierCheck(_amplifier_most),
        SwitchCheck(_switch_least),
        SwitchCheck(_switch_most),
    ),
    VOLTAGE,
)
