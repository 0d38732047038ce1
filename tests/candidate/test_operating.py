"""Output window, ranges and their borders, and what a range makes of its parts."""

from __future__ import annotations

from math import inf, pi

import numpy as np
import pytest

from selector.candidate import Calibration
from selector.candidate.elementwise import chosen, larger, smaller
from tests.builders import (
    ZERO,
    amplifier,
    capacitor,
    chain,
    design,
    near,
    operating,
    resistor,
    switched,
)

TWO_WAY = ZERO | {"current__two_way": True}


@pytest.mark.parametrize(
    ("changes", "fields", "window"),
    [
        ({}, {}, (0.01, 4.0)),  # the converter's 4 V is the top, the amplifier's 10 mV the bottom
        ({"converter__reference": 5.0}, {}, (0.01, 4.4)),  # 4.5 V less a swing of 0.1 V
        ({"converter__reference": 5.0, "output__high": 3.0}, {}, (0.01, 3.0)),
        ({"output__low": 0.05}, {}, (0.05, 4.0)),
        ({"supply__tolerance": 0.0, "converter__reference": 5.0}, {"swing_high": 0.2}, (0.01, 4.8)),
        ({}, {"swing_low": 0.3}, (0.3, 4.0)),
    ],
)
def test_output_window(changes: dict[str, object], fields: dict[str, object], window: tuple[float, float]) -> None:
    """The top is the least of output.high, supply less swing and reference, the bottom the higher of two lows."""
    found = chain(design(amplifier=amplifier(**fields)), **changes).pairing.window
    assert (found.low_v, found.high_v) == near(window)
    assert found.span_v == near(window[1])


def test_span_one_way_reaches_from_the_zero_to_the_top() -> None:
    """A zero of 1 V leaves 3 V of 4 V."""
    assert chain(**ZERO).pairing.window.span_v == near(3.0)


@pytest.mark.parametrize(("zero_v", "span_v"), [(1.0, 0.99), (3.0, 1.0), (2.005, 1.995)])
def test_span_both_ways_is_the_smaller_half(zero_v: float, span_v: float) -> None:
    """Between 0.01 and 4 V a zero of 1 V leaves 0.99 V, one of 3 V 1 V, one in the middle 1.995 V either way."""
    assert chain(**TWO_WAY | {"output__zero": zero_v}).pairing.window.span_v == near(span_v)


def test_borders_of_one_range() -> None:
    """One range goes from I_min to I_max."""
    at = operating()
    assert (at.low_a, at.high_a, at.last) == (0.1, 1.0, True)


# 40, 80 and 20 by 19 990, 39 990 and 9 990 ohm with a switch of 10 ohm; 3.8 V are within headroom.
THREE = switched("current-output", 39_990.0, 19_990.0, 9_990.0)


def test_borders_of_three_ranges() -> None:
    """Ranges end at 3.8 V / (G Rs), the last at I_max, and begin 10 % below the end of the one before."""
    ranges = chain(THREE).ranges
    assert [at.gain for at in ranges] == near([80.0, 40.0, 20.0])
    assert [at.high_a for at in ranges] == near([0.475, 0.95, 1.0])
    assert [at.low_a for at in ranges] == near([0.1, 0.4275, 0.855])
    assert [at.border.below_a for at in ranges] == near([0.1, 0.475, 0.95])
    assert [at.border.below_gain for at in ranges] == [inf, near(80.0), near(40.0)]
    assert [at.last for at in ranges] == [False, False, True]


def test_borders_follow_headroom_and_overlap() -> None:
    """A headroom of 20 % ends the first range at 3.2 V / 8 ohm = 0.4 A; an overlap of 25 % begins the next at 0.3 A."""
    first, second, _ = chain(THREE, limits__headroom=0.2, ranges__overlap=0.25).ranges
    assert (first.high_a, second.low_a) == near((0.4, 0.3))


def test_no_window_leaves_no_ranges() -> None:
    """An amplifier that cannot leave 4 V has no ranges."""
    assert chain(design(amplifier=amplifier(swing_high=4.5))).ranges == ()


def test_filter_at_both_ends_of_its_tolerance() -> None:
    """1 kohm of 1 % and 100 nF of 10 + 5 %: slow at 1010 ohm, 115 nF, noisy at 990 ohm, 85 nF."""
    of = design(filter_resistor=resistor(tolerance=0.01), filter_capacitor=capacitor(tolerance=0.1, temp_change=0.05))
    found = operating(of).filter
    assert found.slow_hz == near(1.0 / (2.0 * pi * 1010.0 * 115e-9))
    assert found.noisy_hz == near(1.0 / (2.0 * pi * 990.0 * 85e-9))
    assert (found.ohm, found.least_ohm) == near((1e3, 990.0))


def test_filter_stands_behind_an_unbuffered_output() -> None:
    """10 kohm of load resistor and 1 kohm of 1 %: the tolerance holds for the filter's resistor alone."""
    found = operating(design("current-output", filter_resistor=resistor(tolerance=0.01))).filter
    assert found.slow_hz == near(1.0 / (2.0 * pi * 11_010.0 * 1e-7))
    assert found.noisy_hz == near(1.0 / (2.0 * pi * 10_990.0 * 1e-7))


def test_range_without_a_filter_is_not_slowed() -> None:
    """Before a filter is chosen its corners are infinite and its resistance 0."""
    found = operating(design(filter_resistor=None)).filter
    assert (found.ohm, found.slow_hz, found.noisy_hz) == (0.0, inf, inf)


def test_largest_swing_of_a_range() -> None:
    """2 ohm times 1 A are 2 V, 4 V where current flows both ways; the first of three ranges swings 3.8 V."""
    assert operating().swing_v == near(2.0)
    assert operating(**TWO_WAY).swing_v == near(4.0)
    assert operating(THREE).swing_v == near(3.8)


def test_uncalibrated_range() -> None:
    """A calibrated range can be asked how it reads without calibration: nothing is removed."""
    at = operating(accuracy__calibration="zero-and-span").uncalibrated()
    assert at.calibration is Calibration.NONE
    assert at.zero_sum_a == 0.0


def test_smaller_larger_and_chosen() -> None:
    """Floats stay floats, arrays are taken element by element, and a float meets an array."""
    many = np.array([1.0, 3.0])
    assert (smaller(1.0, 2.0), larger(1.0, 2.0)) == (1.0, 2.0)
    assert [chosen(condition, 1.0, 2.0) for condition in (True, False)] == [1.0, 2.0]
    assert isinstance(smaller(1.0, 2.0), float)
    assert np.array_equal(smaller(many, 2.0), [1.0, 2.0])
    assert np.array_equal(larger(2.0, many), [2.0, 3.0])
    assert np.array_equal(chosen(many < 2.0, many, 9.0), [1.0, 9.0])
