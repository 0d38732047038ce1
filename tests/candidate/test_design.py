"""The parts of a combination: where they stand, how many a board takes, what they are called and cost."""

from __future__ import annotations

from dataclasses import replace

import pytest

from selector.candidate import cost_of
from tests.builders import OF_LAW, amplifier, capacitor, design, near, resistor, shunt, switch, switched


def test_places_of_the_plain_design() -> None:
    """A fixed gain takes shunt, amplifier and the two parts of the filter, one of each."""
    rows = [(place.use, place.part.part, place.count) for place in design().places()]
    assert rows == [("shunt", "S", 1), ("amplifier", "A", 1), ("filter resistor", "R", 1), ("filter capacitor", "C", 1)]


def test_places_of_three_ranges() -> None:
    """Gain resistors are numbered where there are several; they stand after switch and common resistor."""
    rows = [(place.use, place.part.part, place.count) for place in switched("two-resistor", 3e4, 2e4, 1e4).places()]
    assert rows == [
        ("shunt", "S", 1),
        ("amplifier", "A", 1),
        ("switch", "W", 2),
        ("common", "RC", 1),
        ("gain 1", "RG1", 1),
        ("gain 2", "RG2", 1),
        ("gain 3", "RG3", 1),
        ("filter resistor", "R", 1),
        ("filter capacitor", "C", 1),
    ]


def test_one_gain_resistor_has_no_number() -> None:
    """With one range the switched resistor's place is `gain`."""
    assert [place.use for place in design("one-resistor").places()][2] == "gain"


def test_difference_takes_two_of_each_resistor() -> None:
    """A difference amplifier has two of R1 and two of R2."""
    counts = {place.use: place.count for place in design("difference").places()}
    assert (counts["common"], counts["gain"], counts["filter resistor"]) == (2, 2, 1)


@pytest.mark.parametrize(("ranges", "channels", "packages"), [(2, 2, 1), (3, 2, 2), (4, 2, 2), (4, 4, 1), (4, 1, 4)])
def test_switch_packages(ranges: int, channels: int, packages: int) -> None:
    """Each range takes a channel: K ranges take ceil(K / channels) packages."""
    of = switched("current-output", *[1e4 * (ranges - number) for number in range(ranges)])
    of = replace(of, switch=switch(channels=channels))
    assert of.range_count == ranges
    assert [place.count for place in of.places() if place.use == "switch"] == [packages]


def test_part_in_several_places_counts_for_all() -> None:
    """One resistor as common, twice as gain and in the filter, in a difference amplifier: 2 + 2 + 1 pieces."""
    one = resistor(1e3)
    of = design("difference", common=one, gain=(one,), filter_resistor=one)
    assert of.uses() == {("shunt", "S"): 1, ("amplifier", "A"): 1, ("resistor", "R"): 5, ("capacitor", "C"): 1}


def test_kinds_with_one_code_are_two_parts() -> None:
    """A resistor and a capacitor of the same code are counted apart."""
    of = design(filter_resistor=resistor(code="X"), filter_capacitor=capacitor(code="X"))
    assert of.uses()["resistor", "X"] == of.uses()["capacitor", "X"] == 1


def test_filter_that_is_still_to_be_chosen_has_no_place() -> None:
    """An open filter part is in no place and named as the empty string."""
    of = design(filter_resistor=None, filter_capacitor=None)
    assert [place.use for place in of.places()] == ["shunt", "amplifier"]
    assert of.names()[-2:] == (("",), ("",))


def test_names_stand_in_the_order_of_ties() -> None:
    """Shunts, amplifier, switch, bypass, common, gain, gain capacitors, filter resistor, filter capacitor."""
    of = switched("two-resistor", 2e4, 1e4)
    assert of.names() == (("S",), ("A",), ("W",), ("",), ("RC",), ("RG1", "RG2"), (), ("R",), ("C",))
    assert design().names() == (("S",), ("A",), ("",), ("",), ("",), (), (), ("R",), ("C",))


def test_shorter_lists_of_names_come_first() -> None:
    """Of lists that begin alike the shorter stands first; names compare by code point."""
    one, two = switched("two-resistor", 2e4), switched("two-resistor", 2e4, 1e4)
    assert replace(one, switch=two.switch).names() < two.names()
    assert design(shunts=(shunt(part="S10"),)).names() < design(shunts=(shunt(part="S2"),)).names()
    assert design(shunts=(shunt(part="Z"),)).names() < design(shunts=(shunt(part="a"),)).names()


@pytest.mark.parametrize("law", OF_LAW)
def test_law_and_ranges_of_a_design(law: str) -> None:
    """A design has its amplifier's law, and one range where it has one gain resistor or none."""
    assert design(law).law.name == law
    assert design(law).range_count == 1


PRICED = design(
    "difference",
    shunts=(shunt(unit_cost=1.5),),
    amplifier=amplifier("difference", unit_cost=2.0),
    common=resistor(1e3, "RC", unit_cost=0.25),
    gain=(resistor(2e4, "RG", unit_cost=0.5),),
    filter_resistor=resistor(unit_cost=0.125),
    filter_capacitor=capacitor(unit_cost=0.0625),
)


def test_cost_is_the_sum_over_all_uses() -> None:
    """1.5 + 2 + 2 * 0.25 + 2 * 0.5 + 0.125 + 0.0625 = 5.1875."""
    assert cost_of(PRICED) == near(5.1875)


def test_cost_counts_packages_of_a_switch() -> None:
    """Three ranges on two channels take two switches of 0.75."""
    of = switched("current-output", 3e4, 2e4, 1e4, switch=switch(unit_cost=0.75))
    rows = tuple(resistor(1e4, f"RG{number}", unit_cost=0.5) for number in range(3))
    priced = replace(
        of,
        shunts=(shunt(unit_cost=1.0),),
        amplifier=amplifier("current-output", unit_cost=1.0),
        gain=rows,
        filter_resistor=resistor(unit_cost=0.0),
        filter_capacitor=capacitor(unit_cost=0.0),
    )
    assert cost_of(priced) == near(5.0)


@pytest.mark.parametrize("place", ["shunts", "amplifier", "common", "gain", "filter_resistor", "filter_capacitor"])
def test_cost_is_unknown_where_one_is_not_stated(place: str) -> None:
    """One part without a unit cost, wherever it stands, leaves the cost unknown; a cost of 0 is known."""
    assert cost_of(replace(PRICED, **{place: getattr(design("difference"), place)})) is None
    assert cost_of(replace(PRICED, shunts=(shunt(unit_cost=0.0),))) == near(3.6875)
