"""Answers as plain text of at most 80 columns, for people."""

from __future__ import annotations

from collections.abc import Iterator

from selector.report.clean import clean
from selector.report.document import Bars, Block, Column, Lines, Notes, Table, empty
from selector.report.format import Format
from selector.report.layout import WIDTH, padded, width_of, widths, wrapped
from selector.report.told import Told

_INDENT = "  "
_GAP = "  "
_BAR = 30
_LEAST = 5  # columns of a cell that is narrowed
_MOST_WHOLE = 36  # columns of a cell that is kept whole


def _write(told: Told) -> str:
    """Return the blocks with an empty line between them; everything below a heading is set in."""
    blocks = [list(_block(block)) for block in told.document().blocks if not empty(block)]
    return "\n\n".join("\n".join(line.rstrip() for line in lines) for lines in blocks) + "\n"


def _block(block: Block) -> Iterator[str]:
    match block:
        case Lines():
            for text in block.texts:
                yield from wrapped(clean(text), WIDTH)
        case Table():
            yield from _set_in(block.heading, WIDTH)
            yield from _table(block)
        case Bars():
            yield from _set_in(block.heading, WIDTH)
            yield from _bars(block)
        case Notes():
            yield from _set_in(block.heading, WIDTH)
            for text in block.texts:
                first, *more = wrapped(clean(text), WIDTH - len(_INDENT) - 2)
                yield f"{_INDENT}- {first}"
                yield from (f"{_INDENT}  {line}" for line in more)


def _set_in(heading: str, width: int) -> Iterator[str]:
    if heading:
        yield from (_INDENT + line for line in wrapped(clean(heading), width - len(_INDENT)))


def _table(table: Table) -> Iterator[str]:
    names = [clean(column.name) for column in table.columns]
    below = [clean(column.below) for column in table.columns]
    rows = [[clean(cell) for cell in row] for row in table.rows]
    room = WIDTH - len(_INDENT) - len(_GAP) * (len(names) - 1)
    cells = [names, below, *rows]
    least = [
        min(max(map(width_of, column)), _MOST_WHOLE) if each.whole else _least(each.name)
        for each, column in zip(table.columns, zip(*cells, strict=True), strict=True)
    ]
    fitted = widths(cells, room, least)
    heads = [names, below] if any(below) else [names]
    for row in (*heads, *rows):
        yield from _row(row, fitted, table.columns)


def _least(name: str) -> int:
    """Return the least width of a column: that of the longest word of its name, so that the name can be read."""
    return max(_LEAST, *(width_of(word) for word in name.split(" ")))


def _row(cells: list[str], fitted: list[int], columns: tuple[Column, ...]) -> Iterator[str]:
    """Yield the lines of a row: as many as its cell of most lines takes."""
    split = [wrapped(cell, width) for cell, width in zip(cells, fitted, strict=True)]
    for number in range(max(map(len, split))):
        parts = (
            padded(lines[number] if number < len(lines) else "", width, column.align)
            for lines, width, column in zip(split, fitted, columns, strict=True)
        )
        yield _INDENT + _GAP.join(parts)


def _bars(bars: Bars) -> Iterator[str]:
    names = [clean(bar.name) for bar in bars.bars]
    figures = [clean(bar.figure) for bar in bars.bars]
    wide = widths(list(zip(names, figures, strict=True)), WIDTH - len(_INDENT) - 2 * len(_GAP) - _BAR, [_LEAST, _LEAST])
    for name, figure, bar in zip(names, figures, bars.bars, strict=True):
        marks = "" if bar.share is None else "#" * max(1, round(_BAR * bar.share))
        first, *more = wrapped(name, wide[0])
        yield _INDENT + padded(first, wide[0], "left") + _GAP + padded(figure, wide[1], "right") + _GAP + marks
        yield from (_INDENT + line for line in more)


FORMAT = Format("table", (".txt",), _write)
