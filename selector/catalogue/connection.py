"""Connections to a catalogue: how its file is opened, and with which settings."""

from __future__ import annotations

import os
import sqlite3
from collections.abc import Iterator
from contextlib import closing, contextmanager
from pathlib import Path
from typing import Literal
from urllib.parse import quote

Mode = Literal["ro", "rw", "rwc"]

WAIT_S = 30.0
"""How long a lock of another process is waited for, in s."""

_MOST_ROWS_HELD = 100_000
_CACHE_KIB = 64_000
_HOT_JOURNAL = ("SQLITE_READONLY", "SQLITE_CANTOPEN")


def address(path: Path, mode: Mode) -> str:
    """Return the URI of a path: whatever stands in its name is quoted, so it means just that file."""
    scheme = "file://" if path.is_absolute() else "file:"
    return f"{scheme}{quote(os.fsencode(path))}?mode={mode}"


@contextmanager
def connected(path: Path, mode: Mode) -> Iterator[sqlite3.Connection]:
    """Open a file of ours and close it after the block; transactions are begun and ended by hand."""
    with closing(sqlite3.connect(address(path, mode), uri=True, timeout=WAIT_S, isolation_level=None)) as connection:
        settle(connection)
        yield connection


def make_durable(connection: sqlite3.Connection, rows: int) -> None:
    """Set what a writer has besides: a journal that is deleted, and every step on the disk before the next.

    Up to 100 000 rows stay in memory until the commit: what spills earlier locks readers out. More rows spill, from a
    cache that is large enough for the tree of their codes.
    """
    connection.execute("PRAGMA journal_mode = DELETE")
    connection.execute("PRAGMA synchronous = EXTRA")
    if rows <= _MOST_ROWS_HELD:
        connection.execute("PRAGMA cache_spill = 0")
    else:
        connection.execute(f"PRAGMA cache_size = {-_CACHE_KIB}")


def settle(connection: sqlite3.Connection) -> None:
    """Set what every connection has: keys enforced, a foreign schema not trusted, cells measured."""
    connection.execute("PRAGMA foreign_keys = ON")
    connection.execute("PRAGMA trusted_schema = OFF")
    connection.execute("PRAGMA cell_size_check = ON")


@contextmanager
def in_memory() -> Iterator[sqlite3.Connection]:
    """Open an empty database without a file."""
    with closing(sqlite3.connect(":memory:", isolation_level=None)) as connection:
        settle(connection)
        yield connection


def wants_rollback(error: sqlite3.Error) -> bool:
    """Return whether a reader met the journal of a crashed writer, which only a writable connection rolls back."""
    return getattr(error, "sqlite_errorname", "").startswith(_HOT_JOURNAL)


@contextmanager
def transaction(connection: sqlite3.Connection, *, immediate: bool) -> Iterator[None]:
    """Hold one transaction: all of the block or nothing.

    A writer begins with IMMEDIATE: a deferred one that reads and then writes fails at once, without waiting.
    """
    connection.execute("BEGIN IMMEDIATE" if immediate else "BEGIN")
    try:
        yield
        connection.execute("COMMIT")
    except BaseException:
        if connection.in_transaction:
            connection.execute("ROLLBACK")
        raise
