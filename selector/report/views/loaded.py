"""What became of stock files."""

from __future__ import annotations

from collections.abc import Iterator
from functools import partial

from selector.report.answers.loaded import CellRefused, ColumnRead, FileLoaded, Loaded
from selector.report.document import Block, Column, Document, Lines, Notes, Table
from selector.report.told import Json, Records, Told
from selector.report.views.changed import changes_block, changes_data
from selector.report.words import UNKNOWN, number

_DELIMITERS = {",": "comma", ";": "semicolon", "\t": "tab", "|": "bar", " ": "blank"}


def told(answer: Loaded) -> Told:
    """Return a load, told."""
    return Told(partial(_data, answer), partial(_document, answer), partial(_records, answer))


def _data(answer: Loaded) -> dict[str, Json]:
    return {"schema": "selector.load/1", "files": [_file_data(file) for file in answer.files]}


def _file_data(file: FileLoaded) -> dict[str, Json]:
    return {
        "file": file.file,
        "read": {
            "encoding": file.encoding,
            "delimiter": file.delimiter,
            "heading_line": file.heading_line,
            "decimal": None,
            "sheet": None,
            "layout": None,
        },
        "columns": [_column_data(column) for column in file.columns],
        "counts": {"new": file.new, "changed": file.changed, "same": file.same, "refused": file.refused},
        "changes": changes_data(file.changes),
        "refused": [
            {"line": each.line, "column": each.column, "value": each.value, "why": each.why, "remedy": each.remedy}
            for each in file.cells
        ],
    }


def _column_data(column: ColumnRead) -> dict[str, Json]:
    return {
        "heading": column.heading,
        "field": column.field,
        "unit": column.unit,
        "notation": None,
        "matched": column.matched,
        "samples": list(column.samples),
    }


def _document(answer: Loaded) -> Document:
    blocks = [block for file in answer.files for block in _file(file, dry_run=answer.dry_run)]
    last = []
    if answer.rejects is not None:
        last.append(f"-> {answer.rejects}")
    if answer.dry_run:
        last.append("Dry run: the catalogue is as it was.")
    return Document((*blocks, Lines(tuple(last))))


def _file(file: FileLoaded, *, dry_run: bool) -> Iterator[Block]:
    delimiter = _DELIMITERS.get(file.delimiter, file.delimiter)
    yield Lines((f"{file.file}: read as {delimiter}, {file.encoding}, headings in line {file.heading_line}",))
    columns = (Column("heading"), Column("field"), Column("unit"), Column("example"))
    yield Table(columns, tuple(_column(column) for column in file.columns))
    would = " would be" if dry_run else ""
    counts = ((file.new, "new"), (file.changed, "changed"), (file.same, "same"), (file.refused, "refused"))
    yield Lines((", ".join(f"{number(count)}{would} {what}" for count, what in counts),))
    yield changes_block(file.changes)
    yield Notes("refused", tuple(_refused(each) for each in file.cells))
    yield Notes("notes", file.notes)


def _refused(cell: CellRefused) -> str:
    """Return place, value, reason and remedy; the value once, where the reason names it."""
    place = f"line {cell.line}, {cell.column}" if cell.column else f"line {cell.line}"
    read = f'"{cell.value}"'
    said = cell.why if not cell.value or cell.why.startswith(read) else f"{read}: {cell.why}"
    return f"{place}: {said}; {cell.remedy}" if cell.remedy else f"{place}: {said}"


def _column(column: ColumnRead) -> tuple[str, ...]:
    example = column.samples[0] if column.samples else UNKNOWN
    if column.field is None:
        nearest = f"; did you mean {column.nearest}?" if column.nearest else ""
        return (column.heading, f"not used{nearest}", UNKNOWN, example)
    return (column.heading, column.field, column.unit or UNKNOWN, example)


def _records(answer: Loaded) -> Records:
    headings = ("file", "encoding", "delimiter", "heading_line", "new", "changed", "same", "refused")
    rows = (
        (
            *(file.file, file.encoding, file.delimiter, file.heading_line),
            *(file.new, file.changed, file.same, file.refused),
        )
        for file in answer.files
    )
    return Records(headings, tuple(rows))
