"""What the converter's reference may be off."""

from __future__ import annotations

from selector.budget.term import Size, Term
from selector.candidate import Calibration, Operating


def _sizes(at: Operating) -> tuple[Size, ...]:
    """I times the tolerance."""
    return (Size(proportional=at.conditions.reference_tolerance_frac),)


TERM = Term("reference tolerance", _sizes, removed_by=Calibration.ZERO_AND_SPAN)
