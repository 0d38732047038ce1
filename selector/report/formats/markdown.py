"""Answers as Markdown, to be pasted into notes and tickets."""

from __future__ import annotations

import re
from collections.abc import Iterator

from selector.report.clean import clean
from selector.report.document import Bars, Block, Lines, Notes, Table, empty
from selector.report.format import Format
from selector.report.told import Told

_MARKUP = re.compile(r"([\\`*_\[\]<>|&~$!{}])")
_AT_START = re.compile(r"^(\s*)([#+\-=:]|\d+(?=[.)]))")


def _write(told: Told) -> str:
    """Return the blocks of the document with an empty line between them."""
    blocks = (block for block in told.document().blocks if not empty(block))
    return "\n\n".join("\n".join(_block(block)) for block in blocks) + "\n"


def _block(block: Block) -> Iterator[str]:
    match block:
        case Table():
            yield from _heading(block.heading)
            yield _row([" ".join(filter(None, (each.name, each.below))) for each in block.columns])
            yield "|" + "|".join(" ---: " if each.align == "right" else " --- " for each in block.columns) + "|"
            yield from (_row(row) for row in block.rows)
        case Bars():
            yield from _heading(block.heading)
            yield _row(("", "amount"))
            yield "| --- | ---: |"
            yield from (_row((bar.name, bar.figure)) for bar in block.bars)
        case Notes():
            yield from _heading(block.heading)
            yield from (f"- {_start(text)}" for text in block.texts)
        case Lines():
            yield "\\\n".join(_start(text) for text in block.texts)


def _heading(text: str) -> Iterator[str]:
    if text:
        yield f"### {_text(text)}"
        yield ""


def _row(cells: list[str] | tuple[str, ...]) -> str:
    return "| " + " | ".join(_text(cell) for cell in cells) + " |"


def _start(text: str) -> str:
    r"""Return text for the start of a line: what would begin a list or a heading has a `\` before it."""
    shown = _text(text)
    match = _AT_START.match(shown)
    if match is None:
        return shown
    mark, rest = match[2], shown[match.end() :]
    return f"{mark}\\{rest}" if mark.isdigit() else f"\\{mark}{rest}"


def _text(text: str) -> str:
    """Return text that Markdown takes for nothing but text."""
    return _MARKUP.sub(r"\\\1", clean(text))


FORMAT = Format("markdown", (".md", ".markdown"), _write)
