"""Parts written as a stock file that loads again unchanged."""

from __future__ import annotations

import csv
import io
from collections.abc import Iterable, Mapping

from selector.guard import guarded
from selector.ingest.headings import KIND
from selector.parts import KINDS, Column, Part, cells_of, columns


def stock_csv(parts: Iterable[Part]) -> str:
    """Return parts of any kinds as a CSV: a column `kind`, and one for each field that some part states.

    Figures stand with their unit in the cell, except for those that may be negative: these have it in the heading,
    so that the cell is a plain number, which no spreadsheet takes for a formula. Fields that the kinds have in common
    come first, then those of each kind; the parts keep their order.
    """
    rows = [(part, cells_of(part)) for part in parts]
    stated = {name for _, cells in rows for name in cells}
    kinds = {part.kind for part, _ in rows}
    by_name: dict[str, Column] = {
        column.name: column
        for kind in KINDS
        if kind in kinds
        for column in columns(kind)
        if column.name in stated or column.name == "part"
    }
    text = io.StringIO()
    writer = csv.writer(text, lineterminator="\r\n")
    writer.writerow([KIND, *(map(_heading, by_name.values()) if by_name else ("part",))])
    for part, cells in rows:
        writer.writerow([part.kind, *(guarded(_cell(part, column, cells)) for column in by_name.values())])
    return text.getvalue()


def _heading(column: Column) -> str:
    """Return a field's heading, with the unit where the cells have none."""
    if column.quantity is None or not _may_be_negative(column):
        return column.name
    return f"{column.name} [{column.quantity.unit}]"


def _cell(part: Part, column: Column, cells: Mapping[str, str]) -> str:
    """Return one cell; empty where the part does not state the field."""
    if column.name not in cells:
        return ""
    return repr(getattr(part, column.name)) if _may_be_negative(column) else cells[column.name]


def _may_be_negative(column: Column) -> bool:
    """Return whether a figure below nought is possible."""
    return column.quantity is not None and column.least is None and column.above is not None and column.above < 0
