"""Gain error of the converter."""

from __future__ import annotations

from selector.budget.term import Size, Term
from selector.candidate import Calibration, Operating


def _sizes(at: Operating) -> tuple[Size, ...]:
    """I times the gain error."""
    return (Size(proportional=at.conditions.converter_gain_error_frac),)


TERM = Term("converter gain", _sizes, removed_by=Calibration.ZERO_AND_SPAN)
