"""All rows of a catalogue at one moment, read with sqlite3 alone."""

from __future__ import annotations

import sqlite3
from collections.abc import Mapping
from dataclasses import dataclass, field

from selector.catalogue.digest import digest_sum, moved_sum
from selector.catalogue.faults import damaged, not_a_catalogue
from selector.catalogue.place import APPLICATION_ID, refuse_newer
from selector.catalogue.rows import Stored
from selector.catalogue.schema import found_tables, quoted, stored_names, tables
from selector.parts import KINDS

Rows = dict[str, dict[str, Stored]]

_AT_ONCE = 10_000


@dataclass(frozen=True, slots=True)
class State:
    """What the state row says: how many rows there are, the sum of their digests, changes so far, the last one."""

    rows: int = 0
    digests: bytes = field(default_factory=lambda: digest_sum(()))
    changes: int = 0
    changed: str = ""


@dataclass(frozen=True, slots=True)
class Snapshot:
    """Rows by kind and code, in order of the code points of the code, with the state row of the same moment."""

    version: int
    state: State
    rows: Mapping[str, Mapping[str, Stored]]

    @property
    def counts(self) -> Mapping[str, int]:
        """Return how many rows there are of each kind."""
        return {kind: len(of_kind) for kind, of_kind in self.rows.items()}

    def row(self, kind: str, code: str) -> Stored | None:
        """Return the row of one part, None where there is none."""
        return self.rows[kind].get(code)


def empty() -> Snapshot:
    """Return the snapshot of a catalogue that is not there yet."""
    return Snapshot(0, State(), {kind: {} for kind in KINDS})


def version_of(connection: sqlite3.Connection, newest: int, where: str) -> int:
    """Return the schema version inside the transaction that is open; 0 for a database with nothing in it."""
    application = connection.execute("PRAGMA application_id").fetchone()[0]
    version = int(connection.execute("PRAGMA user_version").fetchone()[0])
    if application == APPLICATION_ID and version > 0:
        refuse_newer(version, newest, where)
        return version
    if application or version or found_tables(connection):
        raise not_a_catalogue(where, "it is the database of another program")
    return 0


def read(connection: sqlite3.Connection, version: int, where: str) -> Snapshot:
    """Return all rows, inside the transaction that is open; the schema must be today's.

    Raises
    ------
    Unusable
        A table is not as it was made, rows are missing or too many, or a value cannot be read.
    """
    refuse_other_schema(connection, where)
    try:
        state = _state(connection, where)
        rows = {kind: _rows(connection, kind) for kind in KINDS}
        _refuse_other_sum(rows, state, where)
    except (UnicodeDecodeError, TypeError, ValueError, OverflowError) as error:
        raise damaged(where, "a value cannot be read") from error
    return Snapshot(version, state, rows)


def standing(connection: sqlite3.Connection, where: str) -> tuple[State, Mapping[str, int]]:
    """Return the state row and the number of rows of each kind, inside the transaction that is open.

    The rows are seen through as far as their digests go, and not kept; Unusable as `read`.
    """
    refuse_other_schema(connection, where)
    counts: dict[str, int] = {}
    total = digest_sum(())
    try:
        state = _state(connection, where)
        for kind in KINDS:
            found = connection.execute(f'SELECT "digest" FROM {quoted(kind)}')  # noqa: S608 - a name of ours, quoted
            counts[kind] = 0
            while some := found.fetchmany(_AT_ONCE):
                counts[kind] += len(some)
                total = moved_sum(total, (), (row[0] for row in some))
    except (UnicodeDecodeError, TypeError, ValueError, OverflowError) as error:
        raise damaged(where, "a value cannot be read") from error
    _refuse_other(state, sum(counts.values()), total, where)
    return state, counts


def row_of(connection: sqlite3.Connection, kind: str, code: str) -> Stored | None:
    """Return the row of one part, None where there is none, inside the transaction that is open."""
    names = ", ".join(quoted(name) for name in stored_names(kind))
    sql = f'SELECT {names} FROM {quoted(kind)} WHERE "part" = ?'  # noqa: S608 - names of ours, quoted
    row = connection.execute(sql, (code,)).fetchone()
    return None if row is None else Stored(row[:-1], row[-1])


def refuse_other_schema(connection: sqlite3.Connection, where: str) -> None:
    """Raise Unusable where the tables are not, to the letter, those that this program makes."""
    try:
        found = found_tables(connection)
    except (UnicodeDecodeError, TypeError, ValueError) as error:
        raise damaged(where, "its list of tables cannot be read") from error
    wanted = tables()
    odd = sorted(str(name) for name in wanted.keys() | found.keys() if wanted.get(name) != found.get(name))
    if odd:
        raise damaged(where, f"not as it was made: {', '.join(odd)}")


def _state(connection: sqlite3.Connection, where: str) -> State:
    """Return the state row."""
    sql = 'SELECT "rows", "digests", "changes", "changed" FROM "state"'
    found = connection.execute(sql).fetchall()
    if len(found) != 1:
        raise damaged(where, f"{len(found)} state rows instead of 1")
    return State(*found[0])


def _rows(connection: sqlite3.Connection, kind: str) -> dict[str, Stored]:
    """Return the rows of one kind by their code."""
    names = ", ".join(quoted(name) for name in stored_names(kind))
    found = connection.execute(f"SELECT {names} FROM {quoted(kind)}").fetchall()  # noqa: S608 - names of ours, quoted
    return {row[0]: Stored(row[:-1], row[-1]) for row in sorted(found, key=lambda row: str(row[0]))}


def _refuse_other_sum(rows: Rows, state: State, where: str) -> None:
    """Raise Unusable where rows are missing, doubled or beside the state row."""
    count = sum(len(of_kind) for of_kind in rows.values())
    _refuse_other(state, count, digest_sum(row.digest for of_kind in rows.values() for row in of_kind.values()), where)


def _refuse_other(state: State, count: int, digests: bytes, where: str) -> None:
    """Raise Unusable where the number of rows, or the sum of their digests, is not what the state row says."""
    if count != state.rows:
        raise damaged(where, f"{count} parts where {state.rows} were written")
    if digests != state.digests:
        raise damaged(where, "the parts are not those that were written")
