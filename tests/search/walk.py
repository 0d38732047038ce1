"""The plain walk: every combination judged one by one, with nothing left out. The oracle of the search."""

from __future__ import annotations

from itertools import product
from typing import TYPE_CHECKING

from selector.candidate import Design
from selector.limits import LIMITS
from selector.search.assess import chain_of, stopped_at, uses_of
from selector.search.bank import bank_of
from selector.search.objective import LargestUse, score_of
from selector.search.shelf import shelf_of
from selector.search.standing import rank_of

if TYPE_CHECKING:
    from collections.abc import Iterator, Mapping

    from selector.candidate.chain import Chain
    from selector.parts import Part
    from selector.search.shelf import Shelf
    from selector.search.standing import Rank
    from selector.spec import Spec

PLACES = {limit.name: place for place, limit in enumerate(LIMITS)}
RANKED = frozenset({"power", "burden", "headroom", "error"})


def designs(shelf: Shelf) -> Iterator[Design]:
    """Yield every combination of a shelf, without its filter."""
    for shunt, amplifier in product(shelf.shunts, shelf.amplifiers):
        law = Design((shunt,), amplifier, None, None, None).law
        for count in range(1, (shelf.conditions.ranges_most if law.switchable else 1) + 1):
            for switch in shelf.switches if count > 1 else (None,):
                for common in shelf.resistors if law.common_name else (None,):
                    each = product(shelf.resistors, repeat=count) if law.switched_name else ((),)
                    for gain in each:
                        yield Design((shunt,), amplifier, switch, common, tuple(gain) or None)


def walked(spec: Spec, stock: Mapping[str, tuple[Part, ...]], *, variants: bool = False) -> list[tuple[Rank, Chain]]:
    """Return every combination that meets all limits in its order; the best of each pair unless `variants`."""
    shelf = shelf_of(spec, stock)
    bank = bank_of(shelf.conditions, shelf.resistors, shelf.capacitors)
    score = score_of(spec)
    best: dict[object, tuple[Rank, Chain]] = {}
    for design in designs(shelf):
        chain = stopped_at(chain_of(shelf.conditions, design), bank)
        if isinstance(chain, str):
            continue
        uses = uses_of(chain)
        rank = rank_of(float(score.of(uses.power, uses.burden, uses.headroom, uses.error)), chain.design)
        key: object = rank[2] if variants else rank[2][:2]
        if key not in best or rank < best[key][0]:
            best[key] = (rank, chain)
    return sorted(best.values(), key=lambda row: row[0])


def blocked(spec: Spec, stock: Mapping[str, tuple[Part, ...]]) -> dict[str, int]:
    """Return the pairs by the furthest limit at which one of their combinations stops."""
    shelf = shelf_of(spec, stock)
    bank = bank_of(shelf.conditions, shelf.resistors, shelf.capacitors)
    furthest: dict[tuple[str, str], int] = {}
    for design in designs(shelf):
        stop = stopped_at(chain_of(shelf.conditions, design), bank)
        assert isinstance(stop, str)
        pair = (design.shunts[0].part, design.amplifier.part)
        furthest[pair] = max(furthest.get(pair, 0), PLACES[stop])
    counts: dict[str, int] = {}
    for place in sorted(furthest.values()):
        counts[LIMITS[place].name] = counts.get(LIMITS[place].name, 0) + 1
    return counts


def nearest(spec: Spec, stock: Mapping[str, tuple[Part, ...]]) -> Rank | None:
    """Return the combination with the smallest largest use, the four ranked limits lifted."""
    shelf = shelf_of(spec, stock)
    bank = bank_of(shelf.conditions, shelf.resistors, shelf.capacitors)
    ranks = []
    for design in designs(shelf):
        chain = stopped_at(chain_of(shelf.conditions, design), bank, RANKED)
        if not isinstance(chain, str):
            uses = uses_of(chain)
            figure = float(LargestUse().of(uses.power, uses.burden, uses.headroom, uses.error))
            ranks.append(rank_of(figure, chain.design))
    return min(ranks) if ranks else None
