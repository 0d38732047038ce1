"""The supply against the one the offset was tested at."""

from __future__ import annotations

from selector.budget.term import Size, Term
from selector.candidate import Calibration, Operating
from selector.real import magnitude


def _sizes(at: Operating) -> tuple[Size, ...]:
    """Kappa abs(Vs - Vtest) / PSRR / Rs."""
    distance_v = magnitude(at.conditions.supply_v - at.amplifier.supply_test_v)
    return (Size(constant_a=at.noise_gain_over_gain * distance_v / at.amplifier.psrr / at.shunt_ohm),)


TERM = Term("supply offset", _sizes, removed_by=Calibration.ZERO)
