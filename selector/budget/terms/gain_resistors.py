"""What the gain resistors may be off their nominal values."""

from __future__ import annotations

from selector.budget.term import Size, Term
from selector.candidate import Calibration, Operating
from selector.real import magnitude


def _sizes(at: Operating) -> tuple[Size, ...]:
    """I abs(S) tolerance, one cause per resistor of the law."""
    common = magnitude(at.law.common_sensitivity(at.stage))
    switched = magnitude(at.law.switched_sensitivity(at.stage))
    return (
        Size(proportional=common * at.common.tolerance_frac),
        Size(proportional=switched * at.switched.tolerance_frac),
    )


TERM = Term("gain resistors", _sizes, removed_by=Calibration.ZERO_AND_SPAN)
