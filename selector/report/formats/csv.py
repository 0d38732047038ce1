"""The main records of an answer as CSV."""

from __future__ import annotations

import csv
import io
import math
import re

from selector.report.format import Format
from selector.report.told import Cell, Told

_FORMULA = re.compile(r"'*[=+\-@\t\r]")
_NUMBER = re.compile(r"[+-]?(?:[0-9]+(?:[.,][0-9]*)?|[.,][0-9]+)(?:[eE][+-]?[0-9]{1,3})?")
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


def guarded(cell: str) -> str:
    """Return a text that no spreadsheet takes for a formula: with one more `'` where it starts like one.

    Source: OWASP ASVS 4.0.3, requirement 5.3.10 (from memory).

    >>> guarded("=1+1"), guarded("'-x"), guarded("-5"), guarded("S-1R")
    ("'=1+1", "''-x", '-5', 'S-1R')
    """
    return f"'{cell}" if _FORMULA.match(cell) and not _NUMBER.fullmatch(cell) else cell


FORMAT = Format("csv", (".csv",), _write)
