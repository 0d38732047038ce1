"""How the supply moves in use."""

from __future__ import annotations

from selector.budget.term import Size, Term
from selector.candidate import Operating


def _sizes(at: Operating) -> tuple[Size, ...]:
    """Kappa dVs / PSRR / Rs."""
    return (
        Size(constant_a=at.noise_gain_over_gain * at.conditions.supply_change_v / at.amplifier.psrr / at.shunt_ohm),
    )


TERM = Term("supply change", _sizes)
