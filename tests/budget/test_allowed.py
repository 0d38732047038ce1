"""The allowed error and the currents at which a range is judged."""

from __future__ import annotations

import numpy as np

from selector.budget import allowed_at, judged
from tests.builders import conditions, near

BANDS = [
    {"up_to": 0.2, "reading": 0.1, "floor": 0.01},
    {"up_to": 0.5, "reading": 0.05},
    {"reading": 0.02, "floor": 0.1},
]
BANDED = conditions(accuracy__reading=None, accuracy__floor=None, accuracy__bands=BANDS)


def test_one_allowance() -> None:
    """10 % of the reading and 10 mA allow 20 mA at 0.1 A and 110 mA at 1 A."""
    assert [allowed_at(conditions(), current) for current in (0.1, 1.0)] == near([0.02, 0.11])


def test_a_band_holds_its_upper_end() -> None:
    """At 0.2 A the first band holds, 30 mA; above it the second, 5 %; above 0.5 A the last, 2 % and 100 mA."""
    wanted = {0.1: 0.02, 0.2: 0.03, 0.3: 0.015, 0.5: 0.025, 0.6: 0.112}
    for current, allowed in wanted.items():
        assert allowed_at(BANDED, current) == near(allowed)


def test_floats_and_arrays_alike() -> None:
    """An array of currents has the allowance of each."""
    currents = np.array([0.1, 0.2, 0.3, 0.5, 0.6])
    assert allowed_at(BANDED, currents).tolist() == [allowed_at(BANDED, float(one)) for one in currents]


def test_a_range_is_judged_at_its_ends() -> None:
    """Without bands the two ends are judged."""
    assert judged(conditions(), 0.1, 1.0) == ((0.1, near(0.02)), (1.0, near(0.11)))


def test_a_range_is_judged_on_both_sides_of_every_break() -> None:
    """Breaks of 0.2 and 0.5 A are judged by the lower, then by the upper band."""
    assert judged(BANDED, 0.1, 1.0) == (
        (0.1, near(0.02)),
        (0.2, near(0.03)),
        (0.2, near(0.01)),
        (0.5, near(0.025)),
        (0.5, near(0.11)),
        (1.0, near(0.12)),
    )


def test_a_break_at_an_end_of_the_range() -> None:
    """A break at the lower end is judged on both sides, once each; one at the upper end by the band it belongs to."""
    assert judged(BANDED, 0.2, 0.5) == ((0.2, near(0.03)), (0.2, near(0.01)), (0.5, near(0.025)))


def test_bands_outside_the_range_are_not_judged() -> None:
    """From 0.3 to 0.4 A the second band holds at both ends."""
    assert judged(BANDED, 0.3, 0.4) == ((0.3, near(0.015)), (0.4, near(0.02)))
