"""Current that a network between the sense lines takes past the shunt."""

from __future__ import annotations

from selector.budget.term import Size, Term
from selector.candidate import Calibration, Operating


def _sizes(at: Operating) -> tuple[Size, ...]:
    """I Rs times the conductance that the law states."""
    taken_s = at.law.shunt_load_siemens(at.stage, high_side=at.conditions.high_side)
    return (Size(proportional=at.shunt_ohm * taken_s),)


TERM = Term("network loading", _sizes, removed_by=Calibration.ZERO_AND_SPAN)
