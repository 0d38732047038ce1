"""The amplifier's inputs stand the largest drop."""

from __future__ import annotations

from selector.candidate import Pairing
from selector.limits.measure import Limit, Measure, PairCheck
from selector.units import VOLTAGE


def _input(at: Pairing) -> Measure:
    """Rs (1 + tolerance) times the larger of I_max and the overload against input_max."""
    return Measure(at.shunt.most_ohm * at.conditions.largest_current_a, at.amplifier.input_max_v)


LIMIT = Limit("amplifier input", (PairCheck(_input),), VOLTAGE)
