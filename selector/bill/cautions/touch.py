"""Voltages that are dangerous to touch."""

from __future__ import annotations

from selector.bill.caution import Caution
from selector.candidate import Candidate, Conditions
from selector.units import VOLTAGE, shown

MOST_DIRECT_V = 60.0  # IEC 61140, extra-low voltage in dry places, from memory
MOST_ALTERNATING_V = 30.0  # the same, r.m.s.


def _texts(_candidate: Candidate, conditions: Conditions) -> tuple[str, ...]:
    """Highest bus stated for either side, or the supply, above 60 V; above 30 V where it may alternate (two-way)."""
    highest_v = max(conditions.stated_bus_v, conditions.supply_max_v)
    if highest_v > MOST_DIRECT_V:
        return (_said(highest_v, "Touch hazard"),)
    if conditions.two_way and highest_v > MOST_ALTERNATING_V:
        return (_said(highest_v, "Touch hazard where it alternates"),)
    return ()


def _said(voltage_v: float, hazard: str) -> str:
    return (
        f"{hazard}: up to {shown(voltage_v, VOLTAGE)}, above 60 V dc or 30 V ac. Switch off, let stored energy "
        "discharge and measure before you touch it."
    )


CAUTION = Caution("touch", _texts)
