"""What the amplifier's gain may be off by itself."""

from __future__ import annotations

from selector.budget.term import Size, Term
from selector.candidate import Calibration, Operating


def _sizes(at: Operating) -> tuple[Size, ...]:
    """I times the gain error."""
    return (Size(proportional=at.amplifier.gain_error_frac),)


TERM = Term("amplifier gain", _sizes, removed_by=Calibration.ZERO_AND_SPAN)
