"""The shunt's inductance does not raise the reading inside the bandwidth."""

from __future__ import annotations

from math import inf, pi

from selector.candidate import ShuntAt
from selector.candidate.elementwise import chosen, larger
from selector.limits.measure import Limit, Measure, ShuntCheck
from selector.units import FREQUENCY

LEAST_H = 1e-300  # keeps the division of an absent inductance finite


def _corner(at: ShuntAt) -> Measure:
    """Bandwidth against Rs / (2 pi L), where the reading has risen 3 dB; nothing where no inductance is stated."""
    stated_h = larger(at.shunt.inductance_h, LEAST_H)
    corner_hz = at.shunt.ohm / (2.0 * pi * stated_h)
    return Measure(at.conditions.bandwidth_hz, chosen(at.shunt.inductance_h > 0.0, corner_hz, inf))


LIMIT = Limit("inductance", (ShuntCheck(_corner),), FREQUENCY)
