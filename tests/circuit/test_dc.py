"""Gain, sensitivities and dc errors of the six gain laws against circuits.

The circuits are the named designs of benches.py, run in the simulator; their figures stand in
tests/reference/circuit.csv.
"""

from __future__ import annotations

import pytest

from tests.circuit.compare import apart, names


@pytest.mark.parametrize("name", names("gain"))
def test_the_gain_is_that_of_the_network(name: str) -> None:
    """Output over input of each law's network is the nominal gain, the closed switch in it.

    Source: circuit.csv, quantity gain: a circuit of ideal elements in ngspice.
    Tolerance: 1e-9; ideal amplifiers, and what double precision leaves of a common mode of 12 V.
    """
    assert apart("gain", name) <= 1.0


@pytest.mark.parametrize("name", names("common_sensitivity"))
def test_a_step_of_the_common_resistor_moves_the_gain(name: str) -> None:
    """One millionth more and less of Rf or R1 moves the gain by the stated sensitivity.

    Source: circuit.csv, quantity common_sensitivity: a circuit of ideal elements in ngspice.
    Tolerance: 1e-7; thirteen digits of a change of two millionths.
    """
    assert apart("common_sensitivity", name) <= 1.0


@pytest.mark.parametrize("name", names("switched_sensitivity"))
def test_a_step_of_the_switched_resistor_moves_the_gain(name: str) -> None:
    """One millionth more and less of the range's resistor moves the gain by the stated sensitivity.

    Source: circuit.csv, quantity switched_sensitivity: a circuit of ideal elements in ngspice.
    Tolerance: 1e-7; thirteen digits of a change of two millionths.
    """
    assert apart("switched_sensitivity", name) <= 1.0


@pytest.mark.parametrize("name", names("on_sensitivity_per_ohm"))
def test_a_step_of_the_closed_switch_moves_the_gain(name: str) -> None:
    """One millionth more and less of the closed switch moves the gain by the stated sensitivity per ohm.

    Source: circuit.csv, quantity on_sensitivity_per_ohm: a circuit of ideal elements in ngspice.
    Tolerance: 1e-5; the switch is a small part of its branch, so that few digits of the change are left.
    """
    assert apart("on_sensitivity_per_ohm", name) <= 1.0


@pytest.mark.parametrize("name", names("bias_v"))
def test_bias_currents_make_the_stated_input_voltage(name: str) -> None:
    """Each bias current alone, summed whatever its sign, is worth the law's Vb at the input.

    Source: circuit.csv, quantity bias_v: a circuit of ideal elements in ngspice.
    Tolerance: 1e-5; the difference amplifier's circuit has the shunt in, 5e-6 of R1, and its formula has not.
    """
    assert apart("bias_v", name) <= 1.0


@pytest.mark.parametrize("name", names("leakage_v"))
def test_open_channels_leak_the_stated_input_voltage(name: str) -> None:
    """The leakage of all open channels is worth the law's Vl at the input.

    Source: circuit.csv, quantity leakage_v: a circuit of ideal elements in ngspice.
    Tolerance: 1e-7; thirteen digits of a small output.
    """
    assert apart("leakage_v", name) <= 1.0


@pytest.mark.parametrize("name", names("noise_gain_over_gain"))
def test_an_offset_comes_to_the_output_by_the_noise_gain(name: str) -> None:
    """A voltage in series with the amplifier's own input is worth kappa times itself at the shunt.

    Source: circuit.csv, quantity noise_gain_over_gain: a circuit of ideal elements in ngspice.
    Tolerance: 1e-5; as for the bias currents.
    """
    assert apart("noise_gain_over_gain", name) <= 1.0


@pytest.mark.parametrize("name", names("loop_gain_frac"))
def test_a_finite_open_loop_gain_takes_the_stated_share(name: str) -> None:
    """An open-loop gain of 110 dB takes 1/(1 + A0/NG) of the gain.

    Source: circuit.csv, quantity loop_gain_frac: a circuit of ideal elements in ngspice.
    Tolerance: 1e-5; as for the bias currents, at the high side.
    """
    assert apart("loop_gain_frac", name) <= 1.0


@pytest.mark.parametrize("name", names("network_a"))
def test_the_output_drives_the_stated_current(name: str) -> None:
    """The amplifier's output drives the stated current into the gain network at the largest current.

    Source: circuit.csv, quantity network_a: a circuit of ideal elements in ngspice.
    Tolerance: 1e-5; as for the bias currents.
    """
    assert apart("network_a", name) <= 1.0
