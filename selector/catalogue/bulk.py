"""Rows of whole stock files taken into a catalogue, some thousand at a time: no more than these is held in memory."""

from __future__ import annotations

from collections.abc import Iterator, Mapping, Sequence
from dataclasses import dataclass
from typing import Protocol

from selector.catalogue.digest import moved_sum, row_digests
from selector.catalogue.merge import Change, Conflict, differing
from selector.catalogue.rows import Stored, refuse_damaged
from selector.catalogue.store import Writing
from selector.catalogue.write import put_columns, restate
from selector.parts import Record, Records, part_of_record, place_of

_AT_ONCE = 1_000


class Source(Protocol):
    """The parts of one stock file; no two of one load share kind and code."""

    def __len__(self) -> int:
        """Return how many there are."""

    def __iter__(self) -> Iterator[tuple[str, Records]]:
        """Yield the kind and the records of some of them at a time, in the order of the file, as often as is asked."""


class Before(Protocol):
    """What a catalogue holds before a load."""

    @property
    def counts(self) -> Mapping[str, int]:
        """Return how many rows there are of each kind."""

    def row(self, kind: str, code: str) -> Stored | None:
        """Return the row of one part, None where there is none."""


@dataclass(frozen=True, slots=True)
class Taken:
    """What became of the parts of one source, or would become of them; changes and conflicts in its order."""

    new: int
    same: int
    changed: int
    changes: tuple[Change, ...]
    conflicts: tuple[Conflict, ...]


def planned(sources: Sequence[Source], before: Before, *, replace: bool, where: str) -> tuple[Taken, ...]:
    """Return what would become of each source's parts.

    Raises
    ------
    Unusable
        A row that is compared is damaged.
    """
    return tuple(_Intake(before, where, replace=replace).take(source, None) for source in sources)


def take_in(sources: Sequence[Source], writing: Writing, *, replace: bool, where: str) -> tuple[Taken, ...]:
    """Write what is new or replaced of each source's parts, and return what became of them; Unusable as `planned`."""
    pen = _Pen(writing)
    taken = tuple(_Intake(writing, where, replace=replace).take(source, pen) for source in sources)
    pen.finish()
    return taken


class _Pen:
    """Writes rows, many of a kind at once, and keeps count of how the state row moves by it."""

    def __init__(self, writing: Writing) -> None:
        """Begin with nothing written."""
        self._writing = writing
        self._waiting: dict[str, list[Record]] = {}
        self._more = 0
        self._wrote = False
        self._digests = writing.state.digests

    def put(self, kind: str, records: Records, replaced: Sequence[bytes]) -> None:
        """Take rows of a kind, some for the place of rows of these digests; a few wait for more of their kind."""
        if not records:
            return
        self._digests = moved_sum(self._digests, replaced, ())
        self._more -= len(replaced)
        waiting = self._waiting.setdefault(kind, [])
        if not waiting and len(records[0]) >= _AT_ONCE:
            self._write(kind, records)
            return
        waiting += zip(*records, strict=True)
        if len(waiting) >= _AT_ONCE:
            self._write_waiting(kind)

    def finish(self) -> None:
        """Write what waits, and bring the state row in step, where anything was written."""
        for kind in list(self._waiting):
            self._write_waiting(kind)
        if self._wrote:
            restate(self._writing, self._more, self._digests)

    def _write_waiting(self, kind: str) -> None:
        """Write the rows of a kind that wait."""
        rows = self._waiting.pop(kind)
        if rows:
            self._write(kind, list(zip(*rows, strict=True)))

    def _write(self, kind: str, records: Records) -> None:
        """Write rows of a kind."""
        digests = row_digests(kind, records)
        put_columns(self._writing.connection, kind, [*records, digests])
        self._digests = moved_sum(self._digests, (), digests)
        self._more += len(digests)
        self._wrote = True


class _Intake:
    """The parts of one source, sorted into new, same, changed ones and conflicts."""

    def __init__(self, before: Before, where: str, *, replace: bool) -> None:
        """Begin with none."""
        self._before, self._where, self._replace = before, where, replace
        self._new = self._same = self._changed = 0
        self._changes: list[Change] = []
        self._conflicts: list[Conflict] = []

    def take(self, source: Source, pen: _Pen | None) -> Taken:
        """Sort all parts in, and write what is to be written, where there is a pen."""
        for kind, records in source:
            puts, replaced = self._sorted(kind, records) if self._before.counts[kind] else (records, ())
            self._new += (len(puts[0]) if puts else 0) - len(replaced)
            self._changed += len(replaced)
            if pen is not None:
                pen.put(kind, puts, replaced)
        return Taken(self._new, self._same, self._changed, tuple(self._changes), tuple(self._conflicts))

    def _sorted(self, kind: str, records: Records) -> tuple[Records, Sequence[bytes]]:
        """Return the records to write, and the digests of the rows that some take the place of."""
        puts: list[Record] = []
        replaced: list[bytes] = []
        for record in zip(*records, strict=True):
            code = str(record[0])
            old = self._before.row(kind, code)
            differences = () if old is None else self._differences(kind, old, record)
            if old is None:
                puts.append(record)
            elif not differences:
                self._same += 1
            elif not self._replace:
                self._conflicts.append(Conflict(kind, code, differences))
            else:
                self._changes += differences
                replaced.append(old.digest)
                puts.append(record)
        return list(zip(*puts, strict=True)), replaced

    def _differences(self, kind: str, old: Stored, record: Record) -> tuple[Change, ...]:
        """Return the fields in which a part differs from what the catalogue has; its source does not count."""
        refuse_damaged(kind, old, self._where)
        source = place_of(kind, "source")
        if old.values[:source] == record[:source] and old.values[source + 1 :] == record[source + 1 :]:
            return ()
        return differing(part_of_record(kind, old.values), part_of_record(kind, record))
