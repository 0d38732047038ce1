"""The ranges that a frame allows, as arrays: one node per choice of gain resistors."""

from __future__ import annotations

from dataclasses import dataclass, replace

import numpy as np
from numpy.typing import NDArray

from selector.budget import Combined, allowed_at, combined, zeroed
from selector.candidate import Operating, Pairing
from selector.candidate.figures import NO_RESISTOR, ResistorFigures
from selector.candidate.uses import power_w, use_headroom
from selector.limits import FilterCheck, LinkCheck, Measure, RangeCheck, use_of, worst_point
from selector.search.bench import Bench
from selector.search.pick import picked

Numbers = NDArray[np.float64]
Indices = NDArray[np.int64]
Truths = NDArray[np.bool_]
NONE = -1  # index of a resistor that the law does not have


@dataclass(frozen=True, slots=True)
class Nodes:
    """Ranges as arrays of shape (nodes,), with the resistors they are made of; ordered by common resistor."""

    at: Operating
    common: Indices
    switched: Indices

    def __len__(self) -> int:
        """Return the number of nodes."""
        return len(self.switched)

    def pick(self, index: Indices) -> Nodes:
        """Return some of the nodes."""
        return Nodes(picked(self.at, index), self.common[index], self.switched[index])

    def where(self, stands: Truths) -> Nodes:
        """Return the nodes for which a condition holds."""
        return self if stands.all() else self.pick(np.flatnonzero(stands))


@dataclass(frozen=True, slots=True)
class Judged:
    """Nodes with their filter in, their combined error, and the uses that they settle as the last range."""

    nodes: Nodes
    error: Combined | None
    power: Numbers
    headroom: Numbers

    def pick(self, index: Indices) -> Judged:
        """Return some of the nodes."""
        return Judged(self.nodes.pick(index), picked(self.error, index), self.power[index], self.headroom[index])


def nodes_of(bench: Bench, pairing: Pairing, *, last: bool) -> Nodes:
    """Return every range that meets the held limits which concern it alone, before the filter is known."""
    grid = Grid.of(bench, pairing, last=last)
    for limit in bench.limits:
        for check in limit.checks:
            if isinstance(check, RangeCheck) and (last or not check.last_only):
                measure = check.measure(grid.at)
                if measure is not None:
                    grid = grid.kept(np.atleast_2d(np.asarray(measure.meets, dtype=bool)))
    if not last and bench.ordered:
        high_a = np.atleast_2d(np.asarray(grid.at.high_a))
        grid = grid.kept((high_a > bench.conditions.current_min_a) & (high_a < bench.conditions.current_max_a))
    return grid.nodes()


@dataclass(frozen=True, slots=True)
class Grid:
    """Every choice of common (rows) and switched resistor (columns) that is left, as indices of the resistors.

    A law without one of them has a single row or column of index NONE.
    """

    pairing: Pairing
    resistors: ResistorFigures
    last: bool
    rows: Indices
    columns: Indices
    stands: Truths
    at: Operating

    @classmethod
    def of(cls, bench: Bench, pairing: Pairing, *, last: bool) -> Grid:
        """Return the whole grid."""
        law, every = pairing.amplifier.law, np.arange(len(bench.shelf.resistors))
        nothing = np.full(1, NONE)
        rows = nothing if law.common_name is None else every
        columns = nothing if law.switched_name is None else every
        stands = np.ones((len(rows), len(columns)), dtype=bool)
        return cls(
            pairing,
            bench.resistors,
            last,
            rows,
            columns,
            stands,
            _on(pairing, bench.resistors, rows[:, None], columns[None, :], last=last),
        )

    def kept(self, stands: Truths) -> Grid:
        """Return the grid with what stands; rows and columns in which nothing does are taken out."""
        both = self.stands & stands
        rows, columns = both.any(axis=1), both.any(axis=0)
        if rows.all() and columns.all():
            return replace(self, stands=both)
        rows_left, columns_left = self.rows[rows], self.columns[columns]
        at = _on(self.pairing, self.resistors, rows_left[:, None], columns_left[None, :], last=self.last)
        return replace(self, rows=rows_left, columns=columns_left, stands=both[np.ix_(rows, columns)], at=at)

    def nodes(self) -> Nodes:
        """Return what stands, one node each, with the sum that a zero calibration removes."""
        places = np.nonzero(self.stands)
        rows, columns = self.rows[places[0]], self.columns[places[1]]
        at = zeroed(_on(self.pairing, self.resistors, rows, columns, last=self.last))
        return Nodes(_flattened(at, len(rows)), rows, columns)


