"""The table of a kind's fields, from which the catalogue's schema, CSV headings and templates are made."""

from __future__ import annotations

from dataclasses import dataclass
from functools import cache

from pydantic.fields import FieldInfo

from selector.parts.base import Part
from selector.parts.holds import Holds, Sort, Value
from selector.parts.kinds import KINDS
from selector.units import COUNT, Quantity


@dataclass(frozen=True, slots=True)
class Column:
    """One field of a kind.

    Bounds are in SI units: `least` <= value <= `most`, `above` < value < `below`; None is no bound.
    """

    name: str
    holds: Holds
    required: bool
    default: Value

    @property
    def sort(self) -> Sort:
        """Return what the field holds: quantity, text, flag, choice or names."""
        return self.holds.sort

    @property
    def quantity(self) -> Quantity | None:
        """Return the quantity of a figure, else None."""
        return self.holds.quantity

    @property
    def whole(self) -> bool:
        """Return whether the figure is a whole number."""
        return self.holds.quantity is COUNT

    @property
    def real(self) -> bool:
        """Return whether the value is kept as a float: a figure that need not be whole."""
        return self.sort == "quantity" and not self.whole

    @property
    def least(self) -> float | None:
        """Return the least value allowed."""
        return self.holds.least

    @property
    def above(self) -> float | None:
        """Return what the value must lie above."""
        return self.holds.above

    @property
    def below(self) -> float | None:
        """Return what the value must lie below."""
        return self.holds.below

    @property
    def most(self) -> float | None:
        """Return the largest value allowed."""
        return self.holds.most

    @property
    def choices(self) -> tuple[str | int, ...]:
        """Return the only values allowed, none where any is."""
        return self.holds.choices


@cache
def columns(kind: str) -> tuple[Column, ...]:
    """Return the fields of a kind, those that every part has first; KeyError for a kind there is not."""
    return columns_of(KINDS[kind])


@cache
def columns_of(model: type[Part]) -> tuple[Column, ...]:
    """Return the fields of a model in the order in which they are declared."""
    return tuple(_column(name, field) for name, field in model.model_fields.items())


def _column(name: str, field: FieldInfo) -> Column:
    holds = next(each for each in field.metadata if isinstance(each, Holds))
    required = field.is_required()
    return Column(name, holds, required, None if required else field.default)
