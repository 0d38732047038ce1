"""Whole budgets against two libraries that propagate uncertainties through a measurement function."""

from __future__ import annotations

from typing import TYPE_CHECKING, Any

import metrolopy
import pytest
import uncertainties

from selector.budget import combined
from tests.budget.models import high_side, low_side
from tests.budget.worked import chain
from tests.builders import near

if TYPE_CHECKING:
    from collections.abc import Callable

Standard = tuple["Callable[[float, float], Any]", "Callable[[Any], tuple[float, float]]"]
LIBRARIES: dict[str, Standard] = {
    "uncertainties": (uncertainties.ufloat, lambda number: (number.nominal_value, number.std_dev)),
    "metrolopy": (metrolopy.gummy, lambda number: (float(number.x), float(number.u))),
}
COVERAGE = 2.0


@pytest.mark.parametrize("library", LIBRARIES)
@pytest.mark.parametrize("number", [1, 2])
@pytest.mark.parametrize("share", [0.0, 0.5, 1.0])
def test_budget_of_a_non_inverting_design(library: str, number: int, share: float) -> None:
    """The low side design's error over its coverage is the standard uncertainty of its measurement function.

    Source: uncertainties and metrolopy, JCGM 100:2008, 5.1.2.
    Tolerance: 1e-9, what is asked of them.
    """
    at = chain("low_side_two_ranges", accuracy__method="rss").ranges[number - 1]
    current = float(at.low_a + share * (at.high_a - at.low_a))
    make, read = LIBRARIES[library]
    value, standard = read(low_side(make, number, current))
    assert value == near(current, rel=1e-12)
    assert combined(at).error_a(current) / COVERAGE == near(standard, rel=1e-9)


@pytest.mark.parametrize("library", LIBRARIES)
@pytest.mark.parametrize("number", [1, 2, 3])
@pytest.mark.parametrize("share", [0.0, 0.5, 1.0])
def test_budget_of_a_one_resistor_design(library: str, number: int, share: float) -> None:
    """The calibrated high side design's error over its coverage is that of its measurement function.

    Source: uncertainties and metrolopy, JCGM 100:2008, 5.1.2.
    Tolerance: 1e-9, what is asked of them.
    """
    at = chain("high_side_two_way").ranges[number - 1]
    current = float(at.low_a + share * (at.high_a - at.low_a))
    make, read = LIBRARIES[library]
    value, standard = read(high_side(make, number, current, float(at.high_a)))
    assert value == near(current, rel=1e-12)
    assert combined(at).error_a(current) / COVERAGE == near(standard, rel=1e-9)
