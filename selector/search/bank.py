"""The choice of the output filter: every pair of a resistor and a capacitor, thinned limit by limit."""

from __future__ import annotations

from collections.abc import Sequence
from dataclasses import dataclass

import numpy as np
from numpy.typing import NDArray

from selector.candidate import Conditions, Design, Operating, cost_of
from selector.candidate.design import cost_or_inf, in_stock
from selector.candidate.figures import FilterFigures, filter_figures, stacked
from selector.limits import LIMITS, FilterCheck
from selector.limits.measure import ChoiceAt, ChoiceCheck
from selector.parts import Capacitor, Resistor
from selector.search.order import NEARLY, cost_key, rounded


@dataclass(frozen=True, slots=True)
class FilterBank:
    """All filter pairs with their figures as arrays of shape (pairs,)."""

    conditions: Conditions
    pairs: tuple[tuple[Resistor, Capacitor], ...]
    figures: FilterFigures | None
    held_resistors: NDArray[np.float64]
    held_capacitors: NDArray[np.float64]
    resistor_costs: NDArray[np.float64]
    capacitor_costs: NDArray[np.float64]
    resistor_rows: dict[str, NDArray[np.int64]]  # the pairs that each resistor stands in

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
        left = np.ones(len(self.pairs), dtype=bool)
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
        resistor, capacitor = self.pairs[index]
        known = resistor.unit_cost is not None and capacitor.unit_cost is not None
        cost = (resistor.unit_cost or 0.0) + (capacitor.unit_cost or 0.0) if known else None
        return rounded(slow_hz), -rounded(resistor.resistance), cost_key(cost), resistor.part, capacitor.part

    def beside(self, design: Design, exempt: frozenset[tuple[str, str]]) -> ChoiceAt:
        """Return every pair beside the rest of a design: uses of both its parts on one board, and the whole cost."""
        resistor_uses = np.ones(len(self.pairs))
        capacitor_uses = np.ones(len(self.pairs))
        for (kind, code), pieces in design.uses().items():
            if kind == Resistor.kind and code in self.resistor_rows:
                resistor_uses[self.resistor_rows[code]] += pieces
        cost = cost_of(design)
        return ChoiceAt(
            conditions=self.conditions,
            design=design,
            exempt=exempt,
            resistor_uses=resistor_uses,
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
    pairs = tuple((resistor, capacitor) for resistor in resistors for capacitor in capacitors)
    each = [filter_figures(resistor, capacitor) for resistor, capacitor in pairs]
    return FilterBank(
        conditions,
        pairs,
        stacked(each) if each else None,
        np.array([_held(resistor, exempt) for resistor, _ in pairs]),
        np.array([_held(capacitor, exempt) for _, capacitor in pairs]),
        np.array([cost_or_inf(resistor) for resistor, _ in pairs]),
        np.array([cost_or_inf(capacitor) for _, capacitor in pairs]),
        _rows([resistor.part for resistor, _ in pairs]),
    )


def _rows(codes: list[str]) -> dict[str, NDArray[np.int64]]:
    rows: dict[str, list[int]] = {}
    for index, code in enumerate(codes):
        rows.setdefault(code, []).append(index)
    return {code: np.array(indices, dtype=np.int64) for code, indices in rows.items()}


def _held(part: Resistor | Capacitor, exempt: frozenset[tuple[str, str]]) -> float:
    return float("inf") if (part.kind, part.part) in exempt else float(in_stock(part))
