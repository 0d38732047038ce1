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
        fixed = fixed + lot.family.law.copies * bench.resistors.costs[line.common]
    return np.asarray(limit - fixed)


def gain_budget_of(bench: Bench, line: Line) -> Numbers:
    """Return what gain resistors may cost beside the cheapest filter, of shape (rows,), with room for rounding."""
    spare = spare_of(bench, line)
    if np.isposinf(spare).all():
        return spare
    return spare - bench.cheapest_filter + ROUNDING * (1.0 + bench.conditions.cost_limit)


def gain_budget(bench: Bench, line: Line, most: float) -> float:
    """Return what the gain resistors of a single row may cost, `most` where that is less."""
    return min(float(gain_budget_of(bench, line)[0]), most + ROUNDING * (1.0 + bench.conditions.cost_limit))


def payable(bench: Bench, line: Line) -> NDArray[np.bool_] | None:
    """Return which switched resistors rows can pay beside the cheapest others, (rows, resistors); None for any."""
    budget, law = gain_budget_of(bench, line), line.lot.family.law
    if law.switched_name is None or np.isposinf(budget).all():
        return None
    costs = law.copies * bench.resistors.costs
    others = (line.lot.range_count - 1) * costs.min(initial=inf) if line.lot.range_count > 1 else 0.0
    return np.asarray(costs[None, :] <= (budget - others)[:, None])
