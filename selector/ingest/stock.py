"""The reading of a stock file, row by row; what it holds in memory is bounded by what is accepted."""

from __future__ import annotations

from array import array
from collections.abc import Mapping
from hashlib import blake2b
from pathlib import Path

from selector.ingest.headings import Heading
from selector.ingest.judge import Judge
from selector.ingest.layout import Layout, layout_of
from selector.ingest.lines import opened, shown_path
from selector.ingest.refused import CellFault, RefusedRow, RefusedRows
from selector.ingest.result import ColumnRead, Key, MissingFields, Read, StockFile, packed, shared_fault
from selector.ingest.rows import RawRow
from selector.parts import Part

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
        judge = Judge(layout.headings, kind, f"{who}, {name}" if who else name)
        intake = _Intake(layout, judge)
        for row in layout.rows:
            intake.take(row)
    return intake.finished(path, read)


class _Intake:
    """The rows of one file, sorted into parts and refused rows while they come."""

    def __init__(self, layout: Layout, judge: Judge) -> None:
        """Begin with no row."""
        self._layout, self._judge = layout, judge
        self._samples: list[list[str]] = [[] for _ in layout.headings]
        self._accepted: dict[Key, tuple[int, Part, str]] = {}
        self._again: dict[Key, int] = {}
        self._refused = RefusedRows()
        self._refused_codes = array("Q")
        self._code_heading = next((each.text for each in layout.headings if each.field == "part"), "part")

    def take(self, row: RawRow) -> None:
        """Sort one row in."""
        self._sample(row)
        part = self._judge.part_of(row)
        if isinstance(part, tuple):
            self._refuse(row, part)
            return
        key = (part.kind, part.part)
        if key not in self._accepted:
            self._accepted[key] = (row.line, part, packed(row.cells))
            return
        first = self._accepted[key][0]
        self._again.setdefault(key, row.line)
        self._refused.add(RefusedRow(row.line, row.cells, (self._shared(key, first),)))

    def finished(self, path: Path, read: Read) -> StockFile:
        """Return all that came, without the parts whose code stands in another row as well."""
        rows = tuple(self._accepted.values())
        file = StockFile(
            path=path,
            read=read,
            columns=tuple(map(_column_read, self._layout.headings, self._samples)),
            rows=tuple((line, part) for line, part, _ in rows),
            refused=self._refused,
            missing=self._missing(),
            not_mapped=self._layout.not_mapped,
            packed=tuple(cells for _, _, cells in rows),
        )
        return file.refusing({key: (self._shared(key, line),) for key, line in self._shared_keys().items()})

    def _shared_keys(self) -> dict[Key, int]:
        """Return the codes of parts that another row has as well, with that row's line, 0 where it was not kept."""
        codes = set(self._refused_codes) if self._accepted else set()
        among_refused = {key: 0 for key in self._accepted if _number_of(" ".join(key)) in codes}
        return among_refused | self._again

    def _refuse(self, row: RawRow, faults: tuple[CellFault, ...]) -> None:
        """Keep a row that is refused, and its code, so that a row that shares it is refused too."""
        self._refused.add(RefusedRow(row.line, row.cells, faults))
        self._refused_codes.append(_number_of(self._judge.code_of(row)))

    def _shared(self, key: Key, line: int) -> CellFault:
        """Return the fault of a row that shares its code with the one in a line."""
        return shared_fault(self._code_heading, key, f"line {line}" if line else "a row that is refused")

    def _missing(self) -> tuple[MissingFields, ...]:
        """Return the kinds for which columns are missing, in the order in which they came."""
        return tuple(each for each in self._judge.missing.values() if each.fields)

    def _sample(self, row: RawRow) -> None:
        """Keep what stands in the first rows of each column."""
        for samples, cell in zip(self._samples, row.cells, strict=False):
            if len(samples) < _SAMPLES and cell.strip():
                samples.append(cell.strip()[:_LONGEST_SAMPLE])


def _column_read(heading: Heading, samples: list[str]) -> ColumnRead:
    """Return how one column was read."""
    return ColumnRead(heading.text, heading.field, heading.unit, heading.matched, heading.nearest, tuple(samples))


def _number_of(code: str) -> int:
    """Return eight bytes that stand for a code: many refused ones must not fill the memory."""
    return int.from_bytes(blake2b(code.encode("utf-8", "surrogatepass"), digest_size=8).digest(), "big")
