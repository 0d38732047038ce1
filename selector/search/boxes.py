"""Bounds: what no combination of a block of parts can undercut, from cells of currents and gains."""

from __future__ import annotations

from dataclasses import dataclass, replace

import numpy as np
from numpy.typing import NDArray

from selector.budget import Combined, combined, zeroed
from selector.candidate import Operating, Pairing
from selector.candidate.figures import NO_RESISTOR, ResistorFigures
from selector.candidate.operating import Border, FilterAt
from selector.candidate.uses import power_w, use_headroom
from selector.limits import Measure, use_of, worst_point
from selector.search.bench import Bench
from selector.search.cells import ROOM, Cells
from selector.search.checks import met
from selector.search.interval import Interval, lower, upper
from selector.search.lots import Lot
from selector.search.reach import least_larger
from selector.search.stacks import Indices, low_ends

Numbers = NDArray[np.float64]
Truths = NDArray[np.bool_]


@dataclass(frozen=True, slots=True)
class Block:
    """Ranges of shape (rows, cells) as intervals, and which cells hold any."""

    at: Operating
    stands: Truths
    error: Combined | None


def bounds(bench: Bench, lot: Lot, common: ResistorFigures, cells: Cells) -> Numbers:
    """Return for each row of a lot a figure that no combination of it undercuts, of shape (rows,).

    `common` holds what the common resistors of a row have between them, as intervals of shape (rows, 1).
    """
    pairing = lot.pairing()
    frames = Frames(bench, pairing, common, _stand_in(bench, lot))
    with np.errstate(all="ignore"):
        last = _last(frames, cells)
        if pairing.range_count == 1:
            use = _first_use(bench, last, np.array([[cells.conditions.current_max_a]]))
        else:
            inner = _inner(frames, cells)
            reached = _first_use(bench, inner, cells.borders_a[None, :-1])
            for _ in range(pairing.range_count - 2):
                reached = _reached_inner(bench, inner, reached, cells)
            use = _reached_last(bench, last, reached, cells)
        conditions = pairing.conditions
        figure = bench.figure(
            lower(power_w(last.at)) / conditions.power_limit_w,
            lower(pairing.burden_v) / conditions.burden_limit_v,
            lower(use_headroom(last.at)),
            np.where(last.stands, use, np.inf),
        )
    return np.asarray(np.min(np.where(np.isnan(figure), 0.0, figure), axis=1))


def _stand_in(bench: Bench, lot: Lot) -> FilterAt | None:
    if not bench.needs_filter or bench.ladder is None:
        return None
    return bench.ladder.stand_in(alone=lot.family.alone)


def _inner(frames: Frames, cells: Cells) -> Block:
    edges = cells.borders_a[None, :]
    transfer = Interval(edges[:, :-1] * (1.0 - ROOM), edges[:, 1:] * (1.0 + ROOM))
    gain = lower(frames.pairing.usable_v) / (transfer * lower(frames.pairing.shunt.ohm))
    return frames.block(gain, last=False)


def _last(frames: Frames, cells: Cells) -> Block:
    top = lower(frames.pairing.usable_v) / (lower(frames.pairing.shunt.ohm) * cells.conditions.current_max_a)
    return frames.block(cells.shares * top, last=True)


@dataclass(frozen=True, slots=True)
class Frames:
    """Frames side by side with what their common resistors have between them, and a stand-in for their filter."""

    bench: Bench
    pairing: Pairing
    common: ResistorFigures
    stand_in: FilterAt | None

    def block(self, gain: Interval, *, last: bool) -> Block:
        """Return the ranges whose gain lies in cells, with the resistors that can give it."""
        switched, cut, stands = self._given(gain)
        at = self.pairing.operate_at(cut.real(), self.common, switched, last=last)
        if self.stand_in is not None:
            at = replace(at, filter=self.stand_in)
        at = zeroed(at)
        stands = met(self.bench.last_checks if last else self.bench.inner_checks, at, stands, possible)
        if self.stand_in is not None:
            stands = met(self.bench.filter_checks, at, stands, possible)
        return Block(at, stands, low_ends(combined(at)) if self.bench.needs_filter else None)

    def _given(self, gain: Interval) -> tuple[ResistorFigures, Interval, Truths]:
        """Return the switched resistors that give a gain within cells, what gain they give, and where there are any."""
        law, resistors = self.pairing.amplifier.law, self.bench.resistors
        figures, on_ohm = self.pairing.amplifier.of_law, self.pairing.switch.on_ohm
        if law.switched_name is None:
            cut, stands = _cut(gain, _enclosed(law.gain(figures, 0.0, 0.0, on_ohm)))
            return NO_RESISTOR, cut, stands
        cut, stands = _cut(gain, _enclosed(law.gain(figures, self.common.ohm, resistors.whole.ohm, on_ohm)))
        begin, end = resistors.near(_enclosed(law.switched_ohm(figures, cut.real(), self.common.ohm, on_ohm)))
        stands = stands & (end > begin)
        begin = np.minimum(begin, len(resistors) - 1)
        switched = resistors.between(begin, np.maximum(end, begin + 1))
        reached = _enclosed(law.gain(figures, self.common.ohm, switched.ohm, on_ohm))
        near = Interval(np.asarray(cut.low) * (1.0 - ROOM), np.asarray(cut.high) * (1.0 + ROOM))
        finer, reaches = _cut(reached, near)
        return switched, finer, stands & reaches


