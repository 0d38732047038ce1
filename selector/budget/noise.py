"""Noise of a range, referred to the shunt."""

from __future__ import annotations

from selector.candidate import Operating
from selector.physics.noise import PEAK_TO_PEAK_SIGMAS, noise_bandwidth_hz, thermal_noise_v2_per_hz
from selector.real import Real


def noise_v(at: Operating) -> Real:
    """Return the standard deviation of the input voltage, V.

    White noise of amplifier, resistors and converter over the exact noise bandwidth of the poles, divided by
    the number of readings averaged, plus the 0.1 to 10 Hz noise, which averaging leaves as it is.
    Source: independent sources add in squares.
    """
    amplifier, conditions = at.amplifier, at.conditions
    density = (at.noise_gain_over_gain * amplifier.noise_v_per_rthz) ** 2
    density = density + (amplifier.output_noise_v_per_rthz / at.gain) ** 2
    resistance_ohm = at.shunt_ohm + at.law.noise_ohm(at.stage)
    density = density + thermal_noise_v2_per_hz(resistance_ohm, conditions.hottest_k)
    density = density + (amplifier.current_noise_a_per_rthz * at.law.current_noise_ohm(at.stage)) ** 2
    bandwidth_hz = noise_bandwidth_hz(at.amplifier_pole_hz, at.filter.noisy_hz)
    white_v2 = (density * bandwidth_hz + (conditions.converter_noise_v / at.gain) ** 2) / conditions.average
    slow_v = at.noise_gain_over_gain * amplifier.low_frequency_noise_v / PEAK_TO_PEAK_SIGMAS
    return (white_v2 + slow_v**2) ** 0.5
