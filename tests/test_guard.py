"""The mark before cells that a spreadsheet would take for a formula."""

from __future__ import annotations

import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

from selector.guard import guarded, unguarded


@pytest.mark.parametrize(
    ("cell", "written"),
    [
        ("=1+1", "'=1+1"),
        ("+a", "'+a"),
        ("-a", "'-a"),
        ("@a", "'@a"),
        ("\ta", "'\ta"),
        ("\ra", "'\ra"),
        ("'=a", "''=a"),
        ("''-5", "'''-5"),
        ("-5", "-5"),
        ("+5.5e-3", "+5.5e-3"),
        ("-,5", "-,5"),
        ("-5 V", "'-5 V"),
        ("+5.2", "+5.2"),
        ("-1e-6", "-1e-6"),
        ("-.5", "-.5"),
        ("S-1", "S-1"),
        ("'a", "'a"),
        ("a=b", "a=b"),
        ("", ""),
    ],
)
def test_cells_like_formulas_are_guarded(cell: str, written: str) -> None:
    """A cell that starts like a formula, behind any number of `'`, and is no number gets one more `'`.

    Source: OWASP ASVS 4.0.3, 5.3.10 (from memory): formula characters first in an exported cell are escaped with `'`.
    Tolerance: none, the text itself.
    """
    assert guarded(cell) == written
    assert unguarded(written) == cell


@given(st.text(st.sampled_from("'=+-@\t\r15.ea"), max_size=6))
@settings(max_examples=300)
def test_the_guard_comes_off_as_it_went_on(cell: str) -> None:
    """Reading takes off just what writing put on, for every cell that can be written."""
    assert unguarded(guarded(cell)) == cell
