"""A gain set by one resistor between two pins of an instrumentation amplifier."""

from __future__ import annotations

from random import Random
from typing import TYPE_CHECKING

import sympy

from tests.builders import near
from tests.gain.stages import ON, SWITCHED, between, check_arrays, check_sensitivities, law, stage

if TYPE_CHECKING:
    from selector.gain import Stage

# G = 5 + 45 k / (990 + 10) = 50; share set by the resistor 1 - 5 / 50 = 0.9
AT = stage("one-resistor", switched=990.0, on=10.0, gain_base=5.0, gain_resistance_ohm=45e3, bias_a=2e-9)


def test_gain_by_hand() -> None:
    """A base of 5 and 45 kohm over 1 kohm make 50; without a base stated it counts as 1."""
    assert AT.gain == 50.0
    assert stage("one-resistor", switched=990.0, on=10.0, gain_resistance_ohm=45e3).gain == 46.0


def test_sensitivities_by_hand() -> None:
    """Of the gain of 50 the resistor sets 0.9: S_g = -0.9 * 990 / 1000, and 0.9 / 1000 per ohm of the switch."""
    found = law("one-resistor")
    assert found.common_sensitivity(AT) == 0.0
    assert found.switched_sensitivity(AT) == near(-0.891)
    assert found.on_sensitivity_per_ohm(AT) == near(9e-4)


def _drawn(random: Random) -> Stage:
    base, branch = random.choice((1.0, 5.0)), between(random, 100.0, 1e5)
    on = random.choice((0.0, between(random, 0.1, 50.0)))
    ohm = between(random, 0.5, 500.0) * base * branch
    return stage("one-resistor", switched=branch, on=on, gain_base=base, gain_resistance_ohm=ohm)


def test_sensitivities_are_the_derivatives_of_ln_gain() -> None:
    """The sensitivity is Rg d ln(base + R / (Rg + Ron)) / dRg.

    Source: differentiation by sympy.
    Tolerance: 1e-12, rounding of a gain down to 1.5 times its base.
    """
    base, ohm = sympy.symbols("base ohm", positive=True)
    figures = {"base": "gain_base", "ohm": "gain_resistance_ohm"}
    check_sensitivities("one-resistor", base + ohm / (SWITCHED + ON), _drawn, figures)


def test_bias_flows_through_the_shunt_alone() -> None:
    """2 nA in 0.1 ohm are 0.2 nV."""
    assert law("one-resistor").bias_v(AT) == near(2e-10)


def test_leakage_of_both_ends_sees_the_gain_resistance() -> None:
    """1 nA through 45 kohm are 45 uV at the output, 0.9 uV at the input."""
    assert law("one-resistor").leakage_v(AT, 1e-9) == near(9e-7)


def test_noise_resistances() -> None:
    """1 kohm counts with the square of the share it sets, 0.81: 810 ohm; the current noise sees the shunt."""
    assert law("one-resistor").noise_ohm(AT) == near(810.0)
    assert law("one-resistor").current_noise_ohm(AT) == 0.1


def test_switch_stands_on_the_inputs() -> None:
    """The range switch stands at the common mode of the inputs; the output drives no network."""
    found = law("one-resistor")
    assert (found.switch_on_inputs, found.switchable, found.by_feedback) == (True, True, False)
    assert (found.load_siemens(AT), found.output_ohm(AT)) == (0.0, 0.0)
    assert (found.least_switched_ohm, found.most_ohm) == (100.0, 1e6)


def test_floats_and_arrays_alike() -> None:
    """Arrays of shunts and switches give what each element gives by itself."""
    check_arrays("one-resistor", AT)
