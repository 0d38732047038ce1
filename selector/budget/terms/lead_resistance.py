"""Lead and joints inside the reading of a shunt with two terminals."""

from __future__ import annotations

from selector.budget.term import Size, Term
from selector.candidate import Calibration, Operating


def _sizes(at: Operating) -> tuple[Size, ...]:
    """I lead / Rs."""
    return (Size(proportional=at.shunt.terminal_lead * at.conditions.lead_ohm / at.shunt_ohm),)


TERM = Term("lead resistance", _sizes, removed_by=Calibration.ZERO_AND_SPAN)
