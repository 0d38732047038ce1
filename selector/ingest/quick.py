"""Many rows of a stock file at once, column by column, to the records of their parts."""

from __future__ import annotations

from collections.abc import Callable, Container, Iterator, Mapping, Sequence
from dataclasses import dataclass
from itertools import groupby
from typing import cast

from selector.guard import unguarded
from selector.ingest.accepted import Piece
from selector.ingest.headings import KIND, Heading
from selector.ingest.known import ODD, Cell, Known, known_of
from selector.ingest.layout import missing_fields
from selector.ingest.rows import PlainRows
from selector.parts import KINDS, Column, Part, Record, Records, columns, plain_value, read_cell
from selector.units import QuantityError

_NAMES = ("typical", "assumed")


@dataclass(frozen=True, slots=True)
class _Plan:
    """How rows of one kind are read, by the places of its columns in a record.

    `defaults` are the values of what the file does not give, `given` the place in the file and the known texts of what
    it does; `source` is what stands before the number of the line at `source_at`. `empty` are the columns of the file
    in which nothing may stand, `rules` what judges the values of a row in the light of each other.
    """

    defaults: tuple[Cell, ...]
    given: Mapping[int, tuple[int, Known]]
    source_at: int | None
    source: str
    empty: tuple[int, ...]
    rules: Callable[[tuple[Cell, ...]], Record | None] | None


@dataclass(frozen=True, slots=True)
class _Read:
    """The records of some rows, and the places of the odd ones, which must be judged by themselves.

    Where all are odd there may be no records.
    """

    records: Records
    odd: frozenset[int]

    def each(self) -> Sequence[Record | None]:
        """Return the record of each row, None of an odd one."""
        rows = enumerate(zip(*self.records, strict=True))
        return [None if place in self.odd else record for place, record in rows] or [None] * len(self.odd)


class Quick:
    """Reads rows that have nothing odd, as `Judge` would; of a row that has, it says nothing."""

    def __init__(self, headings: Sequence[Heading], kind: str | None, origin: str) -> None:
        """Keep what every row of the file is read by."""
        self._headings, self._kind, self._origin = headings, kind, origin
        self._kind_place = next((place for place, each in enumerate(headings) if each.field == KIND), None)
        self._plans: dict[str, _Plan | None] = {}

    def pieces(self, rows: PlainRows) -> Iterator[Piece]:
        """Yield rows in their order, in pieces: of one kind with records, or of none and to be judged one by one."""
        fitted = self._fitted(rows.cells)
        cells = tuple(zip(*fitted, strict=True))
        kinds = self._kinds(cells, len(fitted))
        if kinds.count(kinds[0]) == len(kinds):
            read = self._read(kinds[0], rows.lines, cells)
            if not read.odd:
                yield Piece(kinds[0], rows.lines, read.records, rows.cells)
                return
            found = read.each()
        else:
            found = self._mixed(kinds, rows.lines, fitted)
        for kind, run in groupby(range(len(kinds)), lambda place: "" if found[place] is None else kinds[place]):
            places = list(run)
            records = [record for place in places if (record := found[place]) is not None]
            lines, of_rows = zip(*((rows.lines[place], rows.cells[place]) for place in places), strict=True)
            yield Piece(kind, lines, list(zip(*records, strict=True)), of_rows)

    def _fitted(self, rows: Sequence[Sequence[str]]) -> Sequence[Sequence[str]]:
        """Return the rows with a cell for each heading; nothing stands in those of a row that has too many."""
        width = len(self._headings)
        if all(map(width.__eq__, map(len, rows))):
            return rows
        return [_fitted(cells, width) for cells in rows]

    def _kinds(self, columns_of_file: Sequence[Sequence[str]], count: int) -> Sequence[str]:
        """Return the kind of each row, an empty text where it is in doubt."""
        if self._kind_place is None:
            return [self._kind or ""] * count
        of_cell = {cell: self._kind_of(cell) for cell in set(columns_of_file[self._kind_place])}
        return [of_cell[cell] for cell in columns_of_file[self._kind_place]]

    def _kind_of(self, cell: str) -> str:
        """Return the kind that a cell names, an empty text where it is in doubt."""
        kind = unguarded(cell.strip()).casefold() or self._kind
        return kind if kind in KINDS and self._kind in (None, kind) else ""

    def _mixed(
        self, kinds: Sequence[str], lines: Sequence[int], rows: Sequence[Sequence[str]]
    ) -> Sequence[Record | None]:
        """Return the record of each row, those of each kind read together; None where it must be judged by itself."""
        found: list[Record | None] = [None] * len(rows)
        for kind in filter(None, set(kinds)):
            places = [place for place, of_row in enumerate(kinds) if of_row == kind]
            some = tuple(zip(*(rows[place] for place in places), strict=True))
            read = self._read(kind, [lines[place] for place in places], some)
            for place, record in zip(places, read.each(), strict=True):
                found[place] = record
        return found

    def _read(self, kind: str, lines: Sequence[int], cells: Sequence[Sequence[str]]) -> _Read:
        """Return the records of rows of a kind; `cells` are those of each column of the file."""
        plan = self._plan(kind) if kind else None
        return _Read((), frozenset(range(len(lines)))) if plan is None else _read(plan, lines, cells)

    def _plan(self, kind: str) -> _Plan | None:
        """Return how rows of a kind are read, None where each must be judged by itself."""
        if kind not in self._plans:
            self._plans[kind] = _plan(kind, self._headings, self._origin)
        return self._plans[kind]


