"""Making a catalogue's tables, and bringing those of an older version up to today's.

A later version adds one function to `STEPS` and raises nothing by hand: the version is their number and one. A step
does what the tables of the part kinds do not: new tables beside them, figures moved from one field to another. Columns
that a kind gained or lost are seen to after the steps.
"""

from __future__ import annotations

from collections.abc import Callable
from typing import TYPE_CHECKING

from selector.catalogue.digest import digest_sum, row_digest
from selector.catalogue.faults import damaged
from selector.catalogue.place import APPLICATION_ID
from selector.catalogue.schema import found_tables, quoted, stored_names, table
from selector.catalogue.snapshot import State, read
from selector.parts import KINDS, columns

if TYPE_CHECKING:
    import sqlite3

    from sqlite_utils import Database

Step = Callable[["Database"], None]

STEPS: tuple[Step, ...] = ()
"""What brings a catalogue from version 1 to 2, from 2 to 3, and so on."""


def newest() -> int:
    """Return the version of the schema that this program writes."""
    return 1 + len(STEPS)


def create(connection: sqlite3.Connection, ddl: dict[str, str]) -> None:
    """Make the tables of today's version in an empty database, inside the transaction that is open.

    sqlite3 does it alone: sqlite-utils brings pandas along, which takes longer than a load of thousands of rows.
    """
    for statement in ddl.values():
        connection.execute(statement)
    state = State()
    sql = 'INSERT INTO "state" ("id", "rows", "digests", "changes", "changed") VALUES (1, ?, ?, 0, ?)'
    connection.execute(sql, (state.rows, state.digests, state.changed))
    connection.execute(f"PRAGMA application_id = {APPLICATION_ID}")
    connection.execute(f"PRAGMA user_version = {newest()}")


def migrate(connection: sqlite3.Connection, version: int, where: str) -> None:
    """Bring the tables from an older version to today's, inside the transaction that is open.

    The rows are checked against their digests before and after; nothing stays where that or a step fails.

    Raises
    ------
    Unusable
        The old rows are not what was written, or the new tables are not today's.
    """
    from sqlite_utils import Database  # noqa: PLC0415 - only a change of tables needs it, and it is slow to import

    db = Database(connection, recursive_triggers=False, execute_plugins=False)
    _refuse_damaged_rows(connection, where)
    for step in STEPS[version - 1 :]:
        step(db)
    for kind in KINDS:
        _remake(db, kind)
    _digest_anew(db)
    db.execute(f"PRAGMA user_version = {newest()}")
    read(connection, newest(), where)
    for pragma, sound in (("integrity_check", [("ok",)]), ("foreign_key_check", [])):
        if connection.execute(f"PRAGMA {pragma}").fetchall() != sound:
            raise damaged(where, f"{pragma} fails after the change to version {newest()}")


def _refuse_damaged_rows(connection: sqlite3.Connection, where: str) -> None:
    """Raise Unusable where the rows of an older version are not those that were written, whatever its columns are."""
    digests: list[bytes] = []
    for kind in found_tables(connection).keys() & KINDS.keys():
        names = _column_names(connection, kind)
        values = ", ".join(quoted(name) for name in names if name != "digest")
        rows = connection.execute(f'SELECT "digest", {values} FROM {quoted(kind)}').fetchall()  # noqa: S608 - quoted
        odd = next((row[1] for row in rows if row_digest(kind, row[1:]) != row[0]), None)
        if odd is not None:
            raise damaged(where, f"row {odd!r} of table {kind}")
        digests += [row[0] for row in rows]
    found = connection.execute('SELECT "rows", "digests" FROM "state"').fetchone()
    if found != (len(digests), digest_sum(digests)):
        raise damaged(where, "the parts are not those that were written")


def _remake(db: Database, kind: str) -> None:
    """Give one kind the table of today's fields, where it is not that already; a new field has its default."""
    ddl = table(kind)
    found = found_tables(db.conn).get(kind)
    if found == ddl:
        return
    if found is None:
        db.execute(ddl)
        return
    old = f"old {kind}"
    before = _column_names(db.conn, kind)
    defaults = {column.name: column.default for column in columns(kind) if column.default not in (None, ())}
    db.execute(f"ALTER TABLE {quoted(kind)} RENAME TO {quoted(old)}")
    db.execute(ddl)
    kept = [name for name in stored_names(kind) if name in before]
    new = [name for name in defaults if name not in before]
    into = ", ".join(quoted(name) for name in (*kept, *new))
    taken = ", ".join([*(quoted(name) for name in kept), *("?" for _ in new)])
    sql = f"INSERT INTO {quoted(kind)} ({into}) SELECT {taken} FROM {quoted(old)}"  # noqa: S608 - names of ours, quoted
    db.execute(sql, tuple(defaults[name] for name in new))
    db.execute(f"DROP TABLE {quoted(old)}")


def _digest_anew(db: Database) -> None:
    """Write the digest of every row, and their count and sum."""
    digests: list[bytes] = []
    for kind in KINDS:
        values = ", ".join(quoted(column.name) for column in columns(kind))
        rows = db.conn.execute(f"SELECT {values} FROM {quoted(kind)}").fetchall()  # noqa: S608 - names of ours, quoted
        new = [(row_digest(kind, row), row[0]) for row in rows]
        db.conn.executemany(f'UPDATE {quoted(kind)} SET "digest" = ? WHERE "part" = ?', new)  # noqa: S608 - names of ours, quoted
        digests += [digest for digest, _ in new]
    db.table("state").update(1, {"rows": len(digests), "digests": digest_sum(digests)})


def _column_names(connection: sqlite3.Connection, name: str) -> list[str]:
    """Return the names of a table's columns in order."""
    return [row[0] for row in connection.execute("SELECT name FROM pragma_table_info(?)", (name,))]
