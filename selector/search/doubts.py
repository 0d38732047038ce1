"""Whether stock or cost may take a design's filter away from it, so that it takes another one."""

from __future__ import annotations

from collections.abc import Iterator
from dataclasses import dataclass, replace
from math import inf, isfinite

import numpy as np

from selector.candidate.design import in_stock
from selector.search.bench import Bench
from selector.search.ladder import Ladder
from selector.search.lots import NONE
from selector.search.prices import spare_of
from selector.search.rows import Line
from selector.search.solve import Lane


@dataclass(frozen=True, slots=True)
class Doubts:
    """The doubts about the filters of one row; `spare` is what the cost limit leaves for gain resistors and filter."""

    bench: Bench
    ladder: Ladder
    copies: int
    places: int
    common: int
    spare: float
    whole: bool  # nothing is certain: with limits lifted, a last range's swing may decide

    @classmethod
    def of(cls, bench: Bench, line: Line) -> Doubts:
        """Return the doubts about a row."""
        if bench.ladder is None:
            message = "without filters there is none to doubt"
            raise ValueError(message)
        law, common = line.lot.family.law, int(line.common[0])
        return cls(
            bench,
            bench.ladder,
            law.copies,
            0 if law.switched_name is None else line.lot.range_count,
            common,
            float(spare_of(bench, line)[0]),
            bool(bench.lifted) and isfinite(bench.conditions.settle_s),
        )

    def lanes(self, lane: Lane) -> Iterator[Lane]:
        """Yield a lane with one filter as what is certain of it, and what is in doubt."""
        step = 0 if lane.step is None else int(lane.step)
        if self.whole or self._short(step, self.common):
            yield replace(lane, step=None, doubtful=True)
            return
        place = self._place(step)
        scarce = place != NONE and self.places > 0 and self._short(step, place)
        most = self.spare - self._cost(step) if isfinite(self.spare) else inf
        certain = replace(lane, barred=place if scarce else NONE, cost_most=most)
        if most > -inf:
            yield certain
        if scarce:
            yield replace(lane, step=None, doubtful=True, needed=place)
        if most < self._dearest():
            yield replace(lane, step=None, doubtful=True, barred=certain.barred, cost_above=most)

    def of_single(self, step: int, switched: int) -> bool:
        """Return whether a design with one range might take another filter."""
        cost = 0.0 if switched == NONE else self.copies * float(self.bench.resistors.costs[switched])
        dear = isfinite(self.spare) and cost > self.spare - self._cost(step)
        return self.whole or self._short(step, self.common) or self._short(step, switched) or dear

    def _place(self, step: int) -> int:
        """Return the place among the gain resistors of a filter's resistor."""
        resistor, _ = self.bench.bank.pair(int(self.ladder.places[step]))
        return self.bench.resistors.place[resistor.part]

    def _short(self, step: int, place: int) -> bool:
        """Return whether a filter's resistor would be short if it stood in a place of the gain network as well."""
        conditions = self.bench.conditions
        if not conditions.stock_only or place == NONE or place != self._place(step):
            return False
        most = 1 + self.copies * (1 + (place == self.common))
        return in_stock(self.bench.resistors.parts[place]) < conditions.boards * most

    def _cost(self, step: int) -> float:
        place = self.ladder.places[step]
        return float(self.bench.bank.resistor_costs[place] + self.bench.bank.capacitor_costs[place])

    def _dearest(self) -> float:
        return self.copies * self.places * float(np.max(self.bench.resistors.costs, initial=0.0))
