"""Ranges of real resistors: one row of arrays for each frame with its common resistor."""

from __future__ import annotations

from dataclasses import dataclass, replace

import numpy as np
from numpy.typing import NDArray

from selector.budget import Combined, combined, zeroed
from selector.candidate import Operating, Pairing
from selector.candidate.figures import NO_RESISTOR
from selector.candidate.operating import FilterAt
from selector.candidate.uses import power_w, use_headroom
from selector.limits import use_of, worst_point
from selector.search.bench import Bench
from selector.search.checks import met
from selector.search.lots import NONE, Lot
from selector.search.stacks import Indices, mapped, taken

Numbers = NDArray[np.float64]
Truths = NDArray[np.bool_]


@dataclass(frozen=True, slots=True)
class Line:
    """Frames with a common resistor each (NONE where the law has none), of shape (rows,)."""

    lot: Lot
    common: Indices

    def ranges(self, bench: Bench, pairing: Pairing, places: Indices, *, last: bool) -> Operating:
        """Return the ranges with switched resistors by their places, of shape (rows, places) or (1, places)."""
        law, figures = pairing.amplifier.law, bench.resistors.figures
        common = NO_RESISTOR if law.common_name is None else taken(figures, self.common[:, None])
        switched = NO_RESISTOR if law.switched_name is None else taken(figures, places)
        return pairing.operate(common, switched, last=last)


@dataclass(frozen=True, slots=True)
class Ranges:
    """Ranges of shape (rows, columns) by rising upper border; `stands` tells which of them could be used.

    `switched` holds the place of each one's resistor. `error` is None where no held limit asks for it.
    """

    switched: Indices
    at: Operating
    stands: Truths
    error: Combined | None = None

    @property
    def shape(self) -> tuple[int, int]:
        """Return rows and columns."""
        rows, count = self.switched.shape
        return rows, count

    def high_a(self) -> Numbers:
        """Return the upper borders, A."""
        return np.broadcast_to(np.asarray(self.at.high_a, dtype=float), self.shape)

    def gain(self) -> Numbers:
        """Return the gains, V/V."""
        return np.broadcast_to(np.asarray(self.at.gain, dtype=float), self.shape)

    def some(self, places: Indices) -> Ranges:
        """Return some columns."""
        width = self.shape[1]

        def some(array: Numbers) -> Numbers:
            return array[:, places] if array.ndim > 1 and array.shape[1] == width else array

        return Ranges(self.switched[:, places], mapped(self.at, some), self.stands[:, places], mapped(self.error, some))


def ranges_of(bench: Bench, line: Line, usable: Truths, *, last: bool) -> Ranges:
    """Return the ranges that meet the held limits which concern one by itself, before the filter is known.

    `usable` tells which resistors may be taken, of shape (resistors,) or (rows, resistors).
    """
    pairing = line.lot.pairing()
    if pairing.amplifier.law.switched_name is None:
        places = np.full((1, 1), NONE)
        usable = np.ones((1, 1), dtype=bool)
    else:
        places = np.arange(len(bench.resistors))[None, :]
    at = line.ranges(bench, pairing, places, last=last)
    stands = _standing(bench, at, np.broadcast_to(usable, (len(line.lot), places.shape[1])), last=last)
    borders_rise = np.asarray(at.gain)[0, 0] > np.asarray(at.gain)[0, -1]
    switched, inside = _windows(stands, rising=bool(borders_rise))
    if pairing.amplifier.law.switched_name is None:
        switched = np.full(switched.shape, NONE)
    at = zeroed(line.ranges(bench, pairing, switched, last=last))
    return Ranges(switched, at, inside)


def _standing(bench: Bench, at: Operating, stands: Truths, *, last: bool) -> Truths:
    stands = met(bench.last_checks if last else bench.inner_checks, at, stands)
    if not last and bench.ordered:
        conditions = bench.conditions
        stands = stands & (at.high_a > conditions.current_min_a) & (at.high_a < conditions.current_max_a)
    return stands


def _windows(stands: Truths, *, rising: bool) -> tuple[Indices, Truths]:
    """Return the columns from the first to the last that stands, of shape (rows, widest), and which of them stand.

    In their order, or in the reverse where borders fall with the columns.
    """
    count = stands.shape[1]
    any_ = stands.any(axis=1)
    first = np.where(any_, np.argmax(stands, axis=1), 0)
    end = np.where(any_, count - np.argmax(stands[:, ::-1], axis=1), 0)
    width = max(1, int(np.max(end - first, initial=0)))
    along = np.arange(width)[None, :]
    columns = first[:, None] + along if rising else end[:, None] - 1 - along
    inside = (columns >= first[:, None]) & (columns < end[:, None])
    columns = np.clip(columns, 0, count - 1)
    return columns, inside & np.take_along_axis(stands, columns, axis=1)


def with_filter(bench: Bench, ranges: Ranges, filters: FilterAt | None) -> Ranges:
    """Return the ranges that meet the held limits which need the filter, with it and their combined error in."""
    if filters is None:
        return ranges
    at = replace(ranges.at, filter=filters)
    return Ranges(ranges.switched, at, met(bench.filter_checks, at, ranges.stands), combined(at))


def use_between(bench: Bench, at: Operating, error: Combined | None, shape: tuple[int, ...]) -> Numbers:
    """Return the use of the allowed error of ranges whose borders are in, infinite where a held limit is not met."""
    stands = met(bench.link_checks, at, np.ones(shape, dtype=bool))
    use: Numbers = np.zeros(shape)
    if error is not None:
        point = worst_point(at, error)
        use = use + use_of(point)
        if bench.holds_points:
            stands = stands & point.meets
    return np.where(stands, use, np.inf)


def first_use(bench: Bench, ranges: Ranges) -> Numbers:
    """Return the use of each range as the lowest one, infinite where it cannot be that."""
    use = use_between(bench, ranges.at, ranges.error, ranges.shape)
    return np.where(ranges.stands, use, np.inf)


@dataclass(frozen=True, slots=True)
class Spent:
    """What last ranges spend besides the error: uses of power, burden and headroom, of shape (rows, columns)."""

    power: Numbers
    burden: Numbers
    headroom: Numbers

    @classmethod
    def of(cls, bench: Bench, ranges: Ranges) -> Spent:
        """Return what ranges spend as last ones."""
        at, conditions = ranges.at, bench.conditions
        each = power_w(at) / conditions.power_limit_w, at.burden_v / conditions.burden_limit_v, use_headroom(at)
        return cls(*(np.broadcast_to(np.asarray(one), ranges.shape) for one in each))

    def figures(self, bench: Bench, use: Numbers) -> Numbers:
        """Return the figures of combinations by their last range and the largest use of all their ranges."""
        return bench.figure(self.power, self.burden, self.headroom, use)

    def one(self, place: int) -> Spent:
        """Return a single last range of a single row, of shape (1, 1)."""
        part = slice(place, place + 1)
        return Spent(self.power[:, part], self.burden[:, part], self.headroom[:, part])
