"""The converter's input resistance as a divider."""

from __future__ import annotations

from selector.budget.term import Size, Term
from selector.candidate import Calibration, Operating


def _sizes(at: Operating) -> tuple[Size, ...]:
    """(I + Vz / (G Rs)) r / (r + R_in), r = Ro + R_out."""
    source_ohm = at.filter.ohm + at.output_ohm
    share = source_ohm / (source_ohm + at.conditions.converter_input_ohm)
    zero_a = at.conditions.zero_v / at.transfer_ohm
    return (Size(constant_a=zero_a * share, proportional=share),)


TERM = Term("converter loading", _sizes, removed_by=Calibration.ZERO_AND_SPAN)
