"""A gain set inside the amplifier."""

from __future__ import annotations

from tests.builders import near
from tests.gain.stages import check_arrays, law, stage

AT = stage("fixed", fixed_gain=20.0, bias_a=3e-9)


def test_gain_is_the_stated_one() -> None:
    """An amplifier that states a gain of 20 has it, whatever stands around it."""
    assert AT.gain == 20.0
    assert stage("fixed", fixed_gain=20.0, common=1e3, switched=1e4, on=5.0).gain == 20.0


def test_nothing_sets_the_gain() -> None:
    """No resistor and no switch moves ln G."""
    found = law("fixed")
    assert (found.common_sensitivity(AT), found.switched_sensitivity(AT), found.on_sensitivity_per_ohm(AT)) == (0, 0, 0)
    assert (found.common_name, found.switched_name, found.switchable) == (None, None, False)


def test_bias_flows_through_the_shunt_alone() -> None:
    """3 nA in 0.1 ohm are 0.3 nV."""
    assert law("fixed").bias_v(AT) == near(3e-10)


def test_network_adds_no_noise() -> None:
    """No resistor adds thermal noise; the current noise flows through the shunt of 0.1 ohm."""
    assert law("fixed").noise_ohm(AT) == 0.0
    assert law("fixed").current_noise_ohm(AT) == 0.1


def test_nothing_leaks_loads_or_draws() -> None:
    """No channel leaks, the output drives no network and stands behind no resistance, the shunt is not loaded."""
    found = law("fixed")
    assert found.leakage_v(AT, 1e-9) == 0.0
    assert (found.output_ohm(AT), found.load_siemens(AT), found.bus_siemens(AT)) == (0.0, 0.0, 0.0)
    assert found.shunt_load_siemens(AT, high_side=True) == 0.0
    assert found.mismatch_factor(AT.gain) == 0.0


def test_amplifier_sees_input_and_bus_as_they_are() -> None:
    """The noise gain is the gain of 20, and of 12 V on the sense lines the inputs see 12 V."""
    assert law("fixed").noise_gain(20.0) == 20.0
    assert law("fixed").common_mode_v(20.0, 12.0, 2.5) == 12.0
    assert not law("fixed").by_feedback


def test_floats_and_arrays_alike() -> None:
    """Arrays of shunts and switches give what each element gives by itself."""
    check_arrays("fixed", AT)
