"""Every combination judged by arrays, none passed over for a bound: the oracle of the search on middling catalogues.

Only what a combination is made of, its filter and its order come from beside; figures and limits are those of the
formulas, which take arrays as they take plain numbers.
"""

from __future__ import annotations

from dataclasses import dataclass, replace
from functools import cached_property
from typing import TYPE_CHECKING

import numpy as np

from selector.budget import combined, zeroed
from selector.candidate.chain import Chain
from selector.candidate.uses import power_w, use_headroom
from selector.limits import LIMITS, DesignCheck, use_of, worst_point
from selector.search.assess import pairing_of
from selector.search.objective import Score, score_of
from selector.search.shelf import shelf_of
from tests.search.enumerated_filter import FilterChoice
from tests.search.enumerated_order import Enumerated
from tests.search.enumerated_parts import NONE, cost_of_each, frames, networks

if TYPE_CHECKING:
    from collections.abc import Iterator, Mapping

    from selector.candidate import Operating, Pairing
    from selector.parts import Part
    from selector.search.shelf import Shelf
    from selector.spec import Spec
    from tests.search.enumerated_filter import Truths
    from tests.search.enumerated_parts import Frame, Numbers, Places


OTHER_PLACES = 6  # of a combination, besides the resistors of its ranges


def enumerated(spec: Spec, stock: Mapping[str, tuple[Part, ...]]) -> Enumerated:
    """Return every combination of a catalogue that meets all limits."""
    shelf = shelf_of(spec, stock)
    filters, objective = FilterChoice.among(shelf), score_of(spec)
    chunks = [chunk for frame in frames(shelf) for chunk in Judge(shelf, frame, filters, objective).chunks()]
    width = OTHER_PLACES + shelf.conditions.ranges_most
    return Enumerated(
        shelf,
        objective,
        np.concatenate([np.empty((0, width), dtype=np.int64), *(chunk.places for chunk in chunks)]),
        np.concatenate([np.empty(0), *(chunk.score for chunk in chunks)]),
        np.concatenate([np.empty(0), *(chunk.cost for chunk in chunks)]),
    )


@dataclass(frozen=True, slots=True)
class Fitting:
    """The combinations of a chunk that meet all limits: rows of places, their scores and costs."""

    places: Places
    score: Numbers
    cost: Numbers


@dataclass(frozen=True)
class Judge:
    """One frame with all its gain networks."""

    shelf: Shelf
    frame: Frame
    filters: FilterChoice
    objective: Score

    @cached_property
    def pairing(self) -> Pairing:
        """Return shunt, amplifier and switch as they are tried with the number of ranges."""
        return pairing_of(self.shelf.conditions, self.frame.design(self.shelf), self.frame.count)

    def chunks(self) -> Iterator[Fitting]:
        """Yield the combinations that meet all limits, chunk by chunk."""
        if not met(self._chain(()), 1).all():
            return
        for every in networks(self.shelf, self.frame):
            network = every[:, met(self._chain(self._ranges(every)), every.shape[1])]
            taken = self.filters.of(self.frame, self.pairing, network)
            network, taken = network[:, taken != NONE], taken[taken != NONE]
            held = met(self._filtered(network, taken), len(taken))
            if held.any():
                yield self._fitting(network[:, held], taken[held])

    def _chain(self, ranges: tuple[Operating, ...]) -> Chain:
        return Chain(self.frame.design(self.shelf), self.pairing, ranges, frozenset(), filtered=False)

    def _ranges(self, network: Places) -> tuple[Operating, ...]:
        common = self.filters.resistors_at(network[0])
        ranges: list[Operating] = []
        for number, row in enumerate(network[1:], start=1):
            switched = self.filters.resistors_at(row)
            at = zeroed(self.pairing.operate(common, switched, last=number == self.frame.count))
            ranges.append(at.above(ranges[-1].high_a, ranges[-1].gain) if ranges else at)
        return tuple(ranges)

    def _filtered(self, network: Places, taken: Places) -> Chain:
        figures = self.filters.filters_at(taken)
        ranges = tuple(at.with_filter(figures) for at in self._ranges(network))
        return replace(self._chain(ranges), filtered=True)

    def _fitting(self, network: Places, taken: Places) -> Fitting:
        """Return combinations that meet all limits with their scores and costs."""
        frame = self.frame
        places = np.full((len(taken), OTHER_PLACES + self.shelf.conditions.ranges_most), NONE)
        places[:, :3] = frame.shunt, frame.amplifier, frame.switch
        places[:, 3 : 4 + frame.count] = network.T
        places[:, -2], places[:, -1] = np.divmod(taken, len(self.shelf.capacitors))
        cost, inverse = np.unique(cost_of_each(self.shelf, frame, network), return_inverse=True)
        return Fitting(places, self._scores(self._filtered(network, taken)), self.filters.costs(cost)[inverse, taken])

    def _scores(self, chain: Chain) -> Numbers:
        conditions, last = chain.pairing.conditions, chain.ranges[-1]
        errors = [use_of(worst_point(at, combined(at))) for at in chain.ranges]
        score = self.objective.of(
            power_w(last) / conditions.power_limit_w,
            chain.pairing.burden_v / conditions.burden_limit_v,
            use_headroom(last),
            np.max(np.broadcast_arrays(*errors), axis=0),
        )
        return np.broadcast_to(np.asarray(score, dtype=float), np.shape(last.gain))


def met(chain: Chain, size: int) -> Truths:
    """Return which of many combinations meet every limit of which all that it needs is known.

    What is judged of a design as a whole, stock and cost, is judged where its filter is chosen.
    """
    held = np.ones(size, dtype=bool)
    for check in (check for limit in LIMITS for check in limit.checks if not isinstance(check, DesignCheck)):
        for measure in check.measured(chain):
            if measure is not None:
                held &= measure.meets
    return held
