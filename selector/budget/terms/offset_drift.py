"""Input offset of the amplifier over temperature."""

from __future__ import annotations

from selector.budget.term import Size, Term
from selector.candidate import Operating


def _sizes(at: Operating) -> tuple[Size, ...]:
    """Kappa Vos' dT / Rs."""
    drift_v = at.amplifier.offset_drift_v_per_k * at.conditions.temperature_change_k
    return (Size(constant_a=at.noise_gain_over_gain * drift_v / at.shunt_ohm),)


TERM = Term("offset drift", _sizes)
