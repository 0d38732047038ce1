"""The power a shunt may carry at the hottest ambient."""

from __future__ import annotations

from selector.candidate import ShuntAt
from selector.physics.heat import derating_frac
from selector.real import Real


def rated_w(at: ShuntAt) -> Real:
    """Return the shunt's rating on its derating line at the hottest ambient, W."""
    shunt = at.shunt
    return shunt.power_w * derating_frac(at.conditions.ambient_max_degc, shunt.full_power_degc, shunt.zero_power_degc)
