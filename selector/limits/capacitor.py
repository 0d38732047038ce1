"""Which capacitors can serve in an output filter."""

from __future__ import annotations

from selector.candidate import Conditions
from selector.parts import Capacitor
from selector.parts.dielectric import dielectric_span_degc


def unfit(capacitor: Capacitor, conditions: Conditions) -> str | None:
    """Return why a capacitor cannot be used, or None where it can.

    Its tolerance and temperature change together must be below 1 and known, its dielectric code must span the
    ambient, and its voltage, where stated, must cover the highest supply.
    """
    if capacitor.temp_change is None:
        return "no temperature change"
    if capacitor.tolerance + capacitor.temp_change >= 1.0:
        return "spread of 100 % or more"
    span = None if not capacitor.dielectric else dielectric_span_degc(capacitor.dielectric)
    if span is not None and not (span[0] <= conditions.ambient_min_degc and conditions.ambient_max_degc <= span[1]):
        return "dielectric does not span the ambient"
    if capacitor.voltage is not None and capacitor.voltage < conditions.supply_max_v:
        return "voltage below the supply"
    return None