def _cut(cells: Interval, reach: Interval) -> tuple[Interval, Truths]:
    """Return what cells and a reach have in common, the reach where that is nothing, and where there is any."""
    both = cells.within(reach)
    stands = np.asarray(both.low <= both.high)
    return Interval(np.where(stands, both.low, reach.low), np.where(stands, both.high, reach.high)), stands


def _enclosed(value: object) -> Interval:
    return value if isinstance(value, Interval) else Interval(lower(value), upper(value))


def possible(measure: Measure) -> Truths:
    """Return whether a measure of intervals can be met; what cannot be worked out can."""
    value, allowed = lower(measure.value), upper(measure.allowed)
    meets = np.asarray(replace(measure, value=value, allowed=allowed).meets, dtype=bool)
    return np.asarray(meets | np.isnan(value) | np.isnan(allowed))


def _first_use(bench: Bench, block: Block, high_a: Numbers) -> Numbers:
    """Return the least use of a lowest range that ends at `high_a` or above it, infinite where none can stand."""
    least_a = block.at.conditions.current_min_a
    at = replace(block.at, border=Border(least_a, least_a))
    return np.where(_linked(bench, at) & block.stands, _use(bench, at, block.error, least_a, high_a), np.inf)


def _reached_inner(bench: Bench, block: Block, reached: Numbers, cells: Cells) -> Numbers:
    """Return the least use that reaches each cell from one below it, or from another border in the same cell."""
    edges, kept = cells.borders_a, 1.0 - cells.conditions.overlap_frac
    begin = edges[None, :-1]

    def use_from(place: Indices) -> Numbers:
        begins = edges[place + 1] * kept
        at = replace(block.at, border=Border(begins, edges[place]))
        use = _use(bench, at, block.error, np.minimum(begins, begin), begin)
        return np.where(_linked(bench, at), use, np.inf)

    lower_cells = np.broadcast_to(np.arange(cells.inner), reached.shape)
    below = least_larger(reached, lower_cells, use_from)
    at = replace(block.at, border=Border(edges[None, 1:] * kept, begin))
    same = np.zeros(reached.shape)
    if block.error is not None:
        same = lower(block.error.error_a(begin)) / cells.allowed_a[None, :]
    same = np.where(_linked(bench, at), np.maximum(reached, same), np.inf)
    return np.where(block.stands, np.minimum(below, same), np.inf)


def _reached_last(bench: Bench, block: Block, reached: Numbers, cells: Cells) -> Numbers:
    """Return the least use that reaches each last range from any cell."""
    edges, most_a = cells.borders_a, cells.conditions.current_max_a

    def use_from(place: Indices) -> Numbers:
        begins = edges[place + 1] * (1.0 - cells.conditions.overlap_frac)
        at = replace(block.at, border=Border(begins, edges[place]))
        use = _use(bench, at, block.error, begins, np.full((1, 1), most_a))
        return np.where(_linked(bench, at), use, np.inf)

    end = np.full(block.stands.shape, cells.inner)
    return np.where(block.stands, least_larger(reached, end, use_from), np.inf)


def _linked(bench: Bench, at: Operating) -> Truths:
    """Return where the held limits on neighbours can be met."""
    return met(bench.link_checks, at, np.ones((1, 1), dtype=bool), possible)


def _use(bench: Bench, at: Operating, error: Combined | None, low_a: Numbers | float, high_a: Numbers) -> Numbers:
    """Return the least share of the allowed error between two currents that every range of a cell covers."""
    shape = np.broadcast(lower(at.gain), low_a, high_a).shape
    if error is None:
        return np.zeros(shape)
    point = worst_point(replace(at, border=Border(low_a, low_a), high_a=high_a), error)
    use = np.broadcast_to(np.asarray(use_of(point)), shape)
    return np.where(point.meets, use, np.inf) if bench.holds_points else use.copy()
