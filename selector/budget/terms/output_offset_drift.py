"""Output offset over temperature."""

from __future__ import annotations

from selector.budget.term import Size, Term
from selector.candidate import Operating


def _sizes(at: Operating) -> tuple[Size, ...]:
    """Voso' dT / (G Rs)."""
    drift_v = at.amplifier.output_offset_drift_v_per_k * at.conditions.temperature_change_k
    return (Size(constant_a=drift_v / at.transfer_ohm),)


TERM = Term("output offset drift", _sizes)
