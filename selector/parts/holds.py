"""What a field of a part holds: its sort, its quantity and the bounds of its value, declared beside the field."""

from __future__ import annotations

import math
from dataclasses import dataclass
from typing import Literal

from pydantic import GetCoreSchemaHandler
from pydantic_core import CoreSchema, core_schema

from selector.real import SMALLEST
from selector.units import COUNT, DECIBEL, FRACTION, TEMPERATURE, Quantity, QuantityError, shown

Sort = Literal["quantity", "text", "flag", "choice", "names"]
Value = float | int | str | bool | tuple[str, ...] | None

TOO_LARGE = 1e15
MOST_DB = 400.0
ABSOLUTE_ZERO_DEGC = -273.15


class CellRefused(QuantityError):
    """A value that its field cannot take: what was read, and what would be right."""


@dataclass(frozen=True, slots=True)
class Holds:
    """What a field holds; stands in the field's Annotated type and is enforced by the model.

    Bounds are in SI units: `least` <= value <= `most`, `above` < value < `below`. `choices` are the only values taken.
    """

    sort: Sort
    quantity: Quantity | None = None
    least: float | None = None
    above: float | None = None
    below: float | None = None
    most: float | None = None
    choices: tuple[str | int, ...] = ()

    def check(self, value: Value, read: str, name: str) -> None:
        """Raise CellRefused where the value lies outside the bounds; `read` is how it stood in the input."""
        if value is None:
            return
        if self.choices and value not in self.choices:
            raise CellRefused(f"{read} is not known", f"{name} is one of {', '.join(map(str, self.choices))}")
        if self.quantity is None or isinstance(value, str | tuple):
            return
        if not math.isfinite(value):
            raise CellRefused(f"{read} is no finite number", f"{name} must be finite")
        if abs(value) >= TOO_LARGE:
            raise CellRefused(f"{read} is too large for any calculation", f"{name} must be below 1e15")
        if self.above is not None and not value > self.above:
            raise CellRefused(f"{read} is too small", f"{name} must be above {_bound(self.above, self.quantity)}")
        if self.least is not None and not value >= self.least:
            raise CellRefused(f"{read} is too small", f"{name} must be at least {_bound(self.least, self.quantity)}")
        if self.below is not None and not value < self.below:
            raise CellRefused(f"{read} is too large", f"{name} must be below {_bound(self.below, self.quantity)}")
        if self.most is not None and not value <= self.most:
            raise CellRefused(f"{read} is too large", f"{name} must be at most {_bound(self.most, self.quantity)}")

    def __get_pydantic_core_schema__(self, source: object, handler: GetCoreSchemaHandler) -> CoreSchema:
        """Let the model refuse what lies outside the bounds, whoever builds it."""

        def checked(value: Value, info: core_schema.ValidationInfo) -> Value:
            self.check(value, repr(value), info.field_name or "value")
            return value

        return core_schema.with_info_after_validator_function(checked, handler(source))


def _bound(bound: float, quantity: Quantity) -> str:
    return shown(bound, quantity, digits=6)


def value(quantity: Quantity) -> Holds:
    """Return what holds a value or rating: above 0, and 1e-18 or more."""
    return Holds("quantity", quantity, above=0.0, least=SMALLEST, below=TOO_LARGE)


def decibels() -> Holds:
    """Return what holds a ratio in dB: above 0, at most 400, which is 1e20."""
    return Holds("quantity", DECIBEL, above=0.0, least=SMALLEST, below=TOO_LARGE, most=MOST_DB)


def amount(quantity: Quantity) -> Holds:
    """Return what holds an error figure, a cost or a limit voltage: 0 or more."""
    return Holds("quantity", quantity, least=0.0, below=TOO_LARGE)


def fraction() -> Holds:
    """Return what holds a relative figure: 0 or more and below 1."""
    return Holds("quantity", FRACTION, least=0.0, below=1.0)


def temperature() -> Holds:
    """Return what holds a temperature in degrees Celsius: above absolute zero."""
    return Holds("quantity", TEMPERATURE, above=ABSOLUTE_ZERO_DEGC, below=TOO_LARGE)


def signed(quantity: Quantity) -> Holds:
    """Return what holds a figure of either sign."""
    return Holds("quantity", quantity, above=-TOO_LARGE, below=TOO_LARGE)


def count(least: int = 0, choices: tuple[int, ...] = ()) -> Holds:
    """Return what holds a whole number."""
    return Holds("quantity", COUNT, least=float(least), below=TOO_LARGE, choices=choices)


def choice(*names: str) -> Holds:
    """Return what holds one of a list of words."""
    return Holds("choice", choices=names)


TEXT = Holds("text")
FLAG = Holds("flag")
NAMES = Holds("names")
