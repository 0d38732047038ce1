"""The parts of a shelf as arrays, and combinations with one range as places in them."""

from __future__ import annotations

from collections.abc import Iterator, Sequence
from dataclasses import dataclass
from typing import TypeVar

import numpy as np
from numpy.typing import NDArray

from selector.candidate import Design
from selector.candidate.design import cost_or_inf, in_stock
from selector.candidate.figures import (
    NO_RESISTOR,
    FilterFigures,
    ResistorFigures,
    ShuntFigures,
    filter_figures,
    resistor_figures,
    shunt_figures,
)
from selector.gain import LAWS
from selector.parts import Amplifier, Capacitor, Part, Resistor
from selector.search.order import cost_key, rounded
from selector.search.shelf import Shelf
from selector.search.stacks import stacked, taken

Places = NDArray[np.int64]
Numbers = NDArray[np.float64]
Figures = TypeVar("Figures", ShuntFigures, ResistorFigures, FilterFigures)


@dataclass(frozen=True, slots=True)
class Arrays:
    """Figures, pieces and costs of every part of a shelf; filter pairs stand in the order in which ties are broken."""

    shelf: Shelf
    filters: tuple[tuple[Resistor, Capacitor], ...]
    filter_resistor: Places
    filter_capacitor: Places
    shunt_figures: ShuntFigures
    resistor_figures: ResistorFigures
    filter_figures: FilterFigures
    held_resistors: Numbers
    held_capacitors: Numbers
    shunt_costs: Numbers
    resistor_costs: Numbers
    capacitor_costs: Numbers


@dataclass(frozen=True, slots=True)
class Rows:
    """Combinations of one amplifier as places of their parts: every filter pair beside each of some designs."""

    arrays: Arrays
    amplifier: Amplifier
    shunt: Places
    common: Places
    gain: Places
    pair: Places

    def shunts(self) -> ShuntFigures:
        """Return the figures of the shunts."""
        return taken(self.arrays.shunt_figures, self.shunt)

    def commons(self) -> ResistorFigures:
        """Return the figures of the common resistors."""
        has = LAWS[self.amplifier.gain_law].common_name is not None
        return taken(self.arrays.resistor_figures, self.common) if has else NO_RESISTOR

    def gains(self) -> ResistorFigures:
        """Return the figures of the gain resistors."""
        has = LAWS[self.amplifier.gain_law].switched_name is not None
        return taken(self.arrays.resistor_figures, self.gain) if has else NO_RESISTOR

    def filters(self) -> FilterFigures:
        """Return the figures of the filters."""
        return taken(self.arrays.filter_figures, self.pair)

    def design(self, row: int) -> Design:
        """Return the parts of a combination."""
        shelf, law = self.arrays.shelf, LAWS[self.amplifier.gain_law]
        return Design(
            (shelf.shunts[self.shunt[row]],),
            self.amplifier,
            None,
            shelf.resistors[self.common[row]] if law.common_name else None,
            (shelf.resistors[self.gain[row]],) if law.switched_name else None,
            *self.arrays.filters[self.pair[row]],
        )


def arrays_of(shelf: Shelf) -> Arrays:
    """Return the parts of a shelf as arrays."""
    places = [(r, c) for r in range(len(shelf.resistors)) for c in range(len(shelf.capacitors))]
    places.sort(key=lambda place: _order(shelf.resistors[place[0]], shelf.capacitors[place[1]]))
    filters = tuple((shelf.resistors[r], shelf.capacitors[c]) for r, c in places)
    return Arrays(
        shelf,
        filters,
        np.array([r for r, _ in places], dtype=np.int64),
        np.array([c for _, c in places], dtype=np.int64),
        stacked([shunt_figures(part) for part in shelf.shunts]),
        stacked([resistor_figures(part) for part in shelf.resistors]),
        stacked([filter_figures(*pair) for pair in filters]),
        *(np.array([in_stock(part) for part in parts], dtype=float) for parts in (shelf.resistors, shelf.capacitors)),
        *(_costs(parts) for parts in (shelf.shunts, shelf.resistors, shelf.capacitors)),
    )


def rows_of(arrays: Arrays, amplifier: Amplifier, most: int) -> Iterator[Rows]:
    """Yield all combinations of an amplifier, about `most` at once."""
    shelf, law = arrays.shelf, LAWS[amplifier.gain_law]
    commons = len(shelf.resistors) if law.common_name else 1
    gains = len(shelf.resistors) if law.switched_name else 1
    shape, pairs = (len(shelf.shunts), commons, gains), len(arrays.filters)
    count, step = len(shelf.shunts) * commons * gains, max(1, most // pairs)
    for first in range(0, count, step):
        designs = np.arange(first, min(first + step, count))
        shunt, common, gain = np.unravel_index(np.repeat(designs, pairs), shape)
        yield Rows(arrays, amplifier, shunt, common, gain, np.tile(np.arange(pairs), len(designs)))


def _order(resistor: Resistor, capacitor: Capacitor) -> tuple[float, tuple[bool, float], str, str]:
    """Return the key by which ties between filters of one corner are broken."""
    known = resistor.unit_cost is not None and capacitor.unit_cost is not None
    cost = (resistor.unit_cost or 0.0) + (capacitor.unit_cost or 0.0) if known else None
    return -rounded(resistor.resistance), cost_key(cost), resistor.part, capacitor.part


def _costs(parts: Sequence[Part]) -> Numbers:
    return np.array([cost_or_inf(part) for part in parts])
