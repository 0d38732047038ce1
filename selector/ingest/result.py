"""What was read from a stock file: how, the columns, the parts, and the rows that are refused."""

from __future__ import annotations

from collections.abc import Callable, Iterator, Mapping, Sequence
from dataclasses import dataclass, replace
from pathlib import Path

from selector.ingest.accepted import Accepted, AcceptedRows, Source
from selector.ingest.codes import Codes, Key, among_several, number_of
from selector.ingest.refused import CellFault, RefusedRow, RefusedRows
from selector.parts import Part, part_of_record


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
    accepted
        The rows that are taken, in the order of the file.
    codes
        What stands for the codes of all rows that could be read.
    refused
        The rows that are not taken, in the order of the file.
    missing
        Kinds whose rows are all refused because the file lacks columns: one entry, and one message, for each.
    not_mapped
        Headings that the caller named and that the file does not have.
    """

    path: Path
    read: Read
    columns: tuple[ColumnRead, ...]
    accepted: AcceptedRows
    codes: Codes
    refused: RefusedRows
    missing: tuple[MissingFields, ...]
    not_mapped: tuple[str, ...]

    @property
    def rows(self) -> tuple[tuple[int, Part], ...]:
        """Return the parts, each with the line on which its row begins: of a large file very many."""
        return tuple((row.line, part_of_record(row.kind, row.record)) for row in self.accepted)

    @property
    def parts(self) -> tuple[Part, ...]:
        """Return the parts without their lines."""
        return tuple(part for _, part in self.rows)

    @property
    def records(self) -> Source:
        """Return kinds and records of the parts, read as they are asked for."""
        return Source(self.accepted)

    def heading_of(self, field: str) -> str:
        """Return the heading of the column that gives a field; the field's own name where none does."""
        return next((column.heading for column in self.columns if column.field == field), field)

    def refusing(self, faults: Mapping[Key, Sequence[CellFault]]) -> StockFile:
        """Return this file with more rows refused: those whose kind and code are named, for the faults beside them."""
        return self._refusing(lambda row: faults.get(row.key)) if faults else self

    def refusing_several(self, among_refused: frozenset[int]) -> StockFile:
        """Return this file without the rows that share kind and code with another of its rows.

        `among_refused` holds what stands for the codes that a refused row has.
        """
        doubtful = self.codes.twice() | among_refused
        if not doubtful:
            return self
        lines: dict[Key, list[int]] = {}
        for row in self.accepted:
            if number_of(row.key) in doubtful:
                lines.setdefault(row.key, []).append(row.line)
        several = {key: of_key for key, of_key in lines.items() if len(of_key) > 1 or number_of(key) in among_refused}

        def fault(row: Accepted) -> Sequence[CellFault] | None:
            if row.key not in several:
                return None
            other = next((line for line in several[row.key] if line != row.line), None)
            others = "a row that is refused" if other is None else f"line {other}"
            return (shared_fault(self.heading_of("part"), row.key, others),)

        return self._refusing(fault)

    def _refusing(self, faults_of: Callable[[Accepted], Sequence[CellFault] | None]) -> StockFile:
        """Return this file with those rows refused that have faults after all."""
        gone: set[int] = set()

        def more() -> Iterator[RefusedRow]:
            for row in self.accepted:
                faults = faults_of(row)
                if faults is not None:
                    gone.add(row.line)
                    yield RefusedRow(row.line, tuple(row.cells), tuple(faults))

        refused = self.refused.joined(more())
        return replace(self, accepted=self.accepted.without(gone), refused=refused) if gone else self


def refusing_shared(files: Sequence[StockFile]) -> tuple[StockFile, ...]:
    """Return the files of one load, without the rows that share kind and code with a row of another file."""
    doubtful = among_several([file.codes for file in files])
    places: dict[Key, list[tuple[int, int]]] = {}
    for index, file in enumerate(files) if doubtful else ():
        for row in file.accepted:
            if number_of(row.key) in doubtful:
                places.setdefault(row.key, []).append((index, row.line))
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
