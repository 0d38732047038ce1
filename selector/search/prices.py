"""What the cost limit leaves to spend."""

from __future__ import annotations

from math import ceil, inf, isfinite

import numpy as np
from numpy.typing import NDArray

from selector.candidate.design import cost_or_inf
from selector.limits.each.cost import LIMIT as COST
from selector.search.bench import Bench
from selector.search.rows import Line

Numbers = NDArray[np.float64]
ROUNDING = 1e-9  # of sums of costs


def spare_of(bench: Bench, line: Line) -> Numbers:
    """Return what the cost limit leaves for gain resistors and filter beside all other parts, of shape (rows,).

    Infinite where no limit is held, minus infinity where a part states no cost.
    """
    limit, lot = bench.conditions.cost_limit, line.lot
    if not isfinite(limit) or COST.name in bench.lifted:
        return np.full(len(lot), inf)
    shunts = np.array([cost_or_inf(part) for part in bench.shelf.shunts])
    amplifiers = np.array([cost_or_inf(part) for part in lot.family.amplifiers])
    fixed = shunts[lot.shunt] + amplifiers[lot.amplifier]
    if lot.switch is not None and lot.range_count > 1:
        each = [ceil(lot.range_count / part.channels) * cost_or_inf(part) for part in bench.shelf.switches]
        fixed = fixed + np.array(each)[lot.switch]
    if lot.family.law.common_name is not None:
        fixed = fixed + lot.family.law.copies * _costs(bench)[line.common]
    return np.asarray(limit - fixed)


def payable(bench: Bench, line: Line) -> NDArray[np.bool_] | None:
    """Return which switched resistors rows can pay beside the cheapest others, (rows, resistors); None for any."""
    spare, law = spare_of(bench, line), line.lot.family.law
    if law.switched_name is None or np.isposinf(spare).all():
        return None
    costs = law.copies * _costs(bench)
    pairs = bench.bank.resistor_costs + bench.bank.capacitor_costs
    others = (line.lot.range_count - 1) * costs.min(initial=inf) if line.lot.range_count > 1 else 0.0
    left = spare - others - pairs.min(initial=inf) + ROUNDING * (1.0 + bench.conditions.cost_limit)
    return np.asarray(costs[None, :] <= left[:, None])


def _costs(bench: Bench) -> Numbers:
    return np.array([cost_or_inf(part) for part in bench.resistors.parts])
