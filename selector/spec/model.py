"""The measurement spec: what is to be measured, with what, and how well."""

from __future__ import annotations

from typing import Annotated, Self

from pydantic import model_validator

from selector.spec.choices import Filter, Parts, Ranges
from selector.spec.circuit import Ambient, Converter, Output, Sense, Supply
from selector.spec.demand import Accuracy, Current, Limits, Rank, Section, Signal
from selector.spec.holds import text
from selector.spec.rules import RULES, values_of


class Spec(Section):
    """A measurement spec; sections and keys as interface.md names them, SI units, degC, LSB and fractions."""

    title: Annotated[str, text("a line that says what this is for", "Orchard frost alarm, node 7")] = ""
    current: Current
    accuracy: Accuracy
    limits: Limits
    supply: Supply
    sense: Sense = Sense.model_construct()
    output: Output = Output.model_construct()
    converter: Converter
    ambient: Ambient
    signal: Signal
    ranges: Ranges = Ranges.model_construct()
    filter: Filter = Filter.model_construct()
    parts: Parts = Parts.model_construct()
    rank: Rank = Rank.model_construct()

    @property
    def output_high_v(self) -> float:
        """Return the highest output voltage to be used, V: the supply where the spec states none."""
        return self.supply.voltage if self.output.high is None else self.output.high

    @model_validator(mode="after")
    def _holds_together(self) -> Self:
        """Refuse entries that cannot stand beside each other."""
        wrong = [wrong for rule in RULES for wrong in rule.wrong_in(values_of(self))]
        if wrong:
            raise ValueError("; ".join(f"{each.key}: {each.what}" for each in wrong))
        return self
