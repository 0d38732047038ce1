"""Limits that the output filter decides: filter, converter pin, bandwidth, settling.

Plain: 1 kohm and 100 nF, 1591.5 Hz, behind an amplifier of 100 kHz; 5.5 V of highest supply.
"""

from __future__ import annotations

from math import log, pi, sqrt
from typing import TYPE_CHECKING

import pytest

from tests.builders import amplifier, capacitor, chain, design, measured, meets, near, resistor, switched
from tests.limits.edges import check_edge

if TYPE_CHECKING:
    from selector.candidate.chain import Chain

CORNER_HZ = 1.0 / (2.0 * pi * 1e3 * 1e-7)


def _resistor(ohm: float, **changes: object) -> Chain:
    return chain(design(filter_resistor=resistor(ohm)), **changes)


def _capacitor(**fields: object) -> Chain:
    """Return a chain whose capacitor is judged by itself, before it makes a corner."""
    return chain(design(filter_resistor=None, filter_capacitor=capacitor(**fields)))


def test_filter_resistor() -> None:
    """The filter's resistor lies between 10 ohm and 10 kohm, or between what the spec states."""
    check_edge("filter", _resistor, 10.0, meets_from="above")
    check_edge("filter", _resistor, 1e4, meets_from="below")
    stated = {"filter__resistance_min": 500.0, "filter__resistance_max": 2e3}
    check_edge("filter", lambda ohm: _resistor(ohm, **stated), 500.0, meets_from="above")
    check_edge("filter", lambda ohm: _resistor(ohm, **stated), 2e3, meets_from="below")


def test_filter_capacitor_stands_the_supply() -> None:
    """A stated voltage covers 5.5 V; none stated is none judged."""
    assert meets("filter", _capacitor(voltage=5.5))
    assert not meets("filter", _capacitor(voltage=5.4999))
    assert meets("filter", _capacitor())


def test_filter_capacitor_has_a_known_spread_below_all_of_it() -> None:
    """A tolerance of 50 % with 49.9 % over temperature will do, with 50 % not, and with none known not."""
    assert meets("filter", _capacitor(tolerance=0.5, temp_change=0.499))
    assert not meets("filter", _capacitor(tolerance=0.5, temp_change=0.5))
    assert not meets("filter", _capacitor(temp_change=None))


@pytest.mark.parametrize(
    ("coldest", "hottest", "met"), [(-55.0, 85.0, True), (-55.0, 85.1, False), (-55.1, 85.0, False)]
)
def test_filter_capacitors_dielectric_spans_the_ambient(coldest: float, hottest: float, met: bool) -> None:  # noqa: FBT001 - a column of the table
    """X5R serves from -55 to 85 degC.

    Source: EIA-198 (from memory).
    Tolerance: none.
    """
    of = design(filter_capacitor=capacitor(temp_change=None, dielectric="X5R"))
    assert meets("filter", chain(of, ambient__min=coldest, ambient__max=hottest)) is met


def test_converter_pin_that_stands_the_supply() -> None:
    """A pin that stands 5.5 V needs no clamp; one that stands less by a trillionth of it still does not."""
    check_edge("converter pin", lambda volt: chain(converter__input_max=volt), 5.5, meets_from="above")
    assert meets("converter pin", chain(converter__input_max=5.5 * (1.0 - 5e-13)))


def test_converter_pin_behind_the_filters_resistor() -> None:
    """5.5 V on a pin of 4 V drive 1.5 mA through 1 kohm into its clamp, through 1 kohm of 1 % 1.5152 mA."""

    def built(ampere: float, tolerance: float = 0.0) -> Chain:
        of = design(filter_resistor=resistor(tolerance=tolerance))
        return chain(of, converter__input_max=4.0, converter__clamp_current=ampere)

    check_edge("converter pin", built, 1.5e-3, meets_from="above")
    check_edge("converter pin", lambda ampere: built(ampere, 0.01), 1.5 / 990.0, meets_from="above")


