"""Parts as rows of their kind's table, and back."""

from __future__ import annotations

from collections.abc import Callable
from functools import cache
from typing import NamedTuple

from selector.catalogue.digest import Row, Value, row_digest
from selector.catalogue.faults import damaged
from selector.catalogue.schema import sql_type
from selector.parts import KINDS, Column, Part, columns


class Stored(NamedTuple):
    """One row as it stands in the file: the values in the order of the kind's columns, and the digest beside them."""

    values: Row
    digest: bytes


def stored(part: Part) -> Stored:
    """Return the row of a part."""
    values = tuple(_value_of(getattr(part, column.name), column) for column in columns(part.kind))
    return Stored(values, row_digest(part.kind, values))


def part_of(kind: str, row: Stored, where: str) -> Part:
    """Return the part of a row, without judging its figures anew: they were judged when they came in.

    Raises
    ------
    Unusable
        The row does not have its digest: it is not what was written.
    """
    refuse_damaged(kind, row, where)
    names, flags, lists = _layout(kind)
    fields: dict[str, object] = dict(zip(names, row.values, strict=True))
    for name in flags:
        fields[name] = bool(fields[name])
    for name in lists:
        fields[name] = tuple(str(fields[name]).split())
    construct: Callable[..., Part] = KINDS[kind].model_construct
    return construct(**fields)


def refuse_damaged(kind: str, row: Stored, where: str) -> None:
    """Raise Unusable where a row is not what its digest says."""
    try:
        sound = row_digest(kind, row.values) == row.digest
    except (TypeError, ValueError) as error:
        raise damaged(where, f"a row of table {kind}") from error
    if not sound:
        raise damaged(where, f"row {row.values[0]!r} of table {kind}")


def place_of(kind: str, name: str) -> int:
    """Return where in a kind's rows a field stands."""
    return _layout(kind)[0].index(name)


def _value_of(value: object, column: Column) -> Value:
    """Return a field's value as its column keeps it: no minus nought, no empty text where it may be absent."""
    if isinstance(value, str):
        return value if value or column.required or column.default is not None else None
    if value is None:
        return None
    if isinstance(value, tuple):
        return " ".join(value)
    if isinstance(value, bool | int | float):
        return float(value) + 0.0 if sql_type(column) == "REAL" else int(value)
    msg = f"{column.name} is {type(value).__name__}"
    raise TypeError(msg)


@cache
def _layout(kind: str) -> tuple[tuple[str, ...], tuple[str, ...], tuple[str, ...]]:
    """Return the names of all columns of a kind, of those that are flags, and of those that are lists of names."""
    all_of = columns(kind)
    flags = tuple(column.name for column in all_of if column.sort == "flag")
    lists = tuple(column.name for column in all_of if column.sort == "names")
    return tuple(column.name for column in all_of), flags, lists
