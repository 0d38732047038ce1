"""A gain set by the ratio of a load resistor to an input resistor, times a factor of the part."""

from __future__ import annotations

from dataclasses import replace
from random import Random
from typing import TYPE_CHECKING

import pytest
import sympy

from tests.builders import near
from tests.gain.stages import COMMON, ON, SWITCHED, between, check_arrays, check_sensitivities, law, stage

if TYPE_CHECKING:
    from selector.gain import Stage

# G = 2 * (49 990 + 10) / 1 k = 100
AT = stage("two-resistor", common=1e3, switched=49_990.0, on=10.0, gain_factor=2.0, bias_a=2e-9, output_bias_a=5e-9)


def test_gain_by_hand() -> None:
    """Twice 50 kohm, switch included, over 1 kohm make 100."""
    assert AT.gain == 100.0


@pytest.mark.parametrize(("switched_ohm", "gain"), [(10e6, 400.0), (490e3, 19.6)])
def test_gain_of_twice_the_ratio_to_fifty_kilohm(switched_ohm: float, gain: float) -> None:
    """With G = 2 R2 / R1 and R1 = 50 kohm, 10 Mohm gives 400 and 490 kohm gives 19.6.

    Source: common practice, no source.
    Tolerance: 1e-14, one rounding.
    """
    at = stage("two-resistor", common=50e3, switched=switched_ohm, gain_factor=2.0)
    assert at.gain == near(gain)


def test_a_quarter_of_a_millivolt_at_a_gain_of_400() -> None:
    """250 uV at a gain of 400, from 10 Mohm over 50 kohm, read 0.1 V.

    Source: common practice, no source.
    Tolerance: 1e-14, two roundings.
    """
    at = stage("two-resistor", common=50e3, switched=10e6, gain_factor=2.0)
    assert at.gain * 250e-6 == near(0.1)


def test_sensitivities_by_hand() -> None:
    """S_1 = -1; S_2 = 49 990 / 50 000; 1 / 50 000 per ohm of the switch."""
    found = law("two-resistor")
    assert found.common_sensitivity(AT) == -1.0
    assert found.switched_sensitivity(AT) == near(0.9998)
    assert found.on_sensitivity_per_ohm(AT) == near(2e-5)


def _drawn(random: Random) -> Stage:
    on = random.choice((0.0, between(random, 0.1, 50.0)))
    common, branch = between(random, 1e3, 1e6), between(random, 1e3, 1e6)
    return stage("two-resistor", common=common, switched=branch, on=on, gain_factor=between(random, 0.5, 10.0))


def test_sensitivities_are_the_derivatives_of_ln_gain() -> None:
    """Every sensitivity is x d ln(factor (R2 + Ron) / R1) / dx.

    Source: differentiation by sympy.
    Tolerance: 1e-12, rounding.
    """
    factor = sympy.Symbol("factor", positive=True)
    check_sensitivities("two-resistor", factor * (SWITCHED + ON) / COMMON, _drawn, {"factor": "gain_factor"})


def test_bias_flows_through_shunt_input_and_load_resistor() -> None:
    """2 nA through 1000.1 ohm are 2.0002 uV; 5 nA through 50 kohm are 250 uV, over 100: 2.5 uV; in all 4.5002 uV."""
    assert law("two-resistor").bias_v(AT) == near(4.5002e-6)


def test_leakage_flows_through_the_load_resistor() -> None:
    """1 nA through 50 kohm are 50 uV at the output, 0.5 uV at the input."""
    assert law("two-resistor").leakage_v(AT, 1e-9) == near(5e-7)


def test_noise_resistances() -> None:
    """R1 and R2 over the square of the gain: 1000 + 50 000 / 100^2 = 1005 ohm; the current noise sees R1."""
    assert law("two-resistor").noise_ohm(AT) == near(1005.0)
    assert law("two-resistor").current_noise_ohm(AT) == 1e3


def test_filter_sees_the_load_resistor_unless_buffered() -> None:
    """The filter stands behind R2 and the switch, 50 kohm; behind a buffer it sees nothing of them."""
    found = law("two-resistor")
    assert found.output_ohm(AT) == 50e3
    assert found.output_ohm(replace(AT, figures=replace(AT.figures, buffered=1.0))) == 0.0


def test_output_drives_the_load_resistor() -> None:
    """The output drives 50 kohm, 20 uS; the sense lines are not loaded."""
    assert law("two-resistor").load_siemens(AT) == near(2e-5)
    assert law("two-resistor").shunt_load_siemens(AT, high_side=True) == 0.0
    assert (law("two-resistor").least_switched_ohm, law("two-resistor").most_ohm) == (1e3, 1e6)


def test_floats_and_arrays_alike() -> None:
    """Arrays of shunts and switches give what each element gives by itself."""
    check_arrays("two-resistor", AT)
