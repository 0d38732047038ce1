"""Best first: whatever could still hold the smallest figure is looked into next, until nothing can enter the list.

Every piece of work carries a bound that none of its combinations undercuts; pieces of one sort are worked on side by
side, as rows of arrays. A piece is dropped only when its bound lies above what the list would still take.
Combinations are placed by the plain figures of `assess`, never by the arrays that found them.
"""

from __future__ import annotations

from collections.abc import Callable
from math import inf

from selector.search.assess import chain_of, stopped_at, uses_of
from selector.search.bench import Bench
from selector.search.chains import Chains, Path
from selector.search.order import NEARLY, rounded
from selector.search.piece import Piece, Stage
from selector.search.prices import gain_budget
from selector.search.queue import Queue
from selector.search.stages import Stages
from selector.search.standing import PairKey, Standing

ROUNDING = 1e-12  # how far a figure of the arrays may be from the plain one, relative
# How far above its best chain a row is looked into, step by step; figures within the first may count as equal.
FACTORS = (1.0 + 1.2e-11, 1.0 + 1e-9, 1.0 + 1e-6, 1.0 + 1e-5, 1.0 + 1e-4, 1.001, 1.01, 1.1, inf)

EVALUATED = "evaluated"  # combinations judged in full

Progress = Callable[[int, int], None]


class Engine:
    """One search over a bench."""

    def __init__(self, bench: Bench, standing: Standing, progress: Progress | None = None) -> None:
        """Set up a search that fills a list."""
        self._bench = bench
        self._standing = standing
        self._progress = progress
        self._first_only = False

    def run(self, pairs: frozenset[PairKey] | None = None, *, first_only: bool = False) -> None:
        """Search all pairs or some; with `first_only` each until one combination of it is found."""
        self._first_only = first_only
        stages = Stages(self._bench)
        queue = Queue(self._most)
        queue.put(stages.pairs(pairs))
        total, told = queue.pairs(), 0
        while batch := queue.take():
            if batch[0].stage is Stage.CHAINS:
                for piece in batch:
                    self._look(stages, piece)
            else:
                queue.put(stages.advance(batch, self._most))
            done = total - queue.pairs()
            if self._progress is not None and done > told:
                told = done
                self._progress(done, total)

    def _most(self, pair: PairKey) -> float:
        """Return the figure above which no further combination of a pair can enter the list."""
        if self._first_only:
            return -inf if self._standing.holds(pair) else inf
        return self._standing.most(pair) * NEARLY

    def _look(self, stages: Stages, piece: Piece) -> None:
        """Judge the chains of a row: first those of its least figure, in their order, then further ones by steps."""
        line, solved = stages.solved(piece)
        cost_most = gain_budget(self._bench, line, piece.lane.cost_most)
        chains = Chains(self._bench, line, solved, piece.lane, stages.fixed_cost(piece))
        least, floor = float(solved.least[0]), -inf
        if cost_most < inf:
            least = chains.least(self._most(piece.pair), cost_most)
        ordered = not self._standing.variants and not piece.doubtful and piece.range_count > 1
        for factor in FACTORS:
            upto = min(least * factor, self._most(piece.pair))
            if upto <= floor or least > self._most(piece.pair):
                return
            paths = chains.up_to(upto, floor, cost_most, ordered=not self._first_only)
            if floor > -inf:
                paths = iter(sorted(paths, key=lambda path: path.figure))
            for path in paths:
                placed = self._judge(stages, piece, path)
                if (placed and ordered and self._leads(piece, least)) or least > self._most(piece.pair):
                    return
            floor = upto

    def _leads(self, piece: Piece, least: float) -> bool:
        """Return whether what a combination of the pair must beat counts as equal to the least figure, or as better."""
        rival = self._standing.to_beat(piece.pair)
        return rival is not None and rival.rank[0] <= rounded(least)

    def _judge(self, stages: Stages, piece: Piece, path: Path) -> bool:
        """Judge a chain in full and place it; return whether it was placed or could not have been the better one."""
        if self._hopeless(piece, path.figure):
            return not piece.doubtful
        self._bench.counts[EVALUATED] += 1
        design = stages.design(piece, path.switched)
        chain = stopped_at(chain_of(self._bench.conditions, design), self._bench.bank, self._bench.lifted)
        if isinstance(chain, str):
            return False
        figure = 0.0
        if self._bench.needs_filter:
            uses = uses_of(chain)
            figure = float(self._bench.objective.of(uses.power, uses.burden, uses.headroom, uses.error))
        self._standing.add(piece.pair, figure, chain)
        return True

    def _hopeless(self, piece: Piece, figure: float) -> bool:
        """Return whether a combination certainly comes after the one it must beat."""
        rival = self._standing.to_beat(piece.pair)
        return rival is not None and rounded(figure * (1.0 - ROUNDING)) > rival.rank[0]
