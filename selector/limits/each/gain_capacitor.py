"""The amplifier wants no capacitor across its gain resistors; one that does cannot be judged yet."""

from __future__ import annotations

from selector.candidate.operating import AmplifierAt
from selector.limits.measure import AmplifierCheck, Limit, Measure, flag


def _wanted(at: AmplifierAt) -> Measure:
    """The amplifier takes no gain capacitor."""
    return flag(bad=at.amplifier.gain_capacitor == 1.0)


LIMIT = Limit("gain capacitor", (AmplifierCheck(_wanted),), None)
