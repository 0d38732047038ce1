"""The sense lines stay where the amplifier, and a switch at its inputs, works.

Plain: a burden of 0.101 V, 4.5 V of lowest supply; at the high side 10 to 13 V.
"""

from __future__ import annotations

from typing import TYPE_CHECKING

import pytest

from tests.builders import HIGH_SIDE, ZERO, amplifier, chain, design, meets, switched
from tests.limits.edges import check_edge

if TYPE_CHECKING:
    from selector.candidate.chain import Chain

TWO_WAY = ZERO | {"current__two_way": True}
NAME = "common mode"
VZ = {"output__zero": 2.4, "output__zero_tolerance": 0.0, "output__zero_drift": 0.0}


def _with(law: str = "fixed", changes: dict[str, object] | None = None, **fields: object) -> Chain:
    return chain(design(law, amplifier=amplifier(law, **{"common_mode_max": 100.0} | fields)), **changes or {})


def test_bottom_at_the_low_side() -> None:
    """One-way the lines reach 0 V: an amplifier from 0 V meets, one from 1 nV up fails."""
    assert meets(NAME, _with(common_mode_min=0.0))
    assert not meets(NAME, _with(common_mode_min=1e-9))


def test_bottom_at_the_low_side_both_ways() -> None:
    """Two-way they go down to -0.101 V."""
    check_edge(NAME, lambda volt: _with(changes=TWO_WAY, common_mode_min=volt), -0.101, meets_from="below")


def test_top_at_the_low_side() -> None:
    """They go up to the burden of 0.101 V, either way; absolute, or 4.399 V below the lowest supply."""

    def built(volt: float, changes: dict[str, object]) -> Chain:
        return _with(changes=changes, common_mode_min=-0.2, common_mode_max=volt)

    check_edge(NAME, lambda volt: built(volt, {}), 0.101, meets_from="above")
    check_edge(NAME, lambda volt: built(volt, TWO_WAY), 0.101, meets_from="above")
    check_edge(NAME, lambda volt: _with(common_mode_max=None, common_mode_top_gap=volt), 4.399, meets_from="below")


def test_bottom_at_the_high_side() -> None:
    """The lower line stands the burden below the lowest bus: 10 - 0.101 = 9.899 V."""
    check_edge(NAME, lambda volt: _with(changes=HIGH_SIDE, common_mode_min=volt), 9.899, meets_from="below")


def test_top_at_the_high_side() -> None:
    """One-way the upper line stands at the highest bus of 13 V, two-way the burden above."""
    check_edge(NAME, lambda volt: _with(changes=HIGH_SIDE, common_mode_max=volt), 13.0, meets_from="above")
    both_ways = HIGH_SIDE | TWO_WAY
    check_edge(NAME, lambda volt: _with(changes=both_ways, common_mode_max=volt), 13.101, meets_from="above")


def test_top_by_the_gap_to_the_supply() -> None:
    """With a bus of at most 4 V half a volt below the lowest supply of 4.5 V will do."""
    low_bus = HIGH_SIDE | {"sense__bus_min": 2.0, "sense__bus_nominal": 3.0, "sense__bus_max": 4.0}

    def built(volt: float) -> Chain:
        return _with(changes=low_bus, common_mode_max=None, common_mode_top_gap=volt)

    check_edge(NAME, built, 0.5, meets_from="below")


def test_difference_amplifier_sees_a_divided_voltage() -> None:
    """At a gain of 20 it sees 20/21 of 9.899 and of 13 V; a zero of 2.4 V lifts both by 2.4 / 21 V."""
    for changes, zero_v in ((HIGH_SIDE, 0.0), (HIGH_SIDE | VZ, 2.4)):
        bottom_v, top_v = (20.0 * 9.899 + zero_v) / 21.0, (20.0 * 13.0 + zero_v) / 21.0
        check_edge(
            NAME, lambda volt, of=changes: _with("difference", of, common_mode_min=volt), bottom_v, meets_from="below"
        )
        check_edge(
            NAME, lambda volt, of=changes: _with("difference", of, common_mode_max=volt), top_v, meets_from="above"
        )


def test_difference_amplifier_at_the_low_side_both_ways() -> None:
    """-0.101 V and a zero of 1 V: (-2.02 + 1) / 21 V, below ground by 48.6 mV."""
    check_edge(NAME, lambda volt: _with("difference", TWO_WAY, common_mode_min=volt), -1.02 / 21.0, meets_from="below")


@pytest.mark.parametrize(("changes", "edge"), [({}, 4.5), (TWO_WAY, 4.399)], ids=["one-way", "two-way"])
def test_switch_at_the_inputs_of_a_one_resistor_amplifier(changes: dict[str, object], edge: float) -> None:
    """With two ranges the bus, two-way with the burden, stays below the lowest supply of 4.5 V."""
    part = amplifier("one-resistor", common_mode_max=100.0)

    def built(volt: float) -> Chain:
        bus = {"sense__bus_min": 1.0, "sense__bus_nominal": 2.0, "sense__bus_max": volt}
        return chain(switched("one-resistor", 490.0, 990.0, amplifier=part), **HIGH_SIDE | bus | changes)

    check_edge(NAME, built, edge, meets_from="below")


def test_no_switch_at_the_inputs() -> None:
    """One range, or a switch at the output, leaves the bus of 13 V to the amplifier."""
    one = amplifier("one-resistor", common_mode_max=100.0)
    assert meets(NAME, chain(design("one-resistor", amplifier=one), **HIGH_SIDE))
    other = amplifier("current-output", common_mode_max=100.0)
    assert meets(NAME, chain(switched("current-output", 2e4, 1e4, amplifier=other), **HIGH_SIDE))


def test_switch_at_the_inputs_at_the_low_side() -> None:
    """At the low side the switch sees the burden alone."""
    assert meets(NAME, chain(switched("one-resistor", 490.0, 990.0)))
