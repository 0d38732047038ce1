"""The filters of a bank in the order in which they are taken, and what none of them can beat."""

from __future__ import annotations

from dataclasses import dataclass, replace
from math import inf

import numpy as np
from numpy.typing import NDArray

from selector.candidate import Operating, Pairing
from selector.candidate.figures import NO_RESISTOR, FilterFigures
from selector.candidate.operating import FilterAt
from selector.limits import LIMITS, FilterCheck
from selector.physics.filters import corner_hz
from selector.search.bank import FilterBank
from selector.search.checks import checks_of, met
from selector.search.interval import Interval
from selector.search.stacks import Indices, taken
from selector.search.stretches import first_place

Numbers = NDArray[np.float64]
Truths = NDArray[np.bool_]
DIGITS = 12
HALVINGS = 14  # of the least corner of a range whose network adds to the filter's resistance


@dataclass(frozen=True)
class Ladder:
    """The filters that the fastest amplifier could use, the slowest first, in the order of choice among equals.

    `places` are their places in the bank, `filters` their figures where no network adds resistance. `least` and
    `most` hold the ends of each figure over all filters from a step on: no filter taken later beats them.
    """

    bank: FilterBank
    checks: tuple[FilterCheck, ...]  # that thin the choice
    places: Indices
    filters: FilterAt
    least: FilterAt
    most: FilterAt
    slowest_hz: float  # no filter with a slower corner serves, whatever adds to its resistance
    spread: float  # a filter's noisy corner is at least so many times its slow one, whatever adds to its resistance
    ranks: Indices  # the order of choice among filters of equal corners

    def __len__(self) -> int:
        """Return the number of filters."""
        return len(self.places)

    def figures(self, step: Indices) -> FilterFigures:
        """Return the parts of the filters of some steps, in the shape of `step`."""
        if self.bank.figures is None:
            message = "an empty ladder has no steps"
            raise ValueError(message)
        return taken(self.bank.figures, self.places[step])

    @property
    def _ends(self) -> tuple[FilterAt, FilterAt]:
        """Return the least and the most of each figure over all filters."""
        first = np.array(0)
        return taken(self.least, first), taken(self.most, first)

    def stand_in(self, *, alone: bool) -> FilterAt:
        """Return an interval of all filters; `alone` where no network adds to their resistance."""
        low, high = self._ends
        slow, noisy = low.slow_hz, low.noisy_hz
        if not alone:
            slow, noisy = self.slowest_hz, self.slowest_hz * self.spread
        return FilterAt(
            Interval(np.asarray(low.ohm), np.asarray(high.ohm)).real(),
            Interval(np.asarray(slow), np.asarray(high.slow_hz)).real(),
            Interval(np.asarray(noisy), np.asarray(high.noisy_hz)).real(),
            Interval(np.asarray(low.least_ohm), np.asarray(high.least_ohm)).real(),
        )

    def best_from(self, step: Indices) -> FilterAt:
        """Return what no filter of a step or a later one beats, in error or in speed."""
        low, high = taken(self.least, step), taken(self.most, step)
        return FilterAt(low.ohm, high.slow_hz, low.noisy_hz, high.least_ohm)

    def steps(self, at: Operating) -> Indices:
        """Return the step of the filter that each range takes by itself, where no network adds to its resistance.

        `len(self)` where none serves. A filter with a faster corner serves whatever a slower one does.
        """
        shape = np.broadcast(np.asarray(at.gain), np.asarray(at.high_a)).shape

        def serves(step: Indices) -> Truths:
            return thinned(replace(at, filter=taken(self.filters, step)), self.checks)

        return first_place(np.full(shape, len(self)), serves, len(self) - 1)

    def own(self, at: Operating) -> FilterAt:
        """Return what no filter that serves a range by itself can beat, where a network adds to its resistance."""
        shape = np.broadcast(np.asarray(at.gain), np.asarray(at.high_a)).shape
        low, high = self._ends
        slow, fast = np.full(shape, self.slowest_hz), np.full(shape, high.slow_hz)
        for _ in range(HALVINGS):
            middle = np.sqrt(slow * fast)
            serves = thinned(replace(at, filter=FilterAt(low.ohm, middle, middle, high.least_ohm)), self.checks)
            fast, slow = np.where(serves, middle, fast), np.where(serves, slow, middle)
        return FilterAt(low.ohm, high.slow_hz, slow * self.spread, high.least_ohm)

    def choices(self, first: Operating, lasts: Operating) -> Indices:
        """Return the step of the filter that a lowest range takes beside each of several last ones.

        For networks that add to the filter's resistance: of what serves the lowest range, the filter with the
        slowest corner in the last one. `len(self)` where none serves. Only filters that no other one exceeds in both
        R C and C can have the slowest corner beside some resistance.
        """
        steps = np.arange(len(self))
        figures = self.figures(steps)
        serves = np.broadcast_to(thinned(first.with_filter(figures), self.checks), (1, len(self))).ravel()
        farad = np.asarray(figures.farad * (1.0 + figures.farad_tolerance_frac))
        ohm = np.asarray(figures.ohm * (1.0 + figures.tolerance_frac))
        steps = _foremost(steps[serves], farad[serves], (ohm * farad)[serves])
        count = np.broadcast(np.asarray(lasts.gain), np.asarray(lasts.high_a)).size
        if not len(steps):
            return np.full(count, len(self))
        output_ohm = np.broadcast_to(np.asarray(lasts.output_ohm), (1, count)).ravel()
        slow = _rounded(np.asarray(corner_hz(ohm[steps][None, :] + output_ohm[:, None], farad[steps][None, :])))
        equal = slow == slow.min(axis=1, keepdims=True)
        taken_: Indices = steps[np.argmin(np.where(equal, self.ranks[steps][None, :], len(self)), axis=1)]
        return taken_


