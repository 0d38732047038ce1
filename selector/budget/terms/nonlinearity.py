"""The amplifier's departure from a straight line."""

from __future__ import annotations

from selector.budget.term import Size, Term
from selector.candidate import Operating


def _sizes(at: Operating) -> tuple[Size, ...]:
    """Nu span / (G Rs)."""
    return (Size(constant_a=at.amplifier.nonlinearity_frac * at.window.span_v / at.transfer_ohm),)


TERM = Term("nonlinearity", _sizes)
