"""The work that waits, by its bounds; what is of one sort is taken together."""

from __future__ import annotations

import heapq
from collections import Counter
from collections.abc import Callable, Iterable
from itertools import count

from selector.search.piece import Piece, Stage
from selector.search.standing import PairKey

AT_ONCE = {
    Stage.PAIR: 512,
    Stage.FRAMES: 16,
    Stage.BLOCKS: 16,
    Stage.ROW: 24,
    Stage.SPLIT: 8,
    Stage.LANE: 24,
    Stage.CHAINS: 1,
}
_ORDER = {stage: place for place, stage in enumerate(Stage)}
Sort = tuple[Stage, int, int, bool]


class Queue:
    """Pieces by sort, each sort a heap; `most` tells the figure above which a piece of a pair is of no use."""

    def __init__(self, most: Callable[[PairKey], float]) -> None:
        """Begin empty."""
        self._most = most
        self._heaps: dict[Sort, list[tuple[float, int, Piece]]] = {}
        self._number = count()
        self._waiting: Counter[PairKey] = Counter()
        self._pairs = 0

    def put(self, pieces: Iterable[Piece]) -> None:
        """Add pieces that could still be of use."""
        for piece in pieces:
            if piece.bound < float("inf") and piece.bound <= self._most(piece.pair):
                sort = (piece.stage, piece.family, piece.range_count, piece.lane.step is not None)
                heapq.heappush(self._heaps.setdefault(sort, []), (piece.bound, next(self._number), piece))
                self._pairs += not self._waiting[piece.pair]
                self._waiting[piece.pair] += 1

    def pairs(self) -> int:
        """Return how many pairs still have work."""
        return self._pairs

    def take(self) -> list[Piece]:
        """Take the most promising piece and others of its sort; nothing where no piece is of use."""
        while True:
            sort = min(
                (sort for sort, heap in self._heaps.items() if heap),
                key=lambda one: (self._heaps[one][0][0], -_ORDER[one[0]]),
                default=None,
            )
            if sort is None:
                return []
            heap = self._heaps[sort]
            batch: list[Piece] = []
            while heap and len(batch) < AT_ONCE[sort[0]]:
                bound, _, piece = heapq.heappop(heap)
                self._waiting[piece.pair] -= 1
                self._pairs -= not self._waiting[piece.pair]
                if bound <= self._most(piece.pair):
                    batch.append(piece)
            if batch:
                return batch
