"""Parts as plain values, as they travel by the thousand between stock files and the catalogue."""

from __future__ import annotations

from collections.abc import Callable, Sequence
from functools import cache

from selector.parts.base import Part
from selector.parts.columns import Column, columns
from selector.parts.kinds import KINDS

Plain = str | int | float | None

Record = tuple[Plain, ...]
"""A part's values in the order of its kind's columns: a flag as 0 or 1, names as one text with blanks between."""


Records = Sequence[Sequence[Plain]]
"""The records of parts of one kind, column by column."""


def record_of(part: Part) -> Record:
    """Return the record of a part."""
    return tuple(plain_value(getattr(part, column.name), column) for column in columns(part.kind))


def part_of_record(kind: str, record: Record) -> Part:
    """Return the part of a record, without judging its figures anew: they were judged when they came in."""
    names, flags, lists = _layout(kind)
    fields: dict[str, object] = dict(zip(names, record, strict=True))
    for name in flags:
        fields[name] = bool(fields[name])
    for name in lists:
        fields[name] = tuple(str(fields[name]).split())
    construct: Callable[..., Part] = KINDS[kind].model_construct
    return construct(**fields)


def plain_value(value: object, column: Column) -> Plain:
    """Return a field's value as a record holds it: no minus nought, no empty text where it may be absent."""
    if isinstance(value, str):
        return value if value or column.required or column.default is not None else None
    if value is None:
        return None
    if isinstance(value, tuple):
        return " ".join(value)
    if isinstance(value, bool | int | float):
        return float(value) + 0.0 if column.real else int(value)
    msg = f"{column.name} is {type(value).__name__}"
    raise TypeError(msg)


def place_of(kind: str, name: str) -> int:
    """Return where in a kind's records a field stands."""
    return _layout(kind)[0].index(name)


@cache
def _layout(kind: str) -> tuple[tuple[str, ...], tuple[str, ...], tuple[str, ...]]:
    """Return the names of all columns of a kind, of those that are flags, and of those that are lists of names."""
    all_of = columns(kind)
    flags = tuple(column.name for column in all_of if column.sort == "flag")
    lists = tuple(column.name for column in all_of if column.sort == "names")
    return tuple(column.name for column in all_of), flags, lists
