"""Something is left of the output between its ends."""

from __future__ import annotations

from selector.candidate.operating import AmplifierAt
from selector.limits.measure import AmplifierCheck, Limit, Measure
from selector.units import VOLTAGE


def _span(at: AmplifierAt) -> Measure:
    """The span is above 0 V."""
    return Measure(0.0, at.window.span_v, strict=True)


LIMIT = Limit("output window", (AmplifierCheck(_span),), VOLTAGE)
