"""Current that a network draws through the shunt, from the bus or from the zero reference."""

from __future__ import annotations

from selector.budget.term import Size, Term
from selector.candidate import Calibration, Operating


def _sizes(at: Operating) -> tuple[Size, ...]:
    """abs(Vcm - Vz) times the conductance of the branch that hangs on the load's end of the shunt.

    Kirchhoff's laws: the branch lies between sense line and zero, at either side; the circuit simulator agrees.
    """
    distance_v = abs(at.conditions.common_mode_v - at.conditions.zero_v)
    return (Size(constant_a=distance_v * at.law.bus_siemens(at.stage)),)


TERM = Term("network current", _sizes, removed_by=Calibration.ZERO)
