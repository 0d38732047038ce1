"""Neighbouring ranges may disagree by more than the hysteresis between them."""

from __future__ import annotations

from collections.abc import Iterator
from dataclasses import dataclass
from itertools import pairwise
from math import floor

from selector.bill.caution import Caution
from selector.candidate import Candidate, Conditions
from selector.units import CURRENT, FRACTION, shown


@dataclass(frozen=True, slots=True)
class _Change:
    """A change from a range to the next: its upper border, the hysteresis and the two errors there, A."""

    range: int
    high_a: float
    hysteresis_a: float
    errors_a: float

    @property
    def share(self) -> float:
        """Return the least hysteresis as a share of the upper border."""
        return self.errors_a / self.high_a


def _texts(candidate: Candidate, conditions: Conditions) -> tuple[str, ...]:
    """Where U[k] - L[k+1] <= E(U[k]) + E(L[k+1]); the overlap that would do is a whole per cent above every share."""
    changes = list(_changes(candidate))
    bad = [change for change in changes if change.hysteresis_a <= change.errors_a]
    if not bad:
        return ()
    per_cent = floor(100.0 * max(change.share for change in changes)) + 1
    remedy = f"ranges.overlap = {per_cent} % would do" if per_cent < 100 else "no overlap would do"  # noqa: PLR2004 - per cent
    overlap = shown(conditions.overlap_frac, FRACTION)
    return tuple(
        f"Ranges {change.range} and {change.range + 1} may hand back and forth at {shown(change.high_a, CURRENT)}: "
        f"they may disagree by {shown(change.errors_a, CURRENT)}, and the overlap of {overlap} is "
        f"{shown(change.hysteresis_a, CURRENT)}; {remedy}."
        for change in bad
    )


def _changes(candidate: Candidate) -> Iterator[_Change]:
    """Yield every change; the points of a range run from its lower to its upper border."""
    for number, (lower, upper) in enumerate(pairwise(candidate.ranges), start=1):
        at_high = [point for point in candidate.points if point.range == number][-1]
        at_low = next(point for point in candidate.points if point.range == number + 1)
        yield _Change(number, lower.high_a, lower.high_a - upper.low_a, at_high.error_a + at_low.error_a)


CAUTION = Caution("range change", _texts)
