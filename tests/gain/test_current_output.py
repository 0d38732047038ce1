"""A gain set by the load resistor of a part that puts out a current."""

from __future__ import annotations

from dataclasses import replace
from random import Random
from typing import TYPE_CHECKING

import sympy

from tests.builders import near
from tests.gain.stages import ON, SWITCHED, between, check_arrays, check_sensitivities, law, stage

if TYPE_CHECKING:
    from selector.gain import Stage

# G = 2 mS * (9990 + 10) = 20
AT = stage("current-output", switched=9990.0, on=10.0, transconductance_s=2e-3, bias_a=2e-9)


def test_gain_by_hand() -> None:
    """2 mS into 10 kohm, switch included, make 20."""
    assert AT.gain == 20.0


def test_sensitivities_by_hand() -> None:
    """S_L = 9990 / 10 000, and 1 / 10 000 per ohm of the switch; there is no common resistor."""
    found = law("current-output")
    assert found.common_sensitivity(AT) == 0.0
    assert found.switched_sensitivity(AT) == near(0.999)
    assert found.on_sensitivity_per_ohm(AT) == near(1e-4)


def _drawn(random: Random) -> Stage:
    on = random.choice((0.0, between(random, 0.1, 50.0)))
    branch = between(random, 1e3, 1e6)
    return stage("current-output", switched=branch, on=on, transconductance_s=between(random, 1e-5, 1e-2))


def test_sensitivities_are_the_derivatives_of_ln_gain() -> None:
    """The sensitivity is RL d ln(gm (RL + Ron)) / dRL.

    Source: differentiation by sympy.
    Tolerance: 1e-12, rounding.
    """
    siemens = sympy.Symbol("siemens", positive=True)
    check_sensitivities("current-output", siemens * (SWITCHED + ON), _drawn, {"siemens": "transconductance_s"})


def test_bias_flows_through_the_shunt_alone() -> None:
    """2 nA in 0.1 ohm are 0.2 nV."""
    assert law("current-output").bias_v(AT) == near(2e-10)


def test_leakage_flows_through_the_load_resistor() -> None:
    """1 nA through 10 kohm are 10 uV at the output, 0.5 uV at the input."""
    assert law("current-output").leakage_v(AT, 1e-9) == near(5e-7)


def test_noise_resistances() -> None:
    """The load resistor counts over the square of the gain: 10 000 / 400 = 25 ohm; the current noise sees the shunt."""
    assert law("current-output").noise_ohm(AT) == near(25.0)
    assert law("current-output").current_noise_ohm(AT) == 0.1


def test_filter_sees_the_load_resistor_unless_buffered() -> None:
    """The filter stands behind RL and the switch, 10 kohm; behind a buffer it sees nothing of them."""
    found = law("current-output")
    assert found.output_ohm(AT) == 1e4
    assert found.output_ohm(replace(AT, figures=replace(AT.figures, buffered=1.0))) == 0.0


def test_output_drives_the_load_resistor() -> None:
    """The output drives 10 kohm, 100 uS."""
    assert law("current-output").load_siemens(AT) == near(1e-4)
    assert (law("current-output").least_switched_ohm, law("current-output").most_ohm) == (1e3, 1e6)


def test_floats_and_arrays_alike() -> None:
    """Arrays of shunts and switches give what each element gives by itself."""
    check_arrays("current-output", AT)
