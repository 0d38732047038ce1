"""Small catalogues in which the filter that a design takes hangs on stock or on the cost limit, from a seed."""

from __future__ import annotations

from random import Random
from typing import TYPE_CHECKING

from selector.search.bank import bank_of
from selector.search.shelf import shelf_of
from tests.search.lines import LOOSE
from tests.search.middling_catalogue import GOOD
from tests.search.random_catalogue import catalogue

if TYPE_CHECKING:
    from selector.candidate.chain import Chain
    from selector.parts import Part
    from selector.search.bank import FilterBank
    from selector.spec import Spec
    from tests.search.random_parts import Fields

PLENTY = 99


def scarce(seed: int) -> tuple[Spec, dict[str, tuple[Part, ...]]]:
    """Return a spec and a catalogue that is short of resistors, or whose parts cost as much as is allowed, or both.

    Any of its few resistors may set the gain and stand in the filter.
    """
    random = Random(seed)
    by_stock, by_cost = seed % 3 != 0, seed % 3 != 1
    changes: Fields = LOOSE | {
        "ranges.most": random.choice([1, 2, 2, 3]),
        "filter.resistance_max": 1e6,
        "parts.from": "stock" if by_stock else "all",
        "parts.boards": random.choice([1, 1, 2]),
        "limits.cost": random.choice([1.6, 2.0, 2.5, 3.0]) if by_cost else None,
    }
    spec, stock = catalogue(seed, resistors=(3, 4), changes=changes)
    return spec, {kind: tuple(_drawn(random, part) for part in parts) for kind, parts in stock.items()}


def _drawn(random: Random, part: Part) -> Part:
    """Return a part with a number in stock and a cost; of resistors there are few, and some cost much."""
    if part.kind == "resistor":
        return part.model_copy(
            update={"quantity": random.choice([1, 2, 2, 3, 4]), "unit_cost": random.choice([0.1, 0.1, 0.3, 0.6, 0.9])}
        )
    known: Fields = {"quantity": PLENTY, "unit_cost": random.choice([0.1, 0.2, 0.4])}
    return part.model_copy(update=known | (GOOD if part.kind == "amplifier" else {}))


def bank_for(spec: Spec, stock: dict[str, tuple[Part, ...]]) -> FilterBank:
    """Return the filters of a catalogue."""
    shelf = shelf_of(spec, stock)
    return bank_of(shelf.conditions, shelf.resistors, shelf.capacitors)


def deprived(bank: FilterBank, chain: Chain) -> bool:
    """Return whether a combination has another filter than any number of parts at any cost would give it."""
    free = bank.choose(chain.ranges, None)
    design = chain.design
    return isinstance(free, int) and bank.pair(free) != (design.filter_resistor, design.filter_capacitor)
