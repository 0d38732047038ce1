"""Resistors by resistance, and what stretches of them have between them."""

from __future__ import annotations

from itertools import pairwise
from random import Random
from typing import TYPE_CHECKING, cast

import numpy as np
import pytest

from selector.search.interval import Interval, lower, upper
from selector.search.resistors import CLASSES, Resistors, resistors_of
from tests.search.random_parts import resistor_row
from tests.search.small import part

if TYPE_CHECKING:
    from collections.abc import Iterator

    from selector.parts import Resistor

CHANGE_K = 45.0
SEEDS = range(20)
VALUES = [100.0, 120.0, 120.0, 150.0, 1e3, 1e4]


def _rows(seed: int, count: int = 12, *, spread: bool = False) -> Resistors:
    """Return random resistors of few values, of any tolerance where `spread`."""
    random = Random(seed)
    rows = [resistor_row(random, number, VALUES) for number in range(count)]
    if spread:
        rows = [row | {"tolerance": random.uniform(1e-4, 1e-2)} for row in rows]
    return resistors_of([cast("Resistor", part("resistor", **row)) for row in rows], CHANGE_K)


def _stretches(count: int) -> Iterator[tuple[int, int]]:
    return ((begin, end) for begin in range(count) for end in range(begin + 1, count + 1))


@pytest.mark.parametrize("seed", SEEDS)
def test_resistors_stand_by_resistance(seed: int) -> None:
    """Resistance rises, equal ones keep their order, and each is found at its place by its code."""
    resistors = _rows(seed)
    keys = [(part.resistance, int(part.part[1:])) for part in resistors.parts]
    assert keys == sorted(keys)
    assert resistors.ohm.tolist() == [part.resistance for part in resistors.parts]
    assert [resistors.place[part.part] for part in resistors.parts] == list(range(len(resistors)))


@pytest.mark.parametrize("seed", SEEDS)
def test_stretch_has_the_ends_of_what_is_in_it(seed: int) -> None:
    """Resistance and the least tolerance and drift are those of the stretch; the most of these bounds all."""
    resistors = _rows(seed)
    begin, end = np.array(list(_stretches(len(resistors)))).T
    found = resistors.between(begin, end)
    figures = resistors.figures
    for row, (one, other) in enumerate(zip(begin, end, strict=True)):
        for name in ("ohm", "tolerance_frac", "tempco_per_k"):
            values = np.asarray(getattr(figures, name))[one:other]
            assert lower(getattr(found, name))[row] == values.min()
            assert upper(getattr(found, name))[row] >= values.max()
        assert upper(found.ohm)[row] == resistors.ohm[other - 1]
    assert lower(resistors.whole.ohm).tolist() == [resistors.ohm[0]]
    assert upper(resistors.whole.ohm).tolist() == [resistors.ohm[-1]]


@pytest.mark.parametrize("seed", SEEDS)
def test_group_has_the_ends_of_its_members(seed: int) -> None:
    """Any groups of resistors, in any order, have the least and the most of each figure between them."""
    random, resistors = Random(seed), _rows(seed)
    groups = [np.array(random.sample(range(len(resistors)), size)) for size in (1, 2, 5, 12)]
    found = resistors.of(groups)
    for name in ("ohm", "tolerance_frac", "tempco_per_k"):
        each = [np.asarray(getattr(resistors.figures, name))[group] for group in groups]
        assert lower(getattr(found, name)).ravel().tolist() == [one.min() for one in each]
        assert upper(getattr(found, name)).ravel().tolist() == [one.max() for one in each]


@pytest.mark.parametrize("seed", SEEDS)
def test_near_resistances_are_all_that_lie_between_two(seed: int) -> None:
    """Every resistor within an interval is found, those on its ends too, and none beyond its rounding."""
    random, resistors = Random(seed), _rows(seed)
    ends = np.array([sorted(random.choices([*VALUES, 90.0, 130.0, 2e4], k=2)) for _ in range(40)])
    ends *= 1.0 + np.array([random.choice((0.0, 1e-12, -1e-12)) for _ in range(80)]).reshape(40, 2)
    begin, end = resistors.near(Interval(ends[:, 0], ends[:, 1]))
    for (low, high), one, other in zip(ends, begin, end, strict=True):
        inside = (resistors.ohm >= low * (1.0 - 1e-11)) & (resistors.ohm <= high * (1.0 + 1e-11))
        assert np.flatnonzero(inside).tolist() == list(range(one, other))


@pytest.mark.parametrize("seed", SEEDS)
@pytest.mark.parametrize(("count", "spread"), [(1, False), (12, False), (40, True)])
def test_alike_resistors_part_all_of_them(seed: int, count: int, *, spread: bool) -> None:
    """Each resistor stands in one class; within it resistance rises; no class adds less than one before it."""
    resistors = _rows(seed, count, spread=spread)
    classes = resistors.alike
    assert sorted(int(place) for one in classes for place in one) == list(range(count))
    assert all(len(one) for one in classes)
    assert len(classes) <= CLASSES
    assert all((np.diff(one) > 0).all() for one in classes)
    figures = resistors.figures
    adds = np.asarray(figures.tolerance_frac) + np.asarray(figures.tempco_per_k) * CHANGE_K
    for first, second in pairwise(classes):
        assert adds[first].max() <= adds[second].min() * 1.01


def test_no_resistors_are_no_trouble() -> None:
    """An empty shelf has a length of 0 and no places."""
    resistors = resistors_of([], CHANGE_K)
    assert (len(resistors), resistors.place, resistors.ohm.tolist()) == (0, {}, [])
