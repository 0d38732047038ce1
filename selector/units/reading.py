"""Texts to SI figures: the grammar of quantities as people write them."""

from __future__ import annotations

import math
import re

from selector.units.characters import LONGEST, LONGEST_UNIT, clean, foreign_digit, joined, plain, quoted
from selector.units.doubtful import NOT_TAKEN, TWO_READINGS
from selector.units.letter_code import read_tolerance, read_value
from selector.units.lookup import meanings
from selector.units.number import DecimalMark, Number, Parts, decimals, divided, exponent_of, number_of, split
from selector.units.quantity import Quantity, QuantityError
from selector.units.refusals import (
    could_be,
    like,
    nothing_of_it,
    several_units,
    unknown_unit,
    without_unit,
    wrong_unit,
)

_SIGN = re.compile(r"(\+/-|\+-|±) *+|[+-]")


def parse(
    text: str, quantity: Quantity, *, bare: bool = True, unit: str | None = None, decimal: DecimalMark = "auto"
) -> float:
    """Return the SI figure of a text (temperatures in degC, ratios in dB and figures in LSB as they are).

    Read are a number with a unit (`4.7 kohm`, `25ppm/degC`), with a prefix alone (`2.2u`), a letter code of IEC
    60062:2016 (`4K7`, `0R05`, `5L0`), a fraction of a watt (`1/8 W`), a tolerance letter for a fraction, and
    a bare number. The figure is the double nearest to the decimal that was written.

    Decisions where a reading is not plain: `m` is milli and `M` mega, and an `M` where only milli is in use (`100 MA`)
    is refused, as is a unit all in capitals or all in small letters that is milli to one reader and mega to another
    (`5 MOHM`, `10 mhz`); else the case of a unit does not count. A lone `K` is kilo for a resistance, kelvin for a
    temperature difference and refused elsewhere. `ppm` is `ppm/K` where a temperature coefficient is wanted: nobody
    states it otherwise. `1,000` is refused, `3,3` read. `4E7` as a resistance is refused (4.7 or 4e7), `4e7` read.

    Parameters
    ----------
    text
        At most 10 000 characters.
    quantity
        What is wanted.
    bare
        Whether a number without any unit is taken, in `quantity.unit`.
    unit
        The unit of numbers that have none, such as a column's heading gives it.
    decimal
        `auto`, or the decimal mark that is known to be in use: `point` or `comma`.

    Raises
    ------
    QuantityError
        Where the text is not that quantity, or could be two figures of it.

    Examples
    --------
    >>> from selector.units import CAPACITANCE, FRACTION, PER_KELVIN, RESISTANCE, VOLTAGE
    >>> parse("4.7k", RESISTANCE), parse("4K7", RESISTANCE), parse("0R05", RESISTANCE), parse("5L0", RESISTANCE)
    (4700.0, 4700.0, 0.05, 0.005)
    >>> parse("2.2u", CAPACITANCE), parse("25 ppm/K", PER_KELVIN), parse("0,1 %", FRACTION), parse("F", FRACTION)
    (2.2e-06, 2.5e-05, 0.001, 0.01)
    >>> parse("4.7", RESISTANCE, unit="kohm", bare=False)
    4700.0
    >>> parse("100 mA", VOLTAGE)
    Traceback (most recent call last):
    ...
    selector.units.quantity.QuantityError: "100 mA" is a current; a voltage is wanted, for example "100 mV"
    """
    if len(text) > LONGEST:
        raise QuantityError(f"{quoted(text)} has more than {LONGEST} characters", like(quantity))
    cell = plain(text)
    strange = foreign_digit(cell)
    if strange:
        raise QuantityError(f"{quoted(text)} has the sign {quoted(strange)}, which is none of 0 to 9", like(quantity))
    sign, unsigned = _signed(cell, text, quantity)
    number, power = (
        read_tolerance(cell, quantity)
        or read_value(unsigned, text, quantity)
        or _with_unit(unsigned, text, quantity, _else_unit(quantity, bare=bare, unit=unit), decimal)
    )
    return sign * _checked(number.times_ten_to(power), number, text, quantity)


def is_unit(text: str, quantity: Quantity) -> bool:
    """Whether a text alone is a unit of the quantity, with one reading, as in the heading of a column.

    Examples
    --------
    >>> from selector.units import CURRENT, RESISTANCE
    >>> is_unit("kOhm", RESISTANCE), is_unit("kOhm", CURRENT), is_unit("MOHM", RESISTANCE)
    (True, False, False)
    """
    unit = joined(plain(text))
    if len(unit) > LONGEST_UNIT or (quantity, unit) in TWO_READINGS or (quantity, unit) in NOT_TAKEN:
        return False
    found = meanings(unit, quantity)
    return len(found) == 1 and found[0].quantity == quantity


