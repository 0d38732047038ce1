"""The search against the plain walk, on random small catalogues of every law, with ties, stock and cost."""

from __future__ import annotations

from typing import TYPE_CHECKING

import pytest
from hypothesis import HealthCheck, given, settings
from hypothesis import strategies as st

from selector.search import search
from selector.search.standing import rank_of
from tests.search.listed import best_of_pairs, ranks_of
from tests.search.random_catalogue import catalogue
from tests.search.walk import blocked, nearest, walked

if TYPE_CHECKING:
    from collections.abc import Mapping

    from selector.parts import Part
    from selector.spec import Spec

SEEDS = st.integers(min_value=0, max_value=2**32)
SHORT = settings(max_examples=60, deadline=None, suppress_health_check=list(HealthCheck), derandomize=True)
LONG = settings(max_examples=500, deadline=None, suppress_health_check=list(HealthCheck), derandomize=True)


def _agrees(spec: Spec, stock: Mapping[str, tuple[Part, ...]]) -> None:
    """Compare the list of pairs, its head, the variants, and why nothing fits."""
    everything = [rank for rank, _ in walked(spec, stock, variants=True)]
    best = best_of_pairs(everything)
    found = search(spec, stock, top=None)
    assert ranks_of(found) == best
    assert ranks_of(search(spec, stock, top=2)) == best[:2]
    assert ranks_of(search(spec, stock, top=7, variants=True)) == everything[:7]
    if best:
        assert found.nothing_fits is None
        return
    assert found.nothing_fits is not None
    assert dict(found.nothing_fits.blocked) == blocked(spec, stock)
    assert sum(count for _, count in found.nothing_fits.blocked) == found.nothing_fits.pairs
    close = found.nothing_fits.nearest
    assert (None if close is None else rank_of(close.uses.largest(), close.design)) == nearest(spec, stock)


@given(seed=SEEDS)
@SHORT
def test_search_equals_the_plain_walk(seed: int) -> None:
    """Short list, variants, blocked pairs and nearest combination are those of judging every combination."""
    _agrees(*catalogue(seed, resistors=(3, 5)))


@given(seed=SEEDS)
@SHORT
def test_search_equals_the_plain_walk_without_switching(seed: int) -> None:
    """With one range and more resistors the same holds."""
    _agrees(*catalogue(seed, resistors=(8, 12), most=1))


@pytest.mark.long
@given(seed=SEEDS)
@LONG
def test_search_equals_the_plain_walk_on_many_catalogues(seed: int) -> None:
    """Five hundred catalogues of up to three ranges agree."""
    _agrees(*catalogue(seed, resistors=(2, 6)))


@pytest.mark.long
@given(seed=SEEDS)
@settings(LONG, max_examples=60)
def test_search_equals_the_plain_walk_with_four_ranges(seed: int) -> None:
    """Catalogues of up to four ranges agree."""
    _agrees(*catalogue(seed, resistors=(2, 4), most=4))


def test_same_input_gives_the_same_list() -> None:
    """Two searches of one catalogue agree in every figure but the time taken."""
    spec, stock = catalogue(1004, resistors=(5, 7))
    first, second = search(spec, stock), search(spec, stock)
    assert first.candidates == second.candidates
    assert first.searched.evaluated == second.searched.evaluated
