"""Preferred values of a span, and those nearest to a value."""

from __future__ import annotations

from decimal import Decimal
from fractions import Fraction

import eseries
import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

from selector.errors import UsageRefused
from selector.series import SERIES, Preferred, nearest, values_between

NAMES = st.sampled_from(list(SERIES))


def _every_value(series: str) -> list[float]:
    """Return every value of a series from 1e-18 to 1e15, from its decimals."""
    digits = len(str(SERIES[series][0])) - 1
    return [float(f"{step}e{decade - digits}") for decade in range(-18, 15) for step in SERIES[series]]


def _decimal(value: float) -> Fraction:
    """Return the decimal that a double prints as."""
    return Fraction(Decimal(repr(value)))


def test_values_of_a_span() -> None:
    """A span holds its ends, and every value is the double nearest to its decimal."""
    assert values_between("E96", 4.99e3, 5.11e3) == (4990.0, 5110.0)
    assert values_between("E12", 0.82, 1.2) == (0.82, 1.0, 1.2)
    assert values_between("E12", 1.01, 1.19) == ()
    assert values_between("E12", 2.0, 1.0) == ()
    assert values_between("E3", 1e-12, 1e-10) == (1e-12, 2.2e-12, 4.7e-12, 1e-11, 2.2e-11, 4.7e-11, 1e-10)


@settings(deadline=None)
@given(NAMES, st.floats(1e-15, 1e12), st.floats(1.0, 1e3))
def test_values_of_any_span(series: str, low: float, ratio: float) -> None:
    """A span is what a look at every value of every decade gives."""
    assert list(values_between(series, low, low * ratio)) == [
        value for value in _every_value(series) if low <= value <= low * ratio
    ]


@settings(deadline=None)
@given(st.sampled_from(["E6", "E24", "E96"]), st.floats(1e-2, 1e6), st.floats(1.0, 1e3))
def test_values_of_another_library(series: str, low: float, ratio: float) -> None:
    """A span has the values of an independent implementation, which may be off by rounding.

    Source: the eseries package.
    Tolerance: 1e-12, rounding of its scaling; values within 1e-9 of an end are not compared.
    """
    high = low * ratio
    inside = [one for one in values_between(series, low, high) if low * (1 + 1e-9) < one < high * (1 - 1e-9)]
    others = list(eseries.erange(eseries.ESeries[series], low, high))
    assert inside == pytest.approx([one for one in others if low * (1 + 1e-9) < one < high * (1 - 1e-9)], rel=1e-12)


@settings(deadline=None)
@given(NAMES, st.floats(1e-12, 1e12), st.integers(1, 60))
def test_nearest_values(series: str, value: float, count: int) -> None:
    """The nearest values are those of a look at every value, nearest first, the smaller of two as near."""
    asked = _decimal(value)
    every = sorted(_every_value(series), key=lambda one: (abs(_decimal(one) - asked), one))
    assert nearest(value, series, count) == tuple(
        Preferred(one, float((_decimal(one) - asked) / asked)) for one in every[:count]
    )


def test_nearest_of_two_as_near() -> None:
    """1.6 lies as far from 1.0 as from 2.2: the smaller comes first."""
    assert [one.value for one in nearest(1.6, "E3", 2)] == [1.0, 2.2]


def test_nearest_of_a_preferred_value() -> None:
    """A preferred value is its own nearest, with no deviation at all."""
    assert nearest(4990.0, "E96", 1) == (Preferred(4990.0, 0.0),)


@pytest.mark.parametrize(
    ("series", "value", "count", "message"),
    [
        ("E97", 1.0, 1, 'series: "E97" is no E series; choose one of E3, E6, E12, E24, E48, E96, E192'),
        ("E96", 0.0, 1, "series: 0.0 is no value of a part; give one from 1e-18 to 1000000000000000.0"),
        ("E96", -1.0, 1, "series: -1.0 is no value of a part; give one from 1e-18 to 1000000000000000.0"),
        ("E96", float("nan"), 1, "series: nan is no value of a part; give one from 1e-18 to 1000000000000000.0"),
        ("E96", float("inf"), 1, "series: inf is no value of a part; give one from 1e-18 to 1000000000000000.0"),
        ("E96", 1.0, 0, "series: 0 values cannot be shown; ask for 1 or more"),
    ],
)
def test_refused(series: str, value: float, count: int, message: str) -> None:
    """An unknown series, an impossible value or count is refused in words."""
    with pytest.raises(UsageRefused) as refused:
        nearest(value, series, count)
    assert str(refused.value) == message


def test_more_values_than_there_are() -> None:
    """Asked for more values than a part can have, all of them are given."""
    assert len(nearest(1.0, "E3", 10**9)) == 3 * 33 + 1
