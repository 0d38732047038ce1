"""The zero of the output over temperature."""

from __future__ import annotations

from selector.budget.term import Size, Term
from selector.candidate import Operating


def _sizes(at: Operating) -> tuple[Size, ...]:
    """Vz times its drift times the change of the ambient, over G Rs."""
    conditions = at.conditions
    drift = conditions.zero_drift_per_k * conditions.temperature_change_k
    return (Size(constant_a=conditions.zero_v * drift / at.transfer_ohm),)


TERM = Term("zero reference drift", _sizes)
