"""Short lists as ranks, to compare those of different ways of searching."""

from __future__ import annotations

from typing import TYPE_CHECKING

from selector.search.standing import rank_of

if TYPE_CHECKING:
    from selector.search import Found
    from selector.search.standing import Rank


def ranks_of(found: Found) -> list[Rank]:
    """Return the ranks of a short list in its order."""
    return [rank_of(candidate.score, candidate.design) for candidate in found.candidates]


def best_of_pairs(everything: list[Rank]) -> list[Rank]:
    """Return the first rank of each pair of shunt and amplifier of a list that is in order."""
    best: dict[object, Rank] = {}
    for rank in everything:
        best.setdefault(rank[2][:2], rank)
    return list(best.values())
