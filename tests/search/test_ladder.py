"""The order in which filters are taken, against trying each of them; and what bounds them."""

from __future__ import annotations

from dataclasses import replace
from functools import cache
from random import Random
from typing import TYPE_CHECKING

import numpy as np
import pytest

from selector.budget import combined
from selector.candidate.figures import ResistorFigures
from selector.candidate.uses import use_headroom
from selector.limits import FilterCheck
from selector.search.interval import lower, upper
from selector.search.stacks import mapped, taken
from tests.search.lines import lots, set_up
from tests.search.random_catalogue import catalogue
from tests.search.small import capacitor, resistor

if TYPE_CHECKING:
    from collections.abc import Iterator

    from numpy.typing import NDArray

    from selector.candidate import Operating, Pairing
    from selector.candidate.operating import FilterAt
    from selector.search.bench import Bench
    from selector.search.ladder import Ladder

    Truths = NDArray[np.bool_]

SEEDS = range(24)
ROUNDING = 1e-12
TENS = (10.0, 22.0, 47.0)  # three to a decade, of both parts, so that many corners are equal
NEAR = (1.0, 1.0, 1.0, 1.0, 1.0 + 1e-13, 1.0 - 1e-9, 1.0005)  # times a value: some corners nearly agree
LIFTED = (frozenset[str](), frozenset({"settling"}), frozenset({"bandwidth", "filter"}))
RANGES = 10  # that are asked of each frame
FRAMES = 3  # of each catalogue
SOME = ResistorFigures(1e3, 0.0, 0.0)  # where only the gain counts


