"""Why nothing fits: where each pair stops, and the combination that comes nearest."""

from __future__ import annotations

from collections import Counter
from collections.abc import Callable
from dataclasses import dataclass, replace

from selector.limits import LIMITS
from selector.parts import Amplifier, Shunt
from selector.real import Real
from selector.search.bench import ALL_LIMITS, Bench
from selector.search.engine import Engine
from selector.search.found import NothingFits
from selector.search.frames import EARLY, every_frame, stands
from selector.search.objective import LargestUse, Score
from selector.search.present import present
from selector.search.standing import Standing

FILTER = next(place for place, limit in enumerate(LIMITS) if limit.thins)  # from here on a filter is needed
LATE = tuple(place for place, limit in enumerate(LIMITS) if not all(isinstance(check, EARLY) for check in limit.checks))
PASSED = len(LIMITS)  # the place of what meets every limit
RANKED = frozenset(limit.name for limit in LIMITS if limit.ranked)


@dataclass(frozen=True, slots=True)
class Anything:
    """No figure at all: whatever meets the limits will do, and stands at 0."""

    def of(self, power: Real, burden: Real, headroom: Real, error: Real) -> Real:
        """Return 0 in the shape of the uses; the error is left out, since it may be infinite."""
        del error
        return 0.0 * (power + burden + headroom)


def nothing_fits(
    bench: Bench, score: Score, pairs: list[tuple[Shunt, Amplifier]], progress: Callable[[int, int], None] | None
) -> NothingFits:
    """Return where each pair stops, and the nearest combination with the ranked limits lifted."""
    counts: Counter[int] = Counter()
    for number, (shunt, amplifier) in enumerate(pairs, start=1):
        counts[_furthest(bench, shunt, amplifier)] += 1
        if progress is not None:
            progress(number, len(pairs))
    blocked = tuple((LIMITS[place].name, pieces) for place, pieces in sorted(counts.items()))
    standing = Standing(1, variants=True)
    Engine(replace(bench, objective=LargestUse(), held=ALL_LIMITS - RANKED), standing).run(pairs)
    best = standing.best()
    return NothingFits(len(pairs), blocked, present(best[0].chain, score) if best else None)


def _furthest(bench: Bench, shunt: Shunt, amplifier: Amplifier) -> int:
    """Return the place of the furthest limit at which a combination of the pair stops.

    A combination stops at limit n or later where it meets all limits before n, so the furthest is the last n for
    which there is one that does: found by halving. The answer is a limit that a frame stops at before any resistor
    is chosen, or one that needs more than the frame. A pair without any combination, for want of resistors, counts at
    the first of these.
    """
    stops = _early_stops(bench, shunt, amplifier)
    early = max(stops)
    places = sorted({place for place in LATE if place < early} | (stops - {PASSED}))
    low, high = 0, len(places) - 1
    guess = places.index(FILTER) if early == PASSED else high
    while low < high:
        if _reaches(bench, places[guess], shunt, amplifier):
            low = guess
        else:
            high = guess - 1
        guess = (low + high + 1) // 2 if places[low] != FILTER else high
    return places[low]


def _early_stops(bench: Bench, shunt: Shunt, amplifier: Amplifier) -> set[int]:
    """Return the places at which frames of the pair stop before any resistor is chosen; PASSED for one that passes."""
    return {
        next((place for place, limit in enumerate(LIMITS) if not stands(limit, frame.chain)), PASSED)
        for frame in every_frame(bench, shunt, amplifier)
    }


def _reaches(bench: Bench, place: int, shunt: Shunt, amplifier: Amplifier) -> bool:
    held = frozenset(limit.name for limit in LIMITS[:place])
    narrowed = replace(bench, objective=Anything(), held=held)
    standing = Standing(1, variants=True)
    Engine(narrowed, standing).run([(shunt, amplifier)], first_only=True)
    return bool(standing.best())
