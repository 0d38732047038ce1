"""The difference amplifier's network against circuits.

The circuits are the named designs of benches.py, run in the simulator; their figures stand in
tests/reference/circuit.csv.
"""

from __future__ import annotations

import pytest

from tests.circuit.compare import apart, names


@pytest.mark.parametrize("name", names("network_mismatch_a"))
def test_unequal_resistors_turn_common_mode_into_input(name: str) -> None:
    """Four resistors at the worst ends of their tolerance read the common mode as the stated current.

    Source: circuit.csv, quantity network_mismatch_a: a circuit of ideal elements in ngspice.
    Tolerance: 1e-4; the formula is the first power of tolerances of 1e-5.
    """
    assert apart("network_mismatch_a", name) <= 1.0


@pytest.mark.parametrize("name", names("network_change_a"))
def test_bus_and_temperature_move_what_unequal_resistors_read(name: str) -> None:
    """A bus at its end and resistors that drifted change the reading by the stated current.

    Source: circuit.csv, quantity network_change_a: a circuit of ideal elements in ngspice.
    Tolerance: 1e-4; as for unequal resistors.
    """
    assert apart("network_change_a", name) <= 1.0


@pytest.mark.parametrize("name", names("network_loading_frac"))
def test_the_network_takes_the_stated_share_past_the_shunt(name: str) -> None:
    """The network takes Rs/(R1+R2) of the current at the low side and Rs/R1 at the high side.

    Source: circuit.csv, quantity network_loading_frac: a circuit of ideal elements in ngspice.
    Tolerance: 1e-5; the formula is the first power of Rs/R1, 5e-6.
    """
    assert apart("network_loading_frac", name) <= 1.0


@pytest.mark.parametrize("name", names("network_current_a"))
def test_the_network_draws_the_stated_current_through_the_shunt(name: str) -> None:
    """With no load the network draws the stated current through the shunt.

    Source: circuit.csv, quantity network_current_a: a circuit of ideal elements in ngspice.
    Tolerance: 1e-5; as for the share.
    """
    assert apart("network_current_a", name) <= 1.0


@pytest.mark.parametrize("name", names("amplifier_input_v"))
def test_the_amplifier_sees_the_divided_bus(name: str) -> None:
    """The amplifier's own input stands at (G V + Vz)/(1 + G).

    Source: circuit.csv, quantity amplifier_input_v: a circuit of ideal elements in ngspice.
    Tolerance: 1e-9; what double precision leaves.
    """
    assert apart("amplifier_input_v", name) <= 1.0
