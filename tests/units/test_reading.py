"""Texts that are read, and what they are."""

from __future__ import annotations

import csv
from fractions import Fraction
from pathlib import Path

import pytest
from hypothesis import given
from hypothesis import strategies as st

from selector.units import (
    CAPACITANCE,
    FRACTION,
    PER_KELVIN,
    QUANTITIES,
    RESISTANCE,
    TEMPERATURE,
    VOLTAGE,
    DecimalMark,
    Quantity,
    is_unit,
    parse,
)

REFERENCE = Path(__file__).parents[1] / "reference"


def _rows(name: str) -> list[tuple[str, str, str]]:
    """Return quantity, text and value of each row of a reference table."""
    with (REFERENCE / name).open(encoding="utf-8", newline="") as table:
        return [(row["quantity"], row["text"], row["value"]) for row in csv.DictReader(table)]


@pytest.mark.parametrize(("quantity", "text", "value"), _rows("letter_codes.csv"))
def test_letter_code(quantity: str, text: str, value: str) -> None:
    """A letter code is the figure that the standard gives it.

    Source: tests/reference/letter_codes.csv, row by row.
    Tolerance: none, the double nearest to the decimal.
    """
    assert parse(text, QUANTITIES[quantity], bare=False) == float(value)


@pytest.mark.parametrize(("quantity", "text", "value"), _rows("quantities.csv"))
def test_quantity(quantity: str, text: str, value: str) -> None:
    """A quantity as people write it is its SI figure.

    Source: tests/reference/quantities.csv, row by row.
    Tolerance: none, the double nearest to the decimal.
    """
    assert parse(text, QUANTITIES[quantity]) == float(value)


def test_every_quantity_has_a_reference() -> None:
    """Every quantity stands in the reference table."""
    assert {row[0] for row in _rows("quantities.csv")} == set(QUANTITIES)


@pytest.mark.parametrize("quantity", QUANTITIES.values(), ids=lambda quantity: quantity.name)
def test_example_parses(quantity: Quantity) -> None:
    """The example that a message shows is itself taken, without help of a bare number."""
    assert parse(quantity.example, quantity, bare=False) > 0.0


@pytest.mark.parametrize("quantity", QUANTITIES.values(), ids=lambda quantity: quantity.name)
def test_units_of_a_quantity_are_units(quantity: Quantity) -> None:
    """Canonical unit and heading of a quantity are read as its units."""
    for unit in {quantity.unit, quantity.heading} - {""}:
        assert is_unit(unit, quantity)
    assert parse("2", quantity, unit=quantity.unit) == 2.0


@pytest.mark.parametrize(
    ("text", "quantity", "unit", "value"),
    [
        ("4.7", RESISTANCE, "kohm", 4700.0),
        ("4.7", RESISTANCE, "kΩ", 4700.0),
        ("4.7", RESISTANCE, "k", 4700.0),
        ("4K7", RESISTANCE, "Mohm", 4700.0),
        ("4.7k", RESISTANCE, "Mohm", 4700.0),
        ("4.7 ohm", RESISTANCE, "kohm", 4.7),
        ("0.1", FRACTION, "%", 0.001),
        ("F", FRACTION, "%", 0.01),
        ("25", PER_KELVIN, "ppm/°C", 25e-6),
        ("100n", CAPACITANCE, "uF", 100e-9),
        ("85", TEMPERATURE, None, 85.0),
        ("1/8", QUANTITIES["power"], "W", 0.125),
    ],
)
def test_unit_of_a_heading(text: str, quantity: Quantity, unit: str | None, value: float) -> None:
    """The unit of a heading is taken for a number without one, and only there."""
    assert parse(text, quantity, unit=unit) == value


@pytest.mark.parametrize(
    ("text", "decimal", "value"),
    [
        ("1,000", "point", 1000.0),
        ("1,234.5", "point", 1234.5),
        ("1.000", "point", 1.0),
        ("1,000", "comma", 1.0),
        ("4,7", "comma", 4.7),
        ("1.234,5", "comma", 1234.5),
        ("1.234.567", "comma", 1234567.0),
        ("4.7", "comma", 4.7),
        ("1.000", "auto", 1.0),
        ("1.234.567", "auto", 1234567.0),
        ("1234,567", "auto", 1234.567),
        ("12,3456", "auto", 12.3456),
    ],
)
def test_decimal_mark(text: str, decimal: DecimalMark, value: float) -> None:
    """A known decimal mark decides what a comma is; unknown, only what can be one thing is read."""
    assert parse(text, VOLTAGE, decimal=decimal) == value


@given(st.integers(0, 10**18), st.integers(-30, 30), st.sampled_from([("n", -9), ("m", -3), ("", 0), ("k", 3)]))
def test_nearest_double(digits: int, power: int, prefix: tuple[str, int]) -> None:
    """A figure is the double nearest to the decimal that is written, prefix and exponent included."""
    exact = Fraction(digits) * Fraction(10) ** (power + prefix[1])
    assert parse(f"{digits}e{power} {prefix[0]}V", VOLTAGE) == float(exact)


@given(st.integers(1, 9999), st.integers(1, 9999))
def test_fraction_of_a_watt_is_the_nearest_double(dividend: int, divisor: int) -> None:
    """A fraction of a milliwatt is the double nearest to the exact quotient."""
    assert parse(f"{dividend}/{divisor} mW", QUANTITIES["power"]) == float(Fraction(dividend, divisor * 1000))


@given(st.integers(0, 999), st.integers(0, 999), st.sampled_from("LRKMG"))
def test_letter_code_equals_its_decimal(whole: int, decimals: int, letter: str) -> None:
    """A letter code is the same double as its decimal with the prefix behind it."""
    prefix = {"L": "m", "R": "", "K": "k", "M": "M", "G": "G"}[letter]
    assert parse(f"{whole}{letter}{decimals}", RESISTANCE) == parse(f"{whole}.{decimals} {prefix}ohm", RESISTANCE)


def test_is_unit_knows_its_own_alone() -> None:
    """A unit of another quantity, an ambiguous one and plain words are no units of a quantity."""
    assert is_unit("kOhm", RESISTANCE)
    assert is_unit("µV/√Hz", QUANTITIES["voltage noise density"])
    for text in ("kOhm", "MV", "K", "package", "", "V" * 50_000):
        assert not is_unit(text, VOLTAGE)
