"""What there is to enumerate: the parts of every combination, by their places on the shelf.

A shelf is sorted by the codes of its parts, so that places compare as part names do, and no part comes first.
"""

from __future__ import annotations

from dataclasses import dataclass
from itertools import product
from math import ceil
from typing import TYPE_CHECKING

import numpy as np

from selector.candidate import Design
from selector.candidate.design import cost_or_inf, in_stock
from selector.gain import LAWS

if TYPE_CHECKING:
    from collections.abc import Iterator, Sequence

    from numpy.typing import NDArray

    from selector.parts import Resistor
    from selector.search.shelf import Shelf

    Places = NDArray[np.int64]
    Numbers = NDArray[np.float64]

NONE = -1  # the place of a part that a combination does without
CHUNK = 1 << 14  # combinations that are judged at once


@dataclass(frozen=True, slots=True)
class Frame:
    """Shunt, amplifier and range switch by their places on the shelf, and a number of ranges."""

    shunt: int
    amplifier: int
    switch: int
    count: int

    def design(self, shelf: Shelf) -> Design:
        """Return the parts without gain resistors and filter."""
        switch = None if self.switch == NONE else shelf.switches[self.switch]
        return Design((shelf.shunts[self.shunt],), shelf.amplifiers[self.amplifier], switch, None, None)


def frames(shelf: Shelf) -> Iterator[Frame]:
    """Yield every frame of a shelf."""
    for shunt, (place, amplifier) in product(range(len(shelf.shunts)), enumerate(shelf.amplifiers)):
        most = shelf.conditions.ranges_most if LAWS[amplifier.gain_law].switchable else 1
        for count in range(1, most + 1):
            for switch in range(len(shelf.switches)) if count > 1 else (NONE,):
                yield Frame(shunt, place, switch, count)


def networks(shelf: Shelf, frame: Frame) -> Iterator[Places]:
    """Yield every gain network of a frame, in chunks of the shape (1 + ranges, networks).

    Row 0 holds the places of the common resistors, row k those of the resistor of range k.
    """
    law = frame.design(shelf).law
    rows = 0 if law.switched_name is None else frame.count + (law.common_name is not None)
    total = len(shelf.resistors) ** rows
    for start in range(0, total, CHUNK):
        numbers = np.arange(start, min(start + CHUNK, total))
        network = np.full((1 + frame.count, len(numbers)), NONE)
        for row in range(frame.count, frame.count - rows, -1):
            numbers, network[row] = np.divmod(numbers, len(shelf.resistors))
        yield network


def costs(resistors: Sequence[Resistor]) -> Numbers:
    """Return the cost of each resistor, infinite where it is not known, and last that of none."""
    return np.array([*map(cost_or_inf, resistors), 0.0])


def cost_of_each(shelf: Shelf, frame: Frame, network: Places) -> Numbers:
    """Return the cost of every combination without its filter, summed in the order of the bill."""
    design = frame.design(shelf)
    each = costs(shelf.resistors)
    total = 0.0 + cost_or_inf(design.shunts[0]) + cost_or_inf(design.amplifier)
    if design.switch is not None:
        total += ceil(frame.count / design.switch.channels) * cost_or_inf(design.switch)
    cost = np.full(network.shape[1], total)
    for row in network:
        cost = cost + design.law.copies * each[row]
    return cost


def pieces_of_each(shelf: Shelf, frame: Frame, network: Places) -> Places:
    """Return how many pieces of every resistor every gain network takes, of the shape (networks, resistors)."""
    there = np.arange(len(shelf.resistors))
    standing = sum((row[:, np.newaxis] == there).astype(np.int64) for row in network)
    return np.asarray(frame.design(shelf).law.copies * standing)


def switches_suffice(shelf: Shelf, frame: Frame) -> bool:
    """Return whether the stock holds the switches that all boards take."""
    switch = frame.design(shelf).switch
    if switch is None or not shelf.conditions.stock_only:
        return True
    return shelf.conditions.boards * ceil(frame.count / switch.channels) <= in_stock(switch)
