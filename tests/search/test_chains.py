"""The chains of a row, cheapest first, against a plain loop over all of them."""

from __future__ import annotations

from dataclasses import dataclass, replace
from functools import cache
from itertools import pairwise, product
from math import inf
from random import Random
from typing import TYPE_CHECKING

import numpy as np
import pytest

from selector.candidate import Design, cost_of
from selector.candidate.elementwise import stated
from selector.limits import FilterCheck, LinkCheck, PointCheck, RangeCheck
from selector.search.assess import chain_of, uses_of
from selector.search.chains import UNKNOWN, Chains
from selector.search.lots import NONE
from selector.search.order import cost_key
from selector.search.solve import Lane, solve
from tests.search.lines import lines, loose

if TYPE_CHECKING:
    from collections.abc import Iterator

    from selector.candidate.chain import Chain
    from selector.search.bench import Bench
    from selector.search.rows import Line

# Catalogues that have chains of so many ranges.
SEEDS = {
    1: (0, 1, 4, 5, 6, 7, 8, 10, 11, 16, 18, 30),
    2: (5, 10, 11, 16, 18, 22, 31, 35, 39, 43, 73, 89),
    3: (5, 22, 31, 32, 36, 39, 82, 96, 104, 110, 166, 225),
    4: (22, 36, 82, 83, 110, 166, 286, 352, 380, 387, 446, 453),
}
ROWS = 2  # of each catalogue and number of ranges
CLOSE = 1e-9
OF_RANGES = (RangeCheck, LinkCheck, FilterCheck, PointCheck)


@dataclass(frozen=True, slots=True)
class Plain:
    """A chain that meets every limit on its ranges: figure, cost of its gain resistors, their places and names."""

    figure: float
    cost: float
    switched: tuple[int, ...]
    names: tuple[str, ...]


@dataclass(frozen=True, slots=True)
class Row:
    """A row with one filter, and all its chains as a plain loop finds them."""

    bench: Bench
    line: Line
    step: int
    fixed: float
    every: tuple[Plain, ...]

    def chains(self, lane: Lane) -> Chains:
        """Return the chains of the row in a lane."""
        lane = replace(lane, step=np.array(self.step))
        return Chains(self.bench, self.line, solve(self.bench, self.line, [lane]), lane, self.fixed)

    def wanted(self, most: float, floor: float, cost_most: float, lane: Lane) -> list[tuple[int, ...]]:
        """Return the places of the chains that are to be found, in their order."""
        found = [
            one
            for one in self.every
            if floor < one.figure <= most
            and lane.cost_above < one.cost <= cost_most
            and lane.barred not in one.switched
            and (lane.needed == NONE or lane.needed in one.switched)
        ]
        return [one.switched for one in sorted(found, key=self._key)]

    def _key(self, one: Plain) -> tuple[tuple[bool, float], tuple[str, ...]]:
        cost = self.fixed + one.cost
        return cost_key(None if cost >= UNKNOWN else cost), one.names

    def between(self) -> list[float]:
        """Return figures that lie clearly between those of two chains, and beyond all of them."""
        figures = sorted(one.figure for one in self.every)
        middles = [(a + b) / 2.0 for a, b in pairwise(figures) if b > a * (1.0 + CLOSE)]
        return [*middles, inf]

    def costs(self) -> list[float]:
        """Return costs that just allow some chains, and one that allows all."""
        return [*(cost + CLOSE for cost in sorted({one.cost for one in self.every}) if cost < UNKNOWN), inf]


@cache
def _rows(seed: int, count: int) -> tuple[Row, ...]:
    """Return rows of a catalogue in which some costs are unknown and many equal."""
    bench, random, rows = loose(seed, (5, 7), 4), Random(seed), []
    if bench.ladder is None:
        return ()
    every = [
        line for line in lines(bench, random, range(count, count + 1)) if line.lot.family.law.switchable or count == 1
    ]
    for line in random.sample(every, min(ROWS, len(every))):
        step = random.randrange(len(bench.ladder))
        fixed = stated(cost_of(replace(_design(bench, line, step, ()), gain=None)), UNKNOWN)
        rows.append(Row(bench, line, step, fixed, tuple(_plain(bench, line, step))))
    return tuple(rows)


def _every(count: int) -> Iterator[tuple[Row, Random]]:
    """Yield the rows with so many ranges, each with what draws what is asked of it."""
    for seed in SEEDS[count]:
        for row in _rows(seed, count):
            yield row, Random(seed)


def _design(bench: Bench, line: Line, step: int, switched: tuple[int, ...]) -> Design:
    assert bench.ladder is not None
    shelf, lot, parts = bench.shelf, line.lot, bench.resistors.parts
    common = int(line.common[0])
    assert lot.switch is not None
    return Design(
        (shelf.shunts[int(lot.shunt[0])],),
        lot.family.amplifiers[int(lot.amplifier[0])],
        shelf.switches[int(lot.switch[0])] if lot.range_count > 1 else None,
        None if common == NONE else parts[common],
        tuple(parts[one] for one in switched),
        *bench.bank.pair(int(bench.ladder.places[step])),
    )


