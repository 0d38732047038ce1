"""The exact order of enumerated combinations: figures of arrays say which matter, plain ones say in which order."""

from __future__ import annotations

from bisect import insort
from dataclasses import dataclass, replace
from functools import cached_property
from math import isinf
from typing import TYPE_CHECKING

import numpy as np

from selector.candidate import Design
from selector.search.assess import chain_of, stopped_at, uses_of
from selector.search.bank import bank_of
from selector.search.order import cost_key, rounded
from selector.search.standing import rank_of
from tests.search.enumerated_parts import NONE

if TYPE_CHECKING:
    from collections.abc import Callable

    from selector.search.bank import FilterBank
    from selector.search.objective import Score
    from selector.search.shelf import Shelf
    from selector.search.standing import Rank
    from tests.search.enumerated_parts import Numbers, Places

REACH = 1.0 + 1e-9  # how far above the last place of a list a combination is looked at
SLACK = 1e-14  # how far a score of the arrays may be from the plain one, relative


@dataclass(frozen=True)
class Enumerated:
    """Every combination that meets all limits.

    A row of `places` is a combination: shunt, amplifier, switch, common, the resistors of all ranges, filter resistor
    and filter capacitor by their places on the shelf. `score` and `cost` are figures of the arrays.
    """

    shelf: Shelf
    objective: Score
    places: Places
    score: Numbers
    cost: Numbers

    @cached_property
    def bank(self) -> FilterBank:
        """Return the filters that plain numbers choose from."""
        return bank_of(self.shelf.conditions, self.shelf.resistors, self.shelf.capacitors)

    def pairs(self) -> list[Rank]:
        """Return the best combination of each pair of shunt and amplifier, best first."""
        keys = self.places[:, 0] * len(self.shelf.amplifiers) + self.places[:, 1]
        return sorted(rank for key in np.unique(keys) for rank in self._head(np.flatnonzero(keys == key), 1))

    def variants(self, top: int | None = None) -> list[Rank]:
        """Return the best combinations whatever their pair, best first; all where `top` is None."""
        return self._head(np.arange(len(self.score)), len(self.score) if top is None else top)

    def _head(self, rows: Places, most: int) -> list[Rank]:
        """Return the best of some rows: those that could be among them are judged in plain numbers, best first."""
        if len(rows) > most:
            last = np.partition(self.score[rows], most - 1)[most - 1]
            rows = rows[self.score[rows] <= last * REACH]
        best: list[Rank] = []
        for row in self._sorted(rows):
            design = self.design(self.places[row])
            if len(best) >= most and best[most - 1] < rank_of(self._least(self.score[row]), design):
                break
            insort(best, self._rank(float(self.score[row]), design))
        return best[:most]

    def _sorted(self, rows: Places) -> Places:
        """Return rows by the least score that they can have, cost and names."""
        score = _each(self.score[rows], lambda score: rounded(self._least(score)))
        cost = _each(self.cost[rows], lambda cost: cost if isinf(cost) else cost_key(cost)[1])
        return rows[np.lexsort((*self.places[rows].T[::-1], cost, score))]

    @staticmethod
    def _least(score: float) -> float:
        return float(score) * (1.0 - SLACK)

    def design(self, places: Places) -> Design:
        """Return the design of a row of places; one without a filter has it still to be chosen."""
        shelf = self.shelf
        shunt, amplifier, switch, common, *gain, resistor, capacitor = (int(place) for place in places)
        return Design(
            (shelf.shunts[shunt],),
            shelf.amplifiers[amplifier],
            None if switch == NONE else shelf.switches[switch],
            None if common == NONE else shelf.resistors[common],
            tuple(shelf.resistors[place] for place in gain if place != NONE) or None,
            None if resistor == NONE else shelf.resistors[resistor],
            None if capacitor == NONE else shelf.capacitors[capacitor],
        )

    def judged(self, design: Design) -> tuple[float, Design] | str:
        """Return the plain score of a design, with the filter it takes, or the limit at which it stops."""
        open_design = replace(design, filter_resistor=None, filter_capacitor=None)
        chain = stopped_at(chain_of(self.shelf.conditions, open_design), self.bank)
        if isinstance(chain, str):
            return chain
        uses = uses_of(chain)
        return float(self.objective.of(uses.power, uses.burden, uses.headroom, uses.error)), chain.design

    def _rank(self, score: float, design: Design) -> Rank:
        """Return the rank of a combination in plain numbers: same verdict, same filter, same score."""
        judged = self.judged(design)
        assert not isinstance(judged, str), f"{design.names()} stops at {judged}"
        plain, taken = judged
        assert taken.names() == design.names()
        assert abs(plain - score) <= SLACK * plain, f"{design.names()}: {plain!r} in plain numbers, {score!r} in arrays"
        return rank_of(plain, taken)


def _each(values: Numbers, key: Callable[[float], float]) -> Numbers:
    """Return the key of every value; equal values are asked once."""
    distinct, inverse = np.unique(values, return_inverse=True)
    return np.array([key(float(value)) for value in distinct])[inverse]
