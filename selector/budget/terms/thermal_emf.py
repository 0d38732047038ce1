"""Thermocouple voltage across the shunt."""

from __future__ import annotations

from selector.budget.term import Size, Term
from selector.candidate import Operating


def _sizes(at: Operating) -> tuple[Size, ...]:
    """Emf per kelvin times the gradient along the shunt, over Rs."""
    return (Size(constant_a=at.shunt.thermal_emf_v_per_k * at.conditions.gradient_k / at.shunt_ohm),)


TERM = Term("thermal emf", _sizes)
