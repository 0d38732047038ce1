"""Capacitors of the filter and of gain networks."""

from __future__ import annotations

from collections.abc import Mapping
from typing import Annotated, ClassVar

from pydantic import model_validator

from selector.parts.base import Part, Text
from selector.parts.dielectric import dielectric_change_frac
from selector.parts.holds import Value, fraction, value
from selector.units import CAPACITANCE, VOLTAGE


class Capacitor(Part):
    """A capacitor: F, V; `temp_change` is a fraction of the capacitance over the part's temperature range.

    Where `temp_change` is absent and `dielectric` is an EIA-198 code, the code gives it.
    """

    kind: ClassVar[str] = "capacitor"
    fills: ClassVar[tuple[str, ...]] = ("temp_change",)

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

    @classmethod
    def completed(cls, values: Mapping[str, Value]) -> Mapping[str, Value]:
        """Return values with `temp_change` filled in from the dielectric code."""
        if values.get("temp_change") is not None:
            return values
        dielectric = values.get("dielectric")
        change = dielectric_change_frac(dielectric) if isinstance(dielectric, str) else None
        return values if change is None else {**values, "temp_change": change}

    @model_validator(mode="before")
    @classmethod
    def _change_by_code(cls, given: object) -> object:
        """Fill in what follows from the dielectric code, whoever builds the part."""
        return cls.completed(given) if isinstance(given, Mapping) else given
