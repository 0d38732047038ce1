"""Limits that an amplifier, a switch and their supply decide: missing figure, law, reference pin, supply, temperature.

Plain: 4.5 to 5.5 V, 0 to 50 degC; the window ends at the converter's 4 V and begins at 10 mV.
"""

from __future__ import annotations

import pytest

from selector.candidate import Design
from tests.builders import HIGH_SIDE, ZERO, amplifier, chain, design, measured, meets, resistor, switch, switched
from tests.limits.edges import check_edge


def _with(law: str = "fixed", **fields: object) -> Design:
    return design(law, amplifier=amplifier(law, **fields))


@pytest.mark.parametrize(
    ("fields", "met"),
    [
        ({"bandwidth": None, "gain_bandwidth": None}, False),
        ({"bandwidth": None, "gain_bandwidth": 1e6}, True),
        ({"bandwidth": 1e5, "gain_bandwidth": None}, True),
        ({"common_mode_max": None, "common_mode_top_gap": None}, False),
        ({"common_mode_max": None, "common_mode_top_gap": 0.0}, True),
        ({"common_mode_max": 4.0, "common_mode_top_gap": None}, True),
    ],
)
def test_missing_figure(fields: dict[str, object], met: bool) -> None:  # noqa: FBT001 - a column of the table
    """An amplifier states one figure of its speed and one of its common mode's top; which, is its own matter."""
    assert meets("missing figure", chain(_with(**fields))) is met


def test_law_that_reads_its_own_ground() -> None:
    """Non-inverting serves the low side with its zero at ground, and neither the high side nor a zero above ground."""
    of = design("non-inverting")
    assert meets("law", chain(of))
    assert not meets("law", chain(of, **HIGH_SIDE))
    assert not meets("law", chain(of, **ZERO))


@pytest.mark.parametrize("law", ["fixed", "one-resistor", "two-resistor", "current-output", "difference"])
def test_other_laws_serve_both_sides(law: str) -> None:
    """A law that reads between its two inputs serves either side and any zero."""
    assert meets("law", chain(design(law), **HIGH_SIDE, **ZERO))


@pytest.mark.parametrize(
    ("law", "met"),
    [
        ("fixed", False),
        ("difference", False),
        ("non-inverting", True),
        ("one-resistor", True),
        ("two-resistor", True),
        ("current-output", True),
    ],
)
def test_law_that_cannot_be_switched(law: str, met: bool) -> None:  # noqa: FBT001 - a column of the table
    """Two ranges need a law whose gain can be switched."""
    assert meets("law", chain(switched(law, 2e4, 1e4))) is met


def test_reference_pin() -> None:
    """A zero of 1 V needs a reference pin; a zero of 0 V does not."""
    assert not meets("reference pin", chain(**ZERO))
    assert meets("reference pin", chain(_with(reference_pin=True), **ZERO))
    assert meets("reference pin", chain())


def test_supply_of_the_amplifier() -> None:
    """The amplifier works from 4.5 V down to where the supply may fall, and up to 5.5 V."""
    check_edge("supply", lambda volt: chain(_with(supply_min=volt)), 4.5, meets_from="below")
    check_edge("supply", lambda volt: chain(_with(supply_max=volt)), 5.5, meets_from="above")


def test_supply_of_the_switch() -> None:
    """So does the switch, where there is more than one range."""

    def of(**fields: object) -> Design:
        return switched("current-output", 2e4, 1e4, switch=switch(**fields))

    check_edge("supply", lambda volt: chain(of(supply_min=volt)), 4.5, meets_from="below")
    check_edge("supply", lambda volt: chain(of(supply_max=volt)), 5.5, meets_from="above")
    one = switched("current-output", 1e4, switch=switch(supply_min=5.4))
    assert meets("supply", chain(one))


def test_temperature() -> None:
    """The amplifier stands -20 to 50 degC where that is the ambient."""
    cold = {"ambient__min": -20.0}
    check_edge("temperature", lambda degc: chain(_with(temp_min=degc), **cold), -20.0, meets_from="below")
    check_edge("temperature", lambda degc: chain(_with(temp_max=degc), **cold), 50.0, meets_from="above")


def test_output_window_one_way() -> None:
    """A swing of 4.5 V to the lowest supply of 4.5 V leaves nothing; the limit is strict."""

    def built(volt: float) -> object:
        return chain(_with(swing_high=volt))

    check_edge("output window", built, 4.5, meets_from="below", on_it=False)


def test_output_window_above_a_zero() -> None:
    """A zero of 4 V at the top of the window leaves nothing above it."""

    def built(volt: float) -> object:
        return chain(_with(reference_pin=True), **ZERO | {"output__zero": volt})

    check_edge("output window", built, 4.0, meets_from="below", on_it=False)


def test_output_window_both_ways() -> None:
    """Two-way the smaller half counts: a swing of 1 V from ground to a zero of 1 V leaves nothing below."""

    def built(volt: float) -> object:
        return chain(_with(swing_low=volt, reference_pin=True), current__two_way=True, **ZERO)

    check_edge("output window", built, 1.0, meets_from="below", on_it=False)
    assert meets("output window", chain(_with(swing_low=1.0, reference_pin=True), **ZERO))


def test_gain_capacitor() -> None:
    """A part that wants a capacitor across its gain resistors is out as long as none is chosen."""
    assert not meets("gain capacitor", chain(_with("two-resistor", buffered=True, gain_capacitor=True)))
    assert meets("gain capacitor", chain(_with("two-resistor", buffered=True)))


# Law, place, least and most resistance by default.
PLACES = [
    ("non-inverting", "common", 1e3, 1e6),
    ("non-inverting", "gain", 100.0, 1e6),
    ("one-resistor", "gain", 100.0, 1e6),
    ("two-resistor", "common", 1e3, 1e6),
    ("two-resistor", "gain", 1e3, 1e6),
    ("current-output", "gain", 1e3, 1e6),
    ("difference", "common", 1e3, 1e6),
    ("difference", "gain", 1e3, 1e6),
]


@pytest.mark.parametrize(("law", "place", "least", "most"), PLACES)
def test_gain_resistance(law: str, place: str, least: float, most: float) -> None:
    """Every gain resistor lies between what its law takes by default."""

    def built(ohm: float, **fields: object) -> object:
        one = resistor(ohm, "X")
        return chain(design(law, amplifier=amplifier(law, **fields), **{place: one if place == "common" else (one,)}))

    check_edge("gain resistance", built, least, meets_from="above")
    check_edge("gain resistance", built, most, meets_from="below")


@pytest.mark.parametrize(("law", "place"), [row[:2] for row in PLACES])
def test_gain_resistance_that_the_amplifier_states(law: str, place: str) -> None:
    """Stated resistances, 900 ohm and 30 kohm, hold for every place instead."""

    def built(ohm: float) -> object:
        one = resistor(ohm, "X")
        part = amplifier(law, resistance_min=900.0, resistance_max=30e3)
        return chain(design(law, amplifier=part, **{place: one if place == "common" else (one,)}))

    check_edge("gain resistance", built, 900.0, meets_from="above")
    check_edge("gain resistance", built, 30e3, meets_from="below")


def test_gain_resistance_of_every_range() -> None:
    """Each range's resistor is judged, and none where no resistor sets the gain."""
    assert not meets("gain resistance", chain(switched("current-output", 2e6, 1e4)))
    assert measured("gain resistance", chain()) == []
