"""Figures of many parts side by side."""

from __future__ import annotations

from dataclasses import fields, is_dataclass
from typing import TYPE_CHECKING, Any

import numpy as np
import pytest

from selector.budget import METHODS, combined, zeroed
from selector.search.assess import pairing_of
from selector.search.interval import Interval, lower
from selector.search.stacks import columns, low_ends, mapped, stacked, taken
from tests.budget.two_designs import STATED, design_of
from tests.builders import OF_LAW, conditions, operating
from tests.search.boxed import boxes

if TYPE_CHECKING:
    from collections.abc import Iterator

    from selector.candidate import Pairing

every_law = pytest.mark.parametrize("law", OF_LAW)


def _leaves(tree: object) -> Iterator[Any]:
    """Yield every number or array of a tree of dataclasses and tuples in order, the spec's own left out."""
    if isinstance(tree, float | np.ndarray | Interval):
        yield tree
    elif isinstance(tree, tuple):
        for one in tree:
            yield from _leaves(one)
    elif is_dataclass(tree):
        for field in fields(tree):
            if field.name != "conditions":
                yield from _leaves(getattr(tree, field.name))


def _pairings(law: str) -> list[Pairing]:
    of = conditions(**STATED)
    return [pairing_of(of, design_of(law, number), 2) for number in (0, 1, 0)]


@every_law
def test_stacked_figures_are_those_of_each_part(law: str) -> None:
    """Figures at any depth become arrays, one element for each part; what is no number stays that of the first."""
    each = _pairings(law)
    stack = stacked(each)
    assert (stack.range_count, stack.amplifier.law, stack.conditions) == (2, each[0].amplifier.law, each[0].conditions)
    rows = [list(_leaves(one)) for one in each]
    assert len(rows[0]) > 60
    for many, *numbers in zip(_leaves(stack), *rows, strict=True):
        assert many.tolist() == numbers


@every_law
def test_columns_and_taken_are_rows_of_the_stack(law: str) -> None:
    """Rows come in the order asked for, twice where asked twice, as columns or in the shape of their indices."""
    each = _pairings(law)
    stack, index = stacked(each), np.array([1, 0, 1])
    rows = [list(_leaves(one)) for one in each]
    for down, across, *numbers in zip(
        _leaves(columns(stack, index)), _leaves(taken(stack, np.array([[1], [2]]))), *rows, strict=True
    ):
        assert down.tolist() == [[numbers[1]], [numbers[0]], [numbers[1]]]
        assert across.tolist() == [[numbers[1]], [numbers[2]]]
    assert [float(one) for one in _leaves(taken(stack, np.array(1)))] == rows[1]


@every_law
def test_change_reaches_every_array(law: str) -> None:
    """A change is made to each array and to both ends of each interval, once; plain numbers and words stay."""
    for at in (
        zeroed(operating(design_of(law, 1), **STATED)),
        boxes(law, "low side", conditions().calibration)[0].held,
    ):
        changed = mapped(at, lambda array: 2.0 * array)
        assert (changed.last, changed.calibration, changed.range_count) == (at.last, at.calibration, at.range_count)
        for was, is_ in zip(_leaves(at), _leaves(changed), strict=True):
            if isinstance(was, Interval):
                ends = [2.0 * end if isinstance(end, np.ndarray) else end for end in (was.low, was.high)]
                np.testing.assert_array_equal(is_.low, ends[0])
                np.testing.assert_array_equal(is_.high, ends[1])
            else:
                np.testing.assert_array_equal(is_, 2.0 * was if isinstance(was, np.ndarray) else was)


@pytest.mark.parametrize("method", METHODS)
@every_law
def test_lower_ends_stand_for_every_interval(law: str, method: str) -> None:
    """Each interval gives its lower end, in dataclasses and in the parts of a sum of squares; the rest stays."""
    of = boxes(law, "low side", conditions().calibration)[0].by(method).held
    for held in (of, combined(of)):
        for was, is_ in zip(_leaves(held), _leaves(low_ends(held)), strict=True):
            assert not isinstance(is_, Interval)
            np.testing.assert_array_equal(is_, lower(was))
