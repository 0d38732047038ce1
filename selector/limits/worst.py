"""The judged current of a range at which the error takes the largest share of what is allowed."""

from __future__ import annotations

from selector.budget import Combined, allowed_a, allowed_at, breaks
from selector.candidate import Operating
from selector.candidate.elementwise import chosen
from selector.limits.measure import Measure
from selector.real import Real, Truth


def worst_point(at: Operating, error: Combined) -> Measure:
    """Return error and allowed error, A, where their ratio is largest: both borders and every break between."""
    conditions = at.conditions
    low_a, high_a = at.low_a, at.high_a
    worst = Measure(error.error_a(low_a), allowed_at(conditions, low_a))
    for at_a, below, above in breaks(conditions):
        inside = (low_a <= at_a) & (at_a < high_a)
        value = error.error_a(at_a)
        for band in (below, above):
            worst = _worse(worst, Measure(value, allowed_a(band, at_a)), inside)
    return _worse(worst, Measure(error.error_a(high_a), allowed_at(conditions, high_a)), inside=True)


def use_of(measure: Measure) -> Real:
    """Return the share of what is allowed."""
    return measure.value / measure.allowed


def _worse(first: Measure, second: Measure, inside: Truth) -> Measure:
    worse = inside & (use_of(second) > use_of(first))
    return Measure(chosen(worse, second.value, first.value), chosen(worse, second.allowed, first.allowed))
