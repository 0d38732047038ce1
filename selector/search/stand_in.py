"""A filter that no filter of the bank can beat, for each gain resistor."""

from __future__ import annotations

from dataclasses import dataclass

import numpy as np
from numpy.typing import NDArray

from selector.candidate.operating import FilterAt


@dataclass(frozen=True, slots=True)
class StandIn:
    """Arrays of shape (gain resistors,): the least of what adds error, the most of what gives speed.

    `serves` tells whether any filter at all serves a range with the resistor.
    """

    filter: FilterAt
    serves: NDArray[np.bool_]
