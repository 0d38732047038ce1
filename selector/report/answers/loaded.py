"""What `load` answers."""

from __future__ import annotations

from dataclasses import dataclass
from typing import TYPE_CHECKING, ClassVar

if TYPE_CHECKING:
    from selector.report.answers.changed import FieldChange

CELLS_SHOWN = 20


@dataclass(frozen=True, slots=True)
class ColumnRead:
    """A column of a stock file: its heading, the field it was taken for (None: not used), unit and samples."""

    heading: str
    field: str | None
    unit: str | None
    matched: str | None
    nearest: str | None
    samples: tuple[str, ...]


@dataclass(frozen=True, slots=True)
class CellRefused:
    """A cell that could not be taken, and what would be right."""

    line: int
    column: str
    value: str
    why: str
    remedy: str


@dataclass(frozen=True, slots=True)
class FileLoaded:
    """What became of one stock file."""

    file: str
    encoding: str
    delimiter: str
    heading_line: int
    columns: tuple[ColumnRead, ...]
    new: int
    changed: int
    same: int
    refused: int
    changes: tuple[FieldChange, ...]
    cells: tuple[CellRefused, ...]  # the first of the refused cells, at most `CELLS_SHOWN`
    notes: tuple[str, ...] = ()


@dataclass(frozen=True, slots=True)
class Loaded:
    """Answer of `load`; `rejects` names the file that the refused rows went to."""

    view: ClassVar[str] = "loaded"
    files: tuple[FileLoaded, ...]
    dry_run: bool
    rejects: str | None
