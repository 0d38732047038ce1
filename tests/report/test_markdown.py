"""Markdown: data is text, never markup."""

from __future__ import annotations

from dataclasses import replace

import pytest

from selector.report import render
from selector.report.answers.bill import BillShown
from selector.report.answers.query import Shortlist


def test_a_table_has_its_heading_and_its_sides(bill: BillShown) -> None:
    """A bill is a table under a heading, its figures at the right."""
    lines = render(bill, "markdown").splitlines()
    at = lines.index("### bill for 1 board")
    assert lines[at + 2] == "| use | part | for | qty | have | unit | line |"
    assert lines[at + 3] == "| --- | --- | --- | ---: | ---: | ---: | ---: |"
    assert lines[at + 4] == "| shunt | S-0R82 | 820 mohm, 0.5 %, 500 mW | 1 | 40 | 0.25 | 0.25 |"


def test_bars_are_a_table_of_amounts(shortlist: Shortlist) -> None:
    """The error terms stand with their amounts."""
    assert "| offset drift | 2.1 |" in render(shortlist, "markdown").splitlines()


@pytest.mark.parametrize(
    ("text", "written"),
    [
        ("a|b", r"a\|b"),
        ("<script>", r"\<script\>"),
        ("[x](y)", r"\[x\](y)"),
        ("`a` *b* _c_", r"\`a\` \*b\* \_c\_"),
        ("back\\slash|", r"back\\slash\|"),
        ("# heading", r"\# heading"),
        ("1. item", r"1\. item"),
        ("- item", r"\- item"),
        ("two\nlines", r"two\\x0alines"),
    ],
)
def test_markup_is_escaped(bill: BillShown, text: str, written: str) -> None:
    """A caution that holds markup is a line of the list that reads as it was entered.

    Source: CommonMark 0.31, backslash escapes; pipes as in the table extension, common practice.
    Tolerance: none.
    """
    offer = replace(bill.offer, cautions=(text,))
    assert render(replace(bill, offer=offer), "markdown").endswith(f"\n- {written}\n")


def test_a_pipe_in_a_cell_makes_no_column(bill: BillShown) -> None:
    """Every row of the bill has the seven columns of its heading, whatever the part is called."""
    line = replace(bill.offer.bill[0], part="S|1\\|2", description="x|y")
    text = render(replace(bill, offer=replace(bill.offer, bill=(line,))), "markdown")
    row = next(row for row in text.splitlines() if "S\\|1" in row)
    assert row.replace("\\\\", "").replace("\\|", "").count("|") == 8
