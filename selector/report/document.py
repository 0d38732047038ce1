"""An answer as people read it: blocks in order, with raw texts that each format cleans and lays out."""

from __future__ import annotations

from dataclasses import dataclass
from typing import Literal

Align = Literal["left", "right"]


@dataclass(frozen=True, slots=True)
class Column:
    """A column of a table: its name, what stands below the name (a limit, a unit), and on which side its cells lie.

    `whole` asks not to break its cells as long as other columns can give way.
    """

    name: str
    align: Align = "left"
    below: str = ""
    whole: bool = False


@dataclass(frozen=True, slots=True)
class Table:
    """A table with an optional heading; every row has a cell for each column."""

    columns: tuple[Column, ...]
    rows: tuple[tuple[str, ...], ...]
    heading: str = ""


@dataclass(frozen=True, slots=True)
class Bar:
    """One bar: its name, its figure as text, and its length as a share of the longest."""

    name: str
    figure: str
    share: float | None


@dataclass(frozen=True, slots=True)
class Bars:
    """Figures of one kind, largest first."""

    heading: str
    bars: tuple[Bar, ...]


@dataclass(frozen=True, slots=True)
class Lines:
    """Sentences, each on a line of its own."""

    texts: tuple[str, ...]


@dataclass(frozen=True, slots=True)
class Notes:
    """A list of sentences under a heading."""

    heading: str
    texts: tuple[str, ...]


Block = Table | Bars | Lines | Notes


@dataclass(frozen=True, slots=True)
class Document:
    """Blocks from top to bottom; the first carries the answer. Empty blocks are left out in print."""

    blocks: tuple[Block, ...]


def empty(block: Block) -> bool:
    """Return whether there is nothing to print of a block."""
    match block:
        case Table():
            return not block.rows
        case Bars():
            return not block.bars
        case _:
            return not block.texts
