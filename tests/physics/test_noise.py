"""Thermal noise and the bandwidth over which noise counts."""

from __future__ import annotations

from math import inf, pi

import numpy as np
from hypothesis import given, settings
from hypothesis import strategies as st
from scipy.constants import Boltzmann
from scipy.integrate import quad

from selector.physics.noise import (
    BOLTZMANN_J_PER_K,
    PEAK_TO_PEAK_SIGMAS,
    noise_bandwidth_hz,
    thermal_noise_v2_per_hz,
)
from tests.builders import near

POLES = st.floats(1.0, 1e6)


def test_boltzmann_constant_is_that_of_the_si() -> None:
    """K is 1.380649e-23 J/K.

    Source: CODATA 2018 in scipy.constants, exact in the SI.
    Tolerance: none.
    """
    assert Boltzmann == BOLTZMANN_J_PER_K


def test_thermal_noise_grows_with_resistance_and_temperature() -> None:
    """4 k T R of 10 ohm at 300 K is 1.6567788e-19 V^2/Hz, and proportional to both."""
    assert thermal_noise_v2_per_hz(10.0, 300.0) == near(1.6567788e-19)
    assert thermal_noise_v2_per_hz(20.0, 150.0) == near(1.6567788e-19)


@settings(deadline=None)
@given(POLES, POLES)
def test_noise_bandwidth_is_the_integral_of_the_gain_squared(first_hz: float, second_hz: float) -> None:
    """The noise bandwidth of two poles is the integral of |H|^2 from 0 to infinity.

    Source: scipy.integrate.quad, over the logarithm of the frequency.
    Tolerance: 1e-8, that of the integration.
    """

    def slice_of(log_hz: float) -> float:
        hz = np.exp(log_hz)
        return float(hz / ((1.0 + (hz / first_hz) ** 2) * (1.0 + (hz / second_hz) ** 2)))

    corners = sorted({float(np.log(first_hz)), float(np.log(second_hz))})
    integral, _ = quad(slice_of, corners[0] - 30.0, corners[-1] + 15.0, points=corners, limit=500, epsrel=1e-10)
    assert noise_bandwidth_hz(first_hz, second_hz) == near(integral, rel=1e-8)


def test_noise_bandwidth_by_hand() -> None:
    """Poles of 1 and 3 kHz have pi/2 * 3/4 kHz; one pole by itself pi/2 of its corner, in either place."""
    assert noise_bandwidth_hz(1000.0, 3000.0) == near(pi / 2.0 * 750.0)
    assert noise_bandwidth_hz(1000.0, inf) == noise_bandwidth_hz(inf, 1000.0) == pi / 2.0 * 1000.0


def test_peak_to_peak_holds_six_point_six_sigmas() -> None:
    """A peak-to-peak figure holds 6.6 standard deviations.

    Source: common practice, no source.
    Tolerance: none.
    """
    assert PEAK_TO_PEAK_SIGMAS == 6.6


def test_floats_and_arrays_alike() -> None:
    """Arrays of poles and resistances give what each element gives by itself."""
    first, second = np.array([10.0, 2e3]), np.array([5e3, inf])
    assert noise_bandwidth_hz(first, second).tolist() == [noise_bandwidth_hz(10.0, 5e3), noise_bandwidth_hz(2e3, inf)]
    assert thermal_noise_v2_per_hz(first, 300.0).tolist() == [
        thermal_noise_v2_per_hz(10.0, 300.0),
        thermal_noise_v2_per_hz(2e3, 300.0),
    ]