def _plain(bench: Bench, line: Line, step: int) -> Iterator[Plain]:
    """Yield every chain of a row that meets the limits on its ranges with a filter."""
    parts, copies = bench.resistors.parts, line.lot.family.law.copies
    single = [
        chain_of(bench.conditions, _design(bench, line, step, (one,))).ranges[0].gain for one in range(len(parts))
    ]
    for switched in product(range(len(parts)), repeat=line.lot.range_count):
        if any(single[below] <= single[above] for below, above in pairwise(switched)):
            continue  # gains fall from range to range
        chain = chain_of(bench.conditions, _design(bench, line, step, switched))
        if _met(bench, chain):
            uses = uses_of(chain)
            yield Plain(
                float(bench.objective.of(uses.power, uses.burden, uses.headroom, uses.error)),
                sum(copies * stated(parts[one].unit_cost, UNKNOWN) for one in switched),
                switched,
                tuple(parts[one].part for one in switched),
            )


def _met(bench: Bench, chain: Chain) -> bool:
    checks = (check for limit in bench.limits for check in limit.checks if isinstance(check, OF_RANGES))
    return all(measure is None or bool(measure.meets) for check in checks for measure in check.measured(chain))


def _found(chains: Chains, most: float, floor: float = -inf, cost_most: float = inf) -> list[tuple[int, ...]]:
    return [path.switched for path in chains.up_to(most, floor, cost_most)]


every_count = pytest.mark.parametrize("count", SEEDS)


@every_count
def test_chains_are_those_of_a_plain_loop_in_their_order(count: int) -> None:
    """All chains between two figures that cost no more than some cost come by their rounded cost, then by name."""
    chains_found = 0
    for row, random in _every(count):
        chains, every = row.chains(Lane()), row.wanted(inf, -inf, inf, Lane())
        chains_found += len(every)
        assert _found(chains, inf) == every
        for _ in range(6):
            floor, most = sorted(random.choice([-inf, *row.between()]) for _ in range(2))
            cost_most = random.choice(row.costs())
            assert _found(chains, most, floor, cost_most) == row.wanted(most, floor, cost_most, Lane())
    assert chains_found >= 20


@every_count
def test_chains_carry_their_figures(count: int) -> None:
    """The figure of each chain is that of the combination judged by itself.

    Tolerance: 1e-9, far above the rounding of arrays against plain numbers.
    """
    for row, _ in _every(count):
        figures = {one.switched: one.figure for one in row.every}
        for path in row.chains(Lane()).up_to(inf):
            assert path.figure == pytest.approx(figures[path.switched], rel=CLOSE)


@every_count
def test_lane_narrows_the_chains(count: int) -> None:
    """A lane without some resistor, with a needed one, or of chains above a cost has those chains alone."""
    for row, random in _every(count):
        place = random.randrange(len(row.bench.resistors))
        if row.every:
            place = random.choice(random.choice(row.every).switched)
        above = random.choice(row.costs()[:-1] or [0.0]) - 2.0 * CLOSE
        for lane in (Lane(barred=place), Lane(needed=place), Lane(cost_above=above)):
            most, cost_most = random.choice(row.between()), random.choice(row.costs())
            assert _found(row.chains(lane), most, -inf, cost_most) == row.wanted(most, -inf, cost_most, lane)


@every_count
def test_least_figure_within_a_cost(count: int) -> None:
    """No chain within a cost has a lower figure than the least one, and one comes near it; none at all is infinite.

    Of rows whose other parts state their costs: no others are within one.
    Tolerance: 1e-9, the end of the halving.
    """
    for row, random in _every(count):
        chains, costs = replace(row, fixed=1.0).chains(Lane()), row.costs()
        for cost_most in (-1.0, *random.sample(costs, min(2, len(costs))), inf):
            for most in (row.between()[0], inf):
                within = [one.figure for one in row.every if one.cost <= cost_most and one.figure <= most]
                least = chains.least(most, cost_most)
                assert least == pytest.approx(min(within, default=inf), rel=CLOSE)
                assert least <= min(within, default=inf) * (1.0 + 1e-12)


def test_rows_have_chains_of_many_figures_and_costs() -> None:
    """The catalogues of these tests hold parts of unknown cost, chains of equal cost, and rows of several figures."""
    rows = [row for count in SEEDS for row, _ in _every(count)]
    assert sum(row.fixed >= UNKNOWN for row in rows) >= 3
    assert sum(any(one.cost >= UNKNOWN for one in row.every) for row in rows) >= 3
    assert sum(len(row.costs()) - 1 < len(row.every) for row in rows) >= 10
    assert sum(len(row.between()) > 2 for row in rows) >= 20
