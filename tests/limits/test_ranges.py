"""Limits on gains and ranges: headroom, range order, power, slew rate, output low.

Plain: G Rs 2 ohm and 2 V at 1 A, 3.8 V within headroom. A current output of 2 mS has gain 40 with 19 990 and 20 with
9 990 ohm and a switch of 10 ohm.
"""

from __future__ import annotations

from math import pi
from typing import TYPE_CHECKING

import pytest

from tests.builders import (
    HIGH_SIDE,
    ZERO,
    amplifier,
    chain,
    design,
    measured,
    meets,
    near,
    shunt,
    switched,
)
from tests.limits.edges import check_edge

if TYPE_CHECKING:
    from selector.candidate.chain import Chain

TWO_WAY = ZERO | {"current__two_way": True}


def _gain(gain: float, **changes: object) -> Chain:
    return chain(design(amplifier=amplifier(gain=gain)), **changes)


def _two(upper: float, lower: float = 20.0, **changes: object) -> Chain:
    """Return two ranges of a current output with given gains, the higher first."""
    return chain(switched("current-output", upper / 2e-3 - 10.0, lower / 2e-3 - 10.0), **changes)


def test_headroom() -> None:
    """A gain of 38 brings 3.8 V, 5 % below the top of 4 V; with 20 % of headroom 32."""
    check_edge("headroom", _gain, 38.0, meets_from="below")
    check_edge("headroom", lambda gain: _gain(gain, limits__headroom=0.2), 32.0, meets_from="below")


def test_headroom_at_the_largest_current() -> None:
    """With 0.5 A at most a gain of 76 brings the same 3.8 V."""
    check_edge("headroom", lambda gain: _gain(gain, current__max=0.5), 76.0, meets_from="below")


def test_headroom_above_a_zero_and_both_ways() -> None:
    """Above a zero of 1 V 0.95 * 3 V are left, a gain of 28.5; both ways 0.95 * 0.99 V, a gain of 9.405."""
    check_edge("headroom", lambda gain: _gain(gain, **ZERO), 28.5, meets_from="below")
    check_edge("headroom", lambda gain: _gain(gain, **TWO_WAY), 9.405, meets_from="below")


def test_headroom_concerns_the_last_range() -> None:
    """A first range of gain 80 that I_max would overdrive is none of it."""
    assert meets("headroom", _two(80.0))
    assert [(row.value, row.allowed) for row in measured("headroom", _two(80.0))] == [near((2.0, 3.8))]


def test_range_order_of_the_first_border() -> None:
    """A gain of 380 ends the first range at I_min of 0.1 A: it must end above."""
    check_edge("range order", _two, 380.0 * (1.0 - 1e-12), meets_from="below")


def test_range_order_of_the_last_border() -> None:
    """A gain of 38 ends the first range at I_max of 1 A: it must end below."""
    check_edge("range order", _two, 38.0 * (1.0 + 1e-12), meets_from="above")


def test_range_order_is_strict() -> None:
    """Ranges of equal gain have equal borders, and do not meet; the 1e-12 of the other limits does not count."""
    equal = switched("current-output", 39_990.0, 39_990.0, 9_990.0)
    assert not meets("range order", chain(equal))
    apart = switched("current-output", 39_990.0, 39_990.0 * (1.0 - 1e-13), 9_990.0)
    assert meets("range order", chain(apart))
    assert not meets("range order", chain(switched("current-output", 39_990.0 * (1.0 - 1e-13), 39_990.0, 9_990.0)))


def test_range_order_on_the_border_itself() -> None:
    """4 V over a gain of 32 and 0.125 ohm are 1 A to the last digit, which is I_max: not below it, so not met."""
    of = switched("current-output", 15_990.0, 7_990.0, shunts=(shunt(resistance=0.125),))
    found = chain(of, limits__headroom=0.0)
    assert found.ranges[0].high_a == found.ranges[1].high_a == 1.0
    assert not meets("range order", found)


