"""When a figure is within what is allowed."""

from __future__ import annotations

from math import inf, nextafter

import numpy as np
import pytest
from hypothesis import given
from hypothesis import strategies as st

from selector.limits import Measure, fits

NUMBERS = st.floats(-1e12, 1e12).filter(lambda number: number == 0.0 or abs(number) > 1e-12)
# Figure, allowed, within.
ROWS = [
    (1.0, 2.0, True),
    (2.0, 2.0, True),
    (2.0, 1.0, False),
    (0.1 + 0.2, 0.3, True),
    (1.0 + 0.9e-12, 1.0, True),
    (1.0 + 1.1e-12, 1.0, False),
    (1e-9 * (1.0 + 0.9e-12), 1e-9, True),
    (1e-9 * (1.0 + 1.1e-12), 1e-9, False),
    (-1.0, -1.0 - 0.9e-12, True),
    (-1.0, -1.0 - 1.1e-12, False),
    (0.0, 0.0, True),
    (1e-300, 0.0, False),
    (0.0, -1e-300, False),
    (-1.0, 1.0, True),
    (1.0, inf, True),
    (inf, inf, True),
    (inf, 1.0, False),
    (inf, 0.0, False),
    (1.0, -inf, False),
    (-inf, 1.0, True),
]


@pytest.mark.parametrize(("value", "allowed", "within"), ROWS)
def test_fits(value: float, allowed: float, within: bool) -> None:  # noqa: FBT001 - a column of the table
    """A figure fits where it is not above what is allowed by more than 1e-12 of the larger of both."""
    assert bool(fits(value, allowed)) is within


@pytest.mark.parametrize(("value", "allowed", "within"), ROWS)
def test_fits_in_arrays(value: float, allowed: float, within: bool) -> None:  # noqa: FBT001 - a column of the table
    """So does every element of an array, on either side or on both."""
    for pair in (([value], allowed), (value, [allowed]), ([value], [allowed])):
        assert fits(*(np.array(one) if isinstance(one, list) else one for one in pair)).tolist() == [within]


@given(NUMBERS, NUMBERS)
def test_floats_and_arrays_alike(value: float, allowed: float) -> None:
    """A pair of numbers fits as floats where it fits as arrays."""
    assert fits(np.array([value]), np.array([allowed])).tolist() == [bool(fits(value, allowed))]


@given(NUMBERS.filter(bool))
def test_a_figure_fits_itself_and_its_neighbour(value: float) -> None:
    """One rounding either way leaves a figure on its limit."""
    assert fits(value, value)
    assert fits(nextafter(value, inf), value)
    assert fits(value, nextafter(value, -inf))


def test_strict_measures_know_no_tolerance() -> None:
    """A strict measure is met below what is allowed, by however little, and not on it."""
    assert Measure(nextafter(1.0, 0.0), 1.0, strict=True).meets
    assert not Measure(1.0, 1.0, strict=True).meets
    assert Measure(1.0, 1.0).meets
    many = Measure(np.array([0.5, 1.0, 1.5]), 1.0, strict=True)
    assert np.array_equal(many.meets, [True, False, False])
