"""One cell of a part as it was given, to the value of its field, and the value back to a cell."""

from __future__ import annotations

import math
import re
from collections.abc import Callable, Mapping

from selector.parts.code import clean_code, clean_text
from selector.parts.columns import Column
from selector.parts.holds import TOO_LARGE, CellRefused, Sort, Value
from selector.parts.rules import nearest
from selector.units import exact, parse

_YES = ("yes", "true", "1")
_NO = ("no", "false", "0")
LONGEST_SHOWN = 60
_BETWEEN_NAMES = re.compile(r"[\s,;]+")


def read_cell(raw: object, column: Column, *, bare: bool) -> Value:
    """Return the value of a cell in SI units, None where it is empty.

    Text is read in the units people write; a number is taken in the field's own unit. `bare` allows a text that is a
    number without a unit.

    Raises
    ------
    QuantityError
        The cell is not what the field holds, or lies outside its bounds.
    """
    if raw is None or (isinstance(raw, str) and not raw.strip()):
        return None
    figure = column.quantity
    given = parse(raw, figure, bare=bare or figure.bare_in_stock) if figure and isinstance(raw, str) else raw
    value = _READERS[column.sort](given, column)
    column.holds.check(value, as_read(raw), column.name)
    return value


def cell_of(value: Value, column: Column) -> str:
    """Return the text from which `read_cell` makes the same value, bit for bit."""
    if isinstance(value, bool):
        return "yes" if value else "no"
    if isinstance(value, tuple):
        return ", ".join(value)
    if isinstance(value, int | float) and column.quantity is not None:
        return exact(float(value), column.quantity)
    return "" if value is None else str(value)


def as_read(raw: object) -> str:
    """Return how a message shows what was read: text in quotes, long text cut."""
    if isinstance(raw, str):
        text = raw.strip()
        return f'"{text if len(text) <= LONGEST_SHOWN else text[:LONGEST_SHOWN] + "..."}"'
    if isinstance(raw, bool):
        return "true" if raw else "false"
    if isinstance(raw, float) or (isinstance(raw, int) and abs(raw) < 10**LONGEST_SHOWN):
        return repr(raw)
    if isinstance(raw, int):
        return "a number of very many digits"
    return "a table" if isinstance(raw, Mapping) else f"a {type(raw).__name__}"


def _figure(raw: object, column: Column) -> Value:
    if isinstance(raw, bool) or not isinstance(raw, int | float):
        raise CellRefused(f"{as_read(raw)} is no {column.name}", _like(column))
    figure = float(raw) if isinstance(raw, float) or abs(raw) < TOO_LARGE else (TOO_LARGE if raw > 0 else -TOO_LARGE)
    if not column.whole or not math.isfinite(figure):
        return figure
    if not figure.is_integer():
        raise CellRefused(f"{as_read(raw)} is no whole number", _like(column))
    return int(figure)


def _text(raw: object, column: Column) -> Value:
    if isinstance(raw, bool) or not isinstance(raw, str | int | float):
        raise CellRefused(f"{as_read(raw)} is no text", "write it in quotes")
    text = raw if isinstance(raw, str) else str(int(raw) if float(raw).is_integer() else raw)
    return clean_code(text) if column.name == "part" else clean_text(text)


def _flag(raw: object, _column: Column) -> Value:
    if isinstance(raw, bool):
        return raw
    word = str(int(raw)) if isinstance(raw, int | float) and raw in (0, 1) else raw
    word = word.strip().lower() if isinstance(word, str) else ""
    if word not in (*_YES, *_NO):
        raise CellRefused(f"{as_read(raw)} is neither yes nor no", "write yes or no")
    return word in _YES


def _choice(raw: object, column: Column) -> Value:
    choices = tuple(map(str, column.choices))
    word = re.sub(r"[\s_]+", "-", raw.strip().lower()) if isinstance(raw, str) else ""
    if word not in choices:
        remedy = nearest(word, choices) or f"write one of {', '.join(choices)}"
        raise CellRefused(f"{as_read(raw)} is no {column.name}", remedy)
    return word


def _names(raw: object, _column: Column) -> Value:
    names = raw
    if isinstance(raw, str):
        names = [name for name in _BETWEEN_NAMES.split(raw) if name]
    if not isinstance(names, list | tuple):
        raise CellRefused(f"{as_read(raw)} is no list of field names", "write them with commas between")
    words = tuple(name for name in names if isinstance(name, str))
    if len(words) < len(names):
        raise CellRefused("a list with other things than names", "write field names with commas between")
    return tuple(dict.fromkeys(words))


def _like(column: Column) -> str:
    if column.choices:
        return f"{column.name} is one of {', '.join(map(str, column.choices))}"
    return f"write it like {column.quantity.example}" if column.quantity else ""


_READERS: dict[Sort, Callable[[object, Column], Value]] = {
    "quantity": _figure,
    "text": _text,
    "flag": _flag,
    "choice": _choice,
    "names": _names,
}
