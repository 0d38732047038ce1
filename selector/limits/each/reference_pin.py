"""A zero above 0 V needs an amplifier with a reference pin."""

from __future__ import annotations

from selector.candidate.operating import AmplifierAt
from selector.limits.measure import AmplifierCheck, Limit, Measure, flag


def _pin(at: AmplifierAt) -> Measure:
    """The amplifier has a reference pin where the zero is above 0 V."""
    return flag(bad=at.conditions.zero_v > 0.0 and at.amplifier.reference_pin == 0.0)


LIMIT = Limit("reference pin", (AmplifierCheck(_pin),), None)
