"""Noise of the networks against circuits.

The circuits are the named designs of benches.py, run in the simulator; their figures stand in
tests/reference/circuit.csv.
"""

from __future__ import annotations

import pytest

from tests.circuit.compare import apart, names


@pytest.mark.parametrize("name", names("thermal_noise_v_per_rthz"))
def test_the_simulator_makes_the_thermal_noise_of_a_kilohm(name: str) -> None:
    """1 kohm at 60 degC makes sqrt(4 k T R), so the decks' temperature is the one stated.

    Source: circuit.csv, quantity thermal_noise_v_per_rthz: a circuit of ideal elements in ngspice.
    Tolerance: 1e-6; the simulator's k is that of CODATA 2014, 3.5e-7 below the exact one.
    """
    assert apart("thermal_noise_v_per_rthz", name) <= 1.0


@pytest.mark.parametrize("name", names("noise_ohm"))
def test_the_network_makes_the_stated_thermal_noise(name: str) -> None:
    """The gain resistors together make the noise of Rn at the input.

    Source: circuit.csv, quantity noise_ohm: a circuit of ideal elements in ngspice.
    Tolerance: 1e-5; the difference amplifier's circuit has the shunt in, 5e-6 of R1, and its formula has not.
    """
    assert apart("noise_ohm", name) <= 1.0


@pytest.mark.parametrize("name", names("current_noise_ohm"))
def test_current_noise_passes_the_stated_resistance(name: str) -> None:
    """The current noise of both inputs is worth in Ri at the input.

    Source: circuit.csv, quantity current_noise_ohm: a circuit of ideal elements in ngspice.
    Tolerance: 1e-5; as for the thermal noise; the shunts are small, since Ri leaves the second input's share out.
    """
    assert apart("current_noise_ohm", name) <= 1.0


@pytest.mark.parametrize("name", names("noise_v"))
def test_the_whole_output_noise_is_that_of_the_budget(name: str) -> None:
    """Amplifier, network and shunt behind both poles, from 1 mHz to 100 MHz, make the budget's noise.

    Source: circuit.csv, quantity noise_v: a circuit of ideal elements in ngspice.
    Tolerance: 1e-3; two hundred points a decade and an upper end; an amplifier pole after all sources or far away.
    """
    assert apart("noise_v", name) <= 1.0
