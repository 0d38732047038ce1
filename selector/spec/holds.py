"""What a key of the spec holds: its sort, quantity, bounds and meaning, declared beside the field."""

from __future__ import annotations

import math
import operator
from dataclasses import dataclass
from typing import Literal

from pydantic import GetCoreSchemaHandler
from pydantic_core import CoreSchema, core_schema

from selector.real import SMALLEST
from selector.units import COUNT, FRACTION, MONEY, RATIO, TEMPERATURE, Quantity, QuantityError, shown

Sort = Literal["quantity", "choice", "flag", "text", "codes", "codes by kind", "bands"]

TOO_LARGE = 1e15
ABSOLUTE_ZERO_DEGC = -273.15
_NUMBERS = (COUNT, RATIO, MONEY)


class KeyRefused(QuantityError):
    """A value that its key cannot take: what was read, and what would be right."""


@dataclass(frozen=True, slots=True)
class Holds:
    """What a key holds; stands in the field's Annotated type and is enforced by the model.

    Bounds are in SI units: `least` <= value <= `most`, `above` < value < `below`; no figure reaches 1e15. `choices` are
    the only words taken. `example` is what a new spec shows, as TOML without quotes.
    """

    sort: Sort
    meaning: str
    example: str = ""
    quantity: Quantity | None = None
    least: float | None = None
    above: float | None = None
    below: float | None = None
    most: float | None = None
    choices: tuple[str, ...] = ()

    @property
    def written(self) -> str:
        """Return the example as TOML: what has a unit, and words, in quotes."""
        plain = self.sort in ("flag", "codes", "codes by kind", "bands") or self.quantity in _NUMBERS
        return self.example if plain else f'"{self.example}"'

    @property
    def wanted(self) -> str:
        """Return the remedy that says what the key takes."""
        if self.choices:
            return f"write one of {', '.join(self.choices)}"
        if self.sort == "flag":
            return "write true or false, without quotes"
        return f"for example {self.written}"

    def check(self, value: float, read: str) -> None:
        """Raise KeyRefused where a figure lies outside the bounds; `read` is how it stood in the input."""
        if not math.isfinite(value):
            raise KeyRefused(f"{read} is no finite number", self.wanted)
        if abs(value) >= TOO_LARGE:
            raise KeyRefused(f"{read} is too large for any calculation", self.wanted)
        for bound, holds, words in (
            (self.above, operator.gt, "above"),
            (self.least, operator.ge, "at least"),
            (self.below, operator.lt, "below"),
            (self.most, operator.le, "at most"),
        ):
            if bound is not None and not holds(value, bound):
                raise KeyRefused(f"{read} is not {words} {self._shown(bound)}", self.wanted)

    def _shown(self, bound: float) -> str:
        return shown(bound, self.quantity, digits=6) if self.quantity else f"{bound:g}"

    def __get_pydantic_core_schema__(self, source: object, handler: GetCoreSchemaHandler) -> CoreSchema:
        """Let the model refuse what lies outside the bounds, whoever builds it."""

        def checked(value: object) -> object:
            if self.choices and value is not None and value not in self.choices:
                raise KeyRefused(f"{value!r} is no choice", self.wanted)
            if isinstance(value, int | float) and not isinstance(value, bool):
                self.check(value, repr(value))
            return value

        return core_schema.no_info_after_validator_function(checked, handler(source))


def value(quantity: Quantity, meaning: str, example: str) -> Holds:
    """Return what holds a value or a limit: above 0, and 1e-18 or more."""
    return Holds("quantity", meaning, example, quantity, above=0.0, least=SMALLEST)


def amount(quantity: Quantity, meaning: str, example: str) -> Holds:
    """Return what holds an error figure or a voltage: 0 or more."""
    return Holds("quantity", meaning, example, quantity, least=0.0)


def fraction(meaning: str, example: str) -> Holds:
    """Return what holds a relative figure: 0 or more and below 1."""
    return Holds("quantity", meaning, example, FRACTION, least=0.0, below=1.0)


def temperature(meaning: str, example: str) -> Holds:
    """Return what holds a temperature in degrees Celsius."""
    return Holds("quantity", meaning, example, TEMPERATURE, above=ABSOLUTE_ZERO_DEGC)


def count(meaning: str, example: str, least: int, most: int | None = None) -> Holds:
    """Return what holds a whole number between two."""
    top = None if most is None else float(most)
    return Holds("quantity", meaning, example, COUNT, least=float(least), most=top)


def weight(meaning: str) -> Holds:
    """Return what holds a weight of the score: 0 or more."""
    return amount(RATIO, meaning, "1")


def positive(meaning: str, example: str) -> Holds:
    """Return what holds a plain number above 0."""
    return value(RATIO, meaning, example)


def share(meaning: str, example: str) -> Holds:
    """Return what holds a part of a whole: above 0, at most all of it."""
    return Holds("quantity", meaning, example, FRACTION, above=0.0, least=SMALLEST, most=1.0)


def choice(meaning: str, *words: str) -> Holds:
    """Return what holds one of a list of words."""
    return Holds("choice", meaning, words[0], choices=words)


def flag(meaning: str) -> Holds:
    """Return what holds true or false."""
    return Holds("flag", meaning, "true")


def text(meaning: str, example: str) -> Holds:
    """Return what holds free text."""
    return Holds("text", meaning, example)