def test_range_order_of_gains() -> None:
    """The last range ends at I_max whatever its gain, and still must have less than the one below: 40 is too much."""
    check_edge("range order", lambda gain: _two(40.0, gain), 40.0 * (1.0 - 1e-12), meets_from="below")


def test_range_order_of_one_range() -> None:
    """One range has I_min below I_max and no range below."""
    assert meets("range order", chain())


def test_power() -> None:
    """0.101 W in the shunt and 5.5 mW of supply; a current output drives 2 V into 10 kohm from 5.5 V, 1.1 mW more."""
    check_edge("power", lambda watt: chain(limits__power=watt), 0.1065, meets_from="above")
    check_edge("power", lambda watt: chain(design("current-output"), limits__power=watt), 0.1076, meets_from="above")


def test_power_of_a_difference_amplifier_at_the_high_side() -> None:
    """11 V / 21 kohm of drive and two branches of 13 V on 21 kohm: 0.1065 + (11 + 338) / 21 000 W."""
    edge = 0.1065 + 349.0 / 21e3
    check_edge(
        "power", lambda watt: chain(design("difference"), limits__power=watt, **HIGH_SIDE), edge, meets_from="above"
    )


@pytest.mark.parametrize(("changes", "swing_v"), [({}, 2.0), (TWO_WAY, 4.0)], ids=["one-way", "two-way"])
def test_slew_rate(changes: dict[str, object], swing_v: float) -> None:
    """100 Hz of 2 V, two-way of 4 V, need pi * 100 * A in V/s."""

    def built(slew: float) -> Chain:
        return chain(design(amplifier=amplifier(slew_rate=slew)), **changes)

    check_edge("slew rate", built, 100.0 * pi * swing_v, meets_from="above")


def test_slew_rate_of_every_range() -> None:
    """A first range of gain 40 swings 3.8 V before it hands over."""

    def built(slew: float) -> Chain:
        part = amplifier("current-output", slew_rate=slew)
        return chain(switched("current-output", 19_990.0, 9_990.0, amplifier=part))

    check_edge("slew rate", built, 380.0 * pi, meets_from="above")


def test_slew_rate_that_is_not_stated() -> None:
    """An amplifier that states none follows anything."""
    assert meets("slew rate", chain(signal__bandwidth=1e9))


def _low(volt: float, **changes: object) -> Chain:
    return chain(design(amplifier=amplifier(swing_low=volt)), **changes)


def test_output_low() -> None:
    """0.1 A make 0.2 V, which the output must reach; a zero of 1 V lifts it to 1.2 V."""
    check_edge("output low", _low, 0.2, meets_from="below")
    check_edge("output low", lambda volt: _low(volt, **ZERO), 1.2, meets_from="below")


@pytest.mark.parametrize("method", ["worst-case", "rss"])
@pytest.mark.parametrize("calibration", ["zero", "zero-and-span"])
def test_output_low_with_a_calibrated_zero(method: str, calibration: str) -> None:
    """What the zero removes, 1 mA of offset and 1 mA of the converter's, may draw it down by 2 ohm * 2 mA."""
    changes = {"accuracy__method": method, "accuracy__calibration": calibration, "converter__offset": 2e-3}
    check_edge("output low", lambda volt: _low(volt, **changes), 0.196, meets_from="below")


def test_output_low_of_every_range() -> None:
    """A first range of gain 40 reaches 0.4 V at 0.1 A; with an overlap of 95 % the second begins at 0.0475 A, 95 mV."""

    def built(volt: float, **changes: object) -> Chain:
        part = amplifier("current-output", swing_low=volt)
        return chain(switched("current-output", 19_990.0, 9_990.0, amplifier=part), **changes)

    check_edge("output low", built, 0.4, meets_from="below")
    check_edge("output low", lambda volt: built(volt, ranges__overlap=0.95), 0.095, meets_from="below")


def test_output_low_both_ways() -> None:
    """Two-way the output is not asked to leave its lower end."""
    assert measured("output low", _low(0.5, **TWO_WAY)) == []
