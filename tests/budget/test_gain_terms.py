"""What gain resistors and the range switch do; gain 20 unless a test says else, 25 K, 10 ohm within 2 ohm, 1 nA."""

from __future__ import annotations

import pytest

from selector.candidate import Design
from tests.budget.sized import CLOSE, check
from tests.builders import OHMS_OF_LAW, design, near, operating, resistor, sizes, switched

# Law, abs(S) of common and switched resistor without a switch.
SENSITIVITIES = [
    ("fixed", 0.0, 0.0),
    ("non-inverting", 0.95, 0.95),
    ("one-resistor", 0.0, 0.95),
    ("two-resistor", 1.0, 1.0),
    ("current-output", 0.0, 1.0),
    ("difference", 1.0, 1.0),
]
SPREAD = {"RC": (0.001, 1e-5), "RG": (0.002, 2e-5)}


def _spread(law: str) -> Design:
    """Return the design of a law with 0.1 % and 10 ppm/K on the common, 0.2 % and 20 ppm/K on the switched resistor."""
    common, gain = OHMS_OF_LAW[law]
    return design(
        law,
        common=None if common is None else resistor(common, "RC", tolerance=0.001, tempco=1e-5),
        gain=None if gain is None else (resistor(gain, "RG", tolerance=0.002, tempco=2e-5),),
    )


@pytest.mark.parametrize(("law", "common", "switched_one"), SENSITIVITIES)
def test_gain_resistors(law: str, common: float, switched_one: float) -> None:
    """Each resistor is a cause of its own, S * tolerance: 0.1 % and 0.2 %; a span calibration takes both out."""
    at = operating(_spread(law))
    assert [row[1] for row in sizes("gain resistors", at)] == near([0.001 * common, 0.002 * switched_one], rel=CLOSE)
    check("gain resistors", at, proportional=0.001 * common + 0.002 * switched_one)
    check("gain resistors", operating(_spread(law), accuracy__calibration="zero-and-span"))


@pytest.mark.parametrize(("law", "common", "switched_one"), SENSITIVITIES)
def test_gain_resistors_temperature(law: str, common: float, switched_one: float) -> None:
    """Each resistor is a cause of its own, S * tempco * 25 K: 250 and 500 ppm; it stays."""
    at = operating(_spread(law), accuracy__calibration="zero-and-span")
    each = [row[1] for row in sizes("gain resistors temperature", at)]
    assert each == near([2.5e-4 * common, 5e-4 * switched_one], rel=CLOSE)
    check("gain resistors temperature", at, proportional=2.5e-4 * common + 5e-4 * switched_one)


def test_gain_resistor_beside_its_switch() -> None:
    """9990 ohm in series with 10 ohm set 99.9 % of the gain: 0.2 % counts as 0.1998 %."""
    of = switched("current-output", 19_990.0, 9_990.0)
    rows = tuple(resistor(one.resistance, one.part, tolerance=0.002) for one in of.gain or ())
    at = operating(switched("current-output", gain=rows), 2)
    check("gain resistors", at, proportional=0.001998)


def test_switch_resistance_at_the_output() -> None:
    """2 ohm on 10 kohm are 200 ppm; with 20 kohm in the range below 100 ppm; no calibration takes it out."""
    of = switched("current-output", 19_990.0, 9_990.0)
    check("switch resistance", operating(of, 1), proportional=1e-4)
    check("switch resistance", operating(of, 2, accuracy__calibration="zero-and-span"), proportional=2e-4)


def test_switch_resistance_in_a_feedback_network() -> None:
    """2 ohm on 1 kohm that sets 0.95 of the gain: 0.19 %."""
    check("switch resistance", operating(switched("non-inverting", 490.0, 990.0), 2), proportional=1.9e-3)


def test_switch_leakage() -> None:
    """One open channel leaks 1 nA into 10 kohm: 10 uV at the output, 5 uA over 2 ohm; two leak twice; it stays."""
    check("switch leakage", operating(switched("current-output", 19_990.0, 9_990.0), 2), constant=5e-6)
    three = switched("current-output", 39_990.0, 19_990.0, 9_990.0)
    check("switch leakage", operating(three, 3, accuracy__calibration="zero-and-span"), constant=1e-5)


def test_switch_leakage_of_input_laws() -> None:
    """1 nA into 19 kohm, of a feedback or of an inner resistor, are 19 uV at the output, 9.5 uA over 2 ohm."""
    check("switch leakage", operating(switched("non-inverting", 490.0, 990.0), 2), constant=9.5e-6)
    check("switch leakage", operating(switched("one-resistor", 490.0, 990.0), 2), constant=9.5e-6)


def test_one_range_has_no_switch() -> None:
    """With one range there is neither a switch's resistance nor its leakage."""
    for law, _, _ in SENSITIVITIES:
        check("switch resistance", operating(design(law)))
        check("switch leakage", operating(design(law)))
