"""What became of a stock file, in the words of an answer."""

from __future__ import annotations

from itertools import islice

from selector.app.changes import field_change, figure_text
from selector.app.naming import shown_path
from selector.catalogue.bulk import Taken
from selector.catalogue.merge import Change, Conflict
from selector.ingest import CellFault, StockFile
from selector.report.answers.loaded import CELLS_SHOWN, CellRefused, ColumnRead, FileLoaded


def file_loaded(file: StockFile, taken: Taken) -> FileLoaded:
    """Return the answer for one file and what became of its parts."""
    return FileLoaded(
        file=shown_path(file.path),
        encoding=file.read.encoding,
        delimiter=file.read.delimiter,
        heading_line=file.read.heading_line,
        columns=tuple(
            ColumnRead(each.heading, each.field, each.unit, each.matched, each.nearest or None, each.samples)
            for each in file.columns
        ),
        new=taken.new,
        changed=taken.changed,
        same=taken.same,
        refused=len(file.refused),
        changes=tuple(map(field_change, taken.changes)),
        cells=_cells(file),
        notes=_notes(file),
    )


def conflict_faults(file: StockFile, conflict: Conflict) -> list[CellFault]:
    """Return the faults of a row whose part the catalogue has with other figures: one for each field."""
    return [_conflict_fault(file, each) for each in conflict.differences]


def _conflict_fault(file: StockFile, change: Change) -> CellFault:
    before, after = figure_text(change, change.before), figure_text(change, change.after)
    had = f"with {change.field} {before}" if before else f"without {change.field}"
    why = f"{change.kind} {change.part} is in the catalogue {had}"
    return CellFault(file.heading_of(change.field), after, why, "load with --replace to change it, or correct the row")


def _cells(file: StockFile) -> tuple[CellRefused, ...]:
    """Return the first of the cells that were refused, in the order of the file."""
    missing = {str(each) for each in file.missing}
    faults = (
        CellRefused(row.line, fault.column, fault.value, fault.why, fault.remedy)
        for row in file.refused
        for fault in row.faults
        if fault.why not in missing
    )
    return tuple(islice(faults, CELLS_SHOWN))


def _notes(file: StockFile) -> tuple[str, ...]:
    """Return what is to be said of the file as a whole."""
    missing = [f"{each}; see: selector parts template {each.kind}" for each in file.missing]
    return (*missing, *(f'no column is headed "{each}"' for each in file.not_mapped))
