"""The lines of a bill."""

from __future__ import annotations

from dataclasses import replace

from selector.bill import bill_lines, offer_of
from selector.candidate import Candidate, Conditions


def test_a_line_for_each_part_in_the_order_of_the_board(candidate: Candidate) -> None:
    """A design of six parts has six lines; three boards take three times the pieces."""
    lines = bill_lines(candidate.design, 3)
    assert [line.use for line in lines] == [place.use for place in candidate.design.places()]
    assert {line.quantity for line in lines} == {3}
    assert [line.kind for line in lines] == ["shunt", "amplifier", "resistor", "resistor", "resistor", "capacitor"]


def test_a_part_in_two_places_has_one_line(candidate: Candidate) -> None:
    """The common resistor used again in the filter: both places on its line, two pieces a board, its cost for all."""
    common = candidate.design.common
    assert common is not None
    priced = common.model_copy(update={"unit_cost": 0.25, "quantity": 7})
    design = replace(candidate.design, common=priced, filter_resistor=priced)
    line = next(line for line in bill_lines(design, 10) if line.part == common.part)
    assert (line.use, line.quantity, line.on_hand) == ("common, filter resistor", 20, 7)
    assert (line.unit_cost, line.line_cost) == (0.25, 5.0)


def test_in_line_parts_of_one_name_stay_apart(candidate: Candidate) -> None:
    """Two resistors called in-line with other figures are two parts; two with the same figures are one."""
    common = candidate.design.common
    assert common is not None
    ten, twenty = (common.model_copy(update={"part": "in-line", "resistance": ohm}) for ohm in (10e3, 20e3))
    apart = replace(candidate.design, common=ten, filter_resistor=twenty)
    alike = replace(candidate.design, common=ten, filter_resistor=ten.model_copy())
    assert [line.use for line in bill_lines(apart, 1) if line.part == "in-line"] == ["common", "filter resistor"]
    assert [line.use for line in bill_lines(alike, 1) if line.part == "in-line"] == ["common, filter resistor"]


def test_what_is_not_known_is_none(candidate: Candidate) -> None:
    """A part without cost and quantity has neither on its line, and no line cost."""
    shunt = candidate.design.shunts[0].model_copy(update={"unit_cost": None, "quantity": None})
    line = bill_lines(replace(candidate.design, shunts=(shunt,)), 5)[0]
    assert (line.on_hand, line.unit_cost, line.line_cost) == (None, None, None)


def test_an_offer_holds_the_bill_for_its_boards(candidate: Candidate, conditions: Conditions) -> None:
    """The bill of an offer is that of its boards, beside its cautions."""
    offer = offer_of(candidate, conditions, 4)
    assert (offer.boards, offer.bill) == (4, bill_lines(candidate.design, 4))
    assert offer.cautions
