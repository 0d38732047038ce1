"""What the converter's pin takes against circuits.

The circuits are the named designs of benches.py, run in the simulator; their figures stand in
tests/reference/circuit.csv.
"""

from __future__ import annotations

import pytest

from tests.circuit.compare import apart, names


@pytest.mark.parametrize("name", names("converter_current_a"))
def test_the_pins_current_falls_over_filter_and_output_resistance(name: str) -> None:
    """The pin's input current moves the reading by the stated current.

    Source: circuit.csv, quantity converter_current_a: a circuit of ideal elements in ngspice.
    Tolerance: 1e-7; what double precision leaves.
    """
    assert apart("converter_current_a", name) <= 1.0


@pytest.mark.parametrize("name", names("converter_loading_a"))
def test_the_pins_resistance_divides_the_output(name: str) -> None:
    """The pin's input resistance takes the stated current off the reading, the output at no current included.

    Source: circuit.csv, quantity converter_loading_a: a circuit of ideal elements in ngspice.
    Tolerance: 1e-7; what double precision leaves.
    """
    assert apart("converter_loading_a", name) <= 1.0
