"""CSV: records in SI units, quoted by RFC 4180, and nothing that a spreadsheet would compute."""

from __future__ import annotations

import csv
import io
from dataclasses import replace

import pytest

from selector.report import render
from selector.report.answers.bill import BillShown
from selector.report.answers.check import Checked
from selector.report.answers.parts import PartsListed
from selector.report.answers.query import Shortlist


def read(text: str) -> list[dict[str, str]]:
    """Return the records of a CSV by heading."""
    return list(csv.DictReader(io.StringIO(text, newline="")))


def test_one_record_for_each_candidate(shortlist: Shortlist) -> None:
    """`query` gives every scalar figure in SI units, the unit in the heading; what is not known is empty."""
    first, second = read(render(shortlist, "csv"))
    assert (first["rank"], first["burden [V]"], first["power [W]"]) == ("1", "0.052", "0.0091")
    assert (first["gain"], first["limiting term"], first["pareto"]) == ("R-31R6; R-549R", "offset drift", "yes")
    assert (second["cost"], second["bypass"]) == ("", "")


def test_lines_end_in_a_line_feed(shortlist: Shortlist, empty: Shortlist) -> None:
    """No carriage return is written; where nothing fits the heading stands alone."""
    assert "\r" not in render(shortlist, "csv")
    assert render(empty, "csv").count("\n") == 1


def test_limits_of_check(checked: Checked) -> None:
    """`check` gives a record for each limit, in SI units; what is not judged is empty."""
    law, overload, burden, error = read(render(checked, "csv"))
    assert (law["meets"], law["value"], overload["meets"]) == ("yes", "", "")
    assert (burden["meets"], burden["value"], burden["allowed"], burden["unit"]) == ("no", "0.118", "0.1", "V")
    assert (error["value"], error["unit"]) == ("2.57e-06", "A")


def test_lines_of_a_bill(bill: BillShown) -> None:
    """`bill` gives a record for each line, whole figures of cost."""
    first = read(render(bill, "csv"))[0]
    assert (first["use"], first["part"], first["quantity"], first["unit_cost"]) == ("shunt", "S-0R82", "1", "0.25")


@pytest.mark.parametrize(
    "cell", ["a,b", 'say "x"', "two\nlines", "lone\rCR", "both\r\n", " blank ", "\N{GREEK CAPITAL LETTER OMEGA}", ""]
)
def test_a_cell_comes_back_as_it_was(bill: BillShown, cell: str) -> None:
    """Delimiters, quotes, line breaks of any sort and blanks survive.

    Source: RFC 4180, section 2, rules 5 to 7.
    Tolerance: none.
    """
    line = replace(bill.offer.bill[0], description=cell)
    text = render(replace(bill, offer=replace(bill.offer, bill=(line,))), "csv")
    assert read(text)[0]["description"] == cell


@pytest.mark.parametrize("start", ["=", "+", "-", "@", "\t", "\r", "'=", "''@", "'\t"])
def test_a_formula_gets_one_more_mark(bill: BillShown, start: str) -> None:
    """A cell that starts with any number of ' and then = + - @ TAB CR gets one ' more."""
    cell = f"{start}cmd"
    line = replace(bill.offer.bill[0], part=cell)
    text = render(replace(bill, offer=replace(bill.offer, bill=(line,))), "csv")
    assert read(text)[0]["part"] == f"'{cell}"


def test_a_stock_file_is_printed_as_it_is_given(bill: BillShown) -> None:
    """The text that loads again comes through byte for byte; without it the fields stated stand as texts."""
    shunt = bill.offer.candidate.design.shunts[0]
    assert render(PartsListed((shunt,), "kind,part\r\nshunt,S\r\n"), "csv") == "kind,part\r\nshunt,S\r\n"
    (record,) = read(render(PartsListed((shunt,)), "csv"))
    assert (record["kind"], record["part"], record["resistance"]) == ("shunt", "S-0R82", "820 mohm")