@cache
def _bench(seed: int) -> Bench:
    """Return the set-up of a random catalogue whose filters have few different corners; limits in turn."""
    random = Random(seed)
    changes = {
        "signal.settle": (None, 2e-3, 5e-2)[seed % 3],
        "converter.input_max": (None, 3.4)[seed // 3 % 2],
        "converter.clamp_current": 1e-3,
        "signal.bandwidth": random.choice([100.0, 1000.0]),
        "filter.resistance_max": random.choice([1e4, 1e5]),
        "parts.avoid": None,
        "parts.from": "all",
        "ranges.most": 2,
    }
    spec, stock = catalogue(seed, changes=changes)
    resistances = [one * ten * random.choice(NEAR) for ten in (1e1, 1e2, 1e3, 1e3, 1e4) for one in TENS]
    resistors = [
        resistor(f"R{number}", ohm, tolerance=random.choice([0.01, 0.01, 0.001]), **_cost(random))
        for number, ohm in enumerate(resistances)
    ]
    capacitors = [
        capacitor(f"C{number}", random.choice(TENS) * 10.0 ** -random.randint(7, 10), **_cost(random))
        for number in range(6)
    ]
    bench = set_up(spec, stock | {"resistor": tuple(resistors), "capacitor": tuple(capacitors)})
    return replace(bench, held=bench.held - random.choice(LIFTED))


def _cost(random: Random) -> dict[str, float]:
    return random.choice([{"unit_cost": 0.1}, {"unit_cost": 0.1}, {"unit_cost": 0.2}, {}])


def _frames(bench: Bench, random: Random, *, alone: bool) -> Iterator[Pairing]:
    """Yield frames whose network leaves the filter alone or adds to it, as arrays of shape (1, 1)."""
    every = [lot for lot in lots(bench, range(1, 3)) if lot.family.alone is alone]
    for lot in random.sample(every, min(FRAMES, len(every))):
        yield lot.pairing()


def _ranges(pairing: Pairing, random: Random, *, last: bool, alone: bool) -> Operating:
    """Return ranges of a frame, of shape (1, RANGES): of any gain, or with resistors where they add to the filter.

    With resistors all share a common one.
    """
    if alone:
        gain = np.geomspace(1.5, 3000.0, RANGES)[None, :] * random.uniform(0.9, 1.1)
        return pairing.operate_at(gain, SOME, SOME, last=last)
    switched = np.geomspace(100.0, 1e6, RANGES)[None, :] * random.uniform(0.9, 1.1)
    return pairing.operate(SOME, ResistorFigures(switched, 0.0, 0.0), last=last)


def _each(at: Operating) -> Iterator[Operating]:
    """Yield every range of a row in plain numbers."""
    for place in range(RANGES):
        yield mapped(at, lambda array, place=place: float(np.broadcast_to(array, (1, RANGES))[0, place]))


def _serves(bench: Bench, at: Operating) -> Truths:
    """Return which pairs of a bank serve a range that has them in, limit by limit."""
    serves = np.ones(len(bench.bank), dtype=bool)
    for limit in (one for one in bench.limits if one.thins):
        for check in limit.checks:
            measure = check.measure(at) if isinstance(check, FilterCheck) else None
            serves &= True if measure is None else measure.meets
    return serves


def _place(ladder: Ladder | None, step: int) -> int | None:
    """Return the place in the bank of a step, None where no filter serves."""
    return None if ladder is None or step == len(ladder) else int(ladder.places[step])


def _chosen(bench: Bench, *ranges: Operating) -> int | None:
    found = bench.bank.choose(ranges, None, bench.lifted)
    return None if isinstance(found, str) else found


@pytest.mark.parametrize("seed", SEEDS)
def test_step_of_a_range_is_the_filter_it_chooses(seed: int) -> None:
    """Where no network adds to the filter, each range takes the filter that trying all of them would choose."""
    bench, random = _bench(seed), Random(seed)
    for pairing in _frames(bench, random, alone=True):
        for last in (False, True):
            at = _ranges(pairing, random, last=last, alone=True)
            steps = np.full((1, RANGES), 0) if bench.ladder is None else bench.ladder.steps(at)
            found = [_place(bench.ladder, int(step)) for step in steps[0]]
            assert found == [_chosen(bench, one) for one in _each(at)]


def test_steps_meet_equal_corners_and_ranges_without_a_filter() -> None:
    """The catalogues of these tests hold filters of equal corners, ranges that take none, and many different ones."""
    equal, none, different = 0, 0, set()
    for seed in SEEDS:
        bench, random = _bench(seed), Random(seed)
        ladder = bench.ladder
        if ladder is None:
            continue
        equal += len(ladder) - len(np.unique([f"{one:.9e}" for one in np.asarray(ladder.filters.slow_hz)]))
        for pairing in _frames(bench, random, alone=True):
            steps = ladder.steps(_ranges(pairing, random, last=True, alone=True))
            none += int((steps == len(ladder)).sum())
            different |= {(seed, int(step)) for step in steps.ravel()}
    assert equal > 100
    assert none > 10
    assert len(different) > 20


@pytest.mark.parametrize("seed", SEEDS)
def test_choice_beside_a_last_range_is_the_filter_that_both_choose(seed: int) -> None:
    """Where a network adds to the filter, the lowest and the last range take what trying all filters would choose."""
    bench, random = _bench(seed), Random(seed)
    for pairing in _frames(bench, random, alone=False):
        first, last = (_ranges(pairing, random, last=last, alone=False) for last in (False, True))
        for lowest, at in ((first, first), (last, last)) if pairing.range_count == 1 else ((first, last),):
            _check_choices(bench, lowest, at, single=lowest is at)


def _check_choices(bench: Bench, lowest: Operating, at: Operating, *, single: bool) -> None:
    """Compare the choices of each lowest range beside every last one of a lower gain and with headroom."""
    held = (np.asarray(use_headroom(at)) <= 1.0).ravel()
    for row, one in enumerate(_each(lowest)):
        places = [row] if single else np.flatnonzero(held & (np.asarray(at.gain).ravel() < one.gain))
        if not len(places):
            continue
        last = mapped(at, lambda array, at_=places: array[:, at_] if array.shape[-1] == RANGES else array)
        steps = np.zeros(len(places)) if bench.ladder is None else bench.ladder.choices(one, last)
        assert [_place(bench.ladder, int(step)) for step in steps] == [
            _chosen(bench, one, other) for place, other in enumerate(_each(at)) if place in places
        ]


@pytest.mark.parametrize("alone", [True, False], ids=["alone", "added to"])
@pytest.mark.parametrize("seed", SEEDS)
def test_no_filter_that_serves_beats_what_stands_for_all(seed: int, *, alone: bool) -> None:
    """An interval of all filters holds each that serves any range, in every figure."""
    for bench, at in _asked(seed, alone=alone):
        ladder = bench.ladder
        serves = _serves(bench, at)
        if ladder is None:
            assert not serves.any()
            continue
        stand_in = ladder.stand_in(alone=alone)
        for name in ("ohm", "slow_hz", "noisy_hz", "least_ohm"):
            value = np.broadcast_to(getattr(at.filter, name), serves.shape)[serves]
            assert (lower(getattr(stand_in, name)) <= value * (1.0 + ROUNDING)).all()
            assert (value <= upper(getattr(stand_in, name)) * (1.0 + ROUNDING)).all()


def _asked(seed: int, *, alone: bool) -> Iterator[tuple[Bench, Operating]]:
    """Yield ranges in plain numbers with every filter of the bank in."""
    bench, random = _bench(seed), Random(seed)
    if bench.bank.figures is None:
        return
    for pairing in _frames(bench, random, alone=alone):
        for last in (False, True):
            for one in _each(_ranges(pairing, random, last=last, alone=alone)):
                yield bench, one.with_filter(bench.bank.figures)


@pytest.mark.parametrize("seed", SEEDS)
def test_no_filter_from_a_step_on_beats_the_best_from_it(seed: int) -> None:
    """What a range takes by itself, or a later one, is bounded from that step on, in error and in speed."""
    for bench, at in _asked(seed, alone=True):
        if bench.ladder is not None:
            steps = np.arange(len(bench.ladder))
            of_step = taken(mapped(at.filter, np.ravel), bench.ladder.places)
            best = bench.ladder.best_from(steps)
            for later in (0, 1, len(steps) // 2):
                count = max(0, len(steps) - later)
                _check_unbeaten(taken(best, steps[:count]), taken(of_step, steps[later : later + count]))


@pytest.mark.parametrize("alone", [True, False], ids=["alone", "added to"])
@pytest.mark.parametrize("seed", SEEDS)
def test_no_filter_that_serves_a_range_beats_its_own_bound(seed: int, *, alone: bool) -> None:
    """What stands for a range's own filter is no slower, no noisier and no larger than any that serves the range."""
    for bench, at in _asked(seed, alone=alone):
        serves = _serves(bench, at)
        if bench.ladder is None or not serves.any():
            continue
        bare = replace(at, filter=replace(at.filter, ohm=0.0))
        own = bench.ladder.own(bare)
        _check_unbeaten(own, taken(at.filter, serves))
        least = combined(replace(at, filter=own)).error_a(at.high_a)
        assert (
            np.asarray(least)
            <= np.broadcast_to(combined(at).error_a(at.high_a), serves.shape)[serves] * (1.0 + ROUNDING)
        ).all()


def _check_unbeaten(best: FilterAt, real: FilterAt) -> None:
    """Compare what adds to an error, resistance and noise, and what takes time, with their bound."""
    for name in ("ohm", "noisy_hz"):
        assert (getattr(best, name) <= getattr(real, name) * (1.0 + ROUNDING)).all()
    for name in ("slow_hz", "least_ohm"):
        assert (getattr(real, name) <= getattr(best, name) * (1.0 + ROUNDING)).all()
