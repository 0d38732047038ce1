"""What the zero of the output may be off."""

from __future__ import annotations

from selector.budget.term import Size, Term
from selector.candidate import Calibration, Operating


def _sizes(at: Operating) -> tuple[Size, ...]:
    """Vz (its tolerance + the converter's gain error) / (G Rs)."""
    conditions = at.conditions
    off = conditions.zero_tolerance_frac + conditions.converter_gain_error_frac
    return (Size(constant_a=conditions.zero_v * off / at.transfer_ohm),)


TERM = Term("zero reference", _sizes, removed_by=Calibration.ZERO)
