"""The search against an enumeration by arrays, on middling catalogues; and the enumeration against the plain walk."""

from __future__ import annotations

from random import Random
from typing import TYPE_CHECKING

import numpy as np
import pytest

from selector.gain import LAWS
from selector.search import search
from tests.search.enumerated_parts import NONE, frames
from tests.search.enumeration import enumerated
from tests.search.listed import best_of_pairs, ranks_of
from tests.search.middling_catalogue import middling
from tests.search.random_catalogue import catalogue
from tests.search.walk import walked

if TYPE_CHECKING:
    from collections.abc import Iterator

    from tests.search.enumerated_order import Enumerated
    from tests.search.enumerated_parts import Places

SHORT = range(10_000, 10_025, 5)
LONG = range(0, 500, 10)


def _agrees(seed: int) -> None:
    """Compare the list of pairs, its head, and the head of all variants."""
    spec, stock = middling(seed)
    every = enumerated(spec, stock)
    pairs = every.pairs()
    assert ranks_of(search(spec, stock, top=None)) == pairs, f"seed {seed}"
    assert ranks_of(search(spec, stock, top=2)) == pairs[:2], f"seed {seed}"
    assert ranks_of(search(spec, stock, top=7, variants=True)) == every.variants(7), f"seed {seed}"


def _drawn(every: Enumerated, random: Random, count: int) -> Iterator[Places]:
    """Yield combinations without their filter: of any parts, and of those that meet all limits."""
    every_frame = list(frames(every.shelf))
    for _ in range(count if every_frame else 0):
        frame = random.choice(every_frame)
        places = np.full(every.places.shape[1], NONE)
        places[:3] = frame.shunt, frame.amplifier, frame.switch
        law = frame.design(every.shelf).law
        for column in range(3 if law.common_name else 4, 4 + frame.count if law.switched_name else 4):
            places[column] = random.randrange(len(every.shelf.resistors))
        yield places
    for _ in range(count if len(every.score) else 0):
        yield np.array([*random.choice(every.places)[:-2], NONE, NONE])


@pytest.mark.parametrize("seed", range(20))
def test_enumeration_equals_the_plain_walk(seed: int) -> None:
    """All combinations of a small catalogue stand in one order, and so do the best of each pair."""
    spec, stock = catalogue(seed, resistors=(3, 5))
    plain = [rank for rank, _ in walked(spec, stock, variants=True)]
    every = enumerated(spec, stock)
    assert every.variants() == plain
    assert every.variants(7) == plain[:7]
    assert every.pairs() == best_of_pairs(plain)


@pytest.mark.parametrize("seed", range(20_000, 20_010))
def test_arrays_judge_as_plain_numbers_do(seed: int) -> None:
    """Combinations drawn from all, and from those that fit, have one verdict, filter and score.

    Source: physics of this program, asked with plain numbers.
    Tolerance: 1e-9, relative, the digits asked of a score.
    """
    every, random = enumerated(*middling(seed)), Random(seed)
    for places in _drawn(every, random, 100):
        alike = np.flatnonzero((every.places[:, :-2] == places[:-2]).all(axis=1))
        judged = every.judged(every.design(places))
        if isinstance(judged, str):
            assert not alike.size
        else:
            assert judged[1] == every.design(every.places[alike.item()])
            assert judged[0] == pytest.approx(every.score[alike.item()], rel=1e-9)


def test_middling_catalogues_are_of_all_sorts() -> None:
    """Of forty most have candidates, many of several pairs; all laws, and up to four ranges, are among what fits."""
    fitting, several, laws, counts = 0, 0, set(), set()
    for seed in range(40):
        every = enumerated(*middling(seed))
        fitting += len(every.score) > 0
        several += len(np.unique(every.places[:, :2], axis=0)) > 1
        laws |= {every.shelf.amplifiers[place].gain_law for place in np.unique(every.places[:, 1])}
        counts |= set(np.unique((every.places[:, 4:-2] != NONE).sum(axis=1)).tolist())
    assert fitting > 20
    assert several > 12
    assert laws == set(LAWS)
    assert counts == {0, 1, 2, 3, 4}


@pytest.mark.parametrize("first", SHORT)
def test_search_equals_the_enumeration(first: int) -> None:
    """Short list and variants are those of judging every combination of catalogues of 20 to 80 resistors."""
    for seed in range(first, first + SHORT.step):
        _agrees(seed)


@pytest.mark.long
@pytest.mark.parametrize("first", LONG)
def test_search_equals_the_enumeration_on_many_catalogues(first: int) -> None:
    """Five hundred catalogues of 20 to 80 resistors agree."""
    for seed in range(first, first + LONG.step):
        _agrees(seed)
