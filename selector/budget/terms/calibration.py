"""The uncertainty of the known current that was used to calibrate."""

from __future__ import annotations

from selector.budget.term import Size, Term
from selector.candidate import Operating
from selector.candidate.elementwise import chosen


def _sizes(at: Operating) -> tuple[Size, ...]:
    """I u, where a known current is used: for the span, or for a zero whose output rests on its swing limit."""
    if not at.calibration.zero:
        return ()
    resting = at.conditions.zero_v < at.window.low_v + at.transfer_ohm * at.zero_sum_a
    needed = 1.0 if at.calibration.span else chosen(resting, 1.0, 0.0)
    return (Size(proportional=needed * at.conditions.calibration_uncertainty_frac),)


TERM = Term("calibration", _sizes)
