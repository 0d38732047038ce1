"""What rules a combination out, in the order of judging."""

from selector.limits.capacitor import unfit
from selector.limits.each import LIMITS
from selector.limits.measure import (
    AmplifierCheck,
    ChoiceAt,
    ChoiceCheck,
    DesignAt,
    DesignCheck,
    FilterCheck,
    Limit,
    LinkCheck,
    Measure,
    PairCheck,
    PointCheck,
    RangeCheck,
    ShuntCheck,
    SwitchCheck,
    fits,
)
from selector.limits.settle import settle_s
from selector.limits.worst import use_of, worst_point

__all__ = [
    "LIMITS",
    "AmplifierCheck",
    "ChoiceAt",
    "ChoiceCheck",
    "DesignAt",
    "DesignCheck",
    "FilterCheck",
    "Limit",
    "LinkCheck",
    "Measure",
    "PairCheck",
    "PointCheck",
    "RangeCheck",
    "ShuntCheck",
    "SwitchCheck",
    "fits",
    "settle_s",
    "unfit",
    "use_of",
    "worst_point",
]
