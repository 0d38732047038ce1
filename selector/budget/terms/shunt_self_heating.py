"""What the current's own heat does to the shunt."""

from __future__ import annotations

from selector.budget.term import Size, Term
from selector.candidate import Operating


def _sizes(at: Operating) -> tuple[Size, ...]:
    """I alpha Rth I^2 Rs; with a span calibration the heat of the upper border stays (calibrated hot, used cold)."""
    per_a2 = at.shunt.tempco_per_k * at.shunt.heating_k_per_w * at.shunt_ohm
    if at.calibration.span:
        return (Size(proportional=per_a2 * at.high_a**2),)
    return (Size(cubic_per_a2=per_a2),)


TERM = Term("shunt self-heating", _sizes)