def _foremost(steps: Indices, first: Numbers, second: Numbers) -> Indices:
    """Return the steps that no other one exceeds in both figures; those that are equal in both all stay."""
    order = np.lexsort((-second, -first))
    reached = np.maximum.accumulate(second[order]) if len(order) else second
    return steps[order[second[order] >= reached * (1.0 - 1e-11)]]


def thinned(at: Operating, checks: tuple[FilterCheck, ...]) -> Truths:
    """Return which ranges are served by the filter that is in."""
    return met(checks, at, np.ones((), dtype=bool))


def ladder_of(bank: FilterBank, pairing: Pairing, lifted: frozenset[str]) -> Ladder | None:
    """Return the ladder of a bank; None where no filter serves even an amplifier without a corner of its own."""
    if bank.figures is None:
        return None
    at = _fastest(pairing)
    checks = checks_of((limit for limit in LIMITS if limit.thins and limit.name not in lifted), FilterCheck)
    filtered = at.with_filter(bank.figures)
    serving = np.flatnonzero(np.broadcast_to(thinned(filtered, checks), (len(bank),)))
    if not len(serving):
        return None
    filters = taken(_flat(filtered.filter, len(bank)), serving)
    order = _order(bank, serving, filters)
    places, filters = serving[order], taken(filters, order)
    spread_frac = np.asarray(taken(bank.figures, places).farad_tolerance_frac)
    return Ladder(
        bank,
        checks,
        places,
        filters,
        FilterAt(*(_from(one, np.minimum) for one in _fields(filters))),
        FilterAt(*(_from(one, np.maximum) for one in _fields(filters))),
        _slowest(at, filters, checks),
        float(np.min((1.0 + spread_frac) / (1.0 - spread_frac))),
        np.argsort(_order(bank, places, replace(filters, slow_hz=np.ones(len(places))))),
    )


def _fastest(pairing: Pairing) -> Operating:
    """Return a range of an amplifier without a corner, whose output hardly moves and has no resistance."""
    amplifier = replace(pairing.amplifier, gain_bandwidth_hz=inf, bandwidth_hz=inf, slew_v_per_s=inf)
    stage_of = replace(amplifier.of_law, buffered=1.0)
    at = replace(pairing, amplifier=replace(amplifier, of_law=stage_of), range_count=1)
    return at.operate_at(1.0, NO_RESISTOR, NO_RESISTOR, last=True)


def _slowest(at: Operating, filters: FilterAt, checks: tuple[FilterCheck, ...]) -> float:
    """Return a corner just below the slowest that serves."""
    slow, fast = 0.0, float(np.min(np.asarray(filters.slow_hz)))
    most = float(np.max(np.asarray(filters.least_ohm)))
    least = float(np.min(np.asarray(filters.ohm)))
    for _ in range(60):
        middle = 0.5 * (slow + fast)
        if thinned(replace(at, filter=FilterAt(least, middle, middle, most)), checks):
            fast = middle
        else:
            slow = middle
    return slow * (1.0 - 1e-9) if slow > 0.0 else fast * 1e-6


def _order(bank: FilterBank, places: Indices, filters: FilterAt) -> Indices:
    """Return the order of choice: slow corner, then larger resistor, then cost, then names."""
    cost = np.round(bank.resistor_costs[places] + bank.capacitor_costs[places], 6)
    rows, parts = np.divmod(places, len(bank.capacitors))
    names = [_ranks([one.part for one in bank.resistors])[rows], _ranks([one.part for one in bank.capacitors])[parts]]
    return np.lexsort(
        (names[1], names[0], cost, -_rounded(np.asarray(filters.ohm)), _rounded(np.asarray(filters.slow_hz)))
    )


def _ranks(codes: list[str]) -> Indices:
    ranks = np.empty(len(codes), dtype=np.int64)
    ranks[sorted(range(len(codes)), key=codes.__getitem__)] = np.arange(len(codes))
    return ranks


def _rounded(values: Numbers) -> Numbers:
    """Return values rounded to twelve significant digits."""
    scale = 10.0 ** (DIGITS - 1 - np.floor(np.log10(values)))
    return np.round(values * scale) / scale


def _flat(filters: FilterAt, count: int) -> FilterAt:
    return FilterAt(*(np.broadcast_to(np.asarray(one, dtype=float), (count,)) for one in _fields(filters)))


def _fields(filters: FilterAt) -> tuple[Numbers, Numbers, Numbers, Numbers]:
    ohm, slow, noisy, least = filters.ohm, filters.slow_hz, filters.noisy_hz, filters.least_ohm
    return np.asarray(ohm), np.asarray(slow), np.asarray(noisy), np.asarray(least)


def _from(values: Numbers, end: np.ufunc) -> Numbers:
    """Return the least or the most of each value and all that follow."""
    return np.asarray(end.accumulate(values[::-1])[::-1])
