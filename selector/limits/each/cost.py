"""The parts of a board cost no more than is granted."""

from __future__ import annotations

from math import inf, isinf

from selector.candidate.design import cost_of
from selector.limits.measure import ChoiceAt, ChoiceCheck, DesignAt, DesignCheck, Limit, Measure
from selector.units import MONEY


def _cost(at: DesignAt) -> Measure | None:
    """The cost of a board against limits.cost; a part without a cost does not meet it."""
    if isinf(at.conditions.cost_limit):
        return None
    cost = cost_of(at.design)
    return Measure(inf if cost is None else cost, at.conditions.cost_limit)


def _cost_of_each(at: ChoiceAt) -> Measure | None:
    """The same with every filter pair."""
    if isinf(at.conditions.cost_limit):
        return None
    return Measure(at.cost, at.conditions.cost_limit)


LIMIT = Limit(
    "cost",
    (
        DesignCheck(_cost),
        ChoiceCheck(_cost_of_each),
    ),
    MONEY,
    thins=True,
)
