"""Numbers as people write them: sign, digits, decimal and thousands marks, exponent."""

from __future__ import annotations

import re
from dataclasses import dataclass
from fractions import Fraction
from typing import Literal, NamedTuple

DecimalMark = Literal["auto", "point", "comma"]

# Every alternative begins with another character and nothing is given back (possessive), so the time is linear.
_BODY = re.compile(r"(?:[0-9]++|[.,]|[' \u00a0\u2009\u202f](?=[0-9]{3}(?![0-9])))*+")
_EXPONENT = re.compile(r"[eE]([+-]?[0-9]++)")
_DIVISOR = re.compile(r"/([0-9]{1,4})(?![0-9])")
_EXPONENT_DIGITS = 3
_DIVIDEND_DIGITS = 4

# Digits alone, or in groups of three after a first group that does not begin with 0.
_POINT = re.compile(r"([0-9]*+|[1-9][0-9]{0,2}(?:([,' \u00a0\u2009\u202f])[0-9]{3}(?:\2[0-9]{3})*+)?)(?:\.([0-9]++))?")
_COMMA = re.compile(r"([0-9]*+|[1-9][0-9]{0,2}(?:([.' \u00a0\u2009\u202f])[0-9]{3}(?:\2[0-9]{3})*+)?)(?:,([0-9]++))?")
_MARKS = str.maketrans("", "", ".,' \u00a0\u2009\u202f")


@dataclass(frozen=True, slots=True)
class Number:
    """A number as its exact decimal: `digits` times ten to `exponent`, over `divisor`."""

    digits: str
    exponent: int
    divisor: int = 1

    def times_ten_to(self, power: int) -> float:
        """Return the double nearest to this number times ten to `power`."""
        exponent = self.exponent + power
        if self.divisor == 1:
            return float(f"{self.digits}e{exponent}")
        return float(Fraction(int(self.digits)) * Fraction(10) ** exponent / self.divisor)

    @property
    def is_zero(self) -> bool:
        """Whether the decimal is exactly zero."""
        return not self.digits.strip("0")


class Parts(NamedTuple):
    """A text that begins with a number: digits and marks, the digits of an exponent, and what follows."""

    body: str
    power: str
    rest: str


def split(text: str) -> Parts:
    """Return the parts of a text that begins with a number, if it does.

    Examples
    --------
    >>> split("4.7k"), split("1e-3 V")
    (Parts(body='4.7', power='', rest='k'), Parts(body='1', power='-3', rest=' V'))
    """
    found = _BODY.match(text)
    body = found.group() if found else ""
    rest = text[len(body) :]
    exponent = _EXPONENT.match(rest) if body else None
    if exponent is None:
        return Parts(body, "", rest)
    return Parts(body, exponent.group(1), rest[exponent.end() :])


def exponent_of(digits: str) -> int | None:
    """Return the exponent, or None where it has more than three digits."""
    return int(digits or "0") if len(digits.lstrip("+-")) <= _EXPONENT_DIGITS else None


def divided(body: str, rest: str) -> tuple[Number, str] | None:
    """Return the number and what follows where `body` and `rest` begin with a fraction like 1/8."""
    found = _DIVISOR.match(rest)
    if found is None or not body.isdigit() or len(body) > _DIVIDEND_DIGITS or int(found.group(1)) == 0:
        return None
    return Number(body, 0, int(found.group(1))), rest[found.end() :]


def decimals(body: str, mark: DecimalMark) -> tuple[str, ...]:
    """Return the plain decimals that a body of digits and marks can be: none, one, or two.

    `auto`: a point is the decimal mark, unless points can only be thousands marks; a comma is the decimal mark where it
    cannot be a thousands mark, a thousands mark where it can be nothing else, and both in `1,000`. `point`: commas are
    thousands marks. `comma`: commas are decimal marks; a lone point before three digits can still be either.

    Examples
    --------
    >>> decimals("3,3", "auto"), decimals("1,000", "auto"), decimals("1.234,5", "auto"), decimals("1,2,3", "auto")
    (('3.3',), ('1.000', '1000'), ('1234.5',), ())
    """
    point, comma = _read(_POINT, body), _read(_COMMA, body)
    if mark == "point":
        return point
    if mark == "comma":
        return _distinct(point + comma) if "," not in body else comma
    return point if "," not in body and point else _distinct(comma + point)


def _read(pattern: re.Pattern[str], body: str) -> tuple[str, ...]:
    """Return the plain decimal of a body in one notation, or nothing."""
    found = pattern.fullmatch(body)
    if found is None or not (found.group(1) or found.group(3)):
        return ()
    whole = found.group(1).translate(_MARKS)
    return (f"{whole or '0'}.{found.group(3)}" if found.group(3) else whole,)


def _distinct(readings: tuple[str, ...]) -> tuple[str, ...]:
    """Return the readings without repeats, in their order."""
    return tuple(dict.fromkeys(readings))


def number_of(decimal: str, exponent: int) -> Number:
    """Return the number of a plain decimal with a point and an exponent."""
    whole, _, fraction = decimal.partition(".")
    return Number(whole + fraction, exponent - len(fraction))
