"""The best combinations so far, and what a further one must beat."""

from __future__ import annotations

from dataclasses import dataclass, field
from math import inf

from selector.candidate import Design, cost_of
from selector.candidate.chain import Chain
from selector.search.order import cost_key, rounded

Names = tuple[tuple[str, ...], ...]
Rank = tuple[float, tuple[bool, float], Names]
PairKey = tuple[str, str]


def rank_of(figure: float, design: Design) -> Rank:
    """Return the total order of combinations: rounded figure, cost, part names."""
    return rounded(figure), cost_key(cost_of(design)), design.names()


@dataclass(frozen=True, slots=True)
class Placed:
    """A combination with its place in the order, and the unrounded figure it was placed by."""

    rank: Rank
    figure: float
    chain: Chain


@dataclass(slots=True)
class Standing:
    """The best `top` combinations (all where None), one for each pair unless `variants`."""

    top: int | None
    variants: bool
    _placed: dict[object, Placed] = field(default_factory=dict)
    _sorted: list[Placed] | None = None

    def add(self, pair: PairKey, figure: float, chain: Chain) -> None:
        """Place a combination that meets every held limit."""
        placed = Placed(rank_of(figure, chain.design), figure, chain)
        key: object = placed.rank[2] if self.variants else pair
        held = self._placed.get(key)
        if held is None or placed.rank < held.rank:
            self._placed[key] = placed
            self._sorted = None
            if self.variants and self.top is not None and len(self._placed) > 4 * self.top + 64:
                self._placed = {one.rank[2]: one for one in self.best()}

    def best(self) -> list[Placed]:
        """Return the list so far, best first."""
        if self._sorted is None:
            self._sorted = sorted(self._placed.values(), key=lambda placed: placed.rank)
        return self._sorted[: self.top]

    def to_beat(self, pair: PairKey) -> Placed | None:
        """Return the combination that a further one of the pair must come before, None where any is welcome."""
        held = None if self.variants else self._placed.get(pair)
        best = self.best()
        last = best[-1] if self.top is not None and len(best) == self.top else None
        rivals = [one for one in (held, last) if one is not None]
        return min(rivals, key=lambda placed: placed.rank) if rivals else None

    def holds(self, pair: PairKey) -> bool:
        """Return whether a combination of the pair is in."""
        return pair in self._placed

    def most(self, pair: PairKey) -> float:
        """Return the figure above which no further combination of the pair can enter the list."""
        rival = self.to_beat(pair)
        return inf if rival is None else rival.figure
