"""Best first: whatever could still hold the smallest figure is looked into next, until nothing can enter the list.

Every piece of work carries a bound that none of its combinations undercuts: a pair by its power and burden, a
common resistor by its best first and best last range, then by its best chain. A piece is dropped only when its bound
lies above what the list would still take. Combinations are placed by the plain figures of `assess`, never by
the arrays that found them.
"""

from __future__ import annotations

import heapq
from collections import Counter
from collections.abc import Callable, Iterator
from dataclasses import dataclass, replace
from itertools import count
from math import inf

import numpy as np

from selector.candidate import Design
from selector.candidate.chain import Chain
from selector.candidate.uses import idle_power_w
from selector.parts import Amplifier, Shunt
from selector.search.assess import chain_of, stopped_at, uses_of
from selector.search.bench import Bench
from selector.search.cells import cells_of, over
from selector.search.drafts import Draft, draft_of
from selector.search.frames import Frame, frames_of
from selector.search.layers import Layers, Paths
from selector.search.nodes import NONE
from selector.search.order import NEARLY, rounded
from selector.search.standing import PairKey, Standing, rank_of

ROUNDING = 1e-13  # how far a figure of the arrays may be from the plain one, relative
STEPS = (1.0, 1.0005, 1.002, 1.01, 1.05, 1.25)  # how far above its best chain a common resistor is looked into

EVALUATED = "evaluated"  # combinations judged in full

Progress = Callable[[int, int], None]


@dataclass(frozen=True, slots=True)
class Piece:
    """Work on a pair, with what is known of it: a frame, then its draft, a cell of it, a common resistor's chains."""

    pair: PairKey
    frame: Frame
    draft: Draft | None = None
    cell: Draft | None = None
    place: int = 0  # of the common resistor that comes next in the cell
    layers: Layers | None = None
    least: float = inf
    looked: float = -inf  # chains up to this figure are done
    step: int = 0