def test_converter_pin_counts_the_filters_resistor_alone() -> None:
    """An unbuffered load resistor before the filter protects no pin."""
    pin = {"converter__input_max": 4.0, "converter__clamp_current": 1e-3}
    assert not meets("converter pin", chain(design("current-output"), **pin))


def test_converter_pin_that_is_not_stated() -> None:
    """A spec that states no pin has none judged."""
    assert measured("converter pin", chain()) == []


def _low_hz(first: float, second: float) -> float:
    """Return the exact -3 dB frequency of two poles, 2 a c / (a + c + sqrt((a + c)^2 + 4 a c)) in squares."""
    a, c = first**2, second**2
    return sqrt(2.0 * a * c / (a + c + sqrt((a + c) ** 2 + 4.0 * a * c)))


def test_bandwidth() -> None:
    """100 kHz and 1591.549 Hz make 1591.147 Hz together."""
    edge = _low_hz(1e5, CORNER_HZ)
    assert edge == near(1591.147, rel=1e-6)
    check_edge("bandwidth", lambda hertz: chain(signal__bandwidth=hertz), edge, meets_from="below")


def test_bandwidth_counts_the_filter_at_its_slow_end() -> None:
    """1 kohm of 1 % and 100 nF of 10 + 5 %: the corner of 1010 ohm and 115 nF."""
    of = design(filter_resistor=resistor(tolerance=0.01), filter_capacitor=capacitor(tolerance=0.1, temp_change=0.05))
    edge = _low_hz(1e5, 1.0 / (2.0 * pi * 1010.0 * 115e-9))
    check_edge("bandwidth", lambda hertz: chain(of, signal__bandwidth=hertz), edge, meets_from="below")


def test_bandwidth_of_every_range() -> None:
    """With 40 kHz of gain bandwidth the range of gain 40 has a pole of 1 kHz, and limits."""
    part = amplifier("non-inverting", gain_bandwidth=4e4)
    of = switched("non-inverting", 19e3 / 39.0 - 10.0, 990.0, amplifier=part)
    assert [at.gain for at in chain(of).ranges] == near([40.0, 20.0])
    check_edge(
        "bandwidth", lambda hertz: chain(of, signal__bandwidth=hertz), _low_hz(1e3, CORNER_HZ), meets_from="below"
    )


def test_settling() -> None:
    """10 bits settle in 11 ln 2 of the root sum of squares of both time constants, 0.763 ms."""
    edge = 11.0 * log(2.0) * sqrt(1.0 / 1e10 + 1.0 / CORNER_HZ**2) / (2.0 * pi)
    assert edge == near(7.6257e-4, rel=1e-4)
    check_edge("settling", lambda second: chain(signal__settle=second), edge, meets_from="above")


def test_settling_after_slewing() -> None:
    """At 10 kV/s 2 V take 0.2 ms more; both ways 4 V take 0.4 ms."""
    linear = 11.0 * log(2.0) * sqrt(1.0 / 1e10 + 1.0 / CORNER_HZ**2) / (2.0 * pi)
    of = design(amplifier=amplifier(slew_rate=1e4))
    two_way = {"current__two_way": True, "output__zero": 2.0, "output__zero_tolerance": 0.0, "output__zero_drift": 0.0}

    def built(second: float, **changes: object) -> Chain:
        return chain(of, signal__settle=second, **changes)

    check_edge("settling", built, linear + 2e-4, meets_from="above")
    check_edge(
        "settling", lambda second: chain(of, signal__settle=second, **two_way), linear + 4e-4, meets_from="above"
    )


def test_settling_that_is_not_asked() -> None:
    """A spec that asks for no settling time has none judged."""
    assert measured("settling", chain()) == []


@pytest.mark.parametrize("name", ["converter pin", "bandwidth", "settling", "saturation", "error"])
def test_nothing_is_judged_before_a_filter_is_chosen(name: str) -> None:
    """A chain without its filter has no figure of what the filter decides."""
    of = design(filter_resistor=None)
    assert measured(name, chain(of, signal__settle=1.0, converter__input_max=4.0)) == []
