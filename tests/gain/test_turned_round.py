"""The resistor that gives a gain: a law turned round."""

from __future__ import annotations

from random import Random

import numpy as np
import pytest

from selector.gain import LAWS, LawFigures
from tests.builders import near
from tests.gain.stages import between, law

SET = tuple(name for name, one in LAWS.items() if one.switched_name is not None)
FIGURES = LawFigures(gain_base=1.0, gain_resistance_ohm=49.4e3, gain_factor=2.0, transconductance_s=2e-3)
POINTS = 200
CLOSE = 1e-12  # a gain down to 1.01 less 1 loses two digits of sixteen


def _drawn(random: Random) -> tuple[float, float, float]:
    """Return a common and a switched resistor and a switch, which amplify by 1.01 and more."""
    switched = between(random, 100.0, 1e6)
    return switched * between(random, 0.01, 1e3), switched, random.choice((0.0, between(random, 0.1, 100.0)))


@pytest.mark.parametrize("name", SET)
def test_resistor_of_a_gain_is_the_one_that_gave_it(name: str) -> None:
    """Each law finds the switched resistor again from its gain, one by one and side by side.

    Source: the inverse of the law's own formula.
    Tolerance: 1e-12, rounding of a gain down to 1.01.
    """
    random = Random(name)
    rows = [_drawn(random) for _ in range(POINTS)]
    for common, switched, on in rows:
        gain = law(name).gain(FIGURES, common, switched, on)
        assert law(name).switched_ohm(FIGURES, gain, common, on) == near(switched, rel=CLOSE)
    commons, every, ons = np.array(rows).T
    gains = law(name).gain(FIGURES, commons, every, ons)
    np.testing.assert_allclose(law(name).switched_ohm(FIGURES, gains, commons, ons), every, rtol=CLOSE)


@pytest.mark.parametrize("name", SET)
def test_gain_runs_one_way_with_the_resistor(name: str) -> None:
    """Along rising resistors a law's gain only rises or only falls, so that gains in order are resistors in order."""
    ohms = np.geomspace(100.0, 1e6, POINTS)
    steps = np.diff(np.asarray(law(name).gain(FIGURES, 1e4, ohms, 5.0)))
    assert (steps > 0.0).all() or (steps < 0.0).all()


def test_laws_by_hand() -> None:
    """What makes 20: 19 k over 1 k less a switch of 10 ohm, and so on, worked by hand from each formula."""
    assert law("non-inverting").switched_ohm(FIGURES, 20.0, 19e3, 10.0) == near(990.0)
    assert law("one-resistor").switched_ohm(FIGURES, 20.0, 0.0, 10.0) == near(2590.0)
    assert law("two-resistor").switched_ohm(FIGURES, 20.0, 1e3, 10.0) == near(9990.0)
    assert law("current-output").switched_ohm(FIGURES, 20.0, 0.0, 10.0) == near(9990.0)
    assert law("difference").switched_ohm(FIGURES, 20.0, 1e3, 0.0) == near(2e4)


def test_no_resistor_sets_a_fixed_gain() -> None:
    """A gain that is set inside the amplifier asks for no resistor."""
    assert law("fixed").switched_ohm(FIGURES, 20.0, 1e3, 10.0) == 0.0
    assert np.asarray(law("fixed").switched_ohm(FIGURES, np.array([20.0, 50.0]), 0.0, 0.0)).tolist() == [0.0, 0.0]
