"""The cells of one column read into values, each text once: columns repeat themselves."""

from __future__ import annotations

import re
from collections.abc import Callable, Sequence
from enum import Enum
from typing import Final, Literal

from selector.guard import unguarded
from selector.ingest.heading_units import with_unit
from selector.parts import LONGEST_CODE, Column, Value, plain_value, read_cell
from selector.units import QuantityError, plain_power

_MOST_KEPT = 10_000
_LONGEST_KEPT = 40
_NUMBER = re.compile(r"[0-9]{1,15}(?:\.[0-9]{1,15})?")
_NUMBERS = re.compile(rf"{_NUMBER.pattern}(?:\n{_NUMBER.pattern})*+")


class Odd(Enum):
    """What stands for a cell that must be looked at with its whole row."""

    ODD = "odd"


ODD: Final[Literal[Odd.ODD]] = Odd.ODD
Cell = Value | Literal[Odd.ODD]


class Known(dict[str, Cell]):
    """The values of texts, read where they are not known yet; some thousand short ones are kept.

    `odd` tells whether an odd one was ever met.
    """

    def __init__(self, read: Callable[[str], Cell]) -> None:
        """Begin with no text known."""
        super().__init__()
        self._read = read
        self.odd = False

    def __missing__(self, text: str) -> Cell:
        """Read a text, and keep it if there is room."""
        value = self._read(text)
        self.odd = self.odd or value is ODD
        if len(self) < _MOST_KEPT and len(text) <= _LONGEST_KEPT:
            self[text] = value
        return value

    def values_of(self, cells: Sequence[str]) -> list[Cell]:
        """Return the values of a column's cells."""
        return list(map(self.__getitem__, cells))


class KnownNumbers(Known):
    """The same for a column in which plain decimal numbers are taken: well inside its bounds they need no grammar."""

    def __init__(self, column: Column, power: int, read: Callable[[str], Cell]) -> None:
        """Keep the bounds, and the power of ten that stands behind every number."""
        super().__init__(self._number)
        self._else = read
        self._exponent = f"e{power}"
        self._above = max(bound for bound in (column.least, column.above, 0.0) if bound is not None)
        self._below = min(bound for bound in (column.most, column.below) if bound is not None)

    def values_of(self, cells: Sequence[str]) -> list[Cell]:
        """Return the values of a column's cells; where they hardly repeat themselves, without looking each one up."""
        if len(self) == _MOST_KEPT and _NUMBERS.fullmatch("\n".join(cells)):
            values = [float(text + self._exponent) for text in cells]
            if self._above < min(values) and max(values) < self._below:
                return list(values)
        return super().values_of(cells)

    def _number(self, text: str) -> Cell:
        """Return one number."""
        if _NUMBER.fullmatch(text):
            value = float(text + self._exponent)
            if self._above < value < self._below:
                return value
        return self._else(text)


class KnownCodes(Known):
    """The same for codes, which do not repeat themselves: those of plain ASCII characters are kept as they stand."""

    def values_of(self, cells: Sequence[str]) -> list[Cell]:
        """Return the codes of a column's cells."""
        return [text if _is_plain(text) else self[text] for text in cells]


def known_of(column: Column, unit: str | None, *, plain: bool) -> Known:
    """Return what reads the cells of a column as `read_part` reads them; `unit` is that of its heading.

    An empty cell is the field's default. What is refused, or must not be empty, is ODD. `plain` asks for values as
    records hold them.
    """

    def read(text: str) -> Cell:
        stripped = text.strip()
        value: Value = None
        if stripped:
            try:
                value = read_cell(with_unit(unguarded(stripped), unit, column.quantity), column, bare=False)
            except QuantityError:
                return ODD
        if value is None and (column.required or column.name == "source"):  # an empty source is told by the line
            return ODD
        value = column.default if value is None else value
        return plain_value(value, column) if plain else value

    if column.name == "part":
        return KnownCodes(read)
    figure = column.quantity
    if figure is None or column.choices or column.whole:
        return Known(read)
    power = plain_power(figure, bare=unit is None and figure.bare_in_stock, unit=unit)
    return Known(read) if power is None else KnownNumbers(column, power, read)


def _is_plain(code: str) -> bool:
    """Return whether a code needs no cleaning: nothing in it that cannot be seen, no blank or guard at its ends."""
    plain = code.isascii() and code.isprintable() and 0 < len(code) <= LONGEST_CODE
    return plain and code[0] not in "' " and code[-1] != " "
