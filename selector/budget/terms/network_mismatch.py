"""Unequal resistors that turn common mode into input."""

from __future__ import annotations

from selector.budget.term import Size, Term
from selector.candidate import Calibration, Operating


def _sizes(at: Operating) -> tuple[Size, ...]:
    """abs(Vcm - Vz) m / Rs, m = 2 (t1 + t2) / (1 + G)."""
    common_v = abs(at.conditions.common_mode_v - at.conditions.zero_v)
    mismatch = at.law.mismatch_factor(at.gain) * (at.common.tolerance_frac + at.switched.tolerance_frac)
    return (Size(constant_a=common_v * mismatch / at.shunt_ohm),)


TERM = Term("network mismatch", _sizes, removed_by=Calibration.ZERO)
