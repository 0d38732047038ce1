"""The rejects file: the rows that were refused as they stood, and beside them where, why and what would be right."""

from __future__ import annotations

import csv
import io
from collections.abc import Iterator, Sequence
from itertools import zip_longest

from selector.guard import guarded
from selector.ingest.headings import ADDED_BY_REJECTS, plain
from selector.ingest.refused import CellFault, RefusedRow
from selector.ingest.result import StockFile

_Place = tuple[str, int]
"""A heading, and its number among equal ones in its file."""


def rejects_text(*files: StockFile) -> str:
    """Return the rejects of some stock files as one CSV: mended, it loads as the files did.

    The columns are those of the files, each once, and behind them line, column, why and remedy, which a load passes
    over. Cells beyond the heading line come last, without a heading: they keep the row refused until it is mended.
    """
    places = list(dict.fromkeys(place for file in files if file.refused for place in _places(file) if place))
    text = io.StringIO()
    writer = csv.writer(text, lineterminator="\r\n")
    writer.writerow([heading for heading, _ in places] + list(ADDED_BY_REJECTS))
    for file in files:
        for row in file.refused:
            own = _places(file)
            beyond = map(_as_it_stood, row.cells[len(own) :])
            writer.writerow([*_cells(row, own, places), *_reasons(row), *beyond])
    return text.getvalue()


def _places(file: StockFile) -> list[_Place | None]:
    """Return where each column of a file goes; None for those that an earlier rejects file added."""
    seen: dict[str, int] = {}
    places: list[_Place | None] = []
    for column in file.columns:
        if column.field is None and plain(column.heading) in ADDED_BY_REJECTS:
            places.append(None)
            continue
        seen[column.heading] = seen.get(column.heading, 0) + 1
        places.append((column.heading, seen[column.heading]))
    return places


def _cells(row: RefusedRow, own: Sequence[_Place | None], places: Sequence[_Place]) -> Iterator[str]:
    """Yield the cells of a row in the order of the common columns.

    They are written as they stood, so that a guard that was there is there again; one is added only where it lacks.
    """
    by_place = dict(zip_longest(own, row.cells[: len(own)], fillvalue=""))
    return (_as_it_stood(by_place.get(place, "")) for place in places)


def _as_it_stood(cell: str) -> str:
    """Return a cell that a spreadsheet does not compute and that a load reads as it read the original."""
    return cell if cell.startswith("'") else guarded(cell)


def _reasons(row: RefusedRow) -> tuple[str, str, str, str]:
    """Return line, columns, reasons and remedies of a row, each in one cell."""
    return (
        str(row.line),
        guarded("; ".join(dict.fromkeys(fault.column for fault in row.faults if fault.column))),
        guarded("; ".join(_reason(fault) for fault in row.faults)),
        guarded("; ".join(dict.fromkeys(fault.remedy for fault in row.faults if fault.remedy))),
    )


def _reason(fault: CellFault) -> str:
    """Return why a cell is refused, with its column where a row has several faults to tell apart."""
    return f"{fault.column}: {fault.why}" if fault.column else fault.why
