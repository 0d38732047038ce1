"""What every part has, whatever its kind."""

from __future__ import annotations

from collections.abc import Mapping
from typing import Annotated, ClassVar, Self

from pydantic import AfterValidator, BaseModel, ConfigDict, model_validator

from selector.parts.code import clean_code, clean_text
from selector.parts.holds import FLAG, NAMES, TEXT, Value, amount, count
from selector.parts.rules import Rule, Wrong, known_fields
from selector.units import MONEY

Text = Annotated[str, TEXT, AfterValidator(clean_text)]
Code = Annotated[str, TEXT, AfterValidator(clean_code)]


class Part(BaseModel):
    """A part of the catalogue: fields as interface.md names them, SI units, degC, dB and fractions.

    A field that is absent is None, never zero, unless it has a default.
    """

    # built when a part is first judged: lists and searches take parts that were judged when they came in
    model_config = ConfigDict(frozen=True, extra="forbid", strict=True, defer_build=True)

    kind: ClassVar[str]
    rules: ClassVar[tuple[Rule, ...]] = ()
    fills: ClassVar[tuple[str, ...]] = ()
    """The fields that `completed` may fill in."""

    part: Code
    description: Text = ""
    note: Text = ""
    unit_cost: Annotated[float | None, amount(MONEY)] = None
    currency: Annotated[str | None, TEXT] = None
    quantity: Annotated[int | None, count()] = None
    location: Text = ""
    source: Text = ""
    generic: Annotated[bool, FLAG] = False
    typical: Annotated[tuple[str, ...], NAMES] = ()
    assumed: Annotated[tuple[str, ...], NAMES] = ()

    @classmethod
    def wrong_in(cls, values: Mapping[str, Value]) -> list[Wrong]:
        """Return what cannot stand beside each other among the values read; a field that could not be is not there."""
        rules = (known_fields(cls.model_fields), *cls.rules)
        return [wrong for rule in rules for wrong in rule(values)]

    @classmethod
    def completed(cls, values: Mapping[str, Value]) -> Mapping[str, Value]:
        """Return values with those that follow from others filled in."""
        return values

    def derived(self) -> frozenset[str]:
        """Return the fields whose values follow from other fields, so that they need not be stated."""
        return frozenset()

    @model_validator(mode="after")
    def _holds_together(self) -> Self:
        """Refuse figures that cannot stand beside each other."""
        wrong = self.wrong_in(dict(self))
        if wrong:
            raise ValueError("; ".join(f"{each.field}: {each.what}" for each in wrong))
        return self
