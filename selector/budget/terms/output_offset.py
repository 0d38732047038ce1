"""Offset that stands at the output whatever the gain."""

from __future__ import annotations

from selector.budget.term import Size, Term
from selector.candidate import Calibration, Operating


def _sizes(at: Operating) -> tuple[Size, ...]:
    """Voso / (G Rs)."""
    return (Size(constant_a=at.amplifier.output_offset_v / at.transfer_ohm),)


TERM = Term("output offset", _sizes, removed_by=Calibration.ZERO)
