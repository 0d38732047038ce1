"""What a zero calibration leaves of the bias currents."""

from __future__ import annotations

from selector.budget.term import Size, Term
from selector.candidate import Operating


def _sizes(at: Operating) -> tuple[Size, ...]:
    """Vb / Rs times relative drift and change of the ambient, where the zero is calibrated and a drift stated."""
    if not at.calibration.zero:
        return ()
    change = at.amplifier.bias_drift_per_k * at.conditions.temperature_change_k
    return (Size(constant_a=at.law.bias_v(at.stage) / at.shunt_ohm * change),)


TERM = Term("bias current drift", _sizes)
