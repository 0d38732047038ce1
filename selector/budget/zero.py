"""What a calibration of the zero removes."""

from __future__ import annotations

from dataclasses import replace

from selector.budget.terms import TERMS
from selector.candidate import Calibration, Operating
from selector.real import Real


def zeroed(at: Operating) -> Operating:
    """Return the range with the plain sum of the terms that a zero calibration removes, A.

    The sum is 0 where the zero is not calibrated, and a plain sum whatever the method of combining.
    """
    total: Real = 0.0
    if at.calibration.zero:
        for term in TERMS:
            if term.removed_by is Calibration.ZERO:
                removable = term.removable(at)
                for size in term.sizes(at):
                    total = total + size.constant_a * removable
    return replace(at, zero_sum_a=total)
