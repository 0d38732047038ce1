"""The main records of an answer as CSV."""

from __future__ import annotations

import csv
import io
import math

from selector.guard import guarded
from selector.report.format import Format
from selector.report.told import Cell, Told

_END = "\r\n"


def _write(told: Told) -> str:
    """Return a heading and one line per record, ended by line feeds; text that is CSV already as it is."""
    records = told.records()
    if isinstance(records, str):
        return records
    rows = (records.headings, *records.rows)
    return "".join(_line(tuple(_cell(cell) for cell in row)) for row in rows)


def _line(cells: tuple[str, ...]) -> str:
    """Return a line quoted as RFC 4180 has it: also where a cell holds a lone CR or LF."""
    text = io.StringIO()
    csv.writer(text, lineterminator=_END).writerow(cells)
    return text.getvalue().removesuffix(_END) + "\n"


def _cell(value: Cell) -> str:
    if value is None or (isinstance(value, float) and not math.isfinite(value)):
        return ""
    if isinstance(value, bool):
        return "yes" if value else "no"
    return guarded(value) if isinstance(value, str) else repr(value)


FORMAT = Format("csv", (".csv",), _write)
