"""Where the rows are kept: in a file, or in memory for a catalogue made on the spot."""

from __future__ import annotations

import sqlite3
from collections.abc import Iterator, Mapping
from contextlib import AbstractContextManager, contextmanager
from dataclasses import dataclass
from pathlib import Path
from typing import Protocol

from selector.catalogue import migrations
from selector.catalogue.backup import copy_before_migration
from selector.catalogue.connection import connected, in_memory, make_durable, transaction, wants_rollback
from selector.catalogue.faults import cannot_be_opened, told_plainly
from selector.catalogue.place import Place, look, missing, shown_path
from selector.catalogue.rows import Stored
from selector.catalogue.schema import tables
from selector.catalogue.snapshot import Snapshot, State, empty, read, row_of, standing, version_of


@dataclass(frozen=True, slots=True)
class Writing:
    """A write transaction that is open: its connection, and the state row and the rows of each kind when it began."""

    connection: sqlite3.Connection
    state: State
    counts: Mapping[str, int]

    def row(self, kind: str, code: str) -> Stored | None:
        """Return the row of one part as it is now, None where there was none of its kind."""
        return row_of(self.connection, kind, code) if self.counts[kind] else None


class Store(Protocol):
    """What a catalogue keeps its rows in."""

    @property
    def shown(self) -> str:
        """Return its name in messages."""

    def look(self) -> Place | None:
        """Return what stands at its path, refusing what is no catalogue; None in memory."""

    def snapshot(self) -> Snapshot:
        """Return all rows of one moment; none where there is no catalogue yet."""

    def writing(self, rows: int) -> AbstractContextManager[Writing]:
        """Open a write transaction for about so many rows; it ends with the block, all of it or nothing."""


@dataclass(frozen=True, slots=True)
class FileStore:
    """A catalogue in a file; `make_folder` where a writer makes the folder if it is missing."""

    path: Path
    make_folder: bool = False

    @property
    def shown(self) -> str:
        """Return the path."""
        return shown_path(self.path)

    def look(self) -> Place:
        """Return what stands at the path, refusing what is no catalogue."""
        return look(self.path, migrations.newest())

    def snapshot(self) -> Snapshot:
        """Return all rows of one moment. An older version is brought up to today's in memory; the file stays."""
        if self.look().version == 0:
            return empty()
        with told_plainly(self.shown):
            try:
                return self._read(writable=False)
            except sqlite3.OperationalError as error:
                if not wants_rollback(error):
                    raise
            return self._read(writable=True)

    @contextmanager
    def writing(self, rows: int) -> Iterator[Writing]:
        """Open a write transaction, making the catalogue or bringing it up to today's version first."""
        place = self.look()
        if self.make_folder and not place.exists:
            self._make_folder()
        with told_plainly(self.shown), connected(self.path, "rwc") as connection:
            make_durable(connection, rows)
            with transaction(connection, immediate=True):
                version = version_of(connection, migrations.newest(), self.shown)
                if 0 < version < migrations.newest():
                    copy_before_migration(self.path, version, self.shown)
                yield _begun(connection, version, self.shown)

    def _read(self, *, writable: bool) -> Snapshot:
        """Return all rows, fetched in one transaction that has ended when they are returned."""
        with connected(self.path, "rw" if writable else "ro") as connection, transaction(connection, immediate=False):
            version = version_of(connection, migrations.newest(), self.shown)
            if version == 0:
                return empty()
            if version == migrations.newest():
                return read(connection, version, self.shown)
            return _read_upgraded(connection, version, self.shown)

    def _make_folder(self) -> None:
        """Make the folder of the file."""
        try:
            self.path.parent.mkdir(parents=True, exist_ok=True)
        except OSError as error:
            raise cannot_be_opened(shown_path(self.path.parent), error) from error


@dataclass(frozen=True, slots=True)
class MemoryStore:
    """A catalogue in memory, gone with its connection."""

    connection: sqlite3.Connection

    @property
    def shown(self) -> str:
        """Return what stands for a path."""
        return "catalogue in memory"

    def look(self) -> None:
        """Return nothing: there is no path."""

    def snapshot(self) -> Snapshot:
        """Return all rows."""
        with told_plainly(self.shown):
            version = version_of(self.connection, migrations.newest(), self.shown)
            return read(self.connection, version, self.shown) if version else empty()

    @contextmanager
    def writing(self, rows: int) -> Iterator[Writing]:
        """Open a write transaction, whatever the number of rows."""
        del rows
        with told_plainly(self.shown), transaction(self.connection, immediate=True):
            version = version_of(self.connection, migrations.newest(), self.shown)
            yield _begun(self.connection, version, self.shown)


def must_exist(store: Store) -> None:
    """Raise Unusable, naming the commands that make a catalogue, where there is no file at all."""
    place = store.look()
    if place is not None and not place.exists:
        raise missing(place)


def _begun(connection: sqlite3.Connection, version: int, where: str) -> Writing:
    """Return the open transaction with today's tables."""
    if version == 0:
        migrations.create(connection, tables())
    elif version < migrations.newest():
        migrations.migrate(connection, version, where)
    return Writing(connection, *standing(connection, where))


def _read_upgraded(connection: sqlite3.Connection, version: int, where: str) -> Snapshot:
    """Return all rows of an older version, brought up to today's in a copy in memory."""
    with in_memory() as copy:
        connection.backup(copy)
        with transaction(copy, immediate=True):
            _begun(copy, version, where)
            return read(copy, migrations.newest(), where)
