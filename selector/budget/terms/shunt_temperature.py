"""What the ambient does to the shunt."""

from __future__ import annotations

from selector.budget.term import Size, Term
from selector.candidate import Operating


def _sizes(at: Operating) -> tuple[Size, ...]:
    """I times the temperature coefficient times the change of the ambient."""
    return (Size(proportional=at.shunt.tempco_per_k * at.conditions.temperature_change_k),)


TERM = Term("shunt temperature", _sizes)
