"""Offset of the converter."""

from __future__ import annotations

from selector.budget.term import Size, Term
from selector.candidate import Calibration, Operating


def _sizes(at: Operating) -> tuple[Size, ...]:
    """Offset / (G Rs)."""
    return (Size(constant_a=at.conditions.converter_offset_v / at.transfer_ohm),)


TERM = Term("converter offset", _sizes, removed_by=Calibration.ZERO)
