"""Resistors of the gain network and the filter."""

from __future__ import annotations

from typing import Annotated, ClassVar

from selector.parts.base import Part, Text
from selector.parts.holds import amount, fraction, value
from selector.units import PER_KELVIN, POWER, RESISTANCE, VOLTAGE


class Resistor(Part):
    """A resistor: ohm, W, V; `tempco` is the largest slope from the nominal temperature, 1/K."""

    kind: ClassVar[str] = "resistor"

    resistance: Annotated[float, value(RESISTANCE)]
    tolerance: Annotated[float, fraction()]
    tempco: Annotated[float, amount(PER_KELVIN)]
    power: Annotated[float | None, value(POWER)] = None
    voltage: Annotated[float | None, value(VOLTAGE)] = None
    package: Text = ""
