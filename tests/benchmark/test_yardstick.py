"""The yardstick against the plain walk: what the search is measured by judges as everything else does."""

from __future__ import annotations

from typing import TYPE_CHECKING

import pytest

from scripts.benchmark.catalogue import catalogue, spec
from scripts.benchmark.yardstick import enumerated
from tests.search import random_catalogue
from tests.search.walk import walked

if TYPE_CHECKING:
    from collections.abc import Mapping

    from selector.parts import Part
    from selector.spec import Spec


def _agrees(spec: Spec, stock: Mapping[str, tuple[Part, ...]], chunk: int) -> int:
    """Compare the best of each pair, and return how many pairs there are."""
    expected = [rank for rank, _ in walked(spec, stock)]
    found = enumerated(spec, stock, chunk=chunk).ranks
    assert [rank[1:] for rank in found] == [rank[1:] for rank in expected]
    assert [rank[0] for rank in found] == pytest.approx([rank[0] for rank in expected], rel=1e-11)
    return len(expected)


@pytest.mark.parametrize("chunk", [50, 1000, 1_000_000])
def test_yardstick_equals_the_plain_walk_on_the_catalogue_of_the_benchmark(chunk: int) -> None:
    """On a small one of the catalogues that are measured both find the same combinations, however it is cut."""
    stock = catalogue(shunts=6, amplifiers=12, resistors=8, capacitors=4)
    assert _agrees(spec("loose", 1), stock, chunk) >= 5


@pytest.mark.parametrize("first", range(0, 60, 20))
def test_yardstick_equals_the_plain_walk_on_random_catalogues(first: int) -> None:
    """On random catalogues of every law, method, side and limit both find the same combinations."""
    pairs = 0
    for seed in range(first, first + 20):
        wanted, stock = random_catalogue.catalogue(seed, resistors=(3, 8), most=1)
        pairs += _agrees(wanted, stock, 500)
    assert pairs >= 5
