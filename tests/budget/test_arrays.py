"""The budget of arrays of designs is that of each design by itself."""

from __future__ import annotations

from typing import Any

import numpy as np
import pytest

from selector.budget import METHODS, TERMS, combined, zeroed
from selector.candidate import Calibration
from tests.budget.two_designs import STATED, both
from tests.builders import HIGH_SIDE, OF_LAW, ZERO, near

CLOSE = 1e-14  # powers of arrays and of floats may round apart


@pytest.mark.parametrize("calibration", Calibration)
@pytest.mark.parametrize("sense", [{}, HIGH_SIDE | ZERO], ids=["low", "high"])
@pytest.mark.parametrize("law", OF_LAW)
def test_every_term_takes_arrays(law: str, sense: dict[str, object], calibration: Calibration) -> None:
    """What calibration leaves of each term, in arrays, is what it leaves of each design."""
    many, each = both(law, accuracy__calibration=calibration.value, **STATED, **sense)
    for one in TERMS:
        for index, at in enumerate(each):
            assert _at_one_amp(one.remaining(many), index) == near(_at_one_amp(one.remaining(at), 0), rel=CLOSE)


def _at_one_amp(sizes: tuple[Any, ...], index: int) -> float:
    return sum(float(np.broadcast_to(size.at(1.0), (2,))[index]) for size in sizes)


@pytest.mark.parametrize("method", METHODS)
@pytest.mark.parametrize("law", OF_LAW)
def test_combined_error_takes_arrays(law: str, method: str) -> None:
    """The combined error of arrays of designs, at a current and at an array of currents, is that of each."""
    many, each = both(law, accuracy__method=method, accuracy__calibration="zero", **STATED)
    at_one = combined(many).error_a(0.3)
    at_two = combined(many).error_a(np.array([0.1, 1.0]))
    for index, (at, current) in enumerate(zip(each, (0.1, 1.0), strict=True)):
        assert at_one[index] == near(combined(at).error_a(0.3), rel=CLOSE)
        assert at_two[index] == near(combined(at).error_a(current), rel=CLOSE)


@pytest.mark.parametrize("law", OF_LAW)
def test_sum_that_a_zero_removes_takes_arrays(law: str) -> None:
    """A drift that one of two amplifiers states takes the bias current of that one alone out of the budget."""
    many, each = both(law, accuracy__calibration="zero", **STATED)
    assert np.broadcast_to(zeroed(many).zero_sum_a, (2,)).tolist() == near([at.zero_sum_a for at in each])
