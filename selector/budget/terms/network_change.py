"""What temperature and a moving bus leave of the network's mismatch and current."""

from __future__ import annotations

from selector.budget.term import Size, Term
from selector.candidate import Operating


def _sizes(at: Operating) -> tuple[Size, ...]:
    """[abs(Vcm - Vz) m_T + dVb (m + m_T)] / Rs + dVb times the conductance of a branch."""
    conditions = at.conditions
    factor = at.law.mismatch_factor(at.gain)
    mismatch = factor * (at.common.tolerance_frac + at.switched.tolerance_frac)
    drift = factor * (at.common.tempco_per_k + at.switched.tempco_per_k) * conditions.temperature_change_k
    change_v = conditions.bus_change_v
    input_v = abs(conditions.common_mode_v - conditions.zero_v) * drift + change_v * (mismatch + drift)
    return (Size(constant_a=input_v / at.shunt_ohm + change_v * at.law.bus_siemens(at.stage)),)


TERM = Term("network change", _sizes)
