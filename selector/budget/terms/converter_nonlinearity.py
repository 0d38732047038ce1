"""Integral nonlinearity of the converter."""

from __future__ import annotations

from selector.budget.term import Size, Term
from selector.candidate import Operating


def _sizes(at: Operating) -> tuple[Size, ...]:
    """Inl LSB / (G Rs)."""
    return (Size(constant_a=at.conditions.converter_inl_lsb * at.conditions.lsb_v / at.transfer_ohm),)


TERM = Term("converter nonlinearity", _sizes)
