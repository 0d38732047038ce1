"""Why nothing fits: where each pair stops, and the combination that comes nearest."""

from __future__ import annotations

from collections import Counter
from collections.abc import Callable
from dataclasses import dataclass, replace

import numpy as np

from selector.limits import LIMITS, AmplifierCheck, PairCheck, ShuntCheck, SwitchCheck
from selector.real import Real
from selector.search.bench import ALL_LIMITS, Bench
from selector.search.engine import Engine
from selector.search.found import NothingFits
from selector.search.objective import LargestUse, Score
from selector.search.present import present
from selector.search.screen import Screen
from selector.search.standing import PairKey, Standing

EARLY = (AmplifierCheck, ShuntCheck, SwitchCheck, PairCheck)  # judged before any resistor is chosen
FILTER = next(place for place, limit in enumerate(LIMITS) if limit.thins)  # from here on a filter is needed
LATE = tuple(place for place, limit in enumerate(LIMITS) if not all(isinstance(check, EARLY) for check in limit.checks))
PASSED = len(LIMITS)  # the place of what meets every limit
RANKED = frozenset(limit.name for limit in LIMITS if limit.ranked)

Progress = Callable[[int, int], None]


@dataclass(frozen=True, slots=True)
class Anything:
    """No figure at all: whatever meets the limits will do, and stands at 0."""

    def of(self, power: Real, burden: Real, headroom: Real, error: Real) -> Real:
        """Return 0."""
        return np.zeros(np.broadcast(power, burden, headroom, error).shape)


@dataclass(slots=True)
class Hunt:
    """The furthest limit of a pair, found by halving: it is one of places[low] … places[high]."""

    places: list[int]
    low: int
    high: int
    guess: int

    def settle(self, *, reached: bool) -> None:
        """Take in whether some combination meets all limits before the guessed place, and guess again."""
        if reached:
            self.low = self.guess
        else:
            self.high = self.guess - 1
        self.guess = (self.low + self.high + 1) // 2


def nothing_fits(bench: Bench, score: Score, progress: Progress | None) -> NothingFits:
    """Return where each pair stops, and the nearest combination with the ranked limits lifted."""
    furthest = _furthest(bench, progress)
    counts = Counter(furthest.values())
    blocked = tuple((LIMITS[place].name, pieces) for place, pieces in sorted(counts.items()))
    standing = Standing(1, variants=False)
    Engine(replace(bench, objective=LargestUse(), held=ALL_LIMITS - RANKED), standing).run()
    best = standing.best()
    return NothingFits(len(furthest), blocked, present(best[0].chain, score) if best else None)


def _furthest(bench: Bench, progress: Progress | None) -> dict[PairKey, int]:
    """Return the place of the furthest limit at which a combination of each pair stops.

    A combination stops at limit n or later where it meets all limits before n, so the furthest is the last n for
    which there is one that does. All pairs that ask about the same n are searched together.
    """
    hunts = {pair: _hunt(stops) for pair, stops in _early_stops(bench).items()}
    while True:
        asked: dict[int, list[PairKey]] = {}
        for pair, hunt in hunts.items():
            if hunt.low < hunt.high:
                asked.setdefault(hunt.places[hunt.guess], []).append(pair)
        if progress is not None:
            progress(len(hunts) - sum(len(pairs) for pairs in asked.values()), len(hunts))
        if not asked:
            return {pair: hunt.places[hunt.low] for pair, hunt in hunts.items()}
        for place, pairs in sorted(asked.items()):
            standing = _reaching(bench, place, frozenset(pairs))
            for pair in pairs:
                hunts[pair].settle(reached=standing.holds(pair))


def _hunt(stops: set[int]) -> Hunt:
    """Return the hunt of a pair whose frames stop at some places before any resistor is chosen.

    A pair without any combination, for want of resistors, counts at the first of the places.
    """
    early = max(stops)
    places = sorted({place for place in LATE if place < early} | (stops - {PASSED}))
    high = len(places) - 1
    return Hunt(places, 0, high, places.index(FILTER) if early == PASSED else high)


def _early_stops(bench: Bench) -> dict[PairKey, set[int]]:
    """Return the places at which frames of each pair stop before any resistor; PASSED for one that passes."""
    stops: dict[PairKey, set[int]] = {}
    if bench.stock is None:
        return stops
    screen = Screen(bench, bench.stock, LIMITS)
    count = len(bench.shelf.switches)
    of_switch = [_first([screen.switch(limit, place) for limit in LIMITS]) for place in range(count)]
    for family in bench.stock.families:
        for ranges in range(1, (bench.conditions.ranges_most if family.law.switchable else 1) + 1):
            first = np.full((len(bench.shelf.shunts), len(family.amplifiers)), PASSED)
            for place in range(len(LIMITS) - 1, -1, -1):
                first = np.where(screen.stands(LIMITS[place], family, ranges), first, place)
            beside = {PASSED} if ranges == 1 else set(of_switch)
            for row, shunt in enumerate(bench.shelf.shunts):
                for column, amplifier in enumerate(family.amplifiers):
                    mine = stops.setdefault((shunt.part, amplifier.part), set())
                    mine |= {min(int(first[row, column]), place) for place in beside}
    return stops


def _first(meets: list[bool]) -> int:
    return next((place for place, met in enumerate(meets) if not met), PASSED)


def _reaching(bench: Bench, place: int, pairs: frozenset[PairKey]) -> Standing:
    """Return which pairs have a combination that meets all limits before a place."""
    held = frozenset(limit.name for limit in LIMITS[:place])
    standing = Standing(None, variants=False)
    Engine(replace(bench, objective=Anything(), held=held), standing).run(pairs, first_only=True)
    return standing
