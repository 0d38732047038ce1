"""The gain resistors over temperature."""

from __future__ import annotations

from selector.budget.term import Size, Term
from selector.candidate import Operating
from selector.real import magnitude


def _sizes(at: Operating) -> tuple[Size, ...]:
    """I abs(S) alpha dT, one cause per resistor of the law."""
    change_k = at.conditions.temperature_change_k
    common = magnitude(at.law.common_sensitivity(at.stage)) * change_k
    switched = magnitude(at.law.switched_sensitivity(at.stage)) * change_k
    return (Size(proportional=common * at.common.tempco_per_k), Size(proportional=switched * at.switched.tempco_per_k))


TERM = Term("gain resistors temperature", _sizes)
