"""The least of stretches of an array, and places found by halving."""

from __future__ import annotations

import numpy as np
from hypothesis import given
from hypothesis import strategies as st

from selector.search.stretches import doubled, first_place, least_between

FIGURES = st.lists(st.floats(min_value=0.0, max_value=9.0) | st.just(np.inf), min_size=1, max_size=20)


@given(figures=FIGURES, data=st.data())
def test_least_of_a_stretch_is_the_least_of_its_figures(figures: list[float], data: st.DataObject) -> None:
    """Of every stretch that is asked for, along a row and along one of two rows, the least figure is told."""
    begin = data.draw(st.integers(0, len(figures) - 1))
    end = data.draw(st.integers(begin + 1, len(figures)))
    row, places = np.array(figures), (np.array([begin]), np.array([end]))
    assert least_between(doubled(row), *places) == [row[begin:end].min()]
    two = np.stack([row, row[::-1]])
    assert least_between(doubled(two), *places, np.array([1])) == [row[::-1][begin:end].min()]


@given(wanted=st.lists(st.integers(0, 12), min_size=1, max_size=9), data=st.data())
def test_first_place_that_stands_is_found_before_the_end(wanted: list[int], data: st.DataObject) -> None:
    """Each element has the first place that stands, or its end where none before it does."""
    end = np.array(data.draw(st.lists(st.integers(0, 10), min_size=len(wanted), max_size=len(wanted))))
    first = np.array(wanted)
    found = first_place(end, lambda place: place >= first, 9)
    np.testing.assert_array_equal(found, np.minimum(first, end))
