"""Bypass switches across the shunts of a stack."""

from __future__ import annotations

from typing import Annotated, ClassVar

from selector.parts.base import Part, Text
from selector.parts.holds import amount, value
from selector.units import CURRENT, RESISTANCE, VOLTAGE


class Bypass(Part):
    """A bypass: ohm (maximum), A, V; `leakage` is hot and holds its clamp's, `clamp` its largest drop while open."""

    kind: ClassVar[str] = "bypass"

    on_resistance: Annotated[float, value(RESISTANCE)]
    leakage: Annotated[float, amount(CURRENT)]
    clamp: Annotated[float | None, value(VOLTAGE)] = None
    current: Annotated[float, value(CURRENT)]
    voltage: Annotated[float | None, value(VOLTAGE)] = None
    package: Text = ""
