"""Parts as rows of their kind's table, and back."""

from __future__ import annotations

from typing import NamedTuple

from selector.catalogue.digest import row_digest
from selector.catalogue.faults import damaged
from selector.parts import Part, Record, part_of_record, record_of


class Stored(NamedTuple):
    """One row as it stands in the file: the values in the order of the kind's columns, and the digest beside them."""

    values: Record
    digest: bytes


def stored(part: Part) -> Stored:
    """Return the row of a part."""
    values = record_of(part)
    return Stored(values, row_digest(part.kind, values))


def part_of(kind: str, row: Stored, where: str) -> Part:
    """Return the part of a row, without judging its figures anew: they were judged when they came in.

    Raises
    ------
    Unusable
        The row does not have its digest: it is not what was written.
    """
    refuse_damaged(kind, row, where)
    return part_of_record(kind, row.values)


def refuse_damaged(kind: str, row: Stored, where: str) -> None:
    """Raise Unusable where a row is not what its digest says."""
    try:
        sound = row_digest(kind, row.values) == row.digest
    except (TypeError, ValueError) as error:
        raise damaged(where, f"a row of table {kind}") from error
    if not sound:
        raise damaged(where, f"row {row.values[0]!r} of table {kind}")
