"""Why nothing fits: where each pair stops, and the combination that comes nearest."""

from __future__ import annotations

from collections import Counter
from collections.abc import Callable
from dataclasses import dataclass, replace

from selector.candidate.elementwise import chosen
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
RANKED = frozenset({"power", "burden", "headroom", "error"})


@dataclass(frozen=True, slots=True)
class Anything:
    """No figure at all: whatever meets the limits will do."""

    def of(self, power: Real, burden: Real, headroom: Real, error: Real) -> Real:
        """Return 0."""
        return chosen(error < 0.0, power + burden + headroom, 0.0)


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
    which there is one that does: found by halving. A limit that needs no resistor stops whole frames, and the
    furthest of those is known beforehand; no other limit of its sort can be the answer.
    """
    early = _early_stop(bench, shunt, amplifier)
    places = [place for place in LATE if place < early]
    if early < len(LIMITS):
        places.append(early)
    low, high = 0, len(places) - 1
    guess = high if early < len(LIMITS) else places.index(FILTER)
    while low < high:
        if _reaches(bench, places[guess], shunt, amplifier):
            low = guess
        else:
            high = guess - 1
        guess = (low + high + 1) // 2 if places[low] != FILTER else high
    return places[low]


def _early_stop(bench: Bench, shunt: Shunt, amplifier: Amplifier) -> int:
    """Return the place of the furthest limit that stops a frame of the pair before any resistor is chosen.

    The number of limits, where a frame passes them all.
    """
    furthest = 0
    for frame in every_frame(bench, shunt, amplifier):
        stops = (place for place, limit in enumerate(LIMITS) if not stands(limit, frame.chain))
        furthest = max(furthest, next(stops, len(LIMITS)))
    return furthest


def _reaches(bench: Bench, place: int, shunt: Shunt, amplifier: Amplifier) -> bool:
    held = frozenset(limit.name for limit in LIMITS[:place])
    narrowed = replace(bench, objective=Anything(), held=held)
    standing = Standing(1, variants=True)
    Engine(narrowed, standing).run([(shunt, amplifier)], first_only=True)
    return bool(standing.best())
