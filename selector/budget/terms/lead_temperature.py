"""Copper of the lead over temperature, with two terminals."""

from __future__ import annotations

from selector.budget.term import Size, Term
from selector.candidate import Operating
from selector.physics.heat import COPPER_PER_K


def _sizes(at: Operating) -> tuple[Size, ...]:
    """I lead / Rs times copper's coefficient times the change of the ambient."""
    change = COPPER_PER_K * at.conditions.temperature_change_k
    return (Size(proportional=at.shunt.terminal_lead * at.conditions.lead_ohm / at.shunt_ohm * change),)


TERM = Term("lead temperature", _sizes)
