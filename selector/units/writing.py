"""SI figures to texts: exactly, so that they can be read back, and for people."""

from __future__ import annotations

import math
from decimal import ROUND_HALF_UP, Context, Decimal

from selector.units.quantities import COUNT, MONEY
from selector.units.quantity import Quantity, QuantityError
from selector.units.steps import STEPS, Step

_PLAIN_FROM, _PLAIN_BELOW = -6, 16  # powers of ten between which no exponent is written
_CENTS = Decimal("0.01")


def exact(value: float, quantity: Quantity) -> str:
    """Return a text that `parse` reads back as the same double, in a unit that suits its size.

    Raises
    ------
    QuantityError
        Where the value is not finite, or not whole where the quantity is.

    Examples
    --------
    >>> from selector.units import CURRENT, DECIBEL, FRACTION, PER_KELVIN, RESISTANCE
    >>> exact(4700.0, RESISTANCE), exact(0.001, FRACTION), exact(25e-6, PER_KELVIN), exact(110.0, DECIBEL)
    ('4.7 kohm', '0.1 %', '25 ppm/K', '110 dB')
    >>> exact(0.1 + 0.2, CURRENT)
    '300.00000000000004 mA'
    """
    if not math.isfinite(value):
        raise QuantityError(f"{value} is not finite", f"a {quantity.name} is like {quantity.example}")
    if quantity.whole and not value.is_integer():
        raise QuantityError(f"{value} is no {quantity.name}", f"a {quantity.name} is like {quantity.example}")
    return _in_step(Decimal(repr(float(value))), quantity)


def shown(value: float, quantity: Quantity, digits: int = 3) -> str:
    """Return a text for people: ASCII, so many significant digits, trailing zeros left out.

    Halves are rounded away from zero, as they are by hand, on the decimal that the double prints as. Counts keep every
    digit, prices at least the cents.

    Examples
    --------
    >>> from selector.units import CURRENT, FRACTION, MONEY, RESISTANCE, VOLTAGE
    >>> shown(60e-6, CURRENT), shown(4990.0, RESISTANCE), shown(0.9999, VOLTAGE), shown(0.062, FRACTION)
    ('60 uA', '4.99 kohm', '1 V', '6.2 %')
    >>> shown(0.0, VOLTAGE), shown(-0.0034, CURRENT), shown(1234.5, MONEY)
    ('0 V', '-3.4 mA', '1234.50')
    """
    if not math.isfinite(value):
        return f"{value} {quantity.unit}".rstrip()
    decimal = Decimal(repr(float(value)))
    if quantity == MONEY and abs(decimal) >= _CENTS * 10:
        return f"{decimal.quantize(_CENTS, ROUND_HALF_UP, Context(prec=400)):f}"
    if quantity != COUNT:
        decimal = Context(prec=digits, rounding=ROUND_HALF_UP).plus(decimal)
    return _in_step(abs(decimal) if decimal == 0 else decimal, quantity)


def _in_step(value: Decimal, quantity: Quantity) -> str:
    """Return a decimal with its unit, with the prefix that suits it."""
    step = _step(value, quantity)
    number = _digits(value, step.exponent)
    return f"{number} {step.text}" if step.text else number


def _step(value: Decimal, quantity: Quantity) -> Step:
    """Return the largest step that the value reaches: its own unit for zero, the least step for what reaches none."""
    steps = STEPS.get(quantity, (Step(quantity.unit, 0, 0),))
    if value == 0:
        return next((step for step in steps if step.exponent == 0), steps[0])
    size = value.adjusted()
    return next((step for step in steps if size >= step.start), steps[-1])


def _digits(value: Decimal, exponent: int) -> str:
    """Return a decimal over a power of ten, without trailing zeros, with an exponent only where it would be long."""
    sign, digits, _ = value.as_tuple()
    text = "".join(str(digit) for digit in digits).rstrip("0") or "0"
    minus = "-" if sign else ""
    if text == "0":
        return minus + text
    size = value.adjusted() - exponent
    if not _PLAIN_FROM <= size < _PLAIN_BELOW:
        return f"{minus}{text[0]}{'.' if text[1:] else ''}{text[1:]}e{size}"
    if size < 0:
        return f"{minus}0.{'0' * (-size - 1)}{text}"
    whole, rest = text[: size + 1].ljust(size + 1, "0"), text[size + 1 :]
    return f"{minus}{whole}{'.' if rest else ''}{rest}"
