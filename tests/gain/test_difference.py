"""One amplifier with four resistors that subtract the two sense lines."""

from __future__ import annotations

from itertools import product
from math import log10
from random import Random
from typing import TYPE_CHECKING

from tests.builders import near
from tests.gain.stages import COMMON, ON, SWITCHED, between, check_arrays, check_sensitivities, law, stage

if TYPE_CHECKING:
    from selector.gain import Stage

# G = 20 k / 1 k = 20
AT = stage("difference", common=1e3, switched=20e3, bias_a=9e-9, offset_current_a=2e-9)


def test_gain_by_hand() -> None:
    """20 kohm over 1 kohm make 20."""
    assert AT.gain == 20.0


def test_sensitivities_by_hand() -> None:
    """S_1 = -1, S_2 = 1; there are two of each resistor, and no range switch."""
    found = law("difference")
    assert (found.common_sensitivity(AT), found.switched_sensitivity(AT)) == (-1.0, 1.0)
    assert (found.copies, found.switchable) == (2, False)


def _drawn(random: Random) -> Stage:
    return stage("difference", common=between(random, 1e3, 1e6), switched=between(random, 1e3, 1e6))


def test_sensitivities_are_the_derivatives_of_ln_gain() -> None:
    """Every sensitivity is x d ln(R2 / R1) / dx.

    Source: differentiation by sympy; that of a switch is asked of R2 + Ron, with no ohm of it.
    Tolerance: 1e-12, rounding.
    """
    check_sensitivities("difference", (SWITCHED + ON) / COMMON, _drawn, {})


def test_offset_current_flows_through_the_input_resistor() -> None:
    """2 nA of offset current through 1 kohm are 2 uV; the bias currents meet equal resistances."""
    assert law("difference").bias_v(AT) == near(2e-6)


def test_noise_resistances() -> None:
    """Two of R1 + R2 / G^2: 2 * (1000 + 50) = 2100 ohm; two currents through R1: 1414.2 ohm."""
    assert law("difference").noise_ohm(AT) == near(2100.0)
    assert law("difference").current_noise_ohm(AT) == near(1414.2135623730951)


def test_noise_gain_is_one_more() -> None:
    """The amplifier's own input errors come out 21 times, at a gain of 20."""
    assert law("difference").noise_gain(20.0) == 21.0
    assert law("difference").by_feedback


def test_amplifier_sees_a_divided_common_mode() -> None:
    """Of 12 V on the sense lines and a zero of 2.4 V the inputs see (20 * 12 + 2.4) / 21 = 11.5428571 V."""
    assert law("difference").common_mode_v(20.0, 12.0, 2.4) == near(242.4 / 21.0)


def test_network_loads_shunt_output_and_bus() -> None:
    """Past the shunt: 1 / 21 kohm at the low side, 1 / 1 kohm at the high side; 1 / 21 kohm on output and bus."""
    found = law("difference")
    assert found.shunt_load_siemens(AT, high_side=False) == near(1.0 / 21e3)
    assert found.shunt_load_siemens(AT, high_side=True) == near(1e-3)
    assert found.load_siemens(AT) == near(1.0 / 21e3)
    assert found.bus_siemens(AT) == near(1.0 / 21e3)
    assert (found.output_ohm(AT), found.leakage_v(AT, 1e-9)) == (0.0, 0.0)


def test_common_mode_rejection_of_four_one_per_cent_resistors() -> None:
    """At a gain of 100 four resistors of 1 % reject the common mode by 68.05 dB at worst, (1 + G) / (4 t).

    Source: derivation, two ratios that are each off by 2 t.
    Tolerance: 1e-4, the digits stated.
    """
    factor = law("difference").mismatch_factor(100.0)
    assert -20.0 * log10(factor * (0.01 + 0.01)) == near(68.05, rel=1e-4)


def _common_mode_share(gain: float, minus: float, feedback: float, plus: float, ground: float) -> float:
    """Return how much of a common mode reads as input, by nodal analysis; the four are factors on the resistors."""
    seen = gain * ground / (plus + gain * ground)
    return abs(seen - (1.0 - seen) * gain * feedback / minus) / gain


def test_mismatch_factor_is_that_of_the_circuit() -> None:
    """The factor times twice the tolerance is what the worst of all 16 corners of four resistors lets through.

    Source: nodal analysis of the circuit.
    Tolerance: 1e-3, beyond the linear term at 100 ppm.
    """
    ends = (1.0 - 1e-4, 1.0 + 1e-4)
    worst = max(_common_mode_share(100.0, *corner) for corner in product(ends, repeat=4))
    assert law("difference").mismatch_factor(100.0) * 2e-4 == near(worst, rel=1e-3)


def test_floats_and_arrays_alike() -> None:
    """Arrays of shunts give what each element gives by itself."""
    check_arrays("difference", AT)
