"""What a finite open-loop gain takes from the closed loop."""

from __future__ import annotations

from selector.budget.term import Size, Term
from selector.candidate import Calibration, Operating


def _sizes(at: Operating) -> tuple[Size, ...]:
    """I / (1 + A0 / NG), for laws that close a loop; nothing where no open-loop gain is stated."""
    if not at.law.by_feedback:
        return ()
    return (Size(proportional=1.0 / (1.0 + at.amplifier.open_loop_gain / at.noise_gain)),)


TERM = Term("loop gain", _sizes, removed_by=Calibration.ZERO_AND_SPAN)
