"""Rows of real ranges to ask parts of the search about: frames of a random catalogue with a common resistor each."""

from __future__ import annotations

from functools import cache
from typing import TYPE_CHECKING, Any

import numpy as np

from selector.search.bench import bench_of
from selector.search.lots import NONE, Lot
from selector.search.objective import score_of
from selector.search.rows import Line
from selector.search.screen import Screen
from selector.search.shelf import shelf_of
from tests.search.middling_catalogue import GOOD
from tests.search.random_catalogue import catalogue

if TYPE_CHECKING:
    from collections.abc import Iterator, Mapping
    from random import Random

    from selector.parts import Part
    from selector.search.bench import Bench
    from selector.spec import Spec

LOOSE: dict[str, Any] = {
    "limits.cost": None,  # what cannot be paid is out of a row before its chains are
    "accuracy.bands": None,
    "accuracy.reading": 0.5,
    "accuracy.floor": 1e-3,
    "limits.burden": 0.2,
    "limits.power": 1.0,
    "current.overload": None,
    "current.overload_time": None,
    "signal.bandwidth": 20.0,
    "signal.settle": None,
    "parts.avoid": None,
    "parts.from": "all",
}


def set_up(spec: Spec, stock: Mapping[str, tuple[Part, ...]]) -> Bench:
    """Return the set-up of a search under all limits."""
    return bench_of(shelf_of(spec, stock), score_of(spec))


def lots(bench: Bench, counts: range) -> Iterator[Lot]:
    """Yield every frame of every number of ranges that meets the limits without a resistor, one frame to a lot."""
    if bench.stock is None:
        return
    screen = Screen(bench, bench.stock, bench.limits)
    for family in bench.stock.families:
        for count in counts:
            for shunt, amplifier in np.argwhere(screen.pairs(family, count)):
                for switch in screen.switches() if count > 1 else [NONE]:
                    place = (np.array([one]) for one in (shunt, amplifier, switch))
                    yield Lot(bench.stock, family, count, *place, screen.switches())


def lines(bench: Bench, random: Random, counts: range, most: int = 3) -> Iterator[Line]:
    """Yield a frame of each lot with some common resistors in turn, of those laws whose gain resistors set."""
    for lot in lots(bench, counts):
        if lot.family.law.switched_name is None or not len(bench.resistors):
            continue
        commons = [NONE]
        if lot.family.law.common_name is not None:
            commons = random.sample(range(len(bench.resistors)), min(most, len(bench.resistors)))
        for common in commons:
            yield Line(lot, np.array([common]))


@cache
def loose(seed: int, resistors: tuple[int, int], most: int, headroom: float = 0.05) -> Bench:
    """Return the set-up of a random catalogue under loose limits, so that many rows have chains of ranges."""
    changes = LOOSE | {"limits.headroom": headroom, "ranges.most": most}
    spec, stock = catalogue(seed, resistors=resistors, changes=changes)
    good = tuple(one.model_copy(update=GOOD) for one in stock["amplifier"])
    return set_up(spec, stock | {"amplifier": good})
