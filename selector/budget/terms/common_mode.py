"""The sense lines' nominal voltage against the one the offset was tested at."""

from __future__ import annotations

from selector.budget.term import Size, Term
from selector.candidate import Calibration, Operating
from selector.real import magnitude


def _sizes(at: Operating) -> tuple[Size, ...]:
    """Kappa abs(Vcm - Vtest) / CMRR / Rs, Vcm as the amplifier's own inputs see it."""
    conditions = at.conditions
    seen_v = at.law.common_mode_v(at.gain, conditions.common_mode_v, conditions.zero_v)
    distance_v = magnitude(seen_v - at.amplifier.common_mode_test_v)
    return (Size(constant_a=at.noise_gain_over_gain * distance_v / at.amplifier.cmrr / at.shunt_ohm),)


TERM = Term("common mode", _sizes, removed_by=Calibration.ZERO)
