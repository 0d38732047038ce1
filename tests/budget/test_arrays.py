"""The budget of arrays of designs is that of each design by itself."""

from __future__ import annotations

from typing import Any

import numpy as np
import pytest

from selector.budget import METHODS, TERMS, combined, zeroed
from selector.candidate import Calibration, Design, Operating
from tests.builders import (
    HIGH_SIDE,
    OF_LAW,
    OHMS_OF_LAW,
    ZERO,
    amplifier,
    capacitor,
    design,
    near,
    operating,
    resistor,
    shunt,
    side_by_side,
    switch,
)

CLOSE = 1e-14  # powers of arrays and of floats may round apart
STATED = {
    "converter__noise": 1e-4,
    "converter__inl": 1.0,
    "converter__offset": 1e-3,
    "converter__gain_error": 1e-3,
    "converter__input_current": 1e-8,
    "converter__input_resistance": 1e6,
    "converter__reference_tolerance": 1e-3,
    "converter__reference_drift": 1e-5,
    "sense__lead": 1e-3,
    "accuracy__calibration_uncertainty": 1e-3,
}


def _design(law: str, number: int) -> Design:
    """Return one of two designs of a law that differ in every figure."""
    few = float(number + 1)
    common, gain = OHMS_OF_LAW[law]
    stated: dict[str, Any] = {"bias_current_drift": 1e-11} if number else {}
    ranges = 2 if design(law).law.switchable else 1
    resistors = None if gain is None else [gain * few, gain * few / 2.0][:ranges]
    return design(
        law,
        shunts=(shunt(resistance=0.1 * few, tempco=5e-5 * few, drift=1e-3 * few, thermal_emf=1e-6 * few),),
        amplifier=amplifier(
            law,
            offset=1e-4 * few,
            output_offset=1e-4 * few,
            output_offset_drift=1e-6 * few,
            bias_current=1e-9 * few,
            output_bias_current=1e-9 * few,
            common_mode_test=1.5 * few,
            supply_test=3.0 * few,
            gain_error=1e-3 * few,
            gain_drift=1e-6 * few,
            nonlinearity=1e-5 * few,
            open_loop_gain=100.0 * few,
            current_noise_density=1e-13 * few,
            low_frequency_noise=1e-6 * few,
            **stated,
        ),
        switch=switch(on_resistance=10.0 * few, leakage=1e-9 * few) if ranges > 1 else None,
        common=None if common is None else resistor(common * few, "RC", tolerance=1e-3 * few, tempco=1e-5 * few),
        gain=None
        if resistors is None
        else tuple(resistor(ohm, "RG", tolerance=1e-3 * few, tempco=1e-5 * few) for ohm in resistors),
        filter_resistor=resistor(1e3 * few, tolerance=0.01),
        filter_capacitor=capacitor(1e-7 * few, tolerance=0.1),
    )


def _both(law: str, **changes: object) -> tuple[Operating, tuple[Operating, Operating]]:
    """Return the first ranges of both designs of a law, as arrays and by themselves."""
    first, second = (operating(_design(law, number), **changes) for number in (0, 1))
    return side_by_side(first, second), (first, second)


@pytest.mark.parametrize("calibration", Calibration)
@pytest.mark.parametrize("sense", [{}, HIGH_SIDE | ZERO], ids=["low", "high"])
@pytest.mark.parametrize("law", OF_LAW)
def test_every_term_takes_arrays(law: str, sense: dict[str, object], calibration: Calibration) -> None:
    """What calibration leaves of each term, in arrays, is what it leaves of each design."""
    many, each = _both(law, accuracy__calibration=calibration.value, **STATED, **sense)
    for one in TERMS:
        for index, at in enumerate(each):
            assert _at_one_amp(one.remaining(many), index) == near(_at_one_amp(one.remaining(at), 0), rel=CLOSE)


def _at_one_amp(sizes: tuple[Any, ...], index: int) -> float:
    return sum(float(np.broadcast_to(size.at(1.0), (2,))[index]) for size in sizes)


@pytest.mark.parametrize("method", METHODS)
@pytest.mark.parametrize("law", OF_LAW)
def test_combined_error_takes_arrays(law: str, method: str) -> None:
    """The combined error of arrays of designs, at a current and at an array of currents, is that of each."""
    many, each = _both(law, accuracy__method=method, accuracy__calibration="zero", **STATED)
    at_one = combined(many).error_a(0.3)
    at_two = combined(many).error_a(np.array([0.1, 1.0]))
    for index, (at, current) in enumerate(zip(each, (0.1, 1.0), strict=True)):
        assert at_one[index] == near(combined(at).error_a(0.3), rel=CLOSE)
        assert at_two[index] == near(combined(at).error_a(current), rel=CLOSE)


@pytest.mark.parametrize("law", OF_LAW)
def test_sum_that_a_zero_removes_takes_arrays(law: str) -> None:
    """A drift that one of two amplifiers states takes the bias current of that one alone out of the budget."""
    many, each = _both(law, accuracy__calibration="zero", **STATED)
    assert np.broadcast_to(zeroed(many).zero_sum_a, (2,)).tolist() == near([at.zero_sum_a for at in each])
