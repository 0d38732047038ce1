"""Shunt resistors, which the measured current flows through."""

from __future__ import annotations

from typing import Annotated, ClassVar

from selector.parts.base import Part, Text
from selector.parts.holds import amount, count, fraction, temperature, value
from selector.parts.rules import Rule, not_below
from selector.units import (
    ENERGY,
    INDUCTANCE,
    PER_KELVIN,
    POWER,
    RESISTANCE,
    THERMAL_RESISTANCE,
    VOLT_PER_KELVIN,
)


class Shunt(Part):
    """A shunt: ohm, W, degC, K/W, V/K, J, H; `power` falls on a straight line from full to zero power."""

    kind: ClassVar[str] = "shunt"
    rules: ClassVar[tuple[Rule, ...]] = (not_below("zero_power_temp", "full_power_temp", equal=False),)

    resistance: Annotated[float, value(RESISTANCE)]
    tolerance: Annotated[float, fraction()]
    tempco: Annotated[float, amount(PER_KELVIN)]
    power: Annotated[float, value(POWER)]
    full_power_temp: Annotated[float, temperature()] = 70.0
    zero_power_temp: Annotated[float, temperature()] = 155.0
    drift: Annotated[float, fraction()] = 0.0
    thermal_emf: Annotated[float, amount(VOLT_PER_KELVIN)] = 0.0
    thermal_resistance: Annotated[float | None, value(THERMAL_RESISTANCE)] = None
    pulse_energy: Annotated[float | None, value(ENERGY)] = None
    inductance: Annotated[float | None, value(INDUCTANCE)] = None
    terminals: Annotated[int, count(choices=(2, 4))] = 2
    package: Text = ""
