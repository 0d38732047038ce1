"""Designs whose filter hangs on stock or cost: the search against the plain walk."""

from __future__ import annotations

import pytest

from selector.search import search
from tests.search.listed import best_of_pairs, ranks_of
from tests.search.scarce import bank_for, deprived, scarce
from tests.search.walk import walked

# Catalogues of which some listed designs have a second-best filter: some with several ranges, some with one, and some
# in which one resistor stands in all three places.
SEEDS = (
    *(41, 76, 79, 191, 202, 214, 216, 250, 288, 298, 321, 368, 389, 409, 411, 415, 448, 461),
    *(16, 19, 21, 62, 97, 108, 122, 170, 199, 239, 260, 336, 361, 408, 442, 451, 464, 477, 485),
    *(736, 1280, 1952),
)


@pytest.mark.parametrize("seed", SEEDS)
def test_search_equals_the_plain_walk_where_filters_are_taken_away(seed: int) -> None:
    """Where a resistor of the network leaves too few for the filter, or the filter is too dear, the lists agree."""
    spec, stock = scarce(seed)
    everything = walked(spec, stock, variants=True)
    bank = bank_for(spec, stock)
    assert any(deprived(bank, chain) for _, chain in everything)
    ranks = [rank for rank, _ in everything]
    assert ranks_of(search(spec, stock, top=None)) == best_of_pairs(ranks)
    assert ranks_of(search(spec, stock, top=None, variants=True)) == ranks


@pytest.mark.parametrize("seed", [48, 50, 144, 156, 167, 218, 317])
def test_filter_without_a_cost_is_no_end_under_a_cost_limit(seed: int) -> None:
    """Where the filter that a design would take states no cost, it takes the next one that can be paid."""
    spec, stock = scarce(seed)
    unpriced = [
        part.model_copy(update={"unit_cost": None}) if place % 2 else part
        for place, part in enumerate(stock["capacitor"])
    ]
    stock = stock | {"capacitor": tuple(unpriced)}
    ranks = [rank for rank, _ in walked(spec, stock, variants=True)]
    assert ranks_of(search(spec, stock, top=None)) == best_of_pairs(ranks)
