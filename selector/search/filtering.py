"""Which output filter the ranges of a cell would take, before the whole design is known."""

from __future__ import annotations

from collections.abc import Iterator
from dataclasses import dataclass, replace

import numpy as np
from numpy.typing import NDArray

from selector.candidate import Operating, Pairing
from selector.candidate.figures import NO_RESISTOR, ResistorFigures
from selector.candidate.operating import FilterAt
from selector.limits import LIMITS, FilterCheck
from selector.search.bench import Bench
from selector.search.nodes import Indices, Nodes, Numbers, shaped
from selector.search.pick import picked
from selector.search.stand_in import StandIn


@dataclass(frozen=True, slots=True)
class Stretch:
    """First ranges that take the same filter: their places among the nodes, and the filter's place in the bank."""

    nodes: Indices
    filter: int


def stretches(bench: Bench, first: Nodes) -> Iterator[Stretch]:
    """Yield the first ranges by the filter they take, where the network leaves the filter's corner alone.

    The first range has the largest gain and so the slowest amplifier: it alone decides. The larger its gain, the
    fewer filters are fast enough, so that equal choices form one stretch of gains, found by halving.
    """
    order = np.argsort(first.at.gain, kind="stable")
    chosen: dict[int, int | str] = {}

    def choice(place: int) -> int | str:
        if place not in chosen:
            alone = picked(first.at, int(order[place]))
            chosen[place] = bench.bank.choose([alone], None, bench.lifted)
        return chosen[place]

    def halved(low: int, high: int) -> Iterator[tuple[int, int]]:
        if choice(low) == choice(high) or high - low == 1:
            yield from ((low, high),) if choice(low) == choice(high) else ((low, low), (high, high))
            return
        middle = (low + high) // 2
        yield from halved(low, middle)
        yield from halved(middle, high)

    places: dict[int, list[Indices]] = {}
    if len(order):
        for low, high in halved(0, len(order) - 1):
            taken = choice(low)
            if isinstance(taken, int):
                places.setdefault(taken, []).append(order[low : high + 1])
    for taken, parts in sorted(places.items()):
        yield Stretch(np.unique(np.concatenate(parts)), taken)


def with_stand_in(stand: StandIn, nodes: Nodes) -> Nodes:
    """Return the nodes that some filter serves, with the stand-in in."""
    kept = nodes.pick(np.flatnonzero(stand.serves[nodes.switched]))
    return replace(kept, at=replace(kept.at, filter=picked(stand.filter, kept.switched)))


def stand_in(bench: Bench, pairing: Pairing, *, last: bool) -> StandIn | None:
    """Return the stand-in of every gain resistor; None where the bank is empty.

    Each is asked at the smallest gain that its resistor can have, where the amplifier is fastest: what serves no
    such range serves none with that resistor.
    """
    if bench.bank.figures is None:
        return None
    law = pairing.amplifier.law
    switched = NO_RESISTOR if law.switched_name is None else shaped(bench.resistors, (-1, 1))
    at = _smallest_gain(bench, pairing, switched, last=last).with_filter(bench.bank.figures)
    shape = (1 if law.switched_name is None else len(bench.shelf.resistors), len(bench.bank.pairs))
    serves = np.ones(shape, dtype=bool)
    for limit in LIMITS:
        if limit.name in bench.lifted:
            continue
        for check in limit.checks:
            measure = check.measure(at) if limit.thins and isinstance(check, FilterCheck) else None
            if measure is not None:
                serves &= measure.meets
    return StandIn(
        FilterAt(
            ohm=_least(at.filter.ohm, serves),
            slow_hz=-_least(-1.0 * at.filter.slow_hz, serves),
            noisy_hz=_least(at.filter.noisy_hz, serves),
            least_ohm=-_least(-1.0 * at.filter.least_ohm, serves),
        ),
        np.asarray(serves.any(axis=1)),
    )


def _smallest_gain(bench: Bench, pairing: Pairing, switched: ResistorFigures, *, last: bool) -> Operating:
    """Return the ranges with the common resistor that gives the smallest gain, and so the smallest swing."""
    if pairing.amplifier.law.common_name is None:
        return pairing.operate(NO_RESISTOR, switched, last=last)
    ends = [
        picked(bench.resistors, int(place))
        for place in (np.argmin(bench.resistors.ohm), np.argmax(bench.resistors.ohm))
    ]
    ranges = [pairing.operate(end, switched, last=last) for end in ends]
    return min(ranges, key=lambda at: float(np.min(at.gain)))


def _least(value: object, serves: NDArray[np.bool_]) -> Numbers:
    return np.asarray(
        np.min(np.where(serves, np.broadcast_to(np.asarray(value, dtype=float), serves.shape), np.inf), axis=1)
    )
