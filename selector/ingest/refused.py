"""Rows that are refused, kept in little memory however many there are."""

from __future__ import annotations

import json
import tempfile
import weakref
from array import array
from collections.abc import Iterable, Iterator, Sequence
from dataclasses import dataclass
from itertools import pairwise
from typing import IO, NamedTuple, overload

from selector.errors import Fault, Unusable

_MOST_HELD = 5_000


class CellFault(NamedTuple):
    """One thing that is wrong with a row: the heading of the column (empty: the row), what was read, why, remedy."""

    column: str
    value: str
    why: str
    remedy: str


@dataclass(frozen=True, slots=True)
class RefusedRow:
    """A row that is not taken: its first line, its cells as they stand in the file, and all that is wrong with it."""

    line: int
    cells: tuple[str, ...]
    faults: tuple[CellFault, ...]


class RefusedRows(Sequence[RefusedRow]):
    """Refused rows in the order of the file: the first thousands in memory, the rest in a nameless temporary file."""

    def __init__(self, rows: Iterable[RefusedRow] = ()) -> None:
        """Keep some rows; more can be added."""
        self._held: list[RefusedRow] = []
        self._file: IO[bytes] | None = None
        self._starts = array("Q")
        self._lines = array("Q")
        self._order: Sequence[int] | None = None
        for row in rows:
            self.add(row)

    def add(self, row: RefusedRow) -> None:
        """Add one row, wherever in the file it stands."""
        if len(self._held) < _MOST_HELD:
            self._held.append(row)
        else:
            self._spill(row)
        self._lines.append(row.line)
        self._order = None

    def joined(self, rows: Iterable[RefusedRow]) -> RefusedRows:
        """Return these rows and some more."""
        both = RefusedRows(self)
        for row in rows:
            both.add(row)
        return both

    def __len__(self) -> int:
        """Return the number of rows."""
        return len(self._lines)

    def __iter__(self) -> Iterator[RefusedRow]:
        """Yield the rows in the order of their lines."""
        return (self._row(index) for index in self._in_order())

    @overload
    def __getitem__(self, place: int) -> RefusedRow: ...

    @overload
    def __getitem__(self, place: slice) -> tuple[RefusedRow, ...]: ...

    def __getitem__(self, place: int | slice) -> RefusedRow | tuple[RefusedRow, ...]:
        """Return a row, or some, by place in the order of their lines."""
        order = self._in_order()
        if isinstance(place, slice):
            return tuple(self._row(index) for index in order[place])
        return self._row(order[place])

    def _in_order(self) -> Sequence[int]:
        """Return the rows' places of adding in the order of their lines."""
        if self._order is None:
            places: Sequence[int] = range(len(self._lines))
            if any(later < earlier for earlier, later in pairwise(self._lines)):
                places = sorted(places, key=self._lines.__getitem__)
            self._order = places
        return self._order

    def _row(self, index: int) -> RefusedRow:
        """Return the row that was added at a place."""
        if index < len(self._held):
            return self._held[index]
        if self._file is None:
            raise IndexError(index)
        try:
            self._file.seek(self._starts[index - len(self._held)])
            line, cells, faults = json.loads(self._file.readline())
        except OSError as error:
            raise no_room(error) from error
        return RefusedRow(line, tuple(cells), tuple(CellFault(*fault) for fault in faults))

    def _spill(self, row: RefusedRow) -> None:
        """Write one row to the end of the temporary file."""
        try:
            if self._file is None:
                self._file = tempfile.TemporaryFile("w+b")  # noqa: SIM115 - closed when this object is gone
                weakref.finalize(self, self._file.close)
            self._starts.append(self._file.seek(0, 2))
            self._file.write(json.dumps((row.line, row.cells, row.faults)).encode("ascii") + b"\n")
        except OSError as error:
            raise no_room(error) from error


def no_room(error: OSError, what: str = "the rows that are refused") -> Unusable:
    """Return the fault of a temporary file that cannot be written or read."""
    what = f"{what} cannot be kept: {error.strerror or error}"
    return Unusable(Fault("temporary folder", what, "make room, or set TMPDIR to another folder"))
