"""Input offset of the amplifier."""

from __future__ import annotations

from selector.budget.term import Size, Term
from selector.candidate import Calibration, Operating


def _sizes(at: Operating) -> tuple[Size, ...]:
    """Kappa Vos / Rs: noise gain over gain refers it to the shunt."""
    return (Size(constant_a=at.noise_gain_over_gain * at.amplifier.offset_v / at.shunt_ohm),)


TERM = Term("offset", _sizes, removed_by=Calibration.ZERO)
