"""A limit on arrays of designs is that on each design by itself."""

from __future__ import annotations

from typing import TYPE_CHECKING, Any

import numpy as np
import pytest

from selector.budget import combined
from selector.candidate import ShuntAt
from selector.limits import LIMITS, FilterCheck, LinkCheck, PairCheck, PointCheck, RangeCheck, ShuntCheck
from tests.budget.two_designs import LIMITED, design_of
from tests.builders import HIGH_SIDE, OF_LAW, ZERO, chain, near, side_by_side

if TYPE_CHECKING:
    from selector.candidate.chain import Chain
    from selector.limits import Measure

OF_A_RANGE = (RangeCheck, LinkCheck, FilterCheck)
ASKED = LIMITED | {"current__overload": 3.0, "current__overload_time": 0.01}


def _measures(check: object, first: Chain, second: Chain | None = None) -> list[Measure | None]:
    """Return what a check says of a chain, or of two like chains side by side."""

    def both(one: Any, other: Any) -> Any:  # noqa: ANN401 - any part of a chain
        return one if second is None else side_by_side(one, other)

    other = first if second is None else second
    if isinstance(check, ShuntCheck):
        shunt = both(first.pairing.shunt, other.pairing.shunt)
        return [check.measure(ShuntAt(first.pairing.conditions, shunt))]
    if isinstance(check, PairCheck):
        return [check.measure(both(first.pairing, other.pairing))]
    ranges = [both(*pair) for pair in zip(first.ranges, other.ranges, strict=True)]
    if isinstance(check, OF_A_RANGE):
        return [check.measure(at) for at in ranges]
    if isinstance(check, PointCheck):
        return [check.measure(at, combined(at)) for at in ranges]
    return []


@pytest.mark.parametrize("sense", [{}, HIGH_SIDE | ZERO | {"current__two_way": True}], ids=["low", "high"])
@pytest.mark.parametrize("law", OF_LAW)
def test_every_limit_takes_arrays(law: str, sense: dict[str, object]) -> None:
    """Figure, allowance and verdict of each limit in arrays are those of each design."""
    chains = [chain(design_of(law, number), **ASKED, **sense) for number in (0, 1)]
    compared = 0
    for check in (check for one in LIMITS for check in one.checks):
        each = [_measures(check, one) for one in chains]
        for many, *apart in zip(_measures(check, *chains), *each, strict=True):
            if many is None:
                assert apart == [None, None]
                continue
            compared += 1
            for index, one in enumerate(apart):
                assert _element(many.value, index) == near(float(one.value))
                assert _element(many.allowed, index) == near(float(one.allowed))
                assert bool(np.broadcast_to(many.meets, (2,))[index]) is bool(one.meets)
    assert compared >= 15


def _element(value: object, index: int) -> float:
    return float(np.broadcast_to(value, (2,))[index])
