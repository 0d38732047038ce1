"""The amplifier's gain over temperature."""

from __future__ import annotations

from selector.budget.term import Size, Term
from selector.candidate import Operating


def _sizes(at: Operating) -> tuple[Size, ...]:
    """I times the gain drift times the change of the ambient."""
    return (Size(proportional=at.amplifier.gain_drift_per_k * at.conditions.temperature_change_k),)


TERM = Term("amplifier gain drift", _sizes)
