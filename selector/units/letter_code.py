"""Letter codes of IEC 60062: values with a letter in the place of the decimal mark, and tolerance letters."""

from __future__ import annotations

import re

from selector.units.characters import joined, quoted
from selector.units.letters import LEADING_LETTER, TOLERANCE_LETTERS, VALUE_LETTERS
from selector.units.lookup import is_base
from selector.units.number import Number, number_of
from selector.units.quantities import FRACTION, RESISTANCE
from selector.units.quantity import Quantity, QuantityError
from selector.units.refusals import could_be, nothing_of_it

_CODE = re.compile(r"([0-9]*+)([A-Za-z])([0-9]*+)(.*+)", re.DOTALL)
_EXPONENT_LIKE = re.compile(r"([0-9]++)E([0-9]++)")
_PERCENT = -2


def read_tolerance(cell: str, quantity: Quantity) -> tuple[Number, int] | None:
    """Return the figure of a tolerance letter and its power of ten, where a fraction is wanted."""
    percent = TOLERANCE_LETTERS.get(cell) if quantity == FRACTION else None
    return (number_of(percent, 0), _PERCENT) if percent else None


def read_value(cell: str, text: str, quantity: Quantity) -> tuple[Number, int] | None:
    """Return the digits of a letter code and the letter's power of ten, or None where the cell is no such code.

    The letter stands between plain digits, or behind them with nothing after it, or (where the standard has it so)
    before them. A unit without prefix may follow.

    Raises
    ------
    QuantityError
        Where a tolerance letter or anything else follows, or where `4E7` is 4.7 to one reader and 4e7 to another.
    """
    letters = VALUE_LETTERS.get(quantity, {})
    found = _CODE.fullmatch(cell)
    if not letters or found is None:
        return None
    if quantity == RESISTANCE:
        _refuse_exponent_like(cell, text)
    before, letter, after, rest = found.groups()
    if letter not in letters or not _is_code(before, after, rest, quantity):
        return None
    _refuse_ending(joined(rest), before + letter + after, text, quantity)
    return Number(before + after, -len(after)), letters[letter]


def _is_code(before: str, after: str, rest: str, quantity: Quantity) -> bool:
    """Whether digits stand where a letter code has them."""
    if after:
        return bool(before) or quantity in LEADING_LETTER
    return bool(before) and not rest


def _refuse_exponent_like(cell: str, text: str) -> None:
    """Refuse 4E7, where E is written both for R and for an exponent."""
    found = _EXPONENT_LIKE.fullmatch(cell)
    if found:
        whole, digits = found.groups()
        raise could_be(text, f"{whole}.{digits} ohm", f"{whole}e{digits} ohm")


def _refuse_ending(ending: str, code: str, text: str, quantity: Quantity) -> None:
    """Refuse what may not follow a letter code."""
    if not ending or is_base(ending, quantity):
        return
    if ending in TOLERANCE_LETTERS:
        raise QuantityError(f"{quoted(text)} ends in the tolerance letter {ending}", f"write the value alone: {code}")
    raise nothing_of_it(text, quantity)
