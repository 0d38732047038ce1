"""The plain walk: each combination with one range, its filter too, built and judged by itself in plain numbers."""

from __future__ import annotations

from collections.abc import Iterator, Mapping
from dataclasses import replace
from itertools import product
from math import inf

from selector.candidate import Design, cost_of
from selector.candidate.chain import Chain
from selector.limits import LIMITS
from selector.parts import Part
from selector.search.assess import chain_of, measures, uses_of
from selector.search.objective import score_of
from selector.search.order import cost_key, rounded
from selector.search.shelf import Shelf, shelf_of
from selector.spec import Spec

Key = tuple[float, float, tuple[bool, float], tuple[tuple[str, ...], ...]]


def by_plain_walk(spec: Spec, stock: Mapping[str, tuple[Part, ...]]) -> float:
    """Return the best score, infinite where nothing is left."""
    shelf, best = shelf_of(spec, stock), inf
    for design in _designs(shelf):
        chain = _with_filter(shelf, design)
        if chain is not None and _meets(chain, thins=False):
            uses = uses_of(chain)
            best = min(best, float(score_of(spec).of(uses.power, uses.burden, uses.headroom, uses.error)))
    return best


def _designs(shelf: Shelf) -> Iterator[Design]:
    """Yield every combination with one range, without its filter."""
    for shunt, amplifier in product(shelf.shunts, shelf.amplifiers):
        law = Design((shunt,), amplifier, None, None, None).law
        for common in shelf.resistors if law.common_name else (None,):
            for gain in ((one,) for one in shelf.resistors) if law.switched_name else (None,):
                yield Design((shunt,), amplifier, None, common, gain)


def _with_filter(shelf: Shelf, design: Design) -> Chain | None:
    """Return a design with the filter that it takes, None where there is none."""
    chosen: tuple[Key, Chain] | None = None
    for resistor, capacitor in product(shelf.resistors, shelf.capacitors):
        whole = replace(design, filter_resistor=resistor, filter_capacitor=capacitor)
        chain = chain_of(shelf.conditions, whole)
        if chain.filtered and _meets(chain, thins=True):
            slow_hz = rounded(float(chain.ranges[-1].filter.slow_hz))
            key = slow_hz, -rounded(resistor.resistance), cost_key(cost_of(whole)), whole.names()
            chosen = (key, chain) if chosen is None or key < chosen[0] else chosen
    return None if chosen is None else chosen[1]


def _meets(chain: Chain, *, thins: bool) -> bool:
    """Return whether a combination meets the limits that thin the choice of its filter, or all others."""
    wanted = (limit for limit in LIMITS if limit.thins is thins)
    return all(bool(measure.meets) for limit in wanted for measure in measures(chain, limit))
