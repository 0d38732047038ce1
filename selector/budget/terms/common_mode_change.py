"""How the sense lines move in use."""

from __future__ import annotations

from selector.budget.term import Size, Term
from selector.candidate import Calibration, Operating
from selector.real import Real


def _sizes(at: Operating) -> tuple[Size, ...]:
    """Low side: I / CMRR, the shunt's own drop; high side: the change of the bus over CMRR and Rs."""
    if at.conditions.high_side:
        return (Size(constant_a=at.conditions.bus_change_v / at.amplifier.cmrr / at.shunt_ohm),)
    return (Size(proportional=1.0 / at.amplifier.cmrr),)


def _removable(at: Operating) -> Real:
    """Return 1 at the low side, where the error follows the current."""
    return 0.0 if at.conditions.high_side else 1.0


TERM = Term("common-mode change", _sizes, removed_by=Calibration.ZERO_AND_SPAN, removable=_removable)
