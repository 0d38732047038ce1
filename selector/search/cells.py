"""The parts of a search over one pair: a number of ranges, a switch, and a filter that its ranges take."""

from __future__ import annotations

from collections.abc import Iterator
from dataclasses import dataclass, replace
from math import ceil, inf, isfinite

import numpy as np

from selector.candidate import Design, Operating, Pairing
from selector.candidate.chain import Chain
from selector.parts import Amplifier, Part, Shunt, Switch
from selector.search.assess import pairing_of
from selector.search.bench import Bench
from selector.search.filtering import StandIn, Stretch, stand_in, stretches
from selector.search.layers import Layers
from selector.search.nodes import (
    NONE,
    Indices,
    Judged,
    Nodes,
    Numbers,
    judged_nodes,
    links,
    nodes_of,
    pair_stands,
    top_use,
)
from selector.search.pick import picked

TWO = 2  # ranges that are all neighbours: there is none between the first and the last


@dataclass(frozen=True, slots=True)
class Frame:
    """What all combinations of a cell share."""

    shunt: Shunt
    amplifier: Amplifier
    switch: Switch | None
    range_count: int
    chain: Chain

    @property
    def pairing(self) -> Pairing:
        """Return the pair with its switch."""
        return self.chain.pairing

    @property
    def burden(self) -> float:
        """Return the use of the burden limit."""
        pairing = self.chain.pairing
        return float(pairing.burden_v / pairing.conditions.burden_limit_v)


@dataclass(frozen=True, slots=True)
class Cell:
    """The combinations of a frame whose ranges take one filter, by their common resistor.

    `filter` is the place of the filter in the bank, None where a stand-in bounds it from below. `bound` holds for
    each common resistor a figure that no combination with it can undercut.
    """

    frame: Frame
    filter: int | None
    first_use: Numbers
    layers: tuple[Judged, ...]
    commons: Indices
    bound: Numbers

    def over(self, bench: Bench, common: int) -> Layers:
        """Return the chains over one common resistor."""
        picks = [np.flatnonzero(layer.nodes.common == common) for layer in self.layers]
        kept: list[Judged] = []
        for place, (layer, index) in enumerate(zip(self.layers, picks, strict=True)):
            same = place > 0 and layer is self.layers[place - 1]
            kept.append(kept[-1] if same else layer.pick(index))
        return Layers(bench, self.frame.burden, self.first_use[picks[0]], tuple(kept))