def _on(pairing: Pairing, resistors: ResistorFigures, rows: Indices, columns: Indices, *, last: bool) -> Operating:
    """Return the ranges with common and switched resistors by their indices, in the shape of the indices."""
    law = pairing.amplifier.law
    common = NO_RESISTOR if law.common_name is None else picked(resistors, rows)
    switched = NO_RESISTOR if law.switched_name is None else picked(resistors, columns)
    return pairing.operate(common, switched, last=last)


def _flattened(at: Operating, count: int) -> Operating:
    """Return the range with its gain and border as arrays, also where no resistor made them so."""
    gain = np.broadcast_to(np.asarray(at.stage.gain, dtype=float), (count,))
    high_a = np.broadcast_to(np.asarray(at.high_a, dtype=float), (count,))
    return replace(at, stage=replace(at.stage, gain=gain), high_a=high_a)


def filtered_nodes(bench: Bench, nodes: Nodes) -> Nodes:
    """Return the nodes that meet the held limits which need the filter.

    The filter must be in, or a stand-in for it that no filter can beat.
    """
    if not bench.needs_filter:
        return nodes
    for limit in bench.limits:
        for check in limit.checks:
            measure = check.measure(nodes.at) if isinstance(check, FilterCheck) and len(nodes) else None
            if measure is not None:
                nodes = nodes.where(_truths(measure, len(nodes)))
    return nodes


def judged(bench: Bench, nodes: Nodes) -> Judged:
    """Return the nodes with their combined error, where the limits that are held ask for it."""
    shape, conditions = (len(nodes),), bench.conditions
    return Judged(
        nodes,
        combined(nodes.at) if bench.needs_filter else None,
        np.broadcast_to(np.asarray(power_w(nodes.at) / conditions.power_limit_w), shape),
        np.broadcast_to(np.asarray(use_headroom(nodes.at)), shape),
    )


def links(bench: Bench, at: Operating, error: Combined | None, shape: tuple[int, ...]) -> Numbers:
    """Return the use of the allowed error of ranges whose borders are in, infinite where a held limit is not met."""
    stands = np.ones(shape, dtype=bool)
    use: Numbers = np.zeros(shape)
    for limit in bench.limits:
        for check in limit.checks:
            measure = check.measure(at) if isinstance(check, LinkCheck) else None
            if measure is not None:
                stands &= measure.meets
    if error is not None:
        point = worst_point(at, error)
        use = use + use_of(point)
        if bench.holds_points:
            stands &= point.meets
    return np.where(stands, use, np.inf)


def top_use(bench: Bench, ranges: Judged) -> Numbers:
    """Return the use of the allowed error at the upper border alone: at most the use of the whole range.

    Infinite where it is not allowed.
    """
    at = ranges.nodes.at
    if ranges.error is None:
        return np.zeros(len(ranges.nodes))
    point = Measure(ranges.error.error_a(at.high_a), allowed_at(bench.conditions, at.high_a))
    use = np.asarray(use_of(point), dtype=float)
    return np.where(point.meets, use, np.inf) if bench.holds_points else use


def shaped(figures: ResistorFigures, shape: tuple[int, int]) -> ResistorFigures:
    """Return the figures of resistors as arrays of another shape."""
    each = (figures.ohm, figures.tolerance_frac, figures.tempco_per_k)
    return ResistorFigures(*(np.reshape(one, shape) for one in each))


def _truths(measure: Measure, count: int) -> Truths:
    return np.broadcast_to(np.asarray(measure.meets, dtype=bool), (count,))
