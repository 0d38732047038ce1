"""The catalogue as the rest of the program sees it: parts of a kind, and what changes them."""

from __future__ import annotations

import sqlite3
import unicodedata
import weakref
from collections.abc import Iterable, Mapping, Sequence
from pathlib import Path
from types import TracebackType
from typing import TYPE_CHECKING, Self

from selector.catalogue.connection import settle
from selector.catalogue.place import default_path, missing, user_path
from selector.catalogue.rows import Stored, part_of, stored
from selector.catalogue.snapshot import Snapshot
from selector.catalogue.store import FileStore, MemoryStore, Store, Writing, must_exist
from selector.errors import Fault, InputRefused, UsageRefused
from selector.parts import KINDS, Part, cells_of, read_part

if TYPE_CHECKING:
    from selector.catalogue.bulk import Source, Taken
    from selector.catalogue.find import Found
    from selector.catalogue.info import Info
    from selector.catalogue.merge import Change, Merge


class Catalogue:
    """Parts by kind and code, as they were at one moment for a reader; a writer sees what it wrote.

    No connection stays open between two calls, so a reader who looks at a list for long keeps nobody from writing.
    """

    __slots__ = ("__weakref__", "_parts", "_snapshot", "_store", "_writable", "path")

    def __init__(self, store: Store, *, path: Path | None, writable: bool) -> None:
        """Keep the store; a reader reads all rows at once, so that every list is of the same moment."""
        self.path = path
        self._store = store
        self._writable = writable
        self._parts: dict[str, tuple[Part, ...]] = {}
        self._snapshot: Snapshot | None = None if writable else store.snapshot()

    def __enter__(self) -> Self:
        """Return the catalogue itself."""
        return self

    def __exit__(
        self, kind: type[BaseException] | None, error: BaseException | None, trace: TracebackType | None
    ) -> None:
        """Forget what was read."""
        self._forget()

    def parts(self, kind: str) -> tuple[Part, ...]:
        """Return all parts of a kind in the order of the code points of their codes."""
        if kind not in self._parts:
            rows = self._rows()[kind]
            self._parts[kind] = tuple(part_of(kind, row, self._store.shown) for row in rows.values())
        return self._parts[kind]

    def get(self, kind: str, code: str) -> Part | None:
        """Return one part, or None where there is none of that kind and code."""
        row = self._rows()[kind].get(_clean(code))
        return None if row is None else part_of(kind, row, self._store.shown)

    def kinds_of(self, code: str) -> tuple[str, ...]:
        """Return the kinds that have a part of that code, in the order of the kinds."""
        rows, clean = self._rows(), _clean(code)
        return tuple(kind for kind in KINDS if clean in rows[kind])

    def find(self, text: str, kind: str | None = None, limit: int = 20) -> tuple[Found, ...]:
        """Return the parts that answer a text, the likeliest first (see find.find_parts for the order)."""
        from selector.catalogue.find import find_parts  # noqa: PLC0415 - other readers do without

        kinds = KINDS if kind is None else (kind,)
        return find_parts((part for each in kinds for part in self.parts(each)), text, limit)

    def info(self) -> Info:
        """Return path, schema version, counts, size and the last change."""
        from selector.catalogue.info import info_of  # noqa: PLC0415 - other readers do without

        self._rows()
        return info_of(self._snapshot_now(), self.path)

    def add(self, part: Part) -> None:
        """Add a part; InputRefused where the catalogue has one of that kind and code."""
        from selector.catalogue.merge import Put  # noqa: PLC0415 - readers do without
        from selector.catalogue.write import write  # noqa: PLC0415 - readers do without

        self._refuse_reader()
        with self._store.writing(1) as writing:
            if writing.row(part.kind, part.part) is not None:
                raise _there_already(part.kind, part.part)
            write(writing, [Put(part.kind, part.part, stored(part))])
        self._forget()

    def change(self, kind: str, code: str, fields: Mapping[str, object]) -> tuple[Change, ...]:
        """Give a part other figures, as cells of `read_part`; return what differs. The code itself may change.

        Raises
        ------
        InputRefused
            There is no such part, its new figures are impossible, or its new code is taken.
        """
        from selector.catalogue.merge import Put, differing  # noqa: PLC0415 - readers do without
        from selector.catalogue.write import Gone, write  # noqa: PLC0415 - readers do without

        self._refuse_reader()
        must_exist(self._store)
        with self._store.writing(1) as writing:
            row = _row_of(writing, kind, code)
            before = part_of(kind, row, self._store.shown)
            after = read_part(kind, {**cells_of(before), **fields}, where=f"{kind} {before.part}", bare=False)
            differences = differing(before, after)
            if after.part != before.part:
                if writing.row(kind, after.part) is not None:
                    raise _there_already(kind, after.part)
                write(writing, [Put(kind, after.part, stored(after))], [Gone(kind, before.part, row)])
            elif differences or after.source != before.source:
                write(writing, [Put(kind, after.part, stored(after), row.digest)])
        self._forget()
        return differences

    def remove(self, kind: str, code: str) -> Part:
        """Remove a part and return what it was; InputRefused where there is none."""
        from selector.catalogue.write import Gone, write  # noqa: PLC0415 - readers do without

        self._refuse_reader()
        must_exist(self._store)
        with self._store.writing(1) as writing:
            row = _row_of(writing, kind, code)
            part = part_of(kind, row, self._store.shown)
            write(writing, gone=[Gone(kind, part.part, row)])
        self._forget()
        return part

    def merge(self, parts: Iterable[Part], *, replace: bool = False, dry_run: bool = False) -> Merge:
        """Take in parts in one transaction: all that are new and, where `replace` is set, those that differ.

        With `dry_run` nothing is written and no file is made; what would be done is returned all the same.
        """
        from selector.catalogue.merge import plan  # noqa: PLC0415 - readers do without
        from selector.catalogue.write import write  # noqa: PLC0415 - readers do without

        self._refuse_reader()
        given = tuple(parts)
        if dry_run or not given:
            merge, _ = plan(self._store.snapshot().row, given, replace=replace, where=self._store.shown)
            return merge
        with self._store.writing(len(given)) as writing:
            merge, puts = plan(writing.row, given, replace=replace, where=self._store.shown)
            if puts:
                write(writing, puts)
        self._forget()
        return merge

    def take_in(self, sources: Sequence[Source], *, replace: bool = False, dry_run: bool = False) -> tuple[Taken, ...]:
        """Take in the parts of stock files in one transaction, as `merge` does; return what became of each file's.

        The sources may hold any number of parts: they are read from as they are written.
        """
        from selector.catalogue.bulk import planned, take_in  # noqa: PLC0415 - readers do without

        self._refuse_reader()
        count = sum(map(len, sources))
        if dry_run or not count:
            return planned(sources, self._store.snapshot(), replace=replace, where=self._store.shown)
        with self._store.writing(count) as writing:
            taken = take_in(sources, writing, replace=replace, where=self._store.shown)
        self._forget()
        return taken

    def _rows(self) -> Mapping[str, Mapping[str, Stored]]:
        """Return all rows by kind and code."""
        return self._snapshot_now().rows

    def _snapshot_now(self) -> Snapshot:
        """Return what was read, reading it first where a writer has not yet."""
        if self._snapshot is None:
            self._snapshot = self._store.snapshot()
        return self._snapshot

    def _forget(self) -> None:
        """Read anew at the next look, after a change."""
        if self._writable:
            self._snapshot = None
            self._parts.clear()

    def _refuse_reader(self) -> None:
        """Raise where the catalogue was opened for reading."""
        if not self._writable:
            raise UsageRefused(Fault(self._store.shown, "was opened for reading", "open it with write=True"))


