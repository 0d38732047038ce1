"""How figures are compared wherever something is chosen or ranked."""

from __future__ import annotations

DIGITS = 12
# Two figures that agree in twelve digits differ by less than 1e-11 of the smaller; the rest is room for the rounding of
# the arrays, which agree with plain numbers far closer.
NEARLY = 1.0 + 1.1e-11


def rounded(value: float) -> float:
    """Return a figure rounded to 12 significant digits: what is equal then counts as equal.

    >>> rounded(0.1 + 0.2) == rounded(0.3)
    True
    """
    return float(f"{value:.{DIGITS - 1}e}")


def cost_key(cost: float | None) -> tuple[bool, float]:
    """Return the key that orders costs: rounded to 6 decimals, an unknown one last."""
    return (True, 0.0) if cost is None else (False, round(cost, 6))
