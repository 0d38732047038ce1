"""What one search works on: shelf, filter bank, figures as arrays, and the limits that are held."""

from __future__ import annotations

from collections import Counter
from dataclasses import dataclass, field
from functools import cached_property

import numpy as np
from numpy.typing import NDArray

from selector.candidate import Conditions
from selector.limits import LIMITS, FilterCheck, Limit, LinkCheck, PointCheck, RangeCheck
from selector.limits.each.headroom import LIMIT as HEADROOM
from selector.limits.each.range_order import LIMIT as RANGE_ORDER
from selector.search.bank import FilterBank, bank_of
from selector.search.checks import checks_of
from selector.search.ladder import Ladder, ladder_of
from selector.search.lots import Stock, stock_of
from selector.search.objective import Objective
from selector.search.resistors import Resistors, resistors_of
from selector.search.shelf import Shelf

ALL_LIMITS = frozenset(limit.name for limit in LIMITS)
ORDER = RANGE_ORDER.name


@dataclass(frozen=True)
class Bench:
    """A search that is set up: what is made small, and which limits are held meanwhile."""

    shelf: Shelf
    bank: FilterBank
    stock: Stock | None
    resistors: Resistors
    objective: Objective
    held: frozenset[str] = ALL_LIMITS
    counts: Counter[str] = field(default_factory=Counter, compare=False)  # what was done, over all searches of a bench
    enough: dict[tuple[str, frozenset[str]], NDArray[np.bool_]] = field(
        default_factory=dict, compare=False
    )  # resistors in number, by law

    @property
    def conditions(self) -> Conditions:
        """Return the conditions of the spec."""
        return self.shelf.conditions

    @cached_property
    def lifted(self) -> frozenset[str]:
        """Return the limits that are not held."""
        return ALL_LIMITS - self.held

    @cached_property
    def ladder(self) -> Ladder | None:
        """Return the filters in the order of choice; None where none could serve."""
        return None if self.stock is None else ladder_of(self.bank, self.stock.fastest(), self.lifted)

    @cached_property
    def limits(self) -> tuple[Limit, ...]:
        """Return the limits that are held, in their order."""
        return tuple(limit for limit in LIMITS if limit.name in self.held)

    @cached_property
    def last_checks(self) -> tuple[RangeCheck, ...]:
        """Return the held checks of a last range by itself."""
        return checks_of(self.limits, RangeCheck)

    @cached_property
    def inner_checks(self) -> tuple[RangeCheck, ...]:
        """Return the held checks of any other range by itself."""
        return tuple(check for check in self.last_checks if not check.last_only)

    @cached_property
    def link_checks(self) -> tuple[LinkCheck, ...]:
        """Return the held checks of a range above another."""
        return checks_of(self.limits, LinkCheck)

    @cached_property
    def filter_checks(self) -> tuple[FilterCheck, ...]:
        """Return the held checks of a range with its filter."""
        return checks_of(self.limits, FilterCheck)

    @cached_property
    def needs_filter(self) -> bool:
        """Return whether a held limit can only be judged with the output filter."""
        return bool(self.filter_checks) or self.holds_points or any(limit.thins for limit in self.limits)

    @cached_property
    def holds_points(self) -> bool:
        """Return whether the error is held to what is allowed."""
        return bool(checks_of(self.limits, PointCheck))

    @cached_property
    def cheapest_filter(self) -> float:
        """Return what the cheapest filter costs, infinite where none states a cost."""
        return float(np.min(self.bank.resistor_costs + self.bank.capacitor_costs, initial=np.inf))

    @cached_property
    def ordered(self) -> bool:
        """Return whether borders and gains are held to their strict order."""
        return ORDER in self.held

    @cached_property
    def holds_headroom(self) -> bool:
        """Return whether the last range is held to its headroom."""
        return HEADROOM.name in self.held

    def figure(
        self,
        power: NDArray[np.float64],
        burden: NDArray[np.float64],
        headroom: NDArray[np.float64],
        error: NDArray[np.float64],
    ) -> NDArray[np.float64]:
        """Return the objective, infinite where the error is: a combination that is out has no figure."""
        figure = np.asarray(self.objective.of(power, burden, headroom, error), dtype=float)
        return np.where(np.isfinite(error), figure, np.inf)


def bench_of(shelf: Shelf, objective: Objective) -> Bench:
    """Return the set-up of a search under all limits."""
    return Bench(
        shelf,
        bank_of(shelf.conditions, shelf.resistors, shelf.capacitors),
        stock_of(shelf),
        resistors_of(shelf.resistors, shelf.conditions.temperature_change_k),
        objective,
    )
