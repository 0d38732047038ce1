"""What was read from a stock file: how, the columns, the parts, and the rows that are refused."""

from __future__ import annotations

import json
from collections.abc import Iterable, Mapping, Sequence
from dataclasses import dataclass, replace
from pathlib import Path

from selector.ingest.refused import CellFault, RefusedRow, RefusedRows
from selector.parts import Part

Key = tuple[str, str]
"""Kind and code of a part."""


@dataclass(frozen=True, slots=True)
class Read:
    """How a file was read."""

    encoding: str
    delimiter: str
    heading_line: int


@dataclass(frozen=True, slots=True)
class ColumnRead:
    """One column: its heading, the field it gives (None: not used), and what stands in its first rows.

    `unit` is the heading's, `matched` how the field was found, `nearest` the field that a column not used may have
    meant (empty: none).
    """

    heading: str
    field: str | None
    unit: str | None
    matched: str | None
    nearest: str
    samples: tuple[str, ...]


@dataclass(frozen=True, slots=True)
class MissingFields:
    """The fields that every part of a kind needs and that no column of the file gives."""

    kind: str
    fields: tuple[str, ...]

    def __str__(self) -> str:
        """Return one sentence for the whole kind."""
        return f"no column gives {', '.join(self.fields)}, which every {self.kind} needs"


@dataclass(frozen=True, slots=True)
class StockFile:
    """A stock file, read.

    Attributes
    ----------
    rows
        The parts, each with the line on which its row begins, in the order of the file.
    refused
        The rows that are not taken, in the order of the file.
    missing
        Kinds whose rows are all refused because the file lacks columns: one entry, and one message, for each.
    not_mapped
        Headings that the caller named and that the file does not have.
    packed
        The cells of `rows`, in a small form; `refusing` needs them.
    """

    path: Path
    read: Read
    columns: tuple[ColumnRead, ...]
    rows: tuple[tuple[int, Part], ...]
    refused: RefusedRows
    missing: tuple[MissingFields, ...]
    not_mapped: tuple[str, ...]
    packed: tuple[str, ...]

    @property
    def parts(self) -> tuple[Part, ...]:
        """Return the parts without their lines."""
        return tuple(part for _, part in self.rows)

    def heading_of(self, field: str) -> str:
        """Return the heading of the column that gives a field; the field's own name where none does."""
        return next((column.heading for column in self.columns if column.field == field), field)

    def refusing(self, faults: Mapping[Key, Sequence[CellFault]]) -> StockFile:
        """Return this file with more rows refused: those whose kind and code are named, for the faults beside them."""
        gone = [index for index, (_, part) in enumerate(self.rows) if (part.kind, part.part) in faults]
        if not gone:
            return self
        more = [self._refused(index, faults) for index in gone]
        kept = sorted(set(range(len(self.rows))).difference(gone))
        return replace(
            self,
            rows=tuple(self.rows[index] for index in kept),
            packed=tuple(self.packed[index] for index in kept),
            refused=self.refused.joined(more),
        )

    def _refused(self, index: int, faults: Mapping[Key, Sequence[CellFault]]) -> RefusedRow:
        """Return an accepted row as a refused one."""
        line, part = self.rows[index]
        return RefusedRow(line, unpacked(self.packed[index]), tuple(faults[part.kind, part.part]))


def refusing_shared(files: Sequence[StockFile]) -> tuple[StockFile, ...]:
    """Return the files of one load, without the rows that share kind and code with a row of another file."""
    places: dict[Key, list[tuple[int, int]]] = {}
    for index, file in enumerate(files):
        for line, part in file.rows:
            places.setdefault((part.kind, part.part), []).append((index, line))
    shared = {key: of_key for key, of_key in places.items() if len(of_key) > 1}
    return tuple(
        file.refusing({key: [_shared(key, of_key, index, files)] for key, of_key in shared.items()})
        for index, file in enumerate(files)
    )


def _shared(key: Key, places: Sequence[tuple[int, int]], own: int, files: Sequence[StockFile]) -> CellFault:
    """Return the fault of a row in file `own` whose kind and code another file has as well."""
    others = ", ".join(f"{files[index].path.name} line {line}" for index, line in places if index != own)
    return shared_fault(files[own].heading_of("part"), key, others)


def shared_fault(column: str, key: Key, others: str) -> CellFault:
    """Return the fault of a row whose kind and code stand elsewhere in the load as well."""
    kind, code = key
    return CellFault(column, code, f"{kind} {code} is also in {others}", "keep one of the rows")


def packed(cells: Iterable[str]) -> str:
    """Return cells as one small text."""
    return json.dumps(list(cells), ensure_ascii=False, separators=(",", ":"))


def unpacked(text: str) -> tuple[str, ...]:
    """Return the cells of a packed text."""
    return tuple(json.loads(text))
