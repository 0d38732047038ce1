"""A piece of work: a part of the combinations of one pair, with a bound on their figures."""

from __future__ import annotations

from dataclasses import dataclass
from enum import Enum

from selector.search.lots import NONE
from selector.search.solve import Lane
from selector.search.standing import PairKey

EVERYTHING = Lane()


class Stage(Enum):
    """What is done next with a piece."""

    PAIR = "a pair with a number of ranges, any switch"
    BLOCKS = "a pair with a number of ranges, to be taken apart by common resistor"
    FRAMES = "a pair with a number of ranges and a common resistor, to be taken apart by switch"
    ROW = "a frame with one common resistor"
    SPLIT = "a row, to be taken apart by filter"
    LANE = "a row with one filter"
    CHAINS = "a row that is solved, its chains to be judged"


@dataclass(frozen=True, slots=True)
class Piece:
    """Places of the parts that are settled; `commons` holds those that may be its common resistor."""

    stage: Stage
    pair: PairKey
    bound: float
    family: int
    range_count: int
    shunt: int
    amplifier: int
    switch: int = NONE
    commons: tuple[int, ...] = ()
    lane: Lane = EVERYTHING

    @property
    def common(self) -> int:
        """Return the common resistor of a row."""
        return self.commons[0] if self.commons else NONE

    @property
    def doubtful(self) -> bool:
        """Return whether the filter is chosen only when a design is judged."""
        return self.lane.doubtful
