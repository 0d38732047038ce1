"""Thermal noise and the bandwidth over which noise counts."""

from __future__ import annotations

from math import pi

from selector.real import Real

BOLTZMANN_J_PER_K = 1.380649e-23  # exact by definition; the SI Brochure, 9th edition, 2019
PEAK_TO_PEAK_SIGMAS = 6.6  # standard deviations in a peak-to-peak figure; common practice, no source


def thermal_noise_v2_per_hz(ohm: Real, temperature_k: float) -> Real:
    """Return the noise density 4 k T R of a resistance, V^2/Hz.

    Source: Johnson (1928) and Nyquist (1928); k of the SI.

    >>> round(thermal_noise_v2_per_hz(1e3, 300.0) ** 0.5 * 1e9, 4)
    4.0704
    """
    return 4.0 * BOLTZMANN_J_PER_K * temperature_k * ohm


def noise_bandwidth_hz(first_pole_hz: Real, second_pole_hz: Real) -> Real:
    """Return the noise bandwidth pi/2 a c / (a + c) of two first-order poles, Hz.

    Written as pi/2 / (1/a + 1/c), so that one pole may be infinite.
    Source: integral of 1 / ((1 + f^2/a^2) (1 + f^2/c^2)) over f from 0 to infinity.
    """
    return pi / 2.0 / (1.0 / first_pole_hz + 1.0 / second_pole_hz)
