"""Cells completed by the unit that stands in their column's heading."""

from __future__ import annotations

from functools import lru_cache

from selector.units import QUANTITIES, Quantity, QuantityError, parse

_LONGEST_KEPT = 40


def with_unit(cell: str, unit: str | None, quantity: Quantity | None) -> str | float:
    """Return a cell with the unit of its heading, where it has none of its own; what cannot be read is left as it is.

    A text is returned where the unit can be written behind the number, so that a message shows what stands in the
    file; else the figure in SI units.
    """
    if unit is None or quantity is None:
        return cell
    complete = _completed if len(cell) <= _LONGEST_KEPT else _completed.__wrapped__
    return complete(cell, unit, quantity.name)


@lru_cache(maxsize=8192)
def _completed(cell: str, unit: str, name: str) -> str | float:
    """Return a cell with its unit, kept for the next row: columns repeat themselves."""
    quantity = QUANTITIES[name]
    if _figure(cell, quantity, None) is not None:
        return cell
    figure = _figure(cell, quantity, unit)
    if figure is None:
        return cell
    written = f"{cell} {unit}"
    return written if _figure(written, quantity, None) == figure else figure


def _figure(cell: str, quantity: Quantity, unit: str | None) -> float | None:
    """Return the figure of a cell, None where it cannot be read."""
    try:
        return parse(cell, quantity, bare=False, unit=unit)
    except QuantityError:
        return None
