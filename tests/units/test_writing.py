"""Figures that are written, for reading back and for people."""

from __future__ import annotations

import math
import struct

import pytest
from hypothesis import example, given
from hypothesis import strategies as st

from selector.units import (
    CAPACITANCE,
    COUNT,
    CURRENT,
    CURRENT_NOISE,
    DECIBEL,
    FRACTION,
    FREQUENCY,
    LSB,
    MONEY,
    PER_KELVIN,
    POWER,
    QUANTITIES,
    RATIO,
    RESISTANCE,
    SLEW_RATE,
    TEMPERATURE,
    THERMAL_RESISTANCE,
    TIME,
    VOLT_PER_KELVIN,
    VOLTAGE,
    VOLTAGE_NOISE,
    Quantity,
    QuantityError,
    exact,
    parse,
    shown,
)


def _bits(value: float) -> bytes:
    """Return the eight bytes of a double, which tell 0.0 from -0.0."""
    return struct.pack("<d", value)


@pytest.mark.parametrize("quantity", QUANTITIES.values(), ids=lambda quantity: quantity.name)
@given(value=st.floats(allow_nan=False, allow_infinity=False))
def test_exact_text_reads_back(quantity: Quantity, value: float) -> None:
    """What `exact` writes is read back as the same double, bit for bit, and never needs a bare number."""
    figure = float(math.trunc(value)) if quantity.whole else value
    assert _bits(parse(exact(figure, quantity), quantity, bare=False)) == _bits(figure)


@pytest.mark.parametrize("quantity", QUANTITIES.values(), ids=lambda quantity: quantity.name)
@pytest.mark.parametrize(
    "value", [0.0, -0.0, 5e-324, 2.2250738585072014e-308, 1.7976931348623157e308, 1e15, 1e16, 1e22]
)
def test_exact_text_of_an_extreme(quantity: Quantity, value: float) -> None:
    """The ends of what a double holds are written and read back."""
    if quantity == COUNT and not value.is_integer():
        with pytest.raises(QuantityError):
            exact(value, quantity)
    else:
        assert _bits(parse(exact(value, quantity), quantity, bare=False)) == _bits(value)


@given(st.floats(1e-12, 1e12), st.sampled_from(sorted(QUANTITIES)))
def test_exact_text_is_read_with_a_decimal_point(value: float, name: str) -> None:
    """What `exact` writes is also read where the decimal mark is known to be a point."""
    quantity = QUANTITIES[name]
    figure = float(round(value)) if quantity.whole else value
    assert parse(exact(figure, quantity), quantity, decimal="point") == figure


@pytest.mark.parametrize(
    ("value", "quantity", "text"),
    [
        (4700.0, RESISTANCE, "4.7 kohm"),
        (0.005, RESISTANCE, "5 mohm"),
        (470.0, RESISTANCE, "470 ohm"),
        (2.2e6, RESISTANCE, "2.2 Mohm"),
        (0.001, FRACTION, "0.1 %"),
        (0.01, FRACTION, "1 %"),
        (25e-6, FRACTION, "25 ppm"),
        (0.0, FRACTION, "0 %"),
        (25e-6, PER_KELVIN, "25 ppm/K"),
        (0.0, PER_KELVIN, "0 ppm/K"),
        (110.0, DECIBEL, "110 dB"),
        (-40.0, TEMPERATURE, "-40 degC"),
        (340.0, THERMAL_RESISTANCE, "340 K/W"),
        (1e-7, CAPACITANCE, "100 nF"),
        (8e-9, VOLTAGE_NOISE, "8 nV/rtHz"),
        (5e-15, CURRENT_NOISE, "5 fA/rtHz"),
        (5e5, SLEW_RATE, "0.5 V/us"),
        (500.0, SLEW_RATE, "500 V/s"),
        (1e-7, VOLT_PER_KELVIN, "100 nV/K"),
        (0.125, POWER, "125 mW"),
        (0.01, TIME, "10 ms"),
        (1e7, FREQUENCY, "10 MHz"),
        (0.5, LSB, "0.5 LSB"),
        (12.0, COUNT, "12"),
        (100.0, RATIO, "100"),
        (0.38, MONEY, "0.38"),
        (1e8, VOLTAGE, "100000 kV"),
        (1e-30, CURRENT, "1e-15 fA"),
        (0.1 + 0.2, VOLTAGE, "300.00000000000004 mV"),
    ],
)
def test_exact_text(value: float, quantity: Quantity, text: str) -> None:
    """An exact text has the unit that suits its size."""
    assert exact(value, quantity) == text


@pytest.mark.parametrize("value", [math.nan, math.inf, -math.inf])
def test_exact_text_of_what_is_not_finite(value: float) -> None:
    """What is not finite has no exact text."""
    with pytest.raises(QuantityError, match="is not finite"):
        exact(value, VOLTAGE)


@pytest.mark.parametrize(
    ("value", "quantity", "text"),
    [
        (60e-6, CURRENT, "60 uA"),
        (3.4e-3, CURRENT, "3.4 mA"),
        (4990.0, RESISTANCE, "4.99 kohm"),
        (0.052, VOLTAGE, "52 mV"),
        (0.9996, VOLTAGE, "1 V"),
        (0.9994, VOLTAGE, "999 mV"),
        (999.6e-6, CURRENT, "1 mA"),
        (0.99951, FRACTION, "100 %"),
        (0.062, FRACTION, "6.2 %"),
        (0.7123, FRACTION, "71.2 %"),
        (-0.0034, CURRENT, "-3.4 mA"),
        (0.0, VOLTAGE, "0 V"),
        (-0.0, VOLTAGE, "0 V"),
        (0.0, FRACTION, "0 %"),
        (1.0 / 3.0, POWER, "333 mW"),
        (1.005, VOLTAGE, "1.01 V"),
        (123.4, DECIBEL, "123 dB"),
        (1236.0, THERMAL_RESISTANCE, "1240 K/W"),
        (584.2, RATIO, "584"),
        (12345.0, COUNT, "12345"),
        (1234.5, MONEY, "1234.50"),
        (2.31, MONEY, "2.31"),
        (0.01234, MONEY, "0.0123"),
        (0.0, MONEY, "0"),
        (math.inf, VOLTAGE, "inf V"),
    ],
)
def test_text_for_people(value: float, quantity: Quantity, text: str) -> None:
    """Three significant digits, rounded before the prefix is chosen, without idle zeros."""
    assert shown(value, quantity) == text


def test_text_for_people_with_more_digits() -> None:
    """The number of significant digits can be asked for."""
    assert shown(1.23456, VOLTAGE, digits=5) == "1.2346 V"
    assert shown(1.23456, VOLTAGE, digits=1) == "1 V"


@given(st.floats(allow_nan=False, allow_infinity=False), st.sampled_from(sorted(QUANTITIES)))
@example(0.375, "price")
def test_text_for_people_is_ascii_and_near(value: float, name: str) -> None:
    """What people see is ASCII and within half a unit of the figure's third digit; of the cent for prices from 0.10.

    Tolerance: half a unit of the third digit is at most 0.5 % of the figure; the rest is for the rounding of doubles.
    """
    quantity = QUANTITIES[name]
    figure = float(math.trunc(value)) if quantity.whole else value
    text = shown(figure, quantity)
    assert text.isascii()
    if abs(figure) < 1e308:
        in_cents = quantity == MONEY and abs(figure) >= 0.1
        most = {"rel": 1e-12, "abs": 0.0050001} if in_cents else {"rel": 0.00501, "abs": 5e-321}
        assert parse(text, quantity) == pytest.approx(figure, **most)
