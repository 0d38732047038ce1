"""Capacitors of the filter and of gain networks."""

from __future__ import annotations

from collections.abc import Mapping
from typing import Annotated, ClassVar

from pydantic import model_validator

from selector.parts.base import Part, Text
from selector.parts.dielectric import dielectric_change_frac
from selector.parts.holds import fraction, value
from selector.units import CAPACITANCE, VOLTAGE


class Capacitor(Part):
    """A capacitor: F, V; `temp_change` is a fraction of the capacitance over the part's temperature range.

    Where `temp_change` is absent and `dielectric` is an EIA-198 code, the code gives it.
    """

    kind: ClassVar[str] = "capacitor"

    capacitance: Annotated[float, value(CAPACITANCE)]
    tolerance: Annotated[float, fraction()]
    temp_change: Annotated[float | None, fraction()] = None
    dielectric: Text = ""
    voltage: Annotated[float | None, value(VOLTAGE)] = None
    package: Text = ""

    def derived(self) -> frozenset[str]:
        """Return `temp_change` where it is what the dielectric code gives."""
        by_code = self.temp_change is not None and self.temp_change == dielectric_change_frac(self.dielectric)
        return frozenset({"temp_change"}) if by_code else frozenset()

    @model_validator(mode="before")
    @classmethod
    def _change_by_code(cls, given: object) -> object:
        """Fill `temp_change` from the dielectric code."""
        if not isinstance(given, Mapping) or given.get("temp_change") is not None:
            return given
        dielectric = given.get("dielectric")
        change = dielectric_change_frac(dielectric) if isinstance(dielectric, str) else None
        return given if change is None else {**given, "temp_change": change}
