"""The rows of a stock file: cells between delimiters, in quotes where need be."""

from __future__ import annotations

import csv
import re
from collections import deque
from collections.abc import Iterator, Sequence
from dataclasses import dataclass
from typing import NamedTuple

from selector.ingest.lines import LONGEST_LINE_BYTES, Block, Line, Lines

LONGEST_CELL = 10_000
MOST_COLUMNS = 10_000
MOST_LINES_QUOTED = 50

_QUOTED = re.compile(r'"[^"]*"')


@dataclass(frozen=True, slots=True)
class RawRow:
    """One row as it stands in the file; `why` and `remedy` where it cannot be taken as it is."""

    line: int
    cells: tuple[str, ...]
    why: str = ""
    remedy: str = ""


class PlainRows(NamedTuple):
    """Rows without faults of their own: the lines on which they begin, and the cells of each."""

    lines: Sequence[int]
    cells: Sequence[Sequence[str]]


_NO_ROWS = PlainRows((), ())


class _QuoteStaysOpen(Exception):
    """A quote has swallowed more lines, or more characters, than a cell may have."""


class _Feed(Iterator[str]):
    """Lines for a csv reader, which can be given back to it."""

    def __init__(self, lines: Lines, first: Line) -> None:
        """Keep the source and a line that was taken from it already."""
        self._lines = lines
        self._back: deque[Line] = deque((first,))
        self._size = 0
        self.taken: list[Line] = []
        self.ended = False

    def begin(self) -> None:
        """Forget what the last row took."""
        self.taken, self.ended, self._size = [], False, 0

    def peek(self) -> Line | None:
        """Return the next line without taking it."""
        if not self._back:
            following = next(self._lines, None)
            if following is None:
                return None
            self._back.append(following)
        return self._back[0]

    def block(self) -> Block | None:
        """Return a block of lines, None where the next ones must be looked at one by one."""
        return None if self._back else self._lines.block()

    def back(self, block: Block) -> None:
        """Give a block back as lines."""
        self._back.extend(Line(number, f"{text}\n") for number, text in enumerate(block.texts, block.first))

    def skip(self) -> None:
        """Take the line that `peek` returned."""
        self._back.popleft()

    def give_back(self) -> None:
        """Give back all lines of this row but the first."""
        self._back.extendleft(reversed(self.taken[1:]))

    def __next__(self) -> str:
        """Return the next line of this row."""
        if len(self.taken) > MOST_LINES_QUOTED or self._size > LONGEST_LINE_BYTES:
            raise _QuoteStaysOpen
        line = self._back.popleft() if self._back else next(self._lines, None)
        if line is None:
            self.ended = True
            raise StopIteration
        self.taken.append(line)
        self._size += len(line.text)
        return line.text


class Rows(Iterator[RawRow]):
    """The rows of a file, the heading line among them, without blank lines: one at a time, or many plain ones.

    A row whose quote stays open is refused alone: reading goes on in the line after its first. The same where a quote
    over several lines ends inside a cell, or gives the row another number of cells than the heading has: it then
    ended at a quote of another row.
    """

    def __init__(self, lines: Lines, first: Line, delimiter: str) -> None:
        """Begin with a line that was taken from the others already."""
        self._feed, self._delimiter = _Feed(lines, first), delimiter
        self._width = 0

    def __next__(self) -> RawRow:
        """Return the next row."""
        while (line := self._feed.peek()) is not None:
            if _too_wide(line.text, self._delimiter):
                self._feed.skip()
                return RawRow(line.number, (line.text.rstrip("\r\n"),), *_TOO_WIDE)
            row = _row(self._feed, self._delimiter, self._width)
            if any(cell.strip() for cell in row.cells):
                self._width = self._width or len(row.cells)
                return row
        raise StopIteration

    def plain(self) -> PlainRows:
        """Return the next rows, none where they must be taken one by one: each is one plain line."""
        block = self._feed.block()
        if block is None:
            return _NO_ROWS
        rows = _cells_of(block, self._delimiter)
        if len(rows) != len(block.texts):
            self._feed.back(block)
            return _NO_ROWS
        lines = range(block.first, block.first + len(rows))
        if all(cells and cells[0].strip() for cells in rows):
            return PlainRows(lines, rows)
        numbered = [(line, cells) for line, cells in zip(lines, rows, strict=True) if any(map(str.strip, cells))]
        return PlainRows([line for line, _ in numbered], [cells for _, cells in numbered])


def _cells_of(block: Block, delimiter: str) -> list[list[str]]:
    """Return the cells of each line; fewer rows than lines where a quote is not closed in its line."""
    if not block.quotes:
        return [text.split(delimiter) for text in block.texts]
    try:
        return list(csv.reader(block.texts, delimiter=delimiter, strict=True))
    except csv.Error:
        return []


_TOO_WIDE = (f"has more than {MOST_COLUMNS} columns", "see whether this is a stock file")


def _row(feed: _Feed, delimiter: str, width: int) -> RawRow:
    """Return the next row; `width` is the number of cells of the heading, 0 while it is not known."""
    feed.begin()
    try:
        cells = next(csv.reader(feed, delimiter=delimiter))
    except _QuoteStaysOpen:
        return _open_quote(feed, delimiter, f"a quote swallows more than {MOST_LINES_QUOTED} lines")
    except csv.Error:
        return _refused(feed, delimiter, *_too_long(""))
    if feed.ended:
        return _open_quote(feed, delimiter, "a quote is not closed before the file ends")
    if len(feed.taken) > 1 and ((width and len(cells) != width) or not _well_quoted(feed.taken, delimiter)):
        return _open_quote(feed, delimiter, "a quote stays open at the end of its line")
    return RawRow(feed.taken[0].number, tuple(cells), *_cell_fault(cells))


def _well_quoted(lines: list[Line], delimiter: str) -> bool:
    """Return whether each quote of a row closes right before a delimiter or the end, as one that belongs there does."""
    try:
        next(csv.reader((line.text for line in lines), delimiter=delimiter, strict=True))
    except csv.Error:
        return False
    return True


def _cell_fault(cells: list[str]) -> tuple[str, str]:
    """Return what is wrong with the cells as such, and the remedy; both empty where nothing is."""
    for cell in cells:
        if len(cell) > LONGEST_CELL:
            return _too_long(f" (column {cells.index(cell) + 1})")
        if "\x00" in cell:
            return "holds a NUL character", "take it out; it is no part of a text"
    return "", ""


def _too_long(which: str) -> tuple[str, str]:
    """Return the fault of a cell that is too long."""
    return f"has a cell of more than {LONGEST_CELL} characters{which}", "shorten it"


def _open_quote(feed: _Feed, delimiter: str, why: str) -> RawRow:
    """Return the first line alone as a refused row, and give the others back."""
    feed.give_back()
    return _refused(feed, delimiter, why, 'close the quote; a quote inside a cell in quotes is written twice: ""')


def _refused(feed: _Feed, delimiter: str, why: str, remedy: str) -> RawRow:
    """Return the row's first line as a refused row, its quotes taken as they stand."""
    first = feed.taken[0]
    return RawRow(first.number, tuple(first.text.rstrip("\r\n").split(delimiter)), why, remedy)


def _too_wide(text: str, delimiter: str) -> bool:
    """Return whether a line has too many delimiters outside quotes."""
    return text.count(delimiter) >= MOST_COLUMNS and _QUOTED.sub("", text).count(delimiter) >= MOST_COLUMNS
