"""What the limits rule out before any resistor is chosen: shunts, amplifiers, switches, pairs, whole frames."""

from __future__ import annotations

from dataclasses import dataclass
from math import inf, isfinite

import numpy as np
from numpy.typing import NDArray

from selector.candidate import Design, Pairing, ShuntAt
from selector.candidate.design import cost_or_inf
from selector.candidate.figures import NO_SWITCH
from selector.candidate.operating import AmplifierAt, SwitchAt
from selector.limits import AmplifierCheck, DesignCheck, Limit, Measure, PairCheck, ShuntCheck, SwitchCheck
from selector.limits.measure import DesignAt
from selector.parts import Amplifier, Capacitor, Resistor
from selector.search.bench import Bench
from selector.search.checks import checks_of
from selector.search.lots import Family, Stock
from selector.search.rows import Line
from selector.search.stacks import Indices, columns, taken

Truths = NDArray[np.bool_]
PLENTY = 10**12
FREE = Resistor.model_construct(part="", resistance=1.0, tolerance=0.0, tempco=0.0, unit_cost=0.0, quantity=PLENTY)


def cheapest(bench: Bench) -> tuple[Resistor, Capacitor | None]:
    """Return stand-ins for any resistor and capacitor that cost as much as the cheapest, of which there is plenty."""
    resistors = float(np.min(bench.resistors.costs, initial=inf))
    capacitor = min(bench.shelf.capacitors, key=cost_or_inf, default=None)
    plenty = {"quantity": PLENTY, "generic": False}
    resistor = FREE.model_copy(update={"unit_cost": resistors if isfinite(resistors) else None})
    return resistor, None if capacitor is None else capacitor.model_copy(update=plenty)


@dataclass(frozen=True)
class Screen:
    """The limits as far as shunts, amplifiers, switches and pairs decide them."""

    bench: Bench
    stock: Stock
    limits: tuple[Limit, ...]

    def pairs(self, family: Family, range_count: int) -> Truths:
        """Return which pairs of a family stand with a number of ranges, of shape (shunts, amplifiers)."""
        stands = np.ones((len(self.bench.shelf.shunts), len(family.amplifiers)), dtype=bool)
        for limit in self.limits:
            stands &= self.stands(limit, family, range_count)
        return stands

    def stands(self, limit: Limit, family: Family, range_count: int) -> Truths:
        """Return which pairs of a family meet one limit, as far as that is known without a switch."""
        conditions = self.bench.conditions
        stands: Truths = np.ones((len(self.bench.shelf.shunts), len(family.amplifiers)), dtype=bool)
        every = range(len(family.amplifiers))
        for check in limit.checks:
            if isinstance(check, ShuntCheck):
                stands &= _met(check.measure(ShuntAt(conditions, columns(self.stock.shunts, self._shunts))))
            elif isinstance(check, AmplifierCheck):
                stands &= np.array([[self._amplifier(check, family, place) for place in every]])
            elif isinstance(check, PairCheck):
                stands &= _met(check.measure(self._pairing(family, range_count)))
        return stands

    @property
    def _shunts(self) -> Indices:
        return np.arange(len(self.bench.shelf.shunts))

    def _amplifier(self, check: AmplifierCheck, family: Family, place: int) -> bool:
        figures, window = taken(family.figures, np.array(place)), taken(family.windows, np.array(place))
        measure = check.measure(AmplifierAt(self.bench.conditions, figures, window))
        return measure is None or bool(measure.meets)

    def _pairing(self, family: Family, range_count: int) -> Pairing:
        shunts = columns(self.stock.shunts, self._shunts)
        return Pairing(self.bench.conditions, shunts, family.figures, family.windows, NO_SWITCH, range_count)

    def switches(self) -> Indices:
        """Return the places of the switches that stand."""
        count = len(self.bench.shelf.switches)
        return np.flatnonzero([all(self.switch(limit, place) for limit in self.limits) for place in range(count)])

    def switch(self, limit: Limit, place: int) -> bool:
        """Return whether a switch meets a limit."""
        at = SwitchAt(self.bench.conditions, taken(self.stock.switches, np.array(place)))
        each = [check.measure(at) for check in limit.checks if isinstance(check, SwitchCheck)]
        return all(measure is None or bool(measure.meets) for measure in each)


def _met(measure: Measure | None) -> Truths:
    return np.ones((1, 1), dtype=bool) if measure is None else np.atleast_2d(np.asarray(measure.meets, dtype=bool))


def usable_of(bench: Bench, line: Line) -> Truths:
    """Return which resistors may be taken in rows: of shape (resistors,), or (rows, resistors) where rows differ.

    Out are those of which there are too few for their place, or for a second one beside the same common resistor.
    """
    law, resistors = line.lot.family.law, bench.resistors
    stands = np.ones(max(1, len(resistors)), dtype=bool)
    if not bench.conditions.stock_only or law.switched_name is None:
        return stands
    if law.copies > 1:
        stands = _in_numbers(bench, line)
    if law.common_name is None:
        return stands
    rows = np.tile(stands, (len(line.common), 1))
    amplifier = _plenty(line)
    for row, place in enumerate(line.common):
        part = resistors.parts[int(place)]
        rows[row, place] &= design_stands(bench, Design((), amplifier, None, part, (part,)))
    return rows


def _in_numbers(bench: Bench, line: Line) -> Truths:
    """Return which resistors there are enough of for one place of a law."""
    key = (line.lot.family.law.name, bench.held)
    if key not in bench.enough:
        amplifier = _plenty(line)
        each = [design_stands(bench, Design((), amplifier, None, None, (one,))) for one in bench.resistors.parts]
        bench.enough[key] = np.array(each)
    return bench.enough[key]


def _plenty(line: Line) -> Amplifier:
    """Return an amplifier of the rows' law that costs nothing and of which there is any number."""
    plenty = {"unit_cost": 0.0, "quantity": PLENTY, "generic": False}
    return line.lot.family.amplifiers[0].model_copy(update=plenty)


def design_stands(bench: Bench, design: Design) -> bool:
    """Return whether a design meets the held limits on whole designs."""
    at = DesignAt(bench.conditions, design)
    measures = (check.measure(at) for check in checks_of(bench.limits, DesignCheck))
    return all(measure is None or bool(measure.meets) for measure in measures)
