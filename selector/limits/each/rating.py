"""The shunt carries the largest current within its derated rating."""

from __future__ import annotations

from selector.candidate import ShuntAt
from selector.limits.measure import Limit, Measure, ShuntCheck
from selector.limits.rated import rated_w
from selector.units import POWER


def _power(at: ShuntAt) -> Measure:
    """I_max^2 Rs (1 + tolerance) against load_fraction of the rating at the hottest ambient."""
    power_w = at.conditions.current_max_a**2 * at.shunt.most_ohm
    return Measure(power_w, at.conditions.load_frac * rated_w(at))


LIMIT = Limit("rating", (ShuntCheck(_power),), POWER)
