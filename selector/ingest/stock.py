"""The reading of a stock file, row by row; what it holds in memory does not grow with the file."""

from __future__ import annotations

from collections.abc import Mapping, Sequence
from itertools import islice
from pathlib import Path

from selector.ingest.accepted import AcceptedRows, Piece, Spool
from selector.ingest.codes import Codes
from selector.ingest.headings import Heading
from selector.ingest.judge import Judge
from selector.ingest.layout import Layout, layout_of
from selector.ingest.lines import opened, shown_path
from selector.ingest.quick import Quick
from selector.ingest.refused import RefusedRow, RefusedRows
from selector.ingest.result import ColumnRead, Read, StockFile
from selector.ingest.rows import PlainRows, RawRow
from selector.parts import record_of

_AT_ONCE = 2_000
_SAMPLES = 3
_LONGEST_SAMPLE = 40


def read_stock(
    path: Path, *, kind: str | None = None, headings: Mapping[str, str] | None = None, who: str = ""
) -> StockFile:
    """Read a CSV of stocked parts.

    Parameters
    ----------
    path : Path
        A file or pipe of UTF-8 text; its first line with text in it names the columns.
    kind : str or None
        The kind of all parts; None where a column `kind` gives it.
    headings : Mapping[str, str] or None
        Field by heading, as the caller decides it; an empty field leaves the column out.
    who : str
        Who loads the file, for the `source` of the parts.

    Returns
    -------
    StockFile
        The parts, and the rows that cannot be read or are impossible with all that is wrong with each.

    Raises
    ------
    UsageRefused
        The kind or a field of `headings` does not exist.
    InputRefused
        The file as a whole cannot be read.
    """
    where = shown_path(path)
    with opened(path) as file:
        layout = layout_of(file.lines, kind, headings or {}, where)
        read = Read(file.encoding, layout.delimiter, layout.heading_line)
        name = shown_path(Path(path.name))
        intake = _Intake(layout, kind, f"{who}, {name}" if who else name)
        intake.take_all()
    return intake.finished(path, read)


class _Intake:
    """The rows of one file, sorted into parts and refused rows while they come."""

    def __init__(self, layout: Layout, kind: str | None, origin: str) -> None:
        """Begin with no row."""
        self._layout = layout
        self._judge = Judge(layout.headings, kind, origin)
        self._quick = Quick(layout.headings, kind, origin)
        self._samples: list[list[str]] = [[] for _ in layout.headings]
        self._accepted, self._codes = Spool(), Codes()
        self._refused, self._refused_codes = RefusedRows(), Codes()

    def take_all(self) -> None:
        """Sort all rows in: those that are plain many at once, the others as many as come between them."""
        rows = self._layout.rows
        waiting: list[RawRow] = []
        while True:
            some = rows.plain()
            row = None if some.lines else next(rows, None)
            if row is not None and not row.why:
                waiting.append(row)
            if some.lines or row is None or row.why or len(waiting) == _AT_ONCE:
                self._take(PlainRows([each.line for each in waiting], [each.cells for each in waiting]))
                waiting = []
            if some.lines:
                self._take(some)
            elif row is None:
                return
            elif row.why:
                self._sample((row.cells,))
                self._take_one(row)

    def finished(self, path: Path, read: Read) -> StockFile:
        """Return all that came, without the parts whose code stands in another row as well."""
        file = StockFile(
            path=path,
            read=read,
            columns=tuple(map(_column_read, self._layout.headings, self._samples)),
            accepted=AcceptedRows(self._accepted),
            codes=self._codes,
            refused=self._refused,
            missing=tuple(each for each in self._judge.missing.values() if each.fields),
            not_mapped=self._layout.not_mapped,
        )
        return file.refusing_several(self._codes.also_in(self._refused_codes))

    def _take(self, rows: PlainRows) -> None:
        """Sort rows in that have no fault of their own."""
        if not rows.lines:
            return
        self._sample(rows.cells)
        for piece in self._quick.pieces(rows):
            if piece.kind:
                self._accept(piece)
            else:
                for line, cells in zip(piece.lines, piece.cells, strict=True):
                    self._take_one(RawRow(line, tuple(cells)))

    def _accept(self, piece: Piece) -> None:
        """Keep rows that are parts."""
        self._accepted.add(piece)
        self._codes.add(piece.kind, piece.records[0])

    def _take_one(self, row: RawRow) -> None:
        """Judge one row by itself, and keep it as what it is; the code of a refused one counts against others too."""
        part = self._judge.part_of(row)
        if isinstance(part, tuple):
            self._refused.add(RefusedRow(row.line, row.cells, part))
            kind, code = self._judge.code_of(row)
            self._refused_codes.add(kind, (code,))
        else:
            self._accept(Piece(part.kind, (row.line,), [(value,) for value in record_of(part)], (row.cells,)))

    def _sample(self, rows: Sequence[Sequence[str]]) -> None:
        """Keep what stands in the first rows of each column."""
        for place, samples in enumerate(self._samples):
            if len(samples) < _SAMPLES:
                texts = (cells[place].strip()[:_LONGEST_SAMPLE] for cells in rows if place < len(cells))
                samples.extend(islice(filter(None, texts), _SAMPLES - len(samples)))


def _column_read(heading: Heading, samples: list[str]) -> ColumnRead:
    """Return how one column was read."""
    return ColumnRead(heading.text, heading.field, heading.unit, heading.matched, heading.nearest, tuple(samples))
