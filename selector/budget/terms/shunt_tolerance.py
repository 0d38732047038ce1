"""What the shunt may be off its nominal resistance."""

from __future__ import annotations

from selector.budget.term import Size, Term
from selector.candidate import Calibration, Operating


def _sizes(at: Operating) -> tuple[Size, ...]:
    """I times the tolerance."""
    return (Size(proportional=at.shunt.tolerance_frac),)


TERM = Term("shunt tolerance", _sizes, removed_by=Calibration.ZERO_AND_SPAN)
