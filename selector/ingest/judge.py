"""One row of a stock file: a part, or all that is wrong with the row."""

from __future__ import annotations

from collections.abc import Iterator, Mapping
from dataclasses import dataclass, field

from selector.errors import InputRefused
from selector.guard import unguarded
from selector.ingest.heading_units import with_unit
from selector.ingest.headings import KIND, Heading, nearest
from selector.ingest.layout import missing_fields
from selector.ingest.refused import CellFault
from selector.ingest.result import MissingFields
from selector.ingest.rows import RawRow
from selector.parts import KINDS, Column, Part, columns, read_part

_LONGEST_SHOWN = 200


@dataclass(frozen=True, slots=True)
class Judge:
    """What every row of a file is judged by; it notes the kinds for which columns are missing.

    `origin` names the file in the `source` of its parts.
    """

    headings: tuple[Heading, ...]
    kind: str | None
    origin: str
    missing: dict[str, MissingFields] = field(default_factory=dict)

    def part_of(self, row: RawRow) -> Part | tuple[CellFault, ...]:
        """Return the part that a row gives, or its faults."""
        if row.why:
            return (CellFault("", "", row.why, row.remedy),)
        extra = next((cell for cell in row.cells[len(self.headings) :] if cell.strip()), None)
        if extra is not None:
            why = f"has {len(row.cells)} cells where the heading line has {len(self.headings)}"
            return (CellFault("", _cut(extra), why, "put a cell that holds the delimiter in quotes"),)
        cells = {
            heading.field: unguarded(cell.strip())
            for heading, cell in zip(self.headings, row.cells, strict=False)
            if heading.field is not None and cell.strip()
        }
        kind = self._kind(cells.pop(KIND, ""))
        if isinstance(kind, CellFault):
            return (kind,)
        return self._read(kind, cells, row.line)

    def code_of(self, row: RawRow) -> tuple[str, str]:
        """Return kind and code of a row that is refused, as far as they can be told."""
        cells = dict(zip((heading.field for heading in self.headings), row.cells, strict=False))
        kind = cells.get(KIND, "").strip().casefold() or self.kind or ""
        return kind, unguarded(cells.get("part", "").strip())

    def _kind(self, cell: str) -> str | CellFault:
        """Return the kind of a row, from its cell or else the one named for the whole file."""
        kind = cell.casefold() or self.kind
        heading = self._heading_of(KIND)
        if kind is None:
            return CellFault(heading, "", "the kind of part is missing", f"write one of {', '.join(KINDS)}")
        if kind not in KINDS:
            remedy = nearest(kind, KINDS) or f"write one of {', '.join(KINDS)}"
            return CellFault(heading, _cut(cell), f'"{_cut(cell)}" is no kind of part', remedy)
        if self.kind not in (None, kind):
            why = f'"{kind}" is not {self.kind}, the kind named for this load'
            return CellFault(heading, _cut(cell), why, "leave the kind out of the command, or correct the cell")
        return kind

    def _read(self, kind: str, cells: dict[str, str], line: int) -> Part | tuple[CellFault, ...]:
        """Return the part of the cells by their fields, or its faults."""
        by_name = {column.name: column for column in columns(kind)}
        faults = list(self._foreign(kind, cells, by_name))
        units = {heading.field: heading.unit for heading in self.headings}
        given = {
            name: with_unit(cell, units[name], by_name[name].quantity)
            for name, cell in cells.items()
            if name in by_name
        }
        given.setdefault("source", f"{self.origin} line {line}")
        lacking = self._lacking(kind)
        faults += [CellFault("", "", str(each), f"see: selector parts template {kind}") for each in lacking]
        try:
            part = read_part(kind, given, where="", bare=False)
        except InputRefused as refused:
            unread = {name for each in lacking for name in each.fields}
            faults += [
                CellFault(self._heading_of(fault.where), _cut(cells.get(fault.where, "")), fault.what, fault.remedy)
                for fault in refused.faults
                if fault.where not in unread
            ]
            return tuple(faults)
        return tuple(faults) or part

    def _foreign(self, kind: str, cells: Mapping[str, str], by_name: Mapping[str, Column]) -> Iterator[CellFault]:
        """Yield the cells of fields that the row's kind does not have."""
        for name, cell in cells.items():
            if name not in by_name:
                yield CellFault(self._heading_of(name), _cut(cell), f"a {kind} has no {name}", "empty the cell")

    def _lacking(self, kind: str) -> tuple[MissingFields, ...]:
        """Return what the row's kind needs and no column gives; nothing, or one entry."""
        if kind not in self.missing:
            fields = frozenset(heading.field for heading in self.headings if heading.field is not None)
            self.missing[kind] = missing_fields(kind, fields) or MissingFields(kind, ())
        return (self.missing[kind],) if self.missing[kind].fields else ()

    def _heading_of(self, name: str) -> str:
        """Return the heading of the column that gives a field; the field's own name where none does."""
        return next((heading.text for heading in self.headings if heading.field == name), name)


def _cut(cell: str) -> str:
    """Return a cell as it is shown, cut where it is long."""
    return cell if len(cell) <= _LONGEST_SHOWN else f"{cell[:_LONGEST_SHOWN]}..."
