"""Rows that are taken, kept in little memory however many there are."""

from __future__ import annotations

import marshal
import tempfile
import weakref
from array import array
from collections.abc import Iterable, Iterator, Sequence
from dataclasses import dataclass
from itertools import compress
from typing import IO, NamedTuple

from selector.errors import Unusable
from selector.ingest.codes import Key
from selector.ingest.refused import no_room
from selector.parts import Record, Records

_AT_ONCE = 2_000
_MOST_HELD_BYTES = 8_000_000


class Accepted(NamedTuple):
    """A row that is taken: its first line, the kind and record of its part, its cells as they stand in the file."""

    line: int
    kind: str
    record: Record
    cells: Sequence[str]

    @property
    def key(self) -> Key:
        """Return kind and code."""
        return self.kind, str(self.record[0])


class Piece(NamedTuple):
    """Rows of one kind that stand one behind the other: their first lines, their records, the cells of each."""

    kind: str
    lines: Sequence[int]
    records: Records
    cells: Sequence[Sequence[str]]


_Written = tuple[str, Sequence[int], Records, Sequence[Sequence[str]]]


class Spool:
    """All rows of a file that were taken, in its order: thousands in memory, more in a nameless temporary file.

    They are written by `marshal`, which is fast, and read by this process alone.
    """

    def __init__(self) -> None:
        """Begin with none."""
        self._some: list[_Written] = []
        self._held = 0
        self._file: IO[bytes] = tempfile.SpooledTemporaryFile(_MOST_HELD_BYTES)  # noqa: SIM115 - closed when this object is gone
        weakref.finalize(self, self._file.close)
        self._starts = array("Q", (0,))
        self._count = 0

    def add(self, piece: Piece) -> None:
        """Add some rows, behind those that came before them in the file."""
        self._some.append((piece.kind, list(piece.lines), list(piece.records), list(piece.cells)))
        self._held += len(piece.lines)
        self._count += len(piece.lines)
        if self._held >= _AT_ONCE:
            self._spill()

    def __len__(self) -> int:
        """Return the number of rows."""
        return self._count

    def pieces(self) -> Iterator[Piece]:
        """Yield the rows in the order of the file."""
        for number in range(len(self._starts) - 1):
            yield from map(Piece._make, self._batch(number))
        yield from map(Piece._make, self._some)

    def _batch(self, number: int) -> list[_Written]:
        """Return some pieces that were written to the file."""
        try:
            self._file.seek(self._starts[number])
            written = self._file.read(self._starts[number + 1] - self._starts[number])
        except OSError as error:
            raise _no_room(error) from error
        pieces: list[_Written] = marshal.loads(written)  # noqa: S302 - written by this process
        return pieces

    def _spill(self) -> None:
        """Write some pieces to the end of the file."""
        try:
            self._file.seek(self._starts[-1])
            self._file.write(marshal.dumps(self._some))
            self._starts.append(self._file.tell())
        except OSError as error:
            raise _no_room(error) from error
        self._some, self._held = [], 0


@dataclass(frozen=True, slots=True)
class AcceptedRows:
    """The rows of a spool but for those that begin on some lines: these are refused after all."""

    spool: Spool
    gone: frozenset[int] = frozenset()

    def __len__(self) -> int:
        """Return the number of rows."""
        return len(self.spool) - len(self.gone)

    def __iter__(self) -> Iterator[Accepted]:
        """Yield the rows in the order of the file."""
        for kind, lines, records, cells in self.spool.pieces():
            for line, record, of_row in zip(lines, zip(*records, strict=True), cells, strict=True):
                if line not in self.gone:
                    yield Accepted(line, kind, record, of_row)

    def records(self) -> Iterator[tuple[str, Records]]:
        """Yield kind and records of some rows at a time."""
        for kind, lines, records, _ in self.spool.pieces():
            kept = None if self.gone.isdisjoint(lines) else [line not in self.gone for line in lines]
            if kept is None:
                yield kind, records
            elif any(kept):
                yield kind, [list(compress(column, kept)) for column in records]

    def without(self, lines: Iterable[int]) -> AcceptedRows:
        """Return the rows without some more."""
        return AcceptedRows(self.spool, self.gone.union(lines))


@dataclass(frozen=True, slots=True)
class Source:
    """Records of some rows with their kinds: what a catalogue takes in."""

    rows: AcceptedRows

    def __len__(self) -> int:
        """Return how many there are."""
        return len(self.rows)

    def __iter__(self) -> Iterator[tuple[str, Records]]:
        """Yield kind and records of some rows at a time, in the order of the file, as often as is asked."""
        return self.rows.records()


def _no_room(error: OSError) -> Unusable:
    """Return the fault of a temporary file that cannot be written or read."""
    return no_room(error, "the rows that are read")
