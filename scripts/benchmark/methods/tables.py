"""Parts and spec of a small problem as tables and figures, under the names that the formulas have for them."""

from __future__ import annotations

from collections.abc import Sequence
from dataclasses import dataclass, fields

import pandas as pd

from scripts.benchmark.methods.formulas import RESISTORS
from selector.candidate import Conditions
from selector.candidate.design import cost_or_inf, in_stock
from selector.candidate.figures import amplifier_figures, resistor_figures, shunt_figures
from selector.parts import Capacitor, Part
from selector.search.shelf import Shelf

DERIVED = ("supply_min_v", "supply_max_v", "supply_change_v", "temperature_change_k", "hottest_k", "lsb_v")


@dataclass(frozen=True, slots=True)
class Problem:
    """A table for each place of a design, and the figures of the spec."""

    tables: dict[str, pd.DataFrame]
    spec: dict[str, float]


def problem_of(shelf: Shelf) -> Problem:
    """Return the tables and figures of a shelf."""
    conditions = shelf.conditions
    amplifiers = [amplifier_figures(part, conditions.supply_v) for part in shelf.amplifiers]
    biases = [{"bias_a": part.bias_current} for part in shelf.amplifiers]
    resistors = [_floats(resistor_figures(part)) for part in shelf.resistors]
    rows = {
        "shunt": _table("shunt", shelf.shunts, [_floats(shunt_figures(part)) for part in shelf.shunts]),
        "amplifier": _table(
            "amplifier",
            shelf.amplifiers,
            [_floats(figures) | bias for figures, bias in zip(amplifiers, biases, strict=True)],
        ),
        **{place: _table(place, shelf.resistors, resistors) for place in RESISTORS},
        "capacitor": _table("capacitor", shelf.capacitors, [_capacitor(part) for part in shelf.capacitors]),
    }
    return Problem(rows, _spec(conditions))


def _spec(conditions: Conditions) -> dict[str, float]:
    figures = _floats(conditions) | {name: float(getattr(conditions, name)) for name in DERIVED}
    band = conditions.bands[0]
    ceiling_v = min(conditions.output_high_v, conditions.reference_v)
    return figures | {"reading_frac": band.reading_frac, "floor_a": band.floor_a, "ceiling_v": ceiling_v}


def _capacitor(part: Capacitor) -> dict[str, float]:
    return {"farad": part.capacitance, "tolerance_frac": part.tolerance + (part.temp_change or 0.0)}


def _floats(figures: object) -> dict[str, float]:
    """Return the fields of a dataclass that are numbers."""
    values = {field.name: getattr(figures, field.name) for field in fields(figures)}  # type: ignore[arg-type] # any dataclass
    return {name: float(value) for name, value in values.items() if isinstance(value, int | float)}


def _table(place: str, parts: Sequence[Part], figures: Sequence[dict[str, float]]) -> pd.DataFrame:
    """Return parts as a table whose columns have the place in front."""
    common = [{"part": part.part, "cost": cost_or_inf(part), "held": float(in_stock(part))} for part in parts]
    frame = pd.DataFrame([first | second for first, second in zip(common, figures, strict=True)])
    return frame.add_prefix(f"{place}_")
