"""What the four resistors of a difference amplifier do beside setting the gain.

1 kohm of 0.1 % and 10 ppm/K, 20 kohm of 0.2 % and 20 ppm/K, a gain of 20, Rs 0.1 ohm, 25 K. So m = 2 * 0.003 / 21 and
m_T = 2 * 30 ppm/K * 25 K / 21 = 0.0015 / 21.
"""

from __future__ import annotations

import pytest

from tests.budget.sized import check
from tests.builders import HIGH_SIDE, design, operating, resistor

OF = design(
    "difference",
    common=resistor(1e3, "RC", tolerance=0.001, tempco=1e-5),
    gain=(resistor(2e4, "RG", tolerance=0.002, tempco=2e-5),),
)
VZ = {"output__zero": 2.4, "output__zero_tolerance": 0.0, "output__zero_drift": 0.0}
NETWORK = ("network loading", "network current", "network mismatch", "network change")


def test_network_loading() -> None:
    """Past 0.1 ohm: 0.1 / 21 k of the current at the low side, 0.1 / 1 k at the high side; span takes it out."""
    check("network loading", operating(OF), proportional=0.1 / 21e3)
    check("network loading", operating(OF, **HIGH_SIDE), proportional=1e-4)
    check("network loading", operating(OF, accuracy__calibration="zero", **HIGH_SIDE), proportional=1e-4)
    check("network loading", operating(OF, accuracy__calibration="zero-and-span", **HIGH_SIDE))


def test_network_current() -> None:
    """12 V over 21 kohm flow through the shunt at the high side, 571.4 uA; none at the low side; zero takes it out."""
    check("network current", operating(OF, **HIGH_SIDE), constant=12.0 / 21e3)
    check("network current", operating(OF))
    check("network current", operating(OF, accuracy__calibration="zero", **HIGH_SIDE))


def test_network_current_against_a_zero() -> None:
    """The branch ends at the zero: 9.6 V over 21 kohm at the high side, 2.4 V at the low side.

    Source: Kirchhoff's laws; the branch at the load's end of the shunt lies between sense line and zero.
    Tolerance: 1e-12, rounding.
    """
    check("network current", operating(OF, **HIGH_SIDE, **VZ), constant=9.6 / 21e3)
    check("network current", operating(OF, **VZ), constant=2.4 / 21e3)


def test_network_mismatch() -> None:
    """12 V * 0.006 / 21 over 0.1 ohm are 34.286 mA; against a zero of 2.4 V 27.429 mA; zero takes it out."""
    check("network mismatch", operating(OF, **HIGH_SIDE), constant=0.072 / 2.1)
    check("network mismatch", operating(OF, **HIGH_SIDE, **VZ), constant=0.0576 / 2.1)
    check("network mismatch", operating(OF, accuracy__calibration="zero", **HIGH_SIDE))


def test_network_mismatch_at_the_low_side() -> None:
    """The lines stand at 0 V: nothing, but a zero of 2.4 V counts like a common mode, 6.857 mA."""
    check("network mismatch", operating(OF))
    check("network mismatch", operating(OF, **VZ), constant=0.0144 / 2.1)


def test_network_change() -> None:
    """12 V m_T + 2 V (m + m_T) = (0.018 + 0.015) / 21 V on 0.1 ohm, and 2 V / 21 kohm: 15.8095 mA; it stays."""
    wanted = 0.033 / 2.1 + 2.0 / 21e3
    check("network change", operating(OF, **HIGH_SIDE), constant=wanted)
    check("network change", operating(OF, accuracy__calibration="zero-and-span", **HIGH_SIDE), constant=wanted)


def test_network_change_against_a_zero() -> None:
    """A zero of 2.4 V leaves 9.6 V m_T of the common mode: (0.0144 + 0.015) / 2.1 A and 2 V / 21 kohm."""
    check("network change", operating(OF, **HIGH_SIDE, **VZ), constant=0.0294 / 2.1 + 2.0 / 21e3)


def test_network_change_at_the_low_side() -> None:
    """No bus moves: 2.4 V m_T over 0.1 ohm, 0.0036 / 2.1 A, where a zero is stated, else nothing."""
    check("network change", operating(OF))
    check("network change", operating(OF, **VZ), constant=0.0036 / 2.1)


@pytest.mark.parametrize("name", NETWORK)
@pytest.mark.parametrize("law", ["fixed", "one-resistor", "two-resistor", "current-output"])
def test_no_other_law_has_a_network_between_the_lines(name: str, law: str) -> None:
    """A law whose inputs draw no current through resistors has none of these terms."""
    check(name, operating(design(law), **HIGH_SIDE))
