"""What is done with pieces of one sort, side by side: each becomes finer ones with better bounds."""

from __future__ import annotations

from collections.abc import Callable, Iterator
from dataclasses import replace
from math import inf, isfinite

import numpy as np
from numpy.typing import NDArray

from selector.candidate import Design, cost_of
from selector.candidate.elementwise import stated
from selector.candidate.figures import NO_RESISTOR
from selector.candidate.uses import idle_power_w
from selector.parts import Amplifier, Shunt
from selector.search.bench import Bench
from selector.search.boxes import bounds
from selector.search.cells import Cells
from selector.search.chains import UNKNOWN
from selector.search.interval import lower
from selector.search.lots import NONE, Family, Lot, Stock
from selector.search.piece import Piece, Stage
from selector.search.rows import Line
from selector.search.screen import FREE, Screen, cheapest, design_stands
from selector.search.solve import Solved, solve
from selector.search.split import lanes_of
from selector.search.standing import PairKey

Numbers = NDArray[np.float64]
Most = Callable[[PairKey], float]
COARSE = (10, 8)
FINE = (40, 24)
SINGLE = (1, 64)  # with one range, whose gain alone decides
PARTS = (32, 8, 1)  # most common resistors in a block, level by level


class Stages:
    """The steps of a search over a bench."""

    def __init__(self, bench: Bench) -> None:
        """Set up the screen and the cells."""
        self._bench = bench
        headroom = bench.holds_headroom
        self._coarse = Cells(bench.conditions, *COARSE, holds_headroom=headroom)
        self._fine = Cells(bench.conditions, *FINE, holds_headroom=headroom)
        self._single = Cells(bench.conditions, *SINGLE, holds_headroom=headroom)
        self._others = cheapest(bench)
        self._screen = None if bench.stock is None else Screen(bench, bench.stock, bench.limits)
        self._switches = np.empty(0, dtype=np.int64) if self._screen is None else self._screen.switches()

    def pairs(self, wanted: frozenset[PairKey] | None) -> Iterator[Piece]:
        """Yield every pair with every number of ranges that meets the held limits without a resistor."""
        bench, stock = self._bench, self._bench.stock
        if stock is None or self._screen is None or (bench.needs_filter and bench.ladder is None):
            return
        for number, family in enumerate(stock.families):
            if family.law.switched_name is not None and not len(bench.resistors):
                continue
            for count in range(1, bench.conditions.ranges_most + 1):
                if count > 1 and not (family.law.switchable and len(self._switches)):
                    continue
                shunts, amplifiers = np.nonzero(self._screen.pairs(family, count))
                if not len(shunts):
                    continue
                commons = () if family.law.common_name is None else tuple(range(len(bench.resistors)))
                idle = self._idle(Lot(stock, family, count, shunts, amplifiers, None, self._switches))
                for shunt, amplifier, bound in zip(shunts, amplifiers, idle, strict=True):
                    pair = (bench.shelf.shunts[shunt].part, family.amplifiers[amplifier].part)
                    if wanted is None or pair in wanted:
                        yield Piece(
                            Stage.PAIR, pair, float(bound), number, count, int(shunt), int(amplifier), NONE, commons
                        )

    def _idle(self, lot: Lot) -> Numbers:
        """Return the figure of each pair with nothing but its power at rest and its burden."""
        pairing = lot.pairing()
        power = lower(idle_power_w(pairing) / pairing.conditions.power_limit_w)
        burden = lower(pairing.burden_v / pairing.conditions.burden_limit_v)
        nothing = np.zeros(power.shape)
        return np.broadcast_to(self._bench.figure(power, burden, nothing, nothing), (len(lot), 1))[:, 0]

    def advance(self, batch: list[Piece], most: Most) -> Iterator[Piece]:
        """Yield what pieces of one sort become."""
        work = {
            Stage.PAIR: self._pairs,
            Stage.FRAMES: self._frames,
            Stage.BLOCKS: self._blocks,
            Stage.ROW: self._rows,
            Stage.SPLIT: self._split,
            Stage.LANE: self._rows,
        }
        yield from work[batch[0].stage](batch, most)

    def _lot(self, batch: list[Piece]) -> Lot:
        first = batch[0]
        shunt, amplifier, switch = (
            np.array([getattr(piece, name) for piece in batch]) for name in ("shunt", "amplifier", "switch")
        )
        family = self._family(first.family)
        return Lot(
            self._stock(),
            family,
            first.range_count,
            shunt,
            amplifier,
            None if first.stage in (Stage.PAIR, Stage.BLOCKS) else switch,
            self._switches,
        )

    def _stock(self) -> Stock:
        if self._bench.stock is None:
            message = "there is no work without shunts and amplifiers"
            raise ValueError(message)
        return self._bench.stock

    def _family(self, place: int) -> Family:
        return self._stock().families[place]

    def _bounds(self, batch: list[Piece], cells: Cells) -> Numbers:
        """Return better bounds of pieces that are alike in what of them is settled."""
        if not self._bench.ordered:
            return np.array([piece.bound for piece in batch])
        lot = self._lot(batch)
        common = NO_RESISTOR
        if lot.family.law.common_name is not None:
            common = self._bench.resistors.of([np.array(piece.commons) for piece in batch])
        if lot.range_count == 1 and cells is self._fine:
            cells = self._single
        least = bounds(self._bench, lot, common, cells)
        return np.asarray(np.maximum(least, np.array([piece.bound for piece in batch])))

    def _pairs(self, batch: list[Piece], most: Most) -> Iterator[Piece]:
        """Yield the pairs with a bound of any switch and any common resistor."""
        for piece in self._better(batch, self._coarse, most):
            if isfinite(self._bench.conditions.cost_limit) and not self._affordable(piece):
                continue
            yield replace(piece, stage=Stage.BLOCKS if len(piece.commons) > 1 else Stage.FRAMES)

    def _blocks(self, batch: list[Piece], most: Most) -> Iterator[Piece]:
        """Yield the pairs with some of their common resistors, each block with the bound of any switch."""
        blocks = [replace(piece, commons=part) for piece in batch for part in self._parted(piece.commons)]
        for piece in self._better(blocks, self._fine, most):
            yield replace(piece, stage=Stage.FRAMES) if len(piece.commons) == 1 else piece

    def _frames(self, batch: list[Piece], most: Most) -> Iterator[Piece]:
        """Yield the pairs, each with a common resistor where its law has one, with each switch."""
        switches = [int(one) for one in self._switches] if batch[0].range_count > 1 else [NONE]
        frames = [replace(piece, stage=Stage.ROW, switch=switch) for piece in batch for switch in switches]
        for piece in self._better(frames, self._fine, most):
            if self._affordable(piece):
                yield piece

    def _better(self, batch: list[Piece], cells: Cells, most: Most) -> list[Piece]:
        """Return the pieces that are still of use with better bounds."""
        if not batch:
            return []
        each = zip(batch, self._bounds(batch, cells), strict=True)
        return [replace(piece, bound=float(bound)) for piece, bound in each if bound <= most(piece.pair)]

    def _parted(self, commons: tuple[int, ...]) -> Iterator[tuple[int, ...]]:
        """Yield common resistors in blocks of the next smaller size; first of all by what they add to an error."""
        whole_stock = len(commons) == len(self._bench.resistors)
        groups = (
            [tuple(int(one) for one in group) for group in self._bench.resistors.alike] if whole_stock else [commons]
        )
        size = next(size for size in PARTS if size < len(commons))
        for group in groups:
            for begin in range(0, len(group), size):
                yield group[begin : begin + size]

    def _affordable(self, piece: Piece) -> bool:
        """Return whether the settled parts meet the held limits on whole designs beside the cheapest other parts."""
        bench = self._bench
        if not bench.conditions.stock_only and bench.conditions.cost_limit == inf:
            return True
        law, (resistor, capacitor) = self._family(piece.family).law, self._others
        design = replace(
            self.design(piece, ()),
            common=resistor if law.common_name is not None else None,
            gain=(resistor,) * piece.range_count if law.switched_name is not None else None,
            filter_resistor=resistor,
            filter_capacitor=capacitor,
        )
        return design_stands(bench, design)

    def _parts(self, piece: Piece) -> tuple[Shunt, Amplifier]:
        return self._bench.shelf.shunts[piece.shunt], self._family(piece.family).amplifiers[piece.amplifier]

    def line(self, batch: list[Piece]) -> Line:
        """Return the rows of pieces."""
        return Line(self._lot(batch), np.array([piece.common for piece in batch]))

    def _rows(self, batch: list[Piece], most: Most) -> Iterator[Piece]:
        del most
        solved = solve(self._bench, self.line(batch), [piece.lane for piece in batch])
        final = not self._bench.needs_filter or batch[0].lane.step is not None
        for piece, bound in zip(batch, solved.least, strict=True):
            stage = Stage.CHAINS if final or piece.doubtful else Stage.SPLIT
            yield replace(piece, stage=stage, bound=max(piece.bound, float(bound)))

    def _split(self, batch: list[Piece], most: Most) -> Iterator[Piece]:
        for piece in batch:
            line, solved = self.solved(piece)
            for lane in lanes_of(self._bench, line, solved, most(piece.pair)):
                yield replace(piece, stage=Stage.LANE, lane=lane)

    def solved(self, piece: Piece) -> tuple[Line, Solved]:
        """Return the row of a piece, solved by itself."""
        line = self.line([piece])
        return line, solve(self._bench, line, [piece.lane])

    def fixed_cost(self, piece: Piece) -> float:
        """Return the cost of all parts of a piece but its gain resistors, UNKNOWN where one states none."""
        design, step, ladder = self._bare(piece), piece.lane.step, self._bench.ladder
        if step is not None and step.ndim == 0 and ladder is not None:
            resistor, capacitor = self._bench.bank.pair(int(ladder.places[step]))
            design = replace(design, filter_resistor=resistor, filter_capacitor=capacitor)
        return stated(cost_of(design), UNKNOWN)

    def _bare(self, piece: Piece) -> Design:
        """Return the design of a piece with gain resistors that cost nothing."""
        return replace(self.design(piece, ()), gain=(FREE,) * piece.range_count)

    def design(self, piece: Piece, switched: tuple[int, ...]) -> Design:
        """Return the design of a piece with its gain resistors, the filter still open."""
        parts = self._bench.resistors.parts
        shunt, amplifier = self._parts(piece)
        return Design(
            (shunt,),
            amplifier,
            None if piece.switch == NONE else self._bench.shelf.switches[piece.switch],
            None if piece.common == NONE else parts[piece.common],
            None if not switched or switched[0] == NONE else tuple(parts[one] for one in switched),
        )
