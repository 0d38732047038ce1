"""A gain set by two resistors around a non-inverting stage."""

from __future__ import annotations

from random import Random
from typing import TYPE_CHECKING

from tests.builders import near
from tests.gain.stages import COMMON, ON, SWITCHED, between, check_arrays, check_sensitivities, law, stage

if TYPE_CHECKING:
    from selector.gain import Stage

# G = 1 + 99 k / (990 + 10) = 100; Rf || (Rg + Ron) = 99 k * 1 k / 100 k = 990 ohm
AT = stage("non-inverting", common=99e3, switched=990.0, on=10.0, bias_a=2e-9)
PARALLEL_OHM = 990.0


def test_gain_by_hand() -> None:
    """99 kohm over 990 ohm and a switch of 10 ohm make 1 + 99 = 100."""
    assert AT.gain == 100.0


def test_sensitivities_by_hand() -> None:
    """At a gain of 100: S_f = 0.99, S_g = -0.99 * 990 / 1000 = -0.9801, and 0.99 / 1000 per ohm of the switch."""
    found = law("non-inverting")
    assert found.common_sensitivity(AT) == near(0.99)
    assert found.switched_sensitivity(AT) == near(-0.9801)
    assert found.on_sensitivity_per_ohm(AT) == near(9.9e-4)


def _drawn(random: Random) -> Stage:
    branch, gain = between(random, 100.0, 1e5), between(random, 1.2, 1e3)
    on = random.choice((0.0, between(random, 0.1, 50.0)))
    return stage("non-inverting", common=(gain - 1.0) * branch, switched=branch, on=on)


def test_sensitivities_are_the_derivatives_of_ln_gain() -> None:
    """Every sensitivity is x d ln(1 + Rf / (Rg + Ron)) / dx.

    Source: differentiation by sympy.
    Tolerance: 1e-12, rounding of a gain down to 1.2.
    """
    check_sensitivities("non-inverting", 1 + COMMON / (SWITCHED + ON), _drawn, {})


def test_bias_flows_through_network_and_shunt() -> None:
    """2 nA through 990 ohm (Rf beside Rg and switch) and 2 nA through 0.1 ohm: 1.9802 uV."""
    assert law("non-inverting").bias_v(AT) == near(2e-9 * (PARALLEL_OHM + 0.1))
    assert law("non-inverting").bias_v(AT) == near(1.9802e-6)


def test_leakage_comes_through_the_feedback_resistor() -> None:
    """1 nA through 99 kohm are 99 uV at the output, 0.99 uV at the input."""
    assert law("non-inverting").leakage_v(AT, 1e-9) == near(9.9e-7)


def test_noise_resistances() -> None:
    """Thermal and current noise both have Rf beside Rg and switch: 990 ohm."""
    assert law("non-inverting").noise_ohm(AT) == near(PARALLEL_OHM)
    assert law("non-inverting").current_noise_ohm(AT) == near(PARALLEL_OHM)


def test_output_drives_the_whole_network() -> None:
    """The output drives 99 k + 990 + 10 ohm = 100 kohm, 10 uS, and stands behind no resistance."""
    assert law("non-inverting").load_siemens(AT) == near(1e-5)
    assert law("non-inverting").output_ohm(AT) == 0.0


def test_stage_reads_its_own_ground_by_feedback() -> None:
    """The noise gain is the gain; the stage reads against its own ground; the loop gain limits it."""
    found = law("non-inverting")
    assert found.noise_gain(100.0) == 100.0
    assert (found.reads_own_ground, found.by_feedback, found.switchable, found.copies) == (True, True, True, 1)
    assert (found.least_common_ohm, found.least_switched_ohm, found.most_ohm) == (1e3, 100.0, 1e6)


def test_floats_and_arrays_alike() -> None:
    """Arrays of shunts and switches give what each element gives by itself."""
    check_arrays("non-inverting", AT)
