"""Preferred values near a value."""

from __future__ import annotations

from typing import get_args

from selector.app.naming import cut
from selector.errors import Fault, UsageRefused
from selector.report.answers.series import SeriesShown
from selector.series import How, nearest, pairs
from selector.units import CAPACITANCE, INDUCTANCE, RESISTANCE, Quantity, QuantityError, parse

WAYS: tuple[How, ...] = get_args(How)
_OTHER: dict[How, How] = {"series": "parallel", "parallel": "series"}  # capacitors add up side by side


def series(text: str, name: str = "E96", count: int = 3, how: str | None = None) -> SeriesShown:
    """Return the values of a series nearest to a value, and the best pairs where a way to connect them is named.

    The unit says what the value is of; without one it is a resistance.

    Raises
    ------
    UsageRefused
        The text is no value, or there is no such series or way.
    """
    value, quantity = value_of(text)
    near = nearest(value, name, count)
    if how is None:
        return SeriesShown(value, quantity, name, near)
    way = next((each for each in WAYS if each == how), None)
    if way is None:
        raise UsageRefused(Fault("--pair", f'"{cut(how)}" is no way to connect a pair', "choose series or parallel"))
    best = pairs(value, name, _OTHER[way] if quantity == CAPACITANCE else way, count)
    return SeriesShown(value, quantity, name, near, way, best)


def value_of(text: str) -> tuple[float, Quantity]:
    """Return the figure of a text and what it is of."""
    first: QuantityError | None = None
    for quantity in (RESISTANCE, CAPACITANCE, INDUCTANCE):
        try:
            return parse(text, quantity, bare=quantity is RESISTANCE), quantity
        except QuantityError as refused:
            first = first or refused
    if first is None:
        raise UsageRefused(Fault("", "no value", "write it like 4.7k"))
    remedy = "write it like 4.7k, 100 nF or 10 uH"
    raise UsageRefused(Fault("VALUE", first.what, remedy)) from first
