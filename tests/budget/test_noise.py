"""Noise of a range, referred to the shunt."""

from __future__ import annotations

from math import pi, sqrt

import pytest

from tests.budget.sized import check
from tests.builders import amplifier, capacitor, design, near, operating, resistor, term

BOLTZMANN = 1.380649e-23
HOTTEST_K = 323.15
# Poles of 100 kHz and of 1 kohm with 100 nF.
CORNER_HZ = 1.0 / (2.0 * pi * 1e3 * 1e-7)
ENBW_HZ = pi / 2.0 * 1e5 * CORNER_HZ / (1e5 + CORNER_HZ)
THERMAL_V2 = 4.0 * BOLTZMANN * HOTTEST_K * 0.1  # of the shunt


def test_noise_of_the_plain_design() -> None:
    """10 nV/rtHz and the shunt's thermal noise over 2460.8 Hz: 0.496 uV, on 0.1 ohm 4.96 uA."""
    check("noise", operating(), constant=sqrt((1e-16 + THERMAL_V2) * ENBW_HZ) / 0.1)
    assert near(2460.8, rel=1e-4) == ENBW_HZ
    assert term("noise").sizes(operating())[0].constant_a == near(4.96e-6, rel=1e-3)


def test_noise_is_normal_and_stays() -> None:
    """Noise is the one normal term, and no calibration takes it out."""
    assert term("noise").normal
    found = [term("noise").sizes(operating(accuracy__calibration=one)) for one in ("none", "zero", "zero-and-span")]
    assert found[0] == found[1] == found[2]


def test_output_and_converter_noise_come_over_the_gain() -> None:
    """400 nV/rtHz at the output count as 20 nV/rtHz, 200 uV of the converter as 10 uV, at a gain of 20."""
    at = operating(design(amplifier=amplifier(output_noise_density=4e-7)), converter__noise=2e-4)
    white = (1e-16 + 4e-16 + THERMAL_V2) * ENBW_HZ
    check("noise", at, constant=sqrt(white + 1e-10) / 0.1)


def test_averaging_thins_white_noise_only() -> None:
    """16 readings leave a quarter of the white noise; 6.6 uV peak to peak stay 1 uV whatever is averaged."""
    of = design(amplifier=amplifier(low_frequency_noise=6.6e-6))
    white = (1e-16 + THERMAL_V2) * ENBW_HZ + 1e-10
    for average in (1, 16):
        at = operating(of, converter__noise=2e-4, converter__average=average)
        check("noise", at, constant=sqrt(white / average + 1e-12) / 0.1)


def test_noise_of_a_difference_amplifier() -> None:
    """Kappa 1.05 on both of the amplifier's noises, 2100.1 ohm of thermal and sqrt(2) kohm of current noise."""
    noisy = amplifier("difference", low_frequency_noise=6.6e-6, current_noise_density=1e-12)
    density = (1.05e-8) ** 2 + 4.0 * BOLTZMANN * HOTTEST_K * 2100.1 + (1e-12 * sqrt(2.0) * 1e3) ** 2
    constant = sqrt(density * ENBW_HZ + (1.05e-6) ** 2) / 0.1
    check("noise", operating(design("difference", amplifier=noisy)), constant=constant)


def test_noise_counts_the_filter_at_its_fast_end() -> None:
    """1 % less resistance and 10 + 5 % less capacitance: the corner of 990 ohm and 85 nF."""
    parts = {
        "filter_resistor": resistor(tolerance=0.01),
        "filter_capacitor": capacitor(tolerance=0.1, temp_change=0.05),
    }
    corner_hz = 1.0 / (2.0 * pi * 990.0 * 85e-9)
    enbw_hz = pi / 2.0 / (1.0 / 1e5 + 1.0 / corner_hz)
    check("noise", operating(design(**parts)), constant=sqrt((1e-16 + THERMAL_V2) * enbw_hz) / 0.1)


def test_noise_sees_the_output_resistance_before_the_filter() -> None:
    """An unbuffered 10 kohm stands before the filter's 1 kohm and adds 25 ohm of thermal noise: 11 kohm, 100 nF."""
    corner_hz = 1.0 / (2.0 * pi * 11e3 * 1e-7)
    enbw_hz = pi / 2.0 / (1.0 / 1e5 + 1.0 / corner_hz)
    density = 1e-16 + 4.0 * BOLTZMANN * HOTTEST_K * 25.1
    check("noise", operating(design("current-output")), constant=sqrt(density * enbw_hz) / 0.1)


@pytest.mark.parametrize(
    ("law", "pole_hz"), [("non-inverting", 1e6 / 20.0), ("difference", 1e6 / 21.0), ("fixed", 1e6 / 20.0)]
)
def test_amplifiers_pole_by_its_noise_gain(law: str, pole_hz: float) -> None:
    """1 MHz over the noise gain, 20 or 21, is the pole where it lies below the stated bandwidth, which counts else."""
    of = design(law, amplifier=amplifier(law, gain_bandwidth=1e6, bandwidth=None))
    assert operating(of).amplifier_pole_hz == near(pole_hz)
    slow = design(law, amplifier=amplifier(law, gain_bandwidth=1e6, bandwidth=1e4))
    assert operating(slow).amplifier_pole_hz == 1e4
