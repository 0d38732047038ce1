"""The spread of the range switch's resistance."""

from __future__ import annotations

from selector.budget.term import Size, Term
from selector.candidate import Operating


def _sizes(at: Operating) -> tuple[Size, ...]:
    """I abs(S_x) dRon / R_x of the switched resistor, with more than one range."""
    if at.range_count == 1:
        return ()
    return (Size(proportional=at.law.on_sensitivity_per_ohm(at.stage) * at.switch.on_spread_ohm),)


TERM = Term("switch resistance", _sizes)
