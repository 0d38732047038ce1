"""What heat leaves of a rating, and what it does to a resistance."""

from __future__ import annotations

import numpy as np

from selector.physics.heat import derating_frac, thermal_resistance_k_per_w
from tests.builders import design, near, operating, shunt, size

SELF_HEATING = {"resistance": 0.05, "tempco": 75e-6, "thermal_resistance": 100.0}


def test_derating_is_held_between_all_and_nothing() -> None:
    """Below full power the whole rating is left, from zero power on nothing."""
    assert derating_frac(-40.0, 70.0, 155.0) == 1.0
    assert derating_frac(70.0, 70.0, 155.0) == 1.0
    assert derating_frac(155.0, 70.0, 155.0) == 0.0
    assert derating_frac(200.0, 70.0, 155.0) == 0.0


def test_floats_and_arrays_alike() -> None:
    """Arrays of derating lines give what each element gives by itself: 10/85, 1 and 0."""
    full, zero = np.array([70.0, 150.0, 70.0]), np.array([155.0, 170.0, 125.0])
    assert derating_frac(145.0, full, zero).tolist() == [derating_frac(145.0, 70.0, 155.0), 1.0, 0.0]
    assert thermal_resistance_k_per_w(np.array([0.25, 1.0]), 70.0, 155.0).tolist() == [340.0, 85.0]


def test_self_heating_of_fifty_milliohm() -> None:
    """2 A in 50 mohm are 0.2 W, in 100 K/W 20 K, with 75 ppm/K 1500 ppm of the current.

    Source: Joule heat.
    Tolerance: 1e-14, rounding.
    """
    at = operating(design(shunts=(shunt(**SELF_HEATING),)), current__max=2.0)
    constant, proportional, cubic = size("shunt self-heating", at)
    assert (constant, proportional) == (0.0, 0.0)
    assert cubic * 2.0**3 / 2.0 == near(1500e-6)


def test_self_heating_falls_short_of_its_fixed_point_by_two_ppm() -> None:
    """The warmer resistance heats more: the fixed point is 1502 ppm, 2.3 ppm above what the term counts.

    Source: Joule heat, d = 1500 ppm (1 + d), iterated.
    Tolerance: 1e-3, the digits stated.
    """
    cubic = size("shunt self-heating", operating(design(shunts=(shunt(**SELF_HEATING),)), current__max=2.0))[2]
    counted = cubic * 2.0**2
    risen = 0.0
    for _ in range(50):
        risen = counted * (1.0 + risen)
    assert risen == near(1502e-6, rel=1e-3)
    assert risen - counted == near(2.25e-6, rel=5e-3)
