"""Half a count of the converter."""

from __future__ import annotations

from selector.budget.term import Size, Term
from selector.candidate import Operating


def _sizes(at: Operating) -> tuple[Size, ...]:
    """LSB / 2 / (G Rs)."""
    return (Size(constant_a=0.5 * at.conditions.lsb_v / at.transfer_ohm),)


TERM = Term("quantisation", _sizes)
