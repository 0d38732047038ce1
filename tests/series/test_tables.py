"""The decade tables of the E series."""

from __future__ import annotations

import csv
from pathlib import Path

import eseries
import pytest

from selector.series import SERIES

REFERENCE = Path(__file__).parents[1] / "reference" / "preferred_values.csv"


def _rows() -> list[tuple[str, int, int, int]]:
    """Return series, digits, number of values and decade sum of each row of the reference table."""
    with REFERENCE.open(encoding="utf-8", newline="") as table:
        return [
            (row["series"], int(row["digits"]), int(row["values"]), int(row["decade_sum"]))
            for row in csv.DictReader(table)
        ]


@pytest.mark.parametrize(("series", "digits", "values", "decade_sum"), _rows())
def test_decade_sum(series: str, digits: int, values: int, decade_sum: int) -> None:
    """A decade has as many values as its name says, rising from 1, and their known sum.

    Source: tests/reference/preferred_values.csv (IEC 60063:2015).
    Tolerance: none, whole numbers.
    """
    table = SERIES[series]
    assert len(table) == values
    assert sum(table) == decade_sum
    assert list(table) == sorted(set(table))
    assert (table[0], len(str(table[-1]))) == (10 ** (digits - 1), digits)


def test_series_are_those_of_the_standard() -> None:
    """The series stand in the order of their size, and no other is there."""
    assert list(SERIES) == [row[0] for row in _rows()]


@pytest.mark.parametrize("series", list(SERIES))
def test_table_of_another_library(series: str) -> None:
    """Every decade equals that of an independent implementation.

    Source: the eseries package.
    Tolerance: none, whole numbers.
    """
    assert SERIES[series] == tuple(eseries.series(eseries.ESeries[series]))


def test_values_that_are_not_the_rounded_power() -> None:
    """E24 has eight values, E192 one, that are not the rounded power of ten.

    Source: IEC 60063:2015.
    Tolerance: none, whole numbers.
    """
    assert [value for step, value in enumerate(SERIES["E24"]) if value != round(10 * 10 ** (step / 24))] == [
        27,
        30,
        33,
        36,
        39,
        43,
        47,
        82,
    ]
    assert [value for step, value in enumerate(SERIES["E192"]) if value != round(100 * 10 ** (step / 192))] == [920]
    assert not {value * 10 for value in SERIES["E24"]} <= set(SERIES["E192"])
