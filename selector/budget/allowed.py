"""The error that a spec allows, and the currents at which a range is judged."""

from __future__ import annotations

from collections.abc import Iterator

from selector.candidate import Band, Conditions
from selector.candidate.elementwise import chosen
from selector.real import Real


def allowed_a(band: Band, current_a: Real) -> Real:
    """Return the allowed error in a band at a current, A: a share of the reading and a floor."""
    return band.reading_frac * current_a + band.floor_a


def allowed_at(conditions: Conditions, current_a: Real) -> Real:
    """Return the allowed error in the band that holds the current (I <= up_to), A."""
    bands = conditions.bands
    value = allowed_a(bands[-1], current_a)
    for band in reversed(bands[:-1]):
        value = chosen(current_a <= band.up_to_a, allowed_a(band, current_a), value)
    return value


def breaks(conditions: Conditions) -> Iterator[tuple[float, Band, Band]]:
    """Yield each break of the allowed-error table, A, with the band below and the one above."""
    for below, above in zip(conditions.bands, conditions.bands[1:], strict=False):
        yield below.up_to_a, below, above


def judged(conditions: Conditions, low_a: float, high_a: float) -> tuple[tuple[float, float], ...]:
    """Return (current, allowed error) in A at every judged current of a range, by current, the lower band first."""
    points = [(low_a, allowed_at(conditions, low_a))]
    for at_a, below, above in breaks(conditions):
        if low_a < at_a < high_a:
            points.append((at_a, allowed_a(below, at_a)))
        if low_a <= at_a < high_a:
            points.append((at_a, allowed_a(above, at_a)))
    points.append((high_a, allowed_at(conditions, high_a)))
    return tuple((float(current), float(allowed)) for current, allowed in points)