class Cells:
    """Makes the cells of a pair; stand-ins are kept, since many pairs share them."""

    def __init__(self, bench: Bench) -> None:
        """Set up for one search."""
        self._bench = bench
        self._stand_ins: dict[tuple[str, ...], StandIn | None] = {}

    def frames(self, shunt: Shunt, amplifier: Amplifier) -> Iterator[Frame]:
        """Yield every number of ranges and switch with which the pair meets what needs no resistor."""
        for frame in self.every_frame(shunt, amplifier):
            if pair_stands(self._bench, frame.chain):
                yield frame

    def every_frame(self, shunt: Shunt, amplifier: Amplifier) -> Iterator[Frame]:
        """Yield every number of ranges that the law can have, with every switch."""
        shelf = self._bench.shelf
        for count in range(1, self._bench.conditions.ranges_most + 1):
            for switch in shelf.switches if count > 1 else (None,):
                frame = self._frame(shunt, amplifier, switch, count)
                if count == 1 or frame.pairing.amplifier.law.switchable:
                    yield frame

    def _frame(self, shunt: Shunt, amplifier: Amplifier, switch: Switch | None, count: int) -> Frame:
        bare = Design((shunt,), amplifier, switch, None, None)
        pairing = pairing_of(self._bench.conditions, bare, count)
        return Frame(shunt, amplifier, switch, count, Chain(bare, pairing, (), frozenset(), filtered=False))

    def of(self, frame: Frame) -> Iterator[Cell]:
        """Yield the cells of a frame."""
        if frame.pairing.window.span_v <= 0.0 and self._bench.limits:
            return
        last = nodes_of(self._bench, frame.pairing, last=True)
        inner = nodes_of(self._bench, frame.pairing, last=False) if frame.range_count > 1 else last
        if not len(last) or not len(inner):
            return
        if not self._bench.needs_filter:
            yield from self._cell(frame, None, None, inner, last)
        elif _alone(inner.at) and _alone(last.at):
            yield from self._by_filter(frame, inner, last)
        else:
            yield from self._by_stand_in(frame, inner, last)

    def _by_filter(self, frame: Frame, inner: Nodes, last: Nodes) -> Iterator[Cell]:
        doubtful: list[Indices] = []
        for stretch in stretches(self._bench, inner):
            if self._settled(frame, stretch.filter):
                yield from self._cell(frame, stretch.filter, stretch, inner, last)
            else:
                doubtful.append(stretch.nodes)
        if doubtful:
            only = Stretch(np.unique(np.concatenate(doubtful)), NONE)
            yield from self._by_stand_in(frame, inner, last, only)

    def _settled(self, frame: Frame, place: int) -> bool:
        """Return whether neither stock nor cost nor a last range with a larger swing can change the filter taken."""
        conditions, shelf = self._bench.conditions, self._bench.shelf
        resistor, capacitor = self._bench.bank.pairs[place]
        law = frame.pairing.amplifier.law
        pieces = 1 + law.copies * (frame.range_count + 1)
        if (
            "stock" in self._bench.held
            and conditions.stock_only
            and (resistor.quantity or 0) < conditions.boards * pieces
        ):
            return False
        if "headroom" not in self._bench.held and isfinite(conditions.settle_s):
            return False
        if "cost" not in self._bench.held or not isfinite(conditions.cost_limit):
            return True
        dearest = max((_cost(part) for part in shelf.resistors), default=0.0)
        network = law.copies * dearest * (frame.range_count + 1)
        switches = (
            0.0 if frame.switch is None else ceil(frame.range_count / frame.switch.channels) * _cost(frame.switch)
        )
        parts = (frame.shunt, frame.amplifier, resistor, capacitor)
        return network + switches + sum(_cost(part) for part in parts) <= conditions.cost_limit

    def _by_stand_in(self, frame: Frame, inner: Nodes, last: Nodes, only: Stretch | None = None) -> Iterator[Cell]:
        below = self._stand_in(frame, last=frame.range_count == 1)
        above = self._stand_in(frame, last=True)
        if below is None or above is None:
            return
        first = inner if only is None else inner.pick(only.nodes)
        yield from self._layered(frame, None, below.on(first), below.on(inner), above.on(last))

    def _stand_in(self, frame: Frame, *, last: bool) -> StandIn | None:
        slews = isfinite(self._bench.conditions.settle_s)
        key: tuple[str, ...] = (frame.amplifier.part, "" if frame.switch is None else frame.switch.part)
        if slews:
            key += (frame.shunt.part, str(last))
        if key not in self._stand_ins:
            self._stand_ins[key] = stand_in(self._bench, frame.pairing, last=last)
        return self._stand_ins[key]

    def _cell(
        self, frame: Frame, place: int | None, stretch: Stretch | None, inner: Nodes, last: Nodes
    ) -> Iterator[Cell]:
        first = inner if stretch is None else inner.pick(stretch.nodes)
        if place is not None and self._bench.bank.figures is not None:
            figures = picked(self._bench.bank.figures, place)
            first, inner, last = (replace(nodes, at=nodes.at.with_filter(figures)) for nodes in (first, inner, last))
        yield from self._layered(frame, place, first, inner, last)

    def _layered(self, frame: Frame, place: int | None, first: Nodes, inner: Nodes, last: Nodes) -> Iterator[Cell]:
        bench = self._bench
        lowest = judged_nodes(bench, first)
        use = links(bench, lowest.nodes.at, lowest.error, (len(lowest.nodes),))
        standing = np.flatnonzero(np.isfinite(use))
        lowest, use = lowest.pick(standing), use[standing]
        if frame.range_count == 1:
            layers: tuple[Judged, ...] = (lowest,)
        else:
            middle = judged_nodes(bench, inner) if frame.range_count > TWO else lowest
            layers = (lowest, *([middle] * (frame.range_count - 2)), judged_nodes(bench, last))
        if all(len(layer.nodes) for layer in layers):
            yield _bounded(bench, Cell(frame, place, use, layers, np.empty(0, dtype=np.int64), np.empty(0)))


def _bounded(bench: Bench, cell: Cell) -> Cell:
    """Return the cell with a bound for each common resistor: the best first range beside the best last one."""
    lowest, last = cell.layers[0], cell.layers[-1]
    size = int(max(lowest.nodes.common.max(), last.nodes.common.max())) + 2
    least_first = np.full(size, np.inf)
    np.minimum.at(least_first, lowest.nodes.common, cell.first_use)
    use = cell.first_use if len(cell.layers) == 1 else top_use(bench, last)
    use = np.maximum(use, least_first[last.nodes.common])
    figure = bench.figure(last.power, cell.frame.burden, last.headroom, use)
    bound = np.full(size, np.inf)
    np.minimum.at(bound, last.nodes.common, figure)
    commons = np.flatnonzero(np.isfinite(bound))
    order = commons[np.argsort(bound[commons], kind="stable")]
    return replace(cell, commons=np.where(order == size - 1, NONE, order), bound=bound[order])


def _alone(at: Operating) -> bool:
    """Return whether the network leaves the output filter's corner alone."""
    return not np.any(np.asarray(at.output_ohm))


def _cost(part: Part) -> float:
    return inf if part.unit_cost is None else part.unit_cost
