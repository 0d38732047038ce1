"""The choice of the output filter: every pair of a resistor and a capacitor, thinned limit by limit."""

from __future__ import annotations

from collections.abc import Sequence
from dataclasses import dataclass

import numpy as np
from numpy.typing import NDArray

from selector.candidate import Conditions, Design, Operating, cost_of
from selector.candidate.design import cost_or_inf, in_stock
from selector.candidate.figures import FilterFigures, filter_figures
from selector.limits import LIMITS, FilterCheck
from selector.limits.measure import ChoiceAt, ChoiceCheck
from selector.parts import Capacitor, Resistor
from selector.search.order import NEARLY, cost_key, rounded
from selector.search.stacks import stacked


@dataclass(frozen=True, slots=True)
class FilterBank:
    """All filter pairs with their figures as arrays of shape (pairs,): each resistor with every capacitor in turn."""

    conditions: Conditions
    resistors: tuple[Resistor, ...]
    capacitors: tuple[Capacitor, ...]
    figures: FilterFigures | None
    held_resistors: NDArray[np.float64]
    held_capacitors: NDArray[np.float64]
    resistor_costs: NDArray[np.float64]
    capacitor_costs: NDArray[np.float64]
    rows: dict[str, int]  # the place of each resistor

    def __len__(self) -> int:
        """Return the number of pairs."""
        return len(self.resistors) * len(self.capacitors)

    def pair(self, index: int) -> tuple[Resistor, Capacitor]:
        """Return the parts of a pair."""
        row, column = divmod(index, len(self.capacitors))
        return self.resistors[row], self.capacitors[column]

    def choose(
        self,
        ranges: Sequence[Operating],
        beside: ChoiceAt | None,
        lifted: frozenset[str] = frozenset(),
    ) -> int | str:
        """Return the index of the pair that a design takes, or the name of the limit that leaves none.

        `beside` holds the rest of the design; without it stock and cost are not looked at. Of what meets every
        limit, the pair with the smallest slow corner in the last range; ties: larger resistor, lower cost, names.
        """
        if self.figures is None:
            return next(limit.name for limit in LIMITS if limit.thins)
        left = np.ones(len(self), dtype=bool)
        filtered = [at.with_filter(self.figures) for at in ranges]
        for limit in LIMITS:
            if not limit.thins or limit.name in lifted:
                continue
            for check in limit.checks:
                if isinstance(check, FilterCheck):
                    measures = [check.measure(at) for at in filtered]
                elif isinstance(check, ChoiceCheck) and beside is not None:
                    measures = [check.measure(beside)]
                else:
                    continue
                for measure in measures:
                    if measure is not None:
                        left = left & measure.meets
            if not left.any():
                return limit.name
        return self._slowest(np.broadcast_to(filtered[-1].filter.slow_hz, left.shape), left)

    def _slowest(self, slow_hz: NDArray[np.float64], left: NDArray[np.bool_]) -> int:
        least = float(slow_hz[left].min())
        near = np.flatnonzero(left & (slow_hz <= least * NEARLY))
        return min((int(index) for index in near), key=lambda index: self._key(index, float(slow_hz[index])))

    def _key(self, index: int, slow_hz: float) -> tuple[float, float, tuple[bool, float], str, str]:
        resistor, capacitor = self.pair(index)
        known = resistor.unit_cost is not None and capacitor.unit_cost is not None
        cost = (resistor.unit_cost or 0.0) + (capacitor.unit_cost or 0.0) if known else None
        return rounded(slow_hz), -rounded(resistor.resistance), cost_key(cost), resistor.part, capacitor.part

    def beside(self, design: Design, exempt: frozenset[tuple[str, str]]) -> ChoiceAt:
        """Return every pair beside the rest of a design: uses of both its parts on one board, and the whole cost."""
        resistor_uses = np.ones((len(self.resistors), len(self.capacitors)))
        capacitor_uses = np.ones(len(self))
        for (kind, code), pieces in design.uses().items():
            if kind == Resistor.kind and code in self.rows:
                resistor_uses[self.rows[code]] += pieces
        cost = cost_of(design)
        return ChoiceAt(
            conditions=self.conditions,
            design=design,
            exempt=exempt,
            resistor_uses=resistor_uses.ravel(),
            capacitor_uses=capacitor_uses,
            held_resistors=self.held_resistors,
            held_capacitors=self.held_capacitors,
            cost=(np.inf if cost is None else cost) + self.resistor_costs + self.capacitor_costs,
        )


def bank_of(
    conditions: Conditions,
    resistors: Sequence[Resistor],
    capacitors: Sequence[Capacitor],
    exempt: frozenset[tuple[str, str]] = frozenset(),
) -> FilterBank:
    """Return all pairs of the given parts.

    A part whose cost is unknown costs infinitely much; of one in `exempt`, (kind, code), there is any number.
    """
    return FilterBank(
        conditions,
        tuple(resistors),
        tuple(capacitors),
        _figures(resistors, capacitors),
        np.repeat([_held(resistor, exempt) for resistor in resistors], len(capacitors)),
        np.tile([_held(capacitor, exempt) for capacitor in capacitors], len(resistors)),
        np.repeat([cost_or_inf(resistor) for resistor in resistors], len(capacitors)),
        np.tile([cost_or_inf(capacitor) for capacitor in capacitors], len(resistors)),
        {resistor.part: row for row, resistor in enumerate(resistors)},
    )


def _figures(resistors: Sequence[Resistor], capacitors: Sequence[Capacitor]) -> FilterFigures | None:
    if not resistors or not capacitors:
        return None
    by_resistor = stacked([filter_figures(resistor, capacitors[0]) for resistor in resistors])
    by_capacitor = stacked([filter_figures(resistors[0], capacitor) for capacitor in capacitors])
    return FilterFigures(
        ohm=np.repeat(by_resistor.ohm, len(capacitors)),
        tolerance_frac=np.repeat(by_resistor.tolerance_frac, len(capacitors)),
        farad=np.tile(by_capacitor.farad, len(resistors)),
        farad_tolerance_frac=np.tile(by_capacitor.farad_tolerance_frac, len(resistors)),
    )


def _held(part: Resistor | Capacitor, exempt: frozenset[tuple[str, str]]) -> float:
    return float("inf") if (part.kind, part.part) in exempt else float(in_stock(part))