class Engine:
    """One search over a bench."""

    def __init__(self, bench: Bench, standing: Standing, progress: Progress | None = None) -> None:
        """Set up a search that fills a list."""
        self._bench = bench
        self._standing = standing
        self._progress = progress
        self._queue: list[tuple[float, int, Piece]] = []
        self._number = count()
        self._first_only = False

    def run(self, pairs: list[tuple[Shunt, Amplifier]], *, first_only: bool = False) -> None:
        """Search the pairs; with `first_only` until one combination is found."""
        self._first_only = first_only
        for shunt, amplifier in pairs:
            for frame in frames_of(self._bench, shunt, amplifier):
                self._push(self._idle(frame), Piece((shunt.part, amplifier.part), frame))
        waiting = Counter(piece.pair for _, _, piece in self._queue)
        total = len(waiting)
        while self._queue:
            bound, _, piece = heapq.heappop(self._queue)
            if bound <= self._most(piece.pair):
                self._advance(piece)
            if piece.draft is None and self._progress is not None:
                waiting[piece.pair] -= 1
                self._progress(sum(1 for frames in waiting.values() if not frames), total)
            if self._found():
                return

    def _found(self) -> bool:
        return self._first_only and bool(self._standing.best())

    def _most(self, pair: PairKey) -> float:
        return self._standing.most(pair) * NEARLY

    def _push(self, bound: float, piece: Piece) -> None:
        if bound < inf and bound <= self._most(piece.pair):
            heapq.heappush(self._queue, (bound, next(self._number), piece))

    def _idle(self, frame: Frame) -> float:
        """Return the figure of a pair with nothing but its power at rest and its burden."""
        power = np.array([float(idle_power_w(frame.pairing)) / self._bench.conditions.power_limit_w])
        nothing = np.zeros(1)
        return float(self._bench.figure(power, frame.burden, nothing, nothing)[0])

    def _advance(self, piece: Piece) -> None:
        if piece.layers is not None:
            self._look(piece)
        elif piece.cell is not None:
            self._open(piece, piece.cell)
        elif piece.draft is not None:
            for cell in cells_of(self._bench, piece.draft):
                self._push(float(cell.bound[0]), replace(piece, cell=cell))
        else:
            draft = draft_of(self._bench, piece.frame)
            if draft is not None:
                self._push(float(draft.bound[0]), replace(piece, draft=draft))

    def _open(self, piece: Piece, cell: Draft) -> None:
        """Solve the next common resistor of a cell, and leave the rest of the cell in the queue."""
        if piece.place + 1 < len(cell.bound):
            self._push(float(cell.bound[piece.place + 1]), replace(piece, place=piece.place + 1))
        layers = over(self._bench, cell, int(cell.commons[piece.place]))
        least = layers.least()
        self._push(least, replace(piece, layers=layers, least=least))

    def _look(self, piece: Piece) -> None:
        """Judge the chains of a common resistor up to the next step above its best one."""
        if piece.layers is None or piece.cell is None:
            return
        most = self._most(piece.pair)
        reach = max(piece.least, 0.0) * STEPS[piece.step] * NEARLY if piece.step < len(STEPS) else inf
        upto = min(reach, most)
        paths = piece.layers.up_to(upto)
        for figure, design in self._designs(piece.cell, int(piece.cell.commons[piece.place]), paths, piece.looked):
            self._judge(piece, figure, design)
            if self._found():
                return
        if upto < self._most(piece.pair) and reach < inf:
            self._push(upto, replace(piece, looked=upto, step=piece.step + 1))

    def _designs(self, cell: Draft, common: int, paths: Paths, looked: float) -> Iterator[tuple[float, Design]]:
        """Yield the designs of chains above what was looked at, by figure, cost and names where the order counts."""
        fresh = np.flatnonzero(paths.figure > looked)
        rows = (
            (float(paths.figure[index]), self._design(cell, common, [int(one) for one in paths.switched[index]]))
            for index in fresh
        )
        yield from rows if self._first_only else sorted(rows, key=lambda row: rank_of(*row))

    def _design(self, cell: Draft, common: int, switched: list[int]) -> Design:
        shelf, frame = self._bench.shelf, cell.frame
        pair = None if cell.filter is None else self._bench.bank.pairs[cell.filter]
        return Design(
            (frame.shunt,),
            frame.amplifier,
            frame.switch,
            None if common == NONE else shelf.resistors[common],
            None if switched[0] == NONE else tuple(shelf.resistors[one] for one in switched),
            None if pair is None else pair[0],
            None if pair is None else pair[1],
        )

    def _judge(self, piece: Piece, figure: float, design: Design) -> None:
        if piece.cell is None or self._hopeless(piece.pair, figure, design, exact=piece.cell.filter is not None):
            return
        self._bench.counts[EVALUATED] += 1
        open_design = replace(design, filter_resistor=None, filter_capacitor=None)
        chain = stopped_at(chain_of(self._bench.conditions, open_design), self._bench.bank, self._bench.lifted)
        if isinstance(chain, str):
            return
        self._standing.add(piece.pair, self._figure(chain), chain)

    def _figure(self, chain: Chain) -> float:
        if not self._bench.needs_filter:
            return 0.0
        uses = uses_of(chain)
        return float(self._bench.objective.of(uses.power, uses.burden, uses.headroom, uses.error))

    def _hopeless(self, pair: PairKey, figure: float, design: Design, *, exact: bool) -> bool:
        """Return whether a combination certainly comes after the one it must beat."""
        rival = self._standing.to_beat(pair)
        if rival is None:
            return False
        low, high = rounded(figure * (1.0 - ROUNDING)), rounded(figure * (1.0 + ROUNDING))
        if low > rival.rank[0]:
            return True
        return exact and low == high == rival.rank[0] and rank_of(figure, design) >= rival.rank