def plain_power(quantity: Quantity, *, bare: bool, unit: str | None = None) -> int | None:
    """Return the power of ten of plain decimal numbers, as `parse` reads them with the same arguments.

    None where a number without a unit is refused. `parse` gives the double nearest to such a number times that power.

    Examples
    --------
    >>> from selector.units import FRACTION, RESISTANCE
    >>> plain_power(RESISTANCE, bare=False, unit="kohm"), plain_power(RESISTANCE, bare=True)
    (3, 0)
    >>> plain_power(FRACTION, bare=False) is None
    True
    """
    else_unit = _else_unit(quantity, bare=bare, unit=unit)
    if else_unit is None:
        return None
    try:
        return _power(joined(plain(else_unit)), else_unit, else_unit, quantity) if else_unit else 0
    except QuantityError:
        return None


def _else_unit(quantity: Quantity, *, bare: bool, unit: str | None) -> str | None:
    """Return the unit that a number without one has, or None where it must not be without."""
    return unit or (quantity.unit if bare or not quantity.unit else None)


def _signed(cell: str, text: str, quantity: Quantity) -> tuple[float, str]:
    """Return the sign as a factor, and what follows it."""
    found = _SIGN.match(cell)
    if found is None:
        return 1.0, cell
    rest = cell[found.end() :]
    if not found.group(1):
        return (-1.0 if found.group() == "-" else 1.0), rest
    if not quantity.plus_minus:
        raise could_be(text, rest, "a span of twice that")
    return 1.0, rest


def _with_unit(
    cell: str, text: str, quantity: Quantity, else_unit: str | None, mark: DecimalMark
) -> tuple[Number, int]:
    """Return a number and the power of ten of its unit; `else_unit` is that of a number without one."""
    parts = split(cell)
    number, rest = _fraction(parts, quantity) or (_number(parts, text, quantity, mark), parts.rest)
    own = joined(rest)
    if own:
        if own[0].isdigit() and not own.startswith("1/"):
            raise nothing_of_it(text, quantity)
        return number, _power(own, rest, text, quantity)
    if else_unit is None:
        raise without_unit(text, _before(text, rest), quantity)
    return number, _power(joined(plain(else_unit)), else_unit, else_unit, quantity) if else_unit else 0


def _fraction(parts: Parts, quantity: Quantity) -> tuple[Number, str] | None:
    """Return a fraction like 1/8 and what follows it, where the quantity has such."""
    return divided(parts.body, parts.rest) if quantity.fractions and not parts.power else None


def _number(parts: Parts, text: str, quantity: Quantity, mark: DecimalMark) -> Number:
    """Return the number that digits, marks and exponent are."""
    readings = decimals(parts.body, mark)
    if not readings:
        raise nothing_of_it(text, quantity)
    if len(readings) > 1:
        minus = "-" if plain(text).startswith("-") else ""
        tail = (f"e{parts.power}" if parts.power else "") + parts.rest
        shown = (reading.rstrip("0").rstrip(".") if "." in reading else reading for reading in readings)
        raise could_be(text, *(f"{minus}{reading}{tail}" for reading in shown))
    exponent = exponent_of(parts.power)
    if exponent is None:
        raise QuantityError(f"{quoted(text)} has an exponent of more than three digits", like(quantity))
    return number_of(readings[0], exponent)


def _before(text: str, rest: str) -> str:
    """Return the number of a text, sign included, as it was written before its unit."""
    cell = plain(text)
    return clean(cell[: len(cell) - len(rest)].rstrip())


def _power(unit: str, rest: str, text: str, quantity: Quantity) -> int:
    """Return the power of ten of a unit, which must be one of the quantity and must have one reading.

    `unit` is `rest` without spaces, and `rest` what `text` ends in.
    """
    two = TWO_READINGS.get((quantity, unit))
    if two:
        first, second, remedy = (part.format(_before(text, rest)) for part in two)
        raise could_be(text, first, second, remedy=remedy)
    known = NOT_TAKEN.get((quantity, unit))
    if known:
        raise QuantityError(f"{quoted(text)} {known[0]}", known[1])
    found = meanings(unit, quantity) if len(unit) <= LONGEST_UNIT else ()
    if not found:
        raise unknown_unit(text, unit, quantity)
    if found[0].quantity != quantity:
        raise wrong_unit(text, found[0], quantity)
    if len(found) > 1:
        raise several_units(text, _before(text, rest), found)
    return found[0].exponent


def _checked(value: float, number: Number, text: str, quantity: Quantity) -> float:
    """Return the figure if a double can hold it and the quantity can be it."""
    if not math.isfinite(value):
        raise QuantityError(f"{quoted(text)} is too large for any calculation", like(quantity))
    if value == 0.0 and not number.is_zero:
        raise QuantityError(f"{quoted(text)} is too small for any calculation", like(quantity))
    if quantity.whole and not value.is_integer():
        raise nothing_of_it(text, quantity)
    return value
