"""Analogue switches that choose the gain resistor of a range."""

from __future__ import annotations

from typing import Annotated, ClassVar

from selector.parts.base import Part, Text
from selector.parts.holds import amount, count, value
from selector.parts.rules import Rule, not_below
from selector.units import CURRENT, RESISTANCE, VOLTAGE


class Switch(Part):
    """A range switch: ohm (middle and spread about it), A (hot), channels in one package, V."""

    kind: ClassVar[str] = "switch"
    rules: ClassVar[tuple[Rule, ...]] = (not_below("supply_max", "supply_min"),)

    on_resistance: Annotated[float, value(RESISTANCE)]
    on_resistance_spread: Annotated[float, amount(RESISTANCE)]
    leakage: Annotated[float, amount(CURRENT)]
    channels: Annotated[int, count(least=1)]
    supply_min: Annotated[float, amount(VOLTAGE)]
    supply_max: Annotated[float, value(VOLTAGE)]
    package: Text = ""
