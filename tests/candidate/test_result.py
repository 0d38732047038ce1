"""What a judged combination tells of itself."""

from __future__ import annotations

import pytest

from selector.candidate import Point, Uses, Verdict
from tests.builders import near


@pytest.mark.parametrize(
    ("value", "allowed", "margin"),
    [
        (0.5, 2.0, 0.75),
        (2.0, 2.0, 0.0),
        (3.0, 2.0, -0.5),
        (-3.0, -2.0, 0.5),
        (-1.0, -2.0, -0.5),
        (1.0, 0.0, None),
        (None, 2.0, None),
        (1.0, None, None),
    ],
)
def test_margin(value: float | None, allowed: float | None, margin: float | None) -> None:
    """The margin is (allowed - value) / abs(allowed), positive where the limit is met, None without a figure."""
    assert Verdict("burden", None, value, allowed).margin == margin


def test_largest_use() -> None:
    """The largest of the four uses counts, whichever it is."""
    uses = [0.1, 0.2, 0.3, 0.4]
    for turned in range(4):
        assert Uses(*uses[turned:], *uses[:turned]).largest() == 0.4


def test_use_of_a_point() -> None:
    """3 mA of error of 4 mA allowed are three quarters."""
    assert Point(1, 0.1, 3e-3, 4e-3, ()).use == near(0.75)
