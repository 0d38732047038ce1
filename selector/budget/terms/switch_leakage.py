"""What the open channels of the range switch leak."""

from __future__ import annotations

from selector.budget.term import Size, Term
from selector.candidate import Operating


def _sizes(at: Operating) -> tuple[Size, ...]:
    """Vl / Rs of K - 1 open channels."""
    if at.range_count == 1:
        return ()
    open_a = (at.range_count - 1) * at.switch.leakage_a
    return (Size(constant_a=at.law.leakage_v(at.stage, open_a) / at.shunt_ohm),)


TERM = Term("switch leakage", _sizes, leakage=True)
