"""The yardstick: every combination with one range judged in full by numpy, with nothing left out and nothing bounded.

Each combination of shunt, amplifier, gain resistors and filter is an element of flat arrays that go through the same
limits and error terms as everything else. Nothing is shared between combinations that have parts in common: to see
what they share, and not to judge the rest, is what a search is for.
"""

from __future__ import annotations

from collections.abc import Iterator, Mapping
from dataclasses import dataclass, replace

import numpy as np
from numpy.typing import NDArray

from scripts.benchmark.arrays import Arrays, Numbers, Places, Rows, arrays_of, rows_of
from selector.budget import zeroed
from selector.candidate import Design
from selector.candidate.chain import Chain
from selector.candidate.uses import power_w, use_headroom
from selector.gain import LAWS
from selector.limits import LIMITS, ChoiceCheck, DesignCheck, PointCheck, fits, use_of
from selector.parts import Part
from selector.real import Real
from selector.search.assess import pairing_of
from selector.search.objective import score_of
from selector.search.order import NEARLY, rounded
from selector.search.shelf import shelf_of
from selector.search.standing import PairKey, Rank, rank_of
from selector.spec import Spec

CHUNK = 8_000  # combinations at once; fewer, and calls outweigh arithmetic; more, and arrays fall out of the cache

Truths = NDArray[np.bool_]


@dataclass(frozen=True, slots=True)
class Enumerated:
    """The best combination of each pair in the order of the search, and how many combinations were judged."""

    ranks: tuple[Rank, ...]
    judged: int


@dataclass(frozen=True, slots=True)
class Verdicts:
    """What was found of each combination: whether its filter may be chosen, whether all else holds, and its score."""

    thinned: Truths
    held: Truths
    slow_hz: Numbers
    score: Numbers


def enumerated(spec: Spec, stock: Mapping[str, tuple[Part, ...]], *, chunk: int = CHUNK) -> Enumerated:
    """Judge every combination with one range, and return the best of each pair of shunt and amplifier."""
    shelf = shelf_of(spec, stock)
    if not (shelf.shunts and shelf.resistors and shelf.capacitors):
        return Enumerated((), 0)
    arrays = arrays_of(shelf)
    best: dict[PairKey, Rank] = {}
    judged = 0
    for amplifier in shelf.amplifiers:
        for rows in rows_of(arrays, amplifier, chunk):
            judged += len(rows.pair)
            verdicts = _verdicts(spec, rows)
            for rank in () if verdicts is None else _ranks(arrays, rows, verdicts):
                pair = (rank[2][0][0], rank[2][1][0])
                best[pair] = min(best.get(pair, rank), rank)
    return Enumerated(tuple(sorted(best.values())), judged)


def chain_of_rows(rows: Rows) -> Chain | None:
    """Return combinations as one chain of arrays; None where the output has no window."""
    shelf = rows.arrays.shelf
    design = Design(shelf.shunts[:1], rows.amplifier, None, None, None)
    pairing = replace(pairing_of(shelf.conditions, design, 1), shunt=rows.shunts())
    if pairing.window.span_v <= 0.0:
        return None
    at = zeroed(pairing.operate(rows.commons(), rows.gains(), last=True)).with_filter(rows.filters())
    return Chain(design, pairing, (at,), frozenset(), filtered=True)


def _verdicts(spec: Spec, rows: Rows) -> Verdicts | None:
    """Judge combinations by every limit; None where the output has no window."""
    chain = chain_of_rows(rows)
    if chain is None:
        return None
    thinned, held = _available(rows), np.ones(len(rows.pair), dtype=bool)
    error: Real = 0.0
    for limit in LIMITS:
        for check in limit.checks:
            if isinstance(check, DesignCheck | ChoiceCheck):
                continue  # stock and cost, which `_available` looks at
            for measure in check.measured(chain):
                if measure is not None:
                    met = thinned if limit.thins else held
                    met &= measure.meets
                    error = use_of(measure) if isinstance(check, PointCheck) else error
    conditions, at = chain.pairing.conditions, chain.ranges[0]
    power = power_w(at) / conditions.power_limit_w
    burden = chain.pairing.burden_v / conditions.burden_limit_v
    score = np.asarray(score_of(spec).of(power, burden, use_headroom(at), error))
    return Verdicts(thinned, held, np.asarray(at.filter.slow_hz), score)


def _available(rows: Rows) -> Truths:
    """Return whether stock and cost allow a combination."""
    arrays, law = rows.arrays, LAWS[rows.amplifier.gain_law]
    conditions = arrays.shelf.conditions
    in_filter = arrays.filter_resistor[rows.pair]
    capacitor = arrays.filter_capacitor[rows.pair]
    placed = [(in_filter, 1.0)]
    placed += [(rows.common, float(law.copies))] if law.common_name else []
    placed += [(rows.gain, float(law.copies))] if law.switched_name else []
    met = np.ones(len(rows.pair), dtype=bool)
    if conditions.stock_only:
        for place, _ in placed:
            pieces: Numbers = np.zeros(len(place))
            for other, copies in placed:
                pieces += copies * (other == place)
            met &= fits(float(conditions.boards) * pieces, arrays.held_resistors[place])
        met &= fits(float(conditions.boards), arrays.held_capacitors[capacitor])
    if np.isfinite(conditions.cost_limit):
        cost = arrays.shunt_costs[rows.shunt]
        cost = cost + (np.inf if rows.amplifier.unit_cost is None else rows.amplifier.unit_cost)
        for place, copies in (*placed[1:], placed[0]):
            cost = cost + copies * arrays.resistor_costs[place]
        met &= fits(cost + arrays.capacitor_costs[capacitor], conditions.cost_limit)
    return met


def _ranks(arrays: Arrays, rows: Rows, verdicts: Verdicts) -> Iterator[Rank]:
    """Yield the best of each shunt among combinations whose filter is the one that their design takes."""
    chosen = _chosen(verdicts, len(arrays.filters))
    chosen = chosen[verdicts.held[chosen]]
    score = verdicts.score[chosen]
    for shunt in np.unique(rows.shunt[chosen]):
        of_shunt = rows.shunt[chosen] == shunt
        least = score[of_shunt].min()
        ties = np.flatnonzero(of_shunt & (score <= least * NEARLY))
        yield min(rank_of(float(score[tie]), rows.design(int(chosen[tie]))) for tie in ties)


def _chosen(verdicts: Verdicts, pairs: int) -> Places:
    """Return the combinations with the filter of the slowest corner that may be chosen, of each design."""
    slow_hz = np.where(verdicts.thinned, verdicts.slow_hz, np.inf).reshape(-1, pairs)
    least = slow_hz.min(axis=1, keepdims=True)
    near = (slow_hz <= least * NEARLY) & np.isfinite(slow_hz)
    first = near.argmax(axis=1)
    for design in np.flatnonzero((near & (slow_hz != least)).any(axis=1)):
        equal = np.flatnonzero(near[design])  # alike but for rounding: the pairs stand in the order of ties
        first[design] = min(equal, key=lambda pair: rounded(float(slow_hz[design, pair])))
    found = np.flatnonzero(near.any(axis=1))
    rows: Places = found * pairs + first[found]
    return rows
