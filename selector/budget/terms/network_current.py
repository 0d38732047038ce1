"""Current that a network draws from the bus through the shunt."""

from __future__ import annotations

from selector.budget.term import Size, Term
from selector.candidate import Calibration, Operating


def _sizes(at: Operating) -> tuple[Size, ...]:
    """Bus voltage times the conductance of the branch behind the shunt, at the high side."""
    return (Size(constant_a=at.conditions.common_mode_v * at.law.bus_siemens(at.stage)),)


TERM = Term("network current", _sizes, removed_by=Calibration.ZERO)
