"""The parts of a combination, each in its place."""

from __future__ import annotations

from collections import Counter
from dataclasses import dataclass
from math import ceil, inf

from selector.gain import LAWS, Law
from selector.parts import Amplifier, Capacitor, Part, Resistor, Shunt, Switch


@dataclass(frozen=True, slots=True)
class Place:
    """A part where it stands on a board, and how often."""

    use: str
    part: Part
    count: int


@dataclass(frozen=True, slots=True)
class Design:
    """The parts of one combination; `gain` is None for a law without gain resistors.

    A filter part that is None is still to be chosen.
    """

    shunts: tuple[Shunt, ...]
    amplifier: Amplifier
    switch: Switch | None
    common: Resistor | None
    gain: tuple[Resistor, ...] | None
    filter_resistor: Resistor | None = None
    filter_capacitor: Capacitor | None = None

    @property
    def law(self) -> Law:
        """Return the amplifier's gain law."""
        return LAWS[self.amplifier.gain_law]

    @property
    def range_count(self) -> int:
        """Return the number of ranges."""
        return len(self.gain) if self.gain else 1

    def places(self) -> tuple[Place, ...]:
        """Return every part with its uses per board, in the order of a bill of materials."""
        copies = self.law.copies
        rows = [Place("shunt", shunt, 1) for shunt in self.shunts]
        rows.append(Place("amplifier", self.amplifier, 1))
        if self.switch is not None:
            rows.append(Place("switch", self.switch, ceil(self.range_count / self.switch.channels)))
        if self.common is not None:
            rows.append(Place("common", self.common, copies))
        many = self.range_count > 1
        rows.extend(
            Place(f"gain {number}" if many else "gain", resistor, copies)
            for number, resistor in enumerate(self.gain or (), start=1)
        )
        if self.filter_resistor is not None:
            rows.append(Place("filter resistor", self.filter_resistor, 1))
        if self.filter_capacitor is not None:
            rows.append(Place("filter capacitor", self.filter_capacitor, 1))
        return tuple(rows)

    def uses(self) -> Counter[tuple[str, str]]:
        """Return how many pieces of each (kind, part) one board takes."""
        pieces: Counter[tuple[str, str]] = Counter()
        for place in self.places():
            pieces[place.part.kind, place.part.part] += place.count
        return pieces

    def names(self) -> tuple[tuple[str, ...], ...]:
        """Return the part names in the order in which ties are broken."""
        return (
            tuple(shunt.part for shunt in self.shunts),
            (self.amplifier.part,),
            (_name(self.switch),),
            ("",),
            (_name(self.common),),
            tuple(resistor.part for resistor in self.gain or ()),
            (),
            (_name(self.filter_resistor),),
            (_name(self.filter_capacitor),),
        )


def in_stock(part: Part) -> int:
    """Return the pieces of a part in stock; a generic part never counts as stock, nor does one that states none."""
    return 0 if part.generic else part.quantity or 0


def cost_or_inf(part: Part) -> float:
    """Return the cost of a part; one that is not known is infinite, since it meets no limit."""
    return inf if part.unit_cost is None else part.unit_cost


def cost_of(design: Design) -> float | None:
    """Return the cost of one board's parts, or None where a part states none.

    Summed over the places in the order of the bill.
    """
    total = 0.0
    for place in design.places():
        if place.part.unit_cost is None:
            return None
        total += place.count * place.part.unit_cost
    return total


def _name(part: Part | None) -> str:
    return "" if part is None else part.part
