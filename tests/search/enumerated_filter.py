"""The output filter that each of many combinations takes."""

from __future__ import annotations

from dataclasses import dataclass, field
from itertools import product
from math import isinf
from typing import TYPE_CHECKING

import numpy as np

from selector.candidate.design import cost_or_inf, in_stock
from selector.candidate.figures import (
    NO_RESISTOR,
    FilterFigures,
    ResistorFigures,
    filter_figures,
    resistor_figures,
)
from selector.limits import LIMITS, FilterCheck, fits
from selector.physics.filters import corner_hz
from selector.search.order import cost_key, rounded
from selector.search.stacks import stacked
from tests.search.enumerated_parts import NONE, cost_of_each, pieces_of_each, switches_suffice

if TYPE_CHECKING:
    from numpy.typing import NDArray

    from selector.candidate import Operating, Pairing
    from selector.parts import Capacitor, Resistor
    from selector.search.shelf import Shelf
    from tests.search.enumerated_parts import Frame, Numbers, Places

    Truths = NDArray[np.bool_]


@dataclass(frozen=True)
class FilterChoice:
    """All pairs of a resistor and a capacitor of a shelf, and the order in which they are taken behind an output.

    `resistors` are the gain resistors by their places on the shelf, and last what stands for none.
    """

    shelf: Shelf
    pairs: tuple[tuple[Resistor, Capacitor], ...]
    figures: FilterFigures
    resistors: ResistorFigures
    _orders: dict[float, Places] = field(default_factory=dict)

    @classmethod
    def among(cls, shelf: Shelf) -> FilterChoice:
        """Return the choice among all filters of a shelf."""
        pairs = tuple(product(shelf.resistors, shelf.capacitors))
        figures = [filter_figures(resistor, capacitor) for resistor, capacitor in pairs]
        return cls(
            shelf,
            pairs,
            stacked(figures) if figures else FilterFigures(*[np.empty(0)] * 4),
            stacked([*map(resistor_figures, shelf.resistors), NO_RESISTOR]),
        )

    def resistors_at(self, places: Places) -> ResistorFigures:
        """Return the figures of the gain resistors at some places."""
        every = self.resistors
        return ResistorFigures(every.ohm[places], every.tolerance_frac[places], every.tempco_per_k[places])

    def filters_at(self, places: Places) -> FilterFigures:
        """Return the figures of the filters at some places."""
        every = self.figures
        return FilterFigures(
            every.ohm[places], every.tolerance_frac[places], every.farad[places], every.farad_tolerance_frac[places]
        )

    def of(self, frame: Frame, pairing: Pairing, network: Places) -> Places:
        """Return the place of the filter that every combination takes, -1 where none is left.

        Of the filters that serve every range, and are left in stock and cost, the first in the order that the
        resistance of the last range's output gives them.
        """
        taken = np.full(network.shape[1], NONE)
        if not self.pairs or not network.size or not switches_suffice(self.shelf, frame):
            return taken
        left = self._in_stock(frame, network) & self._affordable(frame, network)
        for number in range(1, frame.count + 1):
            left &= self._serving(pairing, network[0], network[number], last=number == frame.count)
        last = pairing.operate(self.resistors_at(network[0]), self.resistors_at(network[-1]), last=True)
        output_ohm = np.asarray(last.output_ohm)
        for ohm in np.unique(output_ohm):
            rows, order = np.flatnonzero(output_ohm == ohm), self._order(float(ohm))
            among = left[np.ix_(rows, order)]
            taken[rows] = np.where(among.any(axis=1), order[among.argmax(axis=1)], NONE)
        return taken

    def costs(self, rest: Numbers) -> Numbers:
        """Return the whole cost with every filter beside the cost of the rest, of the shape (rests, filters)."""
        resistors = np.array([cost_or_inf(resistor) for resistor, _ in self.pairs])
        capacitors = np.array([cost_or_inf(capacitor) for _, capacitor in self.pairs])
        return np.asarray(rest[:, np.newaxis] + resistors + capacitors)

    def _affordable(self, frame: Frame, network: Places) -> Truths:
        rest, inverse = np.unique(cost_of_each(self.shelf, frame, network), return_inverse=True)
        limit = self.shelf.conditions.cost_limit
        affordable = np.full((len(rest), len(self.pairs)), isinf(limit))
        return (affordable if isinf(limit) else np.asarray(fits(self.costs(rest), limit)))[inverse]

    def _in_stock(self, frame: Frame, network: Places) -> Truths:
        """Return where the gain network leaves the resistor of a filter; of all other parts the shelf has enough."""
        conditions = self.shelf.conditions
        if not conditions.stock_only:
            return np.ones((network.shape[1], len(self.pairs)), dtype=bool)
        held = np.array([in_stock(resistor) for resistor in self.shelf.resistors])
        over = held - conditions.boards * pieces_of_each(self.shelf, frame, network)
        enough = np.repeat(over >= conditions.boards, len(self.shelf.capacitors), axis=1)
        return np.asarray(enough & (over >= 0).all(axis=1)[:, np.newaxis])

    def _serving(self, pairing: Pairing, common: Places, switched: Places, *, last: bool) -> Truths:
        """Return which filter serves which range; ranges of the same two resistors are asked once."""
        number = common * (len(self.shelf.resistors) + 1) + switched
        _, first, inverse = np.unique(number, return_index=True, return_inverse=True)
        at = pairing.operate(
            self.resistors_at(common[first, np.newaxis]), self.resistors_at(switched[first, np.newaxis]), last=last
        )
        return self._serves(at.with_filter(self.figures), len(first))[inverse]

    def _serves(self, filtered: Operating, ranges: int) -> Truths:
        serves = np.ones((ranges, len(self.pairs)), dtype=bool)
        for check in (check for limit in LIMITS if limit.thins for check in limit.checks):
            measure = check.measure(filtered) if isinstance(check, FilterCheck) else None
            if measure is not None:
                serves &= measure.meets
        return serves

    def _order(self, output_ohm: float) -> Places:
        """Return the places of the filters: slowest corner first, then larger resistor, lower cost, names."""
        if output_ohm not in self._orders:
            most_ohm = self.figures.ohm * (1.0 + self.figures.tolerance_frac)
            most_farad = self.figures.farad * (1.0 + self.figures.farad_tolerance_frac)
            slow_hz = np.asarray(corner_hz(most_ohm + output_ohm, most_farad))
            places = sorted(range(len(self.pairs)), key=lambda place: self._key(place, float(slow_hz[place])))
            self._orders[output_ohm] = np.array(places)
        return self._orders[output_ohm]

    def _key(self, place: int, slow_hz: float) -> tuple[float, float, tuple[bool, float], str, str]:
        resistor, capacitor = self.pairs[place]
        cost = cost_or_inf(resistor) + cost_or_inf(capacitor)
        known = cost_key(None if isinf(cost) else cost)
        return rounded(slow_hz), -rounded(resistor.resistance), known, resistor.part, capacitor.part
