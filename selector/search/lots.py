"""Frames side by side: pairs with a switch and a number of ranges, of one gain law, as rows of arrays."""

from __future__ import annotations

from dataclasses import dataclass

import numpy as np

from selector.candidate import Conditions, Pairing, Window, window_of
from selector.candidate.figures import (
    NO_SWITCH,
    AmplifierFigures,
    ShuntFigures,
    SwitchFigures,
    amplifier_figures,
    shunt_figures,
    switch_figures,
)
from selector.gain import Law, Stage
from selector.parts import Amplifier
from selector.search.interval import Interval
from selector.search.shelf import Shelf
from selector.search.stacks import Indices, columns, stacked, taken

NONE = -1  # place of a switch or resistor that a frame does not have


@dataclass(frozen=True, slots=True)
class Family:
    """The amplifiers of one gain law, stacked; `alone` where their network leaves the output filter's corner alone."""

    amplifiers: tuple[Amplifier, ...]
    figures: AmplifierFigures
    windows: Window
    alone: bool

    @property
    def law(self) -> Law:
        """Return the law."""
        return self.figures.law


@dataclass(frozen=True, slots=True)
class Stock:
    """What all lots of a search draw on."""

    conditions: Conditions
    shunts: ShuntFigures
    families: tuple[Family, ...]
    switches: SwitchFigures

    def fastest(self) -> Pairing:
        """Return the first shunt with the first amplifier, for what does not depend on them."""
        family = self.families[0]
        first = np.array(0)
        return Pairing(
            self.conditions,
            taken(self.shunts, first),
            taken(family.figures, first),
            taken(family.windows, first),
        )


def stock_of(shelf: Shelf) -> Stock | None:
    """Return the parts of a shelf, stacked; None where it has no shunt or no amplifier."""
    conditions = shelf.conditions
    if not shelf.shunts or not shelf.amplifiers:
        return None
    alike: dict[tuple[str, bool], list[Amplifier]] = {}
    for amplifier in shelf.amplifiers:
        alike.setdefault((amplifier.gain_law, _alone(conditions, amplifier)), []).append(amplifier)
    switches = [switch_figures(switch) for switch in shelf.switches] or [NO_SWITCH]
    return Stock(
        conditions,
        stacked([shunt_figures(shunt) for shunt in shelf.shunts]),
        tuple(_family(conditions, amplifiers, alone=alone) for (_, alone), amplifiers in alike.items()),
        stacked(switches),
    )


def _family(conditions: Conditions, amplifiers: list[Amplifier], *, alone: bool) -> Family:
    figures = [amplifier_figures(amplifier, conditions.supply_v) for amplifier in amplifiers]
    windows = [window_of(conditions, one) for one in figures]
    return Family(tuple(amplifiers), stacked(figures), stacked(windows), alone)


def _alone(conditions: Conditions, amplifier: Amplifier) -> bool:
    """Return whether a network puts no resistance in series with the output filter."""
    figures = amplifier_figures(amplifier, conditions.supply_v)
    return not figures.law.output_ohm(Stage(figures.of_law, 1.0, 1.0, 1.0, 0.0, 1.0))


@dataclass(frozen=True, slots=True)
class Lot:
    """Frames of one family and one number of ranges; places of shunt, amplifier and switch, of shape (frames,).

    `switch` is None where any of `switches` may stand in: the lot then bounds all of them.
    """

    stock: Stock
    family: Family
    range_count: int
    shunt: Indices
    amplifier: Indices
    switch: Indices | None
    switches: Indices

    def __len__(self) -> int:
        """Return the number of frames."""
        return len(self.shunt)

    def pairing(self) -> Pairing:
        """Return the frames as one pairing of arrays of shape (frames, 1)."""
        return Pairing(
            self.stock.conditions,
            columns(self.stock.shunts, self.shunt),
            columns(self.family.figures, self.amplifier),
            columns(self.family.windows, self.amplifier),
            self._switches(),
            self.range_count,
        )

    def _switches(self) -> SwitchFigures:
        if self.range_count == 1:
            return NO_SWITCH
        if self.switch is not None:
            return columns(self.stock.switches, self.switch)
        usable = taken(self.stock.switches, self.switches)
        figures = (
            usable.on_ohm,
            usable.on_spread_ohm,
            usable.leakage_a,
            usable.supply_min_v,
            usable.supply_max_v,
        )
        return SwitchFigures(*(Interval(float(np.min(one)), float(np.max(one))).real() for one in figures))
