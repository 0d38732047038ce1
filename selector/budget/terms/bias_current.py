"""Input bias currents through the network."""

from __future__ import annotations

from selector.budget.term import Size, Term
from selector.candidate import Calibration, Operating
from selector.real import Real


def _sizes(at: Operating) -> tuple[Size, ...]:
    """Vb / Rs, with the law's own Vb."""
    return (Size(constant_a=at.law.bias_v(at.stage) / at.shunt_ohm),)


def _removable(at: Operating) -> Real:
    """Return 1 where the drift that stays behind is stated."""
    return at.amplifier.bias_drift_stated


TERM = Term("bias current", _sizes, removed_by=Calibration.ZERO, removable=_removable, leakage=True)
