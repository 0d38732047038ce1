"""Corner, bandwidth and settling of two first-order poles."""

from __future__ import annotations

from math import exp, inf, log, pi, sqrt

import numpy as np
from hypothesis import given
from hypothesis import strategies as st
from scipy.optimize import brentq

from selector.physics.filters import bandwidth_hz, corner_hz, settling_s
from tests.builders import near

POLES = st.floats(1.0, 1e7)


def _excess(hz: float, first_hz: float, second_hz: float) -> float:
    """Return by how much the chain's 1/|H|^2 is above 2."""
    return (1.0 + (hz / first_hz) ** 2) * (1.0 + (hz / second_hz) ** 2) - 2.0


@given(POLES, POLES)
def test_bandwidth_is_the_root_of_its_definition(first_hz: float, second_hz: float) -> None:
    """The -3 dB frequency of two poles is the root of the product of 1 + f^2 / p^2 less 2.

    Source: scipy.optimize.brentq on the definition.
    Tolerance: 1e-11, that of the root finder.
    """
    root = brentq(_excess, 0.0, min(first_hz, second_hz), args=(first_hz, second_hz), xtol=1e-300, rtol=1e-12)
    assert bandwidth_hz(first_hz, second_hz) == near(root, rel=1e-11)


def test_bandwidth_of_one_pole_is_its_corner() -> None:
    """A pole beside an infinite one, in either place, has its own corner."""
    assert bandwidth_hz(1000.0, inf) == near(1000.0)
    assert bandwidth_hz(inf, 1000.0) == near(1000.0)


def test_bandwidth_of_two_equal_poles() -> None:
    """Two poles at 1 kHz give sqrt(sqrt(2) - 1) kHz = 643.594 Hz.

    Source: (1 + x)^2 = 2 by hand.
    Tolerance: 1e-14, rounding.
    """
    assert bandwidth_hz(1000.0, 1000.0) == near(1000.0 * sqrt(sqrt(2.0) - 1.0))


@given(POLES, POLES)
def test_bandwidth_is_the_contracts_formula(first_hz: float, second_hz: float) -> None:
    """Bandwidth^2 is 2 a c / (a + c + sqrt((a + c)^2 + 4 a c)), a and c the squares of the poles.

    Source: the positive root of a quadratic in f^2.
    Tolerance: 1e-14, rounding.
    """
    a, c = first_hz**2, second_hz**2
    squared = 2.0 * a * c / (a + c + sqrt((a + c) ** 2 + 4.0 * a * c))
    assert bandwidth_hz(first_hz, second_hz) == near(sqrt(squared))


def _exact_settling_s(first_hz: float, second_hz: float, bits: int) -> float:
    """Return when the step response of two different poles comes within half a count for good."""
    fast, slow = sorted((1.0 / (2.0 * pi * first_hz), 1.0 / (2.0 * pi * second_hz)))
    share = 2.0 ** -(bits + 1)

    def left(time_s: float) -> float:
        return (slow * exp(-time_s / slow) - fast * exp(-time_s / fast)) / (slow - fast) - share

    return float(brentq(left, 0.0, 100.0 * slow, rtol=1e-12))


@given(st.floats(1.01, 1e3), st.integers(8, 16))
def test_settling_of_two_poles_is_near_the_exact_time(ratio: float, bits: int) -> None:
    """From 8 to 16 bits the root sum of squares of the time constants is +15 ... -1.5 % off the exact settling time.

    Source: step response of two poles, solved by scipy.optimize.brentq.
    Tolerance: the span that the contract states, to its digits; with fewer or more bits it is wider.
    """
    exact_s = _exact_settling_s(1000.0, 1000.0 * ratio, bits)
    assert 0.9845 <= settling_s(1000.0, 1000.0 * ratio, bits) / exact_s <= 1.15


def test_settling_of_two_equal_poles_by_hand() -> None:
    """Two poles at 1 kHz settle to half a count of 10 bits in 11 ln 2 sqrt(2) / (2 pi 1 kHz) = 1.71615 ms.

    Source: the contract's formula by hand.
    Tolerance: 1e-14, rounding.
    """
    wanted_s = 11.0 * log(2.0) * sqrt(2.0) / (2000.0 * pi)
    assert settling_s(1000.0, 1000.0, 10) == near(wanted_s)
    assert settling_s(1000.0, 1000.0, 10) == near(1.71615e-3, rel=1e-5)


def test_floats_and_arrays_alike() -> None:
    """Arrays of poles and parts give what each element gives by itself, one pole infinite among them."""
    first, second = np.array([10.0, 2e3, inf]), np.array([5e3, inf, 7.0])
    for index in range(3):
        pair = float(first[index]), float(second[index])
        assert bandwidth_hz(first, second)[index] == bandwidth_hz(*pair)
        assert settling_s(first, second, 12)[index] == settling_s(*pair, 12)
    assert corner_hz(first[:2], 1e-7).tolist() == [corner_hz(10.0, 1e-7), corner_hz(2e3, 1e-7)]
