"""Pairs of preferred values in series and in parallel."""

from __future__ import annotations

from decimal import Decimal
from fractions import Fraction
from itertools import combinations_with_replacement

import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

from selector.errors import UsageRefused
from selector.series import How, pairs, values_between
from selector.series.pairs import _WAYS


def _decimal(value: float) -> Fraction:
    """Return the decimal that a double prints as."""
    return Fraction(Decimal(repr(value)))


def _every_pair(value: float, series: str, how: How) -> list[tuple[float, float, float]]:
    """Return deviation, first and second of every pair within 1000 times of a value, best first, by trying them all."""
    asked = _decimal(value)
    found = [(one, _decimal(one)) for one in values_between(series, value / 1000, value * 1000)]
    rated = []
    for (first, a), (second, b) in combinations_with_replacement(found, 2):
        together = a + b if how == "series" else 1 / (1 / a + 1 / b)
        rated.append((abs(together - asked), first, second, float((together - asked) / asked)))
    return [(deviation, first, second) for _, first, second, deviation in sorted(rated)]


@settings(max_examples=25, deadline=None)
@given(
    st.sampled_from(["E3", "E6", "E12"]),
    st.floats(1e-9, 1e9),
    st.sampled_from(["series", "parallel"]),
    st.integers(1, 30),
)
def test_pairs_are_those_of_trying_all(series: str, value: float, how: How, count: int) -> None:
    """The best pairs are those of trying every pair, in the same order, with the same deviations."""
    assert [(pair.deviation, pair.first, pair.second) for pair in pairs(value, series, how, count)] == _every_pair(
        value, series, how
    )[:count]


@pytest.mark.parametrize("how", ["series", "parallel"])
def test_pairs_of_many_values(how: How) -> None:
    """The same holds for E24 at a value that many pairs make exactly."""
    best = pairs(5000.0, "E24", how, 20)
    assert [(pair.deviation, pair.first, pair.second) for pair in best] == _every_pair(5000.0, "E24", how)[:20]


def test_exact_pairs() -> None:
    """Two of 10 kohm are 5 kohm in parallel, and 0.22 and 0.47 are 0.69 in series, with no deviation at all."""
    assert [(one.first, one.second, one.deviation) for one in pairs(5000.0, "E3", "parallel", 1)] == [
        (10000.0, 10000.0, 0.0)
    ]
    assert [(one.first, one.second, one.value, one.deviation) for one in pairs(0.69, "E3", "series", 1)] == [
        (0.22, 0.47, 0.69, 0.0)
    ]


def test_pairs_of_the_largest_series_take_few_steps(monkeypatch: pytest.MonkeyPatch) -> None:
    """The best pairs of E192 over six decades take less than 50 sums for each value, not one for each other value."""
    sums: list[None] = []

    def counted(first: Fraction, second: Fraction) -> Fraction:
        sums.append(None)
        return first * second / (first + second)

    monkeypatch.setitem(_WAYS, "parallel", counted)
    pairs(4991.7, "E192", "parallel", 10)
    values = len(values_between("E192", 4.9917, 4.9917e6))
    assert values > 1000
    assert values < len(sums) < 50 * values


def test_unknown_way() -> None:
    """A way to connect that is none is refused in words."""
    with pytest.raises(UsageRefused) as refused:
        pairs(1.0, "E3", "delta")
    assert str(refused.value) == 'series: "delta" is no way to connect a pair; choose series or parallel'
