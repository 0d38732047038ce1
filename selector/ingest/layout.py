"""The heading line: which delimiter, which fields, and whether a stock file can be read with it at all."""

from __future__ import annotations

import csv
from collections.abc import Iterator, Mapping, Sequence
from dataclasses import dataclass

from selector.errors import Fault, InputRefused, UsageRefused
from selector.ingest.headings import KIND, Heading, field_names, nearest, read_headings
from selector.ingest.lines import Lines
from selector.ingest.result import MissingFields
from selector.ingest.rows import RawRow, Rows
from selector.parts import KINDS, columns

DELIMITERS = (",", ";", "\t")

_LONGEST_SHOWN = 80


@dataclass(frozen=True, slots=True)
class Layout:
    """How the rows of a file are to be read, and the rows themselves behind the heading line."""

    delimiter: str
    heading_line: int
    headings: tuple[Heading, ...]
    not_mapped: tuple[str, ...]
    rows: Rows

    @property
    def fields(self) -> frozenset[str]:
        """Return the fields that some column gives."""
        return frozenset(heading.field for heading in self.headings if heading.field is not None)


def layout_of(lines: Lines, kind: str | None, named: Mapping[str, str], where: str) -> Layout:
    """Return the layout that the first line with text in it gives.

    Raises
    ------
    UsageRefused
        The kind, or a field that a heading is said to give, does not exist.
    InputRefused
        The line is no heading line, two columns give one field, a unit does not fit, or a column is missing that every
        row needs.
    """
    _refuse_unknown(kind, named)
    first = next((line for line in lines if line.text.strip()), None)
    if first is None:
        raise InputRefused(Fault(where, "has no line with text in it", "the first line names the columns"))
    delimiter = _delimiter(first.text, kind, named)
    rows = Rows(lines, first, delimiter)
    row = next(rows, RawRow(first.number, (), "has nothing but delimiters", "name the columns in it"))
    headings, not_mapped = read_headings(row.cells, kind, named)
    faults = _faults(row, headings, kind, f"{where} line {row.line}")
    if faults:
        raise InputRefused(faults)
    return Layout(delimiter, row.line, headings, not_mapped, rows)


def missing_fields(kind: str, fields: frozenset[str]) -> MissingFields | None:
    """Return what a kind needs and no column gives, None where nothing is missing."""
    missing = tuple(column.name for column in columns(kind) if column.required and column.name not in fields)
    return MissingFields(kind, missing) if missing else None


def _refuse_unknown(kind: str | None, named: Mapping[str, str]) -> None:
    """Refuse a kind or a field, named on the command line, that there is not."""
    if kind is not None and kind not in KINDS:
        remedy = nearest(kind, KINDS) or f"kinds: {', '.join(KINDS)}"
        raise UsageRefused(Fault("", f'"{kind}" is no kind of part', remedy))
    known = field_names(kind)
    faults = [
        Fault(f'heading "{heading}"', f'"{field}" is no field of {_of(kind)}', nearest(field, known))
        for heading, field in named.items()
        if field and field not in known
    ]
    if faults:
        raise UsageRefused(faults)


def _of(kind: str | None) -> str:
    """Return whose fields are meant."""
    return "any part" if kind is None else f"kind {kind}"


def _delimiter(text: str, kind: str | None, named: Mapping[str, str]) -> str:
    """Return the delimiter with which most cells of the heading line are known; of equals the one with most cells."""

    def gained(delimiter: str) -> tuple[int, int]:
        try:
            cells = next(csv.reader([text], delimiter=delimiter), [])
        except csv.Error:
            return 0, 0
        headings, _ = read_headings(cells, kind, named)
        return sum(heading.known for heading in headings), len(cells)

    return max(DELIMITERS, key=gained)


def _faults(row: RawRow, headings: Sequence[Heading], kind: str | None, where: str) -> list[Fault]:
    """Return all that keeps a file from being read with these headings."""
    if row.why:
        return [Fault(where, row.why, row.remedy)]
    if not any(heading.known for heading in headings):
        shown = ", ".join(row.cells)
        shown = shown if len(shown) <= _LONGEST_SHOWN else f"{shown[:_LONGEST_SHOWN]}..."
        remedy = "name the columns in the first line as in: selector parts template KIND"
        return [Fault(where, f'no field of a part is named in "{shown}"', remedy)]
    return [*_wrong_units(headings, where), *_twice(headings, where), *_lacking(headings, kind, where)]


def _wrong_units(headings: Sequence[Heading], where: str) -> Iterator[Fault]:
    """Yield the headings whose unit their field cannot have."""
    for heading in headings:
        if heading.wrong_unit:
            what = f'"{heading.wrong_unit}" is no unit of {heading.field}'
            yield Fault(f'{where}, column "{heading.text}"', what, f"write it like {_like(heading.field)}")


def _like(field: str | None) -> str:
    """Return how the heading of a field is written."""
    of_field = next(column for kind in KINDS for column in columns(kind) if column.name == field)
    return f"{field} [{of_field.quantity.heading}]" if of_field.quantity else of_field.name


def _twice(headings: Sequence[Heading], where: str) -> Iterator[Fault]:
    """Yield the fields that more than one column gives."""
    for field in dict.fromkeys(heading.field for heading in headings if heading.field is not None):
        texts = [heading.text for heading in headings if heading.field == field]
        if len(texts) > 1:
            shown = " and ".join(f'"{text}"' for text in texts)
            what = f"{len(texts)} columns give {field}: {shown}"
            yield Fault(where, what, f'keep one, or leave one out: --map "{texts[-1]}="')


def _lacking(headings: Sequence[Heading], kind: str | None, where: str) -> Iterator[Fault]:
    """Yield the columns without which no row can be read."""
    fields = frozenset(heading.field for heading in headings if heading.field is not None)
    missing = missing_fields(kind, fields) if kind is not None else None
    if kind is None and KIND not in fields:
        yield Fault(where, "no column gives the kind of part", "add a column kind, or name it: --kind resistor")
    if missing is not None:
        remedy = f'add them, or say which column it is: --map "HEADING={missing.fields[0]}"'
        yield Fault(where, str(missing), remedy)
    elif "part" not in fields:
        remedy = 'head the column of your stock codes "part", or say which it is: --map "HEADING=part"'
        yield Fault(where, "no column gives part, the code that every part needs", remedy)
