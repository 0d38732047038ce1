"""The resistors of a search by resistance, and what a stretch of them has at best."""

from __future__ import annotations

from collections.abc import Sequence
from dataclasses import dataclass
from functools import cached_property

import numpy as np
from numpy.typing import NDArray

from selector.candidate.design import cost_or_inf
from selector.candidate.figures import ResistorFigures, resistor_figures
from selector.parts import Resistor
from selector.search.interval import Interval
from selector.search.stacks import Indices, stacked
from selector.search.stretches import doubled, least_between

Numbers = NDArray[np.float64]
NEAR = 1e-9  # how far a resistance worked out of a gain may be off, relative
CLASSES = 12  # of tolerance and drift that commons are kept apart by


@dataclass(frozen=True)
class Resistors:
    """Resistors by rising resistance; everywhere in the search a resistor is its place among `parts`."""

    parts: tuple[Resistor, ...]
    figures: ResistorFigures
    temperature_change_k: float

    def __len__(self) -> int:
        """Return the number of resistors."""
        return len(self.parts)

    @cached_property
    def ohm(self) -> Numbers:
        """Return the resistances, ohm."""
        return np.asarray(self.figures.ohm)

    @cached_property
    def place(self) -> dict[str, int]:
        """Return the place of each resistor by its code."""
        return {part.part: place for place, part in enumerate(self.parts)}

    @cached_property
    def costs(self) -> Numbers:
        """Return the cost of each, infinite where none is stated."""
        return np.array([cost_or_inf(part) for part in self.parts])

    @cached_property
    def whole(self) -> ResistorFigures:
        """Return what all resistors have between them, as intervals."""
        return self.between(np.array([0]), np.array([len(self)]))

    @cached_property
    def _least(self) -> tuple[Numbers, Numbers]:
        """Return the least tolerance and drift of every stretch of 1, 2, 4 … resistors."""
        return doubled(np.asarray(self.figures.tolerance_frac)), doubled(np.asarray(self.figures.tempco_per_k))

    @cached_property
    def _most(self) -> tuple[float, float]:
        return float(np.max(self.figures.tolerance_frac)), float(np.max(self.figures.tempco_per_k))

    def between(self, begin: Indices, end: Indices) -> ResistorFigures:
        """Return what the resistors of begin <= place < end have between them, as intervals; none is empty."""
        tolerance, tempco = (least_between(table, begin, end) for table in self._least)
        return ResistorFigures(
            Interval(self.ohm[begin], self.ohm[end - 1]).real(),
            Interval(tolerance, np.full(tolerance.shape, self._most[0])).real(),
            Interval(tempco, np.full(tempco.shape, self._most[1])).real(),
        )

    def of(self, places: Sequence[Indices]) -> ResistorFigures:
        """Return what each of several groups of resistors has between them, as intervals of shape (groups, 1)."""
        if all(len(group) == len(self) for group in places):
            return self.whole
        ends = []
        for figure in (self.figures.ohm, self.figures.tolerance_frac, self.figures.tempco_per_k):
            each = [np.asarray(figure)[group] for group in places]
            low = np.array([one.min() for one in each])[:, None]
            ends.append(Interval(low, np.array([one.max() for one in each])[:, None]).real())
        return ResistorFigures(*ends)

    def near(self, ohm: Interval) -> tuple[Indices, Indices]:
        """Return begin and end of the places whose resistance lies in an interval."""
        begin = np.searchsorted(self.ohm, np.asarray(ohm.low) * (1.0 - NEAR), side="left")
        end = np.searchsorted(self.ohm, np.asarray(ohm.high) * (1.0 + NEAR), side="right")
        return begin, end

    @cached_property
    def alike(self) -> list[Indices]:
        """Return the places by what they add to an error, the best first; by resistance within a class."""
        drift = np.asarray(self.figures.tempco_per_k) * self.temperature_change_k
        spread = np.asarray(self.figures.tolerance_frac) + drift
        values = np.array(sorted({float(f"{one:.3g}") for one in spread}))
        if len(values) > CLASSES:
            values = np.quantile(spread, np.linspace(0.0, 1.0, CLASSES + 1)[1:])
        of_class = np.searchsorted(values, spread * (1.0 - 1e-3), side="left")
        return [np.flatnonzero(of_class == one) for one in sorted(set(of_class.tolist()))]


def resistors_of(parts: Sequence[Resistor], temperature_change_k: float) -> Resistors:
    """Return the resistors by rising resistance; equal ones stay in their order."""
    rising = tuple(sorted(parts, key=lambda one: one.resistance))
    each = [resistor_figures(part) for part in rising]
    figures = stacked(each) if each else ResistorFigures(*[np.empty(0)] * 3)
    return Resistors(rising, figures, temperature_change_k)
