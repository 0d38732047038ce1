"""Corner and settling of the chain against circuits.

The circuits are the named designs of benches.py, run in the simulator; their figures stand in
tests/reference/circuit.csv.
"""

from __future__ import annotations

import pytest

from tests.circuit.compare import apart, names


@pytest.mark.parametrize("name", names("corner_hz"))
def test_the_corner_is_that_of_both_poles(name: str) -> None:
    """At the filter's slowest parts the output is 3 dB down at the stated frequency, R_out and noise gain in it.

    Source: circuit.csv, quantity corner_hz: a circuit of ideal elements in ngspice.
    Tolerance: 1e-3; four hundred points a decade, interpolated.
    """
    assert apart("corner_hz", name) <= 1.0


@pytest.mark.parametrize("name", names("settling_s"))
def test_a_step_settles_about_when_stated(name: str) -> None:
    """Half a count is left of a full step at the stated time, for 8 to 16 bits.

    Source: circuit.csv, quantity settling_s: a circuit of ideal elements in ngspice.
    Tolerance: -1.5 ... +15 % to the digits stated: the root of the squares is no exact time for two poles.
    """
    assert apart("settling_s", name) <= 1.0
