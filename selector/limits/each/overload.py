"""The shunt survives the overload."""

from __future__ import annotations

from selector.candidate import ShuntAt
from selector.candidate.elementwise import larger
from selector.limits.measure import Limit, Measure, ShuntCheck
from selector.limits.rated import rated_w
from selector.units import POWER


def _survives(at: ShuntAt) -> Measure | None:
    """Its derated rating carries the overload, or its pulse energy does for as long as it lasts."""
    current_a, time_s = at.conditions.overload_a, at.conditions.overload_s
    if current_a == 0.0:
        return None
    power_w = current_a**2 * at.shunt.most_ohm
    by_energy_w = at.shunt.pulse_energy_j / time_s
    return Measure(power_w, larger(rated_w(at), by_energy_w))


LIMIT = Limit("overload", (ShuntCheck(_survives),), POWER)
