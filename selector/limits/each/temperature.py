"""The ambient lies inside what the amplifier stands."""

from __future__ import annotations

from selector.candidate.operating import AmplifierAt
from selector.limits.measure import AmplifierCheck, Limit, Measure
from selector.units import TEMPERATURE


def _cold(at: AmplifierAt) -> Measure:
    """The coldest ambient is not too cold."""
    return Measure(at.amplifier.temp_min_degc, at.conditions.ambient_min_degc)


def _hot(at: AmplifierAt) -> Measure:
    """The hottest ambient is not too hot."""
    return Measure(at.conditions.ambient_max_degc, at.amplifier.temp_max_degc)


LIMIT = Limit(
    "temperature",
    (
        AmplifierCheck(_cold),
        AmplifierCheck(_hot),
    ),
    TEMPERATURE,
)
