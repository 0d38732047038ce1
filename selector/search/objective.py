"""What a search makes small: a figure that rises with each of the four uses."""

from __future__ import annotations

from dataclasses import dataclass
from typing import Protocol

from selector.candidate.elementwise import larger
from selector.real import Real
from selector.spec import Spec


class Objective(Protocol):
    """A figure of merit of the four uses; it never falls when one of them rises."""

    def of(self, power: Real, burden: Real, headroom: Real, error: Real) -> Real:
        """Return the figure; arguments broadcast."""


@dataclass(frozen=True, slots=True)
class Score:
    """The weighted mean of the four uses."""

    power: float
    burden: float
    headroom: float
    error: float

    def of(self, power: Real, burden: Real, headroom: Real, error: Real) -> Real:
        """Return sum w use / sum w; a use of weight 0 takes no part, whatever it is."""
        total: Real = 0.0
        weights = (self.power, self.burden, self.headroom, self.error)
        for weight, use in zip(weights, (power, burden, headroom, error), strict=True):
            if weight > 0.0:
                total = total + weight * use
        return total / (self.power + self.burden + self.headroom + self.error)


@dataclass(frozen=True, slots=True)
class LargestUse:
    """The largest of the four uses: how far the nearest combination is from fitting."""

    def of(self, power: Real, burden: Real, headroom: Real, error: Real) -> Real:
        """Return the largest use."""
        return larger(larger(power, burden), larger(headroom, error))


def score_of(spec: Spec) -> Score:
    """Return the score that a spec ranks by."""
    rank = spec.rank
    return Score(rank.power, rank.burden, rank.headroom, rank.error)
