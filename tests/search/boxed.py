"""Ranges of which only the ends of resistances, gain, switch and filter are known, each with a real one inside."""

from __future__ import annotations

from dataclasses import dataclass, fields, replace
from functools import cache
from typing import TYPE_CHECKING, Any, TypeVar

import numpy as np

from selector.budget import zeroed
from selector.candidate import Calibration
from selector.candidate.figures import ResistorFigures, SwitchFigures
from selector.candidate.operating import Border, FilterAt
from selector.search.interval import Interval, lower, upper
from tests.budget.two_designs import LIMITED, design_of
from tests.builders import HIGH_SIDE, OHMS_OF_LAW, ZERO, chain

if TYPE_CHECKING:
    from collections.abc import Callable

    from numpy.typing import NDArray

    from selector.candidate import Operating, Pairing

    Numbers = NDArray[np.float64]

COUNT = 120  # boxes side by side, of the shape (COUNT, 1)
ROOM = 1e-11  # between an end and a figure inside, of the larger: formulas round apart by less
SIDES: dict[str, dict[str, object]] = {
    "low side": {},
    "low side with a zero": ZERO,
    "both ways": ZERO | {"current__two_way": True},
    "high side": HIGH_SIDE,
    "high side both ways": HIGH_SIDE | ZERO | {"current__two_way": True},
}
Tree = TypeVar("Tree")


@dataclass(frozen=True, slots=True)
class Boxed:
    """Ranges as intervals, real ones inside them, and the same real ones as intervals without width."""

    held: Operating
    real: Operating
    points: Operating

    def by(self, method: str) -> Boxed:
        """Return the ranges with another method of combining errors."""
        each = (self.held, self.real, self.points)
        return Boxed(*(replace(at, conditions=replace(at.conditions, method=method)) for at in each))


@cache
def _pairing(law: str, side: str, number: int) -> Pairing:
    return chain(design_of(law, number), **LIMITED | SIDES[side]).pairing


@cache
def boxes(law: str, side: str, calibration: Calibration) -> tuple[Boxed, ...]:
    """Return inner and last ranges of two pairings of a law that differ in every figure; every option is asked for."""
    found = []
    for number in (0, 1):
        last = (number == 1) is (calibration is not Calibration.ZERO)
        pairing = _pairing(law, side, number)
        pairing = replace(pairing, conditions=replace(pairing.conditions, calibration=calibration))
        found.append(_boxed(pairing, np.random.default_rng(number), last=last))
    return tuple(found)


def _boxed(pairing: Pairing, random: np.random.Generator, *, last: bool) -> Boxed:
    """Return ranges of a pairing, around resistors that suit its law."""
    draw = Draw(random)
    ohms = [1.0 if ohm is None else ohm for ohm in OHMS_OF_LAW[pairing.amplifier.law.name]]
    common, switched = (draw.resistor(ohm) for ohm in ohms)
    switch = SwitchFigures(*(draw.around(getattr(pairing.switch, one.name)) for one in fields(SwitchFigures)))
    gain = pairing.amplifier.law.gain(
        pairing.amplifier.of_law, *(one.ohm for one in (inside(common), inside(switched))), inside(switch).on_ohm
    )
    reach = pairing.amplifier.law.gain(pairing.amplifier.of_law, common.ohm, switched.ohm, switch.on_ohm)
    reach = reach if isinstance(reach, Interval) else Interval(reach, reach)
    gains = draw.cut(reach, np.broadcast_to(gain, (COUNT, 1)))
    filters = FilterAt(*(draw.around(one) for one in (1e3, 1.3e3, 1.9e3, 0.99e3)))
    border = Border(*(draw.around(one) for one in (0.2, 0.22, 40.0)))

    def made(change: Callable[[Any], Any]) -> Operating:
        of = replace(pairing, switch=change(switch))
        at = of.operate_at(change(gains), change(common), change(switched), last=last)
        return zeroed(replace(at, filter=change(filters), border=change(border)))

    return Boxed(made(as_held), made(inside), made(as_points))


class Between(Interval):
    """An interval with a real number in it."""

    __slots__ = ("value",)

    def __init__(self, low: Numbers, high: Numbers, value: Numbers) -> None:
        """Take both ends and what lies between them."""
        super().__init__(low, high)
        self.value = value


@dataclass(frozen=True, slots=True)
class Draw:
    """Random boxes: some without width, and some whose number is an end."""

    random: np.random.Generator

    def around(self, nominal: float) -> Between:
        """Return intervals on both sides of a number, of up to a decade."""
        if not np.isfinite(nominal):
            every = np.full((COUNT, 1), nominal)
            return Between(every, every, every)
        low, high = (nominal * self._shares(least, most) for least, most in ((0.3, 1.0), (1.0, 3.0)))
        low, high = np.minimum(low, high), np.maximum(low, high)
        return Between(low, high, self._value(low, high))

    def resistor(self, ohm: float) -> ResistorFigures:
        """Return figures of resistors around a resistance."""
        return ResistorFigures(*(self.around(one) for one in (ohm, 1e-3, 2e-5)))

    def cut(self, reach: Interval, value: Numbers) -> Between:
        """Return a part of some intervals that holds values of theirs: all, the value alone, or anything between."""
        shape = (COUNT, 1)
        low = value - self._shares(0.0, 1.0) * np.maximum(value - lower(reach), 0.0)
        high = value + self._shares(0.0, 1.0) * np.maximum(upper(reach) - value, 0.0)
        return Between(np.broadcast_to(low, shape), np.broadcast_to(high, shape), value)

    def _shares(self, least: float, most: float) -> Numbers:
        ends = np.array([[least, most]])[:, self.random.integers(0, 2, COUNT)].T
        between = self.random.uniform(least, most, (COUNT, 1))
        return np.where(self.random.random((COUNT, 1)) < 0.3, between, ends)

    def _value(self, low: Numbers, high: Numbers) -> Numbers:
        return np.clip(low + self._shares(0.0, 1.0) * (high - low), low, high)


def as_held(tree: Tree) -> Tree:
    """Return a tree of intervals with their ends alone."""
    return _changed(tree, lambda one: Interval(one.low, one.high))


def inside(tree: Tree) -> Tree:
    """Return a tree of intervals with the real number of each."""
    return _changed(tree, lambda one: one.value)


def as_points(tree: Tree) -> Tree:
    """Return a tree of intervals with those without width around the real numbers."""
    return _changed(tree, lambda one: Interval(one.value, one.value))


def _changed(tree: Tree, change: Callable[[Between], Any]) -> Tree:
    if isinstance(tree, Between):
        return change(tree)
    return type(tree)(*(_changed(getattr(tree, one.name), change) for one in fields(tree)))


def check_figure(what: str, held: object, real: object, points: object) -> None:
    """Compare a figure of intervals with the real one inside, and that of points; infinite ones must agree."""
    if isinstance(held, float) and held == real == points:
        return
    value, low, high = np.asarray(real, dtype=float), lower(held), upper(held)
    finite = np.isfinite(value)
    size = np.maximum(np.abs(value), np.maximum(_size(low), _size(high)))
    room = np.where(finite, ROOM * size, 0.0)
    assert (low <= value + room).all(), f"{what}: below its lower end"
    assert (value - room <= high).all(), f"{what}: above its upper end"
    for end in (lower(points), upper(points)):
        assert ((end == value) | (np.abs(end - value) <= ROOM * np.abs(value))).all(), f"{what}: not exact at points"


def _size(end: Numbers) -> Numbers:
    return np.where(np.isfinite(end), np.abs(end), 0.0)