def open_catalogue(path: Path | None = None, *, write: bool = False) -> Catalogue:
    """Open a catalogue.

    Parameters
    ----------
    path : Path or None
        The file; None is the default one (`place.default_path`).
    write : bool
        Whether it shall be changed. Only a writer may begin with no file; it is made by the first change.

    Raises
    ------
    Unusable
        There is no catalogue (for a reader), or what is there cannot be used; it is not changed.
    """
    named = default_path() if path is None else Path(path)
    store = FileStore(named, make_folder=path is None and named == user_path())
    place = store.look()
    if not write and not place.exists:
        raise missing(place)
    return Catalogue(store, path=named, writable=write)


def in_memory(parts: Iterable[Part] = ()) -> Catalogue:
    """Return a catalogue of some parts that is in no file; it can be changed, and is gone with the object."""
    connection = sqlite3.connect(":memory:", isolation_level=None, check_same_thread=False)
    settle(connection)
    catalogue = Catalogue(MemoryStore(connection), path=None, writable=True)
    weakref.finalize(catalogue, connection.close)
    catalogue.merge(parts)
    return catalogue


def _clean(code: str) -> str:
    """Return a code as codes are kept."""
    return unicodedata.normalize("NFC", code.strip())


def _row_of(writing: Writing, kind: str, code: str) -> Stored:
    """Return the row of a part that must be there."""
    row = writing.row(kind, _clean(code))
    if row is None:
        raise InputRefused(
            Fault(f"{kind} {code}", "is not in the catalogue", "search for it: selector parts find TEXT")
        )
    return row


def _there_already(kind: str, code: str) -> InputRefused:
    """Return the fault of a part whose code is taken."""
    remedy = f"change it: selector parts change {code} --kind {kind} FIELD=VALUE"
    return InputRefused(Fault(f"{kind} {code}", "is in the catalogue already", remedy))
