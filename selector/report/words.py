"""Figures as people read them; ASCII, three significant digits."""

from __future__ import annotations

from decimal import Decimal

from selector.units import CURRENT, MONEY, RATIO, Quantity, shown

UNKNOWN = "-"
_LONGEST_COUNT = 10**6


def per_cent(fraction: float) -> str:
    """Return a fraction in per cent: `4.9 %`."""
    return f"{shown(100.0 * fraction, RATIO)} %"


def or_unknown(value: float | None, quantity: Quantity) -> str:
    """Return a figure, `-` where there is none."""
    return UNKNOWN if value is None else shown(value, quantity)


def error(error_a: float, allowed_a: float, current_a: float) -> str:
    """Return an error with what is allowed in brackets, in per cent of the reading; in A where there is no current."""
    if current_a > 0.0:
        both = [shown(100.0 * each / current_a, RATIO) for each in (error_a, allowed_a)]
        return f"{both[0]} ({both[1]}) %"
    return f"{shown(error_a, CURRENT)} ({shown(allowed_a, CURRENT)})"


def price(cost: float | None, currency: str | None) -> str:
    """Return a cost with its currency where one is stated."""
    if cost is None:
        return UNKNOWN
    return f"{shown(cost, MONEY)} {currency}" if currency else shown(cost, MONEY)


def many(count: int, one: str, several: str | None = None) -> str:
    """Return a count with its noun: `1 board`, `3 boards`."""
    return f"{number(count)} {one if count == 1 else several or one + 's'}"


def number(count: int) -> str:
    """Return a count, a large one as `6.1e13`."""
    return str(count) if count < _LONGEST_COUNT else f"{Decimal(count):.1e}".replace("e+", "e")
