"""Our figures beside the recorded ones of the circuits."""

from __future__ import annotations

from tests.circuit.record import MEASURES, recorded


def names(quantity: str) -> list[str]:
    """Return the designs that a quantity is recorded of."""
    return [name for name, measured in recorded() if measured == quantity]


def apart(quantity: str, name: str) -> float:
    """Return how far our figure is from the circuit's, of what is allowed to that side: 1 is just allowed."""
    row = recorded()[name, quantity]
    measure = MEASURES[quantity]
    bench = next(each for each in measure.benches if each.name == name)
    off = (measure.ours(bench) - row.value) / abs(row.value)
    return off / row.above if off > 0.0 else -off / row.below
