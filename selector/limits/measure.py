"""What a limit is: a name, what it needs to be known, and a figure against what is allowed."""

from __future__ import annotations

from collections.abc import Callable
from dataclasses import dataclass
from math import isfinite

import numpy as np

from selector.budget import Combined, combined
from selector.candidate import Conditions, Design, Operating, Pairing, ShuntAt
from selector.candidate.chain import Chain
from selector.candidate.operating import AmplifierAt, SwitchAt
from selector.real import Real, Truth
from selector.units import Quantity

TOLERANCE = 1e-12  # relative, so that a figure on its limit meets it whatever the order of rounding


def fits(value: Real, allowed: Real) -> Truth:
    """Return whether value <= allowed, to 1e-12 of the larger of both; what is infinite is compared as it stands.

    >>> fits(0.1 + 0.2, 0.3)
    True
    """
    if isinstance(value, float) and isinstance(allowed, float):
        finite = isfinite(value) and isfinite(allowed)
        return value <= allowed or (finite and value - allowed <= TOLERANCE * max(abs(value), abs(allowed)))
    value, allowed = np.asarray(value), np.asarray(allowed)
    below = np.asarray(value <= allowed)
    if below.all():
        return below
    both = np.isfinite(value) & np.isfinite(allowed)
    over = np.subtract(value, allowed, where=both, out=np.full(both.shape, np.inf))
    return np.asarray(below | (both & (over <= TOLERANCE * np.maximum(np.abs(value), np.abs(allowed)))))


@dataclass(frozen=True, slots=True)
class Measure:
    """A figure that is to be at most `allowed`; below it where `strict`.

    `figure` is false where value and allowance only say whether the limit is met.
    """

    value: Real
    allowed: Real
    strict: bool = False
    figure: bool = True

    @property
    def meets(self) -> Truth:
        """Return whether the limit is met, element by element."""
        return self.value < self.allowed if self.strict else fits(self.value, self.allowed)


def flag(*, bad: bool) -> Measure:
    """Return the measure of a limit that is met or not, without a figure."""
    return Measure(1.0 if bad else 0.0, 0.0, figure=False)


@dataclass(frozen=True, slots=True)
class DesignAt:
    """All parts of a design under the conditions of a spec; parts in `exempt` come from outside the stock."""

    conditions: Conditions
    design: Design
    exempt: frozenset[tuple[str, str]] = frozenset()


@dataclass(frozen=True, slots=True)
class ChoiceAt:
    """A design without its filter beside every filter pair: uses and stock of both parts, and the whole cost.

    The arrays have the shape (pairs,); a cost that is not known is infinite.
    """

    conditions: Conditions
    design: Design
    exempt: frozenset[tuple[str, str]]
    resistor_uses: Real
    capacitor_uses: Real
    held_resistors: Real
    held_capacitors: Real
    cost: Real


@dataclass(frozen=True, slots=True)
class ShuntCheck:
    """Needs a shunt."""

    measure: Callable[[ShuntAt], Measure | None]

    def measured(self, chain: Chain) -> list[Measure | None]:
        """Return the measures on a chain."""
        return [self.measure(ShuntAt(chain.pairing.conditions, chain.pairing.shunt))]


@dataclass(frozen=True, slots=True)
class AmplifierCheck:
    """Needs an amplifier."""

    measure: Callable[[AmplifierAt], Measure | None]

    def measured(self, chain: Chain) -> list[Measure | None]:
        """Return the measures on a chain."""
        pairing = chain.pairing
        return [self.measure(AmplifierAt(pairing.conditions, pairing.amplifier, pairing.window))]


@dataclass(frozen=True, slots=True)
class SwitchCheck:
    """Needs a range switch; not judged where there is one range."""

    measure: Callable[[SwitchAt], Measure | None]

    def measured(self, chain: Chain) -> list[Measure | None]:
        """Return the measures on a chain."""
        pairing = chain.pairing
        return [self.measure(SwitchAt(pairing.conditions, pairing.switch))] if pairing.range_count > 1 else []


@dataclass(frozen=True, slots=True)
class PairCheck:
    """Needs shunt, amplifier and the number of ranges."""

    measure: Callable[[Pairing], Measure | None]

    def measured(self, chain: Chain) -> list[Measure | None]:
        """Return the measures on a chain."""
        return [self.measure(chain.pairing)]


@dataclass(frozen=True, slots=True)
class RangeCheck:
    """Needs one range, whatever the others; `last_only` where it concerns the range of the largest current."""

    measure: Callable[[Operating], Measure | None]
    last_only: bool = False

    def measured(self, chain: Chain) -> list[Measure | None]:
        """Return the measures on a chain."""
        return [self.measure(at) for at in (chain.ranges[-1:] if self.last_only else chain.ranges)]


@dataclass(frozen=True, slots=True)
class LinkCheck:
    """Needs a range and where the one below it ends."""

    measure: Callable[[Operating], Measure | None]

    def measured(self, chain: Chain) -> list[Measure | None]:
        """Return the measures on a chain."""
        return [self.measure(at) for at in chain.ranges]


@dataclass(frozen=True, slots=True)
class FilterCheck:
    """Needs a range and the output filter."""

    measure: Callable[[Operating], Measure | None]

    def measured(self, chain: Chain) -> list[Measure | None]:
        """Return the measures on a chain."""
        return [self.measure(at) for at in chain.ranges] if chain.filtered else []


@dataclass(frozen=True, slots=True)
class PointCheck:
    """Needs a range with its border below, and its combined error with the output filter in."""

    measure: Callable[[Operating, Combined], Measure]

    def measured(self, chain: Chain) -> list[Measure | None]:
        """Return the measures on a chain."""
        return [self.measure(at, combined(at)) for at in chain.ranges] if chain.filtered else []


@dataclass(frozen=True, slots=True)
class DesignCheck:
    """Needs every part of the design."""

    measure: Callable[[DesignAt], Measure | None]

    def measured(self, chain: Chain) -> list[Measure | None]:
        """Return the measures on a chain."""
        return [self.measure(DesignAt(chain.pairing.conditions, chain.design, chain.exempt))]


@dataclass(frozen=True, slots=True)
class ChoiceCheck:
    """Needs a design without its filter, and judges every filter pair at once."""

    measure: Callable[[ChoiceAt], Measure | None]

    def measured(self, chain: Chain) -> list[Measure | None]:
        """Return the measures on a chain."""
        del chain
        return []


Check = (
    ShuntCheck
    | AmplifierCheck
    | SwitchCheck
    | PairCheck
    | RangeCheck
    | LinkCheck
    | FilterCheck
    | PointCheck
    | DesignCheck
    | ChoiceCheck
)


@dataclass(frozen=True, slots=True)
class Limit:
    """A limit that a combination must meet; `quantity` is None where there is no figure to show.

    `thins` marks the limits that thin the choice of an output filter, in their order; `ranked` those whose use a
    score weighs.
    """

    name: str
    checks: tuple[Check, ...]
    quantity: Quantity | None
    thins: bool = False
    ranked: bool = False
