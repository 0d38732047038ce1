"""The converter's input current through what stands before it."""

from __future__ import annotations

from selector.budget.term import Size, Term
from selector.candidate import Operating


def _sizes(at: Operating) -> tuple[Size, ...]:
    """I_in (Ro + R_out) / (G Rs)."""
    source_ohm = at.filter.ohm + at.output_ohm
    return (Size(constant_a=at.conditions.converter_input_current_a * source_ohm / at.transfer_ohm),)


TERM = Term("converter input current", _sizes, leakage=True)
