"""How far the shunt drifts over its life."""

from __future__ import annotations

from selector.budget.term import Size, Term
from selector.candidate import Operating


def _sizes(at: Operating) -> tuple[Size, ...]:
    """I times the drift."""
    return (Size(proportional=at.shunt.drift_frac),)


TERM = Term("shunt ageing", _sizes)