def _fitted(cells: Sequence[str], width: int) -> Sequence[str]:
    """Return so many cells: empty ones behind the others, all empty where more is there than can be."""
    if any(cell and not cell.isspace() for cell in cells[width:]):
        return [""] * width
    return [*cells[:width], *[""] * (width - len(cells))]


def _plan(kind: str, headings: Sequence[Heading], origin: str) -> _Plan | None:
    """Return how rows of a kind are read, None where the file lacks columns that the kind needs."""
    of_kind, names = columns(kind), [column.name for column in columns(kind)]
    fields = {each.field: (place, each) for place, each in enumerate(headings) if each.field is not None}
    source_at = None if "source" in fields else names.index("source")
    source = _source(of_kind[names.index("source")], origin)
    if source is None or missing_fields(kind, frozenset(fields)):
        return None
    rules = _rules(KINDS[kind], of_kind) if _has_rules(KINDS[kind], fields) else None
    given = {
        at: (fields[column.name][0], known_of(column, fields[column.name][1].unit, plain=rules is None))
        for at, column in enumerate(of_kind)
        if column.name in fields
    }
    defaults = tuple(column.default if rules else plain_value(column.default, column) for column in of_kind)
    empty = tuple(place for name, (place, _) in fields.items() if name not in (*names, KIND))
    return _Plan(defaults, given, source_at, source, empty, rules)


def _source(column: Column, origin: str) -> str | None:
    """Return what stands before the number of the line in a part's source, None where it is no text to be kept."""
    try:
        text = read_cell(f"{origin} line 1", column, bare=False)
    except QuantityError:
        return None
    return str(text)[:-1]


def _has_rules(model: type[Part], given: Container[str]) -> bool:
    """Return whether what a file gives of a kind can be wrong together, or makes up for what it does not give."""
    return bool(model.rules or model.fills) or any(name in given for name in _NAMES)


def _rules(model: type[Part], of_kind: Sequence[Column]) -> Callable[[tuple[Cell, ...]], Record | None]:
    """Return what judges the values of one row together, and completes them; None where they cannot stand together."""
    names = [column.name for column in of_kind]

    def record(values: tuple[Cell, ...]) -> Record | None:
        read = {name: value for name, value in zip(names, values, strict=True) if value is not ODD}
        if len(read) < len(names) or model.wrong_in(read):
            return None
        whole = model.completed(read)
        return tuple(plain_value(whole[column.name], column) for column in of_kind)

    return record


def _read(plan: _Plan, lines: Sequence[int], cells: Sequence[Sequence[str]]) -> _Read:
    """Return the records of rows; `cells` are those of each column of the file."""
    odd = {place for column in plan.empty for place, cell in enumerate(cells[column]) if cell and not cell.isspace()}
    values: list[Sequence[Cell]] = [[value] * len(lines) for value in plan.defaults]
    for at, (place, known) in plan.given.items():
        column = values[at] = known.values_of(cells[place])
        if known.odd:
            odd.update(place for place, value in enumerate(column) if value is ODD)
    if plan.source_at is not None:
        values[plan.source_at] = [f"{plan.source}{line}" for line in lines]
    if plan.rules is None:
        # the readers gave values as a record holds them, but for those of the odd rows
        return _Read(cast("Records", values), frozenset(odd))
    judged = list(map(plan.rules, zip(*values, strict=True)))
    odd.update(place for place, record in enumerate(judged) if record is None)
    nothing = (None,) * len(values)
    return _Read(list(zip(*(record or nothing for record in judged), strict=True)), frozenset(odd))
