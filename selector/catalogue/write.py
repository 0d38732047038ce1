"""Rows written into the tables, with the state row kept in step."""

from __future__ import annotations

from collections.abc import Sequence
from dataclasses import dataclass
from datetime import UTC, datetime
from itertools import groupby
from operator import attrgetter
from typing import TYPE_CHECKING

from selector.catalogue.digest import Value, moved_sum
from selector.catalogue.merge import Put
from selector.catalogue.rows import Stored
from selector.catalogue.schema import quoted, stored_names

if TYPE_CHECKING:
    import sqlite3

    from selector.catalogue.store import Writing

_WRITTEN_OUT: dict[Value, str] = {None: "NULL", "": "''"}


@dataclass(frozen=True, slots=True)
class Gone:
    """A row to delete."""

    kind: str
    code: str
    row: Stored


def write(writing: Writing, puts: Sequence[Put] = (), gone: Sequence[Gone] = ()) -> None:
    """Delete rows, then write rows, new ones or in another's place, inside the open transaction."""
    for each in gone:
        writing.connection.execute(f'DELETE FROM {quoted(each.kind)} WHERE "part" = ?', (each.code,))  # noqa: S608 - a name of ours, quoted
    for kind, group in groupby(sorted(puts, key=attrgetter("kind", "code")), key=attrgetter("kind")):
        rows = [(*each.row.values, each.row.digest) for each in group]
        put_columns(writing.connection, kind, list(zip(*rows, strict=True)))
    taken = [each.replaced for each in puts if each.replaced is not None] + [each.row.digest for each in gone]
    digests = moved_sum(writing.state.digests, taken, [each.row.digest for each in puts])
    restate(writing, len(puts) - len(taken), digests)


def put_columns(connection: sqlite3.Connection, kind: str, columns: Sequence[Sequence[Value]]) -> None:
    """Write rows of one kind, new ones or in the place of those of their codes; the last column is their digest.

    A column in which no row has anything is written out in the statement: what is not bound is faster.
    """
    written = [_empty(column) for column in columns]
    values = ", ".join(text or "?" for text in written)
    names = ", ".join(map(quoted, stored_names(kind)))
    sql = f"INSERT OR REPLACE INTO {quoted(kind)} ({names}) VALUES ({values})"  # noqa: S608 - names of ours, quoted
    bound = (column for column, text in zip(columns, written, strict=True) if not text)
    connection.executemany(sql, zip(*bound, strict=True))


def restate(writing: Writing, more: int, digests: bytes) -> None:
    """Bring the state row in step: so many rows more, or less, than at the beginning, and the sum of all digests."""
    state = writing.state
    now = datetime.now(UTC).isoformat(timespec="seconds")
    sql = 'UPDATE "state" SET "rows" = ?, "digests" = ?, "changes" = ?, "changed" = ? WHERE "id" = 1'
    writing.connection.execute(sql, (state.rows + more, digests, state.changes + 1, now))


def _empty(column: Sequence[Value]) -> str:
    """Return the SQL of a column that is absent or an empty text in all rows; nothing where a row has something."""
    first = column[0]
    return _WRITTEN_OUT[first] if first in ("", None) and column.count(first) == len(column) else ""
